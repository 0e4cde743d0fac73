/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "bar/hyperbolic.h"

#include "support/support.h"

/* The definitions as they stand, in extended precision where they neither overflow nor cancel much.
 */
static utw_hyper plain_end(long double k, long double x)
{
    const long double b = sinhl(k * x) / sinhl(k), b1 = k * coshl(k * x) / sinhl(k);
    return (utw_hyper){(double)((b - x) / (k * k)), (double)((b1 - 1) / (k * k)), (double)b,
                       (double)b1};
}

static utw_hyper plain_point(long double k, long double x, long double y)
{
    const long double b = -sinhl(k * x) * sinhl(k * y) / (k * sinhl(k));
    const long double b1 = -coshl(k * x) * sinhl(k * y) / sinhl(k);
    return (utw_hyper){(double)((x * y + b) / (k * k)), (double)((y + b1) / (k * k)), (double)b,
                       (double)b1};
}

static utw_hyper plain_uniform(long double k, long double x)
{
    const long double c = coshl(k / 2), b = (coshl(k * (0.5L - x)) / c - 1) / (k * k);
    const long double b1 = -sinhl(k * (0.5L - x)) / (k * c);
    return (utw_hyper){(double)((x * (1 - x) / 2 + b) / (k * k)),
                       (double)(((1 - 2 * x) / 2 + b1) / (k * k)), (double)b, (double)b1};
}

static void same(utw_hyper a, utw_hyper b, double rtol, double f_scale)
{
    assert_close_scaled(a.f, b.f, rtol, f_scale);
    assert_close_scaled(a.f1, b.f1, rtol, f_scale);
    assert_close_scaled(a.b, b.b, rtol, 1e-300);
    assert_close_scaled(a.b1, b.b1, rtol, 1e-300 + 1e-3 * fabs(b.b));
}

/* On both sides of the change from series to exponentials. */
static void plain_definitions(void **state)
{
    (void)state;
    const double ks[] = {0.3, 1, 2.385, 3.9999999, 4, 4.0000001, 7.1, 23, 300};
    for (int i = 0; i < 9; i++) {
        for (int j = 1; j < 20; j++) {
            const double k = ks[i], x = j / 20.0, scale = 0.02 / (1 + k * k);
            same(utw_hyper_end(k, x), plain_end(k, x), 3e-13, scale);
            same(utw_hyper_uniform(k, x), plain_uniform(k, x), 3e-13, scale);
            for (int l = 1; l <= 20 - j; l++)
                same(utw_hyper_point(k, x, l / 20.0), plain_point(k, x, l / 20.0), 3e-13, scale);
        }
    }
}

static void polynomials_at_small_k(void **state)
{
    (void)state;
    const double ks[] = {0, 1e-300, 1e-160, 1e-20, 1e-9, 1e-7};
    for (int i = 0; i < 6; i++) {
        for (int j = 1; j < 20; j++) {
            const double k = ks[i], x = j / 20.0;
            same(utw_hyper_end(k, x), (utw_hyper){(x * x * x - x) / 6, (3 * x * x - 1) / 6, x, 1},
                 1e-13, 1e-2);
            same(utw_hyper_uniform(k, x),
                 (utw_hyper){x * (1 - x) * (1 + x - x * x) / 24,
                             (1 - 6 * x * x + 4 * x * x * x) / 24, -x * (1 - x) / 2,
                             -(1 - 2 * x) / 2},
                 1e-13, 1e-2);
            for (int l = 1; l <= 20 - j; l++) {
                const double y = l / 20.0;
                same(utw_hyper_point(k, x, y),
                     (utw_hyper){x * y * (1 - x * x - y * y) / 6, y * (1 - 3 * x * x - y * y) / 6,
                                 -x * y, -y},
                     1e-13, 1e-2);
            }
        }
    }
}

/* For large k the bimoments live in layers of width 1/k and the twists are those of a bar that does
 * not warp. */
static void layers_at_large_k(void **state)
{
    (void)state;
    for (double k = 1e3; k < 1e101; k *= 1e7) {
        const double x = 0.37, y = 0.41;
        assert_close(utw_hyper_end(k, x).f * k * k, -x, 1e-12);
        assert_close(utw_hyper_end(k, 1).b, 1, 1e-15);
        assert_close(utw_hyper_end(k, 1).b1, k, 1e-15);
        assert_close(utw_hyper_end(k, 1).f1 * k, 1 - 1 / k, 1e-12);
        assert_close(utw_hyper_uniform(k, x).b * k * k, -1, 1e-12);
        assert_close(utw_hyper_uniform(k, x).f * k * k, x * (1 - x) / 2 - 1 / k / k, 1e-12);
        assert_close(utw_hyper_point(k, x, y).f * k * k, x * y, 1e-12);
        assert_close(utw_hyper_point(k, x, 1 - x).b * k, -0.5, 1e-9);
        assert_close(utw_hyper_point(k, x, 1 - x).b1, -0.5, 1e-9);
        /* x + y one ulp above 1 must not be blown up */
        assert_close(utw_hyper_point(k, nextafter(x, 1), 1 - x).b * k, -0.5, 1e-9);
    }
}

static void ends_are_exact(void **state)
{
    (void)state;
    for (double k = 1e-8; k < 1e8; k *= 3.7) {
        const utw_hyper a = utw_hyper_end(k, 0), b = utw_hyper_end(k, 1),
                        c = utw_hyper_uniform(k, 0);
        assert_true(a.f == 0 && a.b == 0);
        assert_close_scaled(b.f, 0.0, 1e-15, 1 / (1 + k * k));
        assert_close(b.b, 1, 1e-15);
        assert_close_scaled(c.f, 0.0, 1e-15, 1 / (1 + k * k));
        assert_true(c.b == 0);
        assert_true(utw_hyper_point(k, 0, 0.3).b == 0 && utw_hyper_point(k, 0.3, 0).b == 0);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(plain_definitions),
        cmocka_unit_test(polynomials_at_small_k),
        cmocka_unit_test(layers_at_large_k),
        cmocka_unit_test(ends_are_exact),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
