/* SPDX-License-Identifier: GPL-3.0-or-later
 * Whether a net of several parts is sound: no overlap, no sliver, no contact in a point, one piece.
 */
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/boxtree.h"
#include "outline/check_curve.h"
#include "outline/curvelist.h"
#include "outline/intersect.h"
#include "outline/net_build.h"

/* ---- edges that meet away from nodes ----------------------------------------------------- */

typedef struct verifying {
    const utw_net_build *b;
    const utw_net *net;
    utw_error *err;
    utw_status st;
} verifying;

/* Edges of one part have been compared when its loops were checked. */
static int have_common_part(const utw_net_edge *a, const utw_net_edge *b)
{
    return (a->left >= 0 && (a->left == b->left || a->left == b->right)) ||
           (a->right >= 0 && (a->right == b->left || a->right == b->right));
}

static int shared_nodes(const utw_net_edge *a, const utw_net_edge *b)
{
    return (a->from == b->from ? UTW_SHARED(0, 0) : 0) | (a->from == b->to ? UTW_SHARED(0, 1) : 0) |
           (a->to == b->from ? UTW_SHARED(1, 0) : 0) | (a->to == b->to ? UTW_SHARED(1, 1) : 0);
}

/* Whether the curves pass through one another where they meet: not in an end, not as tangents. */
static int passes_through(const utw_curve *a, const utw_curve *b, const utw_meeting *m, double near)
{
    double d[2], e[2], p[2], q[2];
    utw_curve_d1(a, m->s, d);
    utw_curve_d1(b, m->t, e);
    utw_curve_point(a, m->s, p);
    utw_curve_point(b, m->t, q);
    return fabs(utw_cross(d, e)) > 1e-3 * utw_norm(d) * utw_norm(e) &&
           utw_distance(p, a->from) > near && utw_distance(p, a->to) > near &&
           utw_distance(q, b->from) > near && utw_distance(q, b->to) > near;
}

static utw_status report_meeting(const verifying *x, int i, int j, int shared, utw_meeting m)
{
    const double touch = UTW_TOUCH * x->b->size, sliver = UTW_SLIVER * x->b->size;
    const utw_net_edge *a = &x->net->edge[i], *b = &x->net->edge[j];
    char one[128], other[128];
    utw_strand_text(one, sizeof one, x->b, x->b->edge_strand[j]);
    utw_strand_text(other, sizeof other, x->b, x->b->edge_strand[i]);
    utw_status st;
    if (!utw_curves_narrow(&a->curve, &b->curve, shared, touch, &m) || shared)
        st = utw_fail(x->err, UTW_E_OUTLINE,
                      "%s leaves a sliver against %s near (%.6g, %.6g), less than %.3g wide: give "
                      "both the same "
                      "points, or a wider gap",
                      one, other, m.at[0], m.at[1], sliver);
    else if (passes_through(&a->curve, &b->curve, &m, sliver))
        st = utw_fail(
            x->err, UTW_E_OUTLINE,
            "parts %d and %d overlap: %s crosses %s near (%.6g, %.6g); cut one out of the other",
            a->part + 1, b->part + 1, one, other, m.at[0], m.at[1]);
    else
        st = utw_fail(x->err, UTW_E_OUTLINE,
                      "%s only touches %s, in the point (%.6g, %.6g): let the parts share an edge "
                      "there, or keep them "
                      "apart",
                      one, other, m.at[0], m.at[1]);
    utw_strand_place(x->err, x->b, x->b->edge_strand[j]);
    return st;
}

static int verify_pair(void *context, int i, int j)
{
    verifying *x = context;
    const utw_net_edge *a = &x->net->edge[i], *b = &x->net->edge[j];
    if (have_common_part(a, b)) return 0;
    const int shared = shared_nodes(a, b);
    const double tolerance = (shared ? UTW_TOUCH : UTW_SLIVER) * x->b->size;
    utw_meeting m;
    if (!utw_curves_meet(&a->curve, &b->curve, shared, tolerance, &m)) return 0;
    x->st = report_meeting(x, i, j, shared, m);
    return 1;
}

static utw_status verify_meetings(verifying *x, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_boxtree tree = {.n = 0};
    double(*box)[4] = NULL;
    const int n = x->net->n_edge;
    UTW_TRY_ALLOC(box = utw_alloc((size_t)n, sizeof *box));
    for (int e = 0; e < n; e++) utw_curve_box(&x->net->edge[e].curve, box[e]);
    UTW_TRY(utw_boxtree_init(&tree, (const double(*)[4])box, n, err));
    st = utw_boxtree_pairs(&tree, UTW_SLIVER * x->b->size, verify_pair, x) ? x->st : UTW_OK;
done:
    utw_boxtree_clear(&tree);
    utw_free(box);
    return st;
}

/* ---- around the nodes -------------------------------------------------------------------- */

/* An edge as it leaves a node, and the parts on either side of it seen in that direction. */
typedef struct spoke {
    int node, edge;
    int left, right;
    double angle;
} spoke;

static int by_angle(const void *a, const void *b)
{
    const spoke *p = a, *q = b;
    if (p->node != q->node) return p->node - q->node;
    if (p->angle != q->angle) return p->angle < q->angle ? -1 : 1;
    return p->edge - q->edge;
}

static spoke spoke_of(const utw_net_edge *e, int edge, int end)
{
    double d[2];
    utw_curve_d1(&e->curve, end, d);
    if (end) return (spoke){e->to, edge, e->right, e->left, atan2(-d[1], -d[0])};
    return (spoke){e->from, edge, e->left, e->right, atan2(d[1], d[0])};
}

static utw_status refuse_node(const verifying *x, const spoke *a, const spoke *b, const char *what)
{
    const double *p = x->net->node[a->node];
    char one[128], other[128];
    int first = x->b->edge_strand[a->edge], second = x->b->edge_strand[b->edge];
    if (first > second) { /* the later part is the one to move */
        const int swap = first;
        first = second;
        second = swap;
    }
    utw_strand_text(one, sizeof one, x->b, second);
    utw_strand_text(other, sizeof other, x->b, first);
    const utw_status st = utw_fail(x->err, UTW_E_OUTLINE, "%s and %s meet at (%.6g, %.6g) %s", one,
                                   other, p[0], p[1], what);
    utw_strand_place(x->err, x->b, second);
    return st;
}

/* The n spokes of one node in counter-clockwise order: what lies left of one must lie right of the
 * next, and the empty space around the node must be in one piece. */
static utw_status verify_node(const verifying *x, const spoke *s, int n)
{
    int empty = 0;
    const spoke *before = NULL; /* the spoke before the last empty sector */
    for (int i = 0; i < n; i++) {
        const spoke *a = &s[i], *b = &s[(i + 1) % n];
        const double angle = b->angle - a->angle + (i + 1 == n ? 2 * UTW_PI : 0);
        if (n > 1 && angle < UTW_CUSP)
            return refuse_node(
                x, a, b, "at an angle of nearly 0: let them share the edge, or open the angle");
        if (a->left != b->right)
            return refuse_node(x, a, b, "where their parts overlap: cut one out of the other");
        if (a->left >= 0) continue;
        if (++empty > 1)
            return refuse_node(x, before, a,
                               "and their parts touch in that point only: let them share an edge "
                               "there, or keep them "
                               "apart");
        before = a;
    }
    return UTW_OK;
}

static utw_status verify_nodes(const verifying *x, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    spoke *s = NULL;
    const int n = 2 * x->net->n_edge;
    UTW_TRY_ALLOC(s = utw_alloc((size_t)n, sizeof *s));
    for (int i = 0; i < n; i++) s[i] = spoke_of(&x->net->edge[i / 2], i / 2, i % 2);
    qsort(s, (size_t)n, sizeof *s, by_angle);
    for (int i = 0, j = 0; i < n; i = j) {
        while (j < n && s[j].node == s[i].node) j++;
        UTW_TRY(verify_node(x, s + i, j - i));
    }
    st = UTW_OK;
done:
    utw_free(s);
    return st;
}

/* ---- one inside the other, and all in one piece ------------------------------------------ */

static int root_of(int *parent, int i)
{
    while (parent[i] != i) i = parent[i] = parent[parent[i]];
    return i;
}

static void unite(int *parent, int i, int j)
{
    const int r = root_of(parent, i), s = root_of(parent, j);
    parent[r > s ? r : s] = r > s ? s : r;
}

/* A part is around a point when an odd number of its loops are: its outline and no hole. */
static int part_around(const utw_curve_list *list, const double p[2], int not_a, int not_b,
                       unsigned char *inside, int *touched, unsigned char *odd)
{
    const int n = utw_loops_around(list, p, inside, touched);
    int found = -1;
    for (int i = 0; i < n; i++) {
        const int part = list->part_of[touched[i]];
        if (inside[touched[i]]) odd[part] ^= 1;
    }
    for (int i = 0; i < n; i++) {
        const int part = list->part_of[touched[i]];
        if (odd[part] && part != not_a && part != not_b) found = part;
        inside[touched[i]] = 0;
    }
    for (int i = 0; i < n; i++) odd[list->part_of[touched[i]]] = 0;
    return found;
}

/* Edges cross nowhere by now, so one edge of each connected piece of the net tells for all of it.
 */
static utw_status verify_cover(const verifying *x, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_net *net = x->net;
    utw_curve_list list = {.n = 0};
    int *parent = NULL, *touched = NULL;
    unsigned char *inside = NULL, *odd = NULL, *done_with = NULL;
    UTW_TRY(utw_curve_list_init(&list, x->b->outline, err));
    UTW_TRY_ALLOC(parent = utw_alloc((size_t)net->n_node, sizeof *parent));
    UTW_TRY_ALLOC(done_with = utw_alloc((size_t)net->n_node, 1));
    UTW_TRY_ALLOC(touched = utw_alloc((size_t)list.n_loop, sizeof *touched));
    UTW_TRY_ALLOC(inside = utw_alloc((size_t)list.n_loop, 1));
    UTW_TRY_ALLOC(odd = utw_alloc((size_t)net->n_part, 1));
    for (int i = 0; i < net->n_node; i++) parent[i] = i;
    for (int e = 0; e < net->n_edge; e++) unite(parent, net->edge[e].from, net->edge[e].to);
    for (int e = 0; e < net->n_edge; e++) {
        const int piece = root_of(parent, net->edge[e].from);
        if (done_with[piece]) continue;
        done_with[piece] = 1;
        double p[2];
        utw_curve_point(&net->edge[e].curve, 0.5, p);
        const int part =
            part_around(&list, p, net->edge[e].left, net->edge[e].right, inside, touched, odd);
        if (part < 0) continue;
        st = utw_fail(err, UTW_E_OUTLINE,
                      "parts %d and %d overlap near (%.6g, %.6g): one lies inside the other; give "
                      "the outer one a hole "
                      "of that shape",
                      net->edge[e].part + 1, part + 1, p[0], p[1]);
        utw_strand_place(err, x->b, x->b->edge_strand[e]);
        goto done;
    }
    st = UTW_OK;
done:
    utw_curve_list_clear(&list);
    utw_free(parent);
    utw_free(done_with);
    utw_free(touched);
    utw_free(inside);
    utw_free(odd);
    return st;
}

static utw_status verify_whole(const verifying *x, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_net *net = x->net;
    int *parent = NULL;
    UTW_TRY_ALLOC(parent = utw_alloc((size_t)net->n_part, sizeof *parent));
    for (int p = 0; p < net->n_part; p++) parent[p] = p;
    for (int e = 0; e < net->n_edge; e++)
        if (net->edge[e].left >= 0 && net->edge[e].right >= 0)
            unite(parent, net->edge[e].left, net->edge[e].right);
    for (int p = 1; p < net->n_part; p++) {
        if (root_of(parent, p) == 0) continue;
        st = utw_fail(err, UTW_E_OUTLINE,
                      "part %d shares no edge with part 1 or with what hangs on it, so that the "
                      "section falls apart: "
                      "let them share an edge, or compute them as sections of their own",
                      p + 1);
        utw_error_place(err, p, -1, -1);
        goto done;
    }
    st = UTW_OK;
done:
    utw_free(parent);
    return st;
}

utw_status utw_net_verify(const utw_net_build *b, const utw_net *net, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    verifying x = {b, net, err, UTW_OK};
    UTW_TRY(verify_meetings(&x, err));
    UTW_TRY(verify_nodes(&x, err));
    UTW_TRY(verify_cover(&x, err));
    UTW_TRY(verify_whole(&x, err));
    st = UTW_OK;
done:
    return st;
}
