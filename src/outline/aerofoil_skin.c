/* SPDX-License-Identifier: GPL-3.0-or-later
 * Contour, skin thickness, and the true offset by it. */
#include "outline/aerofoil_skin.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/spline.h"

static int segment_at(const utw_aerofoil *foil, double x)
{
    int k = 0;
    while (k < foil->n_skin && x > foil->skin[k][0] * foil->chord) k++;
    return k;
}

/* Thickness of the skin at x [L], and its slope. */
static double thickness(const utw_aerofoil *foil, int segment, double x, double *slope)
{
    const int k = segment == UTW_AEROFOIL_ANY ? segment_at(foil, x) : segment;
    const double(*skin)[2] = foil->skin;
    *slope = 0;
    if (k == 0) return skin[0][1];
    if (k == foil->n_skin) return skin[k - 1][1];
    *slope = (skin[k][1] - skin[k - 1][1]) / (skin[k][0] - skin[k - 1][0]) / foil->chord;
    return skin[k - 1][1] + *slope * (x - skin[k - 1][0] * foil->chord);
}

/* The piece that u is on, and the parameter on it; a little beyond the ends the last piece goes on.
 */
static const utw_curve *piece_at(const utw_aerofoil_skin *skin, double u, double *t)
{
    int k = (int)floor(u);
    k = k < 0 ? 0 : k >= skin->n ? skin->n - 1 : k;
    *t = u - k;
    return &skin->piece[k];
}

/* Point and three derivatives of the contour. */
static void contour(const utw_aerofoil_skin *skin, double u, double p[2], double d[3][2])
{
    double t;
    const utw_curve *c = piece_at(skin, u, &t);
    utw_curve_point(c, t, p);
    utw_curve_d1(c, t, d[0]);
    utw_curve_d2(c, t, d[1]);
    for (int k = 0; k < 2; k++)
        d[2][k] =
            c->kind == UTW_CUBIC ? 6 * (c->to[k] - 3 * c->c2[k] + 3 * c->c1[k] - c->from[k]) : 0;
}

void utw_aerofoil_outer(const void *context, double u, double p[2], double d1[2], double d2[2])
{
    double d[3][2];
    contour(context, u, p, d);
    memcpy(d1, d[0], sizeof d[0]);
    memcpy(d2, d[1], sizeof d[1]);
}

/* With v = |p'|, unit tangent e, left normal n, curvature k, thickness h(u):
 *   c = p + h n,  c' = v (1 - k h) e + h' n,
 *   c'' = [v' (1 - k h) - v (k' h + k h') - h' v k] e + [v^2 k (1 - k h) + h''] n
 * since e' = v k n, n' = -v k e (elementary). h'' = slope x''. */
void utw_aerofoil_inner(const void *context, double u, double p[2], double d1[2], double d2[2])
{
    const utw_aerofoil_offset *offset = context;
    double d[3][2], slope;
    contour(offset->skin, u, p, d);
    const double h = thickness(offset->skin->foil, offset->segment, p[0], &slope) + offset->extra;
    const double v = utw_norm(d[0]), e[2] = {d[0][0] / v, d[0][1] / v}, n[2] = {-e[1], e[0]};
    const double turn = utw_cross(d[0], d[1]), along = utw_dot(d[0], d[1]);
    const double k = turn / (v * v * v), dv = along / v;
    const double dk = (utw_cross(d[0], d[2]) * v * v - 3 * turn * along) / (v * v * v * v * v);
    const double dh = slope * d[0][0], ddh = slope * d[1][0], f = 1 - k * h;
    for (int i = 0; i < 2; i++) {
        p[i] += h * n[i];
        d1[i] = v * f * e[i] + dh * n[i];
        d2[i] = (dv * f - v * (dk * h + 2 * k * dh)) * e[i] + (v * v * k * f + ddh) * n[i];
    }
}

int utw_aerofoil_segment(const utw_aerofoil_skin *skin, double u)
{
    double p[2], d[3][2];
    contour(skin, u, p, d);
    return segment_at(skin->foil, p[0]);
}

double utw_aerofoil_stretch(const utw_aerofoil_offset *offset, double u)
{
    double p[2], d[3][2], slope;
    contour(offset->skin, u, p, d);
    const double v = utw_norm(d[0]);
    return 1 - utw_cross(d[0], d[1]) / (v * v * v) *
                   (thickness(offset->skin->foil, offset->segment, p[0], &slope) + offset->extra);
}

/* A root of x(u) - x between a and b, where it changes sign: Newton's iteration kept inside by
 * bisection. */
static double root(utw_fit_curve f, const void *context, double x, double a, double b)
{
    double p[2], d1[2], d2[2], u = 0.5 * (a + b);
    f(context, a, p, d1, d2);
    const int rising = p[0] < x;
    for (int i = 0; i < 80 && a != b; i++) {
        f(context, u, p, d1, d2);
        if (p[0] == x) return u;
        if ((p[0] < x) == rising)
            a = u;
        else
            b = u;
        const double next = u - (p[0] - x) / d1[0];
        const int inside = (next - a) * (next - b) < 0;
        const double step = fabs(next - u);
        u = inside ? next : 0.5 * (a + b);
        if (inside && step < 1e-14 * (1 + fabs(u))) return u;
    }
    return u;
}

/* Walks one branch from the trailing edge to the nose at the spline's points (and half way between,
 * where offsets bend more), to the first place where x is passed. */
static double branch_root(utw_fit_curve f, const void *context, const utw_aerofoil_skin *skin,
                          double nose, double x, int side, const utw_aerofoil_offset *valid)
{
    const double start = side == 0 ? 0 : skin->n, direction = side == 0 ? 0.5 : -0.5;
    double p[2], d1[2], d2[2], before = start;
    f(context, start, p, d1, d2);
    if (p[0] < x) return (double)NAN;
    for (int i = 1; before != nose; i++) {
        double u = start + i * direction;
        if ((u - nose) * direction > 0) u = nose;
        if (valid != NULL && !(utw_aerofoil_stretch(valid, u) > 0)) return (double)NAN;
        f(context, u, p, d1, d2);
        if (p[0] <= x) return root(f, context, x, before, u);
        before = u;
    }
    return (double)NAN;
}

double utw_aerofoil_outer_at(const utw_aerofoil_skin *skin, double x, int side)
{
    return branch_root(utw_aerofoil_outer, skin, skin, skin->nose, x, side, NULL);
}

double utw_aerofoil_inner_at(const utw_aerofoil_offset *offset, double x, int side)
{
    const utw_aerofoil_skin *skin = offset->skin;
    const double nose = offset->extra == 0 && skin->round_nose ? skin->inner_nose : skin->nose;
    return branch_root(utw_aerofoil_inner, offset, skin, nose, x, side, offset);
}

/* u of the least x near a point of the spline: where x' changes sign. */
static double least_x(utw_fit_curve f, const void *context, double a, double b)
{
    double p[2], d1[2], d2[2];
    for (int i = 0; i < 60; i++) {
        const double u = 0.5 * (a + b);
        f(context, u, p, d1, d2);
        if (d1[0] < 0)
            a = u;
        else
            b = u;
    }
    return 0.5 * (a + b);
}

/* Whether the inner side has no fold around the nose, and where its least x is. */
static void find_nose(utw_aerofoil_skin *skin)
{
    const utw_aerofoil_offset offset = {skin, 0, UTW_AEROFOIL_ANY};
    int k = 0;
    for (int i = 0; i < skin->n; i++)
        if (skin->piece[i].from[0] < skin->piece[k].from[0]) k = i;
    const double a = k > 0 ? k - 1 : 0, b = k + 1;
    skin->nose = least_x(utw_aerofoil_outer, skin, a, b);
    skin->round_nose = 1;
    double x = HUGE_VAL, at = skin->nose;
    for (int i = 0; i <= 8 * skin->n; i++) {
        const double u = i / 8.0;
        double p[2], d1[2], d2[2];
        utw_aerofoil_inner(&offset, u, p, d1, d2);
        if (!(utw_aerofoil_stretch(&offset, u) > 1e-3)) {
            double q[2];
            utw_aerofoil_outer(skin, u, q, d1, d2);
            if (q[0] < 0.5 * skin->foil->chord) skin->round_nose = 0;
        } else if (p[0] < x) {
            x = p[0];
            at = u;
        }
    }
    skin->inner_nose = least_x(utw_aerofoil_inner, &offset, at - 0.125, at + 0.125);
}

utw_status utw_aerofoil_skin_init(utw_aerofoil_skin *skin, const utw_aerofoil *foil, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    double(*xy)[2] = NULL;
    *skin = (utw_aerofoil_skin){.foil = foil, .n = foil->n - 1};
    UTW_TRY_ALLOC(xy = utw_alloc((size_t)foil->n, sizeof *xy));
    UTW_TRY_ALLOC(skin->piece = utw_alloc((size_t)skin->n, sizeof *skin->piece));
    for (int i = 0; i < foil->n; i++)
        for (int k = 0; k < 2; k++) xy[i][k] = foil->chord * foil->xy[i][k];
    skin->symmetric = 1;
    for (int i = 0; i < foil->n; i++) {
        const double *p = foil->xy[i], *q = foil->xy[foil->n - 1 - i];
        if (p[0] != q[0] || p[1] != -q[1]) skin->symmetric = 0;
    }
    UTW_TRY(utw_spline_natural(foil->n, (const double(*)[2])xy, skin->piece, err));
    find_nose(skin);
    st = UTW_OK;
done:
    utw_free(xy);
    if (st != UTW_OK) utw_aerofoil_skin_clear(skin);
    return st;
}

void utw_aerofoil_skin_clear(utw_aerofoil_skin *skin)
{
    utw_free(skin->piece);
    skin->piece = NULL;
}
