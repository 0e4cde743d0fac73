/* SPDX-License-Identifier: GPL-3.0-or-later
 * The greatest stress of a case in one region, on the polynomials. */
#ifndef UTW_SECTION_SEARCH_H
#define UTW_SECTION_SEARCH_H

#include "section/scan.h"

/** What is searched where. */
typedef struct utw_search {
    const utw_stress *stress;
    const utw_stress_case *stress_case;
    int kind; /* of scan.h */
    const utw_region *region;
} utw_search;

/** From the region's best sample: along a side by its polynomial through the side's samples, on a
 * circle point by point (Brent, Algorithms for Minimization without Derivatives, 1973, ch. 5),
 * inside an element by quadratic models. A region outside the circles around sharp corners is not
 * left into one. [out] *place. Returns the merit there, never less than that of the best sample. */
double utw_search_region(const utw_search *search, utw_place *place);

#endif
