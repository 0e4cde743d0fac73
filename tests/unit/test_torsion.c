/* SPDX-License-Identifier: GPL-3.0-or-later
 * Restrained torsion: end conditions, equilibrium and compatibility for every pair of ends and
 * every ratio of stiffnesses; bad bars. Closed formulas of the literature are in
 * tests/physics/test_bar_tables.c. */
#include "bar/torsion.h"

#include "base/gauss.h"
#include "support/support.h"

/* int theta1, theta2, theta3 dz between two stations on the same side of the torque, on parts that
 * shrink toward both. */
static void integrals(const utw_torsion_solution *s, double from, double to, double sum[3])
{
    double x[10], w[10];
    utw_gauss(10, x, w);
    sum[0] = sum[1] = sum[2] = 0;
    const double middle = (from + to) / 2;
    for (int side = 0; side < 2; side++) {
        double near = 0;
        const double end = side ? to : from;
        for (int i = 20; i >= 0; i--) {
            const double far = ldexp(1, -i);
            for (int g = 0; g < 10; g++) {
                utw_torsion_state at;
                const double u = near + (far - near) * x[g];
                utw_torsion_at(s, end + (middle - end) * u, &at);
                const double dz = fabs(middle - end) * (far - near) * w[g];
                sum[0] += at.theta1 * dz;
                sum[1] += at.theta2 * dz;
                sum[2] += at.theta3 * dz;
            }
            near = far;
        }
    }
}

static void close_to(double a, double b, double scale)
{
    assert_close_scaled(a, b, 2e-11, scale);
}

/* What one bar must obey. Scales: the greatest twist, bimoment and torque of the bar. */
static void check(const utw_torsion_bar *bar)
{
    utw_torsion_solution s;
    utw_error err;
    assert_ok(utw_torsion_solve(bar, &s, &err));
    const double length = bar->length, tiny = 1e-13 * length;
    double theta = 1e-290, slope = 1e-290, curve = 1e-290;
    for (int i = 0; i <= 64; i++) {
        utw_torsion_state at;
        const double z = length * i / 64;
        utw_torsion_at(&s, z, &at);
        theta = fmax(theta, fabs(at.theta));
        slope = fmax(slope, fabs(at.theta1));
        curve = fmax(curve, fabs(at.theta2));
        /* equilibrium: both shares make up the torque; the torque falls by what is applied */
        const double whole = fabs(bar->torque) + fabs(bar->per_length) * length;
        close_to(at.saint_venant + at.warping, at.torque, whole);
        close_to(at.bimoment, bar->EIw * at.theta2, 1e-300);
        close_to(at.warping, -bar->EIw * at.theta3, 1e-300);
        utw_torsion_state first;
        utw_torsion_at(&s, 0, &first);
        const double applied = bar->per_length * z + (bar->at > 0 && z > bar->at ? bar->torque : 0);
        close_to(first.torque - at.torque, applied, whole);
    }
    /* compatibility on both sides of the torque */
    const double cut[3] = {0, bar->at, length};
    for (int i = 0; i < 2; i++) {
        if (cut[i + 1] - cut[i] < tiny) continue;
        double sum[3];
        utw_torsion_state a, b;
        const double from = i == 0 ? 0 : nextafter(cut[1], length);
        utw_torsion_at(&s, from, &a);
        utw_torsion_at(&s, cut[i + 1], &b);
        integrals(&s, cut[i], cut[i + 1], sum);
        close_to(b.theta - a.theta, sum[0], theta);
        close_to(b.theta1 - a.theta1, sum[1], slope);
        close_to(b.theta2 - a.theta2, sum[2], curve);
    }
    /* the ends; a torque at an end acts on the support or on the free end itself */
    const utw_torsion_end ends[2] = {bar->start, bar->end};
    for (int i = 0; i < 2; i++) {
        utw_torsion_state at;
        utw_torsion_at(&s, i * length, &at);
        if (ends[i].twist) close_to(at.theta, 0, theta);
        if (ends[i].warping) close_to(at.theta1, 0, slope);
        if (!ends[i].warping) close_to(at.bimoment, 0, bar->EIw * curve);
        if (!ends[i].twist) {
            double applied = 0;
            if (i == 0 && bar->at == 0) applied = -bar->torque;
            if (i == 1 && bar->at == length) applied = bar->torque;
            close_to(at.torque, applied, fabs(bar->torque) + fabs(bar->per_length) * length);
        }
    }
}

static void every_pair_of_ends(void **state)
{
    (void)state;
    const double kl[] = {0, 1e-8, 1e-3, 0.3, 1, 2.385, 4.1, 9, 40, 1e3, 1e5};
    const double places[] = {0, 0.21, 0.5, 0.93, 1};
    for (int bits = 0; bits < 16; bits++) {
        const utw_torsion_end start = {bits & 1, (bits >> 1) & 1},
                              end = {(bits >> 2) & 1, (bits >> 3) & 1};
        if (!start.twist && !end.twist) continue;
        for (int i = 0; i < 11; i++) {
            if (kl[i] == 0 && !(start.twist && end.twist) && !start.warping && !end.warping)
                continue;
            for (int j = 0; j < 5; j++) {
                utw_torsion_bar bar = {.length = 2.7,
                                       .EIw = 3.1,
                                       .GJ = 3.1 * kl[i] * kl[i] / 2.7 / 2.7,
                                       .start = start,
                                       .end = end,
                                       .torque = 1.9,
                                       .at = places[j] * 2.7};
                check(&bar);
                bar.torque = 0;
                bar.per_length = -0.7;
                check(&bar);
                bar.torque = 1.1;
                check(&bar);
            }
        }
    }
}

/* Turned end for end, a bar has the same twists, and the torques and slopes of the other sign. */
static void reversed_bar(void **state)
{
    (void)state;
    for (int bits = 0; bits < 16; bits++) {
        const utw_torsion_end start = {bits & 1, (bits >> 1) & 1},
                              end = {(bits >> 2) & 1, (bits >> 3) & 1};
        if (!start.twist && !end.twist) continue;
        const utw_torsion_bar bar = {3, 1.7, 0.9, start, end, 1.3, 0.8, 0.6};
        const utw_torsion_bar back = {3, 1.7, 0.9, end, start, 1.3, 3 - 0.8, 0.6};
        utw_torsion_solution a, b;
        utw_error err;
        assert_ok(utw_torsion_solve(&bar, &a, &err));
        assert_ok(utw_torsion_solve(&back, &b, &err));
        for (int i = 0; i <= 11; i++) {
            utw_torsion_state p, q;
            utw_torsion_at(&a, 3 * i / 11.0, &p);
            utw_torsion_at(&b, 3 - 3 * i / 11.0, &q);
            assert_close_scaled(p.theta, q.theta, 1e-12, 1);
            assert_close_scaled(p.theta1, -q.theta1, 1e-12, 1);
            assert_close_scaled(p.bimoment, q.bimoment, 1e-12, 1);
            assert_close_scaled(p.torque, -q.torque, 1e-12, 1);
        }
    }
}

/* EIw = 0 and EIw -> 0 are the same bar outside layers that vanish. */
static void saint_venant_limit(void **state)
{
    (void)state;
    for (int bits = 0; bits < 16; bits++) {
        const utw_torsion_end start = {bits & 1, (bits >> 1) & 1},
                              end = {(bits >> 2) & 1, (bits >> 3) & 1};
        if (!start.twist && !end.twist) continue;
        utw_torsion_bar bar = {2.7, 1.4, 0, start, end, 1.9, 1.1, -0.7};
        utw_torsion_solution a, b;
        utw_error err;
        assert_ok(utw_torsion_solve(&bar, &a, &err));
        assert_true(a.bimoment[0] == 0 && a.bimoment[1] == 0);
        for (double iw = 1e-24; iw > 1e-290; iw *= 1e-20) {
            bar.EIw = iw;
            assert_ok(utw_torsion_solve(&bar, &b, &err));
            for (int i = 1; i < 20; i++) {
                utw_torsion_state p, q;
                utw_torsion_at(&a, 2.7 * i / 20.0, &p);
                utw_torsion_at(&b, 2.7 * i / 20.0, &q);
                assert_close_scaled(q.theta, p.theta, 1e-10, 1);
                assert_close_scaled(q.theta1, p.theta1, 1e-10, 1);
                assert_close_scaled(q.theta2, p.theta2, 1e-10, 1);
                assert_close_scaled(q.torque, p.torque, 1e-10, 1);
                assert_close_scaled(q.warping, 0.0, 1e-10, 1);
            }
        }
    }
}

static void refuse(utw_torsion_bar bar, utw_status status, const char *text)
{
    utw_torsion_solution s = {.k = 77};
    utw_error err;
    assert_int_equal(utw_torsion_solve(&bar, &s, &err), status);
    assert_string_equal(err.text, text);
    assert_true(s.k == 77);
}

static void bars_that_cannot_be(void **state)
{
    (void)state;
    const utw_torsion_bar good = {2.7, 1.4, 0.3, UTW_TORSION_FIXED, UTW_TORSION_FREE,
                                  1.9, 1.1, -0.7};
    utw_torsion_bar b = good;
    b.length = 0;
    refuse(b, UTW_E_ARGUMENT, "torsion: length 0; it must be positive");
    b = good;
    b.GJ = -1;
    refuse(b, UTW_E_ARGUMENT,
           "torsion: stiffnesses GJ = -1 and E Iw = 0.3; neither may be negative, nor both zero");
    b.GJ = b.EIw = 0;
    refuse(b, UTW_E_ARGUMENT,
           "torsion: stiffnesses GJ = 0 and E Iw = 0; neither may be negative, nor both zero");
    b = good;
    b.torque = NAN;
    refuse(b, UTW_E_ARGUMENT, "torsion: a number of the bar is not finite");
    b = good;
    b.at = 2.8;
    refuse(b, UTW_E_ARGUMENT, "torsion: the torque acts at z = 2.8, off the bar (0 to 2.7)");
    b = good;
    b.start = (utw_torsion_end){0, 1};
    refuse(b, UTW_E_LOAD, "torsion: neither end holds the bar against twist");
    b.GJ = 0;
    b.start = UTW_TORSION_FORK;
    refuse(b, UTW_E_LOAD,
           "torsion: with GJ = 0 and warping free at both ends, holding the twist at one end is "
           "not enough");
    utw_torsion_solution s;
    utw_torsion_state at;
    utw_error err;
    assert_int_equal(utw_torsion_solve(NULL, &s, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_torsion_solve(&good, NULL, NULL), UTW_E_ARGUMENT);
    assert_ok(utw_torsion_solve(&good, &s, &err));
    utw_torsion_at(&s, NAN, &at);
    assert_true(isnan(at.theta) && isnan(at.torque) && isnan(at.bimoment));
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(every_pair_of_ends),
        cmocka_unit_test(reversed_bar),
        cmocka_unit_test(saint_venant_limit),
        cmocka_unit_test(bars_that_cannot_be),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
