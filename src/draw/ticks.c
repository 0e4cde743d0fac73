/* SPDX-License-Identifier: GPL-3.0-or-later
 * Round numbers. */
#include "draw/ticks.h"

#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/decimal.h"

static const char minus[] = "\xE2\x88\x92";    /* U+2212 */
static const char thin_gap[] = "\xE2\x80\xAF"; /* U+202F */
static const char times_ten[] = "\xC2\xB7"
                                "10"; /* U+00B7 */

/* Superscript digits and minus (U+2070, U+00B9, U+00B2, U+00B3, U+2074 .. U+2079, U+207B). */
static void add_raised(char *text, size_t n, int number)
{
    static const char *const raised[] = {
        "\xE2\x81\xB0", "\xC2\xB9",     "\xC2\xB2",     "\xC2\xB3",     "\xE2\x81\xB4",
        "\xE2\x81\xB5", "\xE2\x81\xB6", "\xE2\x81\xB7", "\xE2\x81\xB8", "\xE2\x81\xB9"};
    char digits[16];
    size_t used = strlen(text);
    snprintf(digits, sizeof digits, "%d", number);
    for (const char *s = digits; *s != '\0'; s++)
        used += (size_t)snprintf(text + used, used < n ? n - used : 0, "%s",
                                 *s == '-' ? "\xE2\x81\xBB" : raised[*s - '0']);
}

/* Decimal text with a real minus sign. */
static void add_decimal(char *text, size_t n, const char *decimal)
{
    const size_t used = strlen(text);
    snprintf(text + used, n - used, "%s%s", decimal[0] == '-' ? minus : "",
             decimal + (decimal[0] == '-'));
}

/* Decimals that show multiples of step without loss: at most 2 digits of it are not 0. */
static int decimals_of(double step)
{
    const int place = utw_decimal_place(step);
    const double next = step / utw_decimal_value(1, place - 1); /* 10, 20, 25 or 50 */
    const int last = fmod(round(next), 10) > 0.5 ? place - 1 : place;
    return last < 0 ? -last : 0;
}

utw_ticks utw_ticks_of(double low, double high, int most)
{
    static const double nice[] = {1, 2, 2.5, 5};
    utw_ticks t = {0, 0, 0, 0, 0};
    int place = utw_decimal_place((high - low) / most) - 1;
    for (int i = 0;; i++) {
        t.step = utw_decimal_value(nice[i % 4], place + i / 4);
        /* a level that is met to rounding is met */
        const double first = floor(low / t.step + 1e-9), last = ceil(high / t.step - 1e-9);
        t.first = (long)first;
        t.last = (long)last;
        if (t.last - t.first + 1 <= most) break;
    }
    if (t.last == t.first) t.last++;
    const double size = fmax(fabs((double)t.first), fabs((double)t.last)) * t.step;
    const int order = utw_decimal_place(size);
    if (order >= 5 || order < -2) t.exponent = 3 * (int)floor(order / 3.0);
    t.decimals = decimals_of(utw_decimal_value(t.step, -t.exponent));
    return t;
}

void utw_tick_text(const utw_ticks *t, long k, char *text, size_t n)
{
    char decimal[UTW_DECIMAL_LENGTH];
    const double scaled = utw_decimal_value((double)k * t->step, -t->exponent);
    const double count = utw_decimal_count(scaled, -t->decimals, UTW_NEAREST);
    utw_decimal_write(count, -t->decimals, 0, 0, decimal);
    text[0] = '\0';
    add_decimal(text, n, k == 0 ? "0" : decimal);
}

void utw_ticks_unit(const utw_ticks *t, const char *unit, char *text, size_t n)
{
    text[0] = '\0';
    if (t->exponent != 0) {
        snprintf(text, n, "10");
        add_raised(text, n, t->exponent);
        if (unit[0] != '\0') snprintf(text + strlen(text), n - strlen(text), "%s", thin_gap);
    }
    snprintf(text + strlen(text), n - strlen(text), "%s", unit);
}

double utw_round_length(double x)
{
    static const double nice[] = {5, 2, 1};
    const double power = utw_decimal_value(1, utw_decimal_place(x));
    for (int i = 0; i < 3; i++)
        if (nice[i] * power <= x * (1 + 1e-12)) return nice[i] * power;
    return power;
}

/* Digits before the point in groups of three. */
static void add_grouped(char *text, size_t n, const char *decimal)
{
    size_t whole = strspn(decimal, "0123456789"), used = strlen(text);
    for (size_t i = 0; decimal[i] != '\0' && used + 5 < n; i++) {
        if (whole > 4 && i > 0 && i < whole && (whole - i) % 3 == 0)
            used += (size_t)snprintf(text + used, n - used, "%s", thin_gap);
        text[used++] = decimal[i];
        text[used] = '\0';
    }
}

void utw_number_text(double x, int digits, char *text, size_t n)
{
    char decimal[UTW_DECIMAL_LENGTH];
    const int order = x == 0 ? 0 : utw_decimal_place(x), place = order - digits + 1;
    const double count = x == 0 ? 0 : utw_decimal_count(fabs(x), place, UTW_NEAREST);
    const int scientific = order > 6 || order < -3;
    text[0] = '\0';
    if (x < 0) snprintf(text, n, "%s", minus);
    if (scientific) {
        double mantissa = count;
        int exponent = order;
        if (mantissa >= utw_decimal_value(1, digits)) { /* 9.9996 in four digits is 10.00 */
            mantissa /= 10;
            exponent++;
        }
        utw_decimal_write(mantissa, 1 - digits, 0, 0, decimal);
        add_grouped(text, n, decimal);
        snprintf(text + strlen(text), n - strlen(text), "%s", times_ten);
        add_raised(text, n, exponent);
        return;
    }
    utw_decimal_write(count, place, 0, 0, decimal);
    if (strchr(decimal, '.') != NULL) { /* trailing zeros say nothing on a picture */
        size_t end = strlen(decimal);
        while (decimal[end - 1] == '0') end--;
        if (decimal[end - 1] == '.') end--;
        decimal[end] = '\0';
    }
    add_grouped(text, n, decimal);
}

void utw_unit_text(const char *unit, int power, char *text, size_t n)
{
    text[0] = '\0';
    if (power == 0) return;
    snprintf(text, n, "%s", unit);
    if (power != 1) add_raised(text, n, power);
}
