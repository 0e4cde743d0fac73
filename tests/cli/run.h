/* SPDX-License-Identifier: GPL-3.0-or-later
 * Running the program as a user types it, for the tests of this folder.
 *
 * A start of the program costs 0.1 s, most of it the dynamic loader's work on Gmsh, and far more
 * under a sanitizer. What is typed without the signs of the shell is therefore run inside the test,
 * by the same function that main() calls; anything with a redirection, a pipe or a variable goes
 * through the shell and the real program. */
#ifndef UTW_TESTS_CLI_RUN_H
#define UTW_TESTS_CLI_RUN_H

#include "support/support.h"

/** Run `untwist ARGUMENTS`, in the folder of the examples. [in] arguments: words, in single quotes
 * where they hold blanks; may redirect; put 2>&1 to see messages. [out] *output, malloc'ed: free().
 * Returns the exit status. */
int run_untwist(const char *arguments, char **output);

/** The same with the messages in the output, without a shell if that can be. */
int run_untwist_all(const char *arguments, char **output);

/** The run must end with this status and its output, messages included, begin with `start`. */
void expect_run(const char *arguments, int status, const char *start);

/** 1 when the output of a run, messages included, holds `part`. */
int output_holds(const char *arguments, const char *part);

#endif
