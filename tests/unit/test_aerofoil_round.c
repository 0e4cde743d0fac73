/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/aerofoil_round.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "outline/outline.h"
#include "support/figure.h"
#include "support/support.h"

/* A closed chain of lines through n points. */
static utw_fit polygon(int n, const double (*xy)[2])
{
    utw_error err;
    utw_fit fit = {.n = 0};
    for (int k = 0; k < n; k++)
        assert_ok(utw_fit_append(&fit, utw_curve_line(xy[k], xy[(k + 1) % n]), &err));
    return fit;
}

static double area(const utw_fit *fit)
{
    const utw_loop loop = {.curve = fit->curve, .n = (int)fit->n};
    return utw_loop_area(&loop);
}

static void check_closed(const utw_fit *fit)
{
    for (size_t k = 0; k < fit->n; k++) {
        const utw_curve *next = &fit->curve[(k + 1) % fit->n];
        assert_true(fit->curve[k].to[0] == next->from[0] && fit->curve[k].to[1] == next->from[1]);
    }
}

/* A bay with a cap on its left: the corners of the bay are rounded, the one of the cap that sticks
 * out is not. Each of five right angles loses (1 - pi/4) r^2 (elementary). */
static void corners_of_the_bay_are_rounded(void **state)
{
    (void)state;
    static const double bay[6][2] = {{0, 0},      {40.3, 0},   {40.3, 21.7},
                                     {7.1, 21.7}, {7.1, 16.2}, {0, 16.2}};
    for (int start = 0; start < 6; start++) { /* wherever the chain begins */
        utw_error err;
        double xy[6][2];
        for (int k = 0; k < 6; k++) memcpy(xy[k], bay[(start + k) % 6], sizeof xy[k]);
        utw_fit fit = polygon(6, (const double(*)[2])xy);
        const double before = area(&fit), r = 2.385;
        assert_ok(utw_aerofoil_round(&fit, r, &err));
        assert_int_equal(fit.n, 11);
        check_closed(&fit);
        assert_close(area(&fit), before - 5 * (1 - UTW_PI / 4) * r * r, 1e-13);
        utw_free(fit.curve);
    }
}

/* A wedge with a bend of two degrees in its upper side, which is no corner. The corner between two
 * lines at an angle a loses r^2 (cot(a/2) - (pi - a)/2) (elementary). */
static void bends_are_left_alone(void **state)
{
    (void)state;
    utw_error err;
    const double d = 2 * UTW_PI / 180, a = 0.3;
    /* from the tip along the lower side, a face, back in two lines at a and a + d */
    const double top = 50 * tan(a) + 50 * tan(a - d);
    const double xy[4][2] = {{0, 0}, {100, 0}, {100, top}, {50, 50 * tan(a)}};
    utw_fit fit = polygon(4, xy);
    const double before = area(&fit), r = 3.1, upper = UTW_PI / 2 - a + d;
    assert_ok(utw_aerofoil_round(&fit, r, &err));
    check_closed(&fit);
    assert_int_equal(fit.n, 7); /* three arcs, four lines */
    const double angle[3] = {a, UTW_PI / 2, upper};
    double lost = 0;
    for (int k = 0; k < 3; k++) lost += r * r * (1 / tan(angle[k] / 2) - (UTW_PI - angle[k]) / 2);
    assert_close(area(&fit), before - lost, 1e-12);
    utw_free(fit.curve);
}

/* One corner only: a drop, its round end an arc tangent to both straight sides. */
static void one_corner_is_rounded(void **state)
{
    (void)state;
    utw_error err;
    const double R = 10, a = 0.4, c[2] = {0, 0}, x = R / sin(a); /* tip at x, half angle a */
    const double p[2] = {R * sin(a), R * cos(a)}, q[2] = {R * sin(a), -R * cos(a)}, tip[2] = {x, 0};
    utw_fit fit = {.n = 0};
    assert_ok(utw_fit_append(&fit, utw_curve_line(tip, p), &err));
    assert_ok(
        utw_fit_append(&fit, utw_curve_arc(c, R, UTW_PI / 2 - a, 3 * UTW_PI / 2 + a, p, q), &err));
    assert_ok(utw_fit_append(&fit, utw_curve_line(q, tip), &err));
    const double before = area(&fit), r = 1.7;
    assert_ok(utw_aerofoil_round(&fit, r, &err));
    assert_int_equal(fit.n, 4);
    check_closed(&fit);
    assert_close(area(&fit), before - r * r * (1 / tan(a) - (UTW_PI / 2 - a)), 1e-12);
    utw_free(fit.curve);
    /* no corner at all */
    fit = (utw_fit){.n = 0};
    const double e[2] = {R, 0};
    assert_ok(utw_fit_append(&fit, utw_curve_arc(c, R, 0, 2 * UTW_PI, e, e), &err));
    assert_ok(utw_aerofoil_round(&fit, r, &err));
    assert_int_equal(fit.n, 1);
    utw_free(fit.curve);
}

static void radii_up_to_the_greatest_fit(void **state)
{
    (void)state;
    static const double box[4][2] = {{3, 5}, {33, 5}, {33, 17}, {3, 17}};
    utw_error err;
    utw_fit fit = polygon(4, box);
    assert_ok(utw_aerofoil_round(&fit, 6, &err)); /* half the height: two half circles */
    check_closed(&fit);
    assert_int_equal(fit.n, 6);
    assert_close(area(&fit), 18 * 12 + UTW_PI * 36, 1e-13);
    utw_free(fit.curve);
    fit = polygon(4, box);
    utw_curve *curve = fit.curve;
    assert_int_equal(utw_aerofoil_round(&fit, 6.01, &err), UTW_E_OUTLINE);
    assert_string_equal(err.text,
                        "aerofoil: r = 6.01 does not fit in the corner at (33, 17), before the "
                        "section is placed; the greatest that fits in this bay is 6");
    assert_true(fit.curve == curve && fit.n == 4); /* untouched */
    assert_int_equal(utw_aerofoil_round(&fit, 12.5, &err), UTW_E_OUTLINE);
    assert_string_equal(err.text,
                        "aerofoil: r = 12.5 does not fit in the corner at (3, 5), before the "
                        "section is placed; the greatest that fits in this bay is 6");
    utw_free(fit.curve);
}

static void a_refused_allocation_leaves_nothing_behind(void **state)
{
    (void)state;
    static const double box[4][2] = {{3, 5}, {33, 5}, {33, 17}, {3, 17}};
    utw_error err;
    utw_fit fit = polygon(4, box);
    utw_status st = UTW_E_NOMEM;
    long n = 0;
    while (st == UTW_E_NOMEM) {
        utw_memory_fail_at(++n);
        st = utw_aerofoil_round(&fit, 2, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_int_equal(fit.n, 4);
    }
    assert_int_equal(st, UTW_OK);
    assert_true(n > 4);
    utw_free(fit.curve);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(corners_of_the_bay_are_rounded),
        balanced_test(bends_are_left_alone),
        balanced_test(one_corner_is_rounded),
        balanced_test(radii_up_to_the_greatest_fit),
        balanced_test(a_refused_allocation_leaves_nothing_behind),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
