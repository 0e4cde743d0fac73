/* SPDX-License-Identifier: GPL-3.0-or-later
 * Hollow shafts in closed form: the tube between two confocal ellipses and the tube with an
 * eccentric bore. Both loops carry constants that only the equations of the holes give.
 *
 * The boundary problem is that of Saint-Venant: with z = x + iy, omega + i psi is an analytic
 * function, omega single-valued and psi = (x^2 + y^2)/2 + a constant on each loop (Timoshenko and
 * Goodier, Theory of Elasticity, 3rd ed. 1970, ch. 10); solved here in elliptic and in bipolar
 * coordinates (method: Muskhelishvili, Some Basic Problems of the Mathematical Theory of
 * Elasticity, 1953, ch. 22). */
#include "base/gauss.h"
#include "base/vec2.h"
#include "support/section.h"

#define CHECK(call, list, length)                                                                  \
    do {                                                                                           \
        utw_outline *o = call;                                                                     \
        assert_all_known(o, list, sizeof(list) / sizeof((list)[0]), length);                       \
        utw_outline_free(o);                                                                       \
    } while (0)

static utw_outline *ellipses(double a1, double b1, double a2, double b2, double degrees)
{
    return section_outline(UTW_NAN,
                           "\"outline\":{\"ellipse\":[4,-3,%.17g,%.17g,%.17g]},"
                           "\"holes\":[{\"ellipse\":[4,-3,%.17g,%.17g,%.17g]}]",
                           a1, b1, degrees, a2, b2, degrees);
}

/* x = c cosh xi cos eta, y = c sinh xi sin eta; psi = c^2/4 cos 2 eta h(xi) + const, h = cosh(2 xi
 * - s)/cosh(d), s and d the sum and the difference of the two xi. */
static void confocal(double c, double xi0, double xi1)
{
    const double s = xi0 + xi1, d = xi1 - xi0, top = cosh(2 * xi1), c2 = c * c;
    double x[24], w[24], J = 0, squares = 0;
    utw_gauss(24, x, w);
    for (int q = 0; q < 24; q++) {
        const double xi = xi0 + d * x[q], dxi = d * w[q];
        const double h = cosh(2 * xi - s) / cosh(d), g = sinh(2 * xi - s) / cosh(d);
        /* 2 int phi, phi = psi - (x^2 + y^2)/2, zero outside, dA = c^2/2 (cosh 2 xi - cos 2 eta)
         * dxi deta */
        J += c2 * c2 / 4 * UTW_PI * (2 * (top - cosh(2 * xi)) * cosh(2 * xi) - (h - 1)) * dxi;
        /* omega = -c^2/4 g(xi) sin 2 eta */
        squares += c2 * c2 * c2 / 32 * UTW_PI * g * g * cosh(2 * xi) * dxi;
    }
    const double a0 = c * cosh(xi0), b0 = c * sinh(xi0), a1 = c * cosh(xi1), b1 = c * sinh(xi1);
    const double on_hole = c2 / 4 * (top - cosh(2 * xi0));
    J += 2 * on_hole * UTW_PI * a0 * b0;
    const known list[] = {
        {UTW_J, J, 1e-14}, {UTW_IW, squares, 1e-13}, {UTW_XS, 4, 1e-15}, {UTW_YS, -3, 1e-15}};
    CHECK(ellipses(a1, b1, a0, b0, 0), list, a1);
    CHECK(ellipses(a1, b1, a0, b0, 33.7), list, a1);
}

static void confocal_tubes(void **state)
{
    (void)state;
    confocal(2.385, 0.2, 0.5);
    confocal(1.3, 0.7, 1.4);
    confocal(4.1, 0.02, 0.6); /* a hole of axes 50 to 1 */
}

/* z = a coth(zeta/2), zeta = xi + i eta; the circles are xi = const: centre a coth xi, radius
 * a/sinh xi. On them (x^2 + y^2)/2 = 2 a^2 coth(xi) sum exp(-n xi) cos(n eta) + const. J = int r^2
 * dA - int |grad omega|^2, and the latter is that of psi and does not change from z to zeta. */
static void eccentric(double R, double r, double e)
{
    const double away = (R * R - r * r - e * e) / (2 * e),
                 a = sqrt(away * away - r * r); /* inner centre at `away` */
    const double in = asinh(a / r), out = asinh(a / R), Xi = away, Xo = away + e;
    double J = UTW_PI * (R * R * (R * R / 2 + Xo * Xo) - r * r * (r * r / 2 + Xi * Xi));
    for (int n = 1; n <= 400; n++) {
        const double g_in = 2 * a * a / tanh(in) * exp(-n * in),
                     g_out = 2 * a * a / tanh(out) * exp(-n * out);
        /* A exp(n (xi - in)) + B exp(-n (xi - out)) */
        const double t = exp(-n * (in - out)), den = 1 - t * t;
        const double A = (g_in - t * g_out) / den, B = (g_out - t * g_in) / den;
        J -= n * UTW_PI * (A * A + B * B) * den;
    }
    /* the bore is moved from the origin by e along a slanted line */
    const known list[] = {{UTW_J, J, 1e-13}};
    CHECK(section_outline(
              UTW_NAN,
              "\"outline\":{\"circle\":[0,0,%.17g]},\"holes\":[{\"circle\":[%.17g,%.17g,%.17g]}]",
              R, e * cos(0.7), e * sin(0.7), r),
          list, 0);
}

static void eccentric_bores(void **state)
{
    (void)state;
    eccentric(1, 0.5, 0.2);
    eccentric(2.385, 0.9, 0.7);
    eccentric(3.1, 2.2, 0.8); /* the ligament is 0.1 */
    eccentric(3.1, 0.2, 2.6);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(confocal_tubes),
                                       balanced_test(eccentric_bores)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
