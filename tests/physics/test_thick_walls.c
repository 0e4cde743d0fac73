/* SPDX-License-Identifier: GPL-3.0-or-later
 * Sections of thick walls with sharp corners against certified values.
 *
 * Area integrals: evaluated over the exact outline. All other values are certified: computed
 * independently of this program by another high-order finite-element program on the exact outline
 * with two-sided energies (J; the shear factors at nu = 0; shear centres and the rest by the
 * product of two gaps); Iw with the change between orders. The uncertainty stands beside each
 * value.
 */
#include "base/vec2.h"
#include "support/section.h"

#define CHECK(call, list)                                                                          \
    do {                                                                                           \
        utw_outline *o = call;                                                                     \
        assert_all_known(o, list, sizeof(list) / sizeof((list)[0]), 0);                            \
        utw_outline_free(o);                                                                       \
    } while (0)

static const known square_tube_nu0[] = {
    /* 2 x 2, walls 0.2 */
    {UTW_A, 1.44, 1e-12},
    {UTW_XC, 1.0, 1e-12},
    {UTW_YC, 1.0, 1e-12},
    {UTW_IXX, 0.7872, 1e-12},
    {UTW_IYY, 0.7872, 1e-12},
    {UTW_J, 1.2334945413306, 1e-12},
    {UTW_IW, 0.0015107123799, 1.1e-10},
    {UTW_KX, 0.4438137266398, 2e-12},
    {UTW_KY, 0.4438137266398, 2e-12},
};
static const known square_tube_nu03[] = {
    {UTW_KX, 0.4437485159331, 2e-12},
    {UTW_KY, 0.4437485159332, 2e-12},
};

static const known angle_nu0[] = {
    /* legs 1 x 1, thickness 0.1 */
    {UTW_A, 0.19, 1e-12},
    {UTW_XC, 0.28684210526316, 1e-12},
    {UTW_YC, 0.28684210526316, 1e-12},
    {UTW_IXX, 0.018000438596491, 1e-12},
    {UTW_IYY, 0.018000438596491, 1e-12},
    {UTW_IXY, -0.010657894736842, 1e-12},
    {UTW_J, 0.00061957410048892, 1e-12},
    {UTW_XS, 0.05295986309566, 8.4e-12},
    {UTW_YS, 0.0529598630957, 8.4e-12},
    {UTW_IW, 4.672116726096e-05, 2e-12},
    {UTW_KX, 0.4356418182226, 2e-12},
    {UTW_KY, 0.4356418182225, 2e-12},
};

/* The coupling of both shear forces, A int tau^x . tau^y for unit forces at nu = 0. */
static const double angle_alpha_xy = 0.01204675154, angle_alpha_xy_uncertainty = 2.9e-10;

static const known tee_nu0[] = {
    /* flange 1, height 1, thickness 0.1, the foot of the web at the origin */
    {UTW_A, 0.19, 1e-12},
    {UTW_YC, 0.71315789473684, 1e-12},
    {UTW_IXX, 0.018000438596491, 1e-12},
    {UTW_IYY, 0.0084083333333333, 1e-12},
    {UTW_J, 0.0006310163578595, 1.7e-12},
    {UTW_YS, 0.9419182600845, 2e-12},
    {UTW_IW, 2.97199937161e-05, 1.7e-11},
    {UTW_KX, 0.4594117691748, 2e-12},
    {UTW_KY, 0.4129883572162, 3e-12},
};

static const known cross_nu0[] = {
    /* arms 1 x 1, thickness 0.2 */
    {UTW_A, 0.36, 1e-12},
    {UTW_IXX, 0.0172, 1e-12},
    {UTW_IYY, 0.0172, 1e-12},
    {UTW_J, 0.005194841281914, 1.4e-12},
    {UTW_IW, 8.94554075762e-05, 2.2e-11},
    {UTW_KX, 0.544986444883, 2e-12},
    {UTW_KY, 0.5449864448831, 2e-12},
};
static const known cross_nu03[] = {
    {UTW_KX, 0.5442598783271, 2.7e-12},
    {UTW_KY, 0.5442598783272, 2.7e-12},
};

static const known channel_nu0[] = {
    /* h 2, b 1, web 0.15, flanges 0.2; web from x = 0, y = 0 in the middle */
    {UTW_A, 0.64, 1e-12},
    {UTW_XC, 0.340625, 1e-12},
    {UTW_IXX, 0.37653333333333, 1e-12},
    {UTW_IYY, 0.060877083333333, 1e-12},
    {UTW_J, 0.006714648726563, 1.3e-12},
    {UTW_XS, -0.282888752224, 3.6e-12},
    {UTW_IW, 0.0356256469793, 1.9e-11},
    {UTW_KX, 0.3833860709064, 2e-12},
    {UTW_KY, 0.3809659615785, 3.4e-12},
};
static const known channel_nu03[] = {
    {UTW_KX, 0.3819253139366, 6e-12},
    {UTW_KY, 0.3809611518058, 3.2e-12},
    {UTW_XF, -0.2828258173555, 3.6e-12},
};

static const char square_tube[] =
    "\"outline\":[[0,0],[2,0],[2,2],[0,2]],\"holes\":[[[0.2,0.2],[1.8,0.2],[1.8,1.8],[0.2,1.8]]]";
static const char angle[] = "\"outline\":[[0,0],[1,0],[1,0.1],[0.1,0.1],[0.1,1],[0,1]]";
static const char tee[] =
    "\"outline\":[[-0.05,0],[0.05,0],[0.05,0.9],[0.5,0.9],[0.5,1],[-0.5,1],[-0.5,0.9],[-0.05,0.9]]";
static const char cross[] =
    "\"outline\":[[0.1,-0.1],[0.5,-0.1],[0.5,0.1],[0.1,0.1],[0.1,0.5],[-0.1,0.5],[-0.1,0.1],"
    "[-0.5,0.1],[-0.5,-0.1],[-0.1,-0.1],[-0.1,-0.5],[0.1,-0.5]]";
static const char channel[] =
    "\"outline\":[[0,-1],[1,-1],[1,-0.8],[0.15,-0.8],[0.15,0.8],[1,0.8],[1,1],[0,1]]";

static void tubes(void **state)
{
    (void)state;
    CHECK(section_outline(0, "%s", square_tube), square_tube_nu0);
    CHECK(section_outline(0.3, "%s", square_tube), square_tube_nu03);
}

static void angles(void **state)
{
    (void)state;
    CHECK(section_outline(0, "%s", angle), angle_nu0);
}

/* The shear factors of the angle turned by 45 degrees follow from those of its own axes and the
 * coupling: 1/k is (alpha_xx + alpha_yy)/2 - alpha_xy for a force along x, which is the direction
 * (1, -1) of the legs, and with + along y. */
static void coupling_of_the_shear_forces(void **state)
{
    (void)state;
    char list[512];
    static const double xy[6][2] = {{0, 0}, {1, 0}, {1, 0.1}, {0.1, 0.1}, {0.1, 1}, {0, 1}};
    size_t n = 0;
    for (int k = 0; k < 6; k++)
        n += (size_t)snprintf(list + n, sizeof list - n, "%s[%.17g,%.17g]", k > 0 ? "," : "",
                              (xy[k][0] - xy[k][1]) * sqrt(0.5), (xy[k][0] + xy[k][1]) * sqrt(0.5));
    utw_outline *o = section_outline(0, "\"outline\":[%s]", list);
    const double own = 1 / 0.4356418182226;
    const known turned[] = {{UTW_KX, 1 / (own - angle_alpha_xy), 1e-11},
                            {UTW_KY, 1 / (own + angle_alpha_xy), 1e-11}};
    assert_all_known(o, turned, 2, 0);
    utw_solution *s = section_solve(o, 1e-9, 0);
    const utw_quantity kx = section_constant(s, UTW_KX), ky = section_constant(s, UTW_KY);
    const double alpha = (1 / ky.value - 1 / kx.value) / 2;
    const double half = (1 / kx.low - 1 / kx.high + 1 / ky.low - 1 / ky.high) / 2;
    assert_close_scaled(alpha, angle_alpha_xy, 1, half + angle_alpha_xy_uncertainty);
    assert_close(alpha, angle_alpha_xy, 1e-6);
    utw_solution_free(s);
    utw_outline_free(o);
}

static void tees_and_crosses(void **state)
{
    (void)state;
    CHECK(section_outline(0, "%s", tee), tee_nu0);
    CHECK(section_outline(0, "%s", cross), cross_nu0);
    CHECK(section_outline(0.3, "%s", cross), cross_nu03);
}

static void channels(void **state)
{
    (void)state;
    CHECK(section_outline(0, "%s", channel), channel_nu0);
    CHECK(section_outline(0.3, "%s", channel), channel_nu03);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(tubes),
        balanced_test(angles),
        balanced_test(coupling_of_the_shear_forces),
        balanced_test(tees_and_crosses),
        balanced_test(channels),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
