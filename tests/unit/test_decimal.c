/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/decimal.c" /* use_point() is its own */

#include "support/support.h"

/* A repeatable sequence of doubles of every size and sign. */
static double next_number(unsigned long long *seed)
{
    *seed = *seed * 6364136223846793005ULL + 1442695040888963407ULL;
    const double unit = (double)(*seed >> 11) * 0x1p-53;
    *seed = *seed * 6364136223846793005ULL + 1442695040888963407ULL;
    const double size = (double)(*seed >> 11) * 0x1p-53;
    return (unit - 0.5) * pow(10, 40 * size - 20);
}

static void exact_text_reads_back(void **state)
{
    (void)state;
    static const double special[] = {0,      0.1,      1e23, 5e-324, 1.7976931348623157e308,
                                     -2.385, 0.1 + 0.2};
    char text[UTW_DECIMAL_LENGTH];
    for (size_t i = 0; i < sizeof special / sizeof *special; i++) {
        utw_decimal_exact(special[i], text);
        assert_true(strtod(text, NULL) == special[i]);
    }
    unsigned long long seed = 2385;
    for (int i = 0; i < 20000; i++) {
        const double x = next_number(&seed);
        utw_decimal_exact(x, text);
        assert_true(strtod(text, NULL) == x);
    }
    utw_decimal_exact(0.1, text);
    assert_string_equal(text, "0.1");
}

/* What printf makes of 1.25e-7 in locales of other decimal points; few machines have them all. */
static void the_decimal_point_of_the_locale_does_not_matter(void **state)
{
    (void)state;
    char comma[] = "-1,25e-07",
         arabic[] = "1\xd9\xab"
                    "25",
         point[] = "1.25", whole[] = "125";
    use_point(comma);
    assert_string_equal(comma, "-1.25e-07");
    use_point(arabic);
    assert_string_equal(arabic, "1.25");
    use_point(point);
    assert_string_equal(point, "1.25");
    use_point(whole);
    assert_string_equal(whole, "125");
}

static void places_are_those_of_the_first_digit(void **state)
{
    (void)state;
    static const struct {
        double x;
        int place;
    } list[] = {
        {1, 0},      {9.999999999999998, 0}, {10, 1},    {-1000, 3},   {999.9999999999999, 2},
        {0.001, -3}, {0.0009999999, -4},     {1e22, 22}, {1e-22, -22}, {0, 0}};
    for (size_t i = 0; i < sizeof list / sizeof *list; i++)
        assert_int_equal(utw_decimal_place(list[i].x), list[i].place);
}

static void rounding_down_and_up_holds(void **state)
{
    (void)state;
    assert_true(utw_decimal_count(2.385, -3, UTW_DOWN) == 2385);
    assert_true(utw_decimal_count(2.385, -3, UTW_UP) == 2385);
    assert_true(utw_decimal_count(-2.3851, -3, UTW_DOWN) == -2386);
    assert_true(utw_decimal_count(-2.3851, -3, UTW_UP) == -2385);
    assert_true(utw_decimal_count(0.3, -1, UTW_DOWN) == 3); /* 0.3 * 10 rounds to 3 */
    assert_true(utw_decimal_count(2385, 3, UTW_NEAREST) == 2);
    unsigned long long seed = 7;
    for (int i = 0; i < 20000; i++) {
        const double x = next_number(&seed);
        const int place = utw_decimal_place(x) - i % 12;
        const double down = utw_decimal_count(x, place, UTW_DOWN),
                     up = utw_decimal_count(x, place, UTW_UP);
        assert_true(utw_decimal_value(down, place) <= x && utw_decimal_value(up, place) >= x);
        assert_true(up - down <= 1);
    }
}

static void expect(double count, int place, int scientific, int exponent, const char *expected)
{
    char text[UTW_DECIMAL_LENGTH];
    utw_decimal_write(count, place, scientific, exponent, text);
    assert_string_equal(text, expected);
}

static void counts_are_written_with_their_zeros(void **state)
{
    (void)state;
    expect(2385, -3, 0, 0, "2.385");
    expect(-5, -3, 0, 0, "-0.005");
    expect(-0.0, -3, 0, 0, "0.000");
    expect(120, 0, 0, 0, "120");
    expect(-238, 1, 0, 0, "-2380");
    expect(1250, 5, 1, 8, "1.250e+08");
    expect(-1250, -10, 1, -7, "-1.250e-07");
    expect(3, 8, 1, 8, "3e+08");
    expect(25, -8, 1, -5, "0.025e-05");
    expect(0, -8, 1, -5, "0");
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(exact_text_reads_back),
        cmocka_unit_test(the_decimal_point_of_the_locale_does_not_matter),
        cmocka_unit_test(places_are_those_of_the_first_digit),
        cmocka_unit_test(rounding_down_and_up_holds),
        cmocka_unit_test(counts_are_written_with_their_zeros),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
