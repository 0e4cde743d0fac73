/* SPDX-License-Identifier: GPL-3.0-or-later
 * The page that all pictures share: name and subject above, the drawing with its key beside or
 * below it, scale bar and axes under it, notes at the foot. */
#ifndef UTW_DRAW_LAYOUT_H
#define UTW_DRAW_LAYOUT_H

#include "draw/text_flow.h"
#include "draw/labels.h"
#include "draw/sampling.h"

/** Narrowest and widest page [mm]. */
#define UTW_WIDTH_MIN 40.0
#define UTW_WIDTH_MAX 1200.0

/** What a page must hold. Lengths on the page in mm. */
typedef struct utw_request {
    double width;   /* of the page */
    double tallest; /* the page must not be taller, if it can be helped; 0: width times the
                       square root of 2 */
    const char *title, *subject;
    double box[4]; /* xmin, ymin, xmax, ymax to be shown, in the drawing's units [L] */
    double left, right, top, bottom; /* to be kept free around the box, in sizes of the font */
    double key_width;                /* of a key that stands beside the drawing; 0: no key */
    double key_length;               /* that the key wants along its scale */
    double key_height;               /* of a key that lies below */
    int no_scale;                    /* 1: no scale bar and axes (a view that is not the plane) */
    double wall;             /* mean thickness [L], so that outlines leave it visible; 0: any */
    const char *length_unit; /* of the scale bar */
    const utw_notes *notes;
} utw_request;

typedef struct utw_page {
    utw_canvas *canvas; /* borrowed */
    utw_labels *labels; /* owned */
    double width, height, font, margin;
    double line;     /* width of outlines */
    utw_frame frame; /* from the drawing's units to the page */
    utw_box drawing; /* what the box became, without what is kept free around it */
    utw_box room;    /* with it */
    utw_box key;
    int key_upright; /* 1: the key stands beside the drawing */
} utw_page;

/** Size of the font on a page of this width [mm]. */
double utw_font_size(double width);

/** Types of the look. */
utw_type utw_type_plain(double font);
utw_type utw_type_small(double font);

/** Width of the thinnest line that is meant to be seen [mm]. */
double utw_hairline(const utw_page *page);

/** Choose the scale and set title, subject, scale bar, axes and notes. [in] canvas, borrowed while
 * the page is used; request, borrowed. Free with utw_page_clear(). UTW_E_NOMEM. */
utw_status utw_layout(utw_canvas *canvas, const utw_request *request, utw_page *page,
                      utw_error *err);
void utw_page_clear(utw_page *page);

/** A point of the drawing [L] on the page. */
void utw_page_point(const utw_page *page, const double p[2], double xy[2]);

#endif
