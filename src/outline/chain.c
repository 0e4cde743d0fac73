/* SPDX-License-Identifier: GPL-3.0-or-later
 * Edges between vertices, corners rounded or cut, all joined to a loop. */
#include "outline/chain.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/join.h"

static const double SAME =
    1e-12; /* points closer than this share of the loop's size are one point */
static const double GONE =
    1e-9; /* what is left of an edge's curve, as a share of it, when corners use it up */

typedef struct chain {
    const utw_vertex *vertex;
    int n;               /* vertices, and edges: edge k leads to vertex k */
    double same;         /* distance of one point from itself [L] */
    utw_curve *curve;    /* of all edges, before corners */
    int *first;          /* [n + 1]: edge k has the curves first[k] .. first[k+1]-1 */
    utw_corner_cut *cut; /* [n]: parameters where corner k ends edge k and starts edge k+1 */
    utw_loop loop;       /* the result as it grows */
    utw_error *err;
} chain;

static utw_status at_vertex(chain *c, int k, utw_status st)
{
    utw_error_place(c->err, -1, -1, k);
    return st;
}

#define FAIL(c, k, ...) at_vertex(c, k, utw_fail((c)->err, UTW_E_OUTLINE, __VA_ARGS__))

static int before(const chain *c, int k)
{
    return k > 0 ? k - 1 : c->n - 1;
}

static int after(const chain *c, int k)
{
    return k < c->n - 1 ? k + 1 : 0;
}

static utw_edge edge(const chain *c, int k)
{
    return (utw_edge){.curve = c->curve + c->first[k], .n = c->first[k + 1] - c->first[k]};
}

/* ---- vertices and edges ------------------------------------------------------------------- */

static utw_status check_vertices(chain *c)
{
    const utw_vertex *v = c->vertex;
    const int last = c->n - 1;
    int curved = 0, returning = 0;
    double size = 0;
    for (int k = 0; k < c->n; k++) {
        curved += v[k].join != UTW_JOIN_LINE;
        returning += v[k].join == UTW_JOIN_BEZIER || v[k].join == UTW_JOIN_THROUGH;
        for (int i = 0; i < 2; i++) {
            size = fmax(size, fabs(v[k].at[i] - v[0].at[i]));
            for (int j = 0; j < v[k].n_point; j++)
                size = fmax(size, fabs(v[k].point[j][i] - v[0].at[i]));
        }
    }
    c->same = SAME * size;
    if (c->n == 1 && returning == 0)
        return FAIL(c, -1,
                    "the loop has one vertex; at least three are needed; for a circle write "
                    "{\"circle\": [xc, yc, r]}");
    if (c->n < 3 && curved == 0)
        return FAIL(c, -1,
                    "the loop has %d vertices; at least three are needed, or two when one of the "
                    "edges is curved",
                    c->n);
    if (last > 0 && utw_distance(v[0].at, v[last].at) <= c->same && v[0].join == UTW_JOIN_LINE) {
        if (v[last].join != UTW_JOIN_LINE)
            return FAIL(c, last,
                        "the last vertex repeats the first; the loop closes by itself: move the "
                        "curve to vertex 1 and remove the last vertex");
        return FAIL(
            c, last,
            "the last vertex repeats the first; the loop closes by itself: remove the last vertex");
    }
    return UTW_OK;
}

static utw_status make_edges(chain *c)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = c->err;
    UTW_TRY_ALLOC(c->first = utw_alloc((size_t)c->n + 1, sizeof *c->first));
    for (int k = 0; k < c->n; k++) c->first[k + 1] = c->first[k] + utw_join_count(&c->vertex[k]);
    UTW_TRY_ALLOC(c->curve = utw_alloc((size_t)c->first[c->n], sizeof *c->curve));
    for (int k = 0; k < c->n; k++) {
        const int from = before(c, k);
        st = utw_join_curves(&c->vertex[k], c->vertex[from].at, from, c->same,
                             c->curve + c->first[k], err);
        if (st != UTW_OK) {
            (void)at_vertex(c, k, st);
            goto done;
        }
    }
done:
    return st;
}

/* ---- corners ------------------------------------------------------------------------------ */

static const char *corner_key(const chain *c, int k)
{
    return c->vertex[k].corner == UTW_CORNER_ROUND ? "round" : "chamfer";
}

static utw_corner corner_at(const chain *c, int k)
{
    const utw_vertex *v = &c->vertex[k];
    const utw_edge in = edge(c, k), out = edge(c, after(c, k));
    return (utw_corner){.kind = v->corner,
                        .size = v->size,
                        .before = in,
                        .after = out,
                        .least_before = 0,
                        .most_after = out.n};
}

/* The corner at vertex k by itself, with the whole of both edges to use. */
static utw_status make_corner(chain *c, int k)
{
    const utw_vertex *v = &c->vertex[k];
    const utw_corner corner = corner_at(c, k);
    const char *key = corner_key(c, k);
    c->cut[k].before = corner.before.n;
    c->cut[k].after = 0;
    if (v->corner == UTW_CORNER_SHARP) return UTW_OK;
    if (!(v->size > 0))
        return FAIL(c, k, "\"%s\" is %g; it must be greater than 0, or left out", key, v->size);
    switch (utw_corner_make(&corner, &c->cut[k])) {
    case UTW_CORNER_FITS:
        return UTW_OK;
    case UTW_CORNER_STRAIGHT:
        return FAIL(c, k,
                    "\"%s\" has no corner to work on: the outline runs straight on through this "
                    "vertex; leave it out",
                    key);
    case UTW_CORNER_BACK:
        return FAIL(c, k, "\"%s\" does not fit: the outline turns straight back at this vertex",
                    key);
    case UTW_CORNER_NO_TANGENT:
        return FAIL(c, k,
                    "\"%s\" needs the direction of both edges, and a control point of \"bezier\" "
                    "coincides with this vertex; move it",
                    key);
    case UTW_CORNER_TOO_LARGE:
        break;
    }
    const double greatest = utw_corner_greatest(&corner);
    if (greatest > 0)
        return FAIL(c, k,
                    "\"%s\": %g does not fit between its two edges; the greatest that fits is %g",
                    key, v->size, greatest);
    return FAIL(
        c, k,
        "\"%s\": %g does not fit between its two edges, and no smaller one does; leave it out", key,
        v->size);
}

/* The corners at both ends of edge k, to vertex k, share its length. */
static utw_status check_shared_edge(chain *c, int k)
{
    const int j = before(c, k);
    const double start = c->cut[j].after, end = c->cut[k].before;
    if (start <= end + GONE) return UTW_OK;
    if (k == j)
        return FAIL(c, k, "\"%s\": %g uses up the whole edge; make it smaller", corner_key(c, k),
                    c->vertex[k].size);
    /* the greatest at either end beside the other as it is */
    utw_corner here = corner_at(c, k), there = corner_at(c, j);
    here.least_before = start;
    there.most_after = end;
    const double greatest_here = utw_corner_greatest(&here),
                 greatest_there = utw_corner_greatest(&there);
    const utw_edge e = edge(c, k);
    return FAIL(c, k,
                "\"%s\": %g does not fit beside \"%s\": %g of vertex %d: the edge between them is "
                "%g long; the greatest that fits "
                "here is %g, or there %g",
                corner_key(c, k), c->vertex[k].size, corner_key(c, j), c->vertex[j].size, j + 1,
                utw_edge_length(&e, 0, e.n), greatest_here, greatest_there);
}

static utw_status make_corners(chain *c)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = c->err;
    UTW_TRY_ALLOC(c->cut = utw_alloc((size_t)c->n, sizeof *c->cut));
    for (int k = 0; k < c->n; k++) UTW_TRY(make_corner(c, k));
    for (int k = 0; k < c->n; k++) UTW_TRY(check_shared_edge(c, k));
done:
    return st;
}

/* ---- the loop ----------------------------------------------------------------------------- */

static void append(utw_loop *loop, utw_curve curve, int vertex)
{
    if (loop->n > 0) memcpy(curve.from, loop->curve[loop->n - 1].to, sizeof curve.from);
    loop->curve[loop->n] = curve;
    loop->vertex[loop->n++] = vertex;
}

/* What the corners leave of edge k. */
static void append_edge(chain *c, int k)
{
    const utw_edge e = edge(c, k);
    const double start = c->cut[before(c, k)].after, end = c->cut[k].before;
    for (int i = 0; i < e.n; i++) {
        const double t0 = fmax(start - i, 0), t1 = fmin(end - i, 1);
        if (t1 - t0 <= GONE) continue;
        append(&c->loop, t0 > 0 || t1 < 1 ? utw_curve_piece(&e.curve[i], t0, t1) : e.curve[i], k);
    }
}

static utw_status make_loop(chain *c)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = c->err;
    const size_t most = (size_t)c->first[c->n] + (size_t)c->n;
    UTW_TRY_ALLOC(c->loop.curve = utw_alloc(most, sizeof *c->loop.curve));
    UTW_TRY_ALLOC(c->loop.vertex = utw_alloc(most, sizeof *c->loop.vertex));
    for (int k = 0; k < c->n; k++) {
        append_edge(c, k);
        if (c->vertex[k].corner != UTW_CORNER_SHARP) append(&c->loop, c->cut[k].curve, k);
    }
    memcpy(c->loop.curve[0].from, c->loop.curve[c->loop.n - 1].to, sizeof(double[2]));
    st = UTW_OK;
done:
    return st;
}

utw_status utw_chain_loop(const utw_vertex *vertex, int n, utw_loop *loop, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    chain c = {.vertex = vertex, .n = n, .err = err};
    if (n < 1) return FAIL(&c, -1, "the loop has no vertices; at least three are needed");
    UTW_TRY(check_vertices(&c));
    UTW_TRY(make_edges(&c));
    UTW_TRY(make_corners(&c));
    UTW_TRY(make_loop(&c));
    *loop = c.loop;
    c.loop = (utw_loop){0};
    st = UTW_OK;
done:
    utw_loop_clear(&c.loop);
    utw_free(c.curve);
    utw_free(c.first);
    utw_free(c.cut);
    return st;
}
