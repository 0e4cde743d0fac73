/* SPDX-License-Identifier: GPL-3.0-or-later
 * Evaluating elements at the points of their lattices with tables of the shape functions. */
#include "draw/values.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"

enum { N_DENSITY = 6, LATTICE = UTW_CUTS_MAX + 1 };

/* The functions of one order at the points of one lattice, made when first asked for. */
typedef struct lattice_table {
    double *N, *Nr, *Ns; /* [points][functions], row j (n + 1) + i */
} lattice_table;

typedef struct lattice_tables {
    lattice_table table[UTW_ORDER_MAX + 1][N_DENSITY];
} lattice_tables;

static utw_status fill_table(lattice_table *t, int order, int n, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const size_t nf = (size_t)utw_n_functions(order), rows = (size_t)((n + 1) * (n + 1));
    UTW_TRY_ALLOC(t->N = utw_alloc(3 * rows * nf, sizeof *t->N));
    t->Nr = t->N + rows * nf;
    t->Ns = t->Nr + rows * nf;
    for (int j = 0; j <= n; j++)
        for (int i = 0; i + j <= n; i++) {
            const size_t row = (size_t)(j * (n + 1) + i) * nf;
            utw_basis(order, (double)i / n, (double)j / n, t->N + row, t->Nr + row, t->Ns + row);
        }
    st = UTW_OK;
done:
    return st;
}

static void free_tables(lattice_tables *tables)
{
    if (tables == NULL) return;
    for (int p = 0; p <= UTW_ORDER_MAX; p++)
        for (int d = 0; d < N_DENSITY; d++) utw_free(tables->table[p][d].N);
    utw_free(tables);
}

static double sum_of(int n, const double *c, const double *N)
{
    double sum = 0;
    for (int i = 0; i < n; i++) sum += c[i] * N[i];
    return sum;
}

/* omega alone costs a seventh of everything. */
static double omega_at(const utw_unit_element *e, double r, double s, const double *N)
{
    const utw_unit_stress *u = e->unit;
    double xy[2], J[4];
    utw_blend_at(&e->element.blend, r, s, xy, J);
    return sum_of(e->n, e->omega, N) + u->omega0 - u->shear_centre[1] * xy[0] +
           u->shear_centre[0] * xy[1];
}

/* Add the values of one element at its points; count[] says how many elements gave to a vertex. */
static utw_status add_element(utw_values *v, const utw_sampling *s, int tri,
                              const utw_unit_element *e, lattice_tables *tables, int *count,
                              utw_error *err)
{
    const int order = e->element.top, density = s->density[tri], n = 1 << density;
    lattice_table *t = &tables->table[order][density];
    if (t->N == NULL) {
        const utw_status st = fill_table(t, order, n, err);
        if (st != UTW_OK) return st;
    }
    for (int k = s->first[2 * tri]; k < s->first[2 * tri + 1]; k++) {
        const utw_sample_point *p = &s->point[k];
        const double r = (double)p->i / n, q = (double)p->j / n;
        const size_t row = (size_t)(p->j * (n + 1) + p->i) * (size_t)utw_n_functions(order);
        utw_unit_point point;
        count[p->vertex]++;
        if (v->tau == NULL) {
            v->omega[p->vertex] += omega_at(e, r, q, t->N + row);
            continue;
        }
        utw_unit_point_of(e, r, q, t->N + row, t->Nr + row, t->Ns + row, &point);
        v->omega[p->vertex] += point.omega;
        for (int f = 0; f < UTW_N_UNIT; f++)
            for (int d = 0; d < 2; d++)
                v->tau[p->vertex][f][d] +=
                    0.5 * (point.tau[UTW_BY_POTENTIAL][f][d] + point.tau[UTW_BY_FLUX][f][d]);
    }
    return UTW_OK;
}

utw_status utw_values_init(utw_values *v, const utw_sampling *s, const utw_unit_stress *unit,
                           int with_tau, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    lattice_tables *tables = NULL;
    utw_unit_element *e = NULL;
    int *count = NULL;
    memset(v, 0, sizeof *v);
    v->n = s->n_vertex;
    UTW_TRY_ALLOC(v->omega = utw_alloc((size_t)v->n, sizeof *v->omega));
    if (with_tau) UTW_TRY_ALLOC(v->tau = utw_alloc((size_t)v->n, sizeof *v->tau));
    UTW_TRY_ALLOC(count = utw_alloc((size_t)v->n, sizeof *count));
    UTW_TRY_ALLOC(tables = utw_alloc(1, sizeof *tables));
    UTW_TRY_ALLOC(e = utw_alloc(1, sizeof *e));
    for (int t = 0; t < s->mesh->n_tri; t++) {
        utw_unit_element_of(unit, t, e);
        UTW_TRY(add_element(v, s, t, e, tables, count, err));
    }
    for (int i = 0; i < v->n; i++) {
        v->omega[i] /= count[i];
        for (int f = 0; with_tau && f < UTW_N_UNIT; f++)
            for (int d = 0; d < 2; d++) v->tau[i][f][d] /= count[i];
    }
    st = UTW_OK;
done:
    free_tables(tables);
    utw_free(e);
    utw_free(count);
    if (st != UTW_OK) utw_values_clear(v);
    return st;
}

void utw_values_clear(utw_values *v)
{
    utw_free(v->omega);
    utw_free(v->tau);
    memset(v, 0, sizeof *v);
}
