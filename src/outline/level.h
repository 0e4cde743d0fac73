/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where a curve rises and falls, and where it reaches a given height. */
#ifndef UTW_OUTLINE_LEVEL_H
#define UTW_OUTLINE_LEVEL_H

#include "outline/curve.h"

#define UTW_MONOTONE_MAX 5

/** Cut a curve where its coordinate k (0: x, 1: y) is stationary. t[n+1] = {0, ..., 1} ascending;
 * returns the number n of pieces, at most UTW_MONOTONE_MAX. Roots of the derivative in closed form.
 */
int utw_curve_monotone(const utw_curve *curve, int k, double t[UTW_MONOTONE_MAX + 1]);

/** The parameter in [t0, t1] where coordinate k of the curve, monotone there, is `level`; the
 * nearer end when it is nowhere. Lines in closed form, others by Newton's iteration kept in a
 * shrinking interval. */
double utw_curve_at_level(const utw_curve *curve, int k, double level, double t0, double t1);

#endif
