/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/aerofoil_skin.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/support.h"

typedef struct fixture {
    utw_aerofoil foil;
    double (*xy)[2];
    utw_aerofoil_skin skin;
} fixture;

static void set_up(fixture *x, const char *designation, double skin)
{
    utw_error err;
    *x = (fixture){.foil = {.chord = 300, .n_skin = 1, .skin = {{0, skin}}}};
    assert_ok(utw_aerofoil_naca(designation, 0, &x->xy, &x->foil.n, &err));
    x->foil.xy = x->xy;
    assert_ok(utw_aerofoil_skin_init(&x->skin, &x->foil, &err));
}

static void tear_down(fixture *x)
{
    utw_aerofoil_skin_clear(&x->skin);
    utw_free(x->xy);
}

static void derivatives_match_differences(void **state)
{
    (void)state;
    fixture x;
    set_up(&x, "2412", 2);
    x.foil.n_skin = 3;
    memcpy(x.foil.skin, (double[3][2]){{0.1, 1.5}, {0.5, 4}, {0.9, 1}}, sizeof(double[3][2]));
    for (int extra = 0; extra < 2; extra++)
        for (double u = 1.3; u < x.skin.n; u += 7.73) {
            const utw_aerofoil_offset o = {&x.skin, extra, utw_aerofoil_segment(&x.skin, u)};
            double p[2], q[2], d[2], e[2], f[2], d2[2], unused[2];
            const double h = 1e-5;
            utw_aerofoil_inner(&o, u, p, d, d2);
            utw_aerofoil_inner(&o, u - h, p, e, unused);
            utw_aerofoil_inner(&o, u + h, q, f, unused);
            for (int k = 0; k < 2; k++) {
                assert_close_scaled((q[k] - p[k]) / (2 * h), d[k], 1e-7, 1);
                assert_close_scaled((f[k] - e[k]) / (2 * h), d2[k], 1e-6, 0.1);
            }
        }
    tear_down(&x);
}

/* Between the points the spline is as near to the formula as the documents say. */
static void the_contour_is_the_formula(void **state)
{
    (void)state;
    fixture x;
    set_up(&x, "0012", 2);
    double worst = 0;
    for (double u = 0; u <= x.skin.n; u += 0.13) {
        double p[2], d1[2], d2[2];
        utw_aerofoil_outer(&x.skin, u, p, d1, d2);
        const double s = sqrt(fmax(p[0], 0) / 300);
        if (s <
            0.1) { /* across the curve, which is steep at the nose: x = y_t^-1 is better than y_t */
            double a = 0, b = 0.3;
            for (int i = 0; i < 60; i++) {
                const double m = 0.5 * (a + b), xm = m * m;
                const double y = 0.6 * (0.2969 * m - 0.1260 * xm - 0.3516 * xm * xm +
                                        0.2843 * pow(xm, 3) - 0.1015 * pow(xm, 4));
                *(y < fabs(p[1]) / 300 ? &a : &b) = m;
            }
            worst = fmax(worst, fabs(a * a - p[0] / 300));
        } else {
            const double xm = s * s;
            const double y = 0.6 * (0.2969 * s - 0.1260 * xm - 0.3516 * xm * xm +
                                    0.2843 * pow(xm, 3) - 0.1015 * pow(xm, 4));
            worst = fmax(worst, fabs(y - fabs(p[1]) / 300));
        }
    }
    print_message("the spline is within %.2g of the chord\n", worst);
    assert_true(worst < 1e-7);
    tear_down(&x);
}

static void parameters_are_found_by_x(void **state)
{
    (void)state;
    fixture x;
    set_up(&x, "2412", 2);
    const utw_aerofoil_offset o = {&x.skin, 1, UTW_AEROFOIL_ANY};
    for (double at = 10; at < 280; at += 13.7)
        for (int side = 0; side < 2; side++) {
            double p[2], q[2], d1[2], d2[2];
            utw_aerofoil_outer(&x.skin, utw_aerofoil_outer_at(&x.skin, at, side), p, d1, d2);
            utw_aerofoil_inner(&o, utw_aerofoil_inner_at(&o, at, side), q, d1, d2);
            assert_close(p[0], at, 1e-12);
            assert_close(q[0], at, 1e-12);
            assert_true((side == 0) == (p[1] > q[1]));
            assert_true(fabs(p[1] - q[1]) > 3 && fabs(p[1] - q[1]) < 4.5);
        }
    assert_true(isnan(utw_aerofoil_outer_at(&x.skin, 400, 0)));
    assert_true(isnan(utw_aerofoil_outer_at(&x.skin, -1, 1)));
    assert_true(isnan(utw_aerofoil_inner_at(&o, 1, 0)));
    tear_down(&x);
}

/* NACA 2412: nose radius 1.1019 t^2 = 1.587 % of the chord (report 460), 4.76 mm. */
static void the_inner_side_folds_when_thicker_than_the_nose_radius(void **state)
{
    (void)state;
    fixture x;
    for (int i = 0; i < 2; i++) {
        set_up(&x, "0012", i == 0 ? 4.6 : 4.9);
        assert_int_equal(x.skin.round_nose, i == 0);
        const utw_aerofoil_offset o = {&x.skin, 0, UTW_AEROFOIL_ANY};
        assert_close_scaled(utw_aerofoil_stretch(&o, x.skin.nose), 1 - x.foil.skin[0][1] / 4.76,
                            0.004, 1);
        tear_down(&x);
    }
    set_up(&x, "0012", 2);
    double p[2], d1[2], d2[2];
    const utw_aerofoil_offset o = {&x.skin, 0, UTW_AEROFOIL_ANY};
    utw_aerofoil_inner(&o, x.skin.inner_nose, p, d1, d2);
    assert_close(p[0], 2, 1e-9);
    assert_close_scaled(p[1], 0, 1e-9, 1);
    tear_down(&x);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(derivatives_match_differences),
        balanced_test(the_contour_is_the_formula),
        balanced_test(parameters_are_found_by_x),
        balanced_test(the_inner_side_folds_when_thicker_than_the_nose_radius),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
