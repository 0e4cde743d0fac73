/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "section/unit_stress.h"
#include "support/stressed.h"

/* The unit fields are the sums of pairs that utw_field_at() gives, pair by pair. */
static void test_sums_of_pairs(void **state)
{
    (void)state;
    for (int i = 0; stressed_sample(i) != NULL; i++) {
        stressed s = stressed_of(stressed_sample(i), 1e-4);
        const utw_solution *solution = s.solution;
        utw_unit_stress unit;
        utw_unit_stress_of(solution, &unit);
        assert_int_equal(unit.has_shear, 1);
        for (int t = 0; t < solution->solved.mesh->n_tri; t += 7) {
            utw_unit_element e;
            utw_unit_point u;
            double xy[2], value[UTW_N_PAIR], p[UTW_N_PAIR][2], q[UTW_N_PAIR][2];
            utw_unit_element_of(&unit, t, &e);
            utw_unit_point_at(&e, 0.3, 0.6, &u);
            utw_field_at(solution->solved.field, t, 0.3, 0.6, xy, value, p, q);
            for (int k = 0; k < UTW_N_UNIT; k++)
                for (int d = 0; d < 2; d++) {
                    double side[2] = {0, 0}, scale = 0;
                    for (int j = 0; j < UTW_N_PAIR; j++) {
                        const utw_pair *pair = &solution->solved.pair[j];
                        const double P = pair->balanced ? 0 : utw_poly_at(pair->P[d], xy[0], xy[1]);
                        side[0] += unit.mix[k][j] * (p[j][d] - P);
                        side[1] += unit.mix[k][j] * (q[j][d] - P);
                        scale += fabs(unit.mix[k][j]) * (fabs(p[j][d]) + fabs(P));
                    }
                    assert_close_scaled(u.tau[UTW_BY_POTENTIAL][k][d], side[0], 1e-11, scale);
                    assert_close_scaled(u.tau[UTW_BY_FLUX][k][d], side[1], 1e-11, scale);
                }
            assert_close_scaled(u.omega,
                                value[UTW_TORSION] + unit.omega0 - unit.shear_centre[1] * xy[0] +
                                    unit.shear_centre[0] * xy[1],
                                1e-12, 1);
        }
        stressed_clear(&s);
    }
}

/* Without a material there is torsion and no flexural shear. */
static void test_without_material(void **state)
{
    (void)state;
    stressed s = stressed_of(
        "{\"units\": \"mm N\", \"parts\": [{\"outline\": {\"circle\": [0,0,2]}}]}", 1e-6);
    utw_unit_stress unit;
    utw_unit_element e;
    utw_unit_point u;
    utw_unit_stress_of(s.solution, &unit);
    assert_int_equal(unit.has_shear, 0);
    utw_unit_element_of(&unit, 0, &e);
    utw_unit_point_at(&e, 0.2, 0.2, &u);
    for (int side = 0; side < UTW_N_SIDE; side++)
        for (int k = UTW_UNIT_VX; k <= UTW_UNIT_VY; k++)
            assert_true(u.tau[side][k][0] == 0 && u.tau[side][k][1] == 0);
    const double r = hypot(u.xy[0], u.xy[1]);
    assert_close(hypot(u.tau[0][UTW_UNIT_T][0], u.tau[0][UTW_UNIT_T][1]), r / unit.J, 1e-6);
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_sums_of_pairs),
        balanced_test(test_without_material),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
