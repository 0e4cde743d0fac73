/* SPDX-License-Identifier: GPL-3.0-or-later
 * The public calls of the thin-walled theory. */
#include "thinwall/thin.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "thinwall/cells.h"
#include "outline/contact.h"
#include "thinwall/flow.h"
#include "thinwall/sectorial.h"
#include "thinwall/theory.h"

static void count_nodes(utw_thin *thin)
{
    utw_thin_constants *k = &thin->constants;
    k->n_cells = thin->graph.n_cells;
    for (int i = 0; i < thin->graph.n_nodes; i++) {
        k->n_ends += thin->graph.degree[i] == 1;
        k->n_junctions += thin->graph.degree[i] > 2;
    }
}

/* Lengths like 1e-60 or 1e60 leave the range of a double in the sixth power. */
static utw_status check_range(const utw_thin *thin, utw_error *err)
{
    const utw_thin_constants *k = &thin->constants;
    const double all[] = {k->A,   k->length, k->xc,       k->yc,    k->Ixx,         k->Iyy, k->Ixy,
                          k->I1,  k->I2,     k->J,        k->Wt,    k->xs,          k->ys,  k->Iw,
                          k->Asx, k->Asy,    k->shear_xy, k->angle, k->Iw_secondary};
    int good = k->J_open > 1e-290 && k->A * pow(thin->size, 4) > 1e-260;
    for (size_t i = 0; i < sizeof all / sizeof all[0]; i++) good = good && isfinite(all[i]);
    if (good) return UTW_OK;
    return utw_fail(
        err, UTW_E_OUTLINE,
        "midline: its dimensions are too large or too small to compute with; use another "
        "unit of length");
}

utw_status utw_thin_solve(const utw_midline *midline, utw_thin **thin, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_thin *a = NULL;
    double origin[2];
    if (thin == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_thin_solve: nowhere to put the result (NULL)");
    UTW_TRY_ALLOC(a = utw_alloc(1, sizeof *a));
    if (midline != NULL && midline->n_walls > 0 && midline->n_walls <= UTW_GRAPH_MAX)
        UTW_TRY_ALLOC(a->paths = utw_alloc((size_t)midline->n_walls, sizeof *a->paths));
    UTW_TRY(utw_graph_paths(midline, a->paths, origin, &a->size, err));
    UTW_TRY(utw_contact_check(midline, a->paths, origin, a->size, err));
    UTW_TRY(utw_graph_init(midline, &a->graph, err));
    utw_path_rule_init(&a->rule);
    count_nodes(a);
    utw_theory_area(a, origin);
    UTW_TRY(utw_theory_points(a, err));
    UTW_TRY(utw_cells_factor(a, err));
    UTW_TRY(utw_theory_torsion(a, err));
    UTW_TRY(utw_flow_flexure(a, err));
    UTW_TRY(utw_sectorial(a, err));
    UTW_TRY(check_range(a, err));
    *thin = a;
    a = NULL;
    st = UTW_OK;
done:
    utw_thin_free(a);
    return st;
}

void utw_thin_free(utw_thin *thin)
{
    if (thin == NULL) return;
    utw_graph_clear(&thin->graph);
    utw_free(thin->paths);
    utw_free(thin->first);
    utw_free(thin->points);
    utw_free(thin->cell_matrix);
    utw_free(thin->bredt);
    for (int mode = 0; mode < UTW_FLOW_MODES; mode++) utw_free(thin->start[mode]);
    utw_free(thin->omega);
    utw_free(thin);
}

const utw_thin_constants *utw_thin_get(const utw_thin *thin)
{
    return &thin->constants;
}

/* Forces and moments turned into the frame: v[2], m[2]. */
static void load_in_frame(const utw_thin *thin, const utw_thin_load *load, double v[2], double m[2])
{
    const double c = thin->cos_frame, s = thin->sin_frame;
    v[0] = c * load->Vx + s * load->Vy;
    v[1] = c * load->Vy - s * load->Vx;
    m[0] = c * load->Mx + s * load->My;
    m[1] = c * load->My - s * load->Mx;
}

static utw_status check_load(const utw_thin *thin, const utw_thin_load *load, utw_error *err)
{
    const double all[] = {load->N,  load->Vx, load->Vy, load->Mx,
                          load->My, load->T,  load->Tw, load->B};
    for (size_t i = 0; i < sizeof all / sizeof all[0]; i++)
        if (!isfinite(all[i]))
            return utw_fail(err, UTW_E_LOAD, "the load holds a number that is not finite");
    if (!(thin->iw > 0) && (load->Tw != 0 || load->B != 0))
        return utw_fail(
            err, UTW_E_LOAD,
            "the midline does not warp (Iw = 0): it carries no bimoment and no warping torque");
    if (thin->constants.straight) {
        double v[2], m[2];
        load_in_frame(thin, load, v, m);
        /* across the line: V2 and M1 when the line is along axis 1, else V1 and M2; rounding of the
         * turn is let pass */
        const int across = thin->i22 > thin->i11 ? 1 : 0;
        if (fabs(v[across]) > 1e-12 * hypot(v[0], v[1]) ||
            fabs(m[1 - across]) > 1e-12 * hypot(m[0], m[1]))
            return utw_fail(
                err, UTW_E_LOAD,
                "all walls lie on one line: the midline carries no force across it and no moment "
                "about it");
    }
    return UTW_OK;
}

utw_status utw_thin_at(const utw_thin *thin, int wall, double u, const utw_thin_load *load,
                       utw_thin_station *station, utw_error *err)
{
    if (thin == NULL || load == NULL || station == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_thin_at: an argument is NULL");
    if (wall < 0 || wall >= thin->graph.n_walls)
        return utw_fail(err, UTW_E_ARGUMENT, "there is no wall %d; there are walls 0 to %d", wall,
                        thin->graph.n_walls - 1);
    if (!(u >= 0 && u <= 1))
        return utw_fail(err, UTW_E_ARGUMENT, "station %g lies off the wall; it goes from 0 to 1",
                        u);
    const utw_status st = check_load(thin, load, err);
    if (st != UTW_OK) return st;
    const utw_path *path = &thin->paths[wall];
    const utw_thin_constants *k = &thin->constants;
    const double s = u * path->length, c = thin->cos_frame, sine = thin->sin_frame;
    const double s_omega = load->Tw != 0 ? utw_sectorial_run(thin, wall, s) : 0;
    utw_path_point at;
    utw_path_run run;
    double v[2], m[2];
    utw_path_at(path, s, &at);
    utw_path_run_to(path, &thin->rule, s, &run);
    load_in_frame(thin, load, v, m);
    utw_thin_station out = {
        .x = thin->centroid[0] + c * at.x[0] - sine * at.x[1],
        .y = thin->centroid[1] + sine * at.x[0] + c * at.x[1],
        .tangent = {c * at.e[0] - sine * at.e[1], sine * at.e[0] + c * at.e[1]},
        .t = at.t,
        .omega = utw_sectorial_at(thin, wall, s),
    };
    out.q = v[0] * utw_flow_value(thin, UTW_FLOW_1, wall, &run, 0) +
            v[1] * utw_flow_value(thin, UTW_FLOW_2, wall, &run, 0) +
            load->T / k->J * thin->bredt[wall];
    if (load->Tw != 0) out.q += load->Tw * utw_flow_value(thin, UTW_FLOW_WARP, wall, &run, s_omega);
    /* int sigma x dA = -M2 and int sigma y dA = M1 grow like V1 and V2: the same coefficients */
    out.sigma = load->N / k->A;
    for (int i = 0; i < 2; i++)
        out.sigma +=
            (m[0] * thin->slope[UTW_FLOW_2][i] - m[1] * thin->slope[UTW_FLOW_1][i]) * at.x[i];
    if (load->B != 0) out.sigma += load->B * out.omega / thin->iw;
    out.tau = out.q / at.t;
    out.tau_left = out.tau - load->T * at.t / k->J;
    out.tau_right = out.tau + load->T * at.t / k->J;
    *station = out;
    return UTW_OK;
}
