/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "mesh/delaunay.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/support.h"

enum { MOST = 4000 };

/* Closed polygons, one after the other. */
typedef struct polygons {
    int n, start;
    double xy[MOST][2];
    int after[MOST];
} polygons;

static void point(polygons *p, double x, double y)
{
    assert_true(p->n < MOST);
    p->xy[p->n][0] = x;
    p->xy[p->n][1] = y;
    p->after[p->n] = p->n + 1;
    p->n++;
}

static void close_polygon(polygons *p)
{
    p->after[p->n - 1] = p->start;
    p->start = p->n;
}

static double area_of(const polygons *p)
{
    double sum = 0;
    for (int i = 0; i < p->n; i++) sum += 0.5 * utw_cross(p->xy[i], p->xy[p->after[i]]);
    return sum;
}

static utw_status make(const polygons *p, utw_delaunay *d, utw_error *err)
{
    return utw_delaunay_create(p->n, (const double(*)[2])p->xy, p->after, d, err);
}

/* Distance of q from the centre of the circle through the triangle, less its radius, over the
 * radius. */
static double outside(const double (*xy)[2], const int node[3], const double q[2])
{
    const double *a = xy[node[0]], u[2] = {xy[node[1]][0] - a[0], xy[node[1]][1] - a[1]},
                 v[2] = {xy[node[2]][0] - a[0], xy[node[2]][1] - a[1]};
    const double d = 2 * utw_cross(u, v), uu = utw_dot(u, u), vv = utw_dot(v, v);
    const double c[2] = {a[0] + (v[1] * uu - u[1] * vv) / d, a[1] + (u[0] * vv - v[0] * uu) / d};
    const double r = utw_distance(a, c);
    return (utw_distance(q, c) - r) / r;
}

/* n - 2 + 2 holes triangles, turned the right way, that fill the area, know their neighbours, have
 * every polygon side as a boundary and are Delaunay across every other side. */
static void check(const polygons *p, int holes)
{
    utw_error err;
    utw_delaunay d;
    double area = 0;
    int boundary = 0;
    assert_ok(make(p, &d, &err));
    assert_int_equal(d.n, p->n - 2 + 2 * holes);
    for (int t = 0; t < d.n; t++) {
        const utw_delaunay_triangle *tri = &d.tri[t];
        const double(*xy)[2] = (const double(*)[2])p->xy;
        const double turn = utw_turn(xy[tri->node[0]], xy[tri->node[1]], xy[tri->node[2]]);
        assert_true(turn > 0);
        area += 0.5 * turn;
        for (int k = 0; k < 3; k++) {
            const int a = tri->node[k], b = tri->node[(k + 1) % 3];
            if (tri->next[k] < 0) {
                assert_int_equal(p->after[a], b);
                boundary++;
                continue;
            }
            const utw_delaunay_triangle *other = &d.tri[tri->next[k]];
            int j = 0;
            while (j < 3 && other->next[j] != t) j++;
            assert_true(j < 3);
            assert_int_equal(other->node[j], b);
            assert_int_equal(other->node[(j + 1) % 3], a);
            assert_true(outside(xy, tri->node, xy[other->node[(j + 2) % 3]]) > -1e-5);
        }
    }
    assert_int_equal(boundary, p->n);
    assert_close(area, area_of(p), 1e-12);
    utw_delaunay_clear(&d);
    utw_delaunay_clear(&d);
}

static void rectangle(polygons *p, double x0, double y0, double x1, double y1, int n, int hole)
{
    for (int side = 0; side < 4; side++)
        for (int i = 0; i < n; i++) {
            const int s = hole ? 3 - side : side;
            const double u = hole ? 1 - (double)i / n : (double)i / n;
            const double x[4] = {x0 + u * (x1 - x0), x1, x1 - u * (x1 - x0), x0},
                         y[4] = {y0, y0 + u * (y1 - y0), y1, y1 - u * (y1 - y0)};
            point(p, x[s], y[s]);
        }
    close_polygon(p);
}

static void circle(polygons *p, double x, double y, double r, int n, int hole)
{
    for (int i = 0; i < n; i++) {
        const double a = (hole ? -2 : 2) * UTW_PI * i / n;
        point(p, x + r * cos(a), y + r * sin(a));
    }
    close_polygon(p);
}

/* Points in line, points on circles, points on a lattice: every test of the method is a tie. */
static void ties(void **state)
{
    (void)state;
    static polygons p;
    p = (polygons){.n = 0};
    rectangle(&p, -3.2, 1.1, 7.4, 3.6, 1, 0);
    check(&p, 0);
    p = (polygons){.n = 0};
    rectangle(&p, -3.2, 1.1, 7.4, 3.6, 64, 0);
    rectangle(&p, -1.2, 1.6, 1.4, 3.1, 32, 1);
    check(&p, 1);
    p = (polygons){.n = 0};
    circle(&p, 2.385, -1.7, 4.1, 128, 0);
    check(&p, 0);
    p = (polygons){.n = 0};
    circle(&p, 2.385, -1.7, 4.1, 500, 0);
    circle(&p, 2.385, -1.7, 4.0, 500, 1);
    check(&p, 1);
}

/* Long sides across many points: they are not Delaunay and have to be forced. */
static void forced_sides(void **state)
{
    (void)state;
    static polygons p;
    p = (polygons){.n = 0};
    point(&p, -100, -1);
    for (int i = -20; i <= 20; i++) point(&p, i, -0.9 + 0.0301 * abs(i));
    point(&p, 100, -1);
    point(&p, 100, 0.01);
    point(&p, -100, 0.02);
    close_polygon(&p);
    check(&p, 0);
    /* a comb seen through its gaps */
    p = (polygons){.n = 0};
    point(&p, 0, -1);
    point(&p, 100.5, -1);
    for (int i = 100; i >= 0; i--) {
        point(&p, i + 0.5, 30.2 + 0.1 * (i % 7));
        point(&p, i, 30.1 + 0.1 * (i % 5));
        if (i > 0) {
            point(&p, i, 0.1);
            point(&p, i - 0.5, 0.12);
        }
    }
    close_polygon(&p);
    check(&p, 0);
}

static double random_number(unsigned *seed)
{
    *seed = *seed * 1664525u + 1013904223u;
    return (*seed >> 8) / 16777216.0;
}

/* Stars with random radii and a random hole in their middle. */
static void random_stars(void **state)
{
    (void)state;
    static polygons p;
    unsigned seed = 7;
    for (int round = 0; round < 60; round++) {
        const int n = 5 + 13 * round, inner = 3 + round % 40;
        p = (polygons){.n = 0};
        for (int i = 0; i < n; i++) {
            const double a = 2 * UTW_PI * i / n, r = 1.1 + 9 * random_number(&seed);
            point(&p, r * cos(a), r * sin(a));
        }
        close_polygon(&p);
        for (int i = 0; i < inner; i++) {
            const double a = -2 * UTW_PI * i / inner, r = 0.3 + 0.2 * random_number(&seed);
            point(&p, r * cos(a), r * sin(a));
        }
        close_polygon(&p);
        check(&p, 1);
    }
}

/* A hair of 1e-6 of the size between two squares. */
static void hair(void **state)
{
    (void)state;
    static polygons p;
    p = (polygons){.n = 0};
    const double h = 0.5e-4;
    const double xy[][2] = {{-50, -10}, {-30, -10}, {-30, -h}, {30, -h}, {30, -10}, {50, -10},
                            {50, 10},   {30, 10},   {30, h},   {-30, h}, {-30, 10}, {-50, 10}};
    for (int i = 0; i < 12; i++) point(&p, xy[i][0], xy[i][1]);
    close_polygon(&p);
    check(&p, 0);
}

static void refusals(void **state)
{
    (void)state;
    utw_error err;
    utw_delaunay d;
    const int two[] = {1, 0}, three[] = {1, 2, 0}, four[] = {1, 2, 3, 0};
    const double line[][2] = {{0, 0}, {1, 0}, {2, 0}}, bow[][2] = {{0, 0}, {1, 1}, {1, 0}, {0, 1}},
                 close[][2] = {{0, 0}, {1, 0}, {1, 1e-10}, {0, 1}},
                 same[][2] = {{3, 3}, {3, 3}, {3, 3}}, nan[][2] = {{0, 0}, {1, 0}, {NAN, 1}};
    assert_int_equal(utw_delaunay_create(2, line, two, &d, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "2 points make no triangle");
    assert_int_equal(utw_delaunay_create(3, nan, three, &d, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_delaunay_create(3, same, three, &d, &err), UTW_E_MESH);
    assert_int_equal(utw_delaunay_create(4, close, four, &d, &err), UTW_E_MESH);
    assert_int_equal(utw_delaunay_create(4, bow, four, &d, &err), UTW_E_MESH);
    assert_int_equal(utw_delaunay_create(3, line, three, &d, &err), UTW_E_MESH);
}

static void memory_runs_out(void **state)
{
    (void)state;
    static polygons p;
    p = (polygons){.n = 0};
    circle(&p, 0, 0, 4.1, 60, 0);
    circle(&p, 0, 0, 4.0, 60, 1);
    utw_status st = UTW_E_NOMEM;
    for (long n = 1; st == UTW_E_NOMEM && n < 200; n++) {
        utw_delaunay d = {.n = 0};
        utw_error err;
        utw_memory_fail_at(n);
        st = make(&p, &d, &err);
        utw_memory_fail_at(0);
        if (st == UTW_OK) utw_delaunay_clear(&d);
    }
    assert_int_equal(st, UTW_OK);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(ties), balanced_test(forced_sides), balanced_test(random_stars),
        balanced_test(hair), balanced_test(refusals),     balanced_test(memory_runs_out),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
