/* SPDX-License-Identifier: GPL-3.0-or-later
 * The command "untwist shape", run as a user runs it. */
#include <unistd.h>

#include "cli/run.h"
#include "outline/outline.h"

/* The output (with errors) and status of untwist shape ARGUMENTS. */
static int run(const char *arguments, char **output)
{
    char command[600];
    snprintf(command, sizeof command, "shape %s", arguments);
    return run_untwist_all(command, output);
}

static void expect(const char *arguments, int status, const char *start)
{
    char command[600];
    snprintf(command, sizeof command, "shape %s", arguments);
    expect_run(command, status, start);
}

static void lists_and_shows(void **state)
{
    (void)state;
    char *output = NULL;
    assert_int_equal(run("", &output), 0);
    for (int i = 0; i < utw_shape_count(); i++) {
        utw_shape_info info;
        utw_error err;
        char line[100];
        assert_ok(utw_shape_get_info(i, &info, &err));
        snprintf(line, sizeof line, "%-16s%s\n", info.name, info.meaning);
        assert_non_null(strstr(output, line));
        char *shown = NULL;
        assert_int_equal(run(info.name, &shown), 0);
        assert_non_null(strstr(shown, info.drawing));
        for (int k = 0; k < info.n_dimension; k++) {
            snprintf(line, sizeof line, "  %-10s%s", info.dimension[k].key,
                     info.dimension[k].meaning);
            assert_non_null(strstr(shown, line));
        }
        free(shown);
    }
    assert_non_null(strstr(output, "                h b tf tw [r] [r2] [slope] [slope_deg] [u]\n"));
    free(output);
}

static void writes_a_section_file(void **state)
{
    (void)state;
    char *output = NULL;
    assert_int_equal(
        run("angle h=60 t=6 r=8 r2=4 --units 'in lbf' --at -3,1.5 --turn 90 --mirror", &output), 0);
    utw_outline *o = utw_outline_of(output);
    assert_string_equal(utw_outline_units(o), "in lbf");
    assert_string_equal(utw_outline_name(o), "angle h=60 t=6 r=8 r2=4");
    assert_true(o->box[0] == -63 && o->box[1] == -58.5 && o->box[2] == -3 && o->box[3] == 1.5);
    utw_outline_free(o);
    free(output);
}

static void wrong_use_and_wrong_input_are_told_apart(void **state)
{
    (void)state;
    expect("sausage", 2, "untwist: shape: there is no shape \"sausage\"; there are rectangle");
    expect("chanel", 2,
           "untwist: shape: there is no shape \"chanel\"; did you mean \"channel\"?\n");
    expect("tube d=20", 2,
           "untwist: shape: tube: t (wall thickness) is missing: it needs a value\n");
    expect("tube d=20 t", 2, "untwist: shape: a dimension is given as KEY=VALUE, not 't'\n");
    expect("tube d=20 =3", 2, "untwist: shape: a dimension is given as KEY=VALUE, not '=3'\n");
    expect("tube d=20 t=3mm", 2, "untwist: shape: not a number: 't=3mm'\n");
    expect("tube d=20 t=", 2, "untwist: shape: not a number: 't='\n");
    expect("tube d=20 t=nan", 2, "untwist: shape: not a number: 't=nan'\n");
    expect("tube d=20 x=3", 2, "untwist: shape: tube: there is no dimension \"x\"; it has d, t\n");
    expect("tube d=20 t=3 --units mm", 2, "untwist: shape: units is \"mm\"; it must be a length");
    expect("tube d=20 t=3 --units", 2, "untwist: shape: --units needs a value: --units UNITS\n");
    expect("tube d=20 t=3 --turn left", 2, "untwist: shape: --turn must be a number, not 'left'\n");
    expect("tube d=20 t=3 --at 3", 2, "untwist: shape: --at takes X,Y, not '3'\n");
    expect("tube d=20 t=3 --at 3,4,5", 2, "untwist: shape: --at takes X,Y, not '3,4,5'\n");
    expect("tube d=20 t=3 --colour red", 2, "untwist: shape: unknown option '--colour'");
    expect("--mirror", 2, "untwist: shape: name a shape; ");
    expect("tube d=20 t=10", 3,
           "untwist: shape: tube: t = 10 does not fit: less than 10 with d = 20\n");
    expect("tube d=20 t=-1", 3, "untwist: shape: tube: t = -1 must be more than 0\n");
    expect("tube d=20 t=3 --at 1e300,0", 3, "untwist: shape: ");
    expect("--help", 0, "Usage: untwist shape [NAME [KEY=VALUE]...] [--units UNITS]");
}

static void a_full_disk_is_noticed(void **state)
{
    (void)state;
    char *output = NULL;
    if (access("/dev/full", W_OK) != 0) skip();
    char command[300];
    snprintf(command, sizeof command, "\"%s\" shape tube d=20 t=3 2>&1 >/dev/full", UTW_PROGRAM);
    assert_int_equal(utw_run(command, &output), 3);
    assert_string_equal(output,
                        "untwist: standard output cannot be written: No space left on device\n");
    free(output);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(lists_and_shows),
        cmocka_unit_test(writes_a_section_file),
        cmocka_unit_test(wrong_use_and_wrong_input_are_told_apart),
        cmocka_unit_test(a_full_disk_is_noticed),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
