/* SPDX-License-Identifier: GPL-3.0-or-later
 * Shear flows on a graph of walls. */
#include "thinwall/flow.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "thinwall/cells.h"

/* What the flow has gained since the wall's start: -int t d(sigma)/dz ds. */
static double gain(const utw_thin *thin, utw_flow_mode mode, const utw_path_run *run,
                   double s_omega)
{
    if (mode == UTW_FLOW_WARP) /* sigma = B omega/Iw and dB/dz = -T_omega */
        return thin->iw > 0 ? s_omega / thin->iw : 0;
    return -(thin->slope[mode][0] * run->moment[0] + thin->slope[mode][1] * run->moment[1]);
}

double utw_flow_value(const utw_thin *thin, utw_flow_mode mode, int wall, const utw_path_run *run,
                      double s_omega)
{
    return thin->start[mode][wall] + gain(thin, mode, run, s_omega);
}

/* The gain of the whole wall. Of the warping mode it is not at hand as a station, but follows from
 * the pieces' stations. */
static double whole_gain(const utw_thin *thin, utw_flow_mode mode, int wall)
{
    const utw_path *path = &thin->paths[wall];
    utw_path_run run;
    double s_omega = 0;
    utw_path_run_to(path, &thin->rule, path->length, &run);
    for (int i = thin->first[wall]; i < thin->first[wall + 1]; i++)
        s_omega += thin->points[i].omega * thin->points[i].at.t * thin->points[i].ds;
    return gain(thin, mode, &run, s_omega);
}

/* Flows at the walls' starts when every wall outside the tree starts with none: from the leaves to
 * the root, what arrives at a node leaves it through its tree wall. arriving[n_nodes] is scratch,
 * all zero. */
static void tree_flows(const utw_thin *thin, const double *gains, double *start, double *arriving)
{
    const utw_graph *g = &thin->graph;
    for (int w = 0; w < g->n_walls; w++) arriving[g->to[w]] += gains[w];
    for (int k = g->n_nodes - 1; k > 0; k--) {
        const int node = g->order[k], wall = g->parent_wall[node];
        const int parent = utw_graph_other(g, wall, node);
        /* raising the start flow of `wall` raises the flow at both its ends */
        start[wall] = g->from[wall] == node ? arriving[node] : -arriving[node];
        arriving[parent] += arriving[node];
    }
}

utw_status utw_flow_solve(utw_thin *thin, utw_flow_mode mode, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const size_t walls = (size_t)thin->graph.n_walls;
    double *gains = NULL, *arriving = NULL, *gap = NULL;
    UTW_TRY_ALLOC(gains = utw_alloc(walls, sizeof *gains));
    UTW_TRY_ALLOC(gap = utw_alloc(walls, sizeof *gap));
    UTW_TRY_ALLOC(arriving = utw_alloc((size_t)thin->graph.n_nodes, sizeof *arriving));
    UTW_TRY_ALLOC(thin->start[mode] = utw_alloc(walls, sizeof(double)));
    for (int w = 0; w < thin->graph.n_walls; w++) gains[w] = whole_gain(thin, mode, w);
    tree_flows(thin, gains, thin->start[mode], arriving);
    for (int w = 0; w < thin->graph.n_walls; w++) {
        for (int i = thin->first[w]; i < thin->first[w + 1]; i++) {
            const utw_thin_point *p = &thin->points[i];
            gap[w] -= utw_flow_value(thin, mode, w, &p->run, p->s_omega) / p->at.t * p->ds;
        }
    }
    UTW_TRY(utw_cells_close(thin, gap, thin->start[mode], err));
    st = UTW_OK;
done:
    utw_free(gains);
    utw_free(arriving);
    utw_free(gap);
    return st;
}

/* d(sigma)/dz = b x + a y with int (b x + a y) y dA = V2 and int (b x + a y) x dA = V1: the shear
 * forces are the rates of the moments. Walls on one line carry only the force along it. */
static void stress_rates(utw_thin *thin)
{
    const double d = thin->i11 * thin->i22 - thin->i12 * thin->i12;
    if (thin->constants.straight) {
        if (thin->i22 > thin->i11)
            thin->slope[UTW_FLOW_1][0] = 1 / thin->i22;
        else
            thin->slope[UTW_FLOW_2][1] = 1 / thin->i11;
        return;
    }
    thin->slope[UTW_FLOW_1][0] = thin->i11 / d;
    thin->slope[UTW_FLOW_1][1] = thin->slope[UTW_FLOW_2][0] = -thin->i12 / d;
    thin->slope[UTW_FLOW_2][1] = thin->i22 / d;
}

/* Walls on one line have no flow across it. Their torsion and flexure do no work on one another
 * (Trefftz 1935) when int n^2 (s - s0) dA = 0 over the wall's thickness: the pole is the
 * t^3-weighted mean of the line. */
static void straight_pole(utw_thin *thin)
{
    double weight = 0, moment[2] = {0, 0};
    for (int i = 0; i < thin->first[thin->graph.n_walls]; i++) {
        const utw_thin_point *p = &thin->points[i];
        const double t3 = p->at.t * p->at.t * p->at.t * p->ds;
        weight += t3;
        for (int k = 0; k < 2; k++) moment[k] += t3 * p->at.x[k];
    }
    for (int k = 0; k < 2; k++) thin->pole[k] = moment[k] / weight;
}

/* Shear areas in the drawing's axes from the flexibilities a[0] = 11, a[1] = 22, a[2] = 12 of the
 * frame. */
static void shear_areas(utw_thin *thin, const double a[3])
{
    utw_thin_constants *k = &thin->constants;
    const double c = thin->cos_frame, s = thin->sin_frame;
    if (k->straight) { /* finite only for a force exactly along the line */
        const int along1 = thin->i22 > thin->i11;
        if (s == 0) {
            k->Asx = along1 ? 1 / a[0] : 0;
            k->Asy = along1 ? 0 : 1 / a[1];
        }
        return;
    }
    /* a force along x is (c, -s) in the frame, one along y is (s, c) */
    k->Asx = 1 / (c * c * a[0] - 2 * c * s * a[2] + s * s * a[1]);
    k->Asy = 1 / (s * s * a[0] + 2 * c * s * a[2] + c * c * a[1]);
    k->shear_xy = c * s * (a[0] - a[1]) + (c * c - s * s) * a[2];
}

utw_status utw_flow_flexure(utw_thin *thin, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_thin_constants *k = &thin->constants;
    double moment[2] = {0, 0}, energy[3] = {0, 0, 0};
    stress_rates(thin);
    UTW_TRY(utw_flow_solve(thin, UTW_FLOW_1, err));
    UTW_TRY(utw_flow_solve(thin, UTW_FLOW_2, err));
    for (int w = 0; w < thin->graph.n_walls; w++) {
        for (int i = thin->first[w]; i < thin->first[w + 1]; i++) {
            const utw_thin_point *p = &thin->points[i];
            const double q1 = utw_flow_value(thin, UTW_FLOW_1, w, &p->run, 0);
            const double q2 = utw_flow_value(thin, UTW_FLOW_2, w, &p->run, 0);
            const double lever = utw_cross(p->at.x, p->at.e), dt = p->ds / p->at.t;
            moment[0] += q1 * lever * p->ds;
            moment[1] += q2 * lever * p->ds;
            energy[0] += q1 * q1 * dt;
            energy[1] += q2 * q2 * dt;
            energy[2] += q1 * q2 * dt;
        }
    }
    /* moment of the flows = x_s V2 - y_s V1 */
    thin->pole[0] = moment[1];
    thin->pole[1] = -moment[0];
    if (k->straight) straight_pole(thin);
    k->xs = thin->centroid[0] + thin->cos_frame * thin->pole[0] - thin->sin_frame * thin->pole[1];
    k->ys = thin->centroid[1] + thin->sin_frame * thin->pole[0] + thin->cos_frame * thin->pole[1];
    shear_areas(thin, energy);
    st = UTW_OK;
done:
    return st;
}
