/* SPDX-License-Identifier: GPL-3.0-or-later
 * The boundary curves of a section in order, and points on them. */
#include "thinwall/border.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "mesh/walls.h"
#include "outline/intersect.h"
#include "outline/net.h"
#include "outline/net_shape.h"

#define PER_WALL 0.375         /* distance of points over the thickness they see */
#define PER_TURN (UTW_PI / 8)  /* turning from point to point on arcs */
#define PER_BEND (UTW_PI / 12) /* the same on cubics */
#define WEDGE    1.0           /* in a wedge: thickness over distance from the tip, at least */
#define GROWTH   2.5           /* of a spacing over its neighbour's, at most */
#define MOST     20000         /* points, about: thinner walls are sampled more coarsely */
enum { PASSES = 12, CUTS = 4 };

typedef struct span {
    int curve;
    double t0, t1, length;
} span;

typedef struct spans {
    span *s;
    size_t n, capacity;
} spans;

typedef struct sampler {
    utw_border *border;
    utw_net *net; /* of which only boundary edges are left */
    utw_walls *walls;
    int *edge; /* [n_curve] the edge of a curve; reversed when it runs against it */
    unsigned char *reversed;
    double per_wall, least;
    spans list;
    utw_error *err;
} sampler;

void utw_border_free(utw_border *b)
{
    if (b == NULL) return;
    utw_free(b->loop);
    utw_free(b->curve);
    utw_free(b->xy);
    utw_free(b->after);
    utw_free(b->on);
    utw_free(b->t);
    utw_free(b);
}

void utw_border_tangent(const utw_border *b, int curve, double t, double e[2])
{
    utw_curve_d1(&b->curve[curve].curve, t, e);
    const double length = utw_norm(e);
    for (int k = 0; k < 2; k++) e[k] /= length;
}

/* ---- the loops ---- */

/* Keep the edges with material on one side only. Nodes stay. */
static void keep_boundary(utw_net *net)
{
    int n = 0;
    for (int e = 0; e < net->n_edge; e++)
        if ((net->edge[e].left < 0) != (net->edge[e].right < 0)) net->edge[n++] = net->edge[e];
    net->n_edge = n;
}

static utw_status make_loops(sampler *x)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = x->err;
    const utw_net *net = x->net;
    utw_border *b = x->border;
    int *leaving = NULL;
    UTW_TRY_ALLOC(leaving = utw_alloc((size_t)net->n_node, sizeof *leaving));
    UTW_TRY_ALLOC(b->curve = utw_alloc((size_t)net->n_edge, sizeof *b->curve));
    UTW_TRY_ALLOC(x->edge = utw_alloc((size_t)net->n_edge, sizeof *x->edge));
    UTW_TRY_ALLOC(x->reversed = utw_alloc((size_t)net->n_edge, 1));
    for (int i = 0; i < net->n_node; i++) leaving[i] = -1;
    for (int e = 0; e < net->n_edge; e++) {
        const int start = net->edge[e].left >= 0 ? net->edge[e].from : net->edge[e].to;
        if (leaving[start] >= 0) {
            st = utw_fail(err, UTW_E_OUTLINE, "the section touches itself in a point");
            goto done;
        }
        leaving[start] = e;
    }
    for (int node = 0; node < net->n_node; node++) {
        const int first = b->n_curve;
        for (int at = node; leaving[at] >= 0;) {
            const int e = leaving[at], reversed = net->edge[e].left < 0;
            leaving[at] = -1;
            at = reversed ? net->edge[e].from : net->edge[e].to;
            x->edge[b->n_curve] = e;
            x->reversed[b->n_curve] = (unsigned char)reversed;
            b->curve[b->n_curve] = (utw_border_curve){
                .curve = reversed ? utw_curve_reversed(&net->edge[e].curve) : net->edge[e].curve,
                .after = b->n_curve + 1,
                .before = b->n_curve - 1,
                .loop = b->n_loop};
            b->n_curve++;
        }
        if (b->n_curve == first) continue;
        b->curve[first].before = b->n_curve - 1;
        b->curve[b->n_curve - 1].after = first;
        b->n_loop++;
    }
    st = UTW_OK;
done:
    utw_free(leaving);
    return st;
}

static void find_corners(utw_border *b)
{
    for (int i = 0; i < b->n_curve; i++) {
        double in[2], out[2];
        utw_border_tangent(b, b->curve[i].before, 1, in);
        utw_border_tangent(b, i, 0, out);
        b->curve[i].turn = atan2(utw_cross(in, out), utw_dot(in, out));
    }
}

/* ---- points ---- */

static utw_status add(sampler *x, span s)
{
    void *array = x->list.s;
    if (utw_grow(&array, &x->list.capacity, x->list.n + 1, sizeof s) != 0)
        return utw_fail(x->err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    x->list.s = array;
    x->list.s[x->list.n++] = s;
    return UTW_OK;
}

static span piece_of(const utw_border *b, int curve, double t0, double t1)
{
    double p[2], q[2];
    utw_curve_point(&b->curve[curve].curve, t0, p);
    utw_curve_point(&b->curve[curve].curve, t1, q);
    return (span){curve, t0, t1, utw_distance(p, q)};
}

static utw_status divide(sampler *x, int curve, double t0, double t1)
{
    const span s = piece_of(x->border, curve, t0, t1);
    double wall = UTW_INFINITY;
    for (int k = 1; k <= 3; k += 2) {
        const double t = t0 + 0.25 * k * (t1 - t0);
        wall = fmin(wall, utw_walls_thickness(x->walls, x->edge[curve],
                                              x->reversed[curve] ? 1 - t : t, WEDGE));
    }
    const double h = fmax(x->per_wall * wall, x->least);
    if (s.length <= h) return add(x, s);
    const int n = (int)fmin(ceil(s.length / h), CUTS);
    for (int i = 0; i < n; i++) {
        const double a = t0 + (t1 - t0) * i / n, b = t0 + (t1 - t0) * (i + 1) / n;
        const utw_status st = divide(x, curve, a, i == n - 1 ? t1 : b);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}

static utw_status divide_all(sampler *x, double density)
{
    double perimeter = 0;
    for (int i = 0; i < x->border->n_curve; i++)
        for (int k = 0; k < 4; k++)
            perimeter += piece_of(x->border, i, 0.25 * k, 0.25 * (k + 1)).length;
    x->least = perimeter / (MOST * density);
    for (int i = 0; i < x->border->n_curve; i++) {
        const utw_curve *c = &x->border->curve[i].curve;
        const double turning = utw_curve_turning(c) * density;
        int n = (int)ceil(turning / (c->kind == UTW_CUBIC ? PER_BEND : PER_TURN) - 1e-9);
        n = n < 1 ? 1 : n;
        for (int k = 0; k < n; k++) {
            const utw_status st = divide(x, i, (double)k / n, (double)(k + 1) / n);
            if (st != UTW_OK) return st;
        }
    }
    return UTW_OK;
}

/* Halve what is much longer than its neighbours; 1 in *changed when something was. */
static utw_status even_out(sampler *x, int *changed)
{
    const spans old = x->list;
    utw_status st = UTW_OK;
    *changed = 0;
    x->list = (spans){.s = NULL};
    for (size_t first = 0, last; first < old.n && st == UTW_OK; first = last) {
        const int loop = x->border->curve[old.s[first].curve].loop;
        for (last = first; last < old.n && x->border->curve[old.s[last].curve].loop == loop;)
            last++;
        for (size_t i = first; i < last && st == UTW_OK; i++) {
            const span *s = &old.s[i];
            const double before = old.s[i == first ? last - 1 : i - 1].length,
                         after = old.s[i + 1 == last ? first : i + 1].length;
            if (s->length <= fmax(GROWTH * fmin(before, after), x->least)) {
                st = add(x, *s);
                continue;
            }
            const double middle = 0.5 * (s->t0 + s->t1);
            st = add(x, piece_of(x->border, s->curve, s->t0, middle));
            if (st == UTW_OK) st = add(x, piece_of(x->border, s->curve, middle, s->t1));
            *changed = 1;
        }
    }
    utw_free(old.s);
    return st;
}

static utw_status make_points(sampler *x)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = x->err;
    utw_border *b = x->border;
    const size_t n = x->list.n;
    UTW_TRY_ALLOC(b->loop = utw_alloc((size_t)b->n_loop + 1, sizeof *b->loop));
    UTW_TRY_ALLOC(b->xy = utw_alloc(n, sizeof *b->xy));
    UTW_TRY_ALLOC(b->after = utw_alloc(n, sizeof *b->after));
    UTW_TRY_ALLOC(b->on = utw_alloc(n, sizeof *b->on));
    UTW_TRY_ALLOC(b->t = utw_alloc(n, sizeof *b->t));
    b->n_point = (int)n;
    for (int i = 0, start = 0; i < b->n_point; i++) {
        const span *s = &x->list.s[i];
        utw_border_curve *c = &b->curve[s->curve];
        if (c->n++ == 0) c->first = i;
        utw_curve_point(&c->curve, s->t0, b->xy[i]);
        b->on[i] = s->curve;
        b->t[i] = s->t0;
        const int ends = i + 1 == b->n_point || b->curve[x->list.s[i + 1].curve].loop != c->loop;
        b->after[i] = ends ? start : i + 1;
        if (ends) b->loop[c->loop + 1] = start = i + 1;
    }
    st = UTW_OK;
done:
    return st;
}

utw_status utw_border_create(const utw_outline *outline, double density, utw_border **border,
                             utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    sampler x = {.per_wall = PER_WALL / density, .err = err};
    const double *box = outline->box;
    UTW_TRY_ALLOC(x.border = utw_alloc(1, sizeof *x.border));
    UTW_TRY(utw_net_create(outline, &x.net, err));
    keep_boundary(x.net);
    for (int k = 0; k < 2; k++) x.border->origin[k] = 0.5 * (box[k] + box[k + 2]);
    /* a power of two as the unit changes no digit */
    const double size = utw_distance(box, box + 2);
    x.border->unit = exp2(round(log2(size)));
    x.border->size = size / x.border->unit;
    utw_net_move(x.net, x.border->origin, x.border->unit);
    UTW_TRY(make_loops(&x));
    find_corners(x.border);
    UTW_TRY(utw_walls_create(x.net, &x.walls, err));
    UTW_TRY(divide_all(&x, density));
    for (int pass = 0, changed = 1; pass < PASSES && changed; pass++)
        UTW_TRY(even_out(&x, &changed));
    UTW_TRY(make_points(&x));
    *border = x.border;
    x.border = NULL;
    st = UTW_OK;
done:
    utw_walls_free(x.walls);
    utw_net_free(x.net);
    utw_free(x.edge);
    utw_free(x.reversed);
    utw_free(x.list.s);
    utw_border_free(x.border);
    return st;
}

/* ---- the nearest point ---- */

static double nearest_on_line(const utw_curve *c, const double p[2], double *t, double q[2])
{
    const double d[2] = {c->to[0] - c->from[0], c->to[1] - c->from[1]},
                 e[2] = {p[0] - c->from[0], p[1] - c->from[1]};
    *t = fmax(0, fmin(1, utw_dot(d, e) / utw_dot(d, d)));
    for (int k = 0; k < 2; k++) q[k] = *t < 1 ? c->from[k] + *t * d[k] : c->to[k];
    return utw_distance(p, q);
}

/* u and v are perpendicular and of one length: a circle. */
static int is_circle(const utw_curve *c)
{
    const double uu = utw_dot(c->u, c->u), vv = utw_dot(c->v, c->v);
    return c->kind == UTW_ARC && fabs(uu - vv) <= 1e-12 * uu &&
           fabs(utw_dot(c->u, c->v)) <= 1e-12 * uu;
}

static double nearest_on_circle(const utw_curve *c, const double p[2], double *t, double q[2])
{
    const double d[2] = {p[0] - c->centre[0], p[1] - c->centre[1]}, uu = utw_dot(c->u, c->u),
                 turn = c->a1 - c->a0;
    double angle = atan2(utw_dot(d, c->v), utw_dot(d, c->u)) - c->a0;
    /* the value within the arc, or the nearer to its middle when there is none */
    angle -= 2 * UTW_PI * round((angle - 0.5 * turn) / (2 * UTW_PI));
    *t = angle / turn;
    if (*t <= 0 || *t >= 1) {
        const int end = *t >= 1;
        *t = end;
        for (int k = 0; k < 2; k++) q[k] = end ? c->to[k] : c->from[k];
        return utw_distance(p, q);
    }
    const double away = utw_norm(d), r = sqrt(uu);
    if (!(away > 0)) {
        utw_curve_point(c, *t, q);
        return r;
    }
    for (int k = 0; k < 2; k++) q[k] = c->centre[k] + r / away * d[k];
    return fabs(away - r);
}

/* On one curve: lines and circle arcs in closed form, others by Newton's iteration from *t, and by
 * search where that fails. */
static double nearest_on(const utw_curve *c, const double p[2], double *t, double q[2])
{
    if (c->kind == UTW_LINE) return nearest_on_line(c, p, t, q);
    if (is_circle(c)) return nearest_on_circle(c, p, t, q);
    if (c->kind == UTW_CUBIC) {
        double u = *t;
        for (int i = 0; i < 20; i++) {
            double d[2], dd[2];
            utw_curve_point(c, u, q);
            utw_curve_d1(c, u, d);
            utw_curve_d2(c, u, dd);
            const double w[2] = {q[0] - p[0], q[1] - p[1]};
            const double slope = utw_dot(w, d), bend = utw_dot(d, d) + utw_dot(w, dd);
            if (!(bend > 0)) break;
            const double step = fmax(-0.3, fmin(0.3, -slope / bend)),
                         to = fmax(0, fmin(1, u + step));
            if (fabs(to - u) < 1e-14) {
                *t = to;
                return utw_distance(p, q);
            }
            u = to;
        }
    }
    const double distance = utw_curve_nearest(c, p, UTW_INFINITY, t);
    utw_curve_point(c, *t, q);
    return distance;
}

double utw_border_slide(const utw_border *b, const double p[2], int *curve, double *t, double q[2])
{
    double best = nearest_on(&b->curve[*curve].curve, p, t, q);
    for (int hops = 0; hops < b->n_curve; hops++) {
        const int forward = *t >= 1, backward = *t <= 0;
        if (!forward && !backward) break;
        const int other = forward ? b->curve[*curve].after : b->curve[*curve].before;
        double u = forward ? 0 : 1, r[2];
        const double distance = nearest_on(&b->curve[other].curve, p, &u, r);
        if (!(distance < best)) break;
        best = distance;
        *curve = other;
        *t = u;
        memcpy(q, r, sizeof r);
    }
    return best;
}
