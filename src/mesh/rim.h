/* SPDX-License-Identifier: GPL-3.0-or-later
 * The boundary loops of a mesh, and cuts that join every hole to the outer loop. */
#ifndef UTW_MESH_RIM_H
#define UTW_MESH_RIM_H

#include "mesh/mesh.h"

/** A corner of a triangle that lies on the left of the cut of a hole. */
typedef struct utw_cut_corner {
    int tri, corner, hole; /* hole: number of the loop, 1.. */
} utw_cut_corner;

/** Loops run with the material on the left; loop 0 is the outer one, 1.. the holes. */
typedef struct utw_rim {
    int n_loop;
    int *loop;   /* [n_node] loop of a boundary node, -1 inside; owned */
    int *start;  /* [n_loop] a node of each loop; owned */
    int *leave;  /* [n_node] 3*tri + side of the boundary side that starts at the node, -1 inside;
                    owned */
    int *parent; /* [n_loop] the loop where the cut of a hole ends, -1 for the outer loop; owned */
    int n_cut;
    utw_cut_corner *cut; /* [n_cut], owned */
} utw_rim;

/** Walk the boundary of a connected mesh and lay one cut along edges from every hole to another
 * loop, so that the loops form a tree with the outer loop as its root. A function that is 1 at the
 * corners left of the cut of hole k, 0 at all others and linear between jumps by one constant
 * across the cut: its curl is a divergence-free flux from hole k to its parent. UTW_E_MESH when a
 * boundary node has two boundary sides leaving it (the section touches itself in a point) or parts
 * do not hang together; UTW_E_NOMEM. */
utw_status utw_rim_create(const utw_mesh *mesh, utw_rim **rim, utw_error *err);
void utw_rim_free(utw_rim *rim);

#endif
