/* SPDX-License-Identifier: GPL-3.0-or-later
 * Sides of walls: offset lines and arcs. */
#include "outline/side.h"

#include "base/memory.h"
#include "base/vec2.h"

/* p = x + (side t/2) n with n the left normal: since x' = e, e' = kappa n, n' = -kappa e and t'' =
 * 0, p' = (1 - side kappa t/2) e + side t'/2 n,  p'' = kappa (1 - side kappa t/2) n - side kappa t'
 * e. */
void utw_side_point(const void *context, double s, double p[2], double d1[2], double d2[2])
{
    const utw_side *a = context;
    const utw_path *w = a->path;
    utw_path_point at;
    utw_path_at(w, s, &at);
    const double n[2] = {-at.e[1], at.e[0]}, slope = a->side * (w->t1 - w->t0) / w->length;
    const double off = a->side * at.t / 2, along = 1 - w->kappa * off;
    for (int k = 0; k < 2; k++) {
        p[k] = at.x[k] + off * n[k];
        d1[k] = along * at.e[k] + slope / 2 * n[k];
        d2[k] = w->kappa * (along * n[k] - slope * at.e[k]);
    }
}

int utw_side_cross(const utw_side *a, const utw_side *b, double reach, double s[2], double p[2])
{
    const double start[2] = {s[0], s[1]};
    double last = HUGE_VAL;
    for (int i = 0; i < 40; i++) {
        double q[2], da[2], db[2], d2[2];
        utw_side_point(a, s[0], p, da, d2);
        utw_side_point(b, s[1], q, db, d2);
        const double r[2] = {q[0] - p[0], q[1] - p[1]}, det = utw_cross(da, db);
        if (!(fabs(det) > 1e-12 * utw_norm(da) * utw_norm(db))) return 0;
        const double x0 = utw_cross(r, db) / det, x1 = utw_cross(r, da) / det;
        s[0] += x0;
        s[1] += x1;
        if (!(fabs(s[0] - start[0]) <= 2 * reach && fabs(s[1] - start[1]) <= 2 * reach)) return 0;
        const double move = fabs(x0) + fabs(x1);
        if (move <= 1e-15 * reach || (move < 1e-10 * reach && move >= 0.5 * last)) {
            utw_side_point(a, s[0], p, da, d2);
            return 1;
        }
        last = move;
    }
    return 0;
}

int utw_side_cross_line(const utw_side *a, const double o[2], const double v[2], double reach,
                        double *s, double p[2])
{
    const double start = *s;
    double last = HUGE_VAL;
    for (int i = 0; i < 40; i++) {
        double d[2], d2[2];
        utw_side_point(a, *s, p, d, d2);
        const double r[2] = {o[0] - p[0], o[1] - p[1]}, det = utw_cross(d, v);
        if (!(fabs(det) > 1e-12 * utw_norm(d))) return 0;
        const double x = utw_cross(r, v) / det, move = fabs(x);
        *s += x;
        if (!(fabs(*s - start) <= 2 * reach)) return 0;
        if (move <= 1e-15 * reach || (move < 1e-10 * reach && move >= 0.5 * last)) {
            utw_side_point(a, *s, p, d, d2);
            return 1;
        }
        last = move;
    }
    return 0;
}

/* An arc about the midline's centre, of radius |1/kappa - side t/2|. */
static utw_curve arc_piece(const utw_side *a, double s0, double s1, const double from[2],
                           const double to[2])
{
    const utw_path *w = a->path;
    const double sign = w->kappa > 0 ? 1 : -1, r = sign / w->kappa;
    const double centre[2] = {w->p[0] - sign * r * w->e[1], w->p[1] + sign * r * w->e[0]};
    const double a0 =
        atan2(-sign * w->e[0], sign * w->e[1]); /* from the centre to the wall's start */
    return utw_curve_arc(centre, r - sign * a->side * w->t0 / 2, a0 + w->kappa * s0,
                         a0 + w->kappa * s1, from, to);
}

utw_status utw_side_curves(const utw_side *a, double s0, double s1, const double from[2],
                           const double to[2], double tolerance, utw_fit *fit, utw_error *err)
{
    const utw_path *w = a->path;
    if (w->kappa != 0 && w->t0 != w->t1)
        return utw_fit_cubics(utw_side_point, a, s0, s1, from, to, tolerance, fit, err);
    return utw_fit_append(
        fit, w->kappa == 0 ? utw_curve_line(from, to) : arc_piece(a, s0, s1, from, to), err);
}
