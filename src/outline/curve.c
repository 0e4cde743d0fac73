/* SPDX-License-Identifier: GPL-3.0-or-later
 * Points, derivatives and measures of lines, arcs and cubics. */
#include "outline/curve.h"

#include "base/gauss.h"
#include "base/vec2.h"

static void copy2(double to[2], const double from[2])
{
    to[0] = from[0];
    to[1] = from[1];
}

utw_curve utw_curve_line(const double from[2], const double to[2])
{
    utw_curve c = {.kind = UTW_LINE};
    copy2(c.from, from);
    copy2(c.to, to);
    return c;
}

utw_curve utw_curve_arc(const double centre[2], double r, double a0, double a1,
                        const double from[2], const double to[2])
{
    utw_curve c = {.kind = UTW_ARC, .u = {r, 0}, .v = {0, r}, .a0 = a0, .a1 = a1};
    copy2(c.centre, centre);
    copy2(c.from, from);
    copy2(c.to, to);
    return c;
}

int utw_curve_arc_through(const double from[2], const double mid[2], const double to[2],
                          utw_curve *curve)
{
    /* Circumcircle, in coordinates relative to `from`: |c|^2 = |c - m|^2 = |c - e|^2. */
    const double m[2] = {mid[0] - from[0], mid[1] - from[1]};
    const double e[2] = {to[0] - from[0], to[1] - from[1]};
    const double cross = utw_cross(m, e), mm = utw_dot(m, m), ee = utw_dot(e, e);
    if (!(fabs(cross) > 1e-12 * fmax(mm, ee))) return -1;
    const double c[2] = {(e[1] * mm - m[1] * ee) / (2 * cross),
                         (m[0] * ee - e[0] * mm) / (2 * cross)};
    const double r = utw_norm(c), centre[2] = {from[0] + c[0], from[1] + c[1]};
    const double a0 = atan2(-c[1], -c[0]);
    double a1 = atan2(e[1] - c[1], e[0] - c[0]);
    /* from, mid, to turn the way m x e says: the arc goes counter-clockwise when cross > 0 */
    if (cross > 0 && a1 <= a0) a1 += 2 * UTW_PI;
    if (cross < 0 && a1 >= a0) a1 -= 2 * UTW_PI;
    *curve = utw_curve_arc(centre, r, a0, a1, from, to);
    return 0;
}

utw_curve utw_curve_cubic(const double from[2], const double c1[2], const double c2[2],
                          const double to[2])
{
    utw_curve c = {.kind = UTW_CUBIC};
    copy2(c.from, from);
    copy2(c.to, to);
    copy2(c.c1, c1);
    copy2(c.c2, c2);
    return c;
}

/* Chord from the first end of an arc to its point at t: cos a - cos a0 and sin a - sin a0 as
 * products, which keep all digits of a short arc of a very large radius. */
static void arc_chord(const utw_curve *c, double t, double chord[2])
{
    const double half = 0.5 * t * (c->a1 - c->a0), middle = c->a0 + half, s = 2 * sin(half);
    const double cs = s * cos(middle), sn = s * sin(middle);
    for (int k = 0; k < 2; k++) chord[k] = c->v[k] * cs - c->u[k] * sn;
}

/* What is missing between the end of an arc and the end it shall have: rounding, or the width of a
 * join. It is spread evenly along the arc, so that the arc runs into its ends without a step. */
static void arc_gap(const utw_curve *c, double gap[2])
{
    double whole[2];
    arc_chord(c, 1, whole);
    for (int k = 0; k < 2; k++) gap[k] = (c->to[k] - c->from[k]) - whole[k];
}

void utw_curve_point(const utw_curve *c, double t, double xy[2])
{
    if (t == 0 || t == 1) {
        copy2(xy, t == 0 ? c->from : c->to);
    } else if (c->kind == UTW_LINE) {
        for (int k = 0; k < 2; k++) xy[k] = c->from[k] + t * (c->to[k] - c->from[k]);
    } else if (c->kind == UTW_ARC) {
        double chord[2], gap[2];
        arc_chord(c, t, chord);
        arc_gap(c, gap);
        for (int k = 0; k < 2; k++) xy[k] = c->from[k] + chord[k] + t * gap[k];
    } else {
        const double s = 1 - t;
        const double b0 = s * s * s, b1 = 3 * s * s * t, b2 = 3 * s * t * t, b3 = t * t * t;
        for (int k = 0; k < 2; k++)
            xy[k] = b0 * c->from[k] + b1 * c->c1[k] + b2 * c->c2[k] + b3 * c->to[k];
    }
}

void utw_curve_d1(const utw_curve *c, double t, double d[2])
{
    if (c->kind == UTW_LINE) {
        for (int k = 0; k < 2; k++) d[k] = c->to[k] - c->from[k];
    } else if (c->kind == UTW_ARC) {
        const double span = c->a1 - c->a0, a = c->a0 + t * span, cs = cos(a), sn = sin(a);
        double gap[2];
        arc_gap(c, gap);
        for (int k = 0; k < 2; k++) d[k] = span * (c->v[k] * cs - c->u[k] * sn) + gap[k];
    } else {
        const double s = 1 - t;
        for (int k = 0; k < 2; k++)
            d[k] = 3 * (s * s * (c->c1[k] - c->from[k]) + 2 * s * t * (c->c2[k] - c->c1[k]) +
                        t * t * (c->to[k] - c->c2[k]));
    }
}

void utw_curve_d2(const utw_curve *c, double t, double d[2])
{
    if (c->kind == UTW_LINE) {
        d[0] = d[1] = 0;
    } else if (c->kind == UTW_ARC) {
        const double span = c->a1 - c->a0, a = c->a0 + t * span, cs = cos(a), sn = sin(a);
        for (int k = 0; k < 2; k++) d[k] = -span * span * (c->u[k] * cs + c->v[k] * sn);
    } else {
        for (int k = 0; k < 2; k++)
            d[k] = 6 * ((1 - t) * (c->c2[k] - 2 * c->c1[k] + c->from[k]) +
                        t * (c->to[k] - 2 * c->c2[k] + c->c1[k]));
    }
}

utw_curve utw_curve_piece(const utw_curve *c, double t0, double t1)
{
    utw_curve piece = *c;
    utw_curve_point(c, t0, piece.from);
    utw_curve_point(c, t1, piece.to);
    if (c->kind == UTW_ARC) {
        piece.a0 = c->a0 + t0 * (c->a1 - c->a0);
        piece.a1 = c->a0 + t1 * (c->a1 - c->a0);
    } else if (c->kind == UTW_CUBIC) {
        /* A Bezier curve's inner control points lie a third of the end tangents away. */
        double d0[2], d1[2];
        utw_curve_d1(c, t0, d0);
        utw_curve_d1(c, t1, d1);
        for (int k = 0; k < 2; k++) {
            piece.c1[k] = piece.from[k] + (t1 - t0) / 3 * d0[k];
            piece.c2[k] = piece.to[k] - (t1 - t0) / 3 * d1[k];
        }
    }
    return piece;
}

utw_curve utw_curve_reversed(const utw_curve *c)
{
    utw_curve r = *c;
    copy2(r.from, c->to);
    copy2(r.to, c->from);
    copy2(r.c1, c->c2);
    copy2(r.c2, c->c1);
    r.a0 = c->a1;
    r.a1 = c->a0;
    return r;
}

/* Pieces short enough for a 16-point rule to integrate arc length to rounding. */
static int smooth_pieces(const utw_curve *c)
{
    if (c->kind == UTW_LINE) return 1;
    if (c->kind == UTW_CUBIC) return 16;
    const double nu = utw_norm(c->u), nv = utw_norm(c->v), ratio = fmax(nu, nv) / fmin(nu, nv);
    const int eighths = (int)ceil(fabs(c->a1 - c->a0) / (UTW_PI / 4));
    return (eighths < 1 ? 1 : eighths) * (ratio < 1.5 ? 1 : ratio < 8 ? 4 : 16);
}

double utw_curve_length(const utw_curve *c)
{
    if (c->kind == UTW_LINE) return utw_distance(c->from, c->to);
    double x[16], w[16], sum = 0;
    utw_gauss(16, x, w);
    const int n = smooth_pieces(c);
    for (int i = 0; i < n; i++)
        for (int q = 0; q < 16; q++) {
            double d[2];
            utw_curve_d1(c, (i + x[q]) / n, d);
            sum += w[q] * utw_norm(d) / n;
        }
    return sum;
}

double utw_curve_turning(const utw_curve *c)
{
    if (c->kind == UTW_LINE) return 0;
    enum { STEPS = 32 };
    double d0[2], sum = 0;
    utw_curve_d1(c, 0, d0);
    for (int i = 1; i <= STEPS; i++) {
        double d1[2];
        utw_curve_d1(c, (double)i / STEPS, d1);
        sum += fabs(atan2(utw_cross(d0, d1), utw_dot(d0, d1)));
        copy2(d0, d1);
    }
    return sum;
}

static void box_add(double box[4], const double p[2])
{
    box[0] = fmin(box[0], p[0]);
    box[1] = fmin(box[1], p[1]);
    box[2] = fmax(box[2], p[0]);
    box[3] = fmax(box[3], p[1]);
}

static void box_add_at(double box[4], const utw_curve *c, double t)
{
    double p[2];
    if (!(t > 0 && t < 1)) return;
    utw_curve_point(c, t, p);
    box_add(box, p);
}

/* Parameters where a coordinate of a cubic is stationary: a t^2 + b t + c = 0. */
static void box_add_cubic(double box[4], const utw_curve *curve, int k)
{
    const double d0 = curve->c1[k] - curve->from[k], d1 = curve->c2[k] - curve->c1[k],
                 d2 = curve->to[k] - curve->c2[k];
    const double a = d0 - 2 * d1 + d2, b = 2 * (d1 - d0), disc = b * b - 4 * a * d0;
    if (disc < 0) return;
    const double q = -0.5 * (b + copysign(sqrt(disc), b)); /* the stable form of the two roots */
    if (a != 0) box_add_at(box, curve, q / a);
    if (q != 0) box_add_at(box, curve, d0 / q);
}

void utw_curve_box(const utw_curve *c, double box[4])
{
    box[0] = box[2] = c->from[0];
    box[1] = box[3] = c->from[1];
    box_add(box, c->to);
    for (int k = 0; k < 2; k++) {
        if (c->kind == UTW_CUBIC) box_add_cubic(box, c, k);
        if (c->kind == UTW_ARC) {
            /* u cos a + v sin a is extreme where tan a = v/u, twice a turn */
            const double a = atan2(c->v[k], c->u[k]);
            for (int turn = -8; turn <= 8; turn++)
                box_add_at(box, c, (a + turn * UTW_PI - c->a0) / (c->a1 - c->a0));
        }
    }
}
