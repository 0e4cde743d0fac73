/* SPDX-License-Identifier: GPL-3.0-or-later
 * The walls of a midline as a graph: whether it is one, a spanning tree, and a basis of its cycles
 * (the cells). */
#ifndef UTW_OUTLINE_GRAPH_H
#define UTW_OUTLINE_GRAPH_H

#include "outline/wall.h"

/** Most walls and nodes of a midline: the cell equations are dense. */
#define UTW_GRAPH_MAX 4096

/** Tree and cycles of a connected graph. Every wall outside the tree closes exactly one cell: its
 * fundamental cycle. The number of cells is n_walls - n_nodes + 1 (Kirchhoff 1847), whatever way
 * the graph lies in the plane. */
typedef struct utw_graph {
    int n_nodes, n_walls;
    int *from, *to;   /* [n_walls] */
    int *degree;      /* [n_nodes] wall ends at the node */
    int *order;       /* [n_nodes] breadth first from node 0 */
    int *parent_wall; /* [n_nodes] tree wall toward the root, -1 at the root */
    int n_cells;
    int *cell_start; /* [n_cells + 1] into the next two */
    int *cell_wall;  /* [cell_start[n_cells]] */
    int *cell_sign;  /* +1 when the cell runs along the wall from `from` to `to`, else -1; the
                        closing wall is +1 */
} utw_graph;

/** Check the numbers of a midline and make its paths, shifted so that `origin` (returned) is their
 * zero. [in] midline, borrowed. [out] paths[n_walls]; origin[2]: middle of the box of the nodes
 * [L]; *size: greatest distance between two corners of the box of nodes and arc points [L].
 *  Refused: no wall, too many, a number that is not finite, a node index out of range, a thickness
 * that is not positive, a taper beyond a factor 1e6, a wall of no length, three points that are no
 * arc. UTW_E_ARGUMENT (NULL, counts), UTW_E_OUTLINE. err->vertex is the index of the wall or node
 * spoken of. */
utw_status utw_graph_paths(const utw_midline *midline, utw_path *paths, double origin[2],
                           double *size, utw_error *err);

/** Tree and cycles. Refused: a node without walls, more than one piece.
 *  [out] *graph, filled; clear with utw_graph_clear(). UTW_E_OUTLINE, UTW_E_NOMEM. */
utw_status utw_graph_init(const utw_midline *midline, utw_graph *graph, utw_error *err);

/** Free what utw_graph_init() allocated; safe on a zeroed struct and twice. */
void utw_graph_clear(utw_graph *graph);

/** The end of the wall that is not `node`. */
int utw_graph_other(const utw_graph *graph, int wall, int node);

#endif
