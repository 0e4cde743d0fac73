/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/memory.h"
#include "base/vec2.h"
#include "outline/check.h"
#include "outline/net.h"
#include "support/drawing.h"
#include "support/support.h"

/* What every net promises: edges join their nodes bit by bit, loops are closed chains with the part
 * on the left, every edge side is used by one loop, nodes differ, loops stand in the order of the
 * parts. */
static void assert_sound(const utw_net *net)
{
    int sides = 0, last_part = 0;
    for (int e = 0; e < net->n_edge; e++) {
        const utw_net_edge *edge = &net->edge[e];
        assert_true(edge->from != edge->to);
        for (int k = 0; k < 2; k++) {
            assert_true(edge->curve.from[k] == net->node[edge->from][k]);
            assert_true(edge->curve.to[k] == net->node[edge->to][k]);
        }
        sides += (edge->left >= 0) + (edge->right >= 0);
        assert_true(edge->left != edge->right);
    }
    for (int l = 0; l < net->n_loop; l++) {
        const utw_net_loop *loop = &net->loop[l];
        assert_true(loop->part == last_part || loop->part == last_part + 1);
        last_part = loop->part;
        for (int i = 0; i < loop->n; i++) {
            const int ref = loop->ref[i], next = loop->ref[(i + 1) % loop->n];
            const utw_net_edge *a = &net->edge[abs(ref) - 1], *b = &net->edge[abs(next) - 1];
            assert_int_equal(ref > 0 ? a->to : a->from, next > 0 ? b->from : b->to);
            assert_int_equal(ref > 0 ? a->left : a->right, loop->part);
            sides--;
        }
    }
    assert_int_equal(last_part, net->n_part - 1);
    assert_int_equal(sides, 0);
    for (int i = 0; i < net->n_node; i++)
        for (int j = 0; j < i; j++) assert_true(utw_distance(net->node[i], net->node[j]) > 0);
}

/* The net of a drawing, which is freed; the check must accept it too. */
static utw_net *net_of(drawing *d)
{
    utw_error err;
    utw_net *net = NULL;
    assert_ok(utw_outline_check(drawing_done(d), &err));
    assert_ok(utw_net_create(drawing_done(d), &net, &err));
    drawing_clear(d);
    assert_sound(net);
    return net;
}

static void assert_counts(utw_net *net, int n_node, int n_edge, int n_shared)
{
    int shared = 0;
    for (int e = 0; e < net->n_edge; e++)
        shared += net->edge[e].left >= 0 && net->edge[e].right >= 0;
    assert_int_equal(net->n_node, n_node);
    assert_int_equal(net->n_edge, n_edge);
    assert_int_equal(shared, n_shared);
    utw_net_free(net);
}

static drawing start(void)
{
    drawing d;
    drawing_init(&d);
    drawing_part(&d, -1);
    return d;
}

/* ---- one part ---------------------------------------------------------------------------- */

static void one_part_keeps_its_curves(void **state)
{
    (void)state;
    drawing d = start();
    drawing_move(&d, 3, 1);
    drawing_arc(&d, 0, 5, -3, 1);
    drawing_close(&d);
    utw_net *net = net_of(&d);
    assert_int_equal(net->loop[0].ref[0], 1);
    assert_int_equal(net->loop[0].ref[1], 2);
    assert_int_equal(net->edge[0].curve.kind, UTW_ARC);
    assert_int_equal(net->edge[0].vertex, 1);
    assert_int_equal(net->edge[1].vertex, 0);
    assert_counts(net, 2, 2, 0);
}

static void closed_curves_are_cut_in_four(void **state)
{
    (void)state;
    drawing d = start();
    drawing_ellipse(&d, 1, 2, 20, 10, 0.4);
    drawing_circle(&d, 2, 3, 2.385);
    drawing_reverse(&d);
    drawing_move(&d, -8, 0);
    drawing_cubic(&d, -4, -1, -4, 5, -8, 0); /* a closed cubic */
    drawing_reverse(&d);
    utw_net *net = net_of(&d);
    assert_int_equal(net->n_loop, 3);
    double length = 0;
    for (int i = 0; i < 4; i++)
        length += utw_curve_length(&net->edge[net->loop[1].ref[i] - 1].curve);
    assert_close(length, 2 * UTW_PI * 2.385, 1e-13);
    assert_counts(net, 12, 12, 0);
}

/* ---- several parts ----------------------------------------------------------------------- */

static void a_common_side_is_one_edge(void **state)
{
    (void)state;
    drawing d = start();
    drawing_rectangle(&d, 0, 0, 3, 2);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 3, 0, 5, 2);
    utw_net *net = net_of(&d);
    assert_int_equal(net->edge[1].left, 0);
    assert_int_equal(net->edge[1].right, 1);
    assert_int_equal(net->loop[1].ref[3], -2);
    assert_counts(net, 6, 7, 1);
}

static void sides_of_different_length_are_cut(void **state)
{
    (void)state;
    drawing d = start(); /* a tee of two plates: the web's top lies in the middle of the flange */
    drawing_rectangle(&d, -4, 7, 4, 8);
    drawing_part(&d, -1);
    drawing_rectangle(&d, -0.3, 0, 0.3, 7);
    assert_counts(net_of(&d), 8, 9, 1);
    d = start(); /* two plates side by side, shifted: each is cut by the other */
    drawing_rectangle(&d, 0, 0, 3, 2);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 3, 0.7, 5, 3.1);
    assert_counts(net_of(&d), 8, 9, 1);
    d = start(); /* three parts on one line: a vertex of each lies in the side of the first */
    drawing_rectangle(&d, 0, 0, 9, 2);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 0, 2, 4.1, 5);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 4.1, 2, 9, 4);
    assert_counts(net_of(&d), 9, 11, 3);
}

static void coordinates_that_differ_by_rounding_become_one(void **state)
{
    (void)state;
    drawing d = start();
    drawing_rectangle(&d, 0.1, 0, 0.3, 0.7);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 0.1 + 0.2, 0.1, 1, 0.1 + 0.2); /* 0.30000000000000004 */
    assert_counts(net_of(&d), 8, 9, 1);
}

static void a_filled_hole_is_shared(void **state)
{
    (void)state;
    drawing d = start(); /* a shaft of two materials with a bore */
    drawing_circle(&d, 1, 2, 10);
    drawing_circle(&d, 1, 2, 7.3);
    drawing_reverse(&d);
    drawing_part(&d, -1);
    drawing_circle(&d, 1, 2, 7.3);
    drawing_circle(&d, 1, 2, 3.1);
    drawing_reverse(&d);
    assert_counts(net_of(&d), 12, 12, 4);

    d = start(); /* the core is drawn as two half circles that start elsewhere */
    drawing_circle(&d, 1, 2, 10);
    drawing_circle(&d, 1, 2, 7.3);
    drawing_reverse(&d);
    drawing_part(&d, -1);
    const double c = 7.3 * cos(0.3), s = 7.3 * sin(0.3);
    drawing_move(&d, 1 + c, 2 + s);
    drawing_arc(&d, 1 - s, 2 + c, 1 - c, 2 - s);
    drawing_arc(&d, 1 + s, 2 - c, 1 + c, 2 + s);
    drawing_close(&d);
    assert_counts(net_of(&d), 10, 10, 6);

    d = start(); /* an elliptic core, turned, in two quarter-started halves */
    drawing_rectangle(&d, -20, -20, 20, 20);
    drawing_ellipse(&d, 0, 0, 12, 7, 0.3);
    drawing_reverse(&d);
    drawing_part(&d, -1);
    drawing_ellipse(&d, 0, 0, -12, -7, 0.3);
    assert_counts(net_of(&d), 8, 8, 4);
}

static void a_rod_resting_in_a_fillet_shares_the_arc(void **state)
{
    (void)state;
    /* a block with a round groove of 90 degrees and a full rod in it */
    const double r = 4, h = sqrt(0.5) * r;
    drawing d = start();
    drawing_move(&d, -10, -9);
    drawing_line(&d, 10, -9);
    drawing_line(&d, 10, -h);
    drawing_line(&d, h, -h);
    drawing_arc(&d, 0, -r, -h, -h);
    drawing_line(&d, -10, -h);
    drawing_close(&d);
    drawing_part(&d, -1);
    drawing_circle(&d, 0, 0, r);
    assert_counts(net_of(&d), 10, 11, 2); /* the rod's quarter point cuts the groove in two */
}

static void a_common_spline_is_shared(void **state)
{
    (void)state;
    drawing d = start();
    drawing_move(&d, 0, 0);
    drawing_cubic(&d, 10, 4, 20, -4, 30, 1);
    drawing_line(&d, 30, 12);
    drawing_line(&d, 0, 12);
    drawing_close(&d);
    drawing_part(&d, -1);
    drawing_move(&d, 30, 1);
    drawing_cubic(&d, 20, -4, 10, 4, 0, 0);
    drawing_line(&d, 0, -9);
    drawing_line(&d, 30, -9);
    drawing_close(&d);
    assert_counts(net_of(&d), 6, 7, 1);

    const double from[2] = {0, 0}, c1[2] = {10, 4}, c2[2] = {20, -4}, to[2] = {30, 1};
    const utw_curve whole = utw_curve_cubic(from, c1, c2, to);
    const utw_curve a = utw_curve_piece(&whole, 0.7, 0.2);
    d = start(); /* the other part covers a stretch of the spline only */
    drawing_move(&d, 0, 0);
    drawing_cubic(&d, 10, 4, 20, -4, 30, 1);
    drawing_line(&d, 30, 12);
    drawing_line(&d, 0, 12);
    drawing_close(&d);
    drawing_part(&d, -1);
    drawing_move(&d, a.from[0], a.from[1]);
    drawing_cubic(&d, a.c1[0], a.c1[1], a.c2[0], a.c2[1], a.to[0], a.to[1]);
    drawing_line(&d, a.to[0], -9);
    drawing_line(&d, a.from[0], -9);
    drawing_close(&d);
    assert_counts(net_of(&d), 8, 9, 1);
}

static void four_tiles_share_a_corner(void **state)
{
    (void)state;
    drawing d;
    drawing_init(&d);
    for (int i = 0; i < 4; i++) {
        const double x = i & 1 ? 3 : 0, y = i & 2 ? 2 : 0;
        drawing_part(&d, -1);
        drawing_rectangle(&d, x, y, x + 3, y + 2);
    }
    assert_counts(net_of(&d), 9, 12, 4);
}

static void a_ring_of_parts_encloses_a_void(void **state)
{
    (void)state;
    drawing d = start(); /* two channels form a box: they share two edges and enclose a cell */
    const double left[8][2] = {{0, 0}, {5, 0}, {5, 1}, {1, 1}, {1, 9}, {5, 9}, {5, 10}, {0, 10}};
    const double right[8][2] = {{5, 0}, {10, 0}, {10, 10}, {5, 10}, {5, 9}, {9, 9}, {9, 1}, {5, 1}};
    drawing_polygon(&d, 8, left);
    drawing_part(&d, -1);
    drawing_polygon(&d, 8, right);
    assert_counts(net_of(&d), 12, 14, 2);
}

/* ---- what does not fit ------------------------------------------------------------------- */

static void allocation_failures_are_reported(void **state)
{
    (void)state;
    drawing d = start();
    drawing_rectangle(&d, -4, 7, 4, 8);
    drawing_part(&d, -1);
    drawing_rectangle(&d, -0.3, 0, 0.3, 7);
    const utw_outline *o = drawing_done(&d);
    utw_error err;
    utw_net *net = NULL;
    int refusals = 0;
    for (long n = 1;; n++) {
        utw_memory_fail_at(n);
        const utw_status st = utw_net_create(o, &net, &err);
        utw_memory_fail_at(0);
        if (st == UTW_OK) break;
        assert_int_equal(st, UTW_E_NOMEM);
        assert_null(net);
        refusals++;
    }
    assert_true(refusals >= 20);
    utw_net_free(net);
    drawing_clear(&d);
}

static void a_wall_of_many_tiles_is_fast(void **state)
{
    (void)state;
    drawing d;
    drawing_init(&d);
    enum { N = 40 };
    for (int i = 0; i < N * N; i++) {
        const double x = 0.1 * (i % N), y = 0.07 * (i / N);
        drawing_part(&d, -1);
        drawing_rectangle(&d, x, y, 0.1 * (i % N + 1), 0.07 * (i / N + 1));
    }
    utw_error err;
    utw_net *net = NULL;
    assert_ok(utw_net_create(drawing_done(&d), &net, &err));
    drawing_clear(&d);
    assert_counts(net, (N + 1) * (N + 1), 2 * N * (N + 1), 2 * N * (N - 1));
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(one_part_keeps_its_curves),
        balanced_test(closed_curves_are_cut_in_four),
        balanced_test(a_common_side_is_one_edge),
        balanced_test(sides_of_different_length_are_cut),
        balanced_test(coordinates_that_differ_by_rounding_become_one),
        balanced_test(a_filled_hole_is_shared),
        balanced_test(a_rod_resting_in_a_fillet_shares_the_arc),
        balanced_test(a_common_spline_is_shared),
        balanced_test(four_tiles_share_a_corner),
        balanced_test(a_ring_of_parts_encloses_a_void),
        balanced_test(allocation_failures_are_reported),
        balanced_test(a_wall_of_many_tiles_is_fast),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
