/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "section/stress.h"
#include "support/stressed.h"

/* Regions are disjoint runs of samples; each element and each boundary side has its own; bounds
 * hold the samples; those of circles lie on them, no other outside region reaches into one. */
static void test_regions(void **state)
{
    (void)state;
    for (int i = 0; stressed_sample(i) != NULL; i++) {
        stressed s = stressed_of(stressed_sample(i), 1e-4);
        const utw_samples *a = &s.stress->samples;
        const utw_keep_out *keep = &s.stress->keep_out;
        const utw_mesh *mesh = s.solution->solved.mesh;
        int next = 0, insides = 0, wholes = 0, circles = 0, boundary = 0;
        for (int e = 0; e < mesh->n_edge; e++) boundary += mesh->edge[e].tri[1] < 0;
        for (int r = 0; r < a->n_region; r++) {
            const utw_region *g = &a->region[r];
            assert_int_equal(g->first, next);
            assert_true(g->n > 0);
            next += g->n;
            insides += g->kind == UTW_INSIDE;
            wholes += g->kind == UTW_ALONG_SIDE && g->whole;
            circles += g->kind == UTW_ON_CIRCLE;
            for (int k = g->first; k < g->first + g->n; k++) {
                const double xy[2] = {a->x[k], a->y[k]};
                assert_int_equal(utw_keep_out_holds(keep, xy), g->kept_out);
                assert_true(a->x[k] >= g->low[0] && a->x[k] <= g->high[0]);
                assert_true(a->omega[k] >= g->low[2] && a->omega[k] <= g->high[2]);
                for (int f = 0; f < UTW_N_UNIT; f++)
                    assert_true(hypot(a->tau[f][0][k], a->tau[f][1][k]) <= g->most[f]);
                if (g->kind != UTW_ON_CIRCLE) continue;
                const double *c = keep->centre[g->which];
                assert_close(hypot(xy[0] - c[0], xy[1] - c[1]), keep->radius[g->which], 1e-9);
            }
        }
        assert_int_equal(next, a->n);
        assert_int_equal(circles, keep->n);
        if (keep->n == 0) {
            assert_int_equal(insides, mesh->n_tri);
            assert_int_equal(wholes, boundary);
        } else {
            assert_true(insides >= mesh->n_tri && wholes < boundary);
        }
        stressed_clear(&s);
    }
}

/* A sample holds the fields at its own place in its element. */
static void test_values(void **state)
{
    (void)state;
    stressed s = stressed_of(stressed_sample(4), 1e-4);
    const utw_samples *a = &s.stress->samples;
    for (int k = 0; k < a->n; k += 13) {
        utw_unit_element e;
        utw_unit_point p;
        utw_unit_element_of(&s.stress->unit, a->tri[k], &e);
        utw_unit_point_at(&e, a->at[k][0], a->at[k][1], &p);
        assert_close_scaled(a->x[k], p.xy[0], 1e-13, 1);
        assert_close_scaled(a->y[k], p.xy[1], 1e-13, 1);
        assert_close_scaled(a->omega[k], p.omega, 1e-12, 1);
        for (int f = 0; f < UTW_N_UNIT; f++)
            assert_close_scaled(a->tau[f][1][k],
                                0.5 * (p.tau[UTW_BY_POTENTIAL][f][1] + p.tau[UTW_BY_FLUX][f][1]),
                                1e-10, 1);
    }
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_regions),
        balanced_test(test_values),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
