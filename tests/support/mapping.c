/* SPDX-License-Identifier: GPL-3.0-or-later
 * Mapping the curves of an outline. */
#include "support/mapping.h"

#include <math.h>

#include "base/vec2.h"

mapping mapping_of(double degrees, double scale, int mirror, double x, double y)
{
    const double quarter = degrees / 90, a = degrees * UTW_PI / 180;
    double c = cos(a), s = sin(a);
    if (quarter == floor(quarter)) { /* no rounding at right angles */
        c = round(c);
        s = round(s);
    }
    const double flip = mirror ? -1 : 1;
    return (mapping){{flip * scale * c, -scale * s, flip * scale * s, scale * c}, {x, y}};
}

static void map_point(double p[2], const double m[4], const double shift[2])
{
    const double x = p[0], y = p[1];
    p[0] = m[0] * x + m[1] * y + shift[0];
    p[1] = m[2] * x + m[3] * y + shift[1];
}

static void map_curve(utw_curve *c, const double m[4], const double shift[2])
{
    const double none[2] = {0, 0};
    map_point(c->from, m, shift);
    map_point(c->to, m, shift);
    map_point(c->c1, m, shift);
    map_point(c->c2, m, shift);
    map_point(c->centre, m, shift);
    map_point(c->u, m, none);
    map_point(c->v, m, none);
}

void mapping_set_box(utw_outline *outline)
{
    double *box = outline->box;
    box[0] = box[1] = HUGE_VAL;
    box[2] = box[3] = -HUGE_VAL;
    for (int p = 0; p < outline->n_part; p++)
        for (int l = 0; l < outline->part[p].n_loop; l++)
            for (int k = 0; k < outline->part[p].loop[l].n; k++) {
                double b[4];
                utw_curve_box(&outline->part[p].loop[l].curve[k], b);
                for (int q = 0; q < 4; q++)
                    box[q] = q < 2 ? fmin(box[q], b[q]) : fmax(box[q], b[q]);
            }
}

void mapping_apply(const mapping *map, utw_outline *outline)
{
    const double *m = map->m;
    for (int p = 0; p < outline->n_part; p++)
        for (int l = 0; l < outline->part[p].n_loop; l++) {
            utw_loop *loop = &outline->part[p].loop[l];
            for (int k = 0; k < loop->n; k++) map_curve(&loop->curve[k], m, map->shift);
            if (m[0] * m[3] - m[1] * m[2] < 0) utw_loop_reverse(loop);
        }
    mapping_set_box(outline);
}
