/* SPDX-License-Identifier: GPL-3.0-or-later
 * From a draft to curves: tangent fillets in closed form, and what to say when one does not fit. */
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/draft.h"
#include "outline/shape.h"

/* What decimal input leaves of an edge, as a part of it, when its fillets just fit. */
#define SLACK 1e-9

/* ---- fillets ---- */

/* A vertex between two lines: the tangent arc of its fillet. */
typedef struct corner {
    double ratio; /* tangent length over radius: tan of half the angle turned */
    double cut;   /* tangent length; 0 for a sharp vertex */
    double in[2], out[2], centre[2], a0, a1;
} corner;

static void unit(const double from[2], const double to[2], double d[2])
{
    const double length = utw_distance(from, to);
    for (int k = 0; k < 2; k++) d[k] = (to[k] - from[k]) / length;
}

static corner corner_at(const utw_draft_loop *loop, int i)
{
    const utw_draft_vertex *vertex = &loop->vertex[i];
    corner c = {.ratio = 0};
    memcpy(c.in, vertex->at, sizeof c.in);
    memcpy(c.out, vertex->at, sizeof c.out);
    if (!(vertex->round > 0)) return c;
    double d0[2], d1[2];
    unit(loop->vertex[(i + loop->n - 1) % loop->n].at, vertex->at, d0);
    unit(vertex->at, loop->vertex[(i + 1) % loop->n].at, d1);
    const double cross = utw_cross(d0, d1), dot = utw_dot(d0, d1);
    const double turn = atan2(cross, dot), side = turn > 0 ? 1 : -1;
    c.ratio = tan(0.5 * fabs(turn));
    c.cut = vertex->round * c.ratio;
    for (int k = 0; k < 2; k++) {
        c.in[k] = vertex->at[k] - c.cut * d0[k];
        c.out[k] = vertex->at[k] + c.cut * d1[k];
    }
    c.centre[0] = c.in[0] - side * vertex->round * d0[1];
    c.centre[1] = c.in[1] + side * vertex->round * d0[0];
    c.a0 = atan2(-side * d0[0], side * d0[1]);
    c.a1 = c.a0 + turn;
    return c;
}

/* The edge from vertex i to the next, as far as fillets go. */
static double edge_length(const utw_draft_loop *loop, int i)
{
    return utw_distance(loop->vertex[i].at, loop->vertex[(i + 1) % loop->n].at);
}

/* The greatest value of dimension k that edge i leaves room for, all others as they are. */
static double edge_limit(const utw_draft_loop *loop, const corner *c, int i, int k)
{
    double room = edge_length(loop, i), ratio = 0;
    for (int end = 0; end < 2; end++) {
        const int j = (i + end) % loop->n;
        const utw_draft_vertex *vertex = &loop->vertex[j];
        if (vertex->round > 0 && vertex->dimension == k) {
            ratio += c[j].ratio;
            room -= c[j].ratio * vertex->extra;
        } else {
            room -= c[j].cut;
        }
    }
    return ratio > 0 ? room / ratio : HUGE_VAL;
}

/* Edge `worst` is too short for its fillets: say which radius is to blame, and how large it may be.
 */
static utw_status does_not_fit(const utw_draft_loop *loop, const corner *c, int worst,
                               const utw_shape_case *given, utw_error *err)
{
    const int a = worst, b = (worst + 1) % loop->n;
    const int blamed = loop->vertex[c[a].cut >= c[b].cut ? a : b].dimension;
    double limit = INFINITY;
    for (int i = 0; i < loop->n; i++) limit = fmin(limit, edge_limit(loop, c, i, blamed));
    return utw_shape_refuse(given, blamed, fmax(limit, 0), utw_shape_others(given, blamed), err);
}

static utw_status check_fillets(const utw_draft_loop *loop, const corner *c,
                                const utw_shape_case *given, utw_error *err)
{
    int worst = -1;
    double excess = SLACK;
    for (int i = 0; i < loop->n; i++) {
        const double cut = c[i].cut + c[(i + 1) % loop->n].cut;
        const double over = cut / edge_length(loop, i) - 1;
        if (cut > 0 && !(over <= excess)) {
            worst = i;
            excess = over;
        }
    }
    return worst < 0 ? UTW_OK : does_not_fit(loop, c, worst, given, err);
}

/* Where fillets use up an edge they meet in one point, and no line is left between them. */
static void join_fillets(const utw_draft_loop *loop, corner *c)
{
    for (int i = 0; i < loop->n; i++) {
        const int next = (i + 1) % loop->n;
        if (loop->vertex[next].is_arc || c[i].cut + c[next].cut == 0) continue;
        if (utw_distance(c[i].out, c[next].in) > SLACK * edge_length(loop, i)) continue;
        if (c[i].cut > 0)
            memcpy(c[i].out, c[next].in, sizeof c[i].out);
        else
            memcpy(c[next].in, c[i].out, sizeof c[i].out);
    }
}

/* ---- curves ---- */

static void push(utw_loop *loop, utw_curve curve, int vertex)
{
    loop->curve[loop->n] = curve;
    loop->vertex[loop->n++] = vertex;
}

static void curves_of_vertices(const utw_draft_loop *from, const corner *c, utw_loop *loop)
{
    for (int i = 0; i < from->n; i++) {
        const int before = (i + from->n - 1) % from->n;
        const utw_draft_vertex *vertex = &from->vertex[i];
        const double *start = c[before].out, *end = c[i].in;
        if (vertex->is_arc)
            push(loop, utw_curve_arc(vertex->centre, vertex->r, vertex->a0, vertex->a1, start, end),
                 i);
        else if (start[0] != end[0] || start[1] != end[1])
            push(loop, utw_curve_line(start, end), i);
        if (c[i].cut > 0)
            push(loop,
                 utw_curve_arc(c[i].centre, vertex->round, c[i].a0, c[i].a1, c[i].in, c[i].out), i);
    }
}

static void whole_turn(const utw_draft_loop *from, utw_loop *loop)
{
    const double cs[2] = {cos(from->turn), sin(from->turn)};
    const double start[2] = {from->centre[0] + from->a * cs[0], from->centre[1] + from->a * cs[1]};
    utw_curve curve = utw_curve_arc(from->centre, from->a, 0, 2 * UTW_PI, start, start);
    for (int k = 0; k < 2; k++) {
        curve.u[k] = from->a * cs[k];
        curve.v[k] = from->b * (k == 0 ? -cs[1] : cs[0]);
    }
    push(loop, curve, 0);
}

static utw_status make_loop(const utw_draft_loop *from, const utw_shape_case *given, int clockwise,
                            utw_loop *loop, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    corner *c = NULL;
    const size_t most = 2 * (size_t)from->n + 1;
    UTW_TRY_ALLOC(loop->curve = utw_alloc(most, sizeof *loop->curve));
    UTW_TRY_ALLOC(loop->vertex = utw_alloc(most, sizeof *loop->vertex));
    if (from->kind == UTW_DRAFT_VERTICES) {
        UTW_TRY_ALLOC(c = utw_alloc((size_t)from->n, sizeof *c));
        for (int i = 0; i < from->n; i++) c[i] = corner_at(from, i);
        UTW_TRY(check_fillets(from, c, given, err));
        join_fillets(from, c);
        curves_of_vertices(from, c, loop);
    } else {
        whole_turn(from, loop);
    }
    if ((utw_loop_area(loop) < 0) != clockwise) utw_loop_reverse(loop);
    st = UTW_OK;
done:
    utw_free(c);
    return st;
}

utw_status utw_draft_part(const utw_draft *draft, const utw_shape_case *given, utw_part *part,
                          utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_part made = {.material = -1};
    if (draft->out_of_memory) {
        st = utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
        goto done;
    }
    UTW_TRY_ALLOC(made.loop = utw_alloc((size_t)draft->n_loop, sizeof *made.loop));
    for (int i = 0; i < draft->n_loop; i++) {
        made.n_loop++;
        UTW_TRY(make_loop(&draft->loop[i], given, i > 0, &made.loop[i], err));
    }
    *part = made;
    memset(&made, 0, sizeof made);
    st = UTW_OK;
done:
    utw_part_clear(&made);
    return st;
}
