/* SPDX-License-Identifier: GPL-3.0-or-later
 * untwist push, run as a user runs it; and what docs/push.md shows of it. */
#include "cli/run.h"
#include "outline/json.h"

#define CHANNEL "push machined-channel.json --length 36 --force 0,-240 --at 0.11,2 "

/* A word, or a number that is another by little (errors differ from mesh to mesh). */
static int alike(const char *shown, const char *printed)
{
    char *a_end, *b_end;
    const double a = strtod(shown, &a_end), b = strtod(printed, &b_end);
    if (*a_end != '\0' || *b_end != '\0') return strcmp(shown, printed) == 0;
    return fabs(a - b) <= 2e-3 * fmax(fabs(a), fabs(b)) || fmax(fabs(a), fabs(b)) < 0.01 ||
           (fabs(a) < 20 && fabs(b) < 20 && a > 1 && b > 1); /* the error of the stress */
}

/* The lines between ```text and ``` of docs/push.md, word by word. */
static void the_page_shows_what_is_printed(void **state)
{
    (void)state;
    char *page = NULL, *printed = NULL, *rest = NULL;
    assert_int_equal(utw_run("cat \"" UTW_SOURCE_DIR "/docs/push.md\"", &page), 0);
    assert_non_null(strstr(page, "    untwist " CHANNEL "--twist-limit 0.5\n"));
    assert_int_equal(run_untwist(CHANNEL "--twist-limit 0.5 2>/dev/null", &printed), 1);
    char *shown = strstr(page, "\n```text\n");
    assert_non_null(shown);
    shown += strlen("\n```text\n");
    *strstr(shown, "\n```") = '\0';
    const char *at = strstr(printed, "\nLoad ");
    assert_non_null(at);
    int words = 0;
    for (char *word = strtok_r(shown, " \n", &rest); word != NULL;
         word = strtok_r(NULL, " \n", &rest), words++) {
        char other[64];
        int used;
        assert_int_equal(sscanf(at, "%63s%n", other, &used), 1);
        if (!alike(word, other)) print_error("shown: %s, printed: %s\n", word, other);
        assert_true(alike(word, other));
        at += used;
    }
    assert_true(words > 150);
    free(page);
    free(printed);
}

static void limits_make_the_status(void **state)
{
    (void)state;
    expect_run(CHANNEL "--quiet --twist-limit 0.5", 1,
               "untwist: the load twists the bar by 1.146 deg, more than 0.5 deg\n");
    expect_run(CHANNEL "--quiet --twist-limit 1.2 --stress-limit 9000", 0, "");
    expect_run(CHANNEL "--quiet --twist-limit 2 --stress-limit 2500", 1,
               "untwist: the greatest stress is 528");
    char *output = NULL;
    assert_int_equal(
        run_untwist(CHANNEL "--support forked --where z=9 --warping held --json -", &output), 0);
    utw_json *json = NULL;
    utw_error err;
    assert_ok(utw_json_parse(output, strlen(output), &json, &err));
    utw_json_free(json);
    assert_non_null(strstr(output, "\"push\":"));
    free(output);
}

static void wrong_use_is_told(void **state)
{
    (void)state;
    expect_run("push", 2, "untwist: push: FILE is missing; 'untwist help push' tells how");
    expect_run("push a.json", 2,
               "untwist: push: --length is missing; 'untwist help push' tells how to use it\n");
    expect_run("push a.json --length x", 2, "untwist: push: --length must be a number, not 'x'\n");
    expect_run("push a.json --length 9 --force 3", 2,
               "untwist: push: --force takes X,Y, not '3'\n");
    expect_run("push a.json --length 9 --at 3,y", 2, "untwist: push: --at takes X,Y, not '3,y'\n");
    expect_run("push a.json --length 9 --support glued", 2,
               "untwist: push: --support is fixed-free, fixed-fixed, forked or fixed-forked, not "
               "'glued'\n");
    expect_run("push a.json --length 9 --warping usual", 2,
               "untwist: push: --warping is free or held, not 'usual'\n");
    expect_run("push a.json --length 9 --where z=", 2,
               "untwist: push: --where is tip, mid, uniform or z=Z, not 'z='\n");
    expect_run("push a.json --length 9 --twist-limit 0", 2,
               "untwist: push: --twist-limit must lie in 1e-12 .. 1e+06, not 0\n");
    expect_run("push machined-channel.json --length 9 --json machined-channel.json", 2,
               "untwist: push: --json machined-channel.json would overwrite the section file\n");
    expect_run("push machined-channel.json --length 0", 3,
               "untwist: push: the length of the bar is 0; it must be positive\n");
    expect_run("push machined-channel.json --length 9 --where z=10", 3,
               "untwist: the force acts at z = 10, off the bar (0 to 9)\n");
    expect_run("push machined-channel.json --length 9 --support forked --where tip", 3,
               "untwist: the force acts at z = 9, on a support: it would neither bend nor twist "
               "the bar\n");
    expect_run("push ../tests/bad/../../examples/none.json --length 9", 3, "untwist: ");
    char *output = NULL;
    assert_int_equal(run_untwist("push - --length 9 2>&1 <<'END'\n{\"units\": \"mm N\", "
                                 "\"parts\": [{\"outline\": [[0,0],[9,0],[0,9]]}]}\nEND\n",
                                 &output),
                     3);
    assert_string_equal(output, "untwist: a push needs the stiffness of the bar: give the section "
                                "a material with \"E\" and \"nu\"\n");
    free(output);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(the_page_shows_what_is_printed),
        cmocka_unit_test(limits_make_the_status),
        cmocka_unit_test(wrong_use_is_told),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
