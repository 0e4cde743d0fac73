/* SPDX-License-Identifier: GPL-3.0-or-later
 * Rectangles against Saint-Venant's series: fixed values to all digits, then the series at other
 * sides and Poisson's ratios.
 *
 * Sources. [TG] Timoshenko and Goodier, Theory of Elasticity, 3rd ed. 1970, ch. 10 (torsion) and 11
 * (flexure), after Saint-Venant. [R] Renton, International Journal of Solids and Structures 27
 * (1991); [GW] Gruttmann and Wagner, Computational Mechanics 27 (2001) 199-207: shear factors by
 * the energy. The fixed values were evaluated to 16 digits independently of this program. */
#include "base/vec2.h"
#include "support/section.h"

/* ---- the series
 * ---------------------------------------------------------------------------------- */

enum { TERMS = 801 };

/* zeta(5) (Abramowitz and Stegun 1964, table 23.3) */
#define ZETA5 1.03692775514336992633

/* sum tanh(n a)/n^5 over n = 1, 1 + step, ...: tanh is 1 less an exponential, and the sum of the
 * ones is known. */
static double sum_tanh(double a, int step)
{
    double sum = step == 2 ? 31.0 / 32 * ZETA5 : ZETA5;
    for (int n = TERMS; n > 0; n -= step) sum -= 2 / (pow(n, 5) * (exp(2 * n * a) + 1));
    return sum;
}

/* [TG] J of a rectangle w x h = w h^3/3 (1 - 192 h/(pi^5 w) sum tanh(n pi w/(2 h))/n^5), n odd. */
static double torsion_constant(double w, double h)
{
    const double sum = sum_tanh(UTW_PI * w / (2 * h), 2);
    return w * h * h * h / 3 * (1 - 192 * h / (pow(UTW_PI, 5) * w) * sum);
}

/* [TG] Greatest stress of a unit torque, in the middle of the long side w >= h:
 * h (1 - 8/pi^2 sum 1/(n^2 cosh(n pi w/(2 h)))) / J. */
static double greatest_stress(double w, double h)
{
    double sum = 0;
    for (int n = TERMS; n > 0; n -= 2) {
        const double a = n * UTW_PI * w / (2 * h);
        if (a < 700) sum += 1 / (n * (double)n * cosh(a));
    }
    return h * (1 - 8 / (UTW_PI * UTW_PI) * sum) / torsion_constant(w, h);
}

/* The warping function [TG] omega = x y + sum B_n sin(k x) sinh(k y), k = n pi/w, n odd, B_n = -8
 * s/(w k^3 cosh(k h/2)), s = sin(n pi/2), squared and integrated term by term (the terms are
 * orthogonal). */
static double warping_constant(double w, double h)
{
    double sum = pow(w * h, 3) / 144;
    for (int n = TERMS; n > 0; n -= 2) {
        const double k = n * UTW_PI / w, t = tanh(k * h / 2);
        const double b = -8 / (w * k * k * k); /* B_n cosh(k h/2) s */
        /* over cosh(k h/2)^2 */
        const double over = t < 1 ? 1 / pow(cosh(k * h / 2), 2) : 0;
        sum += 2 * b * (2 / (k * k)) * 2 * (h / (2 * k) - t / (k * k));
        sum += b * b * (w / 2) * (t / k - h / 2 * over);
    }
    return sum;
}

/* [TG][R][GW] Shear factor for a force along the side h. The shear stress is c ((h/2)^2 - y^2)/2
 * with c = 1/I plus the curl of f, -lap f = c nu/(1+nu) x, f = 0 on the boundary; the two are
 * orthogonal. */
static double shear_factor(double w, double h, double nu)
{
    const double I = w * h * h * h / 12, q = nu / ((1 + nu) * I);
    /* sum h/k^4 - 2 tanh(k h/2)/k^5, k = 2 n pi/w */
    const double sum =
        h * pow(w, 4) / 1440 - 2 * pow(w / (2 * UTW_PI), 5) * sum_tanh(UTW_PI * h / w, 1);
    return 1 / (w * h * (1.2 / (w * h) + 2 * q * q * w * sum));
}

/* ---- fixed values
 * -------------------------------------------------------------------------------- */

/* width 2 (x), height 1 (y) */
static const known two_by_one_nu0[] = {
    {UTW_A, 2.0, 1e-15},
    {UTW_IXX, 0.1666666666666667, 1e-15},
    {UTW_IYY, 0.6666666666666667, 1e-15},
    {UTW_J, 0.4573633542391415, 1e-15},   /* series: [TG] */
    {TAU_MAX, 2.033525994543918, 1e-15},  /* series: [TG], middle of the long sides */
    {UTW_IW, 0.02032267176858506, 1e-15}, /* series: [TG] squared and integrated */
    {UTW_KY, 0.8333333333333333, 1e-15},  /* series: [R][GW] */
    {UTW_KX, 0.8333333333333333, 1e-15},
};
static const known two_by_one_nu03[] = {
    {UTW_KY, 0.784441925213463, 1e-15}, /* series: [R][GW] */
    {UTW_KX, 0.8329417268314472, 1e-15},
};
static const known square_nu0[] = {
    {UTW_A, 1.0, 1e-15},
    {UTW_IXX, 0.08333333333333333, 1e-15},
    {UTW_IYY, 0.08333333333333333, 1e-15},
    {UTW_J, 0.1405770149551537, 1e-15},     /* series: [TG] */
    {TAU_MAX, 4.803875537754188, 1e-15},    /* series: [TG] */
    {UTW_IW, 0.0001344023455706115, 1e-15}, /* series */
    {UTW_KY, 0.8333333333333333, 1e-15},    /* series: [R][GW] */
    {UTW_KX, 0.8333333333333333, 1e-15},
};
static const known square_nu025[] = {
    {UTW_KY, 0.8294837693447908, 1e-15}, /* series: [R][GW] */
    {UTW_KX, 0.8294837693447908, 1e-15},
};
static const known ten_by_one_nu0[] = {
    {UTW_A, 10.0, 1e-15},
    {UTW_IXX, 0.8333333333333333, 1e-15},
    {UTW_IYY, 83.33333333333333, 1e-15},
    {UTW_J, 3.123250374572054, 1e-15},    /* series: [TG] */
    {TAU_MAX, 0.3201791837865643, 1e-15}, /* series: [TG] */
    {UTW_IW, 6.642911092578896, 1e-15},   /* series */
    {UTW_KY, 0.8333333333333333, 1e-15},  /* series: [R][GW] */
    {UTW_KX, 0.8333333333333333, 1e-15},
};
static const known ten_by_one_nu03[] = {
    {UTW_KY, 0.1791330547235032, 1e-15}, /* series: [R][GW] */
    {UTW_KX, 0.8333326162451289, 1e-15},
};

#define FIXED(w, h, nu, list)                                                                      \
    do {                                                                                           \
        utw_outline *o = section_rectangle(nu, -(w) / 2.0, -(h) / 2.0, (w) / 2.0, (h) / 2.0);      \
        assert_all_known(o, list, sizeof(list) / sizeof((list)[0]), 0);                            \
        utw_outline_free(o);                                                                       \
    } while (0)

static void fixed_values(void **state)
{
    (void)state;
    FIXED(2, 1, 0.0, two_by_one_nu0);
    FIXED(2, 1, 0.3, two_by_one_nu03);
    FIXED(1, 1, 0.0, square_nu0);
    FIXED(1, 1, 0.25, square_nu025);
    FIXED(10, 1, 0.0, ten_by_one_nu0);
    FIXED(10, 1, 0.3, ten_by_one_nu03);
}

/* ---- other sides, other ratios, away from the origin
 * --------------------------------------------- */

static void series_at(double w, double h, double nu)
{
    const double x0 = 17.3, y0 = -41.9, length = fmax(w, h);
    const int wide = w >= h;
    const known list[] = {
        {UTW_A, w * h, 1e-15},
        {UTW_XC, x0 + w / 2, 1e-15},
        {UTW_YC, y0 + h / 2, 1e-15},
        {UTW_IXX, w * h * h * h / 12, 1e-15},
        {UTW_IYY, h * w * w * w / 12, 1e-15},
        {UTW_J, torsion_constant(w, h), 1e-14},
        {TAU_MAX, wide ? greatest_stress(w, h) : greatest_stress(h, w), 1e-14},
        {UTW_IW, warping_constant(w, h), 1e-12},
        {UTW_KX, shear_factor(h, w, nu), 1e-14},
        {UTW_KY, shear_factor(w, h, nu), 1e-14},
        {UTW_XS, x0 + w / 2, 1e-15},
        {UTW_YS, y0 + h / 2, 1e-15},
        {UTW_XF, x0 + w / 2, 1e-15},
        {UTW_YF, y0 + h / 2, 1e-15},
        {UTW_BETAX, 0, 0},
        {UTW_BETAY, 0, 0},
        {UTW_R0, sqrt((w * w + h * h) / 12), 1e-15},
    };
    utw_outline *o = section_rectangle(nu, x0, y0, x0 + w, y0 + h);
    assert_all_known(o, list, sizeof list / sizeof *list, length);
    utw_outline_free(o);
}

static void series_agree_with_the_fixed_values(void **state)
{
    (void)state;
    assert_close(torsion_constant(2, 1), 0.4573633542391415, 1e-14);
    assert_close(torsion_constant(1, 2), 0.4573633542391415, 1e-14);
    assert_close(greatest_stress(10, 1), 0.3201791837865643, 1e-14);
    assert_close(warping_constant(2, 1), 0.02032267176858506, 1e-13);
    assert_close(warping_constant(1, 10), 6.642911092578896, 1e-13);
    assert_close(shear_factor(2, 1, 0.3), 0.784441925213463, 1e-14);
    assert_close(shear_factor(1, 10, 0.3), 0.8333326162451289, 1e-14);
}

static void other_sides(void **state)
{
    (void)state;
    static const double side[][2] = {{2.385, 1.17}, {3.1, 3.3}, {0.41, 5.9}, {23.7, 1.09}};
    static const double nu[] = {0, 0.3, 0.5};
    for (size_t i = 0; i < sizeof side / sizeof *side; i++)
        for (size_t k = 0; k < sizeof nu / sizeof *nu; k++)
            series_at(side[i][0], side[i][1], nu[k]);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(series_agree_with_the_fixed_values),
        balanced_test(fixed_values),
        balanced_test(other_sides),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
