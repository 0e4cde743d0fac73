/* SPDX-License-Identifier: GPL-3.0-or-later
 * Corners rounded by an arc or cut by a chamfer, between edges of any kind. */
#ifndef UTW_OUTLINE_CORNER_H
#define UTW_OUTLINE_CORNER_H

#include "outline/edge.h"

typedef enum utw_corner_kind {
    UTW_CORNER_SHARP,
    UTW_CORNER_ROUND,
    UTW_CORNER_CHAMFER
} utw_corner_kind;

/** Where a corner stands and what is done to it. */
typedef struct utw_corner {
    utw_corner_kind kind;
    double size;            /* radius, or length cut from each edge [L], > 0 */
    utw_edge before, after; /* before.curve[n-1] ends where after.curve[0] starts */
    double least_before;    /* the edge before may be cut back to this parameter ... */
    double most_after;      /* ... and the edge after up to this one */
} utw_corner;

/** What became of it. */
typedef struct utw_corner_cut {
    double before, after; /* parameters of the edges where the arc or chamfer starts and ends */
    utw_curve curve;      /* the arc or the chamfer */
} utw_corner_cut;

typedef enum utw_corner_fit {
    UTW_CORNER_FITS = 0,
    UTW_CORNER_TOO_LARGE, /* an edge is too short, or too strongly curved */
    UTW_CORNER_STRAIGHT,  /* the edges run on (within 1e-5 rad): there is no corner */
    UTW_CORNER_BACK,      /* the second edge runs back along the first */
    UTW_CORNER_NO_TANGENT /* an edge has no direction at the corner */
} utw_corner_fit;

/** Round or cut a corner (kind is not UTW_CORNER_SHARP). [out] *cut, untouched unless it fits.
 *  Between straight lines in closed form. Else the centre of the rounding is followed from the
 * corner, where its radius is 0, along the meeting points of the two edges' offset curves, by
 * Newton's iteration with steps that adapt: so it is always the arc next to the corner that is
 * found. Method of our own; offset curves as in Farouki, Pythagorean-Hodograph Curves (2008),
 * ch. 8. */
utw_corner_fit utw_corner_make(const utw_corner *corner, utw_corner_cut *cut);

/** The greatest size that fits, up to corner->size, rounded down to six digits; 0 when none does.
 * By bisection. */
double utw_corner_greatest(const utw_corner *corner);

#endif
