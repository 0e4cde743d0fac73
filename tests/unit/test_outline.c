/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/outline.h"

#include "base/vec2.h"
#include "support/support.h"

static void area_of_every_kind_of_curve_is_exact(void **state)
{
    (void)state;
    const struct {
        const char *outline;
        double area;
    } row[] = {
        {"[[1.5,-2],[4.2,-2],[4.2,3.1],[1.5,3.1]]", 2.7 * 5.1},
        {"{\"circle\": [100, 200, 2.385]}", UTW_PI * 2.385 * 2.385},
        {"{\"ellipse\": [10, -20, 3.1, 1.7, 27]}", UTW_PI * 3.1 * 1.7},
        /* half a disc */
        {"[[-1.3,7],{\"at\":[1.3,7],\"bulge\":1}]", UTW_PI * 1.3 * 1.3 / 2},
        /* one lobe by a cubic: int 1/2 x x dx = 3/10 d1 x d2 - like terms; here x = 3t(1-t)^2 p + 3
         * t^2 (1-t) q, whose area is 3/20 (p x q) by integrating the Bernstein products */
        {"[{\"at\":[5,5],\"bezier\":[[7,4],[6,9]]}]", 3.0 / 20 * (2 * 4 - -1 * 1)},
    };
    for (size_t i = 0; i < sizeof row / sizeof row[0]; i++) {
        char text[200];
        snprintf(text, sizeof text, "{\"units\":\"mm N\",\"parts\":[{\"outline\":%s}]}",
                 row[i].outline);
        utw_outline *o = utw_outline_of(text);
        assert_close(utw_loop_area(&o->part[0].loop[0]), row[i].area, 1e-13);
        utw_loop_reverse(&o->part[0].loop[0]);
        assert_close(utw_loop_area(&o->part[0].loop[0]), -row[i].area, 1e-13);
        utw_outline_free(o);
    }
}

static void a_reversed_loop_is_still_a_chain(void **state)
{
    (void)state;
    utw_outline *o = utw_outline_of(
        "{\"units\":\"mm "
        "N\",\"parts\":[{\"outline\":[[0,0],[4,0],{\"at\":[4,3],\"arc\":[5,1.5]},[0,3]]}]}");
    utw_loop *loop = &o->part[0].loop[0];
    utw_loop_reverse(loop);
    const int vertex[4] = {3, 2, 1, 0}; /* the edge to vertex 0 comes last as drawn backward */
    for (int k = 0; k < 4; k++) {
        assert_int_equal(loop->vertex[k], vertex[k]);
        assert_memory_equal(loop->curve[k].to, loop->curve[(k + 1) % 4].from, sizeof(double[2]));
    }
    utw_outline_free(o);
}

static void nothing_is_freed_twice(void **state)
{
    (void)state;
    utw_outline_free(NULL);
    utw_part part = {.n_loop = 0};
    utw_part_clear(&part);
    utw_part_clear(&part);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(area_of_every_kind_of_curve_is_exact),
        balanced_test(a_reversed_loop_is_still_a_chain),
        balanced_test(nothing_is_freed_twice),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
