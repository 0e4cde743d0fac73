/* SPDX-License-Identifier: GPL-3.0-or-later
 * Contacts of parts, second step: ends are joined in nodes and common courses merged in edges. */
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/check_curve.h"
#include "outline/intersect.h"
#include "outline/net_build.h"

void utw_strand_text(char *text, size_t size, const utw_net_build *b, int strand)
{
    const utw_strand *s = &b->strand[strand];
    char edge[64];
    utw_edge_text(edge, sizeof edge, &b->outline->part[s->part].loop[s->loop], s->k);
    if (s->loop == 0)
        snprintf(text, size, "%s of part %d", edge, s->part + 1);
    else
        snprintf(text, size, "%s of hole %d of part %d", edge, s->loop, s->part + 1);
}

void utw_strand_place(utw_error *err, const utw_net_build *b, int strand)
{
    const utw_strand *s = &b->strand[strand];
    const utw_loop *loop = &b->outline->part[s->part].loop[s->loop];
    utw_error_place(err, s->part, s->loop, loop->vertex != NULL ? loop->vertex[s->k] : s->k);
}

/* ---- joining ----------------------------------------------------------------------------- */

typedef struct start {
    double x, y;
    int strand;
} start;

static int by_x(const void *a, const void *b)
{
    const start *p = a, *q = b;
    if (p->x != q->x) return p->x < q->x ? -1 : 1;
    return p->strand - q->strand;
}

static int root_of(int *parent, int i)
{
    while (parent[i] != i) i = parent[i] = parent[parent[i]];
    return i;
}

/* Union of strand starts within `touch` of one another, of different parts; the lowest number
 * leads. */
static void unite_starts(const utw_net_build *b, start *sorted, int *parent)
{
    const double touch = UTW_TOUCH * b->size;
    for (int i = 0; i < b->n; i++) {
        const double *p = b->strand[i].curve.from;
        sorted[i] = (start){p[0], p[1], i};
        parent[i] = i;
    }
    qsort(sorted, (size_t)b->n, sizeof *sorted, by_x);
    for (int i = 0; i < b->n; i++)
        for (int j = i + 1; j < b->n && sorted[j].x - sorted[i].x <= touch; j++) {
            const int p = sorted[i].strand, q = sorted[j].strand;
            if (b->strand[p].part == b->strand[q].part) continue;
            if (hypot(sorted[j].x - sorted[i].x, sorted[j].y - sorted[i].y) > touch) continue;
            const int r = root_of(parent, p), s = root_of(parent, q);
            parent[r > s ? r : s] = r > s ? s : r;
        }
}

utw_status utw_net_join(utw_net_build *b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    start *sorted = NULL;
    int *parent = NULL;
    UTW_TRY_ALLOC(sorted = utw_alloc((size_t)b->n, sizeof *sorted));
    UTW_TRY_ALLOC(parent = utw_alloc((size_t)b->n, sizeof *parent));
    UTW_TRY_ALLOC(b->node = utw_alloc((size_t)b->n, sizeof *b->node));
    for (int i = 0; i < b->n; i++) parent[i] = i;
    if (b->outline->n_part > 1) unite_starts(b, sorted, parent);
    for (int i = 0; i < b->n; i++) {
        utw_strand *s = &b->strand[i];
        const int leader = root_of(parent, i); /* never above i */
        s->from = leader == i ? b->n_node++ : b->strand[leader].from;
        if (leader == i) memcpy(b->node[s->from], s->curve.from, sizeof b->node[0]);
    }
    for (int loop = 0; loop < b->n_loop; loop++)
        for (int i = b->first[loop]; i < b->first[loop + 1]; i++) {
            utw_strand *s = &b->strand[i];
            s->to = b->strand[i + 1 < b->first[loop + 1] ? i + 1 : b->first[loop]].from;
            memcpy(s->curve.from, b->node[s->from], sizeof s->curve.from);
            memcpy(s->curve.to, b->node[s->to], sizeof s->curve.to);
        }
    st = UTW_OK;
done:
    utw_free(sorted);
    utw_free(parent);
    return st;
}

/* ---- merging ----------------------------------------------------------------------------- */

typedef struct span {
    int low, high, strand;
} span;

static int by_nodes(const void *a, const void *b)
{
    const span *p = a, *q = b;
    if (p->low != q->low) return p->low - q->low;
    if (p->high != q->high) return p->high - q->high;
    return p->strand - q->strand;
}

/* Greatest distance of points of one strand from another; HUGE_VAL when beyond the width of a
 * sliver. */
static double apart(const utw_net_build *b, int i, int j)
{
    double greatest = 0;
    for (int q = 1; q < 8; q++) {
        double p[2];
        utw_curve_point(&b->strand[i].curve, q / 8.0, p);
        const double d = utw_curve_nearest(&b->strand[j].curve, p, UTW_SLIVER * b->size, NULL);
        greatest = fmax(greatest, d);
    }
    return greatest;
}

static utw_status refuse(const utw_net_build *b, int i, int j, double distance, utw_error *err)
{
    char one[128], other[128];
    double at[2];
    utw_strand_text(one, sizeof one, b, j);
    utw_strand_text(other, sizeof other, b, i);
    utw_curve_point(&b->strand[j].curve, 0.5, at);
    utw_status st;
    if (distance > 0)
        st = utw_fail(
            err, UTW_E_OUTLINE,
            "%s and %s run within %.3g of one another near (%.6g, %.6g) but are not the same: give "
            "both "
            "the same points (an arc the same centre and radius), or a gap of more than %.3g",
            one, other, distance, at[0], at[1], UTW_SLIVER * b->size);
    else
        st = utw_fail(err, UTW_E_OUTLINE,
                      "parts %d and %d overlap: both lie on the same side of their common edge "
                      "near (%.6g, %.6g); "
                      "cut one out of the other",
                      b->strand[i].part + 1, b->strand[j].part + 1, at[0], at[1]);
    utw_strand_place(err, b, j);
    return st;
}

/* Give strand j the edge of an earlier strand of its group that runs the same course, if there is
 * one. */
static utw_status match(utw_net_build *b, const span *group, int j, utw_error *err)
{
    utw_strand *s = &b->strand[group[j].strand];
    for (int i = 0; i < j; i++) {
        const utw_strand *r = &b->strand[group[i].strand];
        if (r->part == s->part) continue;
        const double distance = fmin(apart(b, group[i].strand, group[j].strand),
                                     apart(b, group[j].strand, group[i].strand));
        if (distance > UTW_SLIVER * b->size) continue;
        /* joining may have moved an end by the width of a touch */
        if (distance > 2 * UTW_TOUCH * b->size)
            return refuse(b, group[i].strand, group[j].strand, distance, err);
        if (s->edge < 0) {
            s->edge = r->edge;
            s->forward = r->from == s->from ? r->forward : !r->forward;
        }
        if (s->edge == r->edge && s->forward == r->forward)
            return refuse(b, group[i].strand, group[j].strand, 0, err);
    }
    return UTW_OK;
}

utw_status utw_net_merge(utw_net_build *b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    span *spans = NULL;
    UTW_TRY_ALLOC(b->edge_strand = utw_alloc((size_t)b->n, sizeof *b->edge_strand));
    UTW_TRY_ALLOC(spans = utw_alloc((size_t)b->n, sizeof *spans));
    for (int i = 0; i < b->n; i++) {
        const int f = b->strand[i].from, t = b->strand[i].to;
        spans[i] = (span){f < t ? f : t, f < t ? t : f, i};
    }
    if (b->outline->n_part > 1) qsort(spans, (size_t)b->n, sizeof *spans, by_nodes);
    for (int i = 0, first = 0; i < b->n; i++) {
        if (spans[i].low != spans[first].low || spans[i].high != spans[first].high) first = i;
        utw_strand *s = &b->strand[spans[i].strand];
        UTW_TRY(match(b, spans + first, i - first, err));
        if (s->edge >= 0) continue;
        s->edge = spans[i].strand; /* for now named by its strand */
        s->forward = 1;
    }
    for (int i = 0; i < b->n; i++) { /* number them in the order of the strands */
        utw_strand *s = &b->strand[i];
        if (s->edge == i) {
            b->edge_strand[b->n_edge] = i;
            s->edge = b->n_edge++;
        } else {
            s->edge = b->strand[s->edge].edge; /* an earlier strand: numbered already */
        }
    }
    st = UTW_OK;
done:
    utw_free(spans);
    return st;
}
