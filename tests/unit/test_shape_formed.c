/* SPDX-License-Identifier: GPL-3.0-or-later
 * Areas and moments are elementary: rectangles, polygons, and the spandrels of both faces of each
 * bend. */
#include "base/vec2.h"
#include "support/figure.h"
#include "support/shapes.h"

static void compare(const char *text, figure expected)
{
    utw_outline *o = shape_of(text);
    assert_figure(figure_of_outline(o), expected, 1e-12);
    utw_outline_free(o);
}

/* A right-angled bend: outer corner at (x, y), the strip's inside toward sx, sy. */
static void bend(figure *f, double x, double y, double sx, double sy, double t, double ri)
{
    figure_right_spandrel(f, -1, x, y, sx, sy, ri + t);
    if (ri > 0) figure_right_spandrel(f, 1, x + sx * t, y + sy * t, sx, sy, ri);
}

static figure channel(double h, double b, double c, double t, double ri)
{
    figure f = {0};
    figure_rectangle(&f, 1, 0, 0, t, h);
    figure_rectangle(&f, 1, t, 0, b, t);
    figure_rectangle(&f, 1, t, h - t, b, h);
    bend(&f, 0, 0, 1, 1, t, ri);
    bend(&f, 0, h, 1, -1, t, ri);
    if (c > 0) {
        figure_rectangle(&f, 1, b - t, t, b, c);
        figure_rectangle(&f, 1, b - t, h - c, b, h - t);
        bend(&f, b, 0, -1, 1, t, ri);
        bend(&f, b, h, -1, -1, t, ri);
    }
    return f;
}

static void channels(void **state)
{
    (void)state;
    compare("formed-channel h=150 b=60 c=17 t=2.5 ri=4", channel(150, 60, 17, 2.5, 4));
    compare("formed-channel h=150 b=60 t=2.5 ri=4", channel(150, 60, 0, 2.5, 4));
    compare("formed-channel h=150 b=60 c=17 t=2.5",
            channel(150, 60, 17, 2.5, 0)); /* outside radius t */
    compare("formed-channel h=150 b=60 c=17 t=2.5 ri=14.5",
            channel(150, 60, 17, 2.5, 14.5)); /* the lip is all bend */
    utw_outline *o = shape_of("formed-channel h=150 b=60 c=17 t=2.5 ri=4");
    shape_symmetric(o, 0, 75);
    utw_outline_free(o);
    shape_refused(
        "formed-channel h=150 b=60 c=17 t=2.5 ri=15", UTW_E_OUTLINE,
        "formed-channel: ri = 15 does not fit: at most 14.5 with h = 150, b = 60, c = 17, t = 2.5");
    shape_refused("formed-channel h=150 b=60 c=2.5 t=2.5", UTW_E_OUTLINE,
                  "formed-channel: c = 2.5 does not fit: more than 2.5 with t = 2.5");
    shape_refused("formed-channel h=150 b=60 c=75 t=2.5", UTW_E_OUTLINE,
                  "formed-channel: c = 75 does not fit: less than 75 with h = 150");
    shape_refused("formed-channel h=150 b=60 c=35 t=30", UTW_E_OUTLINE,
                  "formed-channel: t = 30 does not fit: less than 30 with b = 60, c = 35");
    shape_refused("formed-channel h=150 b=60 t=75", UTW_E_OUTLINE,
                  "formed-channel: t = 75 does not fit: less than 75 with h = 150");
}

static figure zed(double h, double b, double c, double t, double ri)
{
    figure f = {0};
    figure_rectangle(&f, 1, -t / 2, 0, t / 2, h);
    for (int side = -1; side <= 1; side += 2) {
        const double y0 = side > 0 ? 0 : h, x = side * (b - t / 2);
        double v[4][2] = {
            {side * t / 2, y0}, {x, y0}, {x, y0 + side * t}, {side * t / 2, y0 + side * t}};
        figure_polygon(&f, 1, 4, (const double(*)[2])v);
        bend(&f, -side * t / 2, y0, side, side, t, ri);
        if (!(c > 0)) continue;
        double w[4][2] = {{x - side * t, y0 + side * t},
                          {x, y0 + side * t},
                          {x, y0 + side * c},
                          {x - side * t, y0 + side * c}};
        figure_polygon(&f, 1, 4, (const double(*)[2])w);
        bend(&f, x, y0, -side, side, t, ri);
    }
    return f;
}

static void zeds(void **state)
{
    (void)state;
    compare("formed-zed h=150 b=60 c=17 t=2.5 ri=4", zed(150, 60, 17, 2.5, 4));
    compare("formed-zed h=150 b=60 t=2.5 ri=4", zed(150, 60, 0, 2.5, 4));
    compare("formed-zed h=20 b=60 c=40 t=2.5 ri=4",
            zed(20, 60, 40, 2.5, 4)); /* lips longer than the web */
    shape_refused("formed-zed h=150 b=60 c=35 t=30", UTW_E_OUTLINE,
                  "formed-zed: t = 30 does not fit: less than 30 with b = 60, c = 35");
    shape_refused("formed-zed h=150 b=60 t=60", UTW_E_OUTLINE,
                  "formed-zed: t = 60 does not fit: less than 60 with b = 60");
    shape_refused("formed-zed h=10 b=60 t=2.5 ri=4", UTW_E_OUTLINE,
                  "formed-zed: ri = 4 does not fit: at most 2.5 with h = 10, b = 60, t = 2.5");
}

/* Faces of the strip: each corner by the intersection of the faces' lines, found anew here. */
static figure hat(double h, double b, double c, double t, double ri, double degrees)
{
    figure f = {0};
    const double a = degrees * UTW_PI / 180,
                 n[2] = {cos(a), sin(a)};    /* outward normal of the right web */
    const double web[2] = {sin(a), -cos(a)}; /* down along it */
    /* outer face through (b/2, h), inner face t inside */
    const double in[2] = {b / 2 - t * n[0], h - t * n[1]};
    const double foot = in[0] + (0 - in[1]) / web[1] * web[0],
                 inside = in[0] + (h - t - in[1]) / web[1] * web[0];
    const double knee = b / 2 + (t - h) / web[1] * web[0], tip = foot + c;
    for (int side = -1; side <= 1; side += 2) {
        const double v[8][2] = {
            {0, h - t},      {side * inside, h - t}, {side * foot, 0},  {side * tip, 0},
            {side * tip, t}, {side * knee, t},       {side * b / 2, h}, {0, h}};
        figure_polygon(&f, side, 8, v);
        const double w[2] = {side * web[0], web[1]}, up[2] = {-w[0], -w[1]}, level[2] = {-side, 0},
                     out[2] = {side, 0};
        figure_spandrel(&f, -1, v[6], level, w, ri + t);
        if (ri > 0) figure_spandrel(&f, 1, v[1], level, w, ri);
        if (ri > 0) figure_spandrel(&f, 1, v[5], out, up, ri);
        figure_spandrel(&f, -1, v[2], out, up, ri + t);
    }
    return f;
}

static void hats(void **state)
{
    (void)state;
    compare("hat h=60 b=80 c=25 t=2.5 ri=4", hat(60, 80, 25, 2.5, 4, 0));
    compare("hat h=60 b=80 c=25 t=2.5 ri=4 angle=23.85", hat(60, 80, 25, 2.5, 4, 23.85));
    compare("hat h=60 b=80 c=25 t=2.5", hat(60, 80, 25, 2.5, 0, 0));
    compare("hat h=60 b=80 c=25 t=2.5 ri=22.5",
            hat(60, 80, 25, 2.5, 22.5, 0)); /* the brim's underside is used up */
    utw_outline *o = shape_of("hat h=60 b=80 c=25 t=2.5 ri=4 angle=23.85");
    shape_symmetric(o, 1, 0);
    utw_outline_free(o);
    shape_refused("hat h=60 b=80 c=25 t=2.5 ri=23", UTW_E_OUTLINE,
                  "hat: ri = 23 does not fit: at most 22.5 with h = 60, b = 80, c = 25, t = 2.5");
    shape_refused("hat h=60 b=80 c=2.5 t=2.5", UTW_E_OUTLINE,
                  "hat: c = 2.5 does not fit: more than 2.5 with t = 2.5, angle = 0");
    shape_refused("hat h=60 b=5 c=25 t=2.5", UTW_E_OUTLINE,
                  "hat: b = 5 does not fit: more than 5 with t = 2.5, angle = 0");
    shape_refused("hat h=60 b=80 c=25 t=60", UTW_E_OUTLINE,
                  "hat: t = 60 does not fit: less than 60 with h = 60");
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(channels),
        balanced_test(zeds),
        balanced_test(hats),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
