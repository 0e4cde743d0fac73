/* SPDX-License-Identifier: GPL-3.0-or-later
 * Load cases and probes in the JSON report. */
#include <math.h>

#include "report/json_writer.h"
#include "section/cases.h"

/* The resultants that act, and where. */
static void add_forces(utw_json_writer *w, cJSON *to, const utw_forces *f)
{
    const struct {
        const char *key;
        double value;
    } list[] = {{"N", f->N},   {"Vx", f->Vx}, {"Vy", f->Vy}, {"Mx", f->Mx},
                {"My", f->My}, {"T", f->T},   {"B", f->B}};
    cJSON *forces = utw_json_add_object(w, to, "forces");
    for (size_t i = 0; i < sizeof list / sizeof *list; i++)
        if (list[i].value != 0) utw_json_add_number(w, forces, list[i].key, list[i].value);
    if (f->has_at) utw_json_add_point(w, forces, "at", f->at);
}

static cJSON *add_peak(utw_json_writer *w, cJSON *to, utw_stress_kind kind,
                       const utw_stress_peak *peak)
{
    cJSON *one = utw_json_add_object(w, to, utw_stress_kind_key(kind));
    utw_json_add_number(w, one, "value", peak->value);
    utw_json_add_number(w, one, "error", peak->error);
    utw_json_add_point(w, one, "at", peak->at);
    utw_json_add_text(w, one, "trust", utw_report_trust(utw_report_peak_trust(peak)));
    return one;
}

/* The corners where the stresses of a case have no bound, and the circles around them. */
static void add_unbounded(utw_json_writer *w, cJSON *one, const utw_cases *cases, int unbounded)
{
    cJSON *places = utw_json_add_array(w, one, "unbounded_at");
    if (!unbounded) return;
    cJSON *radii = utw_json_add_array(w, one, "outside_radius");
    for (int k = 0; k < utw_stress_corner_count(cases->stress); k++) {
        double at[2], radius;
        utw_error err;
        if (utw_stress_corner(cases->stress, k, at, &radius, &err) != UTW_OK) continue;
        utw_json_add_point(w, places, NULL, at);
        utw_json_append_number(w, radii, radius);
    }
}

static void add_case(utw_json_writer *w, cJSON *list, const utw_cases *cases, const utw_case *c)
{
    cJSON *one = utw_json_append_object(w, list);
    utw_json_add_text(w, one, "name", c->name);
    add_forces(w, one, &c->forces);
    if (c->status != UTW_OK) {
        utw_json_add_text(w, one, "reason", c->why);
        return;
    }
    for (int k = 0; k < UTW_STRESS_KIND_COUNT; k++)
        add_peak(w, one, (utw_stress_kind)k, &c->peaks.peak[k]);
    utw_json_add_number(w, one, "margin", c->peaks.margin);
    add_unbounded(w, one, cases, c->peaks.unbounded);
}

static void add_probes(utw_json_writer *w, cJSON *root, const utw_cases *cases)
{
    cJSON *list = utw_json_add_array(w, root, "probes");
    for (int k = 0; k < cases->n_probe; k++)
        for (int i = 0; i < cases->n; i++) {
            if (cases->list[i].status != UTW_OK) continue;
            const utw_stress_point *p = &cases->list[i].point[k];
            cJSON *one = utw_json_append_object(w, list);
            utw_json_add_point(w, one, "at", p->at);
            utw_json_add_text(w, one, "case", cases->list[i].name);
            utw_json_add_number(w, one, "omega", p->omega);
            utw_json_add_number(w, one, "sigma_z", p->sigma_z);
            utw_json_add_number(w, one, "tau_xz", p->tau_xz);
            utw_json_add_number(w, one, "tau_yz", p->tau_yz);
            utw_json_add_number(w, one, "von_mises", p->von_mises);
            utw_json_add_number(w, one, "principal_max", p->principal_max);
            utw_json_add_number(w, one, "principal_min", p->principal_min);
            utw_json_add_number(w, one, "sigma_error", p->sigma_error);
            utw_json_add_number(w, one, "tau_error", p->tau_error);
            utw_json_add_flag(w, one, "near_sharp_corner", p->kept_out);
        }
}

static void add_envelope(utw_json_writer *w, cJSON *root, const utw_cases *cases)
{
    const utw_stress_envelope *e = &cases->envelope;
    cJSON *all = utw_json_add_object(w, root, "envelope");
    for (int k = 0; k < UTW_STRESS_KIND_COUNT; k++) {
        cJSON *one = add_peak(w, all, (utw_stress_kind)k, &e->peak[k]);
        utw_json_add_text(w, one, "case", cases->list[e->governing[k]].name);
    }
    cJSON *margin = utw_json_add_object(w, all, "margin");
    utw_json_add_number(w, margin, "value", e->margin);
    if (e->margin_case >= 0) utw_json_add_text(w, margin, "case", cases->list[e->margin_case].name);
}

void utw_json_add_cases(utw_json_writer *w, cJSON *root)
{
    const utw_cases *cases = w->report->cases;
    if (cases == NULL) return;
    cJSON *list = utw_json_add_array(w, root, "cases");
    for (int i = 0; i < cases->n; i++) add_case(w, list, cases, &cases->list[i]);
    if (cases->n_done > 0) add_envelope(w, root, cases);
    if (cases->n_probe > 0) add_probes(w, root, cases);
}
