/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "thinwall/cells.h"

#include "support/midlines.h"

/* Flows asked for by a gap have its circulation around every cell and balance at every node. */
static void closing_flows_have_the_circulation_asked_for(void **state)
{
    (void)state;
    const char *name;
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        utw_thin *thin = utw_thin_of(utw_midline_sample(i, &name));
        const utw_graph *g = &thin->graph;
        double gap[32], flow[32], balance[32] = {0};
        utw_error err;
        for (int w = 0; w < g->n_walls; w++) {
            gap[w] = sin(3.7 * w + i);
            flow[w] = 0;
        }
        assert_ok(utw_cells_close(thin, gap, flow, &err));
        for (int c = 0; c < g->n_cells; c++) {
            double want = 0, got = 0;
            for (int j = g->cell_start[c]; j < g->cell_start[c + 1]; j++) {
                const int w = g->cell_wall[j];
                want += g->cell_sign[j] * gap[w];
                got += g->cell_sign[j] * flow[w] *
                       utw_path_shear_length(&thin->paths[w], thin->paths[w].length);
            }
            assert_close_scaled(got, want, 1e-12, 1);
        }
        for (int w = 0; w < g->n_walls; w++) {
            balance[g->from[w]] -= flow[w];
            balance[g->to[w]] += flow[w];
        }
        for (int k = 0; k < g->n_nodes; k++) assert_close_scaled(balance[k], 0.0, 1e-13, 1);
        utw_thin_free(thin);
    }
}

/* One cell: K is int ds/t around it, and its Cholesky factor the square root. */
static void one_cell(void **state)
{
    (void)state;
    double n[][2] = {{0, 0}, {3, 0}, {0, 4}};
    utw_wall w[] = {WALL(0, 1, 0.1), TAPER(1, 2, 0.1, 0.2), WALL(2, 0, 0.25)};
    const utw_midline m = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&m);
    assert_close(thin->cell_matrix[0], sqrt(30 + 5 * log(2) / 0.1 + 16), 1e-14);
    utw_thin_free(thin);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(closing_flows_have_the_circulation_asked_for),
        balanced_test(one_cell),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
