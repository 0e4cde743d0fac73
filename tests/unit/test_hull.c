/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/vec2.h"
#include "outline/hull.h"
#include "support/support.h"

static void sample(utw_curve c[4])
{
    const double o[2] = {0.3, -0.2}, from[2] = {2.3, -0.2}, b[2] = {1, 3}, c1[2] = {4, -3},
                 c2[2] = {-3, 5};
    c[0] = utw_curve_line(from, b);
    c[1] = utw_curve_arc(o, 2, 0, 2 * UTW_PI, from, from);
    c[2] = utw_curve_cubic(from, c1, c2, b);
    c[3] = c[1];
    c[3].u[0] = 1.1, c[3].v[0] = -0.4; /* an ellipse */
    c[3].from[0] = c[3].to[0] = o[0] + 1.1;
}

/* No point of a piece is outside its hull along any direction, and hulls shrink as pieces do. */
static void hull_holds_its_piece(void **state)
{
    (void)state;
    utw_curve c[4];
    sample(c);
    for (int i = 0; i < 4; i++)
        for (double span = 1; span > 1e-3; span /= 2)
            for (double t0 = 0; t0 <= 1 - span; t0 += 0.37 * span) {
                const utw_hull h = utw_hull_of(&c[i], t0, t0 + span);
                for (double angle = 0; angle < 6.3; angle += 0.3) {
                    const double d[2] = {cos(angle), sin(angle)};
                    double reach = -HUGE_VAL;
                    for (int q = 0; q < h.n; q++) reach = fmax(reach, utw_dot(d, h.p[q]));
                    for (int s = 0; s <= 20; s++) {
                        double p[2];
                        utw_curve_point(&c[i], t0 + span * s / 20, p);
                        assert_true(utw_dot(d, p) <= reach + 1e-14);
                        assert_true(utw_hull_distance(&h, p) < 1e-14);
                    }
                }
                assert_true(h.width < 25 * span * span); /* and it shrinks with it */
            }
}

static void gaps_are_lower_bounds(void **state)
{
    (void)state;
    utw_curve c[4];
    sample(c);
    for (int i = 0; i < 4; i++)
        for (int j = 0; j < 4; j++)
            for (double s = 0; s < 1; s += 0.125)
                for (double t = 0; t < 1; t += 0.125) {
                    const utw_hull a = utw_hull_of(&c[i], s, s + 0.125),
                                   b = utw_hull_of(&c[j], t, t + 0.125);
                    double p[2], q[2], least = HUGE_VAL;
                    for (int m = 0; m <= 16; m++)
                        for (int n = 0; n <= 16; n++) {
                            utw_curve_point(&c[i], s + 0.125 * m / 16, p);
                            utw_curve_point(&c[j], t + 0.125 * n / 16, q);
                            least = fmin(least, utw_distance(p, q));
                        }
                    assert_true(utw_hull_gap(&a, &b) <= least + 1e-14);
                    assert_true(utw_hull_distance(&a, q) <= utw_distance(q, a.end[0]) + 1e-14);
                }
}

static void cones_part_neighbours(void **state)
{
    (void)state;
    const double o[2] = {1, 2}, a[2] = {3, 2};
    const utw_curve first = utw_curve_line(a, o);
    const utw_hull h = utw_hull_of(&first, 0, 1);
    for (double angle = -3; angle <= 3.01; angle += 0.25) {
        const double to[2] = {1 + cos(angle), 2 + sin(angle)};
        const utw_curve second = utw_curve_line(o, to);
        const utw_hull g = utw_hull_of(&second, 0, 1);
        assert_int_equal(utw_hull_cones_apart(&h, 1, &g, 0), fabs(angle) > 1e-6);
        assert_int_equal(utw_hull_cones_apart(&g, 0, &h, 1), fabs(angle) > 1e-6);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(hull_holds_its_piece),
        cmocka_unit_test(gaps_are_lower_bounds),
        cmocka_unit_test(cones_part_neighbours),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
