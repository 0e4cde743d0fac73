/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/colour.h"

#include "support/support.h"

static double lightness(utw_colour c)
{
    double lab[3];
    utw_colour_to_lab(c, lab);
    return lab[0];
}

static double difference(utw_colour a, utw_colour b)
{
    double p[3], q[3];
    utw_colour_to_lab(a, p);
    utw_colour_to_lab(b, q);
    return sqrt((p[0] - q[0]) * (p[0] - q[0]) + (p[1] - q[1]) * (p[1] - q[1]) +
                (p[2] - q[2]) * (p[2] - q[2]));
}

/* L*a*b* of the primaries of sRGB for D65, from the definitions (IEC 61966-2-1, CIE 015). */
static void known_colours_have_their_coordinates(void **state)
{
    (void)state;
    static const struct {
        utw_colour rgb;
        double lab[3];
    } known[] = {
        {{1, 0, 0}, {53.24, 80.09, 67.20}},
        {{0, 1, 0}, {87.73, -86.18, 83.18}},
        {{0, 0, 1}, {32.30, 79.19, -107.86}},
        {{1, 1, 1}, {100, 0, 0}},
        {{0, 0, 0}, {0, 0, 0}},
    };
    for (size_t i = 0; i < sizeof known / sizeof *known; i++) {
        double lab[3];
        utw_colour_to_lab(known[i].rgb, lab);
        for (int k = 0; k < 3; k++) assert_true(fabs(lab[k] - known[i].lab[k]) < 0.02);
        const utw_colour back = utw_colour_lab(lab[0], lab[1], lab[2]);
        assert_true(fabs(back.r - known[i].rgb.r) < 1e-3 && fabs(back.g - known[i].rgb.g) < 1e-3 &&
                    fabs(back.b - known[i].rgb.b) < 1e-3);
    }
}

static void colours_that_do_not_exist_keep_lightness_and_hue(void **state)
{
    (void)state;
    double lab[3];
    const utw_colour c = utw_colour_lab(24, 60, -120);
    assert_true(c.r >= 0 && c.r <= 1 && c.g >= 0 && c.g <= 1 && c.b >= 0 && c.b <= 1);
    utw_colour_to_lab(c, lab);
    assert_true(fabs(lab[0] - 24) < 0.1);
    assert_true(fabs(lab[2] / lab[1] + 2) < 0.01);
    assert_true(hypot(lab[1], lab[2]) > 40);
}

/* A grey print keeps the order of values, and steps of a twentieth differ in it. */
static void lightness_runs_evenly(void **state)
{
    (void)state;
    for (int i = 0; i < 20; i++) {
        const double a = -1 + 0.1 * i, b = a + 0.1;
        const double step = lightness(utw_colour_signed(b)) - lightness(utw_colour_signed(a));
        assert_true(step > 2.5 && step < 4.5);
        const double down = lightness(utw_colour_magnitude(0.05 * i)) -
                            lightness(utw_colour_magnitude(0.05 * (i + 1)));
        assert_true(down > 3 && down < 4.5);
    }
}

static void zero_is_neutral_and_signs_differ(void **state)
{
    (void)state;
    double lab[3];
    utw_colour_to_lab(utw_colour_signed(0), lab);
    assert_true(hypot(lab[1], lab[2]) < 0.5);
    for (double v = 0.1; v <= 1; v += 0.1) {
        double plus[3], minus[3];
        utw_colour_to_lab(utw_colour_signed(v), plus);
        utw_colour_to_lab(utw_colour_signed(-v), minus);
        assert_true(plus[2] > 5 && minus[2] < -5); /* yellow, blue */
    }
    assert_true(difference(utw_colour_signed(-7), utw_colour_signed(-1)) < 1e-9);
    assert_true(difference(utw_colour_magnitude(3), utw_colour_magnitude(1)) < 1e-9);
}

/* How protanopes and deuteranopes see a colour: linear sRGB to cone responses L, M, S and the
 * missing one from the others (Vienot, Brettel and Mollon 1999, matrices from memory). Where they
 * agree on white and on blue and yellow is what the maps rely on. */
static utw_colour as_seen(utw_colour c, int deuteranope)
{
    static const double to[3][3] = {
        {17.8824, 43.5161, 4.11935}, {3.45565, 27.1554, 3.86714}, {0.0299566, 0.184309, 1.46709}};
    static const double back[3][3] = {{0.0809444479, -0.130504409, 0.116721066},
                                      {-0.0102485335, 0.0540193266, -0.113614708},
                                      {-0.000365296938, -0.00412161469, 0.693511405}};
    const double rgb[3] = {pow(c.r, 2.2), pow(c.g, 2.2), pow(c.b, 2.2)};
    double lms[3], out[3];
    for (int i = 0; i < 3; i++) lms[i] = to[i][0] * rgb[0] + to[i][1] * rgb[1] + to[i][2] * rgb[2];
    if (deuteranope)
        lms[1] = 0.494207 * lms[0] + 1.24827 * lms[2];
    else
        lms[0] = 2.02344 * lms[1] - 2.52581 * lms[2];
    for (int i = 0; i < 3; i++) {
        const double v = back[i][0] * lms[0] + back[i][1] * lms[1] + back[i][2] * lms[2];
        out[i] = pow(fmin(fmax(v, 0), 1), 1 / 2.2);
    }
    return (utw_colour){out[0], out[1], out[2]};
}

/* Neighbours of twelve bands, and opposite signs, stay apart: a difference of 2.3 is just noticed
 * (Mahy, Van Eycken and Oosterlinck, Color Research and Application 19 (1994) 105-121). */
static void the_colour_blind_can_read_the_maps(void **state)
{
    (void)state;
    for (int d = 0; d <= 1; d++) {
        for (int i = 0; i < 11; i++) {
            const double a = -1 + (2 * i + 1) / 12.0, b = a + 2 / 12.0;
            assert_true(difference(as_seen(utw_colour_signed(a), d),
                                   as_seen(utw_colour_signed(b), d)) > 4.6);
            const double p = (i + 0.5) / 12, q = p + 1 / 12.0;
            assert_true(difference(as_seen(utw_colour_magnitude(p), d),
                                   as_seen(utw_colour_magnitude(q), d)) > 4.6);
        }
        assert_true(difference(as_seen(utw_colour_signed(0.2), d),
                               as_seen(utw_colour_signed(-0.2), d)) > 20);
    }
}

static void text_reads_on_every_ground(void **state)
{
    (void)state;
    for (double v = -1; v <= 1; v += 0.02) {
        const utw_colour ground = utw_colour_signed(v), other = utw_colour_magnitude(fabs(v));
        assert_true(fabs(lightness(ground) - lightness(utw_colour_on(ground))) > 35);
        assert_true(fabs(lightness(other) - lightness(utw_colour_on(other))) > 35);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(known_colours_have_their_coordinates),
        cmocka_unit_test(colours_that_do_not_exist_keep_lightness_and_hue),
        cmocka_unit_test(lightness_runs_evenly),
        cmocka_unit_test(zero_is_neutral_and_signs_differ),
        cmocka_unit_test(the_colour_blind_can_read_the_maps),
        cmocka_unit_test(text_reads_on_every_ground),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
