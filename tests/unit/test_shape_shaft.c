/* SPDX-License-Identifier: GPL-3.0-or-later
 * Areas and moments are elementary: sectors, triangles, rectangles and spandrels, turned about the
 * shaft's centre. */
#include "base/vec2.h"
#include "support/figure.h"
#include "support/shapes.h"

static void compare(const char *text, figure expected)
{
    utw_outline *o = shape_of(text);
    assert_figure(figure_of_outline(o), expected, 1e-12);
    utw_outline_free(o);
}

/* Add a figure turned about the origin. */
static void add_turned(figure *f, figure p, double a)
{
    const double c = cos(a), s = sin(a);
    f->A += p.A;
    f->x += c * p.x - s * p.y;
    f->y += s * p.x + c * p.y;
    f->xx += c * c * p.xx - 2 * s * c * p.xy + s * s * p.yy;
    f->yy += s * s * p.xx + 2 * s * c * p.xy + c * c * p.yy;
    f->xy += s * c * (p.xx - p.yy) + (c * c - s * s) * p.xy;
}

/* Segment of a circle cut off at the top by a chord of half-length x. */
static figure segment(double r, double x)
{
    figure f = {0};
    const double a = asin(x / r), y = r * cos(a);
    const double v[3][2] = {{0, 0}, {x, y}, {-x, y}};
    figure_sector(&f, 1, 0, 0, r, UTW_PI / 2 - a, UTW_PI / 2 + a);
    figure_polygon(&f, -1, 3, v);
    return f;
}

static figure keyed(double d, double b, double t, double r, int n, double bore)
{
    figure f = {0};
    figure slot = segment(d / 2, b / 2);
    figure_rectangle(&slot, 1, -b / 2, d / 2 - t, b / 2, sqrt(d * d - b * b) / 2);
    if (r > 0) figure_right_spandrel(&slot, -1, b / 2, d / 2 - t, -1, 1, r);
    if (r > 0) figure_right_spandrel(&slot, -1, -b / 2, d / 2 - t, 1, 1, r);
    figure_ellipse(&f, 1, 0, 0, d / 2, d / 2);
    const figure minus = {-slot.A, -slot.x, -slot.y, -slot.xx, -slot.yy, -slot.xy};
    for (int k = 0; k < n; k++) add_turned(&f, minus, 2 * UTW_PI * k / n);
    if (bore > 0) figure_ellipse(&f, -1, 0, 0, bore / 2, bore / 2);
    return f;
}

static void keyed_shafts(void **state)
{
    (void)state;
    compare("keyed-shaft d=30 b=8 t=4", keyed(30, 8, 4, 0, 1, 0));
    compare("keyed-shaft d=30 b=8 t=4 r=0.4", keyed(30, 8, 4, 0.4, 1, 0));
    compare("keyed-shaft d=30 b=8 t=4 r=0.4 bore=11", keyed(30, 8, 4, 0.4, 1, 11));
    compare("keyed-shaft d=30 b=8 t=4 r=0.4 n=2", keyed(30, 8, 4, 0.4, 2, 0));
    compare("keyed-shaft d=30 b=8 t=4 r=0.4 n=3", keyed(30, 8, 4, 0.4, 3, 0));
    compare("keyed-shaft d=30 b=6 t=5 r=3", keyed(30, 6, 5, 3, 1, 0)); /* a round bottom */
    compare("keyed-shaft d=30 b=28 t=13", keyed(30, 28, 13, 0, 1, 0)); /* nearly a half shaft */
    utw_outline *o = shape_of("keyed-shaft d=30 b=8 t=4 r=0.4 n=2");
    shape_symmetric(o, 1, 0);
    shape_symmetric(o, 0, 0);
    utw_outline_free(o);
    shape_refused("keyed-shaft d=30 b=30 t=4", UTW_E_OUTLINE,
                  "keyed-shaft: b = 30 does not fit: less than 30 with d = 30");
    /* the slot's edges lie 15 - sqrt(225 - 16) = 0.5432 below the top */
    shape_refused("keyed-shaft d=30 b=8 t=0.5", UTW_E_OUTLINE,
                  "keyed-shaft: t = 0.5 does not fit: more than 0.54318 with d = 30, b = 8");
    shape_refused("keyed-shaft d=30 b=8 t=9.5 bore=11", UTW_E_OUTLINE,
                  "keyed-shaft: t = 9.5 does not fit: less than 9.5 with d = 30, bore = 11");
    shape_refused("keyed-shaft d=30 b=8 t=4 bore=30", UTW_E_OUTLINE,
                  "keyed-shaft: bore = 30 does not fit: less than 30 with d = 30");
    shape_refused("keyed-shaft d=30 b=8 t=4 r=4.1", UTW_E_OUTLINE,
                  "keyed-shaft: r = 4.1 does not fit: at most 3.4567 with d = 30, b = 8, t = 4");
    shape_refused("keyed-shaft d=30 b=8 t=4 n=10", UTW_E_OUTLINE,
                  "keyed-shaft: b = 8 does not fit: less than 7.1481 with d = 30, t = 4, n = 10");
    shape_refused("keyed-shaft d=30 b=8 t=4 n=0", UTW_E_OUTLINE,
                  "keyed-shaft: n = 0 must be at least 1");
}

/* The inner circle, and n times a spline: the rectangle from the circle's chord up, the segment on
 * top, less the segment below the chord that the circle has already; and twice the fillet's curved
 * triangle: side, circle, fillet. */
static figure splined(int n, double d, double D, double b, double r, double bore)
{
    figure f = {0};
    const double ri = d / 2, x = b / 2, chord = sqrt(ri * ri - x * x);
    figure spline = segment(D / 2, x);
    figure_rectangle(&spline, 1, -x, chord, x, sqrt(D * D - b * b) / 2);
    const figure below = segment(ri, x),
                 minus = {-below.A, -below.x, -below.y, -below.xx, -below.yy, -below.xy};
    add_turned(&spline, minus, 0);
    if (r > 0)
        for (int side = -1; side <= 1; side += 2) {
            /* quadrilateral of shaft centre, side's foot on the circle ... is cut as polygon less
             * two sectors: O, A (foot on the circle), T1 (on the side), C (fillet's centre), T2 (on
             * the circle) */
            const double c[2] = {x + r, sqrt((ri + r) * (ri + r) - (x + r) * (x + r))};
            const double t2[2] = {c[0] * ri / (ri + r), c[1] * ri / (ri + r)};
            const double v[5][2] = {{0, 0},
                                    {side * t2[0], t2[1]},
                                    {side * c[0], c[1]},
                                    {side * x, c[1]},
                                    {side * x, chord}};
            const double a_foot = atan2(chord, x), a_c = atan2(c[1], c[0]);
            figure_polygon(&spline, side, 5, v);
            if (side > 0) {
                figure_sector(&spline, -1, 0, 0, ri, a_c, a_foot);
                figure_sector(&spline, -1, c[0], c[1], r, UTW_PI, UTW_PI + a_c);
            } else {
                figure_sector(&spline, -1, 0, 0, ri, UTW_PI - a_foot, UTW_PI - a_c);
                figure_sector(&spline, -1, -c[0], c[1], r, -a_c, 0);
            }
        }
    figure_ellipse(&f, 1, 0, 0, ri, ri);
    for (int k = 0; k < n; k++) add_turned(&f, spline, 2 * UTW_PI * k / n);
    if (bore > 0) figure_ellipse(&f, -1, 0, 0, bore / 2, bore / 2);
    return f;
}

static void splined_shafts(void **state)
{
    (void)state;
    compare("splined-shaft n=6 d=23 D=28 b=6", splined(6, 23, 28, 6, 0, 0));
    compare("splined-shaft n=6 d=23 D=28 b=6 r=0.5", splined(6, 23, 28, 6, 0.5, 0));
    compare("splined-shaft n=8 d=32 D=38 b=6 r=0.4 bore=12", splined(8, 32, 38, 6, 0.4, 12));
    compare("splined-shaft n=2 d=32 D=38 b=6 r=0.4", splined(2, 32, 38, 6, 0.4, 0));
    compare("splined-shaft n=7 d=32 D=38 b=6", splined(7, 32, 38, 6, 0, 0));
    /* at the limits: r = (ri/2 - b/2)/(1/2) = 5.5: neighbours' fillets meet on the circle */
    compare("splined-shaft n=6 d=23 D=36 b=6 r=5.5", splined(6, 23, 36, 6, 5.5, 0));
    /* r = (ro^2 - ri^2)/(2 ri - b) = 4: the fillet ends at the spline's edge: no straight side is
     * left */
    compare("splined-shaft n=4 d=20 D=24 b=9 r=4", splined(4, 20, 24, 9, 4, 0));
    utw_outline *o = shape_of("splined-shaft n=4 d=20 D=24 b=9 r=4");
    assert_int_equal(o->part[0].loop[0].n, 16); /* fillet, top, fillet, bottom */
    utw_outline_free(o);
    o = shape_of("splined-shaft n=6 d=23 D=28 b=6 r=0.5");
    shape_symmetric(o, 1, 0);
    shape_symmetric(o, 0, 0);
    utw_outline_free(o);
    shape_refused("splined-shaft n=6 d=23 D=36 b=6 r=5.6", UTW_E_OUTLINE,
                  "splined-shaft: r = 5.6 does not fit: at most 5.5 with n = 6, d = 23, b = 6");
    shape_refused("splined-shaft n=6 d=23 D=28 b=6 r=4", UTW_E_OUTLINE,
                  "splined-shaft: r = 4 does not fit: at most 3.75 with d = 23, D = 28, b = 6");
    shape_refused("splined-shaft n=6 d=28 D=23 b=6", UTW_E_OUTLINE,
                  "splined-shaft: D = 23 does not fit: more than 28 with d = 28");
    shape_refused("splined-shaft n=6 d=23 D=28 b=11.5", UTW_E_OUTLINE,
                  "splined-shaft: b = 11.5 does not fit: less than 11.5 with n = 6, d = 23");
    shape_refused("splined-shaft n=6 d=23 D=28 b=6 bore=23", UTW_E_OUTLINE,
                  "splined-shaft: bore = 23 does not fit: less than 23 with d = 23");
    shape_refused("splined-shaft n=1 d=23 D=28 b=6", UTW_E_OUTLINE,
                  "splined-shaft: n = 1 must be at least 2");
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(keyed_shafts),
        balanced_test(splined_shafts),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
