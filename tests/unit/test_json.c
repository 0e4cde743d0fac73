/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/json.h"
#include "support/support.h"

static void the_tree_holds_what_the_text_says(void **state)
{
    (void)state;
    const char *text = "\xEF\xBB\xBF {\"a\": [1, -2.5e3], \"b\": {\"c\": \"\\u00e9\\n\"}, \"d\": "
                       "true, \"e\": null, \"A\": 1e999}\n";
    utw_error err;
    utw_json *json = NULL;
    assert_ok(utw_json_parse(text, strlen(text), &json, &err));
    assert_int_equal(utw_json_kind_of(json), UTW_JSON_OBJECT);
    assert_int_equal(utw_json_count(json), 5);
    const utw_json *m = utw_json_first(json);
    assert_string_equal(utw_json_key(m), "a");
    assert_string_equal(utw_json_kind_text(m), "an array");
    assert_true(utw_json_number(utw_json_next(utw_json_first(m))) == -2500);
    m = utw_json_next(m);
    assert_string_equal(utw_json_string(utw_json_first(m)), "\xC3\xA9\n");
    m = utw_json_next(m);
    assert_string_equal(utw_json_kind_text(m), "true or false");
    m = utw_json_next(m);
    assert_string_equal(utw_json_kind_text(m), "null");
    m = utw_json_next(m);
    assert_string_equal(utw_json_key(m), "A");
    assert_true(isinf(utw_json_number(m)));
    assert_null(utw_json_next(m));
    utw_json_free(json);
}

static void numbers_are_read_to_the_last_bit(void **state)
{
    (void)state;
    const double value[] = {
        0.1, 2.385, 1.0 / 3, -1.7976931348623157e308, 5e-324, 123456789.123456789};
    for (size_t i = 0; i < sizeof value / sizeof value[0]; i++) {
        char text[64];
        utw_error err;
        utw_json *json = NULL;
        snprintf(text, sizeof text, "%.17g", value[i]);
        assert_ok(utw_json_parse(text, strlen(text), &json, &err));
        assert_true(utw_json_number(json) == value[i]);
        utw_json_free(json);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(the_tree_holds_what_the_text_says),
        cmocka_unit_test(numbers_are_read_to_the_last_bit),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
