/* SPDX-License-Identifier: GPL-3.0-or-later
 * Loads, points and sections for which there are no stresses: the status and the message. */
#include "support/stressed.h"

static void refuse(const stressed *s, utw_forces f, double x, double y, utw_status status,
                   const char *text)
{
    utw_error err;
    const double at[2] = {x, y};
    utw_stress_point point;
    memset(&point, 0x5a, sizeof point);
    const utw_stress_point before = point;
    assert_int_equal(utw_stress_at(s->stress, &f, at, &point, &err), status);
    assert_int_equal(err.status, status);
    assert_string_equal(err.text, text);
    assert_memory_equal(&point, &before, sizeof point);
}

static void refuse_peaks(const stressed *s, utw_forces f, utw_status status, const char *text)
{
    utw_error err;
    utw_stress_peaks p;
    assert_int_equal(utw_stress_peaks_of(s->stress, &f, &p, &err), status);
    assert_string_equal(err.text, text);
}

static void test_points(void **state)
{
    (void)state;
    stressed s = stressed_of(
        "{\"units\": \"mm N\", \"parts\": [{\"outline\": [[0,0], [50,0], [50,30], [0,30]], "
        "\"holes\": [{\"circle\": [20,15,5]}]}]}",
        1e-3);
    const utw_forces f = {.N = 1};
    refuse(&s, f, 60, 10, UTW_E_LOAD,
           "the point (60, 10) lies outside the section; its nearest point is (50, 10), 10 away");
    refuse(&s, f, 21, 15, UTW_E_LOAD,
           "the point (21, 15) lies outside the section; its nearest point is (25, 15), 4 away");
    refuse(&s, f, -1e5, 10, UTW_E_LOAD,
           "the point (-100000, 10) lies outside the section; its nearest point is (0, 10), "
           "100000 away");
    refuse(&s, f, NAN, 0, UTW_E_LOAD, "the point is not finite");
    refuse(&s, f, 1, HUGE_VAL, UTW_E_LOAD, "the point is not finite");
    stressed_clear(&s);
}

static void test_loads(void **state)
{
    (void)state;
    stressed s = stressed_rectangle(2, 1, 0.3, 1e-3);
    refuse(&s, (utw_forces){.Mx = NAN}, 0, 0, UTW_E_LOAD, "Mx is not a finite number");
    refuse(&s, (utw_forces){.B = HUGE_VAL}, 0, 0, UTW_E_LOAD, "B is not a finite number");
    refuse(&s, (utw_forces){.Vy = 1, .has_at = 1, .at = {0, NAN}}, 0, 0, UTW_E_LOAD,
           "at y is not a finite number");
    refuse_peaks(&s, (utw_forces){.N = -HUGE_VAL}, UTW_E_LOAD, "N is not a finite number");
    stressed_clear(&s);
}

static void test_materials(void **state)
{
    (void)state;
    static const char no_nu[] =
        "the stresses of a shear force depend on Poisson's ratio: give every part a "
        "material with the same \"nu\"";
    stressed s = stressed_of(
        "{\"units\": \"mm N\", \"parts\": [{\"outline\": [[0,0], [5,0], [0,3]]}]}", 1e-3);
    refuse(&s, (utw_forces){.Vx = 1}, 1, 1, UTW_E_MATERIAL, no_nu);
    refuse_peaks(&s, (utw_forces){.N = 5, .Vy = 1}, UTW_E_MATERIAL, no_nu);
    stressed_at(&s, (utw_forces){.T = 1, .Mx = 3, .B = 1}, 1, 1); /* these need no material */
    stressed_clear(&s);
    s = stressed_of("{\"units\": \"mm N\", \"parts\": [{\"outline\": {\"circle\": [0,0,2]}}]}",
                    1e-3);
    refuse_peaks(&s, (utw_forces){.B = 1}, UTW_E_LOAD,
                 "this section does not warp (Iw = 0): it carries no bimoment B");
    stressed_clear(&s);
}

static void test_two_moduli(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = utw_outline_of(
        "{\"units\": \"mm N\", \"materials\": {\"a\": {\"E\": 1, \"nu\": 0.3}, \"b\": {\"E\": 2, "
        "\"nu\": 0.3}}, \"parts\": [{\"material\": \"a\", \"outline\": [[0,0], [10,0], [10,20], "
        "[0,20]]}, {\"material\": \"b\", \"outline\": [[0,20], [10,20], [10,30], [0,30]]}]}");
    utw_solution *solution = NULL;
    utw_stress *stress = NULL;
    assert_ok(utw_solve(o, NULL, &solution, &err));
    assert_int_equal(utw_stress_create(solution, &stress, &err), UTW_E_MATERIAL);
    assert_string_equal(
        err.text, "part 2 has another modulus of elasticity than part 1; stresses are computed for "
                  "sections of one modulus");
    assert_int_equal(err.part, 1);
    assert_null(stress);
    utw_solution_free(solution);
    utw_outline_free(o);
}

static void test_arguments(void **state)
{
    (void)state;
    utw_error err;
    utw_stress *stress = NULL;
    utw_stress_point point;
    utw_stress_peaks peaks;
    utw_stress_envelope envelope;
    const utw_forces f = {.N = 1};
    const double at[2] = {0, 0};
    double radius, place[2];
    assert_int_equal(utw_stress_create(NULL, &stress, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_stress_at(NULL, &f, at, &point, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_stress_peaks_of(NULL, &f, &peaks, NULL), UTW_E_ARGUMENT);
    assert_int_equal(utw_stress_envelope_of(0, &peaks, &envelope, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "utw_stress_envelope_of: no load cases");
    assert_int_equal(utw_stress_corner(NULL, 0, place, &radius, &err), UTW_E_ARGUMENT);
    utw_stress_free(NULL);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_points),    balanced_test(test_loads),
        balanced_test(test_materials), balanced_test(test_two_moduli),
        balanced_test(test_arguments),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
