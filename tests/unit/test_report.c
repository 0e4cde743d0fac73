/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "report/report.h"

#include "support/support.h"

static utw_outline *outline;
static utw_solution *solution;

static int solve(void **state)
{
    (void)state;
    utw_error err;
    utw_options options = UTW_OPTIONS_INIT;
    options.fixed_order = 2;
    outline = utw_outline_of(
        "{\"units\": \"in lbf\", \"parts\": [{\"outline\": [[0,0],[3,0],[0.7,2]]}]}");
    return utw_solve(outline, &options, &solution, &err) == UTW_OK ? 0 : -1;
}

static int clear(void **state)
{
    (void)state;
    utw_solution_free(solution);
    utw_outline_free(outline);
    return 0;
}

static void units_follow_the_power_of_the_length(void **state)
{
    (void)state;
    static const struct {
        utw_constant which;
        const char *unit;
    } list[] = {{UTW_A, "in^2"},  {UTW_XC, "in"},   {UTW_IXX, "in^4"}, {UTW_ANGLE, "deg"},
                {UTW_ZX, "in^3"}, {UTW_IW, "in^6"}, {UTW_KX, "-"},     {UTW_BETAX, "in"}};
    char unit[16];
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        utw_report_unit(solution, list[i].which, unit, sizeof unit);
        assert_string_equal(unit, list[i].unit);
    }
}

static void angles_are_in_degrees_and_the_rest_is_as_it_is(void **state)
{
    (void)state;
    utw_error err;
    for (int k = 0; k < UTW_CONSTANT_COUNT; k++) {
        utw_quantity raw = {0}, told = {0};
        const utw_status st = utw_solution_constant(solution, (utw_constant)k, &raw, &err);
        assert_int_equal(utw_report_constant(solution, (utw_constant)k, &told, &err), st);
        if (st != UTW_OK) continue;
        const double factor = k == UTW_ANGLE ? 57.29577951308232 : 1;
        assert_close(told.value, factor * raw.value, 1e-15);
        assert_close(told.low, factor * raw.low, 1e-15);
        assert_close(told.high, factor * raw.high, 1e-15);
        assert_int_equal(told.trust, raw.trust);
    }
}

static void every_trust_has_its_word(void **state)
{
    (void)state;
    assert_string_equal(utw_report_trust(UTW_EXACT), "exact");
    assert_string_equal(utw_report_trust(UTW_BRACKET), "bracket");
    assert_string_equal(utw_report_trust(UTW_ESTIMATE), "estimate");
}

static void parts_of_different_materials_are_cautioned(void **state)
{
    (void)state;
    static const char *const drawing =
        "{\"units\": \"mm N\", \"materials\": {\"s\": {\"E\": 210000, \"nu\": 0.3}, \"b\": "
        "{\"E\": 105000, \"nu\": 0.3}}, \"parts\": [{\"material\": \"s\", \"outline\": "
        "[[0,0],[50,0],[50,30],[0,30]]}, {\"material\": \"%s\", \"outline\": "
        "[[0,30],[50,30],[50,36],[0,36]]}%s]}";
    static const char *const again =
        ", {\"material\": \"b\", \"outline\": [[0,36],[50,36],[50,40],[0,40]]}";
    utw_error err;
    utw_options options = UTW_OPTIONS_INIT;
    options.fixed_order = 2;
    for (int different = 0; different < 2; different++) {
        char text[600];
        utw_solution *s = NULL;
        snprintf(text, sizeof text, drawing, different ? "b" : "s", different ? again : "");
        utw_outline *o = utw_outline_of(text);
        assert_ok(utw_solve(o, &options, &s, &err));
        const char *caution = utw_report_caution(s);
        assert_true((strstr(caution, "taken as bonded where they touch") != NULL) == different);
        assert_non_null(strstr(caution, "licensed engineer"));
        utw_solution_free(s);
        utw_outline_free(o);
    }
}

static void wrong_calls_are_refused(void **state)
{
    (void)state;
    utw_error err;
    utw_report report = UTW_REPORT_INIT;
    char *text = NULL;
    assert_int_equal(utw_report_check(&report, &text, "f", &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "f: report, its solution and text must not be NULL");
    report.solution = solution;
    assert_int_equal(utw_report_check(&report, &text, "f", &err), UTW_OK);
    assert_int_equal(utw_report_check(NULL, &text, "f", &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_report_check(&report, NULL, "f", NULL), UTW_E_ARGUMENT);
    report.version = 2;
    assert_int_equal(utw_report_check(&report, &text, "f", &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "f: version 2 is not known; start from UTW_REPORT_INIT");
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(units_follow_the_power_of_the_length),
        cmocka_unit_test(angles_are_in_degrees_and_the_rest_is_as_it_is),
        cmocka_unit_test(every_trust_has_its_word),
        cmocka_unit_test(parts_of_different_materials_are_cautioned),
        cmocka_unit_test(wrong_calls_are_refused),
    };
    return cmocka_run_group_tests(tests, solve, clear);
}
