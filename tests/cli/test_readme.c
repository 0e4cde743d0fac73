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

/* The next word of a line of `n` bytes; returns its length and moves *at behind it. */
static int next_word(const char **at, const char *end, const char **word)
{
    while (*at < end && **at == ' ') ++*at;
    *word = *at;
    while (*at < end && **at != ' ') ++*at;
    return (int)(*at - *word);
}

/* 1 when two lines have the same words, numbers being the same to five digits: the last ones move
 * when the refinement is improved. */
static int same_line(const char *a, const char *a_end, const char *b, const char *b_end)
{
    for (;;) {
        const char *u, *v;
        const int m = next_word(&a, a_end, &u), n = next_word(&b, b_end, &v);
        if (m == 0 || n == 0) return m == n;
        if (m == n && memcmp(u, v, (size_t)m) == 0) continue;
        char *stop_u, *stop_v;
        const double x = strtod(u, &stop_u), y = strtod(v, &stop_v);
        if (stop_u != u + m || stop_v != v + n) return 0;
        if (fabs(x - y) > 1e-5 * fmax(fmax(fabs(x), fabs(y)), 1)) return 0;
    }
}

/* Line by line, but for what the solution took: that differs from machine to machine. */
static void the_table_shown_is_the_one_printed(void **state)
{
    (void)state;
    char *shown = block_after("solve examples/corner-bracket.json` prints", "text"),
         *printed = NULL;
    assert_int_equal(run_untwist("solve corner-bracket.json", &printed), 0);
    const char *a = shown, *b = printed;
    int lines = 0, own = 0;
    for (; *a != '\0' && *b != '\0'; lines++) {
        const char *a_end = a + strcspn(a, "\n"), *b_end = b + strcspn(b, "\n");
        if (strncmp(a, "Solution", 8) == 0) own = 1;
        if (strncmp(a, "Trust", 5) == 0) own = 0;
        if (!own && !same_line(a, a_end, b, b_end)) {
            print_error("README.md shows\n%.*s\nuntwist prints\n%.*s\n", (int)(a_end - a), a,
                        (int)(b_end - b), b);
            fail();
        }
        a = a_end + (*a_end == '\n');
        b = b_end + (*b_end == '\n');
    }
    assert_true(*a == '\0' && *b == '\0' && lines > 40);
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
