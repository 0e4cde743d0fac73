/* SPDX-License-Identifier: GPL-3.0-or-later
 * The document of report/json.c, read back by the reader of section files. */
#include "base/memory.h"
#include "outline/json.h"
#include "report/report.h"
#include "support/support.h"

static const char *const drawing =
    "{\"name\": \"Tr\\u00e4ger \\\"A\\\"\", \"units\": \"mm N\", \"let\": {\"t\": 9.5, \"b\": "
    "\"2*t\"},"
    " \"materials\": {\"6082\": {\"E\": 70000, \"nu\": 0.33}},"
    " \"parts\": [{\"material\": \"6082\", \"outline\": [[0,0],[80,0],[80,\"t\"],"
    "{\"at\": [\"t\",\"t\"], \"round\": 6},[\"t\",55],[0,55]]}]}";

typedef struct solved {
    utw_outline *outline;
    utw_solution *solution;
    char *text;
    utw_json *json;
} solved;

static void solve(solved *s, const char *json, int order)
{
    utw_error err;
    utw_options options = UTW_OPTIONS_INIT;
    options.fixed_order = order;
    *s = (solved){.outline = utw_outline_of(json)};
    assert_ok(utw_solve(s->outline, &options, &s->solution, &err));
    utw_report report = UTW_REPORT_INIT;
    report.solution = s->solution;
    assert_ok(utw_report_json(&report, &s->text, &err));
    assert_ok(utw_json_parse(s->text, strlen(s->text), &s->json, &err));
}

static void clear(solved *s)
{
    utw_json_free(s->json);
    utw_report_free(s->text);
    utw_solution_free(s->solution);
    utw_outline_free(s->outline);
}

/* A member; the test fails when it is missing. */
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
    const utw_json *m = member(object, key);
    assert_int_equal(utw_json_kind_of(m), UTW_JSON_NUMBER);
    return utw_json_number(m);
}

static void keys_are(const utw_json *object, const char *expected)
{
    char keys[256] = "";
    size_t n = 0;
    for (const utw_json *m = utw_json_first(object); m != NULL; m = utw_json_next(m))
        n += (size_t)snprintf(keys + n, sizeof keys - n, "%s ", utw_json_key(m));
    assert_string_equal(keys, expected);
}

static void the_layout_is_the_documented_one(void **state)
{
    (void)state;
    solved s;
    solve(&s, drawing, 0);
    keys_are(s.json, "untwist name units caution dimensions constants solution ");
    assert_string_equal(utw_json_string(member(s.json, "untwist")), utw_version());
    assert_string_equal(utw_json_string(member(s.json, "name")), "Tr\xc3\xa4ger \"A\"");
    assert_string_equal(utw_json_string(member(s.json, "units")), "mm N");
    assert_true(number(member(s.json, "dimensions"), "b") == 19);
    const utw_json *solution = member(s.json, "solution");
    keys_are(solution, "order triangles unknowns gap tolerance reached seconds ");
    keys_are(member(solution, "seconds"), "read mesh solve total ");
    assert_true(number(member(solution, "seconds"), "total") > 0);
    assert_int_equal(utw_json_count(member(solution, "order")), 2);
    assert_true(number(solution, "tolerance") == 1e-6);
    assert_true(number(solution, "gap") <= 1e-6);
    assert_int_equal(utw_json_kind_of(member(solution, "reached")), UTW_JSON_BOOL);
    assert_true(utw_json_bool(member(solution, "reached")));
    const utw_json *constants = member(s.json, "constants");
    int k = 0;
    for (const utw_json *m = utw_json_first(constants); m != NULL; m = utw_json_next(m), k++) {
        assert_string_equal(utw_json_key(m), utw_constant_key((utw_constant)k));
        keys_are(m, "value low high trust ");
    }
    assert_int_equal(k, UTW_CONSTANT_COUNT);
    clear(&s);
}

static void numbers_are_the_very_doubles(void **state)
{
    (void)state;
    solved s;
    solve(&s, drawing, 0);
    const utw_json *constants = member(s.json, "constants");
    for (int k = 0; k < UTW_CONSTANT_COUNT; k++) {
        utw_quantity q;
        utw_error err;
        const utw_json *one = member(constants, utw_constant_key((utw_constant)k));
        assert_ok(utw_report_constant(s.solution, (utw_constant)k, &q, &err));
        assert_true(number(one, "value") == q.value);
        assert_true(number(one, "low") == q.low);
        assert_true(number(one, "high") == q.high);
        assert_string_equal(utw_json_string(member(one, "trust")), utw_report_trust(q.trust));
    }
    clear(&s);
}

static void what_does_not_exist_is_null_with_a_reason(void **state)
{
    (void)state;
    solved s;
    solve(&s,
          "{\"units\": \"mm N\", \"parts\": [{\"outline\": "
          "[[0,0],[80,0],[80,9.5],[9.5,9.5],[9.5,55],[0,55]]}]}",
          2);
    const utw_json *constants = member(s.json, "constants");
    static const char *const absent[] = {"Wt", "xf", "yf", "Asx", "Asy", "kx", "ky"};
    for (size_t i = 0; i < sizeof absent / sizeof *absent; i++) {
        const utw_json *one = member(constants, absent[i]);
        keys_are(one, "value reason ");
        assert_int_equal(utw_json_kind_of(member(one, "value")), UTW_JSON_NULL);
        assert_memory_equal(utw_json_string(member(one, "reason")), absent[i], strlen(absent[i]));
    }
    assert_true(number(member(constants, "J"), "low") > 0);
    assert_false(utw_json_bool(member(member(s.json, "solution"), "reached")));
    assert_string_equal(utw_json_string(member(s.json, "name")), "");
    clear(&s);
}

static void memory_may_run_out_anywhere(void **state)
{
    (void)state;
    solved s;
    utw_error err;
    solve(&s, drawing, 2);
    utw_report report = UTW_REPORT_INIT;
    report.solution = s.solution;
    int n = 0;
    for (utw_status st = UTW_E_NOMEM; st != UTW_OK;) {
        char *text = NULL;
        const long live = utw_memory_live();
        utw_memory_fail_at(++n);
        st = utw_report_json(&report, &text, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_true(st == UTW_E_NOMEM && text == NULL);
        utw_report_free(text);
        assert_int_equal(utw_memory_live(), live);
    }
    clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(the_layout_is_the_documented_one),
        balanced_test(numbers_are_the_very_doubles),
        balanced_test(what_does_not_exist_is_null_with_a_reason),
        balanced_test(memory_may_run_out_anywhere),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
