/* SPDX-License-Identifier: GPL-3.0-or-later
 * The fields of a section at the vertices of a sampling, from the elements' polynomials. */
#ifndef UTW_DRAW_VALUES_H
#define UTW_DRAW_VALUES_H

#include "draw/sampling.h"
#include "section/unit_stress.h"

/** In units of the net (section/unit_stress.h): omega about the shear centre with zero mean, and
 * the shear stress of each unit force, the mean of both solutions. Where elements meet, the mean of
 * theirs. */
typedef struct utw_values {
    int n;
    double *omega;                /* [n], owned */
    double (*tau)[UTW_N_UNIT][2]; /* [n], NULL when it was not asked for; owned */
} utw_values;

/** [in] sampling, borrowed, in any coordinates; unit, borrowed; with_tau: shear stresses too. Free
 * with utw_values_clear(). UTW_E_NOMEM. */
utw_status utw_values_init(utw_values *values, const utw_sampling *sampling,
                           const utw_unit_stress *unit, int with_tau, utw_error *err);
void utw_values_clear(utw_values *values);

#endif
