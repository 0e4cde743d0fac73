/* SPDX-License-Identifier: GPL-3.0-or-later
 * Points of the true midline: centres of circles that touch both sides of a wall. */
#ifndef UTW_THINWALL_MEDIAL_H
#define UTW_THINWALL_MEDIAL_H

#include "thinwall/chordal.h"

/** What a circle in a wall says of it there. */
typedef struct utw_station {
    double x[2], e[2]; /* centre, unit direction of the branch; units of the border */
    double t;          /* thickness, square to the midline */
    int left, right;   /* border curves it touches */
    int chord;         /* a chord of the branch next to it */
    int good; /* 1: both sides are faces of a wall; 0: a corner is touched, or the sides are
                 more than 53 degrees from parallel */
} utw_station;

/** Stations of a branch in its order: the circle that touches the border at a sample point of one
 * side, in the direction of its tangent, and the other side wherever it does. At a re-entrant
 * corner there are two, one for each face. [in] all borrowed. [out] *station [*n], returned owned:
 * utw_free(). UTW_E_NOMEM.
 *  Method: Newton-like, the circle through the nearest point of the other side again and again (Ma,
 * Bae and Choi, The Visual Computer 28 (2012) 7-19). */
utw_status utw_medial_stations(const utw_border *border, const utw_chordal *chordal,
                               const utw_branch *branch, utw_station **station, int *n,
                               utw_error *err);

#endif
