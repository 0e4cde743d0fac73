/* SPDX-License-Identifier: GPL-3.0-or-later
 * Searching the boundary for the greatest torsional stress. */
#include "section/peak.h"

#include <math.h>

/* A side is searched when a quadrature point of its element reaches this part of the greatest one:
 * points stand inside the element, where the stress is smaller. */
#define NEAR_PEAK 0.8

/* The stress at u of side k of an element: the mean of the warping and the stress-function
 * solution. */
static utw_peak on_side(const utw_solved *s, int t, int k, double u)
{
    static const double corner[3][2] = {{0, 0}, {1, 0}, {0, 1}};
    const double *a = corner[k], *b = corner[(k + 1) % 3];
    double p[UTW_N_PAIR][2], q[UTW_N_PAIR][2];
    utw_peak peak;
    utw_field_at(s->field, t, a[0] + u * (b[0] - a[0]), a[1] + u * (b[1] - a[1]), peak.at, NULL, p,
                 q);
    const utw_pair *pair = &s->pair[UTW_TORSION];
    const double c = s->moduli == NULL ? 1 : s->moduli->shear[s->mesh->tri[t].part];
    double stress[2], apart[2];
    for (int i = 0; i < 2; i++) {
        const double P = c * utw_poly_at(pair->P[i], peak.at[0], peak.at[1]);
        stress[i] = 0.5 * (p[UTW_TORSION][i] + q[UTW_TORSION][i]) - P;
        apart[i] = 0.5 * (p[UTW_TORSION][i] - q[UTW_TORSION][i]);
    }
    peak.value = hypot(stress[0], stress[1]);
    peak.error =
        4 * hypot(apart[0],
                  apart[1]); /* both solutions err alike at the boundary: measured up to 3.5 */
    return peak;
}

/* Samples along the side, then golden-section search about the best one. */
static utw_peak search_side(const utw_solved *s, int t, int k)
{
    const int n = 2 * s->field->order[t] + 2;
    const double golden = 0.6180339887498949;
    utw_peak best = on_side(s, t, k, 0);
    double at = 0;
    for (int i = 1; i <= n; i++) {
        const utw_peak p = on_side(s, t, k, (double)i / n);
        if (p.value <= best.value) continue;
        best = p;
        at = (double)i / n;
    }
    double lo = fmax(0, at - 1.0 / n), hi = fmin(1, at + 1.0 / n);
    double x1 = hi - golden * (hi - lo), x2 = lo + golden * (hi - lo);
    utw_peak p1 = on_side(s, t, k, x1), p2 = on_side(s, t, k, x2);
    for (int step = 0; step < 20; step++) {
        if (p1.value > p2.value) {
            hi = x2, x2 = x1, p2 = p1;
            p1 = on_side(s, t, k, x1 = hi - golden * (hi - lo));
        } else {
            lo = x1, x1 = x2, p1 = p2;
            p2 = on_side(s, t, k, x2 = lo + golden * (hi - lo));
        }
    }
    if (p1.value > best.value) best = p1;
    if (p2.value > best.value) best = p2;
    return best;
}

utw_peak utw_torsion_peak(const utw_solved *s)
{
    utw_peak best = {0, 0, {0, 0}};
    double greatest = 0;
    for (int t = 0; t < s->mesh->n_tri; t++) greatest = fmax(greatest, s->peak[t]);
    for (int t = 0; t < s->mesh->n_tri; t++) {
        if (s->peak[t] < NEAR_PEAK * fmax(greatest, best.value)) continue;
        for (int k = 0; k < 3; k++) {
            if (s->mesh->edge[s->mesh->tri[t].side[k]].tri[1] >= 0) continue;
            const utw_peak p = search_side(s, t, k);
            if (p.value > best.value) best = p;
        }
    }
    return best;
}
