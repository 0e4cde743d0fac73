/* SPDX-License-Identifier: GPL-3.0-or-later
 * Boundary data of the flux problems: what chi must be on the loops so that P + curl chi leaves the
 * section nowhere. */
#ifndef UTW_FIELD_LIFT_H
#define UTW_FIELD_LIFT_H

#include "field/element.h"
#include "mesh/rim.h"

/** For the balanced pairs only, numbered 0 .. n_column-1 in the order of the pairs. A series holds
 * the coefficients of the edge functions k = 2 .. degree of a boundary side, run from its lower to
 * its higher node; a straight side needs degree 3, a curved one up to UTW_SERIES_MAX (to rounding
 * for a quarter turn). */
typedef struct utw_lift {
    int n_column;
    int column[UTW_PAIR_MAX]; /* column of each pair, -1 when it is not balanced */
    double *corner; /* [n_tri][3][n_column]: values at the corners, cuts included; owned */
    int *series_of; /* [n_edge] row of `series`, -1 for edges inside; owned */
    int *degree;    /* [rows]; owned */
    double *series; /* [rows][n_column][UTW_SERIES_TERMS]; owned */
} utw_lift;

/** Integrate -P.n along every loop over the exact curves. What flows out of a hole is led to the
 * next loop along its cut, so that chi is single-valued up to constants on the left of the cuts
 * (mesh/rim.h). UTW_E_INTERNAL when the fluxes do not cancel over all loops (the load has a
 * resultant); UTW_E_NOMEM. */
utw_status utw_lift_create(const utw_mesh *mesh, const utw_rim *rim, int n_pair,
                           const utw_pair *pair, utw_lift **lift, utw_error *err);
void utw_lift_free(utw_lift *lift);

/** Derivatives by r and s of the boundary data beyond the orders of the element's sides, at one
 * point: d[n_column][2]. phi, dphi: [3][UTW_SERIES_TERMS] edge kernels of the sides there, from a
 * table, or NULL to have them made. Returns 0, with nothing written, when the element has no such
 * data. */
int utw_lift_rest(const utw_lift *lift, const utw_mesh *mesh, const utw_element *element, double r,
                  double s, const double *phi, const double *dphi, double (*d)[2]);

#endif
