/* SPDX-License-Identifier: GPL-3.0-or-later
 * The natural cubic spline through points of the plane. */
#ifndef UTW_OUTLINE_SPLINE_H
#define UTW_OUTLINE_SPLINE_H

#include "outline/curve.h"
#include "untwist.h"

/** The spline through xy[n][2] [L], n >= 2, neighbours distinct: curve[n-1] receives its pieces.
 * Tangent and curvature are continuous; the curvature is zero at both ends, as of a batten with
 * free ends. With n = 2 it is a straight line. The parameter is the chord length, so that unevenly
 * spaced points make no loops. Source: de Boor, A Practical Guide to Splines (1978), ch. IV.
 * UTW_E_NOMEM. */
utw_status utw_spline_natural(int n, const double (*xy)[2], utw_curve *curve, utw_error *err);

#endif
