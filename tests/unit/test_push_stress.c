/* SPDX-License-Identifier: GPL-3.0-or-later
 * The search for the stress window; that it holds what it promises is tested in
 * tests/physics/test_push_window.c. */
#include "bar/push_stress.h"

#include "support/pushed.h"

/* By a scan of the bar and of the offsets, much finer than the search. */
static void the_window_is_that_of_a_fine_scan(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_of(stressed_sample(1), 1e-4);
    utw_push_load load = pushed_load(600, 0, -300, 30, 10);
    load.support = UTW_FORKED;
    load.where = UTW_AT_Z;
    load.z = 210;
    utw_push *push = pushed_by(&s, &load);
    utw_worst worst;
    assert_ok(utw_push_worst(push, 25, &worst, &err));
    double greatest = 0;
    for (int i = 0; i <= 300; i++) {
        utw_push_state state_at;
        utw_pushed_at(&push->bar, 2 * i, 25, &state_at);
        greatest = fmax(greatest, stressed_peaks(&s, state_at.forces).peak[UTW_VON_MISES].value);
    }
    assert_true(worst.peak.value >= greatest * (1 - 1e-9));
    assert_close(worst.peak.value, greatest, 1e-3);

    utw_load_window w;
    const double limit = 1.3 * worst.peak.value;
    assert_ok(utw_push_stress_window(push, limit, &w, &err));
    for (int side = 0; side < 2; side++) {
        double in = 25, out = side ? 1e4 : -1e4; /* bisection on its own */
        for (int i = 0; i < 50; i++) {
            const double mid = 0.5 * (in + out);
            assert_ok(utw_push_worst(push, mid, &worst, &err));
            if (worst.peak.value <= limit)
                in = mid;
            else
                out = mid;
        }
        assert_close_scaled(side ? w.to : w.from, in, 1e-5, w.to - w.from);
    }
    utw_push_free(push);
    stressed_clear(&s);
}

/* Limits from far too small to enormous: found or empty, never lost. */
static void any_limit_has_an_answer(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_rectangle(20, 30, 0.3, 1e-7);
    utw_push_load load = pushed_load(400, 0, -10, 9, 0);
    utw_push *push = pushed_by(&s, &load);
    double before = 0;
    for (double limit = 1e-6; limit < 1e13; limit *= 10) {
        utw_load_window w;
        assert_ok(utw_push_stress_window(push, limit, &w, &err));
        if (w.empty) {
            assert_true(before == 0);
            continue;
        }
        assert_true(w.to - w.from > before);
        assert_close_scaled(w.from, -w.to, 1e-3, w.to); /* the section is symmetric */
        before = w.to - w.from;
    }
    assert_true(before > 1e12);
    utw_push_free(push);
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(the_window_is_that_of_a_fine_scan),
        balanced_test(any_limit_has_an_answer),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
