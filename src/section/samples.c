/* SPDX-License-Identifier: GPL-3.0-or-later
 * Spreading samples over sides, elements and circles. */
#include "section/samples.h"

#include <math.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

enum { CIRCLE_SAMPLES = 96 };

/* Functions of one order at the lattice inside the triangle. */
typedef struct lattice {
    int n_point, n_function;
    double *r, *s, *N, *Nr, *Ns; /* [n_point], the last three [n_point][n_function] */
} lattice;

typedef struct sampler {
    const utw_unit_stress *unit;
    const utw_locator *locator;
    const utw_keep_out *keep_out;
    utw_samples *samples;
    lattice lattice[UTW_ORDER_MAX + 1];
} sampler;

void utw_samples_clear(utw_samples *s)
{
    utw_free(s->region);
    utw_free(s->x);
    utw_free(s->y);
    utw_free(s->omega);
    for (int k = 0; k < UTW_N_UNIT; k++)
        for (int d = 0; d < 2; d++) utw_free(s->tau[k][d]);
    utw_free(s->tri);
    utw_free(s->at);
    utw_free(s->apart);
    utw_free(s->along);
    memset(s, 0, sizeof *s);
}

static int lattice_side(int top)
{
    return top + 1;
}

double utw_samples_spacing(const utw_region *region, const utw_field *field, int tri)
{
    if (region->kind == UTW_ON_CIRCLE) return 2 * UTW_PI / CIRCLE_SAMPLES;
    utw_element element;
    utw_field_element(field, tri, &element);
    return 1.0 / lattice_side(element.top);
}

static utw_status grow(utw_samples *s, int more, utw_error *err)
{
    const size_t needed = (size_t)(s->n + more);
    if (needed <= s->capacity) return UTW_OK;
    double **list[9] = {&s->x,         &s->y,         &s->omega,     &s->tau[0][0], &s->tau[0][1],
                        &s->tau[1][0], &s->tau[1][1], &s->tau[2][0], &s->tau[2][1]};
    const size_t room = 2 * needed;
    void *p;
    for (int i = 0; i < 9; i++) {
        if ((p = utw_realloc(*list[i], room, sizeof(double))) == NULL) goto out_of_memory;
        *list[i] = p;
    }
    if ((p = utw_realloc(s->along, room, sizeof(double))) == NULL) goto out_of_memory;
    s->along = p;
    if ((p = utw_realloc(s->tri, room, sizeof(int))) == NULL) goto out_of_memory;
    s->tri = p;
    if ((p = utw_realloc(s->at, room, sizeof *s->at)) == NULL) goto out_of_memory;
    s->at = p;
    s->capacity = room;
    return UTW_OK;
out_of_memory:
    return utw_fail(err, UTW_E_NOMEM, "out of memory (%d samples)", s->n + more);
}

static void add_sample(utw_samples *s, int tri, double r, double q, double along,
                       const utw_unit_point *p)
{
    const int i = s->n++;
    s->x[i] = p->xy[0];
    s->y[i] = p->xy[1];
    s->omega[i] = p->omega;
    for (int k = 0; k < UTW_N_UNIT; k++)
        for (int d = 0; d < 2; d++)
            s->tau[k][d][i] = 0.5 * (p->tau[UTW_BY_POTENTIAL][k][d] + p->tau[UTW_BY_FLUX][k][d]);
    s->tri[i] = tri;
    s->at[i][0] = r;
    s->at[i][1] = q;
    s->along[i] = along;
}

_Static_assert(UTW_N_UNIT == 3, "as many unit fields as coordinates of a region's box");

/* The bounds of a region's samples. */
static void bound_region(const utw_samples *s, utw_region *region)
{
    const double *list[3] = {s->x, s->y, s->omega};
    for (int k = 0; k < 3; k++) {
        region->low[k] = UTW_INFINITY;
        region->high[k] = -UTW_INFINITY;
        region->most[k] = 0;
        for (int i = region->first; i < region->first + region->n; i++) {
            region->low[k] = fmin(region->low[k], list[k][i]);
            region->high[k] = fmax(region->high[k], list[k][i]);
            region->most[k] = fmax(region->most[k], hypot(s->tau[k][0][i], s->tau[k][1][i]));
        }
    }
}

static utw_status close_region(utw_samples *s, utw_region region, utw_error *err)
{
    region.n = s->n - region.first;
    if (region.n == 0) return UTW_OK;
    bound_region(s, &region);
    void *list = s->region;
    if (utw_grow(&list, &s->region_capacity, (size_t)s->n_region + 1, sizeof *s->region) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (regions)");
    s->region = list;
    s->region[s->n_region++] = region;
    return UTW_OK;
}

/* A row of points as one region, or as two when some lie in a circle around a sharp corner. */
typedef struct point_row {
    int n;
    double r[UTW_FUNCTIONS_MAX], s[UTW_FUNCTIONS_MAX], along[UTW_FUNCTIONS_MAX];
    utw_unit_point point[UTW_FUNCTIONS_MAX];
} point_row;

static utw_status add_row(sampler *a, utw_region region, const point_row *row, utw_error *err)
{
    utw_status st = grow(a->samples, row->n, err);
    for (int kept_out = 0; kept_out < 2 && st == UTW_OK; kept_out++) {
        region.first = a->samples->n;
        region.kept_out = kept_out;
        for (int i = 0; i < row->n; i++)
            if (utw_keep_out_holds(a->keep_out, row->point[i].xy) == kept_out)
                add_sample(a->samples, region.tri, row->r[i], row->s[i], row->along[i],
                           &row->point[i]);
        region.whole = a->samples->n - region.first == row->n;
        st = close_region(a->samples, region, err);
        if (a->keep_out->n == 0) break;
    }
    return st;
}

static utw_status add_side(sampler *a, const utw_unit_element *e, int k, point_row *row,
                           utw_error *err)
{
    static const double corner[3][2] = {{0, 0}, {1, 0}, {0, 1}};
    const double *from = corner[k], *to = corner[(k + 1) % 3];
    const int m = UTW_SAMPLES_PER_ORDER * e->element.top;
    row->n = m + 1;
    for (int i = 0; i <= m; i++) {
        const double u = i == m ? 1 : 0.5 * (1 - cos(UTW_PI * i / m));
        row->along[i] = u;
        row->r[i] = from[0] + u * (to[0] - from[0]);
        row->s[i] = from[1] + u * (to[1] - from[1]);
        utw_unit_point_at(e, row->r[i], row->s[i], &row->point[i]);
    }
    return add_row(a, (utw_region){.kind = UTW_ALONG_SIDE, .tri = e->element.tri, .which = k}, row,
                   err);
}

static void lattice_clear(lattice *l)
{
    utw_free(l->r);
    utw_free(l->s);
    utw_free(l->N);
    utw_free(l->Nr);
    utw_free(l->Ns);
}

/* Points (i + 1/3)/n, (j + 1/3)/n: even, and none on a side. */
static utw_status lattice_init(lattice *l, int top, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const int n = lattice_side(top);
    const size_t points = (size_t)(n * (n + 1) / 2), functions = (size_t)utw_n_functions(top);
    UTW_TRY_ALLOC(l->r = utw_alloc(points, sizeof(double)));
    UTW_TRY_ALLOC(l->s = utw_alloc(points, sizeof(double)));
    UTW_TRY_ALLOC(l->N = utw_alloc(points * functions, sizeof(double)));
    UTW_TRY_ALLOC(l->Nr = utw_alloc(points * functions, sizeof(double)));
    UTW_TRY_ALLOC(l->Ns = utw_alloc(points * functions, sizeof(double)));
    l->n_function = (int)functions;
    for (int i = 0; i < n; i++)
        for (int j = 0; i + j < n; j++) {
            const int k = l->n_point++;
            const size_t from = (size_t)k * functions;
            l->r[k] = (i + 1.0 / 3) / n;
            l->s[k] = (j + 1.0 / 3) / n;
            utw_basis(top, l->r[k], l->s[k], l->N + from, l->Nr + from, l->Ns + from);
        }
    st = UTW_OK;
done:
    return st;
}

static double square_between(const utw_unit_point *p, int k)
{
    const double *a = p->tau[UTW_BY_POTENTIAL][k], *b = p->tau[UTW_BY_FLUX][k];
    return (a[0] - b[0]) * (a[0] - b[0]) + (a[1] - b[1]) * (a[1] - b[1]);
}

static utw_status add_inside(sampler *a, const utw_unit_element *e, point_row *row, utw_error *err)
{
    lattice *l = &a->lattice[e->element.top];
    if (l->n_point == 0) {
        const utw_status st = lattice_init(l, e->element.top, err);
        if (st != UTW_OK) return st;
    }
    row->n = l->n_point;
    for (int i = 0; i < l->n_point; i++) {
        const int at = i * l->n_function;
        row->r[i] = l->r[i];
        row->s[i] = l->s[i];
        row->along[i] = 0;
        utw_unit_point_of(e, l->r[i], l->s[i], l->N + at, l->Nr + at, l->Ns + at, &row->point[i]);
    }
    for (int k = 0; k < UTW_N_UNIT; k++) {
        double sum = 0;
        for (int i = 0; i < row->n; i++) sum += square_between(&row->point[i], k);
        a->samples->apart[e->element.tri][k] = sqrt(sum / row->n);
    }
    return add_row(a, (utw_region){.kind = UTW_INSIDE, .tri = e->element.tri}, row, err);
}

static utw_status add_place(sampler *a, const utw_place *place, double angle, utw_error *err)
{
    utw_unit_element e;
    utw_unit_point p;
    const utw_status st = grow(a->samples, 1, err);
    if (st != UTW_OK || utw_keep_out_holds(a->keep_out, place->xy)) return st;
    utw_unit_element_of(a->unit, place->tri, &e);
    utw_unit_point_at(&e, place->r, place->s, &p);
    add_sample(a->samples, place->tri, place->r, place->s, angle, &p);
    return UTW_OK;
}

/* Where a circle crosses a side of the boundary: bisection between two samples on either side of
 * it. */
static utw_status add_crossings(sampler *a, int corner, int tri, int k, utw_error *err)
{
    const utw_mesh *mesh = a->unit->solution->solved.mesh;
    const double *c = a->keep_out->centre[corner], radius = a->keep_out->radius[corner];
    enum { N = 16 };
    utw_place place;
    double before = 0;
    for (int i = 0; i <= N; i++) {
        utw_place_on_side(mesh, tri, k, (double)i / N, &place);
        const double here = utw_distance(c, place.xy) - radius;
        if (i > 0 && (here >= 0) != (before >= 0)) {
            double out = (double)(before >= 0 ? i - 1 : i) / N,
                   in = (double)(before >= 0 ? i : i - 1) / N;
            for (int step = 0; step < 50; step++) {
                const double u = 0.5 * (out + in);
                utw_place_on_side(mesh, tri, k, u, &place);
                if (utw_distance(c, place.xy) >= radius)
                    out = u;
                else
                    in = u;
            }
            utw_place_on_side(mesh, tri, k, out, &place);
            const utw_status st =
                add_place(a, &place, atan2(place.xy[1] - c[1], place.xy[0] - c[0]), err);
            if (st != UTW_OK) return st;
        }
        before = here;
    }
    return UTW_OK;
}

static utw_status add_circle(sampler *a, int corner, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_mesh *mesh = a->unit->solution->solved.mesh;
    const double *c = a->keep_out->centre[corner], radius = a->keep_out->radius[corner];
    utw_region region = {.kind = UTW_ON_CIRCLE, .tri = -1, .which = corner, .first = a->samples->n};
    for (int i = 0; i < CIRCLE_SAMPLES; i++) {
        const double angle = 2 * UTW_PI * i / CIRCLE_SAMPLES;
        const double xy[2] = {c[0] + radius * cos(angle), c[1] + radius * sin(angle)};
        utw_place place;
        if (utw_locate(a->locator, xy, &place)) UTW_TRY(add_place(a, &place, angle, err));
    }
    for (int e = 0; e < mesh->n_edge; e++)
        if (mesh->edge[e].tri[1] < 0)
            UTW_TRY(add_crossings(a, corner, mesh->edge[e].tri[0], mesh->edge[e].slot[0], err));
    st = close_region(a->samples, region, err);
done:
    return st;
}

utw_status utw_samples_init(utw_samples *samples, const utw_unit_stress *unit,
                            const utw_locator *locator, const utw_keep_out *keep_out,
                            utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_mesh *mesh = unit->solution->solved.mesh;
    sampler a = {.unit = unit, .locator = locator, .keep_out = keep_out, .samples = samples};
    point_row *row = NULL;
    memset(samples, 0, sizeof *samples);
    UTW_TRY_ALLOC(row = utw_alloc(1, sizeof *row));
    UTW_TRY_ALLOC(samples->apart = utw_alloc((size_t)mesh->n_tri, sizeof *samples->apart));
    for (int t = 0; t < mesh->n_tri; t++) {
        utw_unit_element e;
        utw_unit_element_of(unit, t, &e);
        UTW_TRY(add_inside(&a, &e, row, err));
        for (int k = 0; k < 3; k++)
            if (mesh->edge[mesh->tri[t].side[k]].tri[1] < 0) UTW_TRY(add_side(&a, &e, k, row, err));
    }
    for (int i = 0; i < keep_out->n; i++) UTW_TRY(add_circle(&a, i, err));
    st = UTW_OK;
done:
    utw_free(row);
    for (int i = 0; i <= UTW_ORDER_MAX; i++) lattice_clear(&a.lattice[i]);
    if (st != UTW_OK) utw_samples_clear(samples);
    return st;
}
