/* SPDX-License-Identifier: GPL-3.0-or-later
 * Shear stresses of a torque, the warping function and the peaks against closed solutions.
 *
 * Sources. [TG] Timoshenko and Goodier, Theory of Elasticity, 3rd ed. 1970, ch. 10, after
 * Saint-Venant, Prandtl and Galerkin; [W] Weber 1921, in [TG] (shaft with circular keyway); [S]
 * Seth, Proc. Cambridge Phil. Soc. 30 (1934) (polygon). Fixed values were evaluated to 15 digits
 * independently of this program. [N] A separate high-order finite-element code on the same outline;
 * the uncertainty is its change from one order to the next but one. */
#include "base/vec2.h"
#include "support/stressed.h"

#define LINES(outline) "{\"units\": \"mm N\", \"parts\": [{\"outline\": " outline "}]}"

/* [TG] ellipse: omega = -(A^2 - B^2)/(A^2 + B^2) x y; tau = T (-2 y/(pi A B^3), 2 x/(pi A^3 B)). */
static void test_ellipse(void **state)
{
    (void)state;
    stressed s = stressed_of(LINES("{\"ellipse\": [1,-2,2,1]}"), 1e-11);
    for (int k = 0; k < 60; k++) {
        const double r = (k % 10) / 9.0, x = 2 * r * cos(0.7 * k), y = r * sin(0.7 * k);
        const utw_stress_point p = stressed_at(&s, (utw_forces){.T = 1}, 1 + x, -2 + y);
        assert_close_scaled(p.tau_xz, -2 * y / (UTW_PI * 2), 1e-6, 0.3);
        assert_close_scaled(p.tau_yz, 2 * x / (UTW_PI * 8), 1e-6, 0.3);
        assert_close_scaled(p.omega, -0.6 * x * y, 1e-7, 0.6);
        assert_true(hypot(p.tau_xz + y / UTW_PI, p.tau_yz - x / (4 * UTW_PI)) <=
                    p.tau_error + 1e-9);
    }
    const utw_stress_peak p = stressed_peaks(&s, (utw_forces){.T = 1}).peak[UTW_TAU_MAX];
    assert_close(p.value, 0.3183098861837907, 1e-6);
    assert_true(fabs(p.value - 0.3183098861837907) <= p.error);
    assert_close(p.at[0], 1, 1e-2);
    stressed_clear(&s);
}

/* Greatest stress of a unit torque. */
static void test_peaks(void **state)
{
    (void)state;
    static const struct {
        const char *what, *json;
        double tau, rtol;
    } row[] = {
        {"[TG] equilateral triangle of side 1", LINES("[[0,0], [1,0], [0.5,0.8660254037844386]]"),
         20, 1e-8},
        {"[TG] right isosceles triangle", LINES("[[0,0], [1,0], [0,1]]"), 17.59987700416261, 1e-6},
        {"[S] hexagon",
         LINES("[[0.8660254037844387,0.5], [0,1], [-0.8660254037844387,0.5], "
               "[-0.8660254037844387,-0.5], [0,-1], [0.8660254037844387,-0.5]]"),
         1.025452317234348, 1e-6},
        {"[TG] rectangle 2 x 1", LINES("[[-1,-0.5], [1,-0.5], [1,0.5], [-1,0.5]]"),
         2.033525994543918, 1e-6},
        {"[TG] square", LINES("[[0,0], [1,0], [1,1], [0,1]]"), 4.803875537754188, 1e-6},
        {"[TG] rectangle 10 x 1", LINES("[[0,0], [10,0], [10,1], [0,1]]"), 0.3201791837865643,
         1e-6},
        {"[TG] semicircle", LINES("[[0,-1], {\"at\": [0,1], \"bulge\": 1}]"), 2.85265339032459,
         5e-6},
    };
    for (size_t i = 0; i < sizeof row / sizeof *row; i++) {
        stressed s = stressed_of(row[i].json, 1e-10);
        const utw_stress_peaks p = stressed_peaks(&s, (utw_forces){.T = 1});
        assert_close(p.peak[UTW_TAU_MAX].value, row[i].tau, row[i].rtol);
        assert_true(fabs(p.peak[UTW_TAU_MAX].value - row[i].tau) <= p.peak[UTW_TAU_MAX].error);
        assert_close(p.peak[UTW_VON_MISES].value, sqrt(3) * row[i].tau, row[i].rtol);
        assert_close(p.peak[UTW_PRINCIPAL_MAX].value, row[i].tau, row[i].rtol);
        assert_close(p.peak[UTW_PRINCIPAL_MIN].value, -row[i].tau, row[i].rtol);
        assert_int_equal(p.unbounded, 0);
        stressed_clear(&s);
    }
}

/* [TG] middle of the short side of a rectangle, and its warping function at two points. */
static void test_rectangle_values(void **state)
{
    (void)state;
    stressed s = stressed_of(LINES("[[-1,-0.5], [1,-0.5], [1,0.5], [-1,0.5]]"), 1e-11);
    const utw_forces f = {.T = 1};
    assert_close(stressed_at(&s, f, 1, 0).tau_yz, 1.616727703569443, 1e-6);
    assert_close(stressed_at(&s, f, 0, -0.5).tau_xz, 2.033525994543918, 1e-6);
    assert_close_scaled(stressed_at(&s, f, 0, -0.5).tau_yz, 0, 1e-6, 1);
    assert_close(stressed_at(&s, f, 0.3, 0.2).omega, -0.04577381869009641, 1e-6);
    assert_close(stressed_at(&s, f, 1, 0.5).omega, -0.2295845930010945, 1e-6);
    stressed_clear(&s);
    s = stressed_of(LINES("[[-5,-0.5], [5,-0.5], [5,0.5], [-5,0.5]]"), 1e-11);
    assert_close(stressed_at(&s, f, 5, 0).tau_yz, 0.2377182922849207, 1e-6);
    stressed_clear(&s);
    s = stressed_of(LINES("[[-0.5,-0.5], [0.5,-0.5], [0.5,0.5], [-0.5,0.5]]"), 1e-11);
    assert_close(stressed_at(&s, f, 0.3, 0.1).omega, 0.003494803397770675, 1e-5);
    stressed_clear(&s);
}

/* [W] shaft of radius 1 about (1, 0) with a keyway of radius 0.3 about (0, 0): the bottom of the
 * keyway, the far side, and omega about the shear centre. */
static void test_keyway(void **state)
{
    (void)state;
    const double c = 0.045, y = 0.3 * sin(81.37307344132137 * UTW_PI / 180);
    char json[400];
    snprintf(json, sizeof json,
             LINES("[{\"at\": [%.17g,%.17g], \"arc\": [2,0]}, {\"at\": [%.17g,%.17g], \"arc\": "
                   "[0.3,0]}]"),
             c, y, c, -y);
    /* the outer arc runs from the lower end to the upper one, the keyway back */
    stressed s = stressed_of(json, 1e-12);
    const utw_forces f = {.T = 1};
    assert_close(stressed_at(&s, f, 0.3, 0).tau, 1.255675103478009, 1e-6);
    assert_close(stressed_at(&s, f, 2, 0).tau_yz, 0.7220131844998554, 1e-6);
    assert_close(stressed_at(&s, f, 1, 1).omega, 0.03821466282993973, 1e-5);
    const utw_stress_peak p = stressed_peaks(&s, f).peak[UTW_TAU_MAX];
    assert_close(p.value, 1.255675103478009, 1e-6);
    assert_close(p.at[0], 0.3, 1e-4);
    stressed_clear(&s);
}

/* [N] points of sections with sharp and with rounded corners. */
static void test_separate_code(void **state)
{
    (void)state;
    const utw_forces f = {.T = 1};
    stressed s =
        stressed_of("{\"units\": \"mm N\", \"parts\": [{\"outline\": [[0,0], [2,0], [2,2], [0,2]], "
                    "\"holes\": [[[0.2,0.2], [1.8,0.2], [1.8,1.8], [0.2,1.8]]]}]}",
                    1e-9);
    assert_close(stressed_at(&s, f, 1, 2).tau, 0.92540714301, 1e-6);
    stressed_clear(&s);
    s = stressed_of(
        "{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 1, \"nu\": 0.3}}, \"parts\": "
        "[{\"material\": \"m\", \"outline\": [[0,-1], [1,-1], [1,-0.8], [0.15,-0.8], "
        "[0.15,0.8], [1,0.8], [1,1], [0,1]]}]}",
        1e-9);
    assert_close(stressed_at(&s, f, 0.5, -1).tau, 29.779552758, 1e-6);
    const utw_stress_point p = stressed_at(&s, (utw_forces){.Vy = 1}, 0, 0);
    assert_close(p.tau_yz, 4.051591842, 1e-6);
    assert_close_scaled(p.tau_xz, 0, 1e-6, 4);
    stressed_clear(&s);
    /* angle 100 x 100 x 10, root radius 12, toes 6: the middle of the fillet */
    s = stressed_of(
        LINES("[[0,0], [100,0], {\"at\": [100,10], \"round\": 6}, {\"at\": [10,10], \"round\": "
              "12}, {\"at\": [10,100], \"round\": 6}, [0,100]]"),
        1e-11);
    assert_close(stressed_at(&s, f, 13.514718625761429, 13.514718625761429).tau, 0.000223886843,
                 1e-6);
    const utw_stress_peak top = stressed_peaks(&s, f).peak[UTW_TAU_MAX];
    assert_close(top.value, 0.000223886843, 2e-6);
    assert_close(top.at[0], 13.514718625761429, 1e-4);
    assert_close(top.at[1], 13.514718625761429, 1e-4);
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_ellipse),          balanced_test(test_peaks),
        balanced_test(test_rectangle_values), balanced_test(test_keyway),
        balanced_test(test_separate_code),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
