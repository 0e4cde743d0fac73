/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/vec2.h"
#include "mesh/blend.h"
#include "mesh/locate.h"
#include "section/solution.h"
#include "support/stressed.h"

/* A fixed row of numbers in [0, 1) (a linear congruence, Knuth, The Art of Computer Programming,
 * vol. 2). */
static double random_number(unsigned *state)
{
    *state = *state * 1664525u + 1013904223u;
    return (*state >> 8) / 16777216.0;
}

static utw_locator *locator_of(const stressed *s)
{
    utw_error err;
    utw_locator *locator = NULL;
    assert_ok(utw_locator_create(s->solution->solved.mesh, &locator, &err));
    return locator;
}

/* Any point of any element is found again, in this element or, on its rim, in a neighbour. */
static void test_every_element(void **state)
{
    (void)state;
    for (int i = 0; stressed_sample(i) != NULL; i++) {
        stressed s = stressed_of(stressed_sample(i), 1e-3);
        const utw_mesh *mesh = s.solution->solved.mesh;
        utw_locator *locator = locator_of(&s);
        unsigned seed = 7;
        for (int t = 0; t < mesh->n_tri; t++)
            for (int k = 0; k < 6; k++) {
                double r = random_number(&seed), q = random_number(&seed), xy[2], J[4];
                if (k == 0) q = 0; /* on a side */
                if (k == 1) r = q = 0;
                if (r + q > 1) r = 1 - r, q = 1 - q;
                utw_blend b;
                utw_place place;
                utw_blend_of(mesh, &mesh->tri[t], &b);
                utw_blend_at(&b, r, q, xy, J);
                assert_int_equal(utw_locate(locator, xy, &place), 1);
                if (k > 1) assert_int_equal(place.tri, t);
                double found[2];
                utw_blend_of(mesh, &mesh->tri[place.tri], &b);
                utw_blend_at(&b, place.r, place.s, found, J);
                assert_true(utw_distance(xy, found) < 1e-12);
                assert_true(place.r > -1e-9 && place.s > -1e-9 && place.r + place.s < 1 + 1e-9);
            }
        utw_locator_free(locator);
        stressed_clear(&s);
    }
}

/* A point is found exactly when it lies in the outline: here a ring, in net coordinates. */
static void test_inside_and_outside(void **state)
{
    (void)state;
    stressed s =
        stressed_of("{\"units\": \"mm N\", \"parts\": [{\"outline\": {\"circle\": [0,0,5]}, "
                    "\"holes\": [{\"circle\": [0,0,3]}]}]}",
                    1e-3);
    utw_locator *locator = locator_of(&s);
    const double unit = s.solution->unit;
    unsigned seed = 3;
    for (int i = 0; i < 4000; i++) {
        const double xy[2] = {(12 * random_number(&seed) - 6) / unit,
                              (12 * random_number(&seed) - 6) / unit};
        const double r = utw_norm(xy) * unit;
        utw_place place;
        if (fabs(r - 3) < 1e-9 || fabs(r - 5) < 1e-9) continue;
        assert_int_equal(utw_locate(locator, xy, &place), r > 3 && r < 5);
        const double d = unit * utw_locate_boundary(locator, xy, &place);
        assert_close_scaled(d, fmin(fabs(r - 3), fabs(r - 5)), 1e-12, 1);
        assert_close(unit * utw_distance(xy, place.xy), d, 1e-7);
    }
    utw_locator_free(locator);
    stressed_clear(&s);
}

/* The nearest point of a straight side, of a corner, and the side it stands on. */
static void test_nearest_boundary(void **state)
{
    (void)state;
    stressed s = stressed_rectangle(4, 2, 0.3, 1e-3);
    utw_locator *locator = locator_of(&s);
    const double unit = s.solution->unit;
    const double point[3][2] = {{0.7, 3.5}, {5, 4}, {0.5, 0.25}};
    const double nearest[3][2] = {{0.7, 1}, {2, 1}, {0.5, 1}};
    for (int i = 0; i < 3; i++) {
        const double xy[2] = {point[i][0] / unit, point[i][1] / unit};
        utw_place place, again;
        utw_locate_boundary(locator, xy, &place);
        assert_close(unit * place.xy[0], nearest[i][0], 1e-12);
        assert_close(unit * place.xy[1], nearest[i][1], 1e-12);
        assert_int_equal(utw_locate(locator, place.xy, &again), 1);
    }
    utw_locator_free(locator);
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_every_element),
        balanced_test(test_inside_and_outside),
        balanced_test(test_nearest_boundary),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
