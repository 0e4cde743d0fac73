/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "section/interval.h"

#include "support/support.h"

static void same(utw_interval a, double value, double low, double high)
{
    assert_close_scaled(a.value, value, 1e-15, 1);
    if (isinf(high))
        assert_true(isinf(a.high) && a.high > 0);
    else
        assert_close_scaled(a.high, high, 1e-15, 1);
    assert_close_scaled(a.low, low, 1e-15, 1);
}

static const utw_interval a = {2, 1.5, 2.5}, b = {-3, -4, -1};

static void sums_and_multiples(void **state)
{
    (void)state;
    same(utw_exactly(7.25), 7.25, 7.25, 7.25);
    same(utw_about(4, 0.5), 4, 3.5, 4.5);
    same(utw_plus(a, b), -1, -2.5, 1.5);
    same(utw_times(3, a), 6, 4.5, 7.5);
    same(utw_times(-2, b), 6, 2, 8);
    same(utw_times(0, a), 0, 0, 0);
}

static void squares_and_roots(void **state)
{
    (void)state;
    same(utw_square(a), 4, 2.25, 6.25);
    same(utw_square(b), 9, 1, 16);
    same(utw_square((utw_interval){0.5, -2, 1}), 0.25, 0, 4); /* zero lies inside */
    same(utw_root((utw_interval){4, 2.25, 6.25}), 2, 1.5, 2.5);
    same(utw_root((utw_interval){0.01, -0.02, 0.04}), 0.1, 0, 0.2);
}

static void quotients(void **state)
{
    (void)state;
    same(utw_inverse(a), 0.5, 0.4, 1 / 1.5);
    same(utw_inverse((utw_interval){2, 0, 4}), 0.5, 0.25, INFINITY);
    same(utw_quotient((utw_interval){6, 5, 7}, a), 3, 2, 7 / 1.5);
    same(utw_quotient((utw_interval){6, 5, 7}, (utw_interval){2, -1, 4}), 3, 1.25, INFINITY);
}

/* Whatever numbers lie in the operands, the result lies in the result. */
static void results_hold_what_they_must(void **state)
{
    (void)state;
    for (double s = 0; s <= 1; s += 0.25)
        for (double t = 0; t <= 1; t += 0.25) {
            const double x = a.low + s * (a.high - a.low), y = b.low + t * (b.high - b.low);
            const utw_interval sum = utw_plus(a, b), q = utw_quotient(utw_square(b), a);
            assert_true(sum.low <= x + y && x + y <= sum.high);
            assert_true(q.low <= y * y / x && y * y / x <= q.high);
        }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(sums_and_multiples),
        balanced_test(squares_and_roots),
        balanced_test(quotients),
        balanced_test(results_hold_what_they_must),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
