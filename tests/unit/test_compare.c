/* SPDX-License-Identifier: GPL-3.0-or-later
 * The rows of a comparison. */
#include "base/memory.h"
#include "support/section.h"
#include "support/shapes.h"
#include "thinwall/compare.h"

typedef struct both {
    utw_outline *outline;
    utw_solution *solution;
    utw_idealisation *ideal;
    utw_comparison *comparison;
} both;

static both compare(utw_outline *outline, double limit)
{
    utw_error err;
    both b = {.outline = outline};
    b.solution = section_solve(outline, 1e-4, 0);
    assert_ok(utw_idealise(outline, &b.ideal, &err));
    assert_ok(utw_compare(b.solution, b.ideal, limit, &b.comparison, &err));
    return b;
}

static void clear(both *b)
{
    utw_comparison_free(b->comparison);
    utw_idealisation_free(b->ideal);
    utw_solution_free(b->solution);
    utw_outline_free(b->outline);
}

static const utw_compared *row_of(const both *b, utw_constant which)
{
    for (int k = 0; k < utw_comparison_count(b->comparison); k++)
        if (utw_comparison_get(b->comparison, k)->which == which)
            return utw_comparison_get(b->comparison, k);
    fail();
    return NULL;
}

/* Every difference is that of its two values over its base, and judged at the further bound. */
static void differences(void **state)
{
    (void)state;
    both b = compare(shape_of("channel h=100 b=47 tf=9 tw=6 r=7"), 0.02);
    const utw_thin_constants *thin = utw_thin_get(utw_idealisation_thin(b.ideal));
    const utw_compared *J = row_of(&b, UTW_J), *xs = row_of(&b, UTW_XS), *ys = row_of(&b, UTW_YS),
                       *Ixy = row_of(&b, UTW_IXY);
    assert_close(J->difference, thin->J / J->solid.value - 1, 1e-12);
    assert_true(J->thin == thin->J);
    assert_int_equal(J->base, UTW_OF_SOLID);
    assert_close(xs->difference, (thin->xs - xs->solid.value) / 47, 1e-12);
    assert_int_equal(xs->base, UTW_OF_WIDTH);
    assert_int_equal(ys->base, UTW_OF_DEPTH);
    assert_close_scaled(ys->difference, 0, 1e-6, 1);
    assert_int_equal(Ixy->base, UTW_OF_MEAN);
    assert_int_equal(Ixy->within, 1);
    for (int k = 0; k < utw_comparison_count(b.comparison); k++) {
        const utw_compared *row = utw_comparison_get(b.comparison, k);
        if (row->absent == NULL) assert_int_equal(row->within, fabs(row->difference) <= 0.02);
    }
    /* no material: no shear areas, and the row says why */
    assert_non_null(strstr(row_of(&b, UTW_ASX)->absent, "Poisson"));
    assert_null(utw_comparison_get(b.comparison, -1));
    assert_null(utw_comparison_get(b.comparison, UTW_COMPARED));
    assert_null(utw_comparison_reason(b.comparison, -1));
    assert_null(utw_comparison_reason(b.comparison, utw_comparison_reason_count(b.comparison)));
    assert_true(utw_comparison_limit(b.comparison) == 0.02);
    assert_ptr_equal(utw_comparison_idealisation(b.comparison), b.ideal);
    clear(&b);
}

/* A bound that lies beyond the limit is not within, though the value is. */
static void the_further_bound_decides(void **state)
{
    (void)state;
    utw_error err;
    both b = {.outline = shape_of("rectangle b=100 h=8")};
    b.solution = section_solve(b.outline, 0.5, 1);
    assert_ok(utw_idealise(b.outline, &b.ideal, &err));
    assert_ok(utw_compare(b.solution, b.ideal, 0.25, &b.comparison, &err));
    const utw_compared *J = row_of(&b, UTW_J);
    assert_true(J->solid.high > 1.25 * J->solid.low);
    const double worst = fmax(fabs(J->thin - J->solid.low), fabs(J->thin - J->solid.high));
    assert_int_equal(J->within, worst <= 0.25 * J->solid.value);
    assert_int_equal(J->within, 0);
    clear(&b);
}

/* A plate has no shear across it in thin-walled theory, and its warping is across the wall:
 * t^3 b^3/144 (Timoshenko and Gere, Theory of Elastic Stability, 1961, from memory). */
static void a_plate(void **state)
{
    (void)state;
    both b =
        compare(section_outline(0.3, "\"shape\": {\"rectangle\": {\"b\": 100, \"h\": 4}}"), 0.05);
    assert_string_equal(row_of(&b, UTW_ASY)->absent,
                        "thin-walled theory knows no shear across walls that lie on one line");
    assert_close(row_of(&b, UTW_IW)->thin, 1e6 * 64 / 144, 1e-9);
    assert_close_scaled(row_of(&b, UTW_IW)->difference, 0, 0.02, 1);
    assert_non_null(
        strstr(utw_comparison_reason(b.comparison, utw_comparison_reason_count(b.comparison) - 1),
               "across the walls alone"));
    /* J = b t^3/3 is 1/(1 - 0.63 t/b) too high */
    assert_close(row_of(&b, UTW_J)->difference, 1 / (1 - 0.630 * 0.04) - 1, 0.01);
    clear(&b);
}

/* A tube warps in neither theory: two zeros agree. */
static void nothing_beside_nothing(void **state)
{
    (void)state;
    both b = compare(shape_of("tube d=60.3 t=4"), 0.05);
    const utw_compared *Iw = row_of(&b, UTW_IW);
    assert_int_equal(Iw->within, 1);
    assert_true(Iw->difference == 0);
    clear(&b);
}

static void wrong_arguments(void **state)
{
    (void)state;
    utw_error err;
    both b = compare(shape_of("rectangle b=100 h=8"), 0.05);
    utw_comparison *none = NULL;
    assert_int_equal(utw_compare(NULL, b.ideal, 0.05, &none, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text,
                        "utw_compare: solution, idealisation and comparison must not be NULL");
    assert_int_equal(utw_compare(b.solution, b.ideal, 0, &none, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "utw_compare: the limit 0 is not between 1e-06 and 1");
    assert_int_equal(utw_compare(b.solution, b.ideal, NAN, &none, &err), UTW_E_ARGUMENT);
    assert_null(none);
    utw_comparison_free(NULL);
    for (long n = 1; n < 40; n++) {
        utw_memory_fail_at(n);
        const utw_status st = utw_compare(b.solution, b.ideal, 0.05, &none, &err);
        utw_memory_fail_at(0);
        if (st == UTW_OK) break;
        assert_int_equal(st, UTW_E_NOMEM);
        assert_null(none);
    }
    assert_non_null(none);
    utw_comparison_free(none);
    clear(&b);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(differences),     balanced_test(the_further_bound_decides),
        balanced_test(a_plate),         balanced_test(nothing_beside_nothing),
        balanced_test(wrong_arguments),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
