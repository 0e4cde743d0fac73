/* SPDX-License-Identifier: GPL-3.0-or-later
 * The list a canvas consists of, as canvas.c fills it and canvas_cairo.c replays it. */
#ifndef UTW_DRAW_CANVAS_LIST_H
#define UTW_DRAW_CANVAS_LIST_H

#include "draw/canvas.h"

/** One piece of a path; coordinates used: MOVE, LINE 2, CUBIC 6, CLOSE none, CIRCLE x, y, r. */
typedef enum utw_verb { UTW_MOVE, UTW_LINE_TO, UTW_CUBIC_TO, UTW_CLOSE, UTW_CIRCLE } utw_verb;
typedef struct utw_segment {
    utw_verb verb;
    double v[6];
} utw_segment;

typedef enum utw_act { UTW_FILL, UTW_STROKE, UTW_CLIP, UTW_UNCLIP, UTW_IMAGE, UTW_TEXT } utw_act;

typedef struct utw_text_item {
    char *text; /* owned */
    utw_type type;
    double x, y; /* where the base line begins [mm] */
} utw_text_item;

typedef struct utw_image_item {
    utw_box box;
    int nx, ny;
    unsigned *pixel; /* [ny][nx], owned */
} utw_image_item;

/** One step of drawing. */
typedef struct utw_step {
    utw_act act;
    size_t first, n; /* its path: segment[first .. first + n) */
    utw_pen pen;     /* STROKE; FILL: its colour */
    double opacity;  /* FILL */
    int item;        /* TEXT, IMAGE: index */
} utw_step;

struct utw_canvas {
    double width, height;                     /* [mm] */
    size_t n_segment, segment_capacity, path; /* path: where the current path begins */
    utw_segment *segment;
    size_t n_step, step_capacity;
    utw_step *step;
    size_t n_text, text_capacity, placed_capacity, n_image, image_capacity;
    utw_text_item *text;
    utw_placed_text *placed; /* [n_text] */
    utw_image_item *image;
    int out_of_memory;
    struct utw_gauge *gauge; /* for measuring text; owned */
};

/** What text is measured with. Returned owned: utw_gauge_free(); NULL when memory is out. */
struct utw_gauge *utw_gauge_create(void);
void utw_gauge_free(struct utw_gauge *gauge);

/** Size of text as set, markup interpreted [mm]. */
utw_text_size utw_gauge_measure(struct utw_gauge *gauge, const char *text, const utw_type *type);

/** Height of a capital letter over the size of the font. */
#define UTW_CAPITAL 0.73

#endif
