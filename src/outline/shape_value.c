/* SPDX-License-Identifier: GPL-3.0-or-later
 * Dimensions of a trade shape: each by itself, and against the limits that follow from others. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/status.h"
#include "base/vec2.h"
#include "outline/shape.h"

/* ---- one value at a time ---- */

static utw_status check_value(const utw_shape *shape, int k, double value, utw_error *err)
{
    const utw_shape_dimension *d = &shape->dimension[k];
    if (!isfinite(value))
        return utw_fail(err, UTW_E_OUTLINE, "%s: %s is not a finite number", shape->name, d->key);
    if (d->unit == UTW_SHAPE_IN_COUNT && value != floor(value))
        return utw_fail(err, UTW_E_OUTLINE, "%s: %s = %.10g must be a whole number", shape->name,
                        d->key, value);
    if (value < d->least || (d->more && value == d->least))
        return utw_fail(err, UTW_E_OUTLINE, "%s: %s = %.10g must be %s %.10g", shape->name, d->key,
                        value, d->more ? "more than" : "at least", d->least);
    if (value > d->greatest)
        return utw_fail(err, UTW_E_OUTLINE, "%s: %s = %.10g must be at most %.10g", shape->name,
                        d->key, value, d->greatest);
    return UTW_OK;
}

static int find_dimension(const utw_shape *shape, const char *key)
{
    for (int k = 0; k < shape->n_dimension; k++)
        if (strcmp(shape->dimension[k].key, key) == 0) return k;
    return -1;
}

static utw_status unknown_dimension(const utw_shape *shape, const char *key, utw_error *err)
{
    utw_words w = {.n = 0};
    for (int k = 0; k < shape->n_dimension; k++)
        utw_words_add(&w, k > 0 ? ", " : "", shape->dimension[k].key);
    return utw_fail(err, UTW_E_SYNTAX, "%s: there is no dimension \"%.40s\"; it has %s",
                    shape->name, key, w.text);
}

utw_status utw_shape_collect(const utw_shape *shape, int n, const char *const *keys,
                             const double *values, utw_shape_case *given, utw_error *err)
{
    memset(given, 0, sizeof *given);
    given->shape = shape;
    for (int i = 0; i < n; i++) {
        const int k = keys[i] != NULL ? find_dimension(shape, keys[i]) : -1;
        if (k < 0) return unknown_dimension(shape, keys[i] != NULL ? keys[i] : "", err);
        if (given->given[k])
            return utw_fail(err, UTW_E_SYNTAX, "%s: %s is given twice", shape->name, keys[i]);
        const utw_status st = check_value(shape, k, values[i], err);
        if (st != UTW_OK) return st;
        given->given[k] = 1;
        given->value[k] = values[i];
    }
    for (int k = 0; k < shape->n_dimension; k++) {
        if (given->given[k]) continue;
        if (shape->dimension[k].required)
            return utw_fail(err, UTW_E_SYNTAX, "%s: %s (%s) is missing: it needs a value",
                            shape->name, shape->dimension[k].key, shape->dimension[k].meaning);
        given->value[k] = shape->dimension[k].fallback;
    }
    return UTW_OK;
}

/* ---- one value against others ---- */

/* Limits carry rounding: a value given to all its digits must not be refused for it. */
#define SLACK 1e-12

/* A limit in at most ten digits when it has no more, else in five, on the side on which it is kept
 * (side < 0: below) and not nearer than 1e-5 of it: what the message prints fits when it is typed
 * in, and no edge is left that is too short to be an edge. */
static void limit_text(double limit, int side, char *text, size_t n)
{
    snprintf(text, n, "%.10g", limit);
    if (fabs(strtod(text, NULL) - limit) <= SLACK * fabs(limit)) return;
    const double unit = pow(10, floor(log10(fabs(limit))) - 4),
                 kept = limit + side * 1e-5 * fabs(limit);
    snprintf(text, n, "%.5g", (side < 0 ? floor(kept / unit) : ceil(kept / unit)) * unit);
}

static utw_status refuse(const utw_shape_case *given, int k, const char *relation, double limit,
                         int side, unsigned with, utw_error *err)
{
    const utw_shape *shape = given->shape;
    char number[40];
    utw_words w = {.n = 0};
    for (int j = 0, n = 0; j < shape->n_dimension; j++) {
        if (!(with & UTW_DIM(j)) || j == k || isnan(given->value[j])) continue;
        snprintf(number, sizeof number, " = %.10g", given->value[j]);
        utw_words_add(&w, n++ == 0 ? " with " : ", ", shape->dimension[j].key);
        utw_words_add(&w, "", number);
    }
    limit_text(limit, side, number, sizeof number);
    return utw_fail(err, UTW_E_OUTLINE, "%s: %s = %.10g%s does not fit: %s %s%s", shape->name,
                    shape->dimension[k].key, given->value[k], given->given[k] ? "" : " (not given)",
                    relation, number, w.text);
}

utw_status utw_shape_refuse(const utw_shape_case *given, int k, double limit, unsigned with,
                            utw_error *err)
{
    return refuse(given, k, "at most", limit, -1, with, err);
}

utw_status utw_shape_need_less(const utw_shape_case *given, int k, double limit, unsigned with,
                               utw_error *err)
{
    if (given->value[k] < limit - SLACK * fabs(limit)) return UTW_OK;
    return refuse(given, k, "less than", limit, -1, with, err);
}

utw_status utw_shape_need_at_most(const utw_shape_case *given, int k, double limit, unsigned with,
                                  utw_error *err)
{
    if (given->value[k] <= limit + SLACK * fabs(limit)) return UTW_OK;
    return refuse(given, k, "at most", limit, -1, with, err);
}

utw_status utw_shape_need_more(const utw_shape_case *given, int k, double limit, unsigned with,
                               utw_error *err)
{
    if (given->value[k] > limit + SLACK * fabs(limit)) return UTW_OK;
    return refuse(given, k, "more than", limit, 1, with, err);
}

utw_status utw_shape_need_at_least(const utw_shape_case *given, int k, double limit, unsigned with,
                                   utw_error *err)
{
    if (given->value[k] >= limit - SLACK * fabs(limit)) return UTW_OK;
    return refuse(given, k, "at least", limit, 1, with, err);
}

utw_status utw_shape_slope(const utw_shape_case *given, int percent, int degrees, double *slope,
                           int *which, utw_error *err)
{
    if (given->given[percent] && given->given[degrees])
        return utw_fail(err, UTW_E_SYNTAX, "%s: %s and %s are both given: give one of them",
                        given->shape->name, given->shape->dimension[percent].key,
                        given->shape->dimension[degrees].key);
    *which = given->given[degrees] ? degrees : percent;
    *slope = given->given[degrees] ? tan(given->value[degrees] * (UTW_PI / 180))
                                   : given->value[percent] / 100;
    return UTW_OK;
}

double utw_shape_default(utw_shape_case *given, int k, double otherwise)
{
    if (isnan(given->value[k])) given->value[k] = otherwise;
    return given->value[k];
}

unsigned utw_shape_others(const utw_shape_case *given, int k)
{
    unsigned with = 0;
    for (int j = 0; j < given->shape->n_dimension; j++)
        if (j != k && given->given[j] && given->value[j] != 0) with |= UTW_DIM(j);
    return with;
}
