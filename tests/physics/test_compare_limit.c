/* SPDX-License-Identifier: GPL-3.0-or-later
 * As walls become thin, the solid and the thin-walled solution become one; and trends that are
 * known. */
#include "support/drawings.h"
#include "support/section.h"

#include "thinwall/thickness.h"

static utw_idealisation *ideal_of(const utw_outline *outline)
{
    utw_error err;
    utw_idealisation *ideal = NULL;
    assert_ok(utw_idealise(outline, &ideal, &err));
    return ideal;
}

static utw_comparison *compare(const utw_outline *outline, utw_idealisation **ideal,
                               utw_solution **solution)
{
    utw_error err;
    utw_comparison *comparison = NULL;
    *ideal = ideal_of(outline);
    *solution = section_solve(outline, 1e-5, 0);
    assert_ok(utw_compare(*solution, *ideal, 0.05, &comparison, &err));
    return comparison;
}

static double difference(const utw_outline *outline, utw_constant which)
{
    utw_idealisation *ideal;
    utw_solution *solution;
    utw_comparison *comparison = compare(outline, &ideal, &solution);
    const utw_compared *row = utw_comparison_get(comparison, utw_compared_index(which));
    assert_null(row->absent);
    const double d = row->difference;
    utw_comparison_free(comparison);
    utw_solution_free(solution);
    utw_idealisation_free(ideal);
    return d;
}

/* The midline of a drawing with nu = 0: thin-walled theory knows no Poisson's ratio. */
static utw_outline *drawn(const utw_midline *m)
{
    utw_error err;
    char *text = NULL, whole[4000];
    assert_ok(utw_midline_file(m, "", "mm N", &text, &err));
    char *at = strstr(text, "\"midline\": {");
    assert_non_null(at);
    const int head = (int)(at - text);
    const int n = snprintf(
        whole, sizeof whole,
        "%.*s\"materials\": {\"m\": {\"E\": 1, \"nu\": 0}},\n\"midline\": {\"material\": \"m\",%s",
        head, text, at + strlen("\"midline\": {"));
    assert_true(n > 0 && (size_t)n < sizeof whole);
    utw_report_free(text);
    return utw_outline_of(whole);
}

/* Channel, zed, box, two cells, slit tube: with half the thickness at most 0.62 times the
 * difference of J, the shear centre, Iw and the shear areas, for t/b from 0.08 to 0.02. */
static void thin_walls(void **state)
{
    (void)state;
    static const char *const names[] = {"channel", "zed", "box", "two_cells", "slit"};
    static const utw_constant which[] = {UTW_J, UTW_XS, UTW_YS, UTW_IW, UTW_ASX, UTW_ASY};
    const utw_study_range range = {0.25, 1, 4}; /* 0.25, 0.5, 0.75, 1 */
    utw_wall wall[32];
    utw_midline given;
    const char *name;
    int found = 0;
    for (int i = 0; utw_drawing_sample(i, 0.08, wall, &given, &name) != NULL; i++)
        for (size_t k = 0; k < sizeof names / sizeof *names; k++) {
            if (strcmp(name, names[k]) != 0) continue;
            utw_error err;
            utw_outline *outline = drawn(&given);
            utw_idealisation *ideal = ideal_of(outline);
            utw_study *study = NULL;
            utw_options options = UTW_OPTIONS_INIT;
            options.tolerance = 1e-5;
            found++;
            assert_ok(utw_thickness_study(outline, ideal, &options, &range, 0.05, &study, &err));
            for (size_t w = 0; w < sizeof which / sizeof *which; w++) {
                double d[3];
                for (int s = 0; s < 3; s++)
                    assert_int_equal(utw_study_difference(study, s == 2 ? 3 : s, which[w], &d[s]),
                                     1);
                for (int s = 0; s < 2; s++) {
                    if (fabs(d[s]) > 0.62 * fabs(d[s + 1]) + 2e-4)
                        print_error("%s, %s: %g, then %g\n", name, utw_constant_key(which[w]),
                                    d[s + 1], d[s]);
                    assert_true(fabs(d[s]) <= 0.62 * fabs(d[s + 1]) + 2e-4);
                }
                /* a box hardly warps: its Iw is a small difference */
                assert_true(fabs(d[0]) < (which[w] == UTW_IW ? 0.15 : 0.05));
            }
            utw_study_free(study);
            utw_idealisation_free(ideal);
            utw_outline_free(outline);
        }
    assert_int_equal(found, 5);
}

/* J = b t^3/3 of a rectangle is 1/(1 - 0.63025 t/b) too high (Timoshenko and Goodier, Theory of
 * Elasticity, art. 109, from memory: 0.630 = 192/pi^5 sum tanh/n^5). */
static void rectangles(void **state)
{
    (void)state;
    const double t[] = {2, 5, 10, 20};
    for (int i = 0; i < 4; i++) {
        utw_outline *outline = section_rectangle(NAN, 0, 0, 100, t[i]);
        assert_close_scaled(difference(outline, UTW_J), 1 / (1 - 0.63025 * t[i] / 100) - 1, 1e-4,
                            1);
        utw_outline_free(outline);
    }
}

/* A tube slit along its length: the shear centre lies two radii from the centre, beyond the wall
 * opposite the slit, less what the slit's width takes (Timoshenko, Strength of Materials, from
 * memory). */
static void slit_tube(void **state)
{
    (void)state;
    const double t[] = {4, 2, 1}; /* d = 100, so the mean radius is 50 - t/2 */
    double last = HUGE_VAL;
    for (int i = 0; i < 3; i++) {
        utw_outline *outline = section_outline(
            NAN, "\"shape\": {\"slit-tube\": {\"d\": 100, \"t\": %.17g, \"gap\": 0.1}}", t[i]);
        utw_solution *solution = section_solve(outline, 1e-5, 0);
        const double xs = section_constant(solution, UTW_XS).value,
                     ys = section_constant(solution, UTW_YS).value, r = 50 - 0.5 * t[i],
                     off = fabs(hypot(xs, ys) / r - 2);
        assert_true(off < 0.62 * last);
        assert_true(off < 0.25 * t[i] / r);
        last = off;
        utw_solution_free(solution);
        utw_outline_free(outline);
    }
}

/* Bredt's J of a square tube is low: the flow spreads into the thick corners. EN 10210-2, annex B
 * (from memory), adds t^3 h/3 and 2 K A_h: J = t^3 h/3 + 2 K A_h, K = 2 A_h t/h, with corner radii,
 * is between both here. */
static void square_tube(void **state)
{
    (void)state;
    const double t[] = {2, 5, 10};
    double last = 0;
    for (int i = 0; i < 3; i++) {
        utw_idealisation *ideal;
        utw_solution *solution;
        utw_outline *outline = section_outline(
            NAN, "\"shape\": {\"box\": {\"h\": 50, \"b\": 50, \"t\": %.17g}}", t[i]);
        utw_comparison *comparison = compare(outline, &ideal, &solution);
        const utw_compared *J = utw_comparison_get(comparison, utw_compared_index(UTW_J));
        const double b = 50 - t[i], bredt = b * b * b * t[i],
                     standard = t[i] * t[i] * t[i] * 4 * b / 3 + bredt;
        assert_true(bredt < J->solid.low);
        assert_true((J->solid.value - bredt) / J->solid.value > last);
        last = (J->solid.value - bredt) / J->solid.value;
        assert_close(J->thin, standard, 1e-9);
        assert_true(fabs(J->difference) < last);
        utw_comparison_free(comparison);
        utw_solution_free(solution);
        utw_idealisation_free(ideal);
        utw_outline_free(outline);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(thin_walls),
        balanced_test(rectangles),
        balanced_test(slit_tube),
        balanced_test(square_tube),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
