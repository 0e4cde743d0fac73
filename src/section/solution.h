/* SPDX-License-Identifier: GPL-3.0-or-later
 * The solved section as the stages above see it. */
#ifndef UTW_SECTION_SOLUTION_H
#define UTW_SECTION_SOLUTION_H

#include "outline/outline.h"
#include "section/adapt.h"
#include "section/area.h"
#include "section/composite.h"
#include "section/constants.h"

struct utw_solution {
    const utw_outline *outline; /* borrowed */
    utw_area area;              /* in the drawing's coordinates */
    double nu;                  /* Poisson's ratio, NAN without material or with several */
    utw_composite composite;    /* reference NULL: one material */
    double origin[2], unit;     /* the solved net: p = (drawing - origin) / unit */
    utw_solved solved;
    utw_options options;
    double seconds; /* wall clock of utw_solve() */
    utw_constant_value value[UTW_CONSTANT_COUNT];
    int n_corner;
    double (*corner)[2]; /* [n_corner][2] sharp re-entrant corners, in the drawing's coordinates;
                            owned */
};

#endif
