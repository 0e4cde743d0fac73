/* SPDX-License-Identifier: GPL-3.0-or-later
 * The pairs of problems that bound each other: a potential u with given load, and an equilibrated
 * flux q of the same load.
 *
 * Potential:  int k grad u . grad v = int (k g . grad v + e s v) for all v        (free on the
 * boundary; e is k unless the setting says otherwise) Flux:       q = k P + curl chi, with int q . grad v = int k (g . grad v + s v) for all
 * v, curl chi = (chi_y, -chi_x); chi minimises int |q|^2 / k: on every loop chi is known up to a
 * constant, zero on the outer loop. Then int |k grad u - q|^2 / k is the sum of both errors (Prager
 * and Synge, Quarterly of Applied Mathematics 5 (1947) 241-269), element by element. */
#ifndef UTW_FIELD_PAIR_H
#define UTW_FIELD_PAIR_H

/** A polynomial of degree two: coefficients of 1, x, y, x^2, x y, y^2. */
typedef double utw_poly[6];

static inline double utw_poly_at(const utw_poly c, double x, double y)
{
    return c[0] + c[1] * x + c[2] * y + c[3] * x * x + c[4] * x * y + c[5] * y * y;
}

/** One pair. */
typedef struct utw_pair {
    utw_poly g[2], s; /* load of the potential */
    utw_poly P[2];    /* particular flux */
    int balanced;     /* 1: P.n is not zero on the boundary where q.n must be, and curl chi takes it
                         back. Needs k = 1     everywhere: with several k only the potential of such a
                         pair     means anything */
} utw_pair;

#define UTW_PAIR_MAX 8

#endif
