/* SPDX-License-Identifier: GPL-3.0-or-later
 * A finer mesh where it is asked for. */
#ifndef UTW_MESH_REFINE_H
#define UTW_MESH_REFINE_H

#include "mesh/mesh.h"

/** Cut the triangles with wanted[t] != 0: those at a node of the net get two more layers toward it
 * (what is left there is the corner's own singularity), the others are cut in four; neighbours
 * follow so that the mesh conforms and no curved side ends up on a flat triangle.
 * [out] *finer, owned by the caller (utw_mesh_free()), NULL when an element would fold or nothing
 * was cut; *parent[finer->n_tri], owned (utw_free()): the triangle of `mesh` each one came from.
 * UTW_E_NOMEM, UTW_E_MESH. */
utw_status utw_mesh_refine(const utw_mesh *mesh, const unsigned char *wanted, utw_mesh **finer,
                           int **parent, utw_error *err);

#endif
