/* SPDX-License-Identifier: GPL-3.0-or-later
 * Keys, meanings and dimensions of the constants; the five problems they come from. */
#include "section/problems.h"
#include "support/section.h"

static void every_constant_has_its_row(void **state)
{
    (void)state;
    for (int i = 0; i < UTW_CONSTANT_COUNT; i++) {
        const char *key = utw_constant_key((utw_constant)i);
        assert_true(key != NULL && strlen(key) > 0 && strlen(key) < 12);
        assert_true(strlen(utw_constant_meaning((utw_constant)i)) > 3);
        for (int k = 0; k < i; k++) assert_string_not_equal(key, utw_constant_key((utw_constant)k));
    }
    assert_string_equal(utw_constant_key(UTW_IXX), "Ixx");
    assert_string_equal(utw_constant_key(UTW_KY), "ky");
    assert_null(utw_constant_key(UTW_CONSTANT_COUNT));
    assert_null(utw_constant_meaning((utw_constant)-1));
    assert_int_equal(utw_constant_power((utw_constant)99), 0);
}

/* The power of a constant is how it grows with the drawing: a section and one 1.7 times as large.
 */
static void powers_are_those_of_a_scaled_section(void **state)
{
    (void)state;
    const double k = 1.7;
    utw_outline *o[2];
    utw_solution *s[2];
    for (int i = 0; i < 2; i++) {
        const double f = i == 0 ? 1 : k;
        o[i] = section_outline(0.3, "\"outline\":[[%g,%g],[%g,%g],[%g,%g],[%g,%g]]", 1 * f, 2 * f,
                               31 * f, 2 * f, 23 * f, 17 * f, 1 * f, 11 * f);
        s[i] = section_solve(o[i], 1e-4, 4);
    }
    for (int i = 0; i < UTW_CONSTANT_COUNT; i++) {
        const double a = section_constant(s[0], i).value, b = section_constant(s[1], i).value;
        assert_close(b, a * pow(k, utw_constant_power((utw_constant)i)), 1e-6);
    }
    for (int i = 0; i < 2; i++) {
        utw_solution_free(s[i]);
        utw_outline_free(o[i]);
    }
}

/* -div P = s where a source is given; P = g where none is; balanced exactly where P is not g. */
static void problems_are_consistent(void **state)
{
    (void)state;
    utw_pair pair[UTW_N_PAIR];
    utw_problems(pair);
    for (int i = 0; i < UTW_N_PAIR; i++) {
        const utw_poly *P = (const utw_poly *)pair[i].P, *g = (const utw_poly *)pair[i].g;
        const double x = 0.7, y = -1.3, h = 1e-4;
        const double div = (utw_poly_at(P[0], x + h, y) - utw_poly_at(P[0], x - h, y) +
                            utw_poly_at(P[1], x, y + h) - utw_poly_at(P[1], x, y - h)) /
                           (2 * h);
        const int source = i == UTW_SHEAR_X || i == UTW_SHEAR_Y;
        assert_int_equal(pair[i].balanced, source);
        assert_close_scaled(utw_poly_at(pair[i].s, x, y), source ? -div : 0, 1e-9, 1);
        for (int k = 0; k < 2; k++)
            assert_true(utw_poly_at(g[k], x, y) == (source ? 0 : utw_poly_at(P[k], x, y)));
    }
    assert_true(utw_poly_at(pair[UTW_TORSION].P[0], 2, 3) == 3); /* (y, -x) */
    assert_true(utw_poly_at(pair[UTW_TORSION].P[1], 2, 3) == -2);
    assert_true(utw_poly_at(pair[UTW_SHEAR_X].s, 2, 3) == 2);
    assert_true(utw_poly_at(pair[UTW_SHEAR_Y].s, 2, 3) == 3);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(every_constant_has_its_row),
        balanced_test(powers_are_those_of_a_scaled_section),
        balanced_test(problems_are_consistent),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
