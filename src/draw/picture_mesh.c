/* SPDX-License-Identifier: GPL-3.0-or-later
 * The elements, coloured by their orders, with a magnified view of the smallest corner. */
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/status.h"
#include "base/vec2.h"
#include "draw/mesh_paths.h"
#include "draw/picture.h"
#include "mesh/locate.h"

/* In sizes of the font: a side shorter than this is not seen without a glass, and should be this
 * long under it or a little less; radius of the glass, and the least one. */
#define UNSEEN     0.12
#define SEEN       0.8
#define GLASS      7.0
#define GLASS_LESS 4.5
#define MAGNIFY    1000.0

/* ---- the key: a swatch for each order -------------------------------------------------------- */

static void orders(const utw_field *f, int *least, int *greatest)
{
    *least = UTW_ORDER_MAX;
    *greatest = 1;
    for (int t = 0; t < f->setting.mesh->n_tri; t++) {
        if (f->order[t] < *least) *least = f->order[t];
        if (f->order[t] > *greatest) *greatest = f->order[t];
    }
}

/* The pale half of the map, so that the edges can be seen on it. */
static utw_colour order_colour(int order)
{
    return utw_colour_magnitude(0.05 + 0.5 * (order - 1) / (UTW_ORDER_MAX - 1));
}

#define SWATCH 2.0 /* width over the size of the font */

static void draw_key(const utw_page *page, int least, int greatest)
{
    utw_canvas *c = page->canvas;
    const double f = page->font, y = page->key.y0 + 0.4 * f;
    const utw_type type = utw_type_plain(f), number = {.size = 0.92 * f, .colour = utw_ink()};
    const utw_pen pen = {.width = utw_hairline(page), .colour = utw_ink()};
    const utw_box name =
        utw_canvas_text(c, page->key.x0, y + 0.75 * f, 0, 0.5, "order of elements", &type);
    double x = name.x1 + f;
    for (int p = least; p <= greatest; p++, x += SWATCH * f) {
        const utw_box box = {x, y, x + SWATCH * f, y + 1.5 * f};
        char text[16];
        snprintf(text, sizeof text, "%d", p);
        utw_canvas_rectangle(c, box);
        utw_canvas_fill(c, order_colour(p), 1);
        utw_canvas_rectangle(c, box);
        utw_canvas_stroke(c, &pen);
        utw_canvas_text(c, x + 0.5 * SWATCH * f, y + 0.75 * f, 0.5, 0.5, text, &number);
    }
}

/* ---- the glass ------------------------------------------------------------------------------- */

/* The corner of the section with the shortest side at it. Returns that length. */
static double smallest_corner(const utw_mesh *mesh, int *node)
{
    double least = UTW_INFINITY;
    for (int e = 0; e < mesh->n_edge; e++)
        for (int k = 0; k < 2; k++) {
            const int a = mesh->edge[e].node[k], b = mesh->edge[e].node[1 - k];
            const double length = utw_distance(mesh->xy[a], mesh->xy[b]);
            if (a >= mesh->net->n_node || length >= least) continue;
            least = length;
            *node = a;
        }
    return least;
}

typedef struct glass {
    int node;
    double at[2]; /* the corner on the page */
    double factor, radius;
    double centre[2];
} glass;

/* A factor that makes the shortest side visible. 0: it is without. */
static double choose_factor(double shortest, double f)
{
    if (shortest >= UNSEEN * f) return 0;
    return utw_round_length(fmin(SEEN * f / shortest, MAGNIFY));
}

/* 1 when a place on the page is on the section. */
static int on_section(const utw_frame *f, const utw_locator *locator, double x, double y)
{
    utw_place place;
    return utw_locate(locator, (const double[]){(x - f->x0) / f->scale, (f->y0 - y) / f->scale},
                      &place);
}

/* A free place for the glass off the section, nearest to the corner. */
static int find_place(const utw_page *page, const utw_frame *frame, const utw_locator *locator,
                      glass *g)
{
    const double f = page->font, step = 0.7 * f;
    double nearest = UTW_INFINITY;
    for (g->radius = GLASS * f; g->radius >= GLASS_LESS * f; g->radius -= 0.5 * f) {
        const double r = g->radius + 0.3 * f;
        for (double y = page->room.y0 + r; y <= page->room.y1 - r; y += step)
            for (double x = page->room.x0 + r; x <= page->room.x1 - r; x += step) {
                const double p[2] = {x, y}, d = utw_distance(p, g->at);
                if (d >= nearest || d < r + f ||
                    !utw_labels_free_for(page->labels, (utw_box){x, y, x, y}, r, 0) ||
                    !utw_labels_free_for(
                        page->labels,
                        (utw_box){x - 2 * f, y - r - 1.6 * f, x + 2 * f, y + r + 1.6 * f}, 0, 0) ||
                    on_section(frame, locator, x, y))
                    continue;
                nearest = d;
                g->centre[0] = x;
                g->centre[1] = y;
            }
        if (isfinite(nearest)) return 1;
    }
    return 0;
}

/* 1 when an element may be seen through a window on the page (NULL: the whole page). Curved sides
 * bulge by less than the element's size. */
static int is_near(const utw_frame *f, const utw_mesh *mesh, int tri, const utw_box *window)
{
    double box[4] = {UTW_INFINITY, UTW_INFINITY, -UTW_INFINITY, -UTW_INFINITY};
    if (window == NULL) return 1;
    for (int k = 0; k < 3; k++) {
        const double *p = mesh->xy[mesh->tri[tri].node[k]];
        const double xy[2] = {f->x0 + f->scale * p[0], f->y0 - f->scale * p[1]};
        for (int d = 0; d < 2; d++) {
            box[d] = fmin(box[d], xy[d]);
            box[d + 2] = fmax(box[d + 2], xy[d]);
        }
    }
    const double bulge = fmax(box[2] - box[0], box[3] - box[1]);
    return box[0] - bulge < window->x1 && box[2] + bulge > window->x0 &&
           box[1] - bulge < window->y1 && box[3] + bulge > window->y0;
}

static void stroke_edges(const utw_page *page, const utw_frame *frame, const utw_mesh *mesh,
                         const utw_box *window)
{
    const utw_pen thin = {.width = 0.8 * utw_hairline(page), .colour = utw_ink()},
                  thick = {.width = window == NULL ? page->line : 3 * utw_hairline(page),
                           .colour = utw_ink()};
    for (int e = 0; e < mesh->n_edge; e++)
        if (mesh->edge[e].tri[1] >= 0 && is_near(frame, mesh, mesh->edge[e].tri[0], window))
            utw_lay_edge(page->canvas, frame, mesh, e);
    utw_canvas_stroke(page->canvas, &thin);
    for (int e = 0; e < mesh->n_edge; e++) {
        const utw_mesh_edge *edge = &mesh->edge[e];
        if ((edge->tri[1] < 0 || mesh->tri[edge->tri[0]].part != mesh->tri[edge->tri[1]].part) &&
            is_near(frame, mesh, edge->tri[0], window))
            utw_lay_edge(page->canvas, frame, mesh, e);
    }
    utw_canvas_stroke(page->canvas, &thick);
}

static void draw_mesh(const utw_page *page, const utw_frame *frame, const utw_field *field,
                      const utw_box *window)
{
    const utw_mesh *mesh = field->setting.mesh;
    for (int p = 1; p <= UTW_ORDER_MAX; p++) {
        for (int t = 0; t < mesh->n_tri; t++)
            if (field->order[t] == p && is_near(frame, mesh, t, window))
                utw_lay_element(page->canvas, frame, mesh, t);
        utw_canvas_fill(page->canvas, order_colour(p), 1);
    }
    stroke_edges(page, frame, mesh, window);
}

static void draw_glass(const utw_page *page, const utw_frame *frame, const utw_field *field,
                       const glass *g)
{
    utw_canvas *c = page->canvas;
    const double f = page->font, *corner = field->setting.mesh->xy[g->node];
    const utw_pen pen = {.width = 2 * utw_hairline(page), .colour = utw_accent()};
    const utw_frame inner = {frame->scale * g->factor,
                             g->centre[0] - frame->scale * g->factor * corner[0],
                             g->centre[1] + frame->scale * g->factor * corner[1]};
    const utw_box window = {g->centre[0] - g->radius, g->centre[1] - g->radius,
                            g->centre[0] + g->radius, g->centre[1] + g->radius};
    const double d = utw_distance(g->at, g->centre), small = 0.5 * f;
    const double u[2] = {(g->centre[0] - g->at[0]) / d, (g->centre[1] - g->at[1]) / d};
    utw_canvas_circle(c, g->centre[0], g->centre[1], g->radius);
    utw_canvas_fill(c, utw_white(), 1);
    utw_canvas_circle(c, g->centre[0], g->centre[1], g->radius);
    utw_canvas_clip(c);
    draw_mesh(page, &inner, field, &window);
    utw_canvas_unclip(c);
    utw_canvas_circle(c, g->centre[0], g->centre[1], g->radius);
    utw_canvas_stroke(c, &pen);
    utw_canvas_circle(c, g->at[0], g->at[1], small);
    utw_canvas_stroke(c, &pen);
    utw_canvas_move(c, g->at[0] + small * u[0], g->at[1] + small * u[1]);
    utw_canvas_line(c, g->centre[0] - g->radius * u[0], g->centre[1] - g->radius * u[1]);
    utw_canvas_stroke(c, &pen);
    char text[32];
    const utw_type type = utw_type_plain(f);
    snprintf(text, sizeof text, "\xC3\x97 %g", g->factor);
    /* on the side that the line does not come from */
    const int above = u[1] < 0;
    utw_canvas_text(c, g->centre[0], g->centre[1] + (above ? -1 : 1) * (g->radius + 0.5 * f), 0.5,
                    above ? 0 : 1, text, &type);
}

/* ---- the picture ----------------------------------------------------------------------------- */

static void write_notes(const utw_sitting *p, utw_notes *notes)
{
    utw_solution_info info;
    char gap[40], tolerance[40];
    utw_solution_get_info(p->solution, &info);
    utw_number_text(info.gap, 2, gap, sizeof gap);
    utw_number_text(info.tolerance, 2, tolerance, sizeof tolerance);
    utw_notes_add(notes, 0, "%d triangles, %d unknowns", info.triangles, info.unknowns);
    utw_notes_add(notes, 0, "bounds of J: (high \xE2\x88\x92 low)/J = %s; asked for %s", gap,
                  tolerance);
}

/* Edges inside the section, where the glass must not stand. */
static void take_edges(const utw_page *page, const utw_frame *frame, const utw_mesh *mesh)
{
    for (int e = 0; e < mesh->n_edge; e++) {
        double end[2][2];
        for (int k = 0; k < 2; k++) {
            const double *p = mesh->xy[mesh->edge[e].node[k]];
            end[k][0] = frame->x0 + frame->scale * p[0];
            end[k][1] = frame->y0 - frame->scale * p[1];
        }
        utw_labels_take_line(page->labels, end[0], end[1]);
    }
}

/* Lay out and look for a place for the glass. *found = 0: there is none, or none is needed. */
static utw_status prepare(const utw_sitting *p, utw_canvas *canvas, const utw_request *q,
                          utw_page *page, glass *g, int *found, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_mesh *mesh = p->solution->solved.mesh;
    utw_locator *locator = NULL;
    UTW_TRY(utw_layout(canvas, q, page, err));
    const utw_frame frame = utw_sitting_frame(p, page);
    const double shortest = smallest_corner(mesh, &g->node) * frame.scale;
    g->at[0] = frame.x0 + frame.scale * mesh->xy[g->node][0];
    g->at[1] = frame.y0 - frame.scale * mesh->xy[g->node][1];
    g->factor = choose_factor(shortest, page->font);
    *found = 0;
    if (g->factor > 0) {
        utw_take_outline(page, p->solution->outline);
        take_edges(page, &frame, mesh);
        UTW_TRY(utw_locator_create(mesh, &locator, err));
        *found = find_place(page, &frame, locator, g);
    }
    st = UTW_OK;
done:
    utw_locator_free(locator);
    return st;
}

/* Room for the glass below the drawing when there is none beside it. */
static utw_status make_room(const utw_sitting *p, utw_request *q, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_canvas *trial = NULL;
    utw_page page = {0};
    glass g = {0};
    int found;
    UTW_TRY(utw_canvas_create(&trial, err));
    UTW_TRY(prepare(p, trial, q, &page, &g, &found, err));
    if (g.factor > 0 && !found) {
        q->bottom += 2 * GLASS + 5;
        q->tallest = page.height + (2 * GLASS + 5) * page.font;
    }
    st = UTW_OK;
done:
    utw_page_clear(&page);
    utw_canvas_free(trial);
    return st;
}

utw_status utw_picture_mesh(const utw_sitting *p, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_field *field = p->solution->solved.field;
    utw_notes notes = {0};
    utw_page page = {0};
    glass g = {0};
    int least, greatest, found;
    orders(field, &least, &greatest);
    write_notes(p, &notes);
    utw_request q =
        utw_sitting_request(p, "Elements, each with the order of its polynomials", &notes);
    memcpy(q.box, p->solution->outline->box, sizeof q.box);
    q.key_width = UTW_INFINITY; /* it lies below */
    q.key_height = 2.6 * utw_font_size(q.width);
    UTW_TRY(make_room(p, &q, err));
    UTW_TRY(prepare(p, p->canvas, &q, &page, &g, &found, err));
    const utw_frame frame = utw_sitting_frame(p, &page);
    draw_key(&page, least, greatest);
    draw_mesh(&page, &frame, field, NULL);
    if (found) draw_glass(&page, &frame, field, &g);
    UTW_TRY(utw_canvas_status(p->canvas, err));
    st = UTW_OK;
done:
    utw_page_clear(&page);
    return st;
}
