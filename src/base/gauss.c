/* SPDX-License-Identifier: GPL-3.0-or-later
 * Gauss-Legendre nodes and weights by Newton's iteration. */
#include "base/gauss.h"
#include "base/vec2.h"

void utw_gauss(int n, double *x, double *w)
{
    for (int i = 0; i < (n + 1) / 2; i++) {
        /* i-th largest root of P_n; Tricomi's first guess, exact enough for Newton to converge. */
        double z = cos(UTW_PI * (i + 0.75) / (n + 0.5)), dp = 1;
        if (2 * i + 1 == n) z = 0; /* the middle root of an odd rule is exactly 0 */
        for (int step = 0, close = 0; step < 20; step++) {
            double p0 = 1, p1 = z;
            for (int k = 1; k < n; k++) { /* (k+1) P_{k+1} = (2k+1) z P_k - k P_{k-1} */
                const double p2 = ((2 * k + 1) * z * p1 - k * p0) / (k + 1);
                p0 = p1;
                p1 = p2;
            }
            dp = n * (z * p1 - p0) / (z * z - 1); /* derivative of P_n */
            const double dz = p1 / dp;
            z -= dz;
            /* once more when close: the weight needs P_n' at the root to the last digit */
            if (close) break;
            close = fabs(dz) < 1e-14;
        }
        /* weight on [-1, 1]: 2 / ((1 - z^2) P_n'(z)^2); halved for [0, 1] */
        const double weight = 1 / ((1 - z * z) * dp * dp);
        x[i] = (1 - z) / 2;
        x[n - 1 - i] = (1 + z) / 2;
        w[i] = w[n - 1 - i] = weight;
    }
}
