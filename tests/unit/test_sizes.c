/* SPDX-License-Identifier: GPL-3.0-or-later
 * The size inside against the least over all points, written out. */
#include "base/vec2.h"
#include "mesh/sizes.h"
#include "support/support.h"

enum { N = 400 };
#define GROWTH 0.83

/* A row of points along a curve, their sizes between 0.001 and 1. */
static void points(double (*xy)[2], double *size)
{
    for (int i = 0; i < N; i++) {
        const double t = 6.2 * i / N;
        xy[i][0] = (3 + sin(5 * t)) * cos(t);
        xy[i][1] = (2 + cos(3 * t)) * sin(t);
        size[i] = pow(10, -1.5 + 1.5 * sin(7.3 * i));
    }
}

static void least_over_all_points(void **state)
{
    (void)state;
    utw_error err;
    utw_sizes *sizes = NULL;
    double xy[N][2], size[N];
    points(xy, size);
    assert_ok(utw_sizes_create(N, (const double(*)[2])xy, size, GROWTH, &sizes, &err));
    for (double x = -5; x < 5; x += 0.37)
        for (double y = -4; y < 4; y += 0.29) {
            double expected = UTW_INFINITY;
            for (int i = 0; i < N; i++)
                expected = fmin(expected, size[i] + GROWTH * hypot(x - xy[i][0], y - xy[i][1]));
            assert_close(utw_sizes_at(sizes, (double[2]){x, y}), expected, 1e-15);
        }
    utw_sizes_free(sizes);
}

static void one_point_is_enough(void **state)
{
    (void)state;
    utw_error err;
    utw_sizes *sizes = NULL;
    const double xy[1][2] = {{1.5, -2}}, size[1] = {0.37};
    assert_ok(utw_sizes_create(1, xy, size, GROWTH, &sizes, &err));
    assert_close(utw_sizes_at(sizes, (double[2]){4.5, 2}), 0.37 + 5 * GROWTH, 1e-15);
    utw_sizes_free(sizes);
    utw_sizes_free(NULL);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(least_over_all_points),
        balanced_test(one_point_is_enough),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
