/* SPDX-License-Identifier: GPL-3.0-or-later
 * Triangles on the exact curves of a net. Sides that lie on a curve know it and their parameter
 * interval. */
#ifndef UTW_MESH_MESH_H
#define UTW_MESH_MESH_H

#include "outline/net.h"
#include "untwist.h"

/** A triangle, counter-clockwise. Side k joins node[k] to node[(k+1)%3]. */
typedef struct utw_triangle {
    int node[3];
    int side[3];    /* edges of the mesh, set by utw_mesh_connect() */
    int curve[3];   /* edge of the net the side lies on, or -1 */
    double t[3][2]; /* parameters on that curve at the side's start and end */
    int part;
    int from; /* the triangle it was cut from in the last utw_mesh_halve() */
} utw_triangle;

/** An edge of the mesh, from the lower to the higher node number. */
typedef struct utw_mesh_edge {
    int node[2];
    int tri[2];  /* triangles on either side; tri[1] = -1 on the boundary */
    int slot[2]; /* which side of tri[0], tri[1] it is */
} utw_mesh_edge;

typedef struct utw_mesh {
    const utw_net *net; /* borrowed; must outlive the mesh */
    int n_node, n_tri, n_edge;
    double (*xy)[2];   /* [n_node][2] [L], owned; the first net->n_node are the nodes of the net */
    utw_triangle *tri; /* [n_tri], owned */
    utw_mesh_edge *edge; /* [n_edge], owned */
} utw_mesh;

void utw_mesh_free(utw_mesh *mesh);

/** A copy on the same net. Returned owned: utw_mesh_free(). UTW_E_NOMEM. */
utw_status utw_mesh_copy(const utw_mesh *mesh, utw_mesh **copy, utw_error *err);

/** Find the edges of mesh->tri, replacing mesh->edge and every side[].
 *  UTW_E_MESH when more than two triangles share an edge; UTW_E_NOMEM. */
utw_status utw_mesh_connect(utw_mesh *mesh, utw_error *err);

/** Halve every edge with marked[edge] != 0 and cut the triangles accordingly into two, three or
 * four; new nodes on a curve lie on it (at the middle of its parameter interval). The mesh is
 * connected again afterwards. UTW_E_NOMEM, UTW_E_MESH. */
utw_status utw_mesh_halve(utw_mesh *mesh, const unsigned char *marked, utw_error *err);

/** Direction in which side k of a triangle leaves its corner `end` (0: its start, 1: its end): the
 * tangent of its curve, or the chord. Not normalised. */
void utw_mesh_leave(const utw_mesh *mesh, const utw_triangle *tri, int k, int end, double d[2]);

/** Interior angle of a triangle at corner k between the true tangents of its sides [rad]. */
double utw_mesh_corner_angle(const utw_mesh *mesh, const utw_triangle *tri, int k);

/** 1 when the side lies on a curve that is not a straight line. */
int utw_mesh_is_curved(const utw_mesh *mesh, const utw_triangle *tri, int k);

/** Smallest ratio of the map's determinant to that of the straight triangle over one element; -1
 * when its corners run the wrong way round. */
double utw_mesh_triangle_quality(const utw_mesh *mesh, int t);

/** Smallest ratio, over all elements, of the map's determinant to that of the straight triangle
 * (mesh/blend.h); 1 on straight meshes, not positive when an element folds. Below UTW_LEAST_QUALITY
 * a mesh is not used. */
double utw_mesh_quality(const utw_mesh *mesh);
#define UTW_LEAST_QUALITY 0.05

/** What the mesher is asked for. */
typedef struct utw_mesh_options {
    double scale; /* factor on the element size that follows from the wall thickness; 1 */
    double
        layer_target; /* relative error of J at which the corner layers may stop; the tolerance */
} utw_mesh_options;

/** Mesh a net: element size from the local wall thickness, Gmsh's triangulation of the chords,
 * repair of flat corners, corner layers. [out] *mesh, returned owned: utw_mesh_free(). Uses Gmsh,
 * which has global state: one thread at a time. UTW_E_MESH, UTW_E_NOMEM. */
utw_status utw_mesh_create(const utw_net *net, const utw_mesh_options *options, utw_mesh **mesh,
                           utw_error *err);

#endif
