/* SPDX-License-Identifier: GPL-3.0-or-later
 * Monotone pieces of curves and their crossings with the lines x = c and y = c. */
#include "outline/level.h"

#include "base/vec2.h"

static void add(double *t, int *n, double value)
{
    if (value > 0 && value < 1 && *n < UTW_MONOTONE_MAX - 1) t[++*n] = value;
}

static void sort(double *t, int n)
{
    for (int i = 1; i < n; i++)
        for (int j = i; j > 0 && t[j] < t[j - 1]; j--) {
            const double swap = t[j];
            t[j] = t[j - 1];
            t[j - 1] = swap;
        }
}

int utw_curve_monotone(const utw_curve *c, int k, double t[UTW_MONOTONE_MAX + 1])
{
    int n = 0; /* interior parameters so far, in t[1..n] */
    t[0] = 0;
    if (c->kind == UTW_ARC) {
        /* d/da (u cos a + v sin a) = 0 where tan a = v/u: every half turn */
        const double first = atan2(c->v[k], c->u[k]), span = c->a1 - c->a0;
        const double low = fmin(c->a0, c->a1), high = fmax(c->a0, c->a1);
        for (double m = ceil((low - first) / UTW_PI); first + m * UTW_PI < high; m++) {
            if (n >= UTW_MONOTONE_MAX - 1) break;
            add(t, &n, (first + m * UTW_PI - c->a0) / span);
        }
    } else if (c->kind == UTW_CUBIC) {
        const double d0 = c->c1[k] - c->from[k], d1 = c->c2[k] - c->c1[k], d2 = c->to[k] - c->c2[k];
        const double a = d0 - 2 * d1 + d2, b = 2 * (d1 - d0), disc = b * b - 4 * a * d0;
        if (disc > 0) {
            const double q =
                -0.5 * (b + copysign(sqrt(disc), b)); /* the stable form of the roots */
            if (a != 0) add(t, &n, q / a);
            if (q != 0) add(t, &n, d0 / q);
        }
    }
    sort(t + 1, n);
    t[n + 1] = 1;
    return n + 1;
}

static double height(const utw_curve *c, int k, double t)
{
    double p[2];
    utw_curve_point(c, t, p);
    return p[k];
}

double utw_curve_at_level(const utw_curve *c, int k, double level, double t0, double t1)
{
    double lo = t0, hi = t1, f_lo = height(c, k, t0) - level, f_hi = height(c, k, t1) - level;
    if (f_lo == 0) return t0;
    if (f_hi == 0) return t1;
    if ((f_lo < 0) == (f_hi < 0)) return fabs(f_lo) <= fabs(f_hi) ? t0 : t1;
    double t = t0 + (t1 - t0) * (f_lo / (f_lo - f_hi));
    if (c->kind == UTW_LINE) return t;
    for (int step = 0; step < 200; step++) {
        const double f = height(c, k, t) - level;
        if (f == 0) break;
        if ((f < 0) == (f_lo < 0))
            lo = t;
        else
            hi = t;
        double d[2];
        utw_curve_d1(c, t, d);
        double next = t - f / d[k];
        if (!(next > lo && next < hi) || step % 8 == 7) next = 0.5 * (lo + hi);
        if (fabs(next - t) <= 1e-16 || !(next > lo && next < hi)) break;
        t = next;
    }
    return t;
}
