/* SPDX-License-Identifier: GPL-3.0-or-later
 * Checking the numbers of a midline, its spanning tree and its cycle basis. */
#include "outline/graph.h"

#include "base/memory.h"
#include "base/vec2.h"

/* Messages count walls from 1 and give nodes by their index, the number a wall's from and to hold.
 */
static utw_status fault(utw_error *err, int place, const char *object)
{
    utw_error_prefix(err, "%s %d: ", object, object[0] == 'w' ? place + 1 : place);
    utw_error_place(err, -1, -1, place);
    return UTW_E_OUTLINE;
}

static utw_status check_counts(const utw_midline *m, utw_error *err)
{
    if (m == NULL || m->nodes == NULL || m->walls == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "midline: no nodes or no walls given (NULL)");
    if (m->n_walls < 1 || m->n_nodes < 1)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "midline: %d nodes and %d walls; at least one wall is needed", m->n_nodes,
                        m->n_walls);
    if (m->n_walls > UTW_GRAPH_MAX || m->n_nodes > UTW_GRAPH_MAX)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "midline: %d nodes and %d walls; at most %d of each are taken", m->n_nodes,
                        m->n_walls, UTW_GRAPH_MAX);
    for (int i = 0; i < m->n_nodes; i++) {
        if (isfinite(m->nodes[i][0]) && isfinite(m->nodes[i][1])) continue;
        (void)utw_fail(err, UTW_E_OUTLINE, "coordinates (%g, %g) are not finite numbers",
                       m->nodes[i][0], m->nodes[i][1]);
        return fault(err, i, "node");
    }
    return UTW_OK;
}

static utw_status check_wall(const utw_midline *m, int i, utw_error *err)
{
    const utw_wall *w = &m->walls[i];
    const int ends[2] = {w->from, w->to};
    for (int k = 0; k < 2; k++) {
        if (ends[k] >= 0 && ends[k] < m->n_nodes) continue;
        (void)utw_fail(err, UTW_E_OUTLINE, "node %d does not exist; there are nodes 0 to %d",
                       ends[k], m->n_nodes - 1);
        return fault(err, i, "wall");
    }
    if (!(w->t0 > 0 && w->t1 > 0 && isfinite(w->t0) && isfinite(w->t1))) {
        (void)utw_fail(err, UTW_E_OUTLINE,
                       "thickness %g at node %d, %g at node %d; it must be positive", w->t0,
                       w->from, w->t1, w->to);
        return fault(err, i, "wall");
    }
    if (!(fmax(w->t0, w->t1) <= 1e6 * fmin(w->t0, w->t1))) {
        (void)utw_fail(err, UTW_E_OUTLINE,
                       "thickness goes from %g to %g; a factor of 1e6 is the most that is taken",
                       w->t0, w->t1);
        return fault(err, i, "wall");
    }
    if (w->arc && !(isfinite(w->mid[0]) && isfinite(w->mid[1]))) {
        (void)utw_fail(err, UTW_E_OUTLINE, "arc point (%g, %g) is not finite", w->mid[0],
                       w->mid[1]);
        return fault(err, i, "wall");
    }
    return UTW_OK;
}

static void widen(double box[4], const double p[2])
{
    for (int k = 0; k < 2; k++) {
        box[k] = fmin(box[k], p[k]);
        box[2 + k] = fmax(box[2 + k], p[k]);
    }
}

/* Middle of the box of the nodes; diagonal of the box of nodes and arc points. */
static void extent(const utw_midline *m, double origin[2], double *size)
{
    double box[4] = {HUGE_VAL, HUGE_VAL, -HUGE_VAL, -HUGE_VAL};
    for (int i = 0; i < m->n_nodes; i++) widen(box, m->nodes[i]);
    for (int k = 0; k < 2; k++) origin[k] = box[k] + (box[2 + k] - box[k]) / 2;
    for (int i = 0; i < m->n_walls; i++)
        if (m->walls[i].arc) widen(box, m->walls[i].mid);
    *size = hypot(box[2] - box[0], box[3] - box[1]);
}

static utw_status make_path(const utw_midline *m, int i, const double origin[2], double size,
                            utw_path *path, utw_error *err)
{
    const utw_wall *w = &m->walls[i];
    double p[3][2];
    for (int k = 0; k < 2; k++) {
        p[0][k] = m->nodes[w->from][k] - origin[k];
        p[1][k] = m->nodes[w->to][k] - origin[k];
        p[2][k] = w->mid[k] - origin[k];
    }
    if (!w->arc) {
        if (!(utw_distance(p[0], p[1]) > 1e-12 * size)) {
            (void)utw_fail(err, UTW_E_OUTLINE,
                           "it has no length: nodes %d and %d both lie at (%g, %g)", w->from, w->to,
                           m->nodes[w->from][0], m->nodes[w->from][1]);
            return fault(err, i, "wall");
        }
        *path = utw_path_line(p[0], p[1], w->t0, w->t1);
        return UTW_OK;
    }
    const utw_arc_fault arc = utw_path_arc(p[0], p[2], p[1], w->t0, w->t1, path);
    if (arc == UTW_ARC_GOOD && path->length > 1e-12 * size) return UTW_OK;
    (void)utw_fail(err, UTW_E_OUTLINE,
                   arc == UTW_ARC_BEYOND
                       ? "its arc point (%g, %g) lies in line with its ends, but not between them"
                       : "its arc point (%g, %g) coincides with an end",
                   w->mid[0], w->mid[1]);
    return fault(err, i, "wall");
}

utw_status utw_graph_paths(const utw_midline *midline, utw_path *paths, double origin[2],
                           double *size, utw_error *err)
{
    utw_status st = check_counts(midline, err);
    for (int i = 0; st == UTW_OK && i < midline->n_walls; i++) st = check_wall(midline, i, err);
    if (st != UTW_OK) return st;
    extent(midline, origin, size);
    if (!isfinite(*size))
        return utw_fail(err, UTW_E_OUTLINE, "midline: its extent is too large to compute with");
    for (int i = 0; st == UTW_OK && i < midline->n_walls; i++)
        st = make_path(midline, i, origin, *size, &paths[i], err);
    return st;
}

int utw_graph_other(const utw_graph *g, int wall, int node)
{
    return g->from[wall] == node ? g->to[wall] : g->from[wall];
}

/* Walls at each node: start[n_nodes + 1] into list[2 n_walls]. A wall from a node to itself is
 * listed twice. */
static void list_walls(const utw_graph *g, int *start, int *list)
{
    for (int i = 0; i < g->n_nodes; i++) start[i + 1] = start[i] + g->degree[i];
    for (int w = g->n_walls - 1; w >= 0; w--) {
        list[--start[g->from[w] + 1]] = w;
        list[--start[g->to[w] + 1]] = w;
    }
    /* the filling moved start[i + 1] down to where node i begins */
    for (int i = 0; i < g->n_nodes; i++) start[i] = start[i + 1];
    start[g->n_nodes] = 2 * g->n_walls;
}

/* Breadth first from node 0: order, parent walls; in_tree[n_walls]. Returns how many nodes were
 * reached. */
static int grow_tree(utw_graph *g, const int *start, const int *list, int *in_tree, int *seen)
{
    int reached = 1;
    g->order[0] = 0;
    seen[0] = 1;
    g->parent_wall[0] = -1;
    for (int k = 0; k < reached; k++) {
        const int node = g->order[k];
        for (int e = start[node]; e < start[node + 1]; e++) {
            const int next = utw_graph_other(g, list[e], node);
            if (seen[next]) continue;
            seen[next] = 1;
            in_tree[list[e]] = 1;
            g->parent_wall[next] = list[e];
            g->order[reached++] = next;
        }
    }
    return reached;
}

/* The cycle that `wall` closes: along it, then through the tree from its end back to its start.
 * Writes walls and signs when they are not NULL; returns their number. depth[n_nodes] is the
 * distance from the root. */
static int trace_cycle(const utw_graph *g, int wall, const int *depth, int *walls, int *signs)
{
    int n = 0, a = g->to[wall], b = g->from[wall];
    if (walls != NULL) {
        walls[0] = wall;
        signs[0] = 1;
    }
    n++;
    while (a != b) {
        /* climb from the deeper end; the cycle runs up from a (toward the root) and down to b */
        const int up = depth[a] >= depth[b], node = up ? a : b, edge = g->parent_wall[node];
        if (walls != NULL) {
            walls[n] = edge;
            signs[n] = (g->from[edge] == node) == up ? 1 : -1;
        }
        n++;
        if (up)
            a = utw_graph_other(g, edge, a);
        else
            b = utw_graph_other(g, edge, b);
    }
    return n;
}

static utw_status find_cycles(utw_graph *g, const int *in_tree, int *depth, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    g->n_cells = g->n_walls - g->n_nodes + 1;
    UTW_TRY_ALLOC(g->cell_start = utw_alloc((size_t)g->n_cells + 1, sizeof(int)));
    for (int k = 1; k < g->n_nodes; k++) {
        const int node = g->order[k];
        depth[node] = 1 + depth[utw_graph_other(g, g->parent_wall[node], node)];
    }
    int cell = 0;
    for (int w = 0; w < g->n_walls; w++) {
        if (in_tree[w]) continue;
        g->cell_start[cell + 1] = g->cell_start[cell] + trace_cycle(g, w, depth, NULL, NULL);
        cell++;
    }
    const size_t total = (size_t)g->cell_start[g->n_cells];
    UTW_TRY_ALLOC(g->cell_wall = utw_alloc(total, sizeof(int)));
    UTW_TRY_ALLOC(g->cell_sign = utw_alloc(total, sizeof(int)));
    cell = 0;
    for (int w = 0; w < g->n_walls; w++) {
        if (in_tree[w]) continue;
        const int at = g->cell_start[cell++];
        (void)trace_cycle(g, w, depth, g->cell_wall + at, g->cell_sign + at);
    }
    st = UTW_OK;
done:
    return st;
}

static utw_status report_pieces(const utw_midline *m, const utw_graph *g, const int *seen,
                                utw_error *err)
{
    int node = 0;
    while (seen[node]) node++;
    for (int i = 0; i < g->n_nodes; i++) {
        if (g->degree[i] > 0) continue;
        (void)utw_fail(err, UTW_E_OUTLINE, "no wall ends at it (%g, %g); remove it or join it",
                       m->nodes[i][0], m->nodes[i][1]);
        return fault(err, i, "node");
    }
    (void)utw_fail(err, UTW_E_OUTLINE,
                   "no walls lead from it (%g, %g) to node 0 (%g, %g); the walls must form one "
                   "connected piece",
                   m->nodes[node][0], m->nodes[node][1], m->nodes[0][0], m->nodes[0][1]);
    return fault(err, node, "node");
}

utw_status utw_graph_init(const utw_midline *midline, utw_graph *graph, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const size_t nodes = (size_t)midline->n_nodes, walls = (size_t)midline->n_walls;
    utw_graph g = {.n_nodes = midline->n_nodes, .n_walls = midline->n_walls};
    int *start = NULL, *list = NULL, *in_tree = NULL, *seen = NULL, *depth = NULL;
    UTW_TRY_ALLOC(g.from = utw_alloc(walls, sizeof(int)));
    UTW_TRY_ALLOC(g.to = utw_alloc(walls, sizeof(int)));
    UTW_TRY_ALLOC(g.degree = utw_alloc(nodes, sizeof(int)));
    UTW_TRY_ALLOC(g.order = utw_alloc(nodes, sizeof(int)));
    UTW_TRY_ALLOC(g.parent_wall = utw_alloc(nodes, sizeof(int)));
    UTW_TRY_ALLOC(start = utw_alloc(nodes + 1, sizeof(int)));
    UTW_TRY_ALLOC(list = utw_alloc(2 * walls, sizeof(int)));
    UTW_TRY_ALLOC(in_tree = utw_alloc(walls, sizeof(int)));
    UTW_TRY_ALLOC(seen = utw_alloc(nodes, sizeof(int)));
    UTW_TRY_ALLOC(depth = utw_alloc(nodes, sizeof(int)));
    for (int w = 0; w < g.n_walls; w++) {
        g.from[w] = midline->walls[w].from;
        g.to[w] = midline->walls[w].to;
        g.degree[g.from[w]]++;
        g.degree[g.to[w]]++;
    }
    list_walls(&g, start, list);
    if (grow_tree(&g, start, list, in_tree, seen) < g.n_nodes) {
        st = report_pieces(midline, &g, seen, err);
        goto done;
    }
    UTW_TRY(find_cycles(&g, in_tree, depth, err));
    *graph = g;
    st = UTW_OK;
done:
    if (st != UTW_OK) utw_graph_clear(&g);
    utw_free(start);
    utw_free(list);
    utw_free(in_tree);
    utw_free(seen);
    utw_free(depth);
    return st;
}

void utw_graph_clear(utw_graph *g)
{
    int **arrays[] = {&g->from,        &g->to,         &g->degree,    &g->order,
                      &g->parent_wall, &g->cell_start, &g->cell_wall, &g->cell_sign};
    for (size_t i = 0; i < sizeof arrays / sizeof arrays[0]; i++) {
        utw_free(*arrays[i]);
        *arrays[i] = NULL;
    }
}
