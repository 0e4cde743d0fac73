/* SPDX-License-Identifier: GPL-3.0-or-later
 * A wall through the stations of a branch: a line or an arc, with linear thickness. */
#ifndef UTW_THINWALL_REGRESS_H
#define UTW_THINWALL_REGRESS_H

#include "outline/wall.h"
#include "thinwall/medial.h"

/** A wall and how far the stations are from it. */
typedef struct utw_wall_fit {
    utw_path path; /* from the first station's foot to the last's; in the frame of the border */
    double off;    /* greatest distance of a station from it [units] */
    double rough;  /* greatest error of a station's thickness [units] */
    double mean;   /* mean thickness of the stations */
} utw_wall_fit;

/** The straight line of least squares (principal axis), thickness by linear regression along it.
 * [in] station[n], n >= 2, borrowed, in order. Returns 0 when they coincide. */
int utw_regress_line(const utw_station *station, int n, utw_wall_fit *fit);

/** The circle by Taubin's method (IEEE Trans. Pattern Analysis 13 (1991) 1115-1138, in the form of
 * Chernov, Circular and Linear Regression, 2010, ch. 5, from memory), n >= 3. Returns 0 when there
 * is none or it turns by more than a full turn. */
int utw_regress_arc(const utw_station *station, int n, utw_wall_fit *fit);

/** The station of the path or its continuation at the foot of a point; of the many of an arc the
 * one nearest to `near`. */
double utw_path_foot(const utw_path *path, const double point[2], double near);

/** Distance of a point from the path continued both ways, positive on the left. */
double utw_path_offset(const utw_path *path, const double point[2]);

#endif
