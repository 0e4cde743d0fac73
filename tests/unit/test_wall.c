/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/wall.h"

#include "base/vec2.h"
#include "support/support.h"

static void line_goes_from_end_to_end(void **state)
{
    (void)state;
    const double a[2] = {1.2, -3.4}, b[2] = {5.7, 2.6};
    const utw_path w = utw_path_line(a, b, 0.3, 0.7);
    utw_path_point p;
    assert_close(w.length, 7.5, 1e-15);
    utw_path_at(&w, 2.5, &p);
    assert_close(p.x[0], 2.7, 1e-14);
    assert_close(p.x[1], -1.4, 1e-14);
    assert_close(p.t, 0.3 + 0.4 / 3, 1e-14);
    assert_close(p.e[0], 0.6, 1e-14);
    assert_close(p.e[1], 0.8, 1e-14);
}

/* An arc of radius 2.385 about (0.7, -1.1) from a0 to a1, given through the fraction f of its
 * angle. */
static utw_path arc(double a0, double a1, double f)
{
    const double r = 2.385, am = a0 + f * (a1 - a0);
    const double a[2] = {0.7 + r * cos(a0), -1.1 + r * sin(a0)};
    const double m[2] = {0.7 + r * cos(am), -1.1 + r * sin(am)};
    const double b[2] = {0.7 + r * cos(a1), -1.1 + r * sin(a1)};
    utw_path w;
    assert_int_equal(utw_path_arc(a, m, b, 0.2, 0.5, &w), UTW_ARC_GOOD);
    return w;
}

static void arc_runs_on_its_circle(void **state)
{
    (void)state;
    const double fractions[] = {0.5, 0.2, 0.81};
    for (int turn = -11; turn <= 11; turn++) {
        if (turn == 0) continue;
        for (int k = 0; k < 3; k++) {
            const double a0 = 0.4 + turn, da = turn * UTW_PI / 6;
            const utw_path w = arc(a0, a0 + da, fractions[k]);
            assert_close(w.length, 2.385 * fabs(da), 1e-12);
            assert_close(w.kappa, (turn > 0 ? 1 : -1) / 2.385, 1e-12);
            for (int i = 0; i <= 10; i++) {
                utw_path_point p;
                utw_path_at(&w, w.length * i / 10, &p);
                const double a = a0 + da * i / 10, sign = turn > 0 ? 1 : -1;
                assert_close_scaled(p.x[0], 0.7 + 2.385 * cos(a), 1e-12, 1);
                assert_close_scaled(p.x[1], -1.1 + 2.385 * sin(a), 1e-12, 1);
                assert_close_scaled(p.e[0], -sign * sin(a), 1e-12, 1);
                assert_close_scaled(p.e[1], sign * cos(a), 1e-12, 1);
                assert_close(p.t, 0.2 + 0.03 * i, 1e-13);
            }
        }
    }
}

static void full_circle_runs_counter_clockwise(void **state)
{
    (void)state;
    const double a[2] = {-3, 1}, m[2] = {4.2, 1};
    utw_path w;
    utw_path_point p;
    assert_int_equal(utw_path_arc(a, m, a, 0.1, 0.1, &w), UTW_ARC_GOOD);
    assert_close(w.length, 7.2 * UTW_PI, 1e-14);
    utw_path_at(&w, w.length / 4, &p); /* from the left end the quarter is at the bottom */
    assert_close(p.x[0], 0.6, 1e-13);
    assert_close(p.x[1], 1 - 3.6, 1e-13);
    /* a saw cut of 1e-7 between the ends changes it by no more than that */
    const double b[2] = {-3, 1 + 1e-7};
    assert_int_equal(utw_path_arc(a, m, b, 0.1, 0.1, &w), UTW_ARC_GOOD);
    assert_close(fabs(w.kappa), 1 / 3.6, 1e-7);
    utw_path_at(&w, w.length, &p);
    assert_close_scaled(p.x[1] - 1, 1e-7, 1e-13, 1);
}

static void flat_arc_loses_nothing(void **state)
{
    (void)state;
    /* rise f over a chord of 2: R = (1 + f^2)/(2 f), length = 2 R asin(1/R) = 2 (1 + 1/(6 R^2) +
     * ...) */
    for (double f = 1e-2; f > 1e-14; f /= 10) {
        const double a[2] = {-1, 0}, m[2] = {0, f}, b[2] = {1, 0}, r = (1 + f * f) / (2 * f);
        utw_path w;
        utw_path_point p;
        assert_int_equal(utw_path_arc(a, m, b, 0.1, 0.1, &w), UTW_ARC_GOOD);
        assert_close(w.length, f > 1e-6 ? 2 * r * asin(1 / r) : 2.0, 1e-11);
        assert_close(w.kappa, -1 / r, 1e-10);
        utw_path_at(&w, w.length / 2, &p);
        assert_close(p.x[1], f, 1e-2 * f + 1e-14 / f);
        utw_path_at(&w, w.length, &p);
        assert_close(p.x[0], 1.0, 1e-14);
    }
}

static void points_that_are_no_arc(void **state)
{
    (void)state;
    const double a[2] = {0, 0}, b[2] = {4, 2}, between[2] = {1, 0.5}, beyond[2] = {6, 3};
    utw_path w;
    assert_int_equal(utw_path_arc(a, a, b, 1, 1, &w), UTW_ARC_AT_END);
    assert_int_equal(utw_path_arc(a, b, b, 1, 1, &w), UTW_ARC_AT_END);
    assert_int_equal(utw_path_arc(a, a, a, 1, 1, &w), UTW_ARC_AT_END);
    assert_int_equal(utw_path_arc(a, beyond, b, 1, 1, &w), UTW_ARC_BEYOND);
    assert_int_equal(utw_path_arc(a, between, b, 1, 1, &w), UTW_ARC_GOOD); /* a straight wall */
    assert_close(w.length, sqrt(20), 1e-15);
    assert_close_scaled(w.kappa, 0.0, 1e-15, 1);
}

/* Midpoint sums refined by Richardson's extrapolation. */
static utw_path_run brute(const utw_path *w, double s)
{
    utw_path_run sums[2];
    memset(sums, 0, sizeof sums);
    for (int level = 0; level < 2; level++) {
        const int n = 2000 << level;
        utw_path_run *r = &sums[level];
        for (int i = 0; i < n; i++) {
            utw_path_point p;
            utw_path_at(w, s * (i + 0.5) / n, &p);
            const double ds = s / n;
            r->area += p.t * ds;
            for (int k = 0; k < 2; k++) r->moment[k] += p.x[k] * p.t * ds;
            r->sector += utw_cross(p.x, p.e) * ds;
            r->f += ds / p.t;
        }
    }
    double *a = &sums[0].area, *b = &sums[1].area;
    for (size_t i = 0; i < sizeof sums[0] / sizeof(double); i++) b[i] += (b[i] - a[i]) / 3;
    return sums[1];
}

static void running_integrals(void **state)
{
    (void)state;
    utw_path_rule rule;
    utw_path_rule_init(&rule);
    const double a[2] = {1.2, -3.4}, b[2] = {5.7, 2.6};
    const utw_path walls[] = {utw_path_line(a, b, 0.3, 0.7), arc(0.3, 1.1, 0.5), arc(2, -4, 0.3),
                              arc(0.1, 0.1001, 0.5)};
    for (int i = 0; i < 4; i++) {
        for (int k = 1; k <= 5; k++) {
            const double s = walls[i].length * k / 5;
            utw_path_run run;
            utw_path_run_to(&walls[i], &rule, s, &run);
            const utw_path_run sum = brute(&walls[i], s);
            assert_close(run.area, sum.area, 1e-11);
            assert_close_scaled(run.moment[0], sum.moment[0], 1e-11, run.area);
            assert_close_scaled(run.moment[1], sum.moment[1], 1e-11, run.area);
            assert_close_scaled(run.sector, sum.sector, 1e-11, s);
            assert_close(run.f, sum.f, 1e-11);
        }
    }
    /* the sector of a circle about its own start, on both sides of the switch to the series */
    for (double theta = 0.3; theta < 0.7; theta += 0.05) {
        utw_path w = {.e = {1, 0}, .length = 2.4 * theta, .kappa = 1 / 2.4, .t0 = 1, .t1 = 1};
        assert_close(utw_path_sector(&w, w.length), 2.4 * 2.4 * (theta - sin(theta)), 1e-13);
    }
}

/* int ds/t = L ln(t1/t0)/(t1 - t0) = L/t0 (1 - e/2 + e^2/3 - ...), e = t1/t0 - 1. */
static void shear_length_of_any_taper(void **state)
{
    (void)state;
    const double a[2] = {0, 0}, b[2] = {3.7, 0};
    utw_path w = utw_path_line(a, b, 0.3, 0.3);
    assert_close(utw_path_shear_length(&w, 3.7), 3.7 / 0.3, 1e-15);
    for (double e = 1e-15; e < 1e-3; e *= 10) {
        for (int sign = -1; sign <= 1; sign += 2) {
            w.t1 = 0.3 * (1 + sign * e);
            const double x = (w.t1 - 0.3) / 0.3;
            assert_close(utw_path_shear_length(&w, 3.7),
                         3.7 / 0.3 * (1 - x / 2 + x * x / 3 - x * x * x / 4 + x * x * x * x / 5),
                         2e-15);
        }
    }
    for (double ratio = 2; ratio < 2e6; ratio *= 10) {
        w.t1 = 0.3 * ratio;
        assert_close(utw_path_shear_length(&w, 3.7), 3.7 * log(ratio) / (0.3 * ratio - 0.3), 1e-14);
        w.t1 = 0.3 / ratio;
        assert_close(utw_path_shear_length(&w, 3.7), 3.7 * log(ratio) / (0.3 - 0.3 / ratio), 1e-14);
    }
}

static void pieces_cover_the_wall(void **state)
{
    (void)state;
    utw_path walls[] = {arc(0, 6.2, 0.5), arc(1, -0.4, 0.5), arc(0, UTW_PI / 2, 0.5)};
    walls[0].t1 = 9e4 * walls[0].t0;
    walls[1].t1 = 1e-3 * walls[1].t0;
    for (int i = 0; i < 3; i++) {
        const utw_path *w = &walls[i];
        double at = 0;
        for (int k = 0; k < utw_path_pieces(w); k++) {
            double range[2];
            utw_path_point p, q;
            utw_path_piece(w, k, range);
            assert_true(range[0] == at || fabs(range[0] - at) < 1e-15 * w->length);
            assert_true(range[1] > range[0]);
            at = range[1];
            utw_path_at(w, range[0], &p);
            utw_path_at(w, range[1], &q);
            assert_true(fmax(p.t, q.t) <= 2 * fmin(p.t, q.t) * (1 + 1e-9));
            assert_true((range[1] - range[0]) * fabs(w->kappa) <= UTW_PI / 2 * (1 + 1e-9));
        }
        assert_true(at == w->length);
    }
    assert_int_equal(utw_path_pieces(&walls[2]), 2); /* 0.2 to 0.5 is a factor of 2.5 */
}

static void nearest_station(void **state)
{
    (void)state;
    const double a[2] = {1.2, -3.4}, b[2] = {5.7, 2.6};
    const utw_path walls[] = {utw_path_line(a, b, 0.3, 0.7), arc(0.3, 1.1, 0.5), arc(2, -4, 0.3)};
    for (int i = 0; i < 3; i++) {
        const utw_path *w = &walls[i];
        for (int k = 1; k < 10; k++) {
            utw_path_point p;
            double s;
            utw_path_at(w, w->length * k / 10, &p);
            const double off[2] = {p.x[0] - 0.11 * p.e[1], p.x[1] + 0.11 * p.e[0]};
            assert_close(utw_path_nearest(w, off, &s), 0.11, 1e-12);
            assert_close(s, w->length * k / 10, 1e-12);
        }
        utw_path_point p;
        double s;
        utw_path_at(w, 0, &p);
        const double before[2] = {p.x[0] - 0.2 * p.e[0], p.x[1] - 0.2 * p.e[1]};
        assert_close(utw_path_nearest(w, before, &s), 0.2, 1e-12);
        assert_close_scaled(s, 0.0, 1e-12, 1);
    }
}

static void frame_turns_and_shifts(void **state)
{
    (void)state;
    utw_path w = arc(0.3, 1.1, 0.5);
    const double origin[2] = {0.7, -1.1}, a = 0.3;
    utw_path_to_frame(&w, origin, cos(a), sin(a));
    assert_close(w.p[0], 2.385, 1e-13);
    assert_close_scaled(w.p[1], 0.0, 1e-13, 1);
    assert_close(w.e[1], 1.0, 1e-13);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(line_goes_from_end_to_end),
        cmocka_unit_test(arc_runs_on_its_circle),
        cmocka_unit_test(full_circle_runs_counter_clockwise),
        cmocka_unit_test(flat_arc_loses_nothing),
        cmocka_unit_test(points_that_are_no_arc),
        cmocka_unit_test(running_integrals),
        cmocka_unit_test(shear_length_of_any_taper),
        cmocka_unit_test(pieces_cover_the_wall),
        cmocka_unit_test(nearest_station),
        cmocka_unit_test(frame_turns_and_shifts),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
