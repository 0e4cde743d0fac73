/* SPDX-License-Identifier: GPL-3.0-or-later
 * The comparison in the report for people and in the one for programs. */
#include "base/memory.h"
#include "outline/json.h"
#include "support/section.h"
#include "support/shapes.h"

typedef struct compared {
    utw_outline *outline;
    utw_solution *solution;
    utw_idealisation *ideal;
    utw_comparison *comparison;
    utw_report report;
} compared;

static compared compare(const char *shape)
{
    utw_error err;
    compared c = {.outline = shape_of(shape), .report = UTW_REPORT_INIT};
    c.solution = section_solve(c.outline, 1e-4, 0);
    assert_ok(utw_idealise(c.outline, &c.ideal, &err));
    assert_ok(utw_compare(c.solution, c.ideal, 0.05, &c.comparison, &err));
    c.report.solution = c.solution;
    c.report.comparison = c.comparison;
    return c;
}

static void clear(compared *c)
{
    utw_comparison_free(c->comparison);
    utw_idealisation_free(c->ideal);
    utw_solution_free(c->solution);
    utw_outline_free(c->outline);
}

static void holds(const char *text, const char *part)
{
    if (strstr(text, part) == NULL) print_error("there is no\n%s\nin\n%s\n", part, text);
    assert_non_null(strstr(text, part));
}

static void the_table(void **state)
{
    (void)state;
    utw_error err;
    char *text = NULL;
    compared c = compare("channel h=100 b=50 tf=8.5 tw=6 r=8.5");
    assert_ok(utw_report_comparison(&c.report, &text, &err));
    holds(text, "Units: mm N. x to the right, y up.\n\nThe thin-walled idealisation may be used "
                "here for A");
    /* A = 2 (50 - 3) 8.5 + (100 - 8.5) 6 on the midline; of the fillets (1 - pi/4) 8.5^2 twice are
     * missing */
    holds(text, "\nA    ");
    holds(text, "  1348  mm^2  within   -2.25 %\n");
    holds(text, "OUTSIDE");
    holds(text, "\nMidline     3 walls, 0 junctions, 0 cells; found in the outline\nReasons     "
                "Walls are slender: "
                "at least 5.53 times as long as thick.\n");
    holds(text, "\nLeft out    Asx: needs a Poisson's ratio");
    holds(text, "\n   1  wall  ");
    for (const char *line = text; *line != '\0';) {
        const size_t n = strcspn(line, "\n");
        assert_true(n <= 100);
        line += n + (line[n] == '\n');
    }
    utw_report_free(text);
    clear(&c);
}

static const utw_json *member(const utw_json *object, const char *key)
{
    for (const utw_json *m = utw_json_first(object); m != NULL; m = utw_json_next(m))
        if (strcmp(utw_json_key(m), key) == 0) return m;
    print_error("there is no \"%s\"\n", key);
    fail();
    return NULL;
}

static void the_document(void **state)
{
    (void)state;
    utw_error err;
    char *text = NULL, keys[256] = "";
    size_t n = 0;
    utw_json *json = NULL;
    compared c = compare("box h=100 b=60 t=5 ro=10 ri=5");
    assert_ok(utw_report_json(&c.report, &text, &err));
    assert_ok(utw_json_parse(text, strlen(text), &json, &err));
    const utw_json *compare_object = member(json, "compare");
    for (const utw_json *m = utw_json_first(compare_object); m != NULL; m = utw_json_next(m))
        n += (size_t)snprintf(keys + n, sizeof keys - n, "%s ", utw_json_key(m));
    assert_string_equal(keys,
                        "limit verdict doubt reasons given walls bends links lumps junctions cells "
                        "area_share area_error length_error quantities midline slenderness ");
    assert_true(utw_json_number(member(compare_object, "walls")) == 4);
    assert_true(utw_json_number(member(compare_object, "bends")) == 4);
    assert_true(utw_json_number(member(compare_object, "cells")) == 1);
    assert_string_equal(utw_json_string(member(compare_object, "verdict")),
                        utw_comparison_verdict(c.comparison));
    const utw_json *J = member(member(compare_object, "quantities"), "J");
    const utw_thin_constants *thin = utw_thin_get(utw_idealisation_thin(c.ideal));
    assert_true(utw_json_number(member(J, "thin")) == thin->J);
    assert_close(utw_json_number(member(J, "difference")),
                 thin->J / utw_json_number(member(J, "solid")) - 1, 1e-12);
    assert_string_equal(utw_json_string(member(J, "of")), "solid");
    const utw_json *Asx = member(member(compare_object, "quantities"), "Asx");
    holds(utw_json_string(member(Asx, "reason")), "needs a Poisson's ratio");
    const utw_json *walls = member(member(compare_object, "midline"), "walls");
    int count = 0;
    for (const utw_json *w = utw_json_first(walls); w != NULL; w = utw_json_next(w)) count++;
    assert_int_equal(count, 8);
    utw_json_free(json);
    utw_report_free(text);
    clear(&c);
}

static void refusals(void **state)
{
    (void)state;
    utw_error err;
    char *text = NULL;
    compared c = compare("rectangle b=100 h=8");
    for (long n = 1; n < 200; n++) {
        utw_memory_fail_at(n);
        const utw_status st = utw_report_comparison(&c.report, &text, &err);
        utw_memory_fail_at(0);
        if (st == UTW_OK) break;
        assert_int_equal(st, UTW_E_NOMEM);
        assert_null(text);
    }
    assert_non_null(text);
    utw_report_free(text);
    text = NULL;
    for (long n = 1; n < 4000; n += 13) {
        utw_memory_fail_at(n);
        const utw_status st = utw_report_json(&c.report, &text, &err);
        utw_memory_fail_at(0);
        if (st == UTW_OK) break;
        assert_int_equal(st, UTW_E_NOMEM);
    }
    assert_non_null(text);
    utw_report_free(text);
    c.report.comparison = NULL;
    assert_int_equal(utw_report_comparison(&c.report, &text, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "utw_report_comparison: the report has no comparison");
    clear(&c);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(the_table), balanced_test(the_document),
                                       balanced_test(refusals)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
