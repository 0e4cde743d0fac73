/* SPDX-License-Identifier: GPL-3.0-or-later
 * The analysed midline: what its files share. The public functions are in untwist.h. */
#ifndef UTW_THINWALL_THIN_H
#define UTW_THINWALL_THIN_H

#include "outline/graph.h"
#include "outline/wall.h"

/** A quadrature station of a wall with all that the integrals along walls need. Frame coordinates.
 */
typedef struct utw_thin_point {
    double s, ds;      /* station and weight [L] */
    utw_path_point at; /* point, tangent, thickness */
    utw_path_run run;  /* integrals from the wall's start */
    double omega;      /* sectorial coordinate [L^2]; after utw_sectorial() */
    double s_omega;    /* int_0^s omega t ds [L^4]; after utw_sectorial() */
} utw_thin_point;

/** Shear flows in equilibrium with normal stresses that change along the bar: the three ways they
 * can. */
typedef enum utw_flow_mode {
    UTW_FLOW_1,    /* unit shear force along frame axis 1 */
    UTW_FLOW_2,    /* unit shear force along frame axis 2 */
    UTW_FLOW_WARP, /* unit warping torque */
    UTW_FLOW_MODES
} utw_flow_mode;

/** An analysed midline. The frame has its origin at the centroid and axis 1 along the principal
 * axis that lies within 45 degrees of x, so that no digits are lost far from the origin or in a
 * flat section. */
struct utw_thin {
    utw_graph graph;
    utw_path *paths; /* [n_walls], in the frame */
    utw_path_rule rule;
    int *first;             /* [n_walls + 1] into points */
    utw_thin_point *points; /* [first[n_walls]] */
    double centroid[2];     /* in the drawing [L] */
    double cos_frame, sin_frame;
    double size;                /* extent [L] */
    double area, i11, i22, i12; /* int t, int y^2 t, int x^2 t, int x y t ds in the frame */
    double pole[2];             /* shear centre in the frame [L] */
    double *cell_matrix;        /* [n_cells][n_cells] Cholesky factor of the cell equations */
    double *bredt; /* [n_walls] torsional flow per G theta' [L^2], positive from `from` to `to` */
    double *start[UTW_FLOW_MODES]; /* [n_walls] flow at the wall's start for a unit load [1/L];
                                      warp: [1/L^2] */
    double *omega;                 /* [n_nodes] sectorial coordinate [L^2] */
    double slope[2][2]; /* d sigma/dz = slope[mode][0] x + slope[mode][1] y for a unit shear force
                           [1/L^4] */
    double iw;
    utw_thin_constants constants;
};

/** Flow of one mode at a station, from the start flow and the running integrals [1/L] (warp:
 * [1/L^2]). */
double utw_flow_value(const utw_thin *thin, utw_flow_mode mode, int wall, const utw_path_run *run,
                      double s_omega);

#endif
