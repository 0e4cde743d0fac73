/* SPDX-License-Identifier: GPL-3.0-or-later
 * Load cases and probes in the JSON report, read back. */
#include "outline/json.h"
#include "support/reported.h"

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
    char keys[256] = "";
    size_t n = 0;
    for (const utw_json *m = utw_json_first(object); m != NULL; m = utw_json_next(m))
        n += (size_t)snprintf(keys + n, sizeof keys - n, "%s ", utw_json_key(m));
    assert_string_equal(keys, expected);
}

static utw_json *json_of(const reported *r)
{
    utw_error err;
    char *text = NULL;
    utw_json *json = NULL;
    assert_ok(utw_report_json(&r->report, &text, &err));
    assert_ok(utw_json_parse(text, strlen(text), &json, &err));
    utw_report_free(text);
    return json;
}

#define KINDS "von_mises principal_max principal_min sigma_z_max sigma_z_min tau_max margin "

static void the_layout_is_the_documented_one(void **state)
{
    (void)state;
    utw_error err;
    reported r = reported_angle(0);
    utw_json *json = json_of(&r);
    keys_are(json, "untwist name units caution constants solution cases envelope probes ");
    const utw_json *pull = utw_json_first(member(json, "cases")), *lift = utw_json_next(pull);
    keys_are(pull, "name forces " KINDS "unbounded_at ");
    keys_are(lift, "name forces " KINDS "unbounded_at outside_radius ");
    keys_are(member(lift, "forces"), "Vy Mx ");
    assert_true(number(member(lift, "forces"), "Mx") == 30150);
    const utw_json *tau = member(lift, "tau_max");
    keys_are(tau, "value error at trust ");
    utw_stress_peaks p;
    assert_ok(utw_cases_get(r.cases, 1, NULL, NULL, &p, &err));
    assert_true(number(tau, "value") == p.peak[UTW_TAU_MAX].value);
    assert_true(number(tau, "error") == p.peak[UTW_TAU_MAX].error);
    assert_string_equal(utw_json_string(member(tau, "trust")), "estimate");
    assert_string_equal(utw_json_string(member(member(pull, "sigma_z_max"), "trust")), "exact");
    const utw_json *corner = utw_json_first(member(lift, "unbounded_at"));
    assert_close(utw_json_number(utw_json_first(corner)), 9, 1e-12);
    assert_close(utw_json_number(utw_json_next(utw_json_first(corner))), 7, 1e-12);
    /* a tenth of the thinner wall */
    assert_close(utw_json_number(utw_json_first(member(lift, "outside_radius"))), 0.7, 1e-6);
    assert_int_equal(utw_json_count(member(pull, "unbounded_at")), 0);
    keys_are(member(json, "envelope"), KINDS);
    assert_string_equal(
        utw_json_string(member(member(member(json, "envelope"), "tau_max"), "case")), "lift");
    const utw_json *probes = member(json, "probes"), *third = utw_json_first(probes);
    assert_int_equal(utw_json_count(probes), 4);
    assert_false(utw_json_bool(member(third, "near_sharp_corner")));
    third = utw_json_next(utw_json_next(utw_json_next(third)));
    keys_are(third, "at case omega sigma_z tau_xz tau_yz von_mises principal_max principal_min "
                    "sigma_error tau_error near_sharp_corner ");
    assert_true(utw_json_bool(member(third, "near_sharp_corner")));
    utw_json_free(json);
    reported_clear(&r);
}

static void a_case_without_result_has_its_reason(void **state)
{
    (void)state;
    reported r = reported_angle(1);
    utw_json *json = json_of(&r);
    const utw_json *pull = utw_json_first(member(json, "cases"));
    assert_int_equal(utw_json_kind_of(member(pull, "margin")), UTW_JSON_NULL);
    keys_are(utw_json_next(pull), "name forces reason ");
    assert_int_equal(utw_json_count(member(json, "probes")), 2);
    utw_json_free(json);
    reported_clear(&r);
}

static void memory_may_run_out_anywhere(void **state)
{
    (void)state;
    reported_without_memory(utw_report_json);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(the_layout_is_the_documented_one),
        balanced_test(a_case_without_result_has_its_reason),
        balanced_test(memory_may_run_out_anywhere),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
