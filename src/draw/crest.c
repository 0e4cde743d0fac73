/* SPDX-License-Identifier: GPL-3.0-or-later
 * Searching the boundary for the extremes of omega. */
#include "draw/crest.h"

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

/* Steps of the search: each leaves 0.618 of a piece, 1e-6 of it in the end. */
enum { STEPS = 29 };

/* A piece of boundary in its element. */
typedef struct piece {
    const utw_unit_element *element;
    double from[2], to[2]; /* r, s */
    int sign;
} piece;

static double value_at(const piece *p, double t, utw_crest *crest)
{
    utw_unit_point point;
    utw_unit_point_at(p->element, p->from[0] + t * (p->to[0] - p->from[0]),
                      p->from[1] + t * (p->to[1] - p->from[1]), &point);
    if (p->sign * point.omega > p->sign * crest->value)
        *crest = (utw_crest){point.omega, {point.xy[0], point.xy[1]}};
    return p->sign * point.omega;
}

static void search(const piece *p, utw_crest *crest)
{
    const double part = 0.5 * (sqrt(5) - 1);
    double low = 0, high = 1, a = high - part, b = low + part;
    double at_a = value_at(p, a, crest), at_b = value_at(p, b, crest);
    value_at(p, 0, crest);
    value_at(p, 1, crest);
    for (int i = 0; i < STEPS; i++) {
        if (at_a > at_b) {
            high = b;
            b = a;
            at_b = at_a;
            a = high - part * (high - low);
            at_a = value_at(p, a, crest);
        } else {
            low = a;
            a = b;
            at_a = at_b;
            b = low + part * (high - low);
            at_b = value_at(p, b, crest);
        }
    }
}

/* Where a vertex lies in an element. */
static void place_of(const utw_sampling *s, int tri, int vertex, double rs[2])
{
    const double n = 1 << s->density[tri];
    for (int k = s->first[2 * tri]; k < s->first[2 * tri + 1]; k++) {
        if (s->point[k].vertex != vertex) continue;
        rs[0] = s->point[k].i / n;
        rs[1] = s->point[k].j / n;
        return;
    }
}

/* The mesh's element that has a piece of boundary. */
static int element_of(const utw_sampling *s, int edge)
{
    int t = 0;
    while (t < s->n_tri - 1 && s->side[t][0] != edge && s->side[t][1] != edge &&
           s->side[t][2] != edge)
        t++;
    return s->element[t];
}

utw_status utw_crest_of(const utw_sampling *s, const utw_values *v, const utw_unit_stress *unit,
                        int sign, utw_crest *crest, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_unit_element *e = NULL;
    utw_crest best = {-sign * UTW_INFINITY, {0, 0}};
    int top = s->rim[0][0];
    UTW_TRY_ALLOC(e = utw_alloc(1, sizeof *e));
    for (int r = 0; r < s->n_rim; r++)
        if (sign * v->omega[s->rim[r][0]] > sign * v->omega[top]) top = s->rim[r][0];
    for (int r = 0; r < s->n_rim; r++) {
        if (s->rim[r][0] != top && s->rim[r][1] != top) continue;
        const int tri = element_of(s, s->rim_edge[r]);
        piece p = {e, {0, 0}, {0, 0}, sign};
        utw_unit_element_of(unit, tri, e);
        place_of(s, tri, s->rim[r][0], p.from);
        place_of(s, tri, s->rim[r][1], p.to);
        search(&p, &best);
    }
    *crest = best;
    st = UTW_OK;
done:
    utw_free(e);
    return st;
}
