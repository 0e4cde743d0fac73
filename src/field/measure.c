/* SPDX-License-Identifier: GPL-3.0-or-later
 * Evaluating solutions: integrals over all elements, and values at points. */
#include <cblas.h>
#include <math.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "field/field.h"

/* Coefficients of an element put in the order of a table's functions: C[2 n_pair][n_function]. */
static void spread(const utw_field *f, const utw_element *el, int order, double *C)
{
    const int m = 2 * f->setting.n_pair, nf = utw_n_functions(order);
    const double *U = f->coef + f->first[el->tri];
    int index[UTW_FUNCTIONS_MAX];
    utw_element_index(el, order, index);
    memset(C, 0, (size_t)(m * nf) * sizeof *C);
    for (int i = 0; i < m; i++)
        for (int j = 0; j < el->n; j++) C[i * nf + index[j]] = U[i * el->n + j];
}

/* Everything at one point, from the derivatives by r and s: k grad u in p, k P + curl chi in q, the
 * not balanced k P in pi. */
typedef struct point_values {
    double p[UTW_PAIR_MAX][2], q[UTW_PAIR_MAX][2], pi[UTW_PAIR_MAX][2];
} point_values;

static double conductivity(const utw_field *f, int tri)
{
    return f->setting.conductivity == NULL
               ? 1
               : f->setting.conductivity[f->setting.mesh->tri[tri].part];
}

static double axial(const utw_field *f, int tri)
{
    return f->setting.axial == NULL ? conductivity(f, tri)
                                    : f->setting.axial[f->setting.mesh->tri[tri].part];
}

static void transform(const utw_field *f, const utw_element *el, const double xy[2],
                      const double J[4], double r, double s, const double *phi, const double *dphi,
                      const double *dr, const double *ds, point_values *v)
{
    const utw_setting *set = &f->setting;
    const int np = set->n_pair;
    const double det = J[0] * J[3] - J[1] * J[2], k = conductivity(f, el->tri);
    double rest[UTW_PAIR_MAX][2];
    const int any = utw_lift_rest(set->lift, set->mesh, el, r, s, phi, dphi, rest);
    for (int i = 0; i < np; i++) {
        const utw_pair *pair = &set->pair[i];
        const double Px = k * utw_poly_at(pair->P[0], xy[0], xy[1]),
                     Py = k * utw_poly_at(pair->P[1], xy[0], xy[1]);
        double cr = dr[np + i], cs = ds[np + i];
        if (any && set->lift->column[i] >= 0) {
            cr += rest[set->lift->column[i]][0];
            cs += rest[set->lift->column[i]][1];
        }
        v->p[i][0] = k * (J[3] * dr[i] - J[2] * ds[i]) / det;
        v->p[i][1] = k * (J[0] * ds[i] - J[1] * dr[i]) / det;
        v->q[i][0] = Px + (J[0] * cs - J[1] * cr) / det; /* chi_y */
        v->q[i][1] = Py - (J[3] * cr - J[2] * cs) / det; /* -chi_x */
        v->pi[i][0] = pair->balanced ? 0 : Px;
        v->pi[i][1] = pair->balanced ? 0 : Py;
    }
}

static void accumulate(const point_values *v, int np, double weight, utw_measures *m)
{
    for (int i = 0; i < np; i++) {
        const double ei[2] = {v->p[i][0] - v->q[i][0], v->p[i][1] - v->q[i][1]};
        const double si[2] = {v->p[i][0] - v->pi[i][0], v->p[i][1] - v->pi[i][1]};
        for (int j = 0; j <= i; j++) {
            m->energy[i][j] += weight * (v->p[i][0] * v->p[j][0] + v->p[i][1] * v->p[j][1]);
            m->stress[i][j] +=
                weight * (si[0] * (v->p[j][0] - v->pi[j][0]) + si[1] * (v->p[j][1] - v->pi[j][1]));
            m->gap[i][j] +=
                weight * (ei[0] * (v->p[j][0] - v->q[j][0]) + ei[1] * (v->p[j][1] - v->q[j][1]));
        }
    }
}

typedef struct scratch {
    double *C, *dr, *ds, *u;
    utw_map map;
} scratch;

static utw_status measure_element(const utw_field *f, const utw_element *el, scratch *w,
                                  utw_measures *m, double *peak, utw_error *err)
{
    const utw_status st = utw_element_map(el, f->setting.store, &w->map, err);
    if (st != UTW_OK) return st;
    const utw_table *t = w->map.table;
    const int np = f->setting.n_pair, c = 2 * np, nf = t->n_function;
    const double k = conductivity(f, el->tri), e = axial(f, el->tri);
    double greatest = 0;
    spread(f, el, t->order, w->C);
    cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasTrans, t->n_point, c, nf, 1, t->Nr, nf, w->C, nf,
                0, w->dr, c);
    cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasTrans, t->n_point, c, nf, 1, t->Ns, nf, w->C, nf,
                0, w->ds, c);
    cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasTrans, t->n_point, np, nf, 1, t->N, nf, w->C, nf,
                0, w->u, np);
    for (int q = 0; q < t->n_point; q++) {
        point_values v;
        const double dA = t->w[q] * w->map.det[q];
        transform(f, el, w->map.xy[q], w->map.J[q], t->r[q], t->s[q],
                  t->phi + q * 3 * UTW_SERIES_TERMS, t->dphi + q * 3 * UTW_SERIES_TERMS,
                  w->dr + q * c, w->ds + q * c, &v);
        accumulate(&v, np, dA / k, m);
        const double sx = 0.5 * (v.p[0][0] + v.q[0][0]) - v.pi[0][0],
                     sy = 0.5 * (v.p[0][1] + v.q[0][1]) - v.pi[0][1];
        greatest = fmax(greatest, sx * sx + sy * sy);
        m->area += dA;
        for (int i = 0; i < np; i++) {
            m->mean[i] += e * dA * w->u[q * np + i];
            m->product[i] += e * dA * w->u[q * np + i] * w->u[q * np];
        }
    }
    *peak = sqrt(greatest);
    return UTW_OK;
}

static void add(utw_measures *total, const utw_measures *part, int np)
{
    total->area += part->area;
    for (int i = 0; i < np; i++) {
        total->mean[i] += part->mean[i];
        total->product[i] += part->product[i];
        for (int j = 0; j <= i; j++) {
            total->energy[i][j] += part->energy[i][j];
            total->stress[i][j] += part->stress[i][j];
            total->gap[i][j] += part->gap[i][j];
        }
    }
}

utw_status utw_field_measure(const utw_field *f, utw_measures *measures, double *share,
                             double *peak, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const int np = f->setting.n_pair;
    const size_t points = UTW_POINTS_MAX * UTW_POINTS_MAX, columns = 2 * (size_t)np;
    scratch w = {.C = NULL};
    utw_measures total;
    memset(&total, 0, sizeof total);
    UTW_TRY_ALLOC(w.C = utw_alloc(columns * UTW_FUNCTIONS_MAX, sizeof(double)));
    UTW_TRY_ALLOC(w.dr = utw_alloc(columns * points, sizeof(double)));
    UTW_TRY_ALLOC(w.ds = utw_alloc(columns * points, sizeof(double)));
    UTW_TRY_ALLOC(w.u = utw_alloc(columns * points, sizeof(double)));
    for (int t = 0; t < f->setting.mesh->n_tri; t++) {
        utw_element el;
        utw_measures m;
        memset(&m, 0, sizeof m);
        utw_field_element(f, t, &el);
        double greatest = 0;
        UTW_TRY(measure_element(f, &el, &w, &m, &greatest, err));
        if (peak != NULL) peak[t] = greatest;
        add(&total, &m, np);
        if (share != NULL)
            for (int i = 0; i < np; i++) share[t * np + i] = m.gap[i][i];
    }
    for (int i = 0; i < np; i++)
        for (int j = 0; j < i; j++) {
            total.energy[j][i] = total.energy[i][j];
            total.stress[j][i] = total.stress[i][j];
            total.gap[j][i] = total.gap[i][j];
        }
    *measures = total;
    st = UTW_OK;
done:
    utw_free(w.C);
    utw_free(w.dr);
    utw_free(w.ds);
    utw_free(w.u);
    return st;
}

void utw_field_at(const utw_field *f, int t, double r, double s, double xy[2], double *u,
                  double (*p)[2], double (*q)[2])
{
    const int np = f->setting.n_pair, m = 2 * np;
    double N[UTW_FUNCTIONS_MAX], Nr[UTW_FUNCTIONS_MAX], Ns[UTW_FUNCTIONS_MAX], J[4];
    double dr[2 * UTW_PAIR_MAX] = {0}, ds[2 * UTW_PAIR_MAX] = {0};
    int index[UTW_FUNCTIONS_MAX];
    utw_element el;
    point_values v;
    utw_field_element(f, t, &el);
    utw_element_index(&el, el.top, index);
    utw_basis(el.top, r, s, N, Nr, Ns);
    utw_blend_at(&el.blend, r, s, xy, J);
    const double *U = f->coef + f->first[t];
    for (int i = 0; i < m; i++) {
        double value = 0;
        for (int j = 0; j < el.n; j++) {
            const double c = U[i * el.n + j];
            value += c * N[index[j]];
            dr[i] += c * Nr[index[j]];
            ds[i] += c * Ns[index[j]];
        }
        if (u != NULL && i < np) u[i] = value;
    }
    transform(f, &el, xy, J, r, s, NULL, NULL, dr, ds, &v);
    if (p != NULL) memcpy(p, v.p, (size_t)np * sizeof *p);
    if (q != NULL) memcpy(q, v.q, (size_t)np * sizeof *q);
}
