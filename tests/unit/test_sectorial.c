/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "thinwall/sectorial.h"

#include "support/midlines.h"

/* Channel: |omega| is e h/2 at the web's ends and (b - e) h/2 at the tips, of opposite signs along
 * a flange, e the distance of the shear centre behind the web (Vlasov 1961; Timoshenko and Gere
 * 1961). d omega/ds = -r_n fixes the sign: the upper flange runs from the web to +x, above the
 * shear centre, so r_n = -h/2 and omega grows by b h/2 along it. */
static void channel_by_hand(void **state)
{
    (void)state;
    const double h = 10.7, b = 4.2, tf = 0.51, tw = 0.32,
                 e = 3 * b * b * tf / (6 * b * tf + h * tw);
    double n[][2] = {{b, -h / 2}, {0, -h / 2}, {0, h / 2}, {b, h / 2}};
    utw_wall w[] = {WALL(0, 1, tf), WALL(1, 2, tw), WALL(2, 3, tf)};
    const utw_midline m = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&m);
    assert_close(utw_sectorial_at(thin, 2, 0), -e * h / 2, 1e-13);
    assert_close(utw_sectorial_at(thin, 2, b), (b - e) * h / 2, 1e-13);
    assert_close(utw_sectorial_at(thin, 0, 0), -(b - e) * h / 2, 1e-13);
    assert_close(utw_sectorial_at(thin, 0, b), e * h / 2, 1e-13);
    assert_close_scaled(utw_sectorial_at(thin, 1, h / 2), 0.0, 1e-13, b * h);
    /* int omega t ds over the flange: mean of its ends */
    assert_close(utw_sectorial_run(thin, 2, b), tf * b * (b - 2 * e) * h / 4, 1e-12);
    assert_true(utw_sectorial_run(thin, 2, 0) == 0);
    utw_thin_free(thin);
}

/* Around closed cells omega comes back to itself: the walls outside the spanning tree agree at both
 * ends. */
static void omega_is_single_valued(void **state)
{
    (void)state;
    const char *name;
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        utw_thin *thin = utw_thin_of(utw_midline_sample(i, &name));
        const double scale = sqrt(utw_thin_get(thin)->Iw / utw_thin_get(thin)->A);
        for (int w = 0; w < thin->graph.n_walls; w++) {
            assert_close_scaled(utw_sectorial_at(thin, w, thin->paths[w].length),
                                thin->omega[thin->graph.to[w]], 1e-12, scale);
        }
        utw_thin_free(thin);
    }
}

/* Boxes that do not warp: b tw = h tf, and any triangle of one thickness (von Wunderlich and
 * Neuber, after Kollbrunner and Basler 1969: a polygon around a circle with one thickness). */
static void sections_that_do_not_warp(void **state)
{
    (void)state;
    double n[][2] = {{0, 0}, {7.5, 0}, {7.5, 5}, {0, 5}};
    utw_wall w[] = {WALL(0, 1, 0.3), WALL(1, 2, 0.2), WALL(2, 3, 0.3), WALL(3, 0, 0.2)};
    const utw_midline box = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&box);
    assert_true(utw_thin_get(thin)->Iw == 0);
    utw_thin_free(thin);
    double p[][2] = {{0, 0}, {7.5, 1}, {2.1, 5}};
    utw_wall q[] = {WALL(0, 1, 0.2), WALL(1, 2, 0.2), WALL(2, 0, 0.2)};
    const utw_midline triangle = MIDLINE(p, q);
    thin = utw_thin_of(&triangle);
    assert_true(utw_thin_get(thin)->Iw == 0);
    /* and its shear centre is the centre of that circle: 2 A/perimeter from each side */
    const utw_thin_constants *k = utw_thin_get(thin);
    const double radius = (7.5 * 5 - 1 * 2.1) / k->length;
    assert_close(fabs(k->xs * 1 - k->ys * 7.5) / hypot(7.5, 1), radius, 1e-12);
    assert_close(fabs(k->xs * 5 - k->ys * 2.1) / hypot(2.1, 5), radius, 1e-12);
    utw_thin_free(thin);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(channel_by_hand),
        balanced_test(omega_is_single_valued),
        balanced_test(sections_that_do_not_warp),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
