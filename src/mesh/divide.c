/* SPDX-License-Identifier: GPL-3.0-or-later
 * Element sides on the boundary from the local wall thickness: halve until every piece is short
 * against the thickness it sees, smooth the sizes along the boundary, divide each curve evenly by
 * them. */
#include "mesh/divide.h"

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "mesh/walls.h"
#include "outline/net_shape.h"

/* A side per so many wall thicknesses. The study of grading and order on five profiles found 1
 * to 1.5 to be cheapest. */
#define SIDE_PER_WALL 1.5
/* In a wedge, length over distance from the tip: a span from the tip on is never halved for the
 * wedge's sake (its first sample lies at a sixth of it, and it may be twice the size). */
#define WEDGE 2.5
/* Growth of the size with the distance along the boundary. */
#define GROWTH     1.7
#define DEEPEST    24 /* halvings of one curve */
#define RE_ENTRANT (185 * UTW_PI / 180)
#define CONVEX     (110 * UTW_PI / 180)

/* A piece of a net edge with the size wanted there. */
typedef struct span {
    int edge;
    double t0, t1, length, h;
} span;

typedef struct spans {
    span *s;
    size_t n, capacity;
} spans;

typedef struct divider {
    const utw_net *net;
    const utw_walls *walls;
    double scale;
    const double *finer; /* [n_edge] a further factor, or NULL */
    spans list;
    double *node_h; /* [n_node] size at the nodes of the net */
} divider;

static double most_turning(const utw_curve *c, double scale)
{
    return (c->kind == UTW_CUBIC ? UTW_PI / 3 : UTW_PI / 2 * 1.0001) * fmin(scale, 1);
}

static utw_status add_span(spans *list, span s, utw_error *err)
{
    void *array = list->s;
    if (utw_grow(&array, &list->capacity, list->n + 1, sizeof *list->s) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    list->s = array;
    list->s[list->n++] = s;
    return UTW_OK;
}

static double scale_of(const divider *d, int edge)
{
    return d->finer == NULL ? d->scale : d->scale * d->finer[edge];
}

static utw_status add_spans(divider *d, int edge, double t0, double t1, int depth, utw_error *err)
{
    const utw_curve *c = &d->net->edge[edge].curve;
    const utw_curve part = utw_curve_piece(c, t0, t1);
    const double scale = scale_of(d, edge);
    const double length = utw_curve_length(&part), turning = utw_curve_turning(&part);
    double h = UTW_INFINITY;
    static const double at[3] = {1.0 / 6, 0.5, 5.0 / 6};
    for (int k = 0; k < 3; k++) {
        const double wall =
            utw_walls_thickness(d->walls, edge, t0 + at[k] * (t1 - t0), WEDGE / scale);
        h = fmin(h, SIDE_PER_WALL * scale * wall);
    }
    const double most = most_turning(c, scale);
    if (depth < DEEPEST && (length > 2 * h || turning > 2 * most)) {
        const double tm = 0.5 * (t0 + t1);
        const utw_status st = add_spans(d, edge, t0, tm, depth + 1, err);
        return st != UTW_OK ? st : add_spans(d, edge, tm, t1, depth + 1, err);
    }
    if (turning > 0) h = fmin(h, length * most / turning);
    return add_span(&d->list, (span){edge, t0, t1, length, h}, err);
}

/* Halve a span again and again toward its ends where the size at the node is small against it, so
 * that sizes can grow along it. near[0], near[1]: the sizes at its start and end. */
static utw_status grade(spans *out, span s, const double near[2], int depth, utw_error *err)
{
    if (depth >= DEEPEST || s.length <= 2 * fmin(near[0], near[1])) return add_span(out, s, err);
    const double tm = 0.5 * (s.t0 + s.t1), half = 0.5 * s.length, middle = UTW_INFINITY;
    const span a = {s.edge, s.t0, tm, half, s.h}, b = {s.edge, tm, s.t1, half, s.h};
    const utw_status st = grade(out, a, (double[2]){near[0], middle}, depth + 1, err);
    return st != UTW_OK ? st : grade(out, b, (double[2]){middle, near[1]}, depth + 1, err);
}

/* Grade the first and the last span of every edge toward its nodes. */
static utw_status grade_ends(divider *d, utw_error *err)
{
    utw_status st = UTW_OK;
    spans out = {NULL, 0, 0};
    const span *s = d->list.s;
    const size_t n = d->list.n;
    for (size_t i = 0; i < n; i++) {
        const utw_net_edge *e = &d->net->edge[s[i].edge];
        d->node_h[e->from] =
            fmin(d->node_h[e->from], i == 0 || s[i - 1].edge != s[i].edge ? s[i].h : UTW_INFINITY);
        d->node_h[e->to] = fmin(d->node_h[e->to],
                                i + 1 == n || s[i + 1].edge != s[i].edge ? s[i].h : UTW_INFINITY);
    }
    for (size_t i = 0; i < n && st == UTW_OK; i++) {
        const utw_net_edge *e = &d->net->edge[s[i].edge];
        const double near[2] = {
            i == 0 || s[i - 1].edge != s[i].edge ? d->node_h[e->from] : UTW_INFINITY,
            i + 1 == n || s[i + 1].edge != s[i].edge ? d->node_h[e->to] : UTW_INFINITY};
        st = grade(&out, s[i], near, 0, err);
    }
    utw_free(d->list.s);
    d->list = out;
    return st;
}

/* What happens at a corner has the size of the shorter edge at it: there a side is at most as long
 * as the edge. Corners that are nearly straight are left alone, they do little. */
static utw_status note_corners(divider *d, double least, double most, utw_error *err)
{
    int *node = NULL, n = 0;
    const utw_status st = utw_net_corners(d->net, least, most, &node, &n, err);
    if (st != UTW_OK) return st;
    for (int k = 0; k < n; k++) d->node_h[node[k]] = 0; /* a mark, for the time being */
    for (size_t i = 0; i < d->list.n; i++) {
        span *s = &d->list.s[i];
        const utw_net_edge *e = &d->net->edge[s->edge];
        if ((s->t0 == 0 && d->node_h[e->from] == 0) || (s->t1 == 1 && d->node_h[e->to] == 0))
            s->h = fmin(s->h, s->length);
    }
    for (int k = 0; k < n; k++) d->node_h[node[k]] = UTW_INFINITY;
    utw_free(node);
    return UTW_OK;
}

static double grown(double h, double distance)
{
    return h + GROWTH * distance;
}

/* One pass over the spans of every edge in both directions and over the nodes between them; 1 when
 * a size changed. */
static int smooth_once(divider *d)
{
    int changed = 0;
    span *s = d->list.s;
    const size_t n = d->list.n;
    for (int way = 0; way < 2; way++)
        for (size_t k = 0; k < n; k++) {
            const size_t i = way == 0 ? k : n - 1 - k;
            const int starts = way == 0 ? i == 0 || s[i - 1].edge != s[i].edge
                                        : i + 1 == n || s[i + 1].edge != s[i].edge;
            const utw_net_edge *e = &d->net->edge[s[i].edge];
            double *node = &d->node_h[way == 0 ? e->from : e->to];
            const span *before = way == 0 ? s + i - 1 : s + i + 1;
            const double limit = starts ? grown(*node, 0.5 * s[i].length)
                                        : grown(before->h, 0.5 * (before->length + s[i].length));
            if (limit < s[i].h * (1 - 1e-9)) {
                s[i].h = limit;
                changed = 1;
            }
            if (starts) *node = fmin(*node, grown(s[i].h, 0.5 * s[i].length));
        }
    return changed;
}

/* Cut each edge where the integral of ds/h passes the multiples of an even share. */
static utw_status cut_evenly(const divider *d, utw_division *out, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const span *s = d->list.s;
    size_t total = 0, capacity = 0, i = 0;
    void *t = NULL;
    for (int e = 0; e < d->net->n_edge; e++) {
        const size_t start = i;
        double sum = 0;
        for (; i < d->list.n && s[i].edge == e; i++) sum += s[i].length / s[i].h;
        const double turns = utw_curve_turning(&d->net->edge[e].curve) /
                             most_turning(&d->net->edge[e].curve, scale_of(d, e));
        int n = (int)ceil(fmax(sum * (1 - 1e-6) - 0.15, turns));
        n = n < 1 ? 1 : n;
        if (utw_grow(&t, &capacity, total + (size_t)n + 1, sizeof(double)) != 0) {
            st = utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
            goto done;
        }
        double *cut = (double *)t + total, passed = 0;
        cut[0] = 0;
        int k = 1;
        for (size_t j = start; j < i; j++) {
            const double share = s[j].length / s[j].h;
            for (; k < n && passed + share >= sum * k / n; k++)
                cut[k] = s[j].t0 + (s[j].t1 - s[j].t0) * (sum * k / n - passed) / share;
            passed += share;
        }
        cut[n] = 1;
        out->first[e] = (int)total;
        total += (size_t)n + 1;
    }
    out->first[d->net->n_edge] = (int)total;
    out->t = t;
    t = NULL;
    st = UTW_OK;
done:
    utw_free(t);
    return st;
}

utw_status utw_division_create(const utw_net *net, double scale, const double *finer,
                               utw_division **division, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    divider d = {.net = net, .scale = scale, .finer = finer};
    utw_division *out = NULL;
    utw_walls *walls = NULL;
    UTW_TRY(utw_walls_create(net, &walls, err));
    d.walls = walls;
    UTW_TRY_ALLOC(d.node_h = utw_alloc((size_t)net->n_node, sizeof(double)));
    for (int i = 0; i < net->n_node; i++) d.node_h[i] = UTW_INFINITY;
    for (int e = 0; e < net->n_edge; e++) UTW_TRY(add_spans(&d, e, 0, 1, 0, err));
    /* a curve that sees no wall takes its own length */
    for (size_t i = 0; i < d.list.n; i++)
        d.list.s[i].h = fmin(d.list.s[i].h, 1e3 * d.list.s[i].length);
    UTW_TRY(note_corners(&d, RE_ENTRANT, UTW_INFINITY, err));
    UTW_TRY(note_corners(&d, 0, CONVEX, err));
    UTW_TRY(grade_ends(&d, err));
    for (int pass = 0; pass < 20 && smooth_once(&d); pass++) continue;
    UTW_TRY_ALLOC(out = utw_alloc(1, sizeof *out));
    UTW_TRY_ALLOC(out->first = utw_alloc((size_t)net->n_edge + 1, sizeof(int)));
    out->n_edge = net->n_edge;
    UTW_TRY(cut_evenly(&d, out, err));
    *division = out;
    out = NULL;
    st = UTW_OK;
done:
    utw_walls_free(walls);
    utw_division_free(out);
    utw_free(d.list.s);
    utw_free(d.node_h);
    return st;
}

void utw_division_free(utw_division *division)
{
    if (division == NULL) return;
    utw_free(division->first);
    utw_free(division->t);
    utw_free(division);
}
