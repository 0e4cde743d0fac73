/* SPDX-License-Identifier: GPL-3.0-or-later
 * Small plane geometry on double[2]. */
#ifndef UTW_BASE_VEC2_H
#define UTW_BASE_VEC2_H

#include <math.h>

#define UTW_PI 3.14159265358979323846
#define UTW_INFINITY ((double)INFINITY)
#define UTW_NAN ((double)NAN)

static inline double utw_dot(const double a[2], const double b[2])
{
    return a[0] * b[0] + a[1] * b[1];
}

/** z component of a x b: positive when b lies counter-clockwise of a. */
static inline double utw_cross(const double a[2], const double b[2])
{
    return a[0] * b[1] - a[1] * b[0];
}

static inline double utw_norm(const double a[2])
{
    return hypot(a[0], a[1]);
}

static inline double utw_distance(const double a[2], const double b[2])
{
    return hypot(b[0] - a[0], b[1] - a[1]);
}

/** Twice the signed area of the triangle a b c, positive counter-clockwise. */
static inline double utw_turn(const double a[2], const double b[2], const double c[2])
{
    return (b[0] - a[0]) * (c[1] - a[1]) - (b[1] - a[1]) * (c[0] - a[0]);
}

#endif
