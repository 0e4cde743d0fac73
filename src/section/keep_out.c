/* SPDX-License-Identifier: GPL-3.0-or-later
 * Radii of the circles around sharp corners. */
#include "section/keep_out.h"

#include <math.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "mesh/walls.h"

/* Where on an edge, from its corner, the wall is looked at: beside the corner itself, where the
 * normal of the edge is still that of its wall. */
#define BESIDE 1e-3

void utw_keep_out_clear(utw_keep_out *k)
{
    utw_free(k->centre);
    utw_free(k->radius);
    *k = (utw_keep_out){0, NULL, NULL};
}

/* The thinner wall at a node, seen from the edges that end there. */
static double wall_at(const utw_net *net, const utw_walls *walls, int node)
{
    double least = UTW_INFINITY;
    for (int e = 0; e < net->n_edge; e++) {
        if (net->edge[e].from == node)
            least = fmin(least, utw_walls_thickness(walls, e, BESIDE, 0));
        if (net->edge[e].to == node)
            least = fmin(least, utw_walls_thickness(walls, e, 1 - BESIDE, 0));
    }
    return least;
}

static int nearest_node(const utw_net *net, const double xy[2])
{
    int best = 0;
    for (int i = 1; i < net->n_node; i++)
        if (utw_distance(net->node[i], xy) < utw_distance(net->node[best], xy)) best = i;
    return best;
}

utw_status utw_keep_out_init(utw_keep_out *k, const utw_solution *s, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_net *net = s->solved.net;
    utw_walls *walls = NULL;
    *k = (utw_keep_out){0, NULL, NULL};
    UTW_TRY_ALLOC(k->centre = utw_alloc((size_t)s->n_corner, sizeof *k->centre));
    UTW_TRY_ALLOC(k->radius = utw_alloc((size_t)s->n_corner, sizeof *k->radius));
    if (s->n_corner > 0) UTW_TRY(utw_walls_create(net, &walls, err));
    for (int i = 0; i < s->n_corner; i++) {
        const double at[2] = {(s->corner[i][0] - s->origin[0]) / s->unit,
                              (s->corner[i][1] - s->origin[1]) / s->unit};
        const int node = nearest_node(net, at);
        const double wall = wall_at(net, walls, node);
        k->centre[i][0] = net->node[node][0];
        k->centre[i][1] = net->node[node][1];
        k->radius[i] = UTW_KEEP_OUT * (wall < UTW_INFINITY ? wall : 1);
    }
    k->n = s->n_corner;
    st = UTW_OK;
done:
    utw_walls_free(walls);
    if (st != UTW_OK) utw_keep_out_clear(k);
    return st;
}

int utw_keep_out_holds(const utw_keep_out *k, const double xy[2])
{
    for (int i = 0; i < k->n; i++)
        if (utw_distance(k->centre[i], xy) < k->radius[i] * (1 - 1e-12)) return 1;
    return 0;
}
