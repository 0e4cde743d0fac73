/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/spline.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/support.h"

enum { N = 7 };
static const double point[N][2] = {{0.3, 0.1}, {1.2, 0.9}, {2.9, 1.1}, {3.1, 2.4},
                                   {2.2, 3.3}, {1.9, 5.0}, {-0.4, 5.2}};

static void tangent_and_curvature_are_continuous(void **state)
{
    (void)state;
    utw_curve c[N - 1];
    utw_error err;
    assert_ok(utw_spline_natural(N, point, c, &err));
    for (int i = 0; i < N - 1; i++) {
        assert_memory_equal(c[i].from, point[i], sizeof point[i]);
        assert_memory_equal(c[i].to, point[i + 1], sizeof point[i]);
        if (i == 0) continue;
        /* by the chord length: d/dl = (1/h) d/dt */
        const double h0 = utw_distance(point[i - 1], point[i]),
                     h1 = utw_distance(point[i], point[i + 1]);
        double a[2], b[2], aa[2], bb[2];
        utw_curve_d1(&c[i - 1], 1, a);
        utw_curve_d1(&c[i], 0, b);
        utw_curve_d2(&c[i - 1], 1, aa);
        utw_curve_d2(&c[i], 0, bb);
        for (int k = 0; k < 2; k++) {
            assert_close_scaled(a[k] / h0, b[k] / h1, 1e-13, 1);
            assert_close_scaled(aa[k] / (h0 * h0), bb[k] / (h1 * h1), 1e-12, 1);
        }
    }
}

static void the_ends_are_not_curved(void **state)
{
    (void)state;
    utw_curve c[N - 1];
    utw_error err;
    assert_ok(utw_spline_natural(N, point, c, &err));
    double a[2], b[2];
    utw_curve_d2(&c[0], 0, a);
    utw_curve_d2(&c[N - 2], 1, b);
    for (int k = 0; k < 2; k++) {
        assert_close_scaled(a[k], 0, 1e-13, 1);
        assert_close_scaled(b[k], 0, 1e-13, 1);
    }
}

/* Three equidistant points: the natural spline's slope in the middle is the central difference, and
 * at the start (5 d0 - d1)/4 with the divided differences d (from 2 m0 + m1 = 3 d0, m1 = (d0 +
 * d1)/2). */
static void three_points_agree_with_the_hand_calculation(void **state)
{
    (void)state;
    const double xy[3][2] = {{0, 0}, {1.2, 0.5}, {2.4, 0}}, h = 1.3;
    utw_curve c[2];
    utw_error err;
    assert_ok(utw_spline_natural(3, xy, c, &err));
    const double d0 = 0.5 / h, d1 = -0.5 / h;
    assert_close(c[0].c1[1], h / 3 * (5 * d0 - d1) / 4, 1e-14);
    assert_close_scaled(c[0].c2[1], 0.5 - h / 3 * (d0 + d1) / 2, 1e-14, 1);
    assert_close(c[1].c2[1], -h / 3 * (5 * d1 - d0) / 4, 1e-14);
    assert_close(c[0].c1[0], 1.2 / 3, 1e-14);
}

static void two_points_and_points_in_line_make_a_straight_line(void **state)
{
    (void)state;
    const double xy[4][2] = {{1, 1}, {1.3, 1.6}, {2, 3}, {4, 7}};
    utw_curve c[3];
    utw_error err;
    assert_ok(utw_spline_natural(2, xy, c, &err));
    assert_close(utw_curve_length(&c[0]), utw_distance(xy[0], xy[1]), 1e-14);
    assert_ok(utw_spline_natural(4, xy, c, &err));
    for (int i = 0; i < 3; i++)
        assert_close(utw_curve_length(&c[i]), utw_distance(xy[i], xy[i + 1]), 1e-13);
}

/* Away from the ends the spline through points of a circle approaches it as h^4. */
static void the_error_falls_with_the_fourth_power(void **state)
{
    (void)state;
    double last = 0;
    for (int n = 33; n <= 65; n += 32) {
        double xy[65][2];
        utw_curve c[64];
        utw_error err;
        for (int i = 0; i < n; i++) {
            const double a = 5.0 * i / (n - 1);
            xy[i][0] = 2.385 * cos(a);
            xy[i][1] = 2.385 * sin(a);
        }
        assert_ok(utw_spline_natural(n, (const double(*)[2])xy, c, &err));
        double worst = 0, p[2];
        for (int i = n / 3; i < 2 * n / 3; i++) {
            utw_curve_point(&c[i], 0.5, p);
            worst = fmax(worst, fabs(utw_norm(p) - 2.385));
        }
        if (last > 0) assert_close(last / worst, 16, 0.1);
        last = worst;
    }
}

static void memory_may_run_out(void **state)
{
    (void)state;
    for (long n = 1; n <= 2; n++) {
        utw_curve c[N - 1];
        utw_error err;
        utw_memory_fail_at(n);
        assert_int_equal(utw_spline_natural(N, point, c, &err), UTW_E_NOMEM);
        utw_memory_fail_at(0);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(tangent_and_curvature_are_continuous),
        balanced_test(the_ends_are_not_curved),
        balanced_test(three_points_agree_with_the_hand_calculation),
        balanced_test(two_points_and_points_in_line_make_a_straight_line),
        balanced_test(the_error_falls_with_the_fourth_power),
        balanced_test(memory_may_run_out),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
