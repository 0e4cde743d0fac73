/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "section/stress.h"
#include "section/stress_case.h"
#include "support/stressed.h"

/* The factors of an unsymmetric section by hand: sigma_z = N/A + ((Mx Iyy + My Ixy) y - (My Ixx +
 * Mx Ixy) x)/D. */
static void test_factors(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_of(stressed_sample(4), 1e-6);
    const double A = stressed_constant(&s, UTW_A), Ixx = stressed_constant(&s, UTW_IXX),
                 Iyy = stressed_constant(&s, UTW_IYY), Ixy = stressed_constant(&s, UTW_IXY),
                 xs = stressed_constant(&s, UTW_XS), ys = stressed_constant(&s, UTW_YS),
                 L = s.solution->unit, D = Ixx * Iyy - Ixy * Ixy;
    const utw_forces f = {11, 3, -5, 700, -400, 90, 2e4, 1, {3, 20}};
    utw_stress_case c;
    assert_ok(utw_stress_case_of(&s.stress->unit, &f, &c, &err));
    assert_close(c.one, 11 / A, 1e-13);
    assert_close(c.x / L, -(-400 * Ixx + 700 * Ixy) / D, 1e-12);
    assert_close(c.y / L, (700 * Iyy + -400 * Ixy) / D, 1e-12);
    assert_close(c.omega / (L * L), 2e4 / stressed_constant(&s, UTW_IW), 1e-12);
    assert_close(c.t[UTW_UNIT_VX] * L * L, 3, 1e-13);
    assert_close(c.t[UTW_UNIT_VY] * L * L, -5, 1e-13);
    assert_close(c.t[UTW_UNIT_T] * L * L * L, 90 - 5 * (3 - xs) - 3 * (20 - ys), 1e-12);
    assert_int_equal(c.sheared, 1);
    assert_true(c.t_error[UTW_UNIT_T] > 0 && c.t_error[UTW_UNIT_T] < 1e-4 * fabs(c.t[UTW_UNIT_T]));
    const utw_forces bent = {.N = 1, .Mx = 2};
    assert_ok(utw_stress_case_of(&s.stress->unit, &bent, &c, &err));
    assert_int_equal(c.sheared, 0);
    stressed_clear(&s);
}

/* A case of bending has no error but rounding; one of a bimoment states one that holds. */
static void test_errors_of_sigma(void **state)
{
    (void)state;
    stressed fine = stressed_of(stressed_sample(1), 1e-11),
             coarse = stressed_of(stressed_sample(1), 1e-3);
    const utw_forces bent = {.Mx = 1e4}, warped = {.B = 1e5};
    double apart = 0;
    for (int k = 0; k < 10; k++) {
        const double x = 4.5, y = 5 + 7 * k;
        const utw_stress_point a = stressed_at(&fine, bent, x, y),
                               b = stressed_at(&coarse, bent, x, y);
        assert_close(a.sigma_z, b.sigma_z, 1e-12);
        assert_true(b.sigma_error < 1e-12 * fabs(b.sigma_z) + 1e-12);
        const utw_stress_point c = stressed_at(&fine, warped, x, y),
                               d = stressed_at(&coarse, warped, x, y);
        assert_true(fabs(c.sigma_z - d.sigma_z) <= d.sigma_error);
        apart = fmax(apart, fabs(c.sigma_z - d.sigma_z));
    }
    assert_true(apart > 1e-8);
    stressed_clear(&fine);
    stressed_clear(&coarse);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_factors),
        balanced_test(test_errors_of_sigma),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
