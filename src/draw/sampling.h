/* SPDX-License-Identifier: GPL-3.0-or-later
 * The section cut into small triangles, fine enough that straight lines between their corners look
 * smooth on the page; curved elements follow their curves. Where elements are cut unequally the
 * triangles still fit together (points of the finer side are moved onto those of the coarser one,
 * as in Moreton, Watertight tessellation using forward differencing, Graphics Hardware 2001). */
#ifndef UTW_DRAW_SAMPLING_H
#define UTW_DRAW_SAMPLING_H

#include "mesh/mesh.h"

/** Greatest number of pieces a side is cut into, a power of two. */
#define UTW_CUTS_MAX 32

/** A point of an element at which a vertex's value is taken: r = i/n, s = j/n with n = 2^density of
 * the element. */
typedef struct utw_sample_point {
    int vertex;
    unsigned char i, j;
} utw_sample_point;

/** Vertices are not shared between parts. Coordinates are the mesh's until utw_sampling_map(). */
typedef struct utw_sampling {
    const utw_mesh *mesh; /* borrowed */
    int n_vertex, n_tri, n_edge, n_rim;
    double (*xy)[2];        /* [n_vertex][2], owned */
    int (*tri)[3];          /* [n_tri] vertices, as the mesh's triangles run; owned */
    int *element;           /* [n_tri] the mesh's triangle it is part of; owned */
    int (*edge)[2];         /* [n_edge] vertices, the lower number first; owned */
    int (*side)[3];         /* [n_tri] edges from vertex k to k+1; owned */
    int (*rim)[2];          /* [n_rim] sides on the boundary of a part, the part on the left;
                               owned */
    int *rim_edge;          /* [n_rim] its edge; owned */
    int *rim_next;          /* [n_rim] the rim side that starts where it ends; owned */
    int *rim_of_edge;       /* [n_edge] or -1; owned */
    unsigned char *density; /* [mesh->n_tri] log2 of the cuts of each element; owned */
    int *first; /* [mesh->n_tri][2]: those of an element are point[first .. end); owned */
    utw_sample_point *point; /* owned */
    size_t vertex_capacity, tri_capacity, element_capacity, point_capacity;
} utw_sampling;

/** How fine, in the mesh's unit of length. */
typedef struct utw_fineness {
    double spacing; /* of the vertices */
    double sagitta; /* greatest distance of a curve from its chords */
} utw_fineness;

/** Cut. [in] mesh, borrowed while the sampling is used. Free with utw_sampling_clear().
 * UTW_E_NOMEM. */
utw_status utw_sampling_init(utw_sampling *sampling, const utw_mesh *mesh,
                             const utw_fineness *fineness, utw_error *err);
void utw_sampling_clear(utw_sampling *sampling);

/** Where the mesh's plane lies on the page: page = (x0 + scale x, y0 - scale y). */
typedef struct utw_frame {
    double scale, x0, y0;
} utw_frame;

/** Move the vertices onto the page. */
void utw_sampling_map(utw_sampling *sampling, const utw_frame *frame);

#endif
