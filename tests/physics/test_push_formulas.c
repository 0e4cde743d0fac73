/* SPDX-License-Identifier: GPL-3.0-or-later
 * A push against formulas written out by hand: bending with shear (Timoshenko 1921; the beam
 * formulas are common practice), uniform torsion, restrained torsion of a cantilever (Vlasov 1961;
 * Timoshenko and Gere, Theory of Elastic Stability, 1961, ch. 5, from memory), stresses. */
#include "support/pushed.h"

#define L  640.0
#define FX 310.0
#define FY (-420.0)

/* 20 x 30 about (0, 0): Ixx = 45000, Iyy = 20000, no coupling; its shear centre is (0, 0). */
static void deflections_of_a_rectangle(void **state)
{
    (void)state;
    stressed s = stressed_rectangle(20, 30, 0.3, 1e-6);
    const double E = 70000, G = E / 2.6;
    const double sx = 1 / (G * stressed_constant(&s, UTW_ASX)),
                 sy = 1 / (G * stressed_constant(&s, UTW_ASY));
    const double bx = 1 / (E * 20000), by = 1 / (E * 45000), L3 = L * L * L;
    /* greatest deflection = F (bend L^3/(E I) + shear L/(G As)) */
    const struct {
        utw_support support;
        utw_along_bar where;
        double bend, shear;
    } list[] = {
        {UTW_FIXED_FREE, UTW_WHERE_USUAL, 1.0 / 3, 1},
        {UTW_FIXED_FREE, UTW_AT_TIP, 1.0 / 3, 1},
        {UTW_FIXED_FREE, UTW_UNIFORM, 1.0 / 8, 0.5},
        {UTW_FIXED_FREE, UTW_AT_MID, 5.0 / 48, 0.5},
        {UTW_FORKED, UTW_WHERE_USUAL, 1.0 / 48, 0.25},
        {UTW_FORKED, UTW_UNIFORM, 5.0 / 384, 0.125},
        {UTW_FIXED_FIXED, UTW_AT_MID, 1.0 / 192, 0.25},
        {UTW_FIXED_FIXED, UTW_UNIFORM, 1.0 / 384, 0.125},
    };
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        utw_push_load load = pushed_load(L, FX, FY, 0, 0);
        load.support = list[i].support;
        load.where = list[i].where;
        utw_push *push = pushed_by(&s, &load);
        const utw_push_result *r = utw_push_get(push);
        const double x = FX * (list[i].bend * L3 * bx + list[i].shear * L * sx),
                     y = FY * (list[i].bend * L3 * by + list[i].shear * L * sy);
        assert_close(r->deflection[0].value, x, 1e-9);
        assert_close(r->deflection[1].value, y, 1e-9);
        for (int k = 0; k < 2; k++)
            assert_true(r->deflection[k].low <= r->deflection[k].value &&
                        r->deflection[k].value <= r->deflection[k].high);
        assert_close_scaled(r->z_deflection, list[i].support == UTW_FIXED_FREE ? L : L / 2, 1e-6,
                            L);
        utw_push_free(push);
    }
    stressed_clear(&s);
}

/* A solid bar: uniform torsion. Its ends carry what statics says, the worst fibre is the root's. */
static void a_rectangle_pushed_beside_its_middle(void **state)
{
    (void)state;
    stressed s = stressed_rectangle(20, 30, 0.3, 1e-7);
    utw_push_load load = pushed_load(L, 0, FY, 13, 2);
    utw_push *push = pushed_by(&s, &load);
    const utw_push_result *r = utw_push_get(push);
    const double GJ = 70000 / 2.6 * stressed_constant(&s, UTW_J), T = FY * 13;
    assert_true(r->uniform_torsion && !r->warping_held[0]);
    assert_close(r->twist.value, T * L / GJ, 1e-6);
    assert_true(r->twist.low <= T * L / GJ && T * L / GJ <= r->twist.high);
    assert_int_equal(r->twist.trust, UTW_BRACKET);
    assert_close(r->load_moves[1], r->deflection[1].value + 13 * r->twist.value, 1e-9);
    assert_close(r->load_moves[0], -2 * r->twist.value, 1e-6);
    assert_close(r->start.forces.Mx, -FY * L, 1e-12); /* tension on top, where it is pulled down */
    assert_close(r->start.forces.Vy, FY, 1e-12);
    assert_close(r->start.torque, T, 1e-6);
    assert_close(r->start.forces.T, T, 1e-6);
    assert_true(r->start.forces.B == 0);
    assert_close_scaled(r->end.forces.Mx, 0, 1e-12, -FY * L);
    /* sigma = M y/I = 89.6 in the root's corner; tau is zero there and 17 on the side */
    assert_close(r->von_mises.value, 420 * L * 15 / 45000, 0.002);
    assert_true(r->z_von_mises == 0);
    assert_close(r->margin, 250 / r->von_mises.value - 1, 1e-12);
    utw_push_free(push);
    stressed_clear(&s);
}

/* Cantilever, torque T at its tip, warping held at the root: with k^2 = G J/(E Iw),
 * theta(L) = T/(GJ) (L - tanh(kL)/k), B(0) = (T/k) tanh(kL), the root carries T as warping torque.
 */
static void restrained_torsion_of_a_cantilever_channel(void **state)
{
    (void)state;
    stressed s = stressed_of(pushed_channel, 1e-8);
    const double GJ = 70000 / 2.54 * stressed_constant(&s, UTW_J),
                 EIw = 70000 * stressed_constant(&s, UTW_IW), k = sqrt(GJ / EIw);
    const double xs = stressed_constant(&s, UTW_XS), T = FY * (25 - xs);
    utw_push_load load = pushed_load(L, 0, FY, 25, 7);
    utw_push *push = pushed_by(&s, &load);
    const utw_push_result *r = utw_push_get(push);
    assert_true(xs < -5);
    assert_close(r->fade, 1 / k, 1e-12);
    assert_true(!r->uniform_torsion && r->warping_held[0] && !r->warping_held[1]);
    assert_close(r->twist.value, T / GJ * (L - tanh(k * L) / k), 1e-10);
    assert_close(r->start.forces.B, T / k * tanh(k * L), 1e-10);
    assert_close_scaled(r->start.forces.T, 0, 1e-9, fabs(T));
    assert_close(r->start.warping_torque, T, 1e-9);
    assert_close(r->end.forces.T, T * (1 - 1 / cosh(k * L)), 1e-9);
    /* sigma_z at the root in the flange tip: Mx y/Ixx + B omega/Iw */
    utw_error err;
    utw_stress_point p;
    const double at[2] = {50, 50};
    assert_ok(utw_stress_at(s.stress, &r->start.forces, at, &p, &err));
    assert_close(p.sigma_z,
                 -FY * L * 50 / stressed_constant(&s, UTW_IXX) +
                     r->start.forces.B * p.omega / stressed_constant(&s, UTW_IW),
                 1e-9);
    assert_true(r->von_mises.value >= fabs(p.sigma_z) * (1 - 1e-9));
    utw_push_free(push);

    load.warping = UTW_WARPING_FREE;
    push = pushed_by(&s, &load);
    assert_close(utw_push_get(push)->twist.value, T * L / GJ, 1e-10);
    assert_close_scaled(utw_push_get(push)->start.forces.B, 0, 1e-9, fabs(T / k));
    utw_push_free(push);

    /* forks at both ends, warping held there, torque in the middle: theta = T/(4 GJ) (L - (4/k)
     * tanh(kL/4)), from the two halves, each with its warping held at both ends */
    load.support = UTW_FORKED;
    load.warping = UTW_WARPING_HELD;
    push = pushed_by(&s, &load);
    assert_close(utw_push_get(push)->twist.value, T / (4 * GJ) * (L - 4 / k * tanh(k * L / 4)),
                 1e-9);
    assert_close_scaled(utw_push_get(push)->z_twist, L / 2, 1e-6, L);
    utw_push_free(push);
    stressed_clear(&s);
}

/* Shear strains couple in a section without symmetry: the flexibilities are a tensor, and turn with
 * the section. So does the whole push. */
static void a_turned_bar_does_the_same(void **state)
{
    (void)state;
    static const char *const drawing =
        "{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 70000, \"nu\": 0.33}}, \"parts\": "
        "[{\"material\": \"m\", \"outline\": [[%.17g,%.17g], [%.17g,%.17g], [%.17g,%.17g], "
        "[%.17g,%.17g], [%.17g,%.17g]]}]}";
    static const double corner[5][2] = {{0, 0}, {61, 4}, {58, 22}, {19, 30}, {3, 77}};
    const double c = 0.8, sn = 0.6;
    utw_push *push[2];
    stressed s[2];
    for (int i = 0; i < 2; i++) {
        double p[5][2];
        char json[700];
        for (int k = 0; k < 5; k++) {
            p[k][0] = i == 0 ? corner[k][0] : c * corner[k][0] - sn * corner[k][1];
            p[k][1] = i == 0 ? corner[k][1] : sn * corner[k][0] + c * corner[k][1];
        }
        snprintf(json, sizeof json, drawing, p[0][0], p[0][1], p[1][0], p[1][1], p[2][0], p[2][1],
                 p[3][0], p[3][1], p[4][0], p[4][1]);
        s[i] = stressed_of(json, 1e-8);
        utw_push_load load =
            pushed_load(200, i == 0 ? 70 : c * 70 - sn * -30, i == 0 ? -30 : sn * 70 + c * -30,
                        i == 0 ? 40 : c * 40 - sn * 9, i == 0 ? 9 : sn * 40 + c * 9);
        load.support = UTW_FIXED_FORKED;
        load.where = UTW_AT_Z;
        load.z = 83;
        push[i] = pushed_by(&s[i], &load);
    }
    const utw_push_result *a = utw_push_get(push[0]), *b = utw_push_get(push[1]);
    const double *u = (const double[2]){a->deflection[0].value, a->deflection[1].value};
    const double size = hypot(u[0], u[1]);
    assert_close_scaled(b->deflection[0].value, c * u[0] - sn * u[1], 1e-7, size);
    assert_close_scaled(b->deflection[1].value, sn * u[0] + c * u[1], 1e-7, size);
    assert_close(b->twist.value, a->twist.value, 1e-6);
    assert_close(b->von_mises.value, a->von_mises.value, 0.01);
    assert_close_scaled(fabs(b->offset), fabs(a->offset), 1e-6, 1);
    utw_push_free(push[0]);
    utw_push_free(push[1]);
    stressed_clear(&s[0]);
    stressed_clear(&s[1]);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(deflections_of_a_rectangle),
        balanced_test(a_rectangle_pushed_beside_its_middle),
        balanced_test(restrained_torsion_of_a_cantilever_channel),
        balanced_test(a_turned_bar_does_the_same),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
