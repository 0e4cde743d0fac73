/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/memory.h"
#include "support/midlines.h"

static void failing_allocations(void **state)
{
    (void)state;
    const char *name;
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        const utw_midline *m = utw_midline_sample(i, &name);
        const long before = utw_memory_live();
        int refused = 0;
        for (long n = 1;; n++) {
            utw_thin *thin = NULL;
            utw_error err;
            utw_memory_fail_at(n);
            const utw_status st = utw_thin_solve(m, &thin, &err);
            utw_memory_fail_at(0);
            if (st == UTW_OK) {
                utw_thin_free(thin);
                break;
            }
            assert_int_equal(st, UTW_E_NOMEM);
            assert_null(thin); /* untouched */
            assert_int_equal(utw_memory_live(), before);
            refused++;
        }
        assert_true(refused > 30);
    }
}

static void stations_outside_and_loads_that_cannot_be(void **state)
{
    (void)state;
    double n[][2] = {{10, 0}, {0, 0}, {0, 6}};
    utw_wall w[] = {WALL(0, 1, 0.8), WALL(1, 2, 0.8)};
    const utw_midline angle = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&angle);
    utw_thin_station at = {.x = 77};
    utw_error err;
    const utw_thin_load none = {.N = 0}, bimoment = {.B = 1}, warp = {.Tw = 1}, odd = {.Mx = NAN};
    assert_int_equal(utw_thin_at(thin, 2, 0.5, &none, &at, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "there is no wall 2; there are walls 0 to 1");
    assert_int_equal(utw_thin_at(thin, -1, 0.5, &none, &at, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_thin_at(thin, 0, 1.01, &none, &at, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "station 1.01 lies off the wall; it goes from 0 to 1");
    assert_int_equal(utw_thin_at(thin, 0, NAN, &none, &at, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_thin_at(thin, 0, 0.5, &bimoment, &at, &err), UTW_E_LOAD);
    assert_string_equal(
        err.text,
        "the midline does not warp (Iw = 0): it carries no bimoment and no warping torque");
    assert_int_equal(utw_thin_at(thin, 0, 0.5, &warp, &at, &err), UTW_E_LOAD);
    assert_int_equal(utw_thin_at(thin, 0, 0.5, &odd, &at, &err), UTW_E_LOAD);
    assert_int_equal(utw_thin_at(thin, 0, 0.5, NULL, &at, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_thin_at(NULL, 0, 0.5, &none, &at, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_thin_at(thin, 0, 0.5, &none, NULL, NULL), UTW_E_ARGUMENT);
    assert_true(at.x == 77); /* untouched by all of them */
    assert_ok(utw_thin_at(thin, 0, 0.5, &none, &at, &err));
    assert_close(at.x, 5, 1e-14);
    assert_true(at.q == 0 && at.sigma == 0);
    utw_thin_free(thin);
    utw_thin_free(NULL);
}

static void loads_across_a_line_of_walls(void **state)
{
    (void)state;
    double n[][2] = {{0, 0}, {4, 3}};
    utw_wall w[] = {WALL(0, 1, 0.2)};
    const utw_midline m = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&m);
    utw_thin_station at;
    utw_error err;
    const utw_thin_load along = {.Vx = 4, .Vy = 3, .Mx = 3, .My = -4}, across = {.Vx = 1},
                        about = {.Mx = 1};
    assert_ok(utw_thin_at(thin, 0, 0.5, &along, &at, &err));
    assert_close(at.tau, 1.5 * 5 / (5 * 0.2), 1e-12); /* 3/2 V/A */
    assert_close_scaled(at.sigma, 0.0, 1e-12, 1);
    assert_ok(utw_thin_at(thin, 0, 1, &along, &at, &err));
    assert_close(at.sigma, 6 * 5 / (0.2 * 25), 1e-12); /* 6 M/(t h^2); Mx > 0 stretches the top */
    assert_int_equal(utw_thin_at(thin, 0, 0.5, &across, &at, &err), UTW_E_LOAD);
    assert_string_equal(err.text,
                        "all walls lie on one line: the midline carries no force across it and no "
                        "moment about it");
    assert_int_equal(utw_thin_at(thin, 0, 0.5, &about, &at, &err), UTW_E_LOAD);
    utw_thin_free(thin);
}

/* A strip of many cells, to the greatest size that is taken, in a second or so. */
static void many_cells(void **state)
{
    (void)state;
    enum { CELLS = 600 };
    static double n[2 * CELLS + 2][2];
    static utw_wall w[3 * CELLS + 1];
    for (int i = 0; i <= CELLS; i++) {
        n[2 * i][0] = n[2 * i + 1][0] = i;
        n[2 * i + 1][1] = 1.3;
        w[3 * i] = (utw_wall)WALL(2 * i, 2 * i + 1, 0.01);
        if (i == CELLS) break;
        w[3 * i + 1] = (utw_wall)WALL(2 * i, 2 * i + 2, 0.02);
        w[3 * i + 2] = (utw_wall)WALL(2 * i + 3, 2 * i + 1, 0.02);
    }
    const utw_midline m = {2 * CELLS + 2, 3 * CELLS + 1, n, w};
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_constants *k = utw_thin_get(thin);
    assert_int_equal(k->n_cells, CELLS);
    assert_close(k->xs, CELLS / 2.0, 1e-10);
    assert_close(k->ys, 0.65, 1e-10);
    /* the webs do little: close to the outline alone, 4 A^2 / int ds/t; they only add stiffness */
    const double outline = 4 * pow(1.3 * CELLS, 2) / (2 * CELLS / 0.02 + 2 * 1.3 / 0.01);
    assert_true(k->J_bredt > outline && k->J_bredt < 1.01 * outline);
    utw_thin_free(thin);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(failing_allocations),
        balanced_test(stations_outside_and_loads_that_cannot_be),
        balanced_test(loads_across_a_line_of_walls),
        balanced_test(many_cells),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
