/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/vec2.h"
#include "section/plastic.h"
#include "support/drawing.h"
#include "support/support.h"

/* Level in the drawing's coordinates and modulus; the drawing is freed. */
static void axis_of(drawing *d, int k, double *level, double *modulus)
{
    utw_boundary b;
    utw_error err;
    assert_ok(utw_boundary_init(&b, drawing_done(d), NULL, &err));
    assert_ok(utw_plastic_axis(&b, k, level, modulus, &err));
    *level += b.origin[k];
    utw_boundary_clear(&b);
    drawing_clear(d);
}

static void axis_in_a_gap_is_its_middle(void **state)
{
    (void)state;
    for (int i = 0; i < 2; i++) { /* at home, and where equal flanges differ by rounding */
        const double x = i * 7123.1, y = i * 9871.7;
        for (int k = 0; k < 2; k++) {
            drawing d;
            drawing_init(&d);
            drawing_part(&d, -1);
            drawing_rectangle(&d, x, y, x + (k ? 8 : 1.1), y + (k ? 1.1 : 8));
            drawing_part(&d, -1);
            drawing_rectangle(&d, x + (k ? 0 : 6.3), y + (k ? 6.3 : 0), x + (k ? 8 : 7.4),
                              y + (k ? 7.4 : 8));
            double level, modulus;
            axis_of(&d, k, &level, &modulus);
            assert_close(level, (k ? y : x) + 3.7, 1e-13);
            assert_close(modulus, 2 * 8 * 1.1 * (3.7 - 0.55), i ? 1e-11 : 1e-13);
        }
    }
}

static void unequal_pieces_have_their_axis_in_the_larger(void **state)
{
    (void)state;
    drawing d;
    drawing_init(&d);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 0, 0, 8, 1);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 0, 6, 8, 8);
    double level, modulus;
    axis_of(&d, 1, &level, &modulus);
    assert_close(level, 6.5, 1e-13);
    assert_close(modulus, 8 * 6 + 4 * 0.25 + 12 * 0.75, 1e-13);
}

static void axis_through_round_pieces(void **state)
{
    (void)state;
    /* two circles on end: the axis is their common tangent, where the width is 0 */
    drawing d;
    drawing_init(&d);
    const double r = 2.385;
    for (int i = 0; i < 2; i++) {
        drawing_part(&d, -1);
        drawing_circle(&d, 0, 2 * r * i, r);
    }
    double level, modulus;
    axis_of(&d, 1, &level, &modulus);
    assert_close(level, r, 1e-6); /* its place is soft there, the modulus is not */
    assert_close(modulus, 2 * UTW_PI * r * r * r, 1e-13);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(axis_in_a_gap_is_its_middle),
        balanced_test(unequal_pieces_have_their_axis_in_the_larger),
        balanced_test(axis_through_round_pieces),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
