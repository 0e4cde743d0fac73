/* SPDX-License-Identifier: GPL-3.0-or-later
 * Outlines drawn in C. */
#include "support/drawing.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/mapping.h"
#include "support/support.h"

void drawing_init(drawing *d)
{
    memset(d, 0, sizeof *d);
}

void drawing_clear(drawing *d)
{
    for (int p = 0; p < d->outline.n_part; p++) {
        for (int l = 0; l < d->outline.part[p].n_loop; l++) {
            utw_free(d->outline.part[p].loop[l].curve);
            utw_free(d->outline.part[p].loop[l].vertex);
        }
        utw_free(d->outline.part[p].loop);
    }
    utw_free(d->outline.part);
    memset(d, 0, sizeof *d);
}

static utw_part *last_part(drawing *d)
{
    assert_true(d->outline.n_part > 0);
    return &d->outline.part[d->outline.n_part - 1];
}

static utw_loop *last_loop(drawing *d)
{
    utw_part *part = last_part(d);
    assert_true(part->n_loop > 0);
    return &part->loop[part->n_loop - 1];
}

void drawing_part(drawing *d, int material)
{
    utw_outline *o = &d->outline;
    o->part = utw_realloc(o->part, (size_t)o->n_part + 1, sizeof *o->part);
    assert_non_null(o->part);
    o->part[o->n_part++] = (utw_part){.material = material};
    if (material >= o->n_material) o->n_material = material + 1;
}

static utw_loop *new_loop(drawing *d)
{
    utw_part *part = last_part(d);
    part->loop = utw_realloc(part->loop, (size_t)part->n_loop + 1, sizeof *part->loop);
    assert_non_null(part->loop);
    part->loop[part->n_loop] = (utw_loop){.n = 0};
    return &part->loop[part->n_loop++];
}

static void add(drawing *d, utw_curve curve)
{
    utw_loop *loop = last_loop(d);
    if ((loop->n & (loop->n - 1)) == 0) { /* grow at powers of two */
        const size_t room = loop->n == 0 ? 1 : 2 * (size_t)loop->n;
        loop->curve = utw_realloc(loop->curve, room, sizeof *loop->curve);
        loop->vertex = utw_realloc(loop->vertex, room, sizeof *loop->vertex);
        assert_non_null(loop->curve);
        assert_non_null(loop->vertex);
    }
    loop->curve[loop->n] = curve;
    loop->vertex[loop->n] = loop->n + 1; /* the first vertex is the start */
    loop->n++;
    d->pen[0] = curve.to[0];
    d->pen[1] = curve.to[1];
}

void drawing_move(drawing *d, double x, double y)
{
    new_loop(d);
    d->start[0] = d->pen[0] = x;
    d->start[1] = d->pen[1] = y;
}

void drawing_line(drawing *d, double x, double y)
{
    const double to[2] = {x, y};
    add(d, utw_curve_line(d->pen, to));
}

void drawing_arc(drawing *d, double xm, double ym, double x, double y)
{
    const double mid[2] = {xm, ym}, to[2] = {x, y};
    utw_curve curve;
    assert_int_equal(utw_curve_arc_through(d->pen, mid, to, &curve), 0);
    add(d, curve);
}

void drawing_cubic(drawing *d, double x1, double y1, double x2, double y2, double x, double y)
{
    const double c1[2] = {x1, y1}, c2[2] = {x2, y2}, to[2] = {x, y};
    add(d, utw_curve_cubic(d->pen, c1, c2, to));
}

void drawing_close(drawing *d)
{
    utw_loop *loop = last_loop(d);
    if (d->pen[0] != d->start[0] || d->pen[1] != d->start[1])
        add(d, utw_curve_line(d->pen, d->start));
    loop->vertex[loop->n - 1] = 0;
}

void drawing_ellipse(drawing *d, double x, double y, double a, double b, double radians)
{
    const double c = cos(radians), s = sin(radians), centre[2] = {x, y};
    const double end[2] = {x + a * c, y + a * s};
    utw_curve curve = utw_curve_arc(centre, 1, 0, 2 * UTW_PI, end, end);
    curve.u[0] = a * c;
    curve.u[1] = a * s;
    curve.v[0] = -b * s;
    curve.v[1] = b * c;
    new_loop(d);
    add(d, curve);
    last_loop(d)->vertex[0] = 0;
}

void drawing_circle(drawing *d, double x, double y, double r)
{
    drawing_ellipse(d, x, y, r, r, 0);
}

void drawing_polygon(drawing *d, int n, const double (*xy)[2])
{
    drawing_move(d, xy[0][0], xy[0][1]);
    for (int i = 1; i < n; i++) drawing_line(d, xy[i][0], xy[i][1]);
    drawing_close(d);
}

void drawing_rectangle(drawing *d, double x0, double y0, double x1, double y1)
{
    const double xy[4][2] = {{x0, y0}, {x1, y0}, {x1, y1}, {x0, y1}};
    drawing_polygon(d, 4, xy);
}

void drawing_reverse(drawing *d)
{
    utw_loop_reverse(last_loop(d));
}

void drawing_mixed(drawing *d)
{
    drawing_init(d);
    drawing_part(d, -1);
    drawing_move(d, 0, 0);
    drawing_line(d, 7, -1);
    drawing_arc(d, 9, 0.3, 8.5, 2.4);
    drawing_cubic(d, 8, 5, 4, 2, 3, 6.1);
    drawing_line(d, 0.4, 5.2);
    drawing_arc(d, -0.9, 2.2, 0, 0);
    drawing_close(d);
    drawing_ellipse(d, 3, 2, 1.6, 0.7, 0.5);
    drawing_reverse(d);
}

void drawing_map(drawing *d, const double m[4], const double shift[2])
{
    const mapping map = {{m[0], m[1], m[2], m[3]}, {shift[0], shift[1]}};
    mapping_apply(&map, &d->outline);
}

const utw_outline *drawing_done(drawing *d)
{
    mapping_set_box(&d->outline);
    return &d->outline;
}
