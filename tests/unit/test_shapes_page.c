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

static void the_page_follows_the_table(void **state)
{
    (void)state;
    static const char *const unit[] = {"length", "degrees", "per cent", "whole number"};
    utw_error err;
    char *text = NULL;
    size_t n = 0;
    assert_ok(utw_read_file(UTW_SOURCE_DIR "/docs/shapes.md", &text, &n, &err));
    char *page = malloc(n + 1);
    assert_non_null(page);
    memcpy(page, text, n);
    page[n] = '\0';
    utw_free(text);
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

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(the_page_follows_the_table)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
