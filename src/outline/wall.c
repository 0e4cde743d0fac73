/* SPDX-License-Identifier: GPL-3.0-or-later
 * Geometry of one wall and its running integrals. */
#include "outline/wall.h"

#include "base/gauss.h"
#include "base/vec2.h"

/* v turned counter-clockwise by the angle a. */
static void turn(const double v[2], double a, double out[2])
{
    const double c = cos(a), s = sin(a);
    out[0] = c * v[0] - s * v[1];
    out[1] = s * v[0] + c * v[1];
}

/* sin(x)/x */
static double sinc(double x)
{
    return fabs(x) < 1e-8 ? 1.0 : sin(x) / x;
}

utw_path utw_path_line(const double from[2], const double to[2], double t0, double t1)
{
    utw_path w = {.p = {from[0], from[1]}, .length = utw_distance(from, to), .t0 = t0, .t1 = t1};
    for (int k = 0; k < 2; k++) w.e[k] = (to[k] - from[k]) / w.length;
    return w;
}

/* Total turning of the arc a-m-b. The path a-m-b of two chords turns at m by half the arc's angle,
 * because an inscribed angle is half the central one (Euclid, Elements, III.20). */
static double arc_turning(const double a[2], const double m[2], const double b[2])
{
    const double u[2] = {m[0] - a[0], m[1] - a[1]}, v[2] = {b[0] - m[0], b[1] - m[1]};
    return 2 * atan2(utw_cross(u, v), utw_dot(u, v));
}

/* The mid-point of the arc of turning theta: off the chord's middle by half the chord times
 * tan(theta/4), to the right of a-b when the arc turns counter-clockwise. */
static void arc_middle(const double a[2], const double b[2], double theta, double m[2])
{
    const double h = tan(theta / 4) / 2;
    m[0] = (a[0] + b[0]) / 2 + h * (b[1] - a[1]);
    m[1] = (a[1] + b[1]) / 2 - h * (b[0] - a[0]);
}

utw_arc_fault utw_path_arc(const double from[2], const double mid[2], const double to[2], double t0,
                           double t1, utw_path *path)
{
    const double chord = utw_distance(from, to);
    double m[2] = {mid[0], mid[1]};
    const double ma = utw_distance(from, m), mb = utw_distance(m, to);
    const double least = 1e-12 * fmax(chord, fmax(ma, mb));
    if (!(ma > least && mb > least)) return UTW_ARC_AT_END;
    double theta;
    if (chord <= least) {
        theta = 2 * UTW_PI;
    } else {
        theta = arc_turning(from, m, to);
        /* a radius 1e6 times what is drawn, on the far side: in line to the rounding of a drawing
         */
        if (fabs(theta) > UTW_PI && chord > 2e6 * fmax(ma, mb) * fabs(sin(theta / 2)))
            return UTW_ARC_BEYOND;
        if (fabs(ma - mb) > 1e-9 * fmax(ma, mb)) arc_middle(from, to, theta, m);
    }
    /* From the start to the mid-point the arc turns by theta/2; the chord between them has length h
     * and leaves the start at theta/4 from the tangent. Half the arc is h (theta/4) / sin(theta/4)
     * long. */
    const double h = utw_distance(from, m), quarter = theta / 4;
    utw_path w = {.p = {from[0], from[1]}, .t0 = t0, .t1 = t1};
    const double u[2] = {(m[0] - from[0]) / h, (m[1] - from[1]) / h};
    turn(u, -quarter, w.e);
    w.length = 2 * h / sinc(quarter);
    w.kappa = theta / w.length;
    *path = w;
    return UTW_ARC_GOOD;
}

/* A sum of positive terms: the thin end of a strong taper keeps its digits. */
static double thickness(const utw_path *w, double s)
{
    const double u = s / w->length;
    return w->t0 * (1 - u) + w->t1 * u;
}

void utw_path_at(const utw_path *w, double s, utw_path_point *point)
{
    point->t = thickness(w, s);
    if (w->kappa == 0) {
        for (int k = 0; k < 2; k++) {
            point->e[k] = w->e[k];
            point->x[k] = w->p[k] + s * w->e[k];
        }
        return;
    }
    /* the chord to s leaves at half the turning and is s sin(a)/a long, a = kappa s / 2 */
    const double a = w->kappa * s / 2, c = s * sinc(a);
    double u[2];
    turn(w->e, a, u);
    turn(w->e, 2 * a, point->e);
    for (int k = 0; k < 2; k++) point->x[k] = w->p[k] + c * u[k];
}

/* int_0^s ds/t = s/t0 log(1 + z)/z with z = (t(s) - t0)/t0: exact for any taper, the constant wall
 * included. */
double utw_path_shear_length(const utw_path *w, double s)
{
    const double z = (w->t1 - w->t0) / w->t0 * (s / w->length);
    if (fabs(z) < 1e-17) return s / w->t0;
    return s / w->t0 * (fabs(z) < 0.5 ? log1p(z) : log(thickness(w, s) / w->t0)) / z;
}

double utw_path_sector(const utw_path *w, double s)
{
    utw_path_point at;
    utw_path_at(w, s, &at);
    const double d[2] = {at.x[0] - w->p[0], at.x[1] - w->p[1]}, theta = w->kappa * s;
    /* about its own start an arc sweeps s^2 (theta - sin theta)/theta^2; a line sweeps nothing */
    double own = 0;
    if (fabs(theta) > 0.5) {
        own = s * s * (theta - sin(theta)) / (theta * theta);
    } else {
        const double q =
            theta * theta; /* theta/3! - theta^3/5! + ...: the next term is below 1e-19 */
        own =
            s * s * theta *
            (1.0 / 6 -
             q * (1.0 / 120 -
                  q * (1.0 / 5040 - q * (1.0 / 362880 - q * (1.0 / 39916800 - q / 6227020800.0)))));
    }
    return utw_cross(w->p, d) + own;
}

/* int_0^s x t ds by Simpson's rule, exact for a line: the integrand has degree 2. */
static void line_moment(const utw_path *w, double s, double moment[2])
{
    utw_path_point a, m, b;
    utw_path_at(w, 0, &a);
    utw_path_at(w, s / 2, &m);
    utw_path_at(w, s, &b);
    for (int k = 0; k < 2; k++)
        moment[k] = s / 6 * (a.x[k] * a.t + 4 * m.x[k] * m.t + b.x[k] * b.t);
}

static void arc_moment(const utw_path *w, const utw_path_rule *rule, double s, double moment[2])
{
    const int pieces = 1 + (int)(fabs(w->kappa) * s / (UTW_PI / 2));
    moment[0] = moment[1] = 0;
    for (int i = 0; i < pieces; i++) {
        for (int g = 0; g < UTW_PATH_GAUSS; g++) {
            utw_path_point at;
            utw_path_at(w, s * (i + rule->x[g]) / pieces, &at);
            for (int k = 0; k < 2; k++) moment[k] += at.x[k] * at.t * (s / pieces) * rule->w[g];
        }
    }
}

void utw_path_run_to(const utw_path *w, const utw_path_rule *rule, double s, utw_path_run *run)
{
    if (w->kappa == 0)
        line_moment(w, s, run->moment);
    else
        arc_moment(w, rule, s, run->moment);
    run->area = s * (w->t0 + thickness(w, s)) / 2;
    run->sector = utw_path_sector(w, s);
    run->f = utw_path_shear_length(w, s);
}

void utw_path_to_frame(utw_path *w, const double origin[2], double c, double s)
{
    const double p[2] = {w->p[0] - origin[0], w->p[1] - origin[1]}, e[2] = {w->e[0], w->e[1]};
    w->p[0] = c * p[0] + s * p[1];
    w->p[1] = c * p[1] - s * p[0];
    w->e[0] = c * e[0] + s * e[1];
    w->e[1] = c * e[1] - s * e[0];
}

double utw_path_nearest(const utw_path *w, const double point[2], double *s)
{
    const double v[2] = {point[0] - w->p[0], point[1] - w->p[1]};
    double at = utw_dot(v, w->e);
    if (fabs(w->kappa) * w->length > 1e-7) {
        /* angle from the start about the centre p + n/kappa, turned so that it grows along the wall
         * and the gap of the circle opposite the arc's middle is where it jumps */
        const double n[2] = {-w->e[1], w->e[0]};
        const double r[2] = {v[0] - n[0] / w->kappa, v[1] - n[1] / w->kappa};
        const double sign = w->kappa > 0 ? 1.0 : -1.0, half = w->kappa * w->length / 2;
        const double r0[2] = {-sign * n[0], -sign * n[1]};
        double middle[2];
        turn(r0, half, middle);
        at = w->length / 2 + atan2(utw_cross(middle, r), utw_dot(middle, r)) / w->kappa;
    }
    *s = fmin(fmax(at, 0.0), w->length);
    utw_path_point here;
    utw_path_at(w, *s, &here);
    return utw_distance(here.x, point);
}

void utw_path_rule_init(utw_path_rule *rule)
{
    utw_gauss(UTW_PATH_GAUSS, rule->x, rule->w);
}

/* Parts by thickness (geometric) and, of each of them, by turning. */
static void piece_counts(const utw_path *w, int *taper, int *bend)
{
    const double ratio = fabs(log2(w->t1 / w->t0));
    *taper = ratio > 1 ? (int)ceil(ratio) : 1;
    const double turning = fabs(w->kappa) * w->length;
    *bend = turning > UTW_PI / 2 ? (int)ceil(turning / (UTW_PI / 2) * (1 - 1e-12)) : 1;
}

int utw_path_pieces(const utw_path *w)
{
    int taper, bend;
    piece_counts(w, &taper, &bend);
    return taper * bend;
}

/* s where the k-th of `taper` geometric parts of the thickness begins. */
static double taper_start(const utw_path *w, int k, int taper)
{
    if (k == 0) return 0;
    if (k == taper) return w->length;
    const double t = w->t0 * pow(w->t1 / w->t0, (double)k / taper);
    return w->length * (t - w->t0) / (w->t1 - w->t0);
}

void utw_path_piece(const utw_path *w, int i, double range[2])
{
    int taper, bend;
    piece_counts(w, &taper, &bend);
    const int k = i / bend, j = i % bend;
    const double a = taper_start(w, k, taper), b = taper_start(w, k + 1, taper);
    range[0] = a + (b - a) * j / bend;
    range[1] = j + 1 == bend ? b : a + (b - a) * (j + 1) / bend;
}
