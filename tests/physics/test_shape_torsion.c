/* SPDX-License-Identifier: GPL-3.0-or-later
 * Trade shapes whose torsion constant is known in closed form or as a series, from their named
 * dimensions (Timoshenko and Goodier, Theory of Elasticity, 3rd ed., ch. 10; Young and Budynas,
 * Roark's Formulas, table 10.1 for the thin ones). */
#include "base/vec2.h"
#include "support/section.h"
#include "support/shapes.h"

/* Series (Timoshenko and Goodier, sec. 109): b the lesser side. */
static double rectangle(double a, double b)
{
    double sum = 0;
    for (int n = 1; n < 1000; n += 2) sum += tanh(n * UTW_PI * a / (2 * b)) / pow(n, 5);
    return a * b * b * b / 3 * (1 - 192 / pow(UTW_PI, 5) * b / a * sum);
}

static void check(const char *text, double J, double rtol)
{
    utw_outline *o = shape_of(text);
    utw_solution *s = section_solve(o, 1e-6, 0);
    const utw_quantity q = section_constant(s, UTW_J);
    if (rtol == 0) { /* exact: within the bracket, but for rounding */
        assert_true(q.low <= J * (1 + 1e-9) && J * (1 - 1e-9) <= q.high);
        assert_close(q.value, J, 1e-6);
    } else {
        assert_close(q.value, J, rtol);
    }
    utw_solution_free(s);
    utw_outline_free(o);
}

static void closed_forms_and_series(void **state)
{
    (void)state;
    check("rectangle b=62.4 h=11.7", rectangle(62.4, 11.7), 0);
    check("rectangle b=23.85 h=23.85", rectangle(23.85, 23.85), 0);
    check("round d=23.85", UTW_PI * pow(23.85, 4) / 32, 0);
    const double a = 31.2, b = 8.45; /* semi-axes */
    check("ellipse b=62.4 h=16.9", UTW_PI * pow(a * b, 3) / (a * a + b * b), 0);
    /* equilateral triangle of side c: sqrt 3 c^4 / 80; s is twice the inscribed circle's radius, c
     * / sqrt 3 */
    check("polygon n=3 s=41.3", sqrt(3) / 80 * pow(41.3 * sqrt(3), 4), 0);
    check("polygon n=4 s=23.85", rectangle(23.85, 23.85), 0);
    check("trapezium b=41.3 h=35.76684918 a=0", sqrt(3) / 80 * pow(41.3, 4), 0);
    check("trapezium b=30 h=12 a=30", rectangle(30, 12), 0);
    check("tube d=60.3 t=4", UTW_PI / 32 * (pow(60.3, 4) - pow(52.3, 4)), 0);
}

/* Thin ones: a strip t thick of length l along its middle has J = l t^3/3 (1 - 0.63 t/l) whatever
 * its bends (Roark; 0.630 is the end effect of the rectangle). */
static void thin_strips(void **state)
{
    (void)state;
    const double end = 0.630;
    double l = UTW_PI * 56.3 - 1; /* round tube slit open, gap 1 along the middle */
    check("slit-tube d=60.3 t=4 gap=1", l * 64 / 3 * (1 - end * 4 / l), 0.003);
    l = UTW_PI / 180 * 130 * 45;
    check("arc-strip r=45 t=3 angle=130", l * 27 / 3 * (1 - end * 3 / l), 0.003);
}

/* Square tube by Bredt (Roark, table 10.1): J = 4 A^2 t / s; sharp corners add to it, by about one
 * part in the number of thicknesses along a side. */
static void rectangular_tubes(void **state)
{
    (void)state;
    const double t = 1.5, a = 80 - t, b = 120 - t;
    check("box h=120 b=80 t=1.5 ro=0 ri=0", 4 * pow(a * b, 2) * t / (2 * (a + b)), 0.01);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(closed_forms_and_series),
        balanced_test(thin_strips),
        balanced_test(rectangular_tubes),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
