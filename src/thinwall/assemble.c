/* SPDX-License-Identifier: GPL-3.0-or-later
 * Walls of every branch, joined within branches, at free ends and at junctions. */
#include "thinwall/assemble.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "thinwall/coarse.h"

#define LONG 2.5 /* a gap longer than so many of its own widths gets straight walls of its own */
#define CLOSE                                                                                      \
    0.75 /* of the thinnest wall there: junctions nearer than that, with no wall between, are one  \
          */
#define RING                                                                                       \
    (300 * UTW_PI / 180) /* an arc back to its own node from this turning on is a full circle */

/* The walls of a branch: build->wall[first .. first + n - 1], in order. */
typedef struct chain {
    int first, n;
} chain;

typedef struct assembly {
    utw_build *build;
    chain *chain; /* [n_branch] */
    int *cluster; /* [n_junction] union-find */
    utw_error *err;
} assembly;

static const utw_branch *branch_of(const assembly *x, int i)
{
    return &x->build->chordal->branch[i];
}

/* ---- walls of one branch ---- */

/* Turn the row of a ring so that it begins where a wall does, and close it: its last station is the
 * first once more. */
static utw_status turn_ring(utw_station **station, int *n, utw_error *err)
{
    if (*n == 0) return UTW_OK;
    const int start = utw_ring_start(*station, *n);
    utw_station *turned = utw_alloc((size_t)*n + 1, sizeof *turned);
    if (turned == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    for (int i = 0; i <= *n; i++) turned[i] = (*station)[(start + i) % *n];
    utw_free(*station);
    *station = turned;
    ++*n;
    return UTW_OK;
}

/* Straight walls for the gap between two chords when it is too long to be bridged. */
static utw_status fill_gap(assembly *x, const utw_branch *branch, int from, int to)
{
    utw_build *b = x->build;
    if (from == to || (!branch->closed && from > to)) return UTW_OK;
    const double length = utw_coarse_length(b, branch, from, to),
                 area = utw_chordal_area(b->chordal, branch, from, to);
    if (length * length <= LONG * area) return UTW_OK;
    return utw_coarse_walls(b, branch, from, to, 1);
}

static utw_status add_pieces(assembly *x, const utw_branch *branch, const utw_station *station,
                             const utw_piece *piece, int n)
{
    utw_build *b = x->build;
    int last = branch->first;
    for (int i = 0; i < n; i++) {
        utw_build_wall w = {.branch = (int)(branch - b->chordal->branch),
                            .path = piece[i].path,
                            .node = {-1, -1},
                            .chord = {station[piece[i].first].chord, station[piece[i].last].chord}};
        utw_status st = UTW_OK;
        if (i > 0 || !branch->closed) st = fill_gap(x, branch, last, w.chord[0]);
        if (st == UTW_OK) st = utw_build_add_wall(b, &w);
        if (st != UTW_OK) return st;
        last = w.chord[1];
    }
    if (n == 0) return UTW_OK;
    return fill_gap(x, branch, last,
                    branch->closed ? station[piece[0].first].chord : branch->first + branch->n - 1);
}

static utw_status find_walls(assembly *x, int i)
{
    utw_status st = UTW_E_INTERNAL;
    utw_build *b = x->build;
    utw_error *err = x->err;
    const utw_branch *branch = branch_of(x, i);
    utw_station *station = NULL;
    utw_piece *piece = NULL;
    int n = 0, n_piece = 0;
    x->chain[i].first = b->n_wall;
    UTW_TRY(utw_medial_stations(b->border, b->chordal, branch, &station, &n, err));
    if (branch->closed) UTW_TRY(turn_ring(&station, &n, err));
    UTW_TRY(utw_segment(station, n, &piece, &n_piece, err));
    UTW_TRY(add_pieces(x, branch, station, piece, n_piece));
    if (n_piece == 0 && branch->closed)
        UTW_TRY(utw_coarse_walls(b, branch, branch->first, branch->first, 3));
    else if (n_piece == 0)
        UTW_TRY(fill_gap(x, branch, branch->first, branch->first + branch->n - 1));
    x->chain[i].n = b->n_wall - x->chain[i].first;
    st = UTW_OK;
done:
    utw_free(station);
    utw_free(piece);
    return st;
}

/* ---- junctions that are one ---- */

static int root(const assembly *x, int junction)
{
    while (x->cluster[junction] != junction) junction = x->cluster[junction];
    return junction;
}

/* Thickness of the thinnest wall found at a junction; its diameter when there is none. */
static double thinnest(const assembly *x, int junction)
{
    const utw_chordal *c = x->build->chordal;
    double t = 2 * c->junction[junction].radius;
    for (int i = 0; i < c->n_branch; i++) {
        const chain *row = &x->chain[i];
        if (row->n == 0) continue;
        if (c->branch[i].from == junction) t = fmin(t, x->build->wall[row->first].path.t0);
        if (c->branch[i].to == junction)
            t = fmin(t, x->build->wall[row->first + row->n - 1].path.t1);
    }
    return t;
}

/* A wall from the middle of one junction to that of the next, as thick as the middle chord between
 * them is long. */
static utw_status bridge(assembly *x, int i)
{
    const utw_chordal *c = x->build->chordal;
    const utw_branch *b = &c->branch[i];
    const utw_chord *middle = &c->chord[b->first + b->n / 2];
    const double(*xy)[2] = (const double(*)[2])x->build->border->xy,
          t = utw_distance(xy[middle->left], xy[middle->right]);
    const utw_build_wall w = {
        .path = utw_path_line(c->junction[b->from].centre, c->junction[b->to].centre, t, t),
        .node = {-1, -1},
        .branch = i,
        .chord = {b->first, b->first + b->n - 1}};
    return utw_build_add_wall(x->build, &w);
}

/* Junctions with no wall between them, near together; the last link of a cell is left. */
static utw_status merge_junctions(assembly *x)
{
    const utw_chordal *c = x->build->chordal;
    for (int j = 0; j < c->n_junction; j++) x->cluster[j] = j;
    for (int i = 0; i < c->n_branch; i++) {
        const utw_branch *b = &c->branch[i];
        if (x->chain[i].n > 0 || b->from < 0 || b->to < 0) continue;
        /* the roots stand for their clusters: these do not grow along a row of junctions */
        const int u = root(x, b->from), v = root(x, b->to);
        const utw_chordal_junction *p = &c->junction[u], *q = &c->junction[v];
        const double t = fmin(thinnest(x, b->from), thinnest(x, b->to));
        if (u != v && utw_distance(p->centre, q->centre) <= CLOSE * t) {
            x->cluster[u] = v;
            continue;
        }
        x->chain[i].first = x->build->n_wall;
        const utw_status st =
            u == v ? utw_coarse_walls(x->build, b, b->first, b->first + b->n - 1, 3) : bridge(x, i);
        if (st != UTW_OK) return st;
        x->chain[i].n = x->build->n_wall - x->chain[i].first;
    }
    return UTW_OK;
}

/* ---- branches that come back ---- */

/* Cut a wall of a chain of one in two at its middle. */
static utw_status cut_in_two(assembly *x, int i)
{
    utw_build *b = x->build;
    utw_build_wall half = b->wall[x->chain[i].first];
    utw_path_point at;
    const utw_path whole = half.path;
    utw_path_at(&whole, 0.5 * whole.length, &at);
    x->chain[i] = (chain){b->n_wall, 2};
    half.path.length *= 0.5;
    half.path.t1 = at.t;
    utw_status st = utw_build_add_wall(b, &half);
    if (st != UTW_OK) return st;
    memcpy(half.path.p, at.x, sizeof at.x);
    memcpy(half.path.e, at.e, sizeof at.e);
    half.path.t0 = at.t;
    half.path.t1 = whole.t1;
    return utw_build_add_wall(b, &half);
}

/* A chain of one wall that starts and ends at the same node is a full circle, or becomes two or
 * three. The wall it replaces is dropped at the end: it has no nodes. */
static utw_status open_loops(assembly *x)
{
    for (int i = 0; i < x->build->chordal->n_branch; i++) {
        const utw_branch *b = branch_of(x, i);
        const int loop =
            b->closed || (b->from >= 0 && b->to >= 0 && root(x, b->from) == root(x, b->to));
        if (!loop || x->chain[i].n != 1) continue;
        const utw_path *path = &x->build->wall[x->chain[i].first].path;
        if (fabs(path->kappa) * path->length >= RING) continue;
        utw_status st;
        if (path->kappa != 0) {
            st = cut_in_two(x, i);
        } else {
            x->chain[i].first = x->build->n_wall;
            const int to = b->closed ? b->first : b->first + b->n - 1;
            st = utw_coarse_walls(x->build, b, b->first, to, 3);
            x->chain[i].n = x->build->n_wall - x->chain[i].first;
        }
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}

/* ---- joining ---- */

static utw_status join_branch(assembly *x, int i)
{
    utw_build *b = x->build;
    const utw_branch *branch = branch_of(x, i);
    const chain c = x->chain[i];
    utw_status st = UTW_OK;
    if (c.n == 0) return UTW_OK;
    for (int k = 0; k + 1 < c.n && st == UTW_OK; k++)
        st = utw_build_join(b, c.first + k, c.first + k + 1);
    if (st != UTW_OK) return st;
    if (branch->closed) {
        if (c.n > 1) return utw_build_join(b, c.first + c.n - 1, c.first);
        int node;
        st = utw_build_add_node(b, b->wall[c.first].path.p, &node);
        b->wall[c.first].node[0] = b->wall[c.first].node[1] = node;
        return st;
    }
    if (branch->from < 0) st = utw_build_tip(b, c.first, 0);
    if (branch->to < 0 && st == UTW_OK) st = utw_build_tip(b, c.first + c.n - 1, 1);
    return st;
}

/* All that meets in the junctions of one cluster. */
static utw_status join_cluster(assembly *x, int cluster)
{
    utw_status st = UTW_E_INTERNAL;
    utw_build *b = x->build;
    utw_error *err = x->err;
    const utw_chordal *c = b->chordal;
    int *wall = NULL, *end = NULL, n = 0, node, widest = cluster;
    UTW_TRY_ALLOC(wall = utw_alloc(2 * (size_t)c->n_branch, sizeof *wall));
    UTW_TRY_ALLOC(end = utw_alloc(2 * (size_t)c->n_branch, sizeof *end));
    for (int j = 0; j < c->n_junction; j++)
        if (root(x, j) == cluster && c->junction[j].radius > c->junction[widest].radius) widest = j;
    UTW_TRY(utw_build_add_node(b, c->junction[widest].centre, &node));
    for (int i = 0; i < c->n_branch; i++) {
        const utw_branch *branch = &c->branch[i];
        if (x->chain[i].n == 0) continue;
        for (int e = 0; e < 2; e++) {
            const int junction = e == 0 ? branch->from : branch->to;
            if (junction < 0 || root(x, junction) != cluster) continue;
            wall[n] = e == 0 ? x->chain[i].first : x->chain[i].first + x->chain[i].n - 1;
            end[n++] = e;
        }
    }
    UTW_TRY(utw_build_meet(b, node, wall, end, n, c->junction[widest].centre,
                           c->junction[widest].radius));
    for (int i = 0; i < c->n_branch; i++) {
        const utw_branch *branch = &c->branch[i];
        if (x->chain[i].n > 0 || (branch->from < 0) == (branch->to < 0)) continue;
        const int at_end = branch->to < 0, junction = at_end ? branch->from : branch->to;
        if (root(x, junction) != cluster) continue;
        UTW_TRY(utw_build_stub(b, node, at_end ? branch->first : branch->first + branch->n - 1,
                               at_end));
    }
    st = UTW_OK;
done:
    utw_free(wall);
    utw_free(end);
    return st;
}

/* Walls that were replaced have no nodes: close the ranks. */
static void drop_replaced(utw_build *b)
{
    int n = 0;
    for (int i = 0; i < b->n_wall; i++)
        if (b->wall[i].node[0] >= 0 && b->wall[i].node[1] >= 0) b->wall[n++] = b->wall[i];
    b->n_wall = n;
}

utw_status utw_assemble(utw_build *build)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = build->err;
    const utw_chordal *c = build->chordal;
    assembly x = {.build = build, .err = err};
    UTW_TRY_ALLOC(x.chain = utw_alloc((size_t)c->n_branch, sizeof *x.chain));
    UTW_TRY_ALLOC(x.cluster = utw_alloc((size_t)c->n_junction, sizeof *x.cluster));
    for (int i = 0; i < c->n_branch; i++) UTW_TRY(find_walls(&x, i));
    UTW_TRY(merge_junctions(&x));
    UTW_TRY(open_loops(&x));
    for (int i = 0; i < c->n_branch; i++) UTW_TRY(join_branch(&x, i));
    for (int j = 0; j < c->n_junction; j++)
        if (root(&x, j) == j) UTW_TRY(join_cluster(&x, j));
    drop_replaced(build);
    st = UTW_OK;
done:
    utw_free(x.chain);
    utw_free(x.cluster);
    return st;
}
