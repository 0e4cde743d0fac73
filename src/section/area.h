/* SPDX-License-Identifier: GPL-3.0-or-later
 * Area integrals by Green's theorem over the exact curves. */
#ifndef UTW_SECTION_AREA_H
#define UTW_SECTION_AREA_H

#include "outline/outline.h"

/** Integrals of one section. Weighted by weight[material] when weights are given (E-weighted
 * properties). All moments are about the (weighted) centroid, in the drawing's directions. */
typedef struct utw_area {
    double A, perimeter, xc, yc;   /* [L^2] [L] [L] */
    double Ixx, Iyy, Ixy;          /* int y^2, x^2, x y dA [L^4] */
    double Ixxx, Ixxy, Ixyy, Iyyy; /* int x^3, x^2 y, x y^2, y^3 dA [L^5] */
    double I1, I2, angle;          /* principal second moments, angle of axis 1 [rad] */
    double rx, ry;
    double left, right, bottom,
        top; /* distances of the extreme fibres from the centroid, all > 0 [L] */
    double Wx_top, Wx_bottom, Wy_left, Wy_right;
    double Zx, Zy, xp,
        yp; /* plastic moduli and neutral axes x = xp, y = yp in the drawing's coordinates */
} utw_area;

/** Fill *area. weight[n_material] multiplies each part's dA (NULL: 1 everywhere); a part without
 * material has weight 1. The perimeter is of the geometry: all loops of all parts, pieces that two
 * parts share not counted. Accuracy: lines and cubics to rounding (polynomial integrands), arcs and
 * ellipses to 1e-14 relative; the integrals are taken about a point near the centroid, so that a
 * section far from the origin loses nothing. Source: Green's theorem; principal axes by Mohr's
 * circle (common practice). UTW_E_NOMEM. */
utw_status utw_area_compute(const utw_outline *outline, const double *weight, utw_area *area,
                            utw_error *err);

#endif
