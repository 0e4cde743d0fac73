/* SPDX-License-Identifier: GPL-3.0-or-later
 * Assembling, condensing and solving the potentials (free boundary) and the fluxes' chi (boundary
 * known up to a constant a loop). Both problems share the element matrices: they are made and
 * condensed once. */
#include <cblas.h>
#include <string.h>

#include "base/clock.h"
#include "base/lapack.h"
#include "base/memory.h"
#include "base/status.h"
#include "field/field.h"
#include "field/system.h"

/* What recovering the interior unknowns of one element needs: the factor L of K_ii, W = L^-1 K_is,
 * G = L^-1 F_i. */
typedef struct condensed {
    size_t at; /* into `kept`: L [ni][ni], W [ns][ni] (column-major of W^T), G [2 n_pair][ni] */
} condensed;

typedef struct solver {
    const utw_setting *set;
    utw_field *field;
    utw_system *system[2]; /* free, clamped */
    double *rhs[2];        /* [n_pair][unknowns] */
    condensed *element;    /* [n_tri] */
    double *kept;
    size_t n_kept, capacity;
    utw_poly load[2 * UTW_PAIR_MAX][2], source[UTW_PAIR_MAX];
    /* of the element at hand */
    utw_map map;
    double *K, *F, *work, *known;
} solver;

enum { FREE, CLAMPED };

static int n_pairs(const solver *s)
{
    return s->set->n_pair;
}

static double conductivity(const utw_setting *set, int tri)
{
    return set->conductivity == NULL ? 1 : set->conductivity[set->mesh->tri[tri].part];
}

/* ---- unknowns in blocks
 * ---------------------------------------------------------------------------- */

/* Block of a node: itself; in the clamped problem boundary nodes are known, and those of a hole
 * share one constant. */
static int node_block(const solver *s, int which, int node)
{
    const utw_mesh *mesh = s->set->mesh;
    if (which == FREE)
        return node == 0 ? -1 : node; /* the potential is free up to a constant: zero at node 0 */
    const int loop = s->set->rim->loop[node];
    return loop < 0 ? node : loop == 0 ? -1 : mesh->n_node + mesh->n_edge + loop - 1;
}

static int side_block(const solver *s, int which, int edge)
{
    const utw_mesh *mesh = s->set->mesh;
    return which == CLAMPED && mesh->edge[edge].tri[1] < 0 ? -1 : mesh->n_node + edge;
}

static void blocks_of(const solver *s, int which, int tri, int block[6])
{
    const utw_triangle *t = &s->set->mesh->tri[tri];
    for (int k = 0; k < 3; k++) {
        block[k] = node_block(s, which, t->node[k]);
        block[3 + k] = side_block(s, which, t->side[k]);
    }
}

static utw_status create_system(solver *s, int which, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_mesh *mesh = s->set->mesh;
    const int n_block = mesh->n_node + mesh->n_edge + s->set->rim->n_loop - 1;
    int *size = NULL, *first = NULL, *item = NULL, n = 0;
    UTW_TRY_ALLOC(size = utw_alloc((size_t)n_block, sizeof(int)));
    UTW_TRY_ALLOC(first = utw_alloc((size_t)mesh->n_tri + 1, sizeof(int)));
    UTW_TRY_ALLOC(item = utw_alloc(6 * (size_t)mesh->n_tri, sizeof(int)));
    for (int t = 0; t < mesh->n_tri; t++) {
        int block[6];
        blocks_of(s, which, t, block);
        first[t] = n;
        for (int k = 0; k < 6; k++) {
            if (block[k] < 0) continue;
            const int wanted = k < 3 ? 1 : s->field->side_order[mesh->tri[t].side[k - 3]] - 1;
            if (wanted == 0) continue;
            size[block[k]] = wanted;
            int twice = 0;
            for (int i = first[t]; i < n; i++) twice |= item[i] == block[k];
            if (!twice) item[n++] = block[k];
        }
    }
    first[mesh->n_tri] = n;
    UTW_TRY(utw_system_create(n_block, size, mesh->n_tri, first, item, &s->system[which], err));
    const size_t unknowns = (size_t)utw_system_size(s->system[which]);
    UTW_TRY_ALLOC(s->rhs[which] = utw_alloc(unknowns * (size_t)n_pairs(s), sizeof(double)));
    st = UTW_OK;
done:
    utw_free(size);
    utw_free(first);
    utw_free(item);
    return st;
}

/* ---- one element
 * ---------------------------------------------------------------------------------- */

/* Boundary data of chi that lie within the element's functions: known[n_pair][n]; 1 when there are
 * any. */
static int boundary_data(const solver *s, const utw_element *el, double *known)
{
    const utw_lift *l = s->set->lift;
    const utw_triangle *t = &s->set->mesh->tri[el->tri];
    int any = 0;
    memset(known, 0, (size_t)(n_pairs(s) * el->n) * sizeof *known);
    for (int i = 0; i < n_pairs(s); i++) {
        const int c = l->column[i];
        if (c < 0) continue;
        double *row = known + i * el->n;
        int at = 3;
        for (int k = 0; k < 3; k++) {
            row[k] = l->corner[(el->tri * 3 + k) * l->n_column + c];
            any |= row[k] != 0;
            const int series = l->series_of[t->side[k]];
            if (series >= 0) {
                const double *a = l->series + (size_t)(series * l->n_column + c) * UTW_SERIES_TERMS;
                for (int d = 2; d <= el->side_order[k] && d <= l->degree[series]; d++)
                    row[at + d - 2] = a[d - 2];
                any = 1;
            }
            at += el->side_order[k] - 1;
        }
    }
    return any;
}

/* Boundary data of curved sides beyond the element's order: F -= int grad(rest) . grad N by
 * quadrature. */
static void subtract_rest(const solver *s, const utw_element *el, double *F)
{
    const utw_map *map = &s->map;
    const utw_table *t = map->table;
    int index[UTW_FUNCTIONS_MAX];
    utw_element_index(el, t->order, index);
    double d[UTW_PAIR_MAX][2];
    for (int k = 0; k < t->n_point; k++) {
        if (!utw_lift_rest(s->set->lift, s->set->mesh, el, t->r[k], t->s[k],
                           t->phi + k * 3 * UTW_SERIES_TERMS, t->dphi + k * 3 * UTW_SERIES_TERMS,
                           d))
            return;
        const double *J = map->J[k], det = map->det[k];
        const double *Nr = t->Nr + k * t->n_function, *Ns = t->Ns + k * t->n_function;
        for (int i = 0; i < n_pairs(s); i++) {
            const int c = s->set->lift->column[i];
            if (c < 0) continue;
            /* w det J^-T d . J^-T (Nr, Ns) */
            const double gx = (J[3] * d[c][0] - J[2] * d[c][1]) / det,
                         gy = (J[0] * d[c][1] - J[1] * d[c][0]) / det;
            const double fr = t->w[k] * (J[3] * gx - J[1] * gy),
                         fs = t->w[k] * (J[0] * gy - J[2] * gx);
            for (int j = 0; j < el->n; j++)
                F[i * el->n + j] -= el->sign[j] * (fr * Nr[index[j]] + fs * Ns[index[j]]);
        }
    }
}

/* The loads of potentials, then those of chi, -(P, curl v) = int P_y v_x - P_x v_y. */
static void collect_loads(solver *s)
{
    const int np = n_pairs(s);
    for (int i = 0; i < np; i++) {
        const utw_pair *pair = &s->set->pair[i];
        memcpy(s->load[i], pair->g, sizeof pair->g);
        memcpy(s->source[i], pair->s, sizeof pair->s);
        for (int j = 0; j < 6; j++) {
            s->load[np + i][0][j] = pair->P[1][j];
            s->load[np + i][1][j] = -pair->P[0][j];
        }
    }
}

/* The sources of the potentials on one element, per unit of k. */
static const utw_poly *sources(const solver *s, int tri, utw_poly scaled[UTW_PAIR_MAX])
{
    if (s->set->axial == NULL) return (const utw_poly *)s->source;
    const double e = s->set->axial[s->set->mesh->tri[tri].part] / conductivity(s->set, tri);
    for (int i = 0; i < n_pairs(s); i++)
        for (int j = 0; j < 6; j++) scaled[i][j] = e * s->source[i][j];
    return (const utw_poly *)scaled;
}

/* K, and F[2 n_pair][n] with the boundary data of chi brought to the right-hand side. */
static utw_status make_element(solver *s, const utw_element *el, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const int np = n_pairs(s), n = el->n;
    utw_poly scaled[UTW_PAIR_MAX];
    if (el->blend.any) UTW_TRY(utw_element_map(el, s->set->store, &s->map, err));
    UTW_TRY(utw_element_stiffness(el, s->set->store, &s->map, s->K, s->work, err));
    UTW_TRY(utw_element_loads(el, s->set->store, &s->map, 2 * np, (const utw_poly(*)[2])s->load, np,
                              sources(s, el->tri, scaled), s->F, s->work, err));
    if (boundary_data(s, el, s->known)) {
        cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasNoTrans, np, n, n, -1, s->known, n, s->K, n,
                    1, s->F + np * n, n);
        if (el->blend.any) subtract_rest(s, el, s->F + np * n);
    }
    st = UTW_OK;
done:
    return st;
}

/* Eliminate the interior: S = K_ss - W^T W, F_s - W^T G, in place in K and F (leading dimension n).
 */
static utw_status condense(solver *s, const utw_element *el, utw_error *err)
{
    const int ns = el->n_skeleton, ni = el->n_interior, n = el->n, m = 2 * n_pairs(s);
    condensed *c = &s->element[el->tri];
    c->at = s->n_kept;
    if (ni == 0) return UTW_OK;
    const size_t need = (size_t)(ni * ni + ns * ni + m * ni);
    void *kept = s->kept;
    if (utw_grow(&kept, &s->capacity, s->n_kept + need, sizeof(double)) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    s->kept = kept;
    s->n_kept += need;
    double *L = s->kept + c->at, *W = L + ni * ni, *G = W + ns * ni;
    for (int i = 0; i < ni; i++)
        memcpy(L + i * ni, s->K + (ns + i) * n + ns, (size_t)ni * sizeof *L);
    for (int i = 0; i < ns; i++) memcpy(W + i * ni, s->K + i * n + ns, (size_t)ni * sizeof *W);
    for (int i = 0; i < m; i++) memcpy(G + i * ni, s->F + i * n + ns, (size_t)ni * sizeof *G);
    int info = 0;
    dpotrf_("L", &ni, L, &ni, &info, 1); /* column-major lower */
    if (info != 0) return utw_fail(err, UTW_E_SINGULAR, "the interior of an element is singular");
    /* rows of W and G are right-hand sides: solve L y = row */
    cblas_dtrsm(CblasColMajor, CblasLeft, CblasLower, CblasNoTrans, CblasNonUnit, ni, ns + m, 1, L,
                ni, W, ni);
    cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasTrans, ns, ns, ni, -1, W, ni, W, ni, 1, s->K, n);
    cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasTrans, m, ns, ni, -1, G, ni, W, ni, 1, s->F, n);
    return UTW_OK;
}

/* Rows of the element's skeleton as six groups. */
static void group_starts(const utw_element *el, int start[6], int size[6])
{
    int at = 3;
    for (int k = 0; k < 3; k++) {
        start[k] = k;
        size[k] = 1;
        start[3 + k] = at;
        size[3 + k] = el->side_order[k] - 1;
        at += el->side_order[k] - 1;
    }
}

static void scatter(solver *s, const utw_element *el)
{
    const int np = n_pairs(s), n = el->n;
    const double k = conductivity(s->set, el->tri);
    int start[6], size[6], block[6];
    group_starts(el, start, size);
    double *S = s->K; /* scaled in place: k for the potentials, then 1/k */
    for (int which = FREE; which <= CLAMPED; which++) {
        if (k != 1) cblas_dscal(n * n, which == FREE ? k : 1 / (k * k), S, 1);
        blocks_of(s, which, el->tri, block);
        utw_system_add(s->system[which], 6, block, start, S, n);
        const size_t unknowns = (size_t)utw_system_size(s->system[which]);
        const double weight =
            which == FREE ? k : 1; /* loads and P of pair.h are densities per unit of k */
        for (int g = 0; g < 6; g++) {
            if (block[g] < 0 || size[g] == 0) continue;
            const int offset = utw_system_offset(s->system[which], block[g]);
            for (int i = 0; i < np; i++)
                for (int j = 0; j < size[g]; j++)
                    s->rhs[which][(size_t)i * unknowns + (size_t)(offset + j)] +=
                        weight * s->F[((which == FREE ? 0 : np) + i) * n + start[g] + j];
        }
    }
}

static utw_status assemble(solver *s, utw_error *err)
{
    for (int t = 0; t < s->set->mesh->n_tri; t++) {
        utw_element el;
        utw_field_element(s->field, t, &el);
        utw_status st = make_element(s, &el, err);
        if (st == UTW_OK) st = condense(s, &el, err);
        if (st != UTW_OK) return st;
        scatter(s, &el);
    }
    return UTW_OK;
}

/* ---- back to the elements
 * -------------------------------------------------------------------------- */

/* Skeleton unknowns of the element from the solved systems plus boundary data: U[2 n_pair][n]. */
static void gather(const solver *s, const utw_element *el, double *U)
{
    const int np = n_pairs(s), n = el->n;
    int start[6], size[6], block[6];
    group_starts(el, start, size);
    memset(U, 0, (size_t)(2 * np * n) * sizeof *U);
    boundary_data(s, el, U + np * n);
    for (int which = FREE; which <= CLAMPED; which++) {
        const size_t unknowns = (size_t)utw_system_size(s->system[which]);
        blocks_of(s, which, el->tri, block);
        for (int g = 0; g < 6; g++) {
            if (block[g] < 0 || size[g] == 0) continue;
            const size_t offset = (size_t)utw_system_offset(s->system[which], block[g]);
            for (int i = 0; i < np; i++)
                for (int j = 0; j < size[g]; j++)
                    U[(which * np + i) * n + start[g] + j] +=
                        s->rhs[which][(size_t)i * unknowns + offset + (size_t)j];
        }
    }
}

/* Interior unknowns: K_ii u_i = F_i - K_is u_s without the boundary data in u_s, which F holds
 * already. */
static void recover(const solver *s, const utw_element *el, double *U, double *data)
{
    const int np = n_pairs(s), n = el->n, ns = el->n_skeleton, ni = el->n_interior, m = 2 * np;
    if (ni == 0) return;
    const double *L = s->kept + s->element[el->tri].at, *W = L + ni * ni, *G = W + ns * ni;
    double *X = s->work; /* [m][ni] */
    const double k = conductivity(s->set, el->tri);
    for (int i = 0; i < m; i++) /* k K u = k F for the potentials, K/k u = F for chi */
        for (int j = 0; j < ni; j++) X[i * ni + j] = (i < np ? 1 : k) * G[i * ni + j];
    boundary_data(s, el, data);
    for (int i = 0; i < m; i++)
        for (int j = 0; j < n; j++)
            s->F[i * n + j] = U[i * n + j] - (i < np ? 0 : data[(i - np) * n + j]);
    cblas_dgemm(CblasRowMajor, CblasNoTrans, CblasNoTrans, m, ni, ns, -1, s->F, n, W, ni, 1, X, ni);
    cblas_dtrsm(CblasColMajor, CblasLeft, CblasLower, CblasTrans, CblasNonUnit, ni, m, 1, L, ni, X,
                ni);
    for (int i = 0; i < m; i++) memcpy(U + i * n + ns, X + i * ni, (size_t)ni * sizeof *U);
}

static utw_status collect(solver *s, utw_error *err)
{
    utw_field *f = s->field;
    const int m = 2 * n_pairs(s);
    if ((f->coef = utw_alloc(f->first[s->set->mesh->n_tri], sizeof(double))) == NULL)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    for (int t = 0; t < s->set->mesh->n_tri; t++) {
        utw_element el;
        utw_field_element(f, t, &el);
        double *U = f->coef + f->first[t];
        gather(s, &el, U);
        recover(s, &el, U, s->known);
        for (int i = 0; i < m; i++)
            for (int j = 0; j < el.n; j++) U[i * el.n + j] *= el.sign[j];
    }
    return UTW_OK;
}

/* ---- orders
 * --------------------------------------------------------------------------------------- */

static utw_status set_orders(utw_field *f, const unsigned char *order, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_mesh *mesh = f->setting.mesh;
    const int m = 2 * f->setting.n_pair, data = f->setting.lift->n_column > 0 ? 3 : 1;
    UTW_TRY_ALLOC(f->order = utw_alloc((size_t)mesh->n_tri, 1));
    UTW_TRY_ALLOC(f->side_order = utw_alloc((size_t)mesh->n_edge, 1));
    UTW_TRY_ALLOC(f->first = utw_alloc((size_t)mesh->n_tri + 1, sizeof(size_t)));
    memcpy(f->order, order, (size_t)mesh->n_tri);
    for (int e = 0; e < mesh->n_edge; e++) {
        /* between two elements the smaller order (as good, and fewer unknowns); on the boundary at
         * least what its data need */
        const int *tri = mesh->edge[e].tri, own = order[tri[0]],
                  other = tri[1] < 0 ? data : order[tri[1]];
        const int least = own < other ? own : other, greatest = own < other ? other : own;
        f->side_order[e] = (unsigned char)(tri[1] < 0 ? greatest : least);
    }
    int vertices = mesh->n_node - 1, sides = 0, inner = 0;
    for (int e = 0; e < mesh->n_edge; e++) sides += f->side_order[e] - 1;
    for (int t = 0; t < mesh->n_tri; t++) {
        utw_element el;
        utw_field_element(f, t, &el);
        inner += el.n_interior;
        f->first[t + 1] = f->first[t] + (size_t)(m * el.n);
    }
    f->n_skeleton_free = vertices + sides;
    f->n_free = vertices + sides + inner;
    st = UTW_OK;
done:
    return st;
}

void utw_field_element(const utw_field *f, int t, utw_element *el)
{
    const utw_triangle *tri = &f->setting.mesh->tri[t];
    const int side[3] = {f->side_order[tri->side[0]], f->side_order[tri->side[1]],
                         f->side_order[tri->side[2]]};
    utw_element_of(f->setting.mesh, t, f->order[t], side, el);
}

void utw_field_free(utw_field *f)
{
    if (f == NULL) return;
    utw_free(f->order);
    utw_free(f->side_order);
    utw_free(f->first);
    utw_free(f->coef);
    utw_free(f);
}

static utw_status create_work(solver *s, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const size_t n = UTW_FUNCTIONS_MAX;
    UTW_TRY_ALLOC(s->element = utw_alloc((size_t)s->set->mesh->n_tri, sizeof *s->element));
    UTW_TRY_ALLOC(s->K = utw_alloc(n * n, sizeof(double)));
    UTW_TRY_ALLOC(s->F = utw_alloc(2 * UTW_PAIR_MAX * n, sizeof(double)));
    UTW_TRY_ALLOC(s->known = utw_alloc(UTW_PAIR_MAX * n, sizeof(double)));
    UTW_TRY_ALLOC(s->work = utw_alloc(UTW_ELEMENT_WORK, sizeof(double)));
    st = UTW_OK;
done:
    return st;
}

static void solver_clear(solver *s)
{
    for (int which = FREE; which <= CLAMPED; which++) {
        utw_system_free(s->system[which]);
        utw_free(s->rhs[which]);
    }
    utw_free(s->element);
    utw_free(s->kept);
    utw_free(s->K);
    utw_free(s->F);
    utw_free(s->known);
    utw_free(s->work);
}

utw_status utw_field_solve(const utw_setting *setting, const unsigned char *order,
                           utw_field **field, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    solver s = {.set = setting};
    utw_field *f = NULL;
    UTW_TRY_ALLOC(f = utw_alloc(1, sizeof *f));
    f->setting = *setting;
    s.field = f;
    UTW_TRY(set_orders(f, order, err));
    UTW_TRY(create_work(&s, err));
    collect_loads(&s);
    for (int which = FREE; which <= CLAMPED; which++) UTW_TRY(create_system(&s, which, err));
    f->n_skeleton_clamped = utw_system_size(s.system[CLAMPED]);
    double mark = utw_seconds();
    UTW_TRY(assemble(&s, err));
    f->times.elements = utw_seconds() - mark;
    for (int which = FREE; which <= CLAMPED; which++) {
        UTW_TRY(utw_system_factorise(s.system[which], err));
        UTW_TRY(utw_system_solve(s.system[which], setting->n_pair, s.rhs[which], err));
        double a, b, c;
        utw_system_seconds(s.system[which], &a, &b, &c);
        f->times.analyse += a;
        f->times.factorise += b;
        f->times.solve += c;
        utw_system_release(s.system[which]);
    }
    mark = utw_seconds();
    UTW_TRY(collect(&s, err));
    f->times.recover = utw_seconds() - mark;
    *field = f;
    f = NULL;
    st = UTW_OK;
done:
    utw_field_free(f);
    solver_clear(&s);
    return st;
}
