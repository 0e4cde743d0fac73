/* SPDX-License-Identifier: GPL-3.0-or-later
 * What README.md shows is what the program does. */
#include "cli/run.h"

static char *page;

static int read_page(void **state)
{
    (void)state;
    assert_int_equal(utw_run("cat \"" UTW_SOURCE_DIR "/README.md\"", &page), 0);
    return 0;
}

static int free_page(void **state)
{
    (void)state;
    free(page);
    return 0;
}

/* The text between ```KIND and ``` after `where`. */
static char *block_after(const char *where, const char *kind)
{
    char fence[32];
    snprintf(fence, sizeof fence, "\n```%s\n", kind);
    const char *at = strstr(page, where);
    assert_non_null(at);
    const char *begin = strstr(at, fence);
    assert_non_null(begin);
    begin += strlen(fence);
    const char *end = strstr(begin, "\n```");
    assert_non_null(end);
    char *block = malloc((size_t)(end - begin) + 1);
    assert_non_null(block);
    memcpy(block, begin, (size_t)(end - begin));
    block[end - begin] = '\0';
    return block;
}

static void the_table_shown_is_the_one_printed(void **state)
{
    (void)state;
    char *shown = block_after("solve examples/corner-bracket.json` prints", "text"),
         *printed = NULL;
    int lines = 0;
    assert_int_equal(run_untwist("solve corner-bracket.json", &printed), 0);
    for (char *line = shown; *line != '\0'; lines++) {
        const size_t n = strcspn(line, "\n");
        char *next = line + n + (line[n] == '\n');
        line[n] = '\0';
        const int timing = strncmp(line, "Time", 4) == 0; /* differs from machine to machine */
        if (!timing && strstr(printed, line) == NULL) print_error("not printed: %s\n", line);
        assert_true(timing || strstr(printed, line) != NULL);
        line = next;
    }
    assert_true(lines > 40);
    free(shown);
    free(printed);
}

/* Remove blanks and line breaks. */
static void press(char *text)
{
    char *to = text;
    for (const char *c = text; *c != '\0'; c++)
        if (strchr(" \n", *c) == NULL) *to++ = *c;
    *to = '\0';
}

static void the_drawing_shown_is_the_example(void **state)
{
    (void)state;
    char *shown = block_after("## A worked run", "json"), *file = NULL;
    assert_int_equal(run_untwist("--version >/dev/null && cat corner-bracket.json", &file), 0);
    press(shown);
    press(file);
    assert_true(strlen(shown) > 300);
    assert_non_null(strstr(file, shown));
    free(shown);
    free(file);
}

static void the_scripts_it_names_exist(void **state)
{
    (void)state;
    assert_non_null(strstr(page, "sh examples/run.sh"));
    assert_non_null(strstr(page, "sh tests/run.sh"));
    for (const char *at = page; (at = strstr(at, "](")) != NULL; at++) {
        char path[200], command[500], *output = NULL;
        if (sscanf(at, "](%199[^)]", path) != 1 || strstr(path, "://") != NULL) continue;
        snprintf(command, sizeof command, "test -e \"%s/%s\"", UTW_SOURCE_DIR, path);
        const int status = utw_run(command, &output);
        if (status != 0) print_error("README.md links %s, which is not there\n", path);
        assert_int_equal(status, 0);
        free(output);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(the_table_shown_is_the_one_printed),
        cmocka_unit_test(the_drawing_shown_is_the_example),
        cmocka_unit_test(the_scripts_it_names_exist),
    };
    return cmocka_run_group_tests(tests, read_page, free_page);
}
