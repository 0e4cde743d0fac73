/* SPDX-License-Identifier: GPL-3.0-or-later
 * Meetings of curves by halving their control polygons. */
#include "outline/intersect.h"

#include <stddef.h>

#include "base/vec2.h"
#include "outline/hull.h"

enum { MAX_VISITS = 20000, MAX_DEPTH = 120 };

typedef struct search {
    const utw_curve *a, *b;
    double tolerance;
    int visits;
    int found;
    utw_meeting meeting;
} search;

static void record(search *x, double s, double t, const double p[2], const double q[2], int found)
{
    x->found = found;
    x->meeting = (utw_meeting){.s = s, .t = t, .distance = utw_distance(p, q)};
    for (int k = 0; k < 2; k++) x->meeting.at[k] = 0.5 * (p[k] + q[k]);
}

/* Point of the segment p q nearest to x: its parameter in [0, 1]. */
static double segment_nearest(const double p[2], const double q[2], const double x[2])
{
    const double d[2] = {q[0] - p[0], q[1] - p[1]}, e[2] = {x[0] - p[0], x[1] - p[1]};
    const double dd = utw_dot(d, d);
    return dd > 0 ? fmin(1, fmax(0, utw_dot(d, e) / dd)) : 0;
}

/* Nearest points of two segments: parameters u[2]; returns the distance. */
static double segments_nearest(const double p[2][2], const double q[2][2], double u[2])
{
    const double a = utw_turn(p[0], p[1], q[0]), b = utw_turn(p[0], p[1], q[1]);
    const double c = utw_turn(q[0], q[1], p[0]), d = utw_turn(q[0], q[1], p[1]);
    if (((a < 0 && b > 0) || (a > 0 && b < 0)) && ((c < 0 && d > 0) || (c > 0 && d < 0))) {
        u[0] = c / (c - d);
        u[1] = a / (a - b);
        return 0;
    }
    double best = HUGE_VAL;
    for (int k = 0; k < 4; k++) { /* an end of one against the other */
        const double *x = k < 2 ? p[k] : q[k - 2];
        const double(*other)[2] = k < 2 ? q : p;
        const double w = segment_nearest(other[0], other[1], x);
        const double y[2] = {other[0][0] + w * (other[1][0] - other[0][0]),
                             other[0][1] + w * (other[1][1] - other[0][1])};
        const double distance = utw_distance(x, y);
        if (distance >= best) continue;
        best = distance;
        u[k < 2 ? 0 : 1] = k & 1;
        u[k < 2 ? 1 : 0] = w;
    }
    return best;
}

static void compare_straight(search *x, const utw_hull *a, const utw_hull *b)
{
    double u[2] = {0, 0}, p[2], q[2];
    const double distance = segments_nearest(a->end, b->end, u);
    if (distance > x->tolerance) return;
    for (int k = 0; k < 2; k++) {
        p[k] = a->end[0][k] + u[0] * (a->end[1][k] - a->end[0][k]);
        q[k] = b->end[0][k] + u[1] * (b->end[1][k] - b->end[0][k]);
    }
    record(x, a->t0 + u[0] * (a->t1 - a->t0), b->t0 + u[1] * (b->t1 - b->t0), p, q, 1);
    x->meeting.distance = distance;
}

/* Two pieces with a common end that no halving can part: they leave it in the same direction. */
static void record_common_run(search *x, const utw_hull *a, const utw_hull *b, int shared)
{
    const int i = (shared & 12) != 0, j = (shared & 10) != 0;
    const int far_a = !i, far_b = !j;
    /* the end of the shorter piece, which lies on the longer one */
    const int a_shorter = a->length <= b->length;
    const double *p = a_shorter ? a->end[far_a] : b->end[far_b];
    record(x, a_shorter ? (far_a ? a->t1 : a->t0) : (i ? a->t1 : a->t0),
           a_shorter ? (j ? b->t1 : b->t0) : (far_b ? b->t1 : b->t0), p, p, 1);
}

/* Of the shared ends those that half `half` (0, 1) of the first or second piece still has. */
static int shared_by_half(int shared, int second, int half)
{
    static const int first_mask[2] = {3, 12}, second_mask[2] = {5, 10};
    return shared & (second ? second_mask[half] : first_mask[half]);
}

static int cones_apart(const utw_hull *a, const utw_hull *b, int shared)
{
    for (int i = 0; i < 2; i++)
        for (int j = 0; j < 2; j++)
            if ((shared & UTW_SHARED(i, j)) && utw_hull_cones_apart(a, i, b, j)) return 1;
    return 0;
}

/* A flat hull whose curve runs along it and back: half a very slim ellipse. */
static int folded(const utw_hull *h)
{
    return h->length > 1.01 * utw_distance(h->end[0], h->end[1]);
}

static void visit(search *x, const utw_hull *a, const utw_hull *b, int shared, int depth)
{
    if (x->found) return;
    if (++x->visits > MAX_VISITS || depth > MAX_DEPTH) {
        record(x, a->t0, b->t0, a->end[0], b->end[0], 2);
        return;
    }
    const double flat = x->tolerance / 4;
    int split_a;
    if (shared) {
        if (cones_apart(a, b, shared)) return;
        const double size_a = a->width > 0 ? a->length : 0, size_b = b->width > 0 ? b->length : 0;
        if (size_a <= x->tolerance && size_b <= x->tolerance) {
            record_common_run(x, a, b, shared);
            return;
        }
        split_a = size_a >= size_b;
    } else {
        if (utw_hull_gap(a, b) > x->tolerance) return;
        const int bent_a = a->width > flat || folded(a), bent_b = b->width > flat || folded(b);
        if (!bent_a && !bent_b) {
            compare_straight(x, a, b);
            return;
        }
        split_a = bent_a && (!bent_b || a->width >= b->width);
    }
    const utw_hull *whole = split_a ? a : b;
    const double middle = 0.5 * (whole->t0 + whole->t1);
    for (int half = 0; half < 2; half++) {
        const utw_hull part = utw_hull_of(split_a ? x->a : x->b, half ? middle : whole->t0,
                                          half ? whole->t1 : middle);
        visit(x, split_a ? &part : a, split_a ? b : &part, shared_by_half(shared, !split_a, half),
              depth + 1);
    }
}

/* Newton's iteration for (c(t) - x) . c'(t) = 0 from t, kept in [0, 1]. */
static double polish(const utw_curve *c, const double x[2], double t)
{
    for (int step = 0; step < 20; step++) {
        double p[2], d1[2], d2[2];
        utw_curve_point(c, t, p);
        utw_curve_d1(c, t, d1);
        utw_curve_d2(c, t, d2);
        const double e[2] = {p[0] - x[0], p[1] - x[1]};
        const double slope = utw_dot(d1, d1) + utw_dot(e, d2);
        if (!(slope > 0)) break;
        const double next = fmin(1, fmax(0, t - utw_dot(e, d1) / slope));
        if (fabs(next - t) < 1e-16) break;
        t = next;
    }
    return t;
}

/* Whether all of the line b lies farther than the tolerance on one side of the line a: most pairs
 * of a large outline, so it is decided before anything else. */
static int lies_beside(const utw_curve *a, const utw_curve *b, double tolerance)
{
    const double d[2] = {a->to[0] - a->from[0], a->to[1] - a->from[1]};
    const double p = d[0] * (b->from[1] - a->from[1]) - d[1] * (b->from[0] - a->from[0]);
    const double q = d[0] * (b->to[1] - a->from[1]) - d[1] * (b->to[0] - a->from[0]);
    const double least = tolerance * tolerance * utw_dot(d, d);
    return (p < 0) == (q < 0) && p * p > least && q * q > least;
}

int utw_curves_meet(const utw_curve *a, const utw_curve *b, int shared, double tolerance,
                    utw_meeting *meeting)
{
    if (shared == 0 && a->kind == UTW_LINE && b->kind == UTW_LINE &&
        (lies_beside(a, b, tolerance) || lies_beside(b, a, tolerance)))
        return 0;
    search x = {.a = a, .b = b, .tolerance = tolerance};
    const utw_hull whole_a = utw_hull_of(a, 0, 1), whole_b = utw_hull_of(b, 0, 1);
    visit(&x, &whole_a, &whole_b, shared, 0);
    if (x.found && meeting != NULL) {
        *meeting = x.meeting;
        /* parameters are not even along a straight piece of a cubic */
        meeting->s = polish(a, meeting->at, meeting->s);
        meeting->t = polish(b, meeting->at, meeting->t);
    }
    return x.found;
}

int utw_curves_narrow(const utw_curve *a, const utw_curve *b, int shared, double touch,
                      utw_meeting *meeting)
{
    for (;;) {
        const double tolerance = fmax(touch, meeting->distance / 2);
        utw_meeting nearer;
        /* a search that gave up has no distance to go on with */
        if (utw_curves_meet(a, b, shared, tolerance, &nearer) != 1) return 0;
        *meeting = nearer;
        if (tolerance <= touch) return 1;
    }
}

/* ---- a curve and itself ------------------------------------------------------------------ */

/* A cubic on one line: it turns back where its speed along the line changes sign. */
static utw_self straight_cubic(const utw_curve *c, double *s, double *t)
{
    const double points[4][2] = {
        {c->from[0], c->from[1]}, {c->c1[0], c->c1[1]}, {c->c2[0], c->c2[1]}, {c->to[0], c->to[1]}};
    const double chord[2] = {c->to[0] - c->from[0], c->to[1] - c->from[1]};
    double d[3]; /* the speed's Bezier coefficients */
    for (int k = 0; k < 3; k++) {
        const double step[2] = {points[k + 1][0] - points[k][0], points[k + 1][1] - points[k][1]};
        d[k] = utw_dot(step, chord);
    }
    if (d[0] > 0 && d[2] > 0 && d[1] > -sqrt(d[0] * d[2])) return UTW_SELF_NONE;
    const double middle = d[0] - 2 * d[1] + d[2];
    *s = *t = middle != 0 ? fmin(1, fmax(0, (d[0] - d[1]) / middle)) : 0.5;
    return UTW_SELF_CUSP;
}

utw_self utw_curve_meets_itself(const utw_curve *c, double *s, double *t)
{
    if (c->kind != UTW_CUBIC) return UTW_SELF_NONE;
    double A[2], B[2], C[2], leg[2][2]; /* c(t) = A t^3 + B t^2 + C t + from */
    for (int k = 0; k < 2; k++) {
        C[k] = 3 * (c->c1[k] - c->from[k]);
        B[k] = 3 * (c->c2[k] - 2 * c->c1[k] + c->from[k]);
        A[k] = c->to[k] - 3 * c->c2[k] + 3 * c->c1[k] - c->from[k];
        leg[0][k] = c->c1[k] - c->from[k];
        leg[1][k] = c->to[k] - c->c2[k];
    }
    const double size =
        utw_distance(c->from, c->c1) + utw_distance(c->c1, c->c2) + utw_distance(c->c2, c->to);
    for (int end = 0; end < 2; end++)
        if (utw_norm(leg[end]) <= 1e-6 * size) {
            *s = *t = end;
            return UTW_SELF_NO_START;
        }
    const double ab = utw_cross(A, B), ac = utw_cross(A, C), bc = utw_cross(B, C);
    const double none = 1e-12 * size * size;
    if (fabs(ab) <= none && fabs(ac) <= none && fabs(bc) <= none) return straight_cubic(c, s, t);
    /* With S = s + t, P = s t:  A (S^2 - P) + B S + C = 0. Its cross product with A gives S, with B
     * gives P. */
    if (fabs(ab) <= none) return UTW_SELF_NONE;
    const double S = -ac / ab, P = S * S - bc / ab;
    const double disc = S * S / 4 - P;
    if (disc < -1e-9) return UTW_SELF_NONE;
    const double half = sqrt(fmax(disc, 0));
    *s = S / 2 - half;
    *t = S / 2 + half;
    if (*s < -1e-9 || *t > 1 + 1e-9) return UTW_SELF_NONE;
    if (half < 1e-5) return UTW_SELF_CUSP;
    if (*s < 1e-9 && *t > 1 - 1e-9) return UTW_SELF_NONE; /* a closed curve */
    return UTW_SELF_CROSSES;
}

/* ---- nearest point ----------------------------------------------------------------------- */

static double distance_at(const utw_curve *c, double t, const double x[2])
{
    double p[2];
    utw_curve_point(c, t, p);
    return utw_distance(p, x);
}

typedef struct nearest {
    const utw_curve *curve;
    const double *point;
    double best, t;
} nearest;

static void improve(nearest *x, double t)
{
    const double d = distance_at(x->curve, t, x->point);
    if (d >= x->best) return;
    x->best = d;
    x->t = t;
}

static void descend(nearest *x, double t0, double t1, int depth)
{
    const utw_hull hull = utw_hull_of(x->curve, t0, t1);
    if (utw_hull_distance(&hull, x->point) >= x->best) return;
    if (depth > 40 || (hull.width <= 1e-3 * hull.length && !folded(&hull))) {
        /* nearly straight: one minimum, near the foot on the chord */
        const double u = segment_nearest(hull.end[0], hull.end[1], x->point);
        const double t = polish(x->curve, x->point, t0 + u * (t1 - t0));
        improve(x, t);
        improve(x, t0);
        improve(x, t1);
        return;
    }
    const double middle = 0.5 * (t0 + t1);
    descend(x, t0, middle, depth + 1);
    descend(x, middle, t1, depth + 1);
}

double utw_curve_nearest(const utw_curve *c, const double point[2], double reach, double *t)
{
    /* `best` starts just above the reach, so that a distance equal to it still counts */
    nearest x = {c, point, nextafter(reach, HUGE_VAL), -1};
    if (c->kind == UTW_LINE)
        improve(&x, segment_nearest(c->from, c->to, point));
    else
        descend(&x, 0, 1, 0);
    if (x.t < 0) return HUGE_VAL;
    if (t != NULL) *t = x.t;
    return x.best;
}
