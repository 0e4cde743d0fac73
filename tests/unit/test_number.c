/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "report/number.h"

#include "support/support.h"

static void expect(double value, double low, double high, const char *value_text,
                   const char *low_text, const char *high_text)
{
    const utw_quantity q = {value, low, high, UTW_BRACKET};
    utw_number n;
    utw_number_write(&q, 0, &n);
    assert_string_equal(n.value, value_text);
    assert_string_equal(n.low, low_text);
    assert_string_equal(n.high, high_text);
}

static void expect_exact(double value, double noise, const char *text)
{
    const utw_quantity q = {value, value, value, UTW_EXACT};
    utw_number n;
    utw_number_write(&q, noise, &n);
    assert_string_equal(n.value, text);
    assert_string_equal(n.low, "");
    assert_string_equal(n.high, "");
}

static void exact_values_have_nine_digits(void **state)
{
    (void)state;
    expect_exact(3600, 0, "3600");
    expect_exact(1585.7809875231387, 0, "1585.78099");
    expect_exact(-502426.2495349103, 0, "-502426.25");
    expect_exact(83457612.34, 0, "83457612.3");
    expect_exact(834576123.4, 0, "8.34576123e+08");
    expect_exact(99999999.96, 0, "1e+08");
    expect_exact(0.02385, 0, "0.02385");
    expect_exact(0.000012385, 0, "1.2385e-05");
    expect_exact(0, 0, "0");
    expect_exact(-2.1e-13, 1e-12, "0");
    expect_exact(-2.1e-11, 1e-12, "-2.1e-11");
}

static void bounds_show_two_digits_of_their_difference(void **state)
{
    (void)state;
    expect(475032.2411, 475032.1461, 475032.3361, "475032.2", "475032.14", "475032.34");
    expect(0.05273484, 0.0527348213, 0.0527348597, "0.05273484", "0.052734821", "0.052734860");
    expect(2.9282088e8, 2.92820583e8, 2.92821177e8, "2.928209e+08", "2.9282058e+08",
           "2.9282118e+08");
    expect(-5.5, -7.2, -3.8, "-6", "-7.2", "-3.8");
    expect(1.5e-9, -0.6e-9, 3.6e-9, "2e-09", "-0.6e-09", "3.6e-09");
    expect(0, -2.08e-6, 2.08e-6, "0", "-2.1e-06", "2.1e-06");
    expect(0, -0.3, 30.2, "0", "-1", "31");
    /* the value must not be rounded out of its bounds */
    expect(1.2349, 1.2341, 1.2350, "1.2349", "1.23410", "1.23500");
    /* bounds closer than ten digits */
    expect(1.5, 1.5 - 1e-13, 1.5 + 1e-13, "1.500000000", "1.499999999", "1.500000001");
    expect(17.78576210009, 17.78576210009, 17.78576210009, "17.78576210", "17.78576210",
           "17.78576211");
    /* low and high carry into a further digit */
    expect(9.997, 9.994, 10.0, "9.997", "9.9940", "10.0000");
}

static void missing_bounds_are_said(void **state)
{
    (void)state;
    expect(2385.4, 1990.2, INFINITY, "2390", "1990", "none");
    expect(NAN, 1, 2, "none", "", "");
}

/* Whatever the bounds, what is printed is true. */
static void printed_bounds_hold(void **state)
{
    (void)state;
    unsigned long long seed = 11;
    for (int i = 0; i < 50000; i++) {
        double u[4];
        for (int k = 0; k < 4; k++) {
            seed = seed * 6364136223846793005ULL + 1442695040888963407ULL;
            u[k] = (double)(seed >> 11) * 0x1p-53;
        }
        const double value = (u[0] - 0.5) * pow(10, 30 * u[1] - 12),
                     width = fabs(value) * pow(10, -14 * u[2]);
        const utw_quantity q = {value, value - u[3] * width, value + (1 - u[3]) * width,
                                UTW_BRACKET};
        utw_number n;
        utw_number_write(&q, 0, &n);
        const double v = strtod(n.value, NULL), low = strtod(n.low, NULL),
                     high = strtod(n.high, NULL);
        if (!(low <= q.low && q.high <= high && v >= low && v <= high))
            print_error("%.17g in %.17g .. %.17g: %s %s %s\n", q.value, q.low, q.high, n.value,
                        n.low, n.high);
        assert_true(low <= q.low && q.high <= high && v >= low && v <= high);
        /* and not much wider than it is */
        assert_true(high - low <= 1.25 * (q.high - q.low) + 3e-9 * fabs(value));
        assert_true(strlen(n.value) <= 16 && strlen(n.low) <= 17 && strlen(n.high) <= 17);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(exact_values_have_nine_digits),
        cmocka_unit_test(bounds_show_two_digits_of_their_difference),
        cmocka_unit_test(missing_bounds_are_said),
        cmocka_unit_test(printed_bounds_hold),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
