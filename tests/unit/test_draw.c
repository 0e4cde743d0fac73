/* SPDX-License-Identifier: GPL-3.0-or-later
 * The public functions that draw. */
#include <unistd.h>

#include "base/memory.h"
#include "support/section.h"

static utw_outline *outline;
static utw_solution *solution;

static int solve(void **state)
{
    (void)state;
    outline = utw_outline_of(
        "{\"units\":\"mm "
        "N\",\"materials\":{\"m\":{\"E\":1000,\"nu\":0.3}},\"parts\":[{\"material\":\"m\","
        "\"outline\": [[0,0],[60,0],[60,8],[8,8],[8,45],[0,45]]}],"
        "\"loads\":[{\"name\":\"a\",\"Vy\":-238.5,\"at\":[40,8]},{\"name\":\"b\",\"Mx\":2385}]}");
    solution = section_solve(outline, 1e-4, 0);
    return 0;
}

static int clear(void **state)
{
    (void)state;
    utw_solution_free(solution);
    utw_outline_free(outline);
    return 0;
}

static void kinds_have_keys(void **state)
{
    (void)state;
    for (int k = 0; k < UTW_PICTURE_COUNT; k++) {
        assert_non_null(utw_picture_key((utw_picture)k));
        assert_non_null(utw_picture_meaning((utw_picture)k));
        for (int j = 0; j < k; j++)
            assert_string_not_equal(utw_picture_key((utw_picture)j),
                                    utw_picture_key((utw_picture)k));
    }
    assert_null(utw_picture_key(UTW_PICTURE_COUNT));
    assert_null(utw_picture_key((utw_picture)-1));
    assert_null(utw_picture_meaning(UTW_PICTURE_COUNT));
}

static void every_kind_and_format_is_written(void **state)
{
    (void)state;
    static const char *const start[] = {"<?xml", "%PDF-", "\x89PNG"};
    for (int k = 0; k < UTW_PICTURE_COUNT; k++)
        for (int f = UTW_SVG; f <= UTW_PNG; f++) {
            utw_error err;
            unsigned char *bytes = NULL;
            size_t n;
            assert_ok(utw_draw_bytes(solution, (utw_picture)k, NULL, (utw_picture_format)f, &bytes,
                                     &n, &err));
            assert_true(n > 2000);
            assert_memory_equal(bytes, start[f], strlen(start[f]));
            utw_draw_free(bytes);
        }
    utw_draw_free(NULL);
}

static void every_stress_of_every_case_is_drawn(void **state)
{
    (void)state;
    static const char *const cases[] = {"a", "b"};
    for (int k = 0; k < UTW_STRESS_COMPONENT_COUNT; k++)
        for (int c = 0; c < 2; c++) {
            utw_error err;
            utw_draw_options o = UTW_DRAW_OPTIONS_INIT;
            unsigned char *bytes = NULL;
            size_t n;
            o.component = (utw_stress_component)k;
            o.load_case = cases[c];
            assert_ok(utw_draw_bytes(solution, UTW_PICTURE_STRESS, &o, UTW_SVG, &bytes, &n, &err));
            assert_true(n > 2000);
            utw_draw_free(bytes);
            assert_non_null(utw_stress_component_key((utw_stress_component)k));
        }
    assert_null(utw_stress_component_key(UTW_STRESS_COMPONENT_COUNT));
}

static void files_are_written_whole_or_not(void **state)
{
    (void)state;
    utw_error err;
    char path[64];
    snprintf(path, sizeof path, "/tmp/untwist-test-%ld.svg", (long)getpid());
    assert_ok(utw_draw(solution, UTW_PICTURE_OUTLINE, NULL, path, &err));
    assert_int_equal(access(path, F_OK), 0);
    remove(path);
    assert_int_equal(utw_draw(solution, UTW_PICTURE_OUTLINE, NULL, "/no/such/x.png", &err),
                     UTW_E_FILE);
    assert_string_equal(err.text, "/no/such/x.png: cannot be written: No such file or directory");
}

static void expect_argument(utw_picture what, const utw_draw_options *o, const char *path,
                            const char *message)
{
    utw_error err;
    assert_int_equal(utw_draw(solution, what, o, path, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, message);
}

static void wrong_use_is_told(void **state)
{
    (void)state;
    utw_error err;
    utw_draw_options o = UTW_DRAW_OPTIONS_INIT;
    unsigned char *bytes = NULL;
    size_t n;
    expect_argument(UTW_PICTURE_MESH, NULL, "a.jpg",
                    "a.jpg: the ending says what to write; it must be .svg, .pdf or .png");
    expect_argument(UTW_PICTURE_MESH, NULL, NULL, "utw_draw: the path must not be NULL");
    o.width = 39;
    expect_argument(UTW_PICTURE_MESH, &o, "a.svg",
                    "drawing options: a width of 39 mm is outside 40 .. 1200 mm");
    o.width = (double)NAN;
    assert_int_equal(utw_draw(solution, UTW_PICTURE_MESH, &o, "a.svg", &err), UTW_E_ARGUMENT);
    o = (utw_draw_options)UTW_DRAW_OPTIONS_INIT;
    o.dpi = 1e5;
    expect_argument(UTW_PICTURE_MESH, &o, "a.svg",
                    "drawing options: 100000 dots per inch is outside 20 .. 2400");
    o = (utw_draw_options)UTW_DRAW_OPTIONS_INIT;
    o.component = UTW_STRESS_COMPONENT_COUNT;
    expect_argument(UTW_PICTURE_MESH, &o, "a.svg",
                    "drawing options: component 5 is outside 0 .. 4");
    o = (utw_draw_options)UTW_DRAW_OPTIONS_INIT;
    o.load_case = "c";
    assert_int_equal(utw_draw(solution, UTW_PICTURE_STRESS, &o, "a.svg", &err), UTW_E_LOAD);
    o = (utw_draw_options)UTW_DRAW_OPTIONS_INIT;
    o.version = 7;
    expect_argument(UTW_PICTURE_MESH, &o, "a.svg",
                    "drawing options: version 7 is not known; start from UTW_DRAW_OPTIONS_INIT");
    assert_int_equal(utw_draw(NULL, UTW_PICTURE_MESH, NULL, "a.svg", &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_draw(solution, (utw_picture)99, NULL, "a.svg", &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_draw_bytes(solution, UTW_PICTURE_MESH, NULL, UTW_SVG, NULL, &n, &err),
                     UTW_E_ARGUMENT);
    assert_int_equal(utw_draw_bytes(solution, UTW_PICTURE_MESH, NULL, UTW_SVG, &bytes, NULL, &err),
                     UTW_E_ARGUMENT);
    assert_int_equal(
        utw_draw_bytes(solution, UTW_PICTURE_MESH, NULL, (utw_picture_format)3, &bytes, &n, &err),
        UTW_E_ARGUMENT);
    assert_int_equal(access("a.svg", F_OK), -1);
}

/* Whatever allocation fails, the call tells and keeps nothing. */
static void no_memory_is_told(void **state)
{
    (void)state;
    for (int k = 0; k < UTW_PICTURE_COUNT; k++) {
        utw_status st = UTW_E_NOMEM;
        utw_draw_options o = UTW_DRAW_OPTIONS_INIT;
        o.width = 60;
        /* early allocations one by one, then ever wider steps */
        for (long n = 1; st == UTW_E_NOMEM; n += 1 + n / 24) {
            utw_error err;
            unsigned char *bytes = NULL;
            size_t size;
            utw_memory_fail_at(n);
            st = utw_draw_bytes(solution, (utw_picture)k, &o, UTW_SVG, &bytes, &size, &err);
            utw_memory_fail_at(0);
            assert_int_equal(bytes != NULL, st == UTW_OK);
            utw_draw_free(bytes);
            assert_true(n < 1000000);
        }
        assert_int_equal(st, UTW_OK);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(kinds_have_keys),
        balanced_test(every_kind_and_format_is_written),
        balanced_test(every_stress_of_every_case_is_drawn),
        balanced_test(files_are_written_whole_or_not),
        balanced_test(wrong_use_is_told),
        balanced_test(no_memory_is_told),
    };
    return cmocka_run_group_tests(tests, solve, clear);
}
