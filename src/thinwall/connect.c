/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where walls that follow one another along a branch meet. */
#include <string.h>

#include "base/status.h"
#include "base/vec2.h"
#include "thinwall/build.h"

#define STRAIGHT    (15 * UTW_PI / 180) /* walls that turn by less go on */
#define STEP        1.15                /* thicknesses that differ by more make a step */
#define ASIDE       0.6                 /* of the thinner wall: midlines further apart get a link */
#define ROUNDED     1.25 /* of the thickness: outer radius from which a corner is a bend */
#define FAR         3.0  /* a crossing further off than so many gaps and thicknesses is none */
#define LUMP        1.3 /* of the thickness beside it: a gap thicker than that is a wall of its own */
#define LUMP_LENGTH 0.75                 /* of its own thickness, at least */
#define BACK        (150 * UTW_PI / 180) /* walls that turn by more run back beside one another */

typedef struct joint {
    utw_build *build;
    int a, b;            /* walls */
    utw_path_point p, q; /* end of a, start of b */
    double turn;         /* from a to b [rad], positive to the left */
    double gap;          /* between their ends */
} joint;

/* Where the paths continued cross, by Newton's iteration: 0 when they do not near by. */
static int cross(const joint *j, double x[2])
{
    const utw_path *path[2] = {&j->build->wall[j->a].path, &j->build->wall[j->b].path};
    double at[2] = {0.5 * (j->p.x[0] + j->q.x[0]), 0.5 * (j->p.x[1] + j->q.x[1])};
    const double reach = FAR * (j->gap + j->p.t + j->q.t);
    memcpy(x, at, sizeof at);
    for (int i = 0; i < 30; i++) {
        double f[2], n[2][2];
        for (int k = 0; k < 2; k++) {
            utw_path_point foot;
            const double s = utw_path_foot(path[k], x, k == 0 ? path[k]->length : 0);
            utw_path_at(path[k], s, &foot);
            n[k][0] = -foot.e[1];
            n[k][1] = foot.e[0];
            f[k] = utw_path_offset(path[k], x);
        }
        const double det = utw_cross(n[0], n[1]);
        if (fabs(det) < 1e-6) return 0;
        const double d[2] = {(f[0] * n[1][1] - f[1] * n[0][1]) / det,
                             (f[1] * n[0][0] - f[0] * n[1][0]) / det};
        x[0] -= d[0];
        x[1] -= d[1];
        if (!(utw_distance(x, at) < reach)) return 0;
        if (utw_norm(d) < 1e-14 * j->build->border->size) return 1;
    }
    return 0;
}

/* ---- bends ---- */

/* Radius of the rounding between two straight faces that would meet at x: the nearest boundary of
 * the gap is R (1/cos(turn/2) - 1) away. side: 0 left, 1 right. */
static double rounding(const joint *j, const double x[2], int side)
{
    const utw_border *border = j->build->border;
    const utw_chord *u = &j->build->chordal->chord[j->build->wall[j->a].chord[1]],
                    *v = &j->build->chordal->chord[j->build->wall[j->b].chord[0]];
    const int from = side == 0 ? v->left : u->right, to = side == 0 ? u->left : v->right;
    int best = from;
    for (int i = from;; i = border->after[i]) {
        if (utw_distance(border->xy[i], x) < utw_distance(border->xy[best], x)) best = i;
        if (i == to) break;
    }
    int curve = border->on[best];
    double t = border->t[best], q[2];
    const double away = utw_border_slide(border, x, &curve, &t, q);
    return away / (1 / cos(0.5 * j->turn) - 1);
}

/* Crossing of two lines. */
static void cross_lines(const double p[2], const double d[2], const double q[2], const double e[2],
                        double x[2])
{
    const double w[2] = {q[0] - p[0], q[1] - p[1]}, s = utw_cross(w, e) / utw_cross(d, e);
    x[0] = p[0] + s * d[0];
    x[1] = p[1] + s * d[1];
}

/* Where the faces on one side of two straight walls would meet. Faces of tapering walls are not
 * parallel to the midline. */
static void face_corner(const joint *j, int side, double x[2])
{
    const double sign = side == 0 ? 0.5 : -0.5;
    const utw_path *path[2] = {&j->build->wall[j->a].path, &j->build->wall[j->b].path};
    double p[2][2], d[2][2];
    for (int k = 0; k < 2; k++) {
        const utw_path_point *at = k == 0 ? &j->p : &j->q;
        const double n[2] = {-at->e[1], at->e[0]},
                     slope = sign * (path[k]->t1 - path[k]->t0) / path[k]->length;
        for (int i = 0; i < 2; i++) {
            p[k][i] = at->x[i] + sign * at->t * n[i];
            d[k][i] = at->e[i] + slope * n[i];
        }
    }
    cross_lines(p[0], d[0], p[1], d[1], x);
}

/* Mean radius of a bend at the corner x of two lines, 0 for a sharp corner. */
static double bend_radius(const joint *j, const double x[2])
{
    const utw_path *a = &j->build->wall[j->a].path, *b = &j->build->wall[j->b].path;
    if (a->kappa != 0 || b->kappa != 0 || fabs(j->turn) > 0.9 * UTW_PI) return 0;
    const int outer = j->turn > 0 ? 1 : 0;
    double corner[2];
    face_corner(j, outer, corner);
    const double ro = rounding(j, corner, outer);
    if (!(ro > ROUNDED * 0.5 * (j->p.t + j->q.t))) return 0;
    face_corner(j, 1 - outer, corner);
    const double r = 0.5 * (ro + rounding(j, corner, 1 - outer)),
                 reach = r * tan(0.5 * fabs(j->turn));
    /* it must leave something of both walls */
    if (reach > 0.9 * utw_distance(x, a->p) || reach > 0.9 * (utw_distance(x, j->q.x) + b->length))
        return 0;
    return r;
}

static utw_status add_bend(const joint *j, const double x[2], double r)
{
    utw_build *b = j->build;
    const double reach = r * tan(0.5 * fabs(j->turn)), sign = j->turn > 0 ? 1 : -1;
    double p[2], q[2];
    for (int k = 0; k < 2; k++) {
        p[k] = x[k] - reach * j->p.e[k];
        q[k] = x[k] + reach * j->q.e[k];
    }
    utw_build_wall bend = {.kind = UTW_WALL_BEND, .bound = 1};
    bend.path = (utw_path){.p = {p[0], p[1]},
                           .e = {j->p.e[0], j->p.e[1]},
                           .length = r * fabs(j->turn),
                           .kappa = sign / r,
                           .t0 = j->p.t,
                           .t1 = j->q.t};
    bend.chord[0] = b->wall[j->a].chord[1];
    bend.chord[1] = b->wall[j->b].chord[0];
    utw_status st = utw_build_add_node(b, p, &bend.node[0]);
    if (st == UTW_OK) st = utw_build_add_node(b, q, &bend.node[1]);
    if (st != UTW_OK) return st;
    b->wall[j->a].node[1] = bend.node[0];
    b->wall[j->b].node[0] = bend.node[1];
    return utw_build_add_wall(b, &bend);
}

/* ---- walls that go on ---- */

static utw_status one_node(const joint *j, const double x[2])
{
    int node;
    const utw_status st = utw_build_add_node(j->build, x, &node);
    if (st != UTW_OK) return st;
    j->build->wall[j->a].node[1] = j->build->wall[j->b].node[0] = node;
    return UTW_OK;
}

/* A straight wall between two new nodes, between walls a and b. */
static utw_status between(const joint *j, const double p[2], const double q[2], double t,
                          utw_wall_kind kind)
{
    utw_build *b = j->build;
    utw_build_wall wall = {.path = utw_path_line(p, q, t, t), .kind = kind, .bound = 1};
    wall.chord[0] = b->wall[j->a].chord[1];
    wall.chord[1] = b->wall[j->b].chord[0];
    utw_status st = utw_build_add_node(b, p, &wall.node[0]);
    if (st == UTW_OK) st = utw_build_add_node(b, q, &wall.node[1]);
    if (st != UTW_OK) return st;
    b->wall[j->a].node[1] = wall.node[0];
    b->wall[j->b].node[0] = wall.node[1];
    return utw_build_add_wall(b, &wall);
}

static utw_status go_on(const joint *j)
{
    const utw_build *b = j->build;
    const double thin = fmin(j->p.t, j->q.t), thick = fmax(j->p.t, j->q.t);
    const int stepped = thick > STEP * thin, thinner_is_a = j->p.t < j->q.t;
    double x[2];
    if (j->gap > thin) {
        const double area = utw_chordal_area(b->chordal, &b->chordal->branch[b->wall[j->a].branch],
                                             b->wall[j->a].chord[1], b->wall[j->b].chord[0]),
                     t = area / j->gap;
        if (t > LUMP * thick && j->gap > LUMP_LENGTH * t)
            return between(j, j->p.x, j->q.x, t, UTW_WALL_LUMP);
    }
    if (!stepped) {
        for (int k = 0; k < 2; k++) x[k] = 0.5 * (j->p.x[k] + j->q.x[k]);
        return one_node(j, x);
    }
    /* the end of the thinner wall and its foot on the other's midline */
    const double *end = thinner_is_a ? j->p.x : j->q.x;
    const utw_path *other = &b->wall[thinner_is_a ? j->b : j->a].path;
    utw_path_point foot;
    utw_path_at(other, utw_path_foot(other, end, thinner_is_a ? 0 : other->length), &foot);
    if (utw_distance(end, foot.x) > ASIDE * thin)
        return between(j, thinner_is_a ? end : foot.x, thinner_is_a ? foot.x : end, thin,
                       UTW_WALL_LINK);
    for (int k = 0; k < 2; k++) x[k] = 0.5 * (end[k] + foot.x[k]);
    return one_node(j, x);
}

/* Walls that run back beside one another: what joins them is a wall across their ends, through the
 * middle of the material there and with its area. */
static utw_status turn_back(const joint *j)
{
    const utw_build *b = j->build;
    const utw_border *border = b->border;
    const utw_path *path[2] = {&b->wall[j->a].path, &b->wall[j->b].path};
    const utw_chord *u = &b->chordal->chord[b->wall[j->a].chord[1]],
                    *v = &b->chordal->chord[b->wall[j->b].chord[0]];
    const int run[2][2] = {{u->right, v->right}, {v->left, u->left}};
    const double *o = border->xy[u->right];
    double area = 0, sum[2] = {0, 0}, m[2];
    for (int side = 0; side < 2; side++)
        for (int i = run[side][0], last = i != run[side][1];; i = border->after[i]) {
            /* along one side, then over the chord to the other */
            const int end = i == run[side][1] || !last,
                      next = end ? run[1 - side][0] : border->after[i];
            const double part = 0.5 * utw_turn(o, border->xy[i], border->xy[next]);
            area += part;
            for (int k = 0; k < 2; k++)
                sum[k] += part * (o[k] + border->xy[i][k] + border->xy[next][k]) / 3;
            if (end) break;
        }
    utw_path_point foot[2];
    for (int k = 0; k < 2; k++) m[k] = sum[k] / area;
    for (int k = 0; k < 2; k++)
        utw_path_at(path[k], utw_path_foot(path[k], m, k == 0 ? path[k]->length : 0), &foot[k]);
    const double t = area / (utw_distance(foot[0].x, foot[1].x) + 0.5 * (j->p.t + j->q.t));
    return between(j, foot[0].x, foot[1].x, t,
                   t > LUMP * fmax(j->p.t, j->q.t) ? UTW_WALL_LUMP : UTW_WALL_PLATE);
}

utw_status utw_build_join(utw_build *build, int a, int b)
{
    joint j = {.build = build, .a = a, .b = b};
    double x[2];
    utw_path_at(&build->wall[a].path, build->wall[a].path.length, &j.p);
    utw_path_at(&build->wall[b].path, 0, &j.q);
    j.turn = atan2(utw_cross(j.p.e, j.q.e), utw_dot(j.p.e, j.q.e));
    j.gap = utw_distance(j.p.x, j.q.x);
    if (fabs(j.turn) < STRAIGHT) return go_on(&j);
    if (fabs(j.turn) > BACK && j.gap > ASIDE * fmin(j.p.t, j.q.t)) return turn_back(&j);
    if (!cross(&j, x)) {
        for (int k = 0; k < 2; k++) x[k] = 0.5 * (j.p.x[k] + j.q.x[k]);
        return one_node(&j, x);
    }
    const double r = bend_radius(&j, x);
    return r > 0 ? add_bend(&j, x, r) : one_node(&j, x);
}
