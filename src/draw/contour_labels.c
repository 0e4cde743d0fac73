/* SPDX-License-Identifier: GPL-3.0-or-later
 * Placing numbers at contour lines. */
#include "draw/contour_labels.h"

#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

/* All in sizes of the font. */
#define LABEL_SIZE 0.85 /* of the numbers */
#define APART      22.0 /* labels of one line */
#define STEP       0.5  /* of the search along a line */
#define SHORTEST   3.5  /* line that gets a label */
#define GAP        0.15 /* around a label on a line */
#define LEADER_MIN 0.45 /* from the end of a line to a label outside */
#define LEADER_MAX 1.5
#define OUTLINE    0.3 /* a leader begins on the outline */

typedef struct placer {
    const utw_page *page;
    const utw_bands *bands;
    utw_contour_labels *labels;
    long level;
    int id; /* of its contour in the raster */
    double width, height;
} placer;

static utw_type label_type(const utw_page *page)
{
    utw_type type = utw_type_plain(LABEL_SIZE * page->font);
    type.markup = 0;
    return type;
}

static utw_status add_label(placer *p, utw_box box, int outside, const double at[2], utw_error *err)
{
    utw_contour_labels *l = p->labels;
    void *block = l->label;
    if (utw_grow(&block, &l->capacity, (size_t)l->n + 1, sizeof *l->label) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    l->label = block;
    l->label[l->n++] = (utw_contour_label){p->level, box, outside, {at[0], at[1]}};
    utw_labels_take_box(p->page->labels, box);
    return UTW_OK;
}

static double path_length(const utw_paths *line, int k)
{
    double length = 0;
    for (int i = line->first[k]; i + 1 < utw_paths_end(line, k); i++)
        length += utw_distance(line->xy[i], line->xy[i + 1]);
    return length;
}

/* The point at distance s along path k. */
static void point_along(const utw_paths *line, int k, double s, double xy[2])
{
    const int end = utw_paths_end(line, k);
    int i = line->first[k];
    double piece = 0;
    for (; i + 1 < end; i++) {
        piece = utw_distance(line->xy[i], line->xy[i + 1]);
        if (s <= piece) break;
        s -= piece;
    }
    if (i + 1 >= end) {
        memcpy(xy, line->xy[end - 1], 2 * sizeof *xy);
        return;
    }
    const double t = piece > 0 ? s / piece : 0;
    for (int d = 0; d < 2; d++) xy[d] = line->xy[i][d] + t * (line->xy[i + 1][d] - line->xy[i][d]);
}

/* One label at the free place nearest to distance `aim` along the path, within `range`. */
static utw_status label_near(placer *p, const utw_paths *line, int k, double aim, double range,
                             int *placed, utw_error *err)
{
    const double f = p->page->font;
    for (double off = 0; off <= range; off += STEP * f)
        for (int side = 0; side < (off > 0 ? 2 : 1); side++) {
            double c[2];
            point_along(line, k, side == 0 ? aim - off : aim + off, c);
            const utw_box box = {c[0] - 0.5 * p->width, c[1] - 0.5 * p->height,
                                 c[0] + 0.5 * p->width, c[1] + 0.5 * p->height};
            if (!utw_labels_free_for(p->page->labels, box, GAP * f, p->id)) continue;
            ++*placed;
            return add_label(p, box, 0, c, err);
        }
    return UTW_OK;
}

/* As many labels as the length of the path wants, each near the middle of its share. */
static utw_status label_path(placer *p, const utw_paths *line, int k, int *placed, utw_error *err)
{
    const double f = p->page->font, length = path_length(line, k);
    utw_status st = UTW_OK;
    if (length < SHORTEST * f) return UTW_OK;
    const int n = 1 + (int)(length / (APART * f));
    for (int i = 0; i < n && st == UTW_OK; i++)
        st = label_near(p, line, k, (i + 0.5) * length / n, 0.4 * length / n, placed, err);
    return st;
}

/* The point of a box nearest to a point. */
static void nearest(const utw_box *box, const double at[2], double xy[2])
{
    xy[0] = fmin(fmax(at[0], box->x0), box->x1);
    xy[1] = fmin(fmax(at[1], box->y0), box->y1);
}

/* Beside one end of an open path, with a leader that meets nothing. */
static utw_status label_outside(placer *p, const utw_paths *line, int k, utw_error *err)
{
    const double f = p->page->font;
    if (line->closed[k]) return UTW_OK;
    for (int end = 0; end < 2; end++) {
        const double *at = line->xy[end == 0 ? line->first[k] : utw_paths_end(line, k) - 1];
        utw_box box;
        double to[2];
        if (!utw_labels_find(p->page->labels, at[0], at[1], p->width, p->height, LEADER_MIN * f,
                             LEADER_MAX * f, GAP * f, &box))
            continue;
        nearest(&box, at, to);
        if (!utw_labels_free_line(p->page->labels, at, to, OUTLINE * f)) continue;
        utw_labels_take_line(p->page->labels, at, to);
        return add_label(p, box, 1, at, err);
    }
    return UTW_OK;
}

static utw_status label_level(placer *p, const utw_paths *line, utw_error *err)
{
    utw_status st = UTW_OK;
    char text[64];
    const utw_type type = label_type(p->page);
    utw_tick_text(&p->bands->ticks, p->level, text, sizeof text);
    const utw_text_size size = utw_canvas_measure(p->page->canvas, text, &type);
    p->width = size.width + 0.3 * type.size;
    p->height = size.above + size.below + 0.3 * type.size;
    for (int k = 0; k < line->n_path && st == UTW_OK; k++) {
        int placed = 0;
        st = label_path(p, line, k, &placed, err);
        if (st == UTW_OK && placed == 0) st = label_outside(p, line, k, err);
    }
    return st;
}

utw_status utw_contour_labels_place(const utw_page *page, const utw_bands *b, const utw_paths *line,
                                    utw_contour_labels *labels, utw_error *err)
{
    utw_status st = UTW_OK;
    const long first = b->ticks.first, last = b->ticks.last;
    for (long k = first; k <= last; k++)
        utw_labels_take_contour(page->labels, &line[k - first], (int)(k - first) + 1);
    /* zero first, then outward: where room is short the middle levels are told */
    const long reach = labs(first) > labs(last) ? labs(first) : labs(last);
    for (long size = 0; size <= reach; size++)
        for (int sign = 1; sign >= (size == 0 ? 1 : -1) && st == UTW_OK; sign -= 2) {
            const long k = sign * size;
            if (k < first || k > last) continue;
            placer p = {page, b, labels, k, (int)(k - first) + 1, 0, 0};
            st = label_level(&p, &line[k - first], err);
        }
    return st;
}

void utw_contour_labels_set(const utw_page *page, const utw_bands *b,
                            const utw_contour_labels *labels)
{
    utw_type type = label_type(page);
    const utw_pen leader = {.width = utw_hairline(page), .colour = utw_pale()};
    for (int i = 0; i < labels->n; i++) {
        const utw_contour_label *l = &labels->label[i];
        const double value = (double)l->level * b->ticks.step / b->most;
        char text[64];
        utw_tick_text(&b->ticks, l->level, text, sizeof text);
        const utw_text_size size = utw_canvas_measure(page->canvas, text, &type);
        if (l->outside) {
            double to[2];
            nearest(&l->box, l->at, to);
            utw_canvas_move(page->canvas, l->at[0], l->at[1]);
            utw_canvas_line(page->canvas, to[0], to[1]);
            utw_canvas_stroke(page->canvas, &leader);
        }
        type.colour = l->outside ? utw_ink()
                                 : utw_colour_on(b->is_signed ? utw_colour_signed(value)
                                                              : utw_colour_magnitude(value));
        const double middle = 0.5 * (l->box.y0 + l->box.y1);
        utw_canvas_text(page->canvas, 0.5 * (l->box.x0 + l->box.x1),
                        middle + 0.5 * (size.above - size.below), 0.5, 0, text, &type);
    }
}

void utw_contour_labels_clear(utw_contour_labels *labels)
{
    utw_free(labels->label);
    memset(labels, 0, sizeof *labels);
}
