/* SPDX-License-Identifier: GPL-3.0-or-later
 * The map of the reference triangle onto an element with curved sides, by blending (Gordon and
 * Hall, Numerische Mathematik 21 (1973) 109-129; for triangles Szabo and Babuska 1991, sec. 6.4).
 */
#ifndef UTW_MESH_BLEND_H
#define UTW_MESH_BLEND_H

#include "mesh/mesh.h"

/** One element as seen by the map. Fill with utw_blend_of(). */
typedef struct utw_blend {
    double x[3][2];            /* corners [L] */
    int curved[3];             /* side k follows curve[k] */
    const utw_curve *curve[3]; /* borrowed from the net */
    double t0[3], t1[3];       /* parameters at the side's start and end */
    int any;                   /* 1 when a side is curved */
    double turning;            /* greatest angle between the tangents at the ends of a side [rad] */
} utw_blend;

void utw_blend_of(const utw_mesh *mesh, const utw_triangle *tri, utw_blend *blend);

/** Point and derivatives at (r, s) of the reference triangle (field/basis.h numbering):
 *  xy[2] [L], jac[4] = {x_r, x_s, y_r, y_s} [L]. */
void utw_blend_at(const utw_blend *blend, double r, double s, double xy[2], double jac[4]);

/** Smallest determinant of the map over a lattice of points, sides included, over that of the
 * straight triangle; 1 for straight elements. Not positive: the map folds. */
double utw_blend_quality(const utw_blend *blend);

#endif
