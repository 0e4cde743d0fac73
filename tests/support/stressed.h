/* SPDX-License-Identifier: GPL-3.0-or-later
 * A section read, solved and made ready for stresses, for tests. */
#ifndef UTW_TESTS_STRESSED_H
#define UTW_TESTS_STRESSED_H

#include "support/support.h"

typedef struct stressed {
    utw_outline *outline;
    utw_solution *solution;
    utw_stress *stress;
} stressed;

/** Read JSON text, solve to the tolerance, prepare the stresses; the test fails with the message of
 * what is refused. Free with stressed_clear(). */
stressed stressed_of(const char *json, double tolerance);
void stressed_clear(stressed *s);

/** The same of a rectangle b wide and h high about the origin, with Poisson's ratio nu. */
stressed stressed_rectangle(double b, double h, double nu, double tolerance);

/** A constant. */
double stressed_constant(const stressed *s, utw_constant which);

/** The stress at (x, y). */
utw_stress_point stressed_at(const stressed *s, utw_forces forces, double x, double y);

/** The peaks. */
utw_stress_peaks stressed_peaks(const stressed *s, utw_forces forces);

/** Sections without symmetry for tests of what holds for every section: polygons and arcs, solid,
 * hollow, with sharp and with rounded corners; index i from 0, NULL beyond the last. With E, nu =
 * 0.27, yield. */
const char *stressed_sample(int i);

#endif
