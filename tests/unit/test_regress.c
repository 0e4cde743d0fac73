/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "thinwall/regress.h"

#include "base/vec2.h"
#include "support/support.h"

enum { N = 23 };

/* Stations on a path, at uneven distances, with its thickness. */
static void along(const utw_path *path, utw_station s[N])
{
    for (int i = 0; i < N; i++) {
        utw_path_point at;
        const double u = (double)i / (N - 1);
        utw_path_at(path, path->length * u * (0.6 + 0.4 * u), &at);
        s[i] =
            (utw_station){.x = {at.x[0], at.x[1]}, .e = {at.e[0], at.e[1]}, .t = at.t, .good = 1};
    }
}

static void same(const utw_path *a, const utw_path *b)
{
    assert_close(b->length, a->length, 1e-10);
    assert_close_scaled(b->kappa, a->kappa, 1e-9, 0.01);
    assert_close(b->t0, a->t0, 1e-10);
    assert_close(b->t1, a->t1, 1e-10);
    for (int k = 0; k < 2; k++) {
        assert_close_scaled(b->p[k], a->p[k], 1e-10, 10);
        assert_close_scaled(b->e[k], a->e[k], 1e-10, 1);
    }
}

static void lines_and_arcs_are_found_again(void **state)
{
    (void)state;
    utw_station s[N];
    utw_wall_fit fit;
    const double a[2] = {1.2, -3.4}, b[2] = {-5.7, 2.6}, m[2] = {-6, -4};
    utw_path path = utw_path_line(a, b, 0.3, 0.7);
    along(&path, s);
    assert_int_equal(utw_regress_line(s, N, &fit), 1);
    same(&path, &fit.path);
    assert_true(fit.off < 1e-12 && fit.rough < 1e-12);
    assert_int_equal(utw_regress_arc(s, N, &fit) && fit.off > 1e-6, 0);
    for (int way = 0; way < 2; way++) {
        assert_int_equal(utw_path_arc(way ? b : a, m, way ? a : b, 0.3, 0.5, &path), UTW_ARC_GOOD);
        along(&path, s);
        assert_int_equal(utw_regress_arc(s, N, &fit), 1);
        same(&path, &fit.path);
        assert_true(fit.off < 1e-11 && fit.rough < 1e-11);
        assert_int_equal(utw_regress_line(s, N, &fit), 1);
        assert_true(fit.off > 0.5);
    }
    for (int i = 0; i < N; i++) s[i] = s[0];
    assert_int_equal(utw_regress_line(s, N, &fit), 0);
    assert_int_equal(utw_regress_arc(s, N, &fit), 0);
}

static void feet_and_offsets(void **state)
{
    (void)state;
    const double a[2] = {3, 0}, m[2] = {0, 3}, b[2] = {-3, 0}, p[2] = {0, 5}, q[2] = {0, 2},
                 r[2] = {1, 0.5};
    utw_path path = utw_path_line(b, a, 1, 1);
    assert_close(utw_path_foot(&path, r, 0), 4, 1e-14);
    assert_close(utw_path_offset(&path, r), 0.5, 1e-14);
    assert_int_equal(utw_path_arc(a, m, b, 1, 1, &path), UTW_ARC_GOOD);
    assert_close(utw_path_foot(&path, p, 0), 1.5 * UTW_PI, 1e-14);
    /* once more around, when that is nearer */
    assert_close(utw_path_foot(&path, p, 6 * UTW_PI), 7.5 * UTW_PI, 1e-14);
    assert_close(utw_path_offset(&path, p), -2, 1e-14); /* outside is on the right of it */
    assert_close(utw_path_offset(&path, q), 1, 1e-14);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(lines_and_arcs_are_found_again),
                                       balanced_test(feet_and_offsets)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
