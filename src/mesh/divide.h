/* SPDX-License-Identifier: GPL-3.0-or-later
 * Dividing the curves of a net into the sides of elements. */
#ifndef UTW_MESH_DIVIDE_H
#define UTW_MESH_DIVIDE_H

#include "outline/net.h"

/** Breakpoints of every net edge: those of edge e are t[first[e]] = 0 < ... < t[first[e+1]-1] = 1.
 */
typedef struct utw_division {
    int n_edge;
    int *first; /* [n_edge + 1], owned */
    double *t;  /* [first[n_edge]], owned */
} utw_division;

/** Divide so that a side is at most about 1.5 scale times the local wall thickness, turns by at
 * most a right angle (60 degrees on cubics), and lengths along the boundary grow by less than a
 * factor of about 2.7 from one to the next. Returned owned: utw_division_free(). UTW_E_NOMEM.
 * [in] finer[n_edge]: a further factor on the sides of each edge, for places where the chords did
 * not do; NULL: 1. */
utw_status utw_division_create(const utw_net *net, double scale, const double *finer,
                               utw_division **division, utw_error *err);
void utw_division_free(utw_division *division);

#endif
