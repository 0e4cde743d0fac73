/* SPDX-License-Identifier: GPL-3.0-or-later
 * Weber's shaft with a circular keyway, in closed form.
 *
 * Source: C. Weber, Forschungsarbeiten 249 (1921); Timoshenko and Goodier, Theory of Elasticity,
 * 3rd ed. 1970, ch. 10. The shaft has radius a about (a, 0), the keyway radius b about the origin:
 * phi = (r^2 - b^2)(2 a cos(theta)/r - 1)/2, omega = -a y (1 + b^2/r^2) about the origin. Fixed
 * values were evaluated to 16 digits independently of this program. */
#include "base/gauss.h"
#include "base/vec2.h"
#include "support/section.h"

static const known fixed[] = {
    /* a = 1, b = 0.3, nu = 0.3 */
    {UTW_A, 3.00924138217406, 1e-15},
    {UTW_XC, 1.038040572147113, 1e-15},
    {UTW_IXX, 0.7827019956101097, 1e-15},
    {UTW_IYY, 0.6812700333601887, 1e-15},
    {UTW_J, 1.353853393518184, 1e-15},
    {TAU_MAX, 1.255675103478009, 1e-15}, /* at the bottom of the keyway */
    {UTW_XS, 1.08321466282994, 1e-15},   /* Trefftz's centre from omega */
    {UTW_IW, 0.005963958323582364, 1e-15},
    {UTW_XF, 1.087605469615179, 1e-15}, /* mean twist zero: Goodier, J. Aeronaut. Sci. 11 (1944) */
};

static utw_outline *shaft(double nu, double a, double b)
{
    const double at = acos(b / (2 * a)), x = b * cos(at), y = b * sin(at);
    return section_outline(
        nu,
        "\"outline\":[{\"at\":[%.17g,%.17g],\"arc\":[%.17g,0]},"
        "{\"at\":[%.17g,0],\"arc\":[%.17g,%.17g]},{\"at\":[%.17g,%.17g],\"arc\":[%.17g,%.17g]}]",
        x, -y, b, 2 * a, a * (1 + cos(-UTW_PI / 4)), -a * sin(UTW_PI / 4), x, y,
        a * (1 + cos(UTW_PI / 4)), a * sin(UTW_PI / 4));
}

/* Integrals over b < r < 2 a cos(theta). */
typedef struct sums {
    double A, x, xx, yy, phi, phi_x, omega_y, omega2;
} sums;

static sums integrate(double a, double b)
{
    const double end = acos(b / (2 * a));
    double u[32], wu[32], v[32], wv[32];
    sums s = {0};
    utw_gauss(32, u, wu);
    utw_gauss(32, v, wv);
    for (int i = 0; i < 32; i++)
        for (int j = 0; j < 32; j++) {
            const double t = end * u[i], far = 2 * a * cos(t), r = b + (far - b) * v[j];
            const double dA = 2 * end * wu[i] * (far - b) * wv[j] * r; /* both halves */
            const double x = r * cos(t), y = r * sin(t);
            const double phi = (r * r - b * b) * (far / r - 1) / 2,
                         omega = -a * y * (1 + b * b / (r * r));
            s.A += dA;
            s.x += x * dA;
            s.xx += x * x * dA;
            s.yy += y * y * dA;
            s.phi += phi * dA;
            s.phi_x += phi * x * dA;
            s.omega_y += omega * y * dA;
            s.omega2 += omega * omega * dA;
        }
    return s;
}

static void check(const known *list, size_t n, double nu, double a, double b)
{
    utw_outline *o = shaft(nu, a, b);
    assert_all_known(o, list, n, a);
    utw_outline_free(o);
}

static void shaft_at(double a, double b, double nu)
{
    const sums s = integrate(a, b);
    const double J = 2 * s.phi, xc = s.x / s.A, xs = -s.omega_y / s.yy;
    /* what Poisson's ratio moves: nu/((1+nu) Ixx) int phi (x - xc) dA, as the torque of the
     * flexural stresses without mean twist */
    const double xf = xs + nu / ((1 + nu) * s.yy) * (s.phi_x - xc * s.phi);
    const known list[] = {
        {UTW_A, s.A, 1e-13},
        {UTW_XC, xc, 1e-13},
        {UTW_YC, 0, 0},
        {UTW_IXX, s.yy, 1e-13},
        {UTW_IYY, s.xx - xc * xc * s.A, 1e-12},
        {UTW_J, J, 1e-13},
        {TAU_MAX, (2 * a - b) / J, 1e-13},
        {UTW_XS, xs, 1e-13},
        {UTW_YS, 0, 0},
        {UTW_IW, s.omega2 - xs * xs * s.yy, 1e-11},
        {UTW_XF, xf, 1e-13},
        {UTW_YF, 0, 0},
    };
    check(list, sizeof list / sizeof *list, nu, a, b);
}

static void fixed_values(void **state)
{
    (void)state;
    check(fixed, sizeof fixed / sizeof *fixed, 0.3, 1, 0.3);
}

static void other_keyways(void **state)
{
    (void)state;
    shaft_at(1, 0.3, 0.3);
    shaft_at(2.385, 0.08, 0);
    shaft_at(2.385, 1.9, 0.5);
    shaft_at(17.3, 7.1, -0.3);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(fixed_values), balanced_test(other_keyways)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
