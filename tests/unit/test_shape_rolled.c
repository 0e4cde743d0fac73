/* SPDX-License-Identifier: GPL-3.0-or-later
 * Areas and moments are elementary: rectangles, polygons and spandrels. */
#include "base/vec2.h"
#include "support/figure.h"
#include "support/shapes.h"

static void compare(const char *text, figure expected)
{
    utw_outline *o = shape_of(text);
    assert_figure(figure_of_outline(o), expected, 1e-12);
    utw_outline_free(o);
}

static figure angle(double h, double b, double t, double tb, double r, double r2)
{
    figure f = {0};
    figure_rectangle(&f, 1, 0, 0, b, tb);
    figure_rectangle(&f, 1, 0, tb, t, h);
    if (r > 0) figure_right_spandrel(&f, 1, t, tb, 1, 1, r);
    if (r2 > 0) {
        figure_right_spandrel(&f, -1, b, tb, -1, -1, r2);
        figure_right_spandrel(&f, -1, t, h, -1, -1, r2);
    }
    return f;
}

static void angles(void **state)
{
    (void)state;
    compare("angle h=100 t=10", angle(100, 100, 10, 10, 0, 0));
    compare("angle h=100 t=10 r=12 r2=6", angle(100, 100, 10, 10, 12, 6));
    compare("angle h=100 b=65 t=10 tb=8 r=10 r2=5", angle(100, 65, 10, 8, 10, 5));
    compare("angle h=100 b=65 t=10 r2=10", angle(100, 65, 10, 10, 0, 10)); /* toes fully round */
    compare("angle h=100 b=65 t=10 r=45 r2=10",
            angle(100, 65, 10, 10, 45, 10));                 /* the level leg is used up */
    utw_outline *o = shape_of("angle h=100 t=10 r=12 r2=6"); /* about the line y = x */
    const utw_loop *loop = &o->part[0].loop[0];
    for (int k = 0; k < loop->n; k++) {
        const double m[2] = {loop->curve[k].from[1], loop->curve[k].from[0]};
        double nearest = 1e9;
        for (int j = 0; j < loop->n; j++)
            nearest = fmin(nearest, utw_distance(m, loop->curve[j].from));
        assert_true(nearest < 1e-13);
    }
    utw_outline_free(o);
    shape_refused("angle h=100 t=100", UTW_E_OUTLINE,
                  "angle: t = 100 does not fit: less than 100 with b = 100");
    shape_refused("angle h=100 t=10 tb=100", UTW_E_OUTLINE,
                  "angle: tb = 100 does not fit: less than 100 with h = 100");
    shape_refused("angle h=100 b=65 t=10 r=50 r2=10", UTW_E_OUTLINE,
                  "angle: r = 50 does not fit: at most 45 with h = 100, b = 65, t = 10, r2 = 10");
    shape_refused("angle h=100 t=10 r2=11", UTW_E_OUTLINE,
                  "angle: r2 = 11 does not fit: at most 10 with h = 100, t = 10");
    /* both are too large together: the larger is named, with what the other leaves */
    shape_refused(
        "angle h=100 b=30 t=10 r=12 r2=9.5", UTW_E_OUTLINE,
        "angle: r = 12 does not fit: at most 10.5 with h = 100, b = 30, t = 10, r2 = 9.5");
}

static figure zed(double h, double b, double bb, double tf, double tfb, double tw, double r,
                  double r2)
{
    figure f = {0};
    figure_rectangle(&f, 1, -tw / 2, 0, tw / 2, h);
    figure_rectangle(&f, 1, tw / 2, 0, bb - tw / 2, tfb);
    figure_rectangle(&f, 1, tw / 2 - b, h - tf, -tw / 2, h);
    if (r > 0) {
        figure_right_spandrel(&f, 1, tw / 2, tfb, 1, 1, r);
        figure_right_spandrel(&f, 1, -tw / 2, h - tf, -1, -1, r);
    }
    if (r2 > 0) {
        figure_right_spandrel(&f, -1, bb - tw / 2, tfb, -1, -1, r2);
        figure_right_spandrel(&f, -1, tw / 2 - b, h - tf, 1, 1, r2);
    }
    return f;
}

static void zeds(void **state)
{
    (void)state;
    compare("zed h=80 b=40 tf=7 tw=5", zed(80, 40, 40, 7, 7, 5, 0, 0));
    compare("zed h=80 b=40 tf=7 tw=5 r=6 r2=3", zed(80, 40, 40, 7, 7, 5, 6, 3));
    compare("zed h=80 b=40 tf=7 tw=5 r=6 r2=3 b_bottom=55 tf_bottom=9",
            zed(80, 40, 55, 7, 9, 5, 6, 3));
    compare("zed h=80 b=40 tf=7 tw=5 r=35", zed(80, 40, 40, 7, 7, 5, 35, 0));
    shape_refused("zed h=80 b=40 tf=7 tw=40", UTW_E_OUTLINE,
                  "zed: tw = 40 does not fit: less than 40 with b = 40");
    shape_refused("zed h=80 b=40 tf=7 tw=6 b_bottom=6", UTW_E_OUTLINE,
                  "zed: tw = 6 does not fit: less than 6 with b_bottom = 6");
    shape_refused("zed h=80 b=40 tf=80 tw=6", UTW_E_OUTLINE,
                  "zed: tf = 80 does not fit: less than 80 with h = 80");
    shape_refused("zed h=80 b=40 tf=7 tw=6 tf_bottom=81", UTW_E_OUTLINE,
                  "zed: tf_bottom = 81 does not fit: less than 80 with h = 80");
}

static figure cruciform(double h, double b, double t, double tb, double r, double r2)
{
    figure f = {0};
    figure_rectangle(&f, 1, -b / 2, -tb / 2, b / 2, tb / 2);
    figure_rectangle(&f, 1, -t / 2, tb / 2, t / 2, h / 2);
    figure_rectangle(&f, 1, -t / 2, -h / 2, t / 2, -tb / 2);
    for (int i = 0; i < 4; i++) {
        const double sx = i & 1 ? 1 : -1, sy = i & 2 ? 1 : -1;
        if (r > 0) figure_right_spandrel(&f, 1, sx * t / 2, sy * tb / 2, sx, sy, r);
        if (r2 > 0) figure_right_spandrel(&f, -1, sx * t / 2, sy * h / 2, -sx, -sy, r2);
        if (r2 > 0) figure_right_spandrel(&f, -1, sx * b / 2, sy * tb / 2, -sx, -sy, r2);
    }
    return f;
}

static void cruciforms(void **state)
{
    (void)state;
    compare("cruciform h=90 t=8", cruciform(90, 90, 8, 8, 0, 0));
    compare("cruciform h=90 t=8 b=70 tb=11 r=5 r2=1.5", cruciform(90, 70, 8, 11, 5, 1.5));
    compare("cruciform h=90 t=8 r=37 r2=4", cruciform(90, 90, 8, 8, 37, 4));
    utw_outline *o = shape_of("cruciform h=90 t=8 b=70 tb=11 r=5 r2=1.5");
    shape_symmetric(o, 1, 0);
    shape_symmetric(o, 0, 0);
    utw_outline_free(o);
    shape_refused("cruciform h=90 t=90", UTW_E_OUTLINE,
                  "cruciform: t = 90 does not fit: less than 90 with b = 90");
    shape_refused("cruciform h=90 t=8 tb=90", UTW_E_OUTLINE,
                  "cruciform: tb = 90 does not fit: less than 90 with h = 90");
    shape_refused("cruciform h=90 t=8 r2=4.1", UTW_E_OUTLINE,
                  "cruciform: r2 = 4.1 does not fit: at most 4 with h = 90, t = 8");
}

/* Flat, triangle and rectangle of the bulb with sharp corners (its end face at x = t + c as high as
 * the nose's two tangents there are apart), less the nose's two corners, plus the root's spandrel.
 */
static figure bulb(double b, double t, double c, double r, double degrees)
{
    figure f = {0};
    const double a = degrees * UTW_PI / 180, face = r + r * tan(UTW_PI / 4 - a / 2),
                 low = face + c * tan(a);
    const double v[4][2] = {{t, b - low}, {t + c, b - face}, {t + c, b}, {t, b}};
    const double in[2] = {-cos(a), -sin(a)}, out[2] = {cos(a), sin(a)}, up[2] = {0, 1},
                 down[2] = {0, -1};
    figure_rectangle(&f, 1, 0, 0, t, b);
    figure_polygon(&f, 1, 4, v);
    if (r > 0) {
        figure_right_spandrel(&f, -1, t + c, b, -1, -1, r);
        figure_spandrel(&f, -1, v[1], in, up, r);
        figure_spandrel(&f, 1, v[0], out, down, r);
    }
    return f;
}

static void flats_with_bulb(void **state)
{
    (void)state;
    compare("bulb b=200 t=10 c=28 r=8", bulb(200, 10, 28, 8, 30));
    compare("bulb b=200 t=10 c=28 r=8 angle=45", bulb(200, 10, 28, 8, 45));
    compare("bulb b=200 t=10 c=28 r=0", bulb(200, 10, 28, 0, 30));
    compare("bulb b=200 t=10 c=28 r=28",
            bulb(200, 10, 28, 28, 30)); /* c = 2 r (1 - sin 30): nose meets root */
    compare("bulb b=200 t=10 c=28 r=14 angle=5", bulb(200, 10, 28, 14, 5));
    shape_refused("bulb b=200 t=10 c=28 r=28.1", UTW_E_OUTLINE,
                  "bulb: r = 28.1 does not fit: at most 28 with c = 28, angle = 30");
    shape_refused("bulb b=200 t=1 c=28 r=100 angle=60", UTW_E_OUTLINE,
                  "bulb: r = 100 does not fit: at most 29 with t = 1, c = 28");
    shape_refused("bulb b=20 t=10 c=28 r=8", UTW_E_OUTLINE,
                  "bulb: b = 20 does not fit: more than 33.404 with t = 10, c = 28, r = 8");
    shape_refused(
        "bulb b=200 t=10 c=28", UTW_E_SYNTAX,
        "bulb: r (radius of the bulb's nose and of its root) is missing: it needs a value");
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(angles),
        balanced_test(zeds),
        balanced_test(cruciforms),
        balanced_test(flats_with_bulb),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
