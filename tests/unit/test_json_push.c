/* SPDX-License-Identifier: GPL-3.0-or-later
 * The push in the JSON report, read back. */
#include "base/memory.h"
#include "outline/json.h"
#include "support/pushed.h"

static const utw_json *member(const utw_json *object, const char *key)
{
    assert_int_equal(utw_json_kind_of(object), UTW_JSON_OBJECT);
    for (const utw_json *m = utw_json_first(object); m != NULL; m = utw_json_next(m))
        if (strcmp(utw_json_key(m), key) == 0) return m;
    print_error("there is no \"%s\"\n", key);
    fail();
    return NULL;
}

static double number(const utw_json *object, const char *key)
{
    return utw_json_number(member(object, key));
}

static void keys_are(const utw_json *object, const char *expected)
{
    char keys[300] = "";
    size_t n = 0;
    for (const utw_json *m = utw_json_first(object); m != NULL; m = utw_json_next(m))
        n += (size_t)snprintf(keys + n, sizeof keys - n, "%s ", utw_json_key(m));
    assert_string_equal(keys, expected);
}

static void the_layout_is_the_documented_one(void **state)
{
    (void)state;
    utw_error err;
    char *text = NULL;
    utw_json *json = NULL;
    stressed s = stressed_of(pushed_channel, 1e-4);
    utw_push_load load = pushed_load(640, 0, -2400, 25, 7);
    load.twist_limit = 0.02;
    utw_push *push = pushed_by(&s, &load);
    const utw_push_result *r = utw_push_get(push);
    utw_report report = UTW_REPORT_INIT;
    report.solution = s.solution;
    report.push = push;
    assert_ok(utw_report_json(&report, &text, &err));
    assert_ok(utw_json_parse(text, strlen(text), &json, &err));
    keys_are(json, "untwist name units caution constants solution push ");
    const utw_json *p = member(json, "push");
    keys_are(p, "load warping_held uniform_torsion fade deflection z_deflection load_moves twist "
                "z_twist no_twist no_twist_error across offset section twist_per_offset ends worst "
                "window ");
    keys_are(member(p, "load"), "length support warping force at z ");
    assert_string_equal(utw_json_string(member(member(p, "load"), "support")), "fixed-free");
    assert_true(utw_json_bool(utw_json_first(member(p, "warping_held"))));
    keys_are(member(p, "twist"), "value low high trust ");
    assert_close(number(member(p, "twist"), "value"), r->twist.value * 57.29577951308232, 1e-14);
    assert_close(number(member(p, "twist_per_offset"), "value"),
                 r->twist_per_offset.value * 57.29577951308232, 1e-14);
    assert_true(utw_json_number(utw_json_first(member(p, "no_twist"))) == r->shear_centre[0]);
    const utw_json *ends = member(p, "ends"), *root = utw_json_first(ends);
    assert_int_equal(utw_json_count(ends), 2);
    keys_are(root, "z Vx Vy Mx My torque T warping_torque bimoment twist deflection ");
    assert_true(number(root, "bimoment") == r->start.forces.B);
    assert_true(number(member(p, "worst"), "von_mises") == r->von_mises.value);
    keys_are(member(p, "worst"), "von_mises error trust at z margin unbounded ");
    const utw_json *window = member(p, "window");
    keys_are(window, "twist stress both ");
    keys_are(member(window, "twist"), "limit empty from to error at_from at_to holds ");
    keys_are(member(window, "both"), "empty from to error at_from at_to holds ");
    assert_close(number(member(window, "twist"), "limit"), 0.02 * 57.29577951308232, 1e-14);
    assert_true(number(member(window, "stress"), "to") == r->stress_window.to);
    utw_json_free(json);
    utw_report_free(text);
    utw_push_free(push);
    stressed_clear(&s);
}

/* A spread load has no z; without a limit there is no window; an empty one has no ends. */
static void what_does_not_exist_is_null(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_of(pushed_channel, 1e-3);
    for (int empty = 0; empty < 2; empty++) {
        char *text = NULL;
        utw_json *json = NULL;
        utw_push *push = NULL;
        utw_push_load load = pushed_load(640, 0, -2400, 25, 7);
        load.where = UTW_UNIFORM;
        load.stress_limit = 1e-3;
        assert_ok(utw_push_create(s.solution, empty ? s.stress : NULL, &load, &push, &err));
        utw_report report = UTW_REPORT_INIT;
        report.solution = s.solution;
        report.push = push;
        assert_ok(utw_report_json(&report, &text, &err));
        assert_ok(utw_json_parse(text, strlen(text), &json, &err));
        const utw_json *p = member(json, "push"), *window = member(p, "window");
        assert_int_equal(utw_json_kind_of(member(member(p, "load"), "z")), UTW_JSON_NULL);
        keys_are(window, empty ? "stress both " : "");
        if (empty) {
            const utw_json *w = member(window, "stress");
            assert_true(utw_json_bool(member(w, "empty")));
            assert_int_equal(utw_json_kind_of(member(w, "from")), UTW_JSON_NULL);
        }
        utw_json_free(json);
        utw_report_free(text);
        utw_push_free(push);
    }
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(the_layout_is_the_documented_one),
        balanced_test(what_does_not_exist_is_null),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
