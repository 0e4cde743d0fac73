/* SPDX-License-Identifier: GPL-3.0-or-later
 * The midline an outline was drawn by. */
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "outline/check.h"
#include "outline/outline.h"
#include "outline/thicken.h"

utw_status utw_outline_take_midline(utw_outline *outline, utw_midline *midline, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_part *part = NULL;
    utw_midline *kept = NULL;
    UTW_TRY_ALLOC(part = utw_alloc(1, sizeof *part));
    UTW_TRY_ALLOC(kept = utw_alloc(1, sizeof *kept));
    UTW_TRY(utw_thicken(midline, part, err));
    *kept = *midline;
    memset(midline, 0, sizeof *midline);
    outline->midline = kept;
    outline->part = part;
    outline->n_part = 1;
    kept = NULL;
    part = NULL;
    st = UTW_OK;
done:
    utw_free(part);
    utw_free(kept);
    return st;
}

const utw_midline *utw_outline_midline(const utw_outline *outline)
{
    return outline->midline;
}

static utw_status copy_midline(const utw_midline *from, utw_midline *to, utw_error *err)
{
    if (from == NULL || from->n_nodes < 1 || from->n_walls < 1 || from->nodes == NULL ||
        from->walls == NULL)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "utw_outline_from_midline: the midline has no nodes or no walls");
    to->nodes = utw_alloc((size_t)from->n_nodes, sizeof *to->nodes);
    to->walls = utw_alloc((size_t)from->n_walls, sizeof *to->walls);
    if (to->nodes == NULL || to->walls == NULL)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    to->n_nodes = from->n_nodes;
    to->n_walls = from->n_walls;
    memcpy(to->nodes, from->nodes, (size_t)from->n_nodes * sizeof *to->nodes);
    memcpy(to->walls, from->walls, (size_t)from->n_walls * sizeof *to->walls);
    return UTW_OK;
}

utw_status utw_outline_from_midline(const utw_midline *midline, const char *units,
                                    utw_outline **outline, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_outline *made = NULL;
    utw_midline copy = {.n_nodes = 0};
    if (units == NULL || outline == NULL)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "utw_outline_from_midline: units and outline must not be NULL");
    utw_error_clear(err);
    UTW_TRY(copy_midline(midline, &copy, err));
    UTW_TRY_ALLOC(made = utw_alloc(1, sizeof *made));
    UTW_TRY(utw_outline_set_units(made, units, "units", err));
    UTW_TRY(utw_outline_take_midline(made, &copy, err));
    utw_outline_orient(made);
    UTW_TRY(utw_outline_check(made, err));
    *outline = made;
    made = NULL;
    st = UTW_OK;
done:
    utw_free(copy.nodes);
    utw_free(copy.walls);
    utw_outline_free(made);
    return st;
}
