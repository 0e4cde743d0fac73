/* SPDX-License-Identifier: GPL-3.0-or-later */
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

static void cubic_meeting_itself_is_seen(void **state)
{
    (void)state;
    drawing d = start();
    drawing_move(&d, 0, 0);
    drawing_cubic(&d, 30, 20, -20, 20, 10, 0); /* a loop, symmetric about x = 5 */
    drawing_line(&d, 5, -8);
    drawing_close(&d);
    utw_error err;
    assert_int_equal(utw_outline_check(drawing_done(&d), &err), UTW_E_OUTLINE);
    assert_non_null(strstr(err.text, "the edge to vertex 2 crosses itself near (5, "));
    assert_int_equal(err.vertex, 1);
    drawing_clear(&d);
    d = start();
    drawing_move(&d, 0, 0);
    drawing_cubic(&d, 10, 20, 0, 20, 10, 0); /* control polygon crossed, still no loop: a cusp */
    drawing_line(&d, 5, -8);
    drawing_close(&d);
    assert_int_equal(utw_outline_check(drawing_done(&d), &err), UTW_E_OUTLINE);
    assert_non_null(strstr(err.text, "turns back on itself near (5, 15)"));
    drawing_clear(&d);
    d = start();
    drawing_move(&d, 0, 0);
    drawing_cubic(&d, 0, 0, 6, 9, 10, 0);
    drawing_close(&d);
    refused(&d, 0, 0, 1,
            "part 1, outline: the edge to vertex 2 has a control point on its end (0, 0), so that "
            "its direction "
            "there is not given; put the control point on the tangent, a third of the way along");
}

static void turning_straight_back_is_seen(void **state)
{
    (void)state;
    const double spike[5][2] = {{0, 0}, {10, 0}, {10, 5}, {14, 5}, {5, 5}};
    drawing d = polygon(5, spike);
    refused(&d, 0, 0, 3,
            "part 1, outline: the edges before and after the corner at (14, 5), vertex 4, run back "
            "along one "
            "another (the angle between them is 0 degrees, least is 0.0573); open the corner");
    d = start(); /* a crescent: two circles that touch from the inside */
    drawing_move(&d, 5, 0);
    drawing_arc(&d, 0, 5, -5, 0);
    drawing_arc(&d, 0, -5, 5, 0);
    drawing_arc(&d, 2, -3, -1, 0);
    drawing_arc(&d, 2, 3, 5, 0);
    drawing_close(&d);
    utw_error err;
    assert_int_equal(utw_outline_check(drawing_done(&d), &err), UTW_E_OUTLINE);
    assert_non_null(strstr(err.text, "run back along one another"));
    drawing_clear(&d);
}

/* ---- holes ------------------------------------------------------------------------------- */

static void numbers_and_lengths_are_looked_at(void **state)
{
    (void)state;
    const double twice[4][2] = {{0, 0}, {10, 0}, {10, 0}, {0, 7}};
    drawing d = polygon(4, twice);
    refused(&d, 0, 0, 2,
            "part 1, outline: the edge to vertex 3 has no length: vertex 3 repeats the one before "
            "it at (10, 0); "
            "remove one");
    const double tiny[4][2] = {{0, 0}, {10, 0}, {10, 5e-7}, {0, 7}};
    d = polygon(4, tiny);
    refused(&d, 0, 0, 2,
            "part 1, outline: the edge to vertex 3 is 5e-07 long, less than 1e-07 of the section's "
            "size 12.2066; "
            "lengthen or remove it");
    const double nan[3][2] = {{0, 0}, {10, NAN}, {10, 5}};
    d = polygon(3, nan);
    refused(&d, 0, 0, 1,
            "part 1, outline: vertex 2 has a coordinate that is not a finite number; correct it");
    const double large[3][2] = {{0, 0}, {3e9, 0}, {0, 4e9}};
    d = polygon(3, large);
    refused(&d, -1, -1, -1,
            "the section is 5e+09 long, more than 1e+09 in the units of the file: check the units");
    const double small[3][2] = {{0, 0}, {3e-10, 0}, {0, 4e-10}};
    d = polygon(3, small);
    refused(&d, -1, -1, -1,
            "the section is 5e-10 long, less than 1e-09 in the units of the file: check the units");
    const double far[3][2] = {{4e7, 0}, {4e7 + 3, 0}, {4e7, 4}};
    d = polygon(3, far);
    refused(&d, -1, -1, -1,
            "the section is 5 long but lies 4e+07 away from the origin, so that its coordinates "
            "have too few "
            "digits left: move it toward the origin");
    d = start();
    drawing_move(&d, 0, 0);
    drawing_line(&d, 10, 0);
    drawing_arc(&d, 5, 1e-9, 0, 0);
    drawing_close(&d);
    refused(&d, 0, 0, 0,
            "part 1, outline: the edge to vertex 1 has the radius 1.25e+10, more than 1e+06 times "
            "the section's "
            "size 10; draw it as a straight line");
    d = start();
    drawing_part(&d, -1);
    refused(&d, 0, -1, -1, "part 1 has no outline; give it one");
    drawing_init(&d);
    refused(&d, -1, -1, -1, "the section has no part; give it one");
}

/* ---- speed and bad temper ---------------------------------------------------------------- */

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(cubic_meeting_itself_is_seen),
        balanced_test(turning_straight_back_is_seen),
        balanced_test(numbers_and_lengths_are_looked_at),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
