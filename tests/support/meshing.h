/* SPDX-License-Identifier: GPL-3.0-or-later
 * Meshes for tests, and what every mesh must satisfy. */
#ifndef UTW_TESTS_MESHING_H
#define UTW_TESTS_MESHING_H

#include "mesh/blend.h"
#include "mesh/mesh.h"
#include "support/samples.h"

/** The net of an outline, as drawn (not moved). Owned: utw_net_free(). */
utw_net *net_of(const utw_outline *outline);

/** Its mesh with the default element size and layers for a relative error `target` of J. Owned:
 * utw_mesh_free(). */
utw_mesh *mesh_of(const utw_net *net, double target);

/** Two triangles, (0,0) (3,0) (3,2) and (0,0) (3,2) (0,2), on a net of the rectangle; layers and
 * size functions are not involved. Owned: utw_mesh_free(), utw_net_free(). */
utw_mesh *mesh_two_triangles(utw_net **net);

/** Area of the elements on their true curves, by quadrature exact to rounding [L^2]. */
double mesh_area(const utw_mesh *mesh);

/** The test fails unless: triangles are counter-clockwise and not folded, every edge has two
 * triangles or lies on the boundary of the net, sides and edges agree, no node is unused, sides on
 * a curve begin and end on it at their parameters, every curve of the net is covered once from each
 * side that has a part, and parts are as the net says. */
void mesh_check(const utw_mesh *mesh);

#endif
