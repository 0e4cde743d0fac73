/* SPDX-License-Identifier: GPL-3.0-or-later
 * Hyperbolic shapes: power series of the differences up to k = 4, scaled exponentials beyond.
 *
 * Below, every difference such as sinh(kx) - x sinh k is summed term by term; its first terms
 * cancel exactly and are left out, the others have one sign (or pass through zero where the
 * function does). Own derivation from the closed forms of Vlasov, Thin-Walled Elastic Beams, 1961,
 * and Timoshenko and Gere, Theory of Elastic Stability, 1961, ch. 5. */
#include "bar/hyperbolic.h"

#include <math.h>

#define SERIES_TO 4.0 /* then 4^44/45! < 1e-29: TERMS are enough */
#define TERMS     22

/* sinh(kx)/k, also for k = 0 */
static double sinh_over(double k, double x)
{
    const double a = k * x;
    return fabs(a) < 1e-5 ? x * (1 + a * a / 6) : sinh(a) / k;
}

/* 1 - e^-2a, without cancellation */
static double fade(double a)
{
    return -expm1(-2 * a);
}

static utw_hyper end_series(double k, double x)
{
    const double q = k * k, scale = 1 / sinh_over(k, 1);
    utw_hyper h = {.b = sinh_over(k, x) * scale, .b1 = cosh(k * x) * scale};
    /* sinh(kx) - x sinh k = sum k^(2n+1) (x^(2n+1) - x)/(2n+1)!, n from 1 */
    double power = 1, factor = 1; /* x^2n, k^(2n-2)/(2n+1)! */
    for (int n = 1; n <= TERMS; n++) {
        power *= x * x;
        factor /= 2.0 * n * (2.0 * n + 1);
        h.f -= factor * x * (1 - power);
        h.f1 += factor * ((2.0 * n + 1) * power - 1);
        factor *= q;
    }
    h.f *= scale;
    h.f1 *= scale;
    return h;
}

utw_hyper utw_hyper_end(double k, double x)
{
    if (k <= SERIES_TO) return end_series(k, x);
    utw_hyper h;
    const double e = exp(-k * (1 - x)) / fade(k);
    h.b = e * fade(k * x);
    h.b1 = k * e * (1 + exp(-2 * k * x));
    h.f = (h.b - x) / k / k;
    h.f1 = (h.b1 - 1) / k / k;
    return h;
}

static utw_hyper point_series(double k, double x, double y)
{
    const double q = k * k, scale = 1 / sinh_over(k, 1), p2 = (x + y) * (x + y),
                 m2 = (x - y) * (x - y);
    utw_hyper h = {.b = -sinh_over(k, x) * sinh_over(k, y) * scale,
                   .b1 = -cosh(k * x) * sinh_over(k, y) * scale};
    /* With p = x + y, m = x - y: sinh(kx) sinh(ky) = sum k^2n (p^2n - m^2n)/(2 (2n)!), and
     * p^2n - m^2n = 4xy sum p^2i m^2(n-1-i). Slope: (p^(2n+1) - m^(2n+1))/2 = y sum (...) is summed
     * by halves. */
    double mixed = 1, m_power = 1, factor = 1; /* sum p^2i m^2(n-1-i), m^(2n-2), k^(2n-4)/(2n-1)! */
    double p_odd = x + y, m_odd = x - y;
    for (int n = 2; n <= TERMS; n++) {
        m_power *= m2;
        mixed = mixed * p2 + m_power;
        p_odd *= p2;
        m_odd *= m2;
        factor /= (2.0 * n - 2) * (2.0 * n - 1);
        h.f += factor * x * y * (1 - mixed / n);
        h.f1 += factor * (y - (p_odd - m_odd) / 2);
        factor *= q;
    }
    h.f *= scale;
    h.f1 *= scale;
    return h;
}

utw_hyper utw_hyper_point(double k, double x, double y)
{
    if (k <= SERIES_TO) return point_series(k, x, y);
    utw_hyper h;
    const double gap =
        fmax(1 - x - y, 0); /* rounding of x + y = 1 would be blown up by a large k */
    const double e = exp(-k * gap) / (2 * fade(k));
    h.b = -e * fade(k * x) * fade(k * y) / k;
    h.b1 = -e * (1 + exp(-2 * k * x)) * fade(k * y);
    h.f = (x * y + h.b) / k / k;
    h.f1 = (y + h.b1) / k / k;
    return h;
}

static utw_hyper uniform_series(double k, double x)
{
    const double q = k * k / 4, scale = 1 / cosh(k / 2), w = 1 - 2 * x, w2 = w * w;
    utw_hyper h = {.b = -2 * sinh_over(k, x / 2) * sinh_over(k, (1 - x) / 2) * scale,
                   .b1 = -sinh_over(k, w / 2) * scale};
    /* cosh(k/2) (1 - w^2)/8 - (cosh(k/2) - cosh(kw/2))/k^2
     *   = (1 - w^2)/8 sum (k/2)^2n/(2n)! (1 - 2 sum w^2i/((2n+1)(2n+2))), n from 1, i from 0 to n
     */
    double sum = 1, power = 1, factor = 0.25; /* sum w^2i, w^2n, (k/2)^(2n-2)/(2n)!/4 */
    for (int n = 1; n <= TERMS; n++) {
        power *= w2;
        sum += power;
        factor /= (2.0 * n - 1) * (2.0 * n);
        h.f += factor * x * (1 - x) / 2 * (1 - 2 * sum / ((2.0 * n + 1) * (2.0 * n + 2)));
        h.f1 += factor * w / 2 * (1 - power / (2.0 * n + 1));
        factor *= q;
    }
    h.f *= scale;
    h.f1 *= scale;
    return h;
}

utw_hyper utw_hyper_uniform(double k, double x)
{
    if (k <= SERIES_TO) return uniform_series(k, x);
    utw_hyper h;
    /* cosh(k/2) - cosh(k(1/2 - x)) = 2 sinh(kx/2) sinh(k(1 - x)/2), over cosh(k/2) */
    const double below = 1 + exp(-k);
    h.b = -fade(k * x / 2) * fade(k * (1 - x) / 2) / below / k / k;
    h.b1 = -(exp(-k * x) - exp(-k * (1 - x))) / below / k;
    h.f = (x * (1 - x) / 2 + h.b) / k / k;
    h.f1 = ((1 - 2 * x) / 2 + h.b1) / k / k;
    return h;
}
