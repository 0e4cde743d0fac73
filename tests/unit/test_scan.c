/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "section/scan.h"
#include "support/stressed.h"

static const utw_forces load[] = {
    {.N = 100, .Mx = 300, .My = -90},
    {.Vx = 3, .Vy = -7, .T = 20},
    {.N = -40, .Mx = 100, .My = 220, .Vx = 3, .Vy = 8, .T = -300, .B = 4000},
    {.N = -10},
};

/* By brute force over all samples: the greatest is the same, and a region left out by its bounds
 * has no sample near it. */
static void test_against_all_samples(void **state)
{
    (void)state;
    utw_error err;
    int left_out = 0, regions = 0;
    for (int i = 0; stressed_sample(i) != NULL; i++) {
        stressed s = stressed_of(stressed_sample(i), 1e-4);
        const utw_samples *a = &s.stress->samples;
        for (size_t l = 0; l < sizeof load / sizeof *load; l++) {
            utw_stress_case c;
            utw_scan scan;
            assert_ok(utw_stress_case_of(&s.stress->unit, &load[l], &c, &err));
            assert_ok(utw_scan_init(&scan, s.stress, &c, &err));
            utw_merits greatest;
            for (int k = 0; k < UTW_STRESS_KIND_COUNT; k++) greatest[k] = -HUGE_VAL;
            for (int r = 0; r < a->n_region; r++) {
                const utw_region *g = &a->region[r];
                left_out += isinf(scan.best[r][UTW_SIGMA_MAX]) != 0;
                for (int n = g->first; n < g->first + g->n; n++) {
                    double sigma, tx, ty;
                    utw_scan_stresses(a, &c, n, 1, &sigma, &tx, &ty);
                    for (int k = 0; k < UTW_STRESS_KIND_COUNT; k++) {
                        const int bounded = k == UTW_SIGMA_MAX || k == UTW_SIGMA_MIN;
                        if (g->kept_out && c.sheared && !bounded) continue;
                        const double m = utw_merit(k, sigma, tx * tx + ty * ty);
                        greatest[k] = fmax(greatest[k], m);
                        if (isinf(scan.best[r][k]))
                            assert_true(m < scan.greatest[k] - scan.near[k]);
                        else
                            assert_true(m <=
                                        scan.best[r][k] * (1 + 1e-12 * (m > 0 ? 1 : -1)) + 1e-12);
                    }
                }
            }
            for (int k = 0; k < UTW_STRESS_KIND_COUNT; k++)
                assert_close_scaled(scan.greatest[k], greatest[k], 1e-12, 1e-6);
            regions += a->n_region;
            utw_scan_clear(&scan);
        }
        stressed_clear(&s);
    }
    print_message("%d of %d regions passed over\n", left_out, regions);
    assert_true(left_out > regions / 10); /* the bounds are of use */
}

static void test_merits(void **state)
{
    (void)state;
    assert_close(utw_merit(UTW_VON_MISES, 3, 4), 21, 1e-15);
    assert_close(utw_merit(UTW_PRINCIPAL_MAX, 6, 16), 8, 1e-15);
    assert_close(utw_merit(UTW_PRINCIPAL_MIN, 6, 16), 2, 1e-15);
    assert_close(utw_merit(UTW_PRINCIPAL_MIN, -6, 16), 8, 1e-15);
    assert_close(utw_merit(UTW_SIGMA_MIN, -6, 16), 6, 1e-15);
    assert_close(utw_merit(UTW_TAU_MAX, -6, 16), 16, 1e-15);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_against_all_samples),
        balanced_test(test_merits),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
