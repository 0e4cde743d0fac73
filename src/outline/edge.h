/* SPDX-License-Identifier: GPL-3.0-or-later
 * What joins two vertices of a drawing: one curve, or the pieces of a spline one after the other.
 */
#ifndef UTW_OUTLINE_EDGE_H
#define UTW_OUTLINE_EDGE_H

#include "outline/curve.h"

/** curve[k] is run by s from k to k + 1; the whole edge is 0 <= s <= n. Points and derivatives may
 * be asked for a little outside, where the first or last curve goes on. */
typedef struct utw_edge {
    const utw_curve *curve; /* [n], borrowed */
    int n;
} utw_edge;

/** Point [L], first and second derivative by s at s. */
void utw_edge_point(const utw_edge *edge, double s, double xy[2]);
void utw_edge_d1(const utw_edge *edge, double s, double d[2]);
void utw_edge_d2(const utw_edge *edge, double s, double d[2]);

/** Length between two parameters s0 <= s1 [L]. */
double utw_edge_length(const utw_edge *edge, double s0, double s1);

/** The parameter a length `c` [L] after the start, or (from_end = 1) before the end; below 0 or
 * above n when the edge is shorter than that. Newton's iteration, kept inside the curve it is on by
 * bisection. */
double utw_edge_at_length(const utw_edge *edge, double c, int from_end);

#endif
