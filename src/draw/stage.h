/* SPDX-License-Identifier: GPL-3.0-or-later
 * A view of solid things: parallel projection, hidden surfaces by a depth buffer (Catmull 1974),
 * light from one side. Surfaces become an image; lines are told which of their parts can be seen.
 */
#ifndef UTW_DRAW_STAGE_H
#define UTW_DRAW_STAGE_H

#include "draw/colour.h"
#include "untwist.h"

/** A parallel projection of x, y, z (right-handed, z toward the viewer before it is tilted): turned
 * by `turn` about y, then by `tilt` about the horizontal of the page. */
typedef struct utw_view {
    double m[3][3]; /* rows: right, up, toward the viewer; orthonormal */
} utw_view;

utw_view utw_view_of(double turn, double tilt);

/** [out] p: right, up, toward the viewer. */
void utw_view_point(const utw_view *view, const double xyz[3], double p[3]);

typedef struct utw_stage utw_stage;

/** An empty stage of nx x ny pixels that shows the box[4] = left, bottom, right, top of the view.
 * Each pixel is the mean of 2 x 2 samples. Returned owned: utw_stage_free(). UTW_E_NOMEM. */
utw_status utw_stage_create(int nx, int ny, const double box[4], utw_stage **stage, utw_error *err);
void utw_stage_free(utw_stage *stage);

/** A triangle in view coordinates with a value and a light (0 .. 1) at each corner; its colour at a
 * value is paint(data, value), times the light. */
typedef utw_colour (*utw_paint)(const void *data, double value);
void utw_stage_triangle(utw_stage *stage, const double p[3][3], const double value[3],
                        const double light[3], utw_paint paint, const void *data);

/** 1 when a point in view coordinates is seen: nothing lies in front of it by more than `slack`. */
int utw_stage_sees(const utw_stage *stage, const double p[3], double slack);

/** The image [ny][nx] 0xAARRGGBB, colours multiplied by alpha; clear where there is nothing. [out]
 * *pixel, returned owned: utw_free(). UTW_E_NOMEM. */
utw_status utw_stage_image(const utw_stage *stage, unsigned **pixel, utw_error *err);

/** Light on a surface with this normal in view coordinates (any length, either side): 0.7 .. 1. */
double utw_stage_light(const double normal[3]);

#endif
