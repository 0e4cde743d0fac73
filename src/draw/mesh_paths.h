/* SPDX-License-Identifier: GPL-3.0-or-later
 * Elements of a mesh as exact paths on a page. */
#ifndef UTW_DRAW_MESH_PATHS_H
#define UTW_DRAW_MESH_PATHS_H

#include "draw/canvas.h"
#include "draw/sampling.h"

/** Add the boundary of an element to the path. The frame is that of the mesh's coordinates. */
void utw_lay_element(utw_canvas *canvas, const utw_frame *frame, const utw_mesh *mesh, int tri);

/** Add an edge of the mesh to the path, as it runs in the first of its triangles. */
void utw_lay_edge(utw_canvas *canvas, const utw_frame *frame, const utw_mesh *mesh, int edge);

/** Add a curve to the path, from where the pen is at its start. Lines and cubics exactly; arcs as
 * cubics of at most an eighth of a turn, off by less than 1e-6 of the radius. */
void utw_lay_curve(utw_canvas *canvas, const utw_frame *frame, const utw_curve *curve);

#endif
