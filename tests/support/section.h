/* SPDX-License-Identifier: GPL-3.0-or-later
 * Sections for tests, from their dimensions, and checks of their solutions against values known
 * beforehand. */
#ifndef UTW_TESTS_SECTION_H
#define UTW_TESTS_SECTION_H

#include "support/support.h"

/** An outline of one part from printf-style JSON: what stands inside the braces of the part, such
 * as
 * "\"outline\": {\"circle\": [0, 0, %.17g]}", or "\"shape\": {...}" in place of it. nu: Poisson's
 * ratio, NAN for a section without material. The test fails when the reader refuses it. Owned:
 * utw_outline_free(). */
utw_outline *section_outline(double nu, const char *part, ...)
    __attribute__((format(printf, 2, 3)));

/** Common sections. Rectangle: corners in order. Sector: symmetric about +x, apex (or, with inner >
 * 0, the centre of both arcs) at the origin, opening in degrees. */
utw_outline *section_rectangle(double nu, double x0, double y0, double x1, double y1);
utw_outline *section_sector(double nu, double degrees, double inner, double outer);

/** Solve with a tolerance; order 0: chosen, else fixed. The test fails when it cannot. Owned:
 * utw_solution_free(). */
utw_solution *section_solve(const utw_outline *outline, double tolerance, int order);

/** A constant that must be there; TAU_MAX is 1/Wt, the greatest torsional stress of a unit torque
 * [1/L^3]. */
enum { TAU_MAX = UTW_CONSTANT_COUNT };
utw_quantity section_constant(const utw_solution *solution, int which);

/** A value known beforehand, in the drawing's units. */
typedef struct known {
    int which; /* utw_constant or TAU_MAX */
    double value;
    double uncertainty; /* relative to |value| */
} known;

/** The value must lie between low and high, moved apart by its own uncertainty and by rounding, and
 * within `rtol` of the value found; both relative to |value| or to the power of `length` that the
 * constant has, whichever is greater: give the size of the section so that zeros can be compared,
 * or 0. Estimates need only do one of the two. */
#define assert_known(solution, k, length, rtol)                                                    \
    section_check(solution, k, length, rtol, __FILE__, __LINE__)
void section_check(const utw_solution *solution, const known *k, double length, double rtol,
                   const char *file, int line);

/** One section of a table: every known value of it at several tolerances. */
#define assert_all_known(outline, k, n, length)                                                    \
    section_check_all(outline, k, n, length, __FILE__, __LINE__)
void section_check_all(const utw_outline *outline, const known *k, size_t n, double length,
                       const char *file, int line);

#endif
