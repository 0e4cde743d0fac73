/* SPDX-License-Identifier: GPL-3.0-or-later
 * Wall thickness by rays along the inward normal, through a tree of boxes over the boundary. */
#include "mesh/walls.h"

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

/* A piece of a net edge between two parameters, and how far it strays from its chord. */
typedef struct piece {
    double a[2], b[2], t0, t1, bulge;
    int edge;
} piece;

typedef struct box {
    double lo[2], hi[2];
} box;

struct utw_walls {
    const utw_net *net;
    int n;
    piece *piece; /* [n], in the order of the net's edges: neighbours in the list are neighbours in
                     the plane */
    box *tree;    /* [2 n - 1]: node for pieces [i, j) at a place that follows from i and j */
};

/* A range [i, j) of pieces is a node of the tree; its halves are [i, m) and [m, j). Nodes are
 * numbered in preorder: a range of n pieces has 2n - 1 nodes, so the second half starts 2(m - i)
 * after its parent. */
static void build(utw_walls *w, int node, int i, int j)
{
    box *b = &w->tree[node];
    if (j - i == 1) {
        const piece *p = &w->piece[i];
        for (int k = 0; k < 2; k++) {
            b->lo[k] = fmin(p->a[k], p->b[k]) - p->bulge;
            b->hi[k] = fmax(p->a[k], p->b[k]) + p->bulge;
        }
        return;
    }
    const int m = (i + j) / 2, second = node + 2 * (m - i);
    build(w, node + 1, i, m);
    build(w, second, m, j);
    for (int k = 0; k < 2; k++) {
        b->lo[k] = fmin(w->tree[node + 1].lo[k], w->tree[second].lo[k]);
        b->hi[k] = fmax(w->tree[node + 1].hi[k], w->tree[second].hi[k]);
    }
}

static int pieces_of(const utw_curve *c)
{
    if (c->kind == UTW_LINE) return 1;
    const int n = (int)ceil(utw_curve_turning(c) / (UTW_PI / 18)); /* at most 10 degrees each */
    return c->kind == UTW_CUBIC && n < 8 ? 8 : n < 2 ? 2 : n;
}

/* Greatest distance of a piece from its chord: seen at three places, half as much again to be safe.
 */
static double bulge_of(const utw_curve *c, const piece *p)
{
    double most = 0;
    if (c->kind == UTW_LINE) return 0;
    for (int k = 1; k <= 3; k++) {
        double x[2];
        utw_curve_point(c, p->t0 + 0.25 * k * (p->t1 - p->t0), x);
        const double u[2] = {x[0] - p->a[0], x[1] - p->a[1]},
                     v[2] = {p->b[0] - p->a[0], p->b[1] - p->a[1]};
        most = fmax(most, fabs(utw_cross(u, v)) / fmax(utw_norm(v), 1e-300));
    }
    return 1.5 * most;
}

utw_status utw_walls_create(const utw_net *net, utw_walls **walls, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_walls *w;
    UTW_TRY_ALLOC(w = utw_alloc(1, sizeof *w));
    w->net = net;
    int total = 0;
    for (int e = 0; e < net->n_edge; e++) total += pieces_of(&net->edge[e].curve);
    UTW_TRY_ALLOC(w->piece = utw_alloc((size_t)total, sizeof *w->piece));
    UTW_TRY_ALLOC(w->tree = utw_alloc(2 * (size_t)total, sizeof *w->tree));
    for (int e = 0; e < net->n_edge; e++) {
        const utw_curve *c = &net->edge[e].curve;
        const int n = pieces_of(c);
        for (int i = 0; i < n; i++) {
            piece *p = &w->piece[w->n++];
            p->edge = e;
            p->t0 = (double)i / n;
            p->t1 = (double)(i + 1) / n;
            utw_curve_point(c, p->t0, p->a);
            utw_curve_point(c, p->t1, p->b);
            p->bulge = bulge_of(c, p);
        }
    }
    if (w->n > 0) build(w, 0, 0, w->n);
    *walls = w;
    w = NULL;
    st = UTW_OK;
done:
    utw_walls_free(w);
    return st;
}

void utw_walls_free(utw_walls *walls)
{
    if (walls == NULL) return;
    utw_free(walls->piece);
    utw_free(walls->tree);
    utw_free(walls);
}

/* ---- rays
 * ---------------------------------------------------------------------------------------- */

typedef struct ray {
    double from[2], dir[2]; /* dir has length 1 */
    int edge;               /* net edge it starts on */
    double t;               /* and the parameter there */
    double best;            /* length to the nearest boundary so far */
    double wedge;           /* least length per distance from a corner shared with what is hit */
} ray;

/* Smallest distance at which the ray enters the box, or UTW_INFINITY. */
static double enters(const box *b, const ray *r)
{
    double near = 0, far = r->best;
    for (int k = 0; k < 2; k++) {
        if (r->dir[k] == 0) {
            if (r->from[k] < b->lo[k] || r->from[k] > b->hi[k]) return UTW_INFINITY;
            continue;
        }
        const double u = (b->lo[k] - r->from[k]) / r->dir[k],
                     v = (b->hi[k] - r->from[k]) / r->dir[k];
        near = fmax(near, fmin(u, v));
        far = fmin(far, fmax(u, v));
    }
    return near <= far * (1 + 1e-12) ? near : UTW_INFINITY;
}

/* Distance from the start of the ray to a node shared by its edge and another one; UTW_INFINITY
 * when they share none. */
static double shared_corner(const utw_walls *w, const ray *r, int other)
{
    const utw_net_edge *a = &w->net->edge[r->edge], *b = &w->net->edge[other];
    const int ends[2] = {a->from, a->to};
    double d = UTW_INFINITY;
    for (int k = 0; k < 2; k++)
        if (ends[k] == b->from || ends[k] == b->to)
            d = fmin(d, utw_distance(r->from, w->net->node[ends[k]]));
    return d;
}

/* Where the ray passes through the chord of a piece [L]; UTW_INFINITY when it does not. On a thin
 * wall the chord may lie behind the opposite curve: there the curve itself is met, by Newton's
 * method from the chord. */
static double passes(const utw_walls *w, const piece *p, const ray *r)
{
    const double side[2] = {p->b[0] - p->a[0], p->b[1] - p->a[1]};
    const double to[2] = {p->a[0] - r->from[0], p->a[1] - r->from[1]};
    const double across = utw_cross(r->dir, side);
    if (across == 0) return UTW_INFINITY;
    double length = utw_cross(to, side) / across, along = utw_cross(to, r->dir) / across;
    if (p->bulge == 0) return length > 0 && along >= 0 && along <= 1 ? length : UTW_INFINITY;
    const utw_curve *c = &w->net->edge[p->edge].curve;
    const double span = p->t1 - p->t0;
    for (int i = 0; i < 4; i++) {
        double x[2], d[2];
        if (!(along > -0.5 && along < 1.5)) return UTW_INFINITY;
        utw_curve_point(c, p->t0 + along * span, x);
        utw_curve_d1(c, p->t0 + along * span, d);
        const double off[2] = {x[0] - r->from[0], x[1] - r->from[1]};
        const double slope = span * utw_cross(r->dir, d);
        if (slope == 0) return UTW_INFINITY;
        length = utw_dot(off, r->dir);
        along -= utw_cross(r->dir, off) / slope;
    }
    return length > 0 && along >= -1e-6 && along <= 1 + 1e-6 ? length : UTW_INFINITY;
}

static void meet(const utw_walls *w, const piece *p, ray *r)
{
    if (p->edge == r->edge) { /* the curve's own chords near the start are no opposite wall */
        const double reach = 1.5 * (p->t1 - p->t0);
        if (r->t > p->t0 - reach && r->t < p->t1 + reach) return;
    }
    double seen = passes(w, p, r);
    if (p->edge != r->edge) {
        const double corner = shared_corner(w, r, p->edge);
        if (corner < UTW_INFINITY) seen = fmax(seen, r->wedge * corner);
    }
    r->best = fmin(r->best, seen);
}

static void descend(const utw_walls *w, int node, int i, int j, ray *r)
{
    if (enters(&w->tree[node], r) == UTW_INFINITY) return;
    if (j - i == 1) {
        meet(w, &w->piece[i], r);
        return;
    }
    const int m = (i + j) / 2, second = node + 2 * (m - i);
    /* the nearer half first, so that the other one is more often pruned */
    if (enters(&w->tree[node + 1], r) <= enters(&w->tree[second], r)) {
        descend(w, node + 1, i, m, r);
        descend(w, second, m, j, r);
    } else {
        descend(w, second, m, j, r);
        descend(w, node + 1, i, m, r);
    }
}

double utw_walls_thickness(const utw_walls *walls, int edge, double t, double wedge)
{
    const utw_net_edge *e = &walls->net->edge[edge];
    double tangent[2], best = UTW_INFINITY;
    utw_curve_d1(&e->curve, t, tangent);
    const double speed = utw_norm(tangent);
    if (speed == 0) return UTW_INFINITY;
    for (int side = 0; side < 2; side++) {
        if ((side == 0 ? e->left : e->right) < 0) continue;
        const double sign = side == 0 ? 1 : -1;
        ray r = {.edge = edge, .t = t, .best = best, .wedge = wedge};
        utw_curve_point(&e->curve, t, r.from);
        r.dir[0] = -sign * tangent[1] / speed;
        r.dir[1] = sign * tangent[0] / speed;
        descend(walls, 0, 0, walls->n, &r);
        best = r.best;
    }
    return best;
}
