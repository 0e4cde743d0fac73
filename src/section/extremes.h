/* SPDX-License-Identifier: GPL-3.0-or-later
 * The greatest stresses of a load case anywhere in the section. */
#ifndef UTW_SECTION_EXTREMES_H
#define UTW_SECTION_EXTREMES_H

#include "section/scan.h"

/** One extreme: the value in [F/L^2], the place in net coordinates, the estimated error. */
typedef struct utw_extreme {
    double value, error;
    utw_place place;
} utw_extreme;

/** All of them. kind[UTW_UTILISATION]: greatest von Mises stress over the yield stress of its part;
 * NAN when stress->yield is NULL. */
typedef struct utw_extremes {
    utw_extreme kind[UTW_N_KIND];
} utw_extremes;

/** Scan the samples for the regions that come within a few per cent of the greatest one, then
 * search those on the polynomials themselves (Brent, Algorithms for Minimization without
 * Derivatives, 1973, ch. 5, on sides and circles; quadratic models inside elements). When the case
 * is sheared and the section has sharp re-entrant corners, what is not sigma_z is searched outside
 * the circles around them. UTW_E_NOMEM. */
utw_status utw_extremes_find(const utw_stress *stress, const utw_stress_case *stress_case,
                             utw_extremes *extremes, utw_error *err);

#endif
