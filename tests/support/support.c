/* SPDX-License-Identifier: GPL-3.0-or-later
 * Comparisons, balance of allocations, running the program. */
#include "support/support.h"

#include <sys/wait.h>

#include "base/memory.h"

void utw_assert_close(double actual, double expected, double rtol, double scale, const char *what,
                      const char *file, int line)
{
    const double allowed = rtol * fmax(fabs(expected), scale);
    if (fabs(actual - expected) <= allowed) return; /* false for NaN as well */
    print_error("%s = %.17g, expected %.17g, differs by %.3g, allowed %.3g\n", what, actual, expected,
                fabs(actual - expected), allowed);
    _fail(file, line);
}

int utw_balance_setup(void **state)
{
    (void)state;
    utw_memory_fail_at(0);
    long *before = malloc(sizeof *before);
    if (before == NULL) return -1;
    *before = utw_memory_live();
    *state = before;
    return 0;
}

int utw_balance_teardown(void **state)
{
    long *before = *state;
    const long now = utw_memory_live(), then = *before;
    free(before);
    if (now != then) print_error("%ld blocks were not freed\n", now - then);
    return now == then ? 0 : -1;
}

int utw_run(const char *command, char **output)
{
    FILE *pipe = popen(command, "r");
    assert_non_null(pipe);
    size_t n = 0, capacity = 4096;
    char *text = malloc(capacity);
    assert_non_null(text);
    for (int c; (c = fgetc(pipe)) != EOF;) {
        if (n + 2 > capacity) {
            text = realloc(text, capacity *= 2);
            assert_non_null(text);
        }
        text[n++] = (char)c;
    }
    text[n] = '\0';
    *output = text;
    const int status = pclose(pipe);
    return WIFEXITED(status) ? WEXITSTATUS(status) : -1;
}
