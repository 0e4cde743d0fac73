/* SPDX-License-Identifier: GPL-3.0-or-later
 * Dropping points of a chain that lie on the way between others. */
#ifndef UTW_DRAW_SIMPLIFY_H
#define UTW_DRAW_SIMPLIFY_H

/** Drop points nearer than `tolerance` to the straight line between the points that are kept
 * (Douglas and Peucker, Cartographica 10 (1973) 112-122), in place. The ends of an open chain are
 * kept; of a closed one the first point and the one farthest from it. Returns how many are left. */
int utw_simplify(int n, double (*xy)[2], int closed, double tolerance);

#endif
