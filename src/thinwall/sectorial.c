/* SPDX-License-Identifier: GPL-3.0-or-later
 * Sectorial coordinate on open and closed walls. */
#include "thinwall/sectorial.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "thinwall/flow.h"

/* omega(s) - omega(0): the cell flow's shear strain less the displacement along the wall of a turn
 * about the pole. */
static double rise(const utw_thin *thin, int wall, double s, double f)
{
    const utw_path *path = &thin->paths[wall];
    utw_path_point at;
    utw_path_at(path, s, &at);
    const double d[2] = {at.x[0] - path->p[0], at.x[1] - path->p[1]};
    return thin->bredt[wall] * f - (utw_path_sector(path, s) - utw_cross(thin->pole, d));
}

double utw_sectorial_at(const utw_thin *thin, int wall, double s)
{
    return thin->omega[thin->graph.from[wall]] +
           rise(thin, wall, s, utw_path_shear_length(&thin->paths[wall], s));
}

double utw_sectorial_run(const utw_thin *thin, int wall, double s)
{
    const utw_path *path = &thin->paths[wall];
    double sum = 0;
    for (int i = 0; i < utw_path_pieces(path); i++) {
        double range[2];
        utw_path_piece(path, i, range);
        if (range[0] >= s) break;
        const double h = fmin(range[1], s) - range[0];
        for (int g = 0; g < UTW_PATH_GAUSS; g++) {
            utw_path_point at;
            const double here = range[0] + h * thin->rule.x[g];
            utw_path_at(path, here, &at);
            sum += utw_sectorial_at(thin, wall, here) * at.t * h * thin->rule.w[g];
        }
    }
    return sum;
}

/* omega at the nodes from the root of the tree outward. Walls outside the tree close by the cell
 * equations. */
static void node_values(utw_thin *thin)
{
    const utw_graph *g = &thin->graph;
    thin->omega[g->order[0]] = 0;
    for (int k = 1; k < g->n_nodes; k++) {
        const int node = g->order[k], wall = g->parent_wall[node];
        const double s = thin->paths[wall].length;
        const double step = rise(thin, wall, s, utw_path_shear_length(&thin->paths[wall], s));
        thin->omega[node] =
            thin->omega[utw_graph_other(g, wall, node)] + (g->to[wall] == node ? step : -step);
    }
}

utw_status utw_sectorial(utw_thin *thin, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_graph *g = &thin->graph;
    utw_thin_constants *k = &thin->constants;
    UTW_TRY_ALLOC(thin->omega = utw_alloc((size_t)g->n_nodes, sizeof *thin->omega));
    node_values(thin);
    double mean = 0;
    for (int w = 0; w < g->n_walls; w++) mean += utw_sectorial_run(thin, w, thin->paths[w].length);
    mean /= thin->area;
    for (int i = 0; i < g->n_nodes; i++) thin->omega[i] -= mean;
    for (int w = 0; w < g->n_walls; w++) {
        for (int i = thin->first[w]; i < thin->first[w + 1]; i++) {
            utw_thin_point *p = &thin->points[i];
            p->omega = utw_sectorial_at(thin, w, p->s);
            p->s_omega = utw_sectorial_run(thin, w, p->s);
            k->Iw += p->omega * p->omega * p->at.t * p->ds;
            const double r[2] = {p->at.x[0] - thin->pole[0], p->at.x[1] - thin->pole[1]};
            const double rt = utw_dot(r, p->at.e), t = p->at.t;
            k->Iw_secondary += t * t * t / 12 * rt * rt * p->ds;
        }
    }
    const double noise = 1e-13 * thin->size * thin->size;
    if (k->Iw <= noise * noise * thin->area) k->Iw = 0;
    thin->iw = k->Iw;
    UTW_TRY(utw_flow_solve(thin, UTW_FLOW_WARP, err));
    st = UTW_OK;
done:
    return st;
}
