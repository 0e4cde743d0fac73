/* SPDX-License-Identifier: GPL-3.0-or-later
 * Choosing the scale and dividing the page. */
#include "draw/layout.h"

#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/status.h"
#include "draw/marks.h"
#include "draw/ticks.h"

/* Width of outlines in hairlines: as a rule, and at least when walls are thin; the part of a wall
 * they may cover. */
#define OUTLINE      3.0
#define OUTLINE_THIN 1.2
#define OUTLINE_WALL 0.3

double utw_font_size(double width)
{
    return 1.55 + 0.0055 * width;
}

utw_type utw_type_plain(double font)
{
    return (utw_type){.size = font, .colour = utw_ink(), .markup = 1};
}

utw_type utw_type_small(double font)
{
    return (utw_type){.size = 0.92 * font, .colour = utw_pale(), .markup = 1};
}

double utw_hairline(const utw_page *page)
{
    return 0.045 * page->font;
}

void utw_page_point(const utw_page *page, const double p[2], double xy[2])
{
    xy[0] = page->frame.x0 + page->frame.scale * p[0];
    xy[1] = page->frame.y0 - page->frame.scale * p[1];
}

void utw_page_clear(utw_page *page)
{
    utw_labels_free(page->labels);
    page->labels = NULL;
}

/* The name of a section is not markup. Returns the end below. */
static double set_head(utw_canvas *c, const utw_request *q, const utw_page *page, int draw)
{
    const double inner = page->width - 2 * page->margin;
    utw_type title = utw_type_plain(1.2 * page->font), subject = utw_type_plain(page->font);
    title.bold = 1;
    title.markup = 0;
    subject.colour = utw_pale();
    double y = utw_flow_text(c, page->margin, page->margin, inner, q->title, &title, draw);
    y = utw_flow_text(c, page->margin, y, inner, q->subject, &subject, draw);
    return y + 0.9 * page->font;
}

static double set_notes(utw_canvas *c, const utw_request *q, const utw_page *page, double y,
                        int draw)
{
    const utw_type type = utw_type_small(page->font);
    return utw_flow_notes(c, page->margin, y, page->width - 2 * page->margin, q->notes, &type, draw,
                          utw_mark_sign);
}

/* Scale that fits the box into a width and a height less what is kept free; of the height at least
 * a part of the width is left, or else the page becomes taller than was asked for. */
static double fit(const utw_request *q, double f, double width, double height)
{
    const double w = fmax(width - (q->left + q->right) * f, f),
                 h = fmax(height - (q->top + q->bottom) * f, 0.3 * w);
    return fmin(w / (q->box[2] - q->box[0]), h / (q->box[3] - q->box[1]));
}

/* Where the drawing and the key lie; *y is moved below them. */
static void divide(const utw_request *q, utw_page *page, double foot, double *y)
{
    const double f = page->font, gap = 1.2 * f, inner = page->width - 2 * page->margin;
    const double tallest = q->tallest > 0 ? q->tallest : sqrt(2) * page->width;
    const double strip = q->no_scale ? 0 : 4.2 * f;
    const double free_height = tallest - *y - foot - strip - page->margin;
    const double bw = q->box[2] - q->box[0], bh = q->box[3] - q->box[1];
    double scale = fit(q, f, inner, free_height), beside, below;
    page->key_upright = 0;
    if (q->key_width > 0) {
        beside = fit(q, f, inner - q->key_width - gap, free_height);
        below = fit(q, f, inner, free_height - q->key_height - gap);
        /* the key beside must not stand taller than the drawing by much */
        const double tall = beside * bh + (q->top + q->bottom) * f;
        page->key_upright =
            q->key_width < 0.5 * inner && beside >= 0.93 * below && tall >= 0.7 * q->key_length;
        scale = page->key_upright ? beside : below;
    }
    const double side = page->key_upright ? q->key_width + gap : 0;
    const double w = scale * bw + (q->left + q->right) * f;
    double h = scale * bh + (q->top + q->bottom) * f;
    if (page->key_upright) h = fmax(h, fmin(q->key_length, 1.4 * h));
    const double x = page->margin + 0.5 * (inner - side - w);
    page->room = (utw_box){page->margin, *y, page->margin + inner - side, *y + h};
    const double spare = h - scale * bh - (q->top + q->bottom) * f;
    page->drawing.x0 = x + q->left * f;
    page->drawing.x1 = page->drawing.x0 + scale * bw;
    page->drawing.y0 = *y + q->top * f + 0.5 * spare;
    page->drawing.y1 = page->drawing.y0 + scale * bh;
    page->frame = (utw_frame){scale, page->drawing.x0 - scale * q->box[0],
                              page->drawing.y1 + scale * q->box[1]};
    if (page->key_upright)
        page->key = (utw_box){page->width - page->margin - q->key_width, *y,
                              page->width - page->margin, *y + h};
    *y += h + strip;
    if (q->key_width > 0 && !page->key_upright) {
        page->key = (utw_box){page->margin, *y, page->margin + inner, *y + q->key_height};
        *y += q->key_height + gap;
    }
}

utw_status utw_layout(utw_canvas *canvas, const utw_request *q, utw_page *page, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    memset(page, 0, sizeof *page);
    page->canvas = canvas;
    page->width = q->width;
    page->font = utw_font_size(q->width);
    page->margin = 1.2 * page->font;
    page->line = OUTLINE * utw_hairline(page);
    const double foot = set_notes(canvas, q, page, 0, 0);
    double y = set_head(canvas, q, page, 1);
    divide(q, page, foot, &y);
    if (q->wall > 0)
        page->line = fmin(page->line, fmax(OUTLINE_THIN * utw_hairline(page),
                                           OUTLINE_WALL * q->wall * page->frame.scale));
    if (!q->no_scale) {
        const utw_box strip = {page->room.x0, page->room.y1, page->room.x1,
                               page->room.y1 + 3.2 * page->font};
        utw_mark_axes_and_scale(page, strip, q->length_unit);
    }
    y = set_notes(canvas, q, page, y, 1);
    page->height = y + page->margin - 0.35 * page->font;
    utw_canvas_size(canvas, page->width, page->height);
    UTW_TRY(utw_canvas_status(canvas, err));
    UTW_TRY(utw_labels_create(page->width, page->height, &page->labels, err));
    int n;
    const utw_placed_text *placed = utw_canvas_placed(canvas, &n);
    for (int i = 0; i < n; i++) utw_labels_take_box(page->labels, placed[i].box);
    if (page->key.x1 > page->key.x0) utw_labels_take_box(page->labels, page->key);
    st = UTW_OK;
done:
    return st;
}
