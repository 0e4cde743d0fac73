/* SPDX-License-Identifier: GPL-3.0-or-later
 * Restrained (warping) torsion of a prismatic bar. */
#ifndef UTW_BAR_TORSION_H
#define UTW_BAR_TORSION_H

#include "base/status.h"

/** What an end holds. Fixed: both; fork: the twist only; free: neither. A free end with a stiff
 * plate holds its warping. */
typedef struct utw_torsion_end {
    int twist;   /* 1: theta = 0; 0: no torque */
    int warping; /* 1: theta' = 0; 0: no bimoment */
} utw_torsion_end;

#define UTW_TORSION_FIXED ((utw_torsion_end){1, 1})
#define UTW_TORSION_FORK  ((utw_torsion_end){1, 0})
#define UTW_TORSION_FREE  ((utw_torsion_end){0, 0})

/** A bar from z = 0 to z = length under a torque at one place and a torque per length all along; T
 * > 0 turns x toward y. Several torques: add the states, the problem is linear. */
typedef struct utw_torsion_bar {
    double length;              /* [L] > 0 */
    double GJ;                  /* [F L^2] >= 0 */
    double EIw;                 /* [F L^4] >= 0; not both 0 */
    utw_torsion_end start, end; /* at z = 0 and z = length */
    double torque, at;          /* [F L] acting at z = at, 0 <= at <= length [L] */
    double per_length;          /* [F] torque per length, uniform */
} utw_torsion_bar;

/** The solution: the bar and the twists and bimoments of its ends. */
typedef struct utw_torsion_solution {
    utw_torsion_bar bar;
    double k;           /* length sqrt(GJ / EIw); HUGE_VAL when EIw is 0 */
    double theta[2];    /* at the ends [1] */
    double bimoment[2]; /* at the ends [F L^2] */
    double torque;      /* constant part of the torque along the bar [F L] */
} utw_torsion_solution;

/** The state at a station. */
typedef struct utw_torsion_state {
    double theta, theta1, theta2,
        theta3;          /* twist and its derivatives by z [1], [1/L], [1/L^2], [1/L^3] */
    double bimoment;     /* B = EIw theta'' [F L^2] */
    double saint_venant; /* GJ theta' [F L] */
    double warping;      /* Tw = -dB/dz = -EIw theta''' [F L] */
    double torque;       /* their sum, from equilibrium [F L] */
} utw_torsion_state;

/** Solve EIw theta'''' - GJ theta'' = torque per length (Vlasov 1961; Timoshenko and Gere 1961, ch.
 * 5) in closed form, for any ratio of the stiffnesses. With EIw = 0 warping cannot be held: the
 * twist is Saint-Venant's. [in] bar, borrowed. [out] *solution. UTW_E_ARGUMENT: a number not finite
 * or out of range. UTW_E_LOAD: nothing holds the bar against twist (no end holds the twist; or GJ =
 * 0, one end holds the twist and no end its warping). */
utw_status utw_torsion_solve(const utw_torsion_bar *bar, utw_torsion_solution *solution,
                             utw_error *err);

/** The state at z, 0 <= z <= length (clamped; all values are NaN when z is). At the torque itself
 * the warping torque, the torque and theta''' jump (with EIw = 0: theta'): the values are those on
 * its left, for a torque at z = 0 those on its right. */
void utw_torsion_at(const utw_torsion_solution *solution, double z, utw_torsion_state *state);

#endif
