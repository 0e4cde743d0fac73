/* SPDX-License-Identifier: GPL-3.0-or-later
 * untwist solve, run as a user runs it. */
#include <unistd.h>

#include "base/memory.h"
#include "cli/run.h"
#include "outline/json.h"

/* A folder of our own for files that are written. */
static char folder[64];

static int make_folder(void **state)
{
    (void)state;
    snprintf(folder, sizeof folder, "/tmp/untwist-test-XXXXXX");
    return mkdtemp(folder) == NULL ? -1 : 0;
}

static int remove_folder(void **state)
{
    (void)state;
    char command[100], *output = NULL;
    snprintf(command, sizeof command, "rm -r %s", folder);
    const int status = utw_run(command, &output);
    free(output);
    return status;
}

static void the_table_goes_to_standard_output(void **state)
{
    (void)state;
    char *output = NULL;
    assert_int_equal(run_untwist("solve corner-bracket.json", &output), 0);
    assert_memory_equal(output, "Corner bracket, 90 x 70, with wire duct\nUnits: mm N.", 52);
    assert_non_null(strstr(output, "\nIxx "));
    assert_non_null(strstr(output, "asked for 1e-06: reached"));
    free(output);
}

static void a_section_may_come_from_standard_input(void **state)
{
    (void)state;
    char *file = NULL, *input = NULL;
    assert_int_equal(run_untwist("solve corner-bracket.json | grep -v ^Time", &file), 0);
    assert_int_equal(run_untwist("solve - <corner-bracket.json | grep -v ^Time", &input), 0);
    assert_string_equal(file, input);
    assert_true(strlen(file) > 1000);
    free(file);
    free(input);
    expect_run("solve - </dev/null", 3, "untwist: standard input: ");
}

static void a_trade_shape_may_be_piped_in(void **state)
{
    (void)state;
    char command[600], *output = NULL;
    snprintf(command, sizeof command, "\"%s\" shape tube d=60 t=2.5 | \"%s\" solve - 2>&1",
             UTW_PROGRAM, UTW_PROGRAM);
    assert_int_equal(utw_run(command, &output), 0);
    /* A = pi (30^2 - 27.5^2), J = pi/2 (30^4 - 27.5^4) */
    assert_non_null(strstr(output, "451.603944"));
    double low, high;
    assert_int_equal(sscanf(strstr(output, "\nJ ") + 45, "%*s %lf %lf", &low, &high), 2);
    const double J = 1.5707963267948966 * (810000 - 571914.0625);
    assert_true(low <= J && J <= high && high - low < 1e-6 * J);
    free(output);
}

static utw_json *parsed(const char *text)
{
    utw_json *json = NULL;
    utw_error err;
    assert_ok(utw_json_parse(text, strlen(text), &json, &err));
    return json;
}

static void json_goes_to_standard_output_or_a_file(void **state)
{
    (void)state;
    char *output = NULL, *none = NULL, arguments[300];
    assert_int_equal(run_untwist("solve corner-bracket.json --json -", &output), 0);
    utw_json_free(parsed(output)); /* nothing else stands there */
    assert_memory_equal(output, "{\n\t\"untwist\":", 13);
    free(output);
    snprintf(arguments, sizeof arguments,
             "solve corner-bracket.json --json %s/r.json --quiet 2>&1 && cat %s/r.json", folder,
             folder);
    assert_int_equal(run_untwist(arguments, &output), 0);
    utw_json_free(parsed(output));
    free(output);
    snprintf(arguments, sizeof arguments, "solve corner-bracket.json --json=%s/r.json", folder);
    assert_int_equal(run_untwist(arguments, &output), 0);
    assert_memory_equal(output, "Corner bracket", 14); /* the table as well */
    free(output);
    assert_int_equal(run_untwist("solve --quiet corner-bracket.json 2>&1", &none), 0);
    assert_string_equal(none, "");
    free(none);
}

static void dimensions_may_be_set(void **state)
{
    (void)state;
    assert_true(
        output_holds("solve corner-bracket.json --set b=95.5 --set t_base=13",
                     "b = 95.5 (set by the caller), h = 70, t_base = 13 (set by the caller)"));
    expect_run("solve corner-bracket.json --set width=3", 2, "untwist: corner-bracket.json: ");
    expect_run("solve corner-bracket.json --set b=", 2, "untwist: corner-bracket.json: ");
    expect_run("solve corner-bracket.json --set b=1 --set b=2", 2,
               "untwist: corner-bracket.json: ");
    expect_run("solve corner-bracket.json --set t_base=-4", 3,
               "untwist: corner-bracket.json: part 1");
}

/* Cases, probes and their CSV; what the file holds is tested with report/csv.c. */
static void load_cases_and_probes_are_printed(void **state)
{
    (void)state;
    char *output = NULL, arguments[300];
    snprintf(arguments, sizeof arguments,
             "solve corner-bracket.json --case 'side gust' --probe 3,4 --csv %s/s.csv && cat "
             "%s/s.csv",
             folder, folder);
    assert_int_equal(run_untwist(arguments, &output), 0);
    assert_non_null(strstr(output, "\nLoad cases: greatest stresses, N/mm^2\n"));
    assert_non_null(strstr(output, "\nStresses at points\n"));
    assert_null(strstr(output, "hook"));
    assert_non_null(strstr(output, "\nside gust,probe 1,sigma_z,"));
    free(output);
    assert_int_equal(run_untwist("solve corner-bracket.json --csv -", &output), 0);
    assert_memory_equal(output, "case,point,quantity,value,error,x,y,unit\r\n", 42);
    assert_null(strstr(output, "Units"));
    free(output);
}

static void wrong_cases_and_probes_are_told(void **state)
{
    (void)state;
    expect_run("solve corner-bracket.json --case 'side gst'", 3,
               "untwist: there is no load case \"side gst\"; did you mean \"side gust\"?\n");
    expect_run("solve corner-bracket.json --probe 91,4", 3,
               "untwist: the point (91, 4) lies outside the section; its nearest point is (90, 4), "
               "1 away\n");
    expect_run("solve a.json --json - --csv -", 2,
               "untwist: solve: --json and --csv cannot both go to standard output\n");
    expect_run("solve corner-bracket.json --vtu -", 2,
               "untwist: solve: --vtu needs a file; it is not text for standard output\n");
    expect_run("solve corner-bracket.json --quiet --vtu /no/such/a.vtu", 3,
               "untwist: /no/such/a.vtu: cannot be written: No such file or directory\n");
    expect_run("solve corner-bracket.json --csv corner-bracket.json", 2,
               "untwist: solve: --csv corner-bracket.json would overwrite the section file\n");
    static const char square[] = "{\"units\": \"mm N\", \"parts\": [{\"outline\": "
                                 "[[0,0],[9,0],[9,9],[0,9]]}]%s}";
    static const struct {
        const char *loads, *options;
        int status;
        const char *text;
    } list[] = {
        {"", "--probe 1,2", 3,
         "untwist: solve: - has no load cases (\"loads\"), which --probe and --csv need\n"},
        {"", "--case a", 3, "untwist: there is no load case \"a\": the section has no \"loads\"\n"},
        {", \"loads\": [{\"name\": \"a\", \"Vx\": 1}]", "--case a", 3,
         "untwist: load case \"a\": the stresses of a shear force depend on Poisson's ratio: give "
         "every part a material with the same \"nu\"\n"},
        {"", "--probe '1;2'", 2, "untwist: solve: --probe takes X,Y, not '1;2'\n"},
        {"", "--probe 1,nan", 2, "untwist: solve: --probe takes X,Y, not '1,nan'\n"},
        {"", "--probe 0x1,2", 2, "untwist: solve: --probe takes X,Y, not '0x1,2'\n"},
    };
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        char section[300], arguments[600];
        snprintf(section, sizeof section, square, list[i].loads);
        snprintf(arguments, sizeof arguments, "solve - %s 2>&1 <<'END'\n%s\nEND\n", list[i].options,
                 section);
        char *output = NULL;
        const int got = run_untwist(arguments, &output);
        if (got != list[i].status) print_error("%s%s", arguments, output);
        assert_int_equal(got, list[i].status);
        assert_string_equal(output, list[i].text);
        free(output);
    }
}

static void wrong_options_are_told(void **state)
{
    (void)state;
    expect_run("solve", 2, "untwist: solve: FILE is missing; 'untwist help solve' tells how");
    expect_run("solve a.json b.json", 2, "untwist: solve: one operand too many: 'b.json'");
    expect_run("solve a.json --tl 1", 2,
               "untwist: solve: unknown option '--tl'; did you mean '--tol'?\n");
    expect_run("solve a.json --frobnicate", 2,
               "untwist: solve: unknown option '--frobnicate'; 'untwist help solve' lists");
    expect_run("solve a.json -q", 2, "untwist: solve: unknown option '-q'; 'untwist help solve'");
    expect_run("solve a.json --tol", 2, "untwist: solve: --tol needs a value: --tol T\n");
    expect_run("solve a.json --json --quiet", 2,
               "untwist: solve: --json needs a value: --json FILE\n");
    expect_run("solve a.json --tol=", 2, "untwist: solve: --tol needs a value: --tol T\n");
    expect_run("solve a.json --tol 1e-6x", 2,
               "untwist: solve: --tol must be a number, not '1e-6x'\n");
    expect_run("solve a.json --tol nan", 2, "untwist: solve: --tol must be a number, not 'nan'\n");
    expect_run("solve a.json --tol 0x1p-9", 2,
               "untwist: solve: --tol must be a number, not '0x1p-9'\n");
    expect_run("solve a.json --tol 1e-13", 2,
               "untwist: solve: --tol must lie in 1e-12 .. 0.5, not 1e-13\n");
    expect_run("solve a.json --order 4.5", 2,
               "untwist: solve: --order must be a whole number, not '4.5'\n");
    expect_run("solve a.json --order 13", 2,
               "untwist: solve: --order must lie in 1 .. 12, not 13\n");
    expect_run("solve a.json --quiet=1", 2, "untwist: solve: --quiet takes no value\n");
    expect_run("solve a.json --tol 1e-4 --tol 1e-5", 2, "untwist: solve: --tol is given twice\n");
    expect_run("solve -- --tol", 3,
               "untwist: --tol: cannot be opened: No such file or directory\n");
}

static void wrong_files_are_told(void **state)
{
    (void)state;
    expect_run("solve nothing.json", 3, "untwist: nothing.json: cannot be opened: No such file");
    expect_run("solve .", 3, "untwist: .: cannot be read: Is a directory\n");
    expect_run("solve ../tests/bad/shape_unknown.json", 3,
               "untwist: ../tests/bad/shape_unknown.json: ");
    expect_run("solve corner-bracket.json --json corner-bracket.json", 2,
               "untwist: solve: --json corner-bracket.json would overwrite the section file\n");
    expect_run("solve corner-bracket.json --quiet --json no/such/folder/r.json", 3,
               "untwist: no/such/folder/r.json cannot be written: No such file or directory\n");
    expect_run("solve corner-bracket.json --quiet --json /dev/full", 3,
               "untwist: /dev/full cannot be written: No space left on device\n");
}

/* The status differs, the results are there, and their bounds are true: the fine solution lies
 * between them. */
static void a_tolerance_not_reached_has_its_own_status(void **state)
{
    (void)state;
    char *output = NULL, value[40], low[40], high[40], fine[40];
    assert_int_equal(run_untwist("solve corner-bracket.json --order 2", &output), 5);
    assert_non_null(strstr(output, "NOT REACHED"));
    assert_int_equal(sscanf(strstr(output, "\nJ ") + 45, "%39s %39s %39s", value, low, high), 3);
    free(output);
    assert_int_equal(run_untwist("solve corner-bracket.json --tol 1e-8", &output), 0);
    assert_int_equal(sscanf(strstr(output, "\nJ ") + 45, "%39s", fine), 1);
    free(output);
    assert_true(strtod(low, NULL) < strtod(fine, NULL) && strtod(fine, NULL) < strtod(high, NULL));
    assert_true(strtod(high, NULL) - strtod(low, NULL) > 1e-5 * strtod(fine, NULL));
    expect_run("solve corner-bracket.json --order 2 --quiet", 5,
               "untwist: the tolerance 1e-06 is not reached: (high - low)/value of J is ");
}

/* Not a terminal: no progress line may be mixed into what is logged. */
static void nothing_is_told_to_a_log(void **state)
{
    (void)state;
    char *output = NULL;
    assert_int_equal(run_untwist("solve t-slot-rail.json --tol 1e-9 2>&1 >/dev/null", &output), 0);
    assert_string_equal(output, "");
    free(output);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(the_table_goes_to_standard_output),
        cmocka_unit_test(a_section_may_come_from_standard_input),
        cmocka_unit_test(a_trade_shape_may_be_piped_in),
        cmocka_unit_test(json_goes_to_standard_output_or_a_file),
        cmocka_unit_test(dimensions_may_be_set),
        cmocka_unit_test(load_cases_and_probes_are_printed),
        cmocka_unit_test(wrong_cases_and_probes_are_told),
        cmocka_unit_test(wrong_options_are_told),
        cmocka_unit_test(wrong_files_are_told),
        cmocka_unit_test(a_tolerance_not_reached_has_its_own_status),
        cmocka_unit_test(nothing_is_told_to_a_log),
    };
    return cmocka_run_group_tests(tests, make_folder, remove_folder);
}
