/* SPDX-License-Identifier: GPL-3.0-or-later
 * untwist compare, run as a user runs it. */
#include "cli/run.h"

static void the_table(void **state)
{
    (void)state;
    char *output = NULL;
    assert_int_equal(run_untwist("compare machined-channel.json --require J --require xs", &output),
                     0);
    assert_non_null(strstr(output, "\n\nThe thin-walled idealisation may be used here for A"));
    assert_non_null(
        strstr(output, "\nMidline     3 walls, 0 junctions, 0 cells; found in the outline\n"));
    free(output);
}

static void what_is_required_decides_the_status(void **state)
{
    (void)state;
    expect_run(
        "compare machined-channel.json --quiet --require J --require Wt --require Asx", 1,
        "untwist: required: Wt is not within 5 %\nuntwist: required: Asx is not within 5 %\n");
    expect_run("compare machined-channel.json --quiet --require J --limit 1", 1,
               "untwist: required: J is not within 1 %\n");
    expect_run("compare machined-channel.json --require j", 2,
               "untwist: --require: 'j' is not compared; did you mean 'J'?\n");
    expect_run("compare machined-channel.json --limit 0", 2, "untwist: ");
}

static void a_lump_gets_a_sentence(void **state)
{
    (void)state;
    expect_run("compare solid-cam.json", 4,
               "untwist: the section has no thin-walled idealisation: no part of it is clearly "
               "longer than thick "
               "(width 36, height 44, area 1164)\n");
}

/* The midline is written, read, solved as a drawing of its own, and taken for the first drawing. */
static void the_midline_can_be_fed_back(void **state)
{
    (void)state;
    char command[900], *output = NULL;
    snprintf(command, sizeof command,
             "cd \"%s/examples\" && f=$(mktemp) && \"%s\" compare machined-channel.json --quiet "
             "--midline $f && "
             "\"%s\" compare $f | grep -c 'the midline is given' && "
             "\"%s\" compare machined-channel.json --with $f | grep -e given -e '^xs' ; rm $f",
             UTW_SOURCE_DIR, UTW_PROGRAM, UTW_PROGRAM, UTW_PROGRAM);
    assert_int_equal(utw_run(command, &output), 0);
    assert_memory_equal(output, "1\nxs ", 5);
    assert_non_null(strstr(output, "-0.540179  in    within"));
    assert_non_null(strstr(output, "the midline is given"));
    free(output);
    expect_run(
        "compare machined-channel.json --with solid-cam.json", 3,
        "untwist: --with: solid-cam.json holds no \"midline\"; docs/section-file.md says how "
        "one is drawn\n");
    expect_run("compare machined-channel.json --midline machined-channel.json", 2,
               "untwist: compare: ");
    expect_run("compare machined-channel.json --json - --midline -", 2,
               "untwist: compare: --json and --midline cannot both go to standard output\n");
}

static void the_thickness_study(void **state)
{
    (void)state;
    char *output = NULL;
    assert_int_equal(
        run_untwist("compare machined-channel.json --thickness 0.5:2:4 --tol 1e-3", &output), 0);
    assert_non_null(strstr(output, "\nThickness study: difference in per cent, as above\n"));
    assert_non_null(strstr(output, "\n     1.5  0.4009   0.109 "));
    assert_non_null(strstr(output, "            J: within 5 % up to t = 0.38"));
    free(output);
    expect_run("compare machined-channel.json --thickness 1:1:3", 2,
               "untwist: compare: --thickness takes FROM:TO:STEPS, rising factors from 0.001 to "
               "1000 in 2 to 500 steps, such as 0.25:3:12, not '1:1:3'\n");
    expect_run("compare machined-channel.json --thickness 1:2", 2,
               "untwist: compare: --thickness ");
}

static void json_goes_to_standard_output(void **state)
{
    (void)state;
    char *output = NULL;
    assert_int_equal(run_untwist("compare machined-channel.json --json -", &output), 0);
    assert_true(output[0] == '{');
    assert_non_null(strstr(output, "\"verdict\":"));
    free(output);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(the_table),
        cmocka_unit_test(what_is_required_decides_the_status),
        cmocka_unit_test(a_lump_gets_a_sentence),
        cmocka_unit_test(the_midline_can_be_fed_back),
        cmocka_unit_test(the_thickness_study),
        cmocka_unit_test(json_goes_to_standard_output),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
