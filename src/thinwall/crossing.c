/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where a thickness study crosses its limit, in words. */
#include <math.h>

#include "base/decimal.h"
#include "thinwall/thickness.h"

/* A thickness, and its ratio to the longest plate. */
typedef struct place {
    double t, ratio;
} place;

static double size_at(const utw_study *s, int k, int i)
{
    return fabs(s->step[i].difference[k]);
}

static int is_within(const utw_study *s, int k, int i)
{
    return size_at(s, k, i) <= s->limit; /* no number is not within */
}

static place at_step(const utw_study *s, int i)
{
    return (place){s->step[i].open.thickness, s->step[i].open.ratio};
}

/* Where the size of the difference is the limit, between a step and the next. */
static place crossing(const utw_study *s, int k, int i)
{
    const double a = size_at(s, k, i), b = size_at(s, k, i + 1);
    const place p = at_step(s, i), q = at_step(s, i + 1);
    const double u = (s->limit - a) / (b - a);
    return (place){p.t + u * (q.t - p.t), p.ratio + u * (q.ratio - p.ratio)};
}

static void add_place(utw_text *text, place p, const char *unit)
{
    char t[UTW_DECIMAL_LENGTH], ratio[UTW_DECIMAL_LENGTH];
    utw_decimal_short(p.t, 3, t);
    utw_decimal_short(p.ratio, 2, ratio);
    utw_text_add(text, "t = %s %s (t/b = %s)", t, unit, ratio);
}

/* One stretch of steps within the limit, first .. last. */
static void add_stretch(const utw_study *s, int k, int first, int last, const char *unit,
                        utw_text *text)
{
    const int from_start = first == 0 || !isfinite(size_at(s, k, first - 1)),
              to_end = last + 1 == s->n || !isfinite(size_at(s, k, last + 1));
    if (!from_start) {
        utw_text_add(text, "from ");
        add_place(text, crossing(s, k, first - 1), unit);
        if (!to_end) utw_text_add(text, " ");
    } else if (first > 0) {
        utw_text_add(text, "from ");
        add_place(text, at_step(s, first), unit);
        if (!to_end) utw_text_add(text, " ");
    }
    if (to_end) {
        if (!from_start || first > 0) utw_text_add(text, " on");
        return;
    }
    utw_text_add(text, "%s", from_start && first == 0 ? "up to " : "to ");
    add_place(text, crossing(s, k, last), unit);
}

void utw_statement_write(const utw_study *s, int k, const char *unit, utw_text *text)
{
    char percent[UTW_DECIMAL_LENGTH];
    int known = 0, within = 0, stretches = 0;
    for (int i = 0; i < s->n; i++) {
        known += isfinite(size_at(s, k, i));
        within += is_within(s, k, i);
    }
    if (known == 0) return;
    utw_decimal_short(100 * s->limit, 4, percent);
    utw_text_add(text, "%s: ", utw_constant_key(utw_compared_constant(k)));
    if (within == known) {
        utw_text_add(text, "within %s %% at every thickness studied", percent);
        return;
    }
    if (within == 0) {
        utw_text_add(text, "outside %s %% at every thickness studied", percent);
        return;
    }
    utw_text_add(text, "within %s %% ", percent);
    for (int i = 0, last; i < s->n; i = last + 1) {
        last = i;
        if (!is_within(s, k, i)) continue;
        while (last + 1 < s->n && is_within(s, k, last + 1)) last++;
        if (stretches++ > 0) utw_text_add(text, ", and ");
        add_stretch(s, k, i, last, unit, text);
    }
}
