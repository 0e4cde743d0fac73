/* SPDX-License-Identifier: GPL-3.0-or-later
 * That every shape's file reads back to its curves is tested with the shapes themselves (shape_of).
 */
#include "report/shape_file.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/support.h"

static void a_file_states_vertices_roundings_and_holes(void **state)
{
    (void)state;
    utw_error err;
    char *text = NULL;
    const char *keys[] = {"h", "b", "t", "ro", "ri"};
    const double values[] = {60, 40.2, 3, 6, 0.1};
    const double turned[] = {60, 40.2, 3, 0, 0.1};
    assert_ok(utw_shape_file_text("box", 5, keys, turned, "m kN", NULL, &text, &err));
    assert_string_equal(text, "{\n"
                              "  \"name\": \"box h=60 b=40.2 t=3 ro=0 ri=0.1\",\n"
                              "  \"units\": \"m kN\",\n"
                              "  \"parts\": [\n"
                              "    {\n"
                              "      \"outline\": [\n"
                              "        [-20.1, -30],\n"
                              "        [20.1, -30],\n"
                              "        [20.1, 30],\n"
                              "        [-20.1, 30]],\n"
                              "      \"holes\": [\n"
                              "        [\n"
                              "          {\"at\": [-17.1, -27], \"round\": 0.1},\n"
                              "          {\"at\": [17.1, -27], \"round\": 0.1},\n"
                              "          {\"at\": [17.1, 27], \"round\": 0.1},\n"
                              "          {\"at\": [-17.1, 27], \"round\": 0.1}]\n"
                              "      ]\n"
                              "    }\n"
                              "  ]\n"
                              "}\n");
    utw_free(text);
    text = NULL;
    assert_int_equal(utw_shape_file_text("box", 5, keys, values, "m", NULL, &text, &err),
                     UTW_E_SYNTAX);
    assert_null(text);
}

static void placed_shapes_are_written_where_they_are(void **state)
{
    (void)state;
    utw_error err;
    char *text = NULL;
    const char *keys[] = {"b", "h"};
    const double values[] = {40, 13};
    const utw_placement place = {.at = {3, -7}, .turn = UTW_PI / 6, .mirror = 0};
    assert_ok(utw_shape_file_text("ellipse", 2, keys, values, "mm N", &place, &text, &err));
    const char *start = "\"outline\": {\"ellipse\": [3, -7, 20, 6.5, ",
               *found = strstr(text, start);
    assert_non_null(found);
    assert_close(strtod(found + strlen(start), NULL), 30, 1e-15);
    utw_free(text);
}

static void a_refused_allocation_leaves_nothing_behind(void **state)
{
    (void)state;
    utw_error err;
    char *text = NULL;
    const char *keys[] = {"d", "t"};
    const double values[] = {60, 4};
    utw_status st = UTW_E_NOMEM;
    for (long n = 1; st == UTW_E_NOMEM; n++) {
        utw_memory_fail_at(n);
        st = utw_shape_file_text("tube", 2, keys, values, "mm N", NULL, &text, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_null(text);
    }
    assert_int_equal(st, UTW_OK);
    utw_free(text);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(a_file_states_vertices_roundings_and_holes),
        balanced_test(placed_shapes_are_written_where_they_are),
        balanced_test(a_refused_allocation_leaves_nothing_behind),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
