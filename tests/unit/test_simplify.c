/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "draw/simplify.h"

#include "base/vec2.h"
#include "support/support.h"

/* Greatest distance of the points of p[n] from the chain q[m] (closed: back to its start). */
static double apart(int n, double (*p)[2], int m, double (*q)[2], int closed)
{
    double worst = 0;
    for (int i = 0; i < n; i++) {
        double least = UTW_INFINITY;
        for (int j = 0; j + 1 < m + closed; j++) {
            const double *a = q[j], *b = q[(j + 1) % m];
            const double d[2] = {b[0] - a[0], b[1] - a[1]}, e[2] = {p[i][0] - a[0], p[i][1] - a[1]};
            const double t = fmin(fmax(utw_dot(d, e) / utw_dot(d, d), 0), 1);
            const double foot[2] = {a[0] + t * d[0], a[1] + t * d[1]};
            least = fmin(least, utw_distance(foot, p[i]));
        }
        worst = fmax(worst, least);
    }
    return worst;
}

enum { N = 500 };

static void nothing_moves_by_more_than_asked(void **state)
{
    (void)state;
    static double p[N][2], q[N][2];
    for (int closed = 0; closed <= 1; closed++)
        for (double tolerance = 1e-4; tolerance < 1; tolerance *= 3) {
            for (int i = 0; i < N; i++) {
                const double a = 2 * UTW_PI * i / N;
                p[i][0] = (30 + 3 * sin(5 * a)) * cos(a);
                p[i][1] = (20 + 2 * cos(3 * a)) * sin(a);
            }
            memcpy(q, p, sizeof q);
            const int m = utw_simplify(N, q, closed, tolerance);
            assert_true(m >= 3 && m <= N);
            if (tolerance > 0.01) assert_true(m < N / 2);
            assert_true(apart(N, p, m, q, closed) <= tolerance * 1.0001);
            assert_memory_equal(q[0], p[0], sizeof q[0]);
            if (!closed) assert_memory_equal(q[m - 1], p[N - 1], sizeof q[0]);
        }
}

static void straight_lines_keep_their_ends(void **state)
{
    (void)state;
    static double p[N][2];
    for (int i = 0; i < N; i++) {
        p[i][0] = 0.1 * i;
        p[i][1] = 7 - 0.2 * i;
    }
    assert_int_equal(utw_simplify(N, p, 0, 1e-6), 2);
    assert_close(p[1][0], 0.1 * (N - 1), 1e-14);
}

static void little_is_left_alone(void **state)
{
    (void)state;
    double p[4][2] = {{1, 2}, {1, 2}, {1, 2}, {1, 2}};
    assert_int_equal(utw_simplify(2, p, 0, 1), 2);
    assert_int_equal(utw_simplify(1, p, 1, 1), 1);
    assert_int_equal(utw_simplify(0, p, 1, 1), 0);
    assert_int_equal(utw_simplify(4, p, 1, 0.1), 4);
    assert_int_equal(utw_simplify(4, p, 0, 0), 4);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(nothing_moves_by_more_than_asked),
        cmocka_unit_test(straight_lines_keep_their_ends),
        cmocka_unit_test(little_is_left_alone),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
