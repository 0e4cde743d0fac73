/* SPDX-License-Identifier: GPL-3.0-or-later
 * Moments two ways: of curves by Green's theorem, and of elementary figures in closed form. */
#ifndef UTW_TESTS_FIGURE_H
#define UTW_TESTS_FIGURE_H

#include "outline/outline.h"

/** Moments about the origin: int 1, x, y, x^2, y^2, xy dA. */
typedef struct figure {
    double A, x, y, xx, yy, xy;
} figure;

/** Of a part or an outline, by Green's theorem with Gauss-Legendre points on each curve. */
figure figure_of_part(const utw_part *part);
figure figure_of_outline(const utw_outline *outline);

/** Add `sign` times an elementary figure (closed forms: elementary). */
void figure_rectangle(figure *f, double sign, double x0, double y0, double x1, double y1);
void figure_polygon(figure *f, double sign, int n, const double (*xy)[2]);
/** Sector of a circle from angle a0 to a1 > a0. */
void figure_sector(figure *f, double sign, double xc, double yc, double r, double a0, double a1);
void figure_ellipse(figure *f, double sign, double xc, double yc, double a, double b);

/** What lies between a corner and its fillet of radius r: the corner at p, unit vectors d and e
 * from it along its edges; the kite of corner, tangent points and centre less the sector. */
void figure_spandrel(figure *f, double sign, const double p[2], const double d[2],
                     const double e[2], double r);

/** The spandrel of a right-angled corner at (x, y) whose edges run toward sx and sy (each +1 or
 * -1). */
void figure_right_spandrel(figure *f, double sign, double x, double y, double sx, double sy,
                           double r);

/** Both agree to rtol of the figure's own magnitude (moments about the centroid of `expected`). */
#define assert_figure(actual, expected, rtol)                                                      \
    figure_compare(actual, expected, rtol, __FILE__, __LINE__)
void figure_compare(figure actual, figure expected, double rtol, const char *file, int line);

#endif
