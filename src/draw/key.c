/* SPDX-License-Identifier: GPL-3.0-or-later
 * The key of bands: upright beside the drawing, or lying below it. */
#include <math.h>
#include <string.h>

#include "draw/bands.h"

/* In sizes of the font. */
#define BAR        1.3  /* breadth of the scale */
#define TICK       0.35 /* from the scale to its numbers */
#define NAME       1.7  /* height of the name over the key */
#define BAND_LEAST 1.25 /* distance of numbers that do not crowd, upright */
#define BAND_MOST  2.4
#define BESIDE     0.8 /* least gap between numbers, lying */

static utw_type number_type(double f)
{
    utw_type type = utw_type_small(f);
    type.colour = utw_ink();
    type.markup = 0;
    return type;
}

static long count(const utw_bands *b)
{
    return b->ticks.last - b->ticks.first;
}

/* Widest number. */
static double widest(utw_canvas *c, const utw_bands *b, double f)
{
    const utw_type type = number_type(f);
    double most = 0;
    for (long k = b->ticks.first; k <= b->ticks.last; k++) {
        char text[64];
        utw_tick_text(&b->ticks, k, text, sizeof text);
        most = fmax(most, utw_canvas_measure(c, text, &type).width);
    }
    return most;
}

/* Name and unit in one line, or the unit below the name when the key is narrow. */
static void heading(const utw_bands *b, const char *name, char *text, size_t n)
{
    text[0] = '\0';
    strncat(text, name, n - 1);
    if (name[0] != '\0' && b->unit[0] != '\0') strncat(text, ", ", n - 1 - strlen(text));
    strncat(text, b->unit, n - 1 - strlen(text));
}

void utw_key_request(utw_canvas *c, const utw_bands *b, const char *name, utw_request *q)
{
    const double f = utw_font_size(q->width);
    char text[160];
    const utw_type type = utw_type_plain(f);
    heading(b, name, text, sizeof text);
    q->key_width =
        fmax((BAR + TICK) * f + widest(c, b, f), utw_canvas_measure(c, text, &type).width);
    q->key_length = (NAME + BAND_MOST * (double)count(b)) * f;
    q->key_height = (NAME + BAR + TICK + 1.2) * f;
}

/* Every how many levels a number fits, counted from 0 so that zero is told: 1, 2, 5, 10 ... */
static long spacing(double band, double least)
{
    static const long nice[] = {1, 2, 5, 10, 20, 50, 100};
    for (size_t i = 0; i < sizeof nice / sizeof *nice; i++)
        if ((double)nice[i] * band >= least) return nice[i];
    return 200;
}

static void frame(const utw_page *page, utw_box box)
{
    const utw_pen pen = {.width = utw_hairline(page), .colour = utw_ink()};
    utw_canvas_rectangle(page->canvas, box);
    utw_canvas_stroke(page->canvas, &pen);
}

static void tick(const utw_page *page, double x0, double y0, double x1, double y1)
{
    const utw_pen pen = {.width = utw_hairline(page), .colour = utw_ink()};
    utw_canvas_move(page->canvas, x0, y0);
    utw_canvas_line(page->canvas, x1, y1);
    utw_canvas_stroke(page->canvas, &pen);
}

static void draw_upright(const utw_page *page, const utw_bands *b)
{
    utw_canvas *c = page->canvas;
    const double f = page->font, x = page->key.x0, top = page->key.y0 + NAME * f;
    const double band = fmin(BAND_MOST * f, (page->key.y1 - 0.5 * f - top) / (double)count(b));
    const long every = spacing(band, BAND_LEAST * f);
    const utw_type type = number_type(f);
    for (long k = b->ticks.first; k <= b->ticks.last; k++) {
        const double y = top + band * (double)(b->ticks.last - k);
        char text[64];
        if (k < b->ticks.last) {
            /* over the bands above it: no seams */
            utw_canvas_rectangle(c, (utw_box){x, top, x + BAR * f, y});
            utw_canvas_fill(c, utw_band_colour(b, k), 1);
        }
        if (k % every != 0) continue;
        utw_tick_text(&b->ticks, k, text, sizeof text);
        tick(page, x + BAR * f, y, x + (BAR + 0.6 * TICK) * f, y);
        utw_canvas_text(c, x + (BAR + TICK) * f, y, 0, 0.5, text, &type);
    }
    frame(page, (utw_box){x, top, x + BAR * f, top + band * (double)count(b)});
}

static void draw_lying(const utw_page *page, const utw_bands *b)
{
    utw_canvas *c = page->canvas;
    const double f = page->font, number = widest(c, b, f);
    const double x = page->key.x0 + 0.5 * number, y = page->key.y0 + NAME * f;
    const double band = fmin(9 * f, (page->key.x1 - 0.5 * number - x) / (double)count(b));
    const double end = x + band * (double)count(b);
    const long every = spacing(band, number + BESIDE * f);
    const utw_type type = number_type(f);
    for (long k = b->ticks.first; k <= b->ticks.last; k++) {
        const double at = x + band * (double)(k - b->ticks.first);
        char text[64];
        if (k < b->ticks.last) {
            utw_canvas_rectangle(c, (utw_box){at, y, end, y + BAR * f});
            utw_canvas_fill(c, utw_band_colour(b, k), 1);
        }
        if (k % every != 0) continue;
        utw_tick_text(&b->ticks, k, text, sizeof text);
        tick(page, at, y + BAR * f, at, y + (BAR + 0.6 * TICK) * f);
        utw_canvas_text(c, at, y + (BAR + TICK + 0.2) * f, 0.5, 1, text, &type);
    }
    frame(page, (utw_box){x, y, end, y + BAR * f});
}

void utw_key_draw(const utw_page *page, const utw_bands *b, const char *name)
{
    const utw_type type = utw_type_plain(page->font);
    char text[160];
    heading(b, name, text, sizeof text);
    utw_canvas_text(page->canvas, page->key.x0, page->key.y0 + 1.0 * page->font, 0, 0, text, &type);
    if (page->key_upright)
        draw_upright(page, b);
    else
        draw_lying(page, b);
}
