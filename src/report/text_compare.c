/* SPDX-License-Identifier: GPL-3.0-or-later
 * The comparison for people: verdict, table, reasons, walls. */
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "base/text.h"
#include "report/number.h"
#include "report/report.h"
#include "report/text_study.h"
#include "section/solution.h"

enum { WIDTH = 100, INDENT = 12, THIN_DIGITS = 6, COLUMNS = 7, MOST = 64 /* walls */ };

/* The texts of one line of a table. */
typedef struct line {
    char cell[COLUMNS][2 * UTW_DECIMAL_LENGTH + 8];
} line;

static void short_number(double x, int digits, char *text, size_t n)
{
    char number[UTW_DECIMAL_LENGTH];
    utw_decimal_short(x, digits, number);
    snprintf(text, n, "%s", number);
}

/* x to a few digits, in the notation of the table's other numbers. */
static void plain_number(double x, char *text, size_t n)
{
    const int place = utw_decimal_place(x) - THIN_DIGITS + 1;
    const double rounded = utw_decimal_value(utw_decimal_count(x, place, UTW_NEAREST), place);
    const utw_quantity q = {rounded, rounded, rounded, UTW_EXACT};
    utw_number number;
    utw_number_write(&q, 0, &number);
    snprintf(text, n, "%s", number.value);
}

/* Width of a column: of its longest text. */
static int width_of(const line *row, int n, int column)
{
    int width = 0;
    for (int i = 0; i < n; i++) {
        const int length = (int)strlen(row[i].cell[column]);
        width = length > width ? length : width;
    }
    return width;
}

static void write_lines(utw_text *text, const line *row, int n, const int *left)
{
    int width[COLUMNS];
    for (int k = 0; k < COLUMNS; k++) width[k] = width_of(row, n, k);
    for (int i = 0; i < n; i++) {
        int last = COLUMNS - 1;
        while (last > 0 && row[i].cell[last][0] == '\0') last--;
        for (int k = 0; k <= last; k++) {
            if (width[k] == 0) continue;
            const int pad = width[k] - (int)strlen(row[i].cell[k]);
            if (!left[k]) utw_text_repeat(text, ' ', pad);
            utw_text_add(text, "%s", row[i].cell[k]);
            if (k == last) break;
            utw_text_repeat(text, ' ', left[k] ? pad + 2 : 2);
        }
        utw_text_add(text, "\n");
    }
}

static const char *base_text(utw_difference_base base)
{
    switch (base) {
    case UTW_OF_WIDTH:
        return " of width";
    case UTW_OF_DEPTH:
        return " of depth";
    case UTW_OF_MEAN:
        return " of sqrt(Ixx Iyy)";
    case UTW_OF_SOLID:
        return "";
    }
    return "";
}

static void difference_text(const utw_compared *row, char *text, size_t n)
{
    const double percent = 100 * row->difference;
    const int digits = fabs(percent) >= 100 ? 0 : 2;
    if (fabs(percent) < 0.005)
        snprintf(text, n, "0.00 %%%s", base_text(row->base));
    else
        snprintf(text, n, "%+.*f %%%s", digits,
                 fabs(percent) < 1e5 ? percent : copysign(1e5, percent), base_text(row->base));
}

/* Size of what is the rounding of a zero: of points and of Ixy. */
static double noise_of(const utw_solution *s, utw_constant which)
{
    const double *box = s->outline->box;
    const double size = hypot(box[2] - box[0], box[3] - box[1]);
    switch (which) {
    case UTW_XC:
    case UTW_YC:
    case UTW_XS:
    case UTW_YS:
        return 1e-9 * size;
    case UTW_IXY:
        return 1e-9 * (s->area.Ixx + s->area.Iyy);
    default:
        return 0;
    }
}

static void write_table(const utw_report *report, utw_text *text)
{
    const utw_comparison *c = report->comparison;
    static const int left[COLUMNS] = {1, 0, 0, 0, 0, 1, 1};
    line row[UTW_CONSTANT_COUNT + 1] = {
        {{"", "solid", "low", "high", "thin-walled", "", "difference"}}};
    int n = 1;
    for (int k = 0; k < utw_comparison_count(c); k++) {
        const utw_compared *one = utw_comparison_get(c, k);
        utw_number number;
        char difference[48];
        if (one->absent != NULL) continue;
        const double noise = noise_of(report->solution, one->which);
        utw_number_write(&one->solid, noise, &number);
        line *r = &row[n++];
        snprintf(r->cell[0], sizeof r->cell[0], "%s", utw_constant_key(one->which));
        snprintf(r->cell[1], sizeof r->cell[1], "%s", number.value);
        snprintf(r->cell[2], sizeof r->cell[2], "%s", number.low);
        snprintf(r->cell[3], sizeof r->cell[3], "%s", number.high);
        plain_number(fabs(one->thin) <= noise ? 0 : one->thin, r->cell[4], sizeof r->cell[4]);
        utw_report_unit(report->solution, one->which, r->cell[5], sizeof r->cell[5]);
        difference_text(one, difference, sizeof difference);
        snprintf(r->cell[6], sizeof r->cell[6], "%-8s %s", one->within ? "within" : "OUTSIDE",
                 difference);
    }
    char limit[UTW_DECIMAL_LENGTH];
    utw_decimal_short(100 * utw_comparison_limit(c), 3, limit);
    snprintf(row[0].cell[6], sizeof row[0].cell[6], "%s %%%*s difference", limit,
             6 - (int)strlen(limit), "");
    write_lines(text, row, n, left);
}

static void begin_note(utw_text *text, const char *title)
{
    utw_text_add(text, "%s", title);
    utw_text_pad(text, INDENT);
}

/* A note of several words; `words` is cleared. */
static void write_note(utw_text *text, const char *title, utw_text *words)
{
    begin_note(text, title);
    if (words->out_of_memory)
        text->out_of_memory = 1;
    else
        utw_text_wrap(text, INDENT, WIDTH, words->text);
    utw_text_clear(words);
}

static void add_count(utw_text *words, int n, const char *one, const char *many)
{
    utw_text_add(words, "%s%d %s", words->n == 0 ? "" : ", ", n, n == 1 ? one : many);
}

static void write_midline(const utw_report *report, utw_text *text)
{
    const utw_idealisation *ideal = utw_comparison_idealisation(report->comparison);
    const utw_idealisation_info *info = utw_idealisation_get(ideal);
    utw_text words = {.text = NULL};
    add_count(&words, info->walls, "wall", "walls");
    if (info->bends > 0) add_count(&words, info->bends, "bend", "bends");
    if (info->links > 0) add_count(&words, info->links, "link", "links");
    add_count(&words, info->junctions, "junction", "junctions");
    add_count(&words, info->cells, "cell", "cells");
    utw_text_add(&words, "; %s", info->given ? "the midline is given" : "found in the outline");
    write_note(text, "Midline", &words);
}

static const char *kind_text(utw_wall_kind kind)
{
    switch (kind) {
    case UTW_WALL_PLATE:
        return "wall";
    case UTW_WALL_BEND:
        return "bend";
    case UTW_WALL_LUMP:
        return "thick part";
    case UTW_WALL_LINK:
        return "link";
    }
    return "";
}

static void point_text(const double p[2], double noise, char *text, size_t n)
{
    char x[UTW_DECIMAL_LENGTH], y[UTW_DECIMAL_LENGTH];
    utw_decimal_short(fabs(p[0]) <= noise ? 0 : p[0], 5, x);
    utw_decimal_short(fabs(p[1]) <= noise ? 0 : p[1], 5, y);
    snprintf(text, n, "(%s, %s)", x, y);
}

static void write_walls(const utw_report *report, utw_text *text)
{
    static const int left[COLUMNS] = {0, 1, 1, 1, 0, 0, 0};
    const utw_idealisation *ideal = utw_comparison_idealisation(report->comparison);
    const utw_midline *m = utw_idealisation_midline(ideal);
    const double noise = noise_of(report->solution, UTW_XC);
    line row[MOST + 1] = {{{"wall", "", "from", "to", "length", "thickness", "length/thickness"}}};
    int n = 1;
    for (int i = 0; i < m->n_walls && n <= MOST; i++) {
        const utw_wall *w = &m->walls[i];
        const utw_wall_info *info = utw_idealisation_wall(ideal, i);
        line *r = &row[n++];
        char t[2][UTW_DECIMAL_LENGTH];
        snprintf(r->cell[0], sizeof r->cell[0], "%d", i + 1);
        snprintf(r->cell[1], sizeof r->cell[1], "%s", kind_text(info->kind));
        point_text(m->nodes[w->from], noise, r->cell[2], sizeof r->cell[2]);
        point_text(m->nodes[w->to], noise, r->cell[3], sizeof r->cell[3]);
        short_number(info->length, 4, r->cell[4], sizeof r->cell[4]);
        short_number(w->t0, 4, t[0], sizeof t[0]);
        short_number(w->t1, 4, t[1], sizeof t[1]);
        snprintf(r->cell[5], sizeof r->cell[5], strcmp(t[0], t[1]) == 0 ? "%s" : "%s to %s", t[0],
                 t[1]);
        if (info->kind == UTW_WALL_PLATE)
            snprintf(r->cell[6], sizeof r->cell[6], "%.1f%s", info->slenderness,
                     info->slender ? "" : " *");
    }
    write_lines(text, row, n, left);
    if (m->n_walls > MOST) utw_text_add(text, "and %d more\n", m->n_walls - MOST);
}

/* Constants that are left out, those with the same reason together. */
static void write_absent(const utw_report *report, utw_text *text)
{
    const utw_comparison *c = report->comparison;
    for (int k = 0; k < utw_comparison_count(c); k++) {
        const utw_compared *one = utw_comparison_get(c, k);
        if (one->absent == NULL) continue;
        utw_text words = {.text = NULL};
        const char *key = utw_constant_key(one->which);
        const size_t n = strlen(key);
        const int begins = strncmp(one->absent, key, n) == 0 && one->absent[n] == ' ';
        utw_text_add(&words, "%s: %s", key, begins ? one->absent + n + 1 : one->absent);
        write_note(text, "Left out", &words);
    }
}

static void write_all(const utw_report *report, utw_text *text)
{
    const utw_comparison *c = report->comparison;
    const utw_outline *outline = report->solution->outline;
    const char *name = utw_outline_name(outline);
    utw_text_add(text, "%s\nUnits: %s. x to the right, y up.\n\n",
                 name[0] != '\0' ? name : "Section without a name", utw_outline_units(outline));
    utw_text_wrap(text, 0, WIDTH, utw_comparison_verdict(c));
    utw_text_add(text, "\n");
    write_table(report, text);
    utw_text_add(text, "\n");
    write_midline(report, text);
    for (int k = 0; k < utw_comparison_reason_count(c); k++) {
        begin_note(text, k == 0 ? "Reasons" : "");
        utw_text_wrap(text, INDENT, WIDTH, utw_comparison_reason(c, k));
    }
    write_absent(report, text);
    begin_note(text, "Caution");
    utw_text_wrap(text, INDENT, WIDTH, utw_report_caution(report->solution));
    utw_text_add(text, "\n");
    write_walls(report, text);
    utw_report_text_study(report, text);
}

utw_status utw_report_comparison(const utw_report *report, char **text, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_text content = {.text = NULL};
    UTW_TRY(utw_report_check(report, text, __func__, err));
    if (report->comparison == NULL) {
        st = utw_fail(err, UTW_E_ARGUMENT, "%s: the report has no comparison", __func__);
        goto done;
    }
    write_all(report, &content);
    UTW_TRY(utw_text_take(&content, text, err));
    st = UTW_OK;
done:
    utw_text_clear(&content);
    return st;
}
