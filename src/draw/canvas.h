/* SPDX-License-Identifier: GPL-3.0-or-later
 * What a picture is drawn on: a list of fills, strokes, images and texts on a page in millimetres,
 * y downward, that is written as SVG, PDF or PNG at the end (canvas_cairo.c, which alone names
 * cairo).
 *
 * Drawing calls return nothing: when memory runs out the canvas remembers it, ignores what follows
 * and utw_canvas_status() tells. */
#ifndef UTW_DRAW_CANVAS_H
#define UTW_DRAW_CANVAS_H

#include <stddef.h>

#include "draw/colour.h"
#include "untwist.h"

/** A rectangle on the page [mm]; x0 <= x1, y0 <= y1, y downward. */
typedef struct utw_box {
    double x0, y0, x1, y1;
} utw_box;

typedef struct utw_canvas utw_canvas;

/** An empty page. Returned owned: utw_canvas_free(). UTW_E_NOMEM. */
utw_status utw_canvas_create(utw_canvas **canvas, utw_error *err);
void utw_canvas_free(utw_canvas *canvas);

/** The size of the page [mm], to be set before it is written. */
void utw_canvas_size(utw_canvas *canvas, double width, double height);

/** UTW_OK, or UTW_E_NOMEM when something could not be noted. */
utw_status utw_canvas_status(const utw_canvas *canvas, utw_error *err);

/* ---- the path that the next fill, stroke or clip takes and ends ---- */

void utw_canvas_move(utw_canvas *canvas, double x, double y);
void utw_canvas_line(utw_canvas *canvas, double x, double y);
/** Cubic Bezier curve with control points 1 and 2. */
void utw_canvas_cubic(utw_canvas *canvas, double x1, double y1, double x2, double y2, double x,
                      double y);
void utw_canvas_close(utw_canvas *canvas);
/** Closed figures. */
void utw_canvas_circle(utw_canvas *canvas, double x, double y, double r);
void utw_canvas_rectangle(utw_canvas *canvas, utw_box box);

/** How a line is drawn. */
typedef struct utw_pen {
    double width; /* [mm] */
    utw_colour colour;
    double dash[4]; /* on, off, on, off [mm]; all 0: solid; the last two 0: on, off */
    int butt;       /* 1: ends cut off square at the end points; 0: round ends */
} utw_pen;

/** Fill by the non-zero winding rule; opacity 0 .. 1. */
void utw_canvas_fill(utw_canvas *canvas, utw_colour colour, double opacity);
void utw_canvas_stroke(utw_canvas *canvas, const utw_pen *pen);

/** From now on only what lies inside the path is drawn, until utw_canvas_unclip(). One clip at a
 * time. Clips are slow on large areas: lines are better cut (gaps.h). */
void utw_canvas_clip(utw_canvas *canvas);
void utw_canvas_unclip(utw_canvas *canvas);

/** An image [ny][nx] of 0xAARRGGBB (colours multiplied by alpha), rows downward, stretched over a
 * box. Copied. */
void utw_canvas_image(utw_canvas *canvas, utw_box box, int nx, int ny, const unsigned *pixel);

/* ---- text ---- */

/** How text is set. "_{...}" lowers and "^{...}" raises what is in the braces when `markup` is set.
 */
typedef struct utw_type {
    double size; /* of the font [mm] */
    utw_colour colour;
    int bold, italic, markup;
    int upright; /* 1: read from the right: turned a quarter counter-clockwise */
} utw_type;

/** Width, and reach above and below the base line, of text that is not turned [mm]. */
typedef struct utw_text_size {
    double width, above, below;
} utw_text_size;

utw_text_size utw_canvas_measure(utw_canvas *canvas, const char *text, const utw_type *type);

/** Set text with its anchor at (x, y): across 0 left, 0.5 middle, 1 right of the text; along 0:
 * base line, 0.5: half the height of a capital, 1: top of a capital. Turned text turns about (x,
 * y). Returns its box, which is also noted. */
utw_box utw_canvas_text(utw_canvas *canvas, double x, double y, double across, double up,
                        const char *text, const utw_type *type);

/** The box utw_canvas_text() would return, without setting anything. */
utw_box utw_canvas_text_box(utw_canvas *canvas, double x, double y, double across, double up,
                            const char *text, const utw_type *type);

/** A text that was set. */
typedef struct utw_placed_text {
    utw_box box;
    const char *text; /* borrowed */
} utw_placed_text;

/** All of them, in the order they were set. Returned borrowed, until the next text. */
const utw_placed_text *utw_canvas_placed(const utw_canvas *canvas, int *n);

/* ---- writing ---- */

/** The format that a path's ending asks for. UTW_E_ARGUMENT: another ending or none. */
utw_status utw_format_of(const char *path, utw_picture_format *format, utw_error *err);

/** The page as a file in memory. [in] title of the document, may be NULL; dots per inch of a PNG.
 * [out] *bytes [*n], returned owned: utw_free(). UTW_E_NOMEM, UTW_E_ARGUMENT when the page is too
 * large for an image, UTW_E_INTERNAL. */
utw_status utw_canvas_bytes(const utw_canvas *canvas, utw_picture_format format, const char *title,
                            double dpi, unsigned char **bytes, size_t *n, utw_error *err);

/** The page as an image on white: [out] *pixel [*ny][*nx] of 0x00RRGGBB, returned owned:
 * utw_free(); without text when `text` is 0. Statuses as above. */
utw_status utw_canvas_pixels(const utw_canvas *canvas, double dpi, int text, unsigned **pixel,
                             int *nx, int *ny, utw_error *err);

#endif
