/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/vec2.h"
#include "outline/draft.h"
#include "outline/shape.h"
#include "support/figure.h"
#include "support/support.h"

/* A shape to name the dimensions of drafts drawn here. */
static const utw_shape_dimension dimension[] = {UTW_SHAPE_RADIUS("r", "radius"),
                                          UTW_SHAPE_RADIUS("q", "other radius")};
static const utw_shape shape = {"test", "", "", "", UTW_SHAPE_ROWS(dimension), NULL};

static utw_shape_case given(double r, double q)
{
    return (utw_shape_case){.shape = &shape, .value = {r, q}, .given = {1, 1}};
}

static utw_status triangle(double r, double q, double extra, utw_part *part, utw_error *err)
{
    const utw_shape_case g = given(r, q);
    utw_draft d;
    utw_draft_init(&d);
    utw_draft_begin(&d);
    utw_draft_round(&d, 0, 0, &g, 0, extra);
    utw_draft_round(&d, 6, 0, &g, 1, 0);
    utw_draft_point(&d, 0, 8);
    const utw_status st = utw_draft_part(&d, &g, part, err);
    utw_draft_clear(&d);
    return st;
}

static void fillets_are_tangent_and_chains_closed(void **state)
{
    (void)state;
    utw_error err;
    utw_part part;
    assert_ok(triangle(1.1, 0.7, 0.4, &part, &err));
    const utw_loop *loop = &part.loop[0];
    assert_int_equal(loop->n, 5);
    for (int k = 0; k < loop->n; k++) {
        const utw_curve *a = &loop->curve[k], *b = &loop->curve[(k + 1) % loop->n];
        assert_memory_equal(a->to, b->from, sizeof a->to);
        double da[2], db[2];
        utw_curve_d1(a, 1, da);
        utw_curve_d1(b, 0, db);
        const double sine = utw_cross(da, db) / utw_norm(da) / utw_norm(db);
        if (a->kind == UTW_ARC || b->kind == UTW_ARC) assert_true(fabs(sine) < 1e-14);
        if (a->kind != UTW_ARC) continue;
        assert_close(utw_distance(a->centre, a->from), utw_norm(a->u), 1e-14);
        assert_close(utw_distance(a->centre, a->to), utw_norm(a->u), 1e-14);
    }
    assert_close(utw_norm(loop->curve[1].u), 1.5, 1e-15);
    utw_part_clear(&part);
}

static void limits_name_the_dimension_and_what_is_left_for_it(void **state)
{
    (void)state;
    utw_error err;
    utw_part part;
    /* at (6, 0) the inside angle has tangent 8/6: the tangent length is q / tan(half of it) = 2 q
     */
    assert_int_equal(triangle(1, 2.6, 0, &part, &err), UTW_E_OUTLINE);
    assert_string_equal(err.text, "test: q = 2.6 does not fit: at most 2.5 with r = 1");
    assert_int_equal(triangle(4.6, 1, 0, &part, &err), UTW_E_OUTLINE);
    assert_string_equal(err.text, "test: r = 4.6 does not fit: at most 4 with q = 1");
    /* the radius is r + 0.5 */
    assert_int_equal(triangle(4.6, 1, 0.5, &part, &err), UTW_E_OUTLINE);
    assert_string_equal(err.text, "test: r = 4.6 does not fit: at most 3.5 with q = 1");
    assert_ok(triangle(3.5, 1, 0.5, &part, &err));
    assert_int_equal(part.loop[0].n, 4); /* the edge between them is used up */
    utw_part_clear(&part);
    assert_ok(triangle(1.0 / 3, (6 - 1.0 / 3) / 2, 0, &part, &err)); /* to rounding */
    assert_int_equal(part.loop[0].n, 4);
    utw_part_clear(&part);
}

static void clockwise_drafts_are_turned_round(void **state)
{
    (void)state;
    utw_error err;
    utw_part part;
    const utw_shape_case g = given(1, 0);
    for (int hole = 0; hole < 2; hole++) {
        utw_draft d;
        utw_draft_init(&d);
        if (hole) utw_draft_ellipse(&d, 5, 5, 20, 30);
        utw_draft_begin(&d);
        utw_draft_round(&d, 0, 0, &g, 0, 0);
        utw_draft_point(&d, 0, 8);
        utw_draft_point(&d, 6, 0);
        assert_ok(utw_draft_part(&d, &g, &part, &err));
        assert_true((utw_loop_area(&part.loop[hole]) > 0) == !hole);
        assert_close(fabs(utw_loop_area(&part.loop[hole])), 24 - (1 - UTW_PI / 4), 1e-14);
        utw_part_clear(&part);
        utw_draft_clear(&d);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(fillets_are_tangent_and_chains_closed),
        balanced_test(limits_name_the_dimension_and_what_is_left_for_it),
        balanced_test(clockwise_drafts_are_turned_round),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
