/* SPDX-License-Identifier: GPL-3.0-or-later
 * Building a JSON document. */
#include "report/json_writer.h"

#include "support/support.h"

static void what_is_added_stands_there(void **state)
{
    (void)state;
    utw_json_writer w = {NULL, 0};
    cJSON *root = utw_json_kept(&w, cJSON_CreateObject());
    const double at[2] = {0.1, -2385}, nowhere[2] = {NAN, HUGE_VAL};
    utw_json_add_text(&w, root, "t", "a \"b\"");
    utw_json_add_number(&w, root, "third", 1.0 / 3);
    utw_json_add_number(&w, root, "none", NAN);
    utw_json_add_flag(&w, root, "f", 1);
    utw_json_add_point(&w, root, "at", at);
    cJSON *list = utw_json_add_array(&w, root, "list");
    utw_json_append_number(&w, list, 1e-300);
    utw_json_add_point(&w, list, NULL, nowhere);
    utw_json_add_number(&w, utw_json_append_object(&w, list), "x", 7);
    char *text = cJSON_PrintUnformatted(root);
    assert_int_equal(w.failed, 0);
    assert_string_equal(text, "{\"t\":\"a \\\"b\\\"\",\"third\":0.3333333333333333,\"none\":null,"
                              "\"f\":true,\"at\":[0.1,-2385],\"list\":[1e-300,[null,null],{\"x\":"
                              "7}]}");
    cJSON_free(text);
    cJSON_Delete(root);
}

/* Nothing to add to: noted, and nothing is lost. */
static void what_cannot_be_added_is_noted(void **state)
{
    (void)state;
    const double at[2] = {1, 2};
    for (int i = 0; i < 7; i++) {
        utw_json_writer w = {NULL, 0};
        switch (i) {
        case 0:
            utw_json_kept(&w, NULL);
            break;
        case 1:
            assert_null(utw_json_add_object(&w, NULL, "a"));
            break;
        case 2:
            assert_null(utw_json_append_object(&w, NULL));
            break;
        case 3:
            utw_json_append_number(&w, NULL, 1);
            break;
        case 4:
            utw_json_add_number(&w, NULL, "a", 1);
            break;
        case 5:
            utw_json_add_point(&w, NULL, "a", at);
            break;
        case 6:
            utw_json_add_text(&w, NULL, "a", "b");
            break;
        }
        assert_int_equal(w.failed, 1);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(what_is_added_stands_there),
        cmocka_unit_test(what_cannot_be_added_is_noted),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
