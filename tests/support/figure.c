/* SPDX-License-Identifier: GPL-3.0-or-later
 * Moments of figures. */
#include "support/figure.h"

#include "base/gauss.h"
#include "base/vec2.h"
#include "support/support.h"

enum { POINTS = 24, PIECES = 8 };

/* Green: int dA = int x dy, int x dA = int x^2/2 dy, int y dA = -int y^2/2 dx, x^3/3 dy, -y^3/3 dx,
 * x^2 y/2 dy. */
static void add_curve(figure *f, const utw_curve *curve)
{
    double t[POINTS], w[POINTS];
    utw_gauss(POINTS, t, w);
    for (int i = 0; i < PIECES; i++)
        for (int q = 0; q < POINTS; q++) {
            double p[2], d[2];
            const double s = (i + t[q]) / PIECES;
            utw_curve_point(curve, s, p);
            utw_curve_d1(curve, s, d);
            const double x = p[0], y = p[1], dx = d[0] * w[q] / PIECES, dy = d[1] * w[q] / PIECES;
            f->A += x * dy;
            f->x += x * x / 2 * dy;
            f->y -= y * y / 2 * dx;
            f->xx += x * x * x / 3 * dy;
            f->yy -= y * y * y / 3 * dx;
            f->xy += x * x * y / 2 * dy;
        }
}

figure figure_of_part(const utw_part *part)
{
    figure f = {0};
    for (int i = 0; i < part->n_loop; i++)
        for (int k = 0; k < part->loop[i].n; k++) add_curve(&f, &part->loop[i].curve[k]);
    return f;
}

figure figure_of_outline(const utw_outline *outline)
{
    figure sum = {0};
    for (int i = 0; i < outline->n_part; i++) {
        const figure f = figure_of_part(&outline->part[i]);
        sum.A += f.A, sum.x += f.x, sum.y += f.y, sum.xx += f.xx, sum.yy += f.yy, sum.xy += f.xy;
    }
    return sum;
}

/* Add a figure given about its own point (xc, yc). */
static void add_about(figure *f, double sign, figure own, double xc, double yc)
{
    f->A += sign * own.A;
    f->x += sign * (own.x + xc * own.A);
    f->y += sign * (own.y + yc * own.A);
    f->xx += sign * (own.xx + 2 * xc * own.x + xc * xc * own.A);
    f->yy += sign * (own.yy + 2 * yc * own.y + yc * yc * own.A);
    f->xy += sign * (own.xy + xc * own.y + yc * own.x + xc * yc * own.A);
}

void figure_rectangle(figure *f, double sign, double x0, double y0, double x1, double y1)
{
    const double b = x1 - x0, h = y1 - y0;
    const figure own = {.A = b * h, .xx = h * b * b * b / 12, .yy = b * h * h * h / 12};
    add_about(f, sign, own, (x0 + x1) / 2, (y0 + y1) / 2);
}

/* Triangle at the origin with sides p, q: int x^2 = cross/12 (px^2 + px qx + qx^2) ... */
void figure_polygon(figure *f, double sign, int n, const double (*v)[2])
{
    for (int i = 1; i + 1 < n; i++) {
        const double p[2] = {v[i][0] - v[0][0], v[i][1] - v[0][1]},
                     q[2] = {v[i + 1][0] - v[0][0], v[i + 1][1] - v[0][1]};
        const double c = utw_cross(p, q);
        const figure own = {
            .A = c / 2,
            .x = c / 6 * (p[0] + q[0]),
            .y = c / 6 * (p[1] + q[1]),
            .xx = c / 12 * (p[0] * p[0] + p[0] * q[0] + q[0] * q[0]),
            .yy = c / 12 * (p[1] * p[1] + p[1] * q[1] + q[1] * q[1]),
            .xy = c / 24 * (2 * p[0] * p[1] + p[0] * q[1] + q[0] * p[1] + 2 * q[0] * q[1]),
        };
        add_about(f, sign, own, v[0][0], v[0][1]);
    }
}

void figure_sector(figure *f, double sign, double xc, double yc, double r, double a0, double a1)
{
    const double r3 = r * r * r / 3, r4 = r * r * r * r / 4, s = (sin(2 * a1) - sin(2 * a0)) / 4;
    const figure own = {
        .A = r * r * (a1 - a0) / 2,
        .x = r3 * (sin(a1) - sin(a0)),
        .y = r3 * (cos(a0) - cos(a1)),
        .xx = r4 * ((a1 - a0) / 2 + s),
        .yy = r4 * ((a1 - a0) / 2 - s),
        .xy = r4 * (sin(a1) * sin(a1) - sin(a0) * sin(a0)) / 2,
    };
    add_about(f, sign, own, xc, yc);
}

void figure_ellipse(figure *f, double sign, double xc, double yc, double a, double b)
{
    const double area = UTW_PI * a * b;
    const figure own = {.A = area, .xx = area * a * a / 4, .yy = area * b * b / 4};
    add_about(f, sign, own, xc, yc);
}

void figure_spandrel(figure *f, double sign, const double p[2], const double d[2],
                     const double e[2], double r)
{
    const double inside = acos(utw_dot(d, e)), cut = r / tan(inside / 2),
                 away = r / sin(inside / 2);
    const double m[2] = {d[0] + e[0], d[1] + e[1]}, length = utw_norm(m);
    const double centre[2] = {p[0] + away * m[0] / length, p[1] + away * m[1] / length};
    double kite[4][2] = {{p[0], p[1]},
                         {p[0] + cut * d[0], p[1] + cut * d[1]},
                         {centre[0], centre[1]},
                         {p[0] + cut * e[0], p[1] + cut * e[1]}};
    /* the sector looks back at the corner, half its angle to either side */
    const double back = atan2(-m[1], -m[0]), half = (UTW_PI - inside) / 2;
    const double turn = utw_cross(d, e) > 0 ? 1 : -1;
    figure_polygon(f, sign * turn, 4, (const double(*)[2])kite);
    figure_sector(f, -sign, centre[0], centre[1], r, back - half, back + half);
}

void figure_right_spandrel(figure *f, double sign, double x, double y, double sx, double sy,
                           double r)
{
    const double p[2] = {x, y}, d[2] = {sx, 0}, e[2] = {0, sy};
    figure_spandrel(f, sign, p, d, e, r);
}

/* Second moments about the centroid of the expected figure. */
static void central(const figure *f, double xc, double yc, double *ixx, double *iyy, double *ixy)
{
    *iyy = f->xx - 2 * xc * f->x + xc * xc * f->A;
    *ixx = f->yy - 2 * yc * f->y + yc * yc * f->A;
    *ixy = f->xy - xc * f->y - yc * f->x + xc * yc * f->A;
}

void figure_compare(figure a, figure e, double rtol, const char *file, int line)
{
    const double xc = e.x / e.A, yc = e.y / e.A;
    double ai[3], ei[3];
    central(&a, xc, yc, &ai[0], &ai[1], &ai[2]);
    central(&e, xc, yc, &ei[0], &ei[1], &ei[2]);
    /* sums about the origin round in proportion to what they are made of */
    const double size = sqrt((e.xx + e.yy) / e.A), scale = e.A * size * size;
    utw_assert_close(a.A, e.A, rtol, 0, "area", file, line);
    utw_assert_close(a.x, e.x, rtol, e.A * size, "int x dA", file, line);
    utw_assert_close(a.y, e.y, rtol, e.A * size, "int y dA", file, line);
    utw_assert_close(ai[0], ei[0], rtol, scale, "Ixx", file, line);
    utw_assert_close(ai[1], ei[1], rtol, scale, "Iyy", file, line);
    utw_assert_close(ai[2], ei[2], rtol, scale, "Ixy", file, line);
}
