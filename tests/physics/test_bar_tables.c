/* SPDX-License-Identifier: GPL-3.0-or-later
 * Bars against the formulas of the literature.
 *
 * Torsion: [V] Vlasov, Thin-Walled Elastic Beams, 1961, ch. II; [TG] Timoshenko and Gere, Theory of
 * Elastic Stability, 1961, ch. 5. Bending: [T] Timoshenko, Strength of Materials, part I, tables of
 * beams; shear terms from the shear area by [C] Cowper, Journal of Applied Mechanics 33 (1966), and
 * the energy theorem of Castigliano. All from memory. */
#include "bar/bending.h"
#include "bar/torsion.h"
#include "support/support.h"

static utw_torsion_state state_of(utw_torsion_bar bar, double z)
{
    utw_torsion_solution s;
    utw_torsion_state at;
    utw_error err;
    assert_ok(utw_torsion_solve(&bar, &s, &err));
    utw_torsion_at(&s, z, &at);
    return at;
}

/* [TG] Built in at z = 0, free at z = L, torque T there:
 *   theta = T/(k GJ) (kz + (sinh k(L - z) - sinh kL)/cosh kL), B(0) = T tanh(kL)/k. */
static void cantilever_under_an_end_torque(void **state)
{
    (void)state;
    for (int i = 1; i <= 12; i++) {
        const double length = 2.385, gj = 1.7, k = 0.4 * i, t = 3.3, kl = k * length;
        const utw_torsion_bar bar = {length,           gj, gj / k / k, UTW_TORSION_FIXED,
                                     UTW_TORSION_FREE, t,  length,     0};
        for (int j = 0; j <= 10; j++) {
            const double z = length * j / 10;
            const utw_torsion_state at = state_of(bar, z);
            assert_close_scaled(at.theta,
                                t / (k * gj) * (k * z + (sinh(kl - k * z) - sinh(kl)) / cosh(kl)),
                                1e-12, 0.1);
            assert_close_scaled(at.saint_venant, t * (1 - cosh(kl - k * z) / cosh(kl)), 1e-12, t);
            assert_close_scaled(at.bimoment, t / k * sinh(kl - k * z) / cosh(kl), 1e-12, 1e-3);
            assert_close(at.torque, t, 1e-13);
        }
        assert_close(state_of(bar, 0).bimoment, t * tanh(kl) / k, 1e-12);
        assert_close(state_of(bar, length).theta, t / (k * gj) * (kl - tanh(kl)), 1e-12);
    }
}

/* [V] Torque T at mid-span. Forks: theta = T/(2 k GJ) (kL/2 - tanh(kL/2)), B = -T tanh(kL/2)/(2k).
 * Built in at both ends: theta = T/(2 k GJ) (kL/2 - 2 tanh(kL/4)), B = -T tanh(kL/4)/(2k) at
 * mid-span, the opposite at the ends. */
static void torque_at_mid_span(void **state)
{
    (void)state;
    for (int i = 1; i <= 12; i++) {
        const double length = 4.1, gj = 0.9, k = 0.3 * i, t = 1.8, h = k * length / 2;
        utw_torsion_bar bar = {length,           gj, gj / k / k, UTW_TORSION_FORK,
                               UTW_TORSION_FORK, t,  length / 2, 0};
        assert_close(state_of(bar, length / 2).theta, t / (2 * k * gj) * (h - tanh(h)), 1e-12);
        assert_close(state_of(bar, length / 2).bimoment, -t * tanh(h) / (2 * k), 1e-12);
        assert_close(state_of(bar, 0).torque, t / 2, 1e-13);
        bar.start = bar.end = UTW_TORSION_FIXED;
        assert_close(state_of(bar, length / 2).theta, t / (2 * k * gj) * (h - 2 * tanh(h / 2)),
                     1e-12);
        assert_close(state_of(bar, length / 2).bimoment, -t * tanh(h / 2) / (2 * k), 1e-12);
        assert_close(state_of(bar, 0).bimoment, t * tanh(h / 2) / (2 * k), 1e-12);
        assert_close(state_of(bar, length).bimoment, t * tanh(h / 2) / (2 * k), 1e-12);
    }
}

/* [V] Uniform torque m. Forks: B = -m/k^2 (1 - 1/cosh(kL/2)) at mid-span. Built in: B = m/k^2
 * ((kL/2) coth(kL/2) - 1) at the ends. Cantilever: see below. */
static void uniform_torque(void **state)
{
    (void)state;
    for (int i = 1; i <= 12; i++) {
        const double length = 3.3, gj = 1.1, k = 0.5 * i, m = 0.7, h = k * length / 2;
        utw_torsion_bar bar = {length, gj, gj / k / k, UTW_TORSION_FORK, UTW_TORSION_FORK, 0, 0, m};
        assert_close(state_of(bar, length / 2).bimoment, -m / k / k * (1 - 1 / cosh(h)), 1e-12);
        assert_close(state_of(bar, length / 2).theta,
                     m / gj * (length * length / 8 - (1 - 1 / cosh(h)) / k / k), 1e-12);
        bar.start = bar.end = UTW_TORSION_FIXED;
        assert_close(state_of(bar, 0).bimoment, m / k / k * (h / tanh(h) - 1), 1e-12);
        assert_close(state_of(bar, 0).warping, m * length / 2, 1e-12);
        bar.end = UTW_TORSION_FREE;
        assert_close(state_of(bar, 0).warping, m * length, 1e-12);
        /* root bimoment: GJ theta' = m (L - z) + B', theta'(0) = 0, B(L) = 0 */
        const double kl = 2 * h;
        assert_close(state_of(bar, 0).bimoment, m / k / k * (kl * tanh(kl) + 1 / cosh(kl) - 1),
                     1e-12);
    }
}

/* GJ = 0: the twist obeys the equation of a beam of stiffness EIw, and so the tables of beams [T]
 * hold. */
static void no_saint_venant_stiffness(void **state)
{
    (void)state;
    const double l = 2.7, iw = 1.9, t = 1.3, m = 0.8;
    utw_torsion_bar bar = {l, 0, iw, UTW_TORSION_FIXED, UTW_TORSION_FREE, t, l, 0};
    assert_close(state_of(bar, l).theta, t * l * l * l / (3 * iw), 1e-13);
    bar.start = bar.end = UTW_TORSION_FORK;
    bar.at = l / 2;
    assert_close(state_of(bar, l / 2).theta, t * l * l * l / (48 * iw), 1e-13);
    bar.start = bar.end = UTW_TORSION_FIXED;
    assert_close(state_of(bar, l / 2).theta, t * l * l * l / (192 * iw), 1e-13);
    bar.torque = 0;
    bar.per_length = m;
    assert_close(state_of(bar, l / 2).theta, m * l * l * l * l / (384 * iw), 1e-13);
    bar.start = bar.end = UTW_TORSION_FORK;
    assert_close(state_of(bar, l / 2).theta, 5 * m * l * l * l * l / (384 * iw), 1e-13);
    bar.end = UTW_TORSION_FIXED;
    assert_close(state_of(bar, l).bimoment, m * l * l / 8, 1e-13);
    bar.start = UTW_TORSION_FIXED;
    bar.end = UTW_TORSION_FREE;
    assert_close(state_of(bar, l).theta, m * l * l * l * l / (8 * iw), 1e-13);
    /* a vanishing GJ changes nothing */
    for (double gj = 1e-10; gj > 1e-300; gj *= 1e-30) {
        bar.GJ = gj;
        assert_close(state_of(bar, l).theta, m * l * l * l * l / (8 * iw), 1e-9);
    }
    /* between forks at one end alone the bar turns as Saint-Venant says, however small GJ is */
    bar = (utw_torsion_bar){l, 1e-9, iw, UTW_TORSION_FORK, UTW_TORSION_FREE, t, l, 0};
    assert_close(state_of(bar, l).theta, t * l / 1e-9, 1e-12);
}

static utw_bending_state bent(utw_bending_bar bar, double z)
{
    utw_bending_solution s;
    utw_bending_state at;
    utw_error err;
    assert_ok(utw_bending_solve(&bar, &s, &err));
    utw_bending_at(&s, z, &at);
    return at;
}

/* [T] Deflections, rotations, moments and reactions, with the shear deflection of the determinate
 * beams. */
static void tables_of_beams(void **state)
{
    (void)state;
    const double l = 3.9, e = 2.1, i = 0.7, f = 1.7, q = 0.6, a = 0.31; /* a = 1/(G As) */
    const double l2 = l * l, l3 = l2 * l, l4 = l3 * l;
    utw_bending_bar bar = {.length = l, .E = e, .Ixx = i, .Iyy = 1.1, .shear = {0.2, a, 0}};
    bar.start = UTW_BENDING_FIXED; /* a cantilever */
    bar.at = l;
    bar.force[1] = f;
    assert_close(bent(bar, l).u[1], f * l3 / (3 * e * i) + f * l * a, 1e-13);
    assert_close(bent(bar, l).rotation[1], f * l2 / (2 * e * i), 1e-13);
    assert_close(bent(bar, 0).Mx, -f * l, 1e-13);
    assert_close(bent(bar, 0).Vy, f, 1e-13);
    bar.at = 1.3;
    assert_close(bent(bar, l).u[1], f * 1.3 * 1.3 * (3 * l - 1.3) / (6 * e * i) + f * 1.3 * a,
                 1e-13);
    bar.force[1] = 0;
    bar.per_length[1] = q;
    assert_close(bent(bar, l).u[1], q * l4 / (8 * e * i) + q * l2 / 2 * a, 1e-13);
    assert_close(bent(bar, l).rotation[1], q * l3 / (6 * e * i), 1e-13);
    assert_close(bent(bar, 0).Mx, -q * l2 / 2, 1e-13);

    bar.start = bar.end = UTW_BENDING_FORK; /* a simple beam */
    assert_close(bent(bar, l / 2).u[1], 5 * q * l4 / (384 * e * i) + q * l2 / 8 * a, 1e-13);
    assert_close(bent(bar, l / 2).Mx, q * l2 / 8, 1e-13);
    assert_close(bent(bar, 0).rotation[1], q * l3 / (24 * e * i), 1e-13);
    bar.per_length[1] = 0;
    bar.force[1] = f;
    bar.at = l / 2;
    assert_close(bent(bar, l / 2).u[1], f * l3 / (48 * e * i) + f * l / 4 * a, 1e-13);
    bar.at = 1.3;
    assert_close(bent(bar, 1.3).u[1],
                 f * 1.3 * 1.3 * 2.6 * 2.6 / (3 * e * i * l) + f * 1.3 * 2.6 / l * a, 1e-13);
    assert_close(bent(bar, 1.3).Mx, f * 1.3 * 2.6 / l, 1e-13);

    bar.start = bar.end = UTW_BENDING_FIXED; /* built in */
    bar.at = l / 2;
    assert_close(bent(bar, l / 2).u[1], f * l3 / (192 * e * i) + f * l / 4 * a, 1e-13);
    assert_close(bent(bar, 0).Mx, -f * l / 8, 1e-13);
    bar.force[1] = 0;
    bar.per_length[1] = q;
    assert_close(bent(bar, l / 2).u[1], q * l4 / (384 * e * i) + q * l2 / 8 * a, 1e-13);
    assert_close(bent(bar, 0).Mx, -q * l2 / 12, 1e-13);
    bar.shear[1] = 0;
    bar.force[1] = f;
    bar.per_length[1] = 0;
    bar.at = 1.3;
    assert_close(bent(bar, 0).Mx, -f * 1.3 * 2.6 * 2.6 / l2, 1e-13);
    assert_close(bent(bar, l).Mx, -f * 1.3 * 1.3 * 2.6 / l2, 1e-13);

    bar.end = UTW_BENDING_FORK; /* propped */
    bar.force[1] = 0;
    bar.per_length[1] = q;
    assert_close(bent(bar, 0).Mx, -q * l2 / 8, 1e-13);
    assert_close(bent(bar, 0).Vy, 5 * q * l / 8, 1e-13);
    bar.shear[1] =
        a; /* prop force 3/8 q L (1 + 4 r)/(1 + 3 r), r = E I a/L^2, by Castigliano's theorem */
    const double r = e * i * a / l2;
    assert_close(-bent(bar, l).Vy, 3 * q * l / 8 * (1 + 4 * r) / (1 + 3 * r), 1e-13);
    bar.start = UTW_BENDING_FORK;
    bar.end = UTW_BENDING_FIXED;
    assert_close(bent(bar, 0).Vy, 3 * q * l / 8 * (1 + 4 * r) / (1 + 3 * r), 1e-13);
}

/* A zed's cantilever under a vertical force goes sideways: the moment acts on the principal axes
 * [T]. Ixx 125, Iyy 64/3, Ixy 40 (h 10, b 4, tf 0.5, tw 0.3): tan of the deflection's angle to y is
 * -Ixy/Iyy. */
static void zed_goes_sideways(void **state)
{
    (void)state;
    const double l = 50, e = 210;
    const utw_bending_bar bar = {.length = l,
                                 .E = e,
                                 .Ixx = 125,
                                 .Iyy = 64.0 / 3,
                                 .Ixy = 40,
                                 .start = UTW_BENDING_FIXED,
                                 .force = {0, -2},
                                 .at = l};
    const utw_bending_state tip = bent(bar, l);
    const double d = 125 * 64.0 / 3 - 1600, c = 2 * l * l * l / (3 * e);
    assert_close(tip.u[1], -c * (64.0 / 3) / d, 1e-13);
    assert_close(tip.u[0], c * 40 / d, 1e-13);
    /* work of the force is twice the energy, the least stiffness between the principal ones */
    assert_true(fabs(tip.u[1]) > c / 125);
    assert_close_scaled(bent(bar, 0).My, 0.0, 1e-13, 100);
    assert_close(bent(bar, 0).Mx, 100, 1e-13);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(cantilever_under_an_end_torque),
        cmocka_unit_test(torque_at_mid_span),
        cmocka_unit_test(uniform_torque),
        cmocka_unit_test(no_saint_venant_stiffness),
        cmocka_unit_test(tables_of_beams),
        cmocka_unit_test(zed_goes_sideways),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
