/* SPDX-License-Identifier: GPL-3.0-or-later
 * From a chain of vertices, as a drawing gives them, to a loop of curves. */
#ifndef UTW_OUTLINE_CHAIN_H
#define UTW_OUTLINE_CHAIN_H

#include "outline/corner.h"
#include "outline/outline.h"

/** How the vertex before is joined to a vertex. */
typedef enum utw_join {
    UTW_JOIN_LINE,
    UTW_JOIN_ARC,    /* circle arc through point[0] */
    UTW_JOIN_BULGE,  /* circle arc, bulge = tan(angle/4), positive counter-clockwise */
    UTW_JOIN_BEZIER, /* cubic with the control points point[0], point[1] */
    UTW_JOIN_THROUGH /* natural cubic spline through point[0..n_point-1] */
} utw_join;

/** A vertex of a drawing. Zeroed but for `at` it is a sharp corner with a straight edge leading to
 * it. */
typedef struct utw_vertex {
    double at[2]; /* [L] */
    utw_join join;
    double bulge;       /* [1] */
    int n_point;        /* of the join */
    double (*point)[2]; /* [n_point][2] [L]; borrowed by the functions below */
    utw_corner_kind corner;
    double size; /* of the corner: radius, or length cut from each edge [L] */
} utw_vertex;

/** The loop through vertex[n], closed from the last to the first. Every curve remembers the vertex
 * it leads to, or rounds, or cuts. [out] *loop, owned by the caller: utw_loop_clear().
 *  UTW_E_OUTLINE when it makes no loop: what is wrong with which vertex (err->vertex, not in the
 * text), and what to do; UTW_E_NOMEM. */
utw_status utw_chain_loop(const utw_vertex *vertex, int n, utw_loop *loop, utw_error *err);

#endif
