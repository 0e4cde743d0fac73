/* SPDX-License-Identifier: GPL-3.0-or-later
 * The net of an outline: from loops to nodes, edges and what lies on either side. */
#include "outline/net.h"

#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "outline/net_build.h"

static void build_clear(utw_net_build *b)
{
    utw_free(b->strand);
    utw_free(b->first);
    utw_free(b->node);
    utw_free(b->edge_strand);
}

static double size_of(const utw_outline *o)
{
    double all[4] = {HUGE_VAL, HUGE_VAL, -HUGE_VAL, -HUGE_VAL};
    for (int p = 0; p < o->n_part; p++)
        for (int l = 0; l < o->part[p].n_loop; l++)
            for (int k = 0; k < o->part[p].loop[l].n; k++) {
                double box[4];
                utw_curve_box(&o->part[p].loop[l].curve[k], box);
                for (int q = 0; q < 4; q++)
                    all[q] = q < 2 ? fmin(all[q], box[q]) : fmax(all[q], box[q]);
            }
    return hypot(all[2] - all[0], all[3] - all[1]);
}

/* A closed curve becomes four strands, any other one. */
static int strands_of(const utw_loop *loop)
{
    return loop->n == 1 ? 4 : loop->n;
}

static void add_loop(utw_net_build *b, int part, int index)
{
    const utw_loop *loop = &b->outline->part[part].loop[index];
    for (int i = 0; i < strands_of(loop); i++) {
        utw_strand *s = &b->strand[b->n++];
        *s = (utw_strand){.part = part, .loop = index, .k = loop->n == 1 ? 0 : i, .edge = -1};
        s->curve = loop->n == 1 ? utw_curve_piece(&loop->curve[0], 0.25 * i, 0.25 * (i + 1))
                                : loop->curve[i];
    }
}

static utw_status build_strands(utw_net_build *b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_outline *o = b->outline;
    size_t n = 0;
    for (int p = 0; p < o->n_part; p++)
        for (int l = 0; l < o->part[p].n_loop; l++, b->n_loop++)
            n += (size_t)strands_of(&o->part[p].loop[l]);
    UTW_TRY_ALLOC(b->strand = utw_alloc(n, sizeof *b->strand));
    UTW_TRY_ALLOC(b->first = utw_alloc((size_t)b->n_loop + 1, sizeof *b->first));
    int index = 0;
    for (int p = 0; p < o->n_part; p++)
        for (int l = 0; l < o->part[p].n_loop; l++) {
            b->first[index++] = b->n;
            add_loop(b, p, l);
        }
    b->first[index] = b->n;
    st = UTW_OK;
done:
    return st;
}

static void fill_edges(const utw_net_build *b, utw_net *net)
{
    for (int e = 0; e < b->n_edge; e++) {
        const utw_strand *s = &b->strand[b->edge_strand[e]];
        const utw_loop *loop = &b->outline->part[s->part].loop[s->loop];
        net->edge[e] = (utw_net_edge){.curve = s->curve,
                                      .from = s->from,
                                      .to = s->to,
                                      .left = -1,
                                      .right = -1,
                                      .part = s->part,
                                      .loop = s->loop,
                                      .vertex = loop->vertex != NULL ? loop->vertex[s->k] : s->k};
    }
    for (int i = 0; i < b->n; i++) {
        const utw_strand *s = &b->strand[i];
        *(s->forward ? &net->edge[s->edge].left : &net->edge[s->edge].right) = s->part;
    }
}

static utw_status fill_net(utw_net_build *b, utw_net *net, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    net->n_part = b->outline->n_part;
    net->n_node = b->n_node;
    net->n_edge = b->n_edge;
    net->node = b->node;
    b->node = NULL;
    UTW_TRY_ALLOC(net->edge = utw_alloc((size_t)net->n_edge, sizeof *net->edge));
    fill_edges(b, net);
    UTW_TRY_ALLOC(net->loop = utw_alloc((size_t)b->n_loop, sizeof *net->loop));
    for (net->n_loop = 0; net->n_loop < b->n_loop; net->n_loop++) {
        utw_net_loop *loop = &net->loop[net->n_loop];
        const int first = b->first[net->n_loop];
        loop->part = b->strand[first].part;
        loop->n = b->first[net->n_loop + 1] - first;
        UTW_TRY_ALLOC(loop->ref = utw_alloc((size_t)loop->n, sizeof *loop->ref));
        for (int i = 0; i < loop->n; i++) {
            const utw_strand *s = &b->strand[first + i];
            loop->ref[i] = s->forward ? s->edge + 1 : -s->edge - 1;
        }
    }
    st = UTW_OK;
done:
    return st;
}

utw_status utw_net_create(const utw_outline *outline, utw_net **net, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_net_build b = {.outline = outline};
    utw_net *made = NULL;
    b.size = size_of(outline);
    UTW_TRY_ALLOC(made = utw_alloc(1, sizeof *made));
    UTW_TRY(build_strands(&b, err));
    if (outline->n_part > 1) UTW_TRY(utw_net_cut(&b, err));
    UTW_TRY(utw_net_join(&b, err));
    UTW_TRY(utw_net_merge(&b, err));
    UTW_TRY(fill_net(&b, made, err));
    if (outline->n_part > 1) UTW_TRY(utw_net_verify(&b, made, err));
    *net = made;
    made = NULL;
    st = UTW_OK;
done:
    build_clear(&b);
    utw_net_free(made);
    return st;
}

void utw_net_free(utw_net *net)
{
    if (net == NULL) return;
    for (int i = 0; net->loop != NULL && i < net->n_loop; i++) utw_free(net->loop[i].ref);
    utw_free(net->loop);
    utw_free(net->edge);
    utw_free(net->node);
    utw_free(net);
}
