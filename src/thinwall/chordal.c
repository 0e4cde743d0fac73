/* SPDX-License-Identifier: GPL-3.0-or-later
 * From the triangles of the sampled outline to branches and junctions. */
#include "thinwall/chordal.h"

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "mesh/delaunay.h"

#define KEPT 0.75    /* least a^2/(h w^3) of what is kept */
enum { ASTRAY = 3 }; /* chords a wall's ends may be the wrong way round, as chords lie askew */

/* A triangle with one side left, and the area beyond that side. */
typedef struct candidate {
    double area;
    int tri;
} candidate;

typedef struct axis {
    const utw_border *border;
    const utw_delaunay_triangle *tri;
    int n_tri;
    utw_chordal *out;
    unsigned char *open; /* [n_tri] sides that lead on, as bits; 0: the triangle is taken off */
    unsigned char *seen; /* [n_tri] sides walked out of */
    candidate *heap;
    size_t n_heap, heap_capacity, chord_capacity, branch_capacity;
    int *junction; /* [n_tri] number of a triangle with three open sides */
    utw_error *err;
} axis;

void utw_chordal_free(utw_chordal *c)
{
    if (c == NULL) return;
    utw_free(c->chord);
    utw_free(c->branch);
    utw_free(c->junction);
    utw_free(c->sum);
    utw_free(c->area);
    utw_free(c);
}

/* ---- areas ---- */

/* Sum of cross products along the boundary from point p on to point q of the same loop. */
static double run(const utw_border *b, const double *sum, int p, int q)
{
    if (p <= q) return sum[q] - sum[p];
    /* the points of a loop are a row: to its end, and on from its start */
    const int loop = b->curve[b->on[p]].loop, start = b->loop[loop], end = b->loop[loop + 1];
    return sum[end] - sum[p] + sum[q] - sum[start];
}

/* Area between a chord and the next one. */
static double area_between(const utw_border *b, const double *sum, const utw_chord *u,
                           const utw_chord *v)
{
    return 0.5 * (run(b, sum, u->right, v->right) + utw_cross(b->xy[v->right], b->xy[v->left]) +
                  run(b, sum, v->left, u->left) + utw_cross(b->xy[u->left], b->xy[u->right]));
}

double utw_chordal_area(const utw_chordal *c, const utw_branch *branch, int from, int to)
{
    const double area = c->area[to] - c->area[from];
    if (to >= from) return area;
    return branch->closed && from - to > ASTRAY ? c->area[branch->first + branch->n - 1] + area : 0;
}

static double area_beyond(const utw_border *b, const double *sum, int right, int left)
{
    return 0.5 * (run(b, sum, right, left) + utw_cross(b->xy[left], b->xy[right]));
}

double utw_chordal_end_area(const utw_border *b, const utw_chordal *c, int chord, int at_end)
{
    const utw_chord *u = &c->chord[chord];
    return at_end ? area_beyond(b, c->sum, u->right, u->left)
                  : area_beyond(b, c->sum, u->left, u->right);
}

static utw_status sum_up(axis *x)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = x->err;
    const utw_border *b = x->border;
    UTW_TRY_ALLOC(x->out->sum = utw_alloc((size_t)b->n_point + 1, sizeof(double)));
    for (int i = 0; i < b->n_point; i++)
        x->out->sum[i + 1] = x->out->sum[i] + utw_cross(b->xy[i], b->xy[b->after[i]]);
    st = UTW_OK;
done:
    return st;
}

/* ---- taking off corners and roundings ---- */

static int count_bits(unsigned bits)
{
    return (int)((bits & 1u) + (bits >> 1 & 1u) + (bits >> 2 & 1u));
}

/* The only open side of a triangle. */
static int open_side(const axis *x, int tri)
{
    return x->open[tri] == 1 ? 0 : x->open[tri] == 2 ? 1 : 2;
}

/* The boundary beyond side k of a triangle, seen from the other side, runs from its end to its
 * start. */
static double beyond(const axis *x, int tri, int k)
{
    const utw_delaunay_triangle *t = &x->tri[tri];
    return area_beyond(x->border, x->out->sum, t->node[(k + 1) % 3], t->node[k]);
}

static int is_kept(const axis *x, int tri, int k, double area)
{
    const utw_border *b = x->border;
    const int right = x->tri[tri].node[(k + 1) % 3], left = x->tri[tri].node[k];
    const double w = utw_distance(b->xy[left], b->xy[right]);
    double h = 0;
    for (int i = b->after[right]; i != left; i = b->after[i])
        h = fmax(h, utw_turn(b->xy[left], b->xy[right], b->xy[i]) / w);
    return area * area >= KEPT * h * w * w * w;
}

static utw_status push(axis *x, int tri)
{
    void *array = x->heap;
    if (utw_grow(&array, &x->heap_capacity, x->n_heap + 1, sizeof *x->heap) != 0)
        return utw_fail(x->err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    x->heap = array;
    const candidate c = {beyond(x, tri, open_side(x, tri)), tri};
    size_t i = x->n_heap++;
    for (; i > 0 && x->heap[(i - 1) / 2].area > c.area; i = (i - 1) / 2)
        x->heap[i] = x->heap[(i - 1) / 2];
    x->heap[i] = c;
    return UTW_OK;
}

static candidate pop(axis *x)
{
    const candidate top = x->heap[0], last = x->heap[--x->n_heap];
    size_t i = 0;
    for (size_t child; (child = 2 * i + 1) < x->n_heap; i = child) {
        if (child + 1 < x->n_heap && x->heap[child + 1].area < x->heap[child].area) child++;
        if (x->heap[child].area >= last.area) break;
        x->heap[i] = x->heap[child];
    }
    x->heap[i] = last;
    return top;
}

/* From the smallest tips inward: what is not kept is closed, and the triangle before it becomes a
 * tip when nothing else leads on from it. */
static utw_status prune(axis *x)
{
    for (int t = 0; t < x->n_tri; t++) {
        for (int k = 0; k < 3; k++)
            if (x->tri[t].next[k] >= 0) x->open[t] |= (unsigned char)(1u << k);
        if (count_bits(x->open[t]) != 1) continue;
        const utw_status st = push(x, t);
        if (st != UTW_OK) return st;
    }
    while (x->n_heap > 0) {
        const candidate c = pop(x);
        if (x->open[c.tri] == 0) continue;
        const int k = open_side(x, c.tri), before = x->tri[c.tri].next[k];
        if (is_kept(x, c.tri, k, c.area)) continue;
        x->open[c.tri] = 0;
        for (int j = 0; j < 3; j++)
            if (x->tri[before].next[j] == c.tri)
                x->open[before] = (unsigned char)(x->open[before] & ~(1u << j));
        if (count_bits(x->open[before]) != 1) continue;
        const utw_status st = push(x, before);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}

/* ---- branches ---- */

static utw_status add_chord(axis *x, int tri, int k)
{
    void *array = x->out->chord;
    if (utw_grow(&array, &x->chord_capacity, (size_t)x->out->n_chord + 1, sizeof(utw_chord)) != 0)
        return utw_fail(x->err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    x->out->chord = array;
    /* seen by one who leaves the triangle through side k */
    x->out->chord[x->out->n_chord++] =
        (utw_chord){x->tri[tri].node[(k + 1) % 3], x->tri[tri].node[k]};
    return UTW_OK;
}

/* Sides across which a triangle has a neighbour, as bits. */
static unsigned inner_sides(const axis *x, int tri)
{
    unsigned bits = 0;
    for (int k = 0; k < 3; k++)
        if (x->tri[tri].next[k] >= 0) bits |= 1u << k;
    return bits;
}

/* Across side k of *tri: *tri becomes the neighbour; returns the number of the same side there. */
static int step(const axis *x, int *tri, int k)
{
    const int next = x->tri[*tri].next[k];
    int back = 0;
    while (back < 2 && x->tri[next].next[back] != *tri) back++;
    *tri = next;
    return back;
}

/* The side by which one who came in by side `back` leaves a triangle of a sleeve, given its sides
 * as bits; -1 when it is none. */
static int other_side(unsigned bits, int back)
{
    if (count_bits(bits) != 2 || !(bits >> back & 1)) return -1;
    bits &= ~(1u << back);
    return bits == 1 ? 0 : bits == 2 ? 1 : 2;
}

/* From a free end outward as long as the sleeve, though taken off, goes on: its sides are still
 * those of the wall. Returns the side that leads back; *tri is the outermost triangle. */
static int go_out(const axis *x, int *tri)
{
    int back = open_side(x, *tri);
    for (int k; (k = other_side(inner_sides(x, *tri), back)) >= 0;) back = step(x, tri, k);
    return back;
}

/* Leave a triangle through side k and go on until a junction, an end, or the start again. */
static utw_status walk(axis *x, int start, int k)
{
    utw_chordal *out = x->out;
    utw_branch b = {.from = x->junction[start], .to = -1, .first = out->n_chord};
    int tri = start;
    utw_status st = UTW_OK;
    if (count_bits(x->open[start]) == 1) k = go_out(x, &tri);
    while (st == UTW_OK && k >= 0) {
        if (x->open[tri] >> k & 1) x->seen[tri] |= (unsigned char)(1u << k);
        st = add_chord(x, tri, k);
        const int back = step(x, &tri, k);
        if (x->open[tri] >> back & 1) x->seen[tri] |= (unsigned char)(1u << back);
        b.to = x->junction[tri];
        k = b.to >= 0
                ? -1
                : other_side(count_bits(x->open[tri]) == 2 ? x->open[tri] : inner_sides(x, tri),
                             back);
        if (st == UTW_OK && tri == start && k >= 0 && count_bits(x->open[tri]) == 2) {
            b.closed = 1;
            st = add_chord(x, tri, k);
            break;
        }
    }
    if (st != UTW_OK) return st;
    b.n = out->n_chord - b.first;
    void *array = out->branch;
    if (utw_grow(&array, &x->branch_capacity, (size_t)out->n_branch + 1, sizeof b) != 0)
        return utw_fail(x->err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    out->branch = array;
    out->branch[out->n_branch++] = b;
    return UTW_OK;
}

static void circle_through(const utw_border *b, const int node[3], utw_chordal_junction *j)
{
    const double *p = b->xy[node[0]];
    const double u[2] = {b->xy[node[1]][0] - p[0], b->xy[node[1]][1] - p[1]},
                 v[2] = {b->xy[node[2]][0] - p[0], b->xy[node[2]][1] - p[1]};
    const double d = 2 * utw_cross(u, v), uu = utw_dot(u, u), vv = utw_dot(v, v);
    const double c[2] = {(v[1] * uu - u[1] * vv) / d, (u[0] * vv - v[0] * uu) / d};
    j->radius = utw_norm(c);
    j->centre[0] = p[0] + c[0];
    j->centre[1] = p[1] + c[1];
}

static utw_status find_junctions(axis *x)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = x->err;
    int n = 0;
    for (int t = 0; t < x->n_tri; t++) x->junction[t] = x->open[t] == 7 ? n++ : -1;
    UTW_TRY_ALLOC(x->out->junction = utw_alloc((size_t)n, sizeof *x->out->junction));
    for (int t = 0; t < x->n_tri; t++)
        if (x->junction[t] >= 0)
            circle_through(x->border, x->tri[t].node, &x->out->junction[x->junction[t]]);
    x->out->n_junction = n;
    st = UTW_OK;
done:
    return st;
}

/* Branches from junctions, then those between two free ends, then rings. */
static utw_status find_branches(axis *x)
{
    static const int order[3] = {3, 1, 2};
    for (int pass = 0; pass < 3; pass++)
        for (int t = 0; t < x->n_tri; t++) {
            if (count_bits(x->open[t]) != order[pass]) continue;
            for (int k = 0; k < 3; k++) {
                if (!(x->open[t] >> k & 1) || (x->seen[t] >> k & 1)) continue;
                const utw_status st = walk(x, t, k);
                if (st != UTW_OK) return st;
                if (pass == 2) break;
            }
        }
    return UTW_OK;
}

static utw_status measure_areas(axis *x)
{
    utw_chordal *out = x->out;
    out->area = utw_alloc((size_t)out->n_chord, sizeof *out->area);
    if (out->area == NULL) return utw_fail(x->err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    for (int i = 0; i < out->n_branch; i++) {
        const utw_branch *b = &out->branch[i];
        for (int c = b->first + 1; c < b->first + b->n; c++)
            out->area[c] = out->area[c - 1] +
                           area_between(x->border, out->sum, &out->chord[c - 1], &out->chord[c]);
    }
    return UTW_OK;
}

utw_status utw_chordal_create(const utw_border *border, utw_chordal **chordal, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_delaunay d = {.n = 0};
    axis x = {.border = border, .err = err};
    UTW_TRY(utw_delaunay_create(border->n_point, (const double(*)[2])border->xy, border->after, &d,
                                err));
    x.tri = d.tri;
    x.n_tri = d.n;
    UTW_TRY_ALLOC(x.out = utw_alloc(1, sizeof *x.out));
    UTW_TRY_ALLOC(x.open = utw_alloc((size_t)d.n, 1));
    UTW_TRY_ALLOC(x.seen = utw_alloc((size_t)d.n, 1));
    UTW_TRY_ALLOC(x.junction = utw_alloc((size_t)d.n, sizeof *x.junction));
    UTW_TRY(sum_up(&x));
    UTW_TRY(prune(&x));
    UTW_TRY(find_junctions(&x));
    UTW_TRY(find_branches(&x));
    UTW_TRY(measure_areas(&x));
    *chordal = x.out;
    x.out = NULL;
    st = UTW_OK;
done:
    utw_delaunay_clear(&d);
    utw_free(x.open);
    utw_free(x.seen);
    utw_free(x.junction);
    utw_free(x.heap);
    utw_chordal_free(x.out);
    return st;
}
