/* SPDX-License-Identifier: GPL-3.0-or-later
 * Moving, turning, mirroring and scaling a section do to its properties what they must. */
#include "base/vec2.h"
#include "section/area.h"
#include "support/drawing.h"
#include "support/support.h"

static const double TIGHT = 1e-13;

/* The properties of a drawing, which is freed. */
static utw_area area_of(drawing *d)
{
    utw_area a;
    utw_error err;
    assert_ok(utw_area_compute(drawing_done(d), NULL, &a, &err));
    drawing_clear(d);
    return a;
}

static drawing start(void)
{
    drawing d;
    drawing_init(&d);
    drawing_part(&d, -1);
    return d;
}

static void turn(drawing *d, double angle)
{
    const double c = cos(angle), s = sin(angle), m[4] = {c, -s, s, c}, none[2] = {0, 0};
    drawing_map(d, m, none);
}

/* ---- closed forms ------------------------------------------------------------------------ */

static void assert_same(const utw_area *a, const utw_area *b, double f, double rtol)
{
    const double f3 = f * f * f, f4 = f3 * f, f5 = f4 * f;
    assert_close(b->A, f * f * a->A, rtol);
    assert_close(b->perimeter, f * a->perimeter, rtol);
    assert_close(b->Ixx, f4 * a->Ixx, rtol);
    assert_close(b->Iyy, f4 * a->Iyy, rtol);
    assert_close(b->Ixy, f4 * a->Ixy, rtol);
    assert_close(b->I1, f4 * a->I1, rtol);
    assert_close(b->I2, f4 * a->I2, rtol);
    assert_close(b->angle, a->angle, rtol);
    assert_close(b->Ixxx, f5 * a->Ixxx, rtol);
    assert_close(b->Ixxy, f5 * a->Ixxy, rtol);
    assert_close(b->Ixyy, f5 * a->Ixyy, rtol);
    assert_close(b->Iyyy, f5 * a->Iyyy, rtol);
    assert_close(b->Zx, f3 * a->Zx, rtol);
    assert_close(b->Zy, f3 * a->Zy, rtol);
    assert_close(b->top, f * a->top, rtol);
    assert_close(b->Wy_left, f3 * a->Wy_left, rtol);
}

static void moving_scaling_reversing(void **state)
{
    (void)state;
    drawing d;
    drawing_mixed(&d);
    const utw_area a = area_of(&d);
    const double factors[3] = {1e-3, 1e3, 0.731};
    for (int i = 0; i < 3; i++) {
        const double f = factors[i], m[4] = {f, 0, 0, f}, none[2] = {0, 0};
        drawing_mixed(&d);
        drawing_map(&d, m, none);
        const utw_area b = area_of(&d);
        assert_same(&a, &b, f, 1e-12);
        assert_close(b.xc, f * a.xc, TIGHT);
        assert_close(b.yp, f * a.yp, TIGHT);
    }
    /* a thousand sizes away the coordinates themselves keep 13 digits of the size */
    const double m[4] = {1, 0, 0, 1}, shift[2] = {1.1e4, -0.9e4};
    drawing_mixed(&d);
    drawing_map(&d, m, shift);
    const utw_area b = area_of(&d);
    assert_same(&a, &b, 1, 3e-11);
    assert_close(b.xc - shift[0], a.xc, 1e-11);
    assert_close(b.xp - shift[0], a.xp, 1e-11);
}

static void turning_turns_the_angle(void **state)
{
    (void)state;
    drawing d;
    drawing_mixed(&d);
    const utw_area a = area_of(&d);
    for (double alpha = -3; alpha <= 3; alpha += 0.37) {
        drawing_mixed(&d);
        turn(&d, alpha);
        const utw_area b = area_of(&d);
        assert_close(b.A, a.A, TIGHT);
        assert_close(b.I1, a.I1, TIGHT);
        assert_close(b.I2, a.I2, TIGHT);
        assert_close(b.Ixx + b.Iyy, a.Ixx + a.Iyy, TIGHT);
        double expected = a.angle + alpha;
        while (expected > UTW_PI / 2) expected -= UTW_PI;
        while (expected <= -UTW_PI / 2) expected += UTW_PI;
        assert_close_scaled(b.angle, expected, 1e-12, 1);
        const double c = cos(alpha), s = sin(alpha);
        assert_close_scaled(b.xc, c * a.xc - s * a.yc, TIGHT, 10);
        /* int x'^3 = int (c x - s y)^3 */
        assert_close_scaled(b.Ixxx,
                            c * c * c * a.Ixxx - 3 * c * c * s * a.Ixxy + 3 * c * s * s * a.Ixyy -
                                s * s * s * a.Iyyy,
                            1e-12, fabs(a.Ixxx) + fabs(a.Iyyy));
    }
}

static void mirroring_swaps_signs(void **state)
{
    (void)state;
    drawing d;
    drawing_mixed(&d);
    const utw_area a = area_of(&d);
    const double m[4] = {-1, 0, 0, 1}, none[2] = {0, 0};
    drawing_mixed(&d);
    drawing_map(&d, m, none);
    const utw_area b = area_of(&d);
    assert_close(b.A, a.A, TIGHT);
    assert_close(b.xc, -a.xc, TIGHT);
    assert_close(b.Ixy, -a.Ixy, TIGHT);
    assert_close(b.angle, -a.angle, TIGHT);
    assert_close(b.Ixxx, -a.Ixxx, 1e-12);
    assert_close(b.Ixxy, a.Ixxy, 1e-12);
    assert_close(b.left, a.right, TIGHT);
    assert_close(b.xp, -a.xp, TIGHT);
    assert_close(b.Zy, a.Zy, TIGHT);
    const double swap[4] = {0, 1, 1, 0};
    drawing_mixed(&d);
    drawing_map(&d, swap, none);
    const utw_area c = area_of(&d);
    assert_close(c.Ixx, a.Iyy, TIGHT);
    assert_close(c.Zx, a.Zy, TIGHT);
    assert_close(c.yp, a.xp, TIGHT);
    assert_close(c.Ixxy, a.Ixyy, 1e-12);
}

static void slender_turned_strip_keeps_its_small_moment(void **state)
{
    (void)state;
    const double b = 200, t = 0.02;
    drawing d = start();
    drawing_rectangle(&d, -b / 2, -t / 2, b / 2, t / 2);
    turn(&d, 0.6);
    const utw_area a = area_of(&d);
    /* the turned corners are rounded to 1e-14, which is 7e-13 of the thickness */
    assert_close(a.I1, t * b * b * b / 12, 3e-12);
    assert_close(a.I2, b * t * t * t / 12, 3e-12);
    assert_close(a.angle, 0.6 - UTW_PI / 2, TIGHT);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(moving_scaling_reversing),
        balanced_test(turning_turns_the_angle),
        balanced_test(mirroring_swaps_signs),
        balanced_test(slender_turned_strip_keeps_its_small_moment),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
