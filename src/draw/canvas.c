/* SPDX-License-Identifier: GPL-3.0-or-later
 * The list of what is on the page. */
#include "draw/canvas.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "draw/canvas_list.h"

utw_status utw_canvas_create(utw_canvas **canvas, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_canvas *c = NULL;
    UTW_TRY_ALLOC(c = utw_alloc(1, sizeof *c));
    UTW_TRY_ALLOC(c->gauge = utw_gauge_create());
    *canvas = c;
    c = NULL;
    st = UTW_OK;
done:
    utw_canvas_free(c);
    return st;
}

void utw_canvas_free(utw_canvas *c)
{
    if (c == NULL) return;
    for (size_t i = 0; i < c->n_text; i++) utw_free(c->text[i].text);
    for (size_t i = 0; i < c->n_image; i++) utw_free(c->image[i].pixel);
    utw_free(c->segment);
    utw_free(c->step);
    utw_free(c->text);
    utw_free(c->placed);
    utw_free(c->image);
    utw_gauge_free(c->gauge);
    utw_free(c);
}

void utw_canvas_size(utw_canvas *c, double width, double height)
{
    c->width = width;
    c->height = height;
}

utw_status utw_canvas_status(const utw_canvas *c, utw_error *err)
{
    if (!c->out_of_memory) return UTW_OK;
    return utw_fail(err, UTW_E_NOMEM, "out of memory (drawing)");
}

/* Room for one more element of an array; 0 when there is none. */
static int room(utw_canvas *c, void *array, size_t *capacity, size_t n, size_t size)
{
    void *block;
    if (c->out_of_memory) return 0;
    memcpy(&block, array, sizeof block);
    if (utw_grow(&block, capacity, n + 1, size) != 0) {
        c->out_of_memory = 1;
        return 0;
    }
    memcpy(array, &block, sizeof block);
    return 1;
}

/* ---- paths ---------------------------------------------------------------------------------- */

static void add_segment(utw_canvas *c, utw_verb verb, int n, const double *v)
{
    if (!room(c, &c->segment, &c->segment_capacity, c->n_segment, sizeof *c->segment)) return;
    utw_segment *s = &c->segment[c->n_segment++];
    memset(s, 0, sizeof *s);
    s->verb = verb;
    for (int i = 0; i < n; i++) s->v[i] = v[i];
}

void utw_canvas_move(utw_canvas *c, double x, double y)
{
    add_segment(c, UTW_MOVE, 2, (const double[]){x, y});
}

void utw_canvas_line(utw_canvas *c, double x, double y)
{
    add_segment(c, UTW_LINE_TO, 2, (const double[]){x, y});
}

void utw_canvas_cubic(utw_canvas *c, double x1, double y1, double x2, double y2, double x, double y)
{
    add_segment(c, UTW_CUBIC_TO, 6, (const double[]){x1, y1, x2, y2, x, y});
}

void utw_canvas_close(utw_canvas *c)
{
    add_segment(c, UTW_CLOSE, 0, NULL);
}

void utw_canvas_circle(utw_canvas *c, double x, double y, double r)
{
    add_segment(c, UTW_CIRCLE, 3, (const double[]){x, y, r});
}

void utw_canvas_rectangle(utw_canvas *c, utw_box b)
{
    utw_canvas_move(c, b.x0, b.y0);
    utw_canvas_line(c, b.x1, b.y0);
    utw_canvas_line(c, b.x1, b.y1);
    utw_canvas_line(c, b.x0, b.y1);
    utw_canvas_close(c);
}

/* ---- steps ---------------------------------------------------------------------------------- */

/* A step that takes the current path. */
static utw_step *add_step(utw_canvas *c, utw_act act)
{
    if (!room(c, &c->step, &c->step_capacity, c->n_step, sizeof *c->step)) return NULL;
    utw_step *s = &c->step[c->n_step++];
    memset(s, 0, sizeof *s);
    s->act = act;
    s->first = c->path;
    s->n = c->n_segment - c->path;
    c->path = c->n_segment;
    return s;
}

void utw_canvas_fill(utw_canvas *c, utw_colour colour, double opacity)
{
    utw_step *s = add_step(c, UTW_FILL);
    if (s == NULL) return;
    s->pen.colour = colour;
    s->opacity = opacity;
}

void utw_canvas_stroke(utw_canvas *c, const utw_pen *pen)
{
    utw_step *s = add_step(c, UTW_STROKE);
    if (s != NULL) s->pen = *pen;
}

void utw_canvas_clip(utw_canvas *c)
{
    add_step(c, UTW_CLIP);
}

void utw_canvas_unclip(utw_canvas *c)
{
    add_step(c, UTW_UNCLIP);
}

void utw_canvas_image(utw_canvas *c, utw_box box, int nx, int ny, const unsigned *pixel)
{
    if (!room(c, &c->image, &c->image_capacity, c->n_image, sizeof *c->image)) return;
    unsigned *copy = utw_alloc((size_t)nx * (size_t)ny, sizeof *copy);
    if (copy == NULL) {
        c->out_of_memory = 1;
        return;
    }
    memcpy(copy, pixel, (size_t)nx * (size_t)ny * sizeof *copy);
    c->image[c->n_image] = (utw_image_item){box, nx, ny, copy};
    utw_step *s = add_step(c, UTW_IMAGE);
    if (s != NULL) s->item = (int)c->n_image;
    c->n_image++;
}

/* ---- text ----------------------------------------------------------------------------------- */

utw_text_size utw_canvas_measure(utw_canvas *c, const char *text, const utw_type *type)
{
    return utw_gauge_measure(c->gauge, text, type);
}

/* Where the base line begins, and the box. */
static utw_box place(utw_canvas *c, double x, double y, double across, double up, const char *text,
                     const utw_type *type, double start[2])
{
    const utw_text_size size = utw_canvas_measure(c, text, type);
    const double back = across * size.width, down = up * UTW_CAPITAL * type->size;
    if (type->upright) { /* along the line is up the page, down from it is to the right */
        start[0] = x + down;
        start[1] = y + back;
        return (utw_box){start[0] - size.above, start[1] - size.width, start[0] + size.below,
                         start[1]};
    }
    start[0] = x - back;
    start[1] = y + down;
    return (utw_box){start[0], start[1] - size.above, start[0] + size.width, start[1] + size.below};
}

utw_box utw_canvas_text_box(utw_canvas *c, double x, double y, double across, double up,
                            const char *text, const utw_type *type)
{
    double start[2];
    return place(c, x, y, across, up, text, type, start);
}

utw_box utw_canvas_text(utw_canvas *c, double x, double y, double across, double up,
                        const char *text, const utw_type *type)
{
    double start[2];
    const utw_box box = place(c, x, y, across, up, text, type, start);
    if (text[0] == '\0') return box;
    if (!room(c, &c->text, &c->text_capacity, c->n_text, sizeof *c->text) ||
        !room(c, &c->placed, &c->placed_capacity, c->n_text, sizeof *c->placed))
        return box;
    char *copy = utw_copy_string(text);
    if (copy == NULL) {
        c->out_of_memory = 1;
        return box;
    }
    c->text[c->n_text] = (utw_text_item){copy, *type, start[0], start[1]};
    c->placed[c->n_text] = (utw_placed_text){box, copy};
    utw_step *s = add_step(c, UTW_TEXT);
    if (s != NULL) s->item = (int)c->n_text;
    c->n_text++;
    return box;
}

const utw_placed_text *utw_canvas_placed(const utw_canvas *c, int *n)
{
    *n = (int)c->n_text;
    return c->placed;
}
