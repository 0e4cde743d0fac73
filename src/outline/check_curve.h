/* SPDX-License-Identifier: GPL-3.0-or-later
 * Faults of single curves and corners of an outline, and the limits of scale. */
#ifndef UTW_OUTLINE_CHECK_CURVE_H
#define UTW_OUTLINE_CHECK_CURVE_H

#include "outline/outline.h"

/* Limits, as parts of the section's size (the diagonal of its box). Double precision carries 16
 * digits, and the geometry keeps about 12 of them: a detail below 1e-7 could not be solved to the
 * accuracy promised. */
#define UTW_TOUCH    1e-9 /* nearer than this, two points are one */
#define UTW_DETAIL   1e-7 /* shortest curve, narrowest gap */
#define UTW_FLAT     1e6  /* greatest radius */
#define UTW_OFFSET   1e6  /* greatest distance from the origin */
#define UTW_LARGEST  1e9  /* greatest extent in units of the file */
#define UTW_SMALLEST 1e-9 /* smallest extent in units of the file */
#define UTW_CUSP     1e-3 /* smallest angle between the two curves of a corner [rad] */

/** Write "part 1, outline: " or "part 2, hole 3: " into text[size]. */
void utw_loop_text(char *text, size_t size, int part, int loop);

/** Write "the edge to vertex 7" for curve k of a loop, or "the closed curve" for a loop of one
 * curve. */
void utw_edge_text(char *text, size_t size, const utw_loop *loop, int k);

/** Numbers finite, loops closed chains, the section neither too large, too small nor too far from
 * the origin. [out] *size: the diagonal of the box around all curves [L]. UTW_E_OUTLINE. */
utw_status utw_check_scale(const utw_outline *outline, double *size, utw_error *err);

/** Every curve of a loop by itself (length, radius, shape) and every corner between two of them.
 *  UTW_E_OUTLINE. */
utw_status utw_check_curves(const utw_loop *loop, int part, int index, double size, utw_error *err);

#endif
