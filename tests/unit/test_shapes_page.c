/* SPDX-License-Identifier: GPL-3.0-or-later
 * docs/shapes.md says of every shape what the program's own table says. */
#include "outline/read.h"

#include <ctype.h>

#include "base/memory.h"
#include "outline/shape.h"
#include "support/support.h"

static void expect(const char *page, const char *text)
{
    if (strstr(page, text) == NULL) print_error("not in docs/shapes.md: %s\n", text);
    assert_non_null(strstr(page, text));
}

/* The page, ended by a NUL; free with free(). */
static char *read_page(void)
{
    utw_error err;
    char *text = NULL;
    size_t n = 0;
    assert_ok(utw_read_file(UTW_SOURCE_DIR "/docs/shapes.md", &text, &n, &err));
    char *page = malloc(n + 1);
    assert_non_null(page);
    memcpy(page, text, n);
    page[n] = '\0';
    utw_free(text);
    return page;
}

static void the_page_follows_the_table(void **state)
{
    (void)state;
    static const char *const unit[] = {"length", "degrees", "per cent", "whole number"};
    char *page = read_page();
    for (int i = 0; i < utw_shape_count(); i++) {
        const utw_shape *shape = utw_shape_at(i);
        char line[400], otherwise[60];
        snprintf(line, sizeof line, "\n## %s\n\n%c%s. Origin: %s.\n", shape->name,
                 toupper(shape->meaning[0]), shape->meaning + 1, shape->origin);
        const char *section = strstr(page, line);
        if (section == NULL) print_error("not in docs/shapes.md: %s\n", line);
        assert_non_null(section);
        expect(section, shape->drawing);
        for (int k = 0; k < shape->n_dimension; k++) {
            const utw_shape_dimension *d = &shape->dimension[k];
            snprintf(otherwise, sizeof otherwise, "%.10g", d->fallback);
            snprintf(line, sizeof line, "\n| `%s` | %s | %s | %s |\n", d->key, d->meaning,
                     unit[d->unit],
                     d->required               ? "required"
                     : d->otherwise[0] != '\0' ? d->otherwise
                                               : otherwise);
            expect(section, line);
        }
    }
    free(page);
}

static void its_examples_are_read(void **state)
{
    (void)state;
    char *page = read_page();
    int count = 0;
    for (char *at = page; (at = strstr(at, "```json\n")) != NULL; count++) {
        at += 8;
        char *end = strstr(at, "\n```");
        assert_non_null(end);
        *end = '\0';
        utw_outline_free(utw_outline_of(at));
        at = end + 4;
    }
    free(page);
    assert_true(count >= 2);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(the_page_follows_the_table),
                                       balanced_test(its_examples_are_read)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
