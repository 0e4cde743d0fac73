/* SPDX-License-Identifier: GPL-3.0-or-later
 * Measuring text and writing a canvas through cairo: the only file of the library that names it. */
#include <cairo-pdf.h>
#include <cairo-svg.h>
#include <cairo.h>
#include <math.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "draw/bytes.h"
#include "draw/canvas.h"
#include "draw/canvas_list.h"
#include "draw/png.h"

/* Small letters of markup: their size and how far they are lowered or raised, over the size of the
 * font. */
#define SMALL   0.72
#define LOWERED 0.16
#define RAISED  0.36

#define PIXELS_MAX 1.5e8

/* Text is the same on every output: no hinting. */
static void set_font(cairo_t *cr, const utw_type *type)
{
    cairo_font_options_t *options = cairo_font_options_create();
    cairo_font_options_set_hint_style(options, CAIRO_HINT_STYLE_NONE);
    cairo_font_options_set_hint_metrics(options, CAIRO_HINT_METRICS_OFF);
    cairo_font_options_set_antialias(options, CAIRO_ANTIALIAS_GRAY);
    cairo_set_font_options(cr, options);
    cairo_font_options_destroy(options);
    cairo_select_font_face(cr, "sans-serif",
                           type->italic ? CAIRO_FONT_SLANT_ITALIC : CAIRO_FONT_SLANT_NORMAL,
                           type->bold ? CAIRO_FONT_WEIGHT_BOLD : CAIRO_FONT_WEIGHT_NORMAL);
}

/* ---- runs of one size -------------------------------------------------------------------------
 */

typedef struct run {
    char text[256];
    double size, shift; /* shift: below the base line */
} run;

/* Take the next run from *text. Returns 0 at the end. Runs longer than the buffer are cut in two at
 * a character's first byte. */
static int next_run(const char **text, const utw_type *type, run *r)
{
    const char *s = *text;
    size_t n = 0;
    char stop = '\0';
    if (*s == '\0') return 0;
    r->size = type->size;
    r->shift = 0;
    if (type->markup && (s[0] == '_' || s[0] == '^') && s[1] == '{') {
        r->size = SMALL * type->size;
        r->shift = (s[0] == '_' ? LOWERED : -RAISED) * type->size;
        stop = '}';
        s += 2;
    }
    while (*s != '\0' && *s != stop) {
        if (stop == '\0' && type->markup && (s[0] == '_' || s[0] == '^') && s[1] == '{') break;
        if (n + 4 >= sizeof r->text && ((unsigned char)*s & 0xC0) != 0x80) break;
        r->text[n++] = *s++;
    }
    if (stop != '\0' && *s == stop) s++;
    r->text[n] = '\0';
    *text = s;
    return 1;
}

struct utw_gauge {
    cairo_surface_t *surface;
    cairo_t *cr;
};

struct utw_gauge *utw_gauge_create(void)
{
    struct utw_gauge *g = utw_alloc(1, sizeof *g);
    if (g == NULL) return NULL;
    g->surface = cairo_image_surface_create(CAIRO_FORMAT_A8, 1, 1);
    g->cr = cairo_create(g->surface);
    cairo_scale(g->cr, 100, 100); /* fonts of a few pixels would be measured coarsely */
    if (cairo_status(g->cr) == CAIRO_STATUS_SUCCESS) return g;
    utw_gauge_free(g);
    return NULL;
}

void utw_gauge_free(struct utw_gauge *g)
{
    if (g == NULL) return;
    cairo_destroy(g->cr);
    cairo_surface_destroy(g->surface);
    utw_free(g);
}

utw_text_size utw_gauge_measure(struct utw_gauge *g, const char *text, const utw_type *type)
{
    utw_text_size size = {0, UTW_CAPITAL * type->size, 0};
    run r;
    set_font(g->cr, type);
    while (next_run(&text, type, &r)) {
        cairo_text_extents_t e;
        cairo_set_font_size(g->cr, r.size);
        cairo_text_extents(g->cr, r.text, &e);
        size.above = fmax(size.above, -e.y_bearing - r.shift);
        size.below = fmax(size.below, e.y_bearing + e.height + r.shift);
        size.width += e.x_advance;
    }
    return size;
}

/* ---- replay ---------------------------------------------------------------------------------- */

static void set_colour(cairo_t *cr, utw_colour c, double opacity)
{
    cairo_set_source_rgba(cr, c.r, c.g, c.b, opacity);
}

static void lay_path(cairo_t *cr, const utw_canvas *c, const utw_step *s)
{
    cairo_new_path(cr);
    for (size_t i = s->first; i < s->first + s->n; i++) {
        const double *v = c->segment[i].v;
        switch (c->segment[i].verb) {
        case UTW_MOVE:
            cairo_move_to(cr, v[0], v[1]);
            break;
        case UTW_LINE_TO:
            cairo_line_to(cr, v[0], v[1]);
            break;
        case UTW_CUBIC_TO:
            cairo_curve_to(cr, v[0], v[1], v[2], v[3], v[4], v[5]);
            break;
        case UTW_CLOSE:
            cairo_close_path(cr);
            break;
        case UTW_CIRCLE:
            cairo_new_sub_path(cr);
            cairo_arc(cr, v[0], v[1], v[2], 0, 2 * UTW_PI);
            cairo_close_path(cr);
            break;
        }
    }
}

static void stroke(cairo_t *cr, const utw_pen *pen)
{
    const int n = pen->dash[0] <= 0 ? 0 : pen->dash[2] <= 0 ? 2 : 4;
    set_colour(cr, pen->colour, 1);
    cairo_set_line_width(cr, pen->width);
    cairo_set_line_cap(cr, pen->butt ? CAIRO_LINE_CAP_BUTT : CAIRO_LINE_CAP_ROUND);
    cairo_set_line_join(cr, CAIRO_LINE_JOIN_ROUND);
    cairo_set_dash(cr, pen->dash, n, 0);
    cairo_stroke(cr);
}

static void show_text(cairo_t *cr, const utw_text_item *item)
{
    const char *text = item->text;
    run r;
    cairo_save(cr);
    set_font(cr, &item->type);
    set_colour(cr, item->type.colour, 1);
    cairo_translate(cr, item->x, item->y);
    if (item->type.upright) cairo_rotate(cr, -UTW_PI / 2);
    double x = 0;
    while (next_run(&text, &item->type, &r)) {
        cairo_text_extents_t e;
        cairo_set_font_size(cr, r.size);
        cairo_text_extents(cr, r.text, &e);
        cairo_move_to(cr, x, r.shift);
        cairo_show_text(cr, r.text);
        x += e.x_advance;
    }
    cairo_restore(cr);
}

static void show_image(cairo_t *cr, const utw_image_item *item)
{
    const int stride = item->nx * (int)sizeof *item->pixel;
    cairo_surface_t *image = cairo_image_surface_create_for_data(
        (unsigned char *)item->pixel, CAIRO_FORMAT_ARGB32, item->nx, item->ny, stride);
    cairo_save(cr);
    cairo_translate(cr, item->box.x0, item->box.y0);
    cairo_scale(cr, (item->box.x1 - item->box.x0) / item->nx,
                (item->box.y1 - item->box.y0) / item->ny);
    cairo_set_source_surface(cr, image, 0, 0);
    cairo_pattern_set_filter(cairo_get_source(cr), CAIRO_FILTER_GOOD);
    cairo_paint(cr);
    cairo_restore(cr);
    cairo_surface_destroy(image);
}

static void replay(cairo_t *cr, const utw_canvas *c, int text)
{
    cairo_set_source_rgb(cr, 1, 1, 1);
    cairo_paint(cr);
    for (size_t i = 0; i < c->n_step; i++) {
        const utw_step *s = &c->step[i];
        if (s->act == UTW_FILL || s->act == UTW_STROKE || s->act == UTW_CLIP) lay_path(cr, c, s);
        switch (s->act) {
        case UTW_FILL:
            set_colour(cr, s->pen.colour, s->opacity);
            cairo_fill(cr);
            break;
        case UTW_STROKE:
            stroke(cr, &s->pen);
            break;
        case UTW_CLIP:
            cairo_save(cr);
            cairo_clip(cr);
            break;
        case UTW_UNCLIP:
            cairo_restore(cr);
            break;
        case UTW_IMAGE:
            show_image(cr, &c->image[s->item]);
            break;
        case UTW_TEXT:
            if (text) show_text(cr, &c->text[s->item]);
            break;
        }
    }
}

static utw_status cairo_failed(cairo_status_t status, utw_error *err)
{
    if (status == CAIRO_STATUS_NO_MEMORY)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (cairo)");
    return utw_fail(err, UTW_E_INTERNAL, "cairo: %s", cairo_status_to_string(status));
}

/* ---- images ---------------------------------------------------------------------------------- */

/* The page drawn on an image, to be destroyed by the caller. */
static utw_status draw_image(const utw_canvas *c, double dpi, int text, cairo_surface_t **surface,
                             utw_error *err)
{
    const double scale = dpi / 25.4, nx = ceil(c->width * scale), ny = ceil(c->height * scale);
    if (!(nx >= 1 && ny >= 1 && nx <= 32767 && ny <= 32767 && nx * ny <= PIXELS_MAX))
        return utw_fail(err, UTW_E_ARGUMENT,
                        "%g x %g mm at %g dots per inch is too large for an image", c->width,
                        c->height, dpi);
    *surface = cairo_image_surface_create(CAIRO_FORMAT_RGB24, (int)nx, (int)ny);
    cairo_t *cr = cairo_create(*surface);
    cairo_scale(cr, scale, scale);
    cairo_set_antialias(cr, CAIRO_ANTIALIAS_FAST);
    replay(cr, c, text);
    const cairo_status_t status = cairo_status(cr);
    cairo_destroy(cr);
    if (status == CAIRO_STATUS_SUCCESS) return UTW_OK;
    cairo_surface_destroy(*surface);
    *surface = NULL;
    return cairo_failed(status, err);
}

utw_status utw_canvas_pixels(const utw_canvas *c, double dpi, int text, unsigned **pixel, int *nx,
                             int *ny, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    cairo_surface_t *surface = NULL;
    unsigned *copy = NULL;
    UTW_TRY(utw_canvas_status(c, err));
    UTW_TRY(draw_image(c, dpi, text, &surface, err));
    cairo_surface_flush(surface);
    const int w = cairo_image_surface_get_width(surface),
              h = cairo_image_surface_get_height(surface),
              stride = cairo_image_surface_get_stride(surface);
    const unsigned char *data = cairo_image_surface_get_data(surface);
    UTW_TRY_ALLOC(copy = utw_alloc((size_t)w * (size_t)h, sizeof *copy));
    for (int y = 0; y < h; y++) {
        unsigned *row = copy + (size_t)y * (size_t)w;
        memcpy(row, data + (size_t)y * (size_t)stride, (size_t)w * sizeof *row);
        for (int x = 0; x < w; x++) row[x] &= 0xFFFFFF;
    }
    *pixel = copy;
    *nx = w;
    *ny = h;
    st = UTW_OK;
done:
    cairo_surface_destroy(surface);
    return st;
}

/* ---- files in memory ------------------------------------------------------------------------- */

static cairo_status_t append(void *data, const unsigned char *bytes, unsigned n)
{
    utw_bytes *b = data;
    return utw_bytes_add(b, bytes, n) == 0 ? CAIRO_STATUS_SUCCESS : CAIRO_STATUS_NO_MEMORY;
}

/* SVG and PDF. */
static cairo_status_t write_page(const utw_canvas *c, utw_picture_format format, const char *title,
                                 utw_bytes *bytes)
{
    const double point = 72 / 25.4;
    cairo_surface_t *surface;
    if (format == UTW_SVG) {
        surface = cairo_svg_surface_create_for_stream(append, bytes, c->width, c->height);
        cairo_svg_surface_set_document_unit(surface, CAIRO_SVG_UNIT_MM);
    } else {
        surface =
            cairo_pdf_surface_create_for_stream(append, bytes, point * c->width, point * c->height);
        if (title != NULL) cairo_pdf_surface_set_metadata(surface, CAIRO_PDF_METADATA_TITLE, title);
        cairo_pdf_surface_set_metadata(surface, CAIRO_PDF_METADATA_CREATOR, "untwist");
    }
    cairo_t *cr = cairo_create(surface);
    if (format == UTW_PDF) cairo_scale(cr, point, point);
    replay(cr, c, 1);
    cairo_status_t status = cairo_status(cr);
    cairo_destroy(cr);
    cairo_surface_finish(surface);
    if (status == CAIRO_STATUS_SUCCESS) status = cairo_surface_status(surface);
    cairo_surface_destroy(surface);
    return status;
}

utw_status utw_canvas_bytes(const utw_canvas *c, utw_picture_format format, const char *title,
                            double dpi, unsigned char **bytes, size_t *n, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_bytes b = {NULL, 0, 0};
    unsigned *pixel = NULL;
    UTW_TRY(utw_canvas_status(c, err));
    if (format == UTW_PNG) {
        int nx, ny;
        UTW_TRY(utw_canvas_pixels(c, dpi, 1, &pixel, &nx, &ny, err));
        UTW_TRY(utw_png_write(pixel, nx, ny, dpi, &b, err));
    } else {
        const cairo_status_t status = write_page(c, format, title, &b);
        if (status != CAIRO_STATUS_SUCCESS) {
            st = cairo_failed(status, err);
            goto done;
        }
        if (format == UTW_SVG && title != NULL) UTW_TRY(utw_tag_svg(&b, title, err));
    }
    *bytes = b.data;
    *n = b.n;
    b.data = NULL;
    st = UTW_OK;
done:
    utw_free(pixel);
    utw_free(b.data);
    return st;
}
