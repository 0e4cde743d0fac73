/* SPDX-License-Identifier: GPL-3.0-or-later
 * The push for people: what the load does, and where it may act. */
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "bar/push.h"
#include "base/vec2.h"
#include "report/number.h"
#include "report/push_words.h"
#include "report/report.h"
#include "report/text_cases.h"
#include "section/solution.h"

enum { WIDTH = 100, INDENT = 12, LABEL = 30, COLUMN = 15 };

#define DEGREES (180 / UTW_PI)

/* A bar shorter than this many times its section is no bar. */
#define SLENDER 5

/* What is being written. */
typedef struct page {
    const utw_push *push;
    const utw_push_result *r;
    const utw_push_load *load;
    const utw_outline *outline;
    utw_text *text;
} page;

static void short_number(double x, int digits, double noise, char text[UTW_DECIMAL_LENGTH])
{
    if (!isfinite(x))
        snprintf(text, UTW_DECIMAL_LENGTH, "-");
    else
        utw_decimal_short(fabs(x) <= noise ? 0 : x, digits, text);
}

static void add_short(utw_text *text, double x, int digits, double noise)
{
    char number[UTW_DECIMAL_LENGTH];
    short_number(x, digits, noise, number);
    utw_text_add(text, "%s", number);
}

static void add_column(const page *p, double x, int digits, double noise)
{
    char number[UTW_DECIMAL_LENGTH];
    short_number(x, digits, noise, number);
    utw_text_add(p->text, " %*s", COLUMN - 1, number);
}

static void add_pair(utw_text *text, const double xy[2], double noise)
{
    utw_text_add(text, "(");
    add_short(text, xy[0], 6, noise);
    utw_text_add(text, ", ");
    add_short(text, xy[1], 6, noise);
    utw_text_add(text, ")");
}

/* A note under its title; `words` is cleared. */
static void write_note(const page *p, const char *title, utw_text *words)
{
    utw_text_add(p->text, "%s", title);
    utw_text_pad(p->text, INDENT);
    if (words->out_of_memory)
        p->text->out_of_memory = 1;
    else
        utw_text_wrap(p->text, INDENT, WIDTH, words->text);
    utw_text_clear(words);
}

/* "x", "y" when offsets are measured along an axis of the drawing, else NULL. */
static const char *axis_of(const page *p)
{
    const double *a = p->r->across;
    return a[1] == 0 ? "x" : a[0] == 0 ? "y" : NULL;
}

/* What is added to an offset to make it a coordinate of that axis. */
static double origin_of(const page *p)
{
    const utw_push_result *r = p->r;
    return r->across[1] == 0 ? r->shear_centre[0] : r->across[0] == 0 ? r->shear_centre[1] : 0;
}

static void write_load(const page *p)
{
    const utw_push_result *r = p->r;
    const char *unit = p->outline->length_unit;
    static const char *const kind[UTW_SUPPORT_COUNT][2] = {
        [UTW_FIXED_FREE] = {"fixed", "free"},
        [UTW_FIXED_FIXED] = {"fixed", "fixed"},
        [UTW_FORKED] = {"forked", "forked"},
        [UTW_FIXED_FORKED] = {"fixed", "forked"}};
    utw_text words = {.text = NULL};
    utw_text_add(&words, "force (Fx, Fy) = ");
    add_pair(&words, p->load->force, 0);
    utw_text_add(&words, " %s at ", p->outline->force_unit);
    add_pair(&words, p->load->has_at ? p->load->at : r->shear_centre, 1e-6 * r->size);
    utw_text_add(&words, "%s, ", p->load->has_at ? "" : ", the shear centre");
    if (isnan(r->z)) {
        utw_text_add(&words, "spread evenly over the length");
    } else {
        utw_text_add(&words, "z = ");
        add_short(&words, r->z, 6, 0);
    }
    write_note(p, "Load", &words);
    utw_text_add(&words, "length ");
    add_short(&words, p->load->length, 6, 0);
    utw_text_add(&words, " %s; ", unit);
    for (int k = 0; k < 2; k++) {
        utw_text_add(&words, "%s%s at z = ", k == 0 ? "" : ", ", kind[p->load->support][k]);
        add_short(&words, k == 0 ? 0 : p->load->length, 6, 0);
        if (r->warping_held[k]) utw_text_add(&words, " (warping held)");
    }
    utw_text_add(&words, "; E = ");
    add_short(&words, r->E, 6, 0);
    utw_text_add(&words, ", G = ");
    add_short(&words, r->G, 6, 0);
    utw_text_add(&words, " %s/%s^2", p->outline->force_unit, unit);
    write_note(p, "Bar", &words);
}

static void write_quantity(const page *p, const char *label, const utw_quantity *q, double factor,
                           const char *unit)
{
    utw_number n;
    const utw_quantity shown = {factor * q->value, factor * q->low, factor * q->high, q->trust};
    if (shown.low == 0 && shown.high == 0) {
        snprintf(n.value, sizeof n.value, "0");
        n.low[0] = n.high[0] = '\0';
    } else {
        utw_number_write(&shown, 0, &n);
    }
    utw_text_add(p->text, "%-*s %*s %*s %*s  %-8s  %s\n", LABEL, label, COLUMN - 1, n.value,
                 COLUMN - 1, n.low, COLUMN - 1, n.high, utw_report_trust(q->trust), unit);
}

static void write_heading(const page *p, const char *words, double z, const char *more)
{
    utw_text_add(p->text, "%s", words);
    if (!isnan(z)) {
        utw_text_add(p->text, "z = ");
        add_short(p->text, z, 6, 1e-9 * p->load->length);
    }
    utw_text_add(p->text, "%s\n", more);
}

static void write_motion(const page *p)
{
    const utw_push_result *r = p->r;
    const char *unit = p->outline->length_unit;
    char per[24];
    utw_text_add(p->text, "\n%-*s %*s %*s %*s  %-8s  %s\n", LABEL, "what it is", COLUMN - 1,
                 "value", COLUMN - 1, "low", COLUMN - 1, "high", "trust", "unit");
    write_heading(p, "Deflection of the shear centre, greatest at ", r->z_deflection, "");
    write_quantity(p, "along x", &r->deflection[0], 1, unit);
    write_quantity(p, "along y", &r->deflection[1], 1, unit);
    write_heading(p, "Twist, greatest at ", r->z_twist, "; counter-clockwise is positive");
    write_quantity(p, "twist", &r->twist, DEGREES, "deg");
    snprintf(per, sizeof per, "deg/%s", unit);
    write_quantity(p, "twist per offset of the load", &r->twist_per_offset, DEGREES, per);
    utw_text_add(p->text, "The place of the load moves by ");
    add_pair(p->text, r->load_moves, 1e-8 * utw_norm(r->load_moves));
    utw_text_add(p->text, " %s.\n", unit);
}

static void write_ends(const page *p)
{
    const utw_push_state *end[2] = {&p->r->start, &p->r->end};
    const char *L = p->outline->length_unit, *F = p->outline->force_unit;
    const double force = utw_norm(p->load->force), arm = p->load->length + p->r->size;
    const struct {
        const char *label;
        int power; /* of the length */
        double value[2], noise;
    } list[] = {
        {"shear force Vx", 0, {end[0]->forces.Vx, end[1]->forces.Vx}, force},
        {"shear force Vy", 0, {end[0]->forces.Vy, end[1]->forces.Vy}, force},
        {"bending moment Mx", 1, {end[0]->forces.Mx, end[1]->forces.Mx}, force * arm},
        {"bending moment My", 1, {end[0]->forces.My, end[1]->forces.My}, force * arm},
        {"torque", 1, {end[0]->torque, end[1]->torque}, force * arm},
        {"of it in uniform torsion", 1, {end[0]->forces.T, end[1]->forces.T}, force * arm},
        {"bimoment B", 2, {end[0]->forces.B, end[1]->forces.B}, force * arm * arm},
    };
    utw_text_add(p->text, "\n%-*s", LABEL, "Sections at the ends, z =");
    add_column(p, 0, 6, 0);
    add_column(p, p->load->length, 6, 0);
    utw_text_add(p->text, "  unit\n");
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        utw_text_add(p->text, "%-*s", LABEL, list[i].label);
        for (int k = 0; k < 2; k++) add_column(p, list[i].value[k], 6, 1e-9 * list[i].noise);
        utw_text_add(p->text, "  %s", F);
        if (list[i].power > 0) utw_text_add(p->text, " %s", L);
        utw_text_add(p->text, "%s\n", list[i].power > 1 ? "^2" : "");
    }
}

static void write_stress(const page *p)
{
    const utw_push_result *r = p->r;
    const utw_quantity q = {r->von_mises.value, r->von_mises.value - r->von_mises.error,
                            r->von_mises.value + r->von_mises.error,
                            utw_report_peak_trust(&r->von_mises)};
    utw_number n;
    if (!r->has_stress) return;
    utw_number_write(&q, 0, &n);
    utw_text_add(p->text, "\n%-*s%*s%*s%*s%*s%*s  unit\n", LABEL, "Greatest stress in the bar",
                 COLUMN, "value", 10, "+-", 11, "z", 11, "x", 11, "y");
    utw_text_add(p->text, "%-*s %*s", LABEL, "von Mises", COLUMN - 1, n.value);
    char text[UTW_DECIMAL_LENGTH];
    const double place[] = {r->z_von_mises, r->von_mises.at[0], r->von_mises.at[1]};
    utw_decimal_short(r->von_mises.error, 2, text);
    utw_text_add(p->text, " %*s", 9, q.trust == UTW_EXACT ? "exact" : text);
    for (int k = 0; k < 3; k++) {
        short_number(place[k], 6, 1e-6 * r->size, text);
        utw_text_add(p->text, " %*s", 10, text);
    }
    utw_text_add(p->text, "  %s/%s^2%s\n", p->outline->force_unit, p->outline->length_unit,
                 r->unbounded ? " *" : "");
    if (isnan(r->margin)) return;
    utw_text_add(p->text, "%-*s", LABEL, "margin to yield");
    add_column(p, r->margin, 3, 0);
    utw_text_add(p->text, "\n");
}

static void write_window(const page *p, const char *label, const utw_load_window *w, double limit,
                         const char *unit)
{
    char text[UTW_DECIMAL_LENGTH];
    if (!w->limited) return;
    utw_text_add(p->text, "%s", label);
    if (limit > 0) {
        utw_decimal_short(limit, 6, text);
        utw_text_add(p->text, " %s %s", text, unit);
    }
    utw_text_pad(p->text, LABEL);
    if (w->empty) {
        utw_text_add(p->text, " %*s\n", COLUMN - 1, "nowhere");
        return;
    }
    add_column(p, origin_of(p) + w->from, 6, 1e-9 * p->r->size);
    add_column(p, origin_of(p) + w->to, 6, 1e-9 * p->r->size);
    add_column(p, w->error, 2, 0);
    utw_text_add(p->text, "  %s\n", w->holds ? "within" : "OUTSIDE");
}

static void write_windows(const page *p)
{
    const utw_push_result *r = p->r;
    const char *axis = axis_of(p), *unit = p->outline->length_unit;
    char from[32], to[32], stress[32];
    snprintf(from, sizeof from, "%s from", axis != NULL ? axis : "offset");
    snprintf(to, sizeof to, "%s to", axis != NULL ? axis : "offset");
    snprintf(stress, sizeof stress, "%s/%s^2", p->outline->force_unit, unit);
    utw_text_add(p->text, "\n%-*s%*s%*s%*s  the load\n", LABEL, "Load window", COLUMN, from, COLUMN,
                 to, COLUMN, "+-");
    utw_text_add(p->text, "%-*s", LABEL, "the section lies");
    add_column(p, origin_of(p) + r->section[0], 6, 1e-9 * r->size);
    add_column(p, origin_of(p) + r->section[1], 6, 1e-9 * r->size);
    utw_text_add(p->text, "%*s  %s = ", COLUMN, "", axis != NULL ? axis : "offset");
    add_short(p->text, origin_of(p) + r->offset, 6, 1e-6 * r->size);
    utw_text_add(p->text, "\n%-*s", LABEL, "no twist");
    add_column(p, origin_of(p), 6, 1e-6 * r->size);
    add_column(p, origin_of(p), 6, 1e-6 * r->size);
    add_column(p, r->shear_centre_error, 2, 0);
    utw_text_add(p->text, "\n");
    write_window(p, "twist up to", &r->twist_window, DEGREES * r->twist_window.limit, "deg");
    write_window(p, "stress up to", &r->stress_window, r->stress_window.limit, stress);
    if (r->twist_window.limited && r->stress_window.limited)
        write_window(p, "both", &r->window, 0, "");
}

/* Which way a load beside the shear centre turns the bar. */
static void note_side(const page *p)
{
    const utw_push_result *r = p->r;
    const char *axis = axis_of(p);
    const int ccw = r->twist_per_offset.value > 0;
    const char *side = axis == NULL     ? "at a greater offset than"
                       : axis[0] == 'x' ? "to the right of"
                                        : "above";
    utw_text words = {.text = NULL};
    utw_text_add(&words, "a load through the shear centre ");
    add_pair(&words, r->shear_centre, 1e-6 * r->size);
    utw_text_add(&words,
                 " does not twist the bar; one %s it turns the section %s, one on the other side "
                 "%s. Twist is linear in the offset; along the line of the force the place of the "
                 "load does not matter.",
                 side, ccw ? "counter-clockwise" : "clockwise",
                 ccw ? "clockwise" : "counter-clockwise");
    if (axis == NULL) {
        utw_text_add(&words, " Offsets are measured from the shear centre along ");
        add_pair(&words, r->across, 0);
        utw_text_add(&words, ".");
    }
    if (!r->twist_window.limited) utw_text_add(&words, " No twist limit is set (--twist-limit).");
    write_note(p, "Place", &words);
}

static void note_warping(const page *p)
{
    const utw_push_result *r = p->r;
    utw_text words = {.text = NULL};
    if (!(r->fade > 0)) {
        utw_text_add(&words, "the section does not warp: uniform torsion");
    } else if (r->uniform_torsion) {
        utw_text_add(&words, "left out: what held warping does would fade within ");
        add_short(&words, r->fade, 3, 0);
        utw_text_add(&words,
                     " %s (to 1/e), less than a fifth of the section's size: an effect of the end, "
                     "for which no theory of bars holds. Uniform torsion.",
                     p->outline->length_unit);
    } else {
        utw_text_add(&words, "restrained torsion; what held warping does fades to 1/e over ");
        add_short(&words, r->fade, 3, 0);
        utw_text_add(&words,
                     " %s. The shear stress of the warping torque (torque less its part in uniform "
                     "torsion) is not in the stresses.",
                     p->outline->length_unit);
        if (r->fade < r->size / 5)
            utw_text_add(&words, " That is less than a fifth of the section's size: the stress of "
                                 "the bimoment is overstated.");
    }
    write_note(p, "Warping", &words);
}

static void write_notes(const page *p)
{
    utw_text words = {.text = NULL};
    utw_text_add(p->text, "\n");
    note_side(p);
    note_warping(p);
    if (p->load->length < SLENDER * p->r->size) {
        utw_text_add(&words, "the bar is only ");
        add_short(&words, p->load->length / p->r->size, 2, 0);
        utw_text_add(&words, " times as long as its section is wide: what happens at its ends, "
                             "which no theory of bars tells, is felt all along");
        write_note(p, "Short bar", &words);
    }
    if (p->r->has_stress) {
        utw_text_add(&words, "+- is estimated and no bound. Away from the supports and the places "
                             "where loads are led in.");
        write_note(p, "Stresses", &words);
    }
    if (p->r->unbounded) {
        utw_report_corners(p->push->stress, &words);
        write_note(p, "Corners", &words);
    }
    utw_text_add(&words, "%s", utw_report_caution(p->push->solution));
    write_note(p, "Caution", &words);
}

utw_status utw_report_push(const utw_report *report, char **text, utw_error *err)
{
    const utw_status st = utw_report_check(report, text, __func__, err);
    if (st != UTW_OK) return st;
    if (report->push == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_report_push: the report has no push");
    utw_text content = {.text = NULL};
    const page p = {report->push, utw_push_get(report->push), utw_push_get_load(report->push),
                    report->solution->outline, &content};
    const char *name = utw_outline_name(p.outline);
    utw_text_add(&content, "%s\nUnits: %s. x to the right, y up, z along the bar.\n\n",
                 name[0] != '\0' ? name : "Section without a name", utw_outline_units(p.outline));
    write_load(&p);
    write_motion(&p);
    write_ends(&p);
    write_stress(&p);
    write_windows(&p);
    write_notes(&p);
    const utw_status taken = utw_text_take(&content, text, err);
    utw_text_clear(&content);
    return taken;
}
