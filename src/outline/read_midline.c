/* SPDX-License-Identifier: GPL-3.0-or-later
 * "midline": nodes and walls with thickness, in place of "parts". */
#include <math.h>
#include <stdio.h>

#include "base/memory.h"
#include "outline/graph.h"
#include "outline/read.h"
#include "outline/thicken.h"

static utw_status read_nodes(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_midline *m = target;
    int n = 0, k = 0;
    const utw_status st = utw_read_array(r, value, what, UTW_GRAPH_MAX, &n);
    if (st != UTW_OK) return st;
    m->nodes = utw_alloc((size_t)n, sizeof *m->nodes);
    if (m->nodes == NULL) return utw_fail(r->err, UTW_E_NOMEM, "out of memory (%d nodes)", n);
    m->n_nodes = n;
    for (const utw_json *j = utw_json_first(value); j != NULL; j = utw_json_next(j)) {
        snprintf(r->subject, sizeof r->subject, "midline, node %d", k);
        const utw_status read = utw_read_point(r, j, "a node", m->nodes[k++]);
        if (read != UTW_OK) return read;
    }
    r->subject[0] = '\0';
    return UTW_OK;
}

/* The index of a node; whether there is such a node is found when all are known. */
static utw_status read_index(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    double number;
    const utw_status st = utw_read_number(r, value, what, &number);
    if (st != UTW_OK) return st;
    if (number != floor(number) || fabs(number) > 1e6)
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "%s must be the number of a node (the first is 0), not %g", what, number);
    *(int *)target = (int)number;
    return UTW_OK;
}

static utw_status read_thickness(utw_reader *r, const utw_json *value, const char *what,
                                 void *target)
{
    utw_wall *w = target;
    if (utw_json_kind_of(value) != UTW_JSON_ARRAY) {
        const utw_status st = utw_read_number(r, value, what, &w->t0);
        w->t1 = w->t0;
        return st;
    }
    double t[2];
    int n;
    const utw_status st = utw_read_numbers(
        r, value, what, "a thickness or [thickness at from, thickness at to]", 2, 2, t, &n);
    if (st != UTW_OK) return st;
    w->t0 = t[0];
    w->t1 = t[1];
    return UTW_OK;
}

static utw_status read_arc(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_wall *w = target;
    w->arc = 1;
    return utw_read_point(r, value, what, w->mid);
}

static const utw_key wall_key[] = {
    {"from", read_index, offsetof(utw_wall, from)},
    {"to", read_index, offsetof(utw_wall, to)},
    {"t", read_thickness, 0},
    {"arc", read_arc, 0},
};
enum { N_WALL_KEY = sizeof wall_key / sizeof wall_key[0], NEEDED = 7 };

static utw_status read_walls(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_midline *m = target;
    int n = 0;
    const utw_status st = utw_read_array(r, value, what, UTW_GRAPH_MAX, &n);
    if (st != UTW_OK) return st;
    m->walls = utw_alloc((size_t)n, sizeof *m->walls);
    if (m->walls == NULL) return utw_fail(r->err, UTW_E_NOMEM, "out of memory (%d walls)", n);
    for (const utw_json *j = utw_json_first(value); j != NULL; j = utw_json_next(j)) {
        unsigned given = 0;
        snprintf(r->subject, sizeof r->subject, "midline, wall %d", m->n_walls + 1);
        const utw_status read =
            utw_read_object(r, j, "a wall", wall_key, N_WALL_KEY, &m->walls[m->n_walls++], &given);
        if (read != UTW_OK) return read;
        for (int k = 0; k < N_WALL_KEY; k++)
            if (NEEDED & ~given & 1u << k)
                return utw_fail(r->err, UTW_E_SYNTAX,
                                "\"%s\" is missing; a wall needs \"from\", \"to\" and \"t\"",
                                wall_key[k].name);
    }
    r->subject[0] = '\0';
    return UTW_OK;
}

/* What "midline" may hold. */
typedef struct midline_given {
    utw_midline midline;
    int material;
} midline_given;

static const utw_key midline_key[] = {
    {"material", utw_read_material_name, offsetof(midline_given, material)},
    {"nodes", read_nodes, 0},
    {"walls", read_walls, 0},
};

utw_status utw_read_midline(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_outline *outline = target;
    utw_error *err = r->err;
    utw_status st = UTW_E_INTERNAL;
    unsigned given = 0;
    midline_given g = {.material = -1};
    if (outline->part != NULL)
        return utw_fail(err, UTW_E_SYNTAX, "\"parts\" or \"shape\" and %s are both given; keep one",
                        what);
    UTW_TRY(utw_read_object(r, value, what, midline_key, 3, &g, &given));
    if ((given & 6u) != 6u) {
        st = utw_fail(err, UTW_E_SYNTAX, "%s needs \"nodes\" and \"walls\"; \"%s\" is missing",
                      what, given & 2u ? "walls" : "nodes");
        goto done;
    }
    if (g.midline.n_walls == 0) {
        st = utw_fail(err, UTW_E_OUTLINE, "\"walls\" is empty; give at least one wall");
        goto done;
    }
    UTW_TRY(utw_outline_take_midline(outline, &g.midline, err));
    outline->part[0].material = g.material;
    st = UTW_OK;
done:
    utw_free(g.midline.nodes);
    utw_free(g.midline.walls);
    return st;
}
