/* SPDX-License-Identifier: GPL-3.0-or-later
 * Closed solution of restrained torsion.
 *
 * The bar with forks at both ends carries the load; end twists and end bimoments are added to meet
 * the true end conditions. With x = z/L and S = GJ + EIw/L^2, the twist is theta = theta0 (1 - x) +
 * theta1 x + (L^2/EIw) (B0 f(1 - x) + B1 f(x)) + load part, f and the load part from hyperbolic.h.
 * As GJ theta' = T + B', the torque is T = (GJ (theta1 - theta0) + B0 - B1)/L plus that of the
 * forked bar, which is a simple beam's shear force. L^2 S/EIw = 1 + k^2 and GJ/S = k^2/(1 + k^2).
 */
#include "bar/torsion.h"

#include <math.h>

#include "bar/hyperbolic.h"

/* Beyond this k^2 leaves the range of a double, and the bar is Saint-Venant's to every digit. */
#define NO_WARPING 1e100

static utw_status check_bar(const utw_torsion_bar *b, utw_error *err)
{
    const double all[] = {b->length, b->GJ, b->EIw, b->torque, b->at, b->per_length};
    for (size_t i = 0; i < sizeof all / sizeof all[0]; i++)
        if (!isfinite(all[i]))
            return utw_fail(err, UTW_E_ARGUMENT, "torsion: a number of the bar is not finite");
    if (!(b->length > 0))
        return utw_fail(err, UTW_E_ARGUMENT, "torsion: length %g; it must be positive", b->length);
    if (b->GJ < 0 || b->EIw < 0 || (b->GJ == 0 && b->EIw == 0))
        return utw_fail(
            err, UTW_E_ARGUMENT,
            "torsion: stiffnesses GJ = %g and E Iw = %g; neither may be negative, nor both zero",
            b->GJ, b->EIw);
    if (b->at < 0 || b->at > b->length)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "torsion: the torque acts at z = %g, off the bar (0 to %g)", b->at,
                        b->length);
    if (!b->start.twist && !b->end.twist)
        return utw_fail(err, UTW_E_LOAD, "torsion: neither end holds the bar against twist");
    if (b->GJ == 0 && !(b->start.twist && b->end.twist) && !b->start.warping && !b->end.warping)
        return utw_fail(err, UTW_E_LOAD,
                        "torsion: with GJ = 0 and warping free at both ends, holding the twist at "
                        "one end is not enough");
    return UTW_OK;
}

static double length_ratio(const utw_torsion_bar *b)
{
    return b->EIw > 0 ? b->length * sqrt(b->GJ / b->EIw) : HUGE_VAL;
}

/* Sum of the stiffnesses S [F L^2]. */
static double stiffness(const utw_torsion_bar *b)
{
    return b->GJ + b->EIw / b->length / b->length;
}

/* Twist, its slope by z, B and B' of the forked bar under its loads. */
typedef struct forked {
    double theta, theta1, b, b1, torque;
} forked;

static forked add_load(forked sum, const utw_torsion_bar *bar, double k, utw_hyper h, double size,
                       double slope)
{
    /* size: load times length [F L]; L^2/EIw = (1 + k^2)/S */
    const double e = (1 + k * k) / stiffness(bar), length = bar->length;
    sum.theta += size * length * e * h.f;
    sum.theta1 += slope * size * e * h.f1;
    sum.b += size * length * h.b;
    sum.b1 += slope * size * h.b1;
    return sum;
}

/* Is z on the left of the torque? At the torque itself yes, but at z = 0 no. */
static int left_of(const utw_torsion_bar *bar, double z)
{
    return bar->at > 0 && z <= bar->at;
}

static forked forked_bar(const utw_torsion_bar *bar, double k, double z)
{
    const double length = bar->length, x = z / length, a = bar->at / length,
                 rest = (length - z) / length;
    const double beyond = (length - bar->at) / length;
    forked sum = {.theta = 0};
    const int left = left_of(bar, z);
    const utw_hyper point = left ? utw_hyper_point(k, x, beyond) : utw_hyper_point(k, rest, a);
    sum = add_load(sum, bar, k, point, bar->torque, left ? 1 : -1);
    sum = add_load(sum, bar, k, utw_hyper_uniform(k, x), bar->per_length * length, 1);
    sum.torque = bar->torque * (left ? beyond : -a) + bar->per_length * (length / 2 - z);
    return sum;
}

/* Saint-Venant's bar: theta' = T/GJ. */
static forked saint_venant_bar(const utw_torsion_bar *bar, double z)
{
    const double length = bar->length;
    const int left = left_of(bar, z);
    forked sum = {.theta = 0};
    const double point = left ? z * (length - bar->at) : bar->at * (length - z);
    sum.theta = (bar->torque * point / length + bar->per_length * z * (length - z) / 2) / bar->GJ;
    sum.torque = bar->torque * (left ? length - bar->at : -bar->at) / length +
                 bar->per_length * (length / 2 - z);
    sum.theta1 = sum.torque / bar->GJ;
    return sum;
}

/* The end conditions in scaled unknowns: d = theta1 - theta0, b0, b1 = bimoments/S.
 *   torque at a free end:  g d + b0 - b1 = c,              g = GJ/S, c given by the load
 *   warping held at 0:     d - e F1 b0 + e F0 b1 = -r0,    e = 1 + k^2, r = L theta' of the forked
 * bar warping held at L:     d - e F0 b0 + e F1 b1 = -rL,    F1 = f'(1), F0 = f'(0) Solved by hand
 * for each pair of ends: no difference of large numbers is left. e g = k^2. */
typedef struct end_problem {
    int warp0, warp1; /* warping held */
    double k, f0, f1, r0, r1, c;
} end_problem;

typedef struct end_values {
    double d, b0, b1;
} end_values;

/* Half sum and half difference of the bimoments. */
static end_values from_sum(double d, double sum, double difference)
{
    return (end_values){d, (sum + difference) / 2, (sum - difference) / 2};
}

static end_values both_twists_held(const end_problem *p)
{
    const double e = 1 + p->k * p->k;
    if (p->warp0 && p->warp1)
        return from_sum(0, (p->r0 - p->r1) / (e * (p->f1 - p->f0)),
                        (p->r0 + p->r1) / (e * (p->f1 + p->f0)));
    return (end_values){0, p->warp0 ? p->r0 / (e * p->f1) : 0, p->warp1 ? -p->r1 / (e * p->f1) : 0};
}

static end_values one_twist_free(const end_problem *p)
{
    const double e = 1 + p->k * p->k, g = p->k * p->k / e;
    if (p->warp0 && p->warp1) {
        const double f = p->f1 + p->f0, r = p->r0 + p->r1, below = 2 + p->k * p->k * f;
        return from_sum((e * f * p->c - r) / below, (p->r0 - p->r1) / (e * (p->f1 - p->f0)),
                        (2 * p->c + g * r) / below);
    }
    if (!p->warp0 && !p->warp1) return (end_values){p->c / g, 0, 0};
    const double r = p->warp0 ? p->r0 : p->r1, below = 1 + p->k * p->k * p->f1;
    const double d = (e * p->f1 * p->c - r) / below, b = (p->c + g * r) / below;
    return (end_values){d, p->warp0 ? b : 0, p->warp1 ? -b : 0};
}

utw_status utw_torsion_solve(const utw_torsion_bar *bar, utw_torsion_solution *solution,
                             utw_error *err)
{
    if (bar == NULL || solution == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "torsion: an argument is NULL");
    const utw_status st = check_bar(bar, err);
    if (st != UTW_OK) return st;
    utw_torsion_solution s = {.bar = *bar, .k = length_ratio(bar)};
    const double length = bar->length, big = stiffness(bar);
    /* torque that must be added to the forked bar's for a free end to have none */
    const double a = bar->at / length, half = bar->per_length * length / 2;
    const double missing = bar->start.twist ? bar->torque * a + half
                                            : -(bar->torque * ((length - bar->at) / length) + half);
    const int all_held = bar->start.twist && bar->end.twist;
    end_values e = {0, 0, 0};
    if (s.k > NO_WARPING) {
        s.k = HUGE_VAL;
        e.d = all_held ? 0 : missing * length / bar->GJ;
    } else {
        const end_problem p = {.warp0 = bar->start.warping,
                               .warp1 = bar->end.warping,
                               .k = s.k,
                               .f0 = utw_hyper_end(s.k, 0).f1,
                               .f1 = utw_hyper_end(s.k, 1).f1,
                               .r0 = length * forked_bar(bar, s.k, 0).theta1,
                               .r1 = length * forked_bar(bar, s.k, length).theta1,
                               .c = missing * length / big};
        e = all_held ? both_twists_held(&p) : one_twist_free(&p);
    }
    s.theta[0] = bar->start.twist ? 0 : -e.d;
    s.theta[1] = bar->start.twist ? e.d : 0;
    s.bimoment[0] = e.b0 * big;
    s.bimoment[1] = e.b1 * big;
    s.torque = all_held ? (s.bimoment[0] - s.bimoment[1]) / length : missing;
    *solution = s;
    return UTW_OK;
}

void utw_torsion_at(const utw_torsion_solution *s, double z, utw_torsion_state *state)
{
    const utw_torsion_bar *bar = &s->bar;
    const double length = bar->length, at = fmin(fmax(z, 0), length), x = at / length,
                 rest = (length - at) / length;
    const double slope = (s->theta[1] - s->theta[0]) / length;
    utw_torsion_state out = {.theta = s->theta[0] * rest + s->theta[1] * x, .theta1 = slope};
    if (s->k > NO_WARPING) {
        const forked load = saint_venant_bar(bar, at);
        out.theta += load.theta;
        out.theta1 += load.theta1;
        out.theta2 = -bar->per_length / bar->GJ;
        out.torque = s->torque + load.torque;
    } else {
        const forked load = forked_bar(bar, s->k, at);
        const utw_hyper h0 = utw_hyper_end(s->k, rest), h1 = utw_hyper_end(s->k, x);
        const double e = (1 + s->k * s->k) / stiffness(bar); /* L^2/EIw */
        out.theta += load.theta + e * (s->bimoment[0] * h0.f + s->bimoment[1] * h1.f);
        out.theta1 += load.theta1 + e / length * (s->bimoment[1] * h1.f1 - s->bimoment[0] * h0.f1);
        out.bimoment = load.b + s->bimoment[0] * h0.b + s->bimoment[1] * h1.b;
        const double b1 = load.b1 + (s->bimoment[1] * h1.b1 - s->bimoment[0] * h0.b1) / length;
        out.warping = -b1;
        out.theta2 = e / length / length * out.bimoment;
        out.theta3 = e / length / length * b1;
        out.torque = s->torque + load.torque;
    }
    out.saint_venant = bar->GJ * out.theta1;
    if (isnan(z)) out = (utw_torsion_state){NAN, NAN, NAN, NAN, NAN, NAN, NAN, NAN};
    *state = out;
}
