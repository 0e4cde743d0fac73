/* SPDX-License-Identifier: GPL-3.0-or-later
 * Bending of a prismatic bar about both axes at once, with shear flexibility. */
#ifndef UTW_BAR_BENDING_H
#define UTW_BAR_BENDING_H

#include "base/status.h"

/** What an end holds, in both planes. Fixed: both; fork: the deflection only; free: neither. */
typedef struct utw_bending_end {
    int deflection; /* 1: u = 0; 0: no shear force */
    int rotation;   /* 1: no rotation of the section; 0: no moment */
} utw_bending_end;

#define UTW_BENDING_FIXED ((utw_bending_end){1, 1})
#define UTW_BENDING_FORK  ((utw_bending_end){1, 0})
#define UTW_BENDING_FREE  ((utw_bending_end){0, 0})

/** A bar from z = 0 to z = length under a force at one place and a force per length all along, both
 * through the shear centre. Several forces: add the states, the problem is linear. */
typedef struct utw_bending_bar {
    double length;        /* [L] > 0 */
    double E;             /* [F/L^2] > 0 */
    double Ixx, Iyy, Ixy; /* about the centroid, in any axes [L^4]; Ixx Iyy > Ixy^2 */
    double shear[3]; /* shear flexibility a with gamma = a V: 1/(G Asx), 1/(G Asy) and the coupling
                        shear_xy/G [1/F]; 0, 0, 0: rigid in shear. Else not negative definite */
    utw_bending_end start, end; /* at z = 0 and z = length */
    double force[2], at;        /* Fx, Fy [F] acting at z = at, 0 <= at <= length [L] */
    double per_length[2];       /* px, py [F/L], uniform */
} utw_bending_bar;

/** The solution: the bar and its state at z = 0 (to the left of a force there). */
typedef struct utw_bending_solution {
    utw_bending_bar bar;
    double u[2], rotation[2];   /* [L], [1] */
    double shear[2], moment[2]; /* Vx, Vy [F]; int sigma x dA, int sigma y dA [F L] */
} utw_bending_solution;

/** The state at a station. */
typedef struct utw_bending_state {
    double u[2];        /* deflection of the shear centre along x, y [L] */
    double slope[2];    /* du/dz, shear strain included [1] */
    double rotation[2]; /* of the section: u_z = -rotation[0] x - rotation[1] y [1] */
    double Mx, My;      /* int sigma y dA, -int sigma x dA [F L] */
    double Vx, Vy;      /* shear forces on the face whose normal is +z [F] */
} utw_bending_state;

/** Solve E I psi' = -M, u' = psi + a V, with M = (int sigma x dA, int sigma y dA) and M' = V
 * (Timoshenko 1921 for shear; unsymmetric bending by the full tensor of second moments, as in
 * Timoshenko, Strength of Materials, part I) in closed form. [in] bar, borrowed. [out] *solution.
 *  UTW_E_ARGUMENT: a number not finite or out of range, second moments or shear flexibilities that
 * are no tensor of a section. UTW_E_LOAD: the ends do not hold the bar. */
utw_status utw_bending_solve(const utw_bending_bar *bar, utw_bending_solution *solution,
                             utw_error *err);

/** The state at z, 0 <= z <= length (clamped; all values are NaN when z is). At the force itself V
 * and the slope jump: the values are those on its left, for a force at z = 0 those on its right. */
void utw_bending_at(const utw_bending_solution *solution, double z, utw_bending_state *state);

#endif
