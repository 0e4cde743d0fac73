/* SPDX-License-Identifier: GPL-3.0-or-later
 * The table of report/text.c. */
#include "base/memory.h"
#include "report/report.h"
#include "support/support.h"

/* The report of a section; options may be NULL. Freed with utw_report_free(). */
static char *report_of(const char *json, const utw_options *options)
{
    utw_error err;
    utw_solution *solution = NULL;
    utw_outline *outline = utw_outline_of(json);
    assert_ok(utw_solve(outline, options, &solution, &err));
    utw_report report = UTW_REPORT_INIT;
    report.solution = solution;
    char *text = NULL;
    assert_ok(utw_report_text(&report, &text, &err));
    utw_solution_free(solution);
    utw_outline_free(outline);
    return text;
}

static const char *const bracket =
    "{\"name\": \"Bracket\", \"units\": \"mm N\", \"let\": {\"t\": 9.5},"
    " \"materials\": {\"6082\": {\"E\": 70000, \"nu\": 0.33}},"
    " \"parts\": [{\"material\": \"6082\", \"outline\": [[0,0],[80,0],[80,\"t\"],"
    "{\"at\": [\"t\",\"t\"], \"round\": 6},[\"t\",55],[0,55]]}]}";

/* The line of a constant: "\nKEY " begins it. Returns its start. */
static const char *line_of(const char *text, const char *key)
{
    char start[32];
    snprintf(start, sizeof start, "\n%s ", key);
    const char *line = strstr(text, start);
    if (line == NULL) return NULL;
    assert_null(strstr(line + 1, start)); /* once */
    return line + 1;
}

static void no_line_is_wider_than_a_page(const char *text)
{
    for (const char *line = text; *line != '\0';) {
        const size_t n = strcspn(line, "\n");
        if (n > 100) print_error("%.*s\n", (int)n, line);
        assert_true(n <= 100);
        assert_true(n == 0 || line[n - 1] != ' ');
        line += n + (line[n] == '\n');
    }
}

static void every_constant_has_its_line(void **state)
{
    (void)state;
    char *text = report_of(bracket, NULL);
    assert_memory_equal(text, "Bracket\nUnits: mm N.", 20);
    for (int k = 0; k < UTW_CONSTANT_COUNT; k++) {
        const char *line = line_of(text, utw_constant_key((utw_constant)k));
        assert_non_null(line);
        const char *meaning = strstr(line, utw_constant_meaning((utw_constant)k));
        assert_true(meaning != NULL && meaning < strchr(line, '\n'));
    }
    no_line_is_wider_than_a_page(text);
    assert_null(strstr(text, "Left out"));
    assert_null(strstr(text, " nan"));
    assert_non_null(strstr(text, "asked for 1e-06: reached"));
    assert_non_null(strstr(text, "Dimensions  t = 9.5\n"));
    assert_non_null(strstr(text, "Material    6082: E = 70000 N/mm^2, nu = 0.33\n"));
    assert_non_null(strstr(text, "licensed engineer"));
    utw_report_free(text);
}

/* The columns of a line hold what the library says. */
static void numbers_and_units_stand_in_their_columns(void **state)
{
    (void)state;
    char *text =
        report_of("{\"units\": \"in lbf\", \"materials\": {\"m\": {\"E\": 1e7, \"nu\": 0.3}},"
                  "\"parts\": [{\"material\": \"m\", \"outline\": [[1,2],[5,2],[5,4],[1,4]]}]}",
                  NULL);
    const struct {
        const char *key, *value, *unit;
    } list[] = {{"A", "8", "in^2"},
                {"xc", "3", "in"},
                {"Ixx", "2.66666667", "in^4"},
                {"Iyy", "10.6666667", "in^4"},
                {"Ixy", "0", "in^4"},
                {"angle", "90", "deg"},
                {"Zx", "4", "in^3"},
                {"Wx_top", "2.66666667", "in^3"}};
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        const char *line = line_of(text, list[i].key);
        char value[40] = "", trust[40] = "", unit[40] = "", rest[40] = "";
        assert_non_null(line);
        assert_int_equal(sscanf(line + 44, "%39s %39s %39s%39[^\n]", value, trust, unit, rest), 3);
        assert_string_equal(value, list[i].value);
        assert_string_equal(trust, "exact");
        assert_string_equal(unit, list[i].unit);
    }
    /* J of a rectangle 4 x 2: 0.2286899 x 4 x 2^3 (Timoshenko and Goodier, ch. 10: series) */
    char value[40], low[40], high[40], trust[40], unit[40];
    assert_int_equal(
        sscanf(line_of(text, "J") + 44, "%39s %39s %39s %39s %39s", value, low, high, trust, unit),
        5);
    assert_close(strtod(value, NULL), 7.318, 1e-4);
    assert_true(strtod(low, NULL) < strtod(value, NULL) &&
                strtod(value, NULL) < strtod(high, NULL));
    assert_string_equal(trust, "bracket");
    assert_string_equal(unit, "in^4");
    assert_memory_equal(text, "Section without a name\n", 23);
    utw_report_free(text);
}

static void what_is_left_out_is_said_with_its_reason(void **state)
{
    (void)state;
    char *text = report_of("{\"units\": \"mm N\", \"parts\": [{\"outline\": "
                           "[[0,0],[80,0],[80,9.5],[9.5,9.5],[9.5,55],[0,55]]}]}",
                           NULL);
    static const char *const absent[] = {"Wt", "xf", "yf", "Asx", "Asy", "kx", "ky"};
    for (size_t i = 0; i < sizeof absent / sizeof *absent; i++)
        assert_null(line_of(text, absent[i]));
    assert_non_null(line_of(text, "Iw"));
    assert_non_null(strstr(text,
                           "Left out    Wt: does not exist: the stress has no bound at the sharp "
                           "re-entrant corner (9.5, 9.5);\n            give it its real radius\n"));
    assert_non_null(strstr(text,
                           "Left out    xf, yf, Asx, Asy, kx, ky: needs a Poisson's ratio: give "
                           "every part one material with\n            \"nu\"\n"));
    assert_non_null(strstr(text, "Material    none is given"));
    no_line_is_wider_than_a_page(text);
    utw_report_free(text);
}

static void a_tolerance_not_reached_is_said(void **state)
{
    (void)state;
    utw_options options = UTW_OPTIONS_INIT;
    options.fixed_order = 2;
    char *text = report_of(bracket, &options);
    assert_non_null(strstr(text, "of order 2, "));
    assert_non_null(strstr(text, "asked for 1e-06: NOT REACHED; the"));
    no_line_is_wider_than_a_page(text);
    utw_report_free(text);
}

/* Any allocation may fail: the call says so, leaves its output alone and keeps nothing. */
static void memory_may_run_out_anywhere(void **state)
{
    (void)state;
    utw_error err;
    utw_solution *solution = NULL;
    utw_options options = UTW_OPTIONS_INIT;
    options.fixed_order = 2;
    utw_outline *outline = utw_outline_of(bracket);
    assert_ok(utw_solve(outline, &options, &solution, &err));
    utw_report report = UTW_REPORT_INIT;
    report.solution = solution;
    int n = 0;
    for (utw_status st = UTW_E_NOMEM; st != UTW_OK;) {
        char *text = NULL;
        const long live = utw_memory_live();
        utw_memory_fail_at(++n);
        st = utw_report_text(&report, &text, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_true(st == UTW_E_NOMEM && text == NULL);
        utw_report_free(text);
        assert_int_equal(utw_memory_live(), live);
    }
    assert_true(n > 5);
    utw_solution_free(solution);
    utw_outline_free(outline);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(every_constant_has_its_line),
        balanced_test(numbers_and_units_stand_in_their_columns),
        balanced_test(what_is_left_out_is_said_with_its_reason),
        balanced_test(a_tolerance_not_reached_is_said),
        balanced_test(memory_may_run_out_anywhere),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
