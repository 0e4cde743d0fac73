/* SPDX-License-Identifier: GPL-3.0-or-later
 * A section with load cases and probes, ready for the reports, for tests. */
#ifndef UTW_TESTS_REPORTED_H
#define UTW_TESTS_REPORTED_H

#include "support/stressed.h"

typedef struct reported {
    stressed s;
    utw_cases *cases;
    utw_report report;
} reported;

/** An angle 61 x 83 with a sharp root at (9, 7): without bound under shear. Cases: "pull, steady"
 * (N = 2385) and "lift" (Vy = 420, Mx = 30150). With no_nu = 1 there is no material and "lift" has
 * no result. Probes at (4, 60) and, in the circle around the root, (8.9, 6.9). Free with
 * reported_clear(). */
reported reported_angle(int no_nu);
void reported_clear(reported *r);

/** The report of that kind fails cleanly wherever memory runs out; the test fails if not. */
void reported_without_memory(utw_status (*writer)(const utw_report *, char **, utw_error *));

#endif
