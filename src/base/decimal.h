/* SPDX-License-Identifier: GPL-3.0-or-later
 * Numbers as decimal text, whatever the locale of the host program says of decimal points. */
#ifndef UTW_BASE_DECIMAL_H
#define UTW_BASE_DECIMAL_H

#define UTW_DECIMAL_LENGTH 40

/** The shortest decimal text that reads back as the very same double (15 to 17 digits). [in] x,
 * finite. [out] text. Valid as a number in JSON and in C. */
void utw_decimal_exact(double x, char text[UTW_DECIMAL_LENGTH]);

/** x with `digits` significant digits (1..17), as printf's %g would write it in the C locale. */
void utw_decimal_short(double x, int digits, char text[UTW_DECIMAL_LENGTH]);

/** How a decimal number is rounded. */
typedef enum utw_rounding { UTW_NEAREST, UTW_DOWN, UTW_UP } utw_rounding;

/** The multiple of 10^place next to x, as a count of 10^place: at most x with UTW_DOWN, at least x
 * with UTW_UP. [in] |x| < 1e15 * 10^place, |place| <= 300. */
double utw_decimal_count(double x, int place, utw_rounding rounding);

/** count * 10^place as a double. */
double utw_decimal_value(double count, int place);

/** Place of the first digit of x: 10^place <= |x| < 10^(place + 1); 0 for x = 0. [in] x, finite. */
int utw_decimal_place(double x);

/** Write count * 10^place (|count| < 1e15) with at most 17 digits after the point, plainly, or with
 * scientific = 1 as digits times 10^exponent (exponent >= place), as in 1.25e+08; zero is then "0".
 * Plain notation needs count * 10^place < 1e18 in size. No minus sign before a zero. */
void utw_decimal_write(double count, int place, int scientific, int exponent,
                       char text[UTW_DECIMAL_LENGTH]);

#endif
