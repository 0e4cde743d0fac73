/* SPDX-License-Identifier: GPL-3.0-or-later
 * Half disc, sectors of circles and of rings, against closed forms and series.
 *
 * Sources. [TG] Timoshenko and Goodier, Theory of Elasticity, 3rd ed. 1970, ch. 10 (sectors), after
 * Saint-Venant; ch. 11 (semicircle). [T] Trefftz, Zeitschrift fuer angewandte Mathematik und
 * Mechanik 15 (1935) 220-225: the shear centre. [Go] Goodier, Journal of the Aeronautical Sciences
 * 11 (1944): no mean twist. Fixed values were evaluated to 16 digits independently of this program;
 * certified: computed by another high-order program with two-sided bounds.
 *
 * The series. With l = m pi/alpha, m odd, and 1 = sum c_m cos(l theta), c_m = 4 s/(m pi), s = sin(m
 * pi/2), over the opening alpha: phi = sum 2 c_m (r^2 + a r^l + b r^-l)/(l^2 - 4) cos(l theta),
 * zero on both arcs (b = 0 without the inner one), and omega = sum c_m (-l r^2 - 2 a r^l + 2 b
 * r^-l)/(l^2 - 4) sin(l theta) about the apex. */
#include "base/vec2.h"
#include "support/section.h"

#define COUNT(list) (sizeof(list) / sizeof((list)[0]))

/* ---- fixed values
 * -------------------------------------------------------------------------------- */

static const known half_disc_nu0[] = {
    /* radius 1, flat side on x = 0 */
    {UTW_A, 1.570796326794897, 1e-15},     {UTW_XC, 0.4244131815783876, 1e-15},
    {UTW_IXX, 0.3926990816987242, 1e-15},  {UTW_IYY, 0.1097569606464658, 1e-15},
    {UTW_J, 0.2975567820597339, 1e-15},    /* closed form: (pi/2 - 4/pi) r^4, [TG] summed */
    {TAU_MAX, 2.85265339032459, 1e-15},    /* closed form: [TG], middle of the flat side */
    {UTW_XS, 0.5092958178940651, 1e-15},   /* closed form: 8 r/(5 pi), [T] */
    {UTW_IW, 0.005920034993750383, 1e-15}, /* series */
    {UTW_KX, 0.7661457974975, 2e-12},      /* certified */
    {UTW_KY, 0.8571428571429, 2e-12},      /* certified */
};
static const known half_disc_nu03[] = {
    {UTW_XF, 0.5113661972901041, 1e-15}, /* closed form: [Go], [TG] */
    {UTW_KX, 0.7332452909652, 2e-12},    /* certified */
    {UTW_KY, 0.8565749267976, 2e-12},    /* certified */
};
static const known sector_60[] = {
    /* radius 1, nu = 0.3 */
    {UTW_A, 0.5235987755982989, 1e-15},     {UTW_XC, 0.6366197723675813, 1e-15},
    {UTW_IXX, 0.02264651842651989, 1e-15},  {UTW_IYY, 0.02694627858343577, 1e-15},
    {UTW_J, 0.03490920609464229, 1e-15},                                         /* series: [TG] */
    {UTW_XS, 0.6594674064851149, 1e-15},                                         /* series: [T] */
    {UTW_IW, 6.107482953111997e-05, 1e-15}, {UTW_XF, 0.6617465465730769, 1e-15}, /* series: [Go] */
};
static const known sector_90[] = {
    {UTW_A, 0.7853981633974483, 1e-15},     {UTW_XC, 0.6002108774380707, 1e-15},
    {UTW_IXX, 0.07134954084936208, 1e-15},  {UTW_IYY, 0.0384074197971037, 1e-15},
    {UTW_J, 0.08232757529299568, 1e-15},    {UTW_XS, 0.5976385781673637, 1e-15},
    {UTW_IW, 0.0002195140720527858, 1e-15}, {UTW_XF, 0.5976920349021269, 1e-15},
};
static const known half_ring[] = {
    /* radii 0.5 and 1 */
    {UTW_A, 1.178097245096172, 1e-15},    {UTW_XC, 0.4951487118414522, 1e-15},
    {UTW_IXX, 0.3681553890925539, 1e-15}, {UTW_IYY, 0.07931864051837346, 1e-15},
    {UTW_J, 0.08545338121367872, 1e-15}, /* series: [TG], after Saint-Venant 1878 */
    {UTW_XS, 0.8658028904199107, 1e-15},  {UTW_IW, 0.01212037989704674, 1e-15},
};

static void check(double nu, double degrees, double inner, double outer, const known *list,
                  size_t n)
{
    utw_outline *o = section_sector(nu, degrees, inner, outer);
    assert_all_known(o, list, n, outer);
    utw_outline_free(o);
}

static void fixed_values(void **state)
{
    (void)state;
    check(0, 180, 0, 1, half_disc_nu0, COUNT(half_disc_nu0));
    check(0.3, 180, 0, 1, half_disc_nu03, COUNT(half_disc_nu03));
    check(0.3, 60, 0, 1, sector_60, COUNT(sector_60));
    check(0.3, 90, 0, 1, sector_90, COUNT(sector_90));
    check(UTW_NAN, 180, 0.5, 1, half_ring, COUNT(half_ring));
}

/* ---- the series
 * ---------------------------------------------------------------------------------- */

/* int over the section: 2 phi = J, phi x, omega y, omega^2. */
typedef struct sums {
    double J, phi_x, omega_y, omega2;
} sums;

/* int sin(l t) sin(t) and int cos(l t) cos(t) over the opening, with l alpha/2 = m pi/2. */
static double sines(double l, double alpha, double s)
{
    if (fabs(l - 1) < 1e-12) return (alpha - sin(alpha)) / 2;
    return 2 * s * cos(alpha / 2) / (l * l - 1);
}

static double cosines(double l, double alpha, double s)
{
    if (fabs(l - 1) < 1e-12) return (alpha + sin(alpha)) / 2;
    return 2 * l * s * cos(alpha / 2) / (l * l - 1);
}

/* Without inner arc the factors 1/(l - 2) cancel, and the series hold for every opening. Terms fall
 * like m^-4. */
static sums sector(double alpha, double r)
{
    sums sum = {0};
    for (int m = 200001; m > 0; m -= 2) {
        const double l = m * UTW_PI / alpha, s = m % 4 == 1 ? 1 : -1, c = 4 * s / (m * UTW_PI);
        sum.J += alpha / 2 * c * c / pow(l + 2, 2) * pow(r, 4);
        sum.phi_x += 2 * c / (5 * (l + 3) * (l + 2)) * cosines(l, alpha, s) * pow(r, 5);
        sum.omega_y -= c * (l + 5) / (5 * (l + 3) * (l + 2)) * sines(l, alpha, s) * pow(r, 5);
        sum.omega2 += c * c * alpha / 2 * (l * l + 9 * l + 12) /
                      (6 * (l + 4) * (l + 1) * pow(l + 2, 2)) * pow(r, 6);
    }
    return sum;
}

/* int r^(n-1) (t/r)^k dr over t .. 1. */
static double falling(double n, double k, double t)
{
    return fabs(n - k) < 1e-12 ? -pow(t, k) * log(t) : (pow(t, k) - pow(t, n)) / (n - k);
}

/* In units of the outer radius a term is r^2 + a r^l + b (t/r)^l, t the inner radius. */
static sums ring_sector(double alpha, double ri, double R)
{
    sums sum = {0};
    const double t = ri / R;
    for (int m = 20001; m > 0; m -= 2) {
        const double l = m * UTW_PI / alpha, s = m % 4 == 1 ? 1 : -1, c = 4 * s / (m * UTW_PI),
                     d = l * l - 4;
        const double tl = pow(t, l), den = 1 - tl * tl;
        const double a = -(1 - t * t * tl) / den, b = -(t * t - tl) / den; /* R = 1 */
        /* int r^n times 1, (r)^l, (t/r)^l over t .. 1 */
        const double p[3] = {(1 - pow(t, 4)) / 4, (1 - tl * t * t) / (l + 2), falling(2, l, t)};
        const double q[3] = {(1 - pow(t, 5)) / 5, (1 - tl * pow(t, 3)) / (l + 3), falling(3, l, t)};
        const double square = (1 - pow(t, 6)) / 6, grow = (1 - tl * tl * t * t) / (2 * l + 2),
                     fall = falling(2, 2 * l, t), product = tl * (1 - t * t) / 2;
        const double up = (1 - tl * pow(t, 4)) / (l + 4), down = falling(4, l, t);
        sum.J += alpha / 2 * c * 4 * c / d * (p[0] + a * p[1] + b * p[2]) * pow(R, 4);
        sum.phi_x += 2 * c / d * cosines(l, alpha, s) * (q[0] + a * q[1] + b * q[2]) * pow(R, 5);
        sum.omega_y +=
            c / d * sines(l, alpha, s) * (-l * q[0] - 2 * a * q[1] + 2 * b * q[2]) * pow(R, 5);
        sum.omega2 += c * c / (d * d) * alpha / 2 * pow(R, 6) *
                      (l * l * square + 4 * a * a * grow + 4 * b * b * fall + 4 * l * a * up -
                       4 * l * b * down - 8 * a * b * product);
    }
    return sum;
}

/* The constants of a section symmetric about x from its sums. */
static void check_series(double degrees, double inner, double outer, double nu)
{
    const double alpha = degrees * UTW_PI / 180;
    const sums s = inner > 0 ? ring_sector(alpha, inner, outer) : sector(alpha, outer);
    const double A = alpha * (outer * outer - inner * inner) / 2;
    const double xc = 4 * sin(alpha / 2) * (pow(outer, 3) - pow(inner, 3)) / (6 * A);
    const double Ixx = (pow(outer, 4) - pow(inner, 4)) / 8 * (alpha - sin(alpha));
    const double Iyy = (pow(outer, 4) - pow(inner, 4)) / 8 * (alpha + sin(alpha)) - xc * xc * A;
    const double xs = -s.omega_y / Ixx, xf = xs + nu / ((1 + nu) * Ixx) * (s.phi_x - xc * s.J / 2);
    const known list[] = {
        {UTW_A, A, 1e-15},
        {UTW_XC, xc, 1e-14},
        {UTW_YC, 0, 0},
        {UTW_IXX, Ixx, 1e-14},
        {UTW_IYY, Iyy, 1e-13},
        {UTW_J, s.J, inner > 0 ? 5e-11 : 1e-12} /* the ring series is summed less far */,
        {UTW_XS, xs, 1e-12},
        {UTW_YS, 0, 0},
        {UTW_XF, xf, 1e-12},
        {UTW_YF, 0, 0},
        {UTW_IW, s.omega2 - xs * xs * Ixx, 1e-10},
    };
    check(nu, degrees, inner, outer, list, COUNT(list));
}

static void series_agree_with_the_fixed_values(void **state)
{
    (void)state;
    const sums s = sector(UTW_PI / 3, 1), h = ring_sector(UTW_PI, 0.5, 1),
               g = ring_sector(UTW_PI / 3, 1e-4, 1);
    assert_close(s.J, 0.03490920609464229, 1e-13);
    assert_close(-s.omega_y / 0.02264651842651989, 0.6594674064851149, 1e-13);
    assert_close(s.omega2 - pow(s.omega_y, 2) / 0.02264651842651989, 6.107482953111997e-05, 1e-10);
    assert_close(h.J, 0.08545338121367872, 1e-11);
    assert_close(-h.omega_y / 0.3681553890925539, 0.8658028904199107, 1e-12);
    assert_close(h.omega2 - pow(h.omega_y, 2) / 0.3681553890925539, 0.01212037989704674, 1e-10);
    assert_close(g.phi_x, s.phi_x, 1e-10); /* two ways to the same limit */
    assert_close(g.omega2, s.omega2, 1e-10);
}

static void other_sectors(void **state)
{
    (void)state;
    check_series(37, 0, 2.385, 0.3);
    check_series(90, 0, 0.7, 0.5);
    check_series(135, 0, 12.1, 0.3);
    check_series(180, 0, 2.385, 0.5);
    check_series(250, 0, 2.385, 0.3); /* the apex is a re-entrant corner */
}

static void other_ring_sectors(void **state)
{
    (void)state;
    check_series(37, 1.1, 2.385, 0.3);
    check_series(100, 0.2, 1, 0.5);
    check_series(180, 2, 2.385, 0.3);
    check_series(320, 1.9, 2.385, 0.3); /* almost a slit tube */
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(series_agree_with_the_fixed_values),
        balanced_test(fixed_values),
        balanced_test(other_sectors),
        balanced_test(other_ring_sectors),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
