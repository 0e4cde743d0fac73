/* SPDX-License-Identifier: GPL-3.0-or-later
 * The hyperbolic shapes of restrained torsion on a bar of unit length, free of overflow and
 * cancellation for every k = L sqrt(GJ / E Iw) from 0 (no Saint-Venant stiffness: polynomials)
 * upward. */
#ifndef UTW_BAR_HYPERBOLIC_H
#define UTW_BAR_HYPERBOLIC_H

/** A bimoment B and the twist theta it goes with, both with forks at the ends: f'''' - k^2 f'' =
 * load, f'' = b. */
typedef struct utw_hyper {
    double f, f1; /* twist shape and its slope */
    double b, b1; /* bimoment shape and its slope */
} utw_hyper;

/** Unit bimoment at x = 1: b = sinh(kx)/sinh k, f = (b - x)/k^2. k -> 0: b = x, f = (x^3 - x)/6. 0
 * <= x <= 1. */
utw_hyper utw_hyper_end(double k, double x);

/** Unit torque, seen from the station's side of it: x is the distance of the station from the end
 * on its side, y that of the torque from the other end, x + y <= 1. Slopes by x. b = -sinh(kx)
 * sinh(ky)/(k sinh k), f = (xy + b)/k^2. k -> 0: b = -xy, f = xy (1 - x^2 - y^2)/6. */
utw_hyper utw_hyper_point(double k, double x, double y);

/** Unit torque per length: b = (cosh(k(1/2 - x))/cosh(k/2) - 1)/k^2, f = (x(1 - x)/2 + b)/k^2.
 *  k -> 0: b = -x(1 - x)/2, f = x(1 - x)(1 + x - x^2)/24. */
utw_hyper utw_hyper_uniform(double k, double x);

#endif
