/* SPDX-License-Identifier: GPL-3.0-or-later
 * Curves and elements as paths. */
#include "draw/mesh_paths.h"

#include <math.h>

#include "base/vec2.h"

static void on_page(const utw_frame *f, const double p[2], double xy[2])
{
    xy[0] = f->x0 + f->scale * p[0];
    xy[1] = f->y0 - f->scale * p[1];
}

static void line_to(utw_canvas *c, const utw_frame *f, const double p[2])
{
    double xy[2];
    on_page(f, p, xy);
    utw_canvas_line(c, xy[0], xy[1]);
}

static void move_to(utw_canvas *c, const utw_frame *f, const double p[2])
{
    double xy[2];
    on_page(f, p, xy);
    utw_canvas_move(c, xy[0], xy[1]);
}

static void cubic_to(utw_canvas *c, const utw_frame *f, const double p1[2], const double p2[2],
                     const double p3[2])
{
    double a[2], b[2], to[2];
    on_page(f, p1, a);
    on_page(f, p2, b);
    on_page(f, p3, to);
    utw_canvas_cubic(c, a[0], a[1], b[0], b[1], to[0], to[1]);
}

/* Hermite interpolation with the tangents at the ends: the handle is 4/3 tan(da/4) of the
 * derivative by the angle (common practice). */
static void arc_to(utw_canvas *c, const utw_frame *f, const utw_curve *curve)
{
    const double turn = fabs(curve->a1 - curve->a0);
    const int n = 1 + (int)floor(turn / (UTW_PI / 4));
    const double da = (curve->a1 - curve->a0) / n, handle = 4.0 / 3 * tan(da / 4) / da;
    for (int i = 0; i < n; i++) {
        double p[4][2], d0[2], d1[2];
        utw_curve_point(curve, (double)i / n, p[0]);
        utw_curve_point(curve, (double)(i + 1) / n, p[3]);
        utw_curve_d1(curve, (double)i / n, d0);
        utw_curve_d1(curve, (double)(i + 1) / n, d1);
        for (int d = 0; d < 2; d++) {
            p[1][d] = p[0][d] + handle * d0[d] / n;
            p[2][d] = p[3][d] - handle * d1[d] / n;
        }
        cubic_to(c, f, p[1], p[2], p[3]);
    }
}

void utw_lay_curve(utw_canvas *c, const utw_frame *f, const utw_curve *curve)
{
    switch (curve->kind) {
    case UTW_LINE:
        line_to(c, f, curve->to);
        break;
    case UTW_ARC:
        arc_to(c, f, curve);
        break;
    case UTW_CUBIC:
        cubic_to(c, f, curve->c1, curve->c2, curve->to);
        break;
    }
}

static void side_to(utw_canvas *c, const utw_frame *f, const utw_mesh *mesh, const utw_triangle *t,
                    int k)
{
    if (!utw_mesh_is_curved(mesh, t, k)) {
        line_to(c, f, mesh->xy[t->node[(k + 1) % 3]]);
        return;
    }
    const utw_curve piece =
        utw_curve_piece(&mesh->net->edge[t->curve[k]].curve, t->t[k][0], t->t[k][1]);
    utw_lay_curve(c, f, &piece);
}

void utw_lay_element(utw_canvas *c, const utw_frame *f, const utw_mesh *mesh, int tri)
{
    const utw_triangle *t = &mesh->tri[tri];
    move_to(c, f, mesh->xy[t->node[0]]);
    for (int k = 0; k < 3; k++) side_to(c, f, mesh, t, k);
    utw_canvas_close(c);
}

void utw_lay_edge(utw_canvas *c, const utw_frame *f, const utw_mesh *mesh, int edge)
{
    const utw_mesh_edge *e = &mesh->edge[edge];
    const utw_triangle *t = &mesh->tri[e->tri[0]];
    move_to(c, f, mesh->xy[t->node[e->slot[0]]]);
    side_to(c, f, mesh, t, e->slot[0]);
}
