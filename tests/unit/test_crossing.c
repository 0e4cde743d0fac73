/* SPDX-License-Identifier: GPL-3.0-or-later
 * The sentences of thinwall/crossing.c. */
#include "support/support.h"
#include "thinwall/thickness.h"

enum { STEPS = 5, J_ROW = 8 };

/* Differences of J in per cent at t = 2, 4, 6, 8, 10; the longest wall is 64 long; limit 5 %. */
static void says(const double percent[STEPS], const char *expected)
{
    static utw_step step[STEPS];
    utw_study study = {.n = STEPS, .limit = 0.05, .step = step};
    utw_text text = {.text = NULL};
    assert_int_equal(utw_compared_index(UTW_J), J_ROW);
    memset(step, 0, sizeof step);
    for (int i = 0; i < STEPS; i++) {
        step[i].open.thickness = 2 + 2 * i;
        step[i].open.ratio = step[i].open.thickness / 64;
        step[i].difference[J_ROW] = 0.01 * percent[i];
    }
    utw_statement_write(&study, J_ROW, "mm", &text);
    if (expected == NULL)
        assert_null(text.text);
    else
        assert_string_equal(text.text, expected);
    utw_text_clear(&text);
}

static void statements(void **state)
{
    (void)state;
    says((const double[]){1, 2, 3, 4, 5}, "J: within 5 % at every thickness studied");
    says((const double[]){6, 7, -8, 9, 9}, "J: outside 5 % at every thickness studied");
    says((const double[]){1, 2, 4, 6, 9}, "J: within 5 % up to t = 7 mm (t/b = 0.11)");
    /* the size counts, not the sign */
    says((const double[]){-1, -2, -4, -6, -9}, "J: within 5 % up to t = 7 mm (t/b = 0.11)");
    says((const double[]){9, 7, 3, 2, 1}, "J: within 5 % from t = 5 mm (t/b = 0.078) on");
    says((const double[]){9, 7, 3, 7, 9},
         "J: within 5 % from t = 5 mm (t/b = 0.078) to t = 7 mm (t/b = 0.11)");
    says((const double[]){1, 9, 1, 9, 9},
         "J: within 5 % up to t = 3 mm (t/b = 0.047), and from t = "
         "5 mm (t/b = 0.078) to t = 7 mm (t/b = 0.11)");
    /* steps that failed say nothing about the thickness there */
    says((const double[]){NAN, 1, 3, 7, NAN},
         "J: within 5 % from t = 4 mm (t/b = 0.062) to t = 7 mm (t/b = 0.11)");
    says((const double[]){1, 2, 3, NAN, NAN}, "J: within 5 % at every thickness studied");
    says((const double[]){NAN, NAN, NAN, NAN, NAN}, NULL);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(statements)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
