/* SPDX-License-Identifier: GPL-3.0-or-later
 * The constants, each from the formula that defines it, with bounds carried along.
 *
 * With s_i the true potential of pair i and Q_ij = int grad s_i . grad s_j, the solution gives
 * energy_ij <= and the gap matrix such that Q_ij = energy_ij + gap_ij/2 +- sqrt(gap_ii gap_jj)/2
 * (the energies of s_i + t s_j are bounded for every t, and the best t gives this). Pairs that are
 * not balanced have the stress grad s_i - P_i; for two of them int stress_i . stress_j = int P_i .
 * P_j - Q_ij. */
#include "section/constants.h"

#include <string.h>

/* Rounding of the sums over all points, relative to the integral of the squares that enter;
 * measured below 1e-14. */
#define ROUNDING 2e-14
/* Rounding of the solved equations, relative: an energy feels it at once, while int |stress|^2 of a
 * pair feels only its square. */
#define SOLVER_ROUNDING 1e-12

typedef struct moments {
    double A, Ixx, Iyy, Ixy, D, Ixxx, Ixxy, Ixyy,
        Iyyy; /* in units of the net; D = Ixx Iyy - Ixy^2 */
} moments;

static moments scaled_moments(const utw_area *a, double scale)
{
    const double s2 = scale * scale, s4 = s2 * s2, s5 = s4 * scale;
    moments m = {a->A / s2,    a->Ixx / s4,  a->Iyy / s4,  a->Ixy / s4, 0,
                 a->Ixxx / s5, a->Ixxy / s5, a->Ixyy / s5, a->Iyyy / s5};
    m.D = m.Ixx * m.Iyy - m.Ixy * m.Ixy;
    return m;
}

/* A combination of pairs. */
typedef double combination[UTW_N_PAIR];

static double form(const double (*matrix)[UTW_PAIR_MAX], const combination u, const combination v)
{
    double sum = 0;
    for (int i = 0; i < UTW_N_PAIR; i++)
        for (int j = 0; j < UTW_N_PAIR; j++) sum += u[i] * matrix[i][j] * v[j];
    return sum;
}

static double half_width(const utw_measures *m, const combination u, const combination v)
{
    const double gaps = sqrt(fmax(form((const double(*)[UTW_PAIR_MAX])m->gap, u, u), 0) *
                             fmax(form((const double(*)[UTW_PAIR_MAX])m->gap, v, v), 0));
    const double size_u = form((const double(*)[UTW_PAIR_MAX])m->energy, u, u) +
                          form((const double(*)[UTW_PAIR_MAX])m->stress, u, u),
                 size_v = form((const double(*)[UTW_PAIR_MAX])m->energy, v, v) +
                          form((const double(*)[UTW_PAIR_MAX])m->stress, v, v);
    return 0.5 * gaps + ROUNDING * sqrt(fabs(size_u * size_v));
}

/* int grad u . grad v for combinations of pairs. */
static utw_interval energy_of(const utw_measures *m, const combination u, const combination v)
{
    const double(*energy)[UTW_PAIR_MAX] = (const double(*)[UTW_PAIR_MAX])m->energy;
    const double(*gap)[UTW_PAIR_MAX] = (const double(*)[UTW_PAIR_MAX])m->gap;
    const double solver = SOLVER_ROUNDING * sqrt(fabs(form(energy, u, u) * form(energy, v, v)));
    return utw_about(form(energy, u, v) + 0.5 * form(gap, u, v), half_width(m, u, v) + solver);
}

/* int stress_u . stress_v for combinations of not balanced pairs. */
static utw_interval stress_of(const utw_measures *m, const combination u, const combination v)
{
    return utw_about(form((const double(*)[UTW_PAIR_MAX])m->stress, u, v) -
                         0.5 * form((const double(*)[UTW_PAIR_MAX])m->gap, u, v),
                     half_width(m, u, v));
}

void utw_constant_put(utw_constant_value *value, utw_constant which, utw_trust trust,
                      utw_interval q, double factor, double shift)
{
    const utw_interval s = utw_times(factor, q);
    value[which].quantity = (utw_quantity){s.value + shift, s.low + shift, s.high + shift, trust};
    value[which].absent = UTW_OK;
}

void utw_constants_of_area(const utw_area *a, utw_constant_value *value)
{
    const struct {
        utw_constant which;
        double x;
    } list[] = {
        {UTW_A, a->A},
        {UTW_PERIMETER, a->perimeter},
        {UTW_XC, a->xc},
        {UTW_YC, a->yc},
        {UTW_IXX, a->Ixx},
        {UTW_IYY, a->Iyy},
        {UTW_IXY, a->Ixy},
        {UTW_I1, a->I1},
        {UTW_I2, a->I2},
        {UTW_ANGLE, a->angle},
        {UTW_RX, a->rx},
        {UTW_RY, a->ry},
        {UTW_WX_TOP, a->Wx_top},
        {UTW_WX_BOTTOM, a->Wx_bottom},
        {UTW_WY_LEFT, a->Wy_left},
        {UTW_WY_RIGHT, a->Wy_right},
        {UTW_ZX, a->Zx},
        {UTW_ZY, a->Zy},
        {UTW_XP, a->xp},
        {UTW_YP, a->yp},
    };
    for (size_t i = 0; i < sizeof list / sizeof *list; i++)
        utw_constant_put(value, list[i].which, UTW_EXACT, utw_exactly(list[i].x), 1, 0);
}

/* xs = (Ixy int omega x - Iyy int omega y)/D, ys = (Ixx int omega x - Ixy int omega y)/D (Trefftz
 * 1935), with int omega x = int grad omega . grad z_x. */
static void shear_centre(const moments *g, const utw_measures *m, utw_interval s[2])
{
    const combination torsion = {[UTW_TORSION] = 1};
    const combination x = {[UTW_SHEAR_X] = g->Ixy / g->D, [UTW_SHEAR_Y] = -g->Iyy / g->D};
    const combination y = {[UTW_SHEAR_X] = g->Ixx / g->D, [UTW_SHEAR_Y] = -g->Ixy / g->D};
    s[0] = energy_of(m, torsion, x);
    s[1] = energy_of(m, torsion, y);
}

/* Unit shear force along axis 0 (x) or 1 (y): d sigma_z/dz = a x + b y. */
static void unit_shear(const moments *g, int axis, double *a, double *b)
{
    *a = (axis == 0 ? g->Ixx : -g->Ixy) / g->D;
    *b = (axis == 0 ? -g->Ixy : g->Iyy) / g->D;
}

/* Torque about the centroid of the anticlastic stresses of a unit shear force. */
static utw_interval anticlastic_torque(const moments *g, const utw_measures *m, int axis)
{
    double a, b;
    unit_shear(g, axis, &a, &b);
    const combination torsion = {[UTW_TORSION] = 1}, anti = {[UTW_ANTI_X] = a, [UTW_ANTI_Y] = b};
    return stress_of(m, torsion, anti);
}

/* int |tau|^2 for a unit shear force through the shear centre: tau = grad z + mu chi + c t with the
 * torsion t taken out, c = -mu T/J, so that it is int |grad z|^2 + mu^2 (int |chi|^2 - T^2/J). mu =
 * nu/(2(1+nu)). */
static utw_interval shear_flexibility(const moments *g, const utw_measures *m, utw_interval J,
                                      double mu, int axis)
{
    double a, b;
    unit_shear(g, axis, &a, &b);
    const combination z = {[UTW_SHEAR_X] = a, [UTW_SHEAR_Y] = b},
                      anti = {[UTW_ANTI_X] = a, [UTW_ANTI_Y] = b};
    const utw_interval chi = stress_of(m, anti, anti),
                       T2 = utw_square(anticlastic_torque(g, m, axis));
    const utw_interval twist = utw_quotient(T2, J);
    return utw_plus(energy_of(m, z, z),
                    utw_plus(utw_times(mu * mu, chi), utw_times(-mu * mu, twist)));
}

utw_quantity utw_shear_coupling(const utw_area *area, double scale, const utw_solved *solved,
                                double nu)
{
    const utw_measures *m = &solved->now;
    const moments g = scaled_moments(area, scale);
    const double mu = nu / (2 * (1 + nu));
    const combination torsion = {[UTW_TORSION] = 1};
    combination z[2] = {{0}, {0}}, anti[2] = {{0}, {0}};
    for (int axis = 0; axis < 2; axis++) {
        double a, b;
        unit_shear(&g, axis, &a, &b);
        z[axis][UTW_SHEAR_X] = anti[axis][UTW_ANTI_X] = a;
        z[axis][UTW_SHEAR_Y] = anti[axis][UTW_ANTI_Y] = b;
    }
    const utw_interval TT = utw_product(anticlastic_torque(&g, m, 0), anticlastic_torque(&g, m, 1));
    const utw_interval twist = utw_product(TT, utw_inverse(stress_of(m, torsion, torsion)));
    const utw_interval chi = stress_of(m, anti[0], anti[1]);
    const utw_interval c =
        utw_times(1 / (scale * scale),
                  utw_plus(energy_of(m, z[0], z[1]),
                           utw_plus(utw_times(mu * mu, chi), utw_times(-mu * mu, twist))));
    return (utw_quantity){c.value, c.low, c.high, UTW_BRACKET};
}

static double warping_constant(const moments *g, const utw_measures *m)
{
    utw_interval s[2];
    shear_centre(g, m, s);
    const double Iwx = m->energy[UTW_TORSION][UTW_SHEAR_X] + 0.5 * m->gap[UTW_TORSION][UTW_SHEAR_X];
    const double Iwy = m->energy[UTW_TORSION][UTW_SHEAR_Y] + 0.5 * m->gap[UTW_TORSION][UTW_SHEAR_Y];
    /* int (omega - mean - ys x + xs y)^2, with the shear centre's own equations used once */
    const double mean = m->mean[UTW_TORSION];
    return m->product[UTW_TORSION] - mean * mean / g->A - s[1].value * Iwx + s[0].value * Iwy;
}

/* The warping constant is no energy, so it has no bracket. The error of int omega^2 is 2 int grad
 * eta . grad (omega - omega_h) with -lap eta = omega; Galerkin's method lets eta_h be taken off, so
 * it is below the product of both relative errors in energy. That of eta is not known: the worst of
 * those of omega and z stands for it, and as z may be a polynomial that is met exactly, and omega
 * nearly one (on a strip), for that of omega too, its gap held against J or its energy, whichever
 * is less. Four times the product is stated. */
static utw_interval warping_estimate(const moments *g, const utw_measures *m, double J)
{
    const double Iw = fmax(warping_constant(g, m), 0), squares = m->product[UTW_TORSION];
    const double floor = 1e-12 * squares + ROUNDING * ROUNDING;
    double worst = m->gap[UTW_TORSION][UTW_TORSION] / J;
    for (int i = UTW_TORSION; i <= UTW_SHEAR_Y; i++)
        if (m->energy[i][i] > 0) worst = fmax(worst, m->gap[i][i] / m->energy[i][i]);
    const double half = 4 * worst * squares + floor;
    return (utw_interval){Iw, fmax(Iw - half, 0), Iw + half};
}

/* Wagner's coefficients: int sigma ((x-xs)^2 + (y-ys)^2) dA for the stresses sigma of int sigma y
 * dA = 1 alone, and of int sigma x dA = 1 alone (Vlasov, Thin-Walled Elastic Beams, 1961, ch. V;
 * sign and factor as in docs/theory.md). */
static void monosymmetry(const moments *g, const utw_interval s[2], utw_interval beta[2])
{
    const double xr = g->Ixxx + g->Ixyy, yr = g->Ixxy + g->Iyyy;
    beta[0] = utw_plus(utw_exactly((g->Iyy * yr - g->Ixy * xr) / g->D), utw_times(-2, s[1]));
    beta[1] = utw_plus(utw_exactly((g->Ixx * xr - g->Ixy * yr) / g->D), utw_times(-2, s[0]));
}

static void with_poisson(const moments *g, const utw_measures *m, utw_interval J,
                         const utw_interval s[2], double nu, const utw_area *area, double scale,
                         utw_constant_value *value)
{
    static const utw_constant list[] = {UTW_XF, UTW_YF, UTW_ASX, UTW_ASY, UTW_KX, UTW_KY};
    if (isnan(nu)) {
        for (size_t i = 0; i < sizeof list / sizeof *list; i++)
            value[list[i]].absent = UTW_E_MATERIAL;
        return;
    }
    const double mu = nu / (2 * (1 + nu));
    /* torque of the classical stresses (mean twist zero): Vy xf - Vx yf */
    utw_constant_put(value, UTW_XF, UTW_BRACKET,
                     utw_plus(s[0], utw_times(mu, anticlastic_torque(g, m, 1))), scale, area->xc);
    utw_constant_put(value, UTW_YF, UTW_BRACKET,
                     utw_plus(s[1], utw_times(-mu, anticlastic_torque(g, m, 0))), scale, area->yc);
    const utw_interval As[2] = {utw_inverse(shear_flexibility(g, m, J, mu, 0)),
                                utw_inverse(shear_flexibility(g, m, J, mu, 1))};
    utw_constant_put(value, UTW_ASX, UTW_BRACKET, As[0], scale * scale, 0);
    utw_constant_put(value, UTW_ASY, UTW_BRACKET, As[1], scale * scale, 0);
    utw_constant_put(value, UTW_KX, UTW_BRACKET, As[0], 1 / g->A, 0);
    utw_constant_put(value, UTW_KY, UTW_BRACKET, As[1], 1 / g->A, 0);
}

void utw_constants_of_solution(const utw_area *area, double scale, const utw_solved *solved,
                               double nu, utw_constant_value *value)
{
    const utw_measures *m = &solved->now;
    const moments g = scaled_moments(area, scale);
    const combination torsion = {[UTW_TORSION] = 1};
    const double s2 = scale * scale;
    utw_interval s[2], beta[2];
    const utw_interval J = stress_of(m, torsion, torsion);
    utw_constant_put(value, UTW_J, UTW_BRACKET, J, s2 * s2, 0);
    shear_centre(&g, m, s);
    utw_constant_put(value, UTW_XS, UTW_BRACKET, s[0], scale, area->xc);
    utw_constant_put(value, UTW_YS, UTW_BRACKET, s[1], scale, area->yc);
    utw_constant_put(value, UTW_IW, UTW_ESTIMATE, warping_estimate(&g, m, J.value), s2 * s2 * s2,
                     0);
    with_poisson(&g, m, J, s, nu, area, scale, value);
    monosymmetry(&g, s, beta);
    utw_constant_put(value, UTW_BETAX, UTW_BRACKET, beta[0], scale, 0);
    utw_constant_put(value, UTW_BETAY, UTW_BRACKET, beta[1], scale, 0);
    const utw_interval r2 =
        utw_plus(utw_exactly((g.Ixx + g.Iyy) / g.A), utw_plus(utw_square(s[0]), utw_square(s[1])));
    utw_constant_put(value, UTW_R0, UTW_BRACKET, utw_root(r2), scale, 0);
}
