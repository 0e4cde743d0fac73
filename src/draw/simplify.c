/* SPDX-License-Identifier: GPL-3.0-or-later
 * Douglas and Peucker's method. Kept points are marked in place: no point on a page is infinite, so
 * the others are set to NAN until they are squeezed out. */
#include "draw/simplify.h"

#include <math.h>

#include "base/vec2.h"

static double distance_to(const double a[2], const double b[2], const double p[2])
{
    const double d[2] = {b[0] - a[0], b[1] - a[1]}, e[2] = {p[0] - a[0], p[1] - a[1]};
    const double length2 = utw_dot(d, d);
    if (length2 <= 0) return utw_norm(e);
    const double t = fmin(fmax(utw_dot(d, e) / length2, 0), 1);
    const double foot[2] = {a[0] + t * d[0], a[1] + t * d[1]};
    return utw_distance(foot, p);
}

/* Points strictly between `from` and `to` (counted modulo n). The longer of two halves is done by
 * the loop, so that calls nest at most log2(n) deep. */
static void reduce(int n, double (*xy)[2], int from, int to, double tolerance)
{
    while (to - from > 1) {
        int worst = from + 1;
        double most = -1;
        for (int i = from + 1; i < to; i++) {
            const double d = distance_to(xy[from % n], xy[to % n], xy[i % n]);
            if (d > most) {
                most = d;
                worst = i;
            }
        }
        if (most <= tolerance) {
            for (int i = from + 1; i < to; i++) xy[i % n][0] = UTW_NAN;
            return;
        }
        if (worst - from < to - worst) {
            reduce(n, xy, from, worst, tolerance);
            from = worst;
        } else {
            reduce(n, xy, worst, to, tolerance);
            to = worst;
        }
    }
}

int utw_simplify(int n, double (*xy)[2], int closed, double tolerance)
{
    int kept = 0;
    if (n < 3 || tolerance <= 0) return n;
    if (closed) {
        int far = 0;
        for (int i = 1; i < n; i++)
            if (utw_distance(xy[0], xy[i]) > utw_distance(xy[0], xy[far])) far = i;
        if (far == 0) return n;
        reduce(n, xy, 0, far, tolerance);
        reduce(n, xy, far, n, tolerance);
    } else {
        reduce(n, xy, 0, n - 1, tolerance);
    }
    for (int i = 0; i < n; i++) {
        if (isnan(xy[i][0])) continue;
        xy[kept][0] = xy[i][0];
        xy[kept++][1] = xy[i][1];
    }
    return kept;
}
