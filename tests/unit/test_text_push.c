/* SPDX-License-Identifier: GPL-3.0-or-later
 * The push for people: every number is that of the library, every note stands where it belongs. */
#include "base/memory.h"
#include "support/pushed.h"

static char *text_of(const stressed *s, const utw_push_load *load)
{
    utw_error err;
    char *text = NULL;
    utw_push *push = pushed_by(s, load);
    utw_report report = UTW_REPORT_INIT;
    report.solution = s->solution;
    report.push = push;
    assert_ok(utw_report_push(&report, &text, &err));
    for (const char *line = text; *line != '\0';) {
        const size_t n = strcspn(line, "\n");
        if (n > 100) print_error("%.*s\n", (int)n, line);
        assert_true(n <= 100);
        assert_true(n == 0 || line[n - 1] != ' ');
        line += n + (line[n] == '\n');
    }
    assert_null(strstr(text, " nan"));
    assert_null(strstr(text, " inf"));
    assert_null(strstr(text, " -0 "));
    assert_non_null(strstr(text, "licensed engineer"));
    utw_push_free(push);
    return text;
}

/* 1 when the text holds the words, wherever its lines break. */
static int says(const char *text, const char *words)
{
    char *flat = malloc(strlen(text) + 1), *to = flat;
    assert_non_null(flat);
    for (const char *c = text; *c != '\0'; c++)
        if (strchr(" \n", *c) == NULL)
            *to++ = *c;
        else if (to > flat && to[-1] != ' ')
            *to++ = ' ';
    *to = '\0';
    const int found = strstr(flat, words) != NULL;
    if (!found) print_error("it does not say: %s\n", words);
    free(flat);
    return found;
}

/* The numbers of the line that begins so, after its label of 30 characters. */
static int numbers(const char *text, const char *label, double value[4])
{
    char start[64];
    snprintf(start, sizeof start, "\n%s", label);
    const char *line = strstr(text, start);
    if (line == NULL) print_error("there is no line %s\n", label);
    assert_non_null(line);
    return sscanf(line + 31, "%lf %lf %lf %lf", &value[0], &value[1], &value[2], &value[3]);
}

static void the_numbers_stand_on_their_lines(void **state)
{
    (void)state;
    stressed s = stressed_of(pushed_channel, 1e-6);
    utw_push_load load = pushed_load(640, 0, -2400, 25, 0);
    load.twist_limit = 0.02;
    char *text = text_of(&s, &load);
    utw_push *push = pushed_by(&s, &load);
    const utw_push_result *r = utw_push_get(push);
    const double degrees = 57.29577951308232;
    double v[4];
    assert_memory_equal(text, "Section without a name\nUnits: mm N.", 35);
    assert_true(says(text, "force (Fx, Fy) = (0, -2400) N at (25, 0), z = 640 "));
    assert_true(says(text, "fixed at z = 0 (warping held), free at z = 640; E = 70000"));
    assert_int_equal(numbers(text, "along y ", v), 3);
    assert_close(v[0], r->deflection[1].value, 1e-6);
    assert_true(v[1] <= r->deflection[1].low && v[2] >= r->deflection[1].high);
    assert_int_equal(numbers(text, "twist  ", v), 3);
    assert_close(v[0], r->twist.value * degrees, 1e-5);
    numbers(text, "twist per offset of the load ", v);
    assert_close(v[0], r->twist_per_offset.value * degrees, 1e-5);
    assert_int_equal(numbers(text, "shear force Vy ", v), 2);
    assert_true(v[0] == -2400 && v[1] == -2400);
    assert_int_equal(numbers(text, "bending moment Mx ", v), 2);
    assert_true(v[0] == 2400 * 640 && v[1] == 0);
    assert_int_equal(numbers(text, "bimoment B ", v), 2);
    assert_close(v[0], r->start.forces.B, 1e-5);
    assert_int_equal(numbers(text, "von Mises ", v), 4);
    assert_close_scaled(v[0], r->von_mises.value, 1, r->von_mises.error);
    assert_true(v[2] == 0);
    assert_int_equal(numbers(text, "no twist ", v), 3);
    assert_close(v[0], r->shear_centre[0], 1e-5);
    assert_int_equal(numbers(text, "the section lies ", v), 2);
    assert_true(v[0] == 0 && v[1] == 50);
    assert_int_equal(numbers(text, "twist up to 1.14592 deg ", v), 3);
    assert_close(v[0], r->twist_window.at_from[0], 1e-5);
    assert_close(v[1], r->twist_window.at_to[0], 1e-5);
    assert_int_equal(numbers(text, "stress up to 250 N/mm^2 ", v), 3);
    assert_close(v[1], r->stress_window.at_to[0], 1e-5);
    assert_int_equal(numbers(text, "both ", v), 3);
    assert_true(says(text, "OUTSIDE"));
    assert_true(says(text, "one to the right of it turns the section clockwise"));
    assert_true(says(text, "shear stress of the warping torque"));
    utw_push_free(push);
    utw_report_free(text);
    stressed_clear(&s);
}

/* Other forces, other words; a short bar, sharp corners, no window and an empty one are told. */
static void what_a_reader_must_know_is_said(void **state)
{
    (void)state;
    stressed s = stressed_of(pushed_channel, 1e-4);
    utw_push_load load = pushed_load(400, 30, 40, 25, 0);
    load.has_at = 0;
    load.support = UTW_FIXED_FORKED;
    load.where = UTW_UNIFORM;
    load.stress_limit = 1e-3;
    char *text = text_of(&s, &load);
    assert_true(says(text, ", the shear centre, spread evenly over the length"));
    assert_true(says(text, "fixed at z = 0 (warping held), forked at z = 400;"));
    assert_true(says(text, "offset from"));
    assert_true(says(text, "shear centre along (0.8, -0.6)"));
    assert_true(says(text, "nowhere "));
    assert_true(says(text, "Short bar the bar is only 3.6 times"));
    assert_true(says(text, "No twist limit is set"));
    utw_report_free(text);
    load = pushed_load(700, 30, 0, 25, 3);
    text = text_of(&s, &load);
    assert_true(says(text, "y from"));
    assert_true(says(text, "one above it turns"));
    assert_null(strstr(text, "Short bar"));
    utw_report_free(text);
    load.warping = UTW_WARPING_FREE;
    text = text_of(&s, &load);
    assert_null(strstr(text, "(warping held)"));
    utw_report_free(text);
    stressed_clear(&s);

    s = stressed_of("{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 70000, \"nu\": 0.27}}, "
                    "\"parts\": [{\"material\": \"m\", \"outline\": [[0,0], [61,0], [61,7], [9,7], "
                    "[9,83], [0,83]]}]}",
                    1e-4);
    text = text_of(&s, &load);
    assert_true(says(text, "no bound at the sharp re-entrant corner (9, 7)"));
    assert_null(strstr(text, "margin"));
    assert_null(strstr(text, "stress up to"));
    utw_report_free(text);
    stressed_clear(&s);

    s = stressed_rectangle(20, 30, 0.3, 1e-4);
    text = text_of(&s, &load);
    assert_true(says(text, "Warping left out: what held warping does would fade within"));
    utw_report_free(text);
    load.warping = UTW_WARPING_HELD;
    text = text_of(&s, &load);
    assert_true(says(text, "the stress of the bimoment is overstated"));
    utw_report_free(text);
    stressed_clear(&s);
}

static void failures_are_clean(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_rectangle(20, 30, 0.3, 1e-2);
    utw_push_load load = pushed_load(700, 30, 0, 25, 3);
    utw_report report = UTW_REPORT_INIT;
    char *text = NULL;
    report.solution = s.solution;
    assert_int_equal(utw_report_push(&report, &text, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "utw_report_push: the report has no push");
    utw_push *push = pushed_by(&s, &load);
    report.push = push;
    int n = 0;
    for (utw_status st = UTW_E_NOMEM; st != UTW_OK;) {
        const long live = utw_memory_live();
        text = NULL;
        utw_memory_fail_at(++n);
        st = utw_report_push(&report, &text, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_true(st == UTW_E_NOMEM && text == NULL);
        utw_report_free(text);
        assert_int_equal(utw_memory_live(), live);
    }
    assert_true(n > 5);
    utw_push_free(push);
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(the_numbers_stand_on_their_lines),
        balanced_test(what_a_reader_must_know_is_said),
        balanced_test(failures_are_clean),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
