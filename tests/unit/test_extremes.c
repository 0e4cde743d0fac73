/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "section/extremes.h"
#include "support/stressed.h"

/* Bending and tension by hand: the extreme fibres of a rectangle, exactly. */
static void test_rectangle(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_rectangle(20, 30, 0.3, 1e-4);
    const utw_forces f = {.N = 1200, .Mx = 45000};
    utw_stress_case c;
    utw_extremes e;
    assert_ok(utw_stress_case_of(&s.stress->unit, &f, &c, &err));
    assert_ok(utw_extremes_find(s.stress, &c, &e, &err));
    assert_close(e.kind[UTW_SIGMA_MAX].value, 2 + 15, 1e-12);
    assert_close(e.kind[UTW_SIGMA_MIN].value, 2 - 15, 1e-12);
    assert_close(e.kind[UTW_VON_MISES].value, 17, 1e-12);
    assert_close(e.kind[UTW_PRINCIPAL_MIN].value, -13, 1e-12);
    assert_close_scaled(e.kind[UTW_TAU_MAX].value, 0, 1e-12, 1);
    assert_close(e.kind[UTW_UTILISATION].value, 17.0 / 250, 1e-12);
    assert_close(s.solution->unit * e.kind[UTW_SIGMA_MAX].place.xy[1], 15, 1e-12);
    assert_true(e.kind[UTW_SIGMA_MAX].error < 1e-12);
    stressed_clear(&s);
}

/* The extreme fibre of a circle lies on its curve, wherever the load points. */
static void test_circle(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_of(
        "{\"units\": \"mm N\", \"parts\": [{\"outline\": {\"circle\": [3,2,10]}}]}", 1e-4);
    const double I = stressed_constant(&s, UTW_IXX);
    for (int k = 0; k < 9; k++) {
        const double angle = 0.7 * k;
        const utw_forces f = {.Mx = I * sin(angle), .My = -I * cos(angle)};
        utw_stress_case c;
        utw_extremes e;
        assert_ok(utw_stress_case_of(&s.stress->unit, &f, &c, &err));
        assert_ok(utw_extremes_find(s.stress, &c, &e, &err));
        const utw_extreme *top = &e.kind[UTW_SIGMA_MAX];
        assert_close(top->value, 10, 1e-6);
        assert_true(top->value <= 10 * (1 + 1e-12));
        assert_close_scaled(top->place.xy[0] * s.solution->unit, 10 * cos(angle), 1e-3, 10);
        assert_close_scaled(top->place.xy[1] * s.solution->unit, 10 * sin(angle), 1e-3, 10);
        assert_true(isnan(e.kind[UTW_UTILISATION].value));
    }
    stressed_clear(&s);
}

/* Parts that yield at different stresses: the weaker one governs though the other carries more. */
static void test_two_yields(void **state)
{
    (void)state;
    stressed s = stressed_of(
        "{\"units\": \"mm N\", \"materials\": {\"soft\": {\"E\": 1, \"nu\": 0.3, \"yield\": 50}, "
        "\"hard\": {\"E\": 1, \"nu\": 0.3, \"yield\": 400}}, \"parts\": [{\"material\": \"soft\", "
        "\"outline\": [[0,0], [10,0], [10,20], [0,20]]}, {\"material\": \"hard\", \"outline\": "
        "[[0,20], [10,20], [10,30], [0,30]]}]}",
        1e-4);
    const double W = 10 * 30 * 30 / 6.0;
    const utw_stress_peaks p = stressed_peaks(&s, (utw_forces){.N = 300 * 10, .Mx = 90 * W});
    assert_close(p.peak[UTW_VON_MISES].value, 100, 1e-12); /* in the hard part: 4 times safe */
    assert_close(p.margin, 50 / 80.0 - 1, 1e-12);          /* -80 at the bottom */
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_rectangle),
        balanced_test(test_circle),
        balanced_test(test_two_yields),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
