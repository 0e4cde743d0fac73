/* SPDX-License-Identifier: GPL-3.0-or-later
 * The midline while it is put together from the walls found in the branches. */
#ifndef UTW_THINWALL_BUILD_H
#define UTW_THINWALL_BUILD_H

#include "thinwall/segment.h"

/** A wall between two nodes, or one whose nodes are yet to be placed. */
typedef struct utw_build_wall {
    utw_path path; /* as found, without what reaches into corners and tips */
    int node[2];   /* at its start and end */
    int branch;    /* it was found in */
    int chord[2];  /* chords of its branch where it starts and ends */
    utw_wall_kind kind;
    int bound; /* 1: `path` already runs from node to node */
} utw_build_wall;

typedef struct utw_build {
    const utw_border *border;   /* borrowed */
    const utw_chordal *chordal; /* borrowed */
    int n_node, n_wall;
    double (*node)[2];    /* [n_node], owned; units of the border */
    utw_build_wall *wall; /* [n_wall], owned */
    size_t node_capacity, wall_capacity;
    utw_error *err;
} utw_build;

/** Append a node, a wall. [out] *index. UTW_E_NOMEM. */
utw_status utw_build_add_node(utw_build *build, const double p[2], int *index);
utw_status utw_build_add_wall(utw_build *build, const utw_build_wall *wall);

void utw_build_clear(utw_build *build);

/** Middle of a chord. */
void utw_chord_middle(const utw_border *border, const utw_chord *chord, double m[2]);

/** Where two walls of a branch that follow one another meet: one node, or the two ends of a bend
 * between them. Walls within 15 degrees of straight meet half way between their ends (or, when
 * their thicknesses differ, where the thinner one ends); others where they cross when continued.
 * Lines whose outer corner is rounded with more than 1.25 times their thickness get a bend: an arc
 * that touches both, with the mean of the outer and the inner radius (both are measured). Midlines
 * that run side by side further apart than 0.6 of the thinner wall keep their lines and are joined
 * by a link.
 *  [in] a, b: indices of walls, b after a. Sets node[1] of a and node[0] of b; appends what stands
 * between them. UTW_E_NOMEM. */
utw_status utw_build_join(utw_build *build, int a, int b);

/** The node of a free end of wall w, at its end (1) or start (0): where it reaches the boundary. A
 * bulb there, with 1.3 times the area of the wall carried on and 0.6 thicknesses squared more,
 * becomes a wall of its own that has its area and points through its centroid. Sets the node,
 * appends the bulb. UTW_E_NOMEM. */
utw_status utw_build_tip(utw_build *build, int w, int at_end);

/** What stands out from a node and is no wall that could be followed: a wall with the area and the
 * centroid of all beyond a chord. */
utw_status utw_build_stub(utw_build *build, int node, int chord, int at_end);

/** Where walls that meet at a junction meet: the point nearest to all their lines, weighted with
 * their areas. [in] wall[n], end[n] (1: its end), borrowed; near, radius: the junction's circle.
 * Walls whose line passes further than 0.45 of their thickness from it are linked to it. Sets their
 * nodes to `node` or to that of the link. UTW_E_NOMEM. */
utw_status utw_build_meet(utw_build *build, int node, const int *wall, const int *end, int n,
                          const double near[2], double radius);

/** The walls between their nodes: lines and arcs with the thickness carried on to the nodes.
 * [out] *midline, in the drawing's coordinates, owned: utw_midline_clear(). kind[n_walls] and
 * length[n_walls] (along which each has two faces: without corners and junctions [L]), owned:
 * utw_free().
 * UTW_E_NOMEM. */
utw_status utw_build_finish(const utw_build *build, utw_midline *midline, utw_wall_kind **kind,
                            double **length);

#endif
