/* SPDX-License-Identifier: GPL-3.0-or-later
 * Load cases and probes as comma-separated values. */
#include "support/reported.h"

/* The line that begins so; its numbers after it. */
static const char *after(const char *text, const char *start)
{
    const char *line = strstr(text, start);
    if (line == NULL) print_error("there is no line %s\n", start);
    assert_non_null(line);
    assert_true(line[-1] == '\n');
    return line + strlen(start);
}

static void every_number_has_its_line(void **state)
{
    (void)state;
    utw_error err;
    char *text = NULL;
    reported r = reported_angle(0);
    assert_ok(utw_report_csv(&r.report, &text, &err));
    assert_memory_equal(text, "case,point,quantity,value,error,x,y,unit\r\n", 42);
    int lines = 0;
    for (const char *c = text; (c = strstr(c, "\r\n")) != NULL; c += 2) lines++;
    assert_int_equal(lines, 1 + 2 * (UTW_STRESS_KIND_COUNT + 2) + 2 * 2 * 7);
    double value, error, x, y;
    char unit[16];
    utw_stress_peaks p;
    utw_stress_point at;
    assert_ok(utw_cases_get(r.cases, 1, NULL, NULL, &p, &err));
    assert_int_equal(sscanf(after(text, "lift,peak,tau_max,"), "%lf,%lf,%lf,%lf,%15s", &value,
                            &error, &x, &y, unit),
                     5);
    const utw_stress_peak *tau = &p.peak[UTW_TAU_MAX];
    assert_true(value == tau->value && error == tau->error && x == tau->at[0] && y == tau->at[1]);
    assert_string_equal(unit, "N/mm^2");
    assert_ok(utw_cases_probe(r.cases, 0, 1, &at, &err));
    assert_int_equal(sscanf(after(text, "\"pull, steady\",probe 2,sigma_z,"),
                            "%lf,%lf,%lf,%lf,%15s", &value, &error, &x, &y, unit),
                     5);
    assert_true(value == at.sigma_z && error == at.sigma_error && x == 8.9 && y == 6.9);
    assert_memory_equal(after(text, "lift,peak,unbounded,"), "1,,,,-\r\n", 8);
    assert_memory_equal(after(text, "\"pull, steady\",peak,unbounded,"), "0,,,,-\r\n", 8);
    assert_int_equal(
        sscanf(after(text, "lift,probe 1,omega,"), "%lf,,%lf,%lf,%15s", &value, &x, &y, unit), 4);
    assert_string_equal(unit, "mm^2");
    utw_report_free(text);
    reported_clear(&r);
}

/* No yield stress: the margin is an empty field. A case without result has no line. */
static void what_does_not_exist_is_empty(void **state)
{
    (void)state;
    utw_error err;
    char *text = NULL;
    reported r = reported_angle(1);
    assert_ok(utw_report_csv(&r.report, &text, &err));
    assert_memory_equal(after(text, "\"pull, steady\",peak,margin,"), ",,,,-\r\n", 7);
    assert_null(strstr(text, "lift"));
    utw_report_free(text);
    reported_clear(&r);
}

static void quotes_are_doubled(void **state)
{
    (void)state;
    utw_error err;
    char *text = NULL;
    stressed s = stressed_of("{\"units\": \"mm N\", \"parts\": [{\"outline\": {\"circle\": "
                             "[0,0,2]}}], \"loads\": [{\"name\": \"3\\\" pipe\", \"N\": 1}]}",
                             1e-3);
    utw_report report = UTW_REPORT_INIT;
    utw_cases *cases = NULL;
    report.solution = s.solution;
    assert_int_equal(utw_report_csv(&report, &text, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "utw_report_csv: the report has no load cases");
    assert_ok(utw_cases_create(s.stress, 0, NULL, 0, NULL, &cases, &err));
    report.cases = cases;
    assert_ok(utw_report_csv(&report, &text, &err));
    after(text, "\"3\"\" pipe\",peak,von_mises,0.0795774715459");
    utw_report_free(text);
    utw_cases_free(cases);
    stressed_clear(&s);
}

static void memory_may_run_out_anywhere(void **state)
{
    (void)state;
    reported_without_memory(utw_report_csv);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(every_number_has_its_line),
        balanced_test(what_does_not_exist_is_empty),
        balanced_test(quotes_are_doubled),
        balanced_test(memory_may_run_out_anywhere),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
