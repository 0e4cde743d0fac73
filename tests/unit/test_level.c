/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/vec2.h"
#include "outline/level.h"
#include "support/support.h"

static void sample(utw_curve c[4])
{
    const double o[2] = {0.3, -0.2}, from[2] = {2.3, -0.2}, b[2] = {1, 3}, c1[2] = {4, -3},
                 c2[2] = {-3, 5};
    c[0] = utw_curve_line(from, b);
    c[1] = utw_curve_arc(o, 2, 0, 2 * UTW_PI, from, from);
    c[2] = utw_curve_cubic(from, c1, c2, b);
    c[3] = utw_curve_arc(o, 2, 5, -1, o, o); /* an ellipse run clockwise, nearly a full turn */
    c[3].u[1] = 0.7, c[3].v[0] = -0.4;
    for (int k = 0; k < 2; k++) {
        c[3].from[k] = o[k] + c[3].u[k] * cos(5) + c[3].v[k] * sin(5);
        c[3].to[k] = o[k] + c[3].u[k] * cos(-1) + c[3].v[k] * sin(-1);
    }
}

static void pieces_are_monotone(void **state)
{
    (void)state;
    utw_curve c[4];
    sample(c);
    const int expected[4][2] = {{1, 1}, {2, 3}, {3, 3}, {3, 3}};
    for (int i = 0; i < 4; i++)
        for (int k = 0; k < 2; k++) {
            double t[UTW_MONOTONE_MAX + 1];
            const int n = utw_curve_monotone(&c[i], k, t);
            assert_int_equal(n, expected[i][k]);
            assert_true(t[0] == 0 && t[n] == 1);
            for (int j = 0; j < n; j++) {
                double p[2], q[2];
                assert_true(t[j] < t[j + 1]);
                utw_curve_point(&c[i], t[j], p);
                utw_curve_point(&c[i], t[j + 1], q);
                const double sign = q[k] > p[k] ? 1 : -1;
                for (int s = 1; s <= 50; s++) {
                    utw_curve_point(&c[i], t[j] + (t[j + 1] - t[j]) * s / 50, q);
                    assert_true(sign * (q[k] - p[k]) >= -1e-15);
                    p[k] = q[k];
                }
            }
        }
}

static void levels_are_found_again(void **state)
{
    (void)state;
    utw_curve c[4];
    sample(c);
    for (int i = 0; i < 4; i++)
        for (int k = 0; k < 2; k++) {
            double t[UTW_MONOTONE_MAX + 1];
            const int n = utw_curve_monotone(&c[i], k, t);
            for (int j = 0; j < n; j++)
                for (double s = 0; s <= 1; s += 1.0 / 64) {
                    double p[2], q[2];
                    utw_curve_point(&c[i], t[j] + s * (t[j + 1] - t[j]), p);
                    const double u = utw_curve_at_level(&c[i], k, p[k], t[j], t[j + 1]);
                    utw_curve_point(&c[i], u, q);
                    assert_true(u >= t[j] && u <= t[j + 1]);
                    assert_close_scaled(q[k], p[k], 2e-15, 4);
                }
        }
}

static void level_out_of_reach_gives_the_nearer_end(void **state)
{
    (void)state;
    utw_curve c[4];
    sample(c);
    assert_true(utw_curve_at_level(&c[0], 1, 9, 0, 1) == 1);
    assert_true(utw_curve_at_level(&c[0], 1, -9, 0, 1) == 0);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(pieces_are_monotone),
        cmocka_unit_test(levels_are_found_again),
        cmocka_unit_test(level_out_of_reach_gives_the_nearer_end),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
