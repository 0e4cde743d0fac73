/* SPDX-License-Identifier: GPL-3.0-or-later
 * Holes, curved corners and sharp corners: where stresses peak, and where they have no bound.
 *
 * Sources. [TG] Timoshenko and Goodier, Theory of Elasticity, 3rd ed. 1970, ch. 10: a small hole in
 * a twisted shaft doubles the stress; Prandtl's stress function of a curved wall. */
#include "base/vec2.h"
#include "support/stressed.h"

static stressed solved(const char *json, double tolerance, double mesh_scale)
{
    utw_error err;
    stressed s = {utw_outline_of(json), NULL, NULL};
    utw_options options = UTW_OPTIONS_INIT;
    options.tolerance = tolerance;
    options.mesh_scale = mesh_scale;
    assert_ok(utw_solve(s.outline, &options, &s.solution, &err));
    assert_ok(utw_stress_create(s.solution, &s.stress, &err));
    return s;
}

/* [TG] A bore of radius b at the distance d from the axis of a shaft: the uniform stress d of
 * theta' = G = 1 doubles, the vortex around the bore adds b: 2 d + b, up to (b/d)^2. */
static void test_small_bore(void **state)
{
    (void)state;
    const double b = 0.06, d = 4.2;
    char json[300];
    snprintf(json, sizeof json,
             "{\"units\": \"mm N\", \"parts\": [{\"outline\": {\"circle\": [0,0,10]}, \"holes\": "
             "[{\"circle\": [%g,0,%g]}]}]}",
             d, b);
    stressed s = solved(json, 1e-9, 1);
    const double J = stressed_constant(&s, UTW_J);
    const utw_stress_peaks p = stressed_peaks(&s, (utw_forces){.T = J});
    assert_close(p.peak[UTW_TAU_MAX].value, 10, 1e-3); /* the far surface still governs */
    assert_close(stressed_at(&s, (utw_forces){.T = J}, d + b, 0).tau, 2 * d + b, 1e-3);
    assert_close(stressed_at(&s, (utw_forces){.T = J}, d - b, 0).tau, 2 * d - b, 1e-3);
    stressed_clear(&s);
}

/* The same under a transverse force on a square at nu = 0: 2 * 1.5 V/A beside a small bore in the
 * middle. */
static void test_small_bore_in_flexure(void **state)
{
    (void)state;
    stressed s =
        solved("{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 1, \"nu\": 0}}, \"parts\": "
               "[{\"material\": \"m\", \"outline\": [[-5,-5], [5,-5], [5,5], [-5,5]], "
               "\"holes\": [{\"circle\": [0,0,0.1]}]}]}",
               1e-9, 1);
    const utw_stress_peak p = stressed_peaks(&s, (utw_forces){.Vy = 100}).peak[UTW_TAU_MAX];
    assert_close(p.value, 3, 2e-3);
    assert_close(fabs(p.at[0]), 0.1, 1e-6);
    stressed_clear(&s);
}

/* A square tube with concentric round corners, radii a inside and a + t outside. Where the corner
 * does not feel its ends, phi = -r^2/2 + c ln r + const falls by K from a to a + t, so that at the
 * inner face tau = a + (K - ((a+t)^2 - a^2)/2)/(a ln(1 + t/a)) for G theta' = 1; K from the middle
 * of the straight wall, tau = K/t there. */
static void test_round_corner_of_a_tube(void **state)
{
    (void)state;
    const double t = 5;
    for (double a = 5; a < 9; a += 3) {
        char json[700];
        snprintf(
            json, sizeof json,
            "{\"units\": \"mm N\", \"let\": {\"a\": %g, \"b\": %g}, \"parts\": [{\"outline\": "
            "[{\"at\": "
            "[0,0], \"round\": \"b\"}, {\"at\": [100,0], \"round\": \"b\"}, {\"at\": [100,100], "
            "\"round\": \"b\"}, {\"at\": [0,100], \"round\": \"b\"}], \"holes\": [[{\"at\": [5,5], "
            "\"round\": \"a\"}, {\"at\": [95,5], \"round\": \"a\"}, {\"at\": [95,95], \"round\": "
            "\"a\"}, "
            "{\"at\": [5,95], \"round\": \"a\"}]]}]}",
            a, a + t);
        stressed s = solved(json, 1e-9, 1);
        const utw_forces f = {.T = stressed_constant(&s, UTW_J)};
        const double K = t * stressed_at(&s, f, 50, t / 2).tau, b = a + t,
                     expected = a + (K - (b * b - a * a) / 2) / (a * log(b / a));
        const utw_stress_peak p = stressed_peaks(&s, f).peak[UTW_TAU_MAX];
        assert_close(p.value, expected, 0.02);
        const double in = 5 + a - a / sqrt(2); /* the middle of a corner */
        assert_close(fmin(p.at[0], 100 - p.at[0]), in, 1e-2);
        assert_close(fmin(p.at[1], 100 - p.at[1]), in, 1e-2);
        assert_int_equal(p.value > K / t + t / 2, 1);
        stressed_clear(&s);
    }
}

#define ANGLE                                                                                      \
    "{\"units\": \"mm N\", \"materials\": {\"m\": {\"E\": 1, \"nu\": 0.3, \"yield\": 200}}, "      \
    "\"parts\": [{\"material\": \"m\", \"outline\": [[0,0], [100,0], [100,10], [10,10], "          \
    "[10,100], "                                                                                   \
    "[0,100]]}]}"

/* At a sharp corner under torsion: said so, the place named, and what is reported does not depend
 * on the mesh: it is the stress on the circle, the same for every tolerance within its stated
 * error. */
static void test_sharp_corner(void **state)
{
    (void)state;
    utw_error err;
    stressed s = solved(ANGLE, 1e-10, 1);
    double at[2], radius;
    assert_int_equal(utw_stress_corner_count(s.stress), 1);
    assert_ok(utw_stress_corner(s.stress, 0, at, &radius, &err));
    assert_close(at[0], 10, 1e-14);
    assert_close(at[1], 10, 1e-14);
    assert_close(radius, 1, 1e-12); /* a tenth of the wall */
    assert_int_equal(utw_stress_corner(s.stress, 1, at, &radius, &err), UTW_E_ARGUMENT);
    const utw_forces f = {.T = 1000};
    const utw_stress_peaks fine = stressed_peaks(&s, f);
    assert_int_equal(fine.unbounded, 1);
    for (int k = 0; k < UTW_STRESS_KIND_COUNT; k++) {
        const utw_stress_peak *p = &fine.peak[k];
        if (k != UTW_SIGMA_MAX && k != UTW_SIGMA_MIN)
            assert_true(hypot(p->at[0] - 10, p->at[1] - 10) > radius * (1 - 1e-9));
    }
    stressed_clear(&s);
    static const double setting[4][2] = {{1e-3, 1}, {1e-4, 1}, {1e-6, 1}, {1e-6, 0.5}};
    for (int i = 0; i < 4; i++) {
        stressed c = solved(ANGLE, setting[i][0], setting[i][1]);
        const utw_stress_peaks p = stressed_peaks(&c, f);
        for (int k = 0; k < UTW_STRESS_KIND_COUNT; k++)
            assert_true(fabs(p.peak[k].value - fine.peak[k].value) <= p.peak[k].error + 1e-12);
        assert_true(p.peak[UTW_TAU_MAX].error < 0.3 * p.peak[UTW_TAU_MAX].value);
        stressed_clear(&c);
    }
}

/* Bending and tension have a bound at a sharp corner; a point in the circle says that it is there.
 */
static void test_sharp_corner_without_shear(void **state)
{
    (void)state;
    stressed s = solved(ANGLE, 1e-6, 1);
    const utw_stress_peaks p = stressed_peaks(&s, (utw_forces){.N = 3, .Mx = 100, .My = -20});
    assert_int_equal(p.unbounded, 0);
    assert_close(p.peak[UTW_TAU_MAX].value + 1, 1, 1e-15);
    const utw_stress_point in = stressed_at(&s, (utw_forces){.T = 1}, 10.1, 9.7),
                           out = stressed_at(&s, (utw_forces){.T = 1}, 10.1, 8.9),
                           bent = stressed_at(&s, (utw_forces){.Mx = 1}, 10.1, 9.7);
    assert_int_equal(in.kept_out, 1);
    assert_int_equal(out.kept_out, 0);
    assert_int_equal(bent.kept_out, 0);
    stressed_clear(&s);
}

/* A sharp corner that gets its radius: the same section with round corners of falling radius has a
 * peak that grows as radius^(-1/3), the exponent pi/omega - 1 of the corner (Williams, J. Appl.
 * Mech. 19 (1952) 526-528), and far from the corner nothing changes. */
static void test_small_radius(void **state)
{
    (void)state;
    double last = 0;
    for (double r = 0.4; r > 0.04; r /= 2) {
        char json[300];
        snprintf(json, sizeof json,
                 "{\"units\": \"mm N\", \"parts\": [{\"outline\": [[0,0], [100,0], [100,10], "
                 "{\"at\": [10,10], "
                 "\"round\": %g}, [10,100], [0,100]]}]}",
                 r);
        stressed s = solved(json, 1e-9, 1);
        const utw_stress_peaks p = stressed_peaks(&s, (utw_forces){.T = 1000});
        assert_int_equal(p.unbounded, 0);
        const double peak = p.peak[UTW_TAU_MAX].value;
        assert_true(p.peak[UTW_TAU_MAX].error < 0.05 * peak);
        if (last > 0) assert_close(log2(peak / last), 1.0 / 3, 0.1);
        last = peak;
        stressed_clear(&s);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(test_small_bore),
        balanced_test(test_small_bore_in_flexure),
        balanced_test(test_round_corner_of_a_tube),
        balanced_test(test_sharp_corner),
        balanced_test(test_sharp_corner_without_shear),
        balanced_test(test_small_radius),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
