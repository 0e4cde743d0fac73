/* SPDX-License-Identifier: GPL-3.0-or-later
 * Free ends and junctions of the midline. */
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "thinwall/build.h"

#define BULB_WIDTH 1.3  /* times the area of the wall carried on to the tip: more is a bulb ... */
#define BULB_AREA  0.6  /* ... and more than it by so many thicknesses squared */
#define ASIDE      0.45 /* of its thickness: a wall whose line passes further off gets a link */
#define FAR        2.0  /* of the junction's radius: a node further off is not in it */
enum { HALVINGS = 60 };

/* Weight that keeps the node at the junction's middle where all walls are in one line; the second
 * when they are nearly so and would meet far away. */
static const double PULL[] = {1e-9, 0.1};

/* The boundary beyond a chord runs from *start on to *end. */
static void boundary_beyond(const utw_build *b, int chord, int at_end, int *start, int *end)
{
    const utw_chord *c = &b->chordal->chord[chord];
    *start = at_end ? c->right : c->left;
    *end = at_end ? c->left : c->right;
}

/* Area and centroid of all beyond a chord. */
static double region_beyond(const utw_build *b, int chord, int at_end, double centre[2])
{
    int start, end;
    boundary_beyond(b, chord, at_end, &start, &end);
    const double(*xy)[2] = (const double(*)[2])b->border->xy, *o = xy[start];
    double area = 0, sum[2] = {0, 0};
    for (int i = start; i != end; i = b->border->after[i]) {
        const int next = b->border->after[i];
        const double part = 0.5 * utw_turn(o, xy[i], xy[next]);
        area += part;
        for (int k = 0; k < 2; k++) sum[k] += part * (o[k] + xy[i][k] + xy[next][k]) / 3;
    }
    for (int k = 0; k < 2; k++) centre[k] = sum[k] / area;
    return area;
}

/* Where the border between point i and the next one crosses the path, on whose two sides they lie:
 * bisection on the curve itself. */
static void crossing(const utw_build *b, const utw_path *path, int i, double x[2])
{
    const utw_border *border = b->border;
    const int next = border->after[i], curve = border->on[i];
    double t0 = border->t[i],
           t1 = border->on[next] == curve && border->t[next] > t0 ? border->t[next] : 1;
    const int left = utw_path_offset(path, border->xy[i]) >= 0;
    for (int k = 0; k < HALVINGS; k++) {
        const double t = 0.5 * (t0 + t1);
        utw_curve_point(&border->curve[curve].curve, t, x);
        if ((utw_path_offset(path, x) >= 0) == left)
            t0 = t;
        else
            t1 = t;
    }
}

/* Station where the path, continued beyond its end (at_end: the chord lies at the end of its
 * branch; way: 1 forward, -1 backward), reaches the boundary beyond the chord; that of its end when
 * it does not. */
static double tip_station(const utw_build *b, const utw_path *path, int chord, int at_end, int way)
{
    const double from = way > 0 ? path->length : 0;
    double best = UTW_INFINITY;
    int start, end;
    boundary_beyond(b, chord, at_end, &start, &end);
    for (int i = start; i != end; i = b->border->after[i]) {
        const double f = utw_path_offset(path, b->border->xy[i]),
                     g = utw_path_offset(path, b->border->xy[b->border->after[i]]);
        double x[2];
        if ((f < 0) == (g < 0)) continue;
        crossing(b, path, i, x);
        const double s = way * (utw_path_foot(path, x, from) - from);
        if (s > 0) best = fmin(best, s);
    }
    return best < UTW_INFINITY ? from + way * best : from;
}

/* How far from p, beyond the point `centre`, the line through both leaves the region beyond a
 * chord. */
static double way_out(const utw_build *b, const double p[2], const double centre[2], int chord,
                      int at_end)
{
    const double half = utw_distance(p, centre);
    const utw_path path = utw_path_line(p, centre, 1, 1);
    const double out = tip_station(b, &path, chord, at_end, 1);
    return out > half ? out : 2 * half;
}

/* A wall with an area, from a node through `centre` to the boundary. */
static utw_status add_lump(utw_build *b, int node, const double centre[2], double area, int chord,
                           int at_end)
{
    const double *p = b->node[node];
    const double length = way_out(b, p, centre, chord, at_end),
                 u = length / utw_distance(p, centre),
                 q[2] = {p[0] + u * (centre[0] - p[0]), p[1] + u * (centre[1] - p[1])};
    utw_build_wall w = {.kind = UTW_WALL_LUMP, .bound = 1, .chord = {chord, chord}};
    int tip;
    const utw_status st = utw_build_add_node(b, q, &tip);
    if (st != UTW_OK) return st;
    w.path = at_end ? utw_path_line(b->node[node], q, area / length, area / length)
                    : utw_path_line(q, b->node[node], area / length, area / length);
    w.node[0] = at_end ? node : tip;
    w.node[1] = at_end ? tip : node;
    return utw_build_add_wall(b, &w);
}

utw_status utw_build_tip(utw_build *b, int w, int at_end)
{
    const utw_path path = b->wall[w].path;
    const int chord = b->wall[w].chord[at_end];
    const double end = at_end ? path.length : 0,
                 tip = tip_station(b, &path, chord, at_end, at_end ? 1 : -1);
    const double t = at_end ? path.t1 : path.t0, length = fabs(tip - end);
    double centre[2], middle[2];
    utw_path_point at;
    /* the area beyond the wall's end itself, which the chord does not quite pass through */
    utw_chord_middle(b->border, &b->chordal->chord[chord], middle);
    const double beyond = (at_end ? 1 : -1) * (end - utw_path_foot(&path, middle, end));
    const double area = region_beyond(b, chord, at_end, centre) - t * beyond;
    const int bulb = area > BULB_WIDTH * t * length && area > t * length + BULB_AREA * t * t;
    utw_path_at(&path, bulb ? end : tip, &at);
    utw_status st = utw_build_add_node(b, at.x, &b->wall[w].node[at_end]);
    if (st == UTW_OK && bulb)
        st = add_lump(b, b->wall[w].node[at_end], centre, area, chord, at_end);
    return st;
}

utw_status utw_build_stub(utw_build *b, int node, int chord, int at_end)
{
    double centre[2], middle[2];
    const double area = region_beyond(b, chord, at_end, centre);
    utw_chord_middle(b->border, &b->chordal->chord[chord], middle);
    /* from the chord as far beyond the centroid as that is from the chord, and back to the node */
    const double length = 2 * utw_distance(middle, centre);
    const double half[2] = {0.5 * (b->node[node][0] + 2 * centre[0] - middle[0]),
                            0.5 * (b->node[node][1] + 2 * centre[1] - middle[1])};
    const double whole = 2 * utw_distance(b->node[node], half);
    return add_lump(b, node, half, area * whole / length, chord, at_end);
}

/* ---- junctions ---- */

typedef struct spoke {
    const utw_path *path;
    double from; /* station of its end at the junction */
    utw_path_point foot;
} spoke;

static spoke spoke_at(const utw_build *b, int wall, int end, const double x[2])
{
    spoke s = {.path = &b->wall[wall].path};
    s.from = end ? s.path->length : 0;
    utw_path_at(s.path, utw_path_foot(s.path, x, s.from), &s.foot);
    return s;
}

static double thickness(const spoke *s)
{
    return s->from > 0 ? s->path->t1 : s->path->t0;
}

/* Least squares of the distances from all lines, by Gauss and Newton. */
static void nearest_to_all(const utw_build *b, const int *wall, const int *end, int n,
                           const double near[2], double pulled, double x[2])
{
    memcpy(x, near, 2 * sizeof *x);
    for (int round = 0; round < 20; round++) {
        double xx = 0, xy = 0, yy = 0, r[2] = {0, 0};
        for (int i = 0; i < n; i++) {
            const spoke s = spoke_at(b, wall[i], end[i], x);
            const double normal[2] = {-s.foot.e[1], s.foot.e[0]},
                         w = thickness(&s) * s.path->length, f = utw_path_offset(s.path, x);
            xx += w * normal[0] * normal[0];
            xy += w * normal[0] * normal[1];
            yy += w * normal[1] * normal[1];
            for (int k = 0; k < 2; k++) r[k] += w * f * normal[k];
        }
        const double pull = pulled * (xx + yy);
        xx += pull;
        yy += pull;
        for (int k = 0; k < 2; k++) r[k] += pull * (x[k] - near[k]);
        const double det = xx * yy - xy * xy;
        const double d[2] = {(yy * r[0] - xy * r[1]) / det, (xx * r[1] - xy * r[0]) / det};
        x[0] -= d[0];
        x[1] -= d[1];
        if (utw_norm(d) < 1e-14 * b->border->size) break;
    }
}

static utw_status link(utw_build *b, int node, int wall, int end, const spoke *s)
{
    utw_build_wall w = {.kind = UTW_WALL_LINK, .bound = 1};
    const double t = thickness(s);
    int foot;
    const utw_status st = utw_build_add_node(b, s->foot.x, &foot);
    if (st != UTW_OK) return st;
    w.path = utw_path_line(b->node[node], s->foot.x, t, t);
    w.node[0] = node;
    w.node[1] = foot;
    w.chord[0] = w.chord[1] = b->wall[wall].chord[end];
    b->wall[wall].node[end] = foot;
    return utw_build_add_wall(b, &w);
}

utw_status utw_build_meet(utw_build *b, int node, const int *wall, const int *end, int n,
                          const double near[2], double radius)
{
    double x[2] = {near[0], near[1]};
    for (int k = 0; k < 2 && n > 0; k++) {
        nearest_to_all(b, wall, end, n, near, PULL[k], x);
        if (utw_distance(x, near) <= FAR * radius) break;
    }
    memcpy(b->node[node], x, sizeof x);
    for (int i = 0; i < n; i++) {
        const spoke s = spoke_at(b, wall[i], end[i], x);
        b->wall[wall[i]].node[end[i]] = node;
        if (utw_distance(x, s.foot.x) <= ASIDE * thickness(&s)) continue;
        const utw_status st = link(b, node, wall[i], end[i], &s);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}
