/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/text.h"

#include "base/memory.h"
#include "support/support.h"

static void text_grows(void **state)
{
    (void)state;
    utw_text t = {.text = NULL};
    for (int i = 0; i < 1000; i++) utw_text_add(&t, "%03d,", i);
    assert_int_equal(t.n, 4000);
    assert_int_equal(strlen(t.text), 4000);
    assert_memory_equal(t.text + 4 * 123, "123,124,", 8);
    utw_text_clear(&t);
    assert_null(t.text);
}

static void numbers_are_short_and_exact(void **state)
{
    (void)state;
    static const double value[] = {
        0.1, 8.5, 1.0 / 3, 100, 1e-7, -2.385, 0.1 + 0.2, 5e-324, 1.7976931348623157e308};
    for (size_t i = 0; i < sizeof value / sizeof *value; i++) {
        utw_text t = {.text = NULL};
        utw_text_add_number(&t, value[i]);
        assert_true(strtod(t.text, NULL) == value[i]);
        utw_text_clear(&t);
    }
    utw_text t = {.text = NULL};
    utw_text_add_number(&t, 0.1);
    utw_text_add(&t, " ");
    utw_text_add_number(&t, -0.0);
    utw_text_add(&t, " ");
    utw_text_add_number(&t, 0.1 + 0.2);
    assert_string_equal(t.text, "0.1 0 0.30000000000000004");
    utw_text_clear(&t);
}

static void columns_count_characters(void **state)
{
    (void)state;
    utw_text t = {.text = NULL};
    assert_int_equal(utw_text_column(&t), 0);
    utw_text_add(&t, "first\nTr\xc3\xa4ger"); /* a letter of two bytes */
    assert_int_equal(utw_text_column(&t), 6);
    utw_text_pad(&t, 9);
    utw_text_add(&t, "x");
    utw_text_pad(&t, 3);
    utw_text_repeat(&t, '-', 2);
    utw_text_repeat(&t, '-', -2);
    assert_string_equal(t.text, "first\nTr\xc3\xa4ger   x--");
    utw_text_clear(&t);
}

static void words_are_wrapped(void **state)
{
    (void)state;
    utw_text t = {.text = NULL};
    utw_text_add(&t, "Note: ");
    utw_text_wrap(&t, 6, 20, "one two three four  five\nsix abcdefghijklmnopqrstuvwxyz seven");
    assert_string_equal(t.text, "Note: one two three\n"
                                "      four five\n"
                                "      six\n"
                                "      abcdefghijklmnopqrstuvwxyz\n"
                                "      seven\n");
    utw_text_clear(&t);
    utw_text_wrap(&t, 2, 20, "");
    assert_string_equal(t.text, "\n");
    utw_text_clear(&t);
}

static void taking_hands_over(void **state)
{
    (void)state;
    utw_text t = {.text = NULL};
    utw_error err;
    char *text = NULL;
    assert_ok(utw_text_take(&t, &text, &err));
    assert_string_equal(text, "");
    utw_free(text);
    utw_text_add(&t, "2.385 mm");
    assert_ok(utw_text_take(&t, &text, &err));
    assert_string_equal(text, "2.385 mm");
    assert_true(t.text == NULL && t.n == 0);
    utw_free(text);
    text = NULL;
    utw_memory_fail_at(1);
    utw_text_add(&t, "lost");
    utw_memory_fail_at(0);
    assert_int_equal(utw_text_take(&t, &text, &err), UTW_E_NOMEM);
    assert_null(text);
}

static void memory_that_runs_out_is_remembered(void **state)
{
    (void)state;
    utw_text t = {.text = NULL};
    utw_text_add(&t, "kept");
    utw_memory_fail_at(1);
    for (int i = 0; i < 100; i++) utw_text_add(&t, "0123456789");
    utw_memory_fail_at(0);
    assert_true(t.out_of_memory);
    const size_t n = t.n;
    utw_text_add(&t, "more");
    assert_int_equal(t.n, n);
    assert_int_equal(strlen(t.text), n);
    utw_text_clear(&t);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(text_grows),
        balanced_test(numbers_are_short_and_exact),
        balanced_test(columns_count_characters),
        balanced_test(words_are_wrapped),
        balanced_test(taking_hands_over),
        balanced_test(memory_that_runs_out_is_remembered),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
