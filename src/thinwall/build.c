/* SPDX-License-Identifier: GPL-3.0-or-later
 * The growing lists of nodes and walls, and what they become. */
#include "thinwall/build.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

#define CARRY                                                                                      \
    0.3 /* a thickness carried on beyond what was found may change by this much of itself */

utw_status utw_build_add_node(utw_build *b, const double p[2], int *index)
{
    void *array = b->node;
    if (utw_grow(&array, &b->node_capacity, (size_t)b->n_node + 1, sizeof *b->node) != 0)
        return utw_fail(b->err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    b->node = array;
    b->node[b->n_node][0] = p[0];
    b->node[b->n_node][1] = p[1];
    *index = b->n_node++;
    return UTW_OK;
}

utw_status utw_build_add_wall(utw_build *b, const utw_build_wall *wall)
{
    void *array = b->wall;
    if (utw_grow(&array, &b->wall_capacity, (size_t)b->n_wall + 1, sizeof *b->wall) != 0)
        return utw_fail(b->err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    b->wall = array;
    b->wall[b->n_wall++] = *wall;
    return UTW_OK;
}

void utw_build_clear(utw_build *b)
{
    utw_free(b->node);
    utw_free(b->wall);
    b->node = NULL;
    b->wall = NULL;
}

void utw_chord_middle(const utw_border *b, const utw_chord *chord, double m[2])
{
    for (int k = 0; k < 2; k++) m[k] = 0.5 * (b->xy[chord->left][k] + b->xy[chord->right][k]);
}

/* Thickness at a station beyond the path's ends. */
static double carried(const utw_path *path, double s)
{
    const double end = s < 0 ? path->t0 : path->t1;
    utw_path_point at;
    utw_path_at(path, s, &at);
    if (s >= 0 && s <= path->length) return at.t;
    return fmax((1 - CARRY) * end, fmin((1 + CARRY) * end, at.t));
}

/* Where a node lies along a wall. The node of a full circle lies at both its ends. */
static void stations(const utw_build *b, const utw_build_wall *w, double s[2])
{
    const utw_path *path = &w->path;
    s[0] = utw_path_foot(path, b->node[w->node[0]], 0);
    s[1] = utw_path_foot(path, b->node[w->node[1]], path->length);
    if (w->node[0] == w->node[1]) s[1] = s[0] + 2 * UTW_PI / fabs(path->kappa);
}

static void to_drawing(const utw_border *b, const double p[2], double q[2])
{
    for (int k = 0; k < 2; k++) q[k] = b->origin[k] + b->unit * p[k];
}

static utw_wall finished(const utw_build *b, const utw_build_wall *w)
{
    double s[2];
    stations(b, w, s);
    utw_wall out = {.from = w->node[0],
                    .to = w->node[1],
                    .t0 = b->border->unit * (w->bound ? w->path.t0 : carried(&w->path, s[0])),
                    .t1 = b->border->unit * (w->bound ? w->path.t1 : carried(&w->path, s[1]))};
    if (w->path.kappa != 0) {
        utw_path_point middle;
        utw_path_at(&w->path, 0.5 * (s[0] + s[1]), &middle);
        out.arc = 1;
        to_drawing(b->border, middle.x, out.mid);
    }
    return out;
}

/* Length along which a wall has two faces: what was found and what reaches into free ends; nothing
 * of what was put in at corners and junctions, all of a lump. */
static double faced_length(const utw_build *b, const utw_build_wall *w, const int *degree)
{
    double s[2];
    if (w->bound) return w->kind == UTW_WALL_LUMP ? w->path.length : 0;
    stations(b, w, s);
    double from = fmax(0, s[0]), to = fmin(w->path.length, s[1]);
    if (degree[w->node[0]] == 1) from = s[0];
    if (degree[w->node[1]] == 1) to = s[1];
    return fmax(0, to - from);
}

utw_status utw_build_finish(const utw_build *b, utw_midline *midline, utw_wall_kind **kind,
                            double **length)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = b->err;
    utw_midline made = {.n_nodes = b->n_node, .n_walls = b->n_wall};
    utw_wall_kind *kinds = NULL;
    double *lengths = NULL;
    int *degree = NULL;
    UTW_TRY_ALLOC(degree = utw_alloc((size_t)b->n_node, sizeof *degree));
    for (int i = 0; i < b->n_wall; i++)
        for (int e = 0; e < 2; e++) degree[b->wall[i].node[e]]++;
    UTW_TRY_ALLOC(made.nodes = utw_alloc((size_t)b->n_node, sizeof *made.nodes));
    UTW_TRY_ALLOC(made.walls = utw_alloc((size_t)b->n_wall, sizeof *made.walls));
    UTW_TRY_ALLOC(kinds = utw_alloc((size_t)b->n_wall, sizeof *kinds));
    UTW_TRY_ALLOC(lengths = utw_alloc((size_t)b->n_wall, sizeof *lengths));
    for (int i = 0; i < b->n_node; i++) to_drawing(b->border, b->node[i], made.nodes[i]);
    for (int i = 0; i < b->n_wall; i++) {
        made.walls[i] = finished(b, &b->wall[i]);
        kinds[i] = b->wall[i].kind;
        lengths[i] = b->border->unit * faced_length(b, &b->wall[i], degree);
    }
    *midline = made;
    *kind = kinds;
    *length = lengths;
    memset(&made, 0, sizeof made);
    kinds = NULL;
    lengths = NULL;
    st = UTW_OK;
done:
    utw_free(made.nodes);
    utw_free(made.walls);
    utw_free(kinds);
    utw_free(lengths);
    utw_free(degree);
    return st;
}
