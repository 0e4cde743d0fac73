/* SPDX-License-Identifier: GPL-3.0-or-later
 * Filled contours. */
#include "draw/bands.h"

#include <math.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "draw/contour_labels.h"
#include "draw/gaps.h"
#include "draw/marks.h"

/* Points of a contour nearer than this to a straight line are not seen [font sizes]. */
#define TOLERANCE 0.003

utw_bands utw_bands_of(double low, double high, int is_signed, int most, const char *unit)
{
    utw_bands b;
    memset(&b, 0, sizeof b);
    b.is_signed = is_signed;
    if (!is_signed) low = 0;
    if (!(high > low)) { /* nothing varies: one step about the value */
        const double half = high != 0 ? 0.5 * fabs(high) : 1;
        low -= is_signed ? half : 0;
        high = low + 2 * half;
    }
    b.ticks = utw_ticks_of(low, high, most);
    b.most = fmax(fabs((double)b.ticks.first), fabs((double)b.ticks.last)) * b.ticks.step;
    utw_ticks_unit(&b.ticks, unit, b.unit, sizeof b.unit);
    return b;
}

utw_colour utw_band_colour(const utw_bands *b, long k)
{
    const double value = ((double)k + 0.5) * b->ticks.step / b->most;
    return b->is_signed ? utw_colour_signed(value) : utw_colour_magnitude(value);
}

/* ---- the field --------------------------------------------------------------------------------
 */

static void lay_paths(utw_canvas *c, const utw_paths *p)
{
    for (int k = 0; k < p->n_path; k++) {
        const int first = p->first[k];
        utw_canvas_move(c, p->xy[first][0], p->xy[first][1]);
        for (int i = first + 1; i < utw_paths_end(p, k); i++)
            utw_canvas_line(c, p->xy[i][0], p->xy[i][1]);
        if (p->closed[k]) utw_canvas_close(c);
    }
}

/* Lines are dark on light colours and light on dark ones. */
static utw_pen line_pen(const utw_page *page, const utw_bands *b, long k)
{
    const double value = (double)k * b->ticks.step / b->most;
    const utw_colour ground = b->is_signed ? utw_colour_signed(value) : utw_colour_magnitude(value);
    return (utw_pen){.width = utw_hairline(page) * (k == 0 ? 2.2 : 1),
                     .colour = utw_colour_on(ground)};
}

/* From the lowest band upward, each region over the one before: no seams between bands. The lines
 * are kept in line[k - first]. */
static utw_status fill_bands(const utw_page *page, const utw_bands *b, const utw_sampling *s,
                             const double *value, const utw_outline *outline, utw_paths *line,
                             utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double tolerance = TOLERANCE * page->font;
    utw_paths region = {0};
    utw_mark_outline_path(page, outline);
    utw_canvas_fill(page->canvas, utw_band_colour(b, b->ticks.first), 1);
    for (long k = b->ticks.first + 1; k < b->ticks.last + b->open_above; k++) {
        utw_paths_clear(&region);
        UTW_TRY(utw_contour(s, value, (double)k * b->ticks.step, tolerance, &region,
                            &line[k - b->ticks.first], err));
        if (region.n_path == 0) continue;
        lay_paths(page->canvas, &region);
        utw_canvas_fill(page->canvas, utw_band_colour(b, k), 1);
    }
    st = UTW_OK;
done:
    utw_paths_clear(&region);
    return st;
}

/* Lines are not drawn under their labels and the letters of points. */
static utw_status stroke_lines(const utw_page *page, const utw_bands *b, const utw_paths *line,
                               const utw_contour_labels *labels, const utw_points *points,
                               utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_box *box = NULL;
    int n = 0;
    UTW_TRY_ALLOC(box = utw_alloc((size_t)(labels->n + points->n_label), sizeof *box));
    for (int i = 0; i < labels->n; i++) box[n++] = labels->label[i].box;
    for (int i = 0; i < points->n_label; i++) box[n++] = points->label[i].box;
    for (long k = b->ticks.first + 1; k < b->ticks.last + b->open_above; k++) {
        const utw_pen pen = line_pen(page, b, k);
        if (line[k - b->ticks.first].n_path == 0) continue;
        utw_lay_with_gaps(page->canvas, &line[k - b->ticks.first], n, box);
        utw_canvas_stroke(page->canvas, &pen);
    }
    st = UTW_OK;
done:
    utw_free(box);
    return st;
}

utw_status utw_bands_draw(const utw_page *page, const utw_bands *b, const utw_sampling *s,
                          const double *value, const utw_outline *outline, int n_mark,
                          const utw_point_mark *mark, int lines, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const long n = b->ticks.last - b->ticks.first + 2;
    utw_paths *line = NULL;
    utw_contour_labels labels = {0};
    utw_points points;
    UTW_TRY_ALLOC(line = utw_alloc((size_t)n, sizeof *line));
    UTW_TRY(fill_bands(page, b, s, value, outline, line, err));
    utw_mark_outline(page, outline);
    utw_points_place(page, n_mark, mark, &points);
    if (lines) {
        UTW_TRY(utw_contour_labels_place(page, b, line, &labels, err));
        UTW_TRY(stroke_lines(page, b, line, &labels, &points, err));
        utw_contour_labels_set(page, b, &labels);
    }
    utw_points_draw(page, &points);
    st = UTW_OK;
done:
    for (long i = 0; line != NULL && i < n; i++) utw_paths_clear(&line[i]);
    utw_free(line);
    utw_contour_labels_clear(&labels);
    return st;
}
