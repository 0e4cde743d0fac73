/* SPDX-License-Identifier: GPL-3.0-or-later
 * Area integrals by Green's theorem over the exact curves. */
#ifndef UTW_SECTION_AREA_H
#define UTW_SECTION_AREA_H

#include "outline/outline.h"

/** Integrals of one section. Weighted by weight[material] when weights are given (E-weighted
 *  properties). All moments are about the (weighted) centroid, in the drawing's directions.
 *
 *  angle: from the x axis to the axis of I1, counter-clockwise, in (-pi/2, pi/2]; turning the
 * section turns it by as much. It is 0 when I1 = I2, and exactly 0 or pi/2 when Ixy = 0, each to
 * rounding. xp, yp: on either side of the line x = xp (y = yp) lies half the weighted area. Where
 * an empty gap of the section leaves the line free, it is the middle of the gap. */
typedef struct utw_area {
    double A;                        /* [L^2] */
    double perimeter;                /* [L] */
    double xc, yc;                   /* centroid in the drawing's coordinates [L] */
    double Ixx, Iyy, Ixy;            /* int y^2, x^2, x y dA [L^4] */
    double Ixxx, Ixxy, Ixyy, Iyyy;   /* int x^3, x^2 y, x y^2, y^3 dA [L^5] */
    double I1, I2, angle;            /* principal second moments [L^4], angle [rad] */
    double rx, ry;                   /* sqrt(Ixx/A), sqrt(Iyy/A) [L] */
    double left, right, bottom, top; /* extreme fibres' distances from the centroid, > 0 [L] */
    double Wx_top, Wx_bottom;        /* Ixx over these [L^3] */
    double Wy_left, Wy_right;        /* Iyy over these [L^3] */
    double Zx, Zy;                   /* plastic moduli int |y - yp| dA, int |x - xp| dA [L^3] */
    double xp, yp;                   /* plastic neutral axes, drawing's coordinates [L] */
} utw_area;

/** Fill *area; untouched on failure. [in] outline, borrowed, that utw_outline_check() accepts.
 *  weight[n_material] multiplies each part's dA (NULL: 1 everywhere); a part without material has
 *  weight 1. The perimeter is of the geometry: all loops of all parts, pieces that two parts share
 *  not counted.
 *  Accuracy: lines and cubics to rounding (polynomial integrands), arcs and ellipses to 1e-14
 *  relative; the integrals are taken about the centroid in a second pass, so that a section far
 * from the origin loses no more than its coordinates have lost. I2 is integrated in its own axes,
 * so that a slender section keeps its digits. Source: Green's theorem; principal axes by Mohr's
 * circle, plastic moduli (common practice). UTW_E_ARGUMENT when a weight is not positive or loops
 * run the wrong way round, UTW_E_OUTLINE when several parts do not fit together, UTW_E_NOMEM. */
utw_status utw_area_compute(const utw_outline *outline, const double *weight, utw_area *area,
                            utw_error *err);

#endif
