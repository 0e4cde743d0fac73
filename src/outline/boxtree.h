/* SPDX-License-Identifier: GPL-3.0-or-later
 * A tree of boxes over a sequence of curves, for finding the few that can meet. */
#ifndef UTW_OUTLINE_BOXTREE_H
#define UTW_OUTLINE_BOXTREE_H

#include "untwist.h"

/** A complete binary tree over n boxes {xmin, ymin, xmax, ymax} in the order given: node 1 is the
 * root, node k has the children 2k and 2k+1, box i stands at n_leaf + i. Runs of neighbours along a
 * loop lie close together, so the order of an outline is a good order without any sorting. */
typedef struct utw_boxtree {
    int n, n_leaf;
    double (*box)[4]; /* [2 n_leaf], owned */
} utw_boxtree;

/** Build the tree over box[n], which is copied. [out] *tree: free with utw_boxtree_clear().
 * UTW_E_NOMEM. */
utw_status utw_boxtree_init(utw_boxtree *tree, const double (*box)[4], int n, utw_error *err);

/** Free what the tree owns; a zeroed struct is allowed. */
void utw_boxtree_clear(utw_boxtree *tree);

/** Call visit(context, i, j), i < j, for every two boxes nearer than `margin` [L] in x and in y,
 * until it returns other than 0; returns that or 0. */
int utw_boxtree_pairs(const utw_boxtree *tree, double margin,
                      int (*visit)(void *context, int i, int j), void *context);

/** Call visit(context, i) for every box that has a point in common with `box`, in ascending order,
 * until it returns other than 0; returns that or 0. */
int utw_boxtree_query(const utw_boxtree *tree, const double box[4],
                      int (*visit)(void *context, int i), void *context);

#endif
