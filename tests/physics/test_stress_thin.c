/* SPDX-License-Identifier: GPL-3.0-or-later
 * Stresses of thin sections go over into those of the thin-walled theory (Vlasov, Thin-Walled
 * Elastic Beams, 1961; docs/theory-thinwall.md), the closer the thinner the walls. */
#include "support/stressed.h"

/* A channel with unequal flanges, midlines 60 (upper), 40 (lower) and 100 (web), of thickness t. */
static stressed solid(double t)
{
    char json[500];
    snprintf(
        json, sizeof json,
        "{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 1, \"nu\": 0.3}}, \"let\": {\"h\": "
        "\"%g/2\"}, \"parts\": [{\"material\": \"m\", \"outline\": [[\"-h\",\"-h\"], [40,\"-h\"], "
        "[40,\"h\"], [\"h\",\"h\"], [\"h\",\"100-h\"], [60,\"100-h\"], [60,\"100+h\"], "
        "[\"-h\",\"100+h\"]]}]}",
        t);
    return stressed_of(json, 1e-7);
}

static utw_thin *thin(double t)
{
    utw_error err;
    utw_thin *theory = NULL;
    double nodes[4][2] = {{40, 0}, {0, 0}, {0, 100}, {60, 100}};
    utw_wall walls[3] = {{.from = 0, .to = 1, .t0 = t, .t1 = t},
                         {.from = 1, .to = 2, .t0 = t, .t1 = t},
                         {.from = 2, .to = 3, .t0 = t, .t1 = t}};
    const utw_midline midline = {4, 3, nodes, walls};
    assert_ok(utw_thin_solve(&midline, &theory, &err));
    return theory;
}

/* Greatest difference, over stations in the middle of walls, between the solid and the thin-walled
 * stresses of a load, over the greatest thin-walled stress. */
static double difference(double t, const utw_forces *f)
{
    utw_error err;
    stressed s = solid(t);
    utw_thin *theory = thin(t);
    const utw_thin_load load = {f->N, f->Vx, f->Vy, f->Mx, f->My, f->T, 0, f->B};
    double worst = 0, scale = 0;
    for (int wall = 0; wall < 3; wall++)
        for (int k = 1; k < 8; k++) {
            utw_thin_station station;
            assert_ok(utw_thin_at(theory, wall, k / 8.0, &load, &station, &err));
            const double n[2] = {-station.tangent[1], station.tangent[0]};
            for (int side = -1; side <= 1; side++) { /* right face, middle, left face */
                const double tau = side < 0   ? station.tau_right
                                   : side > 0 ? station.tau_left
                                              : station.tau;
                const double d = 0.5 * side * t * (1 - 1e-9);
                const utw_stress_point p =
                    stressed_at(&s, *f, station.x + d * n[0], station.y + d * n[1]);
                const double along = p.tau_xz * station.tangent[0] + p.tau_yz * station.tangent[1];
                scale = fmax(scale, fmax(fabs(tau), fabs(station.sigma)));
                worst = fmax(worst, fabs(along - tau));
                if (side == 0) worst = fmax(worst, fabs(p.sigma_z - station.sigma));
            }
        }
    utw_thin_free(theory);
    stressed_clear(&s);
    return worst / scale;
}

static void test_limit(void **state)
{
    (void)state;
    static const utw_forces load[] = {{.Vx = 1}, {.Vy = 1}, {.T = 1},
                                      {.Mx = 1}, {.My = 1}, {.B = 1}};
    for (int i = 0; i < 6; i++) {
        const double thick = difference(4, &load[i]), half = difference(2, &load[i]);
        assert_true(half < 0.03);
        assert_true(half < 0.7 * thick || half < 1e-3);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(test_limit)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
