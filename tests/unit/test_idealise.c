/* SPDX-License-Identifier: GPL-3.0-or-later
 * The checks around a found, a drawn and a taken midline. */
#include "thinwall/idealise.h"

#include "support/midlines.h"
#include "support/samples.h"
#include "support/shapes.h"

static void figures(void **state)
{
    (void)state;
    utw_error err;
    utw_idealisation *ideal = NULL;
    utw_outline *outline = shape_of("angle h=100 b=65 t=10");
    assert_ok(utw_idealise(outline, &ideal, &err));
    const utw_idealisation_info *info = utw_idealisation_get(ideal);
    /* the mitred corner leaves area and half the boundary as they are */
    assert_close_scaled(info->area_error, 0, 1e-9, 1);
    assert_close_scaled(info->length_error, 0, 1e-9, 1);
    assert_close(info->length, 155, 1e-9);
    assert_close(info->thickness, 10, 1e-9);
    assert_string_equal(utw_idealisation_doubt(ideal), "");
    assert_null(utw_idealisation_wall(ideal, -1));
    assert_null(utw_idealisation_wall(ideal, 2));
    assert_close(utw_idealisation_wall(ideal, 0)->length, 95, 1e-9);
    utw_idealisation_free(ideal);
    utw_outline_free(outline);
}

/* A midline that is not that of the section is doubted, with figures. */
static void doubts(void **state)
{
    (void)state;
    utw_error err;
    utw_idealisation *ideal = NULL;
    utw_outline *outline = shape_of("channel h=100 b=50 tf=5 tw=5");
    double nodes[][2] = {{50, 2.5}, {2.5, 2.5}, {2.5, 97.5}, {50, 97.5}};
    utw_wall open[] = {WALL(0, 1, 5), WALL(1, 2, 5), WALL(2, 3, 5)},
             closed[] = {WALL(0, 1, 5), WALL(1, 2, 5), WALL(2, 3, 5), WALL(3, 0, 5)},
             thick[] = {WALL(0, 1, 6), WALL(1, 2, 6), WALL(2, 3, 6)},
             two[] = {WALL(0, 1, 8), WALL(1, 2, 6.5)};
    double corner[][2] = {{40, 2.5}, {2.5, 2.5}, {2.5, 97.5}};
    const utw_midline right = MIDLINE(nodes, open), ring = MIDLINE(nodes, closed),
                      heavy = MIDLINE(nodes, thick), shorter = MIDLINE(corner, two);
    const struct {
        const utw_midline *m;
        const char *doubt;
    } list[] = {
        {&right, ""},
        {&ring, "The midline has 1 cell and the section 0 holes: do not trust it."},
        {&heavy, "The midline does not represent this section well: its area is 20 % greater than "
                 "the section's."},
        {&shorter, "The midline does not represent this section well: its walls are 28.3 % shorter "
                   "than half the "
                   "boundary is long."},
    };
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        assert_ok(utw_idealise_as(outline, list[i].m, &ideal, &err));
        assert_string_equal(utw_idealisation_doubt(ideal), list[i].doubt);
        assert_int_equal(utw_idealisation_get(ideal)->given, 1);
        utw_idealisation_free(ideal);
        ideal = NULL;
    }
    nodes[0][0] = NAN;
    assert_int_equal(utw_idealise_as(outline, &right, &ideal, &err), UTW_E_OUTLINE);
    assert_int_equal(utw_idealise_as(outline, NULL, &ideal, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text,
                        "utw_idealise_as: outline, midline and idealisation must not be NULL");
    assert_null(ideal);
    utw_outline_free(outline);
}

/* Every sample has a midline that is its own, or a sentence. */
static void samples(void **state)
{
    (void)state;
    const char *name;
    utw_outline *outline;
    int found = 0, n = 0;
    for (; (outline = sample_outline(n, &name)) != NULL; n++) {
        utw_error err;
        utw_idealisation *ideal = NULL;
        const utw_status st = utw_idealise(outline, &ideal, &err);
        if (st == UTW_OK) {
            const utw_idealisation_info *info = utw_idealisation_get(ideal);
            const int sound = info->cells == info->holes && fabs(info->area_error) <= 0.1 &&
                              fabs(info->length_error) <= 0.25;
            assert_int_equal(utw_idealisation_doubt(ideal)[0] == '\0', sound);
            found++;
        } else {
            assert_int_equal(st, UTW_E_NO_THIN_WALL);
            assert_memory_equal(err.text, "the section has no thin-walled idealisation: ", 45);
        }
        utw_idealisation_free(ideal);
        utw_outline_free(outline);
    }
    assert_true(n >= 8 && found >= 4);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(figures), balanced_test(doubts),
                                       balanced_test(samples)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
