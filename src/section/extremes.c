/* SPDX-License-Identifier: GPL-3.0-or-later
 * Scanning samples, then searching the polynomials. */
#include "section/extremes.h"

#include <math.h>

#include "base/status.h"
#include "base/vec2.h"
#include "section/search.h"

/* Equal peaks of a symmetric section are all searched; where stresses are level along a wall a few
 * elements of it will do. */
enum { MOST_SIDES = 12, MOST_INSIDES = 4, MOST = MOST_SIDES + MOST_INSIDES };

/* Regions near the greatest sample of a kind, best first; at most so many of each sort. */
typedef struct shortlist {
    int n, insides;
    int region[MOST];
} shortlist;

static int is_inside(const utw_samples *a, int region)
{
    return a->region[region].kind == UTW_INSIDE;
}

/* Drop the last region of a sort. */
static void drop(const utw_samples *a, shortlist *list, int inside)
{
    int i = list->n - 1;
    while (is_inside(a, list->region[i]) != inside) i--;
    for (; i + 1 < list->n; i++) list->region[i] = list->region[i + 1];
    list->n--;
    list->insides -= inside;
}

static void shorten(const utw_samples *a, const utw_scan *scan, int kind, shortlist *list)
{
    list->n = list->insides = 0;
    for (int i = 0; i < a->n_region; i++) {
        const double m = scan->best[i][kind];
        if (!(m >= scan->greatest[kind] - scan->near[kind]) || !isfinite(m)) continue;
        const int inside = is_inside(a, i);
        const int full =
            inside ? list->insides == MOST_INSIDES : list->n - list->insides == MOST_SIDES;
        if (full) { /* is it better than the worst of its sort? */
            int worst = list->n - 1;
            while (is_inside(a, list->region[worst]) != inside) worst--;
            if (m <= scan->best[list->region[worst]][kind]) continue;
            drop(a, list, inside);
        }
        int at = list->n++;
        for (; at > 0 && scan->best[list->region[at - 1]][kind] < m; at--)
            list->region[at] = list->region[at - 1];
        list->region[at] = i;
        list->insides += inside;
    }
}

static void search_kind(const utw_stress *stress, const utw_stress_case *stress_case,
                        const utw_scan *scan, int kind, utw_extreme *extreme)
{
    const utw_samples *a = &stress->samples;
    double best = -UTW_INFINITY;
    shortlist list;
    shorten(a, scan, kind, &list);
    for (int i = 0; i < list.n; i++) {
        if (scan->best[list.region[i]][kind] < best - scan->near[kind]) break;
        const utw_search search = {stress, stress_case, kind, &a->region[list.region[i]]};
        utw_place place;
        const double merit = utw_search_region(&search, &place);
        if (merit <= best) continue;
        best = merit;
        extreme->place = place;
    }
}

/* Value and error at the place found. */
static void evaluate(const utw_stress *stress, const utw_stress_case *c, int kind, utw_extreme *e)
{
    utw_unit_element element;
    utw_point_stress p;
    utw_unit_element_of(&stress->unit, e->place.tri, &element);
    utw_point_stress_of(c, &element, stress->samples.apart[e->place.tri], e->place.r, e->place.s,
                        &p);
    e->place.xy[0] = p.xy[0];
    e->place.xy[1] = p.xy[1];
    const double tau = utw_norm(p.tau), radius = hypot(0.5 * p.sigma, tau);
    switch (kind) {
    case UTW_SIGMA_MAX:
    case UTW_SIGMA_MIN:
        e->value = p.sigma;
        e->error = p.sigma_error;
        break;
    case UTW_TAU_MAX:
        e->value = tau;
        e->error = p.tau_error;
        break;
    case UTW_PRINCIPAL_MAX:
    case UTW_PRINCIPAL_MIN:
        e->value = 0.5 * p.sigma + (kind == UTW_PRINCIPAL_MAX ? radius : -radius);
        e->error = p.sigma_error + p.tau_error;
        break;
    default:
        e->value = sqrt(p.sigma * p.sigma + 3 * tau * tau);
        e->error = p.sigma_error + sqrt(3) * p.tau_error;
    }
    if (kind != UTW_UTILISATION) return;
    const double yield = stress->yield[stress->unit.solution->solved.mesh->tri[e->place.tri].part];
    e->value /= yield;
    e->error /= yield;
}

utw_status utw_extremes_find(const utw_stress *stress, const utw_stress_case *stress_case,
                             utw_extremes *extremes, utw_error *err)
{
    utw_scan scan;
    const utw_status st = utw_scan_init(&scan, stress, stress_case, err);
    if (st != UTW_OK) return st;
    for (int kind = 0; kind < UTW_N_KIND; kind++) {
        utw_extreme *e = &extremes->kind[kind];
        *e = (utw_extreme){UTW_NAN, 0, {0, 0, 0, {0, 0}}};
        if (kind == UTW_UTILISATION && stress->yield == NULL) continue;
        search_kind(stress, stress_case, &scan, kind, e);
        evaluate(stress, stress_case, kind, e);
    }
    utw_scan_clear(&scan);
    return UTW_OK;
}
