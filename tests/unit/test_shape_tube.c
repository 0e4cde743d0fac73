/* SPDX-License-Identifier: GPL-3.0-or-later
 * Areas and moments are elementary: circles, sectors, triangles, rectangles and spandrels. */
#include "base/vec2.h"
#include "support/figure.h"
#include "support/shapes.h"

static void compare(const char *text, figure expected)
{
    utw_outline *o = shape_of(text);
    assert_figure(figure_of_outline(o), expected, 1e-12);
    utw_outline_free(o);
}

static void tube(void **state)
{
    (void)state;
    figure f = {0};
    figure_ellipse(&f, 1, 0, 0, 23.85, 23.85);
    figure_ellipse(&f, -1, 0, 0, 20.6, 20.6);
    compare("tube d=47.7 t=3.25", f);
    shape_refused("tube d=47.7 t=23.85", UTW_E_OUTLINE,
                  "tube: t = 23.85 does not fit: less than 23.85 with d = 47.7");
}

static void rounded(figure *f, double sign, double b, double h, double r)
{
    figure_rectangle(f, sign, -b / 2, -h / 2, b / 2, h / 2);
    for (int i = 0; i < 4 && r > 0; i++) {
        const double sx = i & 1 ? 1 : -1, sy = i & 2 ? 1 : -1;
        figure_right_spandrel(f, -sign, sx * b / 2, sy * h / 2, -sx, -sy, r);
    }
}

static figure box(double b, double h, double t, double tf, double ro, double ri)
{
    figure f = {0};
    rounded(&f, 1, b, h, ro);
    rounded(&f, -1, b - 2 * t, h - 2 * tf, ri);
    return f;
}

static void rectangular_tube(void **state)
{
    (void)state;
    compare("box h=60 b=40 t=3", box(40, 60, 3, 3, 0, 0));
    compare("box h=60 b=40 t=3 ro=6", box(40, 60, 3, 3, 6, 3)); /* ri = ro - t */
    compare("box h=60 b=40 t=3 ro=6 ri=1.5", box(40, 60, 3, 3, 6, 1.5));
    compare("box h=60 b=40 t=3 tf=5 ro=2", box(40, 60, 3, 5, 2, 0));
    compare("box h=60 b=40 t=3 ri=17", box(40, 60, 3, 3, 0, 17));  /* cavity with two semicircles */
    compare("box h=60 b=40 t=3 ro=20", box(40, 60, 3, 3, 20, 17)); /* both */
    utw_outline *o = shape_of("box h=60 b=40 t=3 tf=5 ro=4");
    shape_symmetric(o, 1, 0);
    shape_symmetric(o, 0, 0);
    utw_outline_free(o);
    shape_refused("box h=60 b=40 t=20", UTW_E_OUTLINE,
                  "box: t = 20 does not fit: less than 20 with b = 40");
    shape_refused("box h=60 b=40 t=3 tf=30", UTW_E_OUTLINE,
                  "box: tf = 30 does not fit: less than 30 with h = 60");
    shape_refused("box h=60 b=40 t=3 ri=17.1", UTW_E_OUTLINE,
                  "box: ri = 17.1 does not fit: at most 17 with h = 60, b = 40, t = 3");
    /* sharp cavity, round outside: the corner is at (ro - t) sqrt 2 = 16.97 > 15 from the arc's
     * centre; it stays inside from ri = ((ro - t) sqrt 2 - ro)/(sqrt 2 - 1) = 4.7574 on
     * (elementary) */
    shape_refused("box h=60 b=40 t=3 ro=15 ri=0", UTW_E_OUTLINE,
                  "box: ri = 0 does not fit: more than 4.7575 with t = 3, tf = 3, ro = 15");
    shape_refused("box h=60 b=40 t=3 ro=15 ri=4.757", UTW_E_OUTLINE,
                  "box: ri = 4.757 does not fit: more than 4.7575 with t = 3, tf = 3, ro = 15");
    compare("box h=60 b=40 t=3 ro=15 ri=4.7575", box(40, 60, 3, 3, 15, 4.7575));
    assert_close((12 * sqrt(2) - 15) / (sqrt(2) - 1), 4.75735931, 1e-8);
}

static void slit_tube(void **state)
{
    (void)state;
    const double r = 23.85, ri = 20.6, g = 1.2;
    figure f = {0};
    for (int i = 0; i < 2; i++) { /* sector and triangle of each radius */
        const double q = i == 0 ? r : ri, a = asin(g / q), sign = i == 0 ? 1 : -1;
        const double v[3][2] = {{0, 0}, {q * cos(a), -g}, {q * cos(a), g}};
        figure_sector(&f, sign, 0, 0, q, a, 2 * UTW_PI - a);
        figure_polygon(&f, sign, 3, v);
    }
    /* between the triangles lies the slit */
    figure_rectangle(&f, -1, ri * cos(asin(g / ri)), -g, r * cos(asin(g / r)), g);
    compare("slit-tube d=47.7 t=3.25 gap=2.4", f);
    utw_outline *o = shape_of("slit-tube d=47.7 t=3.25 gap=0.02");
    shape_symmetric(o, 0, 0);
    utw_outline_free(o);
    o = shape_of("slit-tube d=47.7 t=3.25 gap=41");
    shape_symmetric(o, 0, 0);
    utw_outline_free(o);
    shape_refused("slit-tube d=47.7 t=3.25 gap=41.2", UTW_E_OUTLINE,
                  "slit-tube: gap = 41.2 does not fit: less than 41.2 with d = 47.7, t = 3.25");
    shape_refused("slit-tube d=47.7 t=3.25 gap=0", UTW_E_OUTLINE,
                  "slit-tube: gap = 0 must be more than 0");
    shape_refused("slit-tube d=47.7 t=24 gap=1", UTW_E_OUTLINE,
                  "slit-tube: t = 24 does not fit: less than 23.85 with d = 47.7");
}

static figure strip(double r, double t, double degrees)
{
    const double half = degrees * UTW_PI / 360;
    figure f = {0};
    figure_sector(&f, 1, 0, 0, r + t / 2, UTW_PI - half, UTW_PI + half);
    figure_sector(&f, -1, 0, 0, r - t / 2, UTW_PI - half, UTW_PI + half);
    return f;
}

static void arc_strip(void **state)
{
    (void)state;
    compare("arc-strip r=23.85 t=3.2 angle=75", strip(23.85, 3.2, 75));
    compare("arc-strip r=23.85 t=3.2 angle=180", strip(23.85, 3.2, 180));
    compare("arc-strip r=23.85 t=3.2 angle=350", strip(23.85, 3.2, 350));
    compare("arc-strip r=23.85 t=47 angle=20", strip(23.85, 47, 20));
    utw_outline *o = shape_of("arc-strip r=23.85 t=3.2 angle=200");
    shape_symmetric(o, 0, 0);
    utw_outline_free(o);
    shape_refused("arc-strip r=5 t=10 angle=20", UTW_E_OUTLINE,
                  "arc-strip: t = 10 does not fit: less than 10 with r = 5");
    shape_refused("arc-strip r=5 t=1 angle=360", UTW_E_OUTLINE,
                  "arc-strip: angle = 360 must be at most 359.9");
    shape_refused("arc-strip r=5 t=1 angle=0", UTW_E_OUTLINE,
                  "arc-strip: angle = 0 must be more than 0");
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(tube),
        balanced_test(rectangular_tube),
        balanced_test(slit_tube),
        balanced_test(arc_strip),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
