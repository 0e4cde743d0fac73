/* SPDX-License-Identifier: GPL-3.0-or-later
 * Scanning the samples of all regions, those that cannot matter passed over by their bounds. */
#include "section/scan.h"

#include <math.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

/* Regions whose best sample lies within this part of the greatest are searched: samples stand so
 * densely that a smooth peak between them is no higher above them. */
#define NEAR 0.02

typedef struct scanner {
    const utw_stress *stress;
    const utw_stress_case *stress_case;
    double *sigma, *tx, *ty; /* of the samples of one region */
    utw_scan *scan;
} scanner;

double utw_merit(int kind, double sigma, double tau2)
{
    switch (kind) {
    case UTW_PRINCIPAL_MAX:
        return 0.5 * sigma + sqrt(0.25 * sigma * sigma + tau2);
    case UTW_PRINCIPAL_MIN:
        return -0.5 * sigma + sqrt(0.25 * sigma * sigma + tau2);
    case UTW_SIGMA_MAX:
        return sigma;
    case UTW_SIGMA_MIN:
        return -sigma;
    case UTW_TAU_MAX:
        return tau2;
    default:
        return sigma * sigma + 3 * tau2;
    }
}

double utw_region_yield(const utw_stress *f, const utw_region *region)
{
    const utw_mesh *mesh = f->unit.solution->solved.mesh;
    double least = UTW_INFINITY;
    for (int i = region->first; i < region->first + region->n; i++)
        least = fmin(least, f->yield[mesh->tri[f->samples.tri[i]].part]);
    return least;
}

void utw_scan_stresses(const utw_samples *a, const utw_stress_case *c, int first, int n,
                       double *sigma, double *tx, double *ty)
{
    const double *x = a->x + first, *y = a->y + first, *w = a->omega + first;
    for (int i = 0; i < n; i++) sigma[i] = c->one + c->x * x[i] + c->y * y[i] + c->omega * w[i];
    if (!c->sheared) {
        for (int i = 0; i < n; i++) tx[i] = ty[i] = 0;
        return;
    }
    const double *x0 = a->tau[0][0] + first, *x1 = a->tau[1][0] + first, *x2 = a->tau[2][0] + first;
    const double *y0 = a->tau[0][1] + first, *y1 = a->tau[1][1] + first, *y2 = a->tau[2][1] + first;
    const double t0 = c->t[0], t1 = c->t[1], t2 = c->t[2];
    for (int i = 0; i < n; i++) {
        tx[i] = t0 * x0[i] + t1 * x1[i] + t2 * x2[i];
        ty[i] = t0 * y0[i] + t1 * y1[i] + t2 * y2[i];
    }
}

/* sigma_z has a bound everywhere; the rest has none at a sharp corner under shear. */
static int counts(const scanner *s, const utw_region *region, int kind)
{
    const int bounded = kind == UTW_SIGMA_MAX || kind == UTW_SIGMA_MIN;
    return bounded || !s->stress_case->sheared || !region->kept_out;
}

static double utilisation(const scanner *s, const utw_region *region, double mises2)
{
    if (s->stress->yield == NULL) return -UTW_INFINITY;
    const double yield = utw_region_yield(s->stress, region);
    return mises2 / (yield * yield);
}

/* No sample of the region has a greater merit than this: every merit grows with |tau| and is convex
 * in sigma_z, so that it is greatest at an end of sigma_z's interval. */
static void bound_merits(const scanner *s, const utw_region *region, utw_merits bound)
{
    const utw_stress_case *c = s->stress_case;
    const double factor[3] = {c->x, c->y, c->omega};
    double high = c->one, low = c->one, tau = 0;
    for (int k = 0; k < 3; k++) {
        const double a = factor[k] * region->low[k], b = factor[k] * region->high[k];
        high += a > b ? a : b;
        low += a > b ? b : a;
    }
    for (int k = 0; k < UTW_N_UNIT; k++) tau += fabs(c->t[k]) * region->most[k];
    for (int kind = 0; kind < UTW_STRESS_KIND_COUNT; kind++)
        bound[kind] = fmax(utw_merit(kind, low, tau * tau), utw_merit(kind, high, tau * tau));
    bound[UTW_UTILISATION] = utilisation(s, region, bound[UTW_VON_MISES]);
}

static double greater(double a, double b)
{
    return a > b ? a : b;
}

static void scan_region(scanner *s, int which)
{
    const utw_region *region = &s->stress->samples.region[which];
    double *best = s->scan->best[which], *radius = s->tx, *tau2 = s->ty;
    const int n = region->n;
    utw_scan_stresses(&s->stress->samples, s->stress_case, region->first, n, s->sigma, s->tx,
                      s->ty);
    for (int i = 0; i < n; i++) {
        tau2[i] = s->tx[i] * s->tx[i] + s->ty[i] * s->ty[i];
        radius[i] = sqrt(0.25 * s->sigma[i] * s->sigma[i] + tau2[i]);
    }
    double high = -UTW_INFINITY, low = UTW_INFINITY, shear = 0, mises2 = 0;
    double tension = -UTW_INFINITY, compression = -UTW_INFINITY;
    for (int i = 0; i < n; i++) {
        const double sigma = s->sigma[i];
        high = greater(sigma, high);
        low = sigma < low ? sigma : low;
        shear = greater(tau2[i], shear);
        mises2 = greater(sigma * sigma + 3 * tau2[i], mises2);
        tension = greater(0.5 * sigma + radius[i], tension);
        compression = greater(radius[i] - 0.5 * sigma, compression);
    }
    best[UTW_VON_MISES] = mises2;
    best[UTW_PRINCIPAL_MAX] = tension;
    best[UTW_PRINCIPAL_MIN] = compression;
    best[UTW_SIGMA_MAX] = high;
    best[UTW_SIGMA_MIN] = -low;
    best[UTW_TAU_MAX] = shear;
    best[UTW_UTILISATION] = utilisation(s, region, mises2);
    for (int kind = 0; kind < UTW_N_KIND; kind++) {
        if (!counts(s, region, kind)) best[kind] = -UTW_INFINITY;
        s->scan->greatest[kind] = greater(best[kind], s->scan->greatest[kind]);
    }
}

/* Squares may lack twice NEAR; the others, which may pass through zero, are measured by the
 * greatest stress. */
static void set_near(scanner *s)
{
    const double scale = sqrt(greater(s->scan->greatest[UTW_VON_MISES], 0));
    for (int kind = 0; kind < UTW_N_KIND; kind++) s->scan->near[kind] = NEAR * scale;
    s->scan->near[UTW_VON_MISES] = 2 * NEAR * s->scan->greatest[UTW_VON_MISES];
    s->scan->near[UTW_TAU_MAX] = 2 * NEAR * s->scan->greatest[UTW_TAU_MAX];
    s->scan->near[UTW_UTILISATION] = 2 * NEAR * s->scan->greatest[UTW_UTILISATION];
}

static int may_matter(const scanner *s, const utw_region *region, const utw_merits bound)
{
    for (int kind = 0; kind < UTW_N_KIND; kind++)
        if (counts(s, region, kind) && bound[kind] >= s->scan->greatest[kind] - s->scan->near[kind])
            return 1;
    return 0;
}

static int longest_region(const utw_samples *a)
{
    int longest = 0;
    for (int i = 0; i < a->n_region; i++)
        longest = a->region[i].n > longest ? a->region[i].n : longest;
    return longest;
}

/* First the region with the greatest bound of every kind, so that the greatest merits are nearly
 * known when the others are judged by their bounds. */
static void scan_all(scanner *s, const utw_merits *bound)
{
    const utw_samples *a = &s->stress->samples;
    int promising[UTW_N_KIND];
    for (int kind = 0; kind < UTW_N_KIND; kind++) {
        int best = -1;
        for (int i = 0; i < a->n_region; i++)
            if (counts(s, &a->region[i], kind) && (best < 0 || bound[i][kind] > bound[best][kind]))
                best = i;
        promising[kind] = best;
        s->scan->greatest[kind] = -UTW_INFINITY;
    }
    for (int i = 0; i < a->n_region; i++)
        for (int kind = 0; kind < UTW_N_KIND; kind++) s->scan->best[i][kind] = -UTW_INFINITY;
    for (int kind = 0; kind < UTW_N_KIND; kind++)
        if (promising[kind] >= 0) scan_region(s, promising[kind]);
    set_near(s);
    for (int i = 0; i < a->n_region; i++) {
        if (!may_matter(s, &a->region[i], bound[i])) continue;
        scan_region(s, i);
        set_near(s);
    }
}

utw_status utw_scan_init(utw_scan *scan, const utw_stress *stress,
                         const utw_stress_case *stress_case, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_samples *a = &stress->samples;
    const size_t longest = (size_t)longest_region(a);
    utw_merits *bound = NULL;
    scanner s = {.stress = stress, .stress_case = stress_case, .scan = scan};
    *scan = (utw_scan){.best = NULL};
    UTW_TRY_ALLOC(scan->best = utw_alloc((size_t)a->n_region, sizeof *scan->best));
    UTW_TRY_ALLOC(bound = utw_alloc((size_t)a->n_region, sizeof *bound));
    UTW_TRY_ALLOC(s.sigma = utw_alloc(longest, sizeof(double)));
    UTW_TRY_ALLOC(s.tx = utw_alloc(longest, sizeof(double)));
    UTW_TRY_ALLOC(s.ty = utw_alloc(longest, sizeof(double)));
    for (int i = 0; i < a->n_region; i++) bound_merits(&s, &a->region[i], bound[i]);
    scan_all(&s, (const utw_merits *)bound);
    st = UTW_OK;
done:
    utw_free(bound);
    utw_free(s.sigma);
    utw_free(s.tx);
    utw_free(s.ty);
    if (st != UTW_OK) utw_scan_clear(scan);
    return st;
}

void utw_scan_clear(utw_scan *scan)
{
    utw_free(scan->best);
    scan->best = NULL;
}
