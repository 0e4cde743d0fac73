/* SPDX-License-Identifier: GPL-3.0-or-later
 * The line that halves a section's area, and the plastic modulus about it. */
#ifndef UTW_SECTION_PLASTIC_H
#define UTW_SECTION_PLASTIC_H

#include "section/boundary.h"

/** Plastic neutral axis, coordinate k = level (k = 1: the line y = level, k = 0: x = level), about
 * the boundary's origin [L]: the (weighted) area is the same on both sides. Where a gap between
 * separate pieces of the section leaves it free (the halves are equal to 1e-10 of the area anywhere
 * in the gap), it is the middle of the gap. *modulus = int w |distance from the axis| dA [L^3],
 * exact to rounding. Method: area and first moment below a level are int x dy and int x y dy over
 * the pieces of the boundary below it (the level line itself adds nothing), which are cut where
 * they cross it; between two levels at which the boundary has a vertex or a stationary point the
 * area is smooth, and Newton's iteration with the section's width as derivative finds the axis.
 * Plastic modulus: common practice. UTW_E_NOMEM. */
utw_status utw_plastic_axis(const utw_boundary *boundary, int k, double *level, double *modulus,
                            utw_error *err);

#endif
