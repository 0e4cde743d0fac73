/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/fit.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/support.h"

/* A spiral r = 2 + s/3 at the angle s; a sine wave, with inflections; an angle, which is not
 * smooth. */
static void spiral(const void *context, double s, double p[2], double d1[2], double d2[2])
{
    const double scale = *(const double *)context, r = scale * (2 + s / 3), dr = scale / 3,
                 c = cos(s), n = sin(s);
    p[0] = r * c, p[1] = r * n;
    d1[0] = dr * c - r * n, d1[1] = dr * n + r * c;
    d2[0] = -2 * dr * n - r * c, d2[1] = 2 * dr * c - r * n;
}

static void wave(const void *context, double s, double p[2], double d1[2], double d2[2])
{
    (void)context;
    p[0] = s, p[1] = sin(s);
    d1[0] = 1, d1[1] = cos(s);
    d2[0] = 0, d2[1] = -sin(s);
}

static void angle(const void *context, double s, double p[2], double d1[2], double d2[2])
{
    (void)context;
    p[0] = s, p[1] = s < 0.3 ? 0 : s - 0.3;
    d1[0] = 1, d1[1] = s < 0.3 ? 0 : 1;
    d2[0] = d2[1] = 0;
}

static utw_fit fitted(utw_fit_curve f, const double *scale, double s0, double s1, double tolerance)
{
    utw_error err;
    utw_fit fit = {.n = 0};
    double from[2], to[2], d1[2], d2[2];
    f(scale, s0, from, d1, d2);
    f(scale, s1, to, d1, d2);
    assert_ok(utw_fit_cubics(f, scale, s0, s1, from, to, tolerance, &fit, &err));
    assert_memory_equal(fit.curve[0].from, from, sizeof from);
    assert_memory_equal(fit.curve[fit.n - 1].to, to, sizeof to);
    for (size_t k = 0; k + 1 < fit.n; k++)
        assert_memory_equal(fit.curve[k].to, fit.curve[k + 1].from, sizeof to);
    return fit;
}

/* Greatest distance of the spiral's cubics from it, along the radius, on points of our own. */
static double spiral_error(const utw_fit *fit)
{
    double worst = 0;
    for (size_t k = 0; k < fit->n; k++)
        for (int i = 0; i <= 50; i++) {
            double p[2];
            utw_curve_point(&fit->curve[k], i / 50.0, p);
            double a = atan2(p[1], p[0]);
            while (utw_norm(p) - (2 + a / 3) > 1) a += 2 * UTW_PI;
            worst = fmax(worst, fabs(utw_norm(p) - (2 + a / 3)));
        }
    return worst;
}

static void cubics_stay_within_the_tolerance(void **state)
{
    (void)state;
    const double one = 1;
    size_t n[2];
    for (int i = 0; i < 2; i++) {
        const double tolerance = i == 0 ? 1e-6 : 1e-9;
        utw_fit fit = fitted(spiral, &one, 0.2, 8.3, tolerance);
        assert_true(spiral_error(&fit) <= tolerance);
        n[i] = fit.n;
        utw_free(fit.curve);
    }
    /* sixth order: a thousandth of the error for 3.2 times the pieces, 4 by halving */
    assert_true(n[1] <= 6 * n[0] && n[1] > n[0]);
    assert_true(n[0] <= 32 && n[1] <= 128);
}

static void backward_is_the_same_curve(void **state)
{
    (void)state;
    const double one = 1;
    utw_fit fit = fitted(spiral, &one, 3.1, 0.4, 1e-8);
    assert_true(spiral_error(&fit) <= 1e-8);
    double d[2];
    utw_curve_d1(&fit.curve[0], 0, d);
    assert_true(utw_cross(fit.curve[0].from, d) < 0); /* clockwise */
    utw_free(fit.curve);
}

static void inflections_and_scales_do_not_matter(void **state)
{
    (void)state;
    utw_fit fit = fitted(wave, NULL, -3, 9, 1e-8);
    for (size_t k = 0; k < fit.n; k++)
        for (double t = 0; t <= 1; t += 0.01) {
            double p[2];
            utw_curve_point(&fit.curve[k], t, p);
            assert_true(fabs(p[1] - sin(p[0])) <= 1e-8 * 1.5 /* along y, not across */);
        }
    utw_free(fit.curve);
    static const double scale[] = {1e-6, 1e6};
    size_t n[2];
    for (int i = 0; i < 2; i++) {
        fit = fitted(spiral, &scale[i], 0.2, 8.3, 1e-8 * scale[i]);
        n[i] = fit.n;
        utw_free(fit.curve);
    }
    assert_int_equal(n[0], n[1]);
}

static void a_corner_is_refused(void **state)
{
    (void)state;
    utw_error err;
    utw_fit fit = {.n = 0};
    const double from[2] = {0, 0}, to[2] = {1, 0.7};
    assert_int_equal(utw_fit_cubics(angle, NULL, 0, 1, from, to, 1e-9, &fit, &err), UTW_E_OUTLINE);
    assert_string_equal(err.text,
                        "a curve cannot be followed near (0.299999, 0): it is not smooth there");
    utw_free(fit.curve);
}

static void a_refused_allocation_is_reported(void **state)
{
    (void)state;
    utw_error err;
    utw_fit fit = {.n = 0};
    const double from[2] = {0, 0}, to[2] = {9, sin(9)};
    utw_memory_fail_at(1);
    assert_int_equal(utw_fit_cubics(wave, NULL, 0, 9, from, to, 1e-6, &fit, &err), UTW_E_NOMEM);
    utw_memory_fail_at(0);
    utw_free(fit.curve);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(cubics_stay_within_the_tolerance),
        balanced_test(backward_is_the_same_curve),
        balanced_test(inflections_and_scales_do_not_matter),
        balanced_test(a_corner_is_refused),
        balanced_test(a_refused_allocation_is_reported),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
