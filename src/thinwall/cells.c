/* SPDX-License-Identifier: GPL-3.0-or-later
 * Assembling, factoring and solving the cell equations. */
#include "thinwall/cells.h"

#include "base/lapack.h"
#include "base/memory.h"

/* Cells through each wall: start[n_walls + 1] into cell[], sign[]. */
static void walls_to_cells(const utw_graph *g, int *start, int *cell, int *sign)
{
    for (int i = 0; i < g->cell_start[g->n_cells]; i++) start[g->cell_wall[i] + 1]++;
    for (int w = 0; w < g->n_walls; w++) start[w + 1] += start[w];
    for (int c = g->n_cells - 1; c >= 0; c--) {
        for (int i = g->cell_start[c]; i < g->cell_start[c + 1]; i++) {
            const int at = --start[g->cell_wall[i] + 1];
            cell[at] = c;
            sign[at] = g->cell_sign[i];
        }
    }
    for (int w = 0; w < g->n_walls; w++) start[w] = start[w + 1];
    start[g->n_walls] = g->cell_start[g->n_cells];
}

static void assemble(const utw_thin *thin, const int *start, const int *cell, const int *sign)
{
    const size_t n = (size_t)thin->graph.n_cells;
    for (int w = 0; w < thin->graph.n_walls; w++) {
        utw_path_run run;
        utw_path_run_to(&thin->paths[w], &thin->rule, thin->paths[w].length, &run);
        for (int i = start[w]; i < start[w + 1]; i++)
            for (int j = start[w]; j < start[w + 1]; j++)
                thin->cell_matrix[(size_t)cell[i] * n + (size_t)cell[j]] +=
                    sign[i] * sign[j] * run.f;
    }
}

utw_status utw_cells_factor(utw_thin *thin, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_graph *g = &thin->graph;
    const size_t n = (size_t)g->n_cells, total = (size_t)g->cell_start[g->n_cells];
    int *start = NULL, *cell = NULL, *sign = NULL;
    UTW_TRY_ALLOC(start = utw_alloc((size_t)g->n_walls + 1, sizeof *start));
    UTW_TRY_ALLOC(cell = utw_alloc(total, sizeof *cell));
    UTW_TRY_ALLOC(sign = utw_alloc(total, sizeof *sign));
    UTW_TRY_ALLOC(thin->cell_matrix = utw_alloc(n * n, sizeof(double)));
    if (n > 0) {
        walls_to_cells(g, start, cell, sign);
        assemble(thin, start, cell, sign);
        const int order = g->n_cells;
        int info = 0;
        dpotrf_("L", &order, thin->cell_matrix, &order, &info, 1);
        if (info != 0) {
            st =
                utw_fail(err, UTW_E_SINGULAR,
                         "the equations of the %d cells could not be factorised (%d)", order, info);
            goto done;
        }
    }
    st = UTW_OK;
done:
    utw_free(start);
    utw_free(cell);
    utw_free(sign);
    return st;
}

utw_status utw_cells_close(const utw_thin *thin, const double *gap, double *flow, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_graph *g = &thin->graph;
    double *x = NULL;
    UTW_TRY_ALLOC(x = utw_alloc((size_t)g->n_cells, sizeof *x));
    for (int c = 0; c < g->n_cells; c++)
        for (int i = g->cell_start[c]; i < g->cell_start[c + 1]; i++)
            x[c] += g->cell_sign[i] * gap[g->cell_wall[i]];
    if (g->n_cells > 0) {
        const int n = g->n_cells, one = 1;
        int info = 0;
        dpotrs_("L", &n, &one, thin->cell_matrix, &n, x, &n, &info, 1);
        if (info != 0) {
            st = utw_fail(err, UTW_E_INTERNAL, "dpotrs refused its argument %d", -info);
            goto done;
        }
    }
    for (int c = 0; c < g->n_cells; c++)
        for (int i = g->cell_start[c]; i < g->cell_start[c + 1]; i++)
            flow[g->cell_wall[i]] += g->cell_sign[i] * x[c];
    st = UTW_OK;
done:
    utw_free(x);
    return st;
}
