/* SPDX-License-Identifier: GPL-3.0-or-later
 * Round numbers for keys, contours and scale bars, and numbers as text of a picture. */
#ifndef UTW_DRAW_TICKS_H
#define UTW_DRAW_TICKS_H

#include <stddef.h>

/** Levels k * step for k = first .. last. Their texts are in units of 10^exponent, a multiple of 3,
 * with `decimals` digits after the point. */
typedef struct utw_ticks {
    double step;
    long first, last;
    int exponent, decimals;
} utw_ticks;

/** Steps of 1, 2, 2.5 or 5 times a power of ten, the smallest of them with at most `most` (>= 2)
 * levels from low to high: first * step is the last at or below low, last * step the first at or
 * above high. [in] low < high, finite. */
utw_ticks utw_ticks_of(double low, double high, int most);

/** Text of level k: "-2.5" with a real minus sign. */
void utw_tick_text(const utw_ticks *ticks, long k, char *text, size_t n);

/** What texts of ticks are in, with the unit after it: "10³ mm²", "mm²" or "10⁶" (unit ""). */
void utw_ticks_unit(const utw_ticks *ticks, const char *unit, char *text, size_t n);

/** The largest of 1, 2, 5 times a power of ten that is at most x > 0. */
double utw_round_length(double x);

/** A number with `digits` significant digits for people: "48 139", "1.234·10⁸", "−0.25". */
void utw_number_text(double x, int digits, char *text, size_t n);

/** A unit raised to a power: "mm²", "mm⁶", "mm" ("" for power 0). */
void utw_unit_text(const char *unit, int power, char *text, size_t n);

#endif
