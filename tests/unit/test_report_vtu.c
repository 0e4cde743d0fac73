/* SPDX-License-Identifier: GPL-3.0-or-later
 * The grid as a general-purpose reader sees it: the VTK library integrates the fields with the
 * cells' own shape functions, and the integrals are those of the program (support/read_vtu.py). */
#include <unistd.h>

#include "base/memory.h"
#include "section/solution.h"
#include "support/section.h"

/* A lug: an arc, a hole, a straight tail; a case with a name that XML would stumble over. */
static const char lug[] =
    "{\"units\":\"mm "
    "N\",\"materials\":{\"m\":{\"E\":70000,\"nu\":0.33}},\"parts\":[{\"material\":\"m\","
    "\"outline\":[[0,-9],[52,-9],{\"at\":[52,17],\"bulge\":0.8},[0,9]],"
    "\"holes\":[{\"circle\":[51,4,5.5]}]}],"
    "\"loads\":[{\"name\":\"pull & "
    "<turn>\",\"N\":2385,\"Vx\":310,\"Vy\":-720,\"Mx\":41000,\"My\":-8300,"
    "\"T\":12500,\"B\":95000}]}";

typedef struct table {
    char *text;
    int points, cells, lagrange, order;
} table;

/* Debian's own python3, for which python3-vtk9 is made. */
static table read_back(const char *path)
{
    char command[300];
    table t = {NULL, 0, 0, 0, 0};
    snprintf(command, sizeof command, "/usr/bin/python3 \"%s/tests/support/read_vtu.py\" %s 2>&1",
             UTW_SOURCE_DIR, path);
    const int status = utw_run(command, &t.text);
    if (status != 0) print_error("%s\n", t.text);
    assert_int_equal(status, 0);
    assert_int_equal(sscanf(t.text, "%d %d %d %d", &t.points, &t.cells, &t.lagrange, &t.order), 4);
    return t;
}

/* Integral, of the square, by x and by y. */
static void integrals(const table *t, const char *name, double of[4])
{
    char line[120];
    snprintf(line, sizeof line, "\n%s ", name);
    const char *at = strstr(t->text, line);
    if (at == NULL) print_error("there is no '%s' in\n%s\n", name, t->text);
    assert_non_null(at);
    assert_int_equal(sscanf(at + strlen(line), "%lf %lf %lf %lf", &of[0], &of[1], &of[2], &of[3]),
                     4);
}

static double value_of(const utw_solution *s, utw_constant which)
{
    utw_quantity q;
    utw_error err;
    assert_ok(utw_solution_constant(s, which, &q, &err));
    return q.value;
}

/* int sigma = N, int sigma (y - yc) = Mx, int sigma (x - xc) = -My, int omega sigma = B;
 * int tau = V, the torque about the shear centre T. */
static void check_case(const utw_solution *s, const table *t)
{
    double sigma[4], x[4], y[4], mises[4];
    const double xc = value_of(s, UTW_XC), yc = value_of(s, UTW_YC), xs = value_of(s, UTW_XS),
                 ys = value_of(s, UTW_YS);
    integrals(t, "pull_&_<turn>:_sigma_z/0", sigma);
    integrals(t, "pull_&_<turn>:_tau/0", x);
    integrals(t, "pull_&_<turn>:_tau/1", y);
    integrals(t, "pull_&_<turn>:_von_mises/0", mises);
    assert_close(sigma[0], 2385, 1e-7);
    assert_close(sigma[3] - yc * sigma[0], 41000, 1e-7);
    assert_close(-(sigma[2] - xc * sigma[0]), -8300, 1e-7);
    assert_close(x[0], 310, 1e-5);
    assert_close(y[0], -720, 1e-5);
    assert_close(y[2] - xs * y[0] - (x[3] - ys * x[0]), 12500, 1e-5);
    /* a square root is no polynomial: interpolated near where it vanishes */
    assert_close(mises[1], sigma[1] + 3 * (x[1] + y[1]), 2e-3);
}

static void a_reader_finds_what_was_computed(void **state)
{
    (void)state;
    utw_error err;
    char path[64];
    utw_stress *stress = NULL;
    utw_cases *cases = NULL;
    utw_outline *o = utw_outline_of(lug);
    utw_solution *s = section_solve(o, 1e-8, 0);
    utw_report report = UTW_REPORT_INIT;
    snprintf(path, sizeof path, "/tmp/untwist-test-%ld.vtu", (long)getpid());
    assert_ok(utw_stress_create(s, &stress, &err));
    assert_ok(utw_cases_create(stress, 0, NULL, 0, NULL, &cases, &err));
    report.solution = s;
    report.cases = cases;
    assert_ok(utw_report_vtu(&report, path, &err));
    table t = read_back(path);
    utw_solution_info info;
    utw_solution_get_info(s, &info);
    assert_int_equal(t.cells, info.triangles);
    assert_int_equal(t.lagrange, t.cells);
    assert_true(t.order >= 4 && t.order <= 12);
    double v[4], tau[2][4];
    integrals(&t, "area", v);
    assert_close(v[0], value_of(s, UTW_A), 1e-7);
    integrals(&t, "omega/0", v);
    assert_close_scaled(v[0], 0, 1e-7, value_of(s, UTW_A) * 100);
    assert_close(v[1], value_of(s, UTW_IW), 1e-5);
    integrals(&t, "phi/0", v); /* the hole adds 2 c A: between nothing and its whole area */
    assert_true(2 * v[0] < value_of(s, UTW_J) && 2 * v[0] > 0.8 * value_of(s, UTW_J));
    integrals(&t, "tau_of_T_=_1/0", tau[0]);
    integrals(&t, "tau_of_T_=_1/1", tau[1]);
    assert_close(tau[1][2] - tau[0][3], 1, 1e-6); /* the torque */
    assert_close(tau[0][1] + tau[1][1], 1 / value_of(s, UTW_J),
                 1e-6); /* twice the energy of T = 1 */
    integrals(&t, "tau_of_Vy_=_1/1", v);
    assert_close(v[0], 1, 1e-6);
    check_case(s, &t);
    free(t.text);
    remove(path);
    utw_cases_free(cases);
    utw_stress_free(stress);
    utw_solution_free(s);
    utw_outline_free(o);
}

/* phi of a solid section: J = 2 int phi (Prandtl 1903). Without load cases and without nu. */
static void a_solid_section(void **state)
{
    (void)state;
    utw_error err;
    char path[64];
    utw_outline *o =
        section_outline((double)NAN, "%s", "\"outline\": {\"ellipse\": [5, 3, 23.85, 12.4, 30]}");
    utw_solution *s = section_solve(o, 1e-8, 0);
    utw_report report = UTW_REPORT_INIT;
    snprintf(path, sizeof path, "/tmp/untwist-test-%ld.vtu", (long)getpid());
    report.solution = s;
    assert_ok(utw_report_vtu(&report, path, &err));
    table t = read_back(path);
    double v[4];
    integrals(&t, "phi/0", v);
    assert_close(2 * v[0], value_of(s, UTW_J), 1e-6);
    free(t.text);
    remove(path);
    assert_int_equal(utw_report_vtu(&report, "/no/such/a.vtu", &err), UTW_E_FILE);
    assert_int_equal(utw_report_vtu(&report, NULL, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_report_vtu(NULL, path, &err), UTW_E_ARGUMENT);
    for (long n = 1, done = 0; !done; n += 1 + n / 12) { /* whatever allocation fails */
        utw_memory_fail_at(n);
        const utw_status st = utw_report_vtu(&report, path, &err);
        utw_memory_fail_at(0);
        assert_true(st == UTW_OK || st == UTW_E_NOMEM);
        assert_int_equal(access(path, F_OK) == 0, st == UTW_OK);
        done = st == UTW_OK;
    }
    remove(path);
    utw_solution_free(s);
    utw_outline_free(o);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(a_reader_finds_what_was_computed),
                                       balanced_test(a_solid_section)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
