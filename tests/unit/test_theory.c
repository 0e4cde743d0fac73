/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "support/midlines.h"
#include "thinwall/thin.h"

static const double pi = 3.14159265358979323846;

/* A tapering bar along x by hand: t = 0.2 + 0.1 x over 4: A = 1.6, xc = int x t/A = (1.6 +
 * 32/15)/1.6 with int 0.2 x = 1.6, int 0.1 x^2 = 64/30; J = int t^3/3. */
static void taper_by_hand(void **state)
{
    (void)state;
    double n[][2] = {{0, 7}, {4, 7}};
    utw_wall w[] = {TAPER(0, 1, 0.2, 0.6)};
    const utw_midline m = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_constants *k = utw_thin_get(thin);
    const double xc = (1.6 + 64.0 / 30) / 1.6;
    assert_close(k->A, 1.6, 1e-15);
    assert_close(k->xc, xc, 1e-14);
    assert_close(k->yc, 7, 1e-15);
    assert_close(k->Iyy, 0.2 * 64 / 3 + 0.1 * 64 - 1.6 * xc * xc, 1e-13);
    assert_close(k->J_open, (pow(0.6, 4) - pow(0.2, 4)) / (12 * 0.1), 1e-14);
    assert_close(k->Wt, k->J / 0.6, 1e-14);
    utw_thin_free(thin);
}

/* A half circle closed by a flat: J = 4 A^2/(pi R/t1 + 2 R/t2) (Bredt 1896). */
static void d_section(void **state)
{
    (void)state;
    const double r = 2.385;
    double n[][2] = {{0, -r}, {0, r}};
    utw_wall w[] = {ARC(0, 1, 0.11, 0.11, r, 0), WALL(0, 1, 0.23)};
    const utw_midline m = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_constants *k = utw_thin_get(thin);
    const double area = pi * r * r / 2, f = pi * r / 0.11 + 2 * r / 0.23, q = 2 * area / f;
    assert_close(k->J_bredt, 4 * area * area / f, 1e-13);
    assert_close(k->Wt, k->J / (q / 0.11 + 0.11), 1e-13);
    assert_close(fabs(thin->bredt[0]), q, 1e-13);
    assert_true(thin->bredt[0] > 0 && thin->bredt[1] < 0); /* counter-clockwise */
    utw_thin_free(thin);
}

/* Angles of the axis of I1: upright and lying, at 30 degrees both ways, and all axes alike. */
static void principal_axes(void **state)
{
    (void)state;
    for (int deg = -85; deg <= 90; deg += 5) {
        const double a = deg * pi / 180, c = cos(a), s = sin(a);
        /* a tall I turned by a: its axis of I1 is its own x axis */
        double p[][2] = {{-2, -5}, {0, -5}, {2, -5}, {-2, 5}, {0, 5}, {2, 5}}, n[6][2];
        for (int i = 0; i < 6; i++) {
            n[i][0] = c * p[i][0] - s * p[i][1];
            n[i][1] = s * p[i][0] + c * p[i][1];
        }
        utw_wall w[] = {WALL(0, 1, 0.3), WALL(1, 2, 0.3), WALL(3, 4, 0.3), WALL(4, 5, 0.3),
                        WALL(1, 4, 0.2)};
        const utw_midline m = MIDLINE(n, w);
        utw_thin *thin = utw_thin_of(&m);
        assert_close_scaled(utw_thin_get(thin)->angle, a, 1e-13, 1);
        assert_close(utw_thin_get(thin)->I1, 2.4 * 25 + 0.2 * 1000 / 12, 1e-13);
        assert_close(utw_thin_get(thin)->I2, 0.6 * 64 / 12, 1e-13);
        assert_close_scaled(thin->i12, 0.0, 1e-13, utw_thin_get(thin)->I1);
        utw_thin_free(thin);
    }
    double n[][2] = {{0, 0}, {3, 0}, {3, 3}, {0, 3}};
    utw_wall w[] = {WALL(0, 1, 0.1), WALL(1, 2, 0.1), WALL(2, 3, 0.1), WALL(3, 0, 0.1)};
    const utw_midline m = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&m);
    assert_true(utw_thin_get(thin)->angle == 0);
    utw_thin_free(thin);
}

/* Flat sections keep their digits: an arc of rise f has I2 = A f^2 4/45 to first order (a
 * parabola's: int (y - mean)^2 = 4/45 f^2). */
static void flat_sections(void **state)
{
    (void)state;
    for (double f = 1e-2; f > 1e-7; f /= 10) {
        double n[][2] = {{0, 0}, {2 * cos(0.3), 2 * sin(0.3)}};
        utw_wall w[] = {ARC(0, 1, 0.1, 0.1, cos(0.3) - f * sin(0.3), sin(0.3) + f * cos(0.3))};
        const utw_midline m = MIDLINE(n, w);
        utw_thin *thin = utw_thin_of(&m);
        assert_close(utw_thin_get(thin)->I2, 4.0 / 45 * f * f * 0.2, 1.1 * f * f + 1e-8 * 1e-7 / f);
        assert_int_equal(utw_thin_get(thin)->straight, 0);
        assert_close(utw_thin_get(thin)->angle, 0.3 + pi / 2 - (0.3 + pi / 2 > pi / 2 ? pi : 0),
                     1e-7);
        utw_thin_free(thin);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(taper_by_hand),
        balanced_test(d_section),
        balanced_test(principal_axes),
        balanced_test(flat_sections),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
