/* SPDX-License-Identifier: GPL-3.0-or-later
 * Running the program, inside the test or by the shell. */
#include "cli/run.h"

#include <fcntl.h>
#include <unistd.h>

#include "cli/program.h"

enum { MOST_WORDS = 40, MOST_TEXT = 1200 };

/* The words of a line, taken out of their single quotes. Returns their number; text is changed. */
static int split(char *text, char *word[MOST_WORDS])
{
    int n = 0, quoted = 0, inside = 0;
    char *to = text;
    for (const char *c = text; *c != '\0'; c++) {
        if (*c == ' ' && !quoted) {
            if (inside) *to++ = '\0';
            inside = 0;
            continue;
        }
        if (!inside) {
            assert_true(n < MOST_WORDS);
            word[n++] = to;
            inside = 1;
        }
        if (*c == '\'')
            quoted = !quoted;
        else
            *to++ = *c;
    }
    assert_false(quoted);
    *to = '\0';
    return n;
}

/* All of an open file from its start; malloc'ed. */
static char *contents(int file)
{
    const off_t n = lseek(file, 0, SEEK_END);
    assert_true(n >= 0);
    char *text = malloc((size_t)n + 1);
    assert_non_null(text);
    assert_int_equal(pread(file, text, (size_t)n, 0), n);
    text[n] = '\0';
    return text;
}

/* Run it here: standard output (and standard error) go to a file meanwhile, and the folder is that
 * of the examples. */
static int run_inside(const char *arguments, int messages, char **output)
{
    char text[MOST_TEXT], name[] = "untwist", path[] = "/tmp/untwist-run-XXXXXX",
                          *word[MOST_WORDS + 1] = {name};
    assert_true(strlen(arguments) < sizeof text);
    strcpy(text, arguments);
    const int n = 1 + split(text, word + 1);
    const int file = mkstemp(path), out = dup(1), err = dup(2), here = open(".", O_RDONLY);
    assert_true(file >= 0 && out >= 0 && err >= 0 && here >= 0);
    assert_int_equal(unlink(path), 0);
    fflush(stdout);
    fflush(stderr);
    assert_int_equal(chdir(UTW_SOURCE_DIR "/examples"), 0);
    assert_int_equal(dup2(file, 1), 1);
    if (messages) assert_int_equal(dup2(file, 2), 2);
    const int status = cli_program(n, word);
    fflush(stdout);
    fflush(stderr);
    assert_int_equal(dup2(out, 1), 1);
    assert_int_equal(dup2(err, 2), 2);
    assert_int_equal(fchdir(here), 0);
    *output = contents(file);
    close(file);
    close(out);
    close(err);
    close(here);
    return status;
}

static int run(const char *arguments, int messages, char **output)
{
    char command[MOST_TEXT + 400];
    if (strpbrk(arguments, "<>|&;$`\"\\*?~#(){}\n") == NULL)
        return run_inside(arguments, messages, output);
    const int n = snprintf(command, sizeof command, "cd \"%s/examples\" && \"%s\" %s%s",
                           UTW_SOURCE_DIR, UTW_PROGRAM, arguments, messages ? " 2>&1" : "");
    assert_true(n > 0 && (size_t)n < sizeof command);
    return utw_run(command, output);
}

int run_untwist(const char *arguments, char **output)
{
    return run(arguments, 0, output);
}

int run_untwist_all(const char *arguments, char **output)
{
    return run(arguments, 1, output);
}

void expect_run(const char *arguments, int status, const char *start)
{
    char *output = NULL;
    const int got = run(arguments, 1, &output);
    const int same = strncmp(output, start, strlen(start)) == 0;
    if (got != status || !same)
        print_error("untwist %s\n  status %d, output:\n%s\n", arguments, got, output);
    free(output);
    assert_int_equal(got, status);
    assert_true(same);
}

int output_holds(const char *arguments, const char *part)
{
    char *output = NULL;
    run(arguments, 1, &output);
    const int found = strstr(output, part) != NULL;
    free(output);
    return found;
}
