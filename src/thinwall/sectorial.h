/* SPDX-License-Identifier: GPL-3.0-or-later
 * The sectorial coordinate omega and the warping constant. */
#ifndef UTW_THINWALL_SECTORIAL_H
#define UTW_THINWALL_SECTORIAL_H

#include "thinwall/thin.h"

/** omega about the shear centre with mean zero, d(omega)/ds = q/(G theta' t) - r_n: the axial
 * displacement is theta' omega (the sign of docs/theory.md; texts that write u_z = -theta' omega
 * have the other). q is the cell flow of torsion, none in open walls. Iw = int omega^2 dA; values
 * below the rounding of omega (1e-13 size^2) become 0. Iw_secondary = int t^3/12 r_t^2 ds: the
 * slope of omega across the wall, r_t being the distance along the wall from the foot of the
 * perpendicular of the shear centre. Call after utw_theory_torsion() and utw_flow_flexure(). Solves
 * the flows of the warping torque as well. Source: Vlasov 1961, ch. I; cell term: Kollbrunner and
 * Basler 1969; secondary term: Gjelsvik, The Theory of Thin Walled Bars, 1981 (all from memory).
 * UTW_E_NOMEM, UTW_E_SINGULAR. */
utw_status utw_sectorial(utw_thin *thin, utw_error *err);

/** omega [L^2] at s of a wall. */
double utw_sectorial_at(const utw_thin *thin, int wall, double s);

/** int_0^s omega t ds [L^4]. */
double utw_sectorial_run(const utw_thin *thin, int wall, double s);

#endif
