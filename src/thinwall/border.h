/* SPDX-License-Identifier: GPL-3.0-or-later
 * The boundary of a section as oriented curves with sample points, dense against the wall
 * thickness.
 */
#ifndef UTW_THINWALL_BORDER_H
#define UTW_THINWALL_BORDER_H

#include "outline/outline.h"

/** A curve of the boundary, the material on its left. */
typedef struct utw_border_curve {
    utw_curve curve;
    int after, before; /* the curves that follow and precede it in its loop */
    int loop;
    double turn;  /* by which the direction turns at its start [rad]; positive at a convex corner */
    int first, n; /* its points: first .. first + n - 1, of which the first is its start */
} utw_border_curve;

/** Coordinates are those of the drawing moved to the middle of its box and divided by `unit`. */
typedef struct utw_border {
    double origin[2], unit; /* [L] */
    double size;            /* diagonal of the box, in units */
    int n_curve, n_point, n_loop;
    int *loop;               /* [n_loop + 1], owned: the first point of each loop, and n_point */
    utw_border_curve *curve; /* [n_curve], owned; loops one after the other */
    double (*xy)[2];         /* [n_point][2], owned */
    int *after;              /* [n_point], owned: the next point of the loop */
    int *on;   /* [n_point], owned: the curve a point lies on (a corner: that it starts) */
    double *t; /* [n_point], owned: its parameter there; 0 at a corner */
} utw_border;

/** The outer boundary of all parts together, with points at most 3/8 of the thickness that the
 * boundary sees there apart, never more than an eighth of a right angle or so around a curve, and
 * spacings that change by a factor of at most 2.5. [in] outline, borrowed; density: 1, or 2 for
 * twice as many points. [out] *border, returned owned: utw_border_free(). UTW_E_ARGUMENT,
 * UTW_E_NOMEM and the statuses of utw_net_create(). */
utw_status utw_border_create(const utw_outline *outline, double density, utw_border **border,
                             utw_error *err);

void utw_border_free(utw_border *border);

/** Unit tangent of a curve at t, in the direction of the loop. */
void utw_border_tangent(const utw_border *border, int curve, double t, double e[2]);

/** The point of the boundary nearest to p when one slides from (*curve, *t) downhill: across smooth
 * joints and around re-entrant corners, not past convex ones. [in, out] *curve, *t; [out] q[2].
 * Returns its distance. */
double utw_border_slide(const utw_border *border, const double p[2], int *curve, double *t,
                        double q[2]);

#endif
