/* SPDX-License-Identifier: GPL-3.0-or-later
 * Boundary loops, and a breadth-first search over edges from the outer loop that finds the cut of
 * each hole. */
#include "mesh/rim.h"

#include "base/memory.h"
#include "base/status.h"

void utw_rim_free(utw_rim *rim)
{
    if (rim == NULL) return;
    utw_free(rim->loop);
    utw_free(rim->start);
    utw_free(rim->leave);
    utw_free(rim->parent);
    utw_free(rim->cut);
    utw_free(rim);
}

static utw_status find_sides(const utw_mesh *mesh, utw_rim *rim, utw_error *err)
{
    for (int i = 0; i < mesh->n_node; i++) rim->loop[i] = rim->leave[i] = -1;
    for (int e = 0; e < mesh->n_edge; e++) {
        if (mesh->edge[e].tri[1] >= 0) continue;
        const int t = mesh->edge[e].tri[0], k = mesh->edge[e].slot[0], node = mesh->tri[t].node[k];
        if (rim->leave[node] >= 0)
            return utw_fail(err, UTW_E_MESH,
                            "the section touches itself in the point (%g, %g); part it there or "
                            "join it over a length",
                            mesh->xy[node][0], mesh->xy[node][1]);
        rim->leave[node] = 3 * t + k;
    }
    return UTW_OK;
}

static int next_node(const utw_mesh *mesh, const utw_rim *rim, int node)
{
    const int side = rim->leave[node];
    return mesh->tri[side / 3].node[(side % 3 + 1) % 3];
}

static utw_status walk_loops(const utw_mesh *mesh, utw_rim *rim, utw_error *err)
{
    int outer = -1, n = 0;
    for (int i = 0; i < mesh->n_node; i++)
        if (rim->leave[i] >= 0 && (outer < 0 || mesh->xy[i][0] < mesh->xy[outer][0])) outer = i;
    for (int i = -1; i < mesh->n_node; i++) { /* the loop of the leftmost node first */
        const int start = i < 0 ? outer : i;
        if (start < 0 || rim->leave[start] < 0 || rim->loop[start] >= 0) continue;
        int node = start, steps = 0;
        do {
            rim->loop[node] = n;
            node = next_node(mesh, rim, node);
        } while (node != start && rim->leave[node] >= 0 && rim->loop[node] < 0 &&
                 ++steps <= mesh->n_node);
        if (node != start)
            return utw_fail(err, UTW_E_MESH, "the boundary of the mesh does not close");
        rim->start[n++] = start;
    }
    rim->n_loop = n;
    return UTW_OK;
}

/* ---- cuts
 * ---------------------------------------------------------------------------------------- */

typedef struct search {
    const utw_mesh *mesh;
    utw_rim *rim;
    int *first, *next; /* edges at each node as lists over 2 n_edge half-edges */
    int *from;         /* [n_node] half-edge by which the search came, -1 for roots, -2 unseen */
    int *root;         /* [n_node] loop the search came from */
    int *queue;
    int head, tail;
    size_t capacity;
} search;

static void visit_loop(search *s, int loop)
{
    int node = s->rim->start[loop];
    do {
        s->from[node] = -1;
        s->root[node] = loop;
        s->queue[s->tail++] = node;
        node = next_node(s->mesh, s->rim, node);
    } while (node != s->rim->start[loop]);
}

static utw_status mark(search *s, int tri, int corner, int hole, utw_error *err)
{
    void *list = s->rim->cut;
    if (utw_grow(&list, &s->capacity, (size_t)s->rim->n_cut + 1, sizeof *s->rim->cut) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    s->rim->cut = list;
    s->rim->cut[s->rim->n_cut++] = (utw_cut_corner){tri, corner, hole};
    return UTW_OK;
}

static int corner_of(const utw_triangle *t, int node)
{
    return t->node[0] == node ? 0 : t->node[1] == node ? 1 : 2;
}

static int neighbour(const utw_mesh *mesh, int tri, int side)
{
    const utw_mesh_edge *e = &mesh->edge[mesh->tri[tri].side[side]];
    return e->tri[0] == tri ? e->tri[1] : e->tri[0];
}

/* The triangle on the left of the edge from a to b, or -1. */
static int left_of(const utw_mesh *mesh, int edge, int a)
{
    const utw_mesh_edge *e = &mesh->edge[edge];
    for (int k = 0; k < 2; k++)
        if (e->tri[k] >= 0 && mesh->tri[e->tri[k]].node[e->slot[k]] == a) return e->tri[k];
    return -1;
}

/* Mark the corners at `node` of the triangles from `tri` on, turning about it counter-clockwise (or
 * clockwise), up to the edge `stop` or the boundary. */
static utw_status mark_fan(search *s, int node, int tri, int clockwise, int stop, int hole,
                           utw_error *err)
{
    while (tri >= 0) {
        const utw_triangle *t = &s->mesh->tri[tri];
        const int k = corner_of(t, node), side = clockwise ? k : (k + 2) % 3;
        const utw_status st = mark(s, tri, k, hole, err);
        if (st != UTW_OK) return st;
        if (t->side[side] == stop) break;
        tri = neighbour(s->mesh, tri, side);
    }
    return UTW_OK;
}

/* The cut of a hole, from its node `at` back along the search to a root. */
static utw_status lay_cut(search *s, int hole, int at, utw_error *err)
{
    utw_status st = UTW_OK;
    int came = -1;
    while (st == UTW_OK) {
        const int half = s->from[at];
        if (half < 0) break;
        const int edge = half / 2, to = s->mesh->edge[edge].node[half % 2];
        /* left of the edge at -> to, turning counter-clockwise to the edge we came by (or to the
         * boundary) */
        st = mark_fan(s, at, left_of(s->mesh, edge, at), 0, came, hole, err);
        if (st == UTW_OK && s->from[to] < 0) /* the end of the cut: clockwise to the boundary */
            st = mark_fan(s, to, left_of(s->mesh, edge, at), 1, -1, hole, err);
        came = edge;
        at = to;
    }
    return st;
}

static utw_status search_holes(search *s, utw_error *err)
{
    const utw_mesh *mesh = s->mesh;
    utw_rim *rim = s->rim;
    rim->parent[0] = -1;
    visit_loop(s, 0);
    while (s->head < s->tail) {
        const int node = s->queue[s->head++];
        for (int half = s->first[node]; half >= 0; half = s->next[half]) {
            const int edge = half / 2, other = mesh->edge[edge].node[1 - half % 2];
            if (s->from[other] != -2) continue;
            s->from[other] = half; /* half-edge whose node[half % 2] is where we came from */
            s->root[other] = s->root[node];
            const int loop = rim->loop[other];
            if (loop < 0) {
                s->queue[s->tail++] = other;
                continue;
            }
            rim->parent[loop] = s->root[node];
            const utw_status st = lay_cut(s, loop, other, err);
            if (st != UTW_OK) return st;
            visit_loop(s, loop);
        }
    }
    for (int i = 0; i < mesh->n_node; i++)
        if (s->from[i] == -2)
            return utw_fail(err, UTW_E_MESH,
                            "the parts of the section do not hang together near (%g, %g)",
                            mesh->xy[i][0], mesh->xy[i][1]);
    return UTW_OK;
}

static utw_status lay_cuts(const utw_mesh *mesh, utw_rim *rim, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    search s = {.mesh = mesh, .rim = rim};
    const size_t n = (size_t)mesh->n_node;
    UTW_TRY_ALLOC(s.first = utw_alloc(n, sizeof(int)));
    UTW_TRY_ALLOC(s.next = utw_alloc(2 * (size_t)mesh->n_edge, sizeof(int)));
    UTW_TRY_ALLOC(s.from = utw_alloc(n, sizeof(int)));
    UTW_TRY_ALLOC(s.root = utw_alloc(n, sizeof(int)));
    UTW_TRY_ALLOC(s.queue = utw_alloc(n, sizeof(int)));
    for (int i = 0; i < mesh->n_node; i++) {
        s.first[i] = -1;
        s.from[i] = -2;
    }
    for (int half = 0; half < 2 * mesh->n_edge; half++) {
        const int node = mesh->edge[half / 2].node[half % 2];
        s.next[half] = s.first[node];
        s.first[node] = half;
    }
    UTW_TRY(search_holes(&s, err));
    st = UTW_OK;
done:
    utw_free(s.first);
    utw_free(s.next);
    utw_free(s.from);
    utw_free(s.root);
    utw_free(s.queue);
    return st;
}

utw_status utw_rim_create(const utw_mesh *mesh, utw_rim **rim, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_rim *r;
    const size_t n = (size_t)mesh->n_node;
    UTW_TRY_ALLOC(r = utw_alloc(1, sizeof *r));
    UTW_TRY_ALLOC(r->loop = utw_alloc(n, sizeof(int)));
    UTW_TRY_ALLOC(r->leave = utw_alloc(n, sizeof(int)));
    UTW_TRY(find_sides(mesh, r, err));
    UTW_TRY_ALLOC(r->start = utw_alloc(n, sizeof(int)));
    UTW_TRY(walk_loops(mesh, r, err));
    UTW_TRY_ALLOC(r->parent = utw_alloc((size_t)r->n_loop, sizeof(int)));
    for (int i = 0; i < r->n_loop; i++) r->parent[i] = -1;
    UTW_TRY(lay_cuts(mesh, r, err));
    *rim = r;
    r = NULL;
    st = UTW_OK;
done:
    utw_rim_free(r);
    return st;
}
