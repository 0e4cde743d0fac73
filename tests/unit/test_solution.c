/* SPDX-License-Identifier: GPL-3.0-or-later
 * utw_outline_read() and utw_solve() as callers meet them: options, and memory that runs out. */
#include "section/solution.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/section.h"

/* Everything that allocates: a name, dimensions, a material, a fillet, an arc, a spline, a hole, a
 * load. */
static const char section[] =
    "{\"name\": \"Bracket\", \"units\": \"mm N\", \"let\": {\"b\": 40, \"t\": \"b / 5\"},"
    "\"materials\": {\"6082\": {\"E\": 70000, \"nu\": 0.33}},"
    "\"parts\": [{\"material\": \"6082\", \"outline\": [[0,0],[\"b\",0],[\"b\",\"t\"],"
    "{\"at\": [\"t\",\"t\"], \"round\": 3}, {\"at\": [8,50], \"through\": [[8.5,30]]},"
    "{\"at\": [0,50], \"arc\": [4,53]}], \"holes\": [{\"circle\": [4,4,1.5]}]}],"
    "\"loads\": [{\"name\": \"hook\", \"Vy\": -1500, \"at\": [30,0]}]}";

static utw_status read_and_solve(const char *path, double *J, utw_error *err)
{
    utw_outline *o = NULL;
    utw_solution *s = NULL;
    utw_options options = UTW_OPTIONS_INIT;
    options.tolerance = 1e-5;
    utw_quantity q = {0, 0, 0, UTW_EXACT};
    utw_status st = utw_outline_read(path, &o, err);
    if (st != UTW_OK) assert_null(o);
    if (st == UTW_OK) {
        st = utw_solve(o, &options, &s, err);
        if (st != UTW_OK) assert_null(s);
    }
    if (st == UTW_OK) st = utw_solution_constant(s, UTW_J, &q, err);
    *J = q.value;
    utw_solution_free(s);
    utw_outline_free(o);
    return st;
}

/* The n-th allocation and all after it fail, n = 1, 2, ..., in growing steps: always the status of
 * memory, never a block left behind (the test's balance), and the same result once it lasts. */
static void memory_may_run_out_anywhere(void **state)
{
    (void)state;
    utw_error err;
    char path[] = "/tmp/untwist-memory-XXXXXX";
    double J = 0, expected = 0;
    const int file = mkstemp(path);
    assert_true(file >= 0);
    FILE *f = fdopen(file, "w");
    assert_true(f != NULL && fputs(section, f) >= 0 && fclose(f) == 0);
    assert_ok(read_and_solve(path, &expected, &err));
    utw_status st = UTW_E_NOMEM;
    long n = 0, tries = 0;
    for (; st != UTW_OK; tries++) {
        const long live = utw_memory_live();
        n += 1 + n / 100;
        memset(&err, 0, sizeof err);
        utw_memory_fail_at(n);
        st = read_and_solve(path, &J, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK && st != UTW_E_NOMEM) print_error("allocation %ld: %s\n", n, err.text);
        assert_true(st == UTW_OK || st == UTW_E_NOMEM);
        if (st == UTW_E_NOMEM) assert_non_null(strstr(err.text, "memory"));
        assert_int_equal(utw_memory_live(), live);
    }
    print_message("about %ld allocations, %ld tries\n", n, tries);
    assert_true(tries > 100 && n > 200);
    assert_true(J == expected);
    remove(path);
}

static void options_are_checked(void **state)
{
    (void)state;
    utw_outline *o = section_rectangle(UTW_NAN, 0, 0, 3, 2);
    const struct {
        int version, order, rounds, unknowns;
        double tolerance, scale;
        const char *message;
    } list[] = {
        {2, 0, 9, 9999, 1e-3, 1, "options: version 2 is not known; start from UTW_OPTIONS_INIT"},
        {1, 13, 9, 9999, 1e-3, 1, "options: order 13 is outside 0 .. 12"},
        {1, -1, 9, 9999, 1e-3, 1, "options: order -1 is outside 0 .. 12"},
        {1, 0, 9, 9999, 0, 1, "options: tolerance 0 is outside 1e-12 .. 0.5"},
        {1, 0, 9, 9999, UTW_NAN, 1, "options: tolerance nan is outside 1e-12 .. 0.5"},
        {1, 0, 9, 9999, 1e-3, 11, "options: mesh scale 11 is outside 0.001 .. 10"},
        {1, 0, 0, 9999, 1e-3, 1, "options: max_rounds and max_unknowns must be at least 1"},
        {1, 0, 9, 0, 1e-3, 1, "options: max_rounds and max_unknowns must be at least 1"},
    };
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        utw_error err;
        utw_solution *s = NULL;
        utw_options options = UTW_OPTIONS_INIT;
        options.version = list[i].version;
        options.fixed_order = list[i].order;
        options.max_rounds = list[i].rounds;
        options.max_unknowns = list[i].unknowns;
        options.tolerance = list[i].tolerance;
        options.mesh_scale = list[i].scale;
        assert_int_equal(utw_solve(o, &options, &s, &err), UTW_E_ARGUMENT);
        assert_string_equal(err.text, list[i].message);
        assert_null(s);
    }
    utw_outline_free(o);
}

/* Greatest torsional stress of a disc at theta' = 1, G = 1 is its radius: Wt = J/R. A re-entrant
 * corner has none. Weak limits: rounds that are used up are told by `reached`. */
static void what_a_solution_knows_of_itself(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = section_outline(0.3, "\"outline\":{\"circle\":[4,5,2.5]}");
    utw_solution *s = section_solve(o, 1e-8, 0);
    assert_close(section_constant(s, UTW_WT).value, UTW_PI * pow(2.5, 3) / 2, 1e-6);
    assert_int_equal(s->n_corner, 0);
    assert_close(s->nu, 0.3, 0);
    utw_solution_free(s);
    utw_outline_free(o);
    o = section_outline(UTW_NAN, "\"outline\":[[0,0],[40,0],[40,8],[8,8],[8,40],[0,40]]");
    utw_options options = UTW_OPTIONS_INIT;
    options.tolerance = 1e-9;
    options.max_rounds = 1;
    utw_solution_info info;
    utw_quantity q;
    s = NULL;
    assert_ok(utw_solve(o, &options, &s, &err));
    utw_solution_get_info(s, &info);
    assert_true(!info.reached && info.gap > 1e-9);
    assert_int_equal(s->solved.rounds, 1);
    assert_int_equal(s->n_corner, 1);
    assert_true(s->corner[0][0] == 8 && s->corner[0][1] == 8);
    assert_int_equal(utw_solution_constant(s, UTW_WT, &q, &err), UTW_E_UNBOUNDED);
    assert_int_equal(utw_solution_constant(s, UTW_XF, &q, &err), UTW_E_MATERIAL);
    utw_solution_free(s);
    utw_outline_free(o);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(memory_may_run_out_anywhere),
        balanced_test(options_are_checked),
        balanced_test(what_a_solution_knows_of_itself),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
