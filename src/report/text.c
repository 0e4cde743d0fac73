/* SPDX-License-Identifier: GPL-3.0-or-later
 * The report for people: a table of the constants and what stands behind them. */
#include "base/text.h"

#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "report/number.h"
#include "report/report.h"
#include "report/text_cases.h"
#include "section/solution.h"

enum {
    WIDTH = 100,  /* characters of a line */
    INDENT = 12,  /* of the notes below the table */
    MEANING = 11, /* where these columns of the table begin: the longest key has 9 characters, */
    NUMBERS = 44  /* the longest meaning 31 */
};

/* Exact values smaller than this part of the size of the drawing are rounding of a zero. */
#define NOISE 1e-13

typedef struct row {
    utw_constant which;
    utw_quantity quantity;
    utw_number number;
    char unit[16];
} row;

/* What is being written. */
typedef struct table {
    const utw_report *report;
    const utw_solution *solution;
    utw_text *text;
    row row[UTW_CONSTANT_COUNT];
    row stiffness[UTW_STIFFNESS_COUNT]; /* of a bar of different materials */
    char absent[UTW_CONSTANT_COUNT][sizeof(((utw_error *)0)->text)]; /* why there is none, or "" */
    int width[3];                                                    /* of value, low, high */
} table;

static const struct {
    const char *title;
    int n;
    utw_constant which[16];
} groups[] = {
    {"Area", 4, {UTW_A, UTW_PERIMETER, UTW_XC, UTW_YC}},
    {"Bending, about the centroid",
     16,
     {UTW_IXX, UTW_IYY, UTW_IXY, UTW_I1, UTW_I2, UTW_ANGLE, UTW_RX, UTW_RY, UTW_WX_TOP,
      UTW_WX_BOTTOM, UTW_WY_LEFT, UTW_WY_RIGHT, UTW_ZX, UTW_ZY, UTW_XP, UTW_YP}},
    {"Torsion",
     10,
     {UTW_J, UTW_WT, UTW_XS, UTW_YS, UTW_XF, UTW_YF, UTW_IW, UTW_R0, UTW_BETAX, UTW_BETAY}},
    {"Shear", 4, {UTW_ASX, UTW_ASY, UTW_KX, UTW_KY}},
};
enum { N_GROUP = sizeof groups / sizeof groups[0] };

/* Size of the rounding of a constant that symmetry makes zero. */
static double noise_of(const utw_solution *s, utw_constant which)
{
    const double *box = s->outline->box;
    const double size = fmax(fmax(fabs(box[0]), fabs(box[2])), fmax(fabs(box[1]), fabs(box[3])));
    switch (which) {
    case UTW_XC:
    case UTW_YC:
    case UTW_XP:
    case UTW_YP:
        return NOISE * size;
    case UTW_IXY:
        return NOISE * (s->area.Ixx + s->area.Iyy);
    case UTW_ANGLE:
        return NOISE * 180;
    default:
        return 0;
    }
}

/* The row's number as text; the columns become wide enough for it. */
static void set_number(table *t, row *r, double noise)
{
    utw_number_write(&r->quantity, noise, &r->number);
    const char *const cell[3] = {r->number.value, r->number.low, r->number.high};
    for (int k = 0; k < 3; k++) {
        const int n = (int)strlen(cell[k]);
        t->width[k] = n > t->width[k] ? n : t->width[k];
    }
}

static utw_status fill_stiffness(table *t, utw_error *err)
{
    utw_status st = UTW_OK;
    for (int w = 0; utw_solution_composite(t->solution) && w < UTW_STIFFNESS_COUNT; w++) {
        row *r = &t->stiffness[w];
        r->which = utw_stiffness_constant((utw_stiffness)w);
        utw_report_stiffness_unit(t->solution, (utw_stiffness)w, r->unit, sizeof r->unit);
        UTW_TRY(utw_solution_stiffness(t->solution, (utw_stiffness)w, &r->quantity, err));
        const utw_quantity *q = &t->row[r->which].quantity; /* noise in the stiffness' own size */
        set_number(t, r,
                   q->value != 0
                       ? noise_of(t->solution, r->which) * fabs(r->quantity.value / q->value)
                       : 0);
    }
done:
    return st;
}

static void fill(table *t)
{
    for (int w = 0; w < UTW_CONSTANT_COUNT; w++) {
        row *r = &t->row[w];
        utw_error why;
        utw_error_clear(&why);
        r->which = (utw_constant)w;
        utw_report_unit(t->solution, r->which, r->unit, sizeof r->unit);
        if (utw_report_constant(t->solution, r->which, &r->quantity, &why) != UTW_OK) {
            memcpy(t->absent[w], why.text, sizeof why.text);
            continue;
        }
        set_number(t, r, noise_of(t->solution, r->which));
    }
}

/* One line of the table. */
static void write_line(const table *t, const char *name, const char *meaning, const char *value,
                       const char *low, const char *high, const char *trust, const char *unit)
{
    utw_text_add(t->text, "%s", name);
    utw_text_pad(t->text, MEANING);
    utw_text_add(t->text, "%s", meaning);
    utw_text_pad(t->text, NUMBERS);
    utw_text_add(t->text, "%*s  %*s  %*s  %-8s  %s\n", t->width[0], value, t->width[1], low,
                 t->width[2], high, trust, unit);
}

static void write_table(const table *t)
{
    write_line(t, "symbol", "what it is", "value", "low", "high", "trust", "unit");
    for (int g = 0; g < N_GROUP; g++) {
        int any = 0;
        for (int i = 0; i < groups[g].n; i++) {
            const row *r = &t->row[groups[g].which[i]];
            if (t->absent[r->which][0] != '\0') continue;
            if (!any) utw_text_add(t->text, "%s\n", groups[g].title);
            any = 1;
            write_line(t, utw_constant_key(r->which), utw_constant_meaning(r->which),
                       r->number.value, r->number.low, r->number.high,
                       utw_report_trust(r->quantity.trust), r->unit);
        }
    }
}

static void write_stiffness(const table *t)
{
    if (!utw_solution_composite(t->solution)) return;
    utw_text_add(t->text, "Stiffness of the bar\n");
    for (int w = 0; w < UTW_STIFFNESS_COUNT; w++) {
        const row *r = &t->stiffness[w];
        write_line(t, utw_stiffness_key((utw_stiffness)w), utw_constant_meaning(r->which),
                   r->number.value, r->number.low, r->number.high,
                   utw_report_trust(r->quantity.trust), r->unit);
    }
}

/* The reason of an absent constant without the name it begins with. */
static const char *reason_of(const table *t, int which)
{
    const char *key = utw_constant_key((utw_constant)which), *text = t->absent[which];
    const size_t n = strlen(key);
    return strncmp(text, key, n) == 0 && text[n] == ' ' ? text + n + 1 : text;
}

static void begin_note(utw_text *text, const char *title)
{
    utw_text_add(text, "%s", title);
    utw_text_pad(text, INDENT);
}

/* A note of several words; `words` is cleared. */
static void write_note(const table *t, const char *title, utw_text *words)
{
    begin_note(t->text, title);
    if (words->out_of_memory)
        t->text->out_of_memory = 1;
    else
        utw_text_wrap(t->text, INDENT, WIDTH, words->text);
    utw_text_clear(words);
}

/* Constants that are left out, those with the same reason together. */
static void write_absent(const table *t)
{
    for (int w = 0; w < UTW_CONSTANT_COUNT; w++) {
        int told = 0;
        if (t->absent[w][0] == '\0') continue;
        for (int v = 0; v < w; v++)
            told |= t->absent[v][0] != '\0' && strcmp(reason_of(t, v), reason_of(t, w)) == 0;
        if (told) continue;
        utw_text words = {.text = NULL};
        utw_text_add(&words, "%s", utw_constant_key((utw_constant)w));
        for (int v = w + 1; v < UTW_CONSTANT_COUNT; v++)
            if (t->absent[v][0] != '\0' && strcmp(reason_of(t, v), reason_of(t, w)) == 0)
                utw_text_add(&words, ", %s", utw_constant_key((utw_constant)v));
        utw_text_add(&words, ": %s", reason_of(t, w));
        write_note(t, "Left out", &words);
    }
}

/* The named dimensions the section was drawn with. */
static void write_dimensions(const table *t)
{
    const utw_outline *o = t->solution->outline;
    const int n = utw_outline_dimension_count(o);
    utw_text words = {.text = NULL};
    for (int k = 0; k < n; k++) {
        double value = 0;
        int is_set = 0;
        char number[UTW_DECIMAL_LENGTH];
        const char *name = utw_outline_dimension(o, k, &value, &is_set);
        utw_decimal_short(value, 9, number);
        utw_text_add(&words, "%s%s = %s%s", k > 0 ? ", " : "", name, number,
                     is_set ? " (set by the caller)" : "");
    }
    if (n > 0) write_note(t, "Dimensions", &words);
}

/* The materials of the parts, each once. */
static void write_materials(const table *t)
{
    const utw_outline *o = t->solution->outline;
    utw_text words = {.text = NULL};
    for (int m = 0; m < o->n_material; m++) {
        const utw_material *mine = &o->material[m];
        char E[UTW_DECIMAL_LENGTH], nu[UTW_DECIMAL_LENGTH];
        utw_decimal_short(mine->E, 6, E);
        utw_decimal_short(mine->nu, 6, nu);
        utw_text_add(&words, "%s%s: E = %s %s/%s^2, nu = %s", m > 0 ? "; " : "", mine->name, E,
                     o->force_unit, o->length_unit, nu);
    }
    if (o->n_material == 0)
        utw_text_add(&words, "none is given: what depends on the shape alone is computed");
    write_note(t, o->n_material > 1 ? "Materials" : "Material", &words);
}

static void write_solution(const table *t)
{
    utw_solution_info info;
    char gap[UTW_DECIMAL_LENGTH], tolerance[UTW_DECIMAL_LENGTH], order[32];
    utw_solution_get_info(t->solution, &info);
    utw_decimal_short(info.gap, 2, gap);
    utw_decimal_short(info.tolerance, 3, tolerance);
    if (info.least_order == info.greatest_order)
        snprintf(order, sizeof order, "%d", info.least_order);
    else
        snprintf(order, sizeof order, "%d to %d", info.least_order, info.greatest_order);
    utw_text words = {.text = NULL};
    utw_text_add(&words,
                 "%d triangles of order %s, %d unknowns, %d %s\n"
                 "(high - low)/value of J is %s; asked for %s: %s",
                 info.triangles, order, info.unknowns, info.rounds,
                 info.rounds == 1 ? "round" : "rounds", gap, tolerance,
                 info.reached ? "reached" : "NOT REACHED; the bounds hold all the same");
    write_note(t, "Solution", &words);
    begin_note(t->text, "Time");
    utw_text_add(t->text, "%.2f s (drawing %.2f, mesh %.2f, equations %.2f)\n", info.seconds_total,
                 info.seconds_read, info.seconds_mesh, info.seconds_solve);
}

static void write_notes(const table *t)
{
    utw_text_add(t->text, "\n");
    write_absent(t);
    write_dimensions(t);
    write_materials(t);
    write_solution(t);
    utw_report_note_cases(t->report, t->text);
    begin_note(t->text, "Trust");
    utw_text_wrap(t->text, INDENT, WIDTH,
                  "exact: boundary integrals over the drawn curves, to rounding.\n"
                  "bracket: the true value for this drawing lies between low and high; they come "
                  "from two independent solutions that bound it from both sides.\n"
                  "estimate: low and high are estimated from two solutions; they are not bounds.");
    begin_note(t->text, "Caution");
    utw_text_wrap(t->text, INDENT, WIDTH, utw_report_caution(t->solution));
}

utw_status utw_report_text(const utw_report *report, char **text, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_text content = {.text = NULL};
    table *t = NULL;
    UTW_TRY(utw_report_check(report, text, __func__, err));
    UTW_TRY_ALLOC(t = utw_alloc(1, sizeof *t));
    t->report = report;
    t->solution = report->solution;
    t->text = &content;
    fill(t);
    UTW_TRY(fill_stiffness(t, err));
    const char *name = utw_outline_name(t->solution->outline);
    utw_text_add(&content, "%s\nUnits: %s. x to the right, y up, angles in degrees.\n\n",
                 name[0] != '\0' ? name : "Section without a name",
                 utw_outline_units(t->solution->outline));
    write_table(t);
    write_stiffness(t);
    utw_report_text_cases(report, &content);
    write_notes(t);
    UTW_TRY(utw_text_take(&content, text, err));
    st = UTW_OK;
done:
    utw_text_clear(&content);
    utw_free(t);
    return st;
}
