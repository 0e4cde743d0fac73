/* SPDX-License-Identifier: GPL-3.0-or-later
 * Area, second moments and the torsion constant of a midline. */
#ifndef UTW_THINWALL_THEORY_H
#define UTW_THINWALL_THEORY_H

#include "thinwall/thin.h"

/** Area integrals on the midline, no thickness terms; moves thin->paths into the principal frame at
 * the centroid. On entry the paths are about origin[2]. Fills area, centroid, i11, i22, i12, frame
 * and the constants A, length, xc, yc, Ixx, Iyy, Ixy, I1, I2, angle, straight. Source: Vlasov,
 * Thin-Walled Elastic Beams, 1961, ch. I (from memory); principal axes by Mohr's circle. */
void utw_theory_area(utw_thin *thin, const double origin[2]);

/** Quadrature stations of every wall. Call after utw_theory_area(). UTW_E_NOMEM. */
utw_status utw_theory_points(utw_thin *thin, utw_error *err);

/** Torsion: one flow a cell by Bredt and Batho, J_bredt = sum of 2 A_i q_i; open part J_open = sum
 * int t^3/3 ds over all walls; the torsion modulus from the greatest |q/t| + t of all walls. Call
 * after utw_cells_factor(). Source: Bredt 1896; Batho 1916; Kollbrunner and Basler, Torsion in
 * Structures, 1969 (from memory). */
utw_status utw_theory_torsion(utw_thin *thin, utw_error *err);

#endif
