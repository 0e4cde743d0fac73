/* SPDX-License-Identifier: GPL-3.0-or-later
 * The push in the JSON report. */
#include <math.h>

#include "base/vec2.h"
#include "report/json_writer.h"
#include "report/push_words.h"

#define DEGREES (180 / UTW_PI)

static cJSON *quantity(utw_json_writer *w, cJSON *one, const utw_quantity *q, double factor)
{
    utw_json_add_number(w, one, "value", factor * q->value);
    utw_json_add_number(w, one, "low", factor * q->low);
    utw_json_add_number(w, one, "high", factor * q->high);
    utw_json_add_text(w, one, "trust", utw_report_trust(q->trust));
    return one;
}

static void add_load(utw_json_writer *w, cJSON *push, const utw_push_load *load,
                     const utw_push_result *r)
{
    cJSON *one = utw_json_add_object(w, push, "load");
    utw_json_add_number(w, one, "length", load->length);
    utw_json_add_text(w, one, "support", utw_support_word(load->support));
    utw_json_add_text(w, one, "warping", utw_hold_warping_word(load->warping));
    utw_json_add_point(w, one, "force", load->force);
    utw_json_add_point(w, one, "at", load->has_at ? load->at : r->shear_centre);
    utw_json_add_number(w, one, "z", r->z);
}

static void add_bar(utw_json_writer *w, cJSON *push, const utw_push_result *r)
{
    cJSON *held = utw_json_add_array(w, push, "warping_held");
    for (int k = 0; k < 2; k++) utw_json_append_flag(w, held, r->warping_held[k]);
    utw_json_add_flag(w, push, "uniform_torsion", r->uniform_torsion);
    utw_json_add_number(w, push, "fade", r->fade);
    cJSON *deflection = utw_json_add_array(w, push, "deflection");
    for (int k = 0; k < 2; k++)
        quantity(w, utw_json_append_object(w, deflection), &r->deflection[k], 1);
    utw_json_add_number(w, push, "z_deflection", r->z_deflection);
    utw_json_add_point(w, push, "load_moves", r->load_moves);
    quantity(w, utw_json_add_object(w, push, "twist"), &r->twist, DEGREES);
    utw_json_add_number(w, push, "z_twist", r->z_twist);
    utw_json_add_point(w, push, "no_twist", r->shear_centre);
    utw_json_add_number(w, push, "no_twist_error", r->shear_centre_error);
    utw_json_add_point(w, push, "across", r->across);
    utw_json_add_number(w, push, "offset", r->offset);
    utw_json_add_point(w, push, "section", r->section);
    quantity(w, utw_json_add_object(w, push, "twist_per_offset"), &r->twist_per_offset, DEGREES);
}

static void add_end(utw_json_writer *w, cJSON *ends, const utw_push_state *s)
{
    const struct {
        const char *key;
        double value;
    } list[] = {{"z", s->z},
                {"Vx", s->forces.Vx},
                {"Vy", s->forces.Vy},
                {"Mx", s->forces.Mx},
                {"My", s->forces.My},
                {"torque", s->torque},
                {"T", s->forces.T},
                {"warping_torque", s->warping_torque},
                {"bimoment", s->forces.B},
                {"twist", s->twist * DEGREES}};
    cJSON *one = utw_json_append_object(w, ends);
    for (size_t i = 0; i < sizeof list / sizeof *list; i++)
        utw_json_add_number(w, one, list[i].key, list[i].value);
    utw_json_add_point(w, one, "deflection", s->u);
}

static void add_worst(utw_json_writer *w, cJSON *push, const utw_push_result *r)
{
    if (!r->has_stress) return;
    cJSON *one = utw_json_add_object(w, push, "worst");
    utw_json_add_number(w, one, "von_mises", r->von_mises.value);
    utw_json_add_number(w, one, "error", r->von_mises.error);
    utw_json_add_text(w, one, "trust", utw_report_trust(utw_report_peak_trust(&r->von_mises)));
    utw_json_add_point(w, one, "at", r->von_mises.at);
    utw_json_add_number(w, one, "z", r->z_von_mises);
    utw_json_add_number(w, one, "margin", r->margin);
    utw_json_add_flag(w, one, "unbounded", r->unbounded);
}

static void add_window(utw_json_writer *w, cJSON *windows, const char *key,
                       const utw_load_window *window, double factor)
{
    if (!window->limited) return;
    cJSON *one = utw_json_add_object(w, windows, key);
    if (window->limit > 0) utw_json_add_number(w, one, "limit", factor * window->limit);
    utw_json_add_flag(w, one, "empty", window->empty);
    utw_json_add_number(w, one, "from", window->from);
    utw_json_add_number(w, one, "to", window->to);
    utw_json_add_number(w, one, "error", window->error);
    utw_json_add_point(w, one, "at_from", window->at_from);
    utw_json_add_point(w, one, "at_to", window->at_to);
    utw_json_add_flag(w, one, "holds", window->holds);
}

void utw_json_add_push(utw_json_writer *w, cJSON *root)
{
    if (w->report->push == NULL) return;
    const utw_push_result *r = utw_push_get(w->report->push);
    cJSON *push = utw_json_add_object(w, root, "push");
    add_load(w, push, utw_push_get_load(w->report->push), r);
    add_bar(w, push, r);
    cJSON *ends = utw_json_add_array(w, push, "ends");
    add_end(w, ends, &r->start);
    add_end(w, ends, &r->end);
    add_worst(w, push, r);
    cJSON *windows = utw_json_add_object(w, push, "window");
    add_window(w, windows, "twist", &r->twist_window, DEGREES);
    add_window(w, windows, "stress", &r->stress_window, 1);
    add_window(w, windows, "both", &r->window, 1);
}
