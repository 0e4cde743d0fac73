/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/memory.h"
#include "support/stressed.h"

static void test_keys(void **state)
{
    (void)state;
    assert_string_equal(utw_stress_kind_key(UTW_VON_MISES), "von_mises");
    assert_string_equal(utw_stress_kind_key(UTW_TAU_MAX), "tau_max");
    assert_null(utw_stress_kind_key(UTW_STRESS_KIND_COUNT));
    assert_null(utw_stress_kind_key((utw_stress_kind)-1));
}

/* Every load of the file as it stands there. */
static void test_loads_of_the_file(void **state)
{
    (void)state;
    utw_outline *o = utw_outline_of(
        "{\"units\": \"mm N\", \"parts\": [{\"outline\": {\"circle\": [0,0,2]}}], "
        "\"loads\": [{\"name\": \"a\", \"N\": 1, \"Vx\": 2, \"Vy\": 3, \"Mx\": 4, "
        "\"My\": 5, \"T\": 6, \"B\": 7, \"at\": [8, 9]}, {\"name\": \"b\", \"T\": -1}]}");
    utw_forces f;
    assert_int_equal(utw_outline_load_count(o), 2);
    assert_string_equal(utw_outline_load(o, 0, &f), "a");
    assert_true(f.N == 1 && f.Vx == 2 && f.Vy == 3 && f.Mx == 4 && f.My == 5 && f.T == 6 &&
                f.B == 7);
    assert_true(f.has_at == 1 && f.at[0] == 8 && f.at[1] == 9);
    assert_string_equal(utw_outline_load(o, 1, &f), "b");
    assert_true(f.T == -1 && f.has_at == 0);
    assert_string_equal(utw_outline_load(o, 1, NULL), "b");
    assert_null(utw_outline_load(o, 2, &f));
    assert_null(utw_outline_load(o, -1, &f));
    utw_outline_free(o);
}

/* A point that rounding puts outside is moved to the boundary; its place is reported as given. */
static void test_rounded_coordinates(void **state)
{
    (void)state;
    stressed s = stressed_rectangle(20, 30, 0.3, 1e-4);
    const utw_forces f = {.Mx = 45000};
    const utw_stress_point in = stressed_at(&s, f, 3, 15), out = stressed_at(&s, f, 3, 15.0002);
    assert_close(out.sigma_z, in.sigma_z, 1e-12);
    assert_close(in.sigma_z, 15, 1e-12);
    assert_true(out.at[1] == 15.0002);
    stressed_clear(&s);
}

/* Envelope: the greatest of each kind, its case, the least margin. */
static void test_envelope(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_rectangle(20, 30, 0.3, 1e-4);
    const utw_forces load[3] = {{.N = 600}, {.Mx = -30000}, {.T = 20000}};
    utw_stress_peaks p[3];
    utw_stress_envelope e;
    for (int i = 0; i < 3; i++) p[i] = stressed_peaks(&s, load[i]);
    assert_ok(utw_stress_envelope_of(3, p, &e, &err));
    assert_int_equal(e.governing[UTW_SIGMA_MAX], 1);
    assert_int_equal(e.governing[UTW_SIGMA_MIN], 1);
    assert_int_equal(e.governing[UTW_TAU_MAX], 2);
    assert_close(e.peak[UTW_SIGMA_MIN].value, -10, 1e-12);
    assert_close(e.peak[UTW_TAU_MAX].value, p[2].peak[UTW_TAU_MAX].value, 1e-15);
    assert_close(e.margin, fmin(p[0].margin, fmin(p[1].margin, p[2].margin)), 1e-15);
    assert_int_equal(e.margin_case, p[1].margin < p[2].margin ? 1 : 2);
    for (int i = 0; i < 3; i++) p[i].margin = NAN;
    assert_ok(utw_stress_envelope_of(3, p, &e, &err));
    assert_int_equal(e.margin_case, -1);
    stressed_clear(&s);
}

/* Nothing acts: no stress, an infinite margin. */
static void test_no_load(void **state)
{
    (void)state;
    stressed s = stressed_rectangle(20, 30, 0.3, 1e-4);
    const utw_stress_peaks p = stressed_peaks(&s, (utw_forces){0});
    for (int k = 0; k < UTW_STRESS_KIND_COUNT; k++) assert_true(p.peak[k].value == 0);
    assert_true(isinf(p.margin));
    assert_int_equal(p.unbounded, 0);
    stressed_clear(&s);
}

/* Every allocation that fails gives UTW_E_NOMEM and leaves nothing behind. */
static void test_out_of_memory(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_of(stressed_sample(4), 1e-3);
    utw_stress_free(s.stress);
    s.stress = NULL;
    utw_status st = UTW_E_NOMEM;
    for (long n = 1; st != UTW_OK; n++) {
        utw_memory_fail_at(n);
        st = utw_stress_create(s.solution, &s.stress, &err);
        utw_memory_fail_at(0);
        if (st == UTW_OK) break;
        assert_int_equal(st, UTW_E_NOMEM);
        assert_null(s.stress);
        assert_true(n < 1000);
    }
    const utw_forces f = {.T = 1};
    utw_stress_peaks p;
    st = UTW_E_NOMEM;
    for (long n = 1; st != UTW_OK; n++) {
        utw_memory_fail_at(n);
        st = utw_stress_peaks_of(s.stress, &f, &p, &err);
        utw_memory_fail_at(0);
        assert_true(st == UTW_OK || st == UTW_E_NOMEM);
        assert_true(n < 100);
    }
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_keys),     balanced_test(test_loads_of_the_file),
        balanced_test(test_envelope), balanced_test(test_rounded_coordinates),
        balanced_test(test_no_load),  balanced_test(test_out_of_memory),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
