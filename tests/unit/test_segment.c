/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "thinwall/segment.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/support.h"

enum { MOST = 400 };

typedef struct row {
    utw_station s[MOST];
    int n;
} row;

/* Stations along a path, `step` apart, between the border curves left and right. */
static void add(row *r, const utw_path *path, double step, int left, int right, int good)
{
    const int n = (int)ceil(path->length / step);
    for (int i = 0; i <= n; i++) {
        utw_path_point at;
        utw_path_at(path, path->length * i / n, &at);
        assert_true(r->n < MOST);
        r->s[r->n++] = (utw_station){.x = {at.x[0], at.x[1]},
                                     .e = {at.e[0], at.e[1]},
                                     .t = at.t,
                                     .left = left,
                                     .right = right,
                                     .good = good};
    }
}

static utw_piece *pieces_of(const row *r, int expected)
{
    utw_error err;
    utw_piece *piece = NULL;
    int n = 0;
    assert_ok(utw_segment(r->s, r->n, &piece, &n, &err));
    assert_int_equal(n, expected);
    return piece;
}

/* Two plates with a fillet before and behind each, in which the thickness changes: the plates alone
 * are walls, and they end where their faces do, whichever way the row runs. */
static void plates_between_fillets(void **state)
{
    (void)state;
    for (int way = 0; way < 2; way++) {
        static row r, turned;
        const double x[] = {0, 2, 30, 32, 34, 60, 62};
        const double t[][2] = {{4, 3}, {3, 3}, {3, 4}, {4, 3}, {3, 3}, {3, 4}};
        r.n = 0;
        for (int k = 0; k < 6; k++) {
            const double p[2] = {x[k], 0}, q[2] = {x[k + 1], 0};
            const utw_path path = utw_path_line(p, q, t[k][0], t[k][1]);
            add(&r, &path, k % 3 == 1 ? 1.0 : 0.5, k, 100 + k, 1);
        }
        turned = r;
        for (int i = 0; i < r.n && way == 1; i++) {
            turned.s[i] = r.s[r.n - 1 - i];
            turned.s[i].e[0] = -1;
        }
        utw_piece *piece = pieces_of(&turned, 2);
        for (int i = 0; i < 2; i++) {
            const utw_path *path = &piece[i].path;
            const int right = (i == 1) == (way == 0);
            assert_close(path->length, right ? 26 : 28, 1e-9);
            assert_close(path->t0, 3, 1e-9);
            assert_close(path->t1, 3, 1e-9);
        }
        utw_free(piece);
    }
}

/* A line, an arc and a line that go on smoothly between their own faces. */
static void line_arc_line(void **state)
{
    (void)state;
    static row r;
    const double a[2] = {-20, -6}, b[2] = {0, -6},
                 m[2] = {6 * sin(0.25 * UTW_PI), -6 * cos(0.25 * UTW_PI)}, c[2] = {6, 0},
                 d[2] = {6, 15};
    utw_path path = utw_path_line(a, b, 2, 2);
    r.n = 0;
    add(&r, &path, 0.7, 1, 11, 1);
    assert_int_equal(utw_path_arc(b, m, c, 2, 2, &path), UTW_ARC_GOOD);
    add(&r, &path, 0.4, 2, 12, 1);
    path = utw_path_line(c, d, 2, 2);
    add(&r, &path, 0.7, 3, 13, 1);
    utw_piece *piece = pieces_of(&r, 3);
    assert_close(piece[0].path.length, 20, 1e-9);
    assert_close(piece[1].path.length, 3 * UTW_PI, 1e-9);
    assert_close(piece[1].path.kappa, 1.0 / 6, 1e-9);
    assert_close(piece[2].path.length, 15, 1e-9);
    utw_free(piece);
}

static void nothing_good(void **state)
{
    (void)state;
    static row r;
    const double a[2] = {0, 0}, b[2] = {9, 0};
    const utw_path path = utw_path_line(a, b, 2, 2);
    r.n = 0;
    utw_piece *piece = pieces_of(&r, 0);
    utw_free(piece);
    add(&r, &path, 1, 0, 1, 0);
    piece = pieces_of(&r, 0);
    utw_free(piece);
    assert_int_equal(utw_ring_start(r.s, r.n), 0);
    r.s[4].good = r.s[5].good = 1;
    assert_int_equal(utw_ring_start(r.s, r.n), 4);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(plates_between_fillets),
                                       balanced_test(line_arc_line), balanced_test(nothing_good)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
