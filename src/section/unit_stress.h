/* SPDX-License-Identifier: GPL-3.0-or-later
 * The stresses of unit forces on the section: what every load case is a sum of.
 *
 * Everything here is in the coordinates of the solved net: centroidal, in its unit of length. The
 * normal stress is a sum of 1, x, y and omega_s. The shear stress is a sum of three fields
 *   Vx, Vy   a grad z_x + b grad z_y + mu (a chi_x + b chi_y) - (torsion that puts the load at the
 *            shear centre), with d sigma_z/dz = a x + b y, mu = nu/(2(1+nu)), chi = grad Psi - P
 *   T        (grad omega - (y, -x)) / J
 * each known twice: from the potentials, and from the equilibrated fluxes (field/pair.h). Sources:
 * docs/stress.md; Trefftz 1935; Timoshenko and Goodier, Theory of Elasticity, ch. 10 and 11. */
#ifndef UTW_SECTION_UNIT_STRESS_H
#define UTW_SECTION_UNIT_STRESS_H

#include "section/solution.h"

/** The three shear fields. */
enum { UTW_UNIT_VX, UTW_UNIT_VY, UTW_UNIT_T, UTW_N_UNIT };

/** The two solutions. */
enum { UTW_BY_POTENTIAL, UTW_BY_FLUX, UTW_N_SIDE };

/** What turns the five pairs into unit fields. */
typedef struct utw_unit_stress {
    const utw_solution *solution; /* borrowed */
    int has_shear; /* 1: Vx and Vy are known; 0: there is no Poisson's ratio, and they are zero */
    double A, Ixx, Iyy, Ixy, J, Iw; /* in units of the net */
    double shear_centre[2];         /* in the net's coordinates */
    double mix[UTW_N_UNIT][UTW_N_PAIR];
    utw_poly rest[UTW_N_SIDE][UTW_N_UNIT][2]; /* polynomial part of each field */
    double omega0; /* omega_s = omega + omega0 - ys x + xs y: pole at the shear centre, mean 0 */
} utw_unit_stress;

/** [in] solution, borrowed as long as *unit is used. */
void utw_unit_stress_of(const utw_solution *solution, utw_unit_stress *unit);

/** The unit fields of one element: coefficients of its functions in the order of the list of its
 * greatest order (field/basis.h). */
typedef struct utw_unit_element {
    const utw_unit_stress *unit;
    utw_element element;
    int n;                                           /* functions of order element.top */
    double potential[UTW_N_UNIT][UTW_FUNCTIONS_MAX]; /* of the gradients */
    double curl[UTW_N_UNIT][UTW_FUNCTIONS_MAX];      /* of the fluxes */
    double omega[UTW_FUNCTIONS_MAX];
} utw_unit_element;

void utw_unit_element_of(const utw_unit_stress *unit, int tri, utw_unit_element *element);

/** The unit fields at a point. */
typedef struct utw_unit_point {
    double xy[2];
    double omega; /* omega_s */
    double tau[UTW_N_SIDE][UTW_N_UNIT][2];
} utw_unit_point;

/** At (r, s), where the functions and their derivatives are N, Nr, Ns [element->n]. */
void utw_unit_point_of(const utw_unit_element *element, double r, double s, const double *N,
                       const double *Nr, const double *Ns, utw_unit_point *point);

/** The same with the functions computed here. */
void utw_unit_point_at(const utw_unit_element *element, double r, double s, utw_unit_point *point);

#endif
