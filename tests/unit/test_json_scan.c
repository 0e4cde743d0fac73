/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/json_scan.h"
#include "support/support.h"

static const char *const sound[] = {
    "{}",
    "[]",
    " [ ] ",
    "0",
    "-0.5e-7",
    "\"\"",
    "true",
    "[null,false]",
    "{\"a\":[{},[]],\"b\":\"\\\\\\\"\\/\"}",
    "\"\\uD83D\\uDE00 \xF0\x9F\x98\x80 \xED\x9F\xBF\"",
    "[1E+5,\t\r\n2]",
    "[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[]]]]]]]]]]]]]]]]]]]]]]]]]]]]]]]]",
};

static const struct {
    const char *text;
    const char *message;
} wrong[] = {
    {"", "the file is empty; a section file starts with {"},
    {" \n", "the file is empty; a section file starts with {"},
    {"{\n  \"a\": [1, 2\n",
     "line 3, column 1: the text ends before its brackets are closed; ] is missing"},
    {"{\"a\": 1} x", "line 1, column 10: text follows the end of the section; remove it"},
    {"[1, 2,\n ]", "line 1, column 6: a comma stands before the closing ]; remove it"},
    {"{\"a\": 1,}", "line 1, column 8: a comma stands before the closing }; remove it"},
    {"[1 2]", "line 1, column 4: expected a comma or ], not 2"},
    {"{\"a\" 1}", "line 1, column 6: expected a colon after the key, not 1"},
    {"{\"a\": 1]", "line 1, column 8: expected }, not ]"},
    {"[}", "line 1, column 2: expected ], not }"},
    {"{a: 1}", "line 1, column 2: a must stand in double quotes"},
    {"{true: 1}", "line 1, column 6: a key must stand in double quotes"},
    {"{1: 1}", "line 1, column 2: expected a key in double quotes, not 1"},
    {"{'a': 1}", "line 1, column 2: strings stand in double quotes, not in '"},
    {"[NaN]", "line 1, column 2: NaN is not a number; every number must be finite and written out"},
    {"[-Infinity]",
     "line 1, column 3: Infinity is not a number; every number must be finite and written out"},
    {"[-true]", "line 1, column 2: a minus sign must be followed by a digit"},
    {"[-]", "line 1, column 2: a minus sign must be followed by a digit"},
    {"[1, inf]",
     "line 1, column 5: inf is not a number; every number must be finite and written out"},
    {"[yes]", "line 1, column 2: yes must stand in double quotes"},
    {"[05]", "line 1, column 2: a number may not start with 0; write 5, not 05"},
    {"[.5]", "line 1, column 2: a number may not start with a point; write 0.5, not .5"},
    {"[+5]", "line 1, column 2: a number may not start with +"},
    {"[5.]", "line 1, column 2: a decimal point must be followed by a digit"},
    {"[5e]", "line 1, column 2: an exponent must have a digit"},
    {"[1,5, 1;5]", "line 1, column 8: expected a comma or ], not ;"},
    {"[1234567890123456789012345678901234567890123456789012345678901]",
     "line 1, column 2: a number of 61 characters is too long; at most 60 are read"},
    {"[ // x\n1]", "line 1, column 3: comments are not allowed"},
    {"[\"a\nb\"]", "line 1, column 2: a string is not closed on its line"},
    {"[\"a", "line 1, column 2: a string is not closed"},
    {"[\"a\tb\"]", "line 1, column 4: a string may not hold control characters"},
    {"[\"\\x\"]",
     "line 1, column 3: a backslash in a string must be followed by one of \"\\/bfnrtu"},
    {"[\"\\u12g4\"]", "line 1, column 3: \\u must be followed by four hexadecimal digits"},
    {"[\"\\u12", "line 1, column 3: \\u must be followed by four hexadecimal digits"},
    {"[\"\\u0000\"]", "line 1, column 3: a string may not hold the character NUL"},
    {"[\"\\uD83Dx\"]", "line 1, column 3: \\uD83D is half of a surrogate pair"},
    {"[\"\\uDE00\"]", "line 1, column 3: \\uDE00 is half of a surrogate pair"},
    {"[\"\xC3\xA9\", \"\xE9\"]",
     "line 1, column 8: this is not UTF-8 text; save the file as UTF-8"},
    {"[\"\xC0\x80\"]", "line 1, column 3: this is not UTF-8 text; save the file as UTF-8"},
    {"[\"\xED\xA0\x80\"]", "line 1, column 3: this is not UTF-8 text; save the file as UTF-8"},
    {"[\x01]", "line 1, column 2: expected a value, not the byte 0x01"},
    {"[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[[",
     "line 1, column 33: brackets stand more than 32 deep inside one another"},
    {"]", "line 1, column 1: expected a value, not ]"},
};

static void sound_text_passes(void **state)
{
    (void)state;
    for (size_t i = 0; i < sizeof sound / sizeof sound[0]; i++) {
        utw_error err;
        assert_ok(utw_json_scan(sound[i], strlen(sound[i]), &err));
    }
}

static void each_fault_is_named_with_its_place(void **state)
{
    (void)state;
    for (size_t i = 0; i < sizeof wrong / sizeof wrong[0]; i++) {
        utw_error err;
        assert_int_equal(utw_json_scan(wrong[i].text, strlen(wrong[i].text), &err), UTW_E_SYNTAX);
        assert_string_equal(err.text, wrong[i].message);
        int line = -1, column = -1;
        (void)!sscanf(err.text, "line %d, column %d", &line, &column);
        assert_int_equal(err.line, line);
        assert_int_equal(err.column, column);
    }
}

static void nul_bytes_are_refused(void **state)
{
    (void)state;
    utw_error err;
    assert_int_equal(utw_json_scan("[1,\0 2]", 7, &err), UTW_E_SYNTAX);
    assert_string_equal(err.text,
                        "line 1, column 4: the text holds a NUL byte; this is not a section file");
    assert_int_equal(utw_json_scan("[\"a\0\"]", 6, &err), UTW_E_SYNTAX);
    assert_string_equal(err.text, "line 1, column 4: a string may not hold control characters");
    assert_int_equal(utw_json_scan("[]\0", 3, &err), UTW_E_SYNTAX);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(sound_text_passes),
        cmocka_unit_test(each_fault_is_named_with_its_place),
        cmocka_unit_test(nul_bytes_are_refused),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
