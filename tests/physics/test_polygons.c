/* SPDX-License-Identifier: GPL-3.0-or-later
 * Triangles and the hexagon against closed forms and series.
 *
 * Sources. [TG] Timoshenko and Goodier, Theory of Elasticity, 3rd ed. 1970, ch. 10. [G] Galerkin
 * 1919, the right isosceles triangle (in [TG]). [S] Seth, Proceedings of the Cambridge
 * Philosophical Society 30 (1934), regular polygons: the problem; the digits are of a series of
 * particular solutions with a residual below 1e-30, evaluated independently of this program.
 * Certified: computed by another high-order program with two-sided bounds. */
#include "base/vec2.h"
#include "support/section.h"

#define CHECK(call, list, length)                                                                  \
    do {                                                                                           \
        utw_outline *o = call;                                                                     \
        assert_all_known(o, list, sizeof(list) / sizeof((list)[0]), length);                       \
        utw_outline_free(o);                                                                       \
    } while (0)

/* ---- fixed values
 * -------------------------------------------------------------------------------- */

static const known equilateral_nu0[] = {
    /* side 1, centroid at the origin, a vertex on +x */
    {UTW_A, 0.4330127018922193, 1e-15},
    {UTW_IXX, 0.01804219591217581, 1e-15},
    {UTW_IYY, 0.01804219591217581, 1e-15},
    {UTW_J, 0.02165063509461097, 1e-15},   /* closed form: [TG] */
    {UTW_IW, 4.29576093147043e-05, 1e-15}, /* closed form: the cubic warping function squared */
    {TAU_MAX, 20.0, 1e-15},                /* closed form: [TG], middle of the sides */
    {UTW_KX, 0.7564271074041, 2e-12},      /* certified */
    {UTW_KY, 0.7564271074041, 2e-12},
};
static const known equilateral_nu03[] = {
    {UTW_KX, 0.7533329700889, 2e-12}, /* certified */
    {UTW_KY, 0.753332970089, 2e-12},
};
static const known right_isosceles[] = {
    /* legs 1 */
    {UTW_J, 0.02608965171151295, 1e-15}, /* series: [G] */
    {TAU_MAX, 17.59987700416261, 1e-15}, /* series: [G], middle of the hypotenuse */
};
static const known hexagon[] = {
    /* circumradius 1 */
    {UTW_A, 2.598076211353316, 1e-15},      {UTW_IXX, 0.5412658773652742, 1e-15},
    {UTW_J, 1.035458949641279, 1e-15},      /* series: [S] */
    {UTW_IW, 0.0003401787087690126, 1e-15}, /* series: [S] */
    {TAU_MAX, 1.025452317234348, 1e-15},    /* series: [S], middle of the sides */
};

/* ---- constructors
 * -------------------------------------------------------------------------------- */

/* A regular polygon about (x, y), the first vertex at angle `turn`. */
static utw_outline *regular(double nu, int n, double x, double y, double radius, double turn)
{
    char list[1024];
    size_t at = 0;
    for (int k = 0; k < n; k++) {
        const double a = turn + 2 * UTW_PI * k / n;
        at += (size_t)snprintf(list + at, sizeof list - at, "%s[%.17g,%.17g]", k > 0 ? "," : "",
                               x + radius * cos(a), y + radius * sin(a));
    }
    return section_outline(nu, "\"outline\":[%s]", list);
}

static void fixed_values(void **state)
{
    (void)state;
    CHECK(regular(0, 3, 0, 0, 1 / sqrt(3), 0), equilateral_nu0, 0);
    CHECK(regular(0.3, 3, 0, 0, 1 / sqrt(3), 0), equilateral_nu03, 0);
    CHECK(section_outline(UTW_NAN, "\"outline\":[[0,0],[1,0],[0,1]]"), right_isosceles, 0);
    CHECK(regular(UTW_NAN, 6, 0, 0, 1, UTW_PI / 6), hexagon, 0);
}

/* ---- formulas
 * ------------------------------------------------------------------------------------ */

/* The equilateral triangle of side s, anywhere, turned by any angle. */
static void equilateral_triangles(void **state)
{
    (void)state;
    static const double turn[] = {0.4, 1.1, 2.9}, side[] = {2.385, 0.71, 31.6};
    for (int i = 0; i < 3; i++) {
        const double s = side[i];
        const known list[] = {
            {UTW_XC, 12.1, 1e-15},
            {UTW_YC, -7.7, 1e-15},
            {UTW_IXX, sqrt(3) * pow(s, 4) / 96, 1e-15},
            {UTW_IXY, 0, 0},
            {UTW_J, sqrt(3) * pow(s, 4) / 80, 1e-15},     /* [TG] */
            {TAU_MAX, 20 / pow(s, 3), 1e-15},             /* [TG] */
            {UTW_IW, sqrt(3) * pow(s, 6) / 40320, 1e-14}, /* omega of [TG] squared */
            {UTW_XS, 12.1, 1e-15},
            {UTW_YS, -7.7, 1e-15},
            {UTW_XF, 12.1, 1e-15},
            {UTW_YF, -7.7, 1e-15},
            {UTW_KX, 0.7533329700889, 2e-12}, /* certified; the same for every direction */
            {UTW_KY, 0.7533329700889, 2e-12},
        };
        CHECK(regular(0.3, 3, 12.1, -7.7, s / sqrt(3), turn[i]), list, s);
    }
}

/* [G] The right isosceles triangle: the square whose halves are loaded by 2 and -2, in sines along
 * one side. J = a^4/18 - 8 a^4/pi^5 (sum tanh(n pi/2)/n^5, n even, + sum coth(n pi/2)/n^5, n odd);
 * greatest stress in the middle of the hypotenuse. */
static void right_isosceles_triangles(void **state)
{
    (void)state;
    double sum = 0, slope = -0.5;
    for (int n = 801; n > 0; n--) {
        const double t = tanh(n * UTW_PI / 2);
        sum += (n % 2 == 0 ? t : 1 / t) / pow(n, 5);
        if (n % 2 == 1 && n < 200)
            slope += 4 / pow(UTW_PI * n, 2) * (n % 4 == 1 ? 1 : -1) / sinh(n * UTW_PI / 2);
    }
    const double J = 1.0 / 18 - 8 * sum / pow(UTW_PI, 5), tau = -sqrt(2) * slope / J;
    assert_close(J, 0.02608965171151295, 1e-12);
    assert_close(tau, 17.59987700416261, 1e-12);
    static const double leg[] = {2.385, 0.19};
    for (int i = 0; i < 2; i++) {
        const double a = leg[i];
        const known list[] = {
            {UTW_J, J * pow(a, 4), 1e-12},
            {TAU_MAX, tau / pow(a, 3), 1e-12},
            {UTW_IXY, -pow(a, 4) / 72, 1e-14}, /* elementary */
        };
        CHECK(section_outline(UTW_NAN, "\"outline\":[[-5,3],[%.17g,3],[-5,%.17g]]", a - 5, a + 3),
              list, a);
    }
}

/* Of n sides: the shear centre and the centre of flexure are the centre, no direction differs from
 * another, and with n all tends to the circle. */
static void regular_polygons(void **state)
{
    (void)state;
    utw_outline *circle = section_outline(0.3, "\"outline\":{\"circle\":[1.3,2.2,1.7]}");
    utw_solution *round = section_solve(circle, 1e-6, 0);
    double last[2] = {1, 1};
    for (int n = 4; n <= 24; n = n * 3 / 2) {
        utw_outline *o = regular(0.3, n, 1.3, 2.2, 1.7, 0.3);
        utw_solution *s = section_solve(o, 1e-8, 0);
        const double kx = section_constant(s, UTW_KX).value, J = section_constant(s, UTW_J).value;
        const known list[] = {
            {UTW_XS, 1.3, 1e-15}, {UTW_YS, 2.2, 1e-15},
            {UTW_XF, 1.3, 1e-15}, {UTW_YF, 2.2, 1e-15},
            {UTW_KY, kx, 1e-9},   {UTW_IXX, section_constant(s, UTW_IYY).value, 1e-14}};
        for (size_t i = 0; i < sizeof list / sizeof *list; i++)
            assert_known(s, &list[i], 1.7, 1e-7);
        const double apart[2] = {1 - J / section_constant(round, UTW_J).value,
                                 fabs(kx / section_constant(round, UTW_KX).value - 1)};
        for (int i = 0; i < 2; i++) {
            assert_true(apart[i] > 0 && apart[i] < last[i]);
            last[i] = apart[i];
        }
        utw_solution_free(s);
        utw_outline_free(o);
    }
    assert_true(last[0] < 0.05 && last[1] < 0.002);
    utw_solution_free(round);
    utw_outline_free(circle);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(fixed_values),
        balanced_test(equilateral_triangles),
        balanced_test(right_isosceles_triangles),
        balanced_test(regular_polygons),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
