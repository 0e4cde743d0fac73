/* SPDX-License-Identifier: GPL-3.0-or-later
 * utw_solve(): from an outline to its constants. */
#include "section/solution.h"

#include <math.h>

#include "base/clock.h"
#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/net_shape.h"
#include "section/peak.h"

/* A corner turned further in than this is sharp: the stress there has no bound. Flatter kinks are
 * those of curves drawn in pieces. */
#define SHARP_CORNER (185 * UTW_PI / 180)

static utw_status check_options(const utw_options *o, utw_error *err)
{
    if (o->version != 1)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "options: version %d is not known; start from UTW_OPTIONS_INIT",
                        o->version);
    if (!(o->tolerance >= 1e-12 && o->tolerance <= 0.5))
        return utw_fail(err, UTW_E_ARGUMENT, "options: tolerance %g is outside 1e-12 .. 0.5",
                        o->tolerance);
    if (o->fixed_order < 0 || o->fixed_order > UTW_ORDER_MAX)
        return utw_fail(err, UTW_E_ARGUMENT, "options: order %d is outside 0 .. %d", o->fixed_order,
                        UTW_ORDER_MAX);
    if (!(o->mesh_scale >= 1e-3 && o->mesh_scale <= 10))
        return utw_fail(err, UTW_E_ARGUMENT, "options: mesh scale %g is outside 0.001 .. 10",
                        o->mesh_scale);
    if (o->max_rounds < 1 || o->max_unknowns < 1)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "options: max_rounds and max_unknowns must be at least 1");
    return UTW_OK;
}

/* Poisson's ratio of the section: that of its parts when they have one in common. */
static double poisson_of(const utw_outline *o)
{
    double nu = UTW_NAN;
    for (int i = 0; i < o->n_part; i++) {
        const double mine = o->part[i].material < 0 ? UTW_NAN : o->material[o->part[i].material].nu;
        if (i > 0 && !(mine == nu)) return UTW_NAN;
        nu = mine;
    }
    return nu;
}

static utw_status note_corners(utw_solution *s, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int *node = NULL, n = 0;
    const utw_net *net = s->solved.net;
    UTW_TRY(utw_net_sharp_corners(net, SHARP_CORNER, &node, &n, err));
    UTW_TRY_ALLOC(s->corner = utw_alloc((size_t)n, sizeof *s->corner));
    for (int i = 0; i < n; i++)
        for (int k = 0; k < 2; k++)
            s->corner[i][k] = s->origin[k] + s->unit * net->node[node[i]][k];
    s->n_corner = n;
    st = UTW_OK;
done:
    utw_free(node);
    return st;
}

/* Wt = T / tau_max = J / greatest stress at theta' = 1, G = 1. */
static void torsion_modulus(utw_solution *s)
{
    utw_constant_value *Wt = &s->value[UTW_WT];
    if (s->n_corner > 0) {
        Wt->absent = UTW_E_UNBOUNDED;
        return;
    }
    const utw_peak peak = utw_torsion_peak(&s->solved);
    const utw_quantity *J = &s->value[UTW_J].quantity;
    const double low = peak.value * s->unit - peak.error * s->unit,
                 high = (peak.value + peak.error) * s->unit;
    Wt->quantity = (utw_quantity){J->value / (peak.value * s->unit), J->low / high,
                                  low > 0 ? J->high / low : UTW_INFINITY, UTW_ESTIMATE};
}

utw_status utw_solve(const utw_outline *outline, const utw_options *options,
                     utw_solution **solution, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_options defaults = UTW_OPTIONS_INIT;
    utw_net *net = NULL;
    utw_solution *s = NULL;
    const double start = utw_seconds();
    if (outline == NULL || solution == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_solve: outline and solution must not be NULL");
    UTW_TRY(check_options(options == NULL ? &defaults : options, err));
    UTW_TRY_ALLOC(s = utw_alloc(1, sizeof *s));
    s->outline = outline;
    s->options = options == NULL ? defaults : *options;
    s->nu = poisson_of(outline);
    UTW_TRY(utw_composite_of(outline, &s->composite, err));
    const int several = s->composite.reference != NULL;
    UTW_TRY(utw_area_compute(outline, s->composite.by_material, &s->area, err));
    /* work about the centroid, or cancellation eats the bracket; a power of two as the unit changes
     * no digit */
    s->origin[0] = s->area.xc;
    s->origin[1] = s->area.yc;
    s->unit = exp2(round(0.5 * log2(s->area.A)));
    UTW_TRY(utw_net_create(outline, &net, err));
    utw_net_move(net, s->origin, s->unit);
    UTW_TRY(utw_adapt(net, several ? &s->composite.by_part : NULL, &s->options, !isnan(s->nu),
                      &s->solved, err));
    utw_constants_of_area(&s->area, s->value);
    UTW_TRY(note_corners(s, err));
    if (several) {
        utw_constants_of_composite(&s->area, s->unit, &s->solved, s->value);
    } else {
        utw_constants_of_solution(&s->area, s->unit, &s->solved, s->nu, s->value);
        torsion_modulus(s);
    }
    s->seconds = utw_seconds() - start;
    *solution = s;
    s = NULL;
    st = UTW_OK;
done:
    utw_solution_free(s);
    return st;
}

void utw_solution_free(utw_solution *s)
{
    if (s == NULL) return;
    utw_solved_clear(&s->solved);
    utw_composite_clear(&s->composite);
    utw_free(s->corner);
    utw_free(s);
}

utw_status utw_solution_constant(const utw_solution *s, utw_constant which, utw_quantity *quantity,
                                 utw_error *err)
{
    if (s == NULL || quantity == NULL || (int)which < 0 || which >= UTW_CONSTANT_COUNT)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_solution_constant: no such constant");
    const utw_constant_value *v = &s->value[which];
    if (v->absent == UTW_E_MATERIAL && s->composite.reference != NULL)
        return utw_fail(err, UTW_E_MATERIAL, "%s is given for sections of one material only",
                        utw_constant_key(which));
    if (v->absent == UTW_E_MATERIAL)
        return utw_fail(err, UTW_E_MATERIAL,
                        "%s needs a Poisson's ratio: give every part one material with \"nu\"",
                        utw_constant_key(which));
    if (v->absent == UTW_E_UNBOUNDED)
        return utw_fail(err, UTW_E_UNBOUNDED,
                        "%s does not exist: the stress has no bound at the sharp re-entrant corner "
                        "(%g, %g); give it its real radius",
                        utw_constant_key(which), s->corner[0][0], s->corner[0][1]);
    *quantity = v->quantity;
    return UTW_OK;
}

void utw_solution_get_info(const utw_solution *s, utw_solution_info *info)
{
    const utw_field *f = s->solved.field;
    int least = UTW_ORDER_MAX, greatest = 1;
    for (int t = 0; t < s->solved.mesh->n_tri; t++) {
        least = f->order[t] < least ? f->order[t] : least;
        greatest = f->order[t] > greatest ? f->order[t] : greatest;
    }
    *info = (utw_solution_info){least,
                                greatest,
                                s->solved.mesh->n_tri,
                                f->n_free,
                                f->n_skeleton_free,
                                s->solved.rounds,
                                s->solved.gap,
                                s->options.tolerance,
                                s->solved.reached,
                                s->outline->seconds,
                                s->solved.seconds_mesh,
                                s->solved.seconds_solve,
                                s->outline->seconds + s->seconds};
}

/* ---- stiffnesses ----------------------------------------------------------------------------- */

static const struct {
    const char *key;
    utw_constant constant;
    int shear; /* times G, not E */
} stiffness[UTW_STIFFNESS_COUNT] = {
    [UTW_STIFFNESS_EA] = {"EA", UTW_A, 0},       [UTW_STIFFNESS_EIXX] = {"EIxx", UTW_IXX, 0},
    [UTW_STIFFNESS_EIYY] = {"EIyy", UTW_IYY, 0}, [UTW_STIFFNESS_EIXY] = {"EIxy", UTW_IXY, 0},
    [UTW_STIFFNESS_GJ] = {"GJ", UTW_J, 1},       [UTW_STIFFNESS_EIW] = {"EIw", UTW_IW, 0},
};

const char *utw_stiffness_key(utw_stiffness which)
{
    return (int)which >= 0 && which < UTW_STIFFNESS_COUNT ? stiffness[which].key : NULL;
}

utw_constant utw_stiffness_constant(utw_stiffness which)
{
    return (int)which >= 0 && which < UTW_STIFFNESS_COUNT ? stiffness[which].constant
                                                          : UTW_CONSTANT_COUNT;
}

int utw_solution_composite(const utw_solution *s)
{
    return s != NULL && s->composite.reference != NULL;
}

utw_status utw_solution_stiffness(const utw_solution *s, utw_stiffness which,
                                  utw_quantity *quantity, utw_error *err)
{
    if (s == NULL || quantity == NULL || (int)which < 0 || which >= UTW_STIFFNESS_COUNT)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_solution_stiffness: no such stiffness");
    const int m = s->outline->part[0].material;
    if (m < 0)
        return utw_fail(err, UTW_E_MATERIAL, "%s needs a material: give the parts one",
                        stiffness[which].key);
    const utw_material *r = &s->outline->material[m];
    const double factor = stiffness[which].shear ? r->E / (2 * (1 + r->nu)) : r->E;
    utw_quantity q;
    const utw_status st = utw_solution_constant(s, stiffness[which].constant, &q, err);
    if (st == UTW_OK)
        *quantity = (utw_quantity){factor * q.value, factor * q.low, factor * q.high, q.trust};
    return st;
}
