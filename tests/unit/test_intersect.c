/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/vec2.h"
#include "outline/intersect.h"
#include "support/support.h"

/* Small repeatable random numbers in [0, 1) (a linear congruence; Knuth, TAOCP 2, 3.3.4, line 26).
 */
static double next(uint64_t *seed)
{
    *seed = *seed * 6364136223846793005u + 1442695040888963407u;
    return (double)(*seed >> 11) / 9007199254740992.0;
}

static utw_curve line(double x0, double y0, double x1, double y1)
{
    const double from[2] = {x0, y0}, to[2] = {x1, y1};
    return utw_curve_line(from, to);
}

static utw_curve arc(double x, double y, double r, double a0, double a1)
{
    const double o[2] = {x, y}, from[2] = {x + r * cos(a0), y + r * sin(a0)},
                 to[2] = {x + r * cos(a1), y + r * sin(a1)};
    return utw_curve_arc(o, r, a0, a1, from, to);
}

static utw_curve cubic(const double p[8])
{
    return utw_curve_cubic(p, p + 2, p + 4, p + 6);
}

static utw_curve any_curve(uint64_t *seed)
{
    double p[8];
    for (int i = 0; i < 8; i++) p[i] = next(seed);
    const double kind = next(seed);
    if (kind < 0.3) return line(p[0], p[1], p[2], p[3]);
    if (kind < 0.5) return cubic(p);
    utw_curve c = arc(p[0], p[1], 0.05 + 0.6 * p[2], 7 * p[3], 7 * p[3] + 12 * (p[4] - 0.5));
    if (kind < 0.75) return c;
    c.v[0] = 0.3 * (p[5] - 0.5); /* an ellipse on conjugate semi-axes */
    c.v[1] *= 0.1 + p[6];
    for (int k = 0; k < 2; k++) {
        c.from[k] = c.centre[k] + c.u[k] * cos(c.a0) + c.v[k] * sin(c.a0);
        c.to[k] = c.centre[k] + c.u[k] * cos(c.a1) + c.v[k] * sin(c.a1);
    }
    return c;
}

enum { STEPS = 400 };

/* Least distance of the sampled curves, and whether their chords cross. */
static double sampled(const utw_curve *a, const utw_curve *b, int *cross)
{
    static double p[STEPS + 1][2], q[STEPS + 1][2];
    double least = HUGE_VAL;
    *cross = 0;
    for (int i = 0; i <= STEPS; i++) {
        utw_curve_point(a, (double)i / STEPS, p[i]);
        utw_curve_point(b, (double)i / STEPS, q[i]);
    }
    for (int i = 0; i <= STEPS; i++)
        for (int j = 0; j <= STEPS; j++) {
            least = fmin(least, utw_distance(p[i], q[j]));
            if (i == STEPS || j == STEPS) continue;
            if (utw_turn(p[i], p[i + 1], q[j]) * utw_turn(p[i], p[i + 1], q[j + 1]) < 0 &&
                utw_turn(q[j], q[j + 1], p[i]) * utw_turn(q[j], q[j + 1], p[i + 1]) < 0)
                *cross = 1;
        }
    return least;
}

static void random_pairs_agree_with_sampling(void **state)
{
    (void)state;
    uint64_t seed = 20261201;
    int met = 0, clear = 0;
    for (int n = 0; n < 400; n++) {
        const utw_curve a = any_curve(&seed), b = any_curve(&seed);
        int cross;
        const double least = sampled(&a, &b, &cross);
        utw_meeting m;
        const int found = utw_curves_meet(&a, &b, 0, 1e-9, &m);
        assert_int_not_equal(found, 2);
        if (found) {
            double p[2], q[2];
            utw_curve_point(&a, m.s, p);
            utw_curve_point(&b, m.t, q);
            assert_true(utw_distance(p, q) < 3e-9);
            assert_true(utw_distance(p, m.at) < 3e-9);
            assert_true(least < 0.05);
            met++;
        } else {
            assert_false(cross);
            clear += least < 0.05; /* near, and still told apart */
        }
    }
    print_message("%d pairs met, %d passed close by\n", met, clear);
    assert_true(met > 50 && clear > 10);
}

static void order_of_the_curves_does_not_matter(void **state)
{
    (void)state;
    uint64_t seed = 77;
    for (int n = 0; n < 400; n++) {
        const utw_curve a = any_curve(&seed), b = any_curve(&seed), r = utw_curve_reversed(&a);
        const int found = utw_curves_meet(&a, &b, 0, 1e-9, NULL);
        assert_int_equal(utw_curves_meet(&b, &a, 0, 1e-9, NULL), found);
        assert_int_equal(utw_curves_meet(&r, &b, 0, 1e-9, NULL), found);
    }
}

static void touching_is_told_from_missing(void **state)
{
    (void)state;
    const utw_curve c = arc(1, 2, 3, 0.3, 2.8);
    for (int i = -1; i <= 1; i++) { /* a tangent at the top, 1e-6 above, 1e-6 below */
        const utw_curve tangent = line(-4, 5 + 1e-6 * i, 6, 5 + 1e-6 * i);
        assert_int_equal(utw_curves_meet(&c, &tangent, 0, 1e-9, NULL), i <= 0);
        const utw_curve outer = arc(1, 6 + 1e-6 * i, 1, 3.4, 6);
        assert_int_equal(utw_curves_meet(&c, &outer, 0, 1e-9, NULL), i <= 0);
    }
    utw_meeting m;
    const utw_curve above = line(-4, 5.25, 6, 5.25);
    assert_int_equal(utw_curves_meet(&c, &above, 0, 0.3, &m), 1);
    assert_int_equal(utw_curves_narrow(&c, &above, 0, 1e-9, &m), 0);
    assert_true(m.distance >= 0.25 - 1e-12 && m.distance < 0.3);
}

static void curves_that_coincide_meet(void **state)
{
    (void)state;
    const utw_curve whole = arc(1, 2, 3, 0.3, 2.8), part = arc(1, 2, 3, 2.1, 1.1);
    assert_int_equal(utw_curves_meet(&whole, &part, 0, 1e-9, NULL), 1);
    const double p[8] = {0, 0, 3, 2, 1, 4, 5, 1};
    const utw_curve c = cubic(p), piece = utw_curve_piece(&c, 0.6, 0.2);
    assert_int_equal(utw_curves_meet(&c, &piece, 0, 1e-9, NULL), 1);
    assert_int_equal(utw_curves_meet(&c, &c, UTW_SHARED(0, 0) | UTW_SHARED(1, 1), 1e-9, NULL), 1);
}

static void neighbours_share_their_end_only(void **state)
{
    (void)state;
    const utw_curve flat = line(0, 0, 5, 0);
    const int shared = UTW_SHARED(1, 0);
    for (double turn = -3.1; turn <= 3.1; turn += 0.1) {
        const utw_curve next_line = line(5, 0, 5 + 3 * cos(turn), 3 * sin(turn));
        assert_int_equal(utw_curves_meet(&flat, &next_line, shared, 1e-9, NULL), 0);
        /* an arc that leaves in direction `turn` and bends away from the line */
        const double side = turn < 0 ? 1 : -1, r = 1.3;
        const double o[2] = {5 - side * r * sin(turn), side * r * cos(turn)};
        const double a0 = atan2(-o[1], 5 - o[0]);
        const utw_curve bend = arc(o[0], o[1], r, a0, a0 + side * 0.7);
        assert_int_equal(utw_curves_meet(&flat, &bend, shared, 1e-9, NULL), 0);
    }
    const utw_curve back = line(5, 0, 2, 0);
    utw_meeting m;
    assert_int_equal(utw_curves_meet(&flat, &back, shared, 1e-9, &m), 1);
    assert_close(m.at[0], 2, 1e-15);
    /* a full turn of an arc from the end of the line runs through the line again */
    const utw_curve round = arc(4, 1, sqrt(2), -UTW_PI / 4, -UTW_PI / 4 + 5.5);
    assert_int_equal(utw_curves_meet(&flat, &round, shared, 1e-9, &m), 1);
    assert_close(m.at[0], 3, 1e-9);
    assert_close_scaled(m.at[1], 0, 1e-9, 1);
    const utw_curve short_round = arc(4, 1, sqrt(2), -UTW_PI / 4, -UTW_PI / 4 + 4.5);
    assert_int_equal(utw_curves_meet(&flat, &short_round, shared, 1e-9, NULL), 0);
    /* tangent and bending back over the line's start: a cusp at the common end */
    const utw_curve hook = arc(5, 2, 2, -UTW_PI / 2, -UTW_PI / 2 - 1);
    assert_int_equal(utw_curves_meet(&flat, &hook, shared, 1e-9, NULL), 1);
}

static void two_curves_with_both_ends_in_common(void **state)
{
    (void)state;
    const int both = UTW_SHARED(1, 0) | UTW_SHARED(0, 1);
    const utw_curve upper = arc(0, 0, 2, 0, UTW_PI);
    utw_curve lower = arc(0, 0, 2, UTW_PI, 2 * UTW_PI);
    assert_int_equal(utw_curves_meet(&upper, &lower, both, 1e-9, NULL), 0);
    const utw_curve chord = line(-2, 0, 2, 0);
    assert_int_equal(utw_curves_meet(&upper, &chord, both, 1e-9, NULL), 0);
    const double over[8] = {-2, 0, -1, 4.5, 1, 4.5, 2, 0}; /* rises above the half circle */
    const utw_curve wave = cubic(over);
    assert_int_equal(utw_curves_meet(&upper, &wave, both, 1e-9, NULL), 1);
}

static void a_cubic_meets_itself(void **state)
{
    (void)state;
    double s, t, p[2], q[2];
    const double loop[8] = {0, 0, 30, 20, -20, 21, 10, 1}, plain[8] = {0, 0, 3, 2, 1, 4, 5, 1},
                 cusp[8] = {0, 0, 10, 20, 0, 20, 10, 0}, closed[8] = {0, 0, 4, -1, 4, 5, 0, 0},
                 flat_back[8] = {0, 0, 9, 9, -4, -4, 5, 5}, flat[8] = {0, 0, 1, 1, 2, 2, 5, 5},
                 stuck[8] = {0, 0, 3, 2, 5, 1, 5, 1}, quadratic[8] = {0, 0, 2, 4, 4, 4, 6, 0};
    utw_curve c = cubic(loop);
    assert_int_equal(utw_curve_meets_itself(&c, &s, &t), UTW_SELF_CROSSES);
    assert_true(s < t);
    utw_curve_point(&c, s, p);
    utw_curve_point(&c, t, q);
    assert_true(utw_distance(p, q) < 1e-12);
    const utw_curve open = utw_curve_piece(&c, s + 1e-6, 1);
    assert_int_equal(utw_curve_meets_itself(&open, &s, &t), UTW_SELF_NONE);
    c = cubic(plain);
    assert_int_equal(utw_curve_meets_itself(&c, &s, &t), UTW_SELF_NONE);
    c = cubic(cusp);
    assert_int_equal(utw_curve_meets_itself(&c, &s, &t), UTW_SELF_CUSP);
    assert_close(s, 0.5, 1e-12);
    c = cubic(closed);
    assert_int_equal(utw_curve_meets_itself(&c, &s, &t), UTW_SELF_NONE);
    c = cubic(flat_back);
    assert_int_equal(utw_curve_meets_itself(&c, &s, &t), UTW_SELF_CUSP);
    c = cubic(flat);
    assert_int_equal(utw_curve_meets_itself(&c, &s, &t), UTW_SELF_NONE);
    c = cubic(quadratic);
    assert_int_equal(utw_curve_meets_itself(&c, &s, &t), UTW_SELF_NONE);
    c = cubic(stuck);
    assert_int_equal(utw_curve_meets_itself(&c, &s, &t), UTW_SELF_NO_START);
    assert_true(s == 1);
}

static void random_cubics_agree_with_sampling(void **state)
{
    (void)state;
    uint64_t seed = 5;
    int crossing = 0;
    for (int n = 0; n < 2000; n++) {
        double v[8], s, t;
        for (int i = 0; i < 8; i++) v[i] = next(&seed);
        const utw_curve c = cubic(v);
        const utw_self what = utw_curve_meets_itself(&c, &s, &t);
        enum { M = 100 };
        double p[M + 1][2];
        int cross = 0;
        for (int i = 0; i <= M; i++) utw_curve_point(&c, (double)i / M, p[i]);
        for (int i = 0; i < M; i++)
            for (int j = i + 2; j < M; j++)
                if (utw_turn(p[i], p[i + 1], p[j]) * utw_turn(p[i], p[i + 1], p[j + 1]) < 0 &&
                    utw_turn(p[j], p[j + 1], p[i]) * utw_turn(p[j], p[j + 1], p[i + 1]) < 0)
                    cross = 1;
        if (cross) assert_int_equal(what, UTW_SELF_CROSSES);
        if (what == UTW_SELF_CROSSES && t - s > 0.1 && s > 0.02 && t < 0.98) assert_true(cross);
        crossing += cross;
    }
    assert_true(crossing > 20);
}

static void nearest_point_is_the_nearest(void **state)
{
    (void)state;
    uint64_t seed = 9;
    for (int n = 0; n < 300; n++) {
        const utw_curve c = any_curve(&seed);
        const double x[2] = {2 * next(&seed) - 0.5, 2 * next(&seed) - 0.5};
        double least = HUGE_VAL, t, p[2];
        for (int i = 0; i <= 4000; i++) {
            utw_curve_point(&c, i / 4000.0, p);
            least = fmin(least, utw_distance(p, x));
        }
        const double d = utw_curve_nearest(&c, x, 10, &t);
        utw_curve_point(&c, t, p);
        assert_true(t >= 0 && t <= 1);
        assert_close_scaled(utw_distance(p, x), d, 1e-14, 1);
        assert_true(d <= least + 1e-14 && d >= least - 2e-3);
        assert_true(utw_curve_nearest(&c, x, 0.9 * d, NULL) == HUGE_VAL);
        assert_close(utw_curve_nearest(&c, x, 1.1 * d, NULL), d, 1e-12);
        /* a point on the curve is found again */
        double at[2], u;
        utw_curve_point(&c, 0.37, at);
        assert_true(utw_curve_nearest(&c, at, 1e-9, &u) < 1e-14);
    }
}

static void search_gives_up_in_time(void **state)
{
    (void)state;
    /* concentric arcs just farther apart than the tolerance: nothing can be dropped early */
    const utw_curve a = arc(0, 0, 1, 0, 3), b = arc(0, 0, 1 + 1.0001e-9, 3, 0);
    utw_meeting m = {0, 0, {0, 0}, 0};
    const int found = utw_curves_meet(&a, &b, 0, 1e-9, &m);
    assert_true(found == 2 || found == 1); /* either way refused, and quickly */
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(random_pairs_agree_with_sampling),
        balanced_test(order_of_the_curves_does_not_matter),
        balanced_test(touching_is_told_from_missing),
        balanced_test(curves_that_coincide_meet),
        balanced_test(neighbours_share_their_end_only),
        balanced_test(two_curves_with_both_ends_in_common),
        balanced_test(a_cubic_meets_itself),
        balanced_test(random_cubics_agree_with_sampling),
        balanced_test(nearest_point_is_the_nearest),
        balanced_test(search_gives_up_in_time),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
