/* SPDX-License-Identifier: GPL-3.0-or-later
 * The section as a net of curves that meet at nodes only: what the mesher and the midline finder
 * start from. Curves that two parts share stand in it once, cut where either part has a vertex. */
#ifndef UTW_OUTLINE_NET_H
#define UTW_OUTLINE_NET_H

#include "outline/outline.h"

/** One curve of the net, from node `from` to node `to` (equal for a whole circle never: circles are
 * cut). */
typedef struct utw_net_edge {
    utw_curve curve;
    int from, to;           /* nodes */
    int left, right;        /* parts on either side, -1 for none */
    int part, loop, vertex; /* where it comes from, for messages */
} utw_net_edge;

/** A loop of a part as a chain of edges: ref > 0 is edge ref-1 run forward, ref < 0 edge -ref-1
 * backward. The part lies on the left. */
typedef struct utw_net_loop {
    int part;
    int n;
    int *ref; /* [n], owned */
} utw_net_loop;

typedef struct utw_net {
    int n_node, n_edge, n_loop, n_part;
    double (*node)[2];  /* [n_node][2] [L], owned */
    utw_net_edge *edge; /* [n_edge], owned */
    utw_net_loop
        *loop; /* [n_loop], owned; the first loop of each part is its outline, parts ascending */
} utw_net;

/** Build the net of an outline that has been read (and so checked); it is borrowed and not needed
 *  afterwards. Closed curves (whole circles and ellipses) are cut in four; other curves stay whole
 *  unless a vertex of another part lies on them.
 *  Parts may touch along curves (lines, arcs of one circle or ellipse, pieces of one spline); where
 *  they do the common piece becomes one edge with a part on either side. Points of different parts
 *  within 1e-9 of the section's size are one node; within 1e-6 but not 1e-9 they leave a sliver.
 *  The ends of an edge's curve are its nodes bit by bit.
 *  [out] *net, returned owned: utw_net_free(); untouched on failure.
 *  UTW_E_OUTLINE when parts overlap, leave a sliver, touch in a point only, meet at an angle of
 *  nearly 0, or do not hang together along edges; UTW_E_NOMEM. */
utw_status utw_net_create(const utw_outline *outline, utw_net **net, utw_error *err);

void utw_net_free(utw_net *net);

#endif
