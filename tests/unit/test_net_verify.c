/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/vec2.h"
#include "outline/check.h"
#include "outline/net.h"
#include "support/drawing.h"
#include "support/support.h"

static void refused(drawing *d, int part, const char *text)
{
    utw_error err;
    utw_net *net = NULL;
    const utw_status st = utw_net_create(drawing_done(d), &net, &err);
    assert_int_equal(st, UTW_E_OUTLINE);
    assert_null(net);
    if (strstr(err.text, text) == NULL) print_error("%s\nlacks: %s\n", err.text, text);
    assert_non_null(strstr(err.text, text));
    assert_int_equal(err.part, part);
    assert_int_equal(utw_outline_check(drawing_done(d), &err), UTW_E_OUTLINE);
    drawing_clear(d);
}

static drawing start(void)
{
    drawing d;
    drawing_init(&d);
    drawing_part(&d, -1);
    return d;
}

/* ---- one part ---------------------------------------------------------------------------- */

static void overlaps_are_refused(void **state)
{
    (void)state;
    drawing d = start();
    drawing_rectangle(&d, 0, 0, 3, 2);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 2.5, 0.5, 5, 3);
    refused(&d, 1,
            "parts 1 and 2 overlap: the edge to vertex 2 of part 2 crosses the edge to vertex 3 of "
            "part 1 "
            "near (3, 0.5); cut one out of the other");
    d = start(); /* the same sides, one within the other */
    drawing_rectangle(&d, 0, 0, 3, 2);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 1, 0, 3, 2);
    refused(&d, 1, "overlap");
    d = start(); /* twice the same part */
    drawing_rectangle(&d, 0, 0, 3, 2);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 0, 0, 3, 2);
    refused(&d, 1, "parts 1 and 2 overlap: both lie on the same side of their common edge");
    d = start(); /* wholly inside */
    drawing_rectangle(&d, 0, 0, 3, 2);
    drawing_part(&d, -1);
    drawing_circle(&d, 1.5, 1, 0.5);
    refused(&d, 1, "parts 2 and 1 overlap near");
    d = start(); /* wholly around */
    drawing_circle(&d, 1.5, 1, 0.5);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 0, 0, 3, 2);
    refused(&d, 0, "parts 1 and 2 overlap near");
    d = start(); /* crossing exactly in vertices: a square on edge over a square of the same corners
                  */
    drawing_rectangle(&d, -1, -1, 1, 1);
    drawing_part(&d, -1);
    const double lozenge[4][2] = {{1, 1}, {-2, 2}, {-1, -1}, {2, -2}};
    drawing_polygon(&d, 4, lozenge);
    refused(&d, 1, "where their parts overlap");
}

static void slivers_are_refused(void **state)
{
    (void)state;
    for (int sign = -1; sign <= 1; sign += 2) { /* a gap, a lap */
        drawing d = start();
        drawing_rectangle(&d, 0, 0, 3, 2);
        drawing_part(&d, -1);
        drawing_rectangle(&d, 3 + sign * 1e-7, 0.2, 5, 1.8);
        refused(&d, 1, "lies 1e-07 beside the edge to vertex 3 of part 1");
    }
    drawing d = start(); /* common corners, but an arc against its chord's neighbour */
    drawing_move(&d, 0, 0);
    drawing_line(&d, 10, 0);
    drawing_arc(&d, 11, 5, 10, 10);
    drawing_line(&d, 0, 10);
    drawing_close(&d);
    drawing_part(&d, -1);
    drawing_move(&d, 20, 0);
    drawing_line(&d, 20, 10);
    drawing_line(&d, 10, 10);
    drawing_arc(&d, 11 + 3e-6, 5, 10, 0);
    drawing_close(&d);
    refused(&d, 1, "run within");
    d = start(); /* a wedge of 2e-4 rad between two long sides */
    drawing_rectangle(&d, 0, 0, 3, 2);
    drawing_part(&d, -1);
    const double wedge[4][2] = {{3, 0}, {5, 0}, {5, 2}, {3 + 4e-4, 2}};
    drawing_polygon(&d, 4, wedge);
    refused(&d, 1, "at an angle of nearly 0");
    d = start(); /* a circle that comes within 1e-6 of a side between its quarter points */
    drawing_circle(&d, 0, 0, 1);
    drawing_part(&d, -1);
    const double s = sqrt(0.5), a = 1 + 1e-7;
    const double slope[4][2] = {
        {s * (a - 2), s * (a + 2)}, {s * (a + 2), s * (a - 2)}, {5, 5}, {4, 5}};
    drawing_polygon(&d, 4, slope);
    refused(&d, 1, "leaves a sliver against the closed curve of part 1 near (0.70");
}

static void contacts_in_a_point_are_refused(void **state)
{
    (void)state;
    drawing d = start();
    drawing_rectangle(&d, 0, 0, 3, 2);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 3, 2, 5, 3);
    refused(&d, 1, "meet at (3, 2) and their parts touch in that point only");
    d = start(); /* two circles side by side */
    drawing_circle(&d, 0, 0, 2);
    drawing_part(&d, -1);
    drawing_circle(&d, 3 * cos(0.4), 3 * sin(0.4), 1);
    refused(&d, 1, "only touches the closed curve of part 1, in the point (1.842");
    d = start(); /* a corner on a side */
    drawing_rectangle(&d, 0, 0, 3, 2);
    drawing_part(&d, -1);
    const double tip[3][2] = {{1, 2}, {2, 3}, {0, 3}};
    drawing_polygon(&d, 3, tip);
    refused(&d, 1, "meet at (1, 2) and their parts touch in that point only");
}

static void parts_that_do_not_hang_together_are_refused(void **state)
{
    (void)state;
    drawing d = start();
    drawing_rectangle(&d, 0, 0, 3, 2);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 4, 0, 5, 2);
    refused(&d, 1, "part 2 shares no edge with part 1 or with what hangs on it");
    d = start(); /* loose in a hole */
    drawing_rectangle(&d, 0, 0, 30, 20);
    drawing_circle(&d, 15, 10, 6);
    drawing_reverse(&d);
    drawing_part(&d, -1);
    drawing_circle(&d, 15, 10, 5);
    refused(&d, 1, "so that the section falls apart");
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(overlaps_are_refused),
        balanced_test(slivers_are_refused),
        balanced_test(contacts_in_a_point_are_refused),
        balanced_test(parts_that_do_not_hang_together_are_refused),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
