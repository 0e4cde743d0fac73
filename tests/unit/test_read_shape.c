/* SPDX-License-Identifier: GPL-3.0-or-later
 * "shape" in section files gives what utw_outline_from_shape() gives, where it is put. */
#include "outline/outline.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/figure.h"
#include "support/shapes.h"

static void in_place_of_parts(void **state)
{
    (void)state;
    utw_outline *read = utw_outline_of(
        "{\"units\": \"mm N\", \"materials\": {\"steel\": {\"E\": 210000, \"nu\": 0.3}},"
        " \"shape\": {\"material\": \"steel\", \"tube\": {\"t\": 3.25, \"d\": 47.7}, \"at\": [10, "
        "-4]}}");
    utw_outline *built = shape_of("tube d=47.7 t=3.25");
    assert_int_equal(read->n_part, 1);
    assert_int_equal(read->part[0].material, 0);
    assert_int_equal(read->part[0].n_loop, 2);
    figure f = figure_of_outline(built);
    f.xx += 100 * f.A, f.yy += 16 * f.A, f.xy -= 40 * f.A, f.x += 10 * f.A, f.y -= 4 * f.A;
    assert_figure(figure_of_outline(read), f, 1e-13);
    assert_true(read->box[0] == built->box[0] + 10 && read->box[1] == built->box[1] - 4);
    utw_outline_free(read);
    utw_outline_free(built);
}

static void mirrored_and_turned(void **state)
{
    (void)state;
    /* the back of the channel's web faces right, then up */
    utw_outline *o = utw_outline_of(
        "{\"units\": \"mm N\", \"shape\": {\"mirror\": true, \"turn\": 450, \"channel\": "
        "{\"h\": 100, \"b\": 50, \"tf\": 8.5, \"tw\": 6, \"r\": 8.5}, \"at\": [1, 2]}}");
    assert_true(o->box[0] == 1 - 100 && o->box[2] == 1 && o->box[1] == 2 - 50 && o->box[3] == 2);
    const figure f = figure_of_outline(o);
    assert_true(f.y / f.A > 2 - 25); /* the web is on top */
    assert_close(f.x / f.A, 1 - 50, 1e-13);
    utw_outline_free(o);
}

static void in_parts(void **state)
{
    (void)state;
    utw_outline *o = utw_outline_of(
        "{\"units\": \"mm N\", \"materials\": {\"a\": {\"E\": 70000, \"nu\": 0.33}},"
        " \"parts\": [{\"material\": \"a\", \"outline\": [[0,0],[-5,0],[-5,60],[0,60]]},"
        " {\"shape\": {\"angle\": {\"h\": 60, \"t\": 6}}, \"material\": \"a\"}]}");
    assert_int_equal(o->n_part, 2);
    assert_int_equal(o->part[1].material, 0);
    assert_int_equal(o->part[1].loop[0].n, 6);
    const figure f = figure_of_outline(o);
    assert_close(f.A, 300 + 6 * 60 + 6 * 54, 1e-14);
    utw_outline_free(o);
}

static void a_refused_allocation_leaves_nothing_behind(void **state)
{
    (void)state;
    static const char *const text[] = {
        "{\"units\": \"mm N\", \"shape\": {\"tube\": {\"t\": 3.25, \"d\": 47.7}}}",
        "{\"units\": \"mm N\", \"parts\": [{\"shape\": {\"box\": {\"h\": 50, \"b\": 40, \"t\": "
        "3}}}]}"};
    for (int i = 0; i < 2; i++) {
        utw_error err;
        utw_outline *o = NULL;
        utw_status st = UTW_E_NOMEM;
        for (long n = 1; st == UTW_E_NOMEM; n++) {
            utw_memory_fail_at(n);
            st = utw_outline_parse(text[i], strlen(text[i]), "test", &o, &err);
            utw_memory_fail_at(0);
            if (st != UTW_OK) assert_null(o);
        }
        assert_int_equal(st, UTW_OK);
        utw_outline_free(o);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(in_place_of_parts),
        balanced_test(mirrored_and_turned),
        balanced_test(in_parts),
        balanced_test(a_refused_allocation_leaves_nothing_behind),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
