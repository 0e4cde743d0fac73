/* SPDX-License-Identifier: GPL-3.0-or-later
 * Solutions on a mesh (field/solve.c) and what they measure (field/measure.c). */
#include "field/field.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/meshing.h"
#include "support/section.h"

enum { X = 1, Y = 2, XX = 3, XY = 4, YY = 5, PAIRS = 3 };

/* u = 3 x: its load is its own gradient, and the flux needs nothing added. u = x y - x: the same of
 * order 2. Torsion last. */
static const utw_pair pairs[PAIRS] = {
    {.g = {{3}, {0}}, .P = {{3}, {0}}},
    {.g = {{[0] = -1, [Y] = 1}, {[X] = 1}}, .P = {{[0] = -1, [Y] = 1}, {[X] = 1}}},
    {.g = {{[Y] = 1}, {[X] = -1}}, .P = {{[Y] = 1}, {[X] = -1}}},
};

typedef struct solved {
    utw_net *net;
    utw_mesh *mesh;
    utw_rim *rim;
    utw_lift *lift;
    utw_basis_store *store;
    utw_field *field;
} solved;

static solved solve(int order, const double *conductivity)
{
    utw_error err;
    solved s = {NULL, NULL, NULL, NULL, NULL, NULL};
    s.mesh = mesh_two_triangles(&s.net);
    assert_ok(utw_rim_create(s.mesh, &s.rim, &err));
    assert_ok(utw_lift_create(s.mesh, s.rim, PAIRS, pairs, &s.lift, &err));
    assert_ok(utw_basis_store_create(&s.store, &err));
    const utw_setting set = {s.mesh, s.rim, s.lift, s.store, conductivity, NULL, PAIRS, pairs};
    const unsigned char orders[2] = {(unsigned char)order, (unsigned char)order};
    assert_ok(utw_field_solve(&set, orders, &s.field, &err));
    return s;
}

static void clear(solved *s)
{
    utw_field_free(s->field);
    utw_basis_store_free(s->store);
    utw_lift_free(s->lift);
    utw_rim_free(s->rim);
    utw_mesh_free(s->mesh);
    utw_net_free(s->net);
}

static void polynomials_are_found_exactly(void **state)
{
    (void)state;
    utw_error err;
    for (int order = 2; order <= UTW_ORDER_MAX; order += 5) {
        solved s = solve(order, NULL);
        utw_measures m;
        double share[2 * PAIRS];
        assert_ok(utw_field_measure(s.field, &m, share, NULL, &err));
        assert_close(m.area, 6, 1e-14);
        assert_close(m.energy[0][0], 9 * 6, 1e-12);
        /* int (y-1)^2 + x^2 over 3 x 2 = 3 * 2/3 + 2 * 9 */
        assert_close(m.energy[1][1], 20, 1e-12);
        assert_true(fabs(m.energy[0][1]) < 1e-11); /* int 3 (y - 1) = 0 */
        for (int i = 0; i < 2; i++) {
            assert_true(fabs(m.gap[i][i]) < 1e-16 && fabs(m.stress[i][i]) < 1e-16);
            assert_true(share[i] + share[PAIRS + i] < 1e-16);
        }
        /* each element's shares add up to the gap, which is more than nothing for torsion */
        assert_close(share[2] + share[PAIRS + 2], m.gap[2][2], 1e-12);
        assert_true(m.gap[2][2] > 0);
        clear(&s);
    }
}

static void values_at_points(void **state)
{
    (void)state;
    solved s = solve(4, NULL);
    for (int t = 0; t < 2; t++)
        for (double r = 0.1; r < 0.5; r += 0.17) {
            double xy[2], u[PAIRS], p[PAIRS][2], q[PAIRS][2], zero[2], u0[PAIRS];
            utw_field_at(s.field, t, r, 0.31, xy, u, p, q);
            utw_field_at(s.field, 0, 0, 0, zero, u0, NULL, NULL);
            assert_close(u[0] - u0[0], 3 * (xy[0] - zero[0]), 1e-12);
            assert_close(u[1] - u0[1], xy[0] * xy[1] - xy[0], 1e-11);
            for (int k = 0; k < 2; k++) {
                assert_close_scaled(p[0][k], k == 0 ? 3 : 0, 1e-12, 1);
                assert_close_scaled(q[0][k], k == 0 ? 3 : 0, 1e-12, 1);
                assert_close_scaled(p[1][k], k == 0 ? xy[1] - 1 : xy[0], 1e-11, 1);
                assert_close_scaled(q[1][k], k == 0 ? xy[1] - 1 : xy[0], 1e-11, 1);
            }
        }
    clear(&s);
}

/* Two-sided: the stress's square falls from above, what is left when the gap is taken off rises
 * from below, to J of the rectangle (Timoshenko and Goodier, sec. 109; the moments about (0, 0) do
 * not matter). */
static void torsion_is_bounded_from_both_sides(void **state)
{
    (void)state;
    utw_error err;
    double sum = 0;
    for (int n = 1; n < 400; n += 2) sum += tanh(n * UTW_PI * 0.75) / pow(n, 5);
    const double J = 3 * 8 / 3.0 * (1 - 192 / pow(UTW_PI, 5) * 2 / 3 * sum);
    double width = 1e9;
    for (int order = 1; order <= 9; order += 2) {
        solved s = solve(order, NULL);
        utw_measures m;
        double peak[2];
        assert_ok(utw_field_measure(s.field, &m, NULL, peak, &err));
        assert_true(m.stress[2][2] >= J * (1 - 1e-12) &&
                    m.stress[2][2] - m.gap[2][2] <= J * (1 + 1e-12));
        assert_true(m.gap[2][2] < 0.7 * width);
        width = m.gap[2][2];
        if (order > 1) assert_true(peak[0] < 1e-12 && peak[1] < 1e-12); /* of u = 3 x */
        clear(&s);
    }
    assert_true(width < 1e-4 * J);
}

/* k scales the energies and the fluxes of the whole section. */
static void conductivity_scales(void **state)
{
    (void)state;
    utw_error err;
    const double k[1] = {2.5};
    solved one = solve(3, NULL), more = solve(3, k);
    utw_measures a, b;
    assert_ok(utw_field_measure(one.field, &a, NULL, NULL, &err));
    assert_ok(utw_field_measure(more.field, &b, NULL, NULL, &err));
    for (int i = 0; i < PAIRS; i++) {
        assert_close(b.energy[i][i], 2.5 * a.energy[i][i], 1e-11);
        assert_close_scaled(b.gap[i][i], 2.5 * a.gap[i][i], 1e-9, 1e-6);
    }
    clear(&one);
    clear(&more);
}

static void a_refused_allocation_leaves_nothing_behind(void **state)
{
    (void)state;
    utw_error err;
    solved s = solve(3, NULL);
    const utw_setting set = s.field->setting;
    const unsigned char orders[2] = {3, 4};
    utw_field *field = NULL;
    utw_status st = UTW_E_NOMEM;
    long n = 0;
    while (st == UTW_E_NOMEM) {
        utw_memory_fail_at(++n);
        st = utw_field_solve(&set, orders, &field, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_null(field);
    }
    assert_int_equal(st, UTW_OK);
    assert_true(n > 20);
    utw_field_free(field);
    clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(polynomials_are_found_exactly),
        balanced_test(values_at_points),
        balanced_test(torsion_is_bounded_from_both_sides),
        balanced_test(conductivity_scales),
        balanced_test(a_refused_allocation_leaves_nothing_behind),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
