/* SPDX-License-Identifier: GPL-3.0-or-later
 * Pushes that are refused: the status and the message. */
#include "support/pushed.h"

static void refuse(const stressed *s, const utw_push_load *load, utw_status status,
                   const char *text)
{
    utw_error err;
    utw_push *push = NULL;
    assert_int_equal(utw_push_create(s->solution, s->stress, load, &push, &err), status);
    assert_int_equal(err.status, status);
    assert_string_equal(err.text, text);
    assert_null(push);
}

static void test_numbers(void **state)
{
    (void)state;
    stressed s = stressed_rectangle(2, 3, 0.3, 1e-2);
    const utw_push_load good = pushed_load(90, 0, -5, 1, 1);
    const struct {
        double length, fx, fy, x, y, twist, stress;
        const char *text;
    } list[] = {
        {0, 0, -5, 1, 1, 0, 0, "push: the length of the bar is 0; it must be positive"},
        {-90, 0, -5, 1, 1, 0, 0, "push: the length of the bar is -90; it must be positive"},
        {NAN, 0, -5, 1, 1, 0, 0, "push: length is not a finite number"},
        {HUGE_VAL, 0, -5, 1, 1, 0, 0, "push: length is not a finite number"},
        {90, 0, 0, 1, 1, 0, 0, "push: the force is zero: nothing pushes"},
        {90, 0, 1e-200, 1, 1, 0, 0, "push: Fy is 1e-200: no such number can be reckoned with"},
        {1e90, 0, -5, 1, 1, 0, 0, "push: length is 1e+90: no such number can be reckoned with"},
        {90, NAN, 1, 1, 1, 0, 0, "push: Fx is not a finite number"},
        {90, 0, HUGE_VAL, 1, 1, 0, 0, "push: Fy is not a finite number"},
        {90, 0, -5, NAN, 1, 0, 0, "push: place x is not a finite number"},
        {90, 0, -5, 1, -HUGE_VAL, 0, 0, "push: place y is not a finite number"},
        {90, 0, -5, 1, 1, -0.1, 0, "push: the twist limit is -0.1; it must be positive"},
        {90, 0, -5, 1, 1, 0, -3, "push: the stress limit is -3; it must be positive"},
        {90, 0, -5, 1, 1, NAN, 0, "push: twist limit is not a finite number"},
    };
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        utw_push_load l = pushed_load(list[i].length, list[i].fx, list[i].fy, list[i].x, list[i].y);
        l.twist_limit = list[i].twist;
        l.stress_limit = list[i].stress;
        refuse(&s, &l, UTW_E_LOAD, list[i].text);
    }
    utw_push_load l = good;
    l.version = 7;
    refuse(&s, &l, UTW_E_ARGUMENT, "push: version 7 is not known; start from UTW_PUSH_INIT");
    l = good;
    l.support = UTW_SUPPORT_COUNT;
    refuse(&s, &l, UTW_E_ARGUMENT, "push: no such support, hold of warping or place along the bar");
    stressed_clear(&s);
}

static void test_places(void **state)
{
    (void)state;
    stressed s = stressed_rectangle(2, 3, 0.3, 1e-2);
    static const struct {
        utw_support support;
        utw_along_bar where;
        double z;
        const char *text;
    } list[] = {
        {UTW_FIXED_FREE, UTW_AT_Z, 91, "the force acts at z = 91, off the bar (0 to 90)"},
        {UTW_FIXED_FREE, UTW_AT_Z, -1, "the force acts at z = -1, off the bar (0 to 90)"},
        {UTW_FIXED_FREE, UTW_AT_Z, NAN, "push: z is not a finite number"},
        {UTW_FIXED_FREE, UTW_AT_Z, 0,
         "the force acts at z = 0, on a support: it would neither bend nor twist the bar"},
        {UTW_FORKED, UTW_AT_TIP, 0,
         "the force acts at z = 90, on a support: it would neither bend nor twist the bar"},
        {UTW_FIXED_FORKED, UTW_AT_Z, 90,
         "the force acts at z = 90, on a support: it would neither bend nor twist the bar"},
    };
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        utw_push_load l = pushed_load(90, 0, -5, 1, 1);
        l.support = list[i].support;
        l.where = list[i].where;
        l.z = list[i].z;
        refuse(&s, &l, UTW_E_LOAD, list[i].text);
    }
    stressed_clear(&s);
}

static void test_materials(void **state)
{
    (void)state;
    const utw_push_load load = pushed_load(90, 0, -5, 1, 1);
    stressed s = stressed_of(
        "{\"units\": \"mm N\", \"parts\": [{\"outline\": [[0,0], [5,0], [0,3]]}]}", 1e-2);
    refuse(&s, &load, UTW_E_MATERIAL,
           "a push needs the stiffness of the bar: give the section a material with \"E\" and "
           "\"nu\"");
    stressed_clear(&s);
    static const char *const two =
        "{\"units\": \"mm N\", \"materials\": {\"a\": {\"E\": 1, \"nu\": 0.3}, \"b\": {\"E\": %s, "
        "\"nu\": %s}}, \"parts\": [{\"material\": \"a\", \"outline\": [[0,0], [10,0], [10,20], "
        "[0,20]]}, {\"material\": \"b\", \"outline\": [[0,20], [10,20], [10,30], [0,30]]}]}";
    for (int i = 0; i < 2; i++) {
        char json[500];
        utw_error err;
        snprintf(json, sizeof json, two, i == 0 ? "2" : "1", i == 0 ? "0.3" : "0.2");
        stressed t = {utw_outline_of(json), NULL, NULL};
        assert_ok(utw_solve(t.outline, NULL, &t.solution, &err));
        refuse(&t, &load, UTW_E_MATERIAL,
               "a push needs the stiffness of the bar: give every part the same material with "
               "\"E\" and \"nu\"");
        stressed_clear(&t);
    }
}

static void test_arguments(void **state)
{
    (void)state;
    utw_error err;
    utw_push *push = NULL;
    stressed s = stressed_rectangle(2, 3, 0.3, 1e-2), t = stressed_rectangle(2, 3, 0.3, 1e-2);
    const utw_push_load load = pushed_load(90, 0, -5, 1, 1);
    assert_int_equal(utw_push_create(NULL, NULL, &load, &push, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_push_create(s.solution, NULL, NULL, &push, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_push_create(s.solution, t.stress, &load, &push, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "utw_push_create: the stresses are those of another solution");
    utw_push_free(NULL);
    stressed_clear(&s);
    stressed_clear(&t);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_numbers),
        balanced_test(test_places),
        balanced_test(test_materials),
        balanced_test(test_arguments),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
