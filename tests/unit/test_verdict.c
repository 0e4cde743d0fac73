/* SPDX-License-Identifier: GPL-3.0-or-later
 * The sentences of thinwall/verdict.c. */
#include "support/support.h"
#include "thinwall/compare.h"

static void row(utw_comparison *c, int k, utw_constant which, double difference, int within,
                utw_difference_base base)
{
    c->row[k] =
        (utw_compared){.which = which, .difference = difference, .within = within, .base = base};
}

/* All rows left out but those that a test sets. */
static void start(utw_comparison *c, utw_idealisation *ideal)
{
    memset(c, 0, sizeof *c);
    memset(ideal, 0, sizeof *ideal);
    c->idealisation = ideal;
    c->limit = 0.05;
    for (int k = 0; k < UTW_COMPARED; k++) c->row[k].absent = "not here";
}

static void says(const utw_comparison *c, const char *expected)
{
    utw_text text = {.text = NULL};
    utw_verdict_write(c, &text);
    assert_string_equal(text.text, expected);
    utw_text_clear(&text);
}

static void verdicts(void **state)
{
    (void)state;
    utw_comparison c;
    utw_idealisation ideal;
    start(&c, &ideal);
    row(&c, 0, UTW_A, 0.001, 1, UTW_OF_SOLID);
    says(&c, "The thin-walled idealisation may be used here for all that is compared: A is within "
             "5 %.");
    row(&c, 3, UTW_IXX, 0.01, 1, UTW_OF_SOLID);
    row(&c, 4, UTW_IYY, 0.01, 1, UTW_OF_SOLID);
    row(&c, 12, UTW_IW, -0.049, 1, UTW_OF_SOLID);
    c.limit = 0.075;
    says(&c, "The thin-walled idealisation may be used here for all that is compared: A, Ixx, Iyy "
             "and Iw are "
             "within 7.5 %.");
    row(&c, 8, UTW_J, 0.2312, 0, UTW_OF_SOLID);
    says(&c, "The thin-walled idealisation may be used here for A, Ixx, Iyy and Iw (within 7.5 %); "
             "not for J, "
             "which it overestimates by 23 %.");
    row(&c, 9, UTW_WT, -0.7, 0, UTW_OF_SOLID);
    row(&c, 10, UTW_XS, -0.101, 0, UTW_OF_WIDTH);
    row(&c, 11, UTW_YS, 3.2, 0, UTW_OF_DEPTH);
    row(&c, 5, UTW_IXY, 0.0912, 0, UTW_OF_MEAN);
    says(&c, "The thin-walled idealisation may be used here for A, Ixx, Iyy and Iw (within 7.5 %); "
             "not for "
             "Ixy, which it misses by 9.1 % of sqrt(Ixx Iyy), nor for J, which it overestimates by "
             "23 %, nor "
             "for Wt, which it underestimates by 70 %, nor for xs, which it puts 10 % of the width "
             "too far "
             "left, nor for ys, which it puts 320 % of the depth too far up.");
    start(&c, &ideal);
    row(&c, 8, UTW_J, 9, 0, UTW_OF_SOLID);
    snprintf(ideal.doubt, sizeof ideal.doubt, "Do not trust it.");
    says(&c, "Do not trust it. The thin-walled idealisation may not be used here: nothing is "
             "within 5 %.");
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(verdicts)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
