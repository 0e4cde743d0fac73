/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/vec2.h"
#include "outline/outline.h"
#include "support/section.h"

/* Lines, arcs of a circle and of an ellipse, a spline, a hole. */
static const char part[] =
    "\"outline\":[[0,0],[30,0],{\"at\":[30,9],\"arc\":[33,4]},{\"at\":[12,10],\"round\":2},"
    "{\"at\":[3,20],\"through\":[[9,14]]},[0,20]],\"holes\":[{\"ellipse\":[8,5,4,2,20]}]";

static utw_outline *drawn(void)
{
    return section_outline(UTW_NAN, "%s", part);
}

/* The point u along loop l of the placed part, of the mirrored loop run backward. */
static void compare(const utw_part *a, const utw_part *b, const utw_placement *p)
{
    const double c = cos(p->turn), s = sin(p->turn);
    for (int l = 0; l < a->n_loop; l++) {
        assert_int_equal(a->loop[l].n, b->loop[l].n);
        assert_close(utw_loop_area(&b->loop[l]), utw_loop_area(&a->loop[l]), 1e-12);
        for (int k = 0; k < a->loop[l].n; k++)
            for (double t = 0; t <= 1; t += 0.25) {
                double q[2], r[2], least = UTW_INFINITY;
                utw_curve_point(&a->loop[l].curve[k], t, q);
                const double x = p->mirror ? -q[0] : q[0],
                             at[2] = {c * x - s * q[1] + p->at[0], s * x + c * q[1] + p->at[1]};
                for (int j = 0; j < b->loop[l].n; j++) {
                    const utw_curve *curve = &b->loop[l].curve[j];
                    utw_curve_point(curve, p->mirror ? 1 - t : t, r);
                    least = fmin(least, utw_distance(at, r));
                }
                assert_true(least < 1e-13);
            }
    }
}

static void points_go_where_they_should(void **state)
{
    (void)state;
    static const utw_placement list[] = {
        {.at = {0, 0}},
        {.at = {7, -3}, .turn = 0.3},
        {.at = {-2, 5}, .mirror = 1},
        {.at = {1, 1}, .turn = -2.1, .mirror = 1},
    };
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        utw_outline *o = drawn(), *moved = drawn();
        utw_part_place(&moved->part[0], &list[i]);
        compare(&o->part[0], &moved->part[0], &list[i]);
        utw_outline_free(o);
        utw_outline_free(moved);
    }
}

static void quarter_turns_are_exact(void **state)
{
    (void)state;
    utw_outline *o = drawn(), *moved = drawn();
    const utw_placement quarter = {.turn = UTW_PI / 2};
    utw_part_place(&moved->part[0], &quarter);
    for (int k = 0; k < o->part[0].loop[0].n; k++) {
        const utw_curve *a = &o->part[0].loop[0].curve[k], *b = &moved->part[0].loop[0].curve[k];
        assert_true(b->from[0] == -a->from[1] && b->from[1] == a->from[0]);
        assert_true(b->to[0] == -a->to[1] && b->to[1] == a->to[0]);
    }
    for (int i = 0; i < 3; i++) utw_part_place(&moved->part[0], &quarter);
    for (int k = 0; k < o->part[0].loop[0].n; k++) {
        const utw_curve *a = &o->part[0].loop[0].curve[k], *b = &moved->part[0].loop[0].curve[k];
        assert_true(b->from[0] == a->from[0] && b->from[1] == a->from[1]);
    }
    utw_outline_free(o);
    utw_outline_free(moved);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(points_go_where_they_should),
        balanced_test(quarter_turns_are_exact),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
