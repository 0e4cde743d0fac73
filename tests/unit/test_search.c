/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "section/search.h"
#include "support/stressed.h"

/* The merit of a case at a place, by the functions of the element. */
static double merit_there(const stressed *s, const utw_stress_case *c, int kind, int tri, double r,
                          double q)
{
    utw_unit_element e;
    utw_point_stress p;
    utw_unit_element_of(&s->stress->unit, tri, &e);
    utw_point_stress_of(c, &e, s->stress->samples.apart[tri], r, q, &p);
    return utw_merit(kind, p.sigma, p.tau[0] * p.tau[0] + p.tau[1] * p.tau[1]);
}

/* Along every side and inside every element: what a search returns is the merit at the place it
 * names, no sample of the region is above it, and no point of a fine row is by more than a trace.
 */
static void check_region(const stressed *s, const utw_stress_case *c, int kind, const utw_region *g)
{
    static const double corner[3][2] = {{0, 0}, {1, 0}, {0, 1}};
    const utw_search search = {s->stress, c, kind, g};
    utw_place place;
    const double merit = utw_search_region(&search, &place);
    const utw_samples *a = &s->stress->samples;
    double scale = fabs(merit);
    for (int i = g->first; i < g->first + g->n; i++) {
        double sigma, tx, ty;
        utw_scan_stresses(a, c, i, 1, &sigma, &tx, &ty);
        const double m = utw_merit(kind, sigma, tx * tx + ty * ty);
        scale = fmax(scale, fabs(m));
        assert_true(m <= merit + 1e-12 * scale);
    }
    assert_close_scaled(merit_there(s, c, kind, place.tri, place.r, place.s), merit, 1e-7, scale);
    if (g->kind != UTW_ALONG_SIDE || !g->whole) return;
    const double *from = corner[g->which], *to = corner[(g->which + 1) % 3];
    for (int i = 0; i <= 400; i++) {
        const double u = i / 400.0, r = from[0] + u * (to[0] - from[0]),
                     q = from[1] + u * (to[1] - from[1]);
        assert_true(merit_there(s, c, kind, g->tri, r, q) <= merit + 2e-5 * scale);
    }
}

static void test_regions(void **state)
{
    (void)state;
    utw_error err;
    const utw_forces f = {.N = 20, .Mx = -300, .My = 120, .Vx = 4, .Vy = 9, .T = 150};
    for (int i = 0; stressed_sample(i) != NULL; i++) {
        stressed s = stressed_of(stressed_sample(i), 1e-5);
        utw_stress_case c;
        assert_ok(utw_stress_case_of(&s.stress->unit, &f, &c, &err));
        for (int kind = 0; kind < UTW_STRESS_KIND_COUNT; kind++)
            for (int r = kind; r < s.stress->samples.n_region; r += 11)
                check_region(&s, &c, kind, &s.stress->samples.region[r]);
        stressed_clear(&s);
    }
}

/* A circle, and the sides it cuts: the place found is not inside the circle. */
static void test_circles(void **state)
{
    (void)state;
    utw_error err;
    stressed s = stressed_of(stressed_sample(4), 1e-5);
    const utw_forces f = {.Vy = 9, .T = 150};
    utw_stress_case c;
    assert_ok(utw_stress_case_of(&s.stress->unit, &f, &c, &err));
    int circles = 0, cut = 0;
    for (int r = 0; r < s.stress->samples.n_region; r++) {
        const utw_region *g = &s.stress->samples.region[r];
        const utw_search search = {s.stress, &c, UTW_VON_MISES, g};
        utw_place place;
        if (g->kept_out || (g->kind == UTW_ALONG_SIDE && g->whole)) continue;
        circles += g->kind == UTW_ON_CIRCLE;
        cut += g->kind == UTW_ALONG_SIDE;
        utw_search_region(&search, &place);
        assert_int_equal(utw_keep_out_holds(&s.stress->keep_out, place.xy), 0);
    }
    assert_int_equal(circles, 2);
    assert_true(cut >= 2);
    stressed_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_regions),
        balanced_test(test_circles),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
