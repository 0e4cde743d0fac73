/* SPDX-License-Identifier: GPL-3.0-or-later
 * Least of size plus growth times distance, by branch and bound over a tree of boxes. */
#include "mesh/sizes.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

/* A range of points: the box around them and the least size among them. */
typedef struct range {
    double lo[2], hi[2], least;
} range;

struct utw_sizes {
    int n;
    double growth;
    double (*xy)[2], *size; /* [n] as given: neighbours on the boundary are near in the plane */
    range *tree;            /* [2 n - 1], preorder: a range of k points has 2k - 1 nodes */
};

static void build(utw_sizes *s, int node, int i, int j)
{
    range *r = &s->tree[node];
    if (j - i == 1) {
        for (int k = 0; k < 2; k++) r->lo[k] = r->hi[k] = s->xy[i][k];
        r->least = s->size[i];
        return;
    }
    const int m = (i + j) / 2, second = node + 2 * (m - i);
    build(s, node + 1, i, m);
    build(s, second, m, j);
    const range *a = &s->tree[node + 1], *b = &s->tree[second];
    for (int k = 0; k < 2; k++) {
        r->lo[k] = fmin(a->lo[k], b->lo[k]);
        r->hi[k] = fmax(a->hi[k], b->hi[k]);
    }
    r->least = fmin(a->least, b->least);
}

utw_status utw_sizes_create(int n, const double (*xy)[2], const double *size, double growth,
                            utw_sizes **sizes, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_sizes *s;
    UTW_TRY_ALLOC(s = utw_alloc(1, sizeof *s));
    UTW_TRY_ALLOC(s->xy = utw_alloc((size_t)n, sizeof *s->xy));
    UTW_TRY_ALLOC(s->size = utw_alloc((size_t)n, sizeof *s->size));
    UTW_TRY_ALLOC(s->tree = utw_alloc(2 * (size_t)n, sizeof *s->tree));
    memcpy(s->xy, xy, (size_t)n * sizeof *xy);
    memcpy(s->size, size, (size_t)n * sizeof *size);
    s->n = n;
    s->growth = growth;
    build(s, 0, 0, n);
    *sizes = s;
    s = NULL;
    st = UTW_OK;
done:
    utw_sizes_free(s);
    return st;
}

void utw_sizes_free(utw_sizes *sizes)
{
    if (sizes == NULL) return;
    utw_free(sizes->xy);
    utw_free(sizes->size);
    utw_free(sizes->tree);
    utw_free(sizes);
}

/* No point of the range can give less than this. */
static double bound(const utw_sizes *s, int node, const double p[2])
{
    const range *r = &s->tree[node];
    double d[2];
    for (int k = 0; k < 2; k++) d[k] = fmax(0, fmax(r->lo[k] - p[k], p[k] - r->hi[k]));
    return r->least + s->growth * utw_norm(d);
}

static void descend(const utw_sizes *s, int node, int i, int j, const double p[2], double *best)
{
    if (j - i == 1) {
        *best = fmin(*best, bound(s, node, p));
        return;
    }
    const int m = (i + j) / 2, second = node + 2 * (m - i);
    const double a = bound(s, node + 1, p), b = bound(s, second, p);
    /* the more promising half first, so that the other one is more often left out */
    if (a <= b && a < *best) descend(s, node + 1, i, m, p, best);
    if (b < *best) descend(s, second, m, j, p, best);
    if (a > b && a < *best) descend(s, node + 1, i, m, p, best);
}

double utw_sizes_at(const utw_sizes *sizes, const double xy[2])
{
    double best = UTW_INFINITY;
    descend(sizes, 0, 0, sizes->n, xy, &best);
    return best;
}
