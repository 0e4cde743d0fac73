/* SPDX-License-Identifier: GPL-3.0-or-later
 * From forces to factors of the unit stresses. */
#include "section/stress_case.h"

#include <math.h>

#include "base/status.h"
#include "base/vec2.h"

/* Rounding of sums of a few products. */
#define ROUNDING 4e-15

static double half_width(const utw_solution *s, utw_constant which)
{
    const utw_quantity *q = &s->value[which].quantity;
    return fmax(q->high - q->value, q->value - q->low);
}

static double relative(const utw_solution *s, utw_constant which)
{
    return half_width(s, which) / s->value[which].quantity.low;
}

static utw_status check_forces(const utw_unit_stress *u, const utw_forces *f, utw_error *err)
{
    const struct {
        const char *name;
        double value;
    } list[] = {{"N", f->N},
                {"Vx", f->Vx},
                {"Vy", f->Vy},
                {"Mx", f->Mx},
                {"My", f->My},
                {"T", f->T},
                {"B", f->B},
                {"at x", f->has_at ? f->at[0] : 0},
                {"at y", f->has_at ? f->at[1] : 0}};
    for (size_t i = 0; i < sizeof list / sizeof *list; i++)
        if (!isfinite(list[i].value))
            return utw_fail(err, UTW_E_LOAD, "%s is not a finite number", list[i].name);
    if ((f->Vx != 0 || f->Vy != 0) && !u->has_shear)
        return utw_fail(err, UTW_E_MATERIAL,
                        "the stresses of a shear force depend on Poisson's ratio: give every part "
                        "a material with the same \"nu\"");
    if (f->B != 0 && !(u->solution->value[UTW_IW].quantity.low > 0))
        return utw_fail(err, UTW_E_LOAD,
                        "this section does not warp (Iw = 0): it carries no bimoment B");
    return UTW_OK;
}

utw_status utw_stress_case_of(const utw_unit_stress *u, const utw_forces *f, utw_stress_case *c,
                              utw_error *err)
{
    const utw_status st = check_forces(u, f, err);
    if (st != UTW_OK) return st;
    const utw_solution *s = u->solution;
    const double L = s->unit, L2 = L * L, D = u->Ixx * u->Iyy - u->Ixy * u->Ixy;
    const double Mx = f->Mx / (L2 * L), My = f->My / (L2 * L);
    double T = f->T;
    c->one = f->N / L2 / u->A;
    c->x = -(My * u->Ixx + Mx * u->Ixy) / D;
    c->y = (Mx * u->Iyy + My * u->Ixy) / D;
    c->omega = f->B == 0 ? 0 : f->B / (L2 * L2) / u->Iw;
    c->omega_error = f->B == 0 ? 0 : relative(s, UTW_IW);
    double T_error = 0;
    if (f->has_at) {
        T += f->Vy * (f->at[0] - s->value[UTW_XS].quantity.value) -
             f->Vx * (f->at[1] - s->value[UTW_YS].quantity.value);
        T_error = fabs(f->Vy) * half_width(s, UTW_XS) + fabs(f->Vx) * half_width(s, UTW_YS);
    }
    c->t[UTW_UNIT_VX] = f->Vx / L2;
    c->t[UTW_UNIT_VY] = f->Vy / L2;
    c->t[UTW_UNIT_T] = T / (L2 * L);
    c->t_error[UTW_UNIT_VX] = u->has_shear ? fabs(c->t[UTW_UNIT_VX]) * relative(s, UTW_ASX) : 0;
    c->t_error[UTW_UNIT_VY] = u->has_shear ? fabs(c->t[UTW_UNIT_VY]) * relative(s, UTW_ASY) : 0;
    c->t_error[UTW_UNIT_T] = fabs(c->t[UTW_UNIT_T]) * relative(s, UTW_J) + T_error / (L2 * L);
    c->sheared = f->Vx != 0 || f->Vy != 0 || T != 0;
    return UTW_OK;
}

static double size_of(const utw_blend *b)
{
    return fmax(fmax(utw_distance(b->x[0], b->x[1]), utw_distance(b->x[1], b->x[2])),
                utw_distance(b->x[2], b->x[0]));
}

void utw_point_stress_of(const utw_stress_case *c, const utw_unit_element *e,
                         const double apart[UTW_N_UNIT], double r, double s, utw_point_stress *p)
{
    utw_unit_point u;
    utw_unit_point_at(e, r, s, &u);
    double between[2], torsion_between[2], tau_error = 0;
    for (int d = 0; d < 2; d++) {
        double side[UTW_N_SIDE];
        for (int i = 0; i < UTW_N_SIDE; i++) {
            side[i] = 0;
            for (int k = 0; k < UTW_N_UNIT; k++) side[i] += c->t[k] * u.tau[i][k][d];
        }
        between[d] = side[UTW_BY_POTENTIAL] - side[UTW_BY_FLUX];
        torsion_between[d] =
            u.tau[UTW_BY_POTENTIAL][UTW_UNIT_T][d] - u.tau[UTW_BY_FLUX][UTW_UNIT_T][d];
        p->xy[d] = u.xy[d];
        p->tau[d] = 0.5 * (side[UTW_BY_POTENTIAL] + side[UTW_BY_FLUX]);
    }
    for (int k = 0; k < UTW_N_UNIT; k++)
        tau_error += fabs(c->t[k]) * apart[k] +
                     (c->t_error[k] + ROUNDING * fabs(c->t[k])) * utw_norm(u.tau[UTW_BY_FLUX][k]);
    p->omega = u.omega;
    p->sigma = c->one + c->x * u.xy[0] + c->y * u.xy[1] + c->omega * u.omega;
    p->tau_error = 2 * utw_norm(between) + tau_error;
    const double omega_error = (2 * utw_norm(torsion_between) + apart[UTW_UNIT_T]) * e->unit->J *
                               size_of(&e->element.blend);
    p->sigma_error = fabs(c->omega) * (omega_error + c->omega_error * fabs(u.omega)) +
                     ROUNDING * (fabs(c->one) + fabs(c->x * u.xy[0]) + fabs(c->y * u.xy[1]) +
                                 fabs(c->omega * u.omega));
}
