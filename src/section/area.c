/* SPDX-License-Identifier: GPL-3.0-or-later
 * Area, centroid, second and third moments, principal axes and moduli of a section. */
#include "section/area.h"

#include <float.h>

#include "base/gauss.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/net.h"
#include "section/boundary.h"
#include "section/plastic.h"

/* int x^p y^q dA for p + q <= 3, in the order below. */
enum { M1, MX, MY, MXX, MXY, MYY, MXXX, MXXY, MXYY, MYYY, MOMENTS };

/* Add the share of one curve. By Green's theorem and Euler's on homogeneous functions,
 *   int x^p y^q dA = 1/(p + q + 2) oint x^p y^q (x dy - y dx). */
static void add_curve(const utw_curve *c, double weight, utw_sum sum[MOMENTS])
{
    int pieces, points;
    double t[UTW_GAUSS_MAX], w[UTW_GAUSS_MAX], m[MOMENTS] = {0};
    utw_boundary_rule(c, 3, &pieces, &points);
    utw_gauss(points, t, w);
    for (int i = 0; i < pieces; i++)
        for (int q = 0; q < points; q++) {
            double p[2], d[2];
            utw_curve_point(c, (i + t[q]) / pieces, p);
            utw_curve_d1(c, (i + t[q]) / pieces, d);
            const double x = p[0], y = p[1], g = weight * w[q] / pieces * utw_cross(p, d);
            m[M1] += g / 2;
            m[MX] += g / 3 * x;
            m[MY] += g / 3 * y;
            m[MXX] += g / 4 * x * x;
            m[MXY] += g / 4 * x * y;
            m[MYY] += g / 4 * y * y;
            m[MXXX] += g / 5 * x * x * x;
            m[MXXY] += g / 5 * x * x * y;
            m[MXYY] += g / 5 * x * y * y;
            m[MYYY] += g / 5 * y * y * y;
        }
    for (int k = 0; k < MOMENTS; k++) utw_sum_add(&sum[k], m[k]);
}

static void moments(const utw_boundary *b, double m[MOMENTS])
{
    utw_sum sum[MOMENTS] = {{0, 0}};
    for (int i = 0; i < b->n; i++) add_curve(&b->curve[i], b->weight[i], sum);
    for (int k = 0; k < MOMENTS; k++) m[k] = utw_sum_value(&sum[k]);
}

/* Moments about the centroid from those about a point near it (parallel axes, all orders). */
static void shift_to_centroid(double m[MOMENTS])
{
    const double x = m[MX] / m[M1], y = m[MY] / m[M1], A = m[M1];
    m[MXXX] += -3 * x * m[MXX] + 2 * x * x * x * A;
    m[MYYY] += -3 * y * m[MYY] + 2 * y * y * y * A;
    m[MXXY] += -2 * x * m[MXY] - y * m[MXX] + 2 * x * x * y * A;
    m[MXYY] += -2 * y * m[MXY] - x * m[MYY] + 2 * x * y * y * A;
    m[MXX] -= x * x * A;
    m[MXY] -= x * y * A;
    m[MYY] -= y * y * A;
    m[MX] = m[MY] = 0;
}

/* int eta^2 dA about the axis through the origin at an angle, eta the distance from it. Taken
 * afresh, because the small principal moment of a slender section drowns in a difference of the
 * large ones. */
static double moment_about(const utw_boundary *b, double angle)
{
    const double c = cos(angle), s = sin(angle);
    utw_sum sum = {0, 0};
    for (int i = 0; i < b->n; i++) {
        int pieces, points;
        double t[UTW_GAUSS_MAX], w[UTW_GAUSS_MAX], m = 0;
        utw_boundary_rule(&b->curve[i], 2, &pieces, &points);
        utw_gauss(points, t, w);
        for (int j = 0; j < pieces; j++)
            for (int q = 0; q < points; q++) {
                double p[2], d[2];
                utw_curve_point(&b->curve[i], (j + t[q]) / pieces, p);
                utw_curve_d1(&b->curve[i], (j + t[q]) / pieces, d);
                const double eta = c * p[1] - s * p[0];
                m += w[q] / pieces * utw_cross(p, d) * eta * eta / 4;
            }
        utw_sum_add(&sum, b->weight[i] * m);
    }
    return utw_sum_value(&sum);
}

/* I(angle) = mean + half cos 2 angle - Ixy sin 2 angle is greatest at 2 angle = atan2(-Ixy, half).
 */
static void principal(const utw_boundary *b, double size, utw_area *a)
{
    const double mean = 0.5 * (a->Ixx + a->Iyy), half = 0.5 * (a->Ixx - a->Iyy);
    /* what the coordinates' own rounding can make of an exact zero */
    const double away = fabs(b->origin[0]) + fabs(b->origin[1]);
    const double zero = 32 * DBL_EPSILON * (4 + away / size) * mean;
    const double product = fabs(a->Ixy) <= zero ? 0 : a->Ixy;
    if (hypot(half, product) <= zero) {
        a->angle = 0;
        a->I1 = fmax(a->Ixx, a->Iyy);
        a->I2 = fmin(a->Ixx, a->Iyy);
        return;
    }
    a->angle = 0.5 * atan2(-product, half);
    if (product == 0) a->angle = half > 0 ? 0 : 0.5 * UTW_PI;
    if (a->angle <= -0.5 * UTW_PI) a->angle += UTW_PI;
    a->I1 = product == 0 ? fmax(a->Ixx, a->Iyy) : mean + hypot(half, product);
    a->I2 = product == 0 ? fmin(a->Ixx, a->Iyy) : moment_about(b, a->angle + 0.5 * UTW_PI);
}

/* Distances of the extreme fibres; returns the diagonal of the box. */
static double extremes(const utw_boundary *b, utw_area *a)
{
    double all[4] = {HUGE_VAL, HUGE_VAL, -HUGE_VAL, -HUGE_VAL};
    for (int i = 0; i < b->n; i++) {
        double box[4];
        utw_curve_box(&b->curve[i], box);
        for (int q = 0; q < 4; q++) all[q] = q < 2 ? fmin(all[q], box[q]) : fmax(all[q], box[q]);
    }
    a->left = -all[0];
    a->bottom = -all[1];
    a->right = all[2];
    a->top = all[3];
    return hypot(all[2] - all[0], all[3] - all[1]);
}

/* Length of all loops; what two parts share belongs to neither. */
static utw_status perimeter(const utw_outline *o, double *length, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_net *net = NULL;
    utw_sum sum = {0, 0};
    if (o->n_part == 1) {
        for (int l = 0; l < o->part[0].n_loop; l++)
            for (int k = 0; k < o->part[0].loop[l].n; k++)
                utw_sum_add(&sum, utw_curve_length(&o->part[0].loop[l].curve[k]));
    } else {
        UTW_TRY(utw_net_create(o, &net, err));
        for (int e = 0; e < net->n_edge; e++)
            if (net->edge[e].left < 0 || net->edge[e].right < 0)
                utw_sum_add(&sum, utw_curve_length(&net->edge[e].curve));
    }
    *length = utw_sum_value(&sum);
    st = UTW_OK;
done:
    utw_net_free(net);
    return st;
}

utw_status utw_area_compute(const utw_outline *outline, const double *weight, utw_area *area,
                            utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_boundary b = {.n = 0};
    utw_area a = {0};
    double m[MOMENTS];
    UTW_TRY(utw_boundary_init(&b, outline, weight, err));
    UTW_TRY(perimeter(outline, &a.perimeter, err));
    for (int pass = 0; pass < 2;
         pass++) { /* about the middle of the box, then about the centroid */
        moments(&b, m);
        if (!(m[M1] > 0)) {
            st = utw_fail(err, UTW_E_ARGUMENT,
                          "the area is %g; outlines must run counter-clockwise, holes clockwise",
                          m[M1]);
            goto done;
        }
        const double d[2] = {m[MX] / m[M1], m[MY] / m[M1]};
        if (pass == 0) utw_boundary_move(&b, d);
        if (pass == 1) { /* what rounding has left */
            a.xc = b.origin[0] + d[0];
            a.yc = b.origin[1] + d[1];
        }
    }
    shift_to_centroid(m);
    a.A = m[M1];
    a.Ixx = m[MYY], a.Iyy = m[MXX], a.Ixy = m[MXY];
    a.Ixxx = m[MXXX], a.Ixxy = m[MXXY], a.Ixyy = m[MXYY], a.Iyyy = m[MYYY];
    a.rx = sqrt(a.Ixx / a.A);
    a.ry = sqrt(a.Iyy / a.A);
    const double size = extremes(&b, &a);
    principal(&b, size, &a);
    a.Wx_top = a.Ixx / a.top, a.Wx_bottom = a.Ixx / a.bottom;
    a.Wy_left = a.Iyy / a.left, a.Wy_right = a.Iyy / a.right;
    UTW_TRY(utw_plastic_axis(&b, 1, &a.yp, &a.Zx, err));
    UTW_TRY(utw_plastic_axis(&b, 0, &a.xp, &a.Zy, err));
    a.xp += b.origin[0];
    a.yp += b.origin[1];
    *area = a;
    st = UTW_OK;
done:
    utw_boundary_clear(&b);
    return st;
}
