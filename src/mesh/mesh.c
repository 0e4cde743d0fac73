/* SPDX-License-Identifier: GPL-3.0-or-later
 * Edges of a mesh, and halving them. */
#include "mesh/mesh.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

void utw_mesh_free(utw_mesh *mesh)
{
    if (mesh == NULL) return;
    utw_free(mesh->xy);
    utw_free(mesh->tri);
    utw_free(mesh->edge);
    utw_free(mesh);
}

utw_status utw_mesh_copy(const utw_mesh *mesh, utw_mesh **copy, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_mesh *m;
    UTW_TRY_ALLOC(m = utw_alloc(1, sizeof *m));
    *m = *mesh;
    m->xy = NULL, m->tri = NULL, m->edge = NULL;
    UTW_TRY_ALLOC(m->xy = utw_alloc((size_t)m->n_node, sizeof *m->xy));
    UTW_TRY_ALLOC(m->tri = utw_alloc((size_t)m->n_tri, sizeof *m->tri));
    UTW_TRY_ALLOC(m->edge = utw_alloc((size_t)m->n_edge, sizeof *m->edge));
    memcpy(m->xy, mesh->xy, (size_t)m->n_node * sizeof *m->xy);
    memcpy(m->tri, mesh->tri, (size_t)m->n_tri * sizeof *m->tri);
    memcpy(m->edge, mesh->edge, (size_t)m->n_edge * sizeof *m->edge);
    *copy = m;
    m = NULL;
    st = UTW_OK;
done:
    utw_mesh_free(m);
    return st;
}

/* The list of edges that start at one (lower) node is short: it is searched in order. */
static utw_status edge_of(utw_mesh *mesh, int *first, int *next, int tri, int k, utw_error *err)
{
    utw_triangle *t = &mesh->tri[tri];
    const int a = t->node[k], b = t->node[(k + 1) % 3], lo = a < b ? a : b, hi = a < b ? b : a;
    for (int e = first[lo]; e >= 0; e = next[e]) {
        utw_mesh_edge *edge = &mesh->edge[e];
        if (edge->node[1] != hi) continue;
        if (edge->tri[1] >= 0)
            return utw_fail(err, UTW_E_MESH,
                            "three triangles share the edge from (%g, %g) to (%g, %g)",
                            mesh->xy[lo][0], mesh->xy[lo][1], mesh->xy[hi][0], mesh->xy[hi][1]);
        edge->tri[1] = tri;
        edge->slot[1] = k;
        t->side[k] = e;
        return UTW_OK;
    }
    const int e = mesh->n_edge++;
    mesh->edge[e] = (utw_mesh_edge){{lo, hi}, {tri, -1}, {k, -1}};
    next[e] = first[lo];
    first[lo] = e;
    t->side[k] = e;
    return UTW_OK;
}

utw_status utw_mesh_connect(utw_mesh *mesh, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int *first = NULL, *next = NULL;
    const size_t most = 3 * (size_t)mesh->n_tri;
    utw_free(mesh->edge);
    mesh->edge = NULL;
    mesh->n_edge = 0;
    UTW_TRY_ALLOC(mesh->edge = utw_alloc(most, sizeof *mesh->edge));
    UTW_TRY_ALLOC(first = utw_alloc((size_t)mesh->n_node, sizeof *first));
    UTW_TRY_ALLOC(next = utw_alloc(most, sizeof *next));
    for (int i = 0; i < mesh->n_node; i++) first[i] = -1;
    for (int t = 0; t < mesh->n_tri; t++)
        for (int k = 0; k < 3; k++) UTW_TRY(edge_of(mesh, first, next, t, k, err));
    st = UTW_OK;
done:
    utw_free(first);
    utw_free(next);
    return st;
}

void utw_mesh_leave(const utw_mesh *mesh, const utw_triangle *tri, int k, int end, double d[2])
{
    if (utw_mesh_is_curved(mesh, tri, k)) {
        const utw_curve *c = &mesh->net->edge[tri->curve[k]].curve;
        utw_curve_d1(c, tri->t[k][end], d);
        const double along = end == 0 ? tri->t[k][1] - tri->t[k][0] : tri->t[k][0] - tri->t[k][1];
        d[0] *= along;
        d[1] *= along;
        if (d[0] != 0 || d[1] != 0) return; /* a cubic may start with zero speed: use the chord */
    }
    const double *from = mesh->xy[tri->node[end == 0 ? k : (k + 1) % 3]];
    const double *to = mesh->xy[tri->node[end == 0 ? (k + 1) % 3 : k]];
    d[0] = to[0] - from[0];
    d[1] = to[1] - from[1];
}

double utw_mesh_corner_angle(const utw_mesh *mesh, const utw_triangle *tri, int k)
{
    double out[2], in[2];
    utw_mesh_leave(mesh, tri, k, 0, out);
    utw_mesh_leave(mesh, tri, (k + 2) % 3, 1, in);
    double a = atan2(utw_cross(out, in), utw_dot(out, in));
    /* a corner turned inside out by the curves shows as a small negative angle, not as almost a
     * full turn */
    return a < -0.5 * UTW_PI ? a + 2 * UTW_PI : a;
}

int utw_mesh_is_curved(const utw_mesh *mesh, const utw_triangle *tri, int k)
{
    return tri->curve[k] >= 0 && mesh->net->edge[tri->curve[k]].curve.kind != UTW_LINE;
}

/* ---- halving
 * ------------------------------------------------------------------------------------- */

/* The middle of side k: on its curve, or of its chord. */
static void middle(const utw_mesh *mesh, const utw_triangle *tri, int k, double xy[2])
{
    if (utw_mesh_is_curved(mesh, tri, k)) {
        utw_curve_point(&mesh->net->edge[tri->curve[k]].curve, 0.5 * (tri->t[k][0] + tri->t[k][1]),
                        xy);
        return;
    }
    const double *a = mesh->xy[tri->node[k]], *b = mesh->xy[tri->node[(k + 1) % 3]];
    xy[0] = 0.5 * (a[0] + b[0]);
    xy[1] = 0.5 * (a[1] + b[1]);
}

/* A corner or mid-side of the triangle being cut: 0 1 2 its nodes, 3 4 5 the middles of its sides.
 */
static int point_of(const utw_triangle *t, const int *mid, int which)
{
    return which < 3 ? t->node[which] : mid[t->side[which - 3]];
}

/* The parameter interval of the child side from point a to point b, when it lies on a side of the
 * parent. */
static void child_side(const utw_triangle *t, int a, int b, int *curve, double interval[2])
{
    *curve = -1;
    interval[0] = interval[1] = 0;
    for (int k = 0; k < 3; k++) {
        const int start = k, end = (k + 1) % 3, half = 3 + k;
        const double t0 = t->t[k][0], t1 = t->t[k][1], tm = 0.5 * (t0 + t1);
        double from, to;
        if (a == start)
            from = t0;
        else if (a == half)
            from = tm;
        else if (a == end)
            from = t1;
        else
            continue;
        if (b == start)
            to = t0;
        else if (b == half)
            to = tm;
        else if (b == end)
            to = t1;
        else
            continue;
        *curve = t->curve[k];
        interval[0] = from;
        interval[1] = to;
        return;
    }
}

static void add_child(utw_triangle *list, int *n, const utw_triangle *t, const int *mid, int a,
                      int b, int c)
{
    utw_triangle *child = &list[(*n)++];
    const int p[3] = {a, b, c};
    child->part = t->part;
    for (int k = 0; k < 3; k++) {
        child->node[k] = point_of(t, mid, p[k]);
        child_side(t, p[k], p[(k + 1) % 3], &child->curve[k], child->t[k]);
    }
}

static double apart(const utw_mesh *mesh, const utw_triangle *t, const int *mid, int a, int b)
{
    return utw_distance(mesh->xy[point_of(t, mid, a)], mesh->xy[point_of(t, mid, b)]);
}

/* Cut one triangle by its marked sides. Points: corners 0 1 2, middles of sides 3 (01) 4 (12) 5
 * (20). */
static void cut(const utw_mesh *mesh, const utw_triangle *t, const int *mid, utw_triangle *list,
                int *n)
{
    int marked[3], count = 0, k = 0;
    for (int i = 0; i < 3; i++) count += marked[i] = mid[t->side[i]] >= 0;
    if (count == 0) {
        list[(*n)++] = *t;
        return;
    }
    if (count == 3) {
        add_child(list, n, t, mid, 0, 3, 5);
        add_child(list, n, t, mid, 3, 1, 4);
        add_child(list, n, t, mid, 5, 4, 2);
        add_child(list, n, t, mid, 3, 4, 5);
        return;
    }
    if (count == 1) {
        while (!marked[k]) k++;
        const int a = k, b = (k + 1) % 3, c = (k + 2) % 3;
        add_child(list, n, t, mid, a, 3 + k, c);
        add_child(list, n, t, mid, 3 + k, b, c);
        return;
    }
    while (marked[k]) k++; /* side k stays whole: corner c opposite to it is cut off */
    const int a = k, b = (k + 1) % 3, c = (k + 2) % 3, mbc = 3 + b, mca = 3 + c;
    add_child(list, n, t, mid, mca, mbc, c);
    if (apart(mesh, t, mid, a, mbc) <= apart(mesh, t, mid, b, mca)) { /* the shorter diagonal */
        add_child(list, n, t, mid, a, b, mbc);
        add_child(list, n, t, mid, a, mbc, mca);
    } else {
        add_child(list, n, t, mid, a, b, mca);
        add_child(list, n, t, mid, b, mbc, mca);
    }
}

utw_status utw_mesh_halve(utw_mesh *mesh, const unsigned char *marked, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int *mid = NULL, n_new = 0, n_tri = 0;
    utw_triangle *list = NULL;
    UTW_TRY_ALLOC(mid = utw_alloc((size_t)mesh->n_edge, sizeof *mid));
    for (int e = 0; e < mesh->n_edge; e++) mid[e] = marked[e] ? mesh->n_node + n_new++ : -1;
    double(*xy)[2];
    UTW_TRY_ALLOC(xy = utw_realloc(mesh->xy, (size_t)(mesh->n_node + n_new), sizeof *xy));
    mesh->xy = xy;
    for (int e = 0; e < mesh->n_edge; e++)
        if (mid[e] >= 0)
            middle(mesh, &mesh->tri[mesh->edge[e].tri[0]], mesh->edge[e].slot[0], xy[mid[e]]);
    UTW_TRY_ALLOC(list = utw_alloc((size_t)mesh->n_tri * 4, sizeof *list));
    for (int t = 0; t < mesh->n_tri; t++) {
        const int start = n_tri;
        cut(mesh, &mesh->tri[t], mid, list, &n_tri);
        for (int i = start; i < n_tri; i++) list[i].from = t;
    }
    utw_free(mesh->tri);
    mesh->tri = list;
    list = NULL;
    mesh->n_tri = n_tri;
    mesh->n_node += n_new;
    UTW_TRY(utw_mesh_connect(mesh, err));
    st = UTW_OK;
done:
    utw_free(mid);
    utw_free(list);
    return st;
}
