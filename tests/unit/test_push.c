/* SPDX-License-Identifier: GPL-3.0-or-later
 * What tests/physics/test_push_*.c do not see: places, states, windows together, failures. */
#include "bar/push.h"

#include "base/memory.h"
#include "support/pushed.h"

/* Offsets are measured to the right, for a horizontal force upward, and the section's extent is
 * that of its curves: a half disc of radius 20 on a base from (-20, 0) to (20, 0). */
static void places_across_the_force(void **state)
{
    (void)state;
    static const struct {
        double force[2], across[2], section[2]; /* the last from the origin */
    } list[] = {
        {{0, 5}, {1, 0}, {-20, 20}},      {{0, -5}, {1, 0}, {-20, 20}},
        {{7, 0}, {0, 1}, {0, 20}},        {{-7, 0}, {0, 1}, {0, 20}},
        {{3, 4}, {0.8, -0.6}, {-20, 16}}, {{-3, -4}, {0.8, -0.6}, {-20, 16}},
        {{-3, 4}, {0.8, 0.6}, {-16, 20}},
    };
    stressed s = stressed_of(
        "{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 70000, \"nu\": 0.27}}, \"parts\": "
        "[{\"material\": \"m\", \"outline\": [[-20,0], {\"at\": [20,0]}, {\"at\": [-20,0.0001], "
        "\"arc\": [0,20]}]}]}",
        1e-4);
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        utw_push_load load = pushed_load(400, list[i].force[0], list[i].force[1], 11, -6);
        utw_push *push = pushed_by(&s, &load);
        const utw_push_result *r = utw_push_get(push);
        const double *a = list[i].across, *c = r->shear_centre;
        const double origin = c[0] * a[0] + c[1] * a[1];
        for (int k = 0; k < 2; k++) {
            assert_close_scaled(r->across[k], a[k], 1e-15, 1);
            assert_close_scaled(r->section[k] + origin, list[i].section[k], 2e-5, 20);
        }
        assert_close_scaled(r->offset, 11 * a[0] - 6 * a[1] - origin, 1e-12, 20);
        assert_true(!signbit(r->across[0]) && (a[1] < 0 || !signbit(r->across[1])));
        assert_true(isnan(r->margin) && r->has_stress && !r->stress_window.limited);
        utw_push_free(push);
    }
    stressed_clear(&s);
}

/* Equilibrium along the bar, and the state at its ends. */
static void states_along_the_bar(void **state)
{
    (void)state;
    stressed s = stressed_of(pushed_channel, 1e-5);
    utw_push_load load = pushed_load(500, -40, -90, 25, 60);
    load.support = UTW_FIXED_FORKED;
    load.where = UTW_AT_Z;
    load.z = 180;
    utw_push *push = pushed_by(&s, &load);
    const utw_push_result *r = utw_push_get(push);
    utw_push_state a, b, z;
    utw_push_at(push, 180, &a);
    utw_push_at(push, nextafter(180, 500), &b);
    assert_close(a.forces.Vx - b.forces.Vx, -40, 1e-9);
    assert_close(a.forces.Vy - b.forces.Vy, -90, 1e-9);
    const double torque = -90 * (25 - r->shear_centre[0]) + 40 * (60 - r->shear_centre[1]);
    assert_close(a.torque - b.torque, torque, 1e-9);
    assert_close(a.torque, a.forces.T + a.warping_torque, 1e-9);
    utw_push_at(push, -3, &z);
    assert_true(z.z == 0 && z.forces.Mx == r->start.forces.Mx && z.forces.B == r->start.forces.B);
    utw_push_at(push, 1e9, &z);
    assert_true(z.z == 500 && z.forces.B == r->end.forces.B);
    assert_close_scaled(z.forces.Mx, 0, 1e-9, 90 * 500);
    assert_close_scaled(z.twist, 0, 1e-12, fabs(r->twist.value));
    utw_push_at(push, r->z_twist, &z);
    assert_close(z.twist, r->twist.value, 1e-12);
    utw_push_at(push, r->z_deflection, &z);
    assert_close(hypot(z.u[0], z.u[1]), hypot(r->deflection[0].value, r->deflection[1].value),
                 1e-12);
    assert_true(utw_push_get_load(push)->z == 180);
    utw_push_free(push);
    stressed_clear(&s);
}

static void what_both_windows_leave(void **state)
{
    (void)state;
    stressed s = stressed_of(pushed_channel, 1e-5);
    for (int tight = 0; tight < 2; tight++) {
        utw_push_load load = pushed_load(640, 0, -2400, 25, 0);
        load.twist_limit = tight ? 0.002 : 0.1;
        utw_push *push = pushed_by(&s, &load);
        const utw_push_result *r = utw_push_get(push);
        const utw_load_window *t = &r->twist_window, *w = &r->stress_window, *both = &r->window;
        assert_true(both->limited && !both->empty && both->limit == 0);
        assert_true(both->from == fmax(t->from, w->from) && both->to == fmin(t->to, w->to));
        assert_int_equal(both->holds, t->holds && w->holds);
        assert_close(both->at_to[0], r->shear_centre[0] + both->to, 1e-12);
        if (tight) assert_true(both->to == t->to && both->error == t->error && !both->holds);
        utw_push_free(push);
    }
    /* without stresses only the twist counts */
    utw_error err;
    utw_push_load load = pushed_load(640, 0, -2400, 25, 0);
    utw_push *push = NULL;
    load.twist_limit = 0.02;
    assert_ok(utw_push_create(s.solution, NULL, &load, &push, &err));
    const utw_push_result *r = utw_push_get(push);
    assert_true(!r->has_stress && !r->stress_window.limited && r->window.limited);
    assert_true(r->window.from == r->twist_window.from);
    utw_stress_peak peak;
    assert_int_equal(utw_push_stress_of(push, load.at, &peak, NULL, &err), UTW_E_ARGUMENT);
    utw_push_free(push);
    stressed_clear(&s);
}

/* Solid sections twist uniformly, unless asked otherwise; a round one always. */
static void held_warping_that_fades_at_once(void **state)
{
    (void)state;
    stressed s = stressed_rectangle(20, 30, 0.3, 1e-6);
    utw_push_load load = pushed_load(400, 0, -10, 9, 0);
    utw_push *push = pushed_by(&s, &load);
    const utw_push_result *r = utw_push_get(push);
    assert_true(r->uniform_torsion && !r->warping_held[0] && r->fade > 0 &&
                r->fade < 0.2 * r->size);
    const double twist = r->twist.value;
    utw_push_free(push);
    load.warping = UTW_WARPING_HELD;
    push = pushed_by(&s, &load);
    r = utw_push_get(push);
    assert_true(!r->uniform_torsion && r->warping_held[0]);
    assert_close(r->twist.value, twist * (1 - r->fade / 400), 1e-6);
    utw_push_free(push);
    stressed_clear(&s);
    s = stressed_of("{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 70000, \"nu\": 0.27}}, "
                    "\"parts\": [{\"material\": \"m\", \"outline\": {\"circle\": [3,4,12]}}]}",
                    1e-6);
    push = pushed_by(&s, &load);
    r = utw_push_get(push);
    assert_true(r->uniform_torsion && r->start.forces.B == 0);
    utw_push_free(push);
    stressed_clear(&s);
}

static void memory_may_run_out_anywhere(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_rectangle(20, 30, 0.3, 1e-2);
    utw_push_load load = pushed_load(400, 0, -10, 9, 0);
    long n = 0;
    for (utw_status st = UTW_E_NOMEM; st != UTW_OK;) {
        utw_push *push = NULL;
        const long live = utw_memory_live();
        n += n < 4 ? 1 : n / 2; /* hundreds of searches, all alike */
        utw_memory_fail_at(n);
        st = utw_push_create(s.solution, s.stress, &load, &push, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_true(st == UTW_E_NOMEM && push == NULL);
        utw_push_free(push);
        assert_int_equal(utw_memory_live(), live);
    }
    assert_true(n > 10);
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(places_across_the_force),     balanced_test(states_along_the_bar),
        balanced_test(what_both_windows_leave),     balanced_test(held_warping_that_fades_at_once),
        balanced_test(memory_may_run_out_anywhere),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
