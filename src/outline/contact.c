/* SPDX-License-Identifier: GPL-3.0-or-later
 * Walls on one another, nodes on walls, walls that cross. */
#include "outline/contact.h"

#include "base/memory.h"
#include "base/vec2.h"

/* Centre of a circle around the whole wall with radius length/2: no point is further than half the
 * length, along the wall, from its middle. */
static void middle_of(const utw_path *w, double m[2])
{
    utw_path_point at;
    utw_path_at(w, w->length / 2, &at);
    m[0] = at.x[0];
    m[1] = at.x[1];
}

static int is_straight(const utw_path *w)
{
    return fabs(w->kappa) * w->length <= 1e-7;
}

/* How far from the wall's nearer end s lies, in units of the margin inside which an end is "at" a
 * place: a thickness, or a quarter of a short wall. */
static double clearance(const utw_path *w, double s)
{
    utw_path_point at;
    utw_path_at(w, s, &at);
    return fmin(s, w->length - s) / fmin(at.t, w->length / 4);
}

/* Points common to the full lines or circles of two walls; tangency and parallels give none. */
static int line_line(const utw_path *a, const utw_path *b, double x[2][2])
{
    const double d = utw_cross(a->e, b->e), v[2] = {b->p[0] - a->p[0], b->p[1] - a->p[1]};
    if (fabs(d) < 1e-12) return 0;
    const double s = utw_cross(v, b->e) / d;
    for (int k = 0; k < 2; k++) x[0][k] = a->p[k] + s * a->e[k];
    return 1;
}

static void centre_of(const utw_path *w, double c[2])
{
    c[0] = w->p[0] - w->e[1] / w->kappa;
    c[1] = w->p[1] + w->e[0] / w->kappa;
}

static int line_circle(const utw_path *line, const utw_path *arc, double x[2][2])
{
    double c[2];
    centre_of(arc, c);
    const double v[2] = {c[0] - line->p[0], c[1] - line->p[1]};
    const double foot = utw_dot(v, line->e), off = utw_cross(v, line->e), r = 1 / fabs(arc->kappa);
    const double half2 = (r - off) * (r + off);
    if (!(half2 > 1e-14 * r * r)) return 0;
    for (int i = 0; i < 2; i++) {
        const double s = foot + (i ? 1 : -1) * sqrt(half2);
        for (int k = 0; k < 2; k++) x[i][k] = line->p[k] + s * line->e[k];
    }
    return 2;
}

static int circle_circle(const utw_path *a, const utw_path *b, double x[2][2])
{
    double ca[2], cb[2];
    centre_of(a, ca);
    centre_of(b, cb);
    const double d = utw_distance(ca, cb), ra = 1 / fabs(a->kappa), rb = 1 / fabs(b->kappa);
    if (!(d > 1e-9 * (ra + rb))) return 0;
    const double foot = (d * d + (ra - rb) * (ra + rb)) / (2 * d),
                 half2 = (ra - foot) * (ra + foot);
    if (!(half2 > 1e-14 * ra * ra)) return 0;
    const double u[2] = {(cb[0] - ca[0]) / d, (cb[1] - ca[1]) / d};
    for (int i = 0; i < 2; i++) {
        const double h = (i ? 1 : -1) * sqrt(half2);
        x[i][0] = ca[0] + foot * u[0] - h * u[1];
        x[i][1] = ca[1] + foot * u[1] + h * u[0];
    }
    return 2;
}

/* A common point of two walls that is not at an end of both: x[2]. Returns 1 when there is one. */
static int crossing(const utw_path *a, const utw_path *b, double size, double x[2])
{
    double at[2][2];
    int n;
    if (is_straight(a))
        n = is_straight(b) ? line_line(a, b, at) : line_circle(a, b, at);
    else
        n = is_straight(b) ? line_circle(b, a, at) : circle_circle(a, b, at);
    for (int i = 0; i < n; i++) {
        double sa, sb;
        if (utw_path_nearest(a, at[i], &sa) > 1e-7 * size) continue;
        if (utw_path_nearest(b, at[i], &sb) > 1e-7 * size) continue;
        if (clearance(a, sa) < 1 && clearance(b, sb) < 1) continue;
        x[0] = at[i][0];
        x[1] = at[i][1];
        return 1;
    }
    return 0;
}

/* The same ends in either order, and the same middle. */
static int same_walls(const utw_path *a, const utw_path *b, double size)
{
    utw_path_point a0, a1, a2, b0, b1, b2;
    const double near = fmax(1e-9 * size, 0.01 * fmin(fmin(a->t0, a->t1), fmin(b->t0, b->t1)));
    utw_path_at(a, a->length / 2, &a1);
    utw_path_at(b, b->length / 2, &b1);
    if (utw_distance(a1.x, b1.x) > near) return 0;
    utw_path_at(a, 0, &a0);
    utw_path_at(b, 0, &b0);
    utw_path_at(a, a->length, &a2);
    utw_path_at(b, b->length, &b2);
    return (utw_distance(a0.x, b0.x) <= near && utw_distance(a2.x, b2.x) <= near) ||
           (utw_distance(a0.x, b2.x) <= near && utw_distance(a2.x, b0.x) <= near);
}

static utw_status check_pair(const utw_path *paths, int i, int j, const double origin[2],
                             double size, utw_error *err)
{
    double x[2];
    utw_status st = UTW_OK;
    if (same_walls(&paths[i], &paths[j], size))
        st =
            utw_fail(err, UTW_E_OUTLINE,
                     "walls %d and %d lie on one another; draw one wall with the thickness of both",
                     i + 1, j + 1);
    else if (crossing(&paths[i], &paths[j], size, x))
        st = utw_fail(
            err, UTW_E_OUTLINE,
            "walls %d and %d cross at (%g, %g), where no node joins them; put a node there", i + 1,
            j + 1, x[0] + origin[0], x[1] + origin[1]);
    if (st != UTW_OK) utw_error_place(err, -1, -1, j);
    return st;
}

static utw_status check_node(const utw_midline *m, int node, int wall, const utw_path *w,
                             const double p[2], double size, utw_error *err)
{
    double s;
    const double off = utw_path_nearest(w, p, &s);
    utw_path_point at;
    utw_path_at(w, s, &at);
    if (off > fmax(1e-9 * size, 0.01 * at.t) || clearance(w, s) < 1) return UTW_OK;
    (void)utw_fail(err, UTW_E_OUTLINE,
                   "node %d (%g, %g) lies on wall %d (node %d to node %d) without being joined to "
                   "it; split the "
                   "wall there (for a slit, into walls that end at a node of their own)",
                   node, m->nodes[node][0], m->nodes[node][1], wall + 1, m->walls[wall].from,
                   m->walls[wall].to);
    utw_error_place(err, -1, -1, node);
    return UTW_E_OUTLINE;
}

utw_status utw_contact_check(const utw_midline *midline, const utw_path *paths,
                             const double origin[2], double size, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    double(*middle)[2] = NULL;
    const int n = midline->n_walls;
    UTW_TRY_ALLOC(middle = utw_alloc((size_t)n, sizeof *middle));
    for (int j = 0; j < n; j++) {
        const utw_wall *w = &midline->walls[j];
        middle_of(&paths[j], middle[j]);
        const double reach = paths[j].length / 2 * 1.001 + fmax(w->t0, w->t1);
        for (int i = 0; i < midline->n_nodes; i++) {
            const double p[2] = {midline->nodes[i][0] - origin[0],
                                 midline->nodes[i][1] - origin[1]};
            if (i == w->from || i == w->to || utw_distance(p, middle[j]) > reach) continue;
            UTW_TRY(check_node(midline, i, j, &paths[j], p, size, err));
        }
    }
    for (int j = 1; j < n; j++) {
        for (int i = 0; i < j; i++) {
            const double reach = (paths[i].length + paths[j].length) / 2 * 1.001;
            if (utw_distance(middle[i], middle[j]) > reach) continue;
            UTW_TRY(check_pair(paths, i, j, origin, size, err));
        }
    }
    st = UTW_OK;
done:
    utw_free(middle);
    return st;
}
