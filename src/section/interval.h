/* SPDX-License-Identifier: GPL-3.0-or-later
 * Numbers with bounds. value is the best guess and lies in [low, high]. */
#ifndef UTW_SECTION_INTERVAL_H
#define UTW_SECTION_INTERVAL_H

#include <math.h>

typedef struct utw_interval {
    double value, low, high;
} utw_interval;

static inline utw_interval utw_exactly(double x)
{
    return (utw_interval){x, x, x};
}

static inline utw_interval utw_about(double x, double half)
{
    return (utw_interval){x, x - half, x + half};
}

static inline utw_interval utw_plus(utw_interval a, utw_interval b)
{
    return (utw_interval){a.value + b.value, a.low + b.low, a.high + b.high};
}

static inline utw_interval utw_times(double k, utw_interval a)
{
    return k >= 0 ? (utw_interval){k * a.value, k * a.low, k * a.high}
                  : (utw_interval){k * a.value, k * a.high, k * a.low};
}

static inline utw_interval utw_product(utw_interval a, utw_interval b)
{
    const double ll = a.low * b.low, lh = a.low * b.high, hl = a.high * b.low, hh = a.high * b.high;
    return (utw_interval){a.value * b.value, fmin(fmin(ll, lh), fmin(hl, hh)),
                          fmax(fmax(ll, lh), fmax(hl, hh))};
}

static inline utw_interval utw_square(utw_interval a)
{
    const double l = a.low * a.low, h = a.high * a.high;
    return (utw_interval){a.value * a.value, a.low <= 0 && a.high >= 0 ? 0 : fmin(l, h),
                          fmax(l, h)};
}

/** 1/a for a > 0; the high end is infinite when a may be zero. */
static inline utw_interval utw_inverse(utw_interval a)
{
    return (utw_interval){1 / a.value, 1 / a.high, a.low > 0 ? 1 / a.low : (double)INFINITY};
}

/** sqrt(a), negative parts taken as zero. */
static inline utw_interval utw_root(utw_interval a)
{
    return (utw_interval){sqrt(fmax(a.value, 0)), sqrt(fmax(a.low, 0)), sqrt(fmax(a.high, 0))};
}

/** a / b for a >= 0, b > 0. */
static inline utw_interval utw_quotient(utw_interval a, utw_interval b)
{
    return (utw_interval){a.value / b.value, a.low / b.high,
                          b.low > 0 ? a.high / b.low : (double)INFINITY};
}

#endif
