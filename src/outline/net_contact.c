/* SPDX-License-Identifier: GPL-3.0-or-later
 * Contacts of parts: strands cut at foreign vertices, ends joined in nodes, common courses merged
 * in edges. */
#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/boxtree.h"
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

/* ---- cutting
 * ------------------------------------------------------------------------------------- */

typedef struct cut {
    int strand;
    double t, at[2];
} cut;

typedef struct cutting {
    const utw_net_build *b;
    int vertex; /* the strand whose start is looked at */
    cut *cut;
    size_t n, capacity;
    utw_error *err;
    utw_status st;
} cutting;

static int no_memory(cutting *x)
{
    x->st = utw_fail(x->err, UTW_E_NOMEM, "out of memory (%s)", "utw_net_cut");
    return 1;
}

static int near_miss(cutting *x, int strand, double distance)
{
    char edge[128];
    utw_strand_text(edge, sizeof edge, x->b, strand);
    const utw_strand *s = &x->b->strand[x->vertex];
    const utw_loop *loop = &x->b->outline->part[s->part].loop[s->loop];
    const double *p = s->curve.from;
    /* the strand that starts at a vertex follows the one that is named after it */
    const int k = loop->n == 1 ? 0 : (s->k + loop->n - 1) % loop->n;
    x->st = utw_fail(x->err, UTW_E_OUTLINE,
                     "part %d has a corner at (%.9g, %.9g) that lies %.3g beside %s, neither on it "
                     "nor clear of it: "
                     "give both the same coordinates (an arc the same centre and radius), or a gap "
                     "or lap of more "
                     "than %.3g",
                     s->part + 1, p[0], p[1], distance, edge, UTW_SLIVER * x->b->size);
    utw_error_place(x->err, s->part, s->loop, loop->vertex != NULL ? loop->vertex[k] : k);
    return 1;
}

static int look_at_strand(void *context, int i)
{
    cutting *x = context;
    const utw_net_build *b = x->b;
    const utw_strand *s = &b->strand[i];
    const double *p = b->strand[x->vertex].curve.from;
    const double touch = UTW_TOUCH * b->size;
    if (s->part == b->strand[x->vertex].part) return 0;
    const double to_end = fmin(utw_distance(p, s->curve.from), utw_distance(p, s->curve.to));
    if (to_end <= touch) return 0;
    double t = 0;
    const double distance = utw_curve_nearest(&s->curve, p, UTW_SLIVER * b->size, &t);
    if (distance > UTW_SLIVER * b->size) return 0;
    if (distance > touch) return near_miss(x, i, distance);
    if (to_end < UTW_DETAIL * b->size)
        return near_miss(x, i, to_end); /* a piece too short to use */
    if (utw_grow((void **)&x->cut, &x->capacity, x->n + 1, sizeof *x->cut)) return no_memory(x);
    x->cut[x->n++] = (cut){i, t, {p[0], p[1]}};
    return 0;
}

static int by_strand(const void *a, const void *b)
{
    const cut *p = a, *q = b;
    if (p->strand != q->strand) return p->strand - q->strand;
    return p->t < q->t ? -1 : p->t > q->t;
}

/* Write the pieces of strand i to `piece` and return their number. */
static int pieces_of(const utw_strand *s, const cut *at, int n, double touch, utw_strand *piece)
{
    int count = 0;
    double t = 0;
    const double *from = s->curve.from;
    for (int i = 0; i <= n; i++) {
        const double *to = i < n ? at[i].at : s->curve.to;
        if (i < n && (utw_distance(from, to) <= touch || at[i].t <= t))
            continue; /* two in one place */
        const double t1 = i < n ? at[i].t : 1;
        piece[count] = *s;
        piece[count].curve = utw_curve_piece(&s->curve, t, t1);
        memcpy(piece[count].curve.from, from, sizeof piece[count].curve.from);
        memcpy(piece[count].curve.to, to, sizeof piece[count].curve.to);
        count++;
        from = to;
        t = t1;
    }
    return count;
}

static utw_status apply_cuts(utw_net_build *b, const cut *cuts, int n_cut, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_strand *made = NULL;
    UTW_TRY_ALLOC(made = utw_alloc((size_t)b->n + (size_t)n_cut, sizeof *made));
    int n = 0, next = 0;
    for (int loop = 0; loop < b->n_loop; loop++) {
        const int first = b->first[loop], last = b->first[loop + 1];
        b->first[loop] = n;
        for (int i = first; i < last; i++) {
            const int begin = next;
            while (next < n_cut && cuts[next].strand == i) next++;
            n +=
                pieces_of(&b->strand[i], cuts + begin, next - begin, UTW_TOUCH * b->size, made + n);
        }
    }
    b->first[b->n_loop] = n;
    utw_free(b->strand);
    b->strand = made;
    b->n = n;
    st = UTW_OK;
done:
    return st;
}

utw_status utw_net_cut(utw_net_build *b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_boxtree tree = {.n = 0};
    double(*box)[4] = NULL;
    cutting x = {.b = b, .err = err};
    UTW_TRY_ALLOC(box = utw_alloc((size_t)b->n, sizeof *box));
    for (int i = 0; i < b->n; i++) utw_curve_box(&b->strand[i].curve, box[i]);
    UTW_TRY(utw_boxtree_init(&tree, (const double(*)[4])box, b->n, err));
    const double reach = UTW_SLIVER * b->size;
    for (x.vertex = 0; x.vertex < b->n; x.vertex++) {
        const double *p = b->strand[x.vertex].curve.from;
        const double around[4] = {p[0] - reach, p[1] - reach, p[0] + reach, p[1] + reach};
        if (utw_boxtree_query(&tree, around, look_at_strand, &x)) {
            st = x.st;
            goto done;
        }
    }
    if (x.n > 0) {
        qsort(x.cut, x.n, sizeof *x.cut, by_strand);
        UTW_TRY(apply_cuts(b, x.cut, (int)x.n, err));
    }
    st = UTW_OK;
done:
    utw_boxtree_clear(&tree);
    utw_free(box);
    utw_free(x.cut);
    return st;
}

/* ---- joining
 * ------------------------------------------------------------------------------------- */

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

/* ---- merging
 * ------------------------------------------------------------------------------------- */

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
