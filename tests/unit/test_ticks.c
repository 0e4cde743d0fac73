/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/ticks.h"

#include "support/support.h"

static void levels_are_round_and_cover_the_range(void **state)
{
    (void)state;
    static const double range[][2] = {{-468.8, 452},      {0, 1},         {0, 2.385e9},
                                      {-1.7e-7, 3.1e-7},  {12.34, 12.41}, {-1e6, -0.9e6},
                                      {0, 9.99999999999}, {-3, 3},        {1e-12, 7e12}};
    for (size_t i = 0; i < sizeof range / sizeof *range; i++)
        for (int most = 2; most <= 20; most++) {
            const utw_ticks t = utw_ticks_of(range[i][0], range[i][1], most);
            const double size = fmax(fabs(range[i][0]), fabs(range[i][1]));
            const double slack = 1e-8 * t.step + 1e-12 * size;
            assert_true((double)t.first * t.step <= range[i][0] + slack);
            assert_true((double)t.last * t.step >= range[i][1] - slack);
            assert_true(t.last - t.first >= 1 && t.last - t.first + 1 <= (most > 2 ? most : 3));
            /* 1, 2, 2.5 or 5 times a power of ten */
            const double digits = t.step / pow(10, floor(log10(t.step * 1.0000001)));
            assert_true(fabs(digits - 1) < 1e-9 || fabs(digits - 2) < 1e-9 ||
                        fabs(digits - 2.5) < 1e-9 || fabs(digits - 5) < 1e-9);
        }
    /* a level that is met is not passed */
    const utw_ticks t = utw_ticks_of(-0.3, 0.3, 7);
    assert_int_equal(t.first, -3);
    assert_int_equal(t.last, 3);
}

static void expect_tick(double low, double high, int most, long k, const char *text,
                        const char *unit)
{
    char got[64];
    const utw_ticks t = utw_ticks_of(low, high, most);
    utw_tick_text(&t, k, got, sizeof got);
    assert_string_equal(got, text);
    utw_ticks_unit(&t, "mm\xC2\xB2", got, sizeof got);
    assert_string_equal(got, unit);
}

static void texts_of_levels(void **state)
{
    (void)state;
    expect_tick(-468.8, 452, 13, -4,
                "\xE2\x88\x92"
                "400",
                "mm\xC2\xB2");
    expect_tick(-468.8, 452, 13, 0, "0", "mm\xC2\xB2");
    expect_tick(0, 1, 5, 1, "0.25", "mm\xC2\xB2");
    expect_tick(0, 1, 5, 4, "1.00", "mm\xC2\xB2");
    expect_tick(0, 2.385e9, 7, 3, "1.5", "10\xE2\x81\xB9\xE2\x80\xAFmm\xC2\xB2");
    expect_tick(-1.7e-7, 3.1e-7, 7, 1, "100", "10\xE2\x81\xBB\xE2\x81\xB9\xE2\x80\xAFmm\xC2\xB2");
    expect_tick(0, 23456, 6, 2, "10000", "mm\xC2\xB2");
    expect_tick(0, 250000, 6, 1, "50", "10\xC2\xB3\xE2\x80\xAFmm\xC2\xB2");
}

static void expect_number(double x, int digits, const char *text)
{
    char got[64];
    utw_number_text(x, digits, got, sizeof got);
    assert_string_equal(got, text);
}

static void numbers_for_people(void **state)
{
    (void)state;
    expect_number(0, 4, "0");
    expect_number(-468.81, 4,
                  "\xE2\x88\x92"
                  "468.8");
    expect_number(12.5, 4, "12.5");
    expect_number(90, 6, "90");
    expect_number(1234.5, 5, "1234.5");
    expect_number(69985.2, 5,
                  "69\xE2\x80\xAF"
                  "985");
    expect_number(1496612.3, 5,
                  "1\xE2\x80\xAF"
                  "496\xE2\x80\xAF"
                  "600");
    expect_number(3.18592e7, 5,
                  "3.1859\xC2\xB7"
                  "10\xE2\x81\xB7");
    expect_number(9.99996e8, 5,
                  "1.0000\xC2\xB7"
                  "10\xE2\x81\xB9");
    expect_number(0.00123456, 3, "0.00123");
    expect_number(1.23456e-5, 3,
                  "1.23\xC2\xB7"
                  "10\xE2\x81\xBB\xE2\x81\xB5");
    expect_number(-99.9996, 5,
                  "\xE2\x88\x92"
                  "100");
}

static void units_have_their_powers(void **state)
{
    (void)state;
    char text[40];
    utw_unit_text("mm", 2, text, sizeof text);
    assert_string_equal(text, "mm\xC2\xB2");
    utw_unit_text("in", 6, text, sizeof text);
    assert_string_equal(text, "in\xE2\x81\xB6");
    utw_unit_text("m", 1, text, sizeof text);
    assert_string_equal(text, "m");
    utw_unit_text("mm", -3, text, sizeof text);
    assert_string_equal(text, "mm\xE2\x81\xBB\xC2\xB3");
    utw_unit_text("mm", 0, text, sizeof text);
    assert_string_equal(text, "");
}

static void lengths_of_scale_bars(void **state)
{
    (void)state;
    assert_close(utw_round_length(1), 1, 1e-14);
    assert_close(utw_round_length(1.99), 1, 1e-14);
    assert_close(utw_round_length(4.99e-7), 2e-7, 1e-14);
    assert_close(utw_round_length(5.0), 5, 1e-14);
    assert_close(utw_round_length(9.9e5), 5e5, 1e-14);
    assert_close(utw_round_length(20), 20, 1e-14);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(levels_are_round_and_cover_the_range),
        cmocka_unit_test(texts_of_levels),
        cmocka_unit_test(numbers_for_people),
        cmocka_unit_test(units_have_their_powers),
        cmocka_unit_test(lengths_of_scale_bars),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
