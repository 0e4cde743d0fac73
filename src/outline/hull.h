/* SPDX-License-Identifier: GPL-3.0-or-later
 * Control polygons of pieces of curves: convex hulls that hold the piece, for deciding what is
 * apart. */
#ifndef UTW_OUTLINE_HULL_H
#define UTW_OUTLINE_HULL_H

#include "outline/curve.h"

/** The piece of a curve from t0 to t1 and points whose convex hull holds it: its ends; for an arc
 * of at most a quarter turn also the point where the end tangents meet; for a cubic its two inner
 * control points. A longer arc has the parallelogram around the whole ellipse instead of all these.
 */
typedef struct utw_hull {
    double t0, t1;
    double end[2][2]; /* points at t0 and t1 */
    int n;
    double p[4][2]; /* [n] */
    double axis[2]; /* unit vector from end to end, (1, 0) for a closed piece */
    double length;  /* greatest extent along the axis [L] */
    double width;   /* extent across it [L]; exactly 0 for lines */
} utw_hull;

utw_hull utw_hull_of(const utw_curve *curve, double t0, double t1);

/** A lower bound of the distance of two hulls [L]: the greatest gap between their projections on
 * either's axis and across it; negative when none of these parts them. */
double utw_hull_gap(const utw_hull *a, const utw_hull *b);

/** A lower bound of the distance of a point from a hull [L], 0 inside its box. */
double utw_hull_distance(const utw_hull *a, const double point[2]);

/** 1 when end i of a and end j of b are the same point and the cones of the hulls seen from it have
 * nothing in common but that point; then the pieces have not either. */
int utw_hull_cones_apart(const utw_hull *a, int i, const utw_hull *b, int j);

#endif
