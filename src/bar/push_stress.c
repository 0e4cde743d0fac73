/* SPDX-License-Identifier: GPL-3.0-or-later
 * The greatest stress of a pushed bar, and its window. */
#include "bar/push_stress.h"

#include <math.h>

#include "base/status.h"
#include "base/vec2.h"

/* How far along the bar between two stations a peak is looked for: flat at a peak, this leaves its
 * value to 1e-6. */
#define PRECISION 1e-3

/* An end of the window is found when the greatest stress there is the limit to this. */
#define FOUND 1e-7

/* Trials before giving up: each but the first few doubles the digits. */
enum { TRIALS = 200 };

typedef struct at_offset {
    const utw_push *push;
    double offset;
} at_offset;

static utw_status peaks_at(const at_offset *c, double z, utw_stress_peaks *peaks, utw_error *err)
{
    utw_push_state state;
    utw_pushed_at(&c->push->bar, z, c->offset, &state);
    return utw_stress_peaks_of(c->push->stress, &state.forces, peaks, err);
}

static utw_status von_mises_at(const void *context, double z, double *value, utw_error *err)
{
    utw_stress_peaks peaks;
    const utw_status st = peaks_at(context, z, &peaks, err);
    if (st == UTW_OK) *value = peaks.peak[UTW_VON_MISES].value;
    return st;
}

utw_status utw_push_worst(const utw_push *push, double offset, utw_worst *worst, utw_error *err)
{
    const at_offset c = {push, offset};
    utw_stress_peaks peaks;
    double z, value;
    utw_status st =
        utw_along_greatest(&push->stations, von_mises_at, &c, PRECISION, &z, &value, err);
    if (st == UTW_OK) st = peaks_at(&c, z, &peaks, err);
    if (st == UTW_OK) *worst = (utw_worst){peaks.peak[UTW_VON_MISES], z, peaks.unbounded};
    return st;
}

/* Square of the von Mises stress of one point of the bar: a e^2 + 2 b e + c. */
typedef struct parabola {
    double a, b, c;
} parabola;

/* That of the worst point, scaled to the worst stress itself: the place of a peak is told to about
 * 1e-6 of the section's size, and may fall to the neighbour of its element. */
static utw_status parabola_of(const utw_push *push, double offset, const utw_worst *worst,
                              parabola *p, utw_error *err)
{
    utw_push_state none, one;
    utw_stress_point bending, sum;
    utw_pushed_at(&push->bar, worst->z, 0, &none);
    utw_pushed_at(&push->bar, worst->z, 1, &one);
    utw_forces torsion = {.T = one.forces.T, .B = one.forces.B};
    utw_status st = utw_stress_at(push->stress, &none.forces, worst->peak.at, &bending, err);
    if (st == UTW_OK) st = utw_stress_at(push->stress, &torsion, worst->peak.at, &sum, err);
    if (st != UTW_OK) return st;
    const double tb[2] = {bending.tau_xz, bending.tau_yz}, tt[2] = {sum.tau_xz, sum.tau_yz};
    p->a = sum.sigma_z * sum.sigma_z + 3 * utw_dot(tt, tt);
    p->b = bending.sigma_z * sum.sigma_z + 3 * utw_dot(tb, tt);
    p->c = bending.sigma_z * bending.sigma_z + 3 * utw_dot(tb, tb);
    const double here = (p->a * offset + 2 * p->b) * offset + p->c;
    const double scale = here > 0 ? worst->peak.value * worst->peak.value / here : 1;
    *p = (parabola){scale * p->a, scale * p->b, scale * p->c};
    return UTW_OK;
}

/* What is left of a window, and the errors of the stresses its ends were set by. */
typedef struct search {
    const utw_push *push;
    double limit;
    int empty;
    double low, high, low_error, high_error;
} search;

/* Leave what the parabola allows: |e + b/a| <= sqrt((b/a)^2 + (limit^2 - c)/a). */
static void cut(search *s, const parabola *p, double stress_error)
{
    const double rest = s->limit * s->limit - p->c;
    if (!(p->a > 0)) {
        if (rest < 0) s->empty = 1;
        return;
    }
    const double centre = -p->b / p->a, half2 = centre * centre + rest / p->a;
    if (half2 < 0) {
        s->empty = 1;
        return;
    }
    /* d(stress)/de at the end is a half/limit */
    const double half = sqrt(half2), error = stress_error * s->limit / (p->a * half);
    if (centre + half < s->high) s->high = centre + half, s->high_error = error;
    if (centre - half > s->low) s->low = centre - half, s->low_error = error;
    if (s->low > s->high) s->empty = 1;
}

/* Try an offset: *within = 1 when the stress there is the limit or less. */
static utw_status try(search *s, double offset, int *within, utw_error *err)
{
    utw_worst worst;
    parabola p;
    utw_status st = utw_push_worst(s->push, offset, &worst, err);
    if (st == UTW_OK) st = parabola_of(s->push, offset, &worst, &p, err);
    if (st != UTW_OK) return st;
    *within = worst.peak.value <= s->limit * (1 + FOUND);
    cut(s, &p, worst.peak.error);
    return UTW_OK;
}

/* One end: side 1 the upper, -1 the lower. */
static utw_status settle(search *s, int side, utw_error *err)
{
    double far = s->push->result.size;
    for (int i = 0; i < TRIALS && !s->empty; i++) {
        const double end = side > 0 ? s->high : s->low;
        int within = 0;
        if (!isfinite(end) && !isfinite(far)) return UTW_OK; /* nowhere too much: no end */
        const utw_status st = try(s, isfinite(end) ? end : side * far, &within, err);
        if (st != UTW_OK) return st;
        if (within && isfinite(end)) return UTW_OK;
        far *= 8;
    }
    return s->empty ? UTW_OK
                    : utw_fail(err, UTW_E_INTERNAL,
                               "the load window of the stress limit %g was not found", s->limit);
}

utw_status utw_push_stress_window(const utw_push *push, double limit, utw_load_window *window,
                                  utw_error *err)
{
    search s = {push, limit, 0, -HUGE_VAL, HUGE_VAL, 0, 0};
    int within;
    utw_status st = try(&s, 0, &within, err);
    if (st == UTW_OK) st = settle(&s, 1, err);
    if (st == UTW_OK) st = settle(&s, -1, err);
    if (st == UTW_OK) st = settle(&s, 1, err); /* the lower end's trials may have cut it */
    if (st != UTW_OK) return st;
    *window = (utw_load_window){.limited = 1, .limit = limit, .empty = s.empty};
    window->from = s.empty ? UTW_NAN : s.low;
    window->to = s.empty ? UTW_NAN : s.high;
    window->error = s.empty ? 0 : fmax(s.low_error, s.high_error);
    return UTW_OK;
}
