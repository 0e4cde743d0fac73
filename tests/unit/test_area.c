/* SPDX-License-Identifier: GPL-3.0-or-later
 * Closed forms are elementary integrals (common practice; the derivation is given where it is not a
 * line). */
#include <time.h>

#include "base/memory.h"
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

static drawing polygon(int n, const double (*xy)[2])
{
    drawing d = start();
    drawing_polygon(&d, n, xy);
    return d;
}

/* ---- closed forms ------------------------------------------------------------------------ */

static void rectangle(void **state)
{
    (void)state;
    const double b = 2.385, h = 7.12, x0 = 13.7, y0 = -4.4;
    drawing d = start();
    drawing_rectangle(&d, x0, y0, x0 + b, y0 + h);
    const utw_area a = area_of(&d);
    assert_close(a.A, b * h, TIGHT);
    assert_close(a.perimeter, 2 * (b + h), TIGHT);
    assert_close(a.xc, x0 + b / 2, TIGHT);
    assert_close(a.yc, y0 + h / 2, TIGHT);
    assert_close(a.Ixx, b * h * h * h / 12, TIGHT);
    assert_close(a.Iyy, h * b * b * b / 12, TIGHT);
    assert_close_scaled(a.Ixy, 0, TIGHT, a.Ixx);
    assert_close_scaled(a.Iyyy, 0, TIGHT, a.Ixx * h);
    assert_close(a.I1, a.Ixx, TIGHT);
    assert_close(a.I2, a.Iyy, TIGHT);
    assert_true(a.angle == 0);
    assert_close(a.rx, h / sqrt(12), TIGHT);
    assert_close(a.ry, b / sqrt(12), TIGHT);
    assert_close(a.top, h / 2, TIGHT);
    assert_close(a.left, b / 2, TIGHT);
    assert_close(a.Wx_bottom, b * h * h / 6, TIGHT);
    assert_close(a.Wy_right, h * b * b / 6, TIGHT);
    assert_close(a.Zx, b * h * h / 4, TIGHT);
    assert_close(a.Zy, h * b * b / 4, TIGHT);
    assert_close(a.xp, a.xc, TIGHT);
    assert_close(a.yp, a.yc, TIGHT);
}

static void lying_rectangle_has_its_strong_axis_upright(void **state)
{
    (void)state;
    drawing d = start();
    drawing_rectangle(&d, 0, 0, 5.1, 2.2);
    const utw_area a = area_of(&d);
    assert_close(a.angle, UTW_PI / 2, TIGHT);
    assert_close(a.I1, a.Iyy, TIGHT);
}

static void right_triangle(void **state)
{
    (void)state;
    const double b = 3.3, h = 5.7, xy[3][2] = {{0, 0}, {b, 0}, {0, h}};
    drawing d = polygon(3, xy);
    const utw_area a = area_of(&d);
    assert_close(a.A, b * h / 2, TIGHT);
    assert_close(a.xc, b / 3, TIGHT);
    assert_close(a.yc, h / 3, TIGHT);
    assert_close(a.Ixx, b * h * h * h / 36, TIGHT);
    assert_close(a.Iyy, h * b * b * b / 36, TIGHT);
    assert_close(a.Ixy, -b * b * h * h / 72, TIGHT);
    /* third moment of a triangle about its centroid: A/30 (sum of cubes of the corners' distances)
     * (y - h/3 at the corners: -h/3, -h/3, 2h/3) */
    assert_close(a.Iyyy, a.A / 30 * h * h * h * (8 - 1 - 1) / 27, TIGHT);
    assert_close(a.Ixxx, a.A / 30 * b * b * b * (8 - 1 - 1) / 27, TIGHT);
    /* mixed: A/30 sum X^2 Y over the corners (-b/3,-h/3), (2b/3,-h/3), (-b/3,2h/3) */
    assert_close(a.Ixxy, a.A / 30 * b * b * h * (-1 - 4 + 2) / 27, TIGHT);
    assert_close(a.Ixyy, a.A / 30 * b * h * h * (-1 + 2 - 4) / 27, TIGHT);
    /* the plastic axis leaves a similar triangle of half the area above it: yp = h (1 - 1/sqrt 2).
     * Z = 2 * (area of it) * (its centroid's height) - first moment of all = b h^2 (2 - sqrt 2)/6
     */
    assert_close(a.yp, h * (1 - sqrt(0.5)), TIGHT);
    assert_close(a.Zx, b * h * h * (2 - sqrt(2)) / 6, TIGHT);
    assert_close(a.Zy, h * b * b * (2 - sqrt(2)) / 6, TIGHT);
}

static void circle_and_ring(void **state)
{
    (void)state;
    const double r = 4.77, q = 3.9;
    drawing d = start();
    drawing_circle(&d, -20, 31, r);
    utw_area a = area_of(&d);
    assert_close(a.A, UTW_PI * r * r, TIGHT);
    assert_close(a.perimeter, 2 * UTW_PI * r, TIGHT);
    assert_close(a.Ixx, UTW_PI * pow(r, 4) / 4, TIGHT);
    assert_close(a.Iyy, a.Ixx, TIGHT);
    assert_close(a.I2, a.I1, TIGHT);
    assert_true(a.angle == 0);
    assert_close(a.Zx, 4 * r * r * r / 3, TIGHT); /* d^3/6 */
    assert_close(a.Zy, 4 * r * r * r / 3, TIGHT);
    assert_close_scaled(a.Ixxx, 0, TIGHT, a.Ixx * r);
    d = start();
    drawing_circle(&d, -20, 31, r);
    drawing_circle(&d, -20, 31, q);
    drawing_reverse(&d);
    a = area_of(&d);
    assert_close(a.A, UTW_PI * (r * r - q * q), TIGHT);
    assert_close(a.perimeter, 2 * UTW_PI * (r + q), TIGHT);
    assert_close(a.Ixx, UTW_PI * (pow(r, 4) - pow(q, 4)) / 4, TIGHT);
    assert_close(a.Zx, 4 * (r * r * r - q * q * q) / 3, TIGHT);
    assert_close(a.yp, 31, TIGHT);
}

static void turned_ellipse(void **state)
{
    (void)state;
    const double p = 9.1, q = 2.6, angle = 0.4;
    drawing d = start();
    drawing_ellipse(&d, 1, 2, p, q, angle);
    const utw_area a = area_of(&d);
    const double I1 = UTW_PI * p * p * p * q / 4, I2 = UTW_PI * p * q * q * q / 4;
    assert_close(a.A, UTW_PI * p * q, TIGHT);
    assert_close(a.I1, I1, TIGHT);
    assert_close(a.I2, I2, TIGHT);
    assert_close(a.angle, angle - UTW_PI / 2, TIGHT); /* bent most stiffly about the short axis */
    assert_close(a.Ixx, I1 * sin(angle) * sin(angle) + I2 * cos(angle) * cos(angle), TIGHT);
    /* an ellipse is an affine circle: about a diameter in x its Z = 4/3 (p q) * half height */
    const double top = hypot(p * sin(angle), q * cos(angle));
    assert_close(a.top, top, TIGHT);
    assert_close(a.Zx, 4 * p * q * top / 3, TIGHT);
}

static void half_circle_and_segment(void **state)
{
    (void)state;
    const double r = 3.35;
    drawing d = start();
    drawing_move(&d, r, 0);
    drawing_arc(&d, 0, r, -r, 0);
    drawing_close(&d);
    utw_area a = area_of(&d);
    assert_close(a.A, UTW_PI * r * r / 2, TIGHT);
    assert_close(a.yc, 4 * r / (3 * UTW_PI), TIGHT);
    assert_close(a.Ixx, (UTW_PI / 8 - 8 / (9 * UTW_PI)) * pow(r, 4), TIGHT);
    assert_close(a.Iyy, UTW_PI * pow(r, 4) / 8, TIGHT);
    assert_close(a.Zy, 2 * r * r * r / 3, TIGHT); /* half of the circle's */

    const double t = 0.7; /* half angle; the segment above the chord y = r cos t */
    d = start();
    drawing_move(&d, r * sin(t), r * cos(t));
    drawing_arc(&d, 0, r, -r * sin(t), r * cos(t));
    drawing_close(&d);
    a = area_of(&d);
    const double A = r * r * (t - sin(t) * cos(t));
    const double yc = 2 * r * r * r * pow(sin(t), 3) / 3 / A;
    /* int y^2 dA = 2 int_{0}^{t} r^4 cos^2 sin^2 = r^4/4 (t - sin 4t / 4) */
    const double I0 = pow(r, 4) / 4 * (t - sin(4 * t) / 4);
    assert_close(a.A, A, TIGHT);
    assert_close(a.yc, yc, TIGHT);
    assert_close(a.Ixx, I0 - A * yc * yc,
                 1e-12); /* the closed form loses a digit, not the program */
    assert_close(a.perimeter, 2 * r * (t + sin(t)), TIGHT);
}

static void fillet_corner(void **state)
{
    (void)state;
    /* Between two sides at right angles and a quarter arc: a square of r less a quarter circle
     * about (r, r). */
    const double r = 6.2;
    drawing d = start();
    drawing_move(&d, 0, 0);
    drawing_line(&d, r, 0);
    drawing_arc(&d, r - r * sqrt(0.5), r - r * sqrt(0.5), 0, r);
    drawing_close(&d);
    const utw_area a = area_of(&d);
    const double A = r * r * (1 - UTW_PI / 4);
    const double c =
        r * (1 - 1.0 / (6 * (1 - UTW_PI / 4))); /* (r^3/2 - pi/4 r^2 (r - 4r/3pi)) / A */
    /* about the corner: r^4/3 - [pi/16 r^4 + moment arm: pi/4 r^2 r^2 - 2 r (r^3/3)] */
    const double I0 = pow(r, 4) * (1.0 / 3 - (UTW_PI / 16 + UTW_PI / 4 - 2.0 / 3));
    /* product about (r, r), where the quarter circle has r^4/8 */
    const double Ixy0 = pow(r, 4) * (1.0 / 4 - 1.0 / 8);
    assert_close(a.A, A, TIGHT);
    assert_close(a.xc, c, TIGHT);
    assert_close(a.yc, c, TIGHT);
    assert_close(a.Ixx, I0 - A * c * c, 1e-12);
    assert_close(a.Ixy, Ixy0 - A * (r - c) * (r - c), 1e-12);
    assert_close(a.angle, UTW_PI / 4, 1e-12); /* the product is negative */
}

static void hollow_box(void **state)
{
    (void)state;
    drawing d = start();
    drawing_rectangle(&d, 0, 0, 9, 13);
    drawing_rectangle(&d, 1, 3, 7, 12);
    drawing_reverse(&d);
    const utw_area a = area_of(&d);
    const double A = 9 * 13 - 6 * 9, yc = (117 * 6.5 - 54 * 7.5) / A, xc = (117 * 4.5 - 54 * 4) / A;
    assert_close(a.A, A, TIGHT);
    assert_close(a.xc, xc, TIGHT);
    assert_close(a.yc, yc, TIGHT);
    assert_close(a.Ixx, 9 * pow(13, 3) / 3 - 6 * (pow(12, 3) - 27) / 3 - A * yc * yc, TIGHT);
    assert_close(a.Ixy, 117 * 6.5 * 4.5 - 54 * 7.5 * 4 - A * xc * yc, 1e-12);
    /* half of 63 is 31.5: the bottom wall has 27, the two side walls 3 a unit of height */
    assert_close(a.yp, 3 + 4.5 / 3, TIGHT);
    assert_close(a.Zx, 27 * (4.5 - 1.5) + 3 * 1.5 * 0.75 + 3 * 7.5 * 3.75 + 9 * 8, TIGHT);
}

/* ---- plastic moduli ---------------------------------------------------------------------- */

static void tee_by_hand(void **state)
{
    (void)state;
    /* flange 100 x 12 on a web 8 x 120: 2160; the axis lies in the flange, 1080/100 below its top
     */
    const double xy[8][2] = {{46, 0},    {54, 0},  {54, 120}, {100, 120},
                             {100, 132}, {0, 132}, {0, 120},  {46, 120}};
    drawing d = polygon(8, xy);
    const utw_area a = area_of(&d);
    const double yp = 132 - 10.8;
    assert_close(a.yp, yp, TIGHT);
    assert_close(a.Zx, 100 * 10.8 * 5.4 + 100 * 1.2 * 0.6 + 960 * (1.2 + 60), TIGHT);
    assert_close(a.Zy, 12 * 100 * 100 / 4.0 + 120 * 8 * 8 / 4.0, TIGHT);
    assert_close(a.xp, 50, TIGHT);
}

static void diamond(void **state)
{
    (void)state;
    const double p = 4.3, q = 2.9, xy[4][2] = {{p, 0}, {0, q}, {-p, 0}, {0, -q}};
    drawing d = polygon(4, xy);
    const utw_area a = area_of(&d);
    assert_close(a.Zx, 2 * p * q * q / 3, TIGHT); /* 2 (p q) (q/3) */
    assert_close_scaled(a.yp, 0, TIGHT, 1);
}

static void loose_parts_have_no_properties(void **state)
{
    (void)state;
    drawing d = start(); /* two flanges without a web */
    drawing_rectangle(&d, 0, 0, 8, 1.1);
    drawing_part(&d, -1);
    drawing_rectangle(&d, 0, 6.3, 8, 7.4);
    utw_area a;
    utw_error err;
    assert_int_equal(utw_area_compute(drawing_done(&d), NULL, &a, &err), UTW_E_OUTLINE);
    drawing_clear(&d);
}

static void axis_at_a_step_of_the_width(void **state)
{
    (void)state;
    /* the flange holds exactly half the area: the axis lies in its lower face */
    const double xy[8][2] = {{4, 0}, {6, 0}, {6, 5}, {10, 5}, {10, 6}, {0, 6}, {0, 5}, {4, 5}};
    drawing d = polygon(8, xy);
    const utw_area a = area_of(&d);
    assert_close(a.yp, 5, TIGHT);
    assert_close(a.Zx, 10 * 0.5 + 10 * 2.5, TIGHT);
}

/* ---- cubics ------------------------------------------------------------------------------ */

static void region_under_a_cubic(void **state)
{
    (void)state;
    /* x = 6 t, y = 3 + 9 t - 15 t^2 + 8 t^3 above the x axis: control points of equal steps in x */
    drawing d = start();
    drawing_move(&d, 0, 0);
    drawing_line(&d, 6, 0);
    drawing_line(&d, 6, 5);
    drawing_cubic(&d, 4, 3 + 6 - 5.0, 2, 6, 0, 3); /* y: b0 = 3, b1 = 6, b2 = 4, b3 = 5 */
    drawing_close(&d);
    const utw_area a = area_of(&d);
    /* moments int x^p y^q dA = 36.. by integrating polynomials in t with Gauss-free arithmetic */
    const double c[4] = {3, 9, -15, 8};
    double y2[7] = {0}, y3[10] = {0};
    for (int i = 0; i < 4; i++)
        for (int j = 0; j < 4; j++) y2[i + j] += c[i] * c[j];
    for (int i = 0; i < 4; i++)
        for (int j = 0; j < 7; j++) y3[i + j] += c[i] * y2[j];
    double A = 0, Sx = 0, Sy = 0, Ixx = 0, Iyy = 0, Ixy = 0;
    for (int i = 0; i < 4; i++) {
        A += 6 * c[i] / (i + 1);
        Sx += 36 * c[i] / (i + 2);
        Iyy += 216 * c[i] / (i + 3);
    }
    for (int i = 0; i < 7; i++) {
        Sy += 6 * y2[i] / 2 / (i + 1);
        Ixy += 36 * y2[i] / 2 / (i + 2);
    }
    for (int i = 0; i < 10; i++) Ixx += 6 * y3[i] / 3 / (i + 1);
    assert_close(a.A, A, TIGHT);
    assert_close(a.xc, Sx / A, TIGHT);
    assert_close(a.yc, Sy / A, TIGHT);
    assert_close(a.Ixx, Ixx - Sy * Sy / A, 1e-12);
    assert_close(a.Iyy, Iyy - Sx * Sx / A, 1e-12);
    assert_close_scaled(a.Ixy, Ixy - Sx * Sy / A, TIGHT, a.Ixx);
    /* the axis x = xp halves 3 x + 9/12 x^2 - ... : check the area left of it */
    const double t = a.xp / 6;
    assert_close(6 * (3 * t + 4.5 * t * t - 5 * t * t * t + 2 * t * t * t * t), A / 2, TIGHT);
    double left = 0; /* first moment of the left half about x = xp */
    for (int i = 0; i < 4; i++)
        left += 6 * c[i] * pow(t, i + 1) * (a.xp / (i + 1) - a.xp / (i + 2));
    assert_close(a.Zy, (Sx - a.xp * A) + 2 * left, TIGHT);
}

/* ---- weights and parts ------------------------------------------------------------------- */

static void two_materials_are_weighted(void **state)
{
    (void)state;
    drawing d;
    drawing_init(&d);
    drawing_part(&d, 0);
    drawing_rectangle(&d, 0, 0, 4, 3);
    drawing_part(&d, 1);
    drawing_rectangle(&d, 0, 3, 4, 5);
    const double weight[2] = {2, 7};
    utw_area a;
    utw_error err;
    assert_ok(utw_area_compute(drawing_done(&d), weight, &a, &err));
    assert_close(a.A, 2 * 12 + 7 * 8, TIGHT);
    const double yc = (24 * 1.5 + 56 * 4) / 80;
    assert_close(a.yc, yc, TIGHT);
    assert_close(a.Ixx, 2 * 4 * 27 / 3.0 + 7 * 4 * (125 - 27) / 3.0 - 80 * yc * yc, TIGHT);
    assert_close(a.perimeter, 18, TIGHT); /* the joint is no surface */
    assert_close(a.yp, 5 - 40 / 28.0, TIGHT);
    const double bad[2] = {2, -1};
    assert_int_equal(utw_area_compute(drawing_done(&d), bad, &a, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "part 2 has the weight -1; weights must be positive");
    drawing_clear(&d);
}

/* ---- invariance -------------------------------------------------------------------------- */

static void nearly_straight_arc_keeps_its_digits(void **state)
{
    (void)state;
    /* a plate with one side bowed by f over its length L, radius 5e5 L: area + 2/3 f L (1 +
     * O(f/L)^2) */
    const double L = 10, f = 2.5e-6, h = 3;
    drawing d = start();
    drawing_move(&d, 0, 0);
    drawing_line(&d, L, 0);
    drawing_line(&d, L, h);
    drawing_arc(&d, L / 2, h + f, 0, h);
    drawing_close(&d);
    const utw_area a = area_of(&d);
    assert_close(a.A, L * h + 2 * f * L / 3, TIGHT);
    assert_close(a.xc, L / 2, TIGHT);
    assert_close(a.top, h + f - a.yc, TIGHT);
}

static void large_outlines_are_fast(void **state)
{
    (void)state;
    drawing d = start();
    enum { N = 20000 };
    drawing_move(&d, 100, 0);
    for (int i = 1; i < N; i++) {
        const double a = 2 * UTW_PI * i / N;
        drawing_line(&d, 100 * cos(a), 100 * sin(a));
    }
    drawing_close(&d);
    struct timespec t0, t1;
    clock_gettime(CLOCK_MONOTONIC, &t0);
    const utw_area a = area_of(&d);
    clock_gettime(CLOCK_MONOTONIC, &t1);
    const double seconds =
        (double)(t1.tv_sec - t0.tv_sec) + 1e-9 * (double)(t1.tv_nsec - t0.tv_nsec);
    print_message("20000 lines: %.4f s\n", seconds);
    assert_close(a.A, N / 2 * 1e4 * sin(2 * UTW_PI / N), TIGHT);
    assert_true(seconds < 2);
}

static void allocation_failures_are_reported(void **state)
{
    (void)state;
    drawing d;
    drawing_mixed(&d);
    const utw_outline *o = drawing_done(&d);
    utw_error err;
    utw_area a;
    int refusals = 0;
    for (long n = 1;; n++) {
        utw_memory_fail_at(n);
        const utw_status st = utw_area_compute(o, NULL, &a, &err);
        utw_memory_fail_at(0);
        if (st == UTW_OK) break;
        assert_int_equal(st, UTW_E_NOMEM);
        refusals++;
    }
    assert_true(refusals >= 6);
    drawing_clear(&d);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(rectangle),
        balanced_test(lying_rectangle_has_its_strong_axis_upright),
        balanced_test(right_triangle),
        balanced_test(circle_and_ring),
        balanced_test(turned_ellipse),
        balanced_test(half_circle_and_segment),
        balanced_test(fillet_corner),
        balanced_test(hollow_box),
        balanced_test(tee_by_hand),
        balanced_test(diamond),
        balanced_test(loose_parts_have_no_properties),
        balanced_test(axis_at_a_step_of_the_width),
        balanced_test(region_under_a_cubic),
        balanced_test(two_materials_are_weighted),
        balanced_test(nearly_straight_arc_keeps_its_digits),
        balanced_test(large_outlines_are_fast),
        balanced_test(allocation_failures_are_reported),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
