/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "field/basis.h"
#include "support/support.h"

static void vertex_functions_sum_to_one_and_derivatives_match(void **state)
{
    (void)state;
    enum { P = UTW_ORDER_MAX };
    double N[3][UTW_FUNCTIONS_MAX], Nr[UTW_FUNCTIONS_MAX], Ns[UTW_FUNCTIONS_MAX];
    double dump[2][UTW_FUNCTIONS_MAX];
    const double h = 1e-6, at[3][2] = {{0.21, 0.33}, {0.7, 0.05}, {0.1, 0.85}};
    for (int i = 0; i < 3; i++) {
        const double r = at[i][0], s = at[i][1];
        utw_basis(P, r, s, N[0], Nr, Ns);
        assert_close(N[0][0] + N[0][1] + N[0][2], 1, 1e-15);
        utw_basis(P, r - h, s, N[1], dump[0], dump[1]);
        utw_basis(P, r + h, s, N[2], dump[0], dump[1]);
        for (int a = 0; a < UTW_FUNCTIONS_MAX; a++)
            assert_close_scaled((N[2][a] - N[1][a]) / (2 * h), Nr[a], 1e-7, 10);
        utw_basis(P, r, s - h, N[1], dump[0], dump[1]);
        utw_basis(P, r, s + h, N[2], dump[0], dump[1]);
        for (int a = 0; a < UTW_FUNCTIONS_MAX; a++)
            assert_close_scaled((N[2][a] - N[1][a]) / (2 * h), Ns[a], 1e-7, 10);
    }
}

static void orders_are_nested(void **state)
{
    (void)state;
    double N[UTW_FUNCTIONS_MAX], M[UTW_FUNCTIONS_MAX], d[2][UTW_FUNCTIONS_MAX];
    utw_basis(9, 0.3, 0.2, N, d[0], d[1]);
    utw_basis(5, 0.3, 0.2, M, d[0], d[1]);
    for (int e = 0; e < 3; e++)
        for (int k = 2; k <= 5; k++)
            assert_true(N[utw_edge_function(9, e, k)] == M[utw_edge_function(5, e, k)]);
    for (int i = 0; i < utw_n_interior(5); i++) assert_true(N[3 * 9 + i] == M[3 * 5 + i]);
}

/* Edge functions vanish on the other edges, interior ones on all; a run the other way changes the
 * sign of odd ones. */
static void functions_vanish_where_they_must(void **state)
{
    (void)state;
    double N[UTW_FUNCTIONS_MAX], M[UTW_FUNCTIONS_MAX], d[2][UTW_FUNCTIONS_MAX];
    for (double u = 0.1; u < 1; u += 0.2) {
        utw_basis(8, u, 0, N, d[0], d[1]); /* on edge 0 */
        for (int a = utw_edge_function(8, 1, 2); a < utw_n_functions(8); a++)
            assert_true(fabs(N[a]) < 1e-14);
        utw_basis(8, 1 - u, 0, M, d[0], d[1]);
        for (int k = 2; k <= 8; k++)
            assert_close_scaled(M[utw_edge_function(8, 0, k)],
                                (k % 2 ? -1 : 1) * N[utw_edge_function(8, 0, k)], 1e-13, 1);
    }
}

static double factorial(int n)
{
    return n < 2 ? 1 : n * factorial(n - 1);
}

/* int r^a s^b over the triangle = a! b! / (a+b+2)!, exactly for a+b <= 2q-2. */
static void tables_integrate_polynomials(void **state)
{
    (void)state;
    utw_error err;
    utw_basis_store *store = NULL;
    assert_ok(utw_basis_store_create(&store, &err));
    for (int q = 1; q <= UTW_POINTS_MAX; q++) {
        const utw_table *t = utw_basis_table(store, q);
        for (int a = 0; a <= 2 * q - 2; a++)
            for (int b = 0; a + b <= 2 * q - 2; b++) {
                double sum = 0;
                for (int k = 0; k < t->n_point; k++)
                    sum += t->w[k] * pow(t->r[k], a) * pow(t->s[k], b);
                assert_close(sum, factorial(a) * factorial(b) / factorial(a + b + 2), 1e-12);
            }
    }
    utw_basis_store_free(store);
}

/* Rows of the stiffness of a constant vanish, and the reference matrices agree with a richer rule.
 */
static void reference_matrices_are_exact(void **state)
{
    (void)state;
    utw_error err;
    utw_basis_store *store = NULL;
    assert_ok(utw_basis_store_create(&store, &err));
    for (int p = 1; p <= UTW_ORDER_MAX; p++) {
        const utw_reference *f = utw_basis_reference(store, p);
        const utw_table *t = utw_basis_table(store, UTW_POINTS_MAX);
        double N[UTW_FUNCTIONS_MAX], Nr[UTW_FUNCTIONS_MAX], Ns[UTW_FUNCTIONS_MAX];
        for (int a = 0; a < f->n; a += 3)
            for (int b = 0; b < f->n; b += 2) {
                double sum = 0;
                for (int k = 0; k < t->n_point; k++) {
                    utw_basis(p, t->r[k], t->s[k], N, Nr, Ns);
                    sum += t->w[k] * (Nr[a] * Ns[b] + Ns[a] * Nr[b]);
                }
                assert_close_scaled(f->R12[a * f->n + b], sum, 1e-12, 10);
            }
        for (int a = 0; a < f->n; a++) {
            const double *R = f->R11 + a * f->n;
            assert_true(fabs(R[0] + R[1] + R[2]) < 1e-12);
        }
    }
    utw_basis_store_free(store);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(vertex_functions_sum_to_one_and_derivatives_match),
        cmocka_unit_test(orders_are_nested),
        cmocka_unit_test(functions_vanish_where_they_must),
        balanced_test(tables_integrate_polynomials),
        balanced_test(reference_matrices_are_exact),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
