/* SPDX-License-Identifier: GPL-3.0-or-later
 * Whether an outline can be a cross-section: loops that meet, holes that lie wrong. */
#include "outline/check.h"

#include <math.h>
#include <stdio.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/check_curve.h"
#include "outline/curvelist.h"
#include "outline/intersect.h"
#include "outline/net.h"

enum { MAX_CURVES = 200000 };

typedef struct checking {
    const utw_outline *outline;
    const utw_curve_list *list;
    double size;
    utw_error *err;
    utw_status st;
} checking;

static const utw_loop *loop_of(const checking *x, const utw_curve_ref *r)
{
    return &x->outline->part[r->part].loop[r->loop];
}

/* ---- two curves that meet ---------------------------------------------------------------- */

static int parallel(const utw_curve *a, const utw_curve *b, const utw_meeting *m)
{
    double d[2], e[2];
    utw_curve_d1(a, m->s, d);
    utw_curve_d1(b, m->t, e);
    return fabs(utw_cross(d, e)) < 1e-3 * utw_norm(d) * utw_norm(e);
}

/* "crosses", "touches" or "comes within 2e-8 of" */
static void meeting_text(char *text, size_t size, const checking *x, const utw_curve_ref *a,
                         const utw_curve_ref *b, int shared, utw_meeting *m)
{
    const double touch = UTW_TOUCH * x->size;
    if (!utw_curves_narrow(a->curve, b->curve, shared, touch, m)) {
        snprintf(text, size, "comes within %.2g of", m->distance);
        return;
    }
    double p[2], q[2];
    utw_curve_point(a->curve, m->s, p);
    utw_curve_point(b->curve, m->t, q);
    const double reach = 10 * touch;
    const int at_end =
        utw_distance(p, a->curve->from) < reach || utw_distance(p, a->curve->to) < reach ||
        utw_distance(q, b->curve->from) < reach || utw_distance(q, b->curve->to) < reach;
    const char *word = shared && parallel(a->curve, b->curve, m)   ? "runs along"
                       : at_end || parallel(a->curve, b->curve, m) ? "touches"
                                                                   : "crosses";
    snprintf(text, size, "%s", word);
}

static utw_status report_meeting(const checking *x, const utw_curve_ref *a, const utw_curve_ref *b,
                                 int shared, utw_meeting m)
{
    char loop[64], edge_a[64], edge_b[64], word[64], other[64] = "";
    utw_loop_text(loop, sizeof loop, b->part, b->loop);
    utw_edge_text(edge_a, sizeof edge_a, loop_of(x, a), a->k);
    utw_edge_text(edge_b, sizeof edge_b, loop_of(x, b), b->k);
    meeting_text(word, sizeof word, x, a, b, shared, &m);
    if (a->index != b->index && a->loop == 0) snprintf(other, sizeof other, " of the outline");
    if (a->index != b->index && a->loop > 0) snprintf(other, sizeof other, " of hole %d", a->loop);
    const utw_status st =
        utw_fail(x->err, UTW_E_OUTLINE, "%s%s %s %s%s near (%.6g, %.6g); move one of them", loop,
                 edge_b, word, edge_a, other, m.at[0], m.at[1]);
    utw_error_place(x->err, b->part, b->loop, b->vertex);
    return st;
}

/* Which ends two curves of one loop share because one follows the other. */
static int shared_ends(const utw_curve_ref *a, const utw_curve_ref *b)
{
    int shared = 0;
    if (a->index != b->index) return 0;
    if ((a->k + 1) % a->n == b->k) shared |= UTW_SHARED(1, 0);
    if ((b->k + 1) % b->n == a->k) shared |= UTW_SHARED(0, 1);
    return shared;
}

static int check_pair(void *context, int i, int j)
{
    checking *x = context;
    const utw_curve_ref *a = &x->list->ref[i], *b = &x->list->ref[j];
    if (a->part != b->part) return 0; /* parts may touch: the net looks after them */
    if (a->index > b->index || (a->index == b->index && a->k > b->k)) {
        const utw_curve_ref *swap = a;
        a = b;
        b = swap;
    }
    const int shared = shared_ends(a, b);
    utw_meeting m;
    /* Neighbours come as near as one likes at their common end; others need a gap that can be
     * solved. */
    const double tolerance = (shared ? UTW_TOUCH : UTW_DETAIL) * x->size;
    if (!utw_curves_meet(a->curve, b->curve, shared, tolerance, &m)) return 0;
    x->st = report_meeting(x, a, b, shared, m);
    return 1;
}

/* ---- loops in loops ---------------------------------------------------------------------- */

static utw_status report_nesting(const checking *x, int index, int other)
{
    const int part = x->list->part_of[index], loop = x->list->loop_of[index];
    const double *p = x->list->ref[x->list->first[index]].curve->from;
    char text[64];
    utw_loop_text(text, sizeof text, part, loop);
    utw_status st;
    if (other < 0)
        st = utw_fail(x->err, UTW_E_OUTLINE,
                      "%sit lies outside the outline of its part, near (%.6g, %.6g); move it "
                      "inside or remove it",
                      text, p[0], p[1]);
    else
        st = utw_fail(
            x->err, UTW_E_OUTLINE,
            "%sit lies inside hole %d, near (%.6g, %.6g); remove it, or make what it stands for a "
            "part of its own",
            text, x->list->loop_of[other], p[0], p[1]);
    utw_error_place(x->err, part, loop, -1);
    return st;
}

/* Loops do not meet here, so one point of a hole tells where all of it lies. */
static utw_status check_nesting(checking *x)
{
    utw_error *err = x->err;
    utw_status st = UTW_E_INTERNAL;
    unsigned char *inside = NULL;
    int *touched = NULL;
    const utw_curve_list *list = x->list;
    UTW_TRY_ALLOC(inside = utw_alloc((size_t)list->n_loop, sizeof *inside));
    UTW_TRY_ALLOC(touched = utw_alloc((size_t)list->n_loop, sizeof *touched));
    for (int i = 0; i < list->n_loop; i++) {
        if (list->loop_of[i] == 0) continue;
        const double *p = list->ref[list->first[i]].curve->from;
        const int n = utw_loops_around(list, p, inside, touched);
        int hole = -1;
        const int outline_around = inside[i - list->loop_of[i]];
        for (int q = 0; q < n; q++) {
            const int other = touched[q];
            if (inside[other] && other != i && list->loop_of[other] > 0 &&
                list->part_of[other] == list->part_of[i])
                hole = other;
            inside[other] = 0;
        }
        if (!outline_around || hole >= 0) {
            st = report_nesting(x, i, outline_around ? hole : -1);
            goto done;
        }
    }
    st = UTW_OK;
done:
    utw_free(inside);
    utw_free(touched);
    return st;
}

/* The material lies on the left of every loop: whoever fills an outline has to see to it. */
static utw_status check_direction(const utw_outline *outline, utw_error *err)
{
    for (int p = 0; p < outline->n_part; p++)
        for (int l = 0; l < outline->part[p].n_loop; l++) {
            if ((utw_loop_area(&outline->part[p].loop[l]) > 0) == (l == 0)) continue;
            const utw_status st = utw_fail(err, UTW_E_INTERNAL,
                                           "loop %d of part %d runs the wrong way round", l, p + 1);
            utw_error_place(err, p, l, -1);
            return st;
        }
    return UTW_OK;
}

/* ---- all --------------------------------------------------------------------------------- */

static utw_status check_count(const utw_outline *outline, utw_error *err)
{
    long n = 0;
    for (int p = 0; p < outline->n_part; p++)
        for (int l = 0; l < outline->part[p].n_loop; l++) n += outline->part[p].loop[l].n;
    if (n <= MAX_CURVES) return UTW_OK;
    return utw_fail(
        err, UTW_E_OUTLINE,
        "the section has %ld edges, more than %d; draw arcs and splines instead of short lines", n,
        MAX_CURVES);
}

utw_status utw_outline_check(const utw_outline *outline, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_curve_list list = {.n = 0};
    utw_net *net = NULL; /* built to see whether the parts fit together */
    double size = 0;
    UTW_TRY(check_count(outline, err));
    UTW_TRY(utw_check_scale(outline, &size, err));
    for (int p = 0; p < outline->n_part; p++)
        for (int l = 0; l < outline->part[p].n_loop; l++)
            UTW_TRY(utw_check_curves(&outline->part[p].loop[l], p, l, size, err));
    UTW_TRY(utw_curve_list_init(&list, outline, err));
    checking x = {outline, &list, size, err, UTW_OK};
    if (utw_boxtree_pairs(&list.tree, UTW_DETAIL * size, check_pair, &x)) {
        st = x.st;
        goto done;
    }
    UTW_TRY(check_direction(outline, err));
    UTW_TRY(check_nesting(&x));
    if (outline->n_part > 1) UTW_TRY(utw_net_create(outline, &net, err));
    st = UTW_OK;
done:
    utw_net_free(net);
    utw_curve_list_clear(&list);
    return st;
}
