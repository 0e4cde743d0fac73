/* SPDX-License-Identifier: GPL-3.0-or-later
 * Blending a triangle onto the exact curves of its sides. */
#include "mesh/blend.h"

#include "base/vec2.h"

static double turning(const utw_blend *b, int k)
{
    double d0[2], d1[2];
    utw_curve_d1(b->curve[k], b->t0[k], d0);
    utw_curve_d1(b->curve[k], b->t1[k], d1);
    return fabs(atan2(utw_cross(d0, d1), utw_dot(d0, d1)));
}

void utw_blend_of(const utw_mesh *mesh, const utw_triangle *tri, utw_blend *b)
{
    b->any = 0;
    b->turning = 0;
    for (int k = 0; k < 3; k++) {
        b->x[k][0] = mesh->xy[tri->node[k]][0];
        b->x[k][1] = mesh->xy[tri->node[k]][1];
        b->curved[k] = utw_mesh_is_curved(mesh, tri, k);
        b->curve[k] = b->curved[k] ? &mesh->net->edge[tri->curve[k]].curve : NULL;
        b->t0[k] = tri->t[k][0];
        b->t1[k] = tri->t[k][1];
        b->any |= b->curved[k];
        if (b->curved[k]) b->turning = fmax(b->turning, turning(b, k));
    }
}

/* The bump B(u) = (c(u) - chord(u)) / (u (1-u)) of side k and its derivative. Near the ends, where
 * both vanish, the first two terms of its expansion. */
static void bump(const utw_blend *b, int k, double u, double B[2], double dB[2])
{
    const utw_curve *c = b->curve[k];
    const double span = b->t1[k] - b->t0[k], t = b->t0[k] + u * span, v = 1 - u;
    const double *from = b->x[k], *to = b->x[(k + 1) % 3];
    double p[2], d1[2], d2[2];
    utw_curve_d1(c, t, d1);
    const int at_start = u < 1e-5, at_end = v < 1e-5;
    if (!at_start && !at_end) {
        utw_curve_point(c, t, p);
        for (int i = 0; i < 2; i++) {
            const double f = p[i] - v * from[i] - u * to[i], df = span * d1[i] - (to[i] - from[i]);
            B[i] = f / (u * v);
            dB[i] = (df - B[i] * (v - u)) / (u * v);
        }
        return;
    }
    utw_curve_d1(c, at_start ? b->t0[k] : b->t1[k], d1);
    utw_curve_d2(c, at_start ? b->t0[k] : b->t1[k], d2);
    for (int i = 0; i < 2;
         i++) { /* f = f' e + f'' e^2/2 at distance e from the end, 1/(u v) = (1 + e)/e */
        const double f1 = (span * d1[i] - (to[i] - from[i])) * (at_start ? 1 : -1),
                     f2 = span * span * d2[i];
        const double e = at_start ? u : v, slope = f1 + f2 / 2;
        B[i] = f1 + e * slope;
        dB[i] = at_start ? slope : -slope;
    }
}

void utw_blend_at(const utw_blend *b, double r, double s, double xy[2], double jac[4])
{
    static const double lr[3] = {-1, 1, 0}, ls[3] = {-1, 0, 1};
    const double l[3] = {1 - r - s, r, s};
    for (int i = 0; i < 2; i++) {
        xy[i] = l[0] * b->x[0][i] + r * b->x[1][i] + s * b->x[2][i];
        jac[2 * i] = b->x[1][i] - b->x[0][i];
        jac[2 * i + 1] = b->x[2][i] - b->x[0][i];
    }
    if (!b->any) return;
    for (int k = 0; k < 3; k++) {
        if (!b->curved[k]) continue;
        const int a = k, e = (k + 1) % 3;
        const double u = 0.5 * (1 + l[e] - l[a]), product = l[a] * l[e];
        const double ur = 0.5 * (lr[e] - lr[a]), us = 0.5 * (ls[e] - ls[a]);
        const double pr = lr[a] * l[e] + l[a] * lr[e], ps = ls[a] * l[e] + l[a] * ls[e];
        double B[2], dB[2];
        bump(b, k, u, B, dB);
        for (int i = 0; i < 2; i++) {
            xy[i] += product * B[i];
            jac[2 * i] += pr * B[i] + product * dB[i] * ur;
            jac[2 * i + 1] += ps * B[i] + product * dB[i] * us;
        }
    }
}

double utw_blend_quality(const utw_blend *b)
{
    if (!b->any) return 1;
    enum { N = 8 };
    const double straight = utw_turn(b->x[0], b->x[1], b->x[2]);
    double worst = UTW_INFINITY, xy[2], J[4];
    for (int i = 0; i <= N; i++)
        for (int j = 0; i + j <= N; j++) {
            utw_blend_at(b, (double)i / N, (double)j / N, xy, J);
            worst = fmin(worst, J[0] * J[3] - J[1] * J[2]);
        }
    return worst / straight;
}
