/* SPDX-License-Identifier: GPL-3.0-or-later
 * A number with its bounds as text: as many digits as the bounds make sure. */
#ifndef UTW_REPORT_NUMBER_H
#define UTW_REPORT_NUMBER_H

#include "base/decimal.h"
#include "untwist.h"

/** The three texts of a quantity, in the same notation. low and high are empty when the quantity is
 * exact, "none" when there is no such bound. */
typedef struct utw_number {
    char value[UTW_DECIMAL_LENGTH], low[UTW_DECIMAL_LENGTH], high[UTW_DECIMAL_LENGTH];
} utw_number;

/** Write a quantity. The value gets the digits that leave it inside its bounds and not more than
 * they make sure; low is rounded down and high up, to two digits of their difference, so that the
 * printed bounds hold. Exact values get nine significant digits, bounds at most ten. [in] noise:
 * an exact value of at most this size is rounding and printed as 0. */
void utw_number_write(const utw_quantity *quantity, double noise, utw_number *number);

#endif
