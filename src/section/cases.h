/* SPDX-License-Identifier: GPL-3.0-or-later
 * The load cases of a section and what they do, for the reports. */
#ifndef UTW_SECTION_CASES_H
#define UTW_SECTION_CASES_H

#include "section/stress.h"

/** One case. */
typedef struct utw_case {
    const char *name; /* borrowed from the outline */
    utw_forces forces;
    utw_status status; /* UTW_OK, or why there is no result; then only `why` below is set */
    char why[256];
    utw_stress_peaks peaks;
    utw_stress_point *point; /* [n_probe], owned */
} utw_case;

struct utw_cases {
    const utw_stress *stress; /* borrowed */
    int n, n_probe;
    utw_case *list;               /* [n], owned */
    double (*probe)[2];           /* [n_probe] in the drawing's coordinates, owned */
    int n_done;                   /* cases with results */
    utw_stress_envelope envelope; /* over those, their indices in list; not set when n_done is 0 */
};

#endif
