/* SPDX-License-Identifier: GPL-3.0-or-later
 * The list of all curves of an outline, and point location by ray crossings. */
#include "outline/curvelist.h"

#include <math.h>
#include <stdint.h>
#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "outline/level.h"

typedef struct place {
    uint64_t key;
    int part, loop, index;
} place;

/* Interleave 16 bits of x and y, so that sorting by the result keeps neighbours together (Morton
 * order). */
static uint64_t interleave(double x, double y)
{
    uint64_t key = 0;
    const uint32_t i = (uint32_t)(65535 * fmin(1, fmax(0, x)));
    const uint32_t j = (uint32_t)(65535 * fmin(1, fmax(0, y)));
    for (int b = 15; b >= 0; b--) key = key << 2 | (uint64_t)(i >> b & 1) << 1 | (j >> b & 1);
    return key;
}

static int by_key(const void *a, const void *b)
{
    const place *p = a, *q = b;
    if (p->key != q->key) return p->key < q->key ? -1 : 1;
    return p->index < q->index ? -1 : p->index > q->index;
}

static uint64_t key_of(const utw_loop *loop, const double box[4])
{
    const double w = box[2] - box[0], h = box[3] - box[1];
    const double *p = loop->curve[0].from;
    return interleave(w > 0 ? (p[0] - box[0]) / w : 0, h > 0 ? (p[1] - box[1]) / h : 0);
}

static void outline_box(const utw_outline *o, double box[4])
{
    box[0] = box[1] = HUGE_VAL;
    box[2] = box[3] = -HUGE_VAL;
    for (int p = 0; p < o->n_part; p++)
        for (int l = 0; l < o->part[p].n_loop; l++) {
            const double *q = o->part[p].loop[l].curve[0].from;
            for (int k = 0; k < 2; k++) {
                box[k] = fmin(box[k], q[k]);
                box[k + 2] = fmax(box[k + 2], q[k]);
            }
        }
}

static void fill(utw_curve_list *list, const utw_outline *o, const place *order, double (*box)[4])
{
    int n = 0;
    for (int q = 0; q < list->n_loop; q++) {
        const place *at = &order[q];
        const utw_loop *loop = &o->part[at->part].loop[at->loop];
        list->first[at->index] = n;
        list->part_of[at->index] = at->part;
        list->loop_of[at->index] = at->loop;
        for (int k = 0; k < loop->n; k++, n++) {
            const int vertex = loop->vertex != NULL ? loop->vertex[k] : k;
            list->ref[n] =
                (utw_curve_ref){&loop->curve[k], at->part, at->loop, k, loop->n, vertex, at->index};
            utw_curve_box(&loop->curve[k], box[n]);
        }
    }
}

utw_status utw_curve_list_init(utw_curve_list *list, const utw_outline *o, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_curve_list made = {.n = 0};
    place *order = NULL;
    double(*box)[4] = NULL;
    for (int p = 0; p < o->n_part; p++)
        for (int l = 0; l < o->part[p].n_loop; l++, made.n_loop++) made.n += o->part[p].loop[l].n;
    const size_t n = (size_t)made.n, n_loop = (size_t)made.n_loop;
    UTW_TRY_ALLOC(order = utw_alloc(n_loop, sizeof *order));
    UTW_TRY_ALLOC(box = utw_alloc(n, sizeof *box));
    UTW_TRY_ALLOC(made.ref = utw_alloc(n, sizeof *made.ref));
    UTW_TRY_ALLOC(made.first = utw_alloc(n_loop, sizeof *made.first));
    UTW_TRY_ALLOC(made.part_of = utw_alloc(n_loop, sizeof *made.part_of));
    UTW_TRY_ALLOC(made.loop_of = utw_alloc(n_loop, sizeof *made.loop_of));
    double around[4];
    outline_box(o, around);
    int index = 0;
    for (int p = 0; p < o->n_part; p++)
        for (int l = 0; l < o->part[p].n_loop; l++, index++)
            order[index] = (place){key_of(&o->part[p].loop[l], around), p, l, index};
    qsort(order, n_loop, sizeof *order, by_key);
    fill(&made, o, order, box);
    UTW_TRY(utw_boxtree_init(&made.tree, (const double(*)[4])box, made.n, err));
    *list = made;
    memset(&made, 0, sizeof made);
    st = UTW_OK;
done:
    utw_curve_list_clear(&made);
    utw_free(order);
    utw_free(box);
    return st;
}

void utw_curve_list_clear(utw_curve_list *list)
{
    utw_free(list->ref);
    utw_free(list->first);
    utw_free(list->part_of);
    utw_free(list->loop_of);
    utw_boxtree_clear(&list->tree);
    memset(list, 0, sizeof *list);
}

typedef struct ray {
    const utw_curve_list *list;
    const double *point;
    unsigned char *inside;
    int *touched;
    int n_touched;
} ray;

/* Crossings of the ray from `point` toward +x with a curve. An end on the ray belongs to the curve
 * above it only, so that passing through a vertex counts once. */
static int crossings(const utw_curve *c, const double point[2])
{
    double t[UTW_MONOTONE_MAX + 1];
    const int n = utw_curve_monotone(c, 1, t);
    int count = 0;
    for (int i = 0; i < n; i++) {
        double p[2], q[2];
        utw_curve_point(c, t[i], p);
        utw_curve_point(c, t[i + 1], q);
        if ((p[1] > point[1]) == (q[1] > point[1])) continue;
        double at[2];
        utw_curve_point(c, utw_curve_at_level(c, 1, point[1], t[i], t[i + 1]), at);
        count += at[0] > point[0];
    }
    return count;
}

/* inside[] holds bit 0: parity, bit 1: already in touched[] */
static int cross(void *context, int i)
{
    ray *r = context;
    const utw_curve_ref *ref = &r->list->ref[i];
    const int count = crossings(ref->curve, r->point);
    if (count == 0) return 0;
    if (!(r->inside[ref->index] & 2)) r->touched[r->n_touched++] = ref->index;
    r->inside[ref->index] = (unsigned char)((r->inside[ref->index] ^ (count & 1)) | 2);
    return 0;
}

int utw_loops_around(const utw_curve_list *list, const double point[2], unsigned char *inside,
                     int *touched)
{
    const double box[4] = {point[0], point[1], HUGE_VAL, point[1]};
    ray r = {.list = list, .point = point, .inside = inside, .touched = touched};
    utw_boxtree_query(&list->tree, box, cross, &r);
    for (int i = 0; i < r.n_touched; i++) inside[touched[i]] &= 1;
    return r.n_touched;
}
