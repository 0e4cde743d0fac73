/* SPDX-License-Identifier: GPL-3.0-or-later
 * What the steps of building a net hand from one to the next. */
#ifndef UTW_OUTLINE_NET_BUILD_H
#define UTW_OUTLINE_NET_BUILD_H

#include "outline/net.h"

/* Nearer than this part of the section's size, parts that do not share a piece of boundary leave a
 * sliver. */
#define UTW_SLIVER 1e-6

/** A piece of a loop between two vertices of any part; the part lies on its left. */
typedef struct utw_strand {
    utw_curve curve;
    int part, loop, k; /* curve k of the loop of the outline it comes from */
    int from, to;      /* nodes */
    int edge;          /* of the net; run forward or backward: */
    int forward;
} utw_strand;

/** The net in the making. Strands of one loop stand in their order; loops are numbered through all
 * parts. */
typedef struct utw_net_build {
    const utw_outline *outline; /* borrowed */
    double size;                /* diagonal of the box [L] */
    int n, n_loop, n_node, n_edge;
    utw_strand *strand; /* [n], owned */
    int *first;         /* [n_loop + 1], owned: first strand of each loop */
    double (*node)[2];  /* [n_node], owned */
    int *edge_strand;   /* [n_edge], owned: the strand that gives an edge its curve */
} utw_net_build;

/** Cut every strand where a vertex of another part lies on it. UTW_E_OUTLINE when a vertex comes
 * near a curve of another part without lying on it; UTW_E_NOMEM. */
utw_status utw_net_cut(utw_net_build *b, utw_error *err);

/** Number the nodes, giving strand ends of different parts that lie within rounding the same node
 * and bit-identical coordinates. UTW_E_NOMEM. */
utw_status utw_net_join(utw_net_build *b, utw_error *err);

/** Make one edge of the strands that run the same course between the same nodes, in the order of
 * the strands. UTW_E_OUTLINE when strands nearly do, or lie on the same side of one edge;
 * UTW_E_NOMEM. */
utw_status utw_net_merge(utw_net_build *b, utw_error *err);

/** Whether a net of several parts is sound: edges meet in nodes only and not too sharply, no part
 * covers another, all hang together along edges. UTW_E_OUTLINE, UTW_E_NOMEM. */
utw_status utw_net_verify(const utw_net_build *b, const utw_net *net, utw_error *err);

/** "the edge to vertex 7 of part 2" (", hole 1" and so on added) for a strand, into text[size]. */
void utw_strand_text(char *text, size_t size, const utw_net_build *b, int strand);

/** Set the place of an error to that of a strand. */
void utw_strand_place(utw_error *err, const utw_net_build *b, int strand);

#endif
