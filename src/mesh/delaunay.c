/* SPDX-License-Identifier: GPL-3.0-or-later
 * Constrained Delaunay triangulation in exact integers. */
#include "mesh/delaunay.h"

#include <stdint.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

/* Points lie in [-2^27, 2^27]^2 and the three outer ones within 2^29, so differences are below 2^30
 * and the in-circle determinant below 2^125: it fits into 128 bits. */
#define GRID  134217728.0
#define OUTER 536870912

/* gcc and clang have it on every 64-bit machine; it is no part of C11 */
__extension__ typedef __int128 wide;

typedef struct site {
    int64_t x, y;
} site;

typedef struct face {
    int node[3], next[3];
    unsigned char fixed[3]; /* side k is a side of a polygon */
} face;

typedef struct side {
    int face, k;
} side;

typedef struct maker {
    int n_point, n_face;
    site *p;    /* [n_point + 3], the outer ones last */
    face *face; /* [2 n_point + 8] */
    int *at;    /* [n_point + 3] a face at each point */
    int last;   /* where the next walk starts */
    side *stack;
    size_t n_stack, capacity;
    utw_error *err;
} maker;

static int next3(int k)
{
    return k == 2 ? 0 : k + 1;
}

static int before3(int k)
{
    return k == 0 ? 2 : k - 1;
}

static int64_t turn(const site *a, const site *b, const site *c)
{
    return (b->x - a->x) * (c->y - a->y) - (b->y - a->y) * (c->x - a->x);
}

/* Positive when d lies within the circle through a, b, c, which run counter-clockwise; for three
 * points in line, b or c between the others, when d lies on the right of a b. */
static int in_circle(const site *a, const site *b, const site *c, const site *d)
{
    const int64_t ax = a->x - d->x, ay = a->y - d->y, bx = b->x - d->x, by = b->y - d->y,
                  cx = c->x - d->x, cy = c->y - d->y;
    const wide det = (wide)(ax * ax + ay * ay) * (bx * cy - by * cx) +
                     (wide)(bx * bx + by * by) * (cx * ay - cy * ax) +
                     (wide)(cx * cx + cy * cy) * (ax * by - ay * bx);
    return det > 0 ? 1 : det < 0 ? -1 : 0;
}

static int side_of(const face *f, int neighbour)
{
    return f->next[0] == neighbour ? 0 : f->next[1] == neighbour ? 1 : 2;
}

static utw_status push(maker *m, int f, int k)
{
    void *array = m->stack;
    if (utw_grow(&array, &m->capacity, m->n_stack + 1, sizeof *m->stack) != 0)
        return utw_fail(m->err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    m->stack = array;
    m->stack[m->n_stack++] = (side){f, k};
    return UTW_OK;
}

static void join(maker *m, int f, int k, int g, int old, int fixed)
{
    m->face[f].next[k] = g;
    m->face[f].fixed[k] = (unsigned char)fixed;
    if (g >= 0) m->face[g].next[side_of(&m->face[g], old)] = f;
}

/* Replace side k of face f = (a, b, c), a b, by the other diagonal of its two faces. Afterwards f =
 * (c, a, d) and the neighbour g = (d, b, c); side 2 of f and side 2 of g is the new one. */
static void flip(maker *m, int f, int k)
{
    face *F = &m->face[f];
    const int g = F->next[k];
    face *G = &m->face[g];
    const int j = side_of(G, f), a = F->node[k], b = F->node[next3(k)], c = F->node[before3(k)],
              d = G->node[before3(j)];
    const int bc = F->next[next3(k)], ca = F->next[before3(k)], ad = G->next[next3(j)],
              db = G->next[before3(j)];
    const int fixed_bc = F->fixed[next3(k)], fixed_ca = F->fixed[before3(k)],
              fixed_ad = G->fixed[next3(j)], fixed_db = G->fixed[before3(j)];
    *F = (face){.node = {c, a, d}, .next = {ca, -1, g}, .fixed = {(unsigned char)fixed_ca, 0, 0}};
    *G = (face){.node = {d, b, c}, .next = {db, -1, f}, .fixed = {(unsigned char)fixed_db, 0, 0}};
    join(m, f, 1, ad, g, fixed_ad);
    join(m, g, 1, bc, f, fixed_bc);
    m->at[a] = m->at[c] = m->at[d] = f;
    m->at[b] = g;
}

static const site *apex(const maker *m, int f, int k)
{
    return &m->p[m->face[f].node[before3(k)]];
}

/* Flip the sides on the stack that are not Delaunay, and those around what was flipped. */
static utw_status make_delaunay(maker *m)
{
    while (m->n_stack > 0) {
        const side s = m->stack[--m->n_stack];
        const face *f = &m->face[s.face];
        const int g = f->next[s.k];
        if (g < 0 || f->fixed[s.k]) continue;
        const site *a = &m->p[f->node[s.k]], *b = &m->p[f->node[next3(s.k)]];
        if (in_circle(apex(m, s.face, s.k), a, b, apex(m, g, side_of(&m->face[g], s.face))) <= 0)
            continue;
        flip(m, s.face, s.k);
        for (int k = 0; k < 2; k++) {
            utw_status st = push(m, s.face, k);
            if (st == UTW_OK) st = push(m, g, k);
            if (st != UTW_OK) return st;
        }
    }
    return UTW_OK;
}

/* The face that holds a point, by walking toward it; the point may lie on a side. */
static int locate(const maker *m, const site *p)
{
    int f = m->last;
    for (int steps = 0; steps < 4 * m->n_face + 16; steps++) {
        const face *F = &m->face[f];
        int k = 0;
        for (; k < 3; k++)
            if (turn(&m->p[F->node[k]], &m->p[F->node[next3(k)]], p) < 0) break;
        if (k == 3) return f;
        f = F->next[k];
    }
    return -1;
}

static utw_status insert(maker *m, int i)
{
    const int f = locate(m, &m->p[i]), g = m->n_face, h = m->n_face + 1;
    if (f < 0) return utw_fail(m->err, UTW_E_INTERNAL, "the walk through a triangulation is lost");
    const face old = m->face[f];
    for (int k = 0; k < 3; k++)
        if (m->p[old.node[k]].x == m->p[i].x && m->p[old.node[k]].y == m->p[i].y)
            return utw_fail(m->err, UTW_E_MESH,
                            "two points of the outline are too close to be told apart");
    m->n_face += 2;
    const int a = old.node[0], b = old.node[1], c = old.node[2];
    m->face[f] = (face){.node = {a, b, i}, .next = {old.next[0], g, h}};
    m->face[g] = (face){.node = {b, c, i}, .next = {old.next[1], h, f}};
    m->face[h] = (face){.node = {c, a, i}, .next = {old.next[2], f, g}};
    if (old.next[1] >= 0) m->face[old.next[1]].next[side_of(&m->face[old.next[1]], f)] = g;
    if (old.next[2] >= 0) m->face[old.next[2]].next[side_of(&m->face[old.next[2]], f)] = h;
    m->at[a] = m->at[b] = m->at[i] = f;
    m->at[c] = g;
    m->last = f;
    utw_status st = push(m, f, 0);
    if (st == UTW_OK) st = push(m, g, 0);
    if (st == UTW_OK) st = push(m, h, 0);
    return st == UTW_OK ? make_delaunay(m) : st;
}

/* ---- sides of the polygons ---- */

/* The face with the directed side a b, and its number; face = -1 when there is none. */
static side find_side(const maker *m, int a, int b)
{
    const int start = m->at[a];
    for (int way = 0; way < 2; way++)
        for (int f = start, count = 0; f >= 0 && count <= m->n_face; count++) {
            const face *F = &m->face[f];
            const int k = F->node[0] == a ? 0 : F->node[1] == a ? 1 : 2;
            if (F->node[next3(k)] == b) return (side){f, k};
            f = F->next[way == 0 ? before3(k) : k];
            if (f == start) break;
        }
    return (side){-1, 0};
}

static utw_status crossed(const maker *m)
{
    return utw_fail(m->err, UTW_E_MESH, "the outline comes too close to itself to be told apart");
}

static int opposite(int64_t u, int64_t v)
{
    return (u > 0 && v < 0) || (u < 0 && v > 0);
}

/* The face at point a out of which the line to b leaves, k being the side it crosses; face = -1
 * when it runs through a point or along a side. */
static side first_crossing(const maker *m, int a, int b)
{
    const int start = m->at[a];
    for (int way = 0; way < 2; way++)
        for (int f = start, count = 0; f >= 0 && count <= m->n_face; count++) {
            const face *F = &m->face[f];
            const int k = F->node[0] == a ? 0 : F->node[1] == a ? 1 : 2;
            const site *u = &m->p[F->node[next3(k)]], *v = &m->p[F->node[before3(k)]];
            if (turn(&m->p[a], &m->p[b], u) < 0 && turn(&m->p[a], &m->p[b], v) > 0)
                return (side){f, next3(k)};
            f = F->next[way == 0 ? before3(k) : k];
            if (f == start) break;
        }
    return (side){-1, 0};
}

/* Nodes of the sides that the segment a b crosses, pairs in list[*n][2]; owned by the caller. */
static utw_status crossed_sides(const maker *m, int a, int b, int (**list)[2], size_t *n)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = m->err;
    void *array = NULL;
    size_t capacity = 0;
    side s = first_crossing(m, a, b);
    *n = 0;
    while (s.face >= 0) {
        const face *F = &m->face[s.face];
        if (F->fixed[s.k] || F->next[s.k] < 0) break;
        if (utw_grow(&array, &capacity, *n + 1, sizeof **list) != 0) {
            st = utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
            goto done;
        }
        int(*pair)[2] = array;
        pair[*n][0] = F->node[s.k];
        pair[(*n)++][1] = F->node[next3(s.k)];
        const int g = F->next[s.k], j = side_of(&m->face[g], s.face),
                  c = m->face[g].node[before3(j)];
        if (c == b) {
            *list = array;
            array = NULL;
            st = UTW_OK;
            goto done;
        }
        /* side j of g runs from the left of a b to the right */
        const int64_t at = turn(&m->p[a], &m->p[b], &m->p[c]);
        if (at == 0) break;
        s = (side){g, at > 0 ? next3(j) : before3(j)};
    }
    st = crossed(m);
done:
    utw_free(array);
    return st;
}

/* Make the side a b by flipping what crosses it. */
static utw_status force_side(maker *m, int a, int b)
{
    utw_status st = UTW_E_INTERNAL;
    int(*list)[2] = NULL;
    size_t n = 0;
    UTW_TRY(crossed_sides(m, a, b, &list, &n));
    const site *A = &m->p[a], *B = &m->p[b];
    for (size_t i = 0, left = n, waits = 0; left > 0; i = (i + 1) % n) {
        if (list[i][0] < 0) continue;
        const side s = find_side(m, list[i][0], list[i][1]);
        if (s.face < 0 || waits++ > n * n + 16) {
            st = crossed(m);
            goto done;
        }
        const int g = m->face[s.face].next[s.k], j = side_of(&m->face[g], s.face);
        const site *u = &m->p[list[i][0]], *v = &m->p[list[i][1]], *c = apex(m, s.face, s.k),
                   *d = apex(m, g, j);
        /* the faces make a convex quadrangle when c d crosses u v too */
        if (!opposite(turn(c, d, u), turn(c, d, v))) continue;
        flip(m, s.face, s.k);
        waits = 0;
        const int from = m->face[s.face].node[0], to = m->face[s.face].node[2];
        if (from != a && from != b && to != a && to != b &&
            opposite(turn(A, B, c), turn(A, B, d))) {
            /* find_side() takes either direction of a side that has faces on both sides */
            list[i][0] = from;
            list[i][1] = to;
        } else {
            list[i][0] = -1;
            left--;
        }
    }
    st = UTW_OK;
done:
    utw_free(list);
    return st;
}

/* Make and mark all sides of the polygons, then make the rest Delaunay again. */
static utw_status fix_sides(maker *m, const int *after)
{
    utw_status st = UTW_OK;
    for (int a = 0; a < m->n_point; a++) {
        const int b = after[a];
        side s = find_side(m, a, b);
        if (s.face < 0) {
            st = force_side(m, a, b);
            if (st != UTW_OK) return st;
            s = find_side(m, a, b);
            if (s.face < 0) return crossed(m);
        }
        const int g = m->face[s.face].next[s.k];
        m->face[s.face].fixed[s.k] = 1;
        if (g >= 0) m->face[g].fixed[side_of(&m->face[g], s.face)] = 1;
    }
    m->n_stack = 0;
    for (int f = 0; f < m->n_face && st == UTW_OK; f++)
        for (int k = 0; k < 3 && st == UTW_OK; k++) st = push(m, f, k);
    return st == UTW_OK ? make_delaunay(m) : st;
}

/* ---- the faces inside ---- */

/* Number the faces that lie to the left of the polygons; number[] is -1 for the others. */
static utw_status find_inside(maker *m, const int *after, int *number, int *n)
{
    m->n_stack = 0;
    *n = 0;
    for (int f = 0; f < m->n_face; f++) number[f] = -1;
    for (int a = 0; a < m->n_point; a++) {
        const side s = find_side(m, a, after[a]);
        if (s.face < 0) return crossed(m);
        const utw_status st = push(m, s.face, 0);
        if (st != UTW_OK) return st;
    }
    while (m->n_stack > 0) {
        const int f = m->stack[--m->n_stack].face;
        if (number[f] >= 0) continue;
        number[f] = (*n)++;
        for (int k = 0; k < 3; k++) {
            if (m->face[f].node[k] >= m->n_point) return crossed(m);
            if (m->face[f].fixed[k]) continue;
            const utw_status st = push(m, m->face[f].next[k], 0);
            if (st != UTW_OK) return st;
        }
    }
    return UTW_OK;
}

static utw_status collect(maker *m, const int *after, utw_delaunay *out)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = m->err;
    int *number = NULL, n = 0;
    UTW_TRY_ALLOC(number = utw_alloc((size_t)m->n_face, sizeof *number));
    UTW_TRY(find_inside(m, after, number, &n));
    UTW_TRY_ALLOC(out->tri = utw_alloc((size_t)n, sizeof *out->tri));
    out->n = n;
    for (int f = 0; f < m->n_face; f++) {
        if (number[f] < 0) continue;
        utw_delaunay_triangle *t = &out->tri[number[f]];
        for (int k = 0; k < 3; k++) {
            const face *F = &m->face[f];
            t->node[k] = F->node[k];
            t->next[k] = F->fixed[k] ? -1 : number[F->next[k]];
        }
    }
    st = UTW_OK;
done:
    utw_free(number);
    return st;
}

/* Put the points on the grid and make the outer triangle. */
static utw_status prepare(maker *m, const double (*xy)[2])
{
    double lo[2] = {UTW_INFINITY, UTW_INFINITY}, hi[2] = {-UTW_INFINITY, -UTW_INFINITY};
    for (int i = 0; i < m->n_point; i++)
        for (int k = 0; k < 2; k++) {
            if (!isfinite(xy[i][k]))
                return utw_fail(m->err, UTW_E_ARGUMENT, "a point to triangulate is not finite");
            lo[k] = fmin(lo[k], xy[i][k]);
            hi[k] = fmax(hi[k], xy[i][k]);
        }
    const double half = 0.5 * fmax(hi[0] - lo[0], hi[1] - lo[1]);
    if (!(half > 0 && isfinite(half)))
        return utw_fail(m->err, UTW_E_MESH, "the points to triangulate coincide");
    for (int i = 0; i < m->n_point; i++) {
        m->p[i].x = llround((xy[i][0] - 0.5 * (lo[0] + hi[0])) / half * GRID);
        m->p[i].y = llround((xy[i][1] - 0.5 * (lo[1] + hi[1])) / half * GRID);
    }
    const int n = m->n_point;
    m->p[n] = (site){-OUTER, -OUTER / 2};
    m->p[n + 1] = (site){OUTER, -OUTER / 2};
    m->p[n + 2] = (site){0, OUTER};
    m->face[0] = (face){.node = {n, n + 1, n + 2}, .next = {-1, -1, -1}};
    m->n_face = 1;
    m->at[n] = m->at[n + 1] = m->at[n + 2] = 0;
    return UTW_OK;
}

/* Every 2^k-th point of the row first, then those half way between: neighbours are inserted one
 * after the other, and the triangles stay well shaped while their number grows. */
static utw_status insert_all(maker *m)
{
    int step = 1;
    while (step < m->n_point) step *= 2;
    utw_status st = insert(m, 0);
    for (; step > 0 && st == UTW_OK; step /= 2)
        for (int i = step; i < m->n_point && st == UTW_OK; i += 2 * step) st = insert(m, i);
    return st;
}

utw_status utw_delaunay_create(int n_point, const double (*xy)[2], const int *after,
                               utw_delaunay *delaunay, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    maker m = {.n_point = n_point, .err = err};
    utw_delaunay made = {.n = 0};
    if (n_point < 3) return utw_fail(err, UTW_E_ARGUMENT, "%d points make no triangle", n_point);
    UTW_TRY_ALLOC(m.p = utw_alloc((size_t)n_point + 3, sizeof *m.p));
    UTW_TRY_ALLOC(m.at = utw_alloc((size_t)n_point + 3, sizeof *m.at));
    UTW_TRY_ALLOC(m.face = utw_alloc(2 * (size_t)n_point + 8, sizeof *m.face));
    UTW_TRY(prepare(&m, xy));
    UTW_TRY(insert_all(&m));
    UTW_TRY(fix_sides(&m, after));
    UTW_TRY(collect(&m, after, &made));
    *delaunay = made;
    memset(&made, 0, sizeof made);
    st = UTW_OK;
done:
    utw_delaunay_clear(&made);
    utw_free(m.p);
    utw_free(m.at);
    utw_free(m.face);
    utw_free(m.stack);
    return st;
}

void utw_delaunay_clear(utw_delaunay *delaunay)
{
    utw_free(delaunay->tri);
    memset(delaunay, 0, sizeof *delaunay);
}
