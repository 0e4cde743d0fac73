/* SPDX-License-Identifier: GPL-3.0-or-later
 * The thickness study, step by step. */
#include "base/memory.h"
#include "support/section.h"
#include "thinwall/thickness.h"

/* An angle of two walls 3 thick, with a material. */
static const char *const angle =
    "{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 70000, \"nu\": 0.3}},"
    " \"midline\": {\"material\": \"m\", \"nodes\": [[0,80],[0,0],[60,0]],"
    " \"walls\": [{\"from\":0,\"to\":1,\"t\":3},{\"from\":1,\"to\":2,\"t\":3}]}}";

static void steps(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *outline = utw_outline_of(angle);
    utw_idealisation *ideal = NULL;
    utw_study *study = NULL;
    const utw_study_range range = {0.5, 2, 4};
    double d = 7;
    assert_ok(utw_idealise(outline, &ideal, &err));
    assert_ok(utw_thickness_study(outline, ideal, NULL, &range, 0.02, &study, &err));
    assert_int_equal(utw_study_count(study), 4);
    assert_true(utw_study_limit(study) == 0.02);
    for (int i = 0; i < 4; i++) {
        const utw_study_step *step = utw_study_get(study, i);
        assert_close(step->factor, 0.5 + 0.5 * i, 1e-15);
        assert_close(step->thickness, 3 * step->factor, 1e-12);
        assert_close(step->ratio, step->thickness / 80, 1e-12);
        assert_null(step->failed);
        assert_int_equal(utw_study_difference(study, i, UTW_ASX, &d), 1);
        assert_int_equal(utw_study_difference(study, i, UTW_RX, &d), 0);
    }
    /* the step with factor 1 is the section itself */
    utw_solution *solution = section_solve(outline, 1e-6, 0);
    utw_comparison *comparison = NULL;
    assert_ok(utw_compare(solution, ideal, 0.02, &comparison, &err));
    for (int k = 0; k < UTW_COMPARED; k++) {
        const utw_compared *row = utw_comparison_get(comparison, k);
        assert_int_equal(utw_study_difference(study, 1, row->which, &d), row->absent == NULL);
        if (row->absent == NULL && row->which != UTW_IW)
            assert_close_scaled(d, row->difference, 1e-5, 1);
    }
    assert_null(utw_study_get(study, -1));
    assert_null(utw_study_get(study, 4));
    assert_int_equal(utw_study_difference(study, 4, UTW_A, &d), 0);
    assert_string_equal(utw_study_statement(study, UTW_A),
                        "A: within 2 % at every thickness studied");
    assert_null(utw_study_statement(study, UTW_WT));
    assert_null(utw_study_statement(study, UTW_RX));
    utw_comparison_free(comparison);
    utw_solution_free(solution);
    utw_study_free(study);
    utw_idealisation_free(ideal);
    utw_outline_free(outline);
}

/* A box 40 by 24 whose walls close its cell: steps beyond that say why; when all do, there is no
 * study. */
static void walls_that_do_not_fit(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *outline = utw_outline_of(
        "{\"units\": \"mm N\", \"midline\": {\"nodes\": [[0,0],[40,0],[40,24],[0,24]], \"walls\": ["
        "{\"from\":0,\"to\":1,\"t\":2},{\"from\":1,\"to\":2,\"t\":2},{\"from\":2,\"to\":3,\"t\":2},"
        "{\"from\":3,\"to\":0,\"t\":2}]}}");
    utw_idealisation *ideal = NULL;
    utw_study *study = NULL;
    const utw_study_range some = {5, 15, 3}, none = {15, 20, 2};
    double d = 7;
    assert_ok(utw_idealise(outline, &ideal, &err));
    assert_ok(utw_thickness_study(outline, ideal, NULL, &some, 0.05, &study, &err));
    assert_null(utw_study_get(study, 0)->failed);
    assert_null(utw_study_get(study, 1)->failed);
    assert_non_null(utw_study_get(study, 2)->failed);
    assert_int_equal(utw_study_difference(study, 2, UTW_J, &d), 0);
    assert_true(d == 7);
    utw_study_free(study);
    study = NULL;
    assert_int_equal(utw_thickness_study(outline, ideal, NULL, &none, 0.05, &study, &err),
                     UTW_E_NO_THIN_WALL);
    assert_non_null(
        strstr(err.text, "the midline cannot be given a thickness at any step of the study: "));
    assert_null(study);
    utw_idealisation_free(ideal);
    utw_outline_free(outline);
}

static void wrong_arguments(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *outline = utw_outline_of(angle);
    utw_idealisation *ideal = NULL;
    utw_study *study = NULL;
    const utw_study_range bad[] = {{0, 1, 3},   {1, 1, 3},    {2, 1, 3},  {1, 2, 1},
                                   {1, 2, 501}, {1, 1001, 3}, {NAN, 1, 3}},
                          good = {0.5, 1, 2};
    assert_ok(utw_idealise(outline, &ideal, &err));
    for (size_t i = 0; i < sizeof bad / sizeof *bad; i++)
        assert_int_equal(utw_thickness_study(outline, ideal, NULL, &bad[i], 0.05, &study, &err),
                         UTW_E_ARGUMENT);
    assert_int_equal(utw_thickness_study(outline, ideal, NULL, &bad[2], 0.05, &study, &err),
                     UTW_E_ARGUMENT);
    assert_string_equal(
        err.text, "the thickness study from 2 to 1 in 3 steps: the factors must rise from at least "
                  "0.001 to at most 1000, in 2 to 500 steps");
    assert_int_equal(utw_thickness_study(outline, ideal, NULL, &good, 0, &study, &err),
                     UTW_E_ARGUMENT);
    assert_int_equal(utw_thickness_study(NULL, ideal, NULL, &good, 0.05, &study, &err),
                     UTW_E_ARGUMENT);
    assert_null(study);
    utw_study_free(NULL);
    utw_idealisation_free(ideal);
    utw_outline_free(outline);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(steps),
        balanced_test(walls_that_do_not_fit),
        balanced_test(wrong_arguments),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
