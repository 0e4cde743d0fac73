/* SPDX-License-Identifier: GPL-3.0-or-later
 * Circles that touch both sides of a wall. */
#include "thinwall/medial.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

#define SMOOTH   1e-3                /* [rad] corners flatter than this are none */
#define SHARP    (20 * UTW_PI / 180) /* re-entrant corners from this on end a wall's face */
#define SAME     1e-6                /* [rad] directions that differ by less are one */
#define PARALLEL 0.6                 /* least cosine between the normals of a wall's faces */
#define INSIDE   1e-6                /* of the radius: how far a circle may hold another point */
enum { ROUNDS = 40 };

typedef struct row {
    utw_station *s;
    size_t n, capacity;
} row;

typedef struct finder {
    const utw_border *border;
    const utw_chord *chord; /* of the branch */
    int n;
    utw_error *err;
} finder;

static void normal(const utw_border *b, int curve, double t, double n[2])
{
    double e[2];
    utw_border_tangent(b, curve, t, e);
    n[0] = -e[1];
    n[1] = e[0];
}

/* Radius of the circle that touches the line at p with the unit normal n, and passes through q;
 * infinite when q lies behind the line. */
static double radius_through(const double p[2], const double n[2], const double q[2])
{
    const double d[2] = {q[0] - p[0], q[1] - p[1]}, height = utw_dot(d, n);
    return height > 0 ? utw_dot(d, d) / (2 * height) : UTW_INFINITY;
}

/* 1 when the foot at t of a curve, seen along the unit vector m from the boundary, is a re-entrant
 * corner and not the last point of one of its faces. */
static int is_sharp(const utw_border *b, int curve, double t, const double m[2])
{
    if (t > 0 && t < 1) return 0;
    const int after = t >= 1 ? b->curve[curve].after : curve, before = b->curve[after].before;
    double n[2][2];
    if (b->curve[after].turn >= -SHARP) return 0;
    normal(b, before, 1, n[0]);
    normal(b, after, 0, n[1]);
    return fabs(utw_cross(n[0], m)) > SAME && fabs(utw_cross(n[1], m)) > SAME;
}

/* The points of both sides around chord i that the circle must not hold. */
static int holds_point(const finder *x, int i, const double c[2], double r)
{
    for (int k = i - 2; k <= i + 2; k++) {
        if (k < 0 || k >= x->n) continue;
        const int p[2] = {x->chord[k].left, x->chord[k].right};
        for (int side = 0; side < 2; side++)
            if (utw_distance(c, x->border->xy[p[side]]) < r * (1 - INSIDE)) return 1;
    }
    return 0;
}

/* The circle that touches `curve` at t, from chord i on; 0 when there is none. side: 0 left, 1
 * right. */
static int touch(const finder *x, int i, int side, int curve, double t, utw_station *s)
{
    const utw_border *b = x->border;
    const int start = side == 0 ? x->chord[i].right : x->chord[i].left;
    double p[2], n[2], q[2], c[2] = {0, 0};
    int other = b->on[start];
    double u = b->t[start];
    utw_curve_point(&b->curve[curve].curve, t, p);
    normal(b, curve, t, n);
    double r = radius_through(p, n, b->xy[start]);
    for (int round = 0, settled = 0; !settled; round++) {
        if (round == ROUNDS || !(r < 2 * b->size)) return 0;
        for (int k = 0; k < 2; k++) c[k] = p[k] + r * n[k];
        (void)utw_border_slide(b, c, &other, &u, q);
        const double next = radius_through(p, n, q);
        settled = fabs(next - r) <= 1e-13 * b->size;
        r = next;
    }
    if (!(r > 0) || utw_distance(p, q) <= 1e-9 * b->size || holds_point(x, i, c, r)) return 0;
    const double m[2] = {(c[0] - q[0]) / r, (c[1] - q[1]) / r};
    const double d[2] = {n[0] - m[0], n[1] - m[1]}, length = utw_norm(d), sign = side == 0 ? 1 : -1;
    if (!(length > 0)) return 0;
    /* The left face's normal points to the right. With f the angle between one normal and the other
     * reversed, |d| = 2 cos(f/2), and a plane face has its foot square to the midline at
     * r/cos(f/2). */
    *s = (utw_station){.x = {c[0], c[1]},
                       .e = {-sign * d[1] / length, sign * d[0] / length},
                       .t = 4 * r / length,
                       .left = side == 0 ? curve : other,
                       .right = side == 0 ? other : curve,
                       .chord = i,
                       .good = utw_dot(n, m) < -PARALLEL && !is_sharp(b, other, u, m)};
    return 1;
}

static utw_status append(finder *x, row *list, const utw_station *s)
{
    void *array = list->s;
    if (utw_grow(&array, &list->capacity, list->n + 1, sizeof *s) != 0)
        return utw_fail(x->err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    list->s = array;
    list->s[list->n++] = *s;
    return UTW_OK;
}

/* The circles at one point of a side; where two curves meet one for each, in the order of the
 * branch: the left boundary runs against it. So a plate reaches to where its fillet begins, on
 * whichever side of it that lies. */
static utw_status at_point(finder *x, int i, int side, int point, row *list)
{
    const utw_border *b = x->border;
    const int curve = b->on[point], corner = b->t[point] <= 0;
    const double turn = b->curve[curve].turn;
    utw_station s;
    if (corner && turn > SMOOTH) return UTW_OK;
    const int two = corner && b->curve[curve].before != curve;
    for (int k = 0; k <= two; k++) {
        const int before = two && (k == 0) == (side == 1);
        const int on = before ? b->curve[curve].before : curve;
        if (!touch(x, i, side, on, before ? 1 : b->t[point], &s)) continue;
        const utw_status st = append(x, list, &s);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}

static utw_status one_side(finder *x, int side, row *list)
{
    for (int i = 0, last; i < x->n; i = last) {
        const int point = side == 0 ? x->chord[i].left : x->chord[i].right;
        for (last = i; last < x->n; last++)
            if ((side == 0 ? x->chord[last].left : x->chord[last].right) != point) break;
        const utw_status st = at_point(x, (i + last) / 2, side, point, list);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}

/* Both rows are in order; of the next of each, the one that lies behind the other comes first. */
static void merge(const row *left, const row *right, utw_station *out)
{
    size_t i = 0, j = 0, n = 0;
    while (i < left->n || j < right->n) {
        int take_left = j == right->n;
        if (i < left->n && j < right->n) {
            const utw_station *a = &left->s[i], *b = &right->s[j];
            const double d[2] = {b->x[0] - a->x[0], b->x[1] - a->x[1]},
                         e[2] = {a->e[0] + b->e[0], a->e[1] + b->e[1]};
            take_left = utw_dot(d, e) > 0;
        }
        out[n++] = take_left ? left->s[i++] : right->s[j++];
    }
}

utw_status utw_medial_stations(const utw_border *border, const utw_chordal *chordal,
                               const utw_branch *branch, utw_station **station, int *n,
                               utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    finder x = {
        .border = border, .chord = chordal->chord + branch->first, .n = branch->n, .err = err};
    row side[2] = {{NULL, 0, 0}, {NULL, 0, 0}};
    utw_station *merged = NULL;
    if (branch->closed) x.n--; /* the last chord is the first */
    for (int k = 0; k < 2; k++) UTW_TRY(one_side(&x, k, &side[k]));
    UTW_TRY_ALLOC(merged = utw_alloc(side[0].n + side[1].n, sizeof *merged));
    merge(&side[0], &side[1], merged);
    for (size_t i = 0; i < side[0].n + side[1].n; i++) merged[i].chord += branch->first;
    *n = (int)(side[0].n + side[1].n);
    *station = merged;
    st = UTW_OK;
done:
    utw_free(side[0].s);
    utw_free(side[1].s);
    return st;
}
