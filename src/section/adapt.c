/* SPDX-License-Identifier: GPL-3.0-or-later
 * The loop of solving, measuring and choosing orders. */
#include "section/adapt.h"

#include <math.h>
#include <string.h>

#include "base/clock.h"
#include "base/memory.h"
#include "base/status.h"
#include "mesh/refine.h"

/* An order more multiplies an element's share of the gap by about this (measured on five profiles).
 */
#define DECAY 0.15
enum {
    FIRST_ORDER = 3,
    LARGEST_STEP = 6, /* orders added at once */
    SPLIT_ORDER = 10  /* an element of this order that still dominates is cut in four */
};

void utw_solved_clear(utw_solved *s)
{
    utw_field_free(s->field);
    utw_lift_free(s->lift);
    utw_rim_free(s->rim);
    utw_mesh_free(s->mesh);
    utw_net_free(s->net);
    utw_basis_store_free(s->store);
    utw_free(s->peak);
    memset(s, 0, sizeof *s);
}

/* J is int |stress|^2 of the torsion pair at the upper end of its bracket. */
static double relative_gap(const utw_measures *m)
{
    const double high = m->stress[UTW_TORSION][UTW_TORSION], gap = m->gap[UTW_TORSION][UTW_TORSION];
    return gap / (high - 0.5 * gap);
}

/* What an anticlastic pair adds to the shear flexibility is mu^2 (its energy less that of the
 * torsion in it), mu = nu/(2(1+nu)) <= 1/6: 36 times the flexibility at nu = 0 and that difference
 * are what its gap is held against. */
static double anticlastic_scale(const utw_measures *m, int anti, double shear)
{
    const double torsion = m->stress[UTW_TORSION][UTW_TORSION], both = m->stress[anti][UTW_TORSION];
    return 36 * shear + fabs(m->stress[anti][anti] - both * both / torsion);
}

/* The value each pair's gap is held against. */
static void scales(const utw_measures *m, double scale[UTW_N_PAIR])
{
    scale[UTW_TORSION] =
        m->stress[UTW_TORSION][UTW_TORSION] - 0.5 * m->gap[UTW_TORSION][UTW_TORSION];
    scale[UTW_SHEAR_X] = m->energy[UTW_SHEAR_X][UTW_SHEAR_X];
    scale[UTW_SHEAR_Y] = m->energy[UTW_SHEAR_Y][UTW_SHEAR_Y];
    scale[UTW_ANTI_X] = anticlastic_scale(m, UTW_ANTI_X, scale[UTW_SHEAR_X]);
    scale[UTW_ANTI_Y] = anticlastic_scale(m, UTW_ANTI_Y, scale[UTW_SHEAR_Y]);
}

typedef struct loop {
    const utw_options *options;
    utw_solved *s;
    int pairs; /* pairs whose gap is refined: the first so many */
    int least_rounds;
    unsigned char *order;
    double *share; /* [n_tri][UTW_N_PAIR] */
} loop;

/* Greatest relative gap over the pairs that count. */
static double worst_gap(const loop *l)
{
    double scale[UTW_N_PAIR], worst = 0;
    scales(&l->s->now, scale);
    for (int i = 0; i < l->pairs; i++) worst = fmax(worst, l->s->now.gap[i][i] / scale[i]);
    return worst;
}

static utw_status renew_mesh_data(loop *l, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_solved *s = l->s;
    utw_rim_free(s->rim);
    utw_lift_free(s->lift);
    s->rim = NULL;
    s->lift = NULL;
    utw_free(l->share);
    utw_free(s->peak);
    l->share = s->peak = NULL;
    UTW_TRY(utw_rim_create(s->mesh, &s->rim, err));
    UTW_TRY(utw_lift_create(s->mesh, s->rim, UTW_N_PAIR, s->pair, &s->lift, err));
    UTW_TRY_ALLOC(l->share = utw_alloc((size_t)s->mesh->n_tri * UTW_N_PAIR, sizeof(double)));
    UTW_TRY_ALLOC(s->peak = utw_alloc((size_t)s->mesh->n_tri, sizeof(double)));
    st = UTW_OK;
done:
    return st;
}

static utw_status solve_once(loop *l, utw_error *err)
{
    utw_solved *s = l->s;
    const utw_setting set = {s->mesh,
                             s->rim,
                             s->lift,
                             s->store,
                             s->moduli == NULL ? NULL : s->moduli->shear,
                             s->moduli == NULL ? NULL : s->moduli->axial,
                             UTW_N_PAIR,
                             s->pair};
    utw_field *field = NULL;
    utw_status st = utw_field_solve(&set, l->order, &field, err);
    if (st != UTW_OK) return st;
    utw_field_free(s->field);
    s->field = field;
    s->before = s->now;
    st = utw_field_measure(field, &s->now, l->share, s->peak, err);
    if (st != UTW_OK) return st;
    s->rounds++;
    s->gap = relative_gap(&s->now);
    s->reached = s->gap <= l->options->tolerance;
    if (l->options->progress != NULL)
        l->options->progress(l->options->user, s->rounds, field->n_free, s->gap);
    return UTW_OK;
}

/* Go over to a finer mesh; children have the orders of their parents. *split_done is 0, and all
 * stays as it is, when an element would fold. */
static utw_status split(loop *l, const unsigned char *wanted, int *split_done, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_mesh *finer = NULL;
    int *parent = NULL;
    unsigned char *order = NULL;
    UTW_TRY(utw_mesh_refine(l->s->mesh, wanted, &finer, &parent, err));
    *split_done = finer != NULL;
    if (finer != NULL) {
        UTW_TRY_ALLOC(order = utw_alloc((size_t)finer->n_tri, 1));
        for (int t = 0; t < finer->n_tri; t++) order[t] = l->order[parent[t]];
        utw_field_free(l->s->field);
        l->s->field = NULL;
        utw_mesh_free(l->s->mesh);
        utw_free(l->order);
        l->s->mesh = finer;
        l->order = order;
        finer = NULL;
        order = NULL;
        UTW_TRY(renew_mesh_data(l, err));
    }
    st = UTW_OK;
done:
    utw_mesh_free(finer);
    utw_free(parent);
    utw_free(order);
    return st;
}

/* Raise orders where an element's share exceeds what it may have. Returns how many elements got a
 * higher order; wanted[t] = 1 where the order is used up. */
static int raise_orders(loop *l, unsigned char *wanted)
{
    const utw_solved *s = l->s;
    const int n = s->mesh->n_tri;
    double scale[UTW_N_PAIR];
    int raised = 0;
    scales(&s->now, scale);
    for (int t = 0; t < n; t++) {
        double excess = 0; /* the largest share over the one allowed */
        for (int i = 0; i < l->pairs; i++) {
            const double allowed = 0.5 * l->options->tolerance * scale[i] / n;
            excess = fmax(excess, l->share[t * UTW_N_PAIR + i] / allowed);
        }
        if (excess <= 1) continue;
        if (l->order[t] >= SPLIT_ORDER) {
            wanted[t] = 1;
            continue;
        }
        int step = (int)ceil(log(excess) / log(1 / DECAY));
        step = step > LARGEST_STEP ? LARGEST_STEP : step;
        const int order = l->order[t] + step;
        l->order[t] = (unsigned char)(order > SPLIT_ORDER ? SPLIT_ORDER : order);
        raised++;
    }
    return raised;
}

/* Where marked elements cannot be cut, the orders beyond that of cutting are all that is left. */
static int raise_to_last(loop *l, const unsigned char *wanted)
{
    int raised = 0;
    for (int t = 0; t < l->s->mesh->n_tri; t++) {
        if (!wanted[t] || l->order[t] >= UTW_ORDER_MAX) continue;
        l->order[t]++;
        raised++;
    }
    return raised;
}

/* Choose orders and cut elements for the next round; *changed is 0 when nothing is left to do. */
static utw_status refine(loop *l, int *changed, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    unsigned char *wanted;
    UTW_TRY_ALLOC(wanted = utw_alloc((size_t)l->s->mesh->n_tri, 1));
    *changed = raise_orders(l, wanted) > 0;
    if (memchr(wanted, 1, (size_t)l->s->mesh->n_tri) != NULL) {
        int split_done;
        UTW_TRY(split(l, wanted, &split_done, err));
        *changed |= split_done || raise_to_last(l, wanted) > 0;
    }
    st = UTW_OK;
done:
    utw_free(wanted);
    return st;
}

/* With a fixed order and two rounds the first one is of another order. */
static int first_order(const loop *l)
{
    const int fixed = l->options->fixed_order;
    if (fixed == 0) return FIRST_ORDER;
    return l->least_rounds == 1 ? fixed : fixed > 1 ? fixed - 1 : 2;
}

static utw_status run(loop *l, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_options *o = l->options;
    const int n = l->s->mesh->n_tri;
    UTW_TRY_ALLOC(l->order = utw_alloc((size_t)n, 1));
    memset(l->order, first_order(l), (size_t)n);
    UTW_TRY(renew_mesh_data(l, err));
    for (;;) {
        UTW_TRY(solve_once(l, err));
        if (o->fixed_order > 0) {
            if (l->s->rounds >= l->least_rounds) break;
            memset(l->order, o->fixed_order, (size_t)n);
            continue;
        }
        if (worst_gap(l) <= o->tolerance) {
            if (l->s->rounds >= l->least_rounds) break;
            for (int t = 0; t < l->s->mesh->n_tri; t++) l->order[t]++;
            continue;
        }
        if (l->s->rounds >= o->max_rounds || l->s->field->n_free > o->max_unknowns) break;
        int changed = 0;
        UTW_TRY(refine(l, &changed, err));
        if (changed == 0) break;
    }
    st = UTW_OK;
done:
    return st;
}

utw_status utw_adapt(utw_net *net, const utw_moduli *moduli, const utw_options *options,
                     int poisson, utw_solved *s, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    loop l = {options, s, poisson ? UTW_N_PAIR : UTW_SHEAR_Y + 1, 1, NULL, NULL};
    memset(s, 0, sizeof *s);
    s->net = net;
    s->moduli = moduli;
    utw_problems(s->pair);
    if (moduli != NULL) { /* their fluxes would need data on the sides between parts */
        s->pair[UTW_SHEAR_X].balanced = s->pair[UTW_SHEAR_Y].balanced = 0;
        l.pairs = UTW_TORSION + 1;
        l.least_rounds = 2;
    }
    const double start = utw_seconds();
    const utw_mesh_options mesh_options = {options->mesh_scale, options->tolerance};
    UTW_TRY(utw_mesh_create(net, &mesh_options, &s->mesh, err));
    s->seconds_mesh = utw_seconds() - start;
    UTW_TRY(utw_basis_store_create(&s->store, err));
    UTW_TRY(run(&l, err));
    s->seconds_solve = utw_seconds() - start - s->seconds_mesh;
    st = UTW_OK;
done:
    utw_free(l.order);
    utw_free(l.share);
    return st;
}
