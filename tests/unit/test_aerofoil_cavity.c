/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/aerofoil_cavity.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/support.h"

/* NACA 0012, chord 300: sharp edge; nose radius 1.1019 t^2 = 4.76 (NACA Report 460). */
static utw_error err;

static utw_status find(double thickness, int sharp, utw_aerofoil_cavity *cavity)
{
    double(*xy)[2] = NULL;
    utw_aerofoil foil = {.chord = 300, .n_skin = 1, .skin = {{0, thickness}}};
    utw_aerofoil_skin skin;
    assert_ok(utw_aerofoil_naca("0012", sharp, &xy, &foil.n, &err));
    foil.xy = xy;
    assert_ok(utw_aerofoil_skin_init(&skin, &foil, &err));
    const utw_status st = utw_aerofoil_find_cavity(&skin, cavity, &err);
    utw_aerofoil_skin_clear(&skin);
    utw_free(xy);
    return st;
}

/* Half thickness and slope of the formula with the sharp edge, chord 1. */
static double half(double x, double *slope)
{
    *slope = 0.6 * (0.2969 / (2 * sqrt(x)) - 0.1260 - 2 * 0.3516 * x + 3 * 0.2843 * x * x -
                    4 * 0.1036 * x * x * x);
    return 0.6 * (0.2969 * sqrt(x) - 0.1260 * x - 0.3516 * x * x + 0.2843 * pow(x, 3) -
                  0.1036 * pow(x, 4));
}

/* Where the skin's inner side reaches the chord, y = h cos, by bisection between a and b. */
static double meets(double h, double a, double b)
{
    double slope;
    const double start = half(a, &slope) * hypot(1, slope);
    const int rising = start < h;
    for (int i = 0; i < 80; i++) {
        const double x = (a + b) / 2, y = half(x, &slope) * hypot(1, slope);
        *((y < h) == rising ? &a : &b) = x;
    }
    const double y = half(a, &slope);
    return a + y * slope; /* the foot of the normal */
}

static void the_tail_is_where_the_skins_meet(void **state)
{
    (void)state;
    static const double skin[] = {1, 2.385, 4.5};
    for (int i = 0; i < 3; i++) {
        utw_aerofoil_cavity c;
        assert_ok(find(skin[i], 1, &c));
        assert_int_equal(c.round_nose, 1);
        assert_int_equal(c.open_tail, 0);
        assert_close(c.tail.p[0] / 300, meets(skin[i] / 300, 0.5, 1), 1e-6);
        assert_close_scaled(c.tail.p[1], 0, 1e-9, 1);
        assert_close_scaled(c.tail.u[0] + c.tail.u[1], 400, 1e-9, 1); /* a symmetric contour */
        assert_close(c.x0, skin[i], 1e-7); /* straight in from the nose */
        assert_true(c.x1 == c.tail.p[0]);
    }
}

/* Thicker than the nose's radius: the two inner sides cross behind the nose. */
static void a_thick_skin_crosses_in_the_nose(void **state)
{
    (void)state;
    utw_aerofoil_cavity c;
    assert_ok(find(9, 1, &c));
    assert_int_equal(c.round_nose, 0);
    assert_close_scaled(c.front.p[1], 0, 1e-9, 1);
    assert_close(c.front.p[0] / 300, meets(9.0 / 300, 0.01, 0.2), 1e-6);
    assert_true(c.x0 == c.front.p[0] && c.x0 > 9);
}

static void what_is_full_or_open_is_told(void **state)
{
    (void)state;
    utw_aerofoil_cavity c;
    assert_int_equal(find(18.1, 1, &c), UTW_E_OUTLINE);
    assert_string_equal(err.text,
                        "aerofoil: the skin fills the section, which is 36 thick at most, at "
                        "0.3 of the chord; make it thinner, or \"solid\"");
    /* the blunt edge is 2.1 % of the thickness, 0.756: a skin of less than half of it stays open */
    assert_ok(find(0.37, 0, &c));
    assert_int_equal(c.open_tail, 1);
    assert_ok(find(0.4, 0, &c));
    assert_int_equal(c.open_tail, 0);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(the_tail_is_where_the_skins_meet),
        balanced_test(a_thick_skin_crosses_in_the_nose),
        balanced_test(what_is_full_or_open_is_told),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
