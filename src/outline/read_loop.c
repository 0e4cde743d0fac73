/* SPDX-License-Identifier: GPL-3.0-or-later
 * One loop of a section file: an array of vertices, a circle or an ellipse. */
#include <stdio.h>
#include <string.h>

#include "base/degrees.h"
#include "base/memory.h"
#include "base/vec2.h"
#include "outline/chain.h"
#include "outline/read.h"

/* The points of a join: one [x, y] for an arc, an array of them for curves. */
static utw_status read_join(utw_reader *r, const utw_json *value, const char *what, utw_vertex *v,
                            utw_join join)
{
    int n = 1;
    if (join != UTW_JOIN_ARC) {
        const utw_status st = utw_read_array(r, value, what, UTW_MOST_VERTICES, &n);
        if (st != UTW_OK) return st;
        if (join == UTW_JOIN_BEZIER && n != 2)
            return utw_fail(r->err, UTW_E_SYNTAX,
                            "%s must be two control points [[x, y], [x, y]]; it has %d", what, n);
        if (n == 0)
            return utw_fail(
                r->err, UTW_E_SYNTAX,
                "%s is empty; list the points between the two vertices, or leave it out", what);
    }
    v->join = join;
    utw_free(v->point); /* of another join; read_vertex() refuses two */
    v->point = utw_alloc((size_t)n, sizeof *v->point);
    if (v->point == NULL) return utw_fail(r->err, UTW_E_NOMEM, "out of memory (%s)", what);
    v->n_point = n;
    if (join == UTW_JOIN_ARC) return utw_read_point(r, value, what, v->point[0]);
    int k = 0;
    for (const utw_json *m = utw_json_first(value); m != NULL; m = utw_json_next(m), k++) {
        char name[64];
        snprintf(name, sizeof name, "point %d of %s", k + 1, what);
        const utw_status st = utw_read_point(r, m, name, v->point[k]);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}

static utw_status read_arc(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    return read_join(r, value, what, target, UTW_JOIN_ARC);
}

static utw_status read_bezier(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    return read_join(r, value, what, target, UTW_JOIN_BEZIER);
}

static utw_status read_through(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    return read_join(r, value, what, target, UTW_JOIN_THROUGH);
}

static utw_status read_bulge(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_vertex *v = target;
    v->join = UTW_JOIN_BULGE;
    return utw_read_number(r, value, what, &v->bulge);
}

static utw_status read_round(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_vertex *v = target;
    v->corner = UTW_CORNER_ROUND;
    return utw_read_number(r, value, what, &v->size);
}

static utw_status read_chamfer(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_vertex *v = target;
    v->corner = UTW_CORNER_CHAMFER;
    return utw_read_number(r, value, what, &v->size);
}

static const utw_key vertex_key[] = {
    {"at", utw_read_point, offsetof(utw_vertex, at)},
    {"round", read_round, 0},
    {"chamfer", read_chamfer, 0},
    {"arc", read_arc, 0},
    {"bulge", read_bulge, 0},
    {"bezier", read_bezier, 0},
    {"through", read_through, 0},
};
enum {
    N_KEY = sizeof vertex_key / sizeof vertex_key[0],
    AT = 1,
    CORNERS = 0x06, /* round, chamfer */
    JOINS = 0x78    /* arc, bulge, bezier, through */
};

/* More than one bit is set. */
static int several(unsigned bits)
{
    return (bits & (bits - 1)) != 0;
}

static utw_status read_vertex(utw_reader *r, const utw_json *value, utw_vertex *v)
{
    if (utw_json_kind_of(value) == UTW_JSON_ARRAY)
        return utw_read_point(r, value, "the vertex", v->at);
    if (utw_json_kind_of(value) != UTW_JSON_OBJECT)
        return utw_fail(
            r->err, UTW_E_SYNTAX,
            "a vertex must be a point [x, y] or an object {\"at\": [x, y], ...}, not %s",
            utw_json_kind_text(value));
    unsigned given = 0;
    const utw_status st = utw_read_object(r, value, "the vertex", vertex_key, N_KEY, v, &given);
    if (st != UTW_OK) return st;
    if (!(given & AT))
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "\"at\" is missing; give the point [x, y] of the vertex");
    if (several(given & CORNERS))
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "a corner is rounded or cut, not both; keep one of \"round\", \"chamfer\"");
    if (several(given & JOINS))
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "the edge to this vertex is given in two ways; keep one of \"arc\", "
                        "\"bulge\", \"bezier\", \"through\"");
    return UTW_OK;
}

static utw_status read_vertices(utw_reader *r, const utw_json *value, const char *what,
                                utw_loop *loop)
{
    utw_status st = UTW_E_INTERNAL;
    utw_vertex *vertex = NULL;
    utw_error *err = r->err;
    int n = 0, k = 0;
    UTW_TRY(utw_read_array(r, value, what, UTW_MOST_VERTICES, &n));
    UTW_TRY_ALLOC(vertex = utw_alloc((size_t)n, sizeof *vertex));
    for (const utw_json *m = utw_json_first(value); m != NULL; m = utw_json_next(m)) {
        r->vertex = k;
        UTW_TRY(read_vertex(r, m, &vertex[k++]));
    }
    r->vertex = -1;
    st = utw_chain_loop(vertex, n, loop, err);
    if (st != UTW_OK) r->vertex = err->vertex;
done:
    for (int i = 0; vertex != NULL && i < n; i++) utw_free(vertex[i].point);
    utw_free(vertex);
    return st;
}

/* A loop of one closed curve. */
static utw_status close_loop(utw_reader *r, utw_curve curve, utw_loop *loop)
{
    for (int k = 0; k < 2; k++) curve.from[k] = curve.to[k] = curve.centre[k] + curve.u[k];
    if (loop->curve != NULL)
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "a loop is a circle or an ellipse, not both; remove one");
    utw_curve *c = utw_alloc(1, sizeof *c);
    int *vertex = utw_alloc(1, sizeof *vertex);
    if (c == NULL || vertex == NULL) {
        utw_free(c);
        utw_free(vertex);
        return utw_fail(r->err, UTW_E_NOMEM, "out of memory (loop)");
    }
    *c = curve;
    *loop = (utw_loop){.n = 1, .curve = c, .vertex = vertex};
    return UTW_OK;
}

static utw_status read_circle(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    double c[3];
    int n;
    const utw_status st = utw_read_numbers(r, value, what, "[xc, yc, r]", 3, 3, c, &n);
    if (st != UTW_OK) return st;
    if (!(c[2] > 0))
        return utw_fail(r->err, UTW_E_OUTLINE,
                        "the radius of the circle is %g; it must be greater than 0", c[2]);
    return close_loop(r, utw_curve_arc(c, c[2], 0, 2 * UTW_PI, c, c), target);
}

static utw_status read_ellipse(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    double e[5] = {0};
    int n;
    const utw_status st = utw_read_numbers(r, value, what, "[xc, yc, a, b, degrees]", 4, 5, e, &n);
    if (st != UTW_OK) return st;
    if (!(e[2] > 0 && e[3] > 0))
        return utw_fail(r->err, UTW_E_OUTLINE,
                        "the semi-axes of the ellipse are %g and %g; both must be greater than 0",
                        e[2], e[3]);
    const double cs = utw_cos_degrees(e[4]), sn = utw_sin_degrees(e[4]);
    utw_curve curve = utw_curve_arc(e, 1, 0, 2 * UTW_PI, e, e);
    curve.u[0] = e[2] * cs, curve.u[1] = e[2] * sn;
    curve.v[0] = -e[3] * sn, curve.v[1] = e[3] * cs;
    return close_loop(r, curve, target);
}

static const utw_key loop_key[] = {{"circle", read_circle, 0}, {"ellipse", read_ellipse, 0}};

utw_status utw_read_loop(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    if (utw_json_kind_of(value) == UTW_JSON_ARRAY) return read_vertices(r, value, what, target);
    if (utw_json_kind_of(value) != UTW_JSON_OBJECT)
        return utw_fail(
            r->err, UTW_E_SYNTAX,
            "%s must be an array of vertices, {\"circle\": ...} or {\"ellipse\": ...}, not %s",
            what, utw_json_kind_text(value));
    if (utw_json_first(value) == NULL)
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "%s is an empty object; it needs \"circle\" or \"ellipse\"", what);
    return utw_read_object(r, value, what, loop_key, 2, target, NULL);
}
