/* SPDX-License-Identifier: GPL-3.0-or-later
 * Extremes of omega against closed forms, from samplings that miss them. */
#include "draw/crest.h"

#include "support/section.h"

static void crests_of(const char *part, utw_crest crest[2], double origin[2], double *unit_length)
{
    utw_error err;
    utw_sampling s;
    utw_values v;
    utw_unit_stress unit;
    utw_outline *outline = section_outline(0.3, "%s", part);
    utw_solution *solution = section_solve(outline, 1e-10, 0);
    const utw_fineness fineness = {5 / solution->unit, 0.5 / solution->unit};
    utw_unit_stress_of(solution, &unit);
    assert_ok(utw_sampling_init(&s, solution->solved.mesh, &fineness, &err));
    assert_ok(utw_values_init(&v, &s, &unit, 0, &err));
    for (int k = 0; k < 2; k++)
        assert_ok(utw_crest_of(&s, &v, &unit, k == 0 ? -1 : 1, &crest[k], &err));
    for (int d = 0; d < 2; d++) origin[d] = solution->origin[d];
    *unit_length = solution->unit;
    utw_sampling_clear(&s);
    utw_values_clear(&v);
    utw_solution_free(solution);
    utw_outline_free(outline);
}

/* omega = -(a^2 - b^2)/(a^2 + b^2) x y (Saint-Venant 1855): on the boundary x y is greatest, a b /
 * 2, at (a, b)/sqrt(2). */
static void ellipse(void **state)
{
    (void)state;
    const double a = 23.85, b = 12.4, expected = (a * a - b * b) / (a * a + b * b) * a * b / 2;
    utw_crest crest[2];
    double origin[2], unit;
    crests_of("\"outline\": {\"ellipse\": [5, 3, 23.85, 12.4, 0]}", crest, origin, &unit);
    for (int k = 0; k < 2; k++) {
        const double x = origin[0] + unit * crest[k].xy[0] - 5,
                     y = origin[1] + unit * crest[k].xy[1] - 3;
        assert_close(crest[k].value * unit * unit, k == 0 ? -expected : expected, 1e-6);
        assert_close(fabs(x), a / sqrt(2), 2e-3); /* flat there: half the digits of the value */
        assert_close(fabs(y), b / sqrt(2), 2e-3);
        assert_true(k == 0 ? x * y > 0 : x * y < 0);
    }
}

/* A square: omega is zero on its four axes of symmetry, so its extremes come in four equal pairs.
 */
static void square(void **state)
{
    (void)state;
    utw_crest crest[2];
    double origin[2], unit;
    crests_of("\"outline\": [[0,0],[41,0],[41,41],[0,41]]", crest, origin, &unit);
    assert_true(crest[1].value > 0);
    assert_close(crest[0].value, -crest[1].value, 1e-6);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(ellipse), balanced_test(square)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
