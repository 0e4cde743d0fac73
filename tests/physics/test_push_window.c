/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where the load may act: twist is linear in the place of the load and zero at the shear centre; a
 * load ahead of it raises the leading edge (common practice); the windows hold what they promise.
 */
#include "support/pushed.h"

#define PI 3.14159265358979323846

/* Twist alone: without the stresses a push takes no time. */
static stressed without_stress(const char *json, double tolerance)
{
    stressed s = stressed_of(json, tolerance);
    utw_stress_free(s.stress);
    s.stress = NULL;
    return s;
}

/* Separate solutions of the bar with the load at many places: a straight line through the shear
 * centre; moving the load along its own line changes nothing. */
static void twist_is_a_straight_line_through_the_shear_centre(void **state)
{
    (void)state;
    static const double force[3][2] = {{0, -150}, {90, 0}, {-41, 77}};
    stressed s = without_stress(stressed_sample(1), 1e-6);
    const double c[2] = {stressed_constant(&s, UTW_XS), stressed_constant(&s, UTW_YS)};
    for (int f = 0; f < 3; f++) {
        const double size = hypot(force[f][0], force[f][1]);
        double slope = 0;
        for (int i = -3; i <= 3; i++) {
            const double e = 17.3 * i; /* offset to the right of the force's direction */
            const double along = 5.9 * i * i;
            utw_push_load load =
                pushed_load(700, force[f][0], force[f][1],
                            c[0] + (e * force[f][1] + along * force[f][0]) / size,
                            c[1] + (-e * force[f][0] + along * force[f][1]) / size);
            utw_push *push = pushed_by(&s, &load);
            const utw_push_result *r = utw_push_get(push);
            if (i == -3) slope = r->twist.value / e;
            assert_true(slope > 0); /* the force turns the bar counter-clockwise from its right */
            assert_close_scaled(r->twist.value, slope * e, 1e-10, slope * 52);
            assert_close_scaled(utw_push_twist_of(push, load.at), r->twist.value, 1e-10,
                                slope * 52);
            assert_close_scaled(utw_push_twist_of(push, c), 0, 1e-10, slope * 52);
            assert_close(fabs(r->twist_per_offset.value), slope, 1e-10);
            utw_push_free(push);
        }
        utw_push_load load = pushed_load(700, force[f][0], force[f][1], c[0], c[1]);
        utw_push *push = pushed_by(&s, &load);
        assert_close_scaled(utw_push_get(push)->twist.value, 0, 1e-10, slope * 52);
        load.has_at = 0;
        utw_push_free(push);
        push = pushed_by(&s, &load);
        assert_true(utw_push_get(push)->twist.value == 0);
        utw_push_free(push);
    }
    stressed_clear(&s);
}

/* Lift (upward) ahead of the shear centre raises the leading edge, behind it lowers it. */
static void lift_ahead_raises_the_leading_edge(void **state)
{
    (void)state;
    stressed s = without_stress(pushed_blade, 1e-5);
    const double xs = stressed_constant(&s, UTW_XS), ys = stressed_constant(&s, UTW_YS);
    assert_true(xs > 10 && xs < 110);
    for (int ahead = 0; ahead < 2; ahead++) {
        utw_push_load load = pushed_load(1500, 0, 260, ahead ? xs - 30 : xs + 30, ys);
        utw_push *push = pushed_by(&s, &load);
        const utw_push_result *r = utw_push_get(push);
        const double turn = r->twist.value;
        /* a point at p moves by turn x (p - s): the leading edge at (0, 0) relative to the centre
         */
        const double leading = turn * (0 - xs), trailing = turn * (120 - xs);
        assert_true(ahead ? leading > 0 && trailing < 0 : leading < 0 && trailing > 0);
        assert_true(r->deflection[1].value > 0);
        utw_push_free(push);
    }
    stressed_clear(&s);
}

static utw_load_window twist_window(const stressed *s, utw_push_load load, double limit)
{
    load.twist_limit = limit;
    utw_push *push = pushed_by(s, &load);
    const utw_load_window w = utw_push_get(push)->twist_window;
    const utw_push_result *r = utw_push_get(push);
    assert_true(w.limited && !w.empty && w.limit == limit);
    /* the emergency: the window must hold the shear centre, whatever the section and the load */
    assert_true(w.from < 0 && 0 < w.to);
    assert_close(utw_push_twist_of(push, w.at_from), -utw_push_twist_of(push, w.at_to), 1e-9);
    assert_close(fabs(utw_push_twist_of(push, w.at_to)), limit, 1e-9);
    assert_int_equal(w.holds, fabs(r->twist.value) <= limit);
    utw_push_free(push);
    return w;
}

static void the_twist_window_holds_the_shear_centre(void **state)
{
    (void)state;
    static const double force[4][2] = {{0, -1}, {0, 350}, {-20, 0}, {3, -8}};
    for (int i = 0; stressed_sample(i) != NULL; i++) {
        stressed s = without_stress(stressed_sample(i), 1e-4);
        for (int k = 0; k < 4; k++)
            for (int support = 0; support < UTW_SUPPORT_COUNT; support++) {
                utw_push_load load = pushed_load(800, force[k][0], force[k][1], 31, 4);
                load.support = (utw_support)support;
                const utw_load_window one = twist_window(&s, load, 1e-4 * PI),
                                      two = twist_window(&s, load, 2e-4 * PI);
                assert_close(two.to, 2 * one.to, 1e-12);
            }
        stressed_clear(&s);
    }
}

/* Greatest stress with the load at an offset. */
static double stress_at(const utw_push *push, double offset)
{
    utw_error err;
    utw_stress_peak peak;
    const utw_push_result *r = utw_push_get(push);
    const double at[2] = {r->shear_centre[0] + offset * r->across[0],
                          r->shear_centre[1] + offset * r->across[1]};
    assert_ok(utw_push_stress_of(push, at, &peak, NULL, &err));
    return peak.value;
}

/* At its ends the stress is the limit, inside less, outside more. */
static void the_stress_window_ends_where_the_stress_is_the_limit(void **state)
{
    (void)state;
    stressed s = stressed_of(pushed_channel, 1e-5);
    utw_push_load load = pushed_load(640, 0, -2400, 25, 0);
    for (int i = 0; i < 3; i++) {
        load.where = i == 2 ? UTW_UNIFORM : UTW_WHERE_USUAL;
        load.support = i == 1 ? UTW_FIXED_FIXED : UTW_FIXED_FREE;
        load.stress_limit = i == 0 ? 0 : 190; /* 0: the yield stress */
        utw_push *push = pushed_by(&s, &load);
        const utw_push_result *r = utw_push_get(push);
        const utw_load_window w = r->stress_window;
        assert_true(w.limited && !w.empty && w.from < w.to);
        assert_close(w.limit, i == 0 ? 250 : 190, 1e-15);
        assert_close(stress_at(push, w.from), w.limit, 2e-6);
        assert_close(stress_at(push, w.to), w.limit, 2e-6);
        for (int k = 1; k < 8; k++)
            assert_true(stress_at(push, w.from + k * (w.to - w.from) / 8) < w.limit);
        assert_true(stress_at(push, w.from - 0.01 * (w.to - w.from)) > w.limit);
        assert_true(stress_at(push, w.to + 0.01 * (w.to - w.from)) > w.limit);
        assert_int_equal(w.holds, r->von_mises.value <= w.limit);
        assert_close(stress_at(push, r->offset), r->von_mises.value, 1e-12);
        assert_true(w.error > 0 && w.error < 0.02 * (w.to - w.from));
        utw_push_free(push);
    }
    stressed_clear(&s);
}

/* Warping stresses may relieve bending stresses: below the stress of the load at the shear centre
 * there is a window beside it; below the least of all there is none. */
static void a_window_beside_the_shear_centre_and_none(void **state)
{
    (void)state;
    stressed s = stressed_of(stressed_sample(1), 1e-5);
    utw_push_load load = pushed_load(600, 0, -300, 30, 10);
    utw_push *push = pushed_by(&s, &load);
    double least = HUGE_VAL, best = 0;
    const double central = stress_at(push, 0);
    for (double e = -60; e <= 60; e += 1.5) {
        const double v = stress_at(push, e);
        if (v < least) least = v, best = e;
    }
    utw_push_free(push);
    assert_true(least < 0.99 * central);
    load.stress_limit = 0.5 * (least + central);
    push = pushed_by(&s, &load);
    utw_load_window w = utw_push_get(push)->stress_window;
    assert_true(!w.empty && w.from < best && best < w.to);
    assert_true(w.from > 0 || w.to < 0);
    assert_close(stress_at(push, w.from), w.limit, 2e-6);
    assert_close(stress_at(push, w.to), w.limit, 2e-6);
    utw_push_free(push);
    load.stress_limit = 0.98 * least;
    load.twist_limit = 0.1;
    push = pushed_by(&s, &load);
    w = utw_push_get(push)->stress_window;
    assert_true(w.limited && w.empty && isnan(w.from) && isnan(w.to) && !w.holds);
    w = utw_push_get(push)->window;
    assert_true(w.limited && w.empty && !w.holds);
    utw_push_free(push);
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(twist_is_a_straight_line_through_the_shear_centre),
        balanced_test(lift_ahead_raises_the_leading_edge),
        balanced_test(the_twist_window_holds_the_shear_centre),
        balanced_test(the_stress_window_ends_where_the_stress_is_the_limit),
        balanced_test(a_window_beside_the_shear_centre_and_none),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
