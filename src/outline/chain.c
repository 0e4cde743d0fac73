/* SPDX-License-Identifier: GPL-3.0-or-later
 * Edges between vertices, joined to a loop. */
#include "outline/chain.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

/* Points closer than this share of the loop's size are one point. */
static const double SAME = 1e-12;
static const double LEAST_BULGE = 1e-6, GREATEST_BULGE = 60; /* 356 degrees */

typedef struct chain {
    const utw_vertex *vertex;
    int n;
    double same; /* distance of one point from itself [L] */
    utw_curve *curve;
    int *owner; /* vertex of each curve */
    size_t n_curve, curve_capacity, owner_capacity;
    utw_error *err;
} chain;

static utw_status at_vertex(chain *c, int k, utw_status st)
{
    utw_error_place(c->err, -1, -1, k);
    return st;
}

#define FAIL(c, k, ...) at_vertex(c, k, utw_fail((c)->err, UTW_E_OUTLINE, __VA_ARGS__))

static int previous(const chain *c, int k)
{
    return k > 0 ? k - 1 : c->n - 1;
}

static utw_status add(chain *c, int owner, utw_curve curve)
{
    if (utw_grow((void **)&c->curve, &c->curve_capacity, c->n_curve + 1, sizeof *c->curve) != 0 ||
        utw_grow((void **)&c->owner, &c->owner_capacity, c->n_curve + 1, sizeof *c->owner) != 0)
        return utw_fail(c->err, UTW_E_NOMEM, "out of memory (%zu curves)", c->n_curve);
    c->curve[c->n_curve] = curve;
    c->owner[c->n_curve++] = owner;
    return UTW_OK;
}

static utw_status add_bulge(chain *c, int k, const double from[2], const utw_vertex *v)
{
    const double b = v->bulge, size = fabs(b);
    if (b == 0) return FAIL(c, k, "a \"bulge\" of 0 is a straight edge; leave it out");
    if (size < LEAST_BULGE)
        return FAIL(
            c, k,
            "a \"bulge\" of %g is a straight edge within a millionth of its length; leave it out",
            b);
    if (size > GREATEST_BULGE)
        return FAIL(
            c, k,
            "a \"bulge\" of %g turns through %.1f degrees, which is nearly the whole circle; "
            "\"bulge\" is the tangent of a quarter of the arc's angle, 1 for a semicircle",
            b, 4 * atan(size) * 180 / UTW_PI);
    /* The centre lies to the left of the chord by chord (1 - b^2)/(4 b): elementary, with b =
     * tan(angle/4). */
    const double chord[2] = {v->at[0] - from[0], v->at[1] - from[1]}, h = (1 - b * b) / (4 * b);
    const double centre[2] = {from[0] + chord[0] / 2 - h * chord[1],
                              from[1] + chord[1] / 2 + h * chord[0]};
    const double radius = utw_norm(chord) * (1 + b * b) / (4 * size);
    const double a0 = atan2(from[1] - centre[1], from[0] - centre[0]);
    return add(c, k, utw_curve_arc(centre, radius, a0, a0 + 4 * atan(b), from, v->at));
}

static utw_status add_edge(chain *c, int k)
{
    const utw_vertex *v = &c->vertex[k];
    const double *from = c->vertex[previous(c, k)].at;
    utw_curve curve;
    const int closed =
        utw_distance(from, v->at) <= c->same; /* a smooth curve may leave a vertex and come back */
    if (closed && v->join != UTW_JOIN_BEZIER) {
        if (c->n == 1)
            return FAIL(c, k,
                        "one vertex makes no loop; for a circle write {\"circle\": [xc, yc, r]}");
        return FAIL(c, k, "(%g, %g) is the same point as vertex %d; remove one of them", v->at[0],
                    v->at[1], previous(c, k) + 1);
    }
    switch (v->join) {
    case UTW_JOIN_LINE:
        return add(c, k, utw_curve_line(from, v->at));
    case UTW_JOIN_BULGE:
        return add_bulge(c, k, from, v);
    case UTW_JOIN_BEZIER:
        return add(c, k, utw_curve_cubic(from, v->point[0], v->point[1], v->at));
    case UTW_JOIN_ARC:
        break;
    }
    if (utw_curve_arc_through(from, v->point[0], v->at, &curve) != 0)
        return FAIL(c, k,
                    "the arc from (%g, %g) through (%g, %g) to (%g, %g) is none: the three points "
                    "lie in line or coincide; "
                    "move the point of \"arc\", or leave it out for a straight edge",
                    from[0], from[1], v->point[0][0], v->point[0][1], v->at[0], v->at[1]);
    return add(c, k, curve);
}

/* Checks that need all vertices at once. */
static utw_status check_vertices(chain *c)
{
    const utw_vertex *v = c->vertex;
    int curved = 0;
    double size = 0;
    for (int k = 0; k < c->n; k++) {
        curved += v[k].join != UTW_JOIN_LINE;
        size = fmax(size, fmax(fabs(v[k].at[0] - v[0].at[0]), fabs(v[k].at[1] - v[0].at[1])));
    }
    c->same = SAME * size;
    if (c->n < 3 && curved == 0)
        return FAIL(
            c, -1,
            "the loop has %d %s; at least three are needed, or two when one of the edges is curved",
            c->n, c->n == 1 ? "vertex" : "vertices");
    const int last = c->n - 1;
    if (last > 0 && utw_distance(v[0].at, v[last].at) <= c->same) {
        if (v[last].join != UTW_JOIN_LINE)
            return FAIL(c, last,
                        "the last vertex repeats the first; the loop closes by itself: give its "
                        "curve to vertex 1 and remove it");
        return FAIL(
            c, last,
            "the last vertex repeats the first; the loop closes by itself: remove the last vertex");
    }
    return UTW_OK;
}

utw_status utw_chain_loop(const utw_vertex *vertex, int n, utw_loop *loop, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    chain c = {.vertex = vertex, .n = n, .err = err};
    if (n < 1) {
        st = FAIL(&c, -1, "the loop has no vertices; at least three are needed");
        goto done;
    }
    UTW_TRY(check_vertices(&c));
    for (int k = 0; k < n; k++) UTW_TRY(add_edge(&c, k));
    *loop = (utw_loop){.n = (int)c.n_curve, .curve = c.curve, .vertex = c.owner};
    c.curve = NULL;
    c.owner = NULL;
    st = UTW_OK;
done:
    utw_free(c.curve);
    utw_free(c.owner);
    return st;
}
