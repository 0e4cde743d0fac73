/* SPDX-License-Identifier: GPL-3.0-or-later
 * The greatest value of something along a bar. */
#include "bar/along.h"

#include <math.h>
#include <stdlib.h>

#include "base/vec2.h"

enum { EVEN = 16, FADING = 5 }; /* pieces of a span; stations more at either end */

static int ascending(const void *a, const void *b)
{
    const double x = *(const double *)a, y = *(const double *)b;
    return (x > y) - (x < y);
}

static void add_piece(utw_stations *s, double from, double to, double fade)
{
    const int first = s->n;
    const double span = to - from;
    for (int i = 0; i <= EVEN; i++) /* closer at the ends, as Chebyshev's points */
        s->z[s->n++] = i == 0      ? from
                       : i == EVEN ? to
                                   : from + span * (1 - cos(i * UTW_PI / EVEN)) / 2;
    double step = fade / 2;
    for (int i = 0; i < FADING; i++, step *= 2)
        if (step > 1e-9 * span && step < span / 4) {
            s->z[s->n++] = from + step;
            s->z[s->n++] = to - step;
        }
    qsort(s->z + first, (size_t)(s->n - first), sizeof s->z[0], ascending);
    for (int i = first; i < s->n; i++) s->begins[i] = i == first;
}

void utw_stations_spread(utw_stations *s, double length, double at, double fade)
{
    s->n = 0;
    if (at > 0 && at < length) {
        add_piece(s, 0, at, fade);
        add_piece(s, nextafter(at, length), length, fade);
    } else {
        add_piece(s, 0, length, fade);
    }
}

/* What is searched, and the best so far. */
typedef struct search {
    utw_along_function function;
    const void *context;
    double precision, z, value;
} search;

static utw_status try(search *s, double z, double *value, utw_error *err)
{
    const utw_status st = s->function(s->context, z, value, err);
    if (st == UTW_OK && *value > s->value) s->z = z, s->value = *value;
    return st;
}

/* Golden sections between two stations. */
static utw_status divide(search *s, double low, double high, utw_error *err)
{
    const double golden = (sqrt(5) - 1) / 2, width = high - low;
    double a = high - golden * width, b = low + golden * width, va, vb;
    utw_status st = try(s, a, &va, err);
    if (st == UTW_OK) st = try(s, b, &vb, err);
    while (st == UTW_OK && high - low > s->precision * width) {
        if (va > vb) {
            high = b, b = a, vb = va;
            a = high - golden * (high - low);
            st = try(s, a, &va, err);
        } else {
            low = a, a = b, va = vb;
            b = low + golden * (high - low);
            st = try(s, b, &vb, err);
        }
    }
    return st;
}

utw_status utw_along_greatest(const utw_stations *s, utw_along_function function,
                              const void *context, double precision, double *z, double *value,
                              utw_error *err)
{
    search best = {function, context, precision, 0, -HUGE_VAL};
    int at = 0;
    utw_status st = UTW_OK;
    for (int i = 0; i < s->n && st == UTW_OK; i++) {
        double v;
        st = try(&best, s->z[i], &v, err);
        if (st == UTW_OK && best.z == s->z[i]) at = i;
    }
    /* at a break the peak may lie on either side of it */
    const int left = s->begins[at] && at > 0 ? at - 1 : at;
    const int right = at + 1 < s->n && s->begins[at + 1] ? at + 1 : at;
    if (st == UTW_OK && left == right && at > 0 && at + 1 < s->n)
        st = divide(&best, s->z[at - 1], s->z[at + 1], err);
    else {
        if (st == UTW_OK && left > 0) st = divide(&best, s->z[left - 1], s->z[left], err);
        if (st == UTW_OK && right + 1 < s->n) st = divide(&best, s->z[right], s->z[right + 1], err);
    }
    if (st != UTW_OK) return st;
    *z = best.z;
    *value = best.value;
    return UTW_OK;
}
