/* SPDX-License-Identifier: GPL-3.0-or-later */
#include <time.h>

#include "base/memory.h"
#include "base/vec2.h"
#include "outline/check.h"
#include "support/drawing.h"
#include "support/support.h"

/* The outline must be refused with exactly this message at this place; the drawing is freed. */
static void refused(drawing *d, int part, int loop, int vertex, const char *text)
{
    utw_error err;
    const utw_status st = utw_outline_check(drawing_done(d), &err);
    drawing_clear(d);
    assert_int_equal(st, UTW_E_OUTLINE);
    assert_int_equal(err.status, UTW_E_OUTLINE);
    assert_string_equal(err.text, text);
    assert_int_equal(err.part, part);
    assert_int_equal(err.loop, loop);
    assert_int_equal(err.vertex, vertex);
}

static void accepted(drawing *d)
{
    utw_error err;
    assert_ok(utw_outline_check(drawing_done(d), &err));
    drawing_clear(d);
}

static drawing start(void)
{
    drawing d;
    drawing_init(&d);
    drawing_part(&d, -1);
    return d;
}

static drawing polygon(int n, const double (*xy)[2])
{
    drawing d = start();
    drawing_polygon(&d, n, xy);
    return d;
}

/* ---- what must pass ---------------------------------------------------------------------- */

static void sound_sections_pass(void **state)
{
    (void)state;
    drawing d = start(); /* a rounded box with an elliptic and a circular hole */
    drawing_move(&d, 12.3, 0);
    drawing_line(&d, 80, 0);
    drawing_arc(&d, 80 + 10 * sin(0.7), 10 - 10 * cos(0.7), 90, 10);
    drawing_cubic(&d, 90, 30, 70, 35, 75, 60);
    drawing_line(&d, 0, 60);
    drawing_line(&d, 0, 12.3);
    drawing_arc(&d, 12.3 * cos(0.4), 12.3 * sin(0.4), 12.3, 0); /* a concave quarter */
    drawing_close(&d);
    drawing_ellipse(&d, 40, 30, 21, 9, 0.3);
    drawing_reverse(&d);
    drawing_circle(&d, 70, 15, 4.2);
    drawing_reverse(&d);
    accepted(&d);

    d = start(); /* two halves of a circle: two curves with both ends in common */
    drawing_move(&d, -2.385, 0);
    drawing_arc(&d, 0, -2.385, 2.385, 0);
    drawing_arc(&d, 0, 2.385, -2.385, 0);
    drawing_close(&d);
    accepted(&d);

    d = start(); /* a segment: a chord and an arc of more than half a turn */
    drawing_move(&d, 3, 1);
    drawing_arc(&d, 0, 5, -3, 1);
    drawing_close(&d);
    accepted(&d);

    d = start(); /* a drop: one cubic that closes on itself */
    drawing_move(&d, 0, 0);
    drawing_cubic(&d, 4, -1, 4, 5, 0, 0);
    drawing_close(&d);
    accepted(&d);

    d = start(); /* a trailing edge of 0.6 degrees */
    const double wedge[3][2] = {{0, 0}, {100, 0}, {100, 1.05}};
    drawing_polygon(&d, 3, wedge);
    accepted(&d);
}

static void smooth_tight_joints_pass(void **state)
{
    (void)state;
    drawing d = start(); /* sharp corner between an arc and the line that is nearly its tangent */
    const double a = 0.01;
    drawing_move(&d, 0, 0);
    drawing_line(&d, 10, 0);
    drawing_line(&d, 2 * sin(a), 2 - 2 * cos(a) + 10);
    drawing_line(&d, -5, 2);
    drawing_close(&d);
    accepted(&d);

    d = start(); /* an arc leaves its neighbour line at 0.5 degrees and bends away */
    drawing_move(&d, 0, 0);
    drawing_line(&d, 10, 0);
    drawing_arc(&d, 5.1, 1.5, 0, 0);
    drawing_close(&d);
    accepted(&d);
}

/* ---- crossing and touching --------------------------------------------------------------- */

static void crossing_lines_are_named(void **state)
{
    (void)state;
    const double bow[4][2] = {{0, 0}, {10, 0}, {0, 6}, {10, 6}};
    drawing d = polygon(4, bow);
    refused(&d, 0, 0, 0,
            "part 1, outline: the edge to vertex 1 crosses the edge to vertex 3 near (5, 3); move "
            "one of them");
}

static void arc_through_a_far_side_is_seen(void **state)
{
    (void)state;
    for (int i = 0; i < 2; i++) {
        /* Chords would not meet: the arc on the right bulges through the left side or just not. */
        drawing d = start();
        drawing_move(&d, 0, 0);
        drawing_line(&d, 3, 0);
        drawing_arc(&d, i == 0 ? -1 : 0.01, 5, 3, 10);
        drawing_line(&d, 0, 10);
        drawing_close(&d);
        utw_error err;
        if (i == 1) {
            accepted(&d);
            break;
        }
        assert_int_equal(utw_outline_check(drawing_done(&d), &err), UTW_E_OUTLINE);
        drawing_clear(&d);
        assert_non_null(strstr(err.text, "the edge to vertex 1 crosses the edge to vertex 3"));
    }
}

static void loop_through_its_own_vertex_touches(void **state)
{
    (void)state;
    const double eight[6][2] = {{0, 0}, {4, 0}, {2, 2}, {4, 4}, {0, 4}, {2, 2}};
    drawing d = polygon(6, eight);
    utw_error err;
    assert_int_equal(utw_outline_check(drawing_done(&d), &err), UTW_E_OUTLINE);
    assert_non_null(strstr(err.text, "touches"));
    assert_non_null(strstr(err.text, "near (2, 2)"));
    drawing_clear(&d);
}

static void tangent_circles_touch(void **state)
{
    (void)state;
    drawing d = start();
    drawing_circle(&d, 0, 0, 5);
    drawing_circle(&d, 2, 0, 3);
    drawing_reverse(&d);
    refused(&d, 0, 1, 0,
            "part 1, hole 1: the closed curve touches the closed curve of the outline near (5, 0); "
            "move one of them");
    d = start(); /* a wall of 1e-6 of the size is a wall */
    drawing_circle(&d, 0, 0, 5);
    drawing_circle(&d, 2 - 1e-5, 0, 3);
    drawing_reverse(&d);
    accepted(&d);
    d = start(); /* one of 1e-8 is none */
    drawing_circle(&d, 0, 0, 5);
    drawing_circle(&d, 2 - 1e-7, 0, 3);
    drawing_reverse(&d);
    utw_error err;
    assert_int_equal(utw_outline_check(drawing_done(&d), &err), UTW_E_OUTLINE);
    assert_non_null(strstr(err.text, "comes within 1e-07 of"));
    drawing_clear(&d);
}

static void ellipses_and_cubics_cross(void **state)
{
    (void)state;
    utw_error err;
    drawing d = start();
    drawing_ellipse(&d, 0, 0, 20, 10, 0.2);
    drawing_ellipse(&d, 0, 0, 21, 2, 0.2);
    drawing_reverse(&d);
    assert_int_equal(utw_outline_check(drawing_done(&d), &err), UTW_E_OUTLINE);
    assert_non_null(strstr(err.text, "crosses"));
    drawing_clear(&d);

    d = start(); /* two waves in opposite phase */
    drawing_move(&d, 0, 0);
    drawing_cubic(&d, 10, 15, 20, -15, 30, 0);
    drawing_line(&d, 30, 1);
    drawing_cubic(&d, 20, 16, 10, -14, 0, 1);
    drawing_close(&d);
    assert_int_equal(utw_outline_check(drawing_done(&d), &err), UTW_E_OUTLINE);
    assert_non_null(strstr(err.text, "the edge to vertex 4 crosses the edge to vertex 2"));
    drawing_clear(&d);
}

static void holes_must_lie_inside(void **state)
{
    (void)state;
    drawing d = start();
    drawing_rectangle(&d, 0, 0, 40, 20);
    drawing_circle(&d, 50, 10, 4);
    drawing_reverse(&d);
    refused(
        &d, 0, 1, -1,
        "part 1, hole 1: it lies outside the outline of its part, near (54, 10); move it inside or "
        "remove it");
    d = start();
    drawing_rectangle(&d, 0, 0, 40, 20);
    drawing_circle(&d, 20, 10, 6);
    drawing_reverse(&d);
    drawing_circle(&d, 20, 10, 4);
    drawing_reverse(&d);
    refused(&d, 0, 2, -1,
            "part 1, hole 2: it lies inside hole 1, near (24, 10); remove it, or make what it "
            "stands for a "
            "part of its own");
    d = start();
    drawing_rectangle(&d, 0, 0, 40, 20);
    drawing_circle(&d, 20, 10, 6);
    drawing_reverse(&d);
    drawing_rectangle(&d, 25, 9, 30, 12);
    drawing_reverse(&d);
    utw_error err;
    assert_int_equal(utw_outline_check(drawing_done(&d), &err), UTW_E_OUTLINE);
    assert_non_null(strstr(err.text, "part 1, hole 2: the edge to vertex"));
    assert_non_null(strstr(err.text, "crosses the closed curve of hole 1"));
    drawing_clear(&d);
    d = start();
    drawing_rectangle(&d, 0, 0, 40, 20);
    drawing_rectangle(&d, 10, 20, 20, 15); /* its top side lies in the outline */
    drawing_reverse(&d);
    assert_int_equal(utw_outline_check(drawing_done(&d), &err), UTW_E_OUTLINE);
    assert_non_null(strstr(err.text, "touches"));
    drawing_clear(&d);
}

/* ---- numbers and scale ------------------------------------------------------------------- */

static double seconds(void)
{
    struct timespec now;
    clock_gettime(CLOCK_MONOTONIC, &now);
    return (double)now.tv_sec + 1e-9 * (double)now.tv_nsec;
}

/* A gear of n teeth with curved flanks: four curves a tooth. */
static drawing gear(int n)
{
    drawing d = start();
    const double w = 2 * UTW_PI / n;
    drawing_move(&d, 100, 0);
    for (int i = 0; i < n; i++) {
        const double a = i * w, r0 = 100, r1 = 101;
        const double q[4] = {a + 0.25 * w, a + 0.5 * w, a + 0.75 * w, a + w};
        drawing_cubic(&d, 100.3 * cos(a), 100.3 * sin(a), 100.7 * cos(q[0]), 100.7 * sin(q[0]),
                      r1 * cos(q[0]), r1 * sin(q[0]));
        drawing_line(&d, r1 * cos(q[1]), r1 * sin(q[1]));
        drawing_line(&d, r0 * cos(q[2]), r0 * sin(q[2]));
        if (i < n - 1)
            drawing_line(&d, r0 * cos(q[3]), r0 * sin(q[3]));
        else
            drawing_line(&d, 100, 0);
    }
    drawing_close(&d);
    return d;
}

static void many_curves_are_fast(void **state)
{
    (void)state;
    drawing d = gear(500);
    double t = seconds();
    accepted(&d);
    t = seconds() - t;
    print_message("2000 curves: %.4f s\n", t);
    d = gear(5000);
    t = seconds();
    accepted(&d);
    t = seconds() - t;
    print_message("20000 curves: %.4f s\n", t);
}

static void slanted_zigzag_does_not_hang(void **state)
{
    (void)state;
    /* 2000 long strokes whose boxes all overlap: nearly every pair has to be looked at */
    enum { N = 2000 };
    drawing d = start();
    drawing_move(&d, 0, 0);
    for (int i = 0; i < N; i++) {
        const double s = 1e-3 * i, x = i & 1 ? 0 : 100;
        drawing_line(&d, x + s, x - s);
        drawing_line(&d, x + s + 1e-3, x - s - 1e-3);
    }
    drawing_line(&d, 0, -200);
    drawing_line(&d, -200, 0);
    drawing_close(&d);
    drawing_reverse(&d);
    double t = seconds();
    utw_error err;
    assert_ok(utw_outline_check(drawing_done(&d), &err));
    t = seconds() - t;
    print_message("zigzag of 4000 curves: %.4f s\n", t);
    drawing_clear(&d);
}

static void curves_side_by_side_do_not_hang(void **state)
{
    (void)state;
    drawing d =
        start(); /* an arc and the cubic that follows it to 3e-4 of its radius, just apart */
    const double r = 50, k = r * 0.5522847498, e = 1.5e-2;
    drawing_move(&d, r, 0);
    drawing_arc(&d, r * sqrt(0.5), r * sqrt(0.5), 0, r);
    drawing_line(&d, 0, r - e);
    drawing_cubic(&d, k, r - e, r - e, k, r - e, 0);
    drawing_close(&d);
    double t = seconds();
    utw_error err;
    (void)utw_outline_check(drawing_done(&d), &err);
    t = seconds() - t;
    drawing_clear(&d);
}

static void direction_is_looked_at(void **state)
{
    (void)state;
    utw_error err;
    drawing d = start();
    drawing_circle(&d, 0, 0, 5);
    drawing_circle(&d, 2, 0, 1);
    assert_int_equal(utw_outline_check(drawing_done(&d), &err), UTW_E_INTERNAL);
    assert_string_equal(err.text, "loop 1 of part 1 runs the wrong way round");
    drawing_clear(&d);
}

static void allocation_failures_are_reported(void **state)
{
    (void)state;
    drawing d = start();
    drawing_rectangle(&d, 0, 0, 40, 20);
    drawing_circle(&d, 20, 10, 6);
    drawing_reverse(&d);
    const utw_outline *o = drawing_done(&d);
    utw_error err;
    int refusals = 0;
    for (long n = 1;; n++) {
        utw_memory_fail_at(n);
        const utw_status st = utw_outline_check(o, &err);
        utw_memory_fail_at(0);
        if (st == UTW_OK) break;
        assert_int_equal(st, UTW_E_NOMEM);
        refusals++;
    }
    assert_true(refusals >= 5);
    drawing_clear(&d);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(sound_sections_pass),
        balanced_test(smooth_tight_joints_pass),
        balanced_test(crossing_lines_are_named),
        balanced_test(arc_through_a_far_side_is_seen),
        balanced_test(loop_through_its_own_vertex_touches),
        balanced_test(tangent_circles_touch),
        balanced_test(ellipses_and_cubics_cross),
        balanced_test(holes_must_lie_inside),
        balanced_test(many_curves_are_fast),
        balanced_test(slanted_zigzag_does_not_hang),
        balanced_test(curves_side_by_side_do_not_hang),
        balanced_test(direction_is_looked_at),
        balanced_test(allocation_failures_are_reported),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
