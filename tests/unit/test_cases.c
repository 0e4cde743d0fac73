/* SPDX-License-Identifier: GPL-3.0-or-later
 * The load cases of an outline at once: which, in which order, what they do, what is wrong with
 * them. */
#include "base/memory.h"
#include "support/stressed.h"

/* 20 x 30: Ixx = 45000, Iyy = 20000, A = 600. */
#define RECTANGLE                                                                                  \
    "{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 70000, \"nu\": 0.3, \"yield\": 250}}, "  \
    "\"parts\": [{\"material\": \"m\", \"outline\": [[-10,-15], [10,-15], [10,15], [-10,15]]}], "  \
    "\"loads\": [{\"name\": \"pull\", \"N\": 2385}, {\"name\": \"lift\", \"Vy\": 420, \"Mx\": "    \
    "30150}, {\"name\": \"sway\", \"My\": -20400, \"T\": 3}]}"

static const double probe[2][2] = {{4, 15}, {-10, -2.5}};

static utw_cases *cases_of(const stressed *s, int n_name, const char *const *name, int n_probe)
{
    utw_error err;
    utw_cases *cases = NULL;
    assert_ok(utw_cases_create(s->stress, n_name, name, n_probe, probe, &cases, &err));
    return cases;
}

static void all_cases_in_the_order_of_the_file(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_of(RECTANGLE, 1e-5);
    utw_cases *cases = cases_of(&s, 0, NULL, 2);
    assert_int_equal(utw_cases_count(cases), 3);
    static const char *const expected[] = {"pull", "lift", "sway"};
    for (int k = 0; k < 3; k++) {
        const char *name;
        utw_forces f;
        utw_stress_peaks p;
        utw_stress_point at;
        assert_ok(utw_cases_get(cases, k, &name, &f, &p, &err));
        assert_string_equal(name, expected[k]);
        const utw_stress_peaks same = stressed_peaks(&s, f);
        assert_memory_equal(&p, &same, sizeof p);
        for (int i = 0; i < 2; i++) {
            assert_ok(utw_cases_probe(cases, k, i, &at, &err));
            assert_close(at.von_mises, stressed_at(&s, f, probe[i][0], probe[i][1]).von_mises,
                         1e-15);
        }
    }
    utw_stress_point at;
    utw_stress_peaks p;
    assert_ok(utw_cases_probe(cases, 1, 0, &at, &err)); /* Mx y/Ixx */
    assert_close(at.sigma_z, 30150.0 * 15 / 45000, 1e-12);
    assert_ok(utw_cases_probe(cases, 2, 1, &at, &err)); /* -My x/Iyy */
    assert_close(at.sigma_z, 20400.0 * -10 / 20000, 1e-12);
    assert_ok(utw_cases_get(cases, 0, NULL, NULL, &p, &err));
    assert_close(p.peak[UTW_VON_MISES].value, 2385.0 / 600, 1e-12);
    assert_close(p.margin, 250 / (2385.0 / 600) - 1, 1e-12);
    utw_stress_envelope e;
    assert_ok(utw_cases_envelope(cases, &e, &err));
    assert_int_equal(e.governing[UTW_SIGMA_MAX], 2);
    assert_int_equal(e.governing[UTW_TAU_MAX], 1);
    assert_int_equal(e.margin_case, 2);
    utw_cases_free(cases);
    stressed_clear(&s);
}

/* Each case once, in the order of the file; indices of the envelope are those of the choice. */
static void cases_may_be_chosen_by_name(void **state)
{
    (void)state;
    utw_error err;
    static const char *const names[] = {"sway", "lift", "sway"};
    stressed s = stressed_of(RECTANGLE, 1e-5);
    utw_cases *cases = cases_of(&s, 3, names, 0);
    const char *name;
    utw_stress_envelope e;
    assert_int_equal(utw_cases_count(cases), 2);
    assert_ok(utw_cases_get(cases, 0, &name, NULL, NULL, &err));
    assert_string_equal(name, "lift");
    assert_ok(utw_cases_envelope(cases, &e, &err));
    assert_int_equal(e.governing[UTW_SIGMA_MAX], 1);
    assert_int_equal(e.governing[UTW_TAU_MAX], 0);
    utw_cases_free(cases);
    stressed_clear(&s);
}

static void names_and_probes_that_do_not_exist_are_told(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_of(RECTANGLE, 1e-3);
    utw_cases *cases = NULL;
    static const struct {
        const char *name, *text;
    } list[] = {{"lfit", "there is no load case \"lfit\"; did you mean \"lift\"?"},
                {"quake", "there is no load case \"quake\"; the first is \"pull\""}};
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        assert_int_equal(utw_cases_create(s.stress, 1, &list[i].name, 0, NULL, &cases, &err),
                         UTW_E_LOAD);
        assert_string_equal(err.text, list[i].text);
    }
    const double outside[1][2] = {{12, 0}};
    assert_int_equal(utw_cases_create(s.stress, 0, NULL, 1, outside, &cases, &err), UTW_E_LOAD);
    assert_string_equal(
        err.text,
        "the point (12, 0) lies outside the section; its nearest point is (10, 0), 2 away");
    assert_int_equal(utw_cases_create(s.stress, -1, NULL, 0, NULL, &cases, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_cases_create(s.stress, 0, NULL, 1, NULL, &cases, &err), UTW_E_ARGUMENT);
    assert_null(cases);
    cases = cases_of(&s, 0, NULL, 1);
    utw_stress_point p;
    assert_int_equal(utw_cases_get(cases, 3, NULL, NULL, NULL, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_cases_probe(cases, 0, 1, &p, &err), UTW_E_ARGUMENT);
    utw_cases_free(cases);
    stressed_clear(&s);
    s = stressed_rectangle(2, 1, 0.3, 1e-3);
    assert_int_equal(utw_cases_create(s.stress, 1, &list[0].name, 0, NULL, &cases, &err),
                     UTW_E_LOAD);
    assert_string_equal(err.text, "there is no load case \"lfit\": the section has no \"loads\"");
    stressed_clear(&s);
}

/* Without Poisson's ratio a shear force has no stress: its case keeps the reason, others stand. */
static void a_case_without_result_keeps_its_reason(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_of("{\"units\": \"mm N\", \"parts\": [{\"outline\": {\"circle\": "
                             "[0,0,2]}}], \"loads\": [{\"name\": \"shear\", \"Vx\": 1}, {\"name\": "
                             "\"pull\", \"N\": 7}, {\"name\": \"warp\", \"B\": 1}]}",
                             1e-3);
    utw_cases *cases = NULL;
    const char *name = NULL;
    utw_forces f;
    utw_stress_envelope e;
    assert_ok(utw_cases_create(s.stress, 0, NULL, 0, NULL, &cases, &err));
    assert_int_equal(utw_cases_get(cases, 0, &name, &f, NULL, &err), UTW_E_MATERIAL);
    assert_string_equal(name, "shear");
    assert_true(f.Vx == 1);
    assert_memory_equal(err.text, "the stresses of a shear force depend on Poisson's ratio", 55);
    assert_int_equal(utw_cases_get(cases, 2, NULL, NULL, NULL, &err), UTW_E_LOAD);
    assert_ok(utw_cases_envelope(cases, &e, &err));
    for (int k = 0; k < UTW_STRESS_KIND_COUNT; k++) assert_int_equal(e.governing[k], 1);
    assert_int_equal(e.margin_case, -1);
    utw_cases_free(cases);
    static const char *const only[] = {"shear"};
    assert_ok(utw_cases_create(s.stress, 1, only, 0, NULL, &cases, &err));
    assert_int_equal(utw_cases_envelope(cases, &e, &err), UTW_E_LOAD);
    assert_string_equal(err.text, "there is no load case with a result");
    utw_cases_free(cases);
    stressed_clear(&s);
}

static void memory_may_run_out_anywhere(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_of(RECTANGLE, 1e-3);
    int n = 0;
    for (utw_status st = UTW_E_NOMEM; st != UTW_OK;) {
        utw_cases *cases = NULL;
        const long live = utw_memory_live();
        utw_memory_fail_at(++n);
        st = utw_cases_create(s.stress, 0, NULL, 2, probe, &cases, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_true(st == UTW_E_NOMEM && cases == NULL);
        utw_cases_free(cases);
        assert_int_equal(utw_memory_live(), live);
    }
    assert_true(n > 6);
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(all_cases_in_the_order_of_the_file),
        balanced_test(cases_may_be_chosen_by_name),
        balanced_test(names_and_probes_that_do_not_exist_are_told),
        balanced_test(a_case_without_result_keeps_its_reason),
        balanced_test(memory_may_run_out_anywhere),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
