/* SPDX-License-Identifier: GPL-3.0-or-later
 * Points of the section and their letters. */
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/vec2.h"
#include "draw/marks.h"

/* In sizes of the font: points nearer than this share a label; half the size of a sign; from the
 * sign to the letter. */
#define TOGETHER 0.6
#define HALF     0.55
#define NEAR     0.75
#define FAR      5.0

static utw_type letter_type(const utw_page *page)
{
    utw_type type = utw_type_plain(page->font);
    type.bold = 1;
    return type;
}

/* The letters of all points together with point i, which is the first of them. Returns 0 when it is
 * not, or has none. */
static int letters_of(const utw_page *page, int n, const utw_point_mark *mark,
                      const utw_points *points, int i, char *text, size_t size)
{
    text[0] = '\0';
    for (int j = 0; j < n; j++) {
        if (utw_distance(points->point[i].xy, points->point[j].xy) > TOGETHER * page->font ||
            mark[j].letter[0] == '\0')
            continue;
        if (j < i) return 0;
        const size_t used = strlen(text);
        snprintf(text + used, size - used, "%s%s", used > 0 ? ", " : "", mark[j].letter);
    }
    return text[0] != '\0';
}

void utw_points_place(const utw_page *page, int n, const utw_point_mark *mark, utw_points *points)
{
    const double f = page->font;
    const utw_type type = letter_type(page);
    memset(points, 0, sizeof *points);
    points->n = n = n > UTW_POINTS_MAX ? UTW_POINTS_MAX : n;
    for (int i = 0; i < n; i++) {
        double *xy = points->point[i].xy;
        points->point[i].sign = mark[i].sign;
        utw_page_point(page, mark[i].at, xy);
        utw_labels_take_box(page->labels, (utw_box){xy[0] - HALF * f, xy[1] - HALF * f,
                                                    xy[0] + HALF * f, xy[1] + HALF * f});
    }
    for (int i = 0; i < n; i++) {
        char *text = points->label[points->n_label].text;
        utw_box *box = &points->label[points->n_label].box;
        if (!letters_of(page, n, mark, points, i, text, sizeof points->label[0].text)) continue;
        const utw_text_size size = utw_canvas_measure(page->canvas, text, &type);
        const double *xy = points->point[i].xy;
        if (!utw_labels_find(page->labels, xy[0], xy[1], size.width + 0.3 * f,
                             size.above + size.below + 0.2 * f, NEAR * f, FAR * f, 0.1 * f, box))
            continue;
        utw_labels_take_box(page->labels, *box);
        points->n_label++;
    }
}

void utw_points_draw(const utw_page *page, const utw_points *points)
{
    const utw_type type = letter_type(page);
    const double f = page->font;
    /* the last sign is drawn first, so that the first one lies on top; wide ones show below */
    for (int i = points->n - 1; i >= 0; i--)
        utw_mark_sign(page->canvas, points->point[i].sign, points->point[i].xy[0],
                      points->point[i].xy[1], f);
    for (int i = 0; i < points->n_label; i++) {
        const utw_box *box = &points->label[i].box;
        const char *text = points->label[i].text;
        const utw_text_size size = utw_canvas_measure(page->canvas, text, &type);
        utw_canvas_rectangle(page->canvas, *box);
        utw_canvas_fill(page->canvas, utw_white(), 0.7);
        utw_canvas_text(page->canvas, 0.5 * (box->x0 + box->x1),
                        0.5 * (box->y0 + box->y1 + size.above - size.below), 0.5, 0, text, &type);
    }
}
