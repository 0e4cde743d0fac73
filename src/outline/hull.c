/* SPDX-License-Identifier: GPL-3.0-or-later
 * Control polygons of pieces of curves. */
#include "outline/hull.h"

#include "base/vec2.h"

static void add(utw_hull *h, double x, double y)
{
    h->p[h->n][0] = x;
    h->p[h->n][1] = y;
    h->n++;
}

static void add_arc(utw_hull *h, const utw_curve *c)
{
    const double span = c->a1 - c->a0;
    const double half = 0.5 * span * (h->t1 - h->t0), start = c->a0 + span * h->t0;
    if (fabs(half) > 0.2500001 * UTW_PI) {
        h->n = 0;
        for (int k = 0; k < 4; k++) {
            const double su = k & 1 ? 1 : -1, sv = k & 2 ? 1 : -1;
            add(h, c->centre[0] + su * c->u[0] + sv * c->v[0],
                c->centre[1] + su * c->u[1] + sv * c->v[1]);
        }
        return;
    }
    /* the end tangents of a circle meet r tan(half) from either end; affine images keep the ratio
     */
    const double cs = tan(half) * cos(start), sn = tan(half) * sin(start);
    add(h, h->end[0][0] + c->v[0] * cs - c->u[0] * sn, h->end[0][1] + c->v[1] * cs - c->u[1] * sn);
}

static void measure(utw_hull *h)
{
    const double d[2] = {h->end[1][0] - h->end[0][0], h->end[1][1] - h->end[0][1]}, l = utw_norm(d);
    h->axis[0] = l > 0 ? d[0] / l : 1;
    h->axis[1] = l > 0 ? d[1] / l : 0;
    double low[2] = {HUGE_VAL, HUGE_VAL}, high[2] = {-HUGE_VAL, -HUGE_VAL};
    for (int i = 0; i < h->n; i++) {
        const double e[2] = {h->p[i][0] - h->end[0][0], h->p[i][1] - h->end[0][1]};
        const double q[2] = {utw_dot(h->axis, e), utw_cross(h->axis, e)};
        for (int k = 0; k < 2; k++) {
            low[k] = fmin(low[k], q[k]);
            high[k] = fmax(high[k], q[k]);
        }
    }
    h->length = high[0] - low[0];
    h->width = high[1] - low[1];
}

utw_hull utw_hull_of(const utw_curve *c, double t0, double t1)
{
    utw_hull h = {.t0 = t0, .t1 = t1};
    utw_curve_point(c, t0, h.end[0]);
    utw_curve_point(c, t1, h.end[1]);
    add(&h, h.end[0][0], h.end[0][1]);
    add(&h, h.end[1][0], h.end[1][1]);
    if (c->kind == UTW_ARC) add_arc(&h, c);
    if (c->kind == UTW_CUBIC) {
        const utw_curve piece = utw_curve_piece(c, t0, t1);
        add(&h, piece.c1[0], piece.c1[1]);
        add(&h, piece.c2[0], piece.c2[1]);
    }
    measure(&h);
    if (c->kind == UTW_LINE) h.width = 0;
    return h;
}

/* Extent of a hull along a unit vector. */
static void project(const utw_hull *h, const double origin[2], const double axis[2],
                    double range[2])
{
    range[0] = HUGE_VAL;
    range[1] = -HUGE_VAL;
    for (int i = 0; i < h->n; i++) {
        const double e[2] = {h->p[i][0] - origin[0], h->p[i][1] - origin[1]}, s = utw_dot(axis, e);
        range[0] = fmin(range[0], s);
        range[1] = fmax(range[1], s);
    }
}

double utw_hull_gap(const utw_hull *a, const utw_hull *b)
{
    double gap = -HUGE_VAL;
    for (int k = 0; k < 4; k++) {
        const double *along = k < 2 ? a->axis : b->axis;
        const double axis[2] = {k & 1 ? -along[1] : along[0], k & 1 ? along[0] : along[1]};
        double ra[2], rb[2];
        project(a, a->end[0], axis, ra);
        project(b, a->end[0], axis, rb);
        gap = fmax(gap, fmax(rb[0] - ra[1], ra[0] - rb[1]));
    }
    return gap;
}

double utw_hull_distance(const utw_hull *a, const double point[2])
{
    double gap[2];
    for (int k = 0; k < 2; k++) {
        const double axis[2] = {k ? -a->axis[1] : a->axis[0], k ? a->axis[0] : a->axis[1]};
        double range[2];
        project(a, point, axis, range);
        gap[k] = fmax(0, fmax(range[0], -range[1]));
    }
    return utw_norm(gap);
}

/* Direction from end i to the other end, and the angles from it to the hull's points seen from end
 * i. */
static void cone(const utw_hull *h, int i, double towards[2], double range[2])
{
    for (int k = 0; k < 2; k++) towards[k] = h->end[!i][k] - h->end[i][k];
    range[0] = range[1] = 0;
    for (int q = 0; q < h->n; q++) {
        const double e[2] = {h->p[q][0] - h->end[i][0], h->p[q][1] - h->end[i][1]};
        if (e[0] == 0 && e[1] == 0) continue;
        const double angle = atan2(utw_cross(towards, e), utw_dot(towards, e));
        range[0] = fmin(range[0], angle);
        range[1] = fmax(range[1], angle);
    }
}

int utw_hull_cones_apart(const utw_hull *a, int i, const utw_hull *b, int j)
{
    const double margin = 1e-9; /* rad: above the rounding of a direction */
    double da[2], db[2], ra[2], rb[2];
    cone(a, i, da, ra);
    cone(b, j, db, rb);
    if (utw_norm(da) == 0 || utw_norm(db) == 0) return 0; /* closed pieces have no cone */
    if (ra[1] - ra[0] >= UTW_PI || rb[1] - rb[0] >= UTW_PI) return 0;
    double turn = atan2(utw_cross(da, db), utw_dot(da, db));
    if (turn < 0) turn += 2 * UTW_PI;
    return turn + rb[0] - ra[1] > margin && 2 * UTW_PI + ra[0] - (turn + rb[1]) > margin;
}
