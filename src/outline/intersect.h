/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where two curves meet, where a curve meets itself, and which point of a curve is nearest. */
#ifndef UTW_OUTLINE_INTERSECT_H
#define UTW_OUTLINE_INTERSECT_H

#include "outline/curve.h"

/** A place where two curves come together. */
typedef struct utw_meeting {
    double s, t;     /* parameters on the first and on the second curve */
    double at[2];    /* half way between the two points [L] */
    double distance; /* between the two points [L] */
} utw_meeting;

/** Which end points two curves share: UTW_SHARED(i, j) when end i of the first (0: from, 1: to) is
 * end j of the second. Added up when they share more than one. */
#define UTW_SHARED(i, j) (1 << (2 * (i) + (j)))

/** 1 when the curves come nearer than `tolerance` [L] anywhere but at the ends they share, and one
 * such place in *meeting (may be NULL); 0 when they do not. Curves that leave a shared end in the
 * same direction, or run along one another, meet. 2 when the search gave up because the curves run
 * side by side at about the tolerance for very long; *meeting says where. Method: both curves are
 * halved while their control polygons (convex hull property; Farin, Curves and Surfaces for CAGD,
 * 1988, ch. 4) are nearer than the tolerance, until they are straight to a quarter of it; at a
 * shared end two pieces are apart when the cones of their control polygons are. */
int utw_curves_meet(const utw_curve *a, const utw_curve *b, int shared, double tolerance,
                    utw_meeting *meeting);

/** Narrow a meeting that was found down to the place where the curves come nearest (to a factor of
 * two in the distance). Returns 1 when they come within `touch` [L] there, else 0. [in, out]
 * *meeting. */
int utw_curves_narrow(const utw_curve *a, const utw_curve *b, int shared, double touch,
                      utw_meeting *meeting);

/** What a curve does to itself. */
typedef enum utw_self {
    UTW_SELF_NONE,
    UTW_SELF_CROSSES, /* s < t are the parameters of one point */
    UTW_SELF_CUSP,    /* it stops and turns back at s = t */
    UTW_SELF_NO_START /* a control point lies on its end s = t, so that the tangent has no length
                         there */
} utw_self;

/** Whether a cubic crosses itself (its two ends may coincide), has a cusp, or has no tangent at an
 * end. Lines and arcs of at most a full turn never do. [out] *s, *t: parameters. Method: a(s) =
 * a(t) divided by s - t is linear in s + t and s t. */
utw_self utw_curve_meets_itself(const utw_curve *curve, double *s, double *t);

/** Distance of a point from a curve [L], and the nearest parameter in *t (may be NULL).
 *  Only distances of at most `reach` are looked for: otherwise HUGE_VAL is returned. Lines and
 * circle arcs in closed form, the others by halving and Newton's iteration to rounding. */
double utw_curve_nearest(const utw_curve *curve, const double point[2], double reach, double *t);

#endif
