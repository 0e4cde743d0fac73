/* SPDX-License-Identifier: GPL-3.0-or-later
 * What the kinds of report have in common. */
#ifndef UTW_REPORT_REPORT_H
#define UTW_REPORT_REPORT_H

#include "untwist.h"

/** What a report of this solution must say to its reader. Returned borrowed. */
const char *utw_report_caution(const utw_solution *solution);

/** Check what a caller hands in; `function` stands in the message. UTW_E_ARGUMENT. */
utw_status utw_report_check(const utw_report *report, char **text, const char *function,
                            utw_error *err);

/** A constant as reports state it: angles in degrees. [out] *quantity; a value that is not finite
 * is UTW_E_UNBOUNDED. Statuses of utw_solution_constant(), which says why it is absent. */
utw_status utw_report_constant(const utw_solution *solution, utw_constant which,
                               utw_quantity *quantity, utw_error *err);

/** "exact", "bracket" or "estimate". Returned borrowed. */
const char *utw_report_trust(utw_trust trust);

/** How far a greatest stress can be trusted: exact when its error is rounding, else an estimate. */
utw_trust utw_report_peak_trust(const utw_stress_peak *peak);

/** Unit of a constant, such as "mm^4", "deg" for angles, "-" for factors. [out] text[n]. */
void utw_report_unit(const utw_solution *solution, utw_constant which, char *text, size_t n);

/** Unit of a stiffness, such as "N mm^2". [out] text[n]. */
void utw_report_stiffness_unit(const utw_solution *solution, utw_stiffness which, char *text,
                               size_t n);

#endif
