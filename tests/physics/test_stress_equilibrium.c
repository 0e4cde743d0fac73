/* SPDX-License-Identifier: GPL-3.0-or-later
 * What must hold for every section: the stresses of each unit load integrate back to that load and
 * to no other; shear through the shear centre does no work on torsion; loads superpose; a force
 * beside the shear centre is a force there and a torque; peaks are peaks. */
#include "base/gauss.h"
#include "base/vec2.h"
#include "section/stress.h"
#include "section/stress_case.h"
#include "support/stressed.h"

enum { N_LOAD = 7, POINTS = 12 };

static const utw_forces unit_load[N_LOAD] = {{.N = 1},  {.Vx = 1}, {.Vy = 1}, {.Mx = 1},
                                             {.My = 1}, {.T = 1},  {.B = 1}};

/* A load of dimension F L^k is measured in size^k. */
static double scale_of(const stressed *s, int load)
{
    static const int power[N_LOAD] = {0, 0, 0, 1, 1, 1, 2};
    return pow(sqrt(stressed_constant(s, UTW_A)), power[load]);
}

/* sigma_z and tau of every unit load at a point: the mean of both solutions. */
static void stresses_at(const utw_stress_case *c, const utw_unit_point *u, double stress[3])
{
    stress[0] = c->one + c->x * u->xy[0] + c->y * u->xy[1] + c->omega * u->omega;
    for (int d = 0; d < 2; d++) {
        stress[1 + d] = 0;
        for (int k = 0; k < UTW_N_UNIT; k++)
            stress[1 + d] +=
                c->t[k] * 0.5 * (u->tau[UTW_BY_POTENTIAL][k][d] + u->tau[UTW_BY_FLUX][k][d]);
    }
}

typedef struct integrals {
    double resultant[N_LOAD][N_LOAD]; /* of each load, in the order of unit_load; T about the shear
                                         centre */
    double work[N_LOAD][N_LOAD];      /* int tau_i . tau_j dA */
} integrals;

static void add_point(const utw_stress_case *list, const utw_unit_point *u, double dA, double L,
                      const double centre[2], integrals *sum)
{
    double stress[N_LOAD][3];
    const double x = L * u->xy[0], y = L * u->xy[1], omega = L * L * u->omega;
    for (int i = 0; i < N_LOAD; i++) {
        stresses_at(&list[i], u, stress[i]);
        const double *p = stress[i];
        const double density[N_LOAD] = {
            p[0],         p[1],      p[2],
            p[0] * y,     -p[0] * x, (x - L * centre[0]) * p[2] - (y - L * centre[1]) * p[1],
            p[0] * omega,
        };
        for (int k = 0; k < N_LOAD; k++) sum->resultant[i][k] += density[k] * dA;
        for (int k = 0; k <= i; k++)
            sum->work[i][k] += (p[1] * stress[k][1] + p[2] * stress[k][2]) * dA;
    }
}

/* By collapsed Gauss rules on the true elements. */
static void integrate(const stressed *s, integrals *sum)
{
    utw_error err;
    const utw_unit_stress *unit = &s->stress->unit;
    const double L = s->solution->unit;
    double g[POINTS], w[POINTS];
    utw_stress_case list[N_LOAD];
    for (int i = 0; i < N_LOAD; i++)
        assert_ok(utw_stress_case_of(unit, &unit_load[i], &list[i], &err));
    utw_gauss(POINTS, g, w);
    memset(sum, 0, sizeof *sum);
    for (int t = 0; t < s->solution->solved.mesh->n_tri; t++) {
        utw_unit_element e;
        utw_unit_element_of(unit, t, &e);
        for (int k = 0; k < POINTS * POINTS; k++) {
            const double a = g[k / POINTS], b = (1 - a) * g[k % POINTS];
            double xy[2], J[4];
            utw_unit_point u;
            utw_blend_at(&e.element.blend, a, b, xy, J);
            utw_unit_point_at(&e, a, b, &u);
            add_point(list, &u,
                      w[k / POINTS] * w[k % POINTS] * (1 - a) * (J[0] * J[3] - J[1] * J[2]) * L * L,
                      L, unit->shear_centre, sum);
        }
    }
}

static void test_unit_loads(void **state)
{
    (void)state;
    for (int i = 0; stressed_sample(i) != NULL; i++) {
        stressed s = stressed_of(stressed_sample(i), 1e-10);
        integrals sum;
        integrate(&s, &sum);
        for (int load = 0; load < N_LOAD; load++)
            for (int k = 0; k < N_LOAD; k++)
                assert_close_scaled(sum.resultant[load][k] / scale_of(&s, k) * scale_of(&s, load),
                                    load == k, 1e-9, 1);
        /* the energy definition of the shear centre (Trefftz 1935) */
        for (int load = 1; load <= 2; load++)
            assert_close_scaled(sum.work[5][load], 0, 1e-9,
                                sqrt(sum.work[5][5] * sum.work[load][load]));
        assert_close(sum.work[5][5], 1 / stressed_constant(&s, UTW_J), 1e-9);
        assert_close(sum.work[1][1], 1 / stressed_constant(&s, UTW_ASX), 1e-9);
        assert_close(sum.work[2][2], 1 / stressed_constant(&s, UTW_ASY), 1e-9);
        stressed_clear(&s);
    }
}

/* A fixed row of numbers in [-1, 1). */
static double random_number(unsigned *state)
{
    *state = *state * 1664525u + 1013904223u;
    return (*state >> 8) / 8388608.0 - 1;
}

static utw_forces random_forces(const stressed *s, unsigned *seed)
{
    double r[N_LOAD];
    for (int k = 0; k < N_LOAD; k++) r[k] = random_number(seed) * scale_of(s, k);
    return (utw_forces){r[0], r[1], r[2], r[3], r[4], r[5], r[6], 0, {0, 0}};
}

/* A point of the section: the middle of some element. */
static void some_point(const stressed *s, unsigned *seed, double at[2])
{
    const utw_mesh *mesh = s->solution->solved.mesh;
    const int t = (int)(0.5 * (random_number(seed) + 1) * mesh->n_tri);
    for (int d = 0; d < 2; d++) {
        double sum = 0;
        for (int k = 0; k < 3; k++) sum += mesh->xy[mesh->tri[t].node[k]][d] / 3;
        at[d] = s->solution->origin[d] + s->solution->unit * sum;
    }
}

static void test_superposition(void **state)
{
    (void)state;
    unsigned seed = 11;
    for (int i = 0; stressed_sample(i) != NULL; i++) {
        stressed s = stressed_of(stressed_sample(i), 1e-4);
        for (int k = 0; k < 20; k++) {
            double at[2];
            some_point(&s, &seed, at);
            const utw_forces f = random_forces(&s, &seed), g = random_forces(&s, &seed);
            const utw_forces sum = {
                2 * f.N + g.N,   2 * f.Vx + g.Vx, 2 * f.Vy + g.Vy, 2 * f.Mx + g.Mx,
                2 * f.My + g.My, 2 * f.T + g.T,   2 * f.B + g.B,   0,
                {0, 0}};
            const utw_stress_point a = stressed_at(&s, f, at[0], at[1]),
                                   b = stressed_at(&s, g, at[0], at[1]),
                                   c = stressed_at(&s, sum, at[0], at[1]);
            const double scale = c.von_mises;
            assert_close_scaled(c.sigma_z, 2 * a.sigma_z + b.sigma_z, 1e-12, scale);
            assert_close_scaled(c.tau_xz, 2 * a.tau_xz + b.tau_xz, 1e-12, scale);
            assert_close_scaled(c.tau_yz, 2 * a.tau_yz + b.tau_yz, 1e-12, scale);
            assert_close(c.tau, hypot(c.tau_xz, c.tau_yz), 1e-14);
            assert_close(c.von_mises, sqrt(pow(c.sigma_z, 2) + 3 * pow(c.tau, 2)), 1e-14);
            assert_close_scaled(c.principal_max + c.principal_min, c.sigma_z, 1e-12, scale);
            assert_close(-c.principal_max * c.principal_min, c.tau * c.tau, 1e-9);
        }
        stressed_clear(&s);
    }
}

/* "at": nothing at the shear centre itself, the torque Vy dx - Vx dy beside it. */
static void test_place_of_the_force(void **state)
{
    (void)state;
    stressed s = stressed_of(stressed_sample(1), 1e-6);
    const double xs = stressed_constant(&s, UTW_XS), ys = stressed_constant(&s, UTW_YS);
    const utw_forces none = {.Vx = 3, .Vy = -2},
                     there = {.Vx = 3, .Vy = -2, .has_at = 1, .at = {xs, ys}},
                     beside = {.Vx = 3, .Vy = -2, .has_at = 1, .at = {xs + 7, ys - 5}},
                     torque = {.Vx = 3, .Vy = -2, .T = -2 * 7 - 3 * -5};
    const utw_stress_point a = stressed_at(&s, none, 4, 40), b = stressed_at(&s, there, 4, 40),
                           c = stressed_at(&s, beside, 4, 40), d = stressed_at(&s, torque, 4, 40);
    assert_close(b.tau_xz, a.tau_xz, 1e-12);
    assert_close(b.tau_yz, a.tau_yz, 1e-12);
    assert_close(c.tau_xz, d.tau_xz, 1e-12);
    assert_close(c.tau_yz, d.tau_yz, 1e-12);
    assert_true(fabs(c.tau_yz - a.tau_yz) > 1e-6);
    stressed_clear(&s);
}

/* No point of the section has more than the peaks say, and the place of a peak has its value. */
static void test_peaks(void **state)
{
    (void)state;
    unsigned seed = 5;
    for (int i = 0; stressed_sample(i) != NULL; i++) {
        stressed s = stressed_of(stressed_sample(i), 1e-7);
        for (int k = 0; k < 6; k++) {
            const utw_forces f = random_forces(&s, &seed);
            const utw_stress_peaks p = stressed_peaks(&s, f);
            for (int n = 0; n < 60; n++) {
                double at[2];
                some_point(&s, &seed, at);
                const utw_stress_point q = stressed_at(&s, f, at[0], at[1]);
                assert_true(q.sigma_z <= p.peak[UTW_SIGMA_MAX].value);
                assert_true(q.sigma_z >= p.peak[UTW_SIGMA_MIN].value);
                if (q.kept_out) continue;
                assert_true(q.von_mises <= p.peak[UTW_VON_MISES].value * (1 + 1e-9));
                assert_true(q.tau <= p.peak[UTW_TAU_MAX].value * (1 + 1e-9));
                assert_true(q.principal_max <= p.peak[UTW_PRINCIPAL_MAX].value);
                assert_true(q.principal_min >= p.peak[UTW_PRINCIPAL_MIN].value);
            }
            const utw_stress_peak *v = &p.peak[UTW_VON_MISES];
            const utw_stress_point there = stressed_at(&s, f, v->at[0], v->at[1]);
            assert_true(fabs(there.von_mises - v->value) <= 2 * v->error + 1e-6 * v->value);
            assert_close(p.margin, 250 / v->value - 1, 1e-6);
        }
        stressed_clear(&s);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_unit_loads),
        balanced_test(test_superposition),
        balanced_test(test_place_of_the_force),
        balanced_test(test_peaks),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
