/* SPDX-License-Identifier: GPL-3.0-or-later
 * Drawing loops of vertices, fillets and arcs; tidying and placing them. */
#include "outline/draft.h"

#include <string.h>

#include "base/memory.h"
#include "base/vec2.h"
#include "outline/shape.h"

/* Edges shorter than this part of the loop's size are rounding errors of the drawing. */
#define NO_LENGTH 1e-12

void utw_draft_init(utw_draft *draft)
{
    memset(draft, 0, sizeof *draft);
}

void utw_draft_clear(utw_draft *draft)
{
    for (int i = 0; i < draft->n_loop; i++) utw_free(draft->loop[i].vertex);
    utw_free(draft->loop);
    utw_draft_init(draft);
}

static utw_draft_loop *add_loop(utw_draft *draft, utw_draft_kind kind)
{
    void *array = draft->loop;
    if (draft->out_of_memory ||
        utw_grow(&array, &draft->capacity, (size_t)draft->n_loop + 1, sizeof *draft->loop) != 0) {
        draft->out_of_memory = 1;
        return NULL;
    }
    draft->loop = array;
    utw_draft_loop *loop = &draft->loop[draft->n_loop++];
    *loop = (utw_draft_loop){.kind = kind};
    return loop;
}

void utw_draft_begin(utw_draft *draft)
{
    add_loop(draft, UTW_DRAFT_VERTICES);
}

/* A new vertex at the end of the last loop, or NULL when memory is out. */
static utw_draft_vertex *add_vertex(utw_draft *draft, double x, double y)
{
    if (draft->out_of_memory) return NULL;
    utw_draft_loop *loop = &draft->loop[draft->n_loop - 1];
    void *array = loop->vertex;
    if (utw_grow(&array, &loop->capacity, (size_t)loop->n + 1, sizeof *loop->vertex) != 0) {
        draft->out_of_memory = 1;
        return NULL;
    }
    loop->vertex = array;
    utw_draft_vertex *vertex = &loop->vertex[loop->n++];
    *vertex = (utw_draft_vertex){.at = {x, y}, .dimension = -1};
    return vertex;
}

void utw_draft_point(utw_draft *draft, double x, double y)
{
    add_vertex(draft, x, y);
}

void utw_draft_round(utw_draft *draft, double x, double y, const utw_shape_case *given,
                     int dimension, double extra)
{
    utw_draft_vertex *vertex = add_vertex(draft, x, y);
    if (vertex == NULL) return;
    const double radius = given->value[dimension] + extra;
    if (!(radius > 0)) return;
    vertex->round = radius;
    vertex->dimension = dimension;
    vertex->extra = extra;
}

void utw_draft_arc(utw_draft *draft, double xc, double yc, double r, double a0, double a1, double x,
                   double y)
{
    const int pieces = fabs(a1 - a0) > UTW_PI * (1 + 1e-9) ? 2 : 1;
    const double middle = 0.5 * (a0 + a1);
    double cs[2];
    utw_draft_cos_sin(middle, cs);
    for (int i = 0; i < pieces; i++) {
        const int last = i == pieces - 1;
        utw_draft_vertex *vertex =
            add_vertex(draft, last ? x : xc + r * cs[0], last ? y : yc + r * cs[1]);
        if (vertex == NULL) return;
        vertex->is_arc = 1;
        vertex->centre[0] = xc;
        vertex->centre[1] = yc;
        vertex->r = r;
        vertex->a0 = i == 0 ? a0 : middle;
        vertex->a1 = last ? a1 : middle;
    }
}

void utw_draft_circle(utw_draft *draft, double xc, double yc, double r)
{
    utw_draft_loop *loop = add_loop(draft, UTW_DRAFT_CIRCLE);
    if (loop == NULL) return;
    loop->centre[0] = xc;
    loop->centre[1] = yc;
    loop->a = loop->b = r;
}

void utw_draft_ellipse(utw_draft *draft, double xc, double yc, double a, double b)
{
    utw_draft_loop *loop = add_loop(draft, UTW_DRAFT_ELLIPSE);
    if (loop == NULL) return;
    loop->centre[0] = xc;
    loop->centre[1] = yc;
    loop->a = a;
    loop->b = b;
}

/* ---- tidying ---- */

static double size_of(const utw_draft_loop *loop)
{
    double box[4] = {INFINITY, INFINITY, -INFINITY, -INFINITY};
    for (int i = 0; i < loop->n; i++)
        for (int k = 0; k < 2; k++) {
            box[k] = fmin(box[k], loop->vertex[i].at[k]);
            box[k + 2] = fmax(box[k + 2], loop->vertex[i].at[k]);
        }
    return fmax(box[2] - box[0], box[3] - box[1]);
}

static void remove_vertex(utw_draft_loop *loop, int i)
{
    memmove(&loop->vertex[i], &loop->vertex[i + 1],
            (size_t)(loop->n - i - 1) * sizeof *loop->vertex);
    loop->n--;
}

/* Drop the lines of no length, and an arc's end that is the first vertex again. Of two vertices in
 * one place the one with a fillet stays. */
static void drop_repeated(utw_draft_loop *loop)
{
    const double least = NO_LENGTH * size_of(loop);
    for (int i = 0; i < loop->n && loop->n > 2;) {
        utw_draft_vertex *here = &loop->vertex[i], *next = &loop->vertex[(i + 1) % loop->n];
        if (utw_distance(here->at, next->at) > least) {
            i++;
        } else if (next->is_arc && fabs(next->a1 - next->a0) > UTW_PI) {
            i++; /* nearly a whole turn */
        } else if (next->round > 0 && !here->is_arc) {
            remove_vertex(loop, i);
        } else { /* the curve that leads here now leads to where `next` was */
            remove_vertex(loop, (i + 1) % loop->n);
            if (i == loop->n) { /* `next` was vertex 0: keep the count of the first vertex */
                const utw_draft_vertex first = loop->vertex[loop->n - 1];
                memmove(&loop->vertex[1], &loop->vertex[0],
                        (size_t)(loop->n - 1) * sizeof *loop->vertex);
                loop->vertex[0] = first;
                i++;
            }
        }
    }
}

void utw_draft_cos_sin(double turn, double cs[2])
{
    static const double quarter[4][2] = {{1, 0}, {0, 1}, {-1, 0}, {0, -1}};
    const double quarters = turn / (UTW_PI / 2), nearest = floor(quarters + 0.5);
    if (fabs(quarters - nearest) < 1e-14 && fabs(nearest) < 1e9) {
        const int k = (int)(((long)nearest % 4 + 4) % 4);
        memcpy(cs, quarter[k], sizeof quarter[k]);
    } else {
        cs[0] = cos(turn);
        cs[1] = sin(turn);
    }
}

static void place_point(double xy[2], const utw_placement *placement, const double cs[2])
{
    const double x = placement->mirror ? -xy[0] : xy[0], y = xy[1];
    xy[0] = placement->at[0] + cs[0] * x - cs[1] * y;
    xy[1] = placement->at[1] + cs[1] * x + cs[0] * y;
}

static double place_angle(double angle, const utw_placement *placement)
{
    return placement->turn + (placement->mirror ? UTW_PI - angle : angle);
}

void utw_draft_place(utw_draft *draft, const utw_placement *placement)
{
    double cs[2];
    utw_draft_cos_sin(placement->turn, cs);
    for (int i = 0; i < draft->n_loop; i++) {
        utw_draft_loop *loop = &draft->loop[i];
        place_point(loop->centre, placement, cs);
        if (loop->kind == UTW_DRAFT_ELLIPSE) /* symmetric: pi - turn is -turn */
            loop->turn = place_angle(loop->turn, placement) - (placement->mirror ? UTW_PI : 0);
        for (int k = 0; k < loop->n; k++) {
            utw_draft_vertex *vertex = &loop->vertex[k];
            place_point(vertex->at, placement, cs);
            if (!vertex->is_arc) continue;
            place_point(vertex->centre, placement, cs);
            vertex->a0 = place_angle(vertex->a0, placement);
            vertex->a1 = place_angle(vertex->a1, placement);
        }
    }
}

void utw_draft_tidy(utw_draft *draft)
{
    for (int i = 0; i < draft->n_loop; i++) drop_repeated(&draft->loop[i]);
}
