/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/graph.h"

#include "base/memory.h"
#include "support/midlines.h"

/* Every cell is a closed walk along its walls, and holds its closing wall, which no other cell
 * holds. */
static void check_cells(const utw_graph *g)
{
    assert_int_equal(g->n_cells, g->n_walls - g->n_nodes + 1);
    for (int c = 0; c < g->n_cells; c++) {
        const int begin = g->cell_start[c], end = g->cell_start[c + 1],
                  closing = g->cell_wall[begin];
        int balance[32] = {0};
        assert_true(end > begin && g->n_nodes <= 32);
        assert_int_equal(g->cell_sign[begin], 1);
        for (int i = begin; i < end; i++) {
            balance[g->from[g->cell_wall[i]]] -= g->cell_sign[i];
            balance[g->to[g->cell_wall[i]]] += g->cell_sign[i];
            for (int j = begin; j < i; j++) assert_int_not_equal(g->cell_wall[i], g->cell_wall[j]);
        }
        for (int i = 0; i < g->n_nodes; i++) assert_int_equal(balance[i], 0);
        for (int i = 0; i < g->cell_start[g->n_cells]; i++)
            assert_true(g->cell_wall[i] != closing || i == begin);
    }
}

static void check_tree(const utw_graph *g)
{
    int seen[32] = {0};
    assert_int_equal(g->order[0], 0);
    assert_int_equal(g->parent_wall[0], -1);
    seen[0] = 1;
    for (int k = 1; k < g->n_nodes; k++) {
        const int node = g->order[k], parent = utw_graph_other(g, g->parent_wall[node], node);
        assert_true(seen[parent] && !seen[node]);
        seen[node] = 1;
    }
}

static void samples_have_trees_and_cells(void **state)
{
    (void)state;
    const char *name;
    const int cells[] = {0, 0, 0, 1, 3, 1, 5, 2};
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        utw_graph g;
        utw_error err;
        assert_ok(utw_graph_init(utw_midline_sample(i, &name), &g, &err));
        check_tree(&g);
        check_cells(&g);
        assert_int_equal(g.n_cells, cells[i]);
        utw_graph_clear(&g);
        utw_graph_clear(&g); /* twice is allowed */
    }
}

/* No planar drawing has these graphs: all pairs of five nodes, and three joined to three
 * (Kuratowski 1930). */
static void graphs_that_do_not_fit_in_the_plane(void **state)
{
    (void)state;
    double nodes[6][2] = {{0, 0}, {1, 0}, {2, 1}, {1, 2}, {0, 1}, {5, 5}};
    utw_wall walls[10];
    int n = 0;
    for (int i = 0; i < 5; i++)
        for (int j = 0; j < i; j++) walls[n++] = (utw_wall)WALL(i, j, 1);
    utw_midline m = {5, 10, nodes, walls};
    utw_graph g;
    utw_error err;
    assert_ok(utw_graph_init(&m, &g, &err));
    check_tree(&g);
    check_cells(&g);
    assert_int_equal(g.n_cells, 6);
    utw_graph_clear(&g);

    n = 0;
    for (int i = 0; i < 3; i++)
        for (int j = 3; j < 6; j++) walls[n++] = (utw_wall)WALL(i, j, 1);
    m = (utw_midline){6, 9, nodes, walls};
    assert_ok(utw_graph_init(&m, &g, &err));
    check_cells(&g);
    assert_int_equal(g.n_cells, 4);
    utw_graph_clear(&g);
}

/* Several walls between two nodes, and walls from a node to itself. */
static void double_walls_and_loops(void **state)
{
    (void)state;
    double nodes[][2] = {{0, 0}, {4, 0}};
    utw_wall walls[] = {ARC(0, 1, 1, 1, 2, 2), WALL(1, 0, 1), ARC(0, 1, 1, 1, 2, -2),
                        ARC(1, 1, 1, 1, 6, 0), ARC(0, 0, 1, 1, -2, 0)};
    const utw_midline m = MIDLINE(nodes, walls);
    utw_graph g;
    utw_error err;
    assert_ok(utw_graph_init(&m, &g, &err));
    check_tree(&g);
    check_cells(&g);
    assert_int_equal(g.n_cells, 4);
    assert_int_equal(g.degree[0], 5);
    utw_graph_clear(&g);
}

static void paths_are_about_the_middle(void **state)
{
    (void)state;
    double nodes[][2] = {{1001, 2000}, {1005, 2003}};
    utw_wall walls[] = {WALL(0, 1, 1)};
    const utw_midline m = MIDLINE(nodes, walls);
    utw_path path;
    double origin[2], size;
    utw_error err;
    assert_ok(utw_graph_paths(&m, &path, origin, &size, &err));
    assert_close(origin[0], 1003, 1e-15);
    assert_close(origin[1], 2001.5, 1e-15);
    assert_close(size, 5, 1e-15);
    assert_close(path.p[0], -2, 1e-15);
    assert_close(path.p[1], -1.5, 1e-15);
}

static void failing_allocations(void **state)
{
    (void)state;
    const char *name;
    const utw_midline *m = utw_midline_sample(4, &name);
    int refused = 0;
    for (long n = 1;; n++) {
        utw_graph g = {0};
        utw_error err;
        utw_memory_fail_at(n);
        const utw_status st = utw_graph_init(m, &g, &err);
        utw_memory_fail_at(0);
        utw_graph_clear(&g);
        if (st == UTW_OK) break;
        assert_int_equal(st, UTW_E_NOMEM);
        refused++;
    }
    assert_int_equal(refused, 13);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(samples_have_trees_and_cells),
        balanced_test(graphs_that_do_not_fit_in_the_plane),
        balanced_test(double_walls_and_loops),
        balanced_test(paths_are_about_the_middle),
        balanced_test(failing_allocations),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
