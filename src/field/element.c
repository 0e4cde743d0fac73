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

/* On a quarter circle the map is no polynomial: ten points a direction integrate it to rounding
 * whatever the order. */
int utw_element_points(const utw_element *el)
{
    const int least = el->blend.any ? 10 : 3; /* squares of quadratic fluxes need three */
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
static utw_status curved_stiffness(const utw_element *el, utw_basis_store *store, double *K,
                                   double *B, utw_error *err)
{
    const utw_table *t = utw_basis_table(store, utw_element_points(el));
    if (t == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    int index[UTW_FUNCTIONS_MAX];
    utw_element_index(el, t->order, index);
    const int n = el->n;
    for (int k = 0; k < t->n_point; k++) {
        double xy[2], J[4];
        utw_blend_at(&el->blend, t->r[k], t->s[k], xy, J);
        const double det = J[0] * J[3] - J[1] * J[2], root = sqrt(t->w[k] / det);
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
    return UTW_OK;
}

utw_status utw_element_stiffness(const utw_element *el, utw_basis_store *store, double *K,
                                 double *work, utw_error *err)
{
    return el->blend.any ? curved_stiffness(el, store, K, work, err)
                         : straight_stiffness(el, store, K, err);
}

/* The loads as densities of Nr, Ns and N on the reference triangle: g . J^-T (Nr, Ns) det + s N
 * det. */
static void densities(int n_load, const utw_poly (*g)[2], const utw_poly *s, const double xy[2],
                      const double J[4], double (*d)[3])
{
    const double det = J[0] * J[3] - J[1] * J[2];
    for (int c = 0; c < n_load; c++) {
        const double gx = utw_poly_at(g[c][0], xy[0], xy[1]),
                     gy = utw_poly_at(g[c][1], xy[0], xy[1]);
        d[c][0] = gx * J[3] - gy * J[1];
        d[c][1] = gy * J[0] - gx * J[2];
        d[c][2] = s == NULL ? 0 : utw_poly_at(s[c], xy[0], xy[1]) * det;
    }
}

/* On a straight triangle the densities are quadratic: six values and the reference moments do. */
static utw_status straight_loads(const utw_element *el, utw_basis_store *store, int n_load,
                                 const utw_poly (*g)[2], const utw_poly *s, double *F,
                                 utw_error *err)
{
    static const double at[6][2] = {{0, 0}, {1, 0}, {0, 1}, {0.5, 0}, {0.5, 0.5}, {0, 0.5}};
    const utw_reference *f = utw_basis_reference(store, el->top);
    if (f == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    double d[6][UTW_PAIR_MAX][3];
    for (int k = 0; k < 6; k++) {
        double xy[2], J[4];
        utw_blend_at(&el->blend, at[k][0], at[k][1], xy, J);
        densities(n_load, g, s, xy, J, d[k]);
    }
    int index[UTW_FUNCTIONS_MAX];
    utw_element_index(el, el->top, index);
    for (int c = 0; c < n_load; c++)
        for (int i = 0; i < el->n; i++) {
            double sum = 0;
            for (int k = 0; k < 6; k++) {
                const int m = k * f->n + index[i];
                sum += d[k][c][0] * f->Mr[m] + d[k][c][1] * f->Ms[m];
                if (s != NULL) sum += d[k][c][2] * f->M0[m];
            }
            F[c * el->n + i] = el->sign[i] * sum;
        }
    return UTW_OK;
}

static utw_status curved_loads(const utw_element *el, utw_basis_store *store, int n_load,
                               const utw_poly (*g)[2], const utw_poly *s, double *F, utw_error *err)
{
    const utw_table *t = utw_basis_table(store, utw_element_points(el));
    if (t == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    int index[UTW_FUNCTIONS_MAX];
    utw_element_index(el, t->order, index);
    memset(F, 0, (size_t)(n_load * el->n) * sizeof *F);
    for (int k = 0; k < t->n_point; k++) {
        double xy[2], J[4], d[UTW_PAIR_MAX][3];
        utw_blend_at(&el->blend, t->r[k], t->s[k], xy, J);
        densities(n_load, g, s, xy, J, d);
        const double *N = t->N + k * t->n_function, *Nr = t->Nr + k * t->n_function,
                     *Ns = t->Ns + k * t->n_function;
        for (int c = 0; c < n_load; c++)
            for (int i = 0; i < el->n; i++) {
                const int m = index[i];
                F[c * el->n + i] +=
                    el->sign[i] * t->w[k] * (d[c][0] * Nr[m] + d[c][1] * Ns[m] + d[c][2] * N[m]);
            }
    }
    return UTW_OK;
}

utw_status utw_element_loads(const utw_element *el, utw_basis_store *store, int n_load,
                             const utw_poly (*g)[2], const utw_poly *s, double *F, utw_error *err)
{
    return el->blend.any ? curved_loads(el, store, n_load, g, s, F, err)
                         : straight_loads(el, store, n_load, g, s, F, err);
}
