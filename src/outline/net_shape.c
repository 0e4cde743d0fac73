/* SPDX-License-Identifier: GPL-3.0-or-later
 * Moving a net, and its sharp corners. */
#include "outline/net_shape.h"

#include <stdlib.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

static void move_point(double p[2], const double origin[2], double unit)
{
    p[0] = (p[0] - origin[0]) / unit;
    p[1] = (p[1] - origin[1]) / unit;
}

void utw_net_move(utw_net *net, const double origin[2], double unit)
{
    for (int i = 0; i < net->n_node; i++) move_point(net->node[i], origin, unit);
    for (int e = 0; e < net->n_edge; e++) {
        utw_curve *c = &net->edge[e].curve;
        move_point(c->from, origin, unit);
        move_point(c->to, origin, unit);
        move_point(c->centre, origin, unit);
        move_point(c->c1, origin, unit);
        move_point(c->c2, origin, unit);
        for (int k = 0; k < 2; k++) {
            c->u[k] /= unit;
            c->v[k] /= unit;
        }
    }
}

/* Direction of an edge of a loop at its start (end = 0) or, reversed, at its end (end = 1), seen
 * along the loop. */
static void direction(const utw_net *net, int ref, int end, double d[2])
{
    const utw_curve *c = &net->edge[abs(ref) - 1].curve;
    utw_curve_d1(c, (ref > 0) == (end == 0) ? 0 : 1, d);
    if (ref < 0) {
        d[0] = -d[0];
        d[1] = -d[1];
    }
}

static int is_outer(const utw_net *net, int ref)
{
    const utw_net_edge *e = &net->edge[abs(ref) - 1];
    return e->left < 0 || e->right < 0;
}

utw_status utw_net_corners(const utw_net *net, double least, double most, int **node, int *n,
                           utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    double *angle = NULL;
    unsigned char *outer = NULL;
    int *list = NULL, count = 0;
    UTW_TRY_ALLOC(angle = utw_alloc((size_t)net->n_node, sizeof *angle));
    UTW_TRY_ALLOC(outer = utw_alloc((size_t)net->n_node, 1));
    UTW_TRY_ALLOC(list = utw_alloc((size_t)net->n_node, sizeof *list));
    for (int l = 0; l < net->n_loop; l++) {
        const utw_net_loop *loop = &net->loop[l];
        for (int i = 0; i < loop->n;
             i++) { /* the part's own angle at the node where edge i starts */
            const int in = loop->ref[(i + loop->n - 1) % loop->n], out = loop->ref[i];
            const utw_net_edge *e = &net->edge[abs(out) - 1];
            const int at = out > 0 ? e->from : e->to;
            double a[2], b[2];
            direction(net, in, 1, a);
            direction(net, out, 0, b);
            angle[at] += UTW_PI - atan2(utw_cross(a, b), utw_dot(a, b));
            outer[at] |= (unsigned char)(is_outer(net, in) || is_outer(net, out));
        }
    }
    for (int i = 0; i < net->n_node; i++)
        if (outer[i] && angle[i] > least && angle[i] < most) list[count++] = i;
    *node = list;
    *n = count;
    list = NULL;
    st = UTW_OK;
done:
    utw_free(angle);
    utw_free(outer);
    utw_free(list);
    return st;
}

utw_status utw_net_sharp_corners(const utw_net *net, double least_angle, int **node, int *n,
                                 utw_error *err)
{
    return utw_net_corners(net, least_angle, UTW_INFINITY, node, n, err);
}
