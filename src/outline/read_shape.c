/* SPDX-License-Identifier: GPL-3.0-or-later
 * "shape": a trade shape by its dimensions, in place of "outline" and "holes" of a part or of all
 * "parts". */
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "base/vec2.h"
#include "outline/read.h"
#include "outline/shape.h"

enum { MOST_DIMENSIONS = 32 }; /* more are repetitions, which utw_shape_collect() names */

/* A shape while it is read. */
typedef struct shape_given {
    const char *name;
    const utw_json *dimensions; /* of a trade shape, or the aerofoil */
    int material;
    double turn; /* [degrees] */
    utw_placement placement;
} shape_given;

static const char aerofoil[] = "aerofoil";

/* Target of every shape's name: only one may be there. */
static utw_status read_name(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    shape_given *s = target;
    char name[40];
    snprintf(name, sizeof name, "%.*s", (int)strlen(what) - 2, what + 1); /* without its quotes */
    if (utw_json_kind_of(value) != UTW_JSON_OBJECT)
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "%s must be an object of dimensions, such as {\"h\": 100}, not %s", what,
                        utw_json_kind_text(value));
    if (s->name != NULL)
        return utw_fail(r->err, UTW_E_SYNTAX, "\"shape\" is both \"%s\" and %s; keep one", s->name,
                        what);
    s->name = strcmp(name, aerofoil) == 0 ? aerofoil : utw_shape_find(name)->name;
    s->dimensions = value;
    return UTW_OK;
}

static utw_status read_mirror(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    if (utw_json_kind_of(value) != UTW_JSON_BOOL)
        return utw_fail(r->err, UTW_E_SYNTAX, "%s must be true or false, not %s", what,
                        utw_json_kind_text(value));
    *(int *)target = utw_json_bool(value);
    return UTW_OK;
}

/* Keys beside the shape's name; "material" comes first and is left out inside a part, which has its
 * own. */
static const utw_key placement_key[] = {
    {"material", utw_read_material_name, offsetof(shape_given, material)},
    {"at", utw_read_point, offsetof(shape_given, placement.at)},
    {"turn", utw_read_number, offsetof(shape_given, turn)},
    {"mirror", read_mirror, offsetof(shape_given, placement.mirror)},
};
enum { N_PLACEMENT = sizeof placement_key / sizeof placement_key[0], MOST_KEYS = 32 };

static utw_status read_given(utw_reader *r, const utw_json *value, const char *what, int in_part,
                             shape_given *s)
{
    utw_key key[MOST_KEYS];
    int n = 0;
    for (int i = 0; i < utw_shape_count() && n < MOST_KEYS - 1 - N_PLACEMENT; i++)
        key[n++] = (utw_key){utw_shape_at(i)->name, read_name, 0};
    key[n++] = (utw_key){aerofoil, read_name, 0};
    for (int i = in_part; i < N_PLACEMENT; i++) key[n++] = placement_key[i];
    const utw_status st = utw_read_object(r, value, what, key, n, s, NULL);
    if (st != UTW_OK) return st;
    if (s->name == NULL)
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "%s names no shape; add one, such as \"angle\": {\"h\": 50, \"t\": 5}",
                        what);
    s->placement.turn = fmod(s->turn, 360) * (UTW_PI / 180);
    return UTW_OK;
}

static utw_status make(utw_reader *r, const shape_given *s, utw_part *part)
{
    const char *keys[MOST_DIMENSIONS];
    double values[MOST_DIMENSIONS];
    int n = 0;
    if (s->name == aerofoil) {
        const utw_status st = utw_read_aerofoil(r, s->dimensions, part);
        if (st == UTW_OK) utw_part_place(part, &s->placement);
        return st;
    }
    for (const utw_json *m = utw_json_first(s->dimensions); m != NULL && n < MOST_DIMENSIONS;
         m = utw_json_next(m)) {
        char what[80];
        snprintf(what, sizeof what, "%s: %.40s", s->name, utw_json_key(m));
        keys[n] = utw_json_key(m);
        const utw_status st = utw_read_number(r, m, what, &values[n++]);
        if (st != UTW_OK) return st;
    }
    return utw_shape_part(s->name, n, keys, values, &s->placement, part, r->err);
}

utw_status utw_read_part_shape(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_part *part = target, made;
    shape_given s = {.material = -1};
    utw_status st = read_given(r, value, what, 1, &s);
    if (st == UTW_OK) st = make(r, &s, &made);
    if (st != UTW_OK) return st;
    made.material = part->material;
    utw_part_clear(part);
    *part = made;
    return UTW_OK;
}

utw_status utw_read_shape(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_outline *outline = target;
    utw_part made;
    shape_given s = {.material = -1};
    if (outline->part != NULL)
        return utw_fail(r->err, UTW_E_SYNTAX, "\"parts\" and %s are both given; keep one", what);
    utw_status st = read_given(r, value, what, 0, &s);
    if (st == UTW_OK) st = make(r, &s, &made);
    if (st != UTW_OK) return st;
    made.material = s.material;
    outline->part = utw_alloc(1, sizeof *outline->part);
    if (outline->part == NULL) {
        utw_part_clear(&made);
        return utw_fail(r->err, UTW_E_NOMEM, "out of memory (%s)", what);
    }
    outline->part[0] = made;
    outline->n_part = 1;
    return UTW_OK;
}
