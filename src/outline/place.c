/* SPDX-License-Identifier: GPL-3.0-or-later
 * Parts put elsewhere. */
#include "base/vec2.h"
#include "outline/draft.h"
#include "outline/outline.h"

/* m p + shift, or m p alone for directions. */
static void map(double p[2], const double m[4], const double shift[2])
{
    const double x = p[0], y = p[1];
    p[0] = m[0] * x + m[1] * y + (shift != NULL ? shift[0] : 0);
    p[1] = m[2] * x + m[3] * y + (shift != NULL ? shift[1] : 0);
}

void utw_part_place(utw_part *part, const utw_placement *placement)
{
    double cs[2];
    utw_draft_cos_sin(placement->turn, cs);
    const double s = placement->mirror ? -1 : 1, m[4] = {s * cs[0], -cs[1], s * cs[1], cs[0]};
    for (int i = 0; i < part->n_loop; i++) {
        utw_loop *loop = &part->loop[i];
        for (int k = 0; k < loop->n; k++) {
            utw_curve *c = &loop->curve[k];
            map(c->from, m, placement->at);
            map(c->to, m, placement->at);
            map(c->centre, m,
                placement->at); /* an arc's parameters run as before along the new axes */
            map(c->u, m, NULL);
            map(c->v, m, NULL);
            map(c->c1, m, placement->at);
            map(c->c2, m, placement->at);
        }
        if (placement->mirror) utw_loop_reverse(loop);
    }
}
