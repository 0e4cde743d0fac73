/* SPDX-License-Identifier: GPL-3.0-or-later
 * Rounds of solutions (section/adapt.c) and the greatest stress found in the last (peak.c). */
#include "section/adapt.h"

#include "base/vec2.h"
#include "section/peak.h"
#include "support/meshing.h"
#include "support/section.h"

/* In place: the field points into it. */
static void adapt(const char *outline, const utw_options *options, utw_solved *s)
{
    utw_error err;
    *s = (utw_solved){NULL};
    utw_outline *o = section_outline(UTW_NAN, "%s", outline);
    utw_net *net = net_of(o);
    utw_outline_free(o);
    assert_ok(utw_adapt(net, NULL, options, 0, s, &err)); /* takes the net */
}

/* About the centroid, of the size the solver is given: an L of 2 x 2, 0.4 thick. Its centroid: two
 * legs, areas 0.8 and 0.64 (elementary). */
static const char l_section[] = "\"outline\":[[-0.6444444444444445,-0.6444444444444445],"
                                "[1.3555555555555556,-0.6444444444444445],"
                                "[1.3555555555555556,-0.2444444444444445],"
                                "[-0.2444444444444445,-0.2444444444444445],"
                                "[-0.2444444444444445,1.3555555555555556],"
                                "[-0.6444444444444445,1.3555555555555556]]";

static void the_tolerance_is_reached(void **state)
{
    (void)state;
    utw_options options = UTW_OPTIONS_INIT;
    double low = 0, high = 1e9;
    for (double tolerance = 1e-2; tolerance > 1e-9; tolerance *= 1e-2) {
        options.tolerance = tolerance;
        utw_solved s;
        adapt(l_section, &options, &s);
        assert_true(s.reached && s.gap <= tolerance && s.rounds >= 1);
        const double top = s.now.stress[UTW_TORSION][UTW_TORSION],
                     bottom = top - s.now.gap[UTW_TORSION][UTW_TORSION];
        assert_true(bottom <= high && low <= top); /* the brackets overlap */
        low = fmax(low, bottom);
        high = fmin(high, top);
        assert_close(s.now.area, 1.44, 1e-12);
        for (int t = 0; t < s.mesh->n_tri; t++)
            assert_true(s.field->order[t] >= 1 && s.field->order[t] <= UTW_ORDER_MAX &&
                        s.peak[t] > 0);
        utw_solved_clear(&s);
    }
    assert_true(high - low < 1e-8 * high);
}

static void a_fixed_order_is_kept(void **state)
{
    (void)state;
    utw_options options = UTW_OPTIONS_INIT;
    double gap = 1e9;
    for (int order = 2; order <= 8; order += 3) {
        options.fixed_order = order;
        utw_solved s;
        adapt(l_section, &options, &s);
        assert_int_equal(s.rounds, 1);
        for (int t = 0; t < s.mesh->n_tri; t++) assert_int_equal(s.field->order[t], order);
        assert_true(s.gap < gap && s.reached == (s.gap <= options.tolerance));
        gap = s.gap;
        utw_solved_clear(&s);
    }
}

static int told, last_unknowns;

static void tell(void *user, int round, int unknowns, double gap)
{
    assert_true(round == ++told && unknowns >= last_unknowns && gap >= 0 && user == &told);
    last_unknowns = unknowns;
}

static void every_round_is_told(void **state)
{
    (void)state;
    utw_options options = UTW_OPTIONS_INIT;
    options.tolerance = 1e-9;
    options.progress = tell;
    options.user = &told;
    utw_solved s;
    adapt(l_section, &options, &s);
    assert_int_equal(told, s.rounds);
    assert_true(told > 1);
    utw_solved_clear(&s);
}

/* theta' = 1, G = 1. An ellipse a > b: 2 a^2 b/(a^2 + b^2) at the ends of the shorter axis; a ring:
 * its outer radius (Timoshenko and Goodier, secs. 104, 107). */
static void the_greatest_stress_is_found(void **state)
{
    (void)state;
    utw_options options = UTW_OPTIONS_INIT;
    options.tolerance = 1e-8;
    utw_solved s;
    adapt("\"outline\":{\"ellipse\":[0,0,1.5,0.6,0]}", &options, &s);
    utw_peak p = utw_torsion_peak(&s);
    assert_close(p.value, 2 * 2.25 * 0.6 / (2.25 + 0.36), 1e-6);
    assert_true(p.error >= 0 && p.error < 1e-4);
    assert_close_scaled(p.at[0], 0, 1e-2, 1);
    assert_close(fabs(p.at[1]), 0.6, 1e-3);
    utw_solved_clear(&s);
    adapt("\"outline\":{\"circle\":[0,0,1.2]},\"holes\":[{\"circle\":[0,0,0.9]}]", &options, &s);
    p = utw_torsion_peak(&s);
    assert_close(p.value, 1.2, 1e-6);
    assert_close(hypot(p.at[0], p.at[1]), 1.2, 1e-9);
    utw_solved_clear(&s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(the_tolerance_is_reached),
        balanced_test(a_fixed_order_is_kept),
        balanced_test(every_round_is_told),
        balanced_test(the_greatest_stress_is_found),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
