/* SPDX-License-Identifier: GPL-3.0-or-later
 * The program around its commands: help, version, wrong use. */
#include "cli/run.h"

static void help_lists_the_commands(void **state)
{
    (void)state;
    char *help = NULL, *same = NULL;
    assert_int_equal(run_untwist("--help", &help), 0);
    assert_non_null(strstr(help, "Usage: untwist COMMAND"));
    assert_non_null(strstr(help, "\n  solve FILE "));
    assert_non_null(strstr(help, "\n  shape "));
    assert_non_null(strstr(help, "\n  5  done, the tolerance was not reached"));
    assert_int_equal(run_untwist("help", &same), 0);
    assert_string_equal(help, same);
    free(same);
    assert_int_equal(run_untwist("-h", &same), 0);
    assert_string_equal(help, same);
    free(same);
    free(help);
}

/* Every command that help lists has a help of its own, by both ways, and no line of it is too wide.
 */
static void every_command_has_help(void **state)
{
    (void)state;
    char *help = NULL;
    int n = 0;
    assert_int_equal(run_untwist("--help", &help), 0);
    const char *line = strstr(help, "Commands:\n") + strlen("Commands:\n");
    for (; line[0] == ' '; line = strchr(line, '\n') + 1) {
        char name[32], ask[64], start[64], *text = NULL, *same = NULL;
        if (line[2] == ' ') continue; /* goes on with the command above */
        assert_int_equal(sscanf(line, " %31s", name), 1);
        snprintf(ask, sizeof ask, "help %s", name);
        snprintf(start, sizeof start, "Usage: untwist %s", name);
        assert_int_equal(run_untwist(ask, &text), 0);
        assert_memory_equal(text, start, strlen(start));
        for (const char *l = text; *l != '\0'; l += strcspn(l, "\n") + 1)
            assert_true(strcspn(l, "\n") <= 80);
        snprintf(ask, sizeof ask, "%s --help", name);
        assert_int_equal(run_untwist(ask, &same), 0);
        assert_string_equal(text, same);
        free(text);
        free(same);
        n++;
    }
    assert_true(n >= 3);
    free(help);
}

/* The manual page has the commands and the options that help has, and no others. */
static void the_manual_page_has_every_option(void **state)
{
    (void)state;
    char *page = NULL, *help = NULL;
    assert_int_equal(run_untwist("--version >/dev/null && cat ../docs/untwist.1", &page), 0);
    assert_int_equal(run_untwist("--help", &help), 0);
    for (char *at = strstr(page, "\n.SS "); at != NULL; at = strstr(at + 1, "\n.SS ")) {
        char name[32], ask[64], *text = NULL;
        assert_int_equal(sscanf(at, "\n.SS %31s", name), 1);
        snprintf(ask, sizeof ask, "help %s", name);
        assert_int_equal(run_untwist(ask, &text), 0);
        char *end = strstr(at + 1, "\n.S");
        assert_non_null(end);
        *end = '\0'; /* the section of this command alone */
        int in_help = 0, in_page = 0;
        for (char *o = strstr(text, "\n  --"); o != NULL; o = strstr(o + 1, "\n  --"), in_help++) {
            char option[64], entry[80];
            assert_int_equal(sscanf(o, "\n  --%63[a-z]", option), 1);
            snprintf(entry, sizeof entry, "\\-\\-%s", option);
            if (strstr(at, entry) == NULL)
                print_error("docs/untwist.1: %s lacks --%s\n", name, option);
            assert_non_null(strstr(at, entry));
        }
        in_help += strstr(text, "\n  -o, --output ") != NULL; /* the one with a short name */
        for (char *o = strstr(at, " \\-\\-"); o != NULL; o = strstr(o + 1, " \\-\\-")) in_page++;
        assert_int_equal(in_page, in_help);
        *end = '\n';
        free(text);
    }
    const char *line = strstr(help, "Commands:\n") + strlen("Commands:\n");
    for (; line[0] == ' '; line = strchr(line, '\n') + 1) {
        char name[32], entry[40];
        if (line[2] == ' ') continue;
        assert_int_equal(sscanf(line, " %31s", name), 1);
        snprintf(entry, sizeof entry, "\n.SS %s\n", name);
        assert_non_null(strstr(page, entry));
    }
    free(help);
    free(page);
}

static void version_names_the_libraries(void **state)
{
    (void)state;
    char *output = NULL, version[32], solver[32], mesher[32], rest[8];
    assert_int_equal(run_untwist("--version", &output), 0);
    assert_int_equal(sscanf(output, "untwist %31[0-9.]\nCHOLMOD %31[0-9.]\nGmsh %31[^\n]\n%7s",
                            version, solver, mesher, rest),
                     3);
    assert_string_equal(version, utw_version());
    char known[64];
    utw_solver_version(known, sizeof known);
    assert_string_equal(solver, known + strlen("CHOLMOD "));
    utw_mesher_version(known, sizeof known);
    assert_string_equal(mesher, known + strlen("Gmsh "));
    free(output);
}

static void wrong_use_is_told(void **state)
{
    (void)state;
    expect_run("", 2, "untwist: no command is given; 'untwist --help' lists them\n");
    expect_run("sovle x.json", 2, "untwist: unknown command 'sovle'; did you mean 'solve'?\n");
    expect_run("xyzzy", 2,
               "untwist: unknown command 'xyzzy'; 'untwist --help' lists the commands\n");
    expect_run("help sovle", 2, "untwist: unknown command 'sovle'; did you mean 'solve'?\n");
    expect_run(
        "corner-bracket.json", 2,
        "untwist: 'corner-bracket.json' is a file, not a command; did you mean 'untwist solve "
        "corner-bracket.json'?\n");
    expect_run("--quiet solve x.json", 2,
               "untwist: unknown option '--quiet'; options follow the command");
    expect_run("help solve shape", 2, "untwist: help: one operand too many: 'shape'");
}

/* The real program ends with every status that docs/untwist.1 lists, but for those of checks that
 * are asked for. */
static void the_program_ends_with_its_status(void **state)
{
    (void)state;
    static const struct {
        const char *arguments;
        int status;
    } list[] = {
        {"solve corner-bracket.json >/dev/null", 0},
        {"solve corner-bracket.json --tol 2 2>&1", 2},
        {"solve no-such-file.json 2>&1", 3},
        {"solve corner-bracket.json --order 2 --quiet 2>&1", 5},
    };
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        char *output = NULL;
        assert_int_equal(run_untwist(list[i].arguments, &output), list[i].status);
        free(output);
    }
}

/* What the process may have is narrowed until a solution that needs some 100 MB does not fit. */
static void too_little_memory_is_no_result(void **state)
{
    (void)state;
#ifdef __SANITIZE_ADDRESS__
    skip(); /* the sanitizer itself asks for terabytes of addresses */
#endif
    static const int limit[] = {400, 500, 350, 600}; /* MB: what the libraries take differs */
    int found = 0;
    for (size_t i = 0; i < sizeof limit / sizeof *limit && !found; i++) {
        char command[600], *output = NULL;
        snprintf(command, sizeof command,
                 "ulimit -v %d && OPENBLAS_NUM_THREADS=1 OMP_NUM_THREADS=1 timeout 60 \"%s\" "
                 "solve \"%s/examples/t-slot-rail.json\" --tol 1e-12 --quiet 2>&1",
                 limit[i] * 1000, UTW_PROGRAM, UTW_SOURCE_DIR);
        if (utw_run(command, &output) == 4) {
            assert_memory_equal(output, "untwist: out of memory", 22);
            found = 1;
        }
        free(output);
    }
    assert_true(found);
}

static void output_that_cannot_be_written_is_an_error(void **state)
{
    (void)state;
    char *output = NULL;
    if (utw_run("test -w /dev/full", &output) == 0) {
        static const char *const quiet[] = {"--help", "shape", "solve corner-bracket.json"};
        for (size_t i = 0; i < sizeof quiet / sizeof *quiet; i++) {
            char arguments[100], *message = NULL;
            snprintf(arguments, sizeof arguments, "%s 2>&1 >/dev/full", quiet[i]);
            assert_int_equal(run_untwist(arguments, &message), 3);
            assert_string_equal(
                message, "untwist: standard output cannot be written: No space left on device\n");
            free(message);
        }
    }
    free(output);
    /* a reader that has gone: the status is ours, not a death by signal */
    assert_int_equal(run_untwist("help solve 2>&1 >&-", &output), 3);
    assert_memory_equal(output, "untwist: standard output cannot be written", 42);
    free(output);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(help_lists_the_commands),
        cmocka_unit_test(every_command_has_help),
        cmocka_unit_test(the_manual_page_has_every_option),
        cmocka_unit_test(version_names_the_libraries),
        cmocka_unit_test(wrong_use_is_told),
        cmocka_unit_test(the_program_ends_with_its_status),
        cmocka_unit_test(too_little_memory_is_no_result),
        cmocka_unit_test(output_that_cannot_be_written_is_an_error),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
