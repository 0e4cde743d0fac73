/* SPDX-License-Identifier: GPL-3.0-or-later
 * Fitting cubics by geometric Hermite interpolation. */
#include "outline/fit.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

/* Between samples a cubic may be farther off than at them (measured: by less than a quarter). */
#define MARGIN 0.75

enum { DEEPEST = 20, SAMPLES = 7 }; /* halvings: a millionth of the curve */

/* What a cubic takes over from the curve at one of its ends. */
typedef struct end {
    double s, p[2], u[2]; /* parameter, point, unit tangent in the direction run */
    double speed;         /* |dp/ds| */
    double curvature;     /* positive to the left of the direction run */
} end;

static end end_at(utw_fit_curve f, const void *context, double s, double direction)
{
    end e = {.s = s};
    double d1[2], d2[2];
    f(context, s, e.p, d1, d2);
    e.speed = utw_norm(d1);
    for (int k = 0; k < 2; k++) e.u[k] = direction * d1[k] / e.speed;
    e.curvature = direction * utw_cross(d1, d2) / (e.speed * e.speed * e.speed);
    return e;
}

static utw_curve cubic(const end *a, const end *b, double h0, double h1)
{
    const double c1[2] = {a->p[0] + h0 * a->u[0], a->p[1] + h0 * a->u[1]};
    const double c2[2] = {b->p[0] - h1 * b->u[0], b->p[1] - h1 * b->u[1]};
    return utw_curve_cubic(a->p, c1, c2, b->p);
}

/* Handle lengths h that give the end curvatures, by Newton's iteration on de Boor, Hoellig and
 * Sabin's (3.2): (u0 x u1) h0 = (c x u1) - 3/2 k1 h1^2,  (u0 x u1) h1 = (u0 x c) - 3/2 k0 h0^2,
 * with c the chord. Returns 0 when there is no sensible solution. */
static int handles(const end *a, const end *b, double h[2])
{
    const double c[2] = {b->p[0] - a->p[0], b->p[1] - a->p[1]}, length = utw_norm(c);
    const double turn = utw_cross(a->u, b->u), x0 = utw_cross(c, b->u), x1 = utw_cross(a->u, c);
    h[0] = h[1] = length / 3;
    for (int i = 0; i < 20; i++) {
        const double f0 = turn * h[0] - x0 + 1.5 * b->curvature * h[1] * h[1];
        const double f1 = turn * h[1] - x1 + 1.5 * a->curvature * h[0] * h[0];
        const double p = 3 * b->curvature * h[1], q = 3 * a->curvature * h[0];
        const double det = turn * turn - p * q;
        if (!(fabs(det) > 1e-12)) return 0;
        const double d0 = (turn * f0 - p * f1) / det, d1 = (turn * f1 - q * f0) / det;
        h[0] -= d0;
        h[1] -= d1;
        if (fabs(d0) + fabs(d1) < 1e-13 * length) break;
    }
    return h[0] > 0.1 * length && h[0] < length && h[1] > 0.1 * length && h[1] < length;
}

/* Points of a piece of the curve, and the parameters of the cubic next to them. */
typedef struct samples {
    double p[SAMPLES][2], t[SAMPLES];
} samples;

/* The parameter of a cubic nearest to p, from a guess, by Newton's iteration. */
static double nearest(const utw_curve *c, const double p[2], double t)
{
    for (int i = 0; i < 4; i++) {
        double q[2], d1[2], d2[2];
        utw_curve_point(c, t, q);
        utw_curve_d1(c, t, d1);
        utw_curve_d2(c, t, d2);
        const double r[2] = {q[0] - p[0], q[1] - p[1]};
        const double slope = utw_dot(d1, d1) + utw_dot(r, d2), step = utw_dot(r, d1) / slope;
        if (!(slope > 0)) break;
        t -= step;
        t = t < 0 ? 0 : t > 1 ? 1 : t;
        if (fabs(step) < 1e-4) break; /* the distance is right to the square of that */
    }
    return t;
}

/* How far the cubic is off at the samples, whose parameters are brought up to date. */
static double deviation(const utw_curve *c, samples *x)
{
    double worst = 0;
    for (int i = 0; i < SAMPLES; i++) {
        double q[2];
        x->t[i] = nearest(c, x->p[i], x->t[i]);
        utw_curve_point(c, x->t[i], q);
        const double off = utw_distance(x->p[i], q);
        worst = off <= worst ? worst : off; /* a NaN stays */
    }
    return worst;
}

/* Handle lengths that bring the cubic nearer to the samples across it, by a step of Gauss and
 * Newton. Returns 0 when they do not matter (a straight piece) or would turn over. */
static int step_handles(const end *a, const end *b, const utw_curve *c, const samples *x,
                        double h[2])
{
    double m[3] = {0, 0, 0}, g[2] = {0, 0};
    for (int i = 0; i < SAMPLES; i++) {
        double q[2], d[2];
        const double t = x->t[i], s = 1 - t;
        utw_curve_point(c, t, q);
        utw_curve_d1(c, t, d);
        const double v = utw_norm(d), n[2] = {-d[1] / v, d[0] / v},
                     r[2] = {q[0] - x->p[i][0], q[1] - x->p[i][1]};
        const double j0 = 3 * s * s * t * utw_dot(n, a->u), j1 = -3 * s * t * t * utw_dot(n, b->u),
                     off = utw_dot(n, r);
        m[0] += j0 * j0, m[1] += j0 * j1, m[2] += j1 * j1;
        g[0] += j0 * off, g[1] += j1 * off;
    }
    const double det = m[0] * m[2] - m[1] * m[1];
    if (!(det > 1e-6 * m[0] * m[2]) || !(m[0] > 1e-10 && m[2] > 1e-10)) return 0;
    h[0] -= (g[0] * m[2] - g[1] * m[1]) / det;
    h[1] -= (g[1] * m[0] - g[0] * m[1]) / det;
    return h[0] > 0 && h[1] > 0;
}

/* The best cubic found between two ends, and how far it is off. */
static double try_piece(utw_fit_curve f, const void *context, const end *a, const end *b,
                        double tolerance, utw_curve *curve)
{
    const double step = fabs(b->s - a->s) / 3;
    double h[2] = {step * a->speed, step * b->speed}, g[2], d1[2], d2[2];
    samples x, y;
    for (int i = 0; i < SAMPLES; i++) {
        x.t[i] = (double)(i + 1) / (SAMPLES + 1);
        f(context, a->s + x.t[i] * (b->s - a->s), x.p[i], d1, d2);
    }
    y = x;
    *curve = cubic(a, b, h[0], h[1]);
    double off = deviation(curve, &x);
    if (handles(a, b, g)) {
        const utw_curve other = cubic(a, b, g[0], g[1]);
        const double other_off = deviation(&other, &y);
        if (other_off < off) {
            off = other_off;
            *curve = other;
            x = y;
            memcpy(h, g, sizeof h);
        }
    }
    for (int i = 0; i < 6 && off > 0.5 * tolerance; i++) {
        y = x;
        memcpy(g, h, sizeof g);
        if (!step_handles(a, b, curve, &y, g)) break;
        const utw_curve other = cubic(a, b, g[0], g[1]);
        const double other_off = deviation(&other, &y);
        if (!(other_off < 0.9 * off)) break;
        off = other_off;
        *curve = other;
        x = y;
        memcpy(h, g, sizeof h);
    }
    return off;
}

utw_status utw_fit_append(utw_fit *fit, utw_curve curve, utw_error *err)
{
    void *array = fit->curve;
    if (utw_grow(&array, &fit->capacity, fit->n + 1, sizeof *fit->curve) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%zu curves)", fit->n);
    fit->curve = array;
    fit->curve[fit->n++] = curve;
    return UTW_OK;
}

utw_status utw_fit_cubics(utw_fit_curve f, const void *context, double s0, double s1,
                          const double from[2], const double to[2], double tolerance, utw_fit *fit,
                          utw_error *err)
{
    const double direction = s1 > s0 ? 1 : -1;
    end stack[DEEPEST + 2]; /* ends still to be reached, the nearest last */
    int n = 1, depth[DEEPEST + 2] = {0};
    end here = end_at(f, context, s0, direction);
    stack[0] = end_at(f, context, s1, direction);
    memcpy(here.p, from, sizeof here.p);
    memcpy(stack[0].p, to, sizeof here.p);
    while (n > 0) {
        utw_curve curve;
        const end *next = &stack[n - 1];
        if (try_piece(f, context, &here, next, MARGIN * tolerance, &curve) <= MARGIN * tolerance) {
            const utw_status st = utw_fit_append(fit, curve, err);
            if (st != UTW_OK) return st;
            here = *next;
            n--;
            continue;
        }
        if (depth[n - 1] == DEEPEST)
            return utw_fail(err, UTW_E_OUTLINE,
                            "a curve cannot be followed near (%.6g, %.6g): it is not smooth there",
                            here.p[0], here.p[1]);
        depth[n - 1]++;
        depth[n] = depth[n - 1];
        stack[n] = end_at(f, context, 0.5 * (here.s + next->s), direction);
        n++;
    }
    return UTW_OK;
}
