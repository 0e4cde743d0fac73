/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "section/constants.h"

#include "base/vec2.h"
#include "support/support.h"

static utw_constant_value value[UTW_CONSTANT_COUNT];

static void is(utw_constant which, double expected)
{
    assert_int_equal(value[which].absent, UTW_OK);
    assert_close_scaled(value[which].quantity.value, expected, 1e-11, 1e-3);
    assert_true(value[which].quantity.low <= expected + 1e-9 * fabs(expected) + 1e-12 &&
                expected - 1e-9 * fabs(expected) - 1e-12 <= value[which].quantity.high);
}

/* A disc of radius R about (xc, yc) solved exactly: omega = 0, z_x = x (3 R^2 - r^2)/8, so that
 * int |grad z|^2 = int x z = 7 pi R^6 / 96 (elementary). Here with R as the net's unit. */
static void circle(utw_solved *s, utw_area *a, double R)
{
    const double A = UTW_PI * R * R, I = A * R * R / 4;
    *a = (utw_area){.A = A, .xc = 3, .yc = -2, .Ixx = I, .Iyy = I};
    *s = (utw_solved){.net = NULL};
    s->now.stress[UTW_TORSION][UTW_TORSION] = UTW_PI / 2; /* int r^2 dA for R = 1 */
    s->now.energy[UTW_SHEAR_X][UTW_SHEAR_X] = 7 * UTW_PI / 96;
    s->now.energy[UTW_SHEAR_Y][UTW_SHEAR_Y] = 7 * UTW_PI / 96;
}

static void a_circle_from_its_energies(void **state)
{
    (void)state;
    const double R = 2.5;
    utw_solved s;
    utw_area a;
    circle(&s, &a, R);
    memset(value, 0, sizeof value);
    utw_constants_of_solution(&a, R, &s, 0, value);
    is(UTW_J, UTW_PI * pow(R, 4) / 2);
    is(UTW_XS, 3);
    is(UTW_YS, -2);
    is(UTW_XF, 3);
    /* 1/As = int |tau|^2 for V = 1: energy/(I^2) = 7 pi/96 / (pi/4)^2 = 7/(6 pi), k = 6/7 at nu = 0
     */
    is(UTW_ASX, 6.0 / 7 * UTW_PI * R * R);
    is(UTW_KY, 6.0 / 7);
    is(UTW_R0, R / sqrt(2));
    is(UTW_BETAX, 0);
    is(UTW_IW, 0);
    utw_constants_of_solution(&a, R, &s, UTW_NAN, value);
    assert_int_equal(value[UTW_KX].absent, UTW_E_MATERIAL);
    assert_int_equal(value[UTW_XF].absent, UTW_E_MATERIAL);
    assert_int_equal(value[UTW_J].absent, UTW_OK);
}

/* J = stress - gap/2 +- gap/2: the stress's square is the high bound, less the gap the low one. */
static void gaps_become_brackets(void **state)
{
    (void)state;
    utw_solved s;
    utw_area a;
    circle(&s, &a, 1);
    s.now.gap[UTW_TORSION][UTW_TORSION] = 0.02;
    s.now.gap[UTW_SHEAR_Y][UTW_SHEAR_Y] = 0.005;
    s.now.energy[UTW_TORSION][UTW_SHEAR_Y] = s.now.energy[UTW_SHEAR_Y][UTW_TORSION] = 0.1;
    utw_constants_of_solution(&a, 1, &s, 0.3, value);
    const utw_quantity J = value[UTW_J].quantity, x = value[UTW_XS].quantity;
    assert_int_equal(J.trust, UTW_BRACKET);
    assert_close(J.high, UTW_PI / 2, 1e-12);
    assert_close(J.low, UTW_PI / 2 - 0.02, 1e-12);
    assert_close(J.value, UTW_PI / 2 - 0.01, 1e-12);
    /* xs = -int grad omega . grad z_y / Ixx, half width sqrt(0.02 * 0.005)/2 / Ixx = 0.005/Ixx */
    const double I = UTW_PI / 4;
    assert_close(x.value, 3 - 0.1 / I, 1e-12);
    assert_close(x.high - x.value, 0.005 / I, 1e-9);
    assert_close(x.value - x.low, 0.005 / I, 1e-9);
}

static void area_integrals_are_exact(void **state)
{
    (void)state;
    utw_area a = {.A = 1,
                  .perimeter = 2,
                  .xc = 3,
                  .yc = 4,
                  .Ixx = 5,
                  .Iyy = 6,
                  .Ixy = 7,
                  .I1 = 8,
                  .I2 = 9,
                  .angle = 10,
                  .rx = 11,
                  .ry = 12,
                  .Wx_top = 13,
                  .Wx_bottom = 14,
                  .Wy_left = 15,
                  .Wy_right = 16,
                  .Zx = 17,
                  .Zy = 18,
                  .xp = 19,
                  .yp = 20};
    memset(value, 0, sizeof value);
    utw_constants_of_area(&a, value);
    for (int i = 0; i <= UTW_YP; i++) { /* the constants stand in the order of the struct here */
        is((utw_constant)i, i + 1);
        assert_int_equal(value[i].quantity.trust, UTW_EXACT);
        assert_true(value[i].quantity.low == value[i].quantity.high);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(a_circle_from_its_energies),
        balanced_test(gaps_become_brackets),
        balanced_test(area_integrals_are_exact),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
