/* SPDX-License-Identifier: GPL-3.0-or-later
 * "parts": outlines with their holes and materials. */
#include <stdio.h>

#include "base/memory.h"
#include "outline/read.h"

/* Loops of a part while it is read: target of the keys below. */
static utw_status read_outline(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_part *part = target;
    r->loop = 0;
    const utw_status st = utw_read_loop(r, value, what, &part->loop[0]);
    if (st == UTW_OK) r->loop = -1;
    return st;
}

static utw_status read_holes(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_part *part = target;
    int n;
    const utw_status counted = utw_read_array(r, value, what, UTW_MOST_HOLES, &n);
    if (counted != UTW_OK) return counted;
    utw_loop *grown = utw_realloc(part->loop, (size_t)n + 1, sizeof *grown);
    if (grown == NULL) return utw_fail(r->err, UTW_E_NOMEM, "out of memory (%d holes)", n);
    part->loop = grown;
    for (const utw_json *m = utw_json_first(value); m != NULL; m = utw_json_next(m)) {
        r->loop = part->n_loop;
        part->loop[part->n_loop++] = (utw_loop){0};
        const utw_status st = utw_read_loop(r, m, "a hole", &part->loop[r->loop]);
        if (st != UTW_OK) return st;
    }
    r->loop = -1;
    return UTW_OK;
}

static const utw_key part_key[] = {
    {"material", utw_read_material_name, offsetof(utw_part, material)},
    {"outline", read_outline, 0},
    {"holes", read_holes, 0},
    {"shape", utw_read_part_shape, 0}, /* all its loops */
};
enum { N_KEY = sizeof part_key / sizeof part_key[0], OUTLINE = 2, HOLES = 4, SHAPE = 8 };

static utw_status read_part(utw_reader *r, const utw_json *value, utw_outline *outline)
{
    r->part = outline->n_part;
    utw_part *part = &outline->part[outline->n_part++]; /* owned by the outline from now on */
    unsigned given = 0;
    *part = (utw_part){.material = -1, .n_loop = 1, .loop = utw_alloc(1, sizeof *part->loop)};
    if (part->loop == NULL) return utw_fail(r->err, UTW_E_NOMEM, "out of memory (part)");
    const utw_status st = utw_read_object(r, value, "the part", part_key, N_KEY, part, &given);
    if (st != UTW_OK) return st;
    if ((given & SHAPE) && (given & (OUTLINE | HOLES)))
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "\"shape\" and \"%s\" are both given; keep one",
                        given & OUTLINE ? "outline" : "holes");
    if (!(given & (OUTLINE | SHAPE)))
        return utw_fail(r->err, UTW_E_OUTLINE,
                        "\"outline\" is missing; give the vertices of the outer loop");
    r->part = -1;
    return UTW_OK;
}

utw_status utw_read_parts(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_outline *outline = target;
    int n;
    const utw_status counted = utw_read_array(r, value, what, UTW_MOST_PARTS, &n);
    if (counted != UTW_OK) return counted;
    if (n == 0) return utw_fail(r->err, UTW_E_OUTLINE, "%s is empty; give at least one part", what);
    outline->part = utw_alloc((size_t)n, sizeof *outline->part);
    if (outline->part == NULL) return utw_fail(r->err, UTW_E_NOMEM, "out of memory (%d parts)", n);
    for (const utw_json *m = utw_json_first(value); m != NULL; m = utw_json_next(m)) {
        const utw_status st = read_part(r, m, outline);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}
