/* SPDX-License-Identifier: GPL-3.0-or-later
 * From a net to a valid mesh: divide, triangulate, repair, add corner layers, and try finer when a
 * curved element folds. */
#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "mesh/blend.h"
#include "mesh/divide.h"
#include "mesh/layers.h"
#include "mesh/mesh.h"
#include "mesh/triangulate.h"

enum {
    MOST_LOCAL = 5,  /* tries with shorter sides where elements fold */
    MOST_TRIES = 11, /* in all; the later ones with shorter sides everywhere */
    MOST_PASSES = 3
};

/* A corner flatter than this between two boundary sides is as good as smooth: the map's determinant
 * vanishes there. */
#define FLAT_CORNER (150 * UTW_PI / 180)
/* Determinant over that of the straight triangle below which the curved sides of an element are
 * halved. */
#define GOOD_QUALITY 0.3
/* Sides of the next try against those of the last one. */
#define SHORTER 0.6
/* Inside, sizes grow by this much per length of distance from the boundary. With 1 a fillet of a
 * thousandth of the wall took 40 times as many unknowns for 1e-6, with less than this elements are
 * only added. */
#define GROWTH 0.7

/* Halve the side opposite to every flat corner: the new side from the middle then divides the
 * corner. */
static utw_status divide_flat_corners(utw_mesh *mesh, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    unsigned char *marked;
    int any = 0;
    UTW_TRY_ALLOC(marked = utw_alloc((size_t)mesh->n_edge, 1));
    for (int t = 0; t < mesh->n_tri; t++)
        for (int k = 0; k < 3; k++) {
            const utw_triangle *tri = &mesh->tri[t];
            if (tri->curve[k] < 0 || tri->curve[(k + 2) % 3] < 0) continue;
            if (utw_mesh_corner_angle(mesh, tri, k) < FLAT_CORNER) continue;
            any = marked[tri->side[(k + 1) % 3]] = 1;
        }
    if (any) UTW_TRY(utw_mesh_halve(mesh, marked, err));
    st = UTW_OK;
done:
    utw_free(marked);
    return st;
}

double utw_mesh_triangle_quality(const utw_mesh *mesh, int t)
{
    utw_blend b;
    utw_blend_of(mesh, &mesh->tri[t], &b);
    if (!(utw_turn(b.x[0], b.x[1], b.x[2]) > 0)) return -1;
    return utw_blend_quality(&b);
}

double utw_mesh_quality(const utw_mesh *mesh)
{
    double worst = 1;
    for (int t = 0; t < mesh->n_tri; t++) worst = fmin(worst, utw_mesh_triangle_quality(mesh, t));
    return worst;
}

/* Halve the curved sides of elements that are bent too much: half the arc has a quarter of the
 * rise. */
static utw_status straighten(utw_mesh *mesh, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    unsigned char *marked = NULL;
    for (int pass = 0; pass < MOST_PASSES; pass++) {
        int any = 0;
        UTW_TRY_ALLOC(marked = utw_alloc((size_t)mesh->n_edge, 1));
        for (int t = 0; t < mesh->n_tri; t++) {
            const utw_triangle *tri = &mesh->tri[t];
            if (utw_mesh_triangle_quality(mesh, t) >= GOOD_QUALITY) continue;
            for (int k = 0; k < 3; k++)
                if (utw_mesh_is_curved(mesh, tri, k)) any = marked[tri->side[k]] = 1;
        }
        if (any) UTW_TRY(utw_mesh_halve(mesh, marked, err));
        utw_free(marked);
        marked = NULL;
        if (!any) break;
    }
    st = UTW_OK;
done:
    utw_free(marked);
    return st;
}

/* Shorter sides on the curves of elements that fold, for the next try; 0 when none of them lies on
 * one. */
static int shorten(const utw_mesh *mesh, double *finer)
{
    int any = 0;
    unsigned char *done = utw_alloc((size_t)mesh->net->n_edge, 1);
    if (done == NULL) return 0; /* the next try then is finer everywhere */
    for (int t = 0; t < mesh->n_tri; t++) {
        if (utw_mesh_triangle_quality(mesh, t) >= UTW_LEAST_QUALITY) continue;
        for (int k = 0; k < 3; k++) {
            const int edge = mesh->tri[t].curve[k];
            if (edge < 0 || done[edge]) continue;
            finer[edge] *= SHORTER;
            any = done[edge] = 1;
        }
    }
    utw_free(done);
    return any;
}

/* finer[n_edge]: shortened where elements fold; *local: 1 when that is worth another try. */
static utw_status try_once(const utw_net *net, double scale, double target, double *finer,
                           int *local, utw_mesh **mesh, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_division *division = NULL;
    utw_mesh *m = NULL;
    UTW_TRY(utw_division_create(net, scale, finer, &division, err));
    UTW_TRY(utw_mesh_triangulate(net, division, GROWTH * fmin(scale, 1), &m, err));
    UTW_TRY(divide_flat_corners(m, err));
    UTW_TRY(straighten(m, err));
    UTW_TRY(utw_mesh_add_layers(m, target, err));
    if (utw_mesh_quality(m) < UTW_LEAST_QUALITY) {
        *local = shorten(m, finer);
        st = utw_fail(
            err, UTW_E_MESH,
            "an element on a curve folds over; check the outline for walls of almost no thickness");
        goto done;
    }
    *mesh = m;
    m = NULL;
    st = UTW_OK;
done:
    utw_division_free(division);
    utw_mesh_free(m);
    return st;
}

utw_status utw_mesh_create(const utw_net *net, const utw_mesh_options *options, utw_mesh **mesh,
                           utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    double scale = options->scale, *finer;
    UTW_TRY_ALLOC(finer = utw_alloc((size_t)net->n_edge, sizeof *finer));
    for (int e = 0; e < net->n_edge; e++) finer[e] = 1;
    st = UTW_E_MESH;
    for (int i = 0; i < MOST_TRIES && st == UTW_E_MESH; i++) {
        int local = 0;
        st = try_once(net, scale, options->layer_target, finer, &local, mesh, err);
        /* shorter chords follow the curves more closely */
        if (!local || i >= MOST_LOCAL) scale *= SHORTER;
    }
done:
    utw_free(finer);
    return st;
}
