/* SPDX-License-Identifier: GPL-3.0-or-later
 * Plastic neutral axis and plastic modulus by cutting the boundary at a level. */
#include "section/plastic.h"

#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "base/gauss.h"
#include "base/memory.h"
#include "base/status.h"
#include "outline/level.h"

/* A piece of a curve along which the level (coordinate k) only rises or only falls. */
typedef struct piece {
    const utw_curve *curve;
    double weight;
    double t0, t1;
    double low, high;    /* levels of its ends, ascending */
    double area, moment; /* w int x dy, w int x y dy over all of it, for k = 1 */
} piece;

typedef struct slicing {
    int k, n, n_level;
    piece *piece;        /* [n], owned */
    double *level;       /* [n_level], owned, ascending: where pieces end */
    double area, moment; /* of the whole section */
} slicing;

/* What lies below a level: area, first moment about level 0, and the width of the section at the
 * level. */
typedef struct slice {
    double area, moment, width;
} slice;

/* Integrals over t0..t1 of a curve: int x dy, int x y dy for k = 1; -int y dx, -int y x dx for k =
 * 0. */
static void integrate(const utw_curve *c, int k, double t0, double t1, double *area, double *moment)
{
    /* degree of the integrand along a line 2, a cubic 8; an arc is at most half a turn long here */
    double x[18], w[18];
    const int n = c->kind == UTW_LINE ? 2 : c->kind == UTW_CUBIC ? 5 : 18;
    utw_gauss(n, x, w);
    const double sign = k == 1 ? 1 : -1;
    *area = *moment = 0;
    for (int q = 0; q < n; q++) {
        double p[2], d[2];
        utw_curve_point(c, t0 + (t1 - t0) * x[q], p);
        utw_curve_d1(c, t0 + (t1 - t0) * x[q], d);
        const double strip = sign * w[q] * (t1 - t0) * p[1 - k] * d[k];
        *area += strip;
        *moment += strip * p[k];
    }
}

static slice slice_at(const slicing *x, double level)
{
    utw_sum area = {0, 0}, moment = {0, 0}, width = {0, 0};
    for (int i = 0; i < x->n; i++) {
        const piece *s = &x->piece[i];
        if (s->low >= level) continue;
        if (s->high <= level) {
            utw_sum_add(&area, s->area);
            utw_sum_add(&moment, s->moment);
            continue;
        }
        const double t = utw_curve_at_level(s->curve, x->k, level, s->t0, s->t1);
        double a, m, p[2];
        utw_curve_point(s->curve, s->t0, p);
        const int rises = p[x->k] < level;
        integrate(s->curve, x->k, rises ? s->t0 : t, rises ? t : s->t1, &a, &m);
        utw_curve_point(s->curve, t, p);
        utw_sum_add(&area, s->weight * a);
        utw_sum_add(&moment, s->weight * m);
        /* material lies left of the curve: a rising curve bounds the strip at large x, for k = 1 */
        utw_sum_add(&width, s->weight * (rises == (x->k == 1) ? p[1 - x->k] : -p[1 - x->k]));
    }
    return (slice){utw_sum_value(&area), utw_sum_value(&moment), utw_sum_value(&width)};
}

static int ascending(const void *a, const void *b)
{
    const double *p = a, *q = b;
    return (*p > *q) - (*p < *q);
}

static utw_status slicing_init(slicing *x, const utw_boundary *b, int k, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const size_t room = (size_t)b->n * UTW_MONOTONE_MAX;
    utw_sum area = {0, 0}, moment = {0, 0};
    x->k = k;
    UTW_TRY_ALLOC(x->piece = utw_alloc(room, sizeof *x->piece));
    UTW_TRY_ALLOC(x->level = utw_alloc(2 * room, sizeof *x->level));
    for (int i = 0; i < b->n; i++) {
        const utw_curve *c = &b->curve[i];
        double t[UTW_MONOTONE_MAX + 1];
        const int n = utw_curve_monotone(c, k, t);
        for (int j = 0; j < n; j++) {
            piece *s = &x->piece[x->n];
            double p[2], q[2];
            utw_curve_point(c, t[j], p);
            utw_curve_point(c, t[j + 1], q);
            *s = (piece){c, b->weight[i], t[j], t[j + 1], fmin(p[k], q[k]), fmax(p[k], q[k]), 0, 0};
            x->level[x->n_level++] = p[k];
            integrate(c, k, s->t0, s->t1, &s->area, &s->moment);
            s->area *= s->weight;
            s->moment *= s->weight;
            utw_sum_add(&area, s->area);
            utw_sum_add(&moment, s->moment);
            x->n++;
        }
    }
    x->area = utw_sum_value(&area);
    x->moment = utw_sum_value(&moment);
    qsort(x->level, (size_t)x->n_level, sizeof *x->level, ascending);
    st = UTW_OK;
done:
    return st;
}

static void slicing_clear(slicing *x)
{
    utw_free(x->piece);
    utw_free(x->level);
}

/* Levels that differ by rounding become one. */
static void merge_levels(slicing *x)
{
    const double same = 1e-13 * (x->level[x->n_level - 1] - x->level[0]);
    int n = 1;
    for (int i = 1; i < x->n_level; i++)
        if (x->level[i] - x->level[n - 1] > same) x->level[n++] = x->level[i];
    x->n_level = n;
}

/* int w |y - level| dA = (moment above - level area above) + (level area below - moment below). */
static double modulus_at(const slicing *x, double level)
{
    const slice s = slice_at(x, level);
    return (x->moment - level * x->area) + 2 * (level * s.area - s.moment);
}

/* The level between `low` and `high`, where nothing but smooth curves is crossed, with half the
 * area below. */
static double find_level(const slicing *x, double low, double high)
{
    double level = 0.5 * (low + high);
    const double rounding = 1e-16 * (x->level[x->n_level - 1] - x->level[0]);
    for (int step = 0; step < 200; step++) {
        const slice s = slice_at(x, level);
        const double excess = s.area - 0.5 * x->area;
        if (excess == 0) break;
        if (excess < 0)
            low = level;
        else
            high = level;
        double next = level - excess / s.width;
        if (!(next > low && next < high) || step % 8 == 7) next = 0.5 * (low + high);
        const double move = fabs(next - level);
        level = next;
        if (move <= rounding || high - low <= rounding) break;
    }
    return level;
}

static void find_axis(const slicing *x, double *level, double *modulus)
{
    const double half = 0.5 * x->area, equal = 1e-10 * x->area;
    /* the lowest level with at least half the area below it, to the accuracy `equal` */
    int low = 0, high = x->n_level - 1;
    while (low < high) {
        const int middle = low + (high - low) / 2;
        if (slice_at(x, x->level[middle]).area >= half - equal)
            high = middle;
        else
            low = middle + 1;
    }
    const double at = x->level[high];
    const double excess = slice_at(x, at).area - half;
    if (fabs(excess) <= equal && high + 1 < x->n_level) {
        const double next = x->level[high + 1], middle = 0.5 * (at + next);
        if (slice_at(x, middle).width <= 1e-12 * x->area / (next - at)) {
            /* an empty gap; the modulus is taken at its edge toward the exact half */
            *level = middle;
            *modulus = modulus_at(x, excess > 0 ? at : next);
            return;
        }
    }
    /* a half that is reached just above this level, within `equal`, lies in the next interval */
    if (excess < 0 && high + 1 < x->n_level)
        *level = find_level(x, at, x->level[high + 1]);
    else
        *level = high > 0 ? find_level(x, x->level[high - 1], at) : at;
    *modulus = modulus_at(x, *level);
}

utw_status utw_plastic_axis(const utw_boundary *boundary, int k, double *level, double *modulus,
                            utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    slicing x = {.n = 0};
    UTW_TRY(slicing_init(&x, boundary, k, err));
    merge_levels(&x);
    find_axis(&x, level, modulus);
    st = UTW_OK;
done:
    slicing_clear(&x);
    return st;
}
