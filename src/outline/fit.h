/* SPDX-License-Identifier: GPL-3.0-or-later
 * Smooth curves given by a formula, as chains of cubics. */
#ifndef UTW_OUTLINE_FIT_H
#define UTW_OUTLINE_FIT_H

#include <stddef.h>

#include "outline/curve.h"
#include "untwist.h"

/** A smooth curve: point [L], first and second derivative by its parameter s. */
typedef void (*utw_fit_curve)(const void *context, double s, double p[2], double d1[2],
                              double d2[2]);

/** A growing row of curves. Start from {0}; free `curve` with utw_free(). */
typedef struct utw_fit {
    utw_curve *curve; /* [n], owned */
    size_t n, capacity;
} utw_fit;

/** Append one curve. UTW_E_NOMEM. */
utw_status utw_fit_append(utw_fit *fit, utw_curve curve, utw_error *err);

/** Append cubics that follow f from s0 to s1 (s1 < s0 runs it backward) to within `tolerance` [L],
 * each with the curve's points and tangents at its ends and, as far as may be, its curvatures. The
 * ends are `from` and `to`, which should be f's. The tolerance is met at sample points of every
 * piece, measured to the nearest point of the cubic; pieces are halved until it is. Method:
 * geometric Hermite interpolation, of sixth order in the piece's length (de Boor, Hoellig and
 * Sabin, Computer Aided Geometric Design 4 (1987) 269-278); plain Hermite where that has no
 * solution; then least squares across the curve for the lengths of the handles. UTW_E_OUTLINE when
 * a millionth of the curve cannot be followed (it is not smooth), UTW_E_NOMEM. */
utw_status utw_fit_cubics(utw_fit_curve f, const void *context, double s0, double s1,
                          const double from[2], const double to[2], double tolerance, utw_fit *fit,
                          utw_error *err);

#endif
