/* SPDX-License-Identifier: GPL-3.0-or-later
 * One wall of a midline: a line or a circular arc whose thickness varies linearly along its length.
 */
#ifndef UTW_OUTLINE_WALL_H
#define UTW_OUTLINE_WALL_H

#include "base/status.h"

/** A wall by its arc length s from 0 to `length`. The curve is kept by its start, start tangent and
 * curvature, so that a nearly straight arc loses nothing: there is no centre far away. */
typedef struct utw_path {
    double p[2], e[2]; /* start [L], unit tangent there */
    double length;     /* [L] > 0 */
    double kappa; /* curvature [1/L], positive when the wall turns counter-clockwise; 0: straight */
    double t0, t1; /* thickness at s = 0 and s = length [L], linear between */
} utw_path;

/** What lies at a station of a wall. */
typedef struct utw_path_point {
    double x[2], e[2]; /* point [L], unit tangent in the direction of s */
    double t;          /* thickness [L] */
} utw_path_point;

/** Running integrals from the wall's start to s. */
typedef struct utw_path_run {
    double area;      /* int t ds [L^2] */
    double moment[2]; /* int x t ds, int y t ds about the origin [L^3] */
    double sector;    /* int r_n ds, r_n = x e_y - y e_x: twice the area swept about 0 [L^2] */
    double f;         /* int ds / t [1] */
} utw_path_run;

/** Why three points are no arc. */
typedef enum utw_arc_fault {
    UTW_ARC_GOOD = 0,
    UTW_ARC_AT_END, /* mid coincides with an end */
    UTW_ARC_BEYOND  /* mid is in line with the ends, but not between them */
} utw_arc_fault;

/** The straight wall from `from` to `to` (distinct). */
utw_path utw_path_line(const double from[2], const double to[2], double t0, double t1);

/** The arc from `from` through `mid` to `to`. Any point strictly between the ends determines it.
 * When the ends coincide, mid is the opposite point of a full circle, run counter-clockwise. Three
 * points in line, mid between the others, give the straight wall. *path is untouched unless
 * UTW_ARC_GOOD is returned. Method: the chord's inscribed angle; see the comment in wall.c. */
utw_arc_fault utw_path_arc(const double from[2], const double mid[2], const double to[2], double t0,
                           double t1, utw_path *path);

/** The station at s [L], 0 <= s <= length. */
void utw_path_at(const utw_path *path, double s, utw_path_point *point);

/** Turn and shift the wall: p -> R(-angle) (p - origin), with c = cos(angle), s = sin(angle). */
void utw_path_to_frame(utw_path *path, const double origin[2], double c, double s);

/** The wall's station nearest to a point, and how far off it is [L]. */
double utw_path_nearest(const utw_path *path, const double point[2], double *s);

/** Points of the rule below. */
#define UTW_PATH_GAUSS 16

/** Gauss rule on [0, 1] shared by the quadratures along walls. */
typedef struct utw_path_rule {
    double x[UTW_PATH_GAUSS], w[UTW_PATH_GAUSS];
} utw_path_rule;

void utw_path_rule_init(utw_path_rule *rule);

/** int_0^s r_n ds about the origin [L^2], in closed form. */
double utw_path_sector(const utw_path *path, double s);

/** int_0^s ds/t [1], in closed form: the logarithm of a taper, taken so that a slight one loses
 * nothing. */
double utw_path_shear_length(const utw_path *path, double s);

/** Running integrals to s, to rounding: Simpson's rule on lines (exact), Gauss-Legendre on arcs
 * (integrands linear times sine, 16 points a quarter turn); sector and int ds/t in closed form. */
void utw_path_run_to(const utw_path *path, const utw_path_rule *rule, double s, utw_path_run *run);

/** Pieces into which a wall is cut for quadrature. On a piece the thickness changes by a factor of
 * at most 2 and the tangent turns by at most a quarter turn. The 16-point rule then integrates what
 * this theory needs to rounding: with a pole of 1/t no nearer than the Bernstein ellipse rho = 3 +
 * sqrt 8 the error is of the order of rho^-32 = 3e-25 (Trefethen, Approximation Theory and
 * Approximation Practice, 2013, ch. 19). */
int utw_path_pieces(const utw_path *path);

/** Ends of piece i, 0 <= i < utw_path_pieces(path): range[2], s ascending [L]. */
void utw_path_piece(const utw_path *path, int i, double range[2]);

#endif
