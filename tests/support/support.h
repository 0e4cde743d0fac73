/* SPDX-License-Identifier: GPL-3.0-or-later
 * What every test needs: cmocka in its required order, comparisons in double precision, small helpers. */
#ifndef UTW_TESTS_SUPPORT_H
#define UTW_TESTS_SUPPORT_H

#include <setjmp.h>
#include <stdarg.h>
#include <stddef.h>
#include <stdint.h>
#include <cmocka.h>

#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "untwist.h"

/** |actual - expected| <= rtol * max(|expected|, scale); prints both to 17 digits. cmocka's own comparison
 *  works in single precision. Pass scale = 0 for a purely relative comparison. */
#define assert_close_scaled(actual, expected, rtol, scale)                                         \
    utw_assert_close(actual, expected, rtol, scale, #actual, __FILE__, __LINE__)
#define assert_close(actual, expected, rtol) assert_close_scaled(actual, expected, rtol, 0.0)
void utw_assert_close(double actual, double expected, double rtol, double scale, const char *what,
                      const char *file, int line);

/** The call must succeed; its message is printed when it does not. `err` is a utw_error in scope. */
#define assert_ok(call)                                                                            \
    do {                                                                                           \
        const utw_status status_of_call = (call);                                                  \
        if (status_of_call != UTW_OK) print_error("%s\n", err.text);                               \
        assert_int_equal(status_of_call, UTW_OK);                                                  \
    } while (0)

/** cmocka setup and teardown that check that every block allocated in between has been freed. */
int utw_balance_setup(void **state);
int utw_balance_teardown(void **state);

/** A test with the balance check around it. */
#define balanced_test(f) cmocka_unit_test_setup_teardown(f, utw_balance_setup, utw_balance_teardown)

/** Read an outline from JSON text; the test fails with the message when it is refused. Owned by the caller. */
utw_outline *utw_outline_of(const char *json);

/** Run a shell command, capture standard output (and error, when the command says 2>&1). Returns the exit status;
 *  *output is malloc'ed text the caller frees with free(). */
int utw_run(const char *command, char **output);

#endif
