/* SPDX-License-Identifier: GPL-3.0-or-later
 * A number with its bounds as text: as many digits as the bounds make sure. */
#include "report/number.h"

#include <math.h>
#include <stdio.h>
#include <string.h>

enum {
    EXACT_DIGITS = 9, /* of an exact value: more than any drawing holds */
    BOUND_DIGITS = 10,
    LONE_DIGITS = 3, /* of a value one of whose bounds is missing */
    /* plain notation from 10^-4 to below 10^8 */
    LEAST_PLAIN = -4,
    GREATEST_PLAIN = 7
};

/* How the numbers of one row are written. */
typedef struct notation {
    int scientific, exponent;
} notation;

static notation notation_for(double greatest)
{
    const int first = utw_decimal_place(greatest);
    const int plain = greatest == 0 || (first >= LEAST_PLAIN && first <= GREATEST_PLAIN);
    return (notation){!plain, first};
}

static void write(double x, int place, utw_rounding rounding, notation n, char *text)
{
    if (!isfinite(x))
        snprintf(text, UTW_DECIMAL_LENGTH, "none");
    else
        utw_decimal_write(utw_decimal_count(x, place, rounding), place, n.scientific, n.exponent,
                          text);
}

/* Zeros at the end of a fraction tell nothing of an exact value. */
static void drop_zeros(char *text)
{
    char *point = strchr(text, '.');
    if (point == NULL) return;
    char *end = point + strcspn(point, "e"), *last = end;
    while (last[-1] == '0') last--;
    if (last[-1] == '.') last--;
    memmove(last, end, strlen(end) + 1);
}

static void write_exact(double x, double noise, utw_number *number)
{
    if (fabs(x) <= noise) x = 0;
    const int place = utw_decimal_place(x) - EXACT_DIGITS + 1;
    /* rounding may carry: 99999999.96 has nine digits before the point */
    const double rounded = utw_decimal_value(utw_decimal_count(x, place, UTW_NEAREST), place);
    write(x, place, UTW_NEAREST, notation_for(fabs(rounded)), number->value);
    drop_zeros(number->value);
    number->low[0] = number->high[0] = '\0';
}

/* The place down to which the value is written: from the first digit of the width on, until the
 * written value lies between the bounds. */
static int place_of_value(const utw_quantity *q, int width_place, int least)
{
    int place = width_place < least ? least : width_place;
    for (; place > least; place--) {
        const double x = utw_decimal_value(utw_decimal_count(q->value, place, UTW_NEAREST), place);
        if (x >= q->low && x <= q->high) break;
    }
    return place;
}

void utw_number_write(const utw_quantity *q, double noise, utw_number *number)
{
    if (!isfinite(q->value)) {
        snprintf(number->value, sizeof number->value, "none");
        number->low[0] = number->high[0] = '\0';
        return;
    }
    if (q->trust == UTW_EXACT) {
        write_exact(q->value, noise, number);
        return;
    }
    double greatest = fabs(q->value);
    if (isfinite(q->low)) greatest = fmax(greatest, fabs(q->low));
    if (isfinite(q->high)) greatest = fmax(greatest, fabs(q->high));
    const double width = q->high - q->low;
    const int first = utw_decimal_place(greatest), least = first - BOUND_DIGITS + 1;
    int place = first - LONE_DIGITS + 1, bounds = place;
    if (isfinite(width)) {
        int wide = width > 0 ? utw_decimal_place(width) : least;
        if (wide > first) wide = first;
        place = place_of_value(q, wide, least);
        bounds = wide - 1 > place ? place : wide - 1;
        if (bounds < least) bounds = least;
    }
    /* of the rounded number, as rounding may carry: 9.96 is written 10.0 */
    greatest = utw_decimal_value(utw_decimal_count(greatest, bounds, UTW_UP), bounds);
    const notation n = notation_for(greatest);
    write(q->value, place, UTW_NEAREST, n, number->value);
    write(q->low, bounds, UTW_DOWN, n, number->low);
    write(q->high, bounds, UTW_UP, n, number->high);
}
