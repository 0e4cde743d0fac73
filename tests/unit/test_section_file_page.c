/* SPDX-License-Identifier: GPL-3.0-or-later
 * Every example of docs/section-file.md is read: a whole file when it starts with {, one loop when
 * with [. */
#include "outline/read.h"

#include "base/memory.h"
#include "support/support.h"

static void read_example(const char *text, int n)
{
    char file[4096];
    utw_error err;
    utw_outline *outline = NULL;
    const int is_loop = text[0] == '[';
    assert_true(n < 4000);
    snprintf(file, sizeof file, "%s%.*s%s",
             is_loop ? "{\"units\": \"mm N\", \"parts\": [{\"outline\":" : "", n, text,
             is_loop ? "}]}" : "");
    const utw_status st = utw_outline_parse(file, strlen(file), "example", &outline, &err);
    if (st != UTW_OK) print_error("%s\n%s\n", file, err.text);
    assert_int_equal(st, UTW_OK);
    utw_outline_free(outline);
}

static void every_example_is_read(void **state)
{
    (void)state;
    char *text = NULL;
    size_t n = 0;
    utw_error err;
    assert_ok(utw_read_file(UTW_SOURCE_DIR "/docs/section-file.md", &text, &n, &err));
    char *page = malloc(n + 1);
    assert_non_null(page);
    memcpy(page, text, n);
    page[n] = '\0';
    utw_free(text);
    int count = 0;
    for (const char *at = page; (at = strstr(at, "```json\n")) != NULL; count++) {
        at += 8;
        const char *end = strstr(at, "\n```");
        assert_non_null(end);
        read_example(at, (int)(end - at));
        at = end + 4;
    }
    free(page);
    assert_true(count >= 8);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(every_example_is_read)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
