/* SPDX-License-Identifier: GPL-3.0-or-later
 * Circles, ellipses and tubes of either, against closed forms.
 *
 * Sources. [TG] Timoshenko and Goodier, Theory of Elasticity, 3rd ed. 1970, ch. 10 (torsion of the
 * elliptic section and of hollow shafts) and 11 (flexure). [L] Love, Mathematical Theory of
 * Elasticity, 4th ed. 1927, ch. XV (flexure of the circle, the ring and the ellipse). [R] Renton,
 * International Journal of Solids and Structures 27 (1991): shear factor of the circle. Fixed
 * values were evaluated to 16 digits independently of this program. */
#include "base/vec2.h"
#include "support/section.h"

/* ---- fixed values
 * -------------------------------------------------------------------------------- */

static const known ellipse_nu0[] = {
    /* semi-axes 2 (x), 1 (y) */
    {UTW_A, 6.283185307179586, 1e-15},
    {UTW_IXX, 1.570796326794897, 1e-15},
    {UTW_IYY, 6.283185307179586, 1e-15},
    {UTW_J, 5.026548245743669, 1e-15}, /* closed form: [TG] */
    {UTW_IW, 0.3769911184307752, 1e-15},
    {TAU_MAX, 0.3183098861837907, 1e-15}, /* ends of the minor axis */
    {UTW_KY, 0.8076923076923077, 1e-15},  /* closed form: [L], its energy integrated */
    {UTW_KX, 0.8863636363636364, 1e-15},
};
static const known ellipse_nu03[] = {
    {UTW_KY, 0.7580093976932935, 1e-15},
    {UTW_KX, 0.8858275653517909, 1e-15},
};
static const known circle_nu0[] = {
    /* radius 1 */
    {UTW_J, 1.570796326794897, 1e-15},
    {UTW_A, 3.141592653589793, 1e-15},
    {UTW_IW, 0.0, 1e-15},
    {UTW_KY, 0.8571428571428571, 1e-15}, /* closed form: [L][R] */
};
static const known circle_nu03[] = {
    {UTW_KY, 0.8506711409395973, 1e-15},
};
static const known tube_nu0[] = {
    /* radii 1 and 0.6 */
    {UTW_J, 1.367221122842278, 1e-15},
    {UTW_A, 2.010619298297468, 1e-15},
    {UTW_IW, 0.0, 1e-15},
    {UTW_KY, 0.5508259212198221, 1e-15}, /* closed form: [L], its energy integrated */
};
static const known tube_nu03[] = {
    {UTW_KY, 0.5502301966998882, 1e-15},
};
static const known ellipse_tube[] = {
    /* semi-axes 2, 1; hole 0.6 of them */
    {UTW_A, 4.021238596594935, 1e-15},
    {UTW_IXX, 1.367221122842278, 1e-15},
    {UTW_IYY, 5.468884491369112, 1e-15},
    {UTW_J, 4.37510759309529, 1e-15}, /* closed form: [TG], hollow shafts */
    {UTW_IW, 0.3594022208092689, 1e-15},
};

/* ---- constructors
 * -------------------------------------------------------------------------------- */

/* Centre (x, y), semi-axes a along x and b along y, a hole k times as large about the same centre
 * (0: none). */
static utw_outline *ellipse(double nu, double x, double y, double a, double b, double k)
{
    if (k == 0)
        return section_outline(nu, "\"outline\":{\"ellipse\":[%.17g,%.17g,%.17g,%.17g]}", x, y, a,
                               b);
    return section_outline(nu,
                           "\"outline\":{\"ellipse\":[%.17g,%.17g,%.17g,%.17g]},"
                           "\"holes\":[{\"ellipse\":[%.17g,%.17g,%.17g,%.17g]}]",
                           x, y, a, b, x, y, k * a, k * b);
}

static utw_outline *tube(double nu, double x, double y, double outer, double xi, double yi,
                         double inner)
{
    return section_outline(nu,
                           "\"outline\":{\"circle\":[%.17g,%.17g,%.17g]},"
                           "\"holes\":[{\"circle\":[%.17g,%.17g,%.17g]}]",
                           x, y, outer, xi, yi, inner);
}

#define CHECK(call, list, length)                                                                  \
    do {                                                                                           \
        utw_outline *o = call;                                                                     \
        assert_all_known(o, list, sizeof(list) / sizeof((list)[0]), length);                       \
        utw_outline_free(o);                                                                       \
    } while (0)

static void fixed_values(void **state)
{
    (void)state;
    CHECK(ellipse(0, 0, 0, 2, 1, 0), ellipse_nu0, 0);
    CHECK(ellipse(0.3, 0, 0, 2, 1, 0), ellipse_nu03, 0);
    CHECK(ellipse(0, 0, 0, 1, 1, 0), circle_nu0, 1);
    CHECK(section_outline(0.3, "\"outline\":{\"circle\":[0,0,1]}"), circle_nu03, 0);
    CHECK(tube(0, 0, 0, 1, 0, 0, 0.6), tube_nu0, 1);
    CHECK(tube(0.3, 0, 0, 1, 0, 0, 0.6), tube_nu03, 0);
    CHECK(ellipse(UTW_NAN, 0, 0, 2, 1, 0.6), ellipse_tube, 0);
}

/* ---- the ellipse at other axes
 * ------------------------------------------------------------------- */

/* [L] Shear stress of a unit force along b, whose stress sigma_z changes with z as c y, c = 1/I:
 * tau_x = alpha x y, tau_y = beta + gamma x^2 + delta y^2. What acts through the boundary vanishes,
 * the divergence is -c y, the curl is c nu/(1+nu) x. int |tau|^2 from the moments of the ellipse.
 */
static double ellipse_factor(double a, double b, double nu)
{
    const double A = UTW_PI * a * b, c = 4 / (A * b * b);
    const double lambda = c * (1 / (1 + nu) + 2 * b * b / (a * a)) / (6 * b * b / (a * a) + 2);
    const double alpha = 2 * lambda - c, beta = lambda * b * b, delta = -lambda,
                 gamma = -b * b * (lambda + alpha) / (a * a);
    const double xx = a * a / 4, yy = b * b / 4, xxxx = pow(a, 4) / 8, yyyy = pow(b, 4) / 8,
                 xxyy = a * a * b * b / 24; /* over A */
    const double energy =
        A * (alpha * alpha * xxyy + beta * beta + gamma * gamma * xxxx + delta * delta * yyyy +
             2 * beta * gamma * xx + 2 * beta * delta * yy + 2 * gamma * delta * xxyy);
    return 1 / (A * energy);
}

static void ellipse_at(double a, double b, double nu)
{
    const double x = -31.4, y = 12.9, s = a * a + b * b, small = fmin(a, b), large = fmax(a, b);
    const known list[] = {
        {UTW_A, UTW_PI * a * b, 1e-15},
        {UTW_IXX, UTW_PI * a * b * b * b / 4, 1e-15},
        {UTW_IYY, UTW_PI * b * a * a * a / 4, 1e-15},
        {UTW_IXY, 0, 0},
        {UTW_J, UTW_PI * pow(a * b, 3) / s, 1e-15},             /* [TG] */
        {TAU_MAX, 2 / (UTW_PI * large * small * small), 1e-15}, /* [TG] */
        {UTW_IW, pow((a * a - b * b) / s, 2) * UTW_PI * pow(a * b, 3) / 24,
         1e-15}, /* omega = (b^2-a^2)/(a^2+b^2) xy */
        {UTW_KX, ellipse_factor(b, a, nu), 1e-15},
        {UTW_KY, ellipse_factor(a, b, nu), 1e-15},
        {UTW_XS, x, 1e-15},
        {UTW_YS, y, 1e-15},
        {UTW_XF, x, 1e-15},
        {UTW_YF, y, 1e-15},
    };
    CHECK(ellipse(nu, x, y, a, b, 0), list, fmax(a, b));
}

static void other_ellipses(void **state)
{
    (void)state;
    assert_close(ellipse_factor(2, 1, 0.3), 0.7580093976932935, 1e-14);
    for (int k = 0; k < 3; k++) {
        static const double nu[] = {0, 0.3, 0.5};
        ellipse_at(2.385, 1.07, nu[k]);
        ellipse_at(0.53, 2.9, nu[k]);
        ellipse_at(7.3, 0.9, nu[k]);
    }
}

/* [TG] A tube whose hole is similar to the outline: the stress of the solid ellipse, less that of
 * the hole. */
static void similar_tubes(void **state)
{
    (void)state;
    static const double k[] = {0.2, 0.73, 0.95};
    for (int i = 0; i < 3; i++) {
        const double a = 3.1, b = 1.7, k4 = pow(k[i], 4), s = a * a + b * b;
        const known list[] = {
            {UTW_J, (1 - k4) * UTW_PI * pow(a * b, 3) / s, 1e-14},
            {TAU_MAX, 2 / (UTW_PI * a * b * b * (1 - k4)), 1e-14},
            {UTW_IW,
             pow((a * a - b * b) / s, 2) * UTW_PI * pow(a * b, 3) / 24 * (1 - k4 * k[i] * k[i]),
             1e-14},
            {UTW_XS, 5.3, 1e-15},
            {UTW_YS, -2.2, 1e-15},
        };
        CHECK(ellipse(UTW_NAN, 5.3, -2.2, a, b, k[i]), list, a);
    }
}

/* ---- circles and round tubes
 * --------------------------------------------------------------------- */

static void circles(void **state)
{
    (void)state;
    static const double nu[] = {-0.4, 0, 0.17, 0.3, 0.5};
    for (int i = 0; i < 5; i++) {
        const double n = nu[i], r = 12.7,
                     k = 6 * pow(1 + n, 2) / (7 + 14 * n + 8 * n * n); /* [R] */
        const known list[] = {
            {UTW_KX, k, 1e-15},
            {UTW_KY, k, 1e-15},
            {UTW_J, UTW_PI * pow(r, 4) / 2, 1e-15}, /* Coulomb */
            {TAU_MAX, 2 / (UTW_PI * pow(r, 3)), 1e-15},
            {UTW_IW, 0, 0},
            {UTW_XF, 3.7, 1e-15},
            {UTW_YF, -8.8, 1e-15},
        };
        CHECK(section_outline(n, "\"outline\":{\"circle\":[3.7,-8.8,12.7]}"), list, r);
    }
}

/* [L] The ring: tau_r = f sin, tau_t = g cos with f = a r^2 + C + D/r^2, g = b r^2 + C - D/r^2, f =
 * 0 at both radii; a, b from the divergence -c y and the curl c nu/(1+nu) x. int |tau|^2 = pi int
 * (f^2 + g^2) r dr. */
static double ring_factor(double R, double r, double nu)
{
    const double A = UTW_PI * (R * R - r * r), c = 4 / (UTW_PI * (pow(R, 4) - pow(r, 4))),
                 q = c * nu / (1 + nu);
    const double a = (-3 * c + q) / 8, b = (3 * q - c) / 8, C = -a * (R * R + r * r),
                 D = a * R * R * r * r;
    double energy = 0;
    for (int side = 0; side < 2; side++) {
        const double k = side == 0 ? a : b, d = side == 0 ? D : -D;
        for (int end = 0; end < 2; end++) {
            const double x = end == 0 ? R : r, x2 = x * x;
            const double F = k * k * pow(x2, 3) / 6 + k * C * x2 * x2 / 2 +
                             (C * C + 2 * k * d) * x2 / 2 + 2 * C * d * log(x) - d * d / (2 * x2);
            energy += (end == 0 ? 1 : -1) * UTW_PI * F;
        }
    }
    return 1 / (A * energy);
}

static void round_tubes(void **state)
{
    (void)state;
    static const double nu[] = {0, 0.3, 0.5}, inner[] = {0.11, 0.6, 0.9};
    assert_close(ring_factor(1, 0.6, 0.3), 0.5502301966998882, 1e-13);
    for (int i = 0; i < 3; i++)
        for (int j = 0; j < 3; j++) {
            const double R = 2.385, r = inner[j] * R, k = ring_factor(R, r, nu[i]),
                         J = UTW_PI * (pow(R, 4) - pow(r, 4)) / 2;
            const known list[] = {
                {UTW_KX, k, 1e-12},      {UTW_KY, k, 1e-12}, {UTW_J, J, 1e-14},
                {TAU_MAX, R / J, 1e-14}, {UTW_IW, 0, 0},     {UTW_XS, 0, 0},
                {UTW_YS, 0, 0},          {UTW_XF, 0, 0},     {UTW_YF, 0, 0},
            };
            CHECK(tube(nu[i], 0, 0, R, 0, 0, r), list, R);
        }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(fixed_values), balanced_test(other_ellipses), balanced_test(similar_tubes),
        balanced_test(circles),      balanced_test(round_tubes),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
