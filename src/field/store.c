/* SPDX-License-Identifier: GPL-3.0-or-later
 * Tables of the shape functions at quadrature points and the matrices of straight-sided elements.
 */
#include <cblas.h>

#include "base/gauss.h"
#include "base/memory.h"
#include "base/status.h"
#include "field/basis.h"

struct utw_basis_store {
    utw_table *table[UTW_POINTS_MAX + 1];
    utw_reference *reference[UTW_ORDER_MAX + 1];
};

static void table_free(utw_table *t)
{
    if (t == NULL) return;
    utw_free(t->r);
    utw_free(t->s);
    utw_free(t->w);
    utw_free(t->N);
    utw_free(t->Nr);
    utw_free(t->Ns);
    utw_free(t->phi);
    utw_free(t->dphi);
    utw_free(t);
}

static void reference_free(utw_reference *f)
{
    if (f == NULL) return;
    utw_free(f->R11);
    utw_free(f->R12);
    utw_free(f->R22);
    utw_free(f->Mr);
    utw_free(f->Ms);
    utw_free(f->M0);
    utw_free(f);
}

utw_status utw_basis_store_create(utw_basis_store **store, utw_error *err)
{
    utw_basis_store *s = utw_alloc(1, sizeof *s);
    if (s == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    *store = s;
    return UTW_OK;
}

void utw_basis_store_free(utw_basis_store *store)
{
    if (store == NULL) return;
    for (int q = 0; q <= UTW_POINTS_MAX; q++) table_free(store->table[q]);
    for (int p = 0; p <= UTW_ORDER_MAX; p++) reference_free(store->reference[p]);
    utw_free(store);
}

static utw_table *table_create(int q)
{
    utw_table *t = utw_alloc(1, sizeof *t);
    if (t == NULL) return NULL;
    t->q = q;
    t->order = q - 1 < 1 ? 1 : q - 1 > UTW_ORDER_MAX ? UTW_ORDER_MAX : q - 1;
    t->n_point = q * q;
    t->n_function = utw_n_functions(t->order);
    const size_t points = (size_t)t->n_point, all = points * (size_t)t->n_function;
    t->r = utw_alloc(points, sizeof(double));
    t->s = utw_alloc(points, sizeof(double));
    t->w = utw_alloc(points, sizeof(double));
    t->N = utw_alloc(all, sizeof(double));
    t->Nr = utw_alloc(all, sizeof(double));
    t->Ns = utw_alloc(all, sizeof(double));
    t->phi = utw_alloc(points * 3 * UTW_SERIES_TERMS, sizeof(double));
    t->dphi = utw_alloc(points * 3 * UTW_SERIES_TERMS, sizeof(double));
    if (!t->r || !t->s || !t->w || !t->N || !t->Nr || !t->Ns || !t->phi || !t->dphi) {
        table_free(t);
        return NULL;
    }
    double x[UTW_GAUSS_MAX], w[UTW_GAUSS_MAX];
    utw_gauss(q, x, w);
    for (int j = 0; j < q; j++)
        for (int i = 0; i < q; i++) { /* the square collapsed onto the triangle, Jacobian 1 - s */
            const int k = j * q + i;
            const size_t row = (size_t)k * (size_t)t->n_function;
            t->s[k] = x[j];
            t->r[k] = x[i] * (1 - x[j]);
            t->w[k] = w[i] * w[j] * (1 - x[j]);
            utw_basis(t->order, t->r[k], t->s[k], t->N + row, t->Nr + row, t->Ns + row);
            const double l[3] = {1 - t->r[k] - t->s[k], t->r[k], t->s[k]};
            for (int e = 0; e < 3; e++) {
                double *phi = t->phi + (3 * k + e) * UTW_SERIES_TERMS;
                utw_edge_kernels(UTW_SERIES_MAX, l[(e + 1) % 3] - l[e], phi,
                                 t->dphi + (phi - t->phi));
            }
        }
    return t;
}

const utw_table *utw_basis_table(utw_basis_store *store, int q)
{
    if (store->table[q] == NULL) store->table[q] = table_create(q);
    return store->table[q];
}

/* The six quadratic Lagrange functions. */
static void quadratic(double r, double s, double L[6])
{
    const double l0 = 1 - r - s;
    L[0] = l0 * (2 * l0 - 1);
    L[1] = r * (2 * r - 1);
    L[2] = s * (2 * s - 1);
    L[3] = 4 * l0 * r;
    L[4] = 4 * r * s;
    L[5] = 4 * s * l0;
}

/* out[n][n] = A^T B for A, B [n_point][stride], of which the first n columns count. */
static void product(const double *A, const double *B, int n_point, int stride, int n, double *out)
{
    cblas_dgemm(CblasRowMajor, CblasTrans, CblasNoTrans, n, n, n_point, 1, A, stride, B, stride, 0,
                out, n);
}

/* Degree of the integrands: 2(p-1) for R, p+2 for M0: p+1 points a direction do for p >= 2, three
 * for p = 1. The functions of order p come first in the table: it has order p, or for p = 1 order
 * 2, where the vertices come first. */
static utw_status reference_fill(utw_reference *f, const utw_table *t)
{
    const int n = f->n, nf = t->n_function, points = t->n_point;
    double *weighted = utw_alloc(2 * (size_t)(points * nf), sizeof(double)),
           *L = utw_alloc(6 * (size_t)points, sizeof(double));
    if (weighted == NULL || L == NULL) {
        utw_free(weighted);
        utw_free(L);
        return UTW_E_NOMEM;
    }
    double *Wr = weighted, *Ws = weighted + points * nf;
    for (int k = 0; k < points; k++) {
        quadratic(t->r[k], t->s[k], L + 6 * k);
        for (int a = 0; a < nf; a++) {
            Wr[k * nf + a] = t->w[k] * t->Nr[k * nf + a];
            Ws[k * nf + a] = t->w[k] * t->Ns[k * nf + a];
        }
    }
    product(Wr, t->Nr, points, nf, n, f->R11);
    product(Wr, t->Ns, points, nf, n, f->R12);
    product(Ws, t->Ns, points, nf, n, f->R22);
    for (int a = 0; a < n; a++)
        for (int b = 0; b <= a; b++)
            f->R12[a * n + b] = f->R12[b * n + a] = f->R12[a * n + b] + f->R12[b * n + a];
    cblas_dgemm(CblasRowMajor, CblasTrans, CblasNoTrans, 6, n, points, 1, L, 6, Wr, nf, 0, f->Mr,
                n);
    cblas_dgemm(CblasRowMajor, CblasTrans, CblasNoTrans, 6, n, points, 1, L, 6, Ws, nf, 0, f->Ms,
                n);
    for (int k = 0; k < points; k++)
        for (int a = 0; a < nf; a++) Wr[k * nf + a] = t->w[k] * t->N[k * nf + a];
    cblas_dgemm(CblasRowMajor, CblasTrans, CblasNoTrans, 6, n, points, 1, L, 6, Wr, nf, 0, f->M0,
                n);
    utw_free(weighted);
    utw_free(L);
    return UTW_OK;
}

const utw_reference *utw_basis_reference(utw_basis_store *store, int p)
{
    if (store->reference[p] != NULL) return store->reference[p];
    const utw_table *t = utw_basis_table(store, p + 1 < 3 ? 3 : p + 1);
    utw_reference *f = utw_alloc(1, sizeof *f);
    if (t == NULL || f == NULL) {
        utw_free(f);
        return NULL;
    }
    f->p = p;
    f->n = utw_n_functions(p);
    const size_t n = (size_t)f->n;
    f->R11 = utw_alloc(n * n, sizeof(double));
    f->R12 = utw_alloc(n * n, sizeof(double));
    f->R22 = utw_alloc(n * n, sizeof(double));
    f->Mr = utw_alloc(6 * n, sizeof(double));
    f->Ms = utw_alloc(6 * n, sizeof(double));
    f->M0 = utw_alloc(6 * n, sizeof(double));
    if (!f->R11 || !f->R12 || !f->R22 || !f->Mr || !f->Ms || !f->M0 ||
        reference_fill(f, t) != UTW_OK) {
        reference_free(f);
        return NULL;
    }
    store->reference[p] = f;
    return f;
}
