/* SPDX-License-Identifier: GPL-3.0-or-later
 * One joint at a time; all of them around a node are tested with utw_thicken(). */
#include "outline/joint.h"

#include "base/vec2.h"
#include "support/support.h"

/* A wall comes to the origin along x from the left, on its lower side; another, turned by `bend`
 * degrees to the left, leaves it. The wedge below them is pi + bend. */
static utw_joint_fit joint(double t_in, double t_out, double bend, utw_joint *j)
{
    const double a = bend * UTW_PI / 180, o[2] = {0, 0}, before[2] = {-50, 0},
                 after[2] = {50 * cos(a), 50 * sin(a)};
    const utw_path in = utw_path_line(before, o, t_in, t_in),
                   out = utw_path_line(o, after, t_out, t_out);
    const utw_arm arm_in = {{&in, -1}, in.length, -1}, arm_out = {{&out, -1}, 0, 1};
    *j = (utw_joint){.wedge = UTW_PI + a};
    return utw_joint_make(&arm_in, &arm_out, 0, o, 1e-7, 1e-5, j);
}

static void equal_walls_are_mitred(void **state)
{
    (void)state;
    for (int i = -14; i <= 15; i++) {
        utw_joint j;
        const double a = i * UTW_PI / 18, lean = tan(a / 2); /* by 10 degrees */
        assert_int_equal(joint(4, 4, 10 * i, &j), UTW_JOINT_MADE);
        assert_int_equal(j.n, 1);
        assert_close_scaled(j.p[0][0], 2 * lean, 1e-13, 1);
        assert_close(j.p[0][1], -2, 1e-13);
        assert_close(j.s_in, 50 + 2 * lean, 1e-13);
        assert_close_scaled(j.s_out, -2 * lean, 1e-13, 1);
    }
}

static void walls_that_fold_back_are_cut(void **state)
{
    (void)state;
    utw_joint j;
    assert_int_equal(joint(4, 4, 150, &j), UTW_JOINT_MADE);
    assert_int_equal(j.n, 1);
    assert_int_equal(joint(4, 4, 152, &j), UTW_JOINT_MADE); /* 28 degrees between them */
    assert_int_equal(j.n, 2);
    assert_true(j.p[0][0] == 0 && j.p[0][1] == -2);
    assert_close(utw_norm(j.p[1]), 2, 1e-14);
    assert_true(j.s_in == 50 && j.s_out == 0);
}

static void thick_walls_end_square_beside_thin_ones(void **state)
{
    (void)state;
    utw_joint j;
    assert_int_equal(joint(6, 2, 0, &j), UTW_JOINT_MADE);
    assert_int_equal(j.n, 2);
    assert_true(j.p[0][0] == 0 && j.p[0][1] == -3 && j.p[1][0] == 0 && j.p[1][1] == -1);
    assert_int_equal(joint(2, 6, 0, &j), UTW_JOINT_MADE);
    assert_true(j.p[0][1] == -1 && j.p[1][1] == -3);
    /* bent by 10 degrees the thin side is cut where the end face stands */
    for (int i = -1; i <= 1; i += 2) {
        const double a = i * UTW_PI / 18;
        assert_int_equal(joint(6, 2, 10 * i, &j), UTW_JOINT_MADE);
        assert_int_equal(j.n, 2);
        assert_true(j.p[0][1] == -3);
        assert_close_scaled(j.p[1][0], 0, 1e-14, 1);
        assert_close(j.p[1][1], -1 / cos(a), 1e-14);
    }
    /* at 60 degrees they are mitred again */
    assert_int_equal(joint(6, 2, 60, &j), UTW_JOINT_MADE);
    assert_int_equal(j.n, 1);
    assert_close(j.p[0][1], -3, 1e-14);
}

static void what_makes_no_joint_is_told(void **state)
{
    (void)state;
    utw_joint j;
    assert_int_equal(joint(4, 4 + 1e-5, 0, &j), UTW_JOINT_TINY_STEP);
    assert_int_equal(joint(4, 4 + 1e-8, 0, &j), UTW_JOINT_MADE);
    assert_int_equal(j.n, 1);
    assert_int_equal(joint(4, 4, -179, &j),
                     UTW_JOINT_TOO_SHARP); /* 2/tan(0.5 degrees) = 229 along walls of 50 */
    assert_int_equal(joint(4, 4, -160, &j), UTW_JOINT_MADE);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(equal_walls_are_mitred),
        cmocka_unit_test(walls_that_fold_back_are_cut),
        cmocka_unit_test(thick_walls_end_square_beside_thin_ones),
        cmocka_unit_test(what_makes_no_joint_is_told),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
