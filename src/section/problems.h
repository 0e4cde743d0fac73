/* SPDX-License-Identifier: GPL-3.0-or-later
 * The five pairs of problems whose solutions give every constant of a section that is not an area
 * integral. Coordinates are centroidal. docs/theory.md, "Torsion" and "Flexure". */
#ifndef UTW_SECTION_PROBLEMS_H
#define UTW_SECTION_PROBLEMS_H

#include "field/pair.h"

/** Which pair is which.
 *  TORSION   the warping function omega: load and particular flux (y, -x). The torsional stress for
 * theta' = 1, G = 1 is grad omega - (y, -x), and its flux side is the curl of the stress function
 * phi (Saint-Venant 1855, Prandtl 1903). SHEAR_X   z with -lap z = x, dz/dn = 0: flexural shear at
 * nu = 0 for d sigma_z/dz = x (Trefftz, Zeitschrift fuer angewandte Mathematik und Mechanik 15
 * (1935) 220-225). SHEAR_Y   the same for y. ANTI_X    what the anticlastic strains of d sigma_z/dz
 * = x add per nu/(2(1+nu)): load and particular flux
 *            ((x^2-y^2)/2, x y); the stress is grad Psi - that flux, without resultant but with a
 * torque. ANTI_Y    the same for y: (x y, (y^2-x^2)/2). */
enum { UTW_TORSION, UTW_SHEAR_X, UTW_SHEAR_Y, UTW_ANTI_X, UTW_ANTI_Y, UTW_N_PAIR };

/** Fill pair[UTW_N_PAIR]. */
void utw_problems(utw_pair *pair);

#endif
