/* SPDX-License-Identifier: GPL-3.0-or-later
 * Running the program as a user types it, for the tests of this folder. */
#ifndef UTW_TESTS_CLI_RUN_H
#define UTW_TESTS_CLI_RUN_H

#include "support/support.h"

/** Run `untwist ARGUMENTS` in a shell, in the folder of the examples. [in] arguments: may redirect;
 * put 2>&1 to see messages. [out] *output, malloc'ed: free(). Returns the exit status. */
static inline int run_untwist(const char *arguments, char **output)
{
    char command[1200];
    const int n = snprintf(command, sizeof command, "cd \"%s/examples\" && \"%s\" %s",
                           UTW_SOURCE_DIR, UTW_PROGRAM, arguments);
    assert_true(n > 0 && (size_t)n < sizeof command);
    return utw_run(command, output);
}

/** The run must end with this status and its output, messages included, begin with `start`. */
static inline void expect_run(const char *arguments, int status, const char *start)
{
    char both[1000], *output = NULL;
    snprintf(both, sizeof both, "%s 2>&1", arguments);
    const int got = run_untwist(both, &output);
    const int same = strncmp(output, start, strlen(start)) == 0;
    if (got != status || !same)
        print_error("untwist %s\n  status %d, output:\n%s\n", arguments, got, output);
    free(output);
    assert_int_equal(got, status);
    assert_true(same);
}

/** 1 when the output of a run, messages included, holds `part`. */
static inline int output_holds(const char *arguments, const char *part)
{
    char both[1000], *output = NULL;
    snprintf(both, sizeof both, "%s 2>&1", arguments);
    run_untwist(both, &output);
    const int found = strstr(output, part) != NULL;
    free(output);
    return found;
}

#endif
