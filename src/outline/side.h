/* SPDX-License-Identifier: GPL-3.0-or-later
 * The sides of a wall with thickness, and where the sides of two walls meet. */
#ifndef UTW_OUTLINE_SIDE_H
#define UTW_OUTLINE_SIDE_H

#include "outline/fit.h"
#include "outline/wall.h"

/** One side of a wall: half its thickness to the left (side = 1) or right (-1) of its midline. */
typedef struct utw_side {
    const utw_path *path; /* borrowed */
    double side;
} utw_side;

/** Point [L], first and second derivative by the station s [L]; s may lie beyond the wall's ends,
 * where line, arc and taper go on. A utw_fit_curve: `context` is a utw_side. */
void utw_side_point(const void *context, double s, double p[2], double d1[2], double d2[2]);

/** Where two sides cross near stations s[0] and s[1], by Newton's iteration (exact in one step for
 * straight walls). [in, out] s; [out] p [L]. Returns 0 when they do not within 2 `reach` [L] of
 * their starts. */
int utw_side_cross(const utw_side *a, const utw_side *b, double reach, double s[2], double p[2]);

/** Where a side crosses the straight line through o along the unit vector v, near station *s.
 * Returns 0 as above. */
int utw_side_cross_line(const utw_side *a, const double o[2], const double v[2], double reach,
                        double *s, double p[2]);

/** Append the piece of a side between two stations, from the point `from` to the point `to`, to
 * *fit. */
utw_status utw_side_curves(const utw_side *a, double s0, double s1, const double from[2],
                           const double to[2], double tolerance, utw_fit *fit, utw_error *err);

#endif
