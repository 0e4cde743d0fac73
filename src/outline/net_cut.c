/* SPDX-License-Identifier: GPL-3.0-or-later
 * Contacts of parts, first step: strands are cut where a vertex of another part lies on them. */
#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/boxtree.h"
#include "outline/check_curve.h"
#include "outline/intersect.h"
#include "outline/net_build.h"

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

static int near_miss(cutting *x, int strand, double distance, int to_end)
{
    char edge[128];
    utw_strand_text(edge, sizeof edge, x->b, strand);
    const utw_strand *s = &x->b->strand[x->vertex];
    const utw_loop *loop = &x->b->outline->part[s->part].loop[s->loop];
    const double *p = s->curve.from, clear = UTW_SLIVER * x->b->size;
    /* the strand that starts at a vertex follows the one that is named after it */
    const int k = loop->n == 1 ? 0 : (s->k + loop->n - 1) % loop->n;
    if (to_end)
        x->st = utw_fail(x->err, UTW_E_OUTLINE,
                         "part %d has a corner at (%.9g, %.9g) that lies %.3g beside an end of %s: "
                         "give both the same "
                         "coordinates, or move them more than %.3g apart",
                         s->part + 1, p[0], p[1], distance, edge, clear);
    else
        x->st = utw_fail(x->err, UTW_E_OUTLINE,
                         "part %d has a corner at (%.9g, %.9g) that lies %.3g beside %s, neither "
                         "on it nor clear of "
                         "it: give that edge a vertex with these coordinates (two arcs that touch "
                         "need the same centre "
                         "and radius), or leave a gap of more than %.3g",
                         s->part + 1, p[0], p[1], distance, edge, clear);
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
    if (to_end <= UTW_SLIVER * b->size) return near_miss(x, i, to_end, 1);
    double t = 0;
    const double distance = utw_curve_nearest(&s->curve, p, UTW_SLIVER * b->size, &t);
    if (distance > UTW_SLIVER * b->size) return 0;
    if (distance > touch) return near_miss(x, i, distance, 0);
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
