/* SPDX-License-Identifier: GPL-3.0-or-later
 * Parameters and lengths along the curves of an edge. */
#include "outline/edge.h"

#include "base/vec2.h"

/* The curve s lies on; *t its own parameter, which may lie outside [0, 1] at the ends of the edge.
 */
static const utw_curve *locate(const utw_edge *edge, double s, double *t)
{
    int k = s >= edge->n ? edge->n - 1 : s > 0 ? (int)s : 0;
    *t = s - k;
    return &edge->curve[k];
}

void utw_edge_point(const utw_edge *edge, double s, double xy[2])
{
    double t;
    const utw_curve *curve = locate(edge, s, &t);
    utw_curve_point(curve, t, xy);
}

void utw_edge_d1(const utw_edge *edge, double s, double d[2])
{
    double t;
    const utw_curve *curve = locate(edge, s, &t);
    utw_curve_d1(curve, t, d);
}

void utw_edge_d2(const utw_edge *edge, double s, double d[2])
{
    double t;
    const utw_curve *curve = locate(edge, s, &t);
    utw_curve_d2(curve, t, d);
}

double utw_edge_length(const utw_edge *edge, double s0, double s1)
{
    double sum = 0;
    for (int k = 0; k < edge->n; k++) {
        const double t0 = fmax(s0 - k, 0), t1 = fmin(s1 - k, 1);
        if (t0 >= t1) continue;
        const utw_curve piece = utw_curve_piece(&edge->curve[k], t0, t1);
        sum += utw_curve_length(&piece);
    }
    return sum;
}

/* The parameter a length c after the start of a curve at least that long. */
static double at_length(const utw_curve *curve, double c, double whole)
{
    double low = 0, high = 1, t = c / whole;
    for (int i = 0; i < 60; i++) {
        const utw_curve piece = utw_curve_piece(curve, 0, t);
        double d[2];
        const double excess = utw_curve_length(&piece) - c;
        *(excess > 0 ? &high : &low) = t;
        utw_curve_d1(curve, t, d);
        double next = t - excess / utw_norm(d);
        if (!(next > low && next < high)) next = 0.5 * (low + high);
        if (fabs(next - t) <= 1e-15) break;
        t = next;
    }
    return t;
}

double utw_edge_at_length(const utw_edge *edge, double c, int from_end)
{
    for (int i = 0; i < edge->n; i++) {
        const int k = from_end ? edge->n - 1 - i : i;
        const utw_curve curve = from_end ? utw_curve_reversed(&edge->curve[k]) : edge->curve[k];
        const double whole = utw_curve_length(&curve);
        if (c <= whole) {
            const double t = curve.kind == UTW_LINE ? c / whole : at_length(&curve, c, whole);
            return from_end ? k + 1 - t : k + t;
        }
        c -= whole;
    }
    return from_end ? -1 : edge->n + 1;
}
