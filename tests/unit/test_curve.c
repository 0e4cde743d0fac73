/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/vec2.h"
#include "outline/curve.h"
#include "support/support.h"

static utw_curve sample(int kind)
{
    const double a[2] = {1.3, -0.4}, b[2] = {3.1, 1.7}, c[2] = {2.0, 2.2}, d[2] = {0.4, 1.1};
    utw_curve curve = utw_curve_line(a, b);
    if (kind == 1) assert_int_equal(utw_curve_arc_through(a, c, b, &curve), 0);
    if (kind == 2) curve = utw_curve_cubic(a, c, d, b);
    if (kind == 3) { /* a piece of a turned ellipse */
        curve = utw_curve_arc(a, 1, 0.3, 2.9, a, a);
        curve.u[0] = 2.0, curve.u[1] = 0.5, curve.v[0] = -0.2, curve.v[1] = 0.8;
        for (int k = 0; k < 2; k++) {
            curve.from[k] = a[k] + curve.u[k] * cos(0.3) + curve.v[k] * sin(0.3);
            curve.to[k] = a[k] + curve.u[k] * cos(2.9) + curve.v[k] * sin(2.9);
        }
    }
    return curve;
}

static void derivatives_match_differences(void **state)
{
    (void)state;
    for (int kind = 0; kind < 4; kind++) {
        const utw_curve c = sample(kind);
        for (double t = 0.05; t < 1; t += 0.1) {
            double p[2], q[2], d[2], e[2], f[2], d2[2];
            const double h = 1e-6;
            utw_curve_point(&c, t - h, p);
            utw_curve_point(&c, t + h, q);
            utw_curve_d1(&c, t, d);
            utw_curve_d1(&c, t - h, e);
            utw_curve_d1(&c, t + h, f);
            utw_curve_d2(&c, t, d2);
            for (int k = 0; k < 2; k++) {
                assert_close_scaled((q[k] - p[k]) / (2 * h), d[k], 1e-8, 1);
                assert_close_scaled((f[k] - e[k]) / (2 * h), d2[k], 1e-8, 10);
            }
        }
    }
}

static void pieces_and_reversal_lie_on_the_curve(void **state)
{
    (void)state;
    for (int kind = 0; kind < 4; kind++) {
        const utw_curve c = sample(kind), r = utw_curve_reversed(&c), s = utw_curve_piece(&c, 0.25, 0.85);
        for (double t = 0; t <= 1; t += 0.125) {
            double p[2], q[2];
            utw_curve_point(&c, t, p);
            utw_curve_point(&r, 1 - t, q);
            assert_true(utw_distance(p, q) < 1e-14 * 10);
            utw_curve_point(&c, 0.25 + 0.6 * t, p);
            utw_curve_point(&s, t, q);
            assert_true(utw_distance(p, q) < 1e-14 * 10);
        }
    }
}

static void circle_arc_has_its_length_turning_and_box(void **state)
{
    (void)state;
    const double o[2] = {2.5, -1}, from[2] = {2.5 + 1.7, -1}, to[2] = {2.5, -1 - 1.7};
    const utw_curve c = utw_curve_arc(o, 1.7, 0, 1.5 * UTW_PI, from, to);
    assert_close(utw_curve_length(&c), 1.7 * 1.5 * UTW_PI, 1e-14);
    assert_close(utw_curve_turning(&c), 1.5 * UTW_PI, 1e-12);
    double box[4];
    utw_curve_box(&c, box);
    assert_close(box[0], 0.8, 1e-14);
    assert_close(box[1], -2.7, 1e-14);
    assert_close(box[2], 4.2, 1e-14);
    assert_close(box[3], 0.7, 1e-14);
}

static void box_holds_every_point(void **state)
{
    (void)state;
    for (int kind = 0; kind < 4; kind++) {
        const utw_curve c = sample(kind);
        double box[4], seen[4] = {1e9, 1e9, -1e9, -1e9};
        utw_curve_box(&c, box);
        for (int i = 0; i <= 4000; i++) {
            double p[2];
            utw_curve_point(&c, i / 4000.0, p);
            for (int k = 0; k < 2; k++) {
                seen[k] = fmin(seen[k], p[k]);
                seen[k + 2] = fmax(seen[k + 2], p[k]);
            }
        }
        for (int k = 0; k < 4; k++) assert_close_scaled(seen[k], box[k], 1e-6, 1);
    }
}

static void points_in_line_make_no_arc(void **state)
{
    (void)state;
    const double a[2] = {0, 0}, m[2] = {1, 1}, b[2] = {3, 3};
    utw_curve c;
    assert_int_equal(utw_curve_arc_through(a, m, b, &c), -1);
    assert_int_equal(utw_curve_arc_through(a, a, b, &c), -1);
    assert_int_equal(utw_curve_arc_through(a, m, a, &c), -1);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(derivatives_match_differences),
        cmocka_unit_test(pieces_and_reversal_lie_on_the_curve),
        cmocka_unit_test(circle_arc_has_its_length_turning_and_box),
        cmocka_unit_test(box_holds_every_point),
        cmocka_unit_test(points_in_line_make_no_arc),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
