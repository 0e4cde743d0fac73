/* SPDX-License-Identifier: GPL-3.0-or-later
 * The load cases in the report for people. */
#include "support/reported.h"

static char *text_of(const reported *r)
{
    utw_error err;
    char *text = NULL;
    assert_ok(utw_report_text(&r->report, &text, &err));
    for (const char *line = text; *line != '\0'; line += strcspn(line, "\n") + 1)
        assert_true(strcspn(line, "\n") <= 100);
    assert_null(strstr(text, " nan"));
    assert_null(strstr(text, " inf"));
    return text;
}

/* N = 2385 on A = 61 x 7 + 9 x 76 = 1111. */
static void every_case_has_its_line(void **state)
{
    (void)state;
    reported r = reported_angle(0);
    char *text = text_of(&r), mises[20], principal[20], most[20], least[20], tau[20], margin[20];
    const char *table = strstr(text, "\nLoad cases: greatest stresses, N/mm^2\n");
    assert_non_null(table);
    const char *line = strstr(table, "\npull, steady ");
    assert_non_null(line);
    assert_int_equal(sscanf(line + 13, "%19s %19s %19s %19s %19s %19s", mises, principal, most,
                            least, tau, margin),
                     6);
    assert_string_equal(mises, "2.14671"); /* 2385/1111 = 2.146715 */
    assert_string_equal(most, mises);
    assert_string_equal(least, mises);
    assert_string_equal(tau, "0");
    assert_string_equal(margin, "115"); /* 250/2.1467 - 1 = 115.5 */
    assert_true(strchr(line + 1, '*') > strchr(line + 1, '\n'));
    line = strstr(table, "\nlift ");
    assert_true(strchr(line, '*') < strchr(line + 1, '\n'));
    assert_non_null(strstr(table, "\nGreatest of all cases\n"));
    assert_non_null(strstr(table, "\nStresses at points\n"));
    assert_non_null(strstr(table, "* The shear stress has no bound at the sharp re-entrant corner "
                                  "(9, 7). Given are"));
    utw_report_free(text);
    reported_clear(&r);
}

static void a_case_without_result_is_said_with_its_reason(void **state)
{
    (void)state;
    reported r = reported_angle(1);
    char *text = text_of(&r);
    assert_null(strstr(text, "\nlift "));
    assert_non_null(strstr(text, "load case \"lift\": the stresses of a shear force depend"));
    assert_null(strstr(text, "Given are the greatest"));
    utw_report_free(text);
    r.report.cases = NULL;
    text = text_of(&r);
    assert_null(strstr(text, "Load cases"));
    utw_report_free(text);
    reported_clear(&r);
}

static void memory_may_run_out_anywhere(void **state)
{
    (void)state;
    reported_without_memory(utw_report_text);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(every_case_has_its_line),
        balanced_test(a_case_without_result_is_said_with_its_reason),
        balanced_test(memory_may_run_out_anywhere),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
