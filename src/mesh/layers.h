/* SPDX-License-Identifier: GPL-3.0-or-later
 * Corner layers: elements that shrink geometrically toward the corners where the solution is
 * singular. */
#ifndef UTW_MESH_LAYERS_H
#define UTW_MESH_LAYERS_H

#include "mesh/mesh.h"

/** Ratio of one layer to the next: 0.3 was measured best on five profiles (0.15 of the literature
 * leaves nine tenths of the error in the outermost ring). */
#define UTW_LAYER_RATIO 0.3

/** Add corner layers at every node of the net whose interior angle exceeds 185 degrees, and at the
 * nodes where parts meet: as many as the singular exponent pi/angle asks for to reach the relative
 * error `target` of J; one layer at sharp convex corners. Sides between two such corners are halved
 * first. Conforming by construction: every side at a corner is cut at the same fractions of its
 * parameter. Source: Babuska and Guo, Computational Mechanics 1 (1986) 21-41. The mesh must be
 * connected and stays so. UTW_E_NOMEM, UTW_E_MESH. */
utw_status utw_mesh_add_layers(utw_mesh *mesh, double target, utw_error *err);

/** Add layers[node] more layers at the nodes of the net, layers[net->n_node] >= 0; `from` of every
 * triangle tells what it was cut from. Sides between two such nodes are halved first, or, where a
 * node asks for one layer only, it gets none: layers[] is changed accordingly. UTW_E_NOMEM,
 * UTW_E_MESH. */
utw_status utw_mesh_cut_layers(utw_mesh *mesh, int *layers, utw_error *err);

#endif
