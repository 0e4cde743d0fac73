/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/degrees.h"

#include "base/vec2.h"
#include "support/support.h"

static void quarter_turns_are_exact(void **state)
{
    (void)state;
    for (int k = -9; k <= 9; k++) {
        const int sine[4] = {0, 1, 0, -1}, m = ((k % 4) + 4) % 4;
        assert_true(utw_sin_degrees(90.0 * k) == sine[m]);
        assert_true(utw_cos_degrees(90.0 * k) == sine[(m + 1) % 4]);
    }
    assert_true(utw_tan_degrees(180) == 0);
    assert_true(isinf(utw_tan_degrees(90)));
}

static void all_agree_with_radians(void **state)
{
    (void)state;
    for (double a = -737.3; a < 800; a += 23.9) {
        const double r = a * UTW_PI / 180;
        assert_close_scaled(utw_sin_degrees(a), sin(r), 4e-15, 1);
        assert_close_scaled(utw_cos_degrees(a), cos(r), 4e-15, 1);
        assert_close_scaled(utw_tan_degrees(a), tan(r), 1e-13, 1);
    }
    assert_close(utw_asin_degrees(0.5), 30, 1e-15);
    assert_close(utw_acos_degrees(-0.5), 120, 1e-15);
    assert_close(utw_atan_degrees(-1), -45, 1e-15);
    assert_close(utw_atan2_degrees(1, -1), 135, 1e-15);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(quarter_turns_are_exact),
        cmocka_unit_test(all_agree_with_radians),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
