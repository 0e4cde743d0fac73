/* SPDX-License-Identifier: GPL-3.0-or-later
 * Weighted boundary curves about a chosen origin. */
#include "section/boundary.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

void utw_sum_add(utw_sum *s, double term)
{
    const double sum = s->sum + term;
    s->carry += fabs(s->sum) >= fabs(term) ? (s->sum - sum) + term : (term - sum) + s->sum;
    s->sum = sum;
}

double utw_sum_value(const utw_sum *s)
{
    return s->sum + s->carry;
}

static utw_status weight_of(const utw_outline *o, int part, const double *weight, double *w,
                            utw_error *err)
{
    const int material = o->part[part].material;
    *w = weight != NULL && material >= 0 ? weight[material] : 1;
    if (*w > 0 && isfinite(*w)) return UTW_OK;
    const utw_status st = utw_fail(
        err, UTW_E_ARGUMENT, "part %d has the weight %g; weights must be positive", part + 1, *w);
    utw_error_place(err, part, -1, -1);
    return st;
}

static void find_middle(const utw_boundary *b, double middle[2])
{
    double all[4] = {HUGE_VAL, HUGE_VAL, -HUGE_VAL, -HUGE_VAL};
    for (int i = 0; i < b->n; i++) {
        double box[4];
        utw_curve_box(&b->curve[i], box);
        for (int q = 0; q < 4; q++) all[q] = q < 2 ? fmin(all[q], box[q]) : fmax(all[q], box[q]);
    }
    for (int k = 0; k < 2; k++) middle[k] = 0.5 * (all[k] + all[k + 2]);
}

utw_status utw_boundary_init(utw_boundary *boundary, const utw_outline *o, const double *weight,
                             utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_boundary made = {.n = 0};
    size_t n = 0;
    for (int p = 0; p < o->n_part; p++)
        for (int l = 0; l < o->part[p].n_loop; l++) n += (size_t)o->part[p].loop[l].n;
    if (n == 0) {
        st = utw_fail(err, UTW_E_ARGUMENT, "the section has no edges");
        goto done;
    }
    UTW_TRY_ALLOC(made.curve = utw_alloc(n, sizeof *made.curve));
    UTW_TRY_ALLOC(made.weight = utw_alloc(n, sizeof *made.weight));
    for (int p = 0; p < o->n_part; p++) {
        double w = 0;
        UTW_TRY(weight_of(o, p, weight, &w, err));
        for (int l = 0; l < o->part[p].n_loop; l++)
            for (int k = 0; k < o->part[p].loop[l].n; k++) {
                made.weight[made.n] = w;
                made.curve[made.n++] = o->part[p].loop[l].curve[k];
            }
    }
    double middle[2];
    find_middle(&made, middle);
    utw_boundary_move(&made, middle);
    *boundary = made;
    memset(&made, 0, sizeof made);
    st = UTW_OK;
done:
    utw_boundary_clear(&made);
    return st;
}

void utw_boundary_clear(utw_boundary *b)
{
    utw_free(b->curve);
    utw_free(b->weight);
    memset(b, 0, sizeof *b);
}

void utw_boundary_move(utw_boundary *b, const double d[2])
{
    for (int i = 0; i < b->n; i++) {
        utw_curve *c = &b->curve[i];
        for (int k = 0; k < 2; k++) {
            c->from[k] -= d[k];
            c->to[k] -= d[k];
            c->centre[k] -= d[k];
            c->c1[k] -= d[k];
            c->c2[k] -= d[k];
        }
    }
    for (int k = 0; k < 2; k++) b->origin[k] += d[k];
}

void utw_boundary_rule(const utw_curve *c, int degree, int *pieces, int *points)
{
    *pieces = 1;
    if (c->kind == UTW_LINE) {
        *points = degree / 2 + 1; /* x dy - y dx is constant along a line */
    } else if (c->kind == UTW_CUBIC) {
        *points = (3 * degree + 5) / 2 + 1; /* degree 3 in t each, and 5 of the differential */
    } else {
        /* on a quarter turn cos(5 a) is integrated to 1e-17 by 14 points */
        *pieces = (int)ceil(fabs(c->a1 - c->a0) / (0.5 * UTW_PI) - 1e-9);
        if (*pieces < 1) *pieces = 1;
        *points = 14;
    }
}
