/* SPDX-License-Identifier: GPL-3.0-or-later
 * Unit fields from the solved pairs. */
#include "section/unit_stress.h"

#include <math.h>
#include <string.h>

static double value_of(const utw_solution *s, utw_constant which)
{
    return s->value[which].quantity.value;
}

/* mix[][]: which pairs a unit field is made of. A unit force along x has a = Ixx/D, b = -Ixy/D, one
 * along y a = -Ixy/D, b = Iyy/D. What the anticlastic part adds in torque, mu T = Vy (xf - xs) - Vx
 * (yf - ys), is taken out by torsion: the load then acts at the shear centre. */
static void mix_pairs(utw_unit_stress *u)
{
    const utw_solution *s = u->solution;
    const double D = u->Ixx * u->Iyy - u->Ixy * u->Ixy;
    u->mix[UTW_UNIT_T][UTW_TORSION] = 1 / u->J;
    if (!u->has_shear) return;
    const double mu = s->nu / (2 * (1 + s->nu));
    const double a[2] = {u->Ixx / D, -u->Ixy / D}, b[2] = {-u->Ixy / D, u->Iyy / D};
    const double torque[2] = {-(value_of(s, UTW_YF) - value_of(s, UTW_YS)) / s->unit,
                              (value_of(s, UTW_XF) - value_of(s, UTW_XS)) / s->unit};
    for (int k = UTW_UNIT_VX; k <= UTW_UNIT_VY; k++) {
        u->mix[k][UTW_SHEAR_X] = a[k];
        u->mix[k][UTW_SHEAR_Y] = b[k];
        u->mix[k][UTW_ANTI_X] = mu * a[k];
        u->mix[k][UTW_ANTI_Y] = mu * b[k];
        u->mix[k][UTW_TORSION] = -torque[k] / u->J;
    }
}

/* The potential side is grad u - P where the pair is not balanced; the flux side is curl chi, and P
 * + curl chi where it is. */
static void polynomial_parts(utw_unit_stress *u)
{
    const utw_pair *pair = u->solution->solved.pair;
    for (int k = 0; k < UTW_N_UNIT; k++)
        for (int i = 0; i < UTW_N_PAIR; i++) {
            const int side = pair[i].balanced ? UTW_BY_FLUX : UTW_BY_POTENTIAL;
            const double factor = pair[i].balanced ? u->mix[k][i] : -u->mix[k][i];
            for (int d = 0; d < 2; d++)
                for (int j = 0; j < 6; j++) u->rest[side][k][d][j] += factor * pair[i].P[d][j];
        }
}

void utw_unit_stress_of(const utw_solution *s, utw_unit_stress *u)
{
    const double L2 = s->unit * s->unit, L4 = L2 * L2;
    memset(u, 0, sizeof *u);
    u->solution = s;
    u->has_shear = s->value[UTW_XF].absent == UTW_OK;
    u->A = s->area.A / L2;
    u->Ixx = s->area.Ixx / L4;
    u->Iyy = s->area.Iyy / L4;
    u->Ixy = s->area.Ixy / L4;
    u->J = value_of(s, UTW_J) / L4;
    u->Iw = value_of(s, UTW_IW) / (L4 * L2);
    u->shear_centre[0] = (value_of(s, UTW_XS) - s->origin[0]) / s->unit;
    u->shear_centre[1] = (value_of(s, UTW_YS) - s->origin[1]) / s->unit;
    u->omega0 = -s->solved.now.mean[UTW_TORSION] / u->A;
    mix_pairs(u);
    polynomial_parts(u);
}

void utw_unit_element_of(const utw_unit_stress *u, int tri, utw_unit_element *e)
{
    const utw_field *f = u->solution->solved.field;
    int index[UTW_FUNCTIONS_MAX];
    utw_field_element(f, tri, &e->element);
    utw_element_index(&e->element, e->element.top, index);
    e->unit = u;
    e->n = utw_n_functions(e->element.top);
    const int n = e->element.n;
    const double *potential = f->coef + f->first[tri], *curl = potential + UTW_N_PAIR * n;
    memset(e->omega, 0, (size_t)e->n * sizeof(double));
    for (int j = 0; j < n; j++) e->omega[index[j]] = potential[UTW_TORSION * n + j];
    for (int k = 0; k < UTW_N_UNIT; k++) {
        memset(e->potential[k], 0, (size_t)e->n * sizeof(double));
        memset(e->curl[k], 0, (size_t)e->n * sizeof(double));
        for (int i = 0; i < UTW_N_PAIR; i++) {
            const double m = u->mix[k][i];
            if (m == 0) continue;
            for (int j = 0; j < n; j++) {
                e->potential[k][index[j]] += m * potential[i * n + j];
                e->curl[k][index[j]] += m * curl[i * n + j];
            }
        }
    }
}

static double sum_of(int n, const double *c, const double *N)
{
    double sum = 0;
    for (int i = 0; i < n; i++) sum += c[i] * N[i];
    return sum;
}

/* Derivatives by r and s of chi of a unit field, the boundary data beyond the element's order
 * included. */
static void add_lift(const utw_unit_element *e, double r, double s, double (*d)[2])
{
    const utw_unit_stress *u = e->unit;
    const utw_setting *set = &u->solution->solved.field->setting;
    double rest[UTW_PAIR_MAX][2];
    if (!utw_lift_rest(set->lift, set->mesh, &e->element, r, s, NULL, NULL, rest)) return;
    for (int k = 0; k < UTW_N_UNIT; k++)
        for (int i = 0; i < UTW_N_PAIR; i++) {
            const int column = set->lift->column[i];
            if (column < 0) continue;
            d[k][0] += u->mix[k][i] * rest[column][0];
            d[k][1] += u->mix[k][i] * rest[column][1];
        }
}

void utw_unit_point_of(const utw_unit_element *e, double r, double s, const double *N,
                       const double *Nr, const double *Ns, utw_unit_point *p)
{
    const utw_unit_stress *u = e->unit;
    double J[4], chi[UTW_N_UNIT][2];
    utw_blend_at(&e->element.blend, r, s, p->xy, J);
    const double det = J[0] * J[3] - J[1] * J[2], x = p->xy[0], y = p->xy[1];
    for (int k = 0; k < UTW_N_UNIT; k++) {
        chi[k][0] = sum_of(e->n, e->curl[k], Nr);
        chi[k][1] = sum_of(e->n, e->curl[k], Ns);
    }
    add_lift(e, r, s, chi);
    for (int k = 0; k < UTW_N_UNIT; k++) {
        const double ur = sum_of(e->n, e->potential[k], Nr), us = sum_of(e->n, e->potential[k], Ns);
        double(*tau)[UTW_N_UNIT][2] = p->tau;
        tau[UTW_BY_POTENTIAL][k][0] = (J[3] * ur - J[2] * us) / det;
        tau[UTW_BY_POTENTIAL][k][1] = (J[0] * us - J[1] * ur) / det;
        tau[UTW_BY_FLUX][k][0] = (J[0] * chi[k][1] - J[1] * chi[k][0]) / det;  /* chi_y */
        tau[UTW_BY_FLUX][k][1] = -(J[3] * chi[k][0] - J[2] * chi[k][1]) / det; /* -chi_x */
        for (int side = 0; side < UTW_N_SIDE; side++)
            for (int d = 0; d < 2; d++) tau[side][k][d] += utw_poly_at(u->rest[side][k][d], x, y);
    }
    p->omega =
        sum_of(e->n, e->omega, N) + u->omega0 - u->shear_centre[1] * x + u->shear_centre[0] * y;
}

void utw_unit_point_at(const utw_unit_element *e, double r, double s, utw_unit_point *p)
{
    double N[UTW_FUNCTIONS_MAX], Nr[UTW_FUNCTIONS_MAX], Ns[UTW_FUNCTIONS_MAX];
    utw_basis(e->element.top, r, s, N, Nr, Ns);
    utw_unit_point_of(e, r, s, N, Nr, Ns, p);
}
