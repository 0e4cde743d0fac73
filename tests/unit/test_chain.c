/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/chain.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/support.h"

static utw_loop loop_of(const utw_vertex *v, int n)
{
    utw_loop loop = {0};
    utw_error err;
    assert_ok(utw_chain_loop(v, n, &loop, &err));
    for (int k = 0; k < loop.n; k++)
        assert_memory_equal(loop.curve[k].to, loop.curve[(k + 1) % loop.n].from, sizeof(double[2]));
    return loop;
}

/* Corners of a rectangle rounded by r lose (1 - pi/4) r^2 each; cut by c, c^2/2. */
static void rounded_and_cut_corners_have_their_area(void **state)
{
    (void)state;
    const utw_vertex v[] = {{.at = {1, 2}, .corner = UTW_CORNER_ROUND, .size = 0.7},
                            {.at = {6, 2}, .corner = UTW_CORNER_CHAMFER, .size = 1.1},
                            {.at = {6, 5}},
                            {.at = {1, 5}, .corner = UTW_CORNER_ROUND, .size = 0.3}};
    utw_loop loop = loop_of(v, 4);
    const int owner[7] = {0, 0, 1, 1, 2, 3, 3};
    assert_int_equal(loop.n, 7);
    assert_memory_equal(loop.vertex, owner, sizeof owner);
    assert_close(utw_loop_area(&loop), 15 - (1 - UTW_PI / 4) * (0.49 + 0.09) - 1.21 / 2, 1e-14);
    utw_loop_clear(&loop);
}

/* Four roundings that use up their edges leave a circle; two, a slot. */
static void edges_may_be_used_up(void **state)
{
    (void)state;
    utw_vertex v[4] = {
        {.at = {0.1, 0.1}}, {.at = {2.5, 0.1}}, {.at = {2.5, 2.5}}, {.at = {0.1, 2.5}}};
    for (int k = 0; k < 4; k++) {
        v[k].corner = UTW_CORNER_ROUND;
        v[k].size = 1.2;
    }
    utw_loop circle = loop_of(v, 4);
    assert_int_equal(circle.n, 4);
    assert_close(utw_loop_area(&circle), UTW_PI * 1.44, 1e-14);
    utw_loop_clear(&circle);
    v[1].at[0] = v[2].at[0] = 7;
    utw_loop slot = loop_of(v, 4);
    assert_int_equal(slot.n, 6);
    assert_close(utw_loop_area(&slot), UTW_PI * 1.44 + 2.4 * 4.5, 1e-14);
    utw_loop_clear(&slot);
}

/* A re-entrant corner gains what a convex one loses. */
static void a_re_entrant_corner_is_filled(void **state)
{
    (void)state;
    const utw_vertex v[] = {{.at = {0, 0}}, {.at = {9, 0}},
                            {.at = {9, 2}}, {.at = {2, 2}, .corner = UTW_CORNER_ROUND, .size = 1.5},
                            {.at = {2, 8}}, {.at = {0, 8}}};
    utw_loop loop = loop_of(v, 6);
    assert_close(utw_loop_area(&loop), 18 + 12 + (1 - UTW_PI / 4) * 2.25, 1e-14);
    assert_true(loop.curve[4].a1 < loop.curve[4].a0);
    utw_loop_clear(&loop);
}

/* A segment of a circle of radius R whose two corners are rounded: both roundings at once on one
 * arc. The area by the sectors of the three arcs. */
static void both_ends_of_an_arc_may_be_rounded(void **state)
{
    (void)state;
    const double R = 5, h = 2.5, x = sqrt(R * R - h * h),
                 r = 0.8; /* chord at y = h, the arc above */
    double top[1][2] = {{0, R}};
    const utw_vertex v[] = {{.at = {-x, h},
                             .corner = UTW_CORNER_ROUND,
                             .size = r,
                             .join = UTW_JOIN_ARC,
                             .n_point = 1,
                             .point = top},
                            {.at = {x, h}, .corner = UTW_CORNER_ROUND, .size = r}};
    utw_loop loop = loop_of(v, 2);
    assert_int_equal(loop.n, 4);
    /* centres of the roundings (+-a, h + r) at the distance R - r from the origin */
    const double a = sqrt((R - r) * (R - r) - (h + r) * (h + r)), beta = atan2(h + r, a);
    /* half of it: triangle-free sum of 1/2 int x dy - y dx: chord, rounding, arc */
    const double half =
        -0.5 * a * h +
        0.5 * (r * r * (beta + UTW_PI / 2) + a * (r * sin(beta) + r) - (h + r) * (r * cos(beta))) +
        0.5 * R * R * (UTW_PI / 2 - beta);
    assert_close(utw_loop_area(&loop), 2 * half, 1e-13);
    utw_loop_clear(&loop);
}

static void one_vertex_is_enough_for_a_spline(void **state)
{
    (void)state;
    double point[][2] = {{5, 1}, {2, 1.5}, {0, 0.1}, {2, -1}, {5, -0.7}};
    const utw_vertex v = {.at = {10, 0}, .join = UTW_JOIN_THROUGH, .n_point = 5, .point = point};
    utw_loop loop = loop_of(&v, 1);
    assert_int_equal(loop.n, 6);
    assert_true(utw_loop_area(&loop) > 12);
    utw_loop_clear(&loop);
    /* and its corner may be rounded */
    utw_vertex w = v;
    w.corner = UTW_CORNER_ROUND;
    w.size = 0.05;
    utw_loop rounded = loop_of(&w, 1);
    assert_int_equal(rounded.n, 7);
    utw_loop_clear(&rounded);
}

static void assert_refused(const utw_vertex *v, int n, int vertex, const char *message)
{
    utw_loop loop = {0};
    utw_error err;
    assert_int_equal(utw_chain_loop(v, n, &loop, &err), UTW_E_OUTLINE);
    assert_string_equal(err.text, message);
    assert_int_equal(err.vertex, vertex);
    assert_null(loop.curve);
}

static void too_few_vertices_are_refused(void **state)
{
    (void)state;
    const utw_vertex v[] = {{.at = {0, 0}}, {.at = {2, 0}}, {.at = {2, 2}}, {.at = {0, 0}}};
    assert_refused(v, 0, -1, "the loop has no vertices; at least three are needed");
    assert_refused(v, 1, -1,
                   "the loop has one vertex; at least three are needed; for a circle write "
                   "{\"circle\": [xc, yc, r]}");
    assert_refused(v, 2, -1,
                   "the loop has 2 vertices; at least three are needed, or two when one of the "
                   "edges is curved");
    assert_refused(
        v, 4, 3,
        "the last vertex repeats the first; the loop closes by itself: remove the last vertex");
    const utw_vertex w[] = {
        {.at = {0, 0}}, {.at = {2, 0}}, {.at = {0, 0}, .join = UTW_JOIN_BULGE, .bulge = 1}};
    assert_refused(w, 3, 2,
                   "the last vertex repeats the first; the loop closes by itself: move the curve "
                   "to vertex 1 and remove the "
                   "last vertex");
}

static void corners_that_do_not_fit_are_refused(void **state)
{
    (void)state;
    utw_vertex v[] = {
        {.at = {0, 0}}, {.at = {10, 0}}, {.at = {10, 4}}, {.at = {5, 4}}, {.at = {0, 4}}};
    v[1].corner = UTW_CORNER_ROUND;
    v[1].size = -2;
    assert_refused(v, 5, 1, "\"round\" is -2; it must be greater than 0, or left out");
    v[1].size = 4.5;
    assert_refused(
        v, 5, 1, "\"round\": 4.5 does not fit between its two edges; the greatest that fits is 4");
    v[1].size = 2.5;
    v[2].corner = UTW_CORNER_CHAMFER;
    v[2].size = 3;
    assert_refused(v, 5, 2,
                   "\"chamfer\": 3 does not fit beside \"round\": 2.5 of vertex 2: the edge "
                   "between them is 4 long; the "
                   "greatest that fits here is 1.5, or there 1");
    v[2].corner = UTW_CORNER_SHARP;
    v[3].corner = UTW_CORNER_ROUND;
    v[3].size = 1;
    assert_refused(v, 5, 3,
                   "\"round\" has no corner to work on: the outline runs straight on through this "
                   "vertex; leave it out");
    const utw_vertex back[] = {{.at = {0, 0}},
                               {.at = {10, 0}},
                               {.at = {10, 4}},
                               {.at = {12, 4}, .corner = UTW_CORNER_ROUND, .size = 0.1},
                               {.at = {4, 4}}};
    assert_refused(back, 5, 3,
                   "\"round\" does not fit: the outline turns straight back at this vertex");
}

static void memory_may_run_out_anywhere(void **state)
{
    (void)state;
    double point[][2] = {{7, 3}, {5, 4}};
    const utw_vertex v[] = {{.at = {0, 0}, .corner = UTW_CORNER_ROUND, .size = 0.5},
                            {.at = {8, 0}},
                            {.at = {4, 5}, .join = UTW_JOIN_THROUGH, .n_point = 2, .point = point}};
    utw_loop loop = {0};
    long n = 1;
    for (;; n++) {
        utw_error err;
        utw_memory_fail_at(n);
        const utw_status st = utw_chain_loop(v, 3, &loop, &err);
        utw_memory_fail_at(0);
        if (st == UTW_OK) break;
        assert_int_equal(st, UTW_E_NOMEM);
        assert_null(loop.curve);
    }
    assert_true(n > 6);
    utw_loop_clear(&loop);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(rounded_and_cut_corners_have_their_area),
        balanced_test(edges_may_be_used_up),
        balanced_test(a_re_entrant_corner_is_filled),
        balanced_test(both_ends_of_an_arc_may_be_rounded),
        balanced_test(one_vertex_is_enough_for_a_spline),
        balanced_test(too_few_vertices_are_refused),
        balanced_test(corners_that_do_not_fit_are_refused),
        balanced_test(memory_may_run_out_anywhere),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
