/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/aerofoil.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/support.h"

typedef double (*points)[2];

static points naca(const char *designation, int sharp, int *n)
{
    utw_error err;
    points xy = NULL;
    assert_ok(utw_aerofoil_naca(designation, sharp, &xy, n, &err));
    return xy;
}

/* Nearest listed point of the upper (side 1) or lower (-1) surface to a station. */
static void at_station(points xy, int n, double x, double side, double found[2])
{
    const int first = side > 0 ? 0 : n / 2, last = side > 0 ? n / 2 : n - 1;
    double best = HUGE_VAL;
    for (int i = first; i <= last; i++)
        if (fabs(xy[i][0] - x) < best) {
            best = fabs(xy[i][0] - x);
            memcpy(found, xy[i], sizeof xy[i]);
        }
}

/* Ordinates of NACA 0012 in per cent of the chord, as tables print them (Abbott and von Doenhoff,
 * Theory of Wing Sections (1959), appendix I; from memory). */
static void thickness_follows_the_printed_ordinates(void **state)
{
    (void)state;
    static const double table[][2] = {
        {1.25, 1.894}, {2.5, 2.615}, {5, 3.555},  {7.5, 4.200}, {10, 4.683}, {15, 5.345},
        {20, 5.737},   {25, 5.941},  {30, 6.002}, {40, 5.803},  {50, 5.294}, {60, 4.563},
        {70, 3.664},   {80, 2.623},  {90, 1.448}, {95, 0.807},  {100, 0.126}};
    int n;
    points xy = naca("0012", 0, &n);
    for (size_t k = 0; k < sizeof table / sizeof *table; k++) {
        double p[2], q[2];
        const double x = table[k][0] / 100;
        at_station(xy, n, x, 1, p);
        at_station(xy, n, x, -1, q);
        assert_true(p[0] == q[0] && p[1] == -q[1]);
        /* the listed point beside the station, along the slope there */
        double before[2], after[2];
        at_station(xy, n, p[0] - 0.005, 1, before);
        at_station(xy, n, fmin(1, p[0] + 0.005), 1, after);
        const double slope = (after[1] - before[1]) / (after[0] - before[0]);
        assert_true(fabs(p[1] + slope * (x - p[0]) - table[k][1] / 100) < 2e-5);
    }
    utw_free(xy);
}

/* Report 460's formulas, written out once more, at x = s^2. */
static void formula(const char *d, double s, double side, double xy[2])
{
    const double m = (d[0] - '0') / 100.0, p = (d[1] - '0') / 10.0, t = atof(d + 2) / 100,
                 x = s * s;
    const double yt =
        t / 0.20 *
        (0.2969 * s - 0.1260 * x - 0.3516 * x * x + 0.2843 * pow(x, 3) - 0.1015 * pow(x, 4));
    double slope = 0, yc = 0;
    if (m > 0 && x < p) {
        yc = m / (p * p) * (2 * p * x - x * x);
        slope = 2 * m / (p * p) * (p - x);
    } else if (m > 0) {
        yc = m / ((1 - p) * (1 - p)) * (1 - 2 * p + 2 * p * x - x * x);
        slope = 2 * m / ((1 - p) * (1 - p)) * (p - x);
    }
    const double theta = atan(slope);
    xy[0] = x - side * yt * sin(theta);
    xy[1] = yc + side * yt * cos(theta);
}

/* Distance of a point from the formula's curve, by halving thirds about where it should be. */
static double off_formula(const char *designation, const double p[2], double side)
{
    double a = fmax(0, sqrt(fmax(p[0], 0)) - 0.2), b = fmin(1, sqrt(fmax(p[0], 0)) + 0.2), q[2],
           r[2];
    for (int i = 0; i < 200; i++) {
        const double s = a + (b - a) / 3, t = b - (b - a) / 3;
        formula(designation, s, side, q);
        formula(designation, t, side, r);
        if (utw_distance(p, q) < utw_distance(p, r))
            b = t;
        else
            a = s;
    }
    formula(designation, 0.5 * (a + b), side, q);
    return utw_distance(p, q);
}

static void points_lie_on_the_formula(void **state)
{
    (void)state;
    static const char *const designation[] = {"2412", "0009", "4415", "6721"};
    for (int k = 0; k < 4; k++) {
        int m;
        points list = naca(designation[k], 0, &m);
        assert_true(m % 2 == 1);
        assert_true(list[m / 2][0] == 0 && list[m / 2][1] == 0);
        for (int i = 0; i < m; i++)
            assert_true(off_formula(designation[k], list[i], i < m / 2 ? 1 : -1) < 1e-9);
        utw_free(list);
    }
    int n;
    points xy = naca("2412", 1, &n);
    assert_true(utw_distance(xy[0], xy[n - 1]) < 1e-15); /* the edge is sharp */
    utw_free(xy);
    xy = naca("2412", 0, &n);
    assert_close(utw_distance(xy[0], xy[n - 1]), 2 * 0.6 * 0.0021, 1e-12);
    utw_free(xy);
}

static void wrong_designations_are_told(void **state)
{
    (void)state;
    utw_error err;
    points xy = NULL;
    int n;
    static const struct {
        const char *designation, *message;
    } row[] = {
        {"241",
         "\"241\" is no NACA four-digit designation; it must be four digits, such as \"2412\""},
        {"23012",
         "\"23012\" is no NACA four-digit designation; it must be four digits, such as \"2412\""},
        {"24-2",
         "\"24-2\" is no NACA four-digit designation; it must be four digits, such as \"2412\""},
        {"2400", "NACA 2400 has no thickness; its last two digits are per cent of the chord"},
        {"2012", "NACA 2012 has camber, but its second digit, where the camber is greatest, is 0"},
    };
    for (size_t i = 0; i < sizeof row / sizeof *row; i++) {
        assert_int_equal(utw_aerofoil_naca(row[i].designation, 0, &xy, &n, &err), UTW_E_SYNTAX);
        assert_string_equal(err.text, row[i].message);
    }
    utw_memory_fail_at(1);
    assert_int_equal(utw_aerofoil_naca("2412", 0, &xy, &n, &err), UTW_E_NOMEM);
    utw_memory_fail_at(0);
    assert_null(xy);
}

/* ---- lists ---- */

static const double upper[5][2] = {{1, 0.01}, {0.6, 0.07}, {0.3, 0.09}, {0.05, 0.05}, {0, 0.002}};
static const double lower[4][2] = {{0.04, -0.03}, {0.3, -0.05}, {0.7, -0.03}, {1, -0.01}};

static void check_list(const char *text, double scale)
{
    utw_error err;
    points xy = NULL;
    int n;
    assert_ok(utw_aerofoil_points(text, strlen(text), &xy, &n, &err));
    assert_int_equal(n, 9);
    for (int i = 0; i < 9; i++)
        for (int k = 0; k < 2; k++)
            assert_close_scaled(xy[i][k], (i < 5 ? upper[i][k] : lower[i - 5][k]), 1e-14, scale);
    utw_free(xy);
}

static void lists_of_every_kind_are_read(void **state)
{
    (void)state;
    check_list("1 0.01\n0.6 0.07\n0.3 0.09\n0.05 0.05\n0 0.002\n0.04 -0.03\n0.3 -0.05\n0.7 "
               "-0.03\n1 -0.01\n",
               1);
    /* a name, a remark, blank lines, commas, tabs, CR, no line break at the end, a repeated point
     */
    check_list("My wing, tip 3\r\n# x y\r\n\r\n1,0.01\r\n0.6\t0.07\r\n 0.3;0.09\r\n0.05 0.05\r\n0 "
               ".002\r\n0 .002\r\n4e-2 -0.03\r\n0.3 "
               "-0.05\r\n0.7 -0.03\r\n1 -0.01",
               1);
    /* clockwise */
    check_list("1 -0.01\n0.7 -0.03\n0.3 -0.05\n0.04 -0.03\n0 0.002\n0.05 0.05\n0.3 0.09\n0.6 "
               "0.07\n1 0.01\n",
               1);
    /* two runs from the nose, with counts; either surface first */
    check_list("name\n5. 5.\n\n0 0.002\n0.05 0.05\n0.3 0.09\n0.6 0.07\n1 0.01\n\n0 0.002\n0.04 "
               "-0.03\n0.3 -0.05\n0.7 -0.03\n1 "
               "-0.01\n",
               1);
    check_list("0 0.002\n0.04 -0.03\n0.3 -0.05\n0.7 -0.03\n1 -0.01\n0 0.002\n0.05 0.05\n0.3 "
               "0.09\n0.6 0.07\n1 0.01\n",
               1);
    /* another size, and not from x = 0 */
    check_list("350 2.5\n250 17.5\n175 22.5\n112.5 12.5\n100 0.5\n110 -7.5\n175 -12.5\n275 "
               "-7.5\n350 -2.5\n",
               1);
}

static void refused(const char *text, int line, const char *message)
{
    utw_error err;
    points xy = NULL;
    int n;
    assert_int_equal(utw_aerofoil_points(text, strlen(text), &xy, &n, &err), UTW_E_SYNTAX);
    assert_string_equal(err.text, message);
    assert_int_equal(err.line, line);
    assert_null(xy);
}

static void bad_lists_are_told(void **state)
{
    (void)state;
    refused("", -1, "there are 0 points; at least 7 are needed to draw an aerofoil");
    refused("1 0\n0.5 0.1\n0 0\n0.5 -0.1\n1 0\n", -1,
            "there are 5 points; at least 7 are needed to draw an aerofoil");
    refused("name\n1 0\n0.5 0.1 7\n", 3, "line 3 is not two numbers: \"0.5 0.1 7\"");
    refused("name\nanother\n1 0\n", 2, "line 2 is not two numbers: \"another\"");
    refused("1 0\n0.5 nan\n", 2, "line 2 is not two numbers: \"0.5 nan\"");
    refused("1 0\n0.5 0.1x\n", 2, "line 2 is not two numbers: \"0.5 0.1x\"");
    refused("1 0\n0.5\n", 2, "line 2 is not two numbers: \"0.5\"");
    refused("0.5 0.1\n0.3 0.1\n0.1 0.05\n0 0\n0.1 -0.05\n0.5 -0.1\n1 0\n", 1,
            "line 1: (0.5, 0.1) is the first point, but no trailing edge; list the points from the "
            "trailing edge around the "
            "nose and back to it");
    refused("1 0\n0.5 0.1\n0.3 0.1\n0.1 0.05\n0 0\n0.1 -0.05\n0.5 -0.1\n", 7,
            "line 7: (0.5, -0.1) is the last point, but no trailing edge; list the points from the "
            "trailing edge around the "
            "nose and back to it");
    refused("1 0\n0.5 0.1\n0.8 0.08\n0.3 0.1\n0.1 0.05\n0 0\n0.1 -0.05\n0.5 -0.1\n1 0\n", 3,
            "line 3: (0.8, 0.08) lies behind the point before it; the points must run once around "
            "the contour");
    refused("0 0\n0 1\n0 2\n0 3\n0 4\n0 5\n0 6\n0 7\n", -1,
            "all points have the same x; x runs along the chord");
    char *many = malloc(UTW_AEROFOIL_POINTS * 8 + 100);
    assert_non_null(many);
    size_t n = 0;
    for (int i = 0; i <= UTW_AEROFOIL_POINTS; i++) n += (size_t)sprintf(many + n, "1 %d\n", i % 10);
    refused(many, UTW_AEROFOIL_POINTS + 1, "line 10001: there are more than 10000 points");
    free(many);
}

static void a_refused_allocation_leaves_nothing_behind(void **state)
{
    (void)state;
    static const char text[] = "1 0.01\n0.6 0.07\n0.3 0.09\n0.05 0.05\n0 0.002\n0.04 -0.03\n0.3 "
                               "-0.05\n0.7 -0.03\n1 -0.01\n";
    utw_error err;
    points xy = NULL;
    utw_status st = UTW_E_NOMEM;
    for (long k = 1; st == UTW_E_NOMEM; k++) {
        int n;
        utw_memory_fail_at(k);
        st = utw_aerofoil_points(text, strlen(text), &xy, &n, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_null(xy);
    }
    assert_int_equal(st, UTW_OK);
    utw_free(xy);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(thickness_follows_the_printed_ordinates),
        balanced_test(points_lie_on_the_formula),
        balanced_test(wrong_designations_are_told),
        balanced_test(lists_of_every_kind_are_read),
        balanced_test(bad_lists_are_told),
        balanced_test(a_refused_allocation_leaves_nothing_behind),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
