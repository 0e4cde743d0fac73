/* SPDX-License-Identifier: GPL-3.0-or-later
 * The outline: what it owns, and the measure and direction of its loops. */
#include "outline/outline.h"

#include <string.h>

#include "base/gauss.h"
#include "base/memory.h"
#include "base/vec2.h"

void utw_loop_clear(utw_loop *loop)
{
    utw_free(loop->curve);
    utw_free(loop->vertex);
    *loop = (utw_loop){0};
}

void utw_part_clear(utw_part *part)
{
    for (int i = 0; part->loop != NULL && i < part->n_loop; i++) utw_loop_clear(&part->loop[i]);
    utw_free(part->loop);
    *part = (utw_part){.material = -1};
}

void utw_outline_free(utw_outline *outline)
{
    if (outline == NULL) return;
    for (int i = 0; i < outline->n_part; i++) utw_part_clear(&outline->part[i]);
    for (int i = 0; i < outline->n_material; i++) utw_free(outline->material[i].name);
    for (int i = 0; i < outline->n_load; i++) utw_free(outline->load[i].name);
    for (int i = 0; i < outline->n_dimension; i++) utw_free(outline->dimension[i].name);
    utw_free(outline->dimension);
    if (outline->midline != NULL) {
        utw_free(outline->midline->nodes);
        utw_free(outline->midline->walls);
    }
    utw_free(outline->midline);
    utw_free(outline->part);
    utw_free(outline->material);
    utw_free(outline->load);
    utw_free(outline->name);
    utw_free(outline->units);
    utw_free(outline);
}

const char *utw_outline_name(const utw_outline *outline)
{
    return outline->name == NULL ? "" : outline->name;
}

const char *utw_outline_units(const utw_outline *outline)
{
    return outline->units;
}

int utw_outline_dimension_count(const utw_outline *outline)
{
    return outline->n_dimension;
}

const char *utw_outline_dimension(const utw_outline *outline, int k, double *value, int *is_set)
{
    if (k < 0 || k >= outline->n_dimension) return NULL;
    const utw_dimension *d = &outline->dimension[k];
    if (value != NULL) *value = d->value;
    if (is_set != NULL) *is_set = d->is_set;
    return d->name;
}

/* 1/2 int (x dy - y dx) over a curve, about `o`. Lines and arcs in closed form; the integrand of a
 * cubic has degree 5, which three Gauss points integrate exactly. */
static double curve_area(const utw_curve *c, const double o[2])
{
    const double from[2] = {c->from[0] - o[0], c->from[1] - o[1]},
                 to[2] = {c->to[0] - o[0], c->to[1] - o[1]};
    if (c->kind == UTW_LINE) return 0.5 * utw_cross(from, to);
    if (c->kind == UTW_ARC) {
        /* x = c + u cos a + v sin a: 1/2 x x dx = 1/2 [c x (to - from) + (u x v)(a1 - a0)] */
        const double m[2] = {c->centre[0] - o[0], c->centre[1] - o[1]},
                     d[2] = {to[0] - from[0], to[1] - from[1]};
        return 0.5 * (utw_cross(m, d) + utw_cross(c->u, c->v) * (c->a1 - c->a0));
    }
    double t[3], w[3], sum = 0;
    utw_gauss(3, t, w);
    for (int q = 0; q < 3; q++) {
        double p[2], d[2];
        utw_curve_point(c, t[q], p);
        utw_curve_d1(c, t[q], d);
        p[0] -= o[0];
        p[1] -= o[1];
        sum += 0.5 * w[q] * utw_cross(p, d);
    }
    return sum;
}

double utw_loop_area(const utw_loop *loop)
{
    double sum = 0;
    for (int k = 0; k < loop->n; k++) sum += curve_area(&loop->curve[k], loop->curve[0].from);
    return sum;
}

void utw_loop_reverse(utw_loop *loop)
{
    for (int i = 0, j = loop->n - 1; i <= j; i++, j--) {
        const utw_curve first = utw_curve_reversed(&loop->curve[i]);
        const int vertex = loop->vertex[i];
        loop->curve[i] = utw_curve_reversed(&loop->curve[j]);
        loop->curve[j] = first;
        loop->vertex[i] = loop->vertex[j];
        loop->vertex[j] = vertex;
    }
}

void utw_outline_orient(utw_outline *outline)
{
    double box[4] = {HUGE_VAL, HUGE_VAL, -HUGE_VAL, -HUGE_VAL};
    for (int p = 0; p < outline->n_part; p++)
        for (int l = 0; l < outline->part[p].n_loop; l++) {
            utw_loop *loop = &outline->part[p].loop[l];
            if ((utw_loop_area(loop) < 0) != (l > 0)) utw_loop_reverse(loop);
            for (int k = 0; l == 0 && k < loop->n; k++) {
                double b[4];
                utw_curve_box(&loop->curve[k], b);
                for (int i = 0; i < 2; i++) {
                    box[i] = fmin(box[i], b[i]);
                    box[i + 2] = fmax(box[i + 2], b[i + 2]);
                }
            }
        }
    memcpy(outline->box, box, sizeof box);
}

int utw_outline_load_count(const utw_outline *outline)
{
    return outline->n_load;
}

const char *utw_outline_load(const utw_outline *outline, int k, utw_forces *forces)
{
    if (k < 0 || k >= outline->n_load) return NULL;
    const utw_load *l = &outline->load[k];
    if (forces != NULL)
        *forces = (utw_forces){l->N, l->Vx, l->Vy, l->Mx, l->My, l->T, l->B, l->has_at,
                               {l->at[0], l->at[1]}};
    return l->name;
}
