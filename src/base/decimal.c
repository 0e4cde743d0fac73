/* SPDX-License-Identifier: GPL-3.0-or-later
 * Numbers as decimal text, whatever the locale of the host program says of decimal points. */
#include "base/decimal.h"

#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

enum { LONGEST_FRACTION = 17 };

/* printf's decimal point is the locale's, of one byte or more: put a dot in its place. */
static void use_point(char *text)
{
    char *to = text;
    int inside = 0;
    for (const char *from = text; *from != '\0'; from++) {
        const int plain = strchr("0123456789+-eainf", *from) != NULL;
        if (plain) *to++ = *from;
        if (!plain && !inside) *to++ = '.';
        inside = !plain;
    }
    *to = '\0';
}

void utw_decimal_short(double x, int digits, char text[UTW_DECIMAL_LENGTH])
{
    snprintf(text, UTW_DECIMAL_LENGTH, "%.*g", digits, x);
    use_point(text);
}

void utw_decimal_exact(double x, char text[UTW_DECIMAL_LENGTH])
{
    for (int digits = 15; digits <= 17; digits++) {
        snprintf(text, UTW_DECIMAL_LENGTH, "%.*g", digits, x);
        if (strtod(text, NULL) == x) break;
    }
    use_point(text);
}

/* 10^n; exact up to 10^22. */
static double power(int n)
{
    static const double exact[] = {1e0,  1e1,  1e2,  1e3,  1e4,  1e5,  1e6,  1e7,
                                   1e8,  1e9,  1e10, 1e11, 1e12, 1e13, 1e14, 1e15,
                                   1e16, 1e17, 1e18, 1e19, 1e20, 1e21, 1e22};
    return n <= 22 ? exact[n] : pow(10, n);
}

double utw_decimal_value(double count, int place)
{
    return place >= 0 ? count * power(place) : count / power(-place);
}

double utw_decimal_count(double x, int place, utw_rounding rounding)
{
    const double q = place >= 0 ? x / power(place) : x * power(-place);
    if (rounding == UTW_NEAREST) return rint(q);
    /* q is rounded itself: hold the result against x */
    double count = rounding == UTW_DOWN ? floor(q) : ceil(q);
    if (rounding == UTW_DOWN) {
        if (utw_decimal_value(count + 1, place) <= x) count++;
        if (utw_decimal_value(count, place) > x) count--;
    } else {
        if (utw_decimal_value(count - 1, place) >= x) count--;
        if (utw_decimal_value(count, place) < x) count++;
    }
    return count;
}

int utw_decimal_place(double x)
{
    const double size = fabs(x);
    if (!(size > 0)) return 0;
    int place = (int)floor(log10(size));
    if (utw_decimal_value(1, place + 1) <= size) place++;
    if (utw_decimal_value(1, place) > size) place--;
    return place;
}

void utw_decimal_write(double count, int place, int scientific, int exponent,
                       char text[UTW_DECIMAL_LENGTH])
{
    char digits[UTW_DECIMAL_LENGTH / 2 + 1];
    int after = scientific ? exponent - place : -place; /* digits after the point */
    after = after < 0 ? 0 : after > LONGEST_FRACTION ? LONGEST_FRACTION : after;
    if (count == 0 && scientific) after = scientific = 0;
    if (!scientific && place > 0) count = utw_decimal_value(count, place);
    const int n = snprintf(digits, sizeof digits, "%0*.0f", after + 1, fabs(count));
    const int before = n - after;
    snprintf(text, UTW_DECIMAL_LENGTH, "%s%.*s%s%s", count < 0 ? "-" : "", before, digits,
             after > 0 ? "." : "", digits + before);
    const size_t length = strlen(text);
    if (scientific) snprintf(text + length, UTW_DECIMAL_LENGTH - length, "e%+03d", exponent);
}
