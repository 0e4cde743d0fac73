/* SPDX-License-Identifier: GPL-3.0-or-later
 * Block ordering, assembly straight into compressed columns, and CHOLMOD's factorisation. */
#include "field/system.h"

#include <cholmod.h>
#include <string.h>

#include "base/clock.h"
#include "base/memory.h"
#include "base/status.h"

struct utw_system {
    cholmod_common common;
    int n_block, n;     /* blocks, unknowns */
    int *size;          /* [n_block] */
    int *offset;        /* [n_block] first unknown */
    int *rank;          /* [n_block] place in the elimination */
    int *first, *later; /* later[first[b]..first[b+1]): blocks joined to b and eliminated after it,
                           in that order */
    int *row_at; /* the same shape: rows of these blocks start so many entries below the block's own
                    last row */
    cholmod_sparse *A; /* lower triangle, columns packed */
    cholmod_factor *L;
    double seconds[3];
};

void utw_system_release(utw_system *s)
{
    cholmod_free_sparse(&s->A, &s->common);
    cholmod_free_factor(&s->L, &s->common);
    utw_free(s->rank);
    utw_free(s->first);
    utw_free(s->later);
    utw_free(s->row_at);
    s->rank = s->first = s->later = s->row_at = NULL;
}

void utw_system_free(utw_system *s)
{
    if (s == NULL) return;
    utw_system_release(s);
    cholmod_finish(&s->common);
    utw_free(s->size);
    utw_free(s->offset);
    utw_free(s);
}

int utw_system_size(const utw_system *s)
{
    return s->n;
}

int utw_system_offset(const utw_system *s, int block)
{
    return s->offset[block];
}

/* ---- the graph of blocks
 * -------------------------------------------------------------------------- */

typedef struct graph {
    int *first, *item; /* neighbours of every block, each once, unsorted */
} graph;

static utw_status graph_create(int n_block, int n_element, const int *first, const int *item,
                               graph *g, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int *count = NULL, *at = NULL, *element = NULL, *seen = NULL;
    const size_t n = (size_t)n_block;
    /* elements of each block */
    UTW_TRY_ALLOC(count = utw_alloc(n + 1, sizeof(int)));
    UTW_TRY_ALLOC(at = utw_alloc(n + 1, sizeof(int)));
    UTW_TRY_ALLOC(element = utw_alloc((size_t)first[n_element], sizeof(int)));
    UTW_TRY_ALLOC(seen = utw_alloc(n, sizeof(int)));
    for (int i = 0; i < first[n_element]; i++) count[item[i] + 1]++;
    for (int b = 0; b < n_block; b++)
        at[b + 1] = count[b + 1] += count[b]; /* now those of b start at count[b] */
    at[0] = 0;
    for (int e = 0; e < n_element; e++)
        for (int i = first[e]; i < first[e + 1]; i++) element[at[item[i]]++] = e;
    /* neighbours, each once */
    for (int pass = 0; pass < 2; pass++) {
        int total = 0;
        for (int b = 0; b < n_block; b++) seen[b] = -1;
        for (int b = 0; b < n_block; b++) {
            if (pass == 1) g->first[b] = total;
            seen[b] = b;
            for (int k = count[b]; k < count[b + 1]; k++)
                for (int i = first[element[k]]; i < first[element[k] + 1]; i++) {
                    if (seen[item[i]] == b) continue;
                    seen[item[i]] = b;
                    if (pass == 1) g->item[total] = item[i];
                    total++;
                }
        }
        if (pass == 0) {
            UTW_TRY_ALLOC(g->first = utw_alloc(n + 1, sizeof(int)));
            UTW_TRY_ALLOC(g->item = utw_alloc((size_t)total, sizeof(int)));
        } else
            g->first[n_block] = total;
    }
    st = UTW_OK;
done:
    utw_free(count);
    utw_free(at);
    utw_free(element);
    utw_free(seen);
    return st;
}

/* order[k]: the block eliminated k-th. */
static utw_status order_blocks(utw_system *s, const graph *g, int *order, utw_error *err)
{
    cholmod_common *c = &s->common;
    const int n = s->n_block;
    size_t half = 0;
    for (int b = 0; b < n; b++)
        for (int k = g->first[b]; k < g->first[b + 1]; k++) half += g->item[k] > b;
    cholmod_sparse *G =
        cholmod_allocate_sparse((size_t)n, (size_t)n, half, 0, 1, -1, CHOLMOD_PATTERN, c);
    if (G == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (ordering)");
    int *p = G->p, *i = G->i, nz = 0;
    for (int b = 0; b < n; b++) {
        p[b] = nz;
        for (int k = g->first[b]; k < g->first[b + 1]; k++)
            if (g->item[k] > b) i[nz++] = g->item[k];
    }
    p[n] = nz;
    const int done = cholmod_amd(G, NULL, 0, order, c);
    cholmod_free_sparse(&G, c);
    return done ? UTW_OK : utw_fail(err, UTW_E_NOMEM, "out of memory (ordering)");
}

/* ---- layout
 * -------------------------------------------------------------------------------------- */

/* Insertion sort by rank: lists have about ten members. */
static void sort_by_rank(const int *rank, int *list, int n)
{
    for (int i = 1; i < n; i++) {
        const int b = list[i];
        int j = i;
        for (; j > 0 && rank[list[j - 1]] > rank[b]; j--) list[j] = list[j - 1];
        list[j] = b;
    }
}

static utw_status lay_out(utw_system *s, const graph *g, const int *order, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const int nb = s->n_block;
    const size_t total = (size_t)g->first[nb];
    UTW_TRY_ALLOC(s->first = utw_alloc((size_t)nb + 1, sizeof(int)));
    UTW_TRY_ALLOC(s->later = utw_alloc(total, sizeof(int)));
    UTW_TRY_ALLOC(s->row_at = utw_alloc(total, sizeof(int)));
    for (int k = 0; k < nb; k++) {
        s->rank[order[k]] = k;
        s->offset[order[k]] = s->n;
        s->n += s->size[order[k]];
    }
    int n = 0;
    double nonzeros = 0;
    for (int b = 0; b < nb; b++) {
        s->first[b] = n;
        for (int k = g->first[b]; k < g->first[b + 1]; k++)
            if (s->rank[g->item[k]] > s->rank[b] && s->size[g->item[k]] > 0)
                s->later[n++] = g->item[k];
        sort_by_rank(s->rank, s->later + s->first[b], n - s->first[b]);
        int rows = 0;
        for (int k = s->first[b]; k < n; k++) {
            s->row_at[k] = rows;
            rows += s->size[s->later[k]];
        }
        nonzeros += (double)s->size[b] * (rows + 0.5 * (s->size[b] + 1));
    }
    s->first[nb] = n;
    if (nonzeros > 2e9) {
        st = utw_fail(err, UTW_E_NOMEM, "the system of %d equations is too large", s->n);
        goto done;
    }
    s->A = cholmod_allocate_sparse((size_t)s->n, (size_t)s->n, (size_t)nonzeros, 1, 1, -1,
                                   CHOLMOD_REAL, &s->common);
    if (s->A == NULL) {
        st = utw_fail(err, UTW_E_NOMEM, "out of memory (matrix)");
        goto done;
    }
    int *p = s->A->p, *i = s->A->i, nz = 0;
    memset(s->A->x, 0, (size_t)nonzeros * sizeof(double));
    for (int k = 0; k < nb; k++) {
        const int b = order[k];
        for (int j = 0; j < s->size[b]; j++) {
            p[s->offset[b] + j] = nz;
            for (int r = j; r < s->size[b]; r++) i[nz++] = s->offset[b] + r;
            for (int m = s->first[b]; m < s->first[b + 1]; m++)
                for (int r = 0; r < s->size[s->later[m]]; r++) i[nz++] = s->offset[s->later[m]] + r;
        }
    }
    p[s->n] = nz;
    st = UTW_OK;
done:
    return st;
}

utw_status utw_system_create(int n_block, const int *size, int n_element, const int *first,
                             const int *item, utw_system **system, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    graph g = {NULL, NULL};
    int *order = NULL;
    const double start = utw_seconds();
    utw_system *s = utw_alloc(1, sizeof *s);
    if (s == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    cholmod_start(&s->common);
    s->common.print = 0;
    s->common.nmethods = 1;
    s->common.method[0].ordering =
        CHOLMOD_NATURAL; /* the unknowns are numbered in elimination order already */
    s->common.postorder = 1;
    /* L L', also of small matrices: L D L' would go on past pivots that are not positive */
    s->common.final_ll = 1;
    s->n_block = n_block;
    UTW_TRY_ALLOC(s->size = utw_alloc((size_t)n_block, sizeof(int)));
    memcpy(s->size, size, (size_t)n_block * sizeof(int));
    UTW_TRY_ALLOC(s->offset = utw_alloc((size_t)n_block, sizeof(int)));
    UTW_TRY_ALLOC(s->rank = utw_alloc((size_t)n_block, sizeof(int)));
    UTW_TRY_ALLOC(order = utw_alloc((size_t)n_block, sizeof(int)));
    UTW_TRY(graph_create(n_block, n_element, first, item, &g, err));
    UTW_TRY(order_blocks(s, &g, order, err));
    UTW_TRY(lay_out(s, &g, order, err));
    s->seconds[0] = utw_seconds() - start;
    *system = s;
    s = NULL;
    st = UTW_OK;
done:
    utw_free(order);
    utw_free(g.first);
    utw_free(g.item);
    utw_system_free(s);
    return st;
}

/* ---- assembly
 * ------------------------------------------------------------------------------------- */

/* Entries of block `row` in the columns of block `col` (eliminated not after it): rows start so
 * many places below the top of column 0 of the block. For row == col this is 0 and columns start at
 * their own diagonal. */
static int rows_start(const utw_system *s, int col, int row)
{
    int k = s->first[col];
    while (s->later[k] != row) k++;
    return s->size[col] + s->row_at[k];
}

void utw_system_add(utw_system *s, int n_group, const int *block, const int *start, const double *S,
                    int ld)
{
    const int *p = s->A->p;
    double *x = s->A->x;
    for (int g = 0; g < n_group; g++) {
        const int col = block[g];
        if (col < 0 || s->size[col] == 0) continue;
        for (int h = 0; h < n_group; h++) {
            const int row = block[h];
            if (row < 0 || s->size[row] == 0 || s->rank[row] < s->rank[col]) continue;
            const int same = row == col, top = same ? 0 : rows_start(s, col, row);
            for (int j = 0; j < s->size[col]; j++) {
                double *column =
                    x + p[s->offset[col] + j] - j; /* entry r of the block stands at column[r] */
                const double *from = S + (start[g] + j) * ld + start[h];
                for (int r = same ? j : 0; r < s->size[row]; r++) column[top + r] += from[r];
            }
        }
    }
}

/* ---- solving
 * ------------------------------------------------------------------------------------- */

utw_status utw_system_factorise(utw_system *s, utw_error *err)
{
    cholmod_common *c = &s->common;
    const double start = utw_seconds();
    s->L = cholmod_analyze(s->A, c);
    if (s->L == NULL)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (analysis of %d equations)", s->n);
    const double middle = utw_seconds();
    s->seconds[0] += middle - start;
    const int done = cholmod_factorize(s->A, s->L, c);
    s->seconds[1] = utw_seconds() - middle;
    if (c->status == CHOLMOD_OUT_OF_MEMORY || c->status == CHOLMOD_TOO_LARGE)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (factor of %d equations)", s->n);
    /* a factorisation that broke off still returns TRUE: its status tells */
    if (!done || c->status != CHOLMOD_OK || s->L->minor < s->L->n)
        return utw_fail(err, UTW_E_SINGULAR, "the equations are singular at unknown %zu of %d",
                        s->L->minor, s->n);
    return UTW_OK;
}

utw_status utw_system_solve(const utw_system *s, int n_rhs, double *b, utw_error *err)
{
    if (s->n == 0) return UTW_OK;
    utw_system *self = (utw_system *)(size_t)s; /* CHOLMOD's workspace is not ours to keep const */
    const double start = utw_seconds();
    cholmod_dense B = {.nrow = (size_t)s->n,
                       .ncol = (size_t)n_rhs,
                       .nzmax = (size_t)s->n * (size_t)n_rhs,
                       .d = (size_t)s->n,
                       .x = b,
                       .xtype = CHOLMOD_REAL,
                       .dtype = CHOLMOD_DOUBLE};
    cholmod_dense *X = cholmod_solve(CHOLMOD_A, s->L, &B, &self->common);
    if (X == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (solution)");
    memcpy(b, X->x, B.nzmax * sizeof(double));
    cholmod_free_dense(&X, &self->common);
    self->seconds[2] += utw_seconds() - start;
    return UTW_OK;
}

void utw_system_seconds(const utw_system *s, double *analyse, double *factorise, double *solve)
{
    *analyse = s->seconds[0];
    *factorise = s->seconds[1];
    *solve = s->seconds[2];
}
