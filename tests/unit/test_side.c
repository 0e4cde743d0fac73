/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/side.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/support.h"

static utw_path arc_path(double t0, double t1)
{
    const double from[2] = {5, 1}, mid[2] = {1, 5}, to[2] = {-3, 1}; /* centre (1, 1), radius 4 */
    utw_path path = {.length = 0};
    assert_int_equal(utw_path_arc(from, mid, to, t0, t1, &path), UTW_ARC_GOOD);
    return path;
}

static void derivatives_match_differences(void **state)
{
    (void)state;
    const double a[2] = {1, 2}, b[2] = {7, 4};
    const utw_path paths[] = {utw_path_line(a, b, 0.5, 0.9), arc_path(0.5, 0.9),
                              arc_path(0.7, 0.7)};
    for (int i = 0; i < 3; i++)
        for (int side = -1; side <= 1; side += 2) {
            const utw_side s = {&paths[i], side};
            for (double at = -0.5; at < paths[i].length + 0.5; at += 0.37) {
                double p[2], q[2], d[2], e[2], f[2], d2[2], unused[2];
                const double h = 1e-5;
                utw_side_point(&s, at, p, d, d2);
                utw_side_point(&s, at - h, p, e, unused);
                utw_side_point(&s, at + h, q, f, unused);
                for (int k = 0; k < 2; k++) {
                    assert_close_scaled((q[k] - p[k]) / (2 * h), d[k], 1e-9, 1);
                    assert_close_scaled((f[k] - e[k]) / (2 * h), d2[k], 1e-9, 1);
                }
            }
        }
}

static void the_left_side_is_left(void **state)
{
    (void)state;
    const utw_path path = arc_path(1, 1); /* counter-clockwise: left is inside */
    const utw_side left = {&path, 1}, right = {&path, -1};
    double p[2], d1[2], d2[2];
    const double centre[2] = {1, 1};
    utw_side_point(&left, 3, p, d1, d2);
    assert_close(utw_distance(p, centre), 3.5, 1e-14);
    utw_side_point(&right, 3, p, d1, d2);
    assert_close(utw_distance(p, centre), 4.5, 1e-14);
}

static void sides_cross_where_they_do(void **state)
{
    (void)state;
    const double o[2] = {0, 0}, x[2] = {10, 0}, y[2] = {0, 10};
    const utw_path level = utw_path_line(o, x, 2, 2), upright = utw_path_line(o, y, 3, 3),
                   arc = arc_path(1, 1);
    const utw_side top = {&level, 1}, right = {&upright, -1}, outer = {&arc, -1};
    double s[2] = {0, 0}, p[2];
    assert_true(utw_side_cross(&top, &right, 10, s, p));
    assert_true(p[0] == 1.5 && p[1] == 1 && s[0] == 1.5 && s[1] == 1);
    /* y = 1 and the outer circle, radius 4.5 about (1, 1), meet at (5.5, 1), where the arc starts
     */
    s[0] = 5;
    s[1] = 0.1;
    assert_true(utw_side_cross(&top, &outer, 10, s, p));
    assert_close(p[0], 5.5, 1e-14);
    assert_close_scaled(s[1], 0, 1e-13, 1);
    s[0] = 5;
    s[1] = 0.1;
    assert_false(utw_side_cross(&top, &outer, 0.1, s, p)); /* out of reach */
    s[0] = s[1] = 0;
    const utw_side bottom = {&level, -1};
    assert_false(utw_side_cross(&top, &bottom, 10, s, p)); /* parallel */
    const double node[2] = {1, 1}, up[2] = {0, 1};
    s[0] = arc.length / 2 + 0.2;
    assert_true(utw_side_cross_line(&outer, node, up, 10, s, p));
    assert_close(p[1], 5.5, 1e-14);
    assert_close(s[0], arc.length / 2, 1e-13);
    const double along[2] = {1, 0};
    s[0] = 0;
    assert_false(utw_side_cross_line(&top, node, along, 10, s, p));
}

static void pieces_follow_the_side(void **state)
{
    (void)state;
    const utw_path taper = arc_path(0.5, 1.5), plain = arc_path(1, 1);
    for (int i = 0; i < 4; i++) {
        const utw_side s = {i & 1 ? &taper : &plain, i & 2 ? 1 : -1};
        utw_error err;
        utw_fit fit = {.n = 0};
        double from[2], to[2], d1[2], d2[2];
        utw_side_point(&s, 9, from, d1, d2);
        utw_side_point(&s, 2, to, d1, d2);
        assert_ok(utw_side_curves(&s, 9, 2, from, to, 1e-8, &fit, &err));
        assert_int_equal(fit.curve[0].kind, i & 1 ? UTW_CUBIC : UTW_ARC);
        double p[2], mid[2];
        utw_curve_point(&fit.curve[0], 0.5, p);
        if (fit.curve[0].kind == UTW_ARC) {
            assert_int_equal(fit.n, 1);
            utw_side_point(&s, 5.5, mid, d1, d2);
            assert_true(utw_distance(p, mid) < 1e-14);
        } else {
            const double r[2] = {p[0] - 1, p[1] - 1};
            const double half = (0.5 + atan2(r[1], r[0]) / UTW_PI) / 2;
            assert_close_scaled(utw_norm(r), 4 - s.side * half, 1e-8, 1);
        }
        utw_free(fit.curve);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(derivatives_match_differences),
        balanced_test(the_left_side_is_left),
        balanced_test(sides_cross_where_they_do),
        balanced_test(pieces_follow_the_side),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
