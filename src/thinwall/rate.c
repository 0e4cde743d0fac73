/* SPDX-License-Identifier: GPL-3.0-or-later
 * Bends, slenderness and counts. */
#include "thinwall/rate.h"

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/graph.h"

#define BEND    5.5 /* mean radius over thickness, at most */
#define TANGENT (10 * UTW_PI / 180)
#define SMOOTH  (15 * UTW_PI / 180)  /* walls that turn by less at a node are one plate */
#define CORNER  (100 * UTW_PI / 180) /* a chamfered corner turns by less */
#define STEP    1.5                  /* unless one is thicker than that many times the other */

typedef struct rater {
    utw_idealisation *ideal;
    utw_path *path; /* [n_walls] */
    int *degree;    /* [n_nodes] */
    int (*at)[2];   /* [n_nodes] wall ends at a node of degree two: 2 wall + end */
    int *plate;     /* [n_walls] union-find */
} rater;

static void direction(const rater *r, int wall_end, double e[2])
{
    const utw_path *path = &r->path[wall_end / 2];
    const int end = wall_end & 1;
    utw_path_point at;
    utw_path_at(path, end ? path->length : 0, &at);
    for (int k = 0; k < 2; k++) e[k] = end ? at.e[k] : -at.e[k];
}

static double end_thickness(const rater *r, int wall_end)
{
    const utw_path *path = &r->path[wall_end / 2];
    return wall_end & 1 ? path->t1 : path->t0;
}

/* By how much the midline turns at a node of two walls, positive to the left of one who goes in the
 * direction of `wall` [rad]. */
static double turn_at(const rater *r, int node, int wall)
{
    double in[2], out[2];
    const int first = r->at[node][0] / 2 == wall ? 0 : 1, end = r->at[node][first] & 1;
    direction(r, r->at[node][first], in);
    direction(r, r->at[node][1 - first], out);
    const double turn = atan2(-utw_cross(in, out), -utw_dot(in, out));
    return end ? turn : -turn;
}

static void find_bends(rater *r)
{
    const utw_midline *m = &r->ideal->midline;
    for (int i = 0; i < m->n_walls; i++) {
        const utw_wall *w = &m->walls[i];
        const double t = 0.5 * (w->t0 + w->t1);
        if (r->path[i].kappa == 0 || fabs(r->path[i].kappa) * BEND * t < 1 || w->from == w->to)
            continue;
        if (r->degree[w->from] != 2 || r->degree[w->to] != 2) continue;
        if (fabs(turn_at(r, w->from, i)) > TANGENT || fabs(turn_at(r, w->to, i)) > TANGENT)
            continue;
        r->ideal->wall[i].kind = UTW_WALL_BEND;
    }
    /* an arc that only goes on from another arc rounds no corner */
    for (int i = 0; i < m->n_walls; i++) {
        const int node[2] = {m->walls[i].from, m->walls[i].to};
        if (r->ideal->wall[i].kind != UTW_WALL_BEND) continue;
        for (int e = 0; e < 2; e++)
            for (int k = 0; k < 2; k++) {
                const int other = r->at[node[e]][k] / 2;
                if (other != i && r->path[other].kappa * r->path[i].kappa > 0)
                    r->ideal->wall[i].kind = UTW_WALL_PLATE;
            }
    }
}

/* The piece across a chamfered corner: shorter than thick, and the midline turns the same way at
 * both its ends. */
static void find_chamfers(rater *r)
{
    const utw_midline *m = &r->ideal->midline;
    for (int i = 0; i < m->n_walls; i++) {
        const utw_wall *w = &m->walls[i];
        if (r->path[i].kappa != 0 || r->ideal->wall[i].kind != UTW_WALL_PLATE ||
            r->path[i].length >= 0.5 * (w->t0 + w->t1) || r->degree[w->from] != 2 ||
            r->degree[w->to] != 2)
            continue;
        const double a = turn_at(r, w->from, i), b = turn_at(r, w->to, i);
        if (a * b > 0 && fmin(fabs(a), fabs(b)) > SMOOTH && fabs(a) + fabs(b) < CORNER)
            r->ideal->wall[i].kind = UTW_WALL_BEND;
    }
}

static int root(const rater *r, int wall)
{
    while (r->plate[wall] != wall) wall = r->plate[wall];
    return wall;
}

static void find_plates(rater *r)
{
    const utw_midline *m = &r->ideal->midline;
    for (int i = 0; i < m->n_walls; i++) r->plate[i] = i;
    for (int node = 0; node < m->n_nodes; node++) {
        if (r->degree[node] != 2) continue;
        const int a = r->at[node][0], b = r->at[node][1];
        const double ta = end_thickness(r, a), tb = end_thickness(r, b);
        if (r->ideal->wall[a / 2].kind != UTW_WALL_PLATE ||
            r->ideal->wall[b / 2].kind != UTW_WALL_PLATE)
            continue;
        if (fabs(turn_at(r, node, a / 2)) < SMOOTH && fmax(ta, tb) < STEP * fmin(ta, tb))
            r->plate[root(r, a / 2)] = root(r, b / 2);
    }
}

static utw_status rate_plates(rater *r, utw_error *err)
{
    const utw_midline *m = &r->ideal->midline;
    double(*sum)[2] = utw_alloc((size_t)m->n_walls, sizeof *sum); /* length, area of each plate */
    if (sum == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    for (int i = 0; i < m->n_walls; i++) {
        utw_wall_info *w = &r->ideal->wall[i];
        w->length = r->path[i].length;
        w->thickness = 0.5 * (m->walls[i].t0 + m->walls[i].t1);
        sum[root(r, i)][0] += w->length;
        sum[root(r, i)][1] += w->length * w->thickness;
    }
    for (int i = 0; i < m->n_walls; i++) {
        const double *s = sum[root(r, i)];
        r->ideal->wall[i].plate_length = s[0];
        r->ideal->wall[i].slenderness = s[0] * s[0] / s[1];
        r->ideal->wall[i].slender =
            r->ideal->wall[i].kind == UTW_WALL_PLATE && s[0] * s[0] >= (UTW_SLENDER - 1e-9) * s[1];
    }
    utw_free(sum);
    return UTW_OK;
}

static void count(rater *r)
{
    utw_idealisation_info *info = &r->ideal->info;
    double slender = 0, area = 0;
    for (int i = 0; i < r->ideal->midline.n_walls; i++) {
        const utw_wall_info *w = &r->ideal->wall[i];
        info->walls += w->kind == UTW_WALL_PLATE || w->kind == UTW_WALL_LUMP;
        info->lumps += w->kind == UTW_WALL_LUMP;
        info->bends += w->kind == UTW_WALL_BEND;
        info->links += w->kind == UTW_WALL_LINK;
        info->length += w->length;
        area += w->length * w->thickness;
        if (w->slender) slender += w->length * w->thickness;
        if (w->kind == UTW_WALL_PLATE) info->slenderness = fmax(info->slenderness, w->slenderness);
    }
    info->thickness = area / info->length;
    info->slender_share = slender / area;
    for (int i = 0; i < r->ideal->midline.n_nodes; i++) info->junctions += r->degree[i] > 2;
    info->cells = r->ideal->midline.n_walls - r->ideal->midline.n_nodes + 1;
}

utw_status utw_rate_walls(utw_idealisation *ideal, const utw_wall_kind *kind, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_midline *m = &ideal->midline;
    rater r = {.ideal = ideal};
    double origin[2], size;
    UTW_TRY_ALLOC(r.path = utw_alloc((size_t)m->n_walls, sizeof *r.path));
    UTW_TRY_ALLOC(r.degree = utw_alloc((size_t)m->n_nodes, sizeof *r.degree));
    UTW_TRY_ALLOC(r.at = utw_alloc((size_t)m->n_nodes, sizeof *r.at));
    UTW_TRY_ALLOC(r.plate = utw_alloc((size_t)m->n_walls, sizeof *r.plate));
    UTW_TRY_ALLOC(ideal->wall = utw_alloc((size_t)m->n_walls, sizeof *ideal->wall));
    UTW_TRY(utw_graph_paths(m, r.path, origin, &size, err));
    for (int i = 0; i < m->n_walls; i++) {
        ideal->wall[i].kind = kind == NULL ? UTW_WALL_PLATE : kind[i];
        for (int e = 0; e < 2; e++) {
            const int node = e == 0 ? m->walls[i].from : m->walls[i].to;
            if (r.degree[node] < 2) r.at[node][r.degree[node]] = 2 * i + e;
            r.degree[node]++;
        }
    }
    find_bends(&r);
    find_chamfers(&r);
    find_plates(&r);
    UTW_TRY(rate_plates(&r, err));
    count(&r);
    st = UTW_OK;
done:
    utw_free(r.path);
    utw_free(r.degree);
    utw_free(r.at);
    utw_free(r.plate);
    return st;
}
