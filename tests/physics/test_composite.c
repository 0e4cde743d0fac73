/* SPDX-License-Identifier: GPL-3.0-or-later
 * Bars of parts that differ in stiffness, bonded where they touch.
 *
 * Sources. Concentric shafts: every ring turns by the same angle, GJ = sum G_i J_i (common
 * practice). Two rectangles side by side: the stress function's equation div (1/G grad phi) = -2
 * solved by a cosine series in y for each part and matched at the joint (the method of
 * Muskhelishvili, Some Basic Problems of the Mathematical Theory of Elasticity, 1953, art. 140;
 * worked out here). Thin channel: shear flow of Vy in flanges and web weighted by E (common
 * practice). */
#include "base/vec2.h"
#include "support/section.h"

static utw_outline *outline_of(const char *parts, double E1, double nu1, double E2, double nu2)
{
    char json[2000];
    utw_error err;
    utw_outline *o = NULL;
    const int n = snprintf(json, sizeof json,
                           "{\"units\": \"mm N\", \"materials\": {\"a\": {\"E\": %.17g, \"nu\": "
                           "%.17g}, \"b\": {\"E\": %.17g, \"nu\": %.17g}}, \"parts\": [%s]}",
                           E1, nu1, E2, nu2, parts);
    assert_true(n > 0 && (size_t)n < sizeof json);
    assert_ok(utw_outline_parse(json, (size_t)n, "composite", &o, &err));
    return o;
}

static utw_quantity stiffness(const utw_solution *s, utw_stiffness which)
{
    utw_error err;
    utw_quantity q;
    assert_ok(utw_solution_stiffness(s, which, &q, &err));
    return q;
}

static void concentric_shafts(void **state)
{
    (void)state;
    static const double tolerance[] = {1e-3, 1e-6, 1e-9};
    const double G1 = 210e3 / 2.56, G2 = 70e3 / 2.6;
    const double r4 = pow(10.5, 4), R4 = pow(16.25, 4);
    for (size_t i = 0; i < sizeof tolerance / sizeof *tolerance; i++) {
        utw_outline *o = outline_of(
            "{\"material\": \"b\", \"outline\": {\"circle\": [3,4,16.25]}, \"holes\": "
            "[{\"circle\": "
            "[3,4,10.5]}]}, {\"material\": \"a\", \"outline\": {\"circle\": [3,4,10.5]}}",
            210e3, 0.28, 70e3, 0.3);
        utw_solution *s = section_solve(o, tolerance[i], 0);
        const double GJ = UTW_PI / 2 * (G1 * r4 + G2 * (R4 - r4));
        const utw_quantity q = stiffness(s, UTW_STIFFNESS_GJ);
        assert_int_equal(q.trust, UTW_BRACKET);
        assert_true(q.low <= GJ * (1 + 1e-12) && q.high >= GJ * (1 - 1e-12));
        assert_true(q.high - q.low <= tolerance[i] * GJ);
        assert_close(stiffness(s, UTW_STIFFNESS_EA).value,
                     UTW_PI * (210e3 * 10.5 * 10.5 + 70e3 * (16.25 * 16.25 - 10.5 * 10.5)), 1e-12);
        assert_close(stiffness(s, UTW_STIFFNESS_EIXX).value,
                     UTW_PI / 4 * (210e3 * r4 + 70e3 * (R4 - r4)), 1e-12);
        assert_close(section_constant(s, UTW_XS).value, 3, 1e-8);
        assert_close(section_constant(s, UTW_YS).value, 4, 1e-8);
        utw_solution_free(s);
        utw_outline_free(o);
    }
}

/* Rectangles 0 < x < a (G1) and a < x < c (G2), |y| < b/2: phi_i = G_i (b^2/4 - y^2 + sum c_i(x)
 * cos(n pi y/b)) over odd n, c'' = k^2 c; zero at both ends, phi and phi_x/G continuous at a. */
static double two_rectangles(double a, double c, double b, double G1, double G2)
{
    double GJ = 2 * (G1 * a + G2 * (c - a)) * b * b * b / 6;
    for (int n = 1; n < 4001; n += 2) {
        const double k = n * UTW_PI / b, sign = n % 4 == 1 ? 1 : -1, l1 = a, l2 = c - a;
        const double f = sign * 8 * b * b / pow(n * UTW_PI, 3);
        /* c_1 = -f cosh kx + B sinh kx from the left end, c_2 likewise from the right end with C:
         * all over cosh of the own length, which overflows no more */
        const double t1 = tanh(k * l1), t2 = tanh(k * l2), h1 = k * l1 < 300 ? 1 / cosh(k * l1) : 0,
                     h2 = k * l2 < 300 ? 1 / cosh(k * l2) : 0;
        /* with b1 = B cosh, b2 = C cosh: G1 (f - f/h1 + b1 t1) = G2 (f - f/h2 + b2 t2) and
         * -f t1/h1 + b1 = -(-f t2/h2 + b2); p_i = b_i - f t_i / h_i is the slope at the joint */
        /* value at the joint: -f/h + b t = p t - f h (as 1 - t^2 = h^2) */
        const double p1 = (G2 * f * (1 - h2) - G1 * f * (1 - h1)) / (G1 * t1 + G2 * t2);
        const double slope[2] = {p1, -p1}, t[2] = {t1, t2}, h[2] = {h1, h2}, G[2] = {G1, G2};
        for (int i = 0; i < 2; i++) {
            /* int c dx = (c'(end) - c'(start))/k^2; at the end of the bar c' = k B, B = (p + f
             * t/h) h = p h + f t */
            const double integral = (slope[i] - (slope[i] * h[i] + f * t[i])) / k;
            GJ += 2 * G[i] * integral * 2 * sign / k;
        }
    }
    return GJ;
}

static void rectangles_side_by_side(void **state)
{
    (void)state;
    static const struct {
        double a, c, b, E1, nu1, E2, nu2;
    } row[] = {{30, 50, 20, 70e3, 0.3, 210e3, 0.3},
               {12.5, 40, 33, 3e3, 0.4, 210e3, 0.28},
               {5, 60, 7.5, 210e3, 0.1, 70e3, 0.33},
               {20, 40, 15, 1, 0.25, 1, 0.25}};
    for (size_t i = 0; i < sizeof row / sizeof *row; i++) {
        char parts[400];
        snprintf(
            parts, sizeof parts,
            "{\"material\": \"a\", \"outline\": [[0,0], [%.17g,0], [%.17g,%.17g], [0,%.17g]]}, "
            "{\"material\": \"b\", \"outline\": [[%.17g,0], [%.17g,0], [%.17g,%.17g], "
            "[%.17g,%.17g]]}",
            row[i].a, row[i].a, row[i].b, row[i].b, row[i].a, row[i].c, row[i].c, row[i].b,
            row[i].a, row[i].b);
        utw_outline *o = outline_of(parts, row[i].E1, row[i].nu1, row[i].E2, row[i].nu2);
        utw_solution *rough = section_solve(o, 1e-3, 0), *s = section_solve(o, 1e-7, 0);
        const double GJ =
            two_rectangles(row[i].a, row[i].c, row[i].b, row[i].E1 / (2 * (1 + row[i].nu1)),
                           row[i].E2 / (2 * (1 + row[i].nu2)));
        const utw_quantity q = stiffness(s, UTW_STIFFNESS_GJ),
                           r = stiffness(rough, UTW_STIFFNESS_GJ);
        assert_true(q.low <= GJ * (1 + 1e-10) && q.high >= GJ * (1 - 1e-10));
        assert_true(r.low <= GJ && r.high >= GJ);
        /* bending by Vy strains both alike: the shear centre is the E-weighted centroid */
        const utw_quantity xs = section_constant(s, UTW_XS);
        const double xc = section_constant(s, UTW_XC).value;
        assert_close(xc,
                     (row[i].E1 * row[i].a * row[i].a / 2 +
                      row[i].E2 * (row[i].c * row[i].c - row[i].a * row[i].a) / 2) /
                         (row[i].E1 * row[i].a + row[i].E2 * (row[i].c - row[i].a)),
                     1e-12);
        if (row[i].nu1 == row[i].nu2) assert_close(xs.value, xc, 1e-6);
        utw_solution_free(rough);
        utw_solution_free(s);
        utw_outline_free(o);
    }
}

/* Channel of middle lines b = 40, h = 80, walls t, web of another modulus: the shear centre lies
 * e = 3 b^2 Ef / (6 b Ef + h Ew) behind the web as t goes to 0. */
static void thin_channel(void **state)
{
    (void)state;
    double before = UTW_INFINITY;
    for (double t = 2; t > 0.4; t /= 2) {
        char parts[700];
        snprintf(parts, sizeof parts,
                 "{\"material\": \"a\", \"outline\": [[%.17g,%.17g], [%.17g,%.17g], [%.17g,%.17g], "
                 "[%.17g,%.17g]]}, {\"material\": \"b\", \"outline\": [[%.17g,%.17g], [40,%.17g], "
                 "[40,%.17g], [%.17g,%.17g]]}, {\"material\": \"b\", \"outline\": [[%.17g,%.17g], "
                 "[40,%.17g], [40,%.17g], [%.17g,%.17g]]}",
                 -t / 2, -t / 2, t / 2, -t / 2, t / 2, 80 + t / 2, -t / 2, 80 + t / 2, t / 2,
                 -t / 2, -t / 2, t / 2, t / 2, t / 2, t / 2, 80 - t / 2, 80 - t / 2, 80 + t / 2,
                 t / 2, 80 + t / 2);
        utw_outline *o = outline_of(parts, 210e3, 0.3, 70e3, 0.3);
        utw_solution *s = section_solve(o, 1e-4, 0);
        const double e = 3 * 40 * 40 * 70e3 / (6 * 40 * 70e3 + 80 * 210e3);
        const utw_quantity xs = section_constant(s, UTW_XS), ys = section_constant(s, UTW_YS);
        const double off = fabs(xs.value + e);
        assert_true(xs.value < -t / 2); /* behind the web, outside the section */
        assert_close(ys.value, 40, 1e-4);
        assert_true(off < 0.1 * t * 40 / 2 && off < 0.75 * before);
        before = off;
        utw_solution_free(s);
        utw_outline_free(o);
    }
}

/* What a change of units or of the order of the parts must do. */
static void reference_and_scale(void **state)
{
    (void)state;
    static const char one[] = "{\"material\": \"a\", \"outline\": [[0,0], [30,0], [30,8], [8,8], "
                              "[8,20], [0,20]]}",
                      two[] =
                          "{\"material\": \"b\", \"outline\": [[0,20], [8,20], [8,45], [0,45]]}";
    char parts[2][300];
    utw_solution *s[3];
    utw_outline *o[3];
    snprintf(parts[0], sizeof parts[0], "%s, %s", one, two);
    snprintf(parts[1], sizeof parts[1], "%s, %s", two, one);
    o[0] = outline_of(parts[0], 70e3, 0.3, 200e3, 0.25);
    o[1] = outline_of(parts[1], 70e3, 0.3, 200e3, 0.25);
    o[2] = outline_of(parts[0], 70, 0.3, 200, 0.25);
    for (int i = 0; i < 3; i++) s[i] = section_solve(o[i], 1e-8, 0);
    for (int k = 0; k < UTW_STIFFNESS_COUNT; k++) {
        const double value = stiffness(s[0], (utw_stiffness)k).value;
        const double rtol = k < UTW_STIFFNESS_GJ ? 1e-11 : k == UTW_STIFFNESS_GJ ? 1e-8 : 1e-6;
        assert_close(stiffness(s[1], (utw_stiffness)k).value, value, rtol);
        assert_close(stiffness(s[2], (utw_stiffness)k).value, value / 1000, rtol);
    }
    for (int k = UTW_XS; k <= UTW_YS; k++)
        assert_close(section_constant(s[0], k).value, section_constant(s[1], k).value, 1e-6);
    for (int i = 0; i < 3; i++) {
        utw_solution_free(s[i]);
        utw_outline_free(o[i]);
    }
}

/* What needs one material says so. */
static void left_out(void **state)
{
    (void)state;
    static const utw_constant list[] = {UTW_WX_TOP, UTW_ZX,  UTW_XP, UTW_WT,
                                        UTW_XF,     UTW_ASX, UTW_KY};
    utw_outline *o =
        outline_of("{\"material\": \"a\", \"outline\": [[0,0], [30,0], [30,20], [0,20]]}, "
                   "{\"material\": \"b\", \"outline\": [[30,0], [50,0], [50,20], [30,20]]}",
                   70e3, 0.3, 210e3, 0.3);
    utw_solution *s = section_solve(o, 1e-3, 0);
    assert_int_equal(utw_solution_composite(s), 1);
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        utw_quantity q;
        utw_error err;
        char text[100];
        snprintf(text, sizeof text, "%s is given for sections of one material only",
                 utw_constant_key(list[i]));
        assert_int_equal(utw_solution_constant(s, list[i], &q, &err), UTW_E_MATERIAL);
        assert_string_equal(err.text, text);
    }
    utw_solution_free(s);
    utw_outline_free(o);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(concentric_shafts), balanced_test(rectangles_side_by_side),
        balanced_test(thin_channel),      balanced_test(reference_and_scale),
        balanced_test(left_out),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
