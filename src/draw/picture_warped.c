/* SPDX-License-Identifier: GPL-3.0-or-later
 * A tilted view of the end of the bar, warped. */
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "draw/bands.h"
#include "draw/picture.h"
#include "draw/stage.h"
#include "draw/values.h"

/* The warped face rises and falls by so much, and the piece of bar behind it is so long, over the
 * size of the section. */
#define RISE   0.16
#define LENGTH 0.5

/* Turned so that x, y and z are all seen, y upright. */
#define TURN (-32 * UTW_PI / 180)
#define TILT (24 * UTW_PI / 180)

/* Edges of the bar are drawn where its sides meet at more than this angle. */
#define EDGE_ANGLE (25 * UTW_PI / 180)

/* Hidden lines are hidden by what is nearer to the viewer by this part of the size. */
#define SLACK 0.006
/* Where a side turns away from the viewer, whether it is seen is asked this part of the size beside
 * it: on it the depth is steep. */
#define OUTWARD 0.003

/* The face keeps its colours, those of the key, but for so much of its shade. */
#define FACE_SHADE 0.25

/* Pixels a millimetre of the image. */
#define PER_MM 6

/* A section that does not warp: omega less than this part of its area. */
#define NO_WARPING 1e-9

/* The bar in the net's coordinates: the face at z = rise * omega. */
typedef struct bar {
    const utw_sampling *s;
    const double *omega; /* [n_vertex], of the net */
    double size, rise, length;
    utw_view view;
    double (*p)[3];     /* [n_vertex] the face in view coordinates; owned */
    double *light;      /* [n_vertex] owned */
    utw_colour *colour; /* [n_band] owned */
    long first, n_band;
    double step; /* of omega of the net between levels */
} bar;

static void face_point(const bar *b, const double xy[2], double z, double p[3])
{
    utw_view_point(&b->view, (const double[]){xy[0], xy[1], z}, p);
}

/* ---- surfaces -------------------------------------------------------------------------------- */

/* Points of the face, and the light there from the mean normal of the triangles around. */
static utw_status shape_face(bar *b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_sampling *s = b->s;
    double(*normal)[3] = NULL;
    UTW_TRY_ALLOC(normal = utw_alloc((size_t)s->n_vertex, sizeof *normal));
    UTW_TRY_ALLOC(b->p = utw_alloc((size_t)s->n_vertex, sizeof *b->p));
    UTW_TRY_ALLOC(b->light = utw_alloc((size_t)s->n_vertex, sizeof *b->light));
    for (int i = 0; i < s->n_vertex; i++) face_point(b, s->xy[i], b->rise * b->omega[i], b->p[i]);
    for (int t = 0; t < s->n_tri; t++) {
        const double *p = b->p[s->tri[t][0]], *q = b->p[s->tri[t][1]], *r = b->p[s->tri[t][2]];
        double u[3], v[3];
        for (int d = 0; d < 3; d++) {
            u[d] = q[d] - p[d];
            v[d] = r[d] - p[d];
        }
        for (int k = 0; k < 3; k++) {
            double *n = normal[s->tri[t][k]];
            n[0] += u[1] * v[2] - u[2] * v[1];
            n[1] += u[2] * v[0] - u[0] * v[2];
            n[2] += u[0] * v[1] - u[1] * v[0];
        }
    }
    for (int i = 0; i < s->n_vertex; i++)
        b->light[i] = 1 - FACE_SHADE * (1 - utw_stage_light(normal[i]));
    st = UTW_OK;
done:
    utw_free(normal);
    return st;
}

static utw_colour paint_band(const void *data, double value)
{
    const bar *b = data;
    const double k = floor(value / b->step) - (double)b->first;
    return b->colour[k < 0 ? 0 : k > (double)(b->n_band - 1) ? b->n_band - 1 : (long)k];
}

static utw_colour paint_metal(const void *data, double value)
{
    (void)value;
    return *(const utw_colour *)data;
}

/* 1 when a side of the bar with this direction of its boundary faces the viewer. */
static int faces(const bar *b, const double u[2])
{
    double normal[3];
    utw_view_point(&b->view, (const double[]){u[1], -u[0], 0}, normal);
    return normal[2] > 0;
}

/* The sides: a quadrilateral behind every piece of the boundary. */
static void build_sides(const bar *b, utw_stage *stage)
{
    const utw_colour metal = utw_metal();
    const double none[3] = {0, 0, 0};
    for (int r = 0; r < b->s->n_rim; r++) {
        const int i = b->s->rim[r][0], j = b->s->rim[r][1];
        const double *a = b->s->xy[i], *c = b->s->xy[j];
        double back[2][3], normal[3];
        face_point(b, a, b->rise * b->omega[i] - b->length, back[0]);
        face_point(b, c, b->rise * b->omega[j] - b->length, back[1]);
        const double along[2] = {c[0] - a[0], c[1] - a[1]};
        if (!faces(b, along)) continue; /* seen from behind: always hidden by others */
        utw_view_point(&b->view, (const double[]){along[1], -along[0], 0}, normal);
        const double l = utw_stage_light(normal), light[3] = {l, l, l};
        const double one[3][3] = {{b->p[i][0], b->p[i][1], b->p[i][2]},
                                  {b->p[j][0], b->p[j][1], b->p[j][2]},
                                  {back[1][0], back[1][1], back[1][2]}};
        const double two[3][3] = {{b->p[i][0], b->p[i][1], b->p[i][2]},
                                  {back[1][0], back[1][1], back[1][2]},
                                  {back[0][0], back[0][1], back[0][2]}};
        utw_stage_triangle(stage, one, none, light, paint_metal, &metal);
        utw_stage_triangle(stage, two, none, light, paint_metal, &metal);
    }
}

static void build_face(const bar *b, utw_stage *stage)
{
    for (int t = 0; t < b->s->n_tri; t++) {
        double p[3][3], value[3], light[3];
        for (int k = 0; k < 3; k++) {
            const int i = b->s->tri[t][k];
            memcpy(p[k], b->p[i], sizeof p[k]);
            value[k] = b->omega[i];
            light[k] = b->light[i];
        }
        utw_stage_triangle(stage, (const double(*)[3])p, value, light, paint_band, b);
    }
}

/* ---- lines ----------------------------------------------------------------------------------- */

/* Add the seen parts of the segment p q to the path; [in] shift: from the line to where it is asked
 * whether it is seen, may be NULL. `down`: the pen is at p. Returns whether it is
 * at q. */
static int lay_seen(const utw_page *page, const bar *b, const utw_stage *stage, const double p[3],
                    const double q[3], const double shift[2], int down)
{
    const utw_frame *f = &page->frame;
    const double length = hypot(q[0] - p[0], q[1] - p[1]) * f->scale;
    const int n = 1 + (int)(length / 0.2);
    for (int i = 0; i < n; i++) {
        double to[3], middle[3];
        for (int d = 0; d < 3; d++) {
            to[d] = p[d] + (q[d] - p[d]) * (i + 1) / n;
            middle[d] = p[d] + (q[d] - p[d]) * (i + 0.5) / n + (d < 2 && shift ? shift[d] : 0);
        }
        if (!utw_stage_sees(stage, middle, SLACK * b->size)) {
            down = 0;
            continue;
        }
        if (!down)
            utw_canvas_move(page->canvas, f->x0 + f->scale * (p[0] + (q[0] - p[0]) * i / n),
                            f->y0 - f->scale * (p[1] + (q[1] - p[1]) * i / n));
        utw_canvas_line(page->canvas, f->x0 + f->scale * to[0], f->y0 - f->scale * to[1]);
        down = 1;
    }
    return down;
}

/* The boundary of the face moved back by `depth`, without its warping when `flat`: loop by loop, so
 * that dashes run on from piece to piece. */
static utw_status lay_rim(const utw_page *page, const bar *b, const utw_stage *stage, double depth,
                          int flat, utw_error *err)
{
    const utw_sampling *s = b->s;
    unsigned char *done = utw_alloc((size_t)s->n_rim, sizeof *done);
    if (done == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    for (int start = 0; start < s->n_rim; start++) {
        int down = 0;
        for (int r = start; !done[r]; r = s->rim_next[r]) {
            const int i = s->rim[r][0], j = s->rim[r][1];
            double p[3], q[3];
            face_point(b, s->xy[i], (flat ? 0 : b->rise * b->omega[i]) - depth, p);
            face_point(b, s->xy[j], (flat ? 0 : b->rise * b->omega[j]) - depth, q);
            down = lay_seen(page, b, stage, p, q, NULL, down);
            done[r] = 1;
        }
    }
    utw_free(done);
    return UTW_OK;
}

/* Edges along the bar where the boundary turns, and where it turns away from the viewer. */
static void lay_edges(const utw_page *page, const bar *b, const utw_stage *stage)
{
    const utw_sampling *s = b->s;
    for (int r = 0; r < s->n_rim; r++) {
        const double *a = s->xy[s->rim[r][0]], *c = s->xy[s->rim[r][1]],
                     *e = s->xy[s->rim[s->rim_next[r]][1]];
        const double u[2] = {c[0] - a[0], c[1] - a[1]}, v[2] = {e[0] - c[0], e[1] - c[1]};
        const int turns_away = faces(b, u) != faces(b, v);
        if (!turns_away && fabs(atan2(utw_cross(u, v), utw_dot(u, v))) < EDGE_ANGLE) continue;
        const int i = s->rim[r][1];
        double back[3], shift[3];
        utw_view_point(&b->view, (const double[]){u[1], -u[0], 0}, shift);
        const double part = OUTWARD * b->size / utw_norm(u);
        for (int d = 0; d < 2; d++) shift[d] *= part;
        face_point(b, c, b->rise * b->omega[i] - b->length, back);
        lay_seen(page, b, stage, b->p[i], back, turns_away ? shift : NULL, 0);
    }
}

static utw_status draw_levels(const utw_page *page, const bar *b, const utw_stage *stage,
                              const utw_bands *bands, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_paths line = {0};
    for (long k = bands->ticks.first + 1; k < bands->ticks.last; k++) {
        const double level = (double)k * b->step;
        utw_paths_clear(&line);
        UTW_TRY(utw_contour(b->s, b->omega, level, 0.0005 * b->size, NULL, &line, err));
        for (int i = 0; i < line.n_path; i++) {
            const int first = line.first[i], end = utw_paths_end(&line, i);
            int down = 0;
            for (int j = first; j + 1 < end + line.closed[i]; j++) {
                double p[3], q[3];
                face_point(b, line.xy[j], b->rise * level, p);
                face_point(b, line.xy[j + 1 < end ? j + 1 : first], b->rise * level, q);
                down = lay_seen(page, b, stage, p, q, NULL, down);
            }
        }
        const utw_colour ground = utw_colour_signed((double)k * bands->ticks.step / bands->most);
        const utw_pen pen = {.width = utw_hairline(page) * (k == 0 ? 2.2 : 0.8),
                             .colour = utw_colour_on(ground)};
        utw_canvas_stroke(page->canvas, &pen);
    }
    st = UTW_OK;
done:
    utw_paths_clear(&line);
    return st;
}

static utw_status draw_lines(const utw_page *page, const bar *b, const utw_stage *stage, int flat,
                             utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double hair = utw_hairline(page), f = page->font;
    const utw_pen thick = {.width = page->line, .colour = utw_ink()},
                  thin = {.width = 1.6 * hair, .colour = utw_ink()},
                  plane = {.width = 1.6 * hair,
                           .colour = utw_accent(),
                           .dash = {0.6 * f, 0.4 * f},
                           .butt = 1};
    lay_edges(page, b, stage);
    UTW_TRY(lay_rim(page, b, stage, b->length, 0, err));
    utw_canvas_stroke(page->canvas, &thin);
    UTW_TRY(lay_rim(page, b, stage, 0, 0, err));
    utw_canvas_stroke(page->canvas, &thick);
    if (!flat) {
        UTW_TRY(lay_rim(page, b, stage, 0, 1, err));
        utw_canvas_stroke(page->canvas, &plane);
    }
    st = UTW_OK;
done:
    return st;
}

/* The three axes, from their common origin. */
static void draw_axes(const utw_page *page, const bar *b)
{
    static const char *const name[3] = {"x", "y", "z"};
    const double f = page->font, length = 2.6 * f;
    const double origin[2] = {page->room.x0 + 1.8 * f, page->room.y1 - 2.2 * f};
    const utw_pen pen = {.width = 1.5 * utw_hairline(page), .colour = utw_pale()};
    const utw_type type = {.size = 0.92 * f, .colour = utw_pale(), .italic = 1};
    for (int k = 0; k < 3; k++) {
        const double end[2] = {origin[0] + length * b->view.m[0][k],
                               origin[1] - length * b->view.m[1][k]};
        const double u[2] = {(end[0] - origin[0]) / length, (end[1] - origin[1]) / length};
        utw_mark_arrow(page->canvas, origin, end, 0.6 * f, &pen);
        utw_canvas_text(page->canvas, end[0] + 0.55 * f * u[0], end[1] + 0.6 * f * u[1], 0.5, 0.4,
                        name[k], &type);
    }
}

/* ---- the picture ----------------------------------------------------------------------------- */

static void clear_bar(bar *b)
{
    utw_free(b->p);
    utw_free(b->light);
    utw_free(b->colour);
}

static utw_status colours(bar *b, const utw_bands *bands, double unit2, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    b->first = bands->ticks.first;
    b->n_band = bands->ticks.last - bands->ticks.first;
    b->step = bands->ticks.step / unit2;
    UTW_TRY_ALLOC(b->colour = utw_alloc((size_t)b->n_band, sizeof *b->colour));
    for (long k = 0; k < b->n_band; k++) b->colour[k] = utw_band_colour(bands, b->first + k);
    st = UTW_OK;
done:
    return st;
}

/* The box of the bar in view coordinates. */
static void view_box(const bar *b, double box[4])
{
    box[0] = box[1] = UTW_INFINITY;
    box[2] = box[3] = -UTW_INFINITY;
    for (int r = 0; r < b->s->n_rim; r++)
        for (int back = 0; back <= 2; back++) {
            const int i = b->s->rim[r][0];
            double p[3];
            face_point(b, b->s->xy[i],
                       back == 2 ? 0 : b->rise * b->omega[i] - (back ? b->length : 0), p);
            box[0] = fmin(box[0], p[0]);
            box[1] = fmin(box[1], p[1]);
            box[2] = fmax(box[2], p[0]);
            box[3] = fmax(box[3], p[1]);
        }
}

static utw_status draw_bar(const utw_page *page, const bar *b, const utw_bands *bands,
                           const double box[4], int flat, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_stage *stage = NULL;
    unsigned *pixel = NULL;
    const utw_box d = page->drawing;
    const double area = (d.x1 - d.x0) * (d.y1 - d.y0);
    const double per_mm = fmin(PER_MM, sqrt(4e5 / area)); /* so many pixels at most */
    const int nx = 1 + (int)((d.x1 - d.x0) * per_mm), ny = 1 + (int)((d.y1 - d.y0) * per_mm);
    UTW_TRY(utw_stage_create(nx, ny, box, &stage, err));
    build_sides(b, stage);
    build_face(b, stage);
    UTW_TRY(utw_stage_image(stage, &pixel, err));
    utw_canvas_image(page->canvas, d, nx, ny, pixel);
    UTW_TRY(draw_levels(page, b, stage, bands, err));
    UTW_TRY(draw_lines(page, b, stage, flat, err));
    st = UTW_OK;
done:
    utw_stage_free(stage);
    utw_free(pixel);
    return st;
}

static void write_notes(const utw_sitting *p, const bar *b, int flat, utw_notes *notes)
{
    char number[40];
    if (flat) {
        utw_notes_add(notes, 0, "this section does not warp");
        return;
    }
    /* drawn u_z over omega, in the drawing's units */
    utw_number_text(b->rise / p->solution->unit, 2, number, sizeof number);
    utw_notes_add(notes, 0,
                  "drawn as for d\xCE\xB8/dz = %s rad/%s; the broken line is the plane end", number,
                  p->solution->outline->length_unit);
}

static utw_status draw(const utw_sitting *p, bar *b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_solution *s = p->solution;
    const double unit2 = s->unit * s->unit;
    utw_notes notes = {0};
    utw_page page = {0};
    char unit[40];
    double low = UTW_INFINITY, high = -UTW_INFINITY, box[4];
    for (int i = 0; i < b->s->n_vertex; i++) {
        low = fmin(low, b->omega[i] * unit2);
        high = fmax(high, b->omega[i] * unit2);
    }
    const int flat = high - low < NO_WARPING * s->area.A;
    b->rise = flat ? 0 : RISE * b->size * unit2 / fmax(-low, high);
    utw_unit_text(s->outline->length_unit, 2, unit, sizeof unit);
    const utw_bands bands = utw_bands_of(flat ? 0 : low, flat ? 0 : high, 1, 13, unit);
    UTW_TRY(colours(b, &bands, unit2, err));
    UTW_TRY(shape_face(b, err));
    view_box(b, box);
    write_notes(p, b, flat, &notes);
    utw_request q = utw_sitting_request(
        p, "Warped end of the bar: u_{z} = \xCF\x89 d\xCE\xB8/dz, pole at the shear centre",
        &notes);
    memcpy(q.box, box, sizeof q.box);
    q.no_scale = 1;
    q.bottom = 5.5;
    utw_key_request(p->canvas, &bands, "\xCF\x89", &q);
    UTW_TRY(utw_layout(p->canvas, &q, &page, err));
    utw_key_draw(&page, &bands, "\xCF\x89");
    UTW_TRY(draw_bar(&page, b, &bands, box, flat, err));
    draw_axes(&page, b);
    UTW_TRY(utw_canvas_status(p->canvas, err));
    st = UTW_OK;
done:
    utw_page_clear(&page);
    return st;
}

utw_status utw_picture_warped(const utw_sitting *p, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_solution *s = p->solution;
    const utw_fineness fineness = utw_sitting_fineness(p);
    const double *extent = s->outline->box;
    utw_sampling sampling = {0};
    utw_values values = {0};
    utw_unit_stress unit;
    bar b = {.view = utw_view_of(TURN, TILT)};
    utw_unit_stress_of(s, &unit);
    UTW_TRY(utw_sampling_init(&sampling, s->solved.mesh, &fineness, err));
    UTW_TRY(utw_values_init(&values, &sampling, &unit, 0, err));
    b.s = &sampling;
    b.omega = values.omega;
    b.size = fmax(extent[2] - extent[0], extent[3] - extent[1]) / s->unit;
    b.length = LENGTH * b.size;
    UTW_TRY(draw(p, &b, err));
    st = UTW_OK;
done:
    clear_bar(&b);
    utw_sampling_clear(&sampling);
    utw_values_clear(&values);
    return st;
}
