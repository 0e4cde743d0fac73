/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/gauss.h"
#include "base/vec2.h"
#include "section/boundary.h"
#include "support/drawing.h"
#include "support/support.h"

static void origin_is_the_middle_of_the_box(void **state)
{
    (void)state;
    drawing d;
    drawing_init(&d);
    drawing_part(&d, 0);
    drawing_circle(&d, 3, -7, 2);
    const double weight[1] = {2.385};
    utw_boundary b;
    utw_error err;
    assert_ok(utw_boundary_init(&b, drawing_done(&d), weight, &err));
    assert_close(b.origin[0], 3, 1e-15);
    assert_close(b.origin[1], -7, 1e-15);
    assert_close_scaled(b.curve[0].centre[1], 0, 1e-15, 1);
    assert_true(b.weight[0] == 2.385);
    const double shift[2] = {1, 1};
    utw_boundary_move(&b, shift);
    assert_close(b.curve[0].from[0], 1, 1e-15);
    assert_close(b.origin[0], 4, 1e-15);
    utw_boundary_clear(&b);
    drawing_clear(&d);
}

/* The rule must not change when every piece is halved once more. */
static void rule_integrates_to_rounding(void **state)
{
    (void)state;
    const double o[2] = {0, 0}, a[2] = {2, 0.5}, c1[2] = {3, 1}, c2[2] = {-1, 3}, b[2] = {1, 1};
    utw_curve c[3] = {utw_curve_line(a, b), utw_curve_cubic(a, c1, c2, b),
                      utw_curve_arc(o, 1.5, 0.2, 0.2 + 2 * UTW_PI, o, o)};
    for (int k = 0; k < 2; k++) c[2].from[k] = c[2].to[k] = 1.5 * (k ? sin(0.2) : cos(0.2));
    for (int i = 0; i < 3; i++)
        for (int degree = 0; degree <= 3; degree++) {
            int pieces, points;
            double sum[2] = {0, 0}, scale = 0, t[UTW_GAUSS_MAX], w[UTW_GAUSS_MAX];
            utw_boundary_rule(&c[i], degree, &pieces, &points);
            utw_gauss(points, t, w);
            for (int finer = 0; finer < 2; finer++)
                for (int j = 0; j < pieces << finer; j++)
                    for (int q = 0; q < points; q++) {
                        double p[2], d[2];
                        utw_curve_point(&c[i], (j + t[q]) / (pieces << finer), p);
                        utw_curve_d1(&c[i], (j + t[q]) / (pieces << finer), d);
                        const double g = w[q] / (pieces << finer) * utw_cross(p, d) *
                                         pow(p[0] + 2 * p[1], degree);
                        sum[finer] += g;
                        scale += fabs(g) / 2;
                    }
            assert_close_scaled(sum[1], sum[0], 1e-14, scale);
        }
}

static void small_terms_are_not_lost(void **state)
{
    (void)state;
    utw_sum sum = {0, 0};
    utw_sum_add(&sum, 1e16);
    for (int i = 0; i < 1000; i++) utw_sum_add(&sum, 1.0 / 1024);
    utw_sum_add(&sum, -1e16);
    assert_true(utw_sum_value(&sum) == 1000.0 / 1024);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(origin_is_the_middle_of_the_box),
        balanced_test(rule_integrates_to_rounding),
        balanced_test(small_terms_are_not_lost),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
