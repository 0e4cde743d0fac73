/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "support/midlines.h"

/* Channel of depth h, flange b: the flow V tf h s/(2 Ixx) grows along the flanges and adds V tw
 * (h^2/4 - y^2)/(2 Ixx) in the web (q = V S/I, Jourawski 1856). */
static void channel_by_hand(void **state)
{
    (void)state;
    const double h = 10.7, b = 4.2, tf = 0.51, tw = 0.32;
    double n[][2] = {{b, -h / 2}, {0, -h / 2}, {0, h / 2}, {b, h / 2}};
    utw_wall w[] = {WALL(0, 1, tf), WALL(1, 2, tw), WALL(2, 3, tf)};
    const utw_midline m = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_load load = {.Vy = 3.3};
    const double ixx = tw * h * h * h / 12 + b * tf * h * h / 2;
    utw_error err;
    for (int i = 0; i <= 10; i++) {
        utw_thin_station at;
        const double u = i / 10.0, y = h * (u - 0.5);
        assert_ok(utw_thin_at(thin, 0, u, &load, &at, &err));
        assert_close_scaled(at.q, 3.3 * tf * h / 2 * b * u / ixx, 1e-13, 0.1);
        assert_ok(utw_thin_at(thin, 1, u, &load, &at, &err));
        assert_close(at.q, 3.3 * (tf * b * h / 2 + tw * (h * h / 4 - y * y) / 2) / ixx, 1e-13);
        assert_close(at.tau, at.q / tw, 1e-15);
        assert_ok(utw_thin_at(thin, 2, u, &load, &at, &err));
        assert_close_scaled(at.q, 3.3 * tf * h / 2 * b * (1 - u) / ixx, 1e-13, 0.1);
    }
    utw_thin_free(thin);
}

/* A thin tube under Vy: q = V sin(phi)/(pi R) from the top: V/(pi R) at the sides, twice the mean
 * (common practice). */
static void tube_by_hand(void **state)
{
    (void)state;
    const double r = 3.1;
    double n[][2] = {{0, r}};
    utw_wall w[] = {ARC(0, 0, 0.2, 0.2, 0, -r)};
    const utw_midline m = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_load load = {.Vy = 2.4};
    utw_error err;
    for (int i = 0; i <= 16; i++) {
        utw_thin_station at;
        assert_ok(utw_thin_at(thin, 0, i / 16.0, &load, &at, &err));
        /* counter-clockwise from the top is down on the left: the flow against it */
        assert_close_scaled(at.q, -2.4 / (acos(-1.0) * r) * sin(i / 16.0 * 2 * acos(-1.0)), 1e-13,
                            1);
    }
    utw_thin_free(thin);
}

/* Flow at a junction of a box and its fin, and nothing at the fin's end; the shear centre of a box
 * with equal walls and a symmetric pair of fins lies on the axis of symmetry. */
static void free_ends_carry_nothing(void **state)
{
    (void)state;
    const char *name;
    utw_error err;
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        const utw_midline *m = utw_midline_sample(i, &name);
        utw_thin *thin = utw_thin_of(m);
        const utw_thin_load load = {.Vx = 1.1, .Vy = -0.7, .T = 2.2};
        for (int w = 0; w < m->n_walls; w++) {
            int at_from = 0, at_to = 0;
            for (int j = 0; j < m->n_walls; j++) {
                at_from +=
                    (m->walls[j].from == m->walls[w].from) + (m->walls[j].to == m->walls[w].from);
                at_to += (m->walls[j].from == m->walls[w].to) + (m->walls[j].to == m->walls[w].to);
            }
            utw_thin_station at;
            if (at_from == 1) {
                assert_ok(utw_thin_at(thin, w, 0, &load, &at, &err));
                assert_close_scaled(at.q, 0.0, 1e-13, 1 / utw_thin_get(thin)->length);
            }
            if (at_to == 1) {
                assert_ok(utw_thin_at(thin, w, 1, &load, &at, &err));
                assert_close_scaled(at.q, 0.0, 1e-12, 1 / utw_thin_get(thin)->length);
            }
        }
        utw_thin_free(thin);
    }
}

/* A channel with its web to the left has the shear centre left of the web, further out than the
 * centroid is in. */
static void shear_centre_lies_behind_the_web(void **state)
{
    (void)state;
    double n[][2] = {{50, -40}, {3, -40}, {3, 40}, {50, 40}};
    utw_wall w[] = {WALL(0, 1, 6), WALL(1, 2, 4), WALL(2, 3, 6)};
    utw_midline m = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&m);
    assert_true(utw_thin_get(thin)->xs < 3 && utw_thin_get(thin)->xc > 3);
    utw_thin_free(thin);
    n[0][0] = n[3][0] = -44; /* the flanges to the left: the shear centre to the right */
    thin = utw_thin_of(&m);
    assert_true(utw_thin_get(thin)->xs > 3 && utw_thin_get(thin)->xc < 3);
    utw_thin_free(thin);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(channel_by_hand),
        balanced_test(tube_by_hand),
        balanced_test(free_ends_carry_nothing),
        balanced_test(shear_centre_lies_behind_the_web),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
