/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "section/keep_out.h"
#include "support/stressed.h"

/* An angle with a leg 10 thick (along x) and one 6 thick, its corner sharp; the net is centroidal.
 */
static void test_radius_of_the_thinner_wall(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_of(
        "{\"units\": \"mm N\", \"parts\": [{\"outline\": [[0,0], [80,0], [80,10], [6,10], "
        "[6,90], [0,90]]}]}",
        1e-3);
    utw_keep_out k;
    assert_ok(utw_keep_out_init(&k, s.solution, &err));
    const double L = s.solution->unit, *origin = s.solution->origin;
    assert_int_equal(k.n, 1);
    assert_close(origin[0] + L * k.centre[0][0], 6, 1e-12);
    assert_close(origin[1] + L * k.centre[0][1], 10, 1e-12);
    assert_close(L * k.radius[0], 0.6, 1e-12);
    const double point[4][2] = {{6.59, 10}, {6.61, 10}, {5.6, 9.6}, {6 - 0.6, 10}};
    const int inside[4] = {1, 0, 1, 0};
    for (int i = 0; i < 4; i++) {
        const double xy[2] = {(point[i][0] - origin[0]) / L, (point[i][1] - origin[1]) / L};
        assert_int_equal(utw_keep_out_holds(&k, xy), inside[i]);
    }
    utw_keep_out_clear(&k);
    stressed_clear(&s);
}

static void test_no_sharp_corner(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_rectangle(3, 2, 0.3, 1e-3);
    utw_keep_out k;
    assert_ok(utw_keep_out_init(&k, s.solution, &err));
    const double origin[2] = {0, 0};
    assert_int_equal(k.n, 0);
    assert_int_equal(utw_keep_out_holds(&k, origin), 0);
    utw_keep_out_clear(&k);
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_radius_of_the_thinner_wall),
        balanced_test(test_no_sharp_corner),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
