/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/edge.h"

#include "base/vec2.h"
#include "outline/spline.h"
#include "support/support.h"

enum { N = 5 };
static const double point[N][2] = {{0, 0}, {1, 1}, {2.5, 0.8}, {3, -1}, {6, 0.5}};

static utw_edge spline(utw_curve *c)
{
    utw_error err;
    assert_ok(utw_spline_natural(N, point, c, &err));
    return (utw_edge){.curve = c, .n = N - 1};
}

static void parameters_run_over_the_pieces(void **state)
{
    (void)state;
    utw_curve c[N - 1];
    const utw_edge e = spline(c);
    for (int k = 0; k < N; k++) {
        double p[2];
        utw_edge_point(&e, k, p);
        assert_memory_equal(p, point[k], sizeof p);
    }
    double p[2], q[2], d[2], d2[2], a[2], b[2];
    for (double s = -0.1; s < N - 0.85; s += 0.23) {
        const double h = 1e-5;
        utw_edge_point(&e, s - h, p);
        utw_edge_point(&e, s + h, q);
        utw_edge_d1(&e, s, d);
        utw_edge_d1(&e, s - h, a);
        utw_edge_d1(&e, s + h, b);
        utw_edge_d2(&e, s, d2);
        for (int k = 0; k < 2; k++) {
            assert_close_scaled((q[k] - p[k]) / (2 * h), d[k], 1e-8, 1);
            assert_close_scaled((b[k] - a[k]) / (2 * h), d2[k], 1e-8, 10);
        }
    }
}

static void lengths_and_parameters_agree(void **state)
{
    (void)state;
    utw_curve c[N - 1];
    const utw_edge e = spline(c);
    const double whole = utw_edge_length(&e, 0, e.n);
    double sum = 0;
    for (int k = 0; k < N - 1; k++) sum += utw_curve_length(&c[k]);
    assert_close(whole, sum, 1e-13);
    for (double share = 0.03; share < 1; share += 0.097) {
        const double s = utw_edge_at_length(&e, share * whole, 0),
                     t = utw_edge_at_length(&e, share * whole, 1);
        assert_close(utw_edge_length(&e, 0, s), share * whole, 1e-12);
        assert_close(utw_edge_length(&e, t, e.n), share * whole, 1e-12);
    }
    assert_true(utw_edge_at_length(&e, 1.01 * whole, 0) > e.n);
    assert_true(utw_edge_at_length(&e, 1.01 * whole, 1) < 0);
}

static void lengths_on_lines_are_exact(void **state)
{
    (void)state;
    const utw_curve c = utw_curve_line(point[0], point[2]);
    const utw_edge e = {.curve = &c, .n = 1};
    const double length = utw_distance(point[0], point[2]);
    assert_true(utw_edge_at_length(&e, 0.3, 0) == 0.3 / length);
    assert_true(utw_edge_at_length(&e, 0.3, 1) == 1 - 0.3 / length);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(parameters_run_over_the_pieces),
        balanced_test(lengths_and_parameters_agree),
        balanced_test(lengths_on_lines_are_exact),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
