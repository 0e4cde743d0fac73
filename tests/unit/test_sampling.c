/* SPDX-License-Identifier: GPL-3.0-or-later
 * Samplings cover the section without gaps or folds, whatever the sizes of the elements. */
#include "draw/sampling.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "draw/values.h"
#include "section/solution.h"
#include "support/section.h"

static const char *const part[] = {
    "\"outline\": [[0,0],[100,0],[100,20],{\"at\":[20,20],\"round\":10},[20,100],[0,100]], "
    "\"holes\": [{\"circle\": [10,10,4]}]",
    "\"outline\": [[0,0],[100,0],[100,20],[20,20],[20,100],[0,100]]", /* corner layers */
    "\"outline\": {\"circle\": [3,4,50]}, \"holes\": [{\"circle\": [3,4,46]}]",
    "\"outline\": {\"ellipse\": [0,0,60,20,15]}",
};
enum { N_PART = sizeof part / sizeof *part };

static utw_sampling sampling_of(const utw_solution *s, double spacing, double sagitta)
{
    utw_error err;
    utw_sampling sampling;
    const utw_fineness f = {spacing / s->unit, sagitta / s->unit};
    assert_ok(utw_sampling_init(&sampling, s->solved.mesh, &f, &err));
    return sampling;
}

static double area_of(const utw_sampling *s, double unit)
{
    double area = 0;
    for (int t = 0; t < s->n_tri; t++) {
        const double twice =
            utw_turn(s->xy[s->tri[t][0]], s->xy[s->tri[t][1]], s->xy[s->tri[t][2]]);
        assert_true(twice > 0);
        area += 0.5 * twice;
    }
    return area * unit * unit;
}

/* Inner edges have two triangles, and boundaries close: n_tri = 2 n_vertex - n_rim - 2 + 2 holes
 * (Euler). */
static void check_topology(const utw_sampling *s, int holes)
{
    assert_int_equal(s->n_tri, 2 * s->n_vertex - s->n_rim - 2 + 2 * holes);
    assert_int_equal(s->n_edge, s->n_vertex + s->n_tri - 1 + holes);
    for (int r = 0; r < s->n_rim; r++) {
        assert_int_equal(s->rim[s->rim_next[r]][0], s->rim[r][1]);
        assert_int_equal(s->rim_of_edge[s->rim_edge[r]], r);
    }
}

static void triangles_fit_together(void **state)
{
    (void)state;
    static const int holes[N_PART] = {1, 0, 1, 0};
    static const double spacing[] = {0.7, 2.385, 9, 400};
    for (int i = 0; i < N_PART; i++) {
        utw_outline *outline = section_outline((double)NAN, "%s", part[i]);
        utw_solution *s = section_solve(outline, 1e-5, 0);
        for (size_t k = 0; k < sizeof spacing / sizeof *spacing; k++) {
            utw_sampling f = sampling_of(s, spacing[k], 0.002);
            check_topology(&f, holes[i]);
            assert_close(area_of(&f, s->unit), s->area.A, 2e-4);
            utw_sampling_clear(&f);
        }
        utw_solution_free(s);
        utw_outline_free(outline);
    }
}

/* Sides are as short as asked, and chords as close to arcs. */
static void it_is_as_fine_as_asked(void **state)
{
    (void)state;
    utw_outline *outline = section_outline((double)NAN, "%s", part[2]);
    utw_solution *s = section_solve(outline, 1e-4, 0);
    utw_sampling f = sampling_of(s, 1.5, 0.01);
    for (int r = 0; r < f.n_rim; r++) {
        const double *a = f.xy[f.rim[r][0]], *b = f.xy[f.rim[r][1]];
        const double middle[2] = {0.5 * (a[0] + b[0]), 0.5 * (a[1] + b[1])};
        const double radius = s->unit * utw_norm(middle);
        assert_true(s->unit * utw_distance(a, b) < 1.5 * 1.25);
        assert_true(fabs(radius - 50) < 0.011 || fabs(radius - 46) < 0.011);
    }
    utw_sampling_clear(&f);
    utw_solution_free(s);
    utw_outline_free(outline);
}

/* omega of an ellipse with semi-axes a, b: -(a^2 - b^2)/(a^2 + b^2) x y in its own axes
 * (Saint-Venant 1855; Timoshenko and Goodier, Theory of Elasticity, ch. 10), and the shear of a
 * torque T: tau = 2 T/(pi a b) (-y/b^2, x/a^2). */
static void values_are_those_of_the_ellipse(void **state)
{
    (void)state;
    const double a = 60, b = 20, c = cos(UTW_PI / 12), q = sin(UTW_PI / 12);
    utw_error err;
    utw_outline *outline = section_outline(0.3, "%s", part[3]);
    utw_solution *s = section_solve(outline, 1e-9, 0);
    utw_sampling f = sampling_of(s, 4, 0.02);
    utw_unit_stress unit;
    utw_values v;
    utw_unit_stress_of(s, &unit);
    assert_ok(utw_values_init(&v, &f, &unit, 1, &err));
    for (int i = 0; i < f.n_vertex; i++) {
        const double X = s->unit * f.xy[i][0], Y = s->unit * f.xy[i][1];
        const double x = c * X + q * Y, y = -q * X + c * Y;
        assert_close_scaled(v.omega[i] * s->unit * s->unit,
                            -(a * a - b * b) / (a * a + b * b) * x * y, 1e-4, 1200);
        /* tau of the unit torque is in 1/unit^3 of the net */
        const double tx = -2 * y / (UTW_PI * a * b * b * b), ty = 2 * x / (UTW_PI * a * a * a * b);
        const double scale = 1 / (s->unit * s->unit * s->unit), size = 2 / (UTW_PI * a * b * b);
        assert_close_scaled(v.tau[i][UTW_UNIT_T][0] * scale, c * tx - q * ty, 1e-3, size);
        assert_close_scaled(v.tau[i][UTW_UNIT_T][1] * scale, q * tx + c * ty, 1e-3, size);
    }
    utw_values_clear(&v);
    utw_sampling_clear(&f);
    utw_solution_free(s);
    utw_outline_free(outline);
}

static void no_memory_is_told(void **state)
{
    (void)state;
    utw_outline *outline = section_outline((double)NAN, "%s", part[0]);
    utw_solution *s = section_solve(outline, 1e-3, 0);
    utw_unit_stress unit;
    utw_unit_stress_of(s, &unit);
    utw_status st = UTW_E_NOMEM;
    for (long n = 1; st == UTW_E_NOMEM; n++) {
        utw_error err;
        utw_sampling f = {0};
        utw_values v = {0};
        const utw_fineness fineness = {20 / s->unit, 1 / s->unit};
        utw_memory_fail_at(n);
        st = utw_sampling_init(&f, s->solved.mesh, &fineness, &err);
        if (st == UTW_OK) st = utw_values_init(&v, &f, &unit, 1, &err);
        utw_memory_fail_at(0);
        utw_values_clear(&v);
        utw_sampling_clear(&f);
        assert_true(n < 1000);
    }
    assert_int_equal(st, UTW_OK);
    utw_solution_free(s);
    utw_outline_free(outline);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(triangles_fit_together),
        balanced_test(it_is_as_fine_as_asked),
        balanced_test(values_are_those_of_the_ellipse),
        balanced_test(no_memory_is_told),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
