/* SPDX-License-Identifier: GPL-3.0-or-later
 * One load case as a sum of the unit stresses, and the stress it makes at a point. */
#ifndef UTW_SECTION_STRESS_CASE_H
#define UTW_SECTION_STRESS_CASE_H

#include "section/unit_stress.h"

/** sigma_z = one + x x' + y y' + omega omega_s, tau = sum t[k] unit field k; coordinates of the
 * solved net, stresses in [F/L^2]. */
typedef struct utw_stress_case {
    double one, x, y, omega;
    double t[UTW_N_UNIT];
    double t_error[UTW_N_UNIT]; /* of t: the relative brackets of the shear areas and of J; that of
                                   the shear centre */
    double omega_error;         /* of omega, relative: that of Iw */
    int sheared;                /* 1 when any t is not zero */
} utw_stress_case;

/** sigma_z: unsymmetric bending (common practice; Mx = int sigma y dA, My = -int sigma x dA), and B
 * omega_s / Iw (Vlasov 1961). Shear forces at a place bring the torque Vy (x - xs) - Vx (y - ys)
 * about the shear centre. UTW_E_LOAD: a number that is not finite; a bimoment on a section that
 * does not warp. UTW_E_MATERIAL: a shear force without Poisson's ratio. */
utw_status utw_stress_case_of(const utw_unit_stress *unit, const utw_forces *forces,
                              utw_stress_case *stress_case, utw_error *err);

/** The stress of a case at a point of an element. The error of tau is an estimate: twice the
 * distance between the two solutions there (at the boundary both err alike: the distance of their
 * mean from the truth was measured at up to 1.8 times theirs from each other), plus their root mean
 * square distance over the element (theirs at a point may vanish by chance), plus t_error times the
 * unit stresses. The error of omega is that of the torsion field times the size of the element. */
typedef struct utw_point_stress {
    double xy[2];
    double omega;
    double sigma, tau[2];
    double sigma_error, tau_error;
} utw_point_stress;

/** [in] apart: root mean square distance of the two solutions over the element, for each unit
 * field. */
void utw_point_stress_of(const utw_stress_case *stress_case, const utw_unit_element *element,
                         const double apart[UTW_N_UNIT], double r, double s,
                         utw_point_stress *stress);

#endif
