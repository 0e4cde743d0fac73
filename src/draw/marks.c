/* SPDX-License-Identifier: GPL-3.0-or-later
 * Drawing signs. */
#include "draw/marks.h"

#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/vec2.h"
#include "draw/ticks.h"

static void polygon(utw_canvas *c, int n, const double (*p)[2])
{
    for (int i = 0; i < n; i++)
        i == 0 ? utw_canvas_move(c, p[i][0], p[i][1]) : utw_canvas_line(c, p[i][0], p[i][1]);
    utw_canvas_close(c);
}

static void centroid(utw_canvas *c, double x, double y, double r, const utw_pen *pen)
{
    const double k = 0.5522847498 * r; /* a quarter circle as a cubic */
    utw_canvas_circle(c, x, y, r);
    utw_canvas_fill(c, utw_white(), 1);
    utw_canvas_move(c, x, y);
    utw_canvas_line(c, x + r, y);
    utw_canvas_cubic(c, x + r, y - k, x + k, y - r, x, y - r);
    utw_canvas_close(c);
    utw_canvas_move(c, x, y);
    utw_canvas_line(c, x - r, y);
    utw_canvas_cubic(c, x - r, y + k, x - k, y + r, x, y + r);
    utw_canvas_close(c);
    utw_canvas_fill(c, pen->colour, 1);
    utw_canvas_circle(c, x, y, r);
    utw_canvas_stroke(c, pen);
}

void utw_mark_sign(utw_canvas *c, int sign, double x, double y, double size)
{
    const double r = 0.42 * size;
    utw_pen pen = {.width = 0.09 * size, .colour = utw_ink()};
    switch (sign) {
    case UTW_SIGN_CENTROID:
        centroid(c, x, y, 0.9 * r, &pen);
        break;
    case UTW_SIGN_SHEAR_CENTRE: {
        const double d = 1.25 * r, p[4][2] = {{x, y - d}, {x + d, y}, {x, y + d}, {x - d, y}};
        pen.colour = utw_accent();
        pen.width *= 1.5;
        polygon(c, 4, p);
        utw_canvas_fill(c, utw_white(), 1);
        polygon(c, 4, p);
        utw_canvas_stroke(c, &pen);
        utw_canvas_circle(c, x, y, 0.28 * r);
        utw_canvas_fill(c, pen.colour, 1);
        break;
    }
    case UTW_SIGN_FLEXURE: {
        const double p[3][2] = {{x, y - 1.1 * r}, {x + r, y + 0.7 * r}, {x - r, y + 0.7 * r}};
        pen.colour = utw_second();
        polygon(c, 3, p);
        utw_canvas_fill(c, utw_white(), 0.6);
        polygon(c, 3, p);
        utw_canvas_stroke(c, &pen);
        break;
    }
    case UTW_SIGN_ORIGIN:
        pen.width *= 0.8;
        pen.colour = utw_pale();
        utw_canvas_circle(c, x, y, 0.5 * r);
        utw_canvas_stroke(c, &pen);
        utw_canvas_move(c, x - 1.3 * r, y);
        utw_canvas_line(c, x + 1.3 * r, y);
        utw_canvas_move(c, x, y - 1.3 * r);
        utw_canvas_line(c, x, y + 1.3 * r);
        utw_canvas_stroke(c, &pen);
        break;
    case UTW_SIGN_LOAD:
        pen.colour = utw_accent();
        utw_canvas_circle(c, x, y, r);
        utw_canvas_fill(c, utw_white(), 0.8);
        utw_canvas_circle(c, x, y, r);
        utw_canvas_stroke(c, &pen);
        utw_canvas_circle(c, x, y, 0.55 * r);
        utw_canvas_fill(c, utw_accent(), 1);
        break;
    case UTW_SIGN_CORNER:
        pen.colour = utw_accent();
        utw_canvas_circle(c, x, y, 0.6 * r);
        utw_canvas_stroke(c, &pen);
        break;
    case UTW_SIGN_AXIS:
        pen.width *= 0.8;
        utw_canvas_move(c, x - 1.4 * r, y);
        utw_canvas_line(c, x - 0.5 * r, y);
        utw_canvas_move(c, x - 0.05 * r, y);
        utw_canvas_line(c, x + 0.05 * r, y);
        utw_canvas_move(c, x + 0.5 * r, y);
        utw_canvas_line(c, x + 1.4 * r, y);
        utw_canvas_stroke(c, &pen);
        break;
    case UTW_SIGN_LEAST:
    case UTW_SIGN_GREATEST: {
        const double d = sign == UTW_SIGN_LEAST ? -1 : 1;
        const double p[3][2] = {
            {x, y - 0.9 * d * r}, {x + 0.8 * r, y + 0.6 * d * r}, {x - 0.8 * r, y + 0.6 * d * r}};
        polygon(c, 3, p);
        utw_canvas_fill(c, utw_white(), 1);
        polygon(c, 3, p);
        utw_canvas_stroke(c, &pen);
        break;
    }
    default:
        break;
    }
}

void utw_mark_arrow(utw_canvas *c, const double a[2], const double b[2], double head,
                    const utw_pen *pen)
{
    const double length = utw_distance(a, b);
    if (!(length > 0)) return;
    head = fmin(head, length);
    const double d[2] = {(b[0] - a[0]) / length, (b[1] - a[1]) / length};
    const double neck[2] = {b[0] - head * d[0], b[1] - head * d[1]}, half = 0.3 * head;
    const double p[3][2] = {{b[0], b[1]},
                            {neck[0] - half * d[1], neck[1] + half * d[0]},
                            {neck[0] + half * d[1], neck[1] - half * d[0]}};
    utw_canvas_move(c, a[0], a[1]);
    utw_canvas_line(c, neck[0] + 0.2 * head * d[0], neck[1] + 0.2 * head * d[1]);
    utw_canvas_stroke(c, pen);
    polygon(c, 3, p);
    utw_canvas_fill(c, pen->colour, 1);
}

/* ---- axes and scale bar -----------------------------------------------------------------------
 */

static void axes(const utw_page *page, double x, double y)
{
    utw_canvas *c = page->canvas;
    const double f = page->font, length = 1.9 * f;
    const utw_pen pen = {.width = 1.5 * utw_hairline(page), .colour = utw_pale()};
    const utw_type type = {.size = 0.92 * f, .colour = utw_pale(), .italic = 1};
    utw_mark_arrow(c, (const double[]){x, y}, (const double[]){x + length, y}, 0.6 * f, &pen);
    utw_mark_arrow(c, (const double[]){x, y}, (const double[]){x, y - length}, 0.6 * f, &pen);
    utw_canvas_text(c, x + length + 0.3 * f, y, 0, 0.5, "x", &type);
    utw_canvas_text(c, x + 0.35 * f, y - length, 0, 0.6, "y", &type);
}

/* Two fields, one filled, with their ends labelled. */
static void scale_bar(const utw_page *page, double x, double y, double room, const char *unit)
{
    utw_canvas *c = page->canvas;
    const double f = page->font, thick = 0.38 * f;
    const utw_type type = utw_type_small(f);
    char number[40], text[60];
    double length = utw_round_length(fmin(0.3 * page->width, 0.55 * room) / page->frame.scale);
    const double mm = length * page->frame.scale;
    const utw_box whole = {x, y - thick, x + mm, y}, half = {x, y - thick, x + 0.5 * mm, y};
    const utw_pen pen = {.width = utw_hairline(page), .colour = utw_ink()};
    utw_canvas_rectangle(c, half);
    utw_canvas_fill(c, utw_ink(), 1);
    utw_canvas_rectangle(c, whole);
    utw_canvas_stroke(c, &pen);
    utw_number_text(length, 3, number, sizeof number);
    snprintf(text, sizeof text, "%s%s%s", number, unit[0] == '\0' ? "" : " ", unit);
    utw_canvas_text(c, x + mm + 0.5 * f, y, 0, 0, text, &type);
}

void utw_mark_axes_and_scale(const utw_page *page, utw_box strip, const char *unit)
{
    const double f = page->font, x = strip.x0 + 0.3 * f, y = strip.y1 - 0.6 * f;
    const double start = x + 4.6 * f;
    axes(page, x, y);
    scale_bar(page, start, y, strip.x1 - start, unit);
}
