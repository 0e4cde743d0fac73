/* SPDX-License-Identifier: GPL-3.0-or-later
 * Boxes of several cells: certified values, cells that add up, and the limit of thin walls.
 *
 * Area integrals: evaluated over the exact outline. All other values are certified: computed
 * independently of this program by another high-order finite-element program on the exact outline
 * with two-sided energies (J; the shear factors at nu = 0; shear centres and the rest by the
 * product of two gaps); Iw with the change between orders. The uncertainty stands beside each
 * value. Thin walls: Bredt 1896, Batho 1916, in src/thinwall.
 */
#include "base/vec2.h"
#include "support/midlines.h"
#include "support/section.h"

#define CHECK(call, list)                                                                          \
    do {                                                                                           \
        utw_outline *o = call;                                                                     \
        assert_all_known(o, list, sizeof(list) / sizeof((list)[0]), 0);                            \
        utw_outline_free(o);                                                                       \
    } while (0)

static const known two_cell_nu0[] = {
    /* 3 x 1; webs at 0, 1.4, 3, thickness 0.1, 0.1, 0.15; covers 0.1 */
    {UTW_A, 0.88, 1e-12},
    {UTW_XC, 1.5534090909091, 1e-12},
    {UTW_YC, 0.5, 1e-12},
    {UTW_IXX, 0.13693333333333, 1e-12},
    {UTW_IYY, 0.86052310606061, 1e-12},
    {UTW_J, 0.38274703977439, 1e-12},
    {UTW_XS, 1.568225947631, 2e-12},
    {UTW_IW, 0.04286344296246, 7.2e-12},
    {UTW_KX, 0.6229657044606, 3.2e-12},
    {UTW_KY, 0.2685241935214, 2.1e-12},
};
static const known two_cell_nu03[] = {
    {UTW_KX, 0.622962600493, 2.6e-12},
    {UTW_KY, 0.262546337991, 6e-12},
};

static const char two_cells[] = "\"outline\":[[0,0],[3,0],[3,1],[0,1]],"
                                "\"holes\":[[[0.1,0.1],[1.35,0.1],[1.35,0.9],[0.1,0.9]],[[1.45,0.1]"
                                ",[2.85,0.1],[2.85,0.9],[1.45,0.9]]]";

static void fixed_values(void **state)
{
    (void)state;
    CHECK(section_outline(0, "%s", two_cells), two_cell_nu0);
    CHECK(section_outline(0.3, "%s", two_cells), two_cell_nu03);
}

/* A box of midline width w and height h cut in two by a web at x = c, all walls t thick. */
static utw_outline *box(double w, double h, double c, double t)
{
    const double a = t / 2;
    return section_outline(
        0,
        "\"outline\":[[%.17g,%.17g],[%.17g,%.17g],[%.17g,%.17g],[%.17g,%.17g]],\"holes\":["
        "[[%.17g,%.17g],[%.17g,%.17g],[%.17g,%.17g],[%.17g,%.17g]],"
        "[[%.17g,%.17g],[%.17g,%.17g],[%.17g,%.17g],[%.17g,%.17g]]]",
        -a, -a, w + a, -a, w + a, h + a, -a, h + a, a, a, c - a, a, c - a, h - a, a, h - a, c + a,
        a, w - a, a, w - a, h - a, c + a, h - a);
}

/* The thinner the walls, the nearer the thin-walled theory: what differs falls in proportion to t
 * (J, shear areas) or faster (shear centre). */
static void thin_walls_in_the_limit(void **state)
{
    (void)state;
    const double w = 7.3, h = 3.1, c = 2.9;
    double nodes[][2] = {{0, 0}, {c, 0}, {w, 0}, {w, h}, {c, h}, {0, h}};
    double last[4] = {1, 1, 1, 1};
    for (double t = 0.4; t > 0.02; t /= 2) {
        utw_wall walls[] = {WALL(0, 1, t), WALL(1, 2, t), WALL(2, 3, t), WALL(3, 4, t),
                            WALL(4, 5, t), WALL(5, 0, t), WALL(1, 4, t)};
        const utw_midline m = MIDLINE(nodes, walls);
        utw_thin *thin = utw_thin_of(&m);
        const utw_thin_constants *k = utw_thin_get(thin);
        utw_outline *o = box(w, h, c, t);
        utw_solution *s = section_solve(o, 1e-6, 0);
        const double apart[4] = {
            fabs(section_constant(s, UTW_J).value / k->J - 1),
            fabs(section_constant(s, UTW_XS).value - k->xs) / w,
            fabs(section_constant(s, UTW_ASX).value / k->Asx - 1),
            fabs(section_constant(s, UTW_ASY).value / k->Asy - 1),
        };
        for (int i = 0; i < 4; i++) {
            assert_true(apart[i] < 0.65 * last[i]);
            last[i] = apart[i];
        }
        utw_solution_free(s);
        utw_outline_free(o);
        utw_thin_free(thin);
    }
    assert_true(last[0] < 0.02 && last[1] < 1e-3 && last[2] < 0.02 && last[3] < 0.02);
}

/* A hole that carries no flow: two equal cells side by side are one box whose middle web is idle.
 */
static void idle_web(void **state)
{
    (void)state;
    utw_outline *with = box(6, 2, 3, 0.2);
    utw_outline *without =
        section_outline(0, "\"outline\":[[-0.1,-0.1],[6.1,-0.1],[6.1,2.1],[-0.1,2.1]],"
                           "\"holes\":[[[0.1,0.1],[5.9,0.1],[5.9,1.9],[0.1,1.9]]]");
    utw_solution *a = section_solve(with, 1e-8, 0), *b = section_solve(without, 1e-8, 0);
    const double Ja = section_constant(a, UTW_J).value, Jb = section_constant(b, UTW_J).value;
    /* what is left is the torsion of the web itself and of its junctions, some l t^3/3 */
    assert_true(Ja > Jb && Ja < 1.005 * Jb);
    const double Asx = section_constant(a, UTW_ASX).value, one = section_constant(b, UTW_ASX).value;
    assert_close(Asx, one, 0.02);
    assert_true(section_constant(a, UTW_ASY).value > 1.3 * section_constant(b, UTW_ASY).value);
    utw_solution_free(a);
    utw_solution_free(b);
    utw_outline_free(with);
    utw_outline_free(without);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(fixed_values),
        balanced_test(thin_walls_in_the_limit),
        balanced_test(idle_web),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
