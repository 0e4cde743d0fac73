/* SPDX-License-Identifier: GPL-3.0-or-later
 * Sections ready for stresses. */
#include "support/stressed.h"

stressed stressed_of(const char *json, double tolerance)
{
    utw_error err;
    stressed s = {utw_outline_of(json), NULL, NULL};
    utw_options options = UTW_OPTIONS_INIT;
    options.tolerance = tolerance;
    assert_ok(utw_solve(s.outline, &options, &s.solution, &err));
    assert_ok(utw_stress_create(s.solution, &s.stress, &err));
    return s;
}

void stressed_clear(stressed *s)
{
    utw_stress_free(s->stress);
    utw_solution_free(s->solution);
    utw_outline_free(s->outline);
}

stressed stressed_rectangle(double b, double h, double nu, double tolerance)
{
    char json[400];
    snprintf(
        json, sizeof json,
        "{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 70000, \"nu\": %.17g, \"yield\": "
        "250}}, \"parts\": [{\"material\": \"m\", \"outline\": [[%.17g,%.17g], [%.17g,%.17g], "
        "[%.17g,%.17g], [%.17g,%.17g]]}]}",
        nu, -b / 2, -h / 2, b / 2, -h / 2, b / 2, h / 2, -b / 2, h / 2);
    return stressed_of(json, tolerance);
}

double stressed_constant(const stressed *s, utw_constant which)
{
    utw_error err;
    utw_quantity q = {0, 0, 0, UTW_EXACT};
    assert_ok(utw_solution_constant(s->solution, which, &q, &err));
    return q.value;
}

utw_stress_point stressed_at(const stressed *s, utw_forces forces, double x, double y)
{
    utw_error err;
    utw_stress_point p;
    const double at[2] = {x, y};
    memset(&p, 0, sizeof p);
    assert_ok(utw_stress_at(s->stress, &forces, at, &p, &err));
    return p;
}

utw_stress_peaks stressed_peaks(const stressed *s, utw_forces forces)
{
    utw_error err;
    utw_stress_peaks p;
    memset(&p, 0, sizeof p);
    assert_ok(utw_stress_peaks_of(s->stress, &forces, &p, &err));
    return p;
}

#define WITH_MATERIAL                                                                              \
    "{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 70000, \"nu\": 0.27, \"yield\": 250}}, " \
    "\"parts\": [{\"material\": \"m\", "

const char *stressed_sample(int i)
{
    static const char *const sample[] = {
        /* a quadrilateral */
        WITH_MATERIAL "\"outline\": [[2,1], [40.3,-3], [33,21.7], [7,15]]}]}",
        /* an angle with a rounded root and unequal legs */
        WITH_MATERIAL "\"outline\": [[0,0], [61,0], [61,7], {\"at\": [9,7], \"round\": 6}, [9,83], "
                      "[0,83]]}]}",
        /* a blade with two webs: three cells */
        WITH_MATERIAL
        "\"outline\": [{\"at\": [0,0], \"bulge\": 0.25}, {\"at\": [120,0], "
        "\"bulge\": 0.05}], \"holes\": [[[22,0.4], [38,0.4], [38,9], [22,7]], [[44,0], "
        "[66,0], [66,12], [44,11]]]}]}",
        /* an ellipse with an eccentric bore */
        WITH_MATERIAL "\"outline\": {\"ellipse\": [3,4,18,11,25]}, \"holes\": [{\"circle\": "
                      "[7,6,4.4]}]}]}",
        /* an unsymmetric channel with sharp corners */
        WITH_MATERIAL "\"outline\": [[0,0], [40,0], [40,5], [4,5], [4,57], [26,57], [26,64], "
                      "[0,64]]}]}",
    };
    return i >= 0 && i < (int)(sizeof sample / sizeof *sample) ? sample[i] : NULL;
}
