/* SPDX-License-Identifier: GPL-3.0-or-later
 * The load cases in the report for people: a line for each, their envelope, the stresses at probes.
 */
#include "report/text_cases.h"

#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "report/number.h"
#include "section/cases.h"

enum {
    WIDTH = 100,
    INDENT = 12,
    LONGEST = 28, /* a longer name of a case stands on a line of its own */
    COLUMN = 12,  /* of a stress */
    PLACE = 10    /* of a coordinate */
};

/* What is being written. */
typedef struct listing {
    const utw_cases *cases;
    utw_text *text;
    int name_width;
} listing;

static const char *const kind_name[UTW_STRESS_KIND_COUNT] = {
    [UTW_VON_MISES] = "von Mises",         [UTW_PRINCIPAL_MAX] = "principal max",
    [UTW_PRINCIPAL_MIN] = "principal min", [UTW_SIGMA_MAX] = "sigma_z max",
    [UTW_SIGMA_MIN] = "sigma_z min",       [UTW_TAU_MAX] = "tau max",
};

/* A value with as many digits as its error leaves sure; rounding of a zero, measured by the
 * greatest stress of its case, is 0. */
static void write_value(const listing *l, int width, double value, double error, double scale)
{
    utw_number number;
    const int sure = error <= 1e-11 * scale;
    const utw_quantity q = {value, value - error, value + error, sure ? UTW_EXACT : UTW_ESTIMATE};
    if (sure) { /* six digits: no load is known better */
        utw_decimal_short(fabs(value) <= 1e-11 * scale ? 0 : value, 6, number.value);
    } else
        utw_number_write(&q, 0, &number);
    utw_text_add(l->text, "%*s", width, number.value);
}

static void write_error(const listing *l, int width, double error, double scale)
{
    char text[UTW_DECIMAL_LENGTH] = "exact";
    if (error > 1e-11 * scale) utw_decimal_short(error, 2, text);
    utw_text_add(l->text, "%*s", width, text);
}

static void write_short(const listing *l, int width, double x, int digits)
{
    char text[UTW_DECIMAL_LENGTH] = "-";
    if (isfinite(x)) utw_decimal_short(x, digits, text);
    utw_text_add(l->text, "%*s", width, text);
}

/* A coordinate. Peaks are searched to about 1e-6 of the section's size: what is nearer to zero is
 * zero. */
static void write_place(const listing *l, double x)
{
    const double *box = l->cases->stress->unit.solution->outline->box;
    const double size = hypot(box[2] - box[0], box[3] - box[1]);
    utw_text_add(l->text, " ");
    write_short(l, PLACE - 1, fabs(x) < 1e-6 * size ? 0 : x, 5);
}

static void write_name(const listing *l, const char *name)
{
    utw_text_add(l->text, "%s", name);
    if (utw_text_column(l->text) > l->name_width) utw_text_add(l->text, "\n");
    utw_text_pad(l->text, l->name_width);
}

/* The greatest stress of a case: what its zeros are measured by. */
static double scale_of(const utw_stress_peaks *p)
{
    return p->peak[UTW_VON_MISES].value;
}

static void write_margin(const listing *l, double margin)
{
    write_short(l, PLACE, margin, 3);
}

static void write_case(const listing *l, const utw_case *c)
{
    static const utw_stress_kind column[] = {UTW_VON_MISES, UTW_PRINCIPAL_MAX, UTW_SIGMA_MAX,
                                             UTW_SIGMA_MIN, UTW_TAU_MAX};
    if (c->status != UTW_OK) return;
    write_name(l, c->name);
    for (size_t i = 0; i < sizeof column / sizeof *column; i++) {
        const utw_stress_peak *p = &c->peaks.peak[column[i]];
        write_value(l, COLUMN, p->value, p->error, scale_of(&c->peaks));
    }
    write_margin(l, c->peaks.margin);
    utw_text_add(l->text, "%s\n", c->peaks.unbounded ? " *" : "");
}

static void write_cases(const listing *l)
{
    utw_text_add(l->text, "case");
    utw_text_pad(l->text, l->name_width);
    utw_text_add(l->text, "%*s%*s%*s%*s%*s%*s\n", COLUMN, "von Mises", COLUMN, "princ. max", COLUMN,
                 "sigma_z max", COLUMN, "sigma_z min", COLUMN, "tau max", PLACE, "margin");
    for (int i = 0; i < l->cases->n; i++) write_case(l, &l->cases->list[i]);
}

/* The envelope, in full: with its errors and places. */
static void write_envelope(const listing *l)
{
    const utw_stress_envelope *e = &l->cases->envelope;
    if (l->cases->n_done == 0) return;
    double scale = 0;
    for (int i = 0; i < l->cases->n; i++)
        if (l->cases->list[i].status == UTW_OK)
            scale = fmax(scale, scale_of(&l->cases->list[i].peaks));
    utw_text_add(l->text, "%s\n%*s%*s%*s%*s%*s  case\n",
                 l->cases->n_done > 1 ? "Greatest of all cases" : "In full", 14, "", COLUMN,
                 "value", PLACE, "+-", PLACE, "at x", PLACE, "y");
    for (int k = 0; k < UTW_STRESS_KIND_COUNT; k++) {
        const utw_stress_peak *p = &e->peak[k];
        utw_text_add(l->text, "%-14s", kind_name[k]);
        write_value(l, COLUMN, p->value, p->error, scale);
        write_error(l, PLACE, p->error, scale);
        write_place(l, p->at[0]);
        write_place(l, p->at[1]);
        utw_text_add(l->text, "  %s\n", l->cases->list[e->governing[k]].name);
    }
    if (e->margin_case < 0) return;
    utw_text_add(l->text, "%-14s", "margin");
    write_short(l, COLUMN, e->margin, 3);
    utw_text_add(l->text, "%*s  %s\n", 3 * PLACE, "", l->cases->list[e->margin_case].name);
}

static void write_probes(const listing *l)
{
    const utw_cases *c = l->cases;
    if (c->n_probe == 0 || c->n_done == 0) return;
    utw_text_add(l->text, "Stresses at points\ncase");
    utw_text_pad(l->text, l->name_width);
    utw_text_add(l->text, "%*s%*s%*s%*s%*s%*s\n", PLACE, "x", PLACE, "y", COLUMN, "sigma_z", COLUMN,
                 "tau_xz", COLUMN, "tau_yz", COLUMN, "von Mises");
    for (int k = 0; k < c->n_probe; k++)
        for (int i = 0; i < c->n; i++) {
            if (c->list[i].status != UTW_OK) continue;
            const utw_stress_point *p = &c->list[i].point[k];
            const double scale = scale_of(&c->list[i].peaks);
            write_name(l, c->list[i].name);
            write_place(l, p->at[0]);
            write_place(l, p->at[1]);
            write_value(l, COLUMN, p->sigma_z, p->sigma_error, scale);
            write_value(l, COLUMN, p->tau_xz, p->tau_error, scale);
            write_value(l, COLUMN, p->tau_yz, p->tau_error, scale);
            write_value(l, COLUMN, p->von_mises, p->sigma_error + sqrt(3) * p->tau_error, scale);
            utw_text_add(l->text, "%s\n", p->kept_out ? " *" : "");
        }
}

/* A note under its title; `words` is cleared. */
static void write_note(const listing *l, const char *title, utw_text *words)
{
    utw_text_add(l->text, "%s", title);
    utw_text_pad(l->text, INDENT);
    if (words->out_of_memory)
        l->text->out_of_memory = 1;
    else
        utw_text_wrap(l->text, INDENT, WIDTH, words->text);
    utw_text_clear(words);
}

static void add_point(utw_text *words, const double at[2])
{
    char x[UTW_DECIMAL_LENGTH], y[UTW_DECIMAL_LENGTH];
    utw_decimal_short(at[0], 6, x);
    utw_decimal_short(at[1], 6, y);
    utw_text_add(words, "(%s, %s)", x, y);
}

void utw_report_corners(const utw_stress *stress, utw_text *words)
{
    enum { MOST = 8 };
    const int n = utw_stress_corner_count(stress);
    utw_text_add(words, "* The shear stress has no bound at the sharp re-entrant corner%s ",
                 n == 1 ? "" : "s");
    for (int k = 0; k < n && k < MOST; k++) {
        double at[2] = {0, 0}, radius;
        utw_error err;
        if (utw_stress_corner(stress, k, at, &radius, &err) != UTW_OK) break;
        utw_text_add(words, "%s", k == 0 ? "" : k == n - 1 ? " and " : ", ");
        add_point(words, at);
    }
    if (n > MOST) utw_text_add(words, " and %d more", n - MOST);
    utw_text_add(words,
                 ". Given are the greatest stresses outside a circle of %g of the local wall "
                 "around each. Draw the corners with their real radius (\"round\") to see "
                 "the stress in them.",
                 UTW_KEEP_OUT);
}

/* Which corners have no bound, and what is reported instead. */
static void write_corners(const listing *l)
{
    int any = 0;
    for (int i = 0; i < l->cases->n; i++)
        any |= l->cases->list[i].status == UTW_OK && l->cases->list[i].peaks.unbounded;
    if (!any) return;
    utw_text words = {.text = NULL};
    utw_report_corners(l->cases->stress, &words);
    write_note(l, "Corners", &words);
}

static void write_left_out(const listing *l)
{
    for (int i = 0; i < l->cases->n; i++) {
        const utw_case *c = &l->cases->list[i];
        if (c->status == UTW_OK) continue;
        utw_text words = {.text = NULL};
        utw_text_add(&words, "load case \"%s\": %s", c->name, c->why);
        write_note(l, "Left out", &words);
    }
}

void utw_report_text_cases(const utw_report *report, utw_text *text)
{
    listing l = {report->cases, text, 4};
    if (l.cases == NULL || l.cases->n == 0) return;
    for (int i = 0; i < l.cases->n; i++) {
        const int n = (int)strlen(l.cases->list[i].name);
        if (n <= LONGEST && n > l.name_width) l.name_width = n;
    }
    const utw_outline *o = report->solution->outline;
    utw_text_add(text, "\nLoad cases: greatest stresses, %s/%s^2\n", o->force_unit, o->length_unit);
    write_cases(&l);
    write_envelope(&l);
    write_probes(&l);
}

void utw_report_note_cases(const utw_report *report, utw_text *text)
{
    const listing l = {report->cases, text, 0};
    if (l.cases == NULL || l.cases->n == 0) return;
    write_left_out(&l);
    write_corners(&l);
    utw_text words = {.text = NULL};
    utw_text_add(&words, "the mean of two solutions; +- is estimated from their distance and is no "
                         "bound. sigma_z without a bimoment is exact. Away from ends, supports and "
                         "places where loads are led in.");
    write_note(&l, "Stresses", &words);
}
