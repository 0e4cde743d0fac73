/* SPDX-License-Identifier: GPL-3.0-or-later
 * Lines and arcs of least squares through stations. */
#include "thinwall/regress.h"

#include "base/vec2.h"

#define ONCE     1e-9 /* rounding of a full turn, in half turns */
#define THINNEST 1e-3 /* of the mean: a thickness that regression may not go below */

/* ---- lines and arcs continued ---- */

static void arc_centre(const utw_path *path, double c[2])
{
    c[0] = path->p[0] - path->e[1] / path->kappa;
    c[1] = path->p[1] + path->e[0] / path->kappa;
}

double utw_path_foot(const utw_path *path, const double point[2], double near)
{
    const double d[2] = {point[0] - path->p[0], point[1] - path->p[1]};
    if (path->kappa == 0) return utw_dot(d, path->e);
    double c[2];
    arc_centre(path, c);
    const double from[2] = {path->p[0] - c[0], path->p[1] - c[1]},
                 to[2] = {point[0] - c[0], point[1] - c[1]};
    const double angle = atan2(utw_cross(from, to), utw_dot(from, to));
    const double s = angle / path->kappa, turn = 2 * UTW_PI / fabs(path->kappa);
    return s + turn * round((near - s) / turn);
}

double utw_path_offset(const utw_path *path, const double point[2])
{
    const double d[2] = {point[0] - path->p[0], point[1] - path->p[1]};
    const double across = utw_cross(path->e, d);
    if (path->kappa == 0) return across;
    /* the radius less the distance from the centre, without the difference of two large numbers */
    double c[2];
    arc_centre(path, c);
    const double r = 1 / fabs(path->kappa), away = utw_distance(point, c);
    const double inward =
        (2 * across * path->kappa - utw_dot(d, d) * path->kappa * path->kappa) * r * r / (r + away);
    return path->kappa > 0 ? inward : -inward;
}

/* ---- thickness ---- */

/* Regression of the thickness on the stations s[i] = foot + shift, and both errors. */
typedef struct regression {
    double n, s, t, ss, st;
} regression;

static void add(regression *r, double s, double t)
{
    r->n++;
    r->s += s;
    r->t += t;
    r->ss += s * s;
    r->st += s * t;
}

/* Thickness, ends and errors of a path whose line or circle is known. s = 0 is the path's start. */
static int finish(const utw_station *station, int n, utw_wall_fit *fit)
{
    utw_path *path = &fit->path;
    regression r = {0, 0, 0, 0, 0};
    double least = UTW_INFINITY, most = -UTW_INFINITY, s = 0;
    for (int i = 0; i < n; i++) {
        s = utw_path_foot(path, station[i].x, s);
        add(&r, s, station[i].t);
        least = fmin(least, s);
        most = fmax(most, s);
    }
    if (!(most > least)) return 0;
    fit->mean = r.t / r.n;
    const double var = r.ss - r.s * r.s / r.n, slope = (r.st - r.s * r.t / r.n) / var,
                 at_zero = fit->mean - slope * r.s / r.n;
    fit->off = fit->rough = 0;
    s = 0;
    for (int i = 0; i < n; i++) {
        s = utw_path_foot(path, station[i].x, s);
        fit->off = fmax(fit->off, fabs(utw_path_offset(path, station[i].x)));
        fit->rough = fmax(fit->rough, fabs(station[i].t - at_zero - slope * s));
    }
    utw_path_point start;
    path->t0 = path->t1 = 1;
    path->length = most - least;
    utw_path_at(path, least, &start);
    for (int k = 0; k < 2; k++) {
        path->p[k] = start.x[k];
        path->e[k] = start.e[k];
    }
    path->t0 = fmax(at_zero + slope * least, THINNEST * fit->mean);
    path->t1 = fmax(at_zero + slope * most, THINNEST * fit->mean);
    return 1;
}

static void mean_point(const utw_station *station, int n, double m[2])
{
    m[0] = m[1] = 0;
    for (int i = 0; i < n; i++)
        for (int k = 0; k < 2; k++) m[k] += station[i].x[k] / n;
}

int utw_regress_line(const utw_station *station, int n, utw_wall_fit *fit)
{
    double m[2], xx = 0, xy = 0, yy = 0;
    mean_point(station, n, m);
    for (int i = 0; i < n; i++) {
        const double u = station[i].x[0] - m[0], v = station[i].x[1] - m[1];
        xx += u * u;
        xy += u * v;
        yy += v * v;
    }
    if (!(xx + yy > 0)) return 0;
    const double angle = 0.5 * atan2(2 * xy, xx - yy);
    double e[2] = {cos(angle), sin(angle)};
    const double way[2] = {station[n - 1].x[0] - station[0].x[0],
                           station[n - 1].x[1] - station[0].x[1]};
    if (utw_dot(way, e) < 0) {
        e[0] = -e[0];
        e[1] = -e[1];
    }
    fit->path = (utw_path){.p = {m[0], m[1]}, .e = {e[0], e[1]}, .length = 1, .t0 = 1, .t1 = 1};
    return finish(station, n, fit);
}

/* Taubin's circle about the mean point m: its centre less m. 0 when the points are on a line. */
static int taubin(const utw_station *station, int n, const double m[2], double c[2])
{
    double xx = 0, xy = 0, yy = 0, xz = 0, yz = 0, zz = 0, scale = 0;
    for (int i = 0; i < n; i++) scale = fmax(scale, utw_distance(station[i].x, m));
    if (!(scale > 0)) return 0;
    for (int i = 0; i < n; i++) {
        const double u = (station[i].x[0] - m[0]) / scale, v = (station[i].x[1] - m[1]) / scale,
                     z = u * u + v * v;
        xx += u * u / n;
        xy += u * v / n;
        yy += v * v / n;
        xz += u * z / n;
        yz += v * z / n;
        zz += z * z / n;
    }
    const double mz = xx + yy, cov = xx * yy - xy * xy, var = zz - mz * mz;
    const double a3 = 4 * mz, a2 = -3 * mz * mz - zz,
                 a1 = var * mz + 4 * cov * mz - xz * xz - yz * yz,
                 a0 = xz * (xz * yy - yz * xy) + yz * (yz * xx - xz * xy) - var * cov;
    double x = 0, y = HUGE_VAL;
    for (int i = 0; i < 30; i++) {
        const double value = a0 + x * (a1 + x * (a2 + x * a3));
        if (fabs(value) >= fabs(y)) break;
        y = value;
        const double slope = a1 + x * (2 * a2 + 3 * a3 * x), next = x - value / slope;
        if (!isfinite(next) || next < 0 || next == x) break;
        x = next;
    }
    const double det = 2 * (x * x - x * mz + cov);
    if (!(fabs(det) > 1e-14)) return 0;
    c[0] = scale * (xz * (yy - x) - yz * xy) / det;
    c[1] = scale * (yz * (xx - x) - xz * xy) / det;
    return isfinite(c[0]) && isfinite(c[1]);
}

int utw_regress_arc(const utw_station *station, int n, utw_wall_fit *fit)
{
    double m[2], c[2], r = 0;
    mean_point(station, n, m);
    if (n < 3 || !taubin(station, n, m, c)) return 0;
    for (int k = 0; k < 2; k++) c[k] += m[k];
    for (int i = 0; i < n; i++) r += utw_distance(station[i].x, c) / n;
    /* counter-clockwise or not: as most of the steps from station to station are */
    double turned = 0, total = 0;
    for (int i = 1; i < n; i++) {
        const double u[2] = {station[i - 1].x[0] - c[0], station[i - 1].x[1] - c[1]},
                     v[2] = {station[i].x[0] - c[0], station[i].x[1] - c[1]};
        const double a = atan2(utw_cross(u, v), utw_dot(u, v));
        turned += a;
        total += fabs(a);
    }
    if (!(total > 0) || fabs(turned) > (2 + ONCE) * UTW_PI) return 0;
    const double sign = turned > 0 ? 1 : -1;
    const double u[2] = {station[0].x[0] - c[0], station[0].x[1] - c[1]}, length = utw_norm(u);
    if (!(length > 0)) return 0;
    fit->path = (utw_path){.p = {c[0] + r * u[0] / length, c[1] + r * u[1] / length},
                           .e = {-sign * u[1] / length, sign * u[0] / length},
                           .length = 1,
                           .kappa = sign / r,
                           .t0 = 1,
                           .t1 = 1};
    return finish(station, n, fit);
}
