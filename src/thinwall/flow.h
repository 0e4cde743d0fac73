/* SPDX-License-Identifier: GPL-3.0-or-later
 * Shear flows of flexure, the shear centre and the shear areas. */
#ifndef UTW_THINWALL_FLOW_H
#define UTW_THINWALL_FLOW_H

#include "thinwall/thin.h"

/** Flow q with dq/ds = -t d(sigma)/dz, in equilibrium at every node, and with no twist of any cell
 * (int q/t ds = 0 around it): statically right flows on the spanning tree, closed by one constant
 * flow a cell. Fills thin->start[mode]. Source: Megson, Aircraft Structures, chapters on shear of
 * open, closed and multi-cell beams; Vlasov 1961 (both from memory). UTW_E_NOMEM, UTW_E_SINGULAR.
 */
utw_status utw_flow_solve(utw_thin *thin, utw_flow_mode mode, utw_error *err);

/** Both flexural flows, the shear centre (where the force must act for its moment to equal the
 * flows': the cells do not twist, so this is the energy centre) and the shear areas V^2 / int q^2/t
 * ds. Fills pole, slope, xs, ys, Asx, Asy, shear_xy. Call after utw_cells_factor() and
 * utw_theory_points(). */
utw_status utw_flow_flexure(utw_thin *thin, utw_error *err);

#endif
