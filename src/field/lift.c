/* SPDX-License-Identifier: GPL-3.0-or-later
 * Running integrals of the particular flux along the boundary, as series of edge functions, closed
 * by the cuts. */
#include "field/lift.h"

#include <math.h>

#include "base/gauss.h"
#include "base/memory.h"
#include "base/status.h"

enum { TERMS = UTW_SERIES_TERMS, RULE = UTW_SERIES_MAX + 3 };

void utw_lift_free(utw_lift *lift)
{
    if (lift == NULL) return;
    utw_free(lift->corner);
    utw_free(lift->series_of);
    utw_free(lift->degree);
    utw_free(lift->series);
    utw_free(lift);
}

int utw_lift_rest(const utw_lift *lift, const utw_mesh *mesh, const utw_element *el, double r,
                  double s, const double *phi, const double *dphi, double (*d)[2])
{
    static const double lr[3] = {-1, 1, 0}, ls[3] = {-1, 0, 1};
    const utw_triangle *t = &mesh->tri[el->tri];
    const double l[3] = {1 - r - s, r, s};
    int any = 0;
    for (int k = 0; k < 3; k++) {
        const int row = lift->series_of[t->side[k]];
        if (row < 0 || lift->degree[row] <= el->side_order[k]) continue;
        if (!any)
            for (int c = 0; c < lift->n_column; c++) d[c][0] = d[c][1] = 0;
        any = 1;
        const int a = k, b = (k + 1) % 3, backward = t->node[a] > t->node[b];
        double own[2][TERMS];
        const double *f = phi == NULL ? own[0] : phi + k * TERMS,
                     *df = phi == NULL ? own[1] : dphi + k * TERMS;
        if (phi == NULL) utw_edge_kernels(lift->degree[row], l[b] - l[a], own[0], own[1]);
        const double product = l[a] * l[b], xr = lr[b] - lr[a], xs = ls[b] - ls[a];
        const double pr = lr[a] * l[b] + l[a] * lr[b], ps = ls[a] * l[b] + l[a] * ls[b];
        for (int c = 0; c < lift->n_column; c++) {
            const double *coef = lift->series + (size_t)(row * lift->n_column + c) * TERMS;
            double sum = 0, slope = 0;
            for (int m = el->side_order[k] + 1; m <= lift->degree[row]; m++) {
                const double q = backward && m % 2 == 1 ? -coef[m - 2] : coef[m - 2];
                sum += q * f[m - 2];
                slope += q * df[m - 2];
            }
            d[c][0] += pr * sum + product * slope * xr;
            d[c][1] += ps * sum + product * slope * xs;
        }
    }
    return any;
}

/* A boundary side as a curve over u in [0, 1] in the direction of its triangle (material on the
 * left). */
typedef struct boundary_side {
    const utw_curve *curve; /* NULL: straight from a to b */
    double t0, t1;
    const double *a, *b;
} boundary_side;

static boundary_side side_of(const utw_mesh *mesh, int tri, int k)
{
    const utw_triangle *t = &mesh->tri[tri];
    boundary_side s = {NULL, t->t[k][0], t->t[k][1], mesh->xy[t->node[k]],
                       mesh->xy[t->node[(k + 1) % 3]]};
    if (utw_mesh_is_curved(mesh, t, k)) s.curve = &mesh->net->edge[t->curve[k]].curve;
    return s;
}

static void side_at(const boundary_side *s, double u, double xy[2], double d[2])
{
    if (s->curve == NULL) {
        for (int k = 0; k < 2; k++) {
            xy[k] = s->a[k] + u * (s->b[k] - s->a[k]);
            d[k] = s->b[k] - s->a[k];
        }
        return;
    }
    const double t = s->t0 + u * (s->t1 - s->t0);
    utw_curve_point(s->curve, t, xy);
    utw_curve_d1(s->curve, t, d);
    d[0] *= s->t1 - s->t0;
    d[1] *= s->t1 - s->t0;
}

/* d chi/du = -(P . n) ds/du = P_y x' - P_x y', expanded in Legendre polynomials c_0 .. c_{degree-1}
 * of 2u-1 by a rule that is exact for the products kept. Returns c_0, the increment of chi over the
 * side. */
static double expand(const boundary_side *s, const utw_pair *pair, const double *x, const double *w,
                     int degree, int backward, double *series)
{
    double c[UTW_SERIES_MAX] = {0};
    for (int q = 0; q < RULE; q++) {
        double xy[2], d[2];
        side_at(s, x[q], xy, d);
        const double rate = utw_poly_at(pair->P[1], xy[0], xy[1]) * d[0] -
                            utw_poly_at(pair->P[0], xy[0], xy[1]) * d[1];
        const double z = 2 * x[q] - 1;
        double p0 = 0, p1 = 1;
        for (int k = 0; k < degree; k++) {
            c[k] += w[q] * (2 * k + 1) * rate * p1;
            const double p2 = ((2 * k + 1) * z * p1 - k * p0) / (k + 1);
            p0 = p1;
            p1 = p2;
        }
    }
    /* int_0^u P_k du' = 1/2 int P_k: the edge function of degree k+1 is -sqrt((2k+1)/2) int P_k;
     * odd ones change sign when the side runs from its higher to its lower node */
    for (int k = 1; k < degree; k++) {
        const double sign = backward && (k + 1) % 2 == 1 ? -1 : 1;
        series[k - 1] = -sign * 0.5 * c[k] / sqrt((2 * k + 1) / 2.0);
    }
    return c[0];
}

/* Terms at the end of a curved side's series that are only rounding are dropped. */
static int degree_needed(const utw_lift *l, int row)
{
    double greatest = 0;
    const double *series = l->series + (size_t)(row * l->n_column) * TERMS;
    for (int i = 0; i < l->n_column * TERMS; i++) greatest = fmax(greatest, fabs(series[i]));
    int degree = UTW_SERIES_MAX;
    for (; degree > 3; degree--)
        for (int c = 0; c < l->n_column; c++)
            if (fabs(series[c * TERMS + degree - 2]) > 1e-15 * greatest) return degree;
    return degree;
}

/* Series of all boundary sides; step[row][column] is the increment along the side in its triangle's
 * direction. */
static utw_status expand_sides(utw_lift *l, const utw_mesh *mesh, int n_pair, const utw_pair *pair,
                               double **step, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int rows = 0;
    double x[RULE], w[RULE];
    utw_gauss(RULE, x, w);
    for (int e = 0; e < mesh->n_edge; e++) l->series_of[e] = mesh->edge[e].tri[1] < 0 ? rows++ : -1;
    UTW_TRY_ALLOC(l->degree = utw_alloc((size_t)rows, sizeof(int)));
    UTW_TRY_ALLOC(l->series = utw_alloc((size_t)(rows * l->n_column) * TERMS, sizeof(double)));
    UTW_TRY_ALLOC(*step = utw_alloc((size_t)(rows * l->n_column), sizeof(double)));
    for (int e = 0; e < mesh->n_edge; e++) {
        const int row = l->series_of[e];
        if (row < 0) continue;
        const int tri = mesh->edge[e].tri[0], k = mesh->edge[e].slot[0];
        const boundary_side s = side_of(mesh, tri, k);
        const int backward = mesh->tri[tri].node[k] != mesh->edge[e].node[0];
        l->degree[row] = s.curve == NULL ? 3 : UTW_SERIES_MAX;
        for (int i = 0; i < n_pair; i++) {
            const int c = l->column[i];
            if (c < 0) continue;
            (*step)[row * l->n_column + c] =
                expand(&s, &pair[i], x, w, l->degree[row], backward,
                       l->series + (size_t)(row * l->n_column + c) * TERMS);
        }
        if (s.curve != NULL) l->degree[row] = degree_needed(l, row);
    }
    st = UTW_OK;
done:
    return st;
}

/* Flow along the cut of every hole for one column: what its own loop gives off and what its
 * children bring. */
static void collect_flows(const utw_rim *rim, const double *own, double *flow)
{
    for (int k = 0; k < rim->n_loop; k++) flow[k] = 0;
    for (int k = 0; k < rim->n_loop;
         k++) /* each loop's own flow passes through all its ancestors' cuts */
        for (int up = k; up > 0; up = rim->parent[up]) flow[up] += own[k];
}

/* Walk one loop: node values so that the corner values differ by the side's increment. Returns what
 * is left at the end. */
static double walk(utw_lift *l, const utw_mesh *mesh, const utw_rim *rim, const double *step,
                   int loop, int c, double *node_value)
{
    const int nc = l->n_column, start = rim->start[loop];
    double value = 0;
    int node = start;
    do {
        const int side = rim->leave[node], tri = side / 3, k = side % 3, kb = (k + 1) % 3;
        const int row = l->series_of[mesh->tri[tri].side[k]], next = mesh->tri[tri].node[kb];
        node_value[node] = value;
        value += step[row * nc + c] + l->corner[(tri * 3 + k) * nc + c] -
                 l->corner[(tri * 3 + kb) * nc + c];
        node = next;
    } while (node != start);
    return value;
}

static utw_status close_loops(utw_lift *l, const utw_mesh *mesh, const utw_rim *rim,
                              const double *step, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const int nc = l->n_column;
    double *own = NULL, *flow = NULL, *value = NULL;
    UTW_TRY_ALLOC(own = utw_alloc((size_t)rim->n_loop, sizeof(double)));
    UTW_TRY_ALLOC(flow = utw_alloc((size_t)rim->n_loop, sizeof(double)));
    UTW_TRY_ALLOC(value = utw_alloc((size_t)mesh->n_node, sizeof(double)));
    for (int c = 0; c < nc; c++) {
        double scale = 0;
        for (int k = 0; k < rim->n_loop; k++) own[k] = 0;
        for (int i = 0; i < mesh->n_node; i++) {
            value[i] = 0;
            if (rim->leave[i] < 0) continue;
            const double s =
                step[l->series_of[mesh->tri[rim->leave[i] / 3].side[rim->leave[i] % 3]] * nc + c];
            own[rim->loop[i]] += s;
            scale += fabs(s);
        }
        collect_flows(rim, own, flow);
        for (int i = 0; i < rim->n_cut; i++)
            l->corner[(rim->cut[i].tri * 3 + rim->cut[i].corner) * nc + c] +=
                flow[rim->cut[i].hole];
        for (int k = 0; k < rim->n_loop; k++) {
            const double left = walk(l, mesh, rim, step, k, c, value);
            if (!(fabs(left) <= 1e-10 * scale)) {
                st = utw_fail(err, UTW_E_INTERNAL,
                              "the flux through loop %d does not close (%g of %g)", k, left, scale);
                goto done;
            }
        }
        for (int t = 0; t < mesh->n_tri; t++)
            for (int k = 0; k < 3; k++)
                l->corner[(t * 3 + k) * nc + c] += value[mesh->tri[t].node[k]];
    }
    st = UTW_OK;
done:
    utw_free(own);
    utw_free(flow);
    utw_free(value);
    return st;
}

utw_status utw_lift_create(const utw_mesh *mesh, const utw_rim *rim, int n_pair,
                           const utw_pair *pair, utw_lift **lift, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    double *step = NULL;
    utw_lift *l;
    UTW_TRY_ALLOC(l = utw_alloc(1, sizeof *l));
    for (int i = 0; i < n_pair; i++) l->column[i] = pair[i].balanced ? l->n_column++ : -1;
    UTW_TRY_ALLOC(l->corner =
                      utw_alloc((size_t)(mesh->n_tri * 3) * (size_t)l->n_column, sizeof(double)));
    UTW_TRY_ALLOC(l->series_of = utw_alloc((size_t)mesh->n_edge, sizeof(int)));
    UTW_TRY(expand_sides(l, mesh, n_pair, pair, &step, err));
    UTW_TRY(close_loops(l, mesh, rim, step, err));
    *lift = l;
    l = NULL;
    st = UTW_OK;
done:
    utw_free(step);
    utw_lift_free(l);
    return st;
}
