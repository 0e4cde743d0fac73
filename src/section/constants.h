/* SPDX-License-Identifier: GPL-3.0-or-later
 * From area integrals and the measures of the solved pairs to the constants of the section. */
#ifndef UTW_SECTION_CONSTANTS_H
#define UTW_SECTION_CONSTANTS_H

#include "section/adapt.h"
#include "section/area.h"
#include "section/interval.h"

/** What a constant is, or why there is none. */
typedef struct utw_constant_value {
    utw_quantity quantity;
    utw_status absent; /* UTW_OK: the quantity holds; UTW_E_MATERIAL, UTW_E_UNBOUNDED: left out */
} utw_constant_value;

/** Set one constant to factor * q + shift. */
void utw_constant_put(utw_constant_value *value, utw_constant which, utw_trust trust,
                      utw_interval q, double factor, double shift);

/** The area integrals of constants A .. yp, exact. */
void utw_constants_of_area(const utw_area *area, utw_constant_value *value);

/** J, shear centre, centre of flexure, Iw, shear areas and factors, monosymmetry, r0. [in] area in
 * the drawing's coordinates, scale: length of the solved net's unit [L]; nu: Poisson's ratio, NAN
 * when there is no material. Wt is not set here. Sources: docs/theory.md; Trefftz 1935; the bounds
 * of mixed products by polarisation of Prager and Synge 1947. */
void utw_constants_of_solution(const utw_area *area, double scale, const utw_solved *solved,
                               double nu, utw_constant_value *value);

/** int tau_x . tau_y dA [1/L^2] of the stresses of Vx = 1 and of Vy = 1, each through the shear
 * centre: what couples the shear strains of the two, as 1/Asx and 1/Asy are int |tau_x|^2 and int
 * |tau_y|^2. Arguments as above; nu must be a number. */
utw_quantity utw_shear_coupling(const utw_area *area, double scale, const utw_solved *solved,
                                double nu);

#endif
