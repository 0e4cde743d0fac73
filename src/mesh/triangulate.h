/* SPDX-License-Identifier: GPL-3.0-or-later
 * The first, coarse triangulation, by Gmsh. The only file of the library that knows Gmsh. */
#ifndef UTW_MESH_TRIANGULATE_H
#define UTW_MESH_TRIANGULATE_H

#include "mesh/divide.h"
#include "mesh/mesh.h"

/** Triangulate the parts of a net between the chords of its division, with inner nodes where the
 * sides ask for them (Gmsh, Delaunay). Sides on the boundary and between parts get their
 * curve and parameters. Each surface of the mesh is a part. [out] *mesh, returned owned, connected.
 *  UTW_E_MESH when Gmsh finds no triangulation; UTW_E_NOMEM. One thread at a time. */
utw_status utw_mesh_triangulate(const utw_net *net, const utw_division *division, double growth,
                                utw_mesh **mesh, utw_error *err);

#endif
