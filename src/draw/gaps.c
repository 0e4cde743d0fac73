/* SPDX-License-Identifier: GPL-3.0-or-later
 * Cutting lines at boxes. */
#include "draw/gaps.h"

#include <math.h>

/* The part [t0, t1] of the segment a b inside a box (Liang and Barsky, ACM Transactions on Graphics
 * 3 (1984) 1-22). Returns 0 when there is none. */
static int inside(const double a[2], const double b[2], const utw_box *box, double *t0, double *t1)
{
    const double low[2] = {box->x0, box->y0}, high[2] = {box->x1, box->y1};
    *t0 = 0;
    *t1 = 1;
    for (int d = 0; d < 2; d++) {
        const double step = b[d] - a[d];
        if (step == 0) {
            if (a[d] < low[d] || a[d] > high[d]) return 0;
            continue;
        }
        const double in = ((step > 0 ? low[d] : high[d]) - a[d]) / step,
                     out = ((step > 0 ? high[d] : low[d]) - a[d]) / step;
        *t0 = fmax(*t0, in);
        *t1 = fmin(*t1, out);
    }
    return *t0 < *t1;
}

/* From `from` on, the next part of the segment that is hidden: [*t0, *t1], or *t0 = 1 for none. */
static void next_hidden(const double a[2], const double b[2], int n, const utw_box *box,
                        double from, double *t0, double *t1)
{
    *t0 = *t1 = 1;
    for (int i = 0; i < n; i++) {
        double in, out;
        if (!inside(a, b, &box[i], &in, &out) || out <= from || in >= *t0) continue;
        *t0 = in;
        *t1 = out;
    }
}

/* The pen is at a when `down`. Returns whether it ends at b. */
static int lay_segment(utw_canvas *c, const double a[2], const double b[2], int n,
                       const utw_box *box, int down)
{
    double from = 0;
    while (from < 1) {
        double t0, t1;
        next_hidden(a, b, n, box, from, &t0, &t1);
        if (t0 > from) {
            if (!down) utw_canvas_move(c, a[0] + from * (b[0] - a[0]), a[1] + from * (b[1] - a[1]));
            utw_canvas_line(c, a[0] + t0 * (b[0] - a[0]), a[1] + t0 * (b[1] - a[1]));
            down = 1;
        }
        if (t0 >= 1) return down;
        down = 0;
        from = t1;
    }
    return 0;
}

void utw_lay_with_gaps(utw_canvas *c, const utw_paths *p, int n, const utw_box *box)
{
    for (int k = 0; k < p->n_path; k++) {
        const int first = p->first[k], end = utw_paths_end(p, k);
        int down = 0;
        for (int i = first; i + 1 < end; i++)
            down = lay_segment(c, p->xy[i], p->xy[i + 1], n, box, down);
        if (p->closed[k]) lay_segment(c, p->xy[end - 1], p->xy[first], n, box, down);
    }
}
