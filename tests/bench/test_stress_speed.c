/* SPDX-License-Identifier: GPL-3.0-or-later
 * A thousand load cases on a rail with T-slots cost less than half a second beyond the solution. */
#include <time.h>

#include "support/stressed.h"

/* Processor time: the machine may be busy with other things. */
static double seconds(void)
{
    return (double)clock() / CLOCKS_PER_SEC;
}

static double random_number(unsigned *state)
{
    *state = *state * 1664525u + 1013904223u;
    return (*state >> 8) / 8388608.0 - 1;
}

static void test_thousand_cases(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = NULL;
    utw_solution *solution = NULL;
    utw_stress *stress = NULL;
    static utw_stress_peaks peaks[1000];
    assert_ok(utw_outline_read(UTW_SOURCE_DIR "/examples/t-slot-rail.json", &o, &err));
    assert_ok(utw_solve(o, NULL, &solution, &err));
    const double start = seconds();
    assert_ok(utw_stress_create(solution, &stress, &err));
    unsigned seed = 1;
    for (int i = 0; i < 1000; i++) {
        double r[8];
        for (int k = 0; k < 8; k++) r[k] = random_number(&seed);
        const utw_forces f = {1e3 * r[0], 1e2 * r[1], 1e2 * r[2], 1e4 * r[3],   1e4 * r[4],
                              1e4 * r[5], 1e4 * r[6], 1,          {5 * r[7], 0}};
        assert_ok(utw_stress_peaks_of(stress, &f, &peaks[i], &err));
        assert_true(peaks[i].peak[UTW_VON_MISES].value > 0);
    }
    const double took = seconds() - start;
    print_message("1000 cases: %.3f s of processor time\n", took);
#ifndef __SANITIZE_ADDRESS__
    assert_true(took < 0.5);
#endif
    utw_stress_free(stress);
    utw_solution_free(solution);
    utw_outline_free(o);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(test_thousand_cases)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
