/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/curvelist.h"
#include "support/drawing.h"
#include "support/support.h"

enum { LOOPS = 4 };

static void draw(drawing *d)
{
    drawing_init(d);
    drawing_part(d, -1); /* loop 0: a rounded outline; loop 1: a lozenge, corners at ray height;
                            loop 2: a circle */
    drawing_move(d, 0, 0);
    drawing_line(d, 12, 0);
    drawing_arc(d, 15, 4, 12, 8);
    drawing_cubic(d, 8, 11, 4, 5, 0, 8);
    drawing_close(d);
    const double lozenge[4][2] = {{2, 4}, {3, 2}, {4, 4}, {3, 6}};
    drawing_polygon(d, 4, lozenge);
    drawing_reverse(d);
    drawing_circle(d, 9, 4, 2);
    drawing_reverse(d);
    drawing_part(d, -1); /* loop 3 */
    drawing_circle(d, 9, 4, 1);
}

static void list_keeps_loops_together(void **state)
{
    (void)state;
    drawing d;
    draw(&d);
    utw_curve_list list;
    utw_error err;
    assert_ok(utw_curve_list_init(&list, drawing_done(&d), &err));
    assert_int_equal(list.n, 4 + 4 + 1 + 1);
    assert_int_equal(list.n_loop, LOOPS);
    for (int l = 0; l < LOOPS; l++) {
        assert_int_equal(list.part_of[l], l == 3);
        assert_int_equal(list.loop_of[l], l % 3);
        for (int k = 0; k < list.ref[list.first[l]].n; k++) {
            const utw_curve_ref *ref = &list.ref[list.first[l] + k];
            assert_int_equal(ref->k, k);
            assert_int_equal(ref->index, l);
            assert_ptr_equal(ref->curve, &d.outline.part[l == 3].loop[l % 3].curve[k]);
        }
    }
    utw_curve_list_clear(&list);
    drawing_clear(&d);
}

static void rays_tell_the_loops_around_a_point(void **state)
{
    (void)state;
    const struct {
        double p[2];
        unsigned char inside[LOOPS];
    } row[] = {
        {{9, 4}, {1, 0, 1, 1}},    {{1, 4}, {1, 0, 0, 0}},    {{-1, 4}, {0, 0, 0, 0}},
        {{3, 4}, {1, 1, 0, 0}}, /* the ray runs through a corner of the lozenge */
        {{3, 2.5}, {1, 1, 0, 0}},  {{10.5, 4}, {1, 0, 1, 0}}, {{14.9, 4}, {1, 0, 0, 0}},
        {{15.1, 4}, {0, 0, 0, 0}}, {{-1, 0}, {0, 0, 0, 0}}, /* along a whole side */
        {{-1, 8}, {0, 0, 0, 0}},   {{6, 7.9}, {1, 0, 0, 0}},  {{6, 8.1}, {0, 0, 0, 0}},
        {{-1, 6}, {0, 0, 0, 0}}, /* through tops of lozenge and circle, where it only touches */
        {{-1, 2}, {0, 0, 0, 0}},   {{9, 5.99}, {1, 0, 1, 0}}, {{9, 6.01}, {1, 0, 0, 0}},
    };
    drawing d;
    draw(&d);
    utw_curve_list list;
    utw_error err;
    assert_ok(utw_curve_list_init(&list, drawing_done(&d), &err));
    for (size_t i = 0; i < sizeof row / sizeof row[0]; i++) {
        unsigned char inside[LOOPS] = {0};
        int touched[LOOPS];
        const int n = utw_loops_around(&list, row[i].p, inside, touched);
        assert_memory_equal(inside, row[i].inside, LOOPS);
        for (int q = 0; q < n; q++) inside[touched[q]] = 0;
        for (int l = 0; l < LOOPS; l++) assert_int_equal(inside[l], 0);
    }
    utw_curve_list_clear(&list);
    drawing_clear(&d);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(list_keeps_loops_together),
        balanced_test(rays_tell_the_loops_around_a_point),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
