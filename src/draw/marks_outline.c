/* SPDX-License-Identifier: GPL-3.0-or-later
 * Drawing the outline and the dimensions of its extent. */
#include <math.h>
#include <stdio.h>

#include "base/vec2.h"
#include "draw/marks.h"
#include "draw/mesh_paths.h"
#include "draw/ticks.h"

void utw_mark_outline_path(const utw_page *page, const utw_outline *o)
{
    for (int p = 0; p < o->n_part; p++)
        for (int l = 0; l < o->part[p].n_loop; l++) {
            const utw_loop *loop = &o->part[p].loop[l];
            double start[2];
            utw_page_point(page, loop->curve[0].from, start);
            utw_canvas_move(page->canvas, start[0], start[1]);
            for (int k = 0; k < loop->n; k++)
                utw_lay_curve(page->canvas, &page->frame, &loop->curve[k]);
            utw_canvas_close(page->canvas);
        }
}

/* Curves as chords that are short on the page. */
void utw_take_outline(const utw_page *page, const utw_outline *o)
{
    for (int p = 0; p < o->n_part; p++)
        for (int l = 0; l < o->part[p].n_loop; l++)
            for (int k = 0; k < o->part[p].loop[l].n; k++) {
                const utw_curve *curve = &o->part[p].loop[l].curve[k];
                const int n =
                    curve->kind == UTW_LINE ? 1 : 8 + (int)(24 * utw_curve_turning(curve));
                double q[2], a[2], b[2];
                utw_page_point(page, curve->from, a);
                for (int i = 1; i <= n; i++) {
                    utw_curve_point(curve, (double)i / n, q);
                    utw_page_point(page, q, b);
                    utw_labels_take_line(page->labels, a, b);
                    a[0] = b[0];
                    a[1] = b[1];
                }
            }
}

void utw_mark_outline(const utw_page *page, const utw_outline *o)
{
    const utw_pen pen = {.width = page->line, .colour = utw_ink()};
    utw_mark_outline_path(page, o);
    utw_canvas_stroke(page->canvas, &pen);
    utw_take_outline(page, o);
}

/* ---- dimensions -------------------------------------------------------------------------------
 */

/* Two arrows from the middle to both ends, when they fit beside the text. */
static void dimension_line(const utw_page *page, const double a[2], const double b[2],
                           const utw_pen *pen)
{
    const double middle[2] = {0.5 * (a[0] + b[0]), 0.5 * (a[1] + b[1])};
    utw_mark_arrow(page->canvas, middle, a, 0.7 * page->font, pen);
    utw_mark_arrow(page->canvas, middle, b, 0.7 * page->font, pen);
    utw_labels_take_line(page->labels, a, b);
}

static void extension(const utw_page *page, double x0, double y0, double x1, double y1,
                      const utw_pen *pen)
{
    utw_canvas_move(page->canvas, x0, y0);
    utw_canvas_line(page->canvas, x1, y1);
    utw_canvas_stroke(page->canvas, pen);
    utw_labels_take_line(page->labels, (const double[]){x0, y0}, (const double[]){x1, y1});
}

/* Text of a length, at (x, y) beside the middle of its dimension line. When it is longer than the
 * line it stands past the ends of the extension lines. */
static void dimension_text(const utw_page *page, double length, const char *unit, double x,
                           double y, double past, int upright)
{
    const double f = page->font;
    utw_type type = utw_type_small(f);
    char number[40], text[64];
    utw_number_text(length, 6, number, sizeof number);
    snprintf(text, sizeof text, "%s %s", number, unit);
    type.upright = upright;
    const double width = utw_canvas_measure(page->canvas, text, &type).width;
    const double off = width > length * page->frame.scale - 0.3 * f ? past + 0.35 * f : 0.35 * f;
    const utw_box box = upright ? utw_canvas_text(page->canvas, x - off, y, 0.5, 0, text, &type)
                                : utw_canvas_text(page->canvas, x, y + off, 0.5, 1, text, &type);
    utw_labels_take_box(page->labels, box);
}

void utw_mark_extent(const utw_page *page, const double box[4], const char *unit)
{
    const double f = page->font, off = 1.3 * f, past = 0.5 * f, gap = 0.5 * f;
    const utw_pen pen = {.width = utw_hairline(page), .colour = utw_pale()};
    double low[2], high[2];
    utw_page_point(page, box, low); /* y downward: low lies below */
    utw_page_point(page, box + 2, high);

    const double y = low[1] + off + gap;
    extension(page, low[0], low[1] + gap, low[0], y + past, &pen);
    extension(page, high[0], low[1] + gap, high[0], y + past, &pen);
    dimension_line(page, (const double[]){low[0], y}, (const double[]){high[0], y}, &pen);
    dimension_text(page, box[2] - box[0], unit, 0.5 * (low[0] + high[0]), y, past, 0);

    const double x = low[0] - off - gap;
    extension(page, low[0] - gap, low[1], x - past, low[1], &pen);
    extension(page, low[0] - gap, high[1], x - past, high[1], &pen);
    dimension_line(page, (const double[]){x, low[1]}, (const double[]){x, high[1]}, &pen);
    dimension_text(page, box[3] - box[1], unit, x, 0.5 * (low[1] + high[1]), past, 1);
}
