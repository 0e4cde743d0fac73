/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/nearest.h"
#include "support/support.h"

static void distance_counts_edits(void **state)
{
    (void)state;
    assert_int_equal(utw_word_distance("kitten", "sitting"), 3); /* two changes and an insertion */
    assert_int_equal(utw_word_distance("", "abc"), 3);
    assert_int_equal(utw_word_distance("laods", "loads"), 1);
    assert_int_equal(utw_word_distance("outline", "Outline"), 0);
    assert_int_equal(utw_word_distance("flaw", "lawn"), 2);
    char longer[80];
    memset(longer, 'a', 79);
    longer[79] = '\0';
    assert_int_equal(utw_word_distance(longer, "a"), 1000);
}

static void only_near_words_are_suggested(void **state)
{
    (void)state;
    const char *const key[] = {"at", "round", "chamfer", "bezier", "N"};
    assert_int_equal(utw_nearest_word("rond", key, 5), 1);
    assert_int_equal(utw_nearest_word("Chamfre", key, 5), 2);
    assert_int_equal(utw_nearest_word("radius", key, 5), -1);
    assert_int_equal(utw_nearest_word("T", key, 5),
                     -1); /* one edit, yet nothing in common with N */
    assert_int_equal(utw_nearest_word("n", key, 5), 4);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(distance_counts_edits),
        cmocka_unit_test(only_near_words_are_suggested),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
