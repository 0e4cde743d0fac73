/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "thinwall/rate.h"

#include "base/memory.h"
#include "support/midlines.h"

static utw_idealisation rated(const utw_midline *m, const utw_wall_kind *kind)
{
    utw_error err;
    utw_idealisation ideal = {.midline = *m};
    assert_ok(utw_rate_walls(&ideal, kind, &err));
    return ideal;
}

/* Two plates and the quarter bend between them; with a mean radius of 6 thicknesses it is a wall.
 */
static void bends(void **state)
{
    (void)state;
    for (int tight = 0; tight < 2; tight++) {
        const double r = tight ? 15 : 18, c = r - r * sqrt(0.5);
        double nodes[][2] = {{100, 0}, {r, 0}, {0, r}, {0, 80}};
        utw_wall walls[] = {WALL(0, 1, 3), ARC(1, 2, 3, 3, c, c), WALL(2, 3, 3)};
        const utw_midline m = MIDLINE(nodes, walls);
        utw_idealisation ideal = rated(&m, NULL);
        assert_int_equal(ideal.info.bends, tight);
        assert_int_equal(ideal.info.walls, 3 - tight);
        assert_int_equal(ideal.wall[1].kind, tight ? UTW_WALL_BEND : UTW_WALL_PLATE);
        assert_int_equal(ideal.info.cells, 0);
        /* a bend ends the plate; an arc goes on with it */
        const double arc = acos(-1.0) / 2 * r;
        assert_close(ideal.wall[0].plate_length, tight ? 100 - r : 180 - 2 * r + arc, 1e-12);
        assert_close(ideal.wall[0].slenderness, ideal.wall[0].plate_length / 3, 1e-12);
        utw_free(ideal.wall);
    }
}

/* A tee's flange in two halves is two plates; one cut in three in line, of nearly one thickness, is
 * one plate. */
static void plates(void **state)
{
    (void)state;
    double nodes[][2] = {{-30, 0}, {0, 0}, {30, 0}, {0, -10}, {0, -25}, {0, -28}};
    utw_wall walls[] = {WALL(0, 1, 5), WALL(1, 2, 5), WALL(1, 3, 4), WALL(3, 4, 4.5),
                        WALL(4, 5, 9)};
    const utw_midline m = MIDLINE(nodes, walls);
    utw_idealisation ideal = rated(&m, NULL);
    assert_int_equal(ideal.info.walls, 5);
    assert_int_equal(ideal.info.junctions, 1);
    assert_close(ideal.wall[0].slenderness, 6, 1e-12);
    assert_close(ideal.wall[2].plate_length, 25, 1e-12);
    assert_close(ideal.wall[3].slenderness, 625 / (40 + 67.5), 1e-12);
    /* twice as thick: a step */
    assert_close(ideal.wall[4].slenderness, 1.0 / 3, 1e-12);
    assert_int_equal(ideal.wall[4].slender, 0);
    assert_int_equal(ideal.wall[3].slender, 1);
    assert_close(ideal.info.length, 88, 1e-12);
    assert_close(ideal.info.thickness, (300 + 40 + 67.5 + 27) / 88, 1e-12);
    assert_close(ideal.info.slenderness, 6, 1e-12);
    utw_free(ideal.wall);
}

/* Kinds that are known stay; lumps and links are counted apart, and no lump is slender. */
static void kinds(void **state)
{
    (void)state;
    double nodes[][2] = {{0, 0}, {40, 0}, {40, 1}, {70, 1}};
    utw_wall walls[] = {WALL(0, 1, 2), WALL(1, 2, 2), WALL(2, 3, 9)};
    const utw_wall_kind kind[] = {UTW_WALL_PLATE, UTW_WALL_LINK, UTW_WALL_LUMP};
    const utw_midline m = MIDLINE(nodes, walls);
    utw_idealisation ideal = rated(&m, kind);
    assert_int_equal(ideal.info.walls, 2);
    assert_int_equal(ideal.info.lumps, 1);
    assert_int_equal(ideal.info.links, 1);
    assert_int_equal(ideal.wall[2].slender, 0);
    utw_free(ideal.wall);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(bends), balanced_test(plates),
                                       balanced_test(kinds)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
