/* SPDX-License-Identifier: GPL-3.0-or-later
 * Point location: a grid of boxes, then Newton's method on the map. */
#include "mesh/locate.h"

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "mesh/blend.h"

struct utw_locator {
    const utw_mesh *mesh;
    double lo[2], cell[2];
    int n[2];          /* cells a direction */
    int *first, *item; /* elements of cell c: item[first[c]] .. item[first[c+1]-1] */
    double (*box)[4];  /* [n_tri] xmin, ymin, xmax, ymax */
};

/* The share of a barycentric coordinate by which a point may lie outside an element and still count
 * as inside: points on sides, which rounding puts on either side. */
#define ON_SIDE 1e-10

void utw_locator_free(utw_locator *l)
{
    if (l == NULL) return;
    utw_free(l->first);
    utw_free(l->item);
    utw_free(l->box);
    utw_free(l);
}

static void join_box(double box[4], const double other[4])
{
    for (int k = 0; k < 2; k++) {
        box[k] = fmin(box[k], other[k]);
        box[2 + k] = fmax(box[2 + k], other[2 + k]);
    }
}

static void box_of_side(const utw_mesh *mesh, const utw_triangle *t, int k, double box[4])
{
    if (utw_mesh_is_curved(mesh, t, k)) {
        const utw_curve piece =
            utw_curve_piece(&mesh->net->edge[t->curve[k]].curve, t->t[k][0], t->t[k][1]);
        utw_curve_box(&piece, box);
        return;
    }
    const double *a = mesh->xy[t->node[k]], *b = mesh->xy[t->node[(k + 1) % 3]];
    for (int i = 0; i < 2; i++) {
        box[i] = fmin(a[i], b[i]);
        box[2 + i] = fmax(a[i], b[i]);
    }
}

/* The map is one to one, so that an element lies in the box of its sides. */
static void box_of(const utw_mesh *mesh, int tri, double box[4])
{
    box_of_side(mesh, &mesh->tri[tri], 0, box);
    for (int k = 1; k < 3; k++) {
        double side[4];
        box_of_side(mesh, &mesh->tri[tri], k, side);
        join_box(box, side);
    }
}

static int cell_at(const utw_locator *l, int axis, double x)
{
    const double c = floor((x - l->lo[axis]) / l->cell[axis]);
    return !(c > 0) ? 0 : c >= l->n[axis] ? l->n[axis] - 1 : (int)c;
}

/* Count (item NULL) or enter the elements of every cell; a little wider than the boxes. */
static void enter(const utw_locator *l, int *at, int *item)
{
    for (int t = 0; t < l->mesh->n_tri; t++) {
        const double *b = l->box[t];
        const double wx = 1e-9 * l->cell[0], wy = 1e-9 * l->cell[1];
        for (int j = cell_at(l, 1, b[1] - wy); j <= cell_at(l, 1, b[3] + wy); j++)
            for (int i = cell_at(l, 0, b[0] - wx); i <= cell_at(l, 0, b[2] + wx); i++) {
                const int c = j * l->n[0] + i;
                if (item != NULL) item[at[c]] = t;
                at[c]++;
            }
    }
}

utw_status utw_locator_create(const utw_mesh *mesh, utw_locator **locator, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_locator *l = NULL;
    int *at = NULL;
    UTW_TRY_ALLOC(l = utw_alloc(1, sizeof *l));
    l->mesh = mesh;
    UTW_TRY_ALLOC(l->box = utw_alloc((size_t)mesh->n_tri, sizeof *l->box));
    double all[4] = {UTW_INFINITY, UTW_INFINITY, -UTW_INFINITY, -UTW_INFINITY};
    for (int t = 0; t < mesh->n_tri; t++) {
        box_of(mesh, t, l->box[t]);
        join_box(all, l->box[t]);
    }
    const double w = all[2] - all[0], h = all[3] - all[1], side = sqrt(w * h / mesh->n_tri);
    for (int k = 0; k < 2; k++) {
        l->lo[k] = all[k];
        const double n = ceil((k == 0 ? w : h) / side);
        l->n[k] = n < 1 ? 1 : n > 2 * mesh->n_tri ? 2 * mesh->n_tri : (int)n;
        l->cell[k] = (k == 0 ? w : h) / l->n[k];
    }
    const size_t cells = (size_t)l->n[0] * (size_t)l->n[1];
    UTW_TRY_ALLOC(l->first = utw_alloc(cells + 1, sizeof(int)));
    UTW_TRY_ALLOC(at = utw_alloc(cells, sizeof(int)));
    enter(l, at, NULL);
    for (size_t c = 0; c < cells; c++) {
        l->first[c + 1] = l->first[c] + at[c];
        at[c] = l->first[c];
    }
    UTW_TRY_ALLOC(l->item = utw_alloc((size_t)l->first[cells], sizeof(int)));
    enter(l, at, l->item);
    *locator = l;
    l = NULL;
    st = UTW_OK;
done:
    utw_free(at);
    utw_locator_free(l);
    return st;
}

/* How far (r, s) lies outside the reference triangle. */
static double outside(double r, double s)
{
    return fmax(fmax(-r, -s), r + s - 1);
}

/* Newton's method from (r, s); steps stay near the triangle. The residual in lengths of the element
 * ends below 1e-13 of its size. Returns 1 when it does. */
static int invert(const utw_blend *b, const double xy[2], double *r, double *s)
{
    const double size = utw_distance(b->x[0], b->x[1]) + utw_distance(b->x[1], b->x[2]);
    for (int step = 0; step < 40; step++) {
        double p[2], J[4];
        utw_blend_at(b, *r, *s, p, J);
        const double dx = xy[0] - p[0], dy = xy[1] - p[1];
        if (hypot(dx, dy) <= 1e-13 * size + 4e-16 * (fabs(xy[0]) + fabs(xy[1]))) return 1;
        const double det = J[0] * J[3] - J[1] * J[2];
        if (!(det > 0)) return 0;
        *r += (J[3] * dx - J[1] * dy) / det;
        *s += (J[0] * dy - J[2] * dx) / det;
        *r = fmin(fmax(*r, -0.3), 1.3);
        *s = fmin(fmax(*s, -0.3), 1.3);
    }
    return 0;
}

static int inside(const utw_mesh *mesh, int tri, const double xy[2], utw_place *place)
{
    static const double start[4][2] = {{1.0 / 3, 1.0 / 3}, {0.1, 0.1}, {0.8, 0.1}, {0.1, 0.8}};
    utw_blend b;
    utw_blend_of(mesh, &mesh->tri[tri], &b);
    const int tries = b.any ? 4 : 1;
    for (int i = 0; i < tries; i++) {
        double r = start[i][0], s = start[i][1];
        if (!invert(&b, xy, &r, &s)) continue;
        if (outside(r, s) > ON_SIDE) return 0;
        *place = (utw_place){tri, r, s, {xy[0], xy[1]}};
        return 1;
    }
    return 0;
}

int utw_locate(const utw_locator *l, const double xy[2], utw_place *place)
{
    for (int k = 0; k < 2; k++) {
        const double reach = 1e-9 * l->cell[k];
        if (!(xy[k] >= l->lo[k] - reach && xy[k] <= l->lo[k] + l->n[k] * l->cell[k] + reach))
            return 0;
    }
    const int c = cell_at(l, 1, xy[1]) * l->n[0] + cell_at(l, 0, xy[0]);
    for (int i = l->first[c]; i < l->first[c + 1]; i++) {
        const double *b = l->box[l->item[i]], w = 1e-9 * (b[2] - b[0] + b[3] - b[1]);
        if (xy[0] < b[0] - w || xy[0] > b[2] + w || xy[1] < b[1] - w || xy[1] > b[3] + w) continue;
        if (inside(l->mesh, l->item[i], xy, place)) return 1;
    }
    return 0;
}

void utw_place_on_side(const utw_mesh *mesh, int tri, int k, double u, utw_place *place)
{
    static const double corner[3][2] = {{0, 0}, {1, 0}, {0, 1}};
    const double *a = corner[k], *b = corner[(k + 1) % 3];
    utw_blend blend;
    double J[4];
    utw_blend_of(mesh, &mesh->tri[tri], &blend);
    place->tri = tri;
    place->r = a[0] + u * (b[0] - a[0]);
    place->s = a[1] + u * (b[1] - a[1]);
    utw_blend_at(&blend, place->r, place->s, place->xy, J);
}

/* Steps of Newton's method from the parameter t toward the foot of the perpendicular from xy, which
 * stay in [lo, hi]. */
static double foot_of(const utw_curve *c, const double xy[2], double t, double lo, double hi)
{
    for (int step = 0; step < 4; step++) {
        double p[2], d1[2], d2[2];
        utw_curve_point(c, t, p);
        utw_curve_d1(c, t, d1);
        utw_curve_d2(c, t, d2);
        const double to[2] = {p[0] - xy[0], p[1] - xy[1]};
        const double slope = utw_dot(d1, d1) + utw_dot(to, d2);
        if (!(slope > 0)) break;
        t = fmin(fmax(t - utw_dot(to, d1) / slope, lo), hi);
    }
    return t;
}

/* Distance from xy to a straight or curved side: *u its nearest place. On a curve the best of some
 * samples, then a golden-section search and Newton's method. */
static double side_distance(const utw_mesh *mesh, int tri, int k, const double xy[2], double *u)
{
    const utw_triangle *t = &mesh->tri[tri];
    const double *a = mesh->xy[t->node[k]], *b = mesh->xy[t->node[(k + 1) % 3]];
    if (!utw_mesh_is_curved(mesh, t, k)) {
        const double d[2] = {b[0] - a[0], b[1] - a[1]}, to[2] = {xy[0] - a[0], xy[1] - a[1]};
        *u = fmin(fmax(utw_dot(to, d) / utw_dot(d, d), 0), 1);
        const double foot[2] = {a[0] + *u * d[0], a[1] + *u * d[1]};
        return utw_distance(xy, foot);
    }
    enum { N = 16 };
    const utw_curve *c = &mesh->net->edge[t->curve[k]].curve;
    const double t0 = t->t[k][0], span = t->t[k][1] - t0, golden = 0.6180339887498949;
    double best = UTW_INFINITY, p[2], at = 0;
    for (int i = 0; i <= N; i++) {
        utw_curve_point(c, t0 + span * i / N, p);
        if (utw_distance(xy, p) >= best) continue;
        best = utw_distance(xy, p);
        at = (double)i / N;
    }
    double lo = fmax(0, at - 1.0 / N), hi = fmin(1, at + 1.0 / N);
    for (int step = 0; step < 30; step++) {
        const double x1 = hi - golden * (hi - lo), x2 = lo + golden * (hi - lo);
        double p1[2], p2[2];
        utw_curve_point(c, t0 + span * x1, p1);
        utw_curve_point(c, t0 + span * x2, p2);
        if (utw_distance(xy, p1) < utw_distance(xy, p2))
            hi = x2;
        else
            lo = x1;
    }
    const double foot =
        foot_of(c, xy, t0 + span * 0.5 * (lo + hi), fmin(t0, t0 + span), fmax(t0, t0 + span));
    *u = (foot - t0) / span;
    utw_curve_point(c, foot, p);
    return utw_distance(xy, p);
}

double utw_locate_boundary(const utw_locator *l, const double xy[2], utw_place *place)
{
    double best = UTW_INFINITY, at = 0;
    int tri = 0, side = 0;
    for (int e = 0; e < l->mesh->n_edge; e++) {
        const utw_mesh_edge *edge = &l->mesh->edge[e];
        if (edge->tri[1] >= 0) continue;
        const double *b = l->box[edge->tri[0]];
        const double dx = fmax(fmax(b[0] - xy[0], xy[0] - b[2]), 0),
                     dy = fmax(fmax(b[1] - xy[1], xy[1] - b[3]), 0);
        if (hypot(dx, dy) >= best) continue;
        double u;
        const double d = side_distance(l->mesh, edge->tri[0], edge->slot[0], xy, &u);
        if (d >= best) continue;
        best = d;
        at = u;
        tri = edge->tri[0];
        side = edge->slot[0];
    }
    utw_place_on_side(l->mesh, tri, side, at, place);
    return best;
}
