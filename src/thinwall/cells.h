/* SPDX-License-Identifier: GPL-3.0-or-later
 * The cell equations: one redundant flow a cell. */
#ifndef UTW_THINWALL_CELLS_H
#define UTW_THINWALL_CELLS_H

#include "thinwall/thin.h"

/** Factor the matrix K_ij = sum over walls of sign_i sign_j int ds/t: the twist that a unit flow in
 * cell j makes in cell i, times G and twice the area (Bredt 1896; Batho 1916; Megson, Aircraft
 * Structures, ch. on multi-cell beams, from memory). Positive definite, as the cells are
 * independent. Fills thin->cell_matrix. UTW_E_NOMEM, UTW_E_SINGULAR. */
utw_status utw_cells_factor(utw_thin *thin, utw_error *err);

/** Flows that run around cells and close them. [in] gap[n_walls]: what each wall adds to the
 * circulation that the flows must cancel or make, in the direction of the wall: sum over a cell of
 * sign gap = sum of sign int (flow/t) ds. [out] flow[n_walls]: adds the constant cell flows to what
 * it holds. UTW_E_NOMEM, UTW_E_SINGULAR. */
utw_status utw_cells_close(const utw_thin *thin, const double *gap, double *flow, utw_error *err);

#endif
