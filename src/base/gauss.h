/* SPDX-License-Identifier: GPL-3.0-or-later
 * Gauss-Legendre rules on [0, 1]. */
#ifndef UTW_BASE_GAUSS_H
#define UTW_BASE_GAUSS_H

#define UTW_GAUSS_MAX 64

/** The n-point Gauss-Legendre rule on [0, 1], 1 <= n <= UTW_GAUSS_MAX, exact for polynomials of degree
 *  2n-1 to rounding: x[n] ascending, w[n] > 0 with sum 1.
 *  Method: Newton's iteration on the Legendre recurrence (Abramowitz and Stegun 1964, 22.7.10, 25.4.30). */
void utw_gauss(int n, double *x, double *w);

#endif
