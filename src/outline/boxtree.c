/* SPDX-License-Identifier: GPL-3.0-or-later
 * A complete binary tree of bounding boxes. */
#include "outline/boxtree.h"

#include <math.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"

utw_status utw_boxtree_init(utw_boxtree *tree, const double (*box)[4], int n, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_boxtree made = {.n = n, .n_leaf = 1};
    while (made.n_leaf < n) made.n_leaf *= 2;
    UTW_TRY_ALLOC(made.box = utw_alloc(2 * (size_t)made.n_leaf, sizeof *made.box));
    for (int i = 0; i < made.n_leaf; i++) {
        const double empty[4] = {HUGE_VAL, HUGE_VAL, -HUGE_VAL, -HUGE_VAL};
        memcpy(made.box[made.n_leaf + i], i < n ? box[i] : empty, sizeof *made.box);
    }
    for (int k = made.n_leaf - 1; k >= 1; k--)
        for (int q = 0; q < 4; q++) {
            const double l = made.box[2 * k][q], r = made.box[2 * k + 1][q];
            made.box[k][q] = q < 2 ? fmin(l, r) : fmax(l, r);
        }
    *tree = made;
    st = UTW_OK;
done:
    return st;
}

void utw_boxtree_clear(utw_boxtree *tree)
{
    utw_free(tree->box);
    memset(tree, 0, sizeof *tree);
}

static int apart(const double a[4], const double b[4], double margin)
{
    return a[0] > b[2] + margin || b[0] > a[2] + margin || a[1] > b[3] + margin ||
           b[1] > a[3] + margin;
}

typedef struct pair_walk {
    const utw_boxtree *tree;
    double margin;
    int (*visit)(void *, int, int);
    void *context;
} pair_walk;

/* Nodes a <= b of one level, so that both are leaves or neither. */
static int walk_pair(const pair_walk *w, int a, int b)
{
    const utw_boxtree *tree = w->tree;
    if (apart(tree->box[a], tree->box[b], w->margin)) return 0;
    if (a >= tree->n_leaf)
        return a == b ? 0 : w->visit(w->context, a - tree->n_leaf, b - tree->n_leaf);
    for (int i = 0; i < 2; i++)
        for (int j = a == b ? i : 0; j < 2; j++) {
            const int stop = walk_pair(w, 2 * a + i, 2 * b + j);
            if (stop) return stop;
        }
    return 0;
}

int utw_boxtree_pairs(const utw_boxtree *tree, double margin,
                      int (*visit)(void *context, int i, int j), void *context)
{
    const pair_walk w = {tree, margin, visit, context};
    return walk_pair(&w, 1, 1);
}

static int walk_query(const utw_boxtree *tree, int k, const double box[4],
                      int (*visit)(void *, int), void *context)
{
    if (apart(tree->box[k], box, 0)) return 0;
    if (k >= tree->n_leaf) return visit(context, k - tree->n_leaf);
    const int stop = walk_query(tree, 2 * k, box, visit, context);
    return stop ? stop : walk_query(tree, 2 * k + 1, box, visit, context);
}

int utw_boxtree_query(const utw_boxtree *tree, const double box[4],
                      int (*visit)(void *context, int i), void *context)
{
    return walk_query(tree, 1, box, visit, context);
}
