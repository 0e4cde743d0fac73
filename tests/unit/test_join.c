/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/join.h"

#include "base/vec2.h"
#include "support/support.h"

static const double from[2] = {1.5, -0.5};

static utw_curve curve_of(utw_vertex v)
{
    utw_curve c;
    utw_error err;
    assert_int_equal(utw_join_count(&v), 1);
    assert_ok(utw_join_curves(&v, from, 0, 1e-12, &c, &err));
    assert_memory_equal(c.from, from, sizeof from);
    assert_memory_equal(c.to, v.at, sizeof from);
    return c;
}

/* The sagitta of an arc is bulge * chord / 2, to the right of the chord when it turns
 * counter-clockwise. */
static void a_bulge_has_its_angle_and_sagitta(void **state)
{
    (void)state;
    for (double b = -2.5; b <= 2.5; b += 0.7) {
        const utw_curve c =
            curve_of((utw_vertex){.at = {4.5, 3.5}, .join = UTW_JOIN_BULGE, .bulge = b});
        double p[2];
        utw_curve_point(&c, 0.5, p);
        assert_close_scaled(p[0], 3 + b * 5 / 2 * 0.8, 1e-14, 5);
        assert_close_scaled(p[1], 1.5 - b * 5 / 2 * 0.6, 1e-14, 5);
        assert_close(tan((c.a1 - c.a0) / 4), b, 1e-14);
        for (int i = 0; i < 2; i++) {
            const double end[2] = {c.centre[0] + c.u[0] * cos(i == 0 ? c.a0 : c.a1),
                                   c.centre[1] + c.v[1] * sin(i == 0 ? c.a0 : c.a1)};
            assert_close_scaled(utw_distance(end, i == 0 ? c.from : c.to), 0, 1e-14, 5);
        }
    }
}

static void an_arc_goes_through_its_point(void **state)
{
    (void)state;
    double point[1][2] = {{2, 3}};
    const utw_curve c = curve_of(
        (utw_vertex){.at = {4.5, 3.5}, .join = UTW_JOIN_ARC, .n_point = 1, .point = point});
    assert_close(utw_distance(c.centre, point[0]), utw_distance(c.centre, from), 1e-14);
    assert_true(c.a1 < c.a0);
}

static void a_spline_goes_through_its_points(void **state)
{
    (void)state;
    double point[3][2] = {{2, 3}, {3, 3.5}, {4, 3}};
    const utw_vertex v = {
        .at = {1.5, -0.5}, .join = UTW_JOIN_THROUGH, .n_point = 3, .point = point}; /* closed */
    utw_curve c[4];
    utw_error err;
    assert_int_equal(utw_join_count(&v), 4);
    assert_ok(utw_join_curves(&v, from, 0, 1e-12, c, &err));
    for (int k = 0; k < 3; k++) assert_memory_equal(c[k].to, point[k], sizeof from);
    assert_memory_equal(c[3].to, from, sizeof from);
}

static void what_is_no_curve_is_refused(void **state)
{
    (void)state;
    double line[1][2] = {{3, 1.5}}, same[3][2] = {{2, 3}, {2, 3}, {4, 4}},
           first[1][2] = {{1.5, -0.5}}, last[2][2] = {{3, 3}, {4.5, 3.5}};
    const struct {
        utw_vertex vertex;
        const char *message;
    } row[] = {
        {{.at = {1.5, -0.5}}, "(1.5, -0.5) is the same point as vertex 7; remove one of them"},
        {{.at = {4.5, 3.5}, .join = UTW_JOIN_BULGE},
         "a \"bulge\" of 0 is a straight edge; leave it out"},
        {{.at = {4.5, 3.5}, .join = UTW_JOIN_BULGE, .bulge = -1e-7},
         "a \"bulge\" of -1e-07 is a straight edge within a millionth of its length; leave it out"},
        {{.at = {4.5, 3.5}, .join = UTW_JOIN_BULGE, .bulge = 90},
         "a \"bulge\" of 90 turns through 357.5 degrees, nearly a whole circle; \"bulge\" is the "
         "tangent of a quarter of "
         "the arc's angle: 1 for a semicircle"},
        {{.at = {4.5, 3.5}, .join = UTW_JOIN_ARC, .n_point = 1, .point = line},
         "there is no arc from (1.5, -0.5) through (3, 1.5) to (4.5, 3.5): the three points lie in "
         "line or coincide; "
         "move the point of \"arc\", or leave it out for a straight edge"},
        {{.at = {4.5, 3.5}, .join = UTW_JOIN_THROUGH, .n_point = 3, .point = same},
         "points 1 and 2 of \"through\" are the same, (2, 3); remove one"},
        {{.at = {4.5, 3.5}, .join = UTW_JOIN_THROUGH, .n_point = 1, .point = first},
         "point 1 of \"through\" is vertex 7 itself, (1.5, -0.5); list only the points between the "
         "vertices"},
        {{.at = {4.5, 3.5}, .join = UTW_JOIN_THROUGH, .n_point = 2, .point = last},
         "point 2 of \"through\" is this vertex itself, (4.5, 3.5); list only the points between "
         "the vertices"},
    };
    for (size_t i = 0; i < sizeof row / sizeof row[0]; i++) {
        utw_curve c[4];
        utw_error err;
        assert_int_equal(utw_join_curves(&row[i].vertex, from, 6, 1e-12, c, &err), UTW_E_OUTLINE);
        assert_string_equal(err.text, row[i].message);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(a_bulge_has_its_angle_and_sagitta),
        balanced_test(an_arc_goes_through_its_point),
        balanced_test(a_spline_goes_through_its_points),
        balanced_test(what_is_no_curve_is_refused),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
