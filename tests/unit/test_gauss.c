/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/gauss.h"
#include "support/support.h"

/* int_0^1 x^k dx = 1/(k+1) for every k the rule must integrate. */
static void powers_are_exact(void **state)
{
    (void)state;
    double x[UTW_GAUSS_MAX], w[UTW_GAUSS_MAX];
    for (int n = 1; n <= UTW_GAUSS_MAX; n++) {
        utw_gauss(n, x, w);
        for (int k = 0; k < 2 * n; k++) {
            double sum = 0;
            for (int i = 0; i < n; i++) sum += w[i] * pow(x[i], k);
            assert_close(sum, 1.0 / (k + 1), 2e-13);
        }
    }
}

static void points_are_inside_and_weights_positive(void **state)
{
    (void)state;
    double x[UTW_GAUSS_MAX], w[UTW_GAUSS_MAX];
    for (int n = 1; n <= UTW_GAUSS_MAX; n++) {
        utw_gauss(n, x, w);
        for (int i = 0; i < n; i++) {
            assert_true(x[i] > 0 && x[i] < 1 && w[i] > 0);
            assert_true(i == 0 || x[i] > x[i - 1]);
        }
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(powers_are_exact),
        cmocka_unit_test(points_are_inside_and_weights_positive),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
