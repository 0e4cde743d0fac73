/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/draft.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/support.h"

static void repeated_vertices_go(void **state)
{
    (void)state;
    utw_draft d;
    utw_draft_init(&d);
    utw_draft_begin(&d); /* a square: doubled corner, last vertex back at the first */
    utw_draft_point(&d, 0, 0);
    utw_draft_point(&d, 4, 0);
    utw_draft_point(&d, 4 + 1e-14, 0);
    utw_draft_point(&d, 4, 3);
    utw_draft_point(&d, 0, 3);
    utw_draft_point(&d, 0, 1e-14);
    utw_draft_tidy(&d);
    assert_int_equal(d.loop[0].n, 4);
    utw_draft_clear(&d);
}

static void an_arc_back_to_the_start_belongs_to_the_first_vertex(void **state)
{
    (void)state;
    utw_draft d;
    utw_draft_init(&d);
    utw_draft_begin(&d);
    utw_draft_point(&d, 2, 0);
    utw_draft_point(&d, 2, 5);
    utw_draft_point(&d, 0, 2);
    utw_draft_arc(&d, 0, 0, 2, UTW_PI / 2, 0, 2, 0);
    utw_draft_tidy(&d);
    assert_int_equal(d.loop[0].n, 3);
    assert_true(d.loop[0].vertex[0].is_arc && d.loop[0].vertex[0].at[0] == 2 &&
                d.loop[0].vertex[0].at[1] == 0);
    assert_true(!d.loop[0].vertex[1].is_arc && d.loop[0].vertex[1].at[1] == 5);
    utw_draft_clear(&d);
}

static void arcs_of_more_than_half_a_turn_are_cut(void **state)
{
    (void)state;
    utw_draft d;
    utw_draft_init(&d);
    utw_draft_begin(&d);
    utw_draft_point(&d, 2, 0);
    utw_draft_arc(&d, 0, 0, 2, 0, 1.5 * UTW_PI, 0, -2);
    assert_int_equal(d.loop[0].n, 3);
    const utw_draft_vertex *v = d.loop[0].vertex;
    assert_close(v[1].at[0], 2 * cos(0.75 * UTW_PI), 1e-15);
    assert_close(v[1].a1, 0.75 * UTW_PI, 1e-15);
    assert_close(v[2].a0, 0.75 * UTW_PI, 1e-15);
    utw_draft_clear(&d);
    utw_draft_begin(&d);
    utw_draft_point(&d, 2, 0);
    utw_draft_arc(&d, 0, 0, 2, 0, UTW_PI, -2, 0);
    assert_int_equal(d.loop[0].n, 2);
    utw_draft_clear(&d);
}

static void placing_mirrors_then_turns_then_shifts(void **state)
{
    (void)state;
    utw_draft d;
    utw_draft_init(&d);
    utw_draft_begin(&d);
    utw_draft_point(&d, 2, 0);
    utw_draft_point(&d, 2, 5);
    utw_draft_point(&d, 0, 2);
    utw_draft_arc(&d, 0, 0, 2, UTW_PI / 2, 0, 2, 0);
    utw_draft_ellipse(&d, 1, 1, 0.5, 0.25);
    const utw_placement p = {.at = {10, 20}, .turn = 270 * UTW_PI / 180, .mirror = 1};
    utw_draft_place(&d, &p);
    /* (2, 5) -> (-2, 5) -> by -90 degrees (5, 2) -> (15, 22), exactly */
    assert_true(d.loop[0].vertex[1].at[0] == 15 && d.loop[0].vertex[1].at[1] == 22);
    const utw_draft_vertex *v = &d.loop[0].vertex[3];
    assert_close(v->centre[0] + v->r * cos(v->a1), v->at[0], 1e-14);
    assert_close(v->centre[1] + v->r * sin(v->a1), v->at[1], 1e-14);
    /* its start is where the vertex before is */
    assert_close(v->centre[0] + v->r * cos(v->a0), d.loop[0].vertex[2].at[0], 1e-14);
    assert_close(v->centre[1] + v->r * sin(v->a0), d.loop[0].vertex[2].at[1], 1e-14);
    assert_true(d.loop[1].centre[0] == 11 && d.loop[1].centre[1] == 21);
    assert_close_scaled(cos(d.loop[1].turn), 0, 1e-14, 1); /* its long axis is upright now */
    utw_draft_clear(&d);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(repeated_vertices_go),
        balanced_test(an_arc_back_to_the_start_belongs_to_the_first_vertex),
        balanced_test(arcs_of_more_than_half_a_turn_are_cut),
        balanced_test(placing_mirrors_then_turns_then_shifts),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
