/* SPDX-License-Identifier: GPL-3.0-or-later
 * Lines that leave room for text. */
#ifndef UTW_DRAW_GAPS_H
#define UTW_DRAW_GAPS_H

#include "draw/contour.h"
#include "draw/canvas.h"

/** Add the paths to the canvas's path, without what lies inside any of box[n]. */
void utw_lay_with_gaps(utw_canvas *canvas, const utw_paths *paths, int n, const utw_box *box);

#endif
