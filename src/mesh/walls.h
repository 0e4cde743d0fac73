/* SPDX-License-Identifier: GPL-3.0-or-later
 * The local wall thickness of a section, seen from its boundary. */
#ifndef UTW_MESH_WALLS_H
#define UTW_MESH_WALLS_H

#include "outline/net.h"

/** The boundary as short straight pieces in a tree of boxes. */
typedef struct utw_walls utw_walls;

/** [in] net, borrowed for the life of the object. Returned owned: utw_walls_free(). UTW_E_NOMEM. */
utw_status utw_walls_create(const utw_net *net, utw_walls **walls, utw_error *err);
void utw_walls_free(utw_walls *walls);

/** Thickness seen from the point t of a net edge: the length of the normal through the material to
 * the next boundary; of both sides the smaller when the edge lies between two parts. Next to a
 * corner of two edges that close in on each other (a wedge) it is not less than `wedge` times the
 * distance from that corner, or elements would shrink toward every tip. Infinite when nothing is
 * hit. [L] */
double utw_walls_thickness(const utw_walls *walls, int edge, double t, double wedge);

#endif
