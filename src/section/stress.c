/* SPDX-License-Identifier: GPL-3.0-or-later
 * The stresses of a solved section under any load. */
#include "section/stress.h"

#include <math.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "section/extremes.h"

/* Points this much outside, over the size of the section, are taken for rounded coordinates of its
 * boundary. */
#define ROUNDED 1e-5

static const char *const kind_key[UTW_STRESS_KIND_COUNT] = {
    [UTW_VON_MISES] = "von_mises",         [UTW_PRINCIPAL_MAX] = "principal_max",
    [UTW_PRINCIPAL_MIN] = "principal_min", [UTW_SIGMA_MAX] = "sigma_z_max",
    [UTW_SIGMA_MIN] = "sigma_z_min",       [UTW_TAU_MAX] = "tau_max",
};

const char *utw_stress_kind_key(utw_stress_kind kind)
{
    return (int)kind >= 0 && kind < UTW_STRESS_KIND_COUNT ? kind_key[kind] : NULL;
}

static const utw_material *material_of(const utw_outline *o, int part)
{
    const int m = o->part[part].material;
    return m < 0 ? NULL : &o->material[m];
}

/* Where moduli differ, strains and not stresses are common to the parts: these fields are not for
 * that. */
static utw_status check_one_modulus(const utw_outline *o, utw_error *err)
{
    const utw_material *first = material_of(o, 0);
    for (int i = 1; i < o->n_part; i++) {
        const utw_material *m = material_of(o, i);
        if ((m == NULL) == (first == NULL) && (m == NULL || m->E == first->E)) continue;
        utw_fail(err, UTW_E_MATERIAL,
                 "part %d has another modulus of elasticity than part 1; stresses are computed for "
                 "sections of one modulus",
                 i + 1);
        utw_error_place(err, i, -1, -1);
        return UTW_E_MATERIAL;
    }
    return UTW_OK;
}

static utw_status note_yield(utw_stress *s, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_outline *o = s->unit.solution->outline;
    for (int i = 0; i < o->n_part; i++) {
        const utw_material *m = material_of(o, i);
        if (m == NULL || !(m->yield > 0)) return UTW_OK;
    }
    UTW_TRY_ALLOC(s->yield = utw_alloc((size_t)o->n_part, sizeof(double)));
    for (int i = 0; i < o->n_part; i++) s->yield[i] = material_of(o, i)->yield;
    st = UTW_OK;
done:
    return st;
}

utw_status utw_stress_create(const utw_solution *solution, utw_stress **stress, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_stress *s = NULL;
    if (solution == NULL || stress == NULL)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "utw_stress_create: solution and stress must not be NULL");
    UTW_TRY(check_one_modulus(solution->outline, err));
    UTW_TRY_ALLOC(s = utw_alloc(1, sizeof *s));
    utw_unit_stress_of(solution, &s->unit);
    UTW_TRY(utw_locator_create(solution->solved.mesh, &s->locator, err));
    UTW_TRY(utw_keep_out_init(&s->keep_out, solution, err));
    UTW_TRY(utw_samples_init(&s->samples, &s->unit, s->locator, &s->keep_out, err));
    UTW_TRY(note_yield(s, err));
    *stress = s;
    s = NULL;
    st = UTW_OK;
done:
    utw_stress_free(s);
    return st;
}

void utw_stress_free(utw_stress *s)
{
    if (s == NULL) return;
    utw_locator_free(s->locator);
    utw_keep_out_clear(&s->keep_out);
    utw_samples_clear(&s->samples);
    utw_free(s->yield);
    utw_free(s);
}

static void to_drawing(const utw_solution *s, const double net[2], double drawing[2])
{
    for (int k = 0; k < 2; k++) drawing[k] = s->origin[k] + s->unit * net[k];
}

static utw_status find_place(const utw_stress *s, const double at[2], utw_place *place,
                             utw_error *err)
{
    const utw_solution *solution = s->unit.solution;
    if (!isfinite(at[0]) || !isfinite(at[1]))
        return utw_fail(err, UTW_E_LOAD, "the point is not finite");
    const double net[2] = {(at[0] - solution->origin[0]) / solution->unit,
                           (at[1] - solution->origin[1]) / solution->unit};
    if (utw_locate(s->locator, net, place)) return UTW_OK;
    const double *box = solution->outline->box, size = hypot(box[2] - box[0], box[3] - box[1]);
    const double distance = solution->unit * utw_locate_boundary(s->locator, net, place);
    if (distance <= ROUNDED * size) return UTW_OK;
    double nearest[2];
    to_drawing(solution, place->xy, nearest);
    return utw_fail(err, UTW_E_LOAD,
                    "the point (%.9g, %.9g) lies outside the section; its nearest point is (%.9g, "
                    "%.9g), %.6g away",
                    at[0], at[1], nearest[0], nearest[1], distance);
}

utw_status utw_stress_at(const utw_stress *s, const utw_forces *forces, const double at[2],
                         utw_stress_point *point, utw_error *err)
{
    utw_stress_case stress_case;
    utw_place place;
    utw_unit_element element;
    utw_point_stress p;
    if (s == NULL || forces == NULL || at == NULL || point == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_stress_at: arguments must not be NULL");
    utw_status st = utw_stress_case_of(&s->unit, forces, &stress_case, err);
    if (st == UTW_OK) st = find_place(s, at, &place, err);
    if (st != UTW_OK) return st;
    utw_unit_element_of(&s->unit, place.tri, &element);
    utw_point_stress_of(&stress_case, &element, s->samples.apart[place.tri], place.r, place.s, &p);
    const double tau = utw_norm(p.tau), radius = hypot(0.5 * p.sigma, tau),
                 L = s->unit.solution->unit;
    *point = (utw_stress_point){
        {at[0], at[1]},
        p.sigma,
        p.tau[0],
        p.tau[1],
        tau,
        sqrt(p.sigma * p.sigma + 3 * tau * tau),
        0.5 * p.sigma + radius,
        0.5 * p.sigma - radius,
        p.omega * L * L,
        p.sigma_error,
        p.tau_error,
        stress_case.sheared && utw_keep_out_holds(&s->keep_out, p.xy),
    };
    return UTW_OK;
}

/* Margin of safety: yield over stress, minus 1 (common practice). */
static double margin_of(const utw_stress *s, const utw_extremes *e)
{
    const double used = e->kind[UTW_UTILISATION].value;
    if (s->yield == NULL) return UTW_NAN;
    return used > 0 ? 1 / used - 1 : UTW_INFINITY;
}

utw_status utw_stress_peaks_of(const utw_stress *s, const utw_forces *forces,
                               utw_stress_peaks *peaks, utw_error *err)
{
    utw_stress_case stress_case;
    utw_extremes e;
    if (s == NULL || forces == NULL || peaks == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_stress_peaks_of: arguments must not be NULL");
    utw_status st = utw_stress_case_of(&s->unit, forces, &stress_case, err);
    if (st == UTW_OK) st = utw_extremes_find(s, &stress_case, &e, err);
    if (st != UTW_OK) return st;
    for (int i = 0; i < UTW_STRESS_KIND_COUNT; i++) {
        utw_stress_peak *p = &peaks->peak[i];
        p->value = e.kind[i].value;
        p->error = e.kind[i].error;
        to_drawing(s->unit.solution, e.kind[i].place.xy, p->at);
    }
    peaks->margin = margin_of(s, &e);
    peaks->unbounded = stress_case.sheared && s->keep_out.n > 0;
    return UTW_OK;
}

/* 1 when a stands further out than b. */
static int governs(utw_stress_kind kind, double a, double b)
{
    return kind == UTW_PRINCIPAL_MIN || kind == UTW_SIGMA_MIN ? a < b : a > b;
}

utw_status utw_stress_envelope_of(int n, const utw_stress_peaks *peaks,
                                  utw_stress_envelope *envelope, utw_error *err)
{
    if (n < 1 || peaks == NULL || envelope == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_stress_envelope_of: no load cases");
    for (int kind = 0; kind < UTW_STRESS_KIND_COUNT; kind++) {
        int best = 0;
        for (int i = 1; i < n; i++)
            if (governs((utw_stress_kind)kind, peaks[i].peak[kind].value,
                        peaks[best].peak[kind].value))
                best = i;
        envelope->peak[kind] = peaks[best].peak[kind];
        envelope->governing[kind] = best;
    }
    envelope->margin = UTW_NAN;
    envelope->margin_case = -1;
    for (int i = 0; i < n; i++)
        if (!isnan(peaks[i].margin) &&
            (envelope->margin_case < 0 || peaks[i].margin < envelope->margin)) {
            envelope->margin = peaks[i].margin;
            envelope->margin_case = i;
        }
    return UTW_OK;
}

int utw_stress_corner_count(const utw_stress *s)
{
    return s->keep_out.n;
}

utw_status utw_stress_corner(const utw_stress *s, int k, double at[2], double *radius,
                             utw_error *err)
{
    if (s == NULL || at == NULL || radius == NULL || k < 0 || k >= s->keep_out.n)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_stress_corner: no such corner");
    to_drawing(s->unit.solution, s->keep_out.centre[k], at);
    *radius = s->unit.solution->unit * s->keep_out.radius[k];
    return UTW_OK;
}
