/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where corner layers are needed, how many, and cutting the triangles at the corner along its rays.
 */
#include "mesh/layers.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

enum { MOST_LAYERS = 24 };

/* Layers at a corner of interior angle `angle`: the error of the innermost ring is about 1.4e-3
 * 0.3^(2 lambda n) of J (fitted at lambda = 2/3 for orders about 8), lambda = pi/angle the exponent
 * of the singular function. */
static int layers_for(double angle, double target)
{
    const double lambda = UTW_PI / angle;
    const double n = ceil(log(target / 1.4e-3) / (2 * lambda * log(UTW_LAYER_RATIO)));
    return n < 2 ? 2 : n > MOST_LAYERS ? MOST_LAYERS : (int)n;
}

/* layers[node]: interior angles by adding up the corners of the triangles around each node of the
 * net. */
static utw_status count_layers(const utw_mesh *mesh, double target, int *layers, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const int n = mesh->net->n_node;
    double *angle = NULL;
    unsigned char *outer = NULL, *between = NULL;
    UTW_TRY_ALLOC(angle = utw_alloc((size_t)n, sizeof *angle));
    UTW_TRY_ALLOC(outer = utw_alloc((size_t)n, 1));
    UTW_TRY_ALLOC(between = utw_alloc((size_t)n, 1));
    for (int t = 0; t < mesh->n_tri; t++)
        for (int k = 0; k < 3; k++) {
            const int node = mesh->tri[t].node[k];
            if (node < n) angle[node] += utw_mesh_corner_angle(mesh, &mesh->tri[t], k);
        }
    for (int e = 0; e < mesh->n_edge; e++) {
        const utw_mesh_edge *edge = &mesh->edge[e];
        const int boundary = edge->tri[1] < 0;
        if (!boundary && mesh->tri[edge->tri[0]].part == mesh->tri[edge->tri[1]].part) continue;
        for (int k = 0; k < 2; k++)
            if (edge->node[k] < n) (boundary ? outer : between)[edge->node[k]] = 1;
    }
    for (int i = 0; i < n; i++) {
        layers[i] = 0;
        if (outer[i] && angle[i] > 185 * UTW_PI / 180)
            layers[i] = layers_for(angle[i], target);
        else if (outer[i] && between[i])
            layers[i] = layers_for(1.5 * UTW_PI, target);
        else if (outer[i] && angle[i] < 170 * UTW_PI / 180)
            layers[i] = 1;
    }
    st = UTW_OK;
done:
    utw_free(angle);
    utw_free(outer);
    utw_free(between);
    return st;
}

static int layers_at(const utw_mesh *mesh, const int *layers, int node)
{
    return node < mesh->net->n_node ? layers[node] : 0;
}

/* Halve the sides between two corners with layers, so that no triangle has two of them. A convex
 * corner gives its single layer up instead. */
static utw_status separate(utw_mesh *mesh, int *layers, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    unsigned char *marked;
    int any = 0;
    UTW_TRY_ALLOC(marked = utw_alloc((size_t)mesh->n_edge, 1));
    for (int e = 0; e < mesh->n_edge; e++) {
        const int *node = mesh->edge[e].node;
        const int a = layers_at(mesh, layers, node[0]), b = layers_at(mesh, layers, node[1]);
        if (a == 0 || b == 0) continue;
        if (a == 1)
            layers[node[0]] = 0;
        else if (b == 1)
            layers[node[1]] = 0;
        else
            any = marked[e] = 1;
    }
    if (any) UTW_TRY(utw_mesh_halve(mesh, marked, err));
    st = UTW_OK;
done:
    utw_free(marked);
    return st;
}

/* ---- cutting along the rays
 * ----------------------------------------------------------------------- */

typedef struct cutter {
    utw_mesh *mesh;
    const int *layers;
    int *first; /* [n_edge] first of the new nodes on an edge that leaves a corner, -1 */
    utw_triangle *list;
    int n;
} cutter;

/* Parameter at fraction f from the corner on a side whose start is the corner (or whose end, when
 * `flip`). */
static double along(const double t[2], int flip, double f)
{
    return flip ? t[1] + f * (t[0] - t[1]) : t[0] + f * (t[1] - t[0]);
}

static void ray_point(const utw_mesh *mesh, const utw_triangle *t, int k, int flip, double f,
                      double xy[2])
{
    if (utw_mesh_is_curved(mesh, t, k)) {
        utw_curve_point(&mesh->net->edge[t->curve[k]].curve, along(t->t[k], flip, f), xy);
        return;
    }
    const double *s = mesh->xy[t->node[flip ? (k + 1) % 3 : k]],
                 *e = mesh->xy[t->node[flip ? k : (k + 1) % 3]];
    for (int i = 0; i < 2; i++) xy[i] = s[i] + f * (e[i] - s[i]);
}

/* New nodes on every edge that leaves a corner with layers. */
static utw_status ray_nodes(cutter *c, utw_error *err)
{
    utw_mesh *mesh = c->mesh;
    int n = mesh->n_node;
    for (int e = 0; e < mesh->n_edge; e++) {
        const int *node = mesh->edge[e].node;
        const int count = layers_at(mesh, c->layers, node[0]) + layers_at(mesh, c->layers, node[1]);
        c->first[e] = count > 0 ? n : -1;
        n += count;
    }
    double(*xy)[2] = utw_realloc(mesh->xy, (size_t)n, sizeof *xy);
    if (xy == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    mesh->xy = xy;
    for (int e = 0; e < mesh->n_edge; e++) {
        if (c->first[e] < 0) continue;
        const utw_triangle *t = &mesh->tri[mesh->edge[e].tri[0]];
        const int k = mesh->edge[e].slot[0], flip = layers_at(mesh, c->layers, t->node[k]) == 0;
        const int corner = t->node[flip ? (k + 1) % 3 : k],
                  count = layers_at(mesh, c->layers, corner);
        double f = 1;
        for (int i = 0; i < count; i++)
            ray_point(mesh, t, k, flip, f *= UTW_LAYER_RATIO, mesh->xy[c->first[e] + i]);
    }
    mesh->n_node = n;
    return UTW_OK;
}

/* A child with corners p[3]; side 0 may lie on a ray side or on the far side of the parent. */
static void add(cutter *c, const utw_triangle *parent, const int p[3], const int curve[3],
                double t[3][2])
{
    utw_triangle *child = &c->list[c->n++];
    child->part = parent->part;
    for (int k = 0; k < 3; k++) {
        child->node[k] = p[k];
        child->curve[k] = curve[k];
        child->t[k][0] = curve[k] >= 0 ? t[k][0] : 0;
        child->t[k][1] = curve[k] >= 0 ? t[k][1] : 0;
    }
}

/* Triangle (corner, a, b): a small triangle at the corner and rings of two triangles each. */
static void cut_corner(cutter *c, const utw_triangle *t, int k)
{
    const utw_mesh *mesh = c->mesh;
    const int ka = k, kb = (k + 2) % 3, far = (k + 1) % 3; /* sides corner-a, b-corner, a-b */
    const int count = layers_at(mesh, c->layers, t->node[k]);
    const int *new_a = &c->first[t->side[ka]], *new_b = &c->first[t->side[kb]];
    int a = t->node[far], b = t->node[kb];
    double fa = 1; /* fraction of the ray at a and b */
    for (int i = 0; i < count; i++) {
        const int ia = *new_a + i, ib = *new_b + i;
        const double fi = fa * UTW_LAYER_RATIO;
        double ta[2] = {along(t->t[ka], 0, fi), along(t->t[ka], 0, fa)};
        double tb[2] = {along(t->t[kb], 1, fa), along(t->t[kb], 1, fi)};
        const int outermost = i == 0;
        const int cf = outermost ? t->curve[far] : -1;
        /* the quadrilateral ia a b ib, cut by the shorter diagonal of the first ring */
        const int by_ia_b = utw_distance(mesh->xy[*new_a], mesh->xy[t->node[kb]]) <=
                            utw_distance(mesh->xy[*new_b], mesh->xy[t->node[far]]);
        if (by_ia_b) {
            add(c, t, (int[3]){ia, a, b}, (int[3]){t->curve[ka], cf, -1},
                (double[3][2]){{ta[0], ta[1]}, {t->t[far][0], t->t[far][1]}, {0, 0}});
            add(c, t, (int[3]){ia, b, ib}, (int[3]){-1, t->curve[kb], -1},
                (double[3][2]){{0, 0}, {tb[0], tb[1]}, {0, 0}});
        } else {
            add(c, t, (int[3]){ia, a, ib}, (int[3]){t->curve[ka], -1, -1},
                (double[3][2]){{ta[0], ta[1]}, {0, 0}, {0, 0}});
            add(c, t, (int[3]){a, b, ib}, (int[3]){cf, t->curve[kb], -1},
                (double[3][2]){{t->t[far][0], t->t[far][1]}, {tb[0], tb[1]}, {0, 0}});
        }
        a = ia;
        b = ib;
        fa = fi;
    }
    add(c, t, (int[3]){t->node[k], a, b}, (int[3]){t->curve[ka], -1, t->curve[kb]},
        (double[3][2]){
            {t->t[ka][0], along(t->t[ka], 0, fa)}, {0, 0}, {along(t->t[kb], 1, fa), t->t[kb][1]}});
}

utw_status utw_mesh_cut_layers(utw_mesh *mesh, int *layers, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    cutter c = {.mesh = mesh, .layers = layers};
    int *from = NULL;
    UTW_TRY_ALLOC(from = utw_alloc(4 * (size_t)mesh->n_tri, sizeof *from));
    for (int t = 0; t < mesh->n_tri; t++) mesh->tri[t].from = t;
    UTW_TRY(separate(mesh, layers, err));
    for (int t = 0; t < mesh->n_tri; t++) /* at most four times as many as before */
        from[t] = mesh->tri[t].from;
    UTW_TRY_ALLOC(c.first = utw_alloc((size_t)mesh->n_edge, sizeof *c.first));
    size_t total = 0;
    for (int t = 0; t < mesh->n_tri; t++) {
        total++;
        for (int k = 0; k < 3; k++)
            total += 2 * (size_t)layers_at(mesh, layers, mesh->tri[t].node[k]);
    }
    UTW_TRY_ALLOC(c.list = utw_alloc(total, sizeof *c.list));
    UTW_TRY(ray_nodes(&c, err));
    for (int t = 0; t < mesh->n_tri; t++) {
        const utw_triangle *tri = &mesh->tri[t];
        const int start = c.n;
        int k = 0;
        while (k < 3 && layers_at(mesh, layers, tri->node[k]) == 0) k++;
        if (k < 3)
            cut_corner(&c, tri, k);
        else
            c.list[c.n++] = *tri;
        for (int i = start; i < c.n; i++) c.list[i].from = from[t];
    }
    utw_free(mesh->tri);
    mesh->tri = c.list;
    mesh->n_tri = c.n;
    c.list = NULL;
    UTW_TRY(utw_mesh_connect(mesh, err));
    st = UTW_OK;
done:
    utw_free(from);
    utw_free(c.first);
    utw_free(c.list);
    return st;
}

utw_status utw_mesh_add_layers(utw_mesh *mesh, double target, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int *layers;
    UTW_TRY_ALLOC(layers = utw_alloc((size_t)mesh->net->n_node, sizeof *layers));
    UTW_TRY(count_layers(mesh, target, layers, err));
    UTW_TRY(utw_mesh_cut_layers(mesh, layers, err));
    st = UTW_OK;
done:
    utw_free(layers);
    return st;
}
