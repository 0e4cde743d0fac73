/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where a load acts along the bar; what is refused is tested in tests/bad/test_bad_push.c. */
#include "bar/push_load.h"

#include "support/pushed.h"

static void places_along_the_bar(void **state)
{
    (void)state;
    utw_push_load l = pushed_load(90, 0, -5, 1, 1);
    l.z = 31;
    assert_true(utw_push_load_z(&l) == 90); /* the tip of a cantilever */
    l.support = UTW_FIXED_FIXED;
    assert_true(utw_push_load_z(&l) == 45);
    l.where = UTW_AT_TIP;
    assert_true(utw_push_load_z(&l) == 90);
    l.where = UTW_AT_Z;
    assert_true(utw_push_load_z(&l) == 31);
    l.support = UTW_FIXED_FREE;
    l.where = UTW_AT_MID;
    assert_true(utw_push_load_z(&l) == 45);
    l.where = UTW_UNIFORM;
    assert_true(isnan(utw_push_load_z(&l)));
}

int main(void)
{
    const struct CMUnitTest tests[] = {cmocka_unit_test(places_along_the_bar)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
