/* SPDX-License-Identifier: GPL-3.0-or-later
 * A curve of the plane: a line, an arc of a circle or an ellipse, or a cubic, over a parameter t in
 * [0, 1]. */
#ifndef UTW_OUTLINE_CURVE_H
#define UTW_OUTLINE_CURVE_H

typedef enum utw_curve_kind { UTW_LINE, UTW_ARC, UTW_CUBIC } utw_curve_kind;

/** Start and end are stored, so that neighbours meet without rounding.
 *  LINE   from + t (to - from).
 *  ARC    centre + u cos a + v sin a with a = a0 + t (a1 - a0); u, v are (conjugate) semi-axes: for
 * a circle u = (r, 0), v = (0, r). Counter-clockwise when a1 > a0. |a1 - a0| <= 2 pi. Points are
 * reckoned from `from` along the chord and what is missing at `to` (rounding) is spread along the
 * arc. CUBIC  Bezier curve with the inner control points c1, c2. */
typedef struct utw_curve {
    utw_curve_kind kind;
    double from[2], to[2];
    double centre[2], u[2], v[2], a0, a1; /* ARC */
    double c1[2], c2[2];                  /* CUBIC */
} utw_curve;

utw_curve utw_curve_line(const double from[2], const double to[2]);

/** Arc of a circle about `centre`, from angle a0 to a1 [rad]; ends as given (they should lie on
 * it). */
utw_curve utw_curve_arc(const double centre[2], double r, double a0, double a1,
                        const double from[2], const double to[2]);

/** Circle arc from `from` through `mid` to `to`. Returns 0, or -1 when the three are in line (to
 * 1e-12 of the chord) or coincide. */
int utw_curve_arc_through(const double from[2], const double mid[2], const double to[2],
                          utw_curve *curve);

utw_curve utw_curve_cubic(const double from[2], const double c1[2], const double c2[2],
                          const double to[2]);

/** Point at t [L]; exactly `from` and `to` at t = 0 and 1. */
void utw_curve_point(const utw_curve *curve, double t, double xy[2]);

/** First derivative by t [L]. */
void utw_curve_d1(const utw_curve *curve, double t, double d[2]);

/** Second derivative by t [L]. */
void utw_curve_d2(const utw_curve *curve, double t, double d[2]);

/** The piece between t0 and t1 as a curve of its own (t1 < t0 reverses it). */
utw_curve utw_curve_piece(const utw_curve *curve, double t0, double t1);

/** The same curve run the other way. */
utw_curve utw_curve_reversed(const utw_curve *curve);

/** Length [L], by Gauss-Legendre on pieces of at most an eighth of a turn; exact to 1e-13 for lines
 * and circle arcs and about 1e-12 for smooth ellipses and cubics. */
double utw_curve_length(const utw_curve *curve);

/** Total turning of the tangent, unsigned [rad]: 0 for a line. */
double utw_curve_turning(const utw_curve *curve);

/** Smallest box around the curve: box = {xmin, ymin, xmax, ymax}, exact. */
void utw_curve_box(const utw_curve *curve, double box[4]);

#endif
