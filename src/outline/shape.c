/* SPDX-License-Identifier: GPL-3.0-or-later
 * The registry of trade shapes: finds a shape, checks its dimensions, draws and places it. */
#include "outline/shape.h"

#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "base/nearest.h"
#include "base/status.h"
#include "outline/check.h"

static const utw_shape *const shapes[] = {
    &utw_shape_rectangle,  &utw_shape_round,       &utw_shape_ellipse,
    &utw_shape_polygon,    &utw_shape_trapezium,   &utw_shape_tube,
    &utw_shape_box,        &utw_shape_slit_tube,   &utw_shape_arc_strip,
    &utw_shape_angle,      &utw_shape_channel,     &utw_shape_i,
    &utw_shape_tee,        &utw_shape_zed,         &utw_shape_cruciform,
    &utw_shape_bulb,       &utw_shape_hat,         &utw_shape_formed_channel,
    &utw_shape_formed_zed, &utw_shape_keyed_shaft, &utw_shape_splined_shaft,
};

enum { SHAPES = (int)(sizeof shapes / sizeof *shapes) };

int utw_shape_count(void)
{
    return SHAPES;
}

const utw_shape *utw_shape_at(int index)
{
    return index >= 0 && index < SHAPES ? shapes[index] : NULL;
}

const utw_shape *utw_shape_find(const char *name)
{
    for (int i = 0; i < SHAPES; i++)
        if (strcmp(shapes[i]->name, name) == 0) return shapes[i];
    return NULL;
}

utw_status utw_shape_get_info(int index, utw_shape_info *info, utw_error *err)
{
    const utw_shape *shape = utw_shape_at(index);
    if (shape == NULL || info == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "there is no shape %d: 0 to %d", index, SHAPES - 1);
    *info = (utw_shape_info){shape->name,    shape->meaning,     shape->origin,
                             shape->drawing, shape->n_dimension, shape->dimension};
    return UTW_OK;
}

void utw_words_add(utw_words *w, const char *before, const char *text)
{
    const int n = snprintf(w->text + w->n, sizeof w->text - w->n, "%s%s", before, text);
    if (n > 0) w->n += (size_t)n < sizeof w->text - w->n ? (size_t)n : sizeof w->text - w->n - 1;
}

/* ---- drawing ---- */

static utw_status unknown_shape(const char *name, utw_error *err)
{
    const char *known[SHAPES];
    utw_words w = {.n = 0};
    for (int i = 0; i < SHAPES; i++) {
        known[i] = shapes[i]->name;
        utw_words_add(&w, i > 0 ? ", " : "", known[i]);
    }
    const int near = utw_nearest_word(name, known, SHAPES);
    if (near >= 0)
        return utw_fail(err, UTW_E_SYNTAX, "there is no shape \"%.40s\"; did you mean \"%s\"?",
                        name, known[near]);
    return utw_fail(err, UTW_E_SYNTAX, "there is no shape \"%.40s\"; there are %s", name, w.text);
}

utw_status utw_shape_draft(const char *name, int n, const char *const *keys, const double *values,
                           const utw_placement *placement, utw_draft *draft, utw_shape_case *given,
                           utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_shape_case own;
    utw_draft made;
    utw_draft_init(&made);
    const utw_shape *shape = utw_shape_find(name);
    if (shape == NULL) {
        st = unknown_shape(name, err);
        goto done;
    }
    UTW_TRY(utw_shape_collect(shape, n, keys, values, &own, err));
    UTW_TRY(shape->build(&own, &made, err));
    if (made.out_of_memory) {
        st = utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
        goto done;
    }
    utw_draft_tidy(&made);
    if (placement != NULL) utw_draft_place(&made, placement);
    if (given != NULL) *given = own;
    *draft = made;
    utw_draft_init(&made);
    st = UTW_OK;
done:
    utw_draft_clear(&made);
    return st;
}

utw_status utw_shape_part(const char *name, int n, const char *const *keys, const double *values,
                          const utw_placement *placement, utw_part *part, utw_error *err)
{
    utw_shape_case given;
    utw_draft draft;
    utw_status st = utw_shape_draft(name, n, keys, values, placement, &draft, &given, err);
    if (st != UTW_OK) return st;
    st = utw_draft_part(&draft, &given, part, err);
    utw_draft_clear(&draft);
    return st;
}

/* "channel h=100 b=50": what the outline is called. */
static void shape_name(const char *name, int n, const char *const *keys, const double *values,
                       utw_words *w)
{
    utw_words_add(w, "", name);
    for (int i = 0; i < n; i++) {
        char number[40];
        snprintf(number, sizeof number, "=%.10g", values[i]);
        utw_words_add(w, " ", keys[i]);
        utw_words_add(w, "", number);
    }
}

static utw_status outline_from_shape(const char *name, int n, const char *const *keys,
                                     const double *values, const char *units,
                                     const utw_placement *placement, utw_outline **outline,
                                     utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_outline *made = NULL;
    utw_words title = {.n = 0};
    UTW_TRY_ALLOC(made = utw_alloc(1, sizeof *made));
    UTW_TRY_ALLOC(made->part = utw_alloc(1, sizeof *made->part));
    UTW_TRY(utw_outline_set_units(made, units, "units", err));
    UTW_TRY(utw_shape_part(name, n, keys, values, placement, &made->part[0], err));
    made->n_part = 1;
    shape_name(name, n, keys, values, &title);
    UTW_TRY_ALLOC(made->name = utw_copy_string(title.text));
    utw_outline_orient(made);
    UTW_TRY(utw_outline_check(made, err));
    *outline = made;
    made = NULL;
    st = UTW_OK;
done:
    utw_outline_free(made);
    return st;
}

utw_status utw_outline_from_shape(const char *name, int n, const char *const *keys,
                                  const double *values, const char *units,
                                  const utw_placement *placement, utw_outline **outline,
                                  utw_error *err)
{
    if (name == NULL || n < 0 || (n > 0 && (keys == NULL || values == NULL)) || units == NULL ||
        outline == NULL)
        return utw_fail(
            err, UTW_E_ARGUMENT,
            "utw_outline_from_shape: name, keys, values, units and outline must not be NULL");
    utw_error_clear(err);
    return outline_from_shape(name, n, keys, values, units, placement, outline, err);
}
