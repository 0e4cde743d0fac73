/* SPDX-License-Identifier: GPL-3.0-or-later
 * What the kinds of report have in common. */
#include "report/report.h"

#include <math.h>
#include <stdio.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "section/solution.h"

#define CAUTION                                                                                    \
    "Linear elastic material and small displacements; no buckling, no fatigue, no plastic "        \
    "collapse. The governing design code and a licensed engineer decide."

const char *utw_report_caution(const utw_solution *solution)
{
    return utw_solution_composite(solution)
               ? "The parts are of different materials, taken as bonded where they touch: the "
                 "constants are the stiffnesses over the moduli of the first part's material, and "
                 "what different Poisson's ratios do sideways is left out. " CAUTION
               : CAUTION;
}

utw_status utw_report_check(const utw_report *report, char **text, const char *function,
                            utw_error *err)
{
    if (report == NULL || text == NULL || report->solution == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "%s: report, its solution and text must not be NULL",
                        function);
    if (report->version != 1)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "%s: version %d is not known; start from UTW_REPORT_INIT", function,
                        report->version);
    return UTW_OK;
}

utw_status utw_report_constant(const utw_solution *solution, utw_constant which,
                               utw_quantity *quantity, utw_error *err)
{
    utw_quantity q;
    const utw_status st = utw_solution_constant(solution, which, &q, err);
    if (st != UTW_OK) return st;
    if (!isfinite(q.value))
        return utw_fail(err, UTW_E_UNBOUNDED, "%s has no finite value", utw_constant_key(which));
    const double factor = which == UTW_ANGLE ? 180 / UTW_PI : 1;
    *quantity = (utw_quantity){factor * q.value, factor * q.low, factor * q.high, q.trust};
    return UTW_OK;
}

const char *utw_report_trust(utw_trust trust)
{
    switch (trust) {
    case UTW_EXACT:
        return "exact";
    case UTW_BRACKET:
        return "bracket";
    case UTW_ESTIMATE:
        return "estimate";
    }
    return "unknown";
}

utw_trust utw_report_peak_trust(const utw_stress_peak *peak)
{
    return peak->error <= 1e-11 * fabs(peak->value) ? UTW_EXACT : UTW_ESTIMATE;
}

void utw_report_unit(const utw_solution *solution, utw_constant which, char *text, size_t n)
{
    const char *length = solution->outline->length_unit;
    const int power = utw_constant_power(which);
    if (power == 0)
        snprintf(text, n, "%s", which == UTW_ANGLE ? "deg" : "-");
    else if (power == 1)
        snprintf(text, n, "%s", length);
    else
        snprintf(text, n, "%s^%d", length, power);
}

void utw_report_stiffness_unit(const utw_solution *solution, utw_stiffness which, char *text,
                               size_t n)
{
    const utw_outline *o = solution->outline;
    const int power = utw_constant_power(utw_stiffness_constant(which)) - 2; /* modulus: F/L^2 */
    if (power == 0)
        snprintf(text, n, "%s", o->force_unit);
    else
        snprintf(text, n, "%s %s^%d", o->force_unit, o->length_unit, power);
}

void utw_report_free(char *text)
{
    utw_free(text);
}
