/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "thinwall/chordal.h"

#include "base/vec2.h"
#include "support/shapes.h"

typedef struct axis {
    utw_outline *outline;
    utw_border *border;
    utw_chordal *chordal;
} axis;

static axis axis_of(const char *shape)
{
    utw_error err;
    axis a = {shape_of(shape), NULL, NULL};
    assert_ok(utw_border_create(a.outline, 1, &a.border, &err));
    assert_ok(utw_chordal_create(a.border, &a.chordal, &err));
    return a;
}

static void clear(axis *a)
{
    utw_chordal_free(a->chordal);
    utw_border_free(a->border);
    utw_outline_free(a->outline);
}

static void counts(const char *shape, int branches, int junctions)
{
    axis a = axis_of(shape);
    if (a.chordal->n_branch != branches) print_error("%s\n", shape);
    assert_int_equal(a.chordal->n_branch, branches);
    assert_int_equal(a.chordal->n_junction, junctions);
    clear(&a);
}

/* Convex corners, roundings and fillets leave no branch. */
static void branches_and_junctions(void **state)
{
    (void)state;
    counts("rectangle b=100 h=8", 1, 0);
    counts("angle h=100 b=65 t=10 r=10 r2=5", 1, 0);
    counts("channel h=100 b=50 tf=8.5 tw=6 r=8.5 r2=4.5 slope=8", 1, 0);
    counts("tee h=100 b=80 tf=11 tw=9 r=11", 3, 1);
    counts("I h=200 b=100 tf=8.5 tw=5.6 r=12", 5, 2);
    counts("box h=100 b=60 t=6 ro=9 ri=6", 1, 0);
    counts("tube d=60.3 t=4", 1, 0);
    counts("rectangle b=10 h=10", 0, 0);
    counts("polygon n=7 d=23", 0, 0);
}

/* A strip: what is between its first and last chord and beyond them is all of it. */
static void areas(void **state)
{
    (void)state;
    axis a = axis_of("channel h=100 b=50 tf=8.5 tw=6 r=8.5");
    const utw_branch *b = &a.chordal->branch[0];
    const int last = b->first + b->n - 1;
    double whole = 0;
    for (int i = 0; i < a.border->n_point; i++)
        whole += 0.5 * utw_cross(a.border->xy[i], a.border->xy[a.border->after[i]]);
    assert_int_equal(b->from, -1);
    assert_int_equal(b->to, -1);
    assert_int_equal(b->closed, 0);
    assert_close(utw_chordal_end_area(a.border, a.chordal, b->first, 0) +
                     utw_chordal_area(a.chordal, b, b->first, last) +
                     utw_chordal_end_area(a.border, a.chordal, last, 1),
                 whole, 1e-12);
    clear(&a);
    a = axis_of("tube d=60.3 t=4");
    assert_int_equal(a.chordal->branch[0].closed, 1);
    clear(&a);
    utw_chordal_free(NULL);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(branches_and_junctions), balanced_test(areas)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
