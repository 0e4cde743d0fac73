/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/corner.h"

#include "base/vec2.h"
#include "outline/spline.h"
#include "support/support.h"

static utw_corner corner_of(utw_corner_kind kind, double size, const utw_curve *before,
                            int n_before, const utw_curve *after, int n_after)
{
    return (utw_corner){.kind = kind,
                        .size = size,
                        .before = {before, n_before},
                        .after = {after, n_after},
                        .least_before = 0,
                        .most_after = n_after};
}

static utw_curve line(double x0, double y0, double x1, double y1)
{
    const double a[2] = {x0, y0}, b[2] = {x1, y1};
    return utw_curve_line(a, b);
}

/* A straight line that does not know it is one: it takes the road of the general curves. */
static utw_curve line_as_cubic(double x0, double y0, double x1, double y1)
{
    const double a[2] = {x0, y0}, b[2] = {x1, y1};
    const double c[2] = {x0 + 0.3 * (x1 - x0), y0 + 0.3 * (y1 - y0)},
                 d[2] = {x0 + 0.6 * (x1 - x0), y0 + 0.6 * (y1 - y0)};
    return utw_curve_cubic(a, c, d, b);
}

static utw_curve arc(double x0, double y0, double xm, double ym, double x1, double y1)
{
    const double a[2] = {x0, y0}, m[2] = {xm, ym}, b[2] = {x1, y1};
    utw_curve c;
    assert_int_equal(utw_curve_arc_through(a, m, b, &c), 0);
    return c;
}

static utw_curve cubic(double x0, double y0, double x1, double y1, double x2, double y2, double x3,
                       double y3)
{
    const double a[2] = {x0, y0}, b[2] = {x1, y1}, c[2] = {x2, y2}, d[2] = {x3, y3};
    return utw_curve_cubic(a, b, c, d);
}

/* The arc starts and ends on the edges, has the radius, touches both with their tangents and turns
 * the way the corner turns. */
static void assert_rounds(const utw_corner *c)
{
    utw_corner_cut cut;
    assert_int_equal(utw_corner_make(c, &cut), UTW_CORNER_FITS);
    const double r = c->size;
    double p[2], t[2], d[2];
    for (int i = 0; i < 2; i++) {
        const utw_edge *edge = i == 0 ? &c->before : &c->after;
        const double s = i == 0 ? cut.before : cut.after;
        utw_edge_point(edge, s, p);
        utw_edge_d1(edge, s, t);
        utw_curve_d1(&cut.curve, i, d);
        assert_close_scaled(utw_distance(p, i == 0 ? cut.curve.from : cut.curve.to), 0, 1e-12, r);
        assert_close(utw_distance(p, cut.curve.centre), r, 1e-11);
        assert_close_scaled(utw_cross(t, d) / (utw_norm(t) * utw_norm(d)), 0, 1e-11, 1);
        assert_true(utw_dot(t, d) > 0);
    }
    double t0[2], t1[2];
    utw_edge_d1(&c->before, c->before.n, t0);
    utw_edge_d1(&c->after, 0, t1);
    assert_true((utw_cross(t0, t1) > 0) == (cut.curve.a1 > cut.curve.a0));
    assert_true(fabs(cut.curve.a1 - cut.curve.a0) < UTW_PI);
}

static void a_right_angle_is_rounded_by_a_quarter(void **state)
{
    (void)state;
    const utw_curve a = line(100, 20, 20, 20), b = line(20, 20, 20, 100);
    const utw_corner c = corner_of(UTW_CORNER_ROUND, 10, &a, 1, &b, 1);
    utw_corner_cut cut;
    assert_rounds(&c);
    assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_FITS);
    assert_close(cut.curve.centre[0], 30, 1e-15);
    assert_close(cut.curve.centre[1], 30, 1e-15);
    assert_close(utw_curve_length(&cut.curve), 10 * UTW_PI / 2, 1e-14);
    assert_close(cut.before, 1 - 10.0 / 80, 1e-15);
    assert_close(cut.after, 10.0 / 80, 1e-15);
}

static void lines_at_any_angle_agree_by_both_roads(void **state)
{
    (void)state;
    for (int degrees = 5; degrees < 180; degrees += 7)
        for (int side = -1; side <= 1; side += 2) {
            const double a = side * degrees * UTW_PI / 180, x = 3 + 2.7 * cos(a),
                         y = 1 + 2.7 * sin(a);
            const utw_curve l0 = line(0.2, 1, 3, 1), l1 = line(3, 1, x, y);
            const utw_curve c0 = line_as_cubic(0.2, 1, 3, 1), c1 = line_as_cubic(3, 1, x, y);
            const double r = 1.9 / tan(degrees * UTW_PI / 360);
            utw_corner_cut closed, followed;
            const utw_corner by_lines = corner_of(UTW_CORNER_ROUND, r, &l0, 1, &l1, 1);
            const utw_corner by_cubics = corner_of(UTW_CORNER_ROUND, r, &c0, 1, &c1, 1);
            assert_rounds(&by_lines);
            assert_rounds(&by_cubics);
            assert_int_equal(utw_corner_make(&by_lines, &closed), UTW_CORNER_FITS);
            assert_int_equal(utw_corner_make(&by_cubics, &followed), UTW_CORNER_FITS);
            for (int k = 0; k < 2; k++) {
                assert_close_scaled(closed.curve.centre[k], followed.curve.centre[k], 1e-12, r);
                assert_close_scaled(closed.curve.from[k], followed.curve.from[k], 1e-12, r);
            }
        }
}

/* A line along y = 0 that meets a circle of radius R about (0, h) and goes on inside it: the centre
 * of a rounding of radius r inside the circle lies at height r and R - r from the circle's centre
 * (elementary). */
static void line_and_arc_agree_with_the_closed_form(void **state)
{
    (void)state;
    const double R = 5, h = 2.3, x = sqrt(R * R - h * h), r = 1.37;
    const utw_curve a = line(-3, 0, x, 0), b = arc(x, 0, R, h, 0, h + R);
    const utw_corner c = corner_of(UTW_CORNER_ROUND, r, &a, 1, &b, 1);
    utw_corner_cut cut;
    assert_rounds(&c);
    assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_FITS);
    assert_close(cut.curve.centre[0], sqrt((R - r) * (R - r) - (h - r) * (h - r)), 1e-13);
    assert_close(cut.curve.centre[1], r, 1e-13);
}

/* Two arcs of radius R that cross at (0, +-s) and form a lens: a rounding of its tip lies on the y
 * axis. */
static void arc_and_arc_agree_with_the_closed_form(void **state)
{
    (void)state;
    const double R = 4, d = 2.5, s = sqrt(R * R - d * d),
                 r = 0.61; /* centres at (-d, 0) and (d, 0) */
    const utw_curve right = arc(0, -s, R - d, 0, 0, s), left = arc(0, s, d - R, 0, 0, -s);
    const utw_corner c = corner_of(UTW_CORNER_ROUND, r, &right, 1, &left, 1);
    utw_corner_cut cut;
    assert_rounds(&c);
    assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_FITS);
    assert_close_scaled(cut.curve.centre[0], 0, 1e-13, 1);
    assert_close(cut.curve.centre[1], sqrt((R - r) * (R - r) - d * d), 1e-13);
    /* the greatest is the inscribed circle of the lens, R - d */
    utw_corner large = c;
    large.size = 3;
    assert_int_equal(utw_corner_make(&large, &cut), UTW_CORNER_TOO_LARGE);
    assert_close(utw_corner_greatest(&large), R - d, 1e-5);
}

static void curves_of_every_kind_can_be_rounded(void **state)
{
    (void)state;
    const utw_curve before[] = {line(-4, 1, 0, 0), arc(-3, -1, -1.5, 0.6, 0, 0),
                                arc(-3, 1, -1.5, -0.6, 0, 0),
                                cubic(-4, 0.5, -3, -1, -1, 0.7, 0, 0)};
    const utw_curve after[] = {line(0, 0, 1, 4),          arc(0, 0, 1.2, 1.2, 1, 3),
                               arc(0, 0, 0.1, 1.6, 1, 3), cubic(0, 0, 0.6, 1, -1, 2, 1, 4),
                               line(0, 0, -1, -4),        arc(0, 0, 0.4, -1.5, -1, -3)};
    for (int i = 0; i < 4; i++)
        for (int j = 0; j < 6; j++)
            for (int k = 0; k < 3; k++) {
                const double r[] = {0.003, 0.11, 0.4};
                const utw_corner c = corner_of(UTW_CORNER_ROUND, r[k], &before[i], 1, &after[j], 1);
                assert_rounds(&c);
            }
}

static void far_from_the_origin_nothing_changes(void **state)
{
    (void)state;
    const double X = 1e6;
    const utw_curve a = line(X - 4, 1, X, 0), b = arc(X, 0, X + 1.2, 1.2, X + 1, 3);
    const utw_corner c = corner_of(UTW_CORNER_ROUND, 0.4, &a, 1, &b, 1);
    utw_corner_cut cut;
    assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_FITS);
    const utw_curve a0 = line(-4, 1, 0, 0), b0 = arc(0, 0, 1.2, 1.2, 1, 3);
    const utw_corner c0 = corner_of(UTW_CORNER_ROUND, 0.4, &a0, 1, &b0, 1);
    utw_corner_cut cut0;
    assert_int_equal(utw_corner_make(&c0, &cut0), UTW_CORNER_FITS);
    assert_close_scaled(cut.curve.centre[0] - X, cut0.curve.centre[0], 1e-8, 1);
    assert_close_scaled(cut.curve.centre[1], cut0.curve.centre[1], 1e-8, 1);
}

/* The rounding may reach over several pieces of a spline, long and short. */
static void a_rounding_may_use_up_pieces_of_a_spline(void **state)
{
    (void)state;
    const double xy[6][2] = {{0, 0}, {0.1, 0.12}, {0.12, 0.2}, {0.5, 1.1}, {0.55, 1.3}, {1, 3}};
    utw_curve after[5];
    utw_error err;
    assert_ok(utw_spline_natural(6, xy, after, &err));
    const utw_curve before = line(3, 0, 0, 0);
    for (double r = 0.01; r < 0.9; r *= 1.3) {
        const utw_corner c = corner_of(UTW_CORNER_ROUND, r, &before, 1, after, 5);
        assert_rounds(&c);
        utw_corner_cut cut;
        assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_FITS);
        if (r > 0.6) assert_true(cut.after > 2.5);
    }
}

/* In the right angle of legs 3 and 4 the edges end at r = 3; beside a corner that has taken 1.2 of
 * the shorter leg at r = 1.8. */
static void the_greatest_fits_and_a_little_more_does_not(void **state)
{
    (void)state;
    const utw_curve a = line(3, 0, 0, 0), b = line(0, 0, 0, 4);
    utw_corner c = corner_of(UTW_CORNER_ROUND, 7.7, &a, 1, &b, 1);
    assert_close(utw_corner_greatest(&c), 3, 1e-12);
    c.least_before = 1.2 / 3;
    assert_close(utw_corner_greatest(&c), 1.8, 1e-12);
    utw_corner_cut cut;
    c.size = 1.8;
    assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_FITS);
    c.size = 1.80001;
    assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_TOO_LARGE);
    c.kind = UTW_CORNER_CHAMFER;
    assert_close(utw_corner_greatest(&c), 1.8, 1e-5);
    c.least_before = 1;
    assert_true(utw_corner_greatest(&c) == 0);
}

/* The printed greatest is rounded down, never up. */
static void the_greatest_can_be_typed_in(void **state)
{
    (void)state;
    const utw_curve a = line(1, 0, 0, 0), b = line(0, 0, 0.37, 2.9);
    utw_corner c = corner_of(UTW_CORNER_ROUND, 1234, &a, 1, &b, 1);
    const double greatest = utw_corner_greatest(&c);
    char text[32];
    snprintf(text, sizeof text, "%g", greatest);
    utw_corner_cut cut;
    c.size = strtod(text, NULL);
    assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_FITS);
    c.size *= 1.00001;
    assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_TOO_LARGE);
}

/* A chord that meets a circle of radius 1 from inside: no rounding between them exceeds the
 * circle's own radius. */
static void a_rounding_never_exceeds_the_curvature_of_its_edges(void **state)
{
    (void)state;
    const utw_curve chord = line(-9, 2, 0.6, 0.2), on = arc(0.6, 0.2, 1, 1, 0, 2);
    utw_corner c = corner_of(UTW_CORNER_ROUND, 5, &chord, 1, &on, 1);
    const double greatest = utw_corner_greatest(&c);
    assert_true(greatest > 0.5 && greatest < 1);
    c.size = greatest;
    assert_rounds(&c);
}

static void chamfers_cut_equal_lengths(void **state)
{
    (void)state;
    const utw_curve a = line(-4, 1, 0, 0), b = arc(0, 0, 1.2, 1.2, 1, 3);
    const utw_corner c = corner_of(UTW_CORNER_CHAMFER, 0.77, &a, 1, &b, 1);
    utw_corner_cut cut;
    assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_FITS);
    assert_close(utw_edge_length(&c.before, cut.before, 1), 0.77, 1e-12);
    assert_close(utw_edge_length(&c.after, 0, cut.after), 0.77, 1e-12);
    assert_int_equal(cut.curve.kind, UTW_LINE);
}

static void there_must_be_a_corner(void **state)
{
    (void)state;
    const utw_curve a = line(-4, 1, 0, 0), on = line(0, 0, 4, -1), back = line(0, 0, -8, 2);
    const utw_curve still = cubic(0, 0, 0, 0, 1, 1, 2, 1);
    utw_corner_cut cut;
    for (int kind = UTW_CORNER_ROUND; kind <= UTW_CORNER_CHAMFER; kind++) {
        utw_corner c = corner_of((utw_corner_kind)kind, 0.5, &a, 1, &on, 1);
        assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_STRAIGHT);
        c.after.curve = &back;
        assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_BACK);
        c.after.curve = &still;
        assert_int_equal(utw_corner_make(&c, &cut), UTW_CORNER_NO_TANGENT);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(a_right_angle_is_rounded_by_a_quarter),
        cmocka_unit_test(lines_at_any_angle_agree_by_both_roads),
        cmocka_unit_test(line_and_arc_agree_with_the_closed_form),
        cmocka_unit_test(arc_and_arc_agree_with_the_closed_form),
        cmocka_unit_test(curves_of_every_kind_can_be_rounded),
        cmocka_unit_test(far_from_the_origin_nothing_changes),
        cmocka_unit_test(a_rounding_may_use_up_pieces_of_a_spline),
        cmocka_unit_test(the_greatest_fits_and_a_little_more_does_not),
        cmocka_unit_test(the_greatest_can_be_typed_in),
        cmocka_unit_test(a_rounding_never_exceeds_the_curvature_of_its_edges),
        cmocka_unit_test(chamfers_cut_equal_lengths),
        cmocka_unit_test(there_must_be_a_corner),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
