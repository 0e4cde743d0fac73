/* SPDX-License-Identifier: GPL-3.0-or-later
 * The thickness study for people: a line a step, and where each quantity crosses the limit. */
#include "report/text_study.h"

#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/decimal.h"
#include "report/report.h"
#include "section/solution.h"

enum { WIDTH = 100, INDENT = 12, COLUMN = 8 };

/* Columns of the table, in its order; those without any value are left out. */
static const utw_constant column[] = {UTW_A,  UTW_IXX, UTW_IYY, UTW_J,   UTW_WT,
                                      UTW_XS, UTW_YS,  UTW_IW,  UTW_ASX, UTW_ASY};
enum { N_COLUMN = sizeof column / sizeof column[0] };

static int has_any(const utw_study *s, utw_constant which)
{
    double d;
    for (int i = 0; i < utw_study_count(s); i++)
        if (utw_study_difference(s, i, which, &d)) return 1;
    return 0;
}

static void add_cell(utw_text *text, const char *cell)
{
    utw_text_repeat(text, ' ', COLUMN - (int)strlen(cell));
    utw_text_add(text, "%s", cell);
}

static void add_difference(const utw_study *s, int step, utw_constant which, utw_text *text)
{
    char cell[32] = "-";
    double d;
    if (utw_study_difference(s, step, which, &d)) {
        const double percent = fmax(-99999, fmin(99999, 100 * d));
        snprintf(cell, sizeof cell, fabs(percent) >= 100 ? "%+.0f" : "%+.2f",
                 fabs(percent) < 0.005 ? 0 : percent);
    }
    add_cell(text, cell);
}

static void write_table(const utw_study *s, const char *unit, utw_text *text)
{
    char head[32];
    add_cell(text, "factor");
    snprintf(head, sizeof head, "t, %s", unit);
    add_cell(text, head);
    add_cell(text, "t/b");
    for (int k = 0; k < N_COLUMN; k++)
        if (has_any(s, column[k])) add_cell(text, utw_constant_key(column[k]));
    utw_text_add(text, "\n");
    for (int i = 0; i < utw_study_count(s); i++) {
        const utw_study_step *step = utw_study_get(s, i);
        const double number[3] = {step->factor, step->thickness, step->ratio};
        for (int k = 0; k < 3; k++) {
            char cell[UTW_DECIMAL_LENGTH];
            utw_decimal_short(number[k], k == 2 ? 3 : 4, cell);
            add_cell(text, cell);
        }
        if (step->failed != NULL) {
            utw_text_add(text, "  ");
            utw_text_wrap(text, 3 * COLUMN + 2, WIDTH, step->failed);
            continue;
        }
        for (int k = 0; k < N_COLUMN; k++)
            if (has_any(s, column[k])) add_difference(s, i, column[k], text);
        utw_text_add(text, "\n");
    }
}

/* What a statement says behind the name of its constant; NULL without one. */
static const char *saying(const utw_study *s, int which)
{
    const char *statement = utw_study_statement(s, (utw_constant)which);
    return statement == NULL ? NULL : strchr(statement, ':');
}

/* Statements, those that say the same together. */
static void write_limits(const utw_study *s, utw_text *text)
{
    int n = 0;
    for (int k = 0; k < UTW_CONSTANT_COUNT; k++) {
        const char *words = saying(s, k);
        int told = 0;
        if (words == NULL) continue;
        for (int i = 0; i < k; i++)
            told |= saying(s, i) != NULL && strcmp(saying(s, i), words) == 0;
        if (told) continue;
        utw_text line = {.text = NULL};
        utw_text_add(&line, "%s", utw_constant_key((utw_constant)k));
        for (int i = k + 1; i < UTW_CONSTANT_COUNT; i++)
            if (saying(s, i) != NULL && strcmp(saying(s, i), words) == 0)
                utw_text_add(&line, ", %s", utw_constant_key((utw_constant)i));
        utw_text_add(&line, "%s", words);
        utw_text_add(text, "%s", n++ == 0 ? "Limits" : "");
        utw_text_pad(text, INDENT);
        if (line.out_of_memory)
            text->out_of_memory = 1;
        else
            utw_text_wrap(text, INDENT, WIDTH, line.text);
        utw_text_clear(&line);
    }
}

void utw_report_text_study(const utw_report *report, utw_text *text)
{
    const utw_study *s = report->study;
    if (s == NULL) return;
    utw_text_add(text, "\nThickness study: difference in per cent, as above\n");
    write_table(s, report->solution->outline->length_unit, text);
    utw_text_add(text, "\n");
    write_limits(s, text);
    utw_text_add(text, "Study");
    utw_text_pad(text, INDENT);
    utw_text_wrap(
        text, INDENT, WIDTH,
        "The walls of the midline are given the factor times their thickness, with mitred "
        "corners and no fillets, and both theories are solved. t is their mean thickness, b "
        "the length of the longest wall.");
}
