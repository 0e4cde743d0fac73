/* SPDX-License-Identifier: GPL-3.0-or-later
 * Lines, arcs by a point or a bulge, Bezier curves and splines between two vertices. */
#include "outline/join.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/spline.h"

static const double LEAST_BULGE = 1e-6, GREATEST_BULGE = 60; /* 356 degrees */

int utw_join_count(const utw_vertex *v)
{
    return v->join == UTW_JOIN_THROUGH ? v->n_point + 1 : 1;
}

static utw_status join_bulge(const utw_vertex *v, const double from[2], utw_curve *curve,
                             utw_error *err)
{
    const double b = v->bulge, size = fabs(b);
    if (b == 0)
        return utw_fail(err, UTW_E_OUTLINE, "a \"bulge\" of 0 is a straight edge; leave it out");
    if (size < LEAST_BULGE)
        return utw_fail(
            err, UTW_E_OUTLINE,
            "a \"bulge\" of %g is a straight edge within a millionth of its length; leave it out",
            b);
    if (size > GREATEST_BULGE)
        return utw_fail(err, UTW_E_OUTLINE,
                        "a \"bulge\" of %g turns through %.1f degrees, nearly a whole circle; "
                        "\"bulge\" is the tangent of "
                        "a quarter of the arc's angle: 1 for a semicircle",
                        b, 4 * atan(size) * 180 / UTW_PI);
    /* The centre lies to the left of the chord by chord (1 - b^2)/(4 b): elementary, with b =
     * tan(angle/4). */
    const double chord[2] = {v->at[0] - from[0], v->at[1] - from[1]}, h = (1 - b * b) / (4 * b);
    const double centre[2] = {from[0] + chord[0] / 2 - h * chord[1],
                              from[1] + chord[1] / 2 + h * chord[0]};
    const double radius = utw_norm(chord) * (1 + b * b) / (4 * size);
    const double a0 = atan2(from[1] - centre[1], from[0] - centre[0]);
    *curve = utw_curve_arc(centre, radius, a0, a0 + 4 * atan(b), from, v->at);
    return UTW_OK;
}

static utw_status join_arc(const utw_vertex *v, const double from[2], utw_curve *curve,
                           utw_error *err)
{
    const double *mid = v->point[0];
    if (utw_curve_arc_through(from, mid, v->at, curve) == 0) return UTW_OK;
    return utw_fail(err, UTW_E_OUTLINE,
                    "there is no arc from (%g, %g) through (%g, %g) to (%g, %g): the three points "
                    "lie in line or coincide; "
                    "move the point of \"arc\", or leave it out for a straight edge",
                    from[0], from[1], mid[0], mid[1], v->at[0], v->at[1]);
}

static utw_status join_through(const utw_vertex *v, const double from[2], int before, double same,
                               utw_curve *curve, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const int n = v->n_point + 2;
    double(*xy)[2] = utw_alloc((size_t)n, sizeof *xy);
    if (xy == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (spline)");
    memcpy(xy[0], from, sizeof xy[0]);
    memcpy(xy + 1, v->point, (size_t)v->n_point * sizeof *xy);
    memcpy(xy[n - 1], v->at, sizeof xy[0]);
    for (int i = 1; i < n; i++) {
        if (utw_distance(xy[i - 1], xy[i]) > same) continue;
        if (i == 1)
            st = utw_fail(err, UTW_E_OUTLINE,
                          "point 1 of \"through\" is vertex %d itself, (%g, %g); list only the "
                          "points between the vertices",
                          before + 1, xy[i][0], xy[i][1]);
        else if (i == n - 1)
            st = utw_fail(err, UTW_E_OUTLINE,
                          "point %d of \"through\" is this vertex itself, (%g, %g); list only the "
                          "points between the vertices",
                          i - 1, xy[i][0], xy[i][1]);
        else
            st = utw_fail(err, UTW_E_OUTLINE,
                          "points %d and %d of \"through\" are the same, (%g, %g); remove one",
                          i - 1, i, xy[i][0], xy[i][1]);
        goto done;
    }
    st = utw_spline_natural(n, (const double(*)[2])xy, curve, err);
done:
    utw_free(xy);
    return st;
}

utw_status utw_join_curves(const utw_vertex *v, const double from[2], int before, double same,
                           utw_curve *curve, utw_error *err)
{
    /* only these may leave a vertex and come back to it */
    const int may_return = v->join == UTW_JOIN_BEZIER || v->join == UTW_JOIN_THROUGH;
    if (!may_return && utw_distance(from, v->at) <= same)
        return utw_fail(err, UTW_E_OUTLINE,
                        "(%g, %g) is the same point as vertex %d; remove one of them", v->at[0],
                        v->at[1], before + 1);
    switch (v->join) {
    case UTW_JOIN_LINE:
        *curve = utw_curve_line(from, v->at);
        return UTW_OK;
    case UTW_JOIN_BULGE:
        return join_bulge(v, from, curve, err);
    case UTW_JOIN_ARC:
        return join_arc(v, from, curve, err);
    case UTW_JOIN_THROUGH:
        return join_through(v, from, before, same, curve, err);
    case UTW_JOIN_BEZIER:
        break;
    }
    *curve = utw_curve_cubic(from, v->point[0], v->point[1], v->at);
    return UTW_OK;
}
