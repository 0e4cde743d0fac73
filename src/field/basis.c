/* SPDX-License-Identifier: GPL-3.0-or-later
 * The shape functions, point by point. */
#include "field/basis.h"

#include <math.h>

/* A value with its derivatives by r and s. */
typedef struct jet {
    double v, r, s;
} jet;

static jet times(jet a, jet b)
{
    return (jet){a.v * b.v, a.r * b.v + a.v * b.r, a.s * b.v + a.v * b.s};
}

static jet scaled(double k, jet a)
{
    return (jet){k * a.v, k * a.r, k * a.s};
}

static jet plus(jet a, jet b)
{
    return (jet){a.v + b.v, a.r + b.r, a.s + b.s};
}

/* Coefficients of the Jacobi recurrence P_{n+1} = (a x + b) P_n - c P_{n-1} (Abramowitz and
 * Stegun 22.7.1). */
static void jacobi_step(int n, double al, double be, double *a, double *b, double *c)
{
    const double q = 2 * n + al + be, d = 2 * (n + 1) * (n + al + be + 1);
    *a = (q + 1) * (q + 2) / d;
    *b = n == 0 && al + be == 0 ? 0 : (q + 1) * (al * al - be * be) / (d * q);
    *c = n == 0 ? 0 : 2 * (n + al) * (n + be) * (q + 2) / (d * q);
}

/* t^n P_n(x/t) for n = 0..top: homogeneous, so that x/t is never formed. */
static void jacobi(int top, double al, double be, jet x, jet t, jet *P)
{
    P[0] = (jet){1, 0, 0};
    for (int n = 0; n < top; n++) {
        double a, b, c;
        jacobi_step(n, al, be, &a, &b, &c);
        P[n + 1] = times(plus(scaled(a, x), scaled(b, t)), P[n]);
        if (n > 0) P[n + 1] = plus(P[n + 1], scaled(-c, times(times(t, t), P[n - 1])));
    }
}

/* c_k: makes the edge function minus the integral of the normalised Legendre polynomial of degree
 * k-1. */
static double edge_factor(int k)
{
    return sqrt((2 * k - 1) / 2.0) * 2 / (k - 1);
}

void utw_edge_kernels(int n, double x, double *phi, double *dphi)
{
    double p0 = 0, d0 = 0, p1 = 1, d1 = 0; /* P_{j-1}, P_j and derivatives */
    for (int k = 2; k <= n; k++) {
        const double f = edge_factor(k);
        phi[k - 2] = f * p1;
        dphi[k - 2] = f * d1;
        double a, b, c;
        jacobi_step(k - 2, 1, 1, &a, &b, &c);
        const double p2 = a * x * p1 - c * p0, d2 = a * (p1 + x * d1) - c * d0;
        p0 = p1, d0 = d1;
        p1 = p2, d1 = d2;
    }
}

static void put(jet z, int m, double *N, double *Nr, double *Ns)
{
    N[m] = z.v;
    Nr[m] = z.r;
    Ns[m] = z.s;
}

void utw_basis(int p, double r, double s, double *N, double *Nr, double *Ns)
{
    const jet l[3] = {{1 - r - s, -1, -1}, {r, 1, 0}, {s, 0, 1}};
    double phi[UTW_ORDER_MAX], dphi[UTW_ORDER_MAX];
    for (int i = 0; i < 3; i++) put(l[i], i, N, Nr, Ns);
    for (int e = 0; e < 3; e++) {
        const jet a = l[e], b = l[(e + 1) % 3], x = plus(b, scaled(-1, a)), ab = times(a, b);
        utw_edge_kernels(p, x.v, phi, dphi);
        for (int k = 2; k <= p; k++) {
            const jet f = {phi[k - 2], dphi[k - 2] * x.r, dphi[k - 2] * x.s};
            put(times(ab, f), utw_edge_function(p, e, k), N, Nr, Ns);
        }
    }
    if (p < 3) return;
    const jet bubble = times(l[0], times(l[1], l[2]));
    jet P[UTW_ORDER_MAX], Q[UTW_ORDER_MAX];
    jacobi(p - 3, 2, 2, plus(l[1], scaled(-1, l[0])), plus(l[0], l[1]), P);
    for (int i = 0; i <= p - 3; i++) {
        jacobi(p - 3 - i, 2 * i + 5, 2, (jet){2 * s - 1, 0, 2}, (jet){1, 0, 0}, Q);
        for (int j = 0; i + j <= p - 3; j++) {
            const int n = i + j; /* functions of lower total degree come first */
            const double f = 4 * sqrt((2 * i + 5.0) * (n + 4.0) * 2);
            put(scaled(f, times(bubble, times(P[i], Q[j]))), 3 * p + n * (n + 1) / 2 + i, N, Nr,
                Ns);
        }
    }
}
