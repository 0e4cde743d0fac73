/* SPDX-License-Identifier: GPL-3.0-or-later
 * Local searches along sides, on circles and inside elements. */
#include "section/search.h"

#include <math.h>

#include "base/vec2.h"

/* What is known while a region is searched. */
typedef struct hunt {
    const utw_search *search;
    double weight; /* merits are times this: 1, or 1/yield^2 */
    int n;         /* samples of a side */
    double sigma[UTW_SAMPLES_MAX], tx[UTW_SAMPLES_MAX],
        ty[UTW_SAMPLES_MAX];  /* and their stresses */
    utw_unit_element element; /* of the last evaluation by functions */
    utw_place place;          /* the best so far */
    double merit;
} hunt;

static double merit_of(const hunt *h, double sigma, double tx, double ty)
{
    return h->weight * utw_merit(h->search->kind, sigma, tx * tx + ty * ty);
}

/* The merit at a place, by the element's functions. */
static double merit_at(hunt *h, const utw_place *at)
{
    const utw_search *s = h->search;
    const utw_stress_case *c = s->stress_case;
    if (h->element.unit == NULL || h->element.element.tri != at->tri)
        utw_unit_element_of(&s->stress->unit, at->tri, &h->element);
    utw_unit_point p;
    utw_unit_point_at(&h->element, at->r, at->s, &p);
    double tau[2];
    for (int d = 0; d < 2; d++) {
        tau[d] = 0;
        for (int k = 0; k < UTW_N_UNIT; k++)
            tau[d] += c->t[k] * 0.5 * (p.tau[UTW_BY_POTENTIAL][k][d] + p.tau[UTW_BY_FLUX][k][d]);
    }
    return merit_of(h, c->one + c->x * p.xy[0] + c->y * p.xy[1] + c->omega * p.omega, tau[0],
                    tau[1]);
}

/* Take a place when it is better and allowed. */
static void offer(hunt *h, const utw_place *at, double merit)
{
    if (!(merit > h->merit)) return;
    const utw_search *s = h->search;
    if (s->stress_case->sheared && !s->region->kept_out &&
        utw_keep_out_holds(&s->stress->keep_out, at->xy))
        return;
    h->merit = merit;
    h->place = *at;
}

/* ---- along a line -------------------------------------------------------------------------- */

/* On a side: the polynomial through its Chebyshev-Lobatto samples in barycentric form (Berrut and
 * Trefethen, SIAM Review 46 (2004) 501-517); of higher degree than the stresses of a straight
 * element, and to rounding on curved ones. */
static double along_side(const hunt *h, double u)
{
    const utw_search *s = h->search;
    const double *at = s->stress->samples.along + s->region->first;
    double sum = 0, sigma = 0, tx = 0, ty = 0;
    for (int i = 0; i < h->n; i++) {
        const double d = u - at[i];
        if (d == 0) return merit_of(h, h->sigma[i], h->tx[i], h->ty[i]);
        const double w = (i % 2 == 0 ? 1 : -1) * (i == 0 || i == h->n - 1 ? 0.5 : 1) / d;
        sum += w;
        sigma += w * h->sigma[i];
        tx += w * h->tx[i];
        ty += w * h->ty[i];
    }
    return merit_of(h, sigma / sum, tx / sum, ty / sum);
}

static double on_circle(hunt *h, double angle)
{
    const utw_stress *f = h->search->stress;
    const int i = h->search->region->which;
    const double radius = f->keep_out.radius[i];
    const double xy[2] = {f->keep_out.centre[i][0] + radius * cos(angle),
                          f->keep_out.centre[i][1] + radius * sin(angle)};
    utw_place at;
    if (!utw_locate(f->locator, xy, &at)) return -UTW_INFINITY;
    const double merit = merit_at(h, &at);
    offer(h, &at, merit);
    return merit;
}

static double on_line(hunt *h, double u)
{
    if (h->search->region->kind == UTW_ON_CIRCLE) return on_circle(h, u);
    if (h->n > 0) return along_side(h, u);
    utw_place at; /* a side of which a part lies in a circle */
    utw_place_on_side(h->search->stress->unit.solution->solved.mesh, h->search->region->tri,
                      h->search->region->which, u, &at);
    const double merit = merit_at(h, &at);
    offer(h, &at, merit);
    return merit;
}

/* The parabola through three points of a search has its top at x + p/q; 0 when it is of no use. */
static int parabola(const double x[3], const double f[3], double a, double b, double before,
                    double *step)
{
    const double r = (x[0] - x[1]) * (f[0] - f[2]), t = (x[0] - x[2]) * (f[0] - f[1]);
    double p = (x[0] - x[2]) * t - (x[0] - x[1]) * r, q = 2 * (t - r);
    p = q > 0 ? -p : p;
    q = fabs(q);
    if (!isfinite(p) || q == 0 || fabs(p) >= fabs(0.5 * q * before)) return 0;
    *step = p / q;
    return x[0] + *step > a && x[0] + *step < b;
}

/* Brent's search for a maximum in [a, b] from x: parabolas through the three best points x[],
 * golden sections when they do not serve. Stops at a thousandth of the interval: the value there is
 * off by about its square. Returns the place. */
static double search_line(hunt *h, double a, double b, double start)
{
    const double golden = 0.3819660112501051, near = 1e-3 * (b - a);
    double x[3] = {start, start, start}, f[3], step = 0, before = 0;
    f[0] = f[1] = f[2] = on_line(h, start);
    for (int i = 0; i < 20; i++) {
        const double middle = 0.5 * (a + b);
        if (fabs(x[0] - middle) + 0.5 * (b - a) <= 2 * near) break;
        double next;
        if (fabs(before) > near && parabola(x, f, a, b, before, &next)) {
            before = step;
            step = next;
            if (x[0] + step - a < near || b - (x[0] + step) < near)
                step = x[0] < middle ? near : -near;
        } else {
            before = x[0] < middle ? b - x[0] : a - x[0];
            step = golden * before;
        }
        const double u = x[0] + (fabs(step) >= near ? step : step > 0 ? near : -near);
        const double fu = on_line(h, u);
        const int better = fu >= f[0];
        const double bound =
            better ? x[0] : u; /* the maximum lies on the better one's side of it */
        if (better == (u < x[0]))
            b = bound;
        else
            a = bound;
        const int place = better ? 0 : fu >= f[1] || x[1] == x[0] ? 1 : 2;
        if (place == 2 && fu < f[2] && x[2] != x[0] && x[2] != x[1]) continue;
        for (int k = 2; k > place; k--) x[k] = x[k - 1], f[k] = f[k - 1];
        x[place] = u;
        f[place] = fu;
    }
    return x[0];
}

static void search_side(hunt *h, int best)
{
    const utw_search *s = h->search;
    const utw_samples *a = &s->stress->samples;
    const int first = s->region->first, n = s->region->n;
    const double u = a->along[best];
    double reach[2] = {u, u}; /* the neighbours */
    if (best > first) reach[0] = a->along[best - 1];
    if (best < first + n - 1) reach[1] = a->along[best + 1];
    if (s->region->whole) {
        h->n = n;
        utw_scan_stresses(a, s->stress_case, first, n, h->sigma, h->tx, h->ty);
    }
    const double found = search_line(h, reach[0], reach[1], u);
    if (h->n == 0) return;
    utw_place at;
    utw_place_on_side(s->stress->unit.solution->solved.mesh, s->region->tri, s->region->which,
                      found, &at);
    offer(h, &at, along_side(h, found));
}

/* ---- inside an element --------------------------------------------------------------------- */

static double at_point(hunt *h, double r, double s)
{
    const utw_place at = {h->search->region->tri, r, s, {0, 0}};
    return merit_at(h, &at);
}

/* Where a quadratic model through six points about (r, s) is greatest, within two steps, in the
 * element. Model points may lie a little outside. 0 when there is no direction. */
static int model_step(hunt *h, double r, double s, double f, double step, double to[2])
{
    const double side = r + s + 2 * step > 1 ? -1 : 1;
    const double e = at_point(h, r + step, s), w = at_point(h, r - step, s),
                 n = at_point(h, r, s + step), o = at_point(h, r, s - step),
                 d = at_point(h, r + side * step, s + side * step);
    const double h2 = step * step, gr = (e - w) / (2 * step), gs = (n - o) / (2 * step);
    const double rr = (e - 2 * f + w) / h2, ss = (n - 2 * f + o) / h2;
    const double rs = (d - f - side * step * (gr + gs) - 0.5 * h2 * (rr + ss)) / h2;
    const double det = rr * ss - rs * rs;
    const int peak = rr < 0 && det > 0;
    double dr = gr, ds = gs; /* uphill, when the model has no peak */
    if (peak) {
        dr = -(ss * gr - rs * gs) / det;
        ds = -(rr * gs - rs * gr) / det;
    }
    const double length = hypot(dr, ds);
    if (!isfinite(length) || length == 0) return 0;
    const double factor = length > 2 * step || !peak ? 2 * step / length : 1;
    const double r1 = fmax(r + factor * dr, 0), s1 = fmax(s + factor * ds, 0);
    const double over = fmax(1, r1 + s1);
    to[0] = r1 / over;
    to[1] = s1 / over;
    return 1;
}

static void search_inside(hunt *h, double step)
{
    for (int i = 0; i < 3; i++, step *= 0.25) {
        double to[2];
        if (!model_step(h, h->place.r, h->place.s, h->merit, step, to)) return;
        utw_place at = {h->search->region->tri, to[0], to[1], {0, 0}};
        double J[4];
        const double merit = merit_at(h, &at), before = h->merit;
        utw_blend_at(&h->element.element.blend, at.r, at.s, at.xy, J);
        offer(h, &at, merit);
        if (i > 0 && h->merit - before <= 1e-7 * fabs(before)) return;
    }
}

/* The side of the section's boundary next to which a lattice point of an element stands: its own
 * search covers the neighbourhood. */
static int beside_boundary(const hunt *h, double step)
{
    const utw_mesh *mesh = h->search->stress->unit.solution->solved.mesh;
    const utw_triangle *t = &mesh->tri[h->place.tri];
    const double l[3] = {1 - h->place.r - h->place.s, h->place.r, h->place.s};
    for (int k = 0; k < 3; k++)
        if (mesh->edge[t->side[k]].tri[1] < 0 && l[(k + 2) % 3] < 0.5 * step) return 1;
    return 0;
}

/* ---- one region ---------------------------------------------------------------------------- */

/* Best sample into h; returns its index, or -1 when all samples are alike and nothing can be
 * gained. */
static int best_sample(hunt *h)
{
    const utw_search *s = h->search;
    const utw_samples *a = &s->stress->samples;
    double low = UTW_INFINITY;
    int best = s->region->first;
    for (int i = s->region->first; i < s->region->first + s->region->n; i++) {
        double sigma, tx, ty;
        utw_scan_stresses(a, s->stress_case, i, 1, &sigma, &tx, &ty);
        const double m = merit_of(h, sigma, tx, ty);
        low = fmin(low, m);
        if (m <= h->merit) continue;
        h->merit = m;
        best = i;
    }
    h->place = (utw_place){a->tri[best], a->at[best][0], a->at[best][1], {a->x[best], a->y[best]}};
    return h->merit - low > 1e-9 * fabs(h->merit) ? best : -1;
}

double utw_search_region(const utw_search *search, utw_place *place)
{
    hunt h = {.search = search, .weight = 1, .merit = -UTW_INFINITY};
    const utw_region *region = search->region;
    if (search->kind == UTW_UTILISATION) {
        const double yield = utw_region_yield(search->stress, region);
        h.weight = 1 / (yield * yield);
    }
    const int best = best_sample(&h);
    const double along = best < 0 ? 0 : search->stress->samples.along[best];
    const double spacing =
        utw_samples_spacing(region, search->stress->unit.solution->solved.field, h.place.tri);
    if (best >= 0 && region->kind == UTW_ALONG_SIDE)
        search_side(&h, best);
    else if (best >= 0 && region->kind == UTW_ON_CIRCLE)
        search_line(&h, along - spacing, along + spacing, along);
    else if (best >= 0 && !beside_boundary(&h, spacing))
        search_inside(&h, 0.7 * spacing);
    *place = h.place;
    return h.merit;
}
