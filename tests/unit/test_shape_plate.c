/* SPDX-License-Identifier: GPL-3.0-or-later
 * Areas and moments are elementary: rectangles, sectors, spandrels, triangles. */
#include "base/vec2.h"
#include "support/figure.h"
#include "support/shapes.h"

static void compare(const char *text, figure expected)
{
    utw_outline *o = shape_of(text);
    assert_figure(figure_of_outline(o), expected, 1e-12);
    utw_outline_free(o);
}

/* A rectangle about the origin less its corners' spandrels. */
static figure rounded(double b, double h, double r)
{
    figure f = {0};
    figure_rectangle(&f, 1, -b / 2, -h / 2, b / 2, h / 2);
    for (int i = 0; i < 4 && r > 0; i++) {
        const double sx = i & 1 ? 1 : -1, sy = i & 2 ? 1 : -1;
        figure_right_spandrel(&f, -1, sx * b / 2, sy * h / 2, -sx, -sy, r);
    }
    return f;
}

static void rectangle(void **state)
{
    (void)state;
    compare("rectangle b=23.85 h=7.1", rounded(23.85, 7.1, 0));
    compare("rectangle b=23.85 h=7.1 r=1.3", rounded(23.85, 7.1, 1.3));
    compare("rectangle b=23.85 h=7.1 r=3.55", rounded(23.85, 7.1, 3.55)); /* two semicircles */
    compare("rectangle b=7.1 h=7.1 r=3.55", rounded(7.1, 7.1, 3.55));     /* a circle */
    utw_outline *o = shape_of("rectangle b=7.1 h=7.1 r=3.55");
    assert_int_equal(o->part[0].loop[0].n, 4);
    shape_symmetric(o, 1, 0);
    shape_symmetric(o, 0, 0);
    utw_outline_free(o);
    shape_refused("rectangle b=23.85 h=7.1 r=3.56", UTW_E_OUTLINE,
                  "rectangle: r = 3.56 does not fit: at most 3.55 with b = 23.85, h = 7.1");
    shape_refused("rectangle b=23.85 h=0", UTW_E_OUTLINE, "rectangle: h = 0 must be more than 0");
    shape_refused("rectangle b=-2 h=1", UTW_E_OUTLINE, "rectangle: b = -2 must be more than 0");
}

static void round_and_ellipse(void **state)
{
    (void)state;
    figure f = {0};
    figure_ellipse(&f, 1, 0, 0, 2.385, 2.385);
    compare("round d=4.77", f);
    f = (figure){0};
    figure_ellipse(&f, 1, 0, 0, 2.385, 0.7);
    compare("ellipse b=4.77 h=1.4", f);
    compare("ellipse h=1.4 b=4.77", f);
}

/* n triangles from the centre, less n spandrels. */
static figure polygon(int n, double radius, double r)
{
    figure f = {0};
    for (int i = 0; i < n; i++) {
        const double a = 2 * UTW_PI / n, a0 = a * i - UTW_PI / 2 + a / 2;
        double v[3][2] = {{0, 0},
                          {radius * cos(a0), radius * sin(a0)},
                          {radius * cos(a0 + a), radius * sin(a0 + a)}};
        figure_polygon(&f, 1, 3, (const double(*)[2])v);
        if (!(r > 0)) continue;
        const double in = a0 + UTW_PI, half = UTW_PI / 2 - UTW_PI / n; /* half the inside angle */
        const double d[2] = {cos(in - half), sin(in - half)},
                     e[2] = {cos(in + half), sin(in + half)};
        figure_spandrel(&f, -1, v[1], d, e, r);
    }
    return f;
}

static void regular_polygon(void **state)
{
    (void)state;
    compare("polygon n=6 d=23.85", polygon(6, 23.85 / 2, 0));
    compare("polygon n=6 s=19 r=2.1", polygon(6, 9.5 / cos(UTW_PI / 6), 2.1));
    compare("polygon n=3 d=23.85 r=1.2", polygon(3, 23.85 / 2, 1.2));
    compare("polygon n=5 s=19", polygon(5, 9.5 / cos(UTW_PI / 5), 0));
    compare("polygon n=360 d=23.85", polygon(360, 23.85 / 2, 0));
    compare("polygon n=6 s=19 r=9.5",
            polygon(6, 9.5 / cos(UTW_PI / 6), 9.5)); /* a circle of arcs */
    for (int n = 3; n < 14; n++) {
        char text[60];
        snprintf(text, sizeof text, "polygon n=%d s=19 r=0.3", n);
        utw_outline *o = shape_of(text);
        shape_symmetric(o, 1, 0);
        utw_outline_free(o);
    }
    shape_refused("polygon n=6", UTW_E_SYNTAX, "polygon: s or d is missing: give one of them");
    shape_refused("polygon n=6 s=3 d=4", UTW_E_SYNTAX,
                  "polygon: s and d are both given: give one of them");
    shape_refused("polygon n=2 s=3", UTW_E_OUTLINE, "polygon: n = 2 must be at least 3");
    shape_refused("polygon n=6.5 s=3", UTW_E_OUTLINE, "polygon: n = 6.5 must be a whole number");
    shape_refused("polygon n=361 s=3", UTW_E_OUTLINE, "polygon: n = 361 must be at most 360");
    shape_refused("polygon n=6 s=19 r=9.6", UTW_E_OUTLINE,
                  "polygon: r = 9.6 does not fit: at most 9.5 with n = 6, s = 19");
}

static void trapezium(void **state)
{
    (void)state;
    figure f = {0};
    const double v[4][2] = {{-12, 0}, {12, 0}, {3 + 4.5, 11.5}, {3 - 4.5, 11.5}};
    figure_polygon(&f, 1, 4, v);
    compare("trapezium b=24 a=9 h=11.5 shift=3", f);
    f = (figure){0};
    const double t[3][2] = {{-12, 0}, {12, 0}, {-3, 11.5}};
    figure_polygon(&f, 1, 3, t);
    compare("trapezium b=24 a=0 h=11.5 shift=-3", f);
    for (int i = 0; i < 3; i++) { /* the triangle's corners rounded */
        double d[2], e[2];
        for (int k = 0; k < 2; k++) {
            d[k] = t[(i + 1) % 3][k] - t[i][k];
            e[k] = t[(i + 2) % 3][k] - t[i][k];
        }
        const double nd = utw_norm(d), ne = utw_norm(e);
        for (int k = 0; k < 2; k++) d[k] /= nd, e[k] /= ne;
        figure_spandrel(&f, -1, t[i], d, e, 1.7);
    }
    compare("trapezium b=24 a=0 h=11.5 shift=-3 r=1.7", f);
    utw_outline *o = shape_of("trapezium b=24 a=9 h=11.5 r=1.1");
    shape_symmetric(o, 1, 0);
    utw_outline_free(o);
    shape_refused(
        "trapezium b=24 h=11.5", UTW_E_SYNTAX,
        "trapezium: a (width at the top; 0 makes a triangle) is missing: it needs a value");
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(rectangle),
        balanced_test(round_and_ellipse),
        balanced_test(regular_polygon),
        balanced_test(trapezium),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
