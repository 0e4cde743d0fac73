/* SPDX-License-Identifier: GPL-3.0-or-later
 * What must hold of every picture, and pictures as pixels. */
#ifndef UTW_TESTS_PICTURE_H
#define UTW_TESTS_PICTURE_H

#include "draw/picture.h"
#include "support/support.h"

/** Draw on a canvas of its own; the test fails when it cannot. Owned: utw_canvas_free(). */
utw_canvas *picture_canvas(const utw_solution *solution, utw_picture what,
                           const utw_draw_options *options);

/** No two texts meet, none leaves the page, no line that is stroked runs through one. The boxes of
 * the texts are reported by the canvas; lines are those in its list. `name` stands in messages. */
void picture_check_texts(const utw_canvas *canvas, const char *name);

/** A picture as pixels, without its texts. */
typedef struct pixels {
    int nx, ny;
    unsigned *rgb; /* [ny][nx] 0x00RRGGBB, owned: utw_free() */
} pixels;

pixels picture_pixels(const utw_canvas *canvas, double dpi);

/** L* of a pixel; those outside the picture are white. */
double picture_lightness(const pixels *p, int x, int y);

/** The box of the pixels with this colour (to rounding of each channel): box[4] = first and last column and row. The test
 * fails when there is none. */
void picture_box_of(const pixels *p, utw_colour colour, int box[4]);

#endif
