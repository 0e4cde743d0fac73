/* SPDX-License-Identifier: GPL-3.0-or-later
 * Shear stresses of a transverse force against closed solutions.
 *
 * Sources. [TG] Timoshenko and Goodier, Theory of Elasticity, 3rd ed. 1970, ch. 11 (rectangle,
 * circle, ellipse), after Saint-Venant; [L] Love, Mathematical Theory of Elasticity, 4th ed. 1927,
 * ch. XV. The fixed values were evaluated to 16 digits from these, independently of this program.
 */
#include "base/vec2.h"
#include "support/stressed.h"

/* ---- the rectangle --------------------------------------------------------------------------- */

/* [TG] Vy = 1 on |x| <= w, |y| <= h: tau = (h^2 - y^2)/(2 I) along y, plus mu/I times the curl of a
 * function with nabla^2 phi = -2 x that vanishes on the sides, mu = nu/(2(1+nu)):
 * phi = x (w^2 - x^2)/3 - sum a_n sin(k x) cosh(k y)/cosh(k h), k = n pi/w,
 * a_n = 4 w^3 (-1)^(n+1)/(n pi)^3. */
static void rectangle(double w, double h, double nu, double x, double y, double tau[2])
{
    const double I = 4 * w * h * h * h / 3, mu = nu / (2 * (1 + nu));
    double phi_x = (w * w - 3 * x * x) / 3, phi_y = 0;
    for (int n = 4000; n > 0; n--) {
        const double k = n * UTW_PI / w,
                     a = 4 * w * w * w * (n % 2 == 1 ? 1 : -1) / pow(n * UTW_PI, 3);
        const double up = exp(k * (fabs(y) - h)), e = exp(-2 * k * fabs(y)),
                     over = 1 + exp(-2 * k * h);
        phi_x -= a * k * cos(k * x) * up * (1 + e) / over;
        phi_y -= a * k * sin(k * x) * up * (1 - e) / over * (y < 0 ? -1 : 1);
    }
    tau[0] = mu * phi_y / I;
    tau[1] = ((h * h - y * y) / 2 - mu * phi_x) / I;
}

/* Everywhere, at side ratios 1/2, 1, 2: to the tolerance of the solution, and within the error that
 * is stated with each value. The corners, where the series converges slowly, are left out. */
static void test_rectangle(void **state)
{
    (void)state;
    static const double size[3][2] = {{1.3, 2.6}, {1.7, 1.7}, {2.6, 1.3}}, ratio[2] = {0, 0.3};
    for (int i = 0; i < 6; i++) {
        const double b = size[i / 2][0], h = size[i / 2][1], nu = ratio[i % 2];
        stressed s = stressed_rectangle(b, h, nu, 1e-9);
        for (int k = 0; k < 17 * 17; k++) {
            const double x = b / 2 * (k % 17 - 8) / 8, y = 0.96 * h / 2 * (k / 17 - 8.0) / 8;
            double tau[2];
            rectangle(b / 2, h / 2, nu, x, y, tau);
            const utw_stress_point p = stressed_at(&s, (utw_forces){.Vy = 1}, x, y);
            const double apart = hypot(p.tau_xz - tau[0], p.tau_yz - tau[1]);
            assert_true(apart < 5e-4 / (b * h));
            assert_true(apart <= p.tau_error + 1e-6 / (b * h));
            assert_true(p.sigma_z == 0);
        }
        stressed_clear(&s);
    }
}

/* The same points lie as exactly as the program says: a coarse solution states larger errors, and
 * they hold. */
static void test_stated_error(void **state)
{
    (void)state;
    stressed s = stressed_rectangle(2, 1, 0.3, 1e-4);
    int apart_at_all = 0;
    for (int k = 0; k < 21 * 21; k++) {
        const double x = (k % 21 - 10) / 10.0, y = 0.97 * 0.5 * (k / 21 - 10.0) / 10;
        double tau[2];
        rectangle(1, 0.5, 0.3, x, y, tau);
        const utw_stress_point p = stressed_at(&s, (utw_forces){.Vy = 1}, x, y);
        const double apart = hypot(p.tau_xz - tau[0], p.tau_yz - tau[1]);
        assert_true(apart <= p.tau_error);
        assert_true(p.tau_error < 0.05);
        apart_at_all += apart > 1e-5;
    }
    assert_true(apart_at_all > 100); /* or the check above would say nothing */
    stressed_clear(&s);
}

/* Vx on a rectangle is Vy on the same one turned. */
static void test_rectangle_vx(void **state)
{
    (void)state;
    stressed s = stressed_rectangle(2, 1, 0.3, 1e-9);
    for (int k = 0; k < 5; k++) {
        const double x = 0.18 * k, y = 0.11 * k - 0.2;
        double tau[2];
        rectangle(0.5, 1, 0.3, y, -x, tau); /* turned by a quarter: x' = y, y' = -x */
        const utw_stress_point p = stressed_at(&s, (utw_forces){.Vx = 1}, x, y);
        assert_close_scaled(p.tau_xz, tau[1], 1e-5, 1);
        assert_close_scaled(p.tau_yz, -tau[0], 1e-5, 1);
    }
    stressed_clear(&s);
}

/* [TG] at the middle and at the ends of the horizontal axis, to all digits; the peak is there. */
static void test_rectangle_values(void **state)
{
    (void)state;
    static const struct {
        double b, h, nu, centre, edge;
    } row[] = {
        {2, 1, 0, 0.75, 0.75},
        {2, 1, 0.3, 0.6255039063041932, 1.093029317828971},
        {1, 1, 0.25, 1.410377379976281, 1.689395460915409},
        {10, 1, 0.3, 0.1153847845212267, 0.6293910545226331},
    };
    for (size_t i = 0; i < sizeof row / sizeof *row; i++) {
        stressed s = stressed_rectangle(row[i].b, row[i].h, row[i].nu, 1e-10);
        const utw_forces f = {.Vy = 1};
        const utw_stress_point c = stressed_at(&s, f, 0, 0),
                               e = stressed_at(&s, f, row[i].b / 2, 0);
        assert_close(c.tau_yz, row[i].centre, 2e-6);
        assert_close(e.tau_yz, row[i].edge, 2e-6);
        assert_close_scaled(c.tau_xz, 0, 1e-6, 1);
        const utw_stress_peak p = stressed_peaks(&s, f).peak[UTW_TAU_MAX];
        assert_close(p.value, row[i].edge, 2e-6);
        assert_true(fabs(p.value - row[i].edge) <= p.error + 1e-9);
        if (row[i].nu > 0) {
            assert_close(fabs(p.at[0]), row[i].b / 2, 1e-9);
            assert_close_scaled(p.at[1], 0, 5e-3, 1);
        }
        stressed_clear(&s);
    }
}

/* ---- circle, ellipse, tube ------------------------------------------------------------------- */

/* [TG], [L] circle of radius a: tau_y = (3+2nu)/(8(1+nu) I) (a^2 - y^2 - (1-2nu)/(3+2nu) x^2),
 * tau_x = -(1+2nu)/(4(1+nu) I) x y. */
static void test_circle(void **state)
{
    (void)state;
    const double a = 2.385, nu = 0.3, I = UTW_PI * a * a * a * a / 4;
    char json[300];
    snprintf(json, sizeof json,
             "{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 1, \"nu\": 0.3}}, \"parts\": "
             "[{\"material\": \"m\", \"outline\": {\"circle\": [5, -3, %.17g]}}]}",
             a);
    stressed s = stressed_of(json, 1e-10);
    for (int k = 0; k < 60; k++) {
        const double r = a * (k % 10) / 9, phi = 0.7 * k, x = r * cos(phi), y = r * sin(phi);
        const utw_stress_point p = stressed_at(&s, (utw_forces){.Vy = 1}, 5 + x, -3 + y);
        assert_close_scaled(p.tau_yz,
                            (3 + 2 * nu) / (8 * (1 + nu) * I) *
                                (a * a - y * y - (1 - 2 * nu) / (3 + 2 * nu) * x * x),
                            2e-6, 0.1);
        assert_close_scaled(p.tau_xz, -(1 + 2 * nu) / (4 * (1 + nu) * I) * x * y, 2e-6, 0.1);
    }
    /* greatest in the middle: found inside an element */
    const utw_stress_peak p = stressed_peaks(&s, (utw_forces){.Vy = 1}).peak[UTW_TAU_MAX];
    assert_close(p.value, (3 + 2 * nu) / (8 * (1 + nu) * I) * a * a, 1e-7);
    assert_close(p.at[0], 5, 1e-2);
    assert_close(p.at[1], -3, 1e-2);
    stressed_clear(&s);
}

/* [L] ellipse with semi-axes A along x, B along y under Vy: grad z with z = y (al + be x^2 + ga
 * y^2) and the curl of phi = C x (1 - x^2/A^2 - y^2/B^2), C = A^2 B^2/(3 B^2 + A^2). */
static void test_ellipse(void **state)
{
    (void)state;
    const double A = 2, B = 1, nu = 0.3, I = UTW_PI * A * B * B * B / 4, mu = nu / (2 * (1 + nu));
    const double al = 1 / (2 / (2 * B * B + A * A) + 2 / (B * B)), be = -al / (2 * B * B + A * A),
                 ga = -al / (3 * B * B), C = A * A * B * B / (3 * B * B + A * A);
    stressed s =
        stressed_of("{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 1, \"nu\": 0.3}}, "
                    "\"parts\": [{\"material\": \"m\", \"outline\": {\"ellipse\": [0,0,2,1]}}]}",
                    1e-12);
    for (int k = 0; k < 60; k++) {
        const double r = (k % 10) / 9.0, x = A * r * cos(0.7 * k), y = B * r * sin(0.7 * k);
        const double phi_x = C * (1 - 3 * x * x / (A * A) - y * y / (B * B)),
                     phi_y = -2 * C * x * y / (B * B);
        const utw_stress_point p = stressed_at(&s, (utw_forces){.Vy = 1}, x, y);
        assert_close_scaled(p.tau_xz, (2 * be * x * y + mu * phi_y) / I, 2e-6, 0.3);
        assert_close_scaled(p.tau_yz, (al + be * x * x + 3 * ga * y * y - mu * phi_x) / I, 2e-6,
                            0.3);
    }
    /* [L] to all digits */
    const utw_forces f = {.Vy = 1};
    assert_close(stressed_at(&s, f, 0, 0).tau_yz, 0.2308621152541778, 2e-6);
    assert_close(stressed_at(&s, f, 2, 0).tau_yz, 0.1748955418592256, 2e-6);
    stressed_clear(&s);
}

/* [TG], [L] tube of radii 1 and 0.6, at the ends of the axis across the force. */
static void test_tube(void **state)
{
    (void)state;
    static const double nu[2] = {0, 0.3}, outer[2] = {0.7606670074244998, 0.814678865939849},
                        inner[2] = {1.228769781224192, 1.174757922708843};
    for (int i = 0; i < 2; i++) {
        char json[300];
        snprintf(json, sizeof json,
                 "{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 1, \"nu\": %g}}, \"parts\": "
                 "[{\"material\": \"m\", \"outline\": {\"circle\": [0,0,1]}, \"holes\": "
                 "[{\"circle\": [0,0,0.6]}]}]}",
                 nu[i]);
        stressed s = stressed_of(json, 1e-11);
        const utw_forces f = {.Vy = 1};
        assert_close(stressed_at(&s, f, 1, 0).tau_yz, outer[i], 1e-5);
        assert_close(stressed_at(&s, f, -0.6, 0).tau_yz, inner[i], 1e-5);
        const utw_stress_peak p = stressed_peaks(&s, f).peak[UTW_TAU_MAX];
        assert_close(p.value, inner[i], 1e-5);
        assert_close(hypot(p.at[0], p.at[1]), 0.6, 1e-9);
        stressed_clear(&s);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_rectangle),    balanced_test(test_stated_error),
        balanced_test(test_rectangle_vx), balanced_test(test_rectangle_values),
        balanced_test(test_circle),       balanced_test(test_ellipse),
        balanced_test(test_tube),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
