/* SPDX-License-Identifier: GPL-3.0-or-later
 * Sections from printf-style JSON; comparing constants with known values. */
#include "support/section.h"

#include "base/vec2.h"

utw_outline *section_outline(double nu, const char *part, ...)
{
    char inner[16384], text[17000];
    va_list args;
    va_start(args, part);
    const int n = vsnprintf(inner, sizeof inner, part, args);
    va_end(args);
    assert_in_range(n, 0, sizeof inner - 1);
    if (isnan(nu))
        snprintf(text, sizeof text, "{\"units\":\"mm N\",\"parts\":[{%s}]}", inner);
    else
        snprintf(text, sizeof text,
                 "{\"units\":\"mm N\",\"materials\":{\"m\":{\"E\":1000,\"nu\":%.17g}},"
                 "\"parts\":[{\"material\":\"m\",%s}]}",
                 nu, inner);
    return utw_outline_of(text);
}

utw_outline *section_rectangle(double nu, double x0, double y0, double x1, double y1)
{
    return section_outline(nu,
                           "\"outline\":[[%.17g,%.17g],[%.17g,%.17g],[%.17g,%.17g],[%.17g,%.17g]]",
                           x0, y0, x1, y0, x1, y1, x0, y1);
}

/* JSON of an arc about the origin as two vertices of half of it each. */
static void arc_text(char *text, size_t n, double r, double from, double to)
{
    double at[4][2];
    for (int k = 1; k <= 4; k++) {
        const double a = from + k * (to - from) / 4;
        at[k - 1][0] = r * cos(a);
        at[k - 1][1] = r * sin(a);
    }
    snprintf(
        text, n,
        "{\"at\":[%.17g,%.17g],\"arc\":[%.17g,%.17g]},{\"at\":[%.17g,%.17g],\"arc\":[%.17g,%.17g]}",
        at[1][0], at[1][1], at[0][0], at[0][1], at[3][0], at[3][1], at[2][0], at[2][1]);
}

utw_outline *section_sector(double nu, double degrees, double inner, double outer)
{
    const double half = degrees * UTW_PI / 360;
    const double c = cos(half), s = sin(half);
    char out[512], in[512];
    arc_text(out, sizeof out, outer, -half, half);
    arc_text(in, sizeof in, inner, half, -half);
    if (inner == 0)
        return section_outline(nu,
                               degrees == 180 ? "\"outline\":[[%.17g,%.17g],%s]"
                                              : "\"outline\":[[%.17g,%.17g],%s,[0,0]]",
                               outer * c, -outer * s, out);
    return section_outline(nu, "\"outline\":[[%.17g,%.17g],%s,[%.17g,%.17g],%s]", outer * c,
                           -outer * s, out, inner * c, inner * s, in);
}

utw_solution *section_solve(const utw_outline *outline, double tolerance, int order)
{
    utw_options options = UTW_OPTIONS_INIT;
    utw_error err;
    utw_solution *solution = NULL;
    options.tolerance = tolerance;
    options.fixed_order = order;
    assert_ok(utw_solve(outline, &options, &solution, &err));
    assert_non_null(solution);
    return solution;
}

utw_quantity section_constant(const utw_solution *solution, int which)
{
    utw_error err;
    utw_quantity q;
    assert_ok(
        utw_solution_constant(solution, which == TAU_MAX ? UTW_WT : (utw_constant)which, &q, &err));
    if (which == TAU_MAX) q = (utw_quantity){1 / q.value, 1 / q.high, 1 / q.low, q.trust};
    return q;
}

/* Rounding that the comparison itself and the moments of the drawing bring in. */
static const double rounding = 1e-13;

void section_check(const utw_solution *solution, const known *k, double length, double rtol,
                   const char *file, int line)
{
    const char *key = k->which == TAU_MAX ? "1/Wt" : utw_constant_key((utw_constant)k->which);
    const int power = k->which == TAU_MAX ? -3 : utw_constant_power((utw_constant)k->which);
    const utw_quantity q = section_constant(solution, k->which);
    const double size = fmax(fabs(k->value), length > 0 ? pow(length, power) : 0);
    const double slack = k->uncertainty * fabs(k->value) + rounding * size;
    const int ordered = q.low <= q.value && q.value <= q.high;
    const int inside = q.low - slack <= k->value && k->value <= q.high + slack;
    const int near = fabs(q.value - k->value) <= rtol * size + slack;
    if (ordered && (q.trust == UTW_ESTIMATE ? inside || near : inside && near)) return;
    print_error("%s = %.17g in [%.17g, %.17g], known %.17g: differs by %.3g (allowed %.3g)%s%s\n",
                key, q.value, q.low, q.high, k->value, fabs(q.value - k->value), rtol * size,
                inside ? "" : ", not between the bounds", ordered ? "" : ", bounds out of order");
    _fail(file, line);
}

void section_check_all(const utw_outline *outline, const known *k, size_t n, double length,
                       const char *file, int line)
{
    /* the error of what is bracketed by products of two gaps is as small as the gap itself, up to a
     * factor that the section's shape brings in */
    static const double tolerance[] = {1e-2, 1e-4, 1e-6, 1e-9};
    for (size_t t = 0; t < sizeof tolerance / sizeof *tolerance; t++) {
        utw_solution *s = section_solve(outline, tolerance[t], 0);
        utw_solution_info info;
        utw_solution_get_info(s, &info);
        assert_true(info.reached);
        assert_true(info.gap <= tolerance[t]);
        for (size_t i = 0; i < n; i++)
            section_check(s, &k[i], length, 10 * tolerance[t], file, line);
        utw_solution_free(s);
    }
}
