/* SPDX-License-Identifier: GPL-3.0-or-later
 * Walking along contours and boundaries.
 *
 * In every triangle that the level crosses, its line runs from one side to another with the higher
 * values on its left; the boundary runs with the part on its left. Walking along a line, then along
 * the boundary while the values are high, then along the next line, closes a region. */
#include "draw/contour.h"

#include <math.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "draw/simplify.h"

void utw_paths_clear(utw_paths *p)
{
    utw_free(p->first);
    utw_free(p->closed);
    utw_free(p->xy);
    memset(p, 0, sizeof *p);
}

int utw_paths_end(const utw_paths *p, int k)
{
    return k + 1 < p->n_path ? p->first[k + 1] : p->n_point;
}

typedef struct walker {
    const utw_sampling *s;
    const double *value;
    double level, tolerance;
    int *next;              /* [n_edge] edge where the line that starts on an edge leads, or -1 */
    unsigned char *seen;    /* [n_edge] 1: the line from here was walked */
    unsigned char *entered; /* [n_edge] 1: a line ends here */
} walker;

static int is_high(const walker *w, int vertex)
{
    return w->value[vertex] >= w->level;
}

/* The line through every triangle. With one high vertex i it runs from side i to side i+2; with one
 * low vertex i the other way. */
static void link_lines(walker *w)
{
    const utw_sampling *s = w->s;
    for (int e = 0; e < s->n_edge; e++) w->next[e] = -1;
    for (int t = 0; t < s->n_tri; t++) {
        const int *v = s->tri[t];
        const int high[3] = {is_high(w, v[0]), is_high(w, v[1]), is_high(w, v[2])};
        const int n = high[0] + high[1] + high[2];
        if (n == 0 || n == 3) continue;
        int i = 0;
        while (high[i] != (n == 1)) i++;
        const int a = s->side[t][i], b = s->side[t][(i + 2) % 3];
        w->next[n == 1 ? a : b] = n == 1 ? b : a;
        w->entered[n == 1 ? b : a] = 1;
    }
}

/* Where the level lies on an edge. */
static void crossing(const walker *w, int edge, double xy[2])
{
    const int a = w->s->edge[edge][0], b = w->s->edge[edge][1];
    const double va = w->value[a], vb = w->value[b];
    const double t = fmin(fmax((w->level - va) / (vb - va), 0), 1);
    for (int d = 0; d < 2; d++) xy[d] = w->s->xy[a][d] + t * (w->s->xy[b][d] - w->s->xy[a][d]);
}

static utw_status add_point(utw_paths *p, const double xy[2], utw_error *err)
{
    void *block = p->xy;
    if (utw_grow(&block, &p->point_capacity, (size_t)p->n_point + 1, sizeof *p->xy) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    p->xy = block;
    memcpy(p->xy[p->n_point++], xy, sizeof *p->xy);
    return UTW_OK;
}

static utw_status begin(utw_paths *p, int closed, utw_error *err)
{
    void *block = p->first;
    if (utw_grow(&block, &p->path_capacity, (size_t)p->n_path + 1, sizeof *p->first) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    p->first = block;
    block = p->closed;
    if (utw_grow(&block, &p->closed_capacity, (size_t)p->n_path + 1, 1) != 0)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    p->closed = block;
    p->first[p->n_path] = p->n_point;
    p->closed[p->n_path++] = (unsigned char)closed;
    return UTW_OK;
}

/* Drop points of the path just finished. */
static void finish(utw_paths *p, double tolerance)
{
    const int first = p->first[p->n_path - 1];
    p->n_point = first + utw_simplify(p->n_point - first, p->xy + first, p->closed[p->n_path - 1],
                                      tolerance);
}

static utw_status add_crossing(const walker *w, utw_paths *p, int edge, utw_error *err)
{
    double xy[2];
    crossing(w, edge, xy);
    return add_point(p, xy, err);
}

/* A line from an edge to its end, or round to the edge again. */
static utw_status walk_line(walker *w, int start, utw_paths *line, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int e = start;
    UTW_TRY(begin(line, w->entered[start], err));
    do {
        UTW_TRY(add_crossing(w, line, e, err));
        w->seen[e] = 1;
        e = w->next[e];
    } while (w->next[e] >= 0 && e != start);
    if (e != start) UTW_TRY(add_crossing(w, line, e, err));
    finish(line, w->tolerance);
    st = UTW_OK;
done:
    return st;
}

/* Lines that begin on the boundary first: what is left are rings. */
static utw_status walk_lines(walker *w, utw_paths *line, utw_error *err)
{
    memset(w->seen, 0, (size_t)w->s->n_edge);
    for (int rings = 0; rings <= 1; rings++)
        for (int e = 0; e < w->s->n_edge; e++) {
            if (w->next[e] < 0 || w->seen[e] || (w->entered[e] && !rings)) continue;
            const utw_status st = walk_line(w, e, line, err);
            if (st != UTW_OK) return st;
        }
    return UTW_OK;
}

/* The boundary of a region from the line that begins on edge `start`. */
static utw_status walk_region(walker *w, int start, unsigned char *rim_seen, utw_paths *region,
                              utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_sampling *s = w->s;
    int e = start;
    UTW_TRY(begin(region, 1, err));
    do {
        UTW_TRY(add_crossing(w, region, e, err));
        w->seen[e] = 1;
        if (w->next[e] >= 0) {
            e = w->next[e];
            continue;
        }
        /* the line has reached the boundary: on it up to where the values fall below the level */
        int r = s->rim_of_edge[e];
        do {
            UTW_TRY(add_point(region, s->xy[s->rim[r][1]], err));
            r = s->rim_next[r];
            rim_seen[r] = 1;
        } while (is_high(w, s->rim[r][1]));
        e = s->rim_edge[r];
    } while (e != start);
    finish(region, w->tolerance);
    st = UTW_OK;
done:
    return st;
}

/* A loop of the boundary along which all values are high. */
static utw_status walk_rim(walker *w, int start, unsigned char *rim_seen, utw_paths *region,
                           utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    int r = start, high = 1;
    do {
        high &= is_high(w, w->s->rim[r][0]);
        rim_seen[r] = 1;
        r = w->s->rim_next[r];
    } while (r != start);
    if (!high) return UTW_OK;
    UTW_TRY(begin(region, 1, err));
    do {
        UTW_TRY(add_point(region, w->s->xy[w->s->rim[r][0]], err));
        r = w->s->rim_next[r];
    } while (r != start);
    finish(region, w->tolerance);
    st = UTW_OK;
done:
    return st;
}

static utw_status walk_regions(walker *w, utw_paths *region, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    unsigned char *rim_seen = NULL;
    UTW_TRY_ALLOC(rim_seen = utw_alloc((size_t)w->s->n_rim, 1));
    memset(w->seen, 0, (size_t)w->s->n_edge);
    for (int e = 0; e < w->s->n_edge; e++)
        if (w->next[e] >= 0 && !w->seen[e]) UTW_TRY(walk_region(w, e, rim_seen, region, err));
    for (int r = 0; r < w->s->n_rim; r++)
        if (!rim_seen[r]) UTW_TRY(walk_rim(w, r, rim_seen, region, err));
    st = UTW_OK;
done:
    utw_free(rim_seen);
    return st;
}

utw_status utw_contour(const utw_sampling *s, const double *value, double level, double tolerance,
                       utw_paths *region, utw_paths *line, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    walker w = {s, value, level, tolerance, NULL, NULL, NULL};
    UTW_TRY_ALLOC(w.next = utw_alloc((size_t)s->n_edge, sizeof *w.next));
    UTW_TRY_ALLOC(w.seen = utw_alloc((size_t)s->n_edge, 1));
    UTW_TRY_ALLOC(w.entered = utw_alloc((size_t)s->n_edge, 1));
    link_lines(&w);
    if (region != NULL) UTW_TRY(walk_regions(&w, region, err));
    if (line != NULL) UTW_TRY(walk_lines(&w, line, err));
    st = UTW_OK;
done:
    utw_free(w.next);
    utw_free(w.seen);
    utw_free(w.entered);
    return st;
}
