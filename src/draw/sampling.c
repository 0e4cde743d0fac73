/* SPDX-License-Identifier: GPL-3.0-or-later
 * Cutting elements into small triangles that fit together. */
#include "draw/sampling.h"

#include <math.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "draw/sampling_edges.h"
#include "mesh/blend.h"

enum { DENSITY_MAX = 5 }; /* 2^5 = UTW_CUTS_MAX */

/* Numbers of vertices while parts are cut one after the other. */
typedef struct cutter {
    utw_sampling *s;
    unsigned char *cuts; /* [n_edge] log2 of the pieces of each edge of the mesh */
    int *of_node;        /* [n_node] vertex of this part, or -1 */
    int *of_edge;        /* [n_edge] first of the vertices inside an edge for this part, or -1 */
    int lattice[(UTW_CUTS_MAX + 1) * (UTW_CUTS_MAX + 2) / 2];
} cutter;

/* Length of the side and the distance of its middle from the chord's. */
static void side_shape(const utw_mesh *mesh, const utw_triangle *t, int k, double *length,
                       double *sagitta)
{
    const double *a = mesh->xy[t->node[k]], *b = mesh->xy[t->node[(k + 1) % 3]];
    *length = utw_distance(a, b);
    *sagitta = 0;
    if (!utw_mesh_is_curved(mesh, t, k)) return;
    double middle[2];
    const double chord[2] = {0.5 * (a[0] + b[0]), 0.5 * (a[1] + b[1])};
    utw_curve_point(&mesh->net->edge[t->curve[k]].curve, 0.5 * (t->t[k][0] + t->t[k][1]), middle);
    *sagitta = utw_distance(middle, chord);
    *length = utw_distance(a, middle) + utw_distance(middle, b);
}

/* Pieces of every edge: so many that none is longer than the spacing by more than a fifth, and that
 * chords stay close to curves (a piece's sagitta falls with the square of their number). */
static void choose_cuts(cutter *c, const utw_fineness *f)
{
    const utw_mesh *mesh = c->s->mesh;
    for (int e = 0; e < mesh->n_edge; e++) {
        double length, sagitta;
        side_shape(mesh, &mesh->tri[mesh->edge[e].tri[0]], mesh->edge[e].slot[0], &length,
                   &sagitta);
        int cuts = 0;
        while (cuts < DENSITY_MAX && (length > 1.2 * f->spacing * (1 << cuts) ||
                                      sagitta > f->sagitta * (1 << cuts) * (1 << cuts)))
            cuts++;
        c->cuts[e] = (unsigned char)cuts;
    }
    for (int t = 0; t < mesh->n_tri; t++) {
        unsigned char most = 0;
        for (int k = 0; k < 3; k++)
            if (c->cuts[mesh->tri[t].side[k]] > most) most = c->cuts[mesh->tri[t].side[k]];
        c->s->density[t] = most;
    }
}

static utw_status new_vertex(utw_sampling *s, const double xy[2], int *index, utw_error *err)
{
    void *block = s->xy;
    if (utw_grow(&block, &s->vertex_capacity, (size_t)s->n_vertex + 1, sizeof *s->xy) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    s->xy = block;
    s->xy[s->n_vertex][0] = xy[0];
    s->xy[s->n_vertex][1] = xy[1];
    *index = s->n_vertex++;
    return UTW_OK;
}

/* Vertices inside side k, when this part has none there yet. They are counted from the edge's lower
 * node, as neighbours do. */
static utw_status cut_side(cutter *c, const utw_blend *blend, const utw_triangle *t, int k,
                           utw_error *err)
{
    static const double corner[3][2] = {{0, 0}, {1, 0}, {0, 1}};
    const int e = t->side[k], n = 1 << c->cuts[e];
    const int backward = t->node[k] > t->node[(k + 1) % 3];
    const double *a = corner[k], *b = corner[(k + 1) % 3];
    utw_status st = UTW_OK;
    if (c->of_edge[e] >= 0) return UTW_OK;
    c->of_edge[e] = c->s->n_vertex;
    for (int i = 1; i < n && st == UTW_OK; i++) {
        const double u = (double)(backward ? n - i : i) / n;
        double xy[2], jac[4];
        int index;
        utw_blend_at(blend, a[0] + u * (b[0] - a[0]), a[1] + u * (b[1] - a[1]), xy, jac);
        st = new_vertex(c->s, xy, &index, err);
    }
    return st;
}

static int lattice_index(int n, int i, int j)
{
    return j * (n + 1) - j * (j - 1) / 2 + i;
}

/* The vertex that point `step` of n along side k becomes: the nearest of the edge's own points.
 * *own is that point's step of n. */
static int on_side(const cutter *c, const utw_triangle *t, int k, int n, int step, int *own)
{
    const int e = t->side[k], pieces = 1 << c->cuts[e], ratio = n / pieces;
    const int nearest = (2 * step + ratio) / (2 * ratio);
    *own = nearest * ratio;
    if (nearest == 0) return c->of_node[t->node[k]];
    if (nearest == pieces) return c->of_node[t->node[(k + 1) % 3]];
    const int backward = t->node[k] > t->node[(k + 1) % 3];
    return c->of_edge[e] + (backward ? pieces - nearest : nearest) - 1;
}

static utw_status note_point(utw_sampling *s, size_t *n, int vertex, int i, int j, utw_error *err)
{
    void *block = s->point;
    if (utw_grow(&block, &s->point_capacity, *n + 1, sizeof *s->point) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    s->point = block;
    s->point[(*n)++] = (utw_sample_point){vertex, (unsigned char)i, (unsigned char)j};
    return UTW_OK;
}

/* The vertex of every lattice point of an element, and where its values are taken. */
static utw_status fill_lattice(cutter *c, int tri, const utw_blend *blend, size_t *n_point,
                               utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_sampling *s = c->s;
    const utw_triangle *t = &s->mesh->tri[tri];
    const int n = 1 << s->density[tri];
    for (int j = 0; j <= n; j++)
        for (int i = 0; i + j <= n; i++) {
            /* on side 0: j = 0, step i; side 1: i + j = n, step j; side 2: i = 0, step n - j */
            const int k = j == 0 ? 0 : i + j == n ? 1 : i == 0 ? 2 : -1;
            const int step = k == 0 ? i : k == 1 ? j : n - j;
            int vertex = -1, own = step;
            if (k >= 0) {
                vertex = on_side(c, t, k, n, step, &own);
            } else {
                double xy[2], jac[4];
                utw_blend_at(blend, (double)i / n, (double)j / n, xy, jac);
                UTW_TRY(new_vertex(s, xy, &vertex, err));
            }
            c->lattice[lattice_index(n, i, j)] = vertex;
            if (own == step) UTW_TRY(note_point(s, n_point, vertex, i, j, err));
        }
    st = UTW_OK;
done:
    return st;
}

/* Triangles that moving points has made flat are left out. */
static utw_status add_triangle(utw_sampling *s, int tri, int a, int b, int c, utw_error *err)
{
    if (a == b || b == c || c == a) return UTW_OK;
    void *block = s->tri;
    if (utw_grow(&block, &s->tri_capacity, (size_t)s->n_tri + 1, sizeof *s->tri) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    s->tri = block;
    block = s->element;
    if (utw_grow(&block, &s->element_capacity, (size_t)s->n_tri + 1, sizeof *s->element) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    s->element = block;
    s->tri[s->n_tri][0] = a;
    s->tri[s->n_tri][1] = b;
    s->tri[s->n_tri][2] = c;
    s->element[s->n_tri++] = tri;
    return UTW_OK;
}

static utw_status cut_element(cutter *c, int tri, size_t *n_point, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_mesh *mesh = c->s->mesh;
    const utw_triangle *t = &mesh->tri[tri];
    const int n = 1 << c->s->density[tri];
    utw_blend blend;
    utw_blend_of(mesh, t, &blend);
    for (int k = 0; k < 3; k++)
        if (c->of_node[t->node[k]] < 0)
            UTW_TRY(new_vertex(c->s, mesh->xy[t->node[k]], &c->of_node[t->node[k]], err));
    for (int k = 0; k < 3; k++) UTW_TRY(cut_side(c, &blend, t, k, err));
    UTW_TRY(fill_lattice(c, tri, &blend, n_point, err));
    for (int j = 0; j < n; j++)
        for (int i = 0; i + j < n; i++) {
            const int *at = c->lattice;
            UTW_TRY(add_triangle(c->s, tri, at[lattice_index(n, i, j)],
                                 at[lattice_index(n, i + 1, j)], at[lattice_index(n, i, j + 1)],
                                 err));
            if (i + j + 1 < n)
                UTW_TRY(add_triangle(c->s, tri, at[lattice_index(n, i + 1, j)],
                                     at[lattice_index(n, i + 1, j + 1)],
                                     at[lattice_index(n, i, j + 1)], err));
        }
    st = UTW_OK;
done:
    return st;
}

/* Part by part, so that no vertex belongs to two. */
static utw_status cut_parts(cutter *c, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_sampling *s = c->s;
    const utw_mesh *mesh = s->mesh;
    size_t n_point = 0;
    for (int part = 0; part < mesh->net->n_part; part++) {
        for (int i = 0; i < mesh->n_node; i++) c->of_node[i] = -1;
        for (int i = 0; i < mesh->n_edge; i++) c->of_edge[i] = -1;
        for (int t = 0; t < mesh->n_tri; t++) {
            if (mesh->tri[t].part != part) continue;
            s->first[2 * t] = (int)n_point;
            UTW_TRY(cut_element(c, t, &n_point, err));
            s->first[2 * t + 1] = (int)n_point;
        }
    }
    st = UTW_OK;
done:
    return st;
}

utw_status utw_sampling_init(utw_sampling *s, const utw_mesh *mesh, const utw_fineness *fineness,
                             utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    cutter c = {.s = s};
    memset(s, 0, sizeof *s);
    s->mesh = mesh;
    UTW_TRY_ALLOC(c.cuts = utw_alloc((size_t)mesh->n_edge, sizeof *c.cuts));
    UTW_TRY_ALLOC(c.of_node = utw_alloc((size_t)mesh->n_node, sizeof *c.of_node));
    UTW_TRY_ALLOC(c.of_edge = utw_alloc((size_t)mesh->n_edge, sizeof *c.of_edge));
    UTW_TRY_ALLOC(s->density = utw_alloc((size_t)mesh->n_tri, sizeof *s->density));
    UTW_TRY_ALLOC(s->first = utw_alloc(2 * (size_t)mesh->n_tri, sizeof *s->first));
    choose_cuts(&c, fineness);
    UTW_TRY(cut_parts(&c, err));
    UTW_TRY(utw_sampling_edges(s, err));
    st = UTW_OK;
done:
    utw_free(c.cuts);
    utw_free(c.of_node);
    utw_free(c.of_edge);
    if (st != UTW_OK) utw_sampling_clear(s);
    return st;
}

void utw_sampling_clear(utw_sampling *s)
{
    utw_free(s->xy);
    utw_free(s->tri);
    utw_free(s->element);
    utw_free(s->edge);
    utw_free(s->side);
    utw_free(s->rim);
    utw_free(s->rim_edge);
    utw_free(s->rim_next);
    utw_free(s->rim_of_edge);
    utw_free(s->density);
    utw_free(s->first);
    utw_free(s->point);
    memset(s, 0, sizeof *s);
}

void utw_sampling_map(utw_sampling *s, const utw_frame *f)
{
    for (int i = 0; i < s->n_vertex; i++) {
        s->xy[i][0] = f->x0 + f->scale * s->xy[i][0];
        s->xy[i][1] = f->y0 - f->scale * s->xy[i][1];
    }
}
