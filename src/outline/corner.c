/* SPDX-License-Identifier: GPL-3.0-or-later
 * The arc tangent to two edges, the chamfer between them, and the greatest of either. */
#include "outline/corner.h"

#include "base/vec2.h"

static const double STRAIGHT = 1e-5; /* turn in radians that counts as none */
static const double SLACK =
    1e-9; /* of a parameter: what decimal input leaves when pieces just fit */

/* Unit tangent; 0 when the edge has none there. */
static int tangent(const utw_edge *edge, double s, double t[2])
{
    utw_edge_d1(edge, s, t);
    const double length = utw_norm(t);
    if (!(length > 0)) return 0;
    t[0] /= length;
    t[1] /= length;
    return 1;
}

static double clamp(double s, double low, double high)
{
    return s < low ? low : s > high ? high : s;
}

/* The fillet arc of radius r from a point with unit tangent t to the point `to`, where the tangent
 * has turned by `turn` (positive counter-clockwise, less than pi). */
static utw_curve fillet(const double from[2], const double t[2], const double to[2], double turn,
                        double r)
{
    const double side = turn > 0 ? 1 : -1;
    const double centre[2] = {from[0] - side * r * t[1], from[1] + side * r * t[0]};
    const double a0 = atan2(-side * t[0], side * t[1]); /* direction from the centre to `from` */
    return utw_curve_arc(centre, r, a0, a0 + turn, from, to);
}

/* Between lines each edge is cut back by r tan(turn/2) (elementary). */
static utw_corner_fit round_lines(const utw_corner *c, const double t0[2], const double t1[2],
                                  utw_corner_cut *cut)
{
    const utw_curve *a = &c->before.curve[0], *b = &c->after.curve[0];
    const double cross = utw_cross(t0, t1), dot = utw_dot(t0, t1), turn = atan2(cross, dot);
    const double back = c->size * tan(0.5 * fabs(turn));
    const double before = 1 - back / utw_distance(a->from, a->to),
                 after = back / utw_distance(b->from, b->to);
    if (!(before >= c->least_before - SLACK && after <= c->most_after + SLACK))
        return UTW_CORNER_TOO_LARGE;
    const double from[2] = {a->to[0] - back * t0[0], a->to[1] - back * t0[1]};
    const double to[2] = {b->from[0] + back * t1[0], b->from[1] + back * t1[1]};
    cut->before = clamp(before, c->least_before, 1);
    cut->after = clamp(after, 0, c->most_after);
    cut->curve = fillet(from, t0, to, turn, c->size);
    return UTW_CORNER_FITS;
}

/* The offset curves of both edges at radius r and parameters s = {on before, on after}. */
typedef struct offset_state {
    double gap[2];  /* vector from the second offset curve to the first [L] */
    double d0[2];   /* derivative of the first offset point by s[0], */
    double d1[2];   /* of the second by s[1]; d/ds (p + r n) = (1 - r curvature) p' */
    double by_r[2]; /* of the gap by r */
    double factor;  /* the lesser of the two brackets: not positive beyond the evolute */
    double sine; /* of the turn from the first tangent to the second, positive toward the corner's
                    side */
} offset_state;

static int offsets(const utw_corner *c, const double s[2], double side, double r, offset_state *o)
{
    double p[2][2], t[2][2], derivative[2][2];
    o->factor = 1;
    for (int i = 0; i < 2; i++) {
        const utw_edge *edge = i == 0 ? &c->before : &c->after;
        double d2[2];
        utw_edge_point(edge, s[i], p[i]);
        utw_edge_d1(edge, s[i], derivative[i]);
        utw_edge_d2(edge, s[i], d2);
        const double speed = utw_norm(derivative[i]);
        if (!(speed > 0)) return 0;
        const double curvature = utw_cross(derivative[i], d2) / (speed * speed * speed);
        const double factor = 1 - side * r * curvature;
        o->factor = fmin(o->factor, factor);
        for (int k = 0; k < 2; k++) {
            t[i][k] = derivative[i][k] / speed;
            derivative[i][k] *= factor;
        }
    }
    /* left normals (-t1, t0) */
    o->by_r[0] = side * (t[1][1] - t[0][1]);
    o->by_r[1] = side * (t[0][0] - t[1][0]);
    for (int k = 0; k < 2; k++) {
        o->gap[k] = p[0][k] - p[1][k] + r * o->by_r[k];
        o->d0[k] = derivative[0][k];
        o->d1[k] = derivative[1][k];
    }
    o->sine = side * utw_cross(t[0], t[1]);
    return isfinite(o->gap[0]) && isfinite(o->gap[1]);
}

/* Solve d0 x[0] - d1 x[1] = -rhs. Returns 0 when the offset curves do not cross. */
static int solve(const offset_state *o, const double rhs[2], double x[2])
{
    const double det = -utw_cross(o->d0, o->d1);
    if (!(fabs(det) > 0) || o->factor <= 0 || o->sine <= 0) return 0;
    x[0] = utw_cross(rhs, o->d1) / det;
    x[1] = utw_cross(rhs, o->d0) / det;
    return isfinite(x[0]) && isfinite(x[1]);
}

/* Newton's iteration for the parameters at radius r, from a guess in s. */
static int correct(const utw_corner *c, double side, double r, double s[2])
{
    offset_state o;
    double x[2], last = 1;
    const double start[2] = {s[0], s[1]};
    for (int i = 0; i < 12; i++) {
        if (!offsets(c, s, side, r, &o) || !solve(&o, o.gap, x)) return 0;
        s[0] += x[0];
        s[1] += x[1];
        if (fabs(s[0] - start[0]) > 0.2 || fabs(s[1] - start[1]) > 0.2)
            return 0; /* another branch */
        /* done when nothing moves any more, or when what moves is rounding that no longer shrinks
         */
        const double move = fabs(x[0]) + fabs(x[1]);
        if (move < 1e-15 || (move < 1e-9 && move >= 0.5 * last))
            return offsets(c, s, side, r, &o) && o.factor > 0 && o.sine > 0 &&
                   s[0] >= c->least_before - SLACK && s[1] <= c->most_after + SLACK &&
                   s[0] <= c->before.n + SLACK && s[1] >= -SLACK;
        last = move;
    }
    return 0;
}

static utw_corner_fit round_any(const utw_corner *c, double side, utw_corner_cut *cut)
{
    double s[2] = {c->before.n, 0}, r = 0, step = c->size / 8;
    while (r < c->size) {
        const double next = r + step > c->size * (1 - 1e-12) ? c->size : r + step;
        offset_state o;
        double x[2], guess[2] = {s[0], s[1]};
        int good = offsets(c, s, side, r, &o) && solve(&o, o.by_r, x);
        if (good) {
            guess[0] += x[0] * (next - r);
            guess[1] += x[1] * (next - r);
            good = fabs(guess[0] - s[0]) <= 0.25 && fabs(guess[1] - s[1]) <= 0.25 &&
                   correct(c, side, next, guess);
        }
        if (good) {
            s[0] = guess[0];
            s[1] = guess[1];
            r = next;
            step *= 2;
        } else {
            step /= 2;
            if (step < 1e-7 * c->size) return UTW_CORNER_TOO_LARGE;
        }
    }
    double from[2], to[2], t0[2], t1[2];
    s[0] = clamp(s[0], c->least_before, c->before.n);
    s[1] = clamp(s[1], 0, c->most_after);
    utw_edge_point(&c->before, s[0], from);
    utw_edge_point(&c->after, s[1], to);
    if (!tangent(&c->before, s[0], t0) || !tangent(&c->after, s[1], t1))
        return UTW_CORNER_TOO_LARGE;
    cut->before = s[0];
    cut->after = s[1];
    cut->curve = fillet(from, t0, to, atan2(utw_cross(t0, t1), utw_dot(t0, t1)), c->size);
    return UTW_CORNER_FITS;
}

static utw_corner_fit chamfer(const utw_corner *c, utw_corner_cut *cut)
{
    const double before = utw_edge_at_length(&c->before, c->size, 1),
                 after = utw_edge_at_length(&c->after, c->size, 0);
    if (!(before >= c->least_before - SLACK && after <= c->most_after + SLACK))
        return UTW_CORNER_TOO_LARGE;
    double from[2], to[2];
    cut->before = clamp(before, c->least_before, c->before.n);
    cut->after = clamp(after, 0, c->most_after);
    utw_edge_point(&c->before, cut->before, from);
    utw_edge_point(&c->after, cut->after, to);
    cut->curve = utw_curve_line(from, to);
    return UTW_CORNER_FITS;
}

utw_corner_fit utw_corner_make(const utw_corner *c, utw_corner_cut *cut)
{
    double t0[2], t1[2];
    if (!tangent(&c->before, c->before.n, t0) || !tangent(&c->after, 0, t1))
        return UTW_CORNER_NO_TANGENT;
    const double cross = utw_cross(t0, t1);
    if (fabs(cross) < STRAIGHT) return utw_dot(t0, t1) > 0 ? UTW_CORNER_STRAIGHT : UTW_CORNER_BACK;
    if (c->kind == UTW_CORNER_CHAMFER) return chamfer(c, cut);
    if (c->before.n == 1 && c->before.curve[0].kind == UTW_LINE && c->after.n == 1 &&
        c->after.curve[0].kind == UTW_LINE)
        return round_lines(c, t0, t1, cut);
    return round_any(c, cross > 0 ? 1 : -1, cut);
}

/* Down to six digits, so that what a message prints fits when it is typed in. */
static double six_digits_down(double x)
{
    if (!(x > 0)) return 0;
    const double unit = pow(10, floor(log10(x)) - 5);
    return floor(x / unit * (1 + 1e-9)) * unit;
}

double utw_corner_greatest(const utw_corner *corner)
{
    utw_corner trial = *corner;
    utw_corner_cut cut;
    if (utw_corner_make(&trial, &cut) == UTW_CORNER_FITS) return corner->size;
    /* what is so small next to its edges fits only by the slack */
    const double nothing = 1e-7 * (utw_edge_length(&corner->before, 0, corner->before.n) +
                                   utw_edge_length(&corner->after, 0, corner->after.n));
    double low = 0, high = corner->size;
    while (high - low > 1e-10 * high && high > nothing) {
        trial.size = 0.5 * (low + high);
        *(utw_corner_make(&trial, &cut) == UTW_CORNER_FITS ? &low : &high) = trial.size;
    }
    if (low <= nothing) return 0;
    return six_digits_down(low);
}
