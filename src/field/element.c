/* SPDX-License-Identifier: GPL-3.0-or-later
 * Stiffness and loads of one element: by reference matrices when its sides are straight, by
 * quadrature when not. */
#include "field/element.h"

#include <cblas.h>
#include <math.h>
#include <string.h>

#include "base/status.h"

enum { SIDE_KIND = 8, SIDE_STEP = 64, INTERIOR_KIND = 1024 };

void utw_element_of(const utw_mesh *mesh, int tri, int order, const int side_order[3],
                    utw_element *el)
{
    const utw_triangle *t = &mesh->tri[tri];
    int n = 0;
    el->tri = tri;
    el->order = el->top = order;
    for (; n < 3; n++) {
        el->kind[n] = n;
        el->sign[n] = 1;
    }
    for (int e = 0; e < 3; e++) {
        const int backward = t->node[e] > t->node[(e + 1) % 3];
        el->side_order[e] = side_order[e];
        if (side_order[e] > el->top) el->top = side_order[e];
        for (int k = 2; k <= side_order[e]; k++, n++) {
            el->kind[n] = SIDE_KIND + SIDE_STEP * e + k;
            el->sign[n] = backward && k % 2 == 1 ? -1 : 1;
        }
    }
    el->n_skeleton = n;
    el->n_interior = utw_n_interior(order);
    for (int j = 0; j < el->n_interior; j++, n++) {
        el->kind[n] = INTERIOR_KIND + j;
        el->sign[n] = 1;
    }
    el->n = n;
    utw_blend_of(mesh, t, &el->blend);
}

void utw_element_index(const utw_element *el, int p, int *index)
{
    for (int i = 0; i < el->n; i++) {
        const int kind = el->kind[i];
        if (kind < SIDE_KIND)
            index[i] = kind;
        else if (kind < INTERIOR_KIND)
            index[i] = utw_edge_function(p, (kind - SIDE_KIND) / SIDE_STEP,
                                         (kind - SIDE_KIND) % SIDE_STEP);
        else
            index[i] = 3 * p + kind - INTERIOR_KIND;
    }
}

/* A curved map is no polynomial: the more a side turns, the more points it takes to integrate to
 * rounding whatever the order. Measured on ring sectors; squares of quadratic fluxes need three
 * points on straight elements. */
int utw_element_points(const utw_element *el)
{
    const double turning = el->blend.turning;
    const int least = turning > 0.8 ? 13 : turning > 0.4 ? 10 : turning > 0.15 ? 8 : 3;
    const int q = el->top + (el->blend.any ? 2 : 1);
    return q < least ? least : q;
}

/* K = g11 R11 + g12 R12 + g22 R22: the metric of a straight triangle is constant. */
static utw_status straight_stiffness(const utw_element *el, utw_basis_store *store, double *K,
                                     utw_error *err)
{
    const utw_reference *f = utw_basis_reference(store, el->top);
    if (f == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    double xy[2], J[4];
    utw_blend_at(&el->blend, 0, 0, xy, J);
    const double det = J[0] * J[3] - J[1] * J[2];
    const double g11 = (J[1] * J[1] + J[3] * J[3]) / det, g22 = (J[0] * J[0] + J[2] * J[2]) / det;
    const double g12 = -(J[0] * J[1] + J[2] * J[3]) / det;
    int index[UTW_FUNCTIONS_MAX];
    utw_element_index(el, el->top, index);
    const int n = el->n;
    for (int i = 0; i < n; i++) {
        const double *R11 = f->R11 + index[i] * f->n, *R12 = f->R12 + index[i] * f->n,
                     *R22 = f->R22 + index[i] * f->n;
        for (int j = 0; j <= i; j++) {
            const int c = index[j];
            K[i * n + j] = el->sign[i] * el->sign[j] * (g11 * R11[c] + g12 * R12[c] + g22 * R22[c]);
        }
    }
    for (int i = 0; i < n; i++)
        for (int j = 0; j < i; j++) K[j * n + i] = K[i * n + j];
    return UTW_OK;
}

/* K = B B^T with the rows of B the weighted gradients at the points. */
static void curved_stiffness(const utw_element *el, const utw_map *map, double *K, double *B)
{
    const utw_table *t = map->table;
    int index[UTW_FUNCTIONS_MAX];
    utw_element_index(el, t->order, index);
    const int n = el->n;
    for (int k = 0; k < t->n_point; k++) {
        const double *J = map->J[k], root = sqrt(t->w[k] / map->det[k]);
        const double *Nr = t->Nr + k * t->n_function, *Ns = t->Ns + k * t->n_function;
        double *Bx = B + 2 * k * n, *By = Bx + n;
        for (int i = 0; i < n; i++) { /* grad N = J^-T (Nr, Ns), times sqrt(w det) */
            const double r = el->sign[i] * root * Nr[index[i]],
                         s = el->sign[i] * root * Ns[index[i]];
            Bx[i] = J[3] * r - J[2] * s;
            By[i] = J[0] * s - J[1] * r;
        }
    }
    cblas_dsyrk(CblasRowMajor, CblasLower, CblasTrans, n, 2 * t->n_point, 1, B, n, 0, K, n);
    for (int i = 0; i < n; i++)
        for (int j = 0; j < i; j++) K[j * n + i] = K[i * n + j];
}

utw_status utw_element_map(const utw_element *el, utw_basis_store *store, utw_map *map,
                           utw_error *err)
{
    const utw_table *t = map->table = utw_basis_table(store, utw_element_points(el));
    if (t == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    for (int k = 0; k < t->n_point; k++) {
        double *J = map->J[k];
        utw_blend_at(&el->blend, t->r[k], t->s[k], map->xy[k], J);
        map->det[k] = J[0] * J[3] - J[1] * J[2];
    }
    return UTW_OK;
}

utw_status utw_element_stiffness(const utw_element *el, utw_basis_store *store, const utw_map *map,
                                 double *K, double *work, utw_error *err)
{
    if (!el->blend.any) return straight_stiffness(el, store, K, err);
    curved_stiffness(el, map, K, work);
    return UTW_OK;
}

enum { LOADS_MAX = 2 * UTW_PAIR_MAX };

/* Loads as densities of Nr, Ns and N on the reference triangle: d[0], d[1] of g . J^-T (Nr, Ns) det
 * and d[2] of s N det, each [n_load] with stride `stride`. */
static void densities(int n_load, const utw_poly (*g)[2], int n_source, const utw_poly *s,
                      const double xy[2], const double J[4], double *const d[3], int stride)
{
    const double det = J[0] * J[3] - J[1] * J[2];
    for (int c = 0; c < n_load; c++) {
        const double gx = utw_poly_at(g[c][0], xy[0], xy[1]),
                     gy = utw_poly_at(g[c][1], xy[0], xy[1]);
        d[0][c * stride] = gx * J[3] - gy * J[1];
        d[1][c * stride] = gy * J[0] - gx * J[2];
        if (c < n_source) d[2][c * stride] = utw_poly_at(s[c], xy[0], xy[1]) * det;
    }
}

/* On a straight triangle the densities are quadratic: six values and the reference moments do. */
static utw_status straight_loads(const utw_element *el, utw_basis_store *store, int n_load,
                                 const utw_poly (*g)[2], int n_source, const utw_poly *s, double *F,
                                 utw_error *err)
{
    static const double at[6][2] = {{0, 0}, {1, 0}, {0, 1}, {0.5, 0}, {0.5, 0.5}, {0, 0.5}};
    const utw_reference *f = utw_basis_reference(store, el->top);
    if (f == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    double d[3][LOADS_MAX][6];
    for (int k = 0; k < 6; k++) {
        double xy[2], J[4], *const at_k[3] = {&d[0][0][k], &d[1][0][k], &d[2][0][k]};
        utw_blend_at(&el->blend, at[k][0], at[k][1], xy, J);
        densities(n_load, g, n_source, s, xy, J, at_k, 6);
    }
    int index[UTW_FUNCTIONS_MAX];
    utw_element_index(el, el->top, index);
    for (int c = 0; c < n_load; c++)
        for (int i = 0; i < el->n; i++) {
            double sum = 0;
            for (int k = 0; k < 6; k++) {
                const int m = k * f->n + index[i];
                sum += d[0][c][k] * f->Mr[m] + d[1][c][k] * f->Ms[m];
                if (c < n_source) sum += d[2][c][k] * f->M0[m];
            }
            F[c * el->n + i] = el->sign[i] * sum;
        }
    return UTW_OK;
}

static void curved_loads(const utw_element *el, const utw_map *map, int n_load,
                         const utw_poly (*g)[2], int n_source, const utw_poly *s, double *F,
                         double *work)
{
    const utw_table *t = map->table;
    const int np = t->n_point, nf = t->n_function;
    double *d[3] = {work, work + n_load * np, work + 2 * n_load * np},
           *full = work + 3 * n_load * np;
    for (int k = 0; k < np; k++) {
        double *const at_k[3] = {d[0] + k, d[1] + k, d[2] + k};
        densities(n_load, g, n_source, s, map->xy[k], map->J[k], at_k, np);
        for (int c = 0; c < n_load; c++) {
            d[0][c * np + k] *= t->w[k];
            d[1][c * np + k] *= t->w[k];
            if (c < n_source) d[2][c * np + k] *= t->w[k];
        }
    }
    cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasNoTrans, n_load, nf, np, 1, d[0], np, t->Nr, nf,
                0, full, nf);
    cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasNoTrans, n_load, nf, np, 1, d[1], np, t->Ns, nf,
                1, full, nf);
    cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasNoTrans, n_source, nf, np, 1, d[2], np, t->N, nf,
                1, full, nf);
    int index[UTW_FUNCTIONS_MAX];
    utw_element_index(el, t->order, index);
    for (int c = 0; c < n_load; c++)
        for (int i = 0; i < el->n; i++) F[c * el->n + i] = el->sign[i] * full[c * nf + index[i]];
}

utw_status utw_element_loads(const utw_element *el, utw_basis_store *store, const utw_map *map,
                             int n_load, const utw_poly (*g)[2], int n_source, const utw_poly *s,
                             double *F, double *work, utw_error *err)
{
    if (!el->blend.any) return straight_loads(el, store, n_load, g, n_source, s, F, err);
    curved_loads(el, map, n_load, g, n_source, s, F, work);
    return UTW_OK;
}
