/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "report/push_words.h"

#include "support/support.h"

static void every_choice_has_its_word(void **state)
{
    (void)state;
    assert_string_equal(utw_support_word(UTW_FIXED_FREE), "fixed-free");
    assert_string_equal(utw_support_word(UTW_FIXED_FORKED), "fixed-forked");
    for (int i = 0; i < UTW_SUPPORT_COUNT; i++) assert_non_null(utw_support_word((utw_support)i));
    assert_null(utw_support_word(UTW_SUPPORT_COUNT));
    assert_null(utw_support_word((utw_support)-1));
    assert_string_equal(utw_hold_warping_word(UTW_WARPING_USUAL), "usual");
    assert_string_equal(utw_hold_warping_word(UTW_WARPING_HELD), "held");
    assert_null(utw_hold_warping_word((utw_hold_warping)(UTW_WARPING_HELD + 1)));
}

int main(void)
{
    const struct CMUnitTest tests[] = {cmocka_unit_test(every_choice_has_its_word)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
