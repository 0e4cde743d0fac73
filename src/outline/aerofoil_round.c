/* SPDX-License-Identifier: GPL-3.0-or-later
 * Corners are rounded one by one between the smooth sides that meet there; two corners share the
 * side between them. */
#include "outline/aerofoil_round.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/corner.h"

static const double KINK = 5 * UTW_PI / 180; /* as sharp as a corner of the mesh (mesh/layers.c) */
static const double GONE = 1e-9; /* what is left of a curve, as a share of it, when it is used up */

typedef struct rounder {
    int n;               /* corners, and sides: side k runs from corner k to corner k + 1 */
    utw_curve *curve;    /* [n_curve], owned: from corner 0 on */
    int *first;          /* [n + 1], owned: side k has the curves first[k] .. first[k+1] - 1 */
    int *is_sharp;       /* [n], owned: left as it is */
    utw_corner_cut *cut; /* [n], owned */
    utw_error *err;
} rounder;

/* How far the direction turns to the left where curve a ends and b starts [rad]. */
static double turning(const utw_curve *a, const utw_curve *b)
{
    double d[2], e[2];
    utw_curve_d1(a, 1, d);
    utw_curve_d1(b, 0, e);
    return atan2(utw_cross(d, e), utw_dot(d, e));
}

/* Corners, and the curves turned about so that the first of them is where the chain starts. */
static utw_status find_corners(rounder *x, const utw_fit *bay)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = x->err;
    const int n = (int)bay->n;
    int start = -1;
    UTW_TRY_ALLOC(x->curve = utw_alloc(bay->n, sizeof *x->curve));
    UTW_TRY_ALLOC(x->first = utw_alloc(bay->n + 1, sizeof *x->first));
    UTW_TRY_ALLOC(x->is_sharp = utw_alloc(bay->n, sizeof *x->is_sharp));
    UTW_TRY_ALLOC(x->cut = utw_alloc(bay->n, sizeof *x->cut));
    for (int k = 0; k < n && start < 0; k++)
        if (fabs(turning(&bay->curve[(k + n - 1) % n], &bay->curve[k])) > KINK) start = k;
    for (int k = 0; start >= 0 && k < n; k++) {
        const int here = (start + k) % n;
        const double turn = turning(&bay->curve[(here + n - 1) % n], &bay->curve[here]);
        x->curve[k] = bay->curve[here];
        if (!(fabs(turn) > KINK)) continue;
        x->is_sharp[x->n] = turn < 0;
        x->first[x->n++] = k;
    }
    x->first[x->n] = n;
    st = UTW_OK;
done:
    return st;
}

static utw_edge side(const rounder *x, int k)
{
    return (utw_edge){.curve = x->curve + x->first[k], .n = x->first[k + 1] - x->first[k]};
}

static utw_corner corner_at(const rounder *x, int k, double r)
{
    const utw_edge in = side(x, (k + x->n - 1) % x->n), out = side(x, k);
    return (utw_corner){.kind = UTW_CORNER_ROUND,
                        .size = r,
                        .before = in,
                        .after = out,
                        .least_before = 0,
                        .most_after = out.n};
}

/* Rounds all corners. Returns the first that does not fit beside those before it, or -1. */
static int make_corners(const rounder *x, double r)
{
    for (int k = 0; k < x->n; k++) {
        utw_corner corner = corner_at(x, k, r);
        x->cut[k] = (utw_corner_cut){.before = corner.before.n};
        if (x->is_sharp[k]) continue;
        if (k > 0) corner.least_before = x->cut[k - 1].after;
        if (k == x->n - 1 && k > 0) corner.most_after = x->cut[0].before;
        if (utw_corner_make(&corner, &x->cut[k]) != UTW_CORNER_FITS) return k;
    }
    return -1;
}

/* The greatest radius that fits everywhere, by bisection, down to four digits: what a message
 * prints fits when it is typed in. */
static double greatest(const rounder *x, double r)
{
    double low = 0, high = r;
    for (int i = 0; i < 30; i++) {
        const double mid = 0.5 * (low + high);
        *(make_corners(x, mid) < 0 ? &low : &high) = mid;
    }
    if (!(low > 1e-6 * r)) return 0;
    const double unit = pow(10, floor(log10(low)) - 3);
    return floor(low / unit) * unit;
}

static utw_status too_large(const rounder *x, double r, int k)
{
    const double *at = side(x, k).curve[0].from, most = greatest(x, r);
    if (most > 0)
        return utw_fail(x->err, UTW_E_OUTLINE,
                        "aerofoil: r = %g does not fit in the corner at (%.4g, %.4g), before the "
                        "section is placed; the greatest that fits in this bay is %g",
                        r, at[0], at[1], most);
    return utw_fail(x->err, UTW_E_OUTLINE,
                    "aerofoil: r = %g does not fit in the corner at (%.4g, %.4g), before the "
                    "section is placed, and no smaller one does; leave \"r\" out",
                    r, at[0], at[1]);
}

static utw_status append(utw_fit *fit, utw_curve curve, utw_error *err)
{
    if (fit->n > 0) memcpy(curve.from, fit->curve[fit->n - 1].to, sizeof curve.from);
    return utw_fit_append(fit, curve, err);
}

static utw_status assemble(const rounder *x, utw_fit *made)
{
    utw_status st = UTW_E_INTERNAL;
    for (int k = 0; k < x->n; k++) {
        const utw_edge e = side(x, k);
        const double start = x->cut[k].after, end = x->cut[(k + 1) % x->n].before;
        if (!x->is_sharp[k]) UTW_TRY(append(made, x->cut[k].curve, x->err));
        for (int i = 0; i < e.n; i++) {
            const double t0 = fmax(start - i, 0), t1 = fmin(end - i, 1);
            if (t1 - t0 <= GONE) continue;
            UTW_TRY(append(made,
                           t0 > 0 || t1 < 1 ? utw_curve_piece(&e.curve[i], t0, t1) : e.curve[i],
                           x->err));
        }
    }
    memcpy(made->curve[0].from, made->curve[made->n - 1].to, sizeof(double[2]));
    st = UTW_OK;
done:
    return st;
}

utw_status utw_aerofoil_round(utw_fit *bay, double r, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    rounder x = {.err = err};
    utw_fit made = {.n = 0};
    UTW_TRY(find_corners(&x, bay));
    if (x.n > 0) {
        const int k = make_corners(&x, r);
        if (k >= 0) {
            st = too_large(&x, r, k);
            goto done;
        }
        UTW_TRY(assemble(&x, &made));
        utw_free(bay->curve);
        *bay = made;
        made = (utw_fit){.n = 0};
    }
    st = UTW_OK;
done:
    utw_free(made.curve);
    utw_free(x.curve);
    utw_free(x.first);
    utw_free(x.is_sharp);
    utw_free(x.cut);
    return st;
}
