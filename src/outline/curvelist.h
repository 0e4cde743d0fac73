/* SPDX-License-Identifier: GPL-3.0-or-later
 * All curves of an outline in one row with a tree of their boxes, and which loops lie around a
 * point. */
#ifndef UTW_OUTLINE_CURVELIST_H
#define UTW_OUTLINE_CURVELIST_H

#include "outline/boxtree.h"
#include "outline/outline.h"

typedef struct utw_curve_ref {
    const utw_curve *curve; /* borrowed from the outline */
    int part, loop, k;      /* curve k of a loop of a part */
    int n;                  /* curves of that loop */
    int vertex;             /* of the file */
    int index;              /* number of the loop among all loops, parts ascending */
} utw_curve_ref;

/** Curves of one loop stand together; loops that lie near one another stand near one another. */
typedef struct utw_curve_list {
    int n, n_loop;
    utw_curve_ref *ref; /* [n], owned */
    int *first;         /* [n_loop], owned: place of curve 0 of loop `index` */
    int *part_of;       /* [n_loop], owned: part of loop `index` */
    int *loop_of;       /* [n_loop], owned: its number in the part */
    utw_boxtree tree;   /* over the boxes of ref[] */
} utw_curve_list;

/** List the curves of an outline, which must be finite; it is borrowed and must outlive the list.
 *  Free with utw_curve_list_clear(). UTW_E_NOMEM. */
utw_status utw_curve_list_init(utw_curve_list *list, const utw_outline *outline, utw_error *err);

/** Free what a list owns; a zeroed struct is allowed. */
void utw_curve_list_clear(utw_curve_list *list);

/** Which loops a point lies in, by the parity of crossings of a ray toward +x. inside[n_loop] must
 * be all 0; it is 1 afterwards for the loops around the point. touched[n_loop] receives the indices
 * of loops the ray crossed; returns their number: set those entries of `inside` back to 0 before
 * the next call. A point on a curve counts as either. */
int utw_loops_around(const utw_curve_list *list, const double point[2], unsigned char *inside,
                     int *touched);

#endif
