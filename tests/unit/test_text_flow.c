/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/text_flow.h"

#include "support/support.h"

static const utw_type type = {.size = 2.385};

static utw_canvas *page(void)
{
    utw_error err;
    utw_canvas *c = NULL;
    assert_ok(utw_canvas_create(&c, &err));
    return c;
}

/* All lines fit, and together they are the text (blanks at breaks aside). */
static void check_flow(const char *text, double width)
{
    utw_canvas *c = page();
    int n;
    char joined[600] = "", wanted[600];
    const double end = utw_flow_text(c, 5, 7, width, text, &type, 1);
    const utw_placed_text *t = utw_canvas_placed(c, &n);
    double last = 7;
    for (int i = 0; i < n; i++) {
        size_t characters = 0;
        for (const char *s = t[i].text; *s != '\0'; s++)
            characters += ((unsigned char)*s & 0xC0) != 0x80;
        if (characters > 1) assert_true(t[i].box.x1 <= 5 + width + 1e-9);
        assert_true(t[i].box.y0 >= last - 0.5);
        last = t[i].box.y1;
        for (const char *s = t[i].text; *s != '\0'; s++)
            if (*s != ' ') strncat(joined, s, 1);
    }
    assert_true(end >= last);
    size_t k = 0;
    for (const char *s = text; *s != '\0'; s++)
        if (*s != ' ') wanted[k++] = *s;
    wanted[k] = '\0';
    assert_string_equal(joined, wanted);
    /* measuring without drawing agrees */
    assert_close(utw_flow_text(c, 5, 7, width, text, &type, 0), end, 1e-12);
    utw_canvas_free(c);
}

static void text_is_broken_to_fit(void **state)
{
    (void)state;
    static const char *const texts[] = {
        "Warping function about the shear centre, mean zero",
        "One",
        "Averyveryverylongwordwithoutanyblankinitthatmustbebrokensomewhere and more",
        "\xC3\x84\xC3\x96\xC3\x9C\xC3\x84\xC3\x96\xC3\x9C\xC3\x84\xC3\x96\xC3\x9C\xC3\x84",
        "  blanks   in  between ",
    };
    for (size_t i = 0; i < sizeof texts / sizeof *texts; i++)
        for (double width = 1; width < 150; width *= 1.7) check_flow(texts[i], width);
    utw_canvas *c = page();
    assert_close(utw_flow_text(c, 5, 7, 50, "", &type, 1), 7, 1e-14);
    utw_canvas_free(c);
}

static void notes_stand_in_columns(void **state)
{
    (void)state;
    for (double width = 20; width < 400; width += 13) {
        utw_canvas *c = page();
        utw_notes notes = {0};
        int n;
        for (int i = 0; i < 7; i++)
            utw_notes_add(&notes, i == 3 ? 1 : 0, "note %d with a value of %g mm", i, 2.385 * i);
        const double end = utw_flow_notes(c, 3, 4, width, &notes, &type, 1, NULL);
        assert_close(utw_flow_notes(c, 3, 4, width, &notes, &type, 0, NULL), end, 1e-12);
        const utw_placed_text *t = utw_canvas_placed(c, &n);
        for (int i = 0; i < n; i++) {
            assert_true(t[i].box.x0 >= 3 && t[i].box.y1 <= end + 1e-9);
            assert_true(t[i].box.x1 <= 3 + width + 1e-6 || strchr(t[i].text, ' ') == NULL);
            for (int j = 0; j < i; j++)
                assert_true(t[j].box.x1 <= t[i].box.x0 + 1e-9 ||
                            t[i].box.x1 <= t[j].box.x0 + 1e-9 ||
                            t[j].box.y1 <= t[i].box.y0 + 1e-9 || t[i].box.y1 <= t[j].box.y0 + 1e-9);
        }
        utw_canvas_free(c);
    }
}

static void too_many_notes_are_left_out(void **state)
{
    (void)state;
    utw_notes notes = {0};
    for (int i = 0; i < UTW_NOTES_MAX + 5; i++) utw_notes_add(&notes, 0, "%d", i);
    assert_int_equal(notes.n, UTW_NOTES_MAX);
    assert_string_equal(notes.note[UTW_NOTES_MAX - 1].text, "23");
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(text_is_broken_to_fit),
        balanced_test(notes_stand_in_columns),
        balanced_test(too_many_notes_are_left_out),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
