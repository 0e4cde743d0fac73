/* SPDX-License-Identifier: GPL-3.0-or-later
 * Cutting marked triangles: layers at the corners of the outline, halved sides elsewhere. */
#include "mesh/refine.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "mesh/layers.h"

/* Below this quality a triangle is bent: it is cut from the middle of its curved sides, and never
 * with a curved side left whole, because its children would be flatter against the same rise and
 * fold. */
#define BENT 0.7
/* Layers cut triangles flatter still: they need this quality. */
#define STRAIGHT 0.9

enum { LAYERS_ADDED = 2 };

/* A mesh in the making. */
typedef struct refining {
    utw_mesh *mesh;
    int *parent; /* [n_tri] triangles of the mesh that is refined */
} refining;

/* Nodes with curved triangles around them get no layers. served[t] is set for the triangles that
 * are cut by layers. */
static utw_status plan_layers(const utw_mesh *mesh, const unsigned char *wanted, int *layers,
                              unsigned char *served, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    unsigned char *closed;
    const int n = mesh->net->n_node;
    UTW_TRY_ALLOC(closed = utw_alloc((size_t)n, 1));
    for (int t = 0; t < mesh->n_tri; t++)
        for (int k = 0; k < 3; k++) {
            const int node = mesh->tri[t].node[k];
            if (node < n && !closed[node])
                closed[node] = utw_mesh_triangle_quality(mesh, t) < STRAIGHT;
        }
    for (int t = 0; t < mesh->n_tri; t++)
        for (int k = 0; wanted[t] && k < 3; k++) {
            const int node = mesh->tri[t].node[k];
            if (node >= n || closed[node]) continue;
            layers[node] = LAYERS_ADDED;
            served[t] = 1;
        }
    st = UTW_OK;
done:
    utw_free(closed);
    return st;
}

static int mark_curved(const utw_mesh *mesh, int t, unsigned char *marked)
{
    int added = 0;
    for (int k = 0; k < 3; k++) {
        const int side = mesh->tri[t].side[k];
        if (marked[side] || !utw_mesh_is_curved(mesh, &mesh->tri[t], k)) continue;
        added = marked[side] = 1;
    }
    return added;
}

/* Mark the sides to halve; 0 when there are none. */
static int mark_sides(const utw_mesh *mesh, const unsigned char *wanted,
                      const unsigned char *served, const unsigned char *bent, unsigned char *marked)
{
    int any = 0;
    for (int t = 0; t < mesh->n_tri; t++) {
        if (!wanted[t] || served[t]) continue;
        if (bent[t]) {
            any |= mark_curved(mesh, t, marked);
            continue;
        }
        for (int k = 0; k < 3; k++) any = marked[mesh->tri[t].side[k]] = 1;
    }
    for (int changed = any; changed;) {
        changed = 0;
        for (int t = 0; t < mesh->n_tri; t++) {
            const int *side = mesh->tri[t].side;
            if (bent[t] && (marked[side[0]] || marked[side[1]] || marked[side[2]]))
                changed |= mark_curved(mesh, t, marked);
        }
    }
    return any;
}

/* After a cut: follow the triangles back to those of the mesh that is refined. */
static utw_status follow(refining *r, utw_error *err)
{
    int *parent = utw_alloc((size_t)r->mesh->n_tri, sizeof *parent);
    if (parent == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    for (int t = 0; t < r->mesh->n_tri; t++) parent[t] = r->parent[r->mesh->tri[t].from];
    utw_free(r->parent);
    r->parent = parent;
    return UTW_OK;
}

static utw_status cut(refining *r, const unsigned char *wanted, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_mesh *mesh = r->mesh;
    int *layers = NULL;
    unsigned char *served = NULL, *bent = NULL, *marked = NULL;
    UTW_TRY_ALLOC(layers = utw_alloc((size_t)mesh->net->n_node, sizeof *layers));
    UTW_TRY_ALLOC(served = utw_alloc((size_t)mesh->n_tri, 1));
    UTW_TRY_ALLOC(bent = utw_alloc((size_t)mesh->n_tri, 1));
    UTW_TRY_ALLOC(marked = utw_alloc((size_t)mesh->n_edge, 1));
    for (int t = 0; t < mesh->n_tri; t++) bent[t] = utw_mesh_triangle_quality(mesh, t) < BENT;
    UTW_TRY(plan_layers(mesh, wanted, layers, served, err));
    if (mark_sides(mesh, wanted, served, bent, marked)) {
        UTW_TRY(utw_mesh_halve(mesh, marked, err));
        UTW_TRY(follow(r, err));
    }
    UTW_TRY(utw_mesh_cut_layers(mesh, layers, err));
    UTW_TRY(follow(r, err));
    st = UTW_OK;
done:
    utw_free(layers);
    utw_free(served);
    utw_free(bent);
    utw_free(marked);
    return st;
}

utw_status utw_mesh_refine(const utw_mesh *mesh, const unsigned char *wanted, utw_mesh **finer,
                           int **parent, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    refining r = {NULL, NULL};
    *finer = NULL;
    *parent = NULL;
    UTW_TRY(utw_mesh_copy(mesh, &r.mesh, err));
    UTW_TRY_ALLOC(r.parent = utw_alloc((size_t)mesh->n_tri, sizeof *r.parent));
    for (int t = 0; t < mesh->n_tri; t++) r.parent[t] = t;
    UTW_TRY(cut(&r, wanted, err));
    if (r.mesh->n_tri > mesh->n_tri && utw_mesh_quality(r.mesh) >= UTW_LEAST_QUALITY) {
        *finer = r.mesh;
        *parent = r.parent;
        r = (refining){NULL, NULL};
    }
    st = UTW_OK;
done:
    utw_mesh_free(r.mesh);
    utw_free(r.parent);
    return st;
}
