/* SPDX-License-Identifier: GPL-3.0-or-later
 * Sharp re-entrant corners and the circles around them within which no stress is reported. */
#ifndef UTW_SECTION_KEEP_OUT_H
#define UTW_SECTION_KEEP_OUT_H

#include "section/solution.h"

/** The radius of the circle over the local thickness of the wall. */
#define UTW_KEEP_OUT 0.1

/** In the coordinates of the solved net. */
typedef struct utw_keep_out {
    int n;
    double (*centre)[2]; /* [n], owned */
    double *radius;      /* [n], owned */
} utw_keep_out;

/** One circle for each sharp corner of the solution; its radius is UTW_KEEP_OUT times the thinner
 * of the walls that meet there (mesh/walls.h). Free with utw_keep_out_clear(). UTW_E_NOMEM. */
utw_status utw_keep_out_init(utw_keep_out *keep_out, const utw_solution *solution, utw_error *err);
void utw_keep_out_clear(utw_keep_out *keep_out);

/** 1 when a point lies inside a circle; points on a circle (to rounding) do not. */
int utw_keep_out_holds(const utw_keep_out *keep_out, const double xy[2]);

#endif
