/* SPDX-License-Identifier: GPL-3.0-or-later
 * The push: a bar under a transverse force at a stated place of its section. */
#include "bar/push.h"

#include <math.h>

#include "bar/push_load.h"
#include "bar/push_stress.h"
#include "base/memory.h"
#include "base/vec2.h"
#include "section/solution.h"
#include "section/stress.h"

/* The effects of an end, of whatever kind, fade over about a quarter of the width of a solid
 * section (a plane strip of width h: exp(-4.2 z/h); Horgan and Knowles, Advances in Applied
 * Mechanics 23, 1983, from memory). Held warping that fades faster than this share of the section's
 * size is such an effect, and Vlasov's theory overstates its stresses. */
#define LOCAL 0.2

void utw_pushed_at(const utw_pushed *bar, double z, double offset, utw_push_state *state)
{
    utw_bending_state b;
    utw_torsion_state t;
    utw_bending_at(&bar->bending, z, &b);
    utw_torsion_at(&bar->torsion, z, &t);
    const double warping = bar->torsion.bar.EIw > 0 ? t.warping : 0;
    *state = (utw_push_state){
        .z = fmin(fmax(z, 0), bar->bending.bar.length),
        .u = {b.u[0], b.u[1]},
        .slope = {b.slope[0], b.slope[1]},
        .twist = offset * t.theta,
        .twist1 = offset * t.theta1,
        .forces = {.Vx = b.Vx,
                   .Vy = b.Vy,
                   .Mx = b.Mx,
                   .My = b.My,
                   .T = offset * t.saint_venant,
                   .B = bar->torsion.bar.EIw > 0 ? offset * t.bimoment : 0},
        .torque = offset * t.torque,
        .warping_torque = offset * warping,
    };
}

double utw_push_offset(const utw_push *p, const double at[2])
{
    const double *s = p->result.shear_centre, *a = p->result.across;
    return (at[0] - s[0]) * a[0] + (at[1] - s[1]) * a[1];
}

/* Where the section lies along `across`, exactly: the curves in axes turned so that this is x. */
static void find_section(const utw_solution *solution, utw_push_result *r)
{
    const double c = r->across[0], s = r->across[1], *o = r->shear_centre;
    const utw_outline *outline = solution->outline;
    r->section[0] = HUGE_VAL;
    r->section[1] = -HUGE_VAL;
    for (int p = 0; p < outline->n_part; p++) /* the outline of a part is its first loop */
        for (int i = 0; i < outline->part[p].loop[0].n; i++) {
            utw_curve curve = outline->part[p].loop[0].curve[i];
            double *point[] = {curve.from, curve.to, curve.centre, curve.c1, curve.c2};
            double *way[] = {curve.u, curve.v}, box[4];
            for (int k = 0; k < 5; k++) {
                const double x = point[k][0] - o[0], y = point[k][1] - o[1];
                point[k][0] = c * x + s * y, point[k][1] = c * y - s * x;
            }
            for (int k = 0; k < 2; k++) {
                const double x = way[k][0], y = way[k][1];
                way[k][0] = c * x + s * y, way[k][1] = c * y - s * x;
            }
            utw_curve_box(&curve, box);
            r->section[0] = fmin(r->section[0], box[0]);
            r->section[1] = fmax(r->section[1], box[2]);
        }
}

/* What needs no solution of the bar. */
static void describe(utw_push *p)
{
    const utw_solution *s = p->solution;
    const utw_push_load *load = &p->load;
    utw_push_result *r = &p->result;
    const utw_quantity *xs = &s->value[UTW_XS].quantity, *ys = &s->value[UTW_YS].quantity,
                       *J = &s->value[UTW_J].quantity, *Iw = &s->value[UTW_IW].quantity;
    const double *box = s->outline->box, force = utw_norm(load->force);
    r->E = s->outline->material[s->outline->part[0].material].E;
    r->G = r->E / (2 * (1 + s->nu));
    r->z = utw_push_load_z(load);
    r->size = hypot(box[2] - box[0], box[3] - box[1]);
    r->shear_centre[0] = xs->value;
    r->shear_centre[1] = ys->value;
    const double side = load->force[1] > 0 || (load->force[1] == 0 && load->force[0] < 0) ? 1 : -1;
    r->across[0] = side * load->force[1] / force + 0.0; /* -0 becomes 0 */
    r->across[1] = side * -load->force[0] / force + 0.0;
    r->shear_centre_error =
        (fabs(r->across[0]) * (xs->high - xs->low) + fabs(r->across[1]) * (ys->high - ys->low)) / 2;
    find_section(s, r);
    r->offset = load->has_at ? utw_push_offset(p, load->at) : 0;
    r->fade = Iw->low > 0 ? sqrt(r->E * Iw->value / (r->G * J->value)) : 0;
    r->uniform_torsion =
        !(Iw->low > 0) || (load->warping != UTW_WARPING_HELD && r->fade < LOCAL * r->size);
    const int fixed[2] = {load->support != UTW_FORKED, load->support == UTW_FIXED_FIXED};
    const int held[2] = {1, load->support != UTW_FIXED_FREE}; /* is there a support? */
    for (int k = 0; k < 2; k++)
        r->warping_held[k] =
            !r->uniform_torsion && held[k] &&
            (load->warping == UTW_WARPING_HELD || (load->warping == UTW_WARPING_USUAL && fixed[k]));
}

/* What acts along the bar in bending, with shear flexibilities a = (1/Asx, 1/Asy, coupling). */
static utw_status bend(const utw_push *p, const double a[3], utw_bending_solution *bending,
                       utw_error *err)
{
    const utw_push_load *load = &p->load;
    const utw_push_result *r = &p->result;
    const utw_area *area = &p->solution->area;
    const double L = load->length;
    const int spread = isnan(r->z);
    const utw_bending_bar bar = {
        .length = L,
        .E = r->E,
        .Ixx = area->Ixx,
        .Iyy = area->Iyy,
        .Ixy = area->Ixy,
        .shear = {a[0] / r->G, a[1] / r->G, a[2] / r->G},
        .start = load->support == UTW_FORKED ? UTW_BENDING_FORK : UTW_BENDING_FIXED,
        .end = load->support == UTW_FIXED_FREE    ? UTW_BENDING_FREE
               : load->support == UTW_FIXED_FIXED ? UTW_BENDING_FIXED
                                                  : UTW_BENDING_FORK,
        .force = {spread ? 0 : load->force[0], spread ? 0 : load->force[1]},
        .at = spread ? L : r->z,
        .per_length = {spread ? load->force[0] / L : 0, spread ? load->force[1] / L : 0},
    };
    return utw_bending_solve(&bar, bending, err);
}

/* The same in torsion for an offset of 1, with these constants. */
static utw_status twist(const utw_push *p, double J, double Iw, utw_torsion_solution *torsion,
                        utw_error *err)
{
    const utw_push_load *load = &p->load;
    const utw_push_result *r = &p->result;
    const double L = load->length;
    /* Vy (x - xs) - Vx (y - ys) */
    const double torque = load->force[1] * r->across[0] - load->force[0] * r->across[1];
    const int spread = isnan(r->z);
    const utw_torsion_bar bar = {
        .length = L,
        .GJ = r->G * J,
        .EIw = r->uniform_torsion ? 0 : r->E * Iw,
        .start = {1, r->warping_held[0]},
        .end = {load->support != UTW_FIXED_FREE, r->warping_held[1]},
        .torque = spread ? 0 : torque,
        .at = spread ? L : r->z,
        .per_length = spread ? torque / L : 0,
    };
    return utw_torsion_solve(&bar, torsion, err);
}

static utw_status sag_at(const void *context, double z, double *value, utw_error *err)
{
    const utw_push *p = context;
    utw_push_state s;
    (void)err;
    utw_pushed_at(&p->bar, z, 0, &s);
    *value = utw_norm(s.u);
    return UTW_OK;
}

static utw_status turn_at(const void *context, double z, double *value, utw_error *err)
{
    const utw_push *p = context;
    utw_push_state s;
    (void)err;
    utw_pushed_at(&p->bar, z, 1, &s);
    *value = fabs(s.twist);
    return UTW_OK;
}

static void widen(utw_quantity *q, double x)
{
    q->low = fmin(q->low, x);
    q->high = fmax(q->high, x);
}

/* Along the bar peaks are flat: this leaves their values to rounding. */
#define PRECISION 1e-8

/* Greatest deflection, its bounds from those of the shear areas: it is linear in the flexibilities
 * when equilibrium alone gives the forces. */
static utw_status find_deflection(utw_push *p, utw_error *err)
{
    const utw_solution *s = p->solution;
    utw_push_result *r = &p->result;
    const utw_quantity *As[2] = {&s->value[UTW_ASX].quantity, &s->value[UTW_ASY].quantity};
    const utw_quantity c = utw_shear_coupling(&s->area, s->unit, &s->solved, s->nu);
    const double a[3] = {1 / As[0]->value, 1 / As[1]->value, c.value};
    const int determinate = p->load.support == UTW_FIXED_FREE || p->load.support == UTW_FORKED;
    utw_push_state state;
    double size;
    utw_status st = bend(p, a, &p->bar.bending, err);
    if (st == UTW_OK)
        st = utw_along_greatest(&p->stations, sag_at, p, PRECISION, &r->z_deflection, &size, err);
    if (st != UTW_OK) return st;
    utw_pushed_at(&p->bar, r->z_deflection, 0, &state);
    for (int k = 0; k < 2; k++)
        r->deflection[k] = (utw_quantity){state.u[k], state.u[k], state.u[k],
                                          determinate ? UTW_BRACKET : UTW_ESTIMATE};
    for (int corner = 0; corner < 8; corner++) {
        utw_bending_solution bending;
        utw_bending_state b;
        const double at[3] = {1 / (corner & 1 ? As[0]->low : As[0]->high),
                              1 / (corner & 2 ? As[1]->low : As[1]->high),
                              corner & 4 ? c.low : c.high};
        st = bend(p, at, &bending, err);
        if (st != UTW_OK) return st;
        utw_bending_at(&bending, r->z_deflection, &b);
        for (int k = 0; k < 2; k++) widen(&r->deflection[k], b.u[k]);
    }
    return UTW_OK;
}

/* Greatest twist for an offset of 1 and for the load's, with what the bounds of J, Iw and the shear
 * centre make of them. */
static utw_status find_twist(utw_push *p, utw_error *err)
{
    utw_push_result *r = &p->result;
    const utw_quantity *J = &p->solution->value[UTW_J].quantity,
                       *Iw = &p->solution->value[UTW_IW].quantity;
    utw_push_state state;
    double size;
    utw_status st =
        utw_along_greatest(&p->stations, turn_at, p, PRECISION, &r->z_twist, &size, err);
    if (st != UTW_OK) return st;
    utw_pushed_at(&p->bar, r->z_twist, 1, &state);
    utw_quantity *q = &r->twist_per_offset;
    *q = (utw_quantity){state.twist, state.twist, state.twist,
                        r->uniform_torsion ? UTW_BRACKET : UTW_ESTIMATE};
    for (int corner = 0; corner < 4; corner++) {
        utw_torsion_solution torsion;
        utw_torsion_state t;
        st =
            twist(p, corner & 1 ? J->low : J->high, corner & 2 ? Iw->low : Iw->high, &torsion, err);
        if (st != UTW_OK) return st;
        utw_torsion_at(&torsion, r->z_twist, &t);
        widen(q, t.theta);
    }
    const double e = r->offset, off = p->load.has_at ? r->shear_centre_error : 0;
    r->twist = (utw_quantity){e * q->value, e * q->value, e * q->value, q->trust};
    for (int corner = 0; corner < 4; corner++)
        widen(&r->twist, (corner & 1 ? e - off : e + off) * (corner & 2 ? q->low : q->high));
    return UTW_OK;
}

static void find_states(utw_push *p)
{
    utw_push_result *r = &p->result;
    utw_push_state s;
    utw_pushed_at(&p->bar, 0, r->offset, &r->start);
    utw_pushed_at(&p->bar, p->load.length, r->offset, &r->end);
    utw_pushed_at(&p->bar, isnan(r->z) ? r->z_deflection : r->z, r->offset, &s);
    const double *at = p->load.has_at ? p->load.at : r->shear_centre;
    r->load_moves[0] = s.u[0] - s.twist * (at[1] - r->shear_centre[1]);
    r->load_moves[1] = s.u[1] + s.twist * (at[0] - r->shear_centre[0]);
}

/* Least yield stress of the parts, NAN when one has none. */
static double yield_of(const utw_outline *o)
{
    double least = HUGE_VAL;
    for (int i = 0; i < o->n_part; i++) {
        const double yield = o->material[o->part[i].material].yield;
        if (!(yield > 0)) return UTW_NAN;
        least = fmin(least, yield);
    }
    return least;
}

static utw_status find_stress(utw_push *p, utw_error *err)
{
    utw_push_result *r = &p->result;
    utw_worst worst;
    const double yield = yield_of(p->solution->outline);
    if (p->stress == NULL) return UTW_OK;
    utw_status st = utw_push_worst(p, r->offset, &worst, err);
    if (st != UTW_OK) return st;
    r->has_stress = 1;
    r->von_mises = worst.peak;
    r->z_von_mises = worst.z;
    r->unbounded = worst.unbounded;
    r->margin = yield / worst.peak.value - 1;
    const double limit = p->load.stress_limit > 0 ? p->load.stress_limit : yield;
    return limit > 0 ? utw_push_stress_window(p, limit, &r->stress_window, err) : UTW_OK;
}

/* Does the load stand within, and where do the ends lie? */
static void finish_window(const utw_push *p, utw_load_window *w)
{
    const utw_push_result *r = &p->result;
    if (!w->limited) return;
    w->holds = !w->empty && w->from <= r->offset && r->offset <= w->to;
    for (int k = 0; k < 2; k++) {
        w->at_from[k] = r->shear_centre[k] + w->from * r->across[k];
        w->at_to[k] = r->shear_centre[k] + w->to * r->across[k];
    }
}

static void find_windows(utw_push *p)
{
    utw_push_result *r = &p->result;
    const utw_quantity *q = &r->twist_per_offset;
    utw_load_window *t = &r->twist_window, *s = &r->stress_window, *both = &r->window;
    if (p->load.twist_limit > 0) {
        const double reach = p->load.twist_limit / fabs(q->value);
        *t = (utw_load_window){
            .limited = 1, .limit = p->load.twist_limit, .from = -reach, .to = reach};
        t->error =
            r->shear_centre_error + reach * (q->high - q->low) / fmin(fabs(q->low), fabs(q->high));
    }
    if (t->limited && s->limited) {
        *both = (utw_load_window){.limited = 1, .empty = s->empty};
        both->from = s->empty ? UTW_NAN : fmax(t->from, s->from);
        both->to = s->empty ? UTW_NAN : fmin(t->to, s->to);
        both->error = fmax(t->from > s->from ? t->error : s->error, /* of the ends that govern */
                           t->to < s->to ? t->error : s->error);
        if (!(both->from <= both->to)) both->empty = 1, both->from = both->to = UTW_NAN;
    } else {
        *both = t->limited ? *t : *s;
        both->limit = 0;
    }
    finish_window(p, t);
    finish_window(p, s);
    finish_window(p, both);
}

utw_status utw_push_create(const utw_solution *solution, const utw_stress *stress,
                           const utw_push_load *load, utw_push **push, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_push *p = NULL;
    if (solution == NULL || load == NULL || push == NULL)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "utw_push_create: solution, load and push must not be NULL");
    if (stress != NULL && stress->unit.solution != solution)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "utw_push_create: the stresses are those of another solution");
    UTW_TRY(utw_push_load_check(solution, load, err));
    UTW_TRY_ALLOC(p = utw_alloc(1, sizeof *p));
    p->solution = solution;
    p->stress = stress;
    p->load = *load;
    describe(p);
    utw_stations_spread(&p->stations, load->length, p->result.z, p->result.fade);
    UTW_TRY(twist(p, solution->value[UTW_J].quantity.value, solution->value[UTW_IW].quantity.value,
                  &p->bar.torsion, err));
    UTW_TRY(find_deflection(p, err));
    UTW_TRY(find_twist(p, err));
    find_states(p);
    UTW_TRY(find_stress(p, err));
    find_windows(p);
    *push = p;
    p = NULL;
    st = UTW_OK;
done:
    utw_push_free(p);
    return st;
}

void utw_push_free(utw_push *push)
{
    utw_free(push);
}

const utw_push_result *utw_push_get(const utw_push *push)
{
    return &push->result;
}

const utw_push_load *utw_push_get_load(const utw_push *push)
{
    return &push->load;
}

void utw_push_at(const utw_push *push, double z, utw_push_state *state)
{
    utw_pushed_at(&push->bar, z, push->result.offset, state);
}

double utw_push_twist_of(const utw_push *push, const double at[2])
{
    return push->result.twist_per_offset.value * utw_push_offset(push, at);
}

utw_status utw_push_stress_of(const utw_push *push, const double at[2], utw_stress_peak *peak,
                              double *z, utw_error *err)
{
    utw_worst worst;
    if (push == NULL || at == NULL || peak == NULL || push->stress == NULL || !isfinite(at[0]) ||
        !isfinite(at[1]))
        return utw_fail(err, UTW_E_ARGUMENT,
                        "utw_push_stress_of: an argument is NULL, the push has no stresses, or the "
                        "place is not finite");
    const utw_status st = utw_push_worst(push, utw_push_offset(push, at), &worst, err);
    if (st != UTW_OK) return st;
    *peak = worst.peak;
    if (z != NULL) *z = worst.z;
    return UTW_OK;
}
