/* SPDX-License-Identifier: GPL-3.0-or-later
 * The boundary of a section as a weighted row of curves about a chosen origin, for integrals along
 * it. */
#ifndef UTW_SECTION_BOUNDARY_H
#define UTW_SECTION_BOUNDARY_H

#include "outline/outline.h"

/** All curves of an outline, the material on their left, moved so that `origin` is (0, 0). */
typedef struct utw_boundary {
    int n;
    utw_curve *curve; /* [n], owned */
    double *weight;   /* [n], owned: of the part a curve belongs to */
    double origin[2]; /* in the drawing's coordinates [L] */
} utw_boundary;

/** Copy the curves of an outline; the origin is the middle of their box. weight[n_material] as in
 *  utw_area_compute(). Free with utw_boundary_clear(). UTW_E_ARGUMENT when a weight is not positive
 * and finite, UTW_E_NOMEM. */
utw_status utw_boundary_init(utw_boundary *boundary, const utw_outline *outline,
                             const double *weight, utw_error *err);

/** Free what a boundary owns; a zeroed struct is allowed. */
void utw_boundary_clear(utw_boundary *boundary);

/** Move the origin by d [L]. */
void utw_boundary_move(utw_boundary *boundary, const double d[2]);

/** How many equal pieces in t, and how many Gauss points on each, integrate polynomials of degree
 * `degree` in x and y times x dy - y dx along the curve to rounding: exactly for lines and cubics.
 */
void utw_boundary_rule(const utw_curve *curve, int degree, int *pieces, int *points);

/** Sum with the rounding errors carried along (Neumaier, Z. Angew. Math. Mech. 54, 1974, 39-51). */
typedef struct utw_sum {
    double sum, carry;
} utw_sum;

void utw_sum_add(utw_sum *sum, double term);
double utw_sum_value(const utw_sum *sum);

#endif
