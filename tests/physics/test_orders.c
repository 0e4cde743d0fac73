/* SPDX-License-Identifier: GPL-3.0-or-later
 * On one mesh the spaces of order p + 1 hold those of order p: the gap shrinks with every order,
 * and each bracket of J lies within the one before. */
#include "support/samples.h"

/* Rounding of sums over the section. */
#define ROUNDING 1e-12

static void orders_of(int sample, int most)
{
    const char *name;
    utw_outline *o = sample_outline(sample, &name);
    utw_quantity last = {0, 0, HUGE_VAL, UTW_BRACKET};
    double gap = HUGE_VAL;
    print_message("%s:", name);
    for (int p = 1; p <= most; p++) {
        utw_options options = UTW_OPTIONS_INIT;
        utw_error err;
        utw_solution *s = NULL;
        utw_solution_info info;
        options.fixed_order = p;
        assert_ok(utw_solve(o, &options, &s, &err));
        utw_solution_get_info(s, &info);
        const utw_quantity J = section_constant(s, UTW_J);
        assert_int_equal(info.rounds, 1);
        assert_int_equal(info.least_order, p);
        assert_int_equal(info.greatest_order, p);
        assert_int_equal(info.reached, info.gap <= options.tolerance);
        assert_close_scaled(info.gap, (J.high - J.low) / J.value, 1e-3, 1e-9);
        print_message(" %.1e", info.gap);
        assert_true(J.low >= last.low - ROUNDING * J.value);
        assert_true(J.high <= last.high + ROUNDING * J.value);
        assert_true(info.gap < gap + ROUNDING);
        last = J;
        gap = info.gap;
        utw_solution_free(s);
    }
    print_message("\n");
    assert_true(gap < 1e-5);
    utw_outline_free(o);
}

static void every_order_narrows_the_bracket(void **state)
{
    (void)state;
    const char *name;
    utw_outline *o;
    for (int i = 0; (o = sample_outline(i, &name)) != NULL; i++) {
        utw_outline_free(o);
        orders_of(i, 10);
    }
}

/* Shear centre, factors and flexibilities: the bounds of every order hold the value of a much finer
 * solution. */
static void bounds_of_every_order_hold_the_fine_value(void **state)
{
    (void)state;
    static const utw_constant which[] = {UTW_J,   UTW_XS,  UTW_YS,    UTW_XF,    UTW_YF,
                                         UTW_ASX, UTW_ASY, UTW_BETAX, UTW_BETAY, UTW_R0};
    enum { N = sizeof which / sizeof *which };
    const char *name;
    utw_outline *o;
    for (int i = 0; (o = sample_outline(i, &name)) != NULL; i++) {
        utw_solution *fine = section_solve(o, 1e-8, 0);
        for (int p = 1; p <= 5; p += 2) {
            utw_solution *s = section_solve(o, 1e-3, p); /* few corner layers */
            for (int k = 0; k < N; k++) {
                const utw_quantity f = section_constant(fine, which[k]),
                                   q = section_constant(s, which[k]);
                const double slack =
                    ROUNDING * fmax(fabs(f.value), section_constant(fine, UTW_R0).value);
                if (q.low - slack <= f.high && f.low <= q.high + slack) continue;
                print_error("%s, order %d: %s in [%.15g, %.15g], but [%.15g, %.15g]\n", name, p,
                            utw_constant_key(which[k]), q.low, q.high, f.low, f.high);
                fail();
            }
            utw_solution_free(s);
        }
        utw_solution_free(fine);
        utw_outline_free(o);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(every_order_narrows_the_bracket),
        balanced_test(bounds_of_every_order_hold_the_fine_value),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
