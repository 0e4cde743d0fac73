/* SPDX-License-Identifier: GPL-3.0-or-later
 * The chordal axis of a section: sleeves of chords from side to side, and the junctions where they
 * meet, pruned of what corners and roundings add. */
#ifndef UTW_THINWALL_CHORDAL_H
#define UTW_THINWALL_CHORDAL_H

#include "thinwall/border.h"

/** A chord of the triangulation that crosses a wall, seen in the direction of its branch. */
typedef struct utw_chord {
    int left, right; /* points of the border */
} utw_chord;

/** A sleeve: the chords from one end of a wall, or chain of walls, to the other. Seen along it the
 * left boundary runs backward and the right one forward. */
typedef struct utw_branch {
    int from, to; /* junctions, or -1: a free end, bounded by the boundary from `right` on to `left`
                     of the last chord (before the first one from `left` on to `right`) */
    int first, n; /* its chords */
    int closed;   /* 1: a ring without junctions; from = to = -1 and the last chord is the first */
} utw_branch;

/** A triangle from which three sleeves leave. */
typedef struct utw_chordal_junction {
    double centre[2], radius; /* of the circle through its corners, in units of the border */
} utw_chordal_junction;

typedef struct utw_chordal {
    int n_chord, n_branch, n_junction;
    utw_chord *chord;               /* [n_chord], owned; branches one after the other */
    utw_branch *branch;             /* [n_branch], owned */
    utw_chordal_junction *junction; /* [n_junction], owned */
    double *sum;                    /* [n_point + 1], owned: of cross products along the border */
    double *area; /* [n_chord], owned: from the first chord of the branch on, with what was taken
                     off there [units^2] */
} utw_chordal;

/** Find the axis. Triangles of the constrained Delaunay triangulation of the points with one, two
 * and three neighbours are ends, parts of sleeves and junctions (Prasad, CNLS Newsletter 139, Los
 * Alamos 1997). What lies beyond a chord of width w, to a height h and with an area a, is taken off
 * unless a^2/(h w^3) >= 3/4 for it or for a chord further out: that is h/w times the square of how
 * well it fills its rectangle. A stub three quarters as long as wide stays; so does a wedge of less
 * than 19 degrees; the corner of a plate has 1/8, that of two walls folded to 30 degrees 0.47.
 *  [in] border, borrowed. [out] *chordal, returned owned: utw_chordal_free(). No branch at all is a
 * result: the section is a lump. UTW_E_MESH, UTW_E_NOMEM. */
utw_status utw_chordal_create(const utw_border *border, utw_chordal **chordal, utw_error *err);

void utw_chordal_free(utw_chordal *chordal);

/** Area between two chords of a branch, from the first on to the second; in a ring it may pass its
 * end. 0 when they are the same or a few chords the wrong way round. [units^2] */
double utw_chordal_area(const utw_chordal *chordal, const utw_branch *branch, int from, int to);

/** Area of a free end beyond a chord: at the end (1) or start (0) of its branch. */
double utw_chordal_end_area(const utw_border *border, const utw_chordal *chordal, int chord,
                            int at_end);

#endif
