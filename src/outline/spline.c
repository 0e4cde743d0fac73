/* SPDX-License-Identifier: GPL-3.0-or-later
 * Slopes of the natural spline by elimination, then its pieces as Bezier curves. */
#include "outline/spline.h"

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

/* Slopes m[i] by the chord length at every point, from
 *   h[i] m[i-1] + 2 (h[i-1] + h[i]) m[i] + h[i-1] m[i+1] = 3 (h[i] d[i-1] + h[i-1] d[i])
 * with the chord lengths h and the divided differences d, and 2 m[0] + m[1] = 3 d[0] (and its
 * mirror image) at the ends, where the second derivative is zero. The rows are diagonally dominant:
 * no pivoting. ratio[n] is scratch: the upper diagonal over the pivot. */
static void slopes(int n, const double (*xy)[2], double (*m)[2], double *ratio)
{
    double h0 = utw_distance(xy[0], xy[1]);
    ratio[0] = 0.5;
    for (int k = 0; k < 2; k++) m[0][k] = 1.5 * (xy[1][k] - xy[0][k]) / h0;
    for (int i = 1; i < n - 1; i++) {
        const double h1 = utw_distance(xy[i], xy[i + 1]), pivot = 2 * (h0 + h1) - h1 * ratio[i - 1];
        for (int k = 0; k < 2; k++) {
            const double d0 = (xy[i][k] - xy[i - 1][k]) / h0, d1 = (xy[i + 1][k] - xy[i][k]) / h1;
            m[i][k] = (3 * (h1 * d0 + h0 * d1) - h1 * m[i - 1][k]) / pivot;
        }
        ratio[i] = h0 / pivot;
        h0 = h1;
    }
    for (int k = 0; k < 2; k++)
        m[n - 1][k] = (3 * (xy[n - 1][k] - xy[n - 2][k]) / h0 - m[n - 2][k]) / (2 - ratio[n - 2]);
    for (int i = n - 2; i >= 0; i--)
        for (int k = 0; k < 2; k++) m[i][k] -= ratio[i] * m[i + 1][k];
}

utw_status utw_spline_natural(int n, const double (*xy)[2], utw_curve *curve, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    double(*m)[2] = NULL, *ratio = NULL;
    UTW_TRY_ALLOC(m = utw_alloc((size_t)n, sizeof *m));
    UTW_TRY_ALLOC(ratio = utw_alloc((size_t)n, sizeof *ratio));
    slopes(n, xy, m, ratio);
    for (int i = 0; i < n - 1; i++) {
        const double third = utw_distance(xy[i], xy[i + 1]) / 3;
        double c1[2], c2[2];
        for (int k = 0; k < 2; k++) {
            c1[k] = xy[i][k] + third * m[i][k];
            c2[k] = xy[i + 1][k] - third * m[i + 1][k];
        }
        curve[i] = utw_curve_cubic(xy[i], c1, c2, xy[i + 1]);
    }
    st = UTW_OK;
done:
    utw_free(m);
    utw_free(ratio);
    return st;
}
