/* SPDX-License-Identifier: GPL-3.0-or-later
 * The public functions that draw. */
#include <math.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "draw/bytes.h"
#include "draw/picture.h"

typedef struct kind {
    const char *key, *meaning;
    utw_status (*draw)(const utw_sitting *sitting, utw_error *err);
} kind;

static const kind kinds[UTW_PICTURE_COUNT] = {
    [UTW_PICTURE_OUTLINE] = {"outline",
                             "outline, extent, centroid, shear centre and principal axes",
                             utw_picture_outline},
    [UTW_PICTURE_MESH] = {"mesh", "elements, their orders and the layers in the corners",
                          utw_picture_mesh},
    [UTW_PICTURE_WARPING] = {"warping", "warping function about the shear centre as contours",
                             utw_picture_warping},
    [UTW_PICTURE_WARPED] = {"warped", "tilted view of the warped end of the bar",
                            utw_picture_warped},
    [UTW_PICTURE_STRESS] = {"stress", "a stress of a load case as contours, shear with arrows",
                            utw_picture_stress},
};

const char *utw_picture_key(utw_picture which)
{
    return (int)which >= 0 && which < UTW_PICTURE_COUNT ? kinds[which].key : NULL;
}

const char *utw_picture_meaning(utw_picture which)
{
    return (int)which >= 0 && which < UTW_PICTURE_COUNT ? kinds[which].meaning : NULL;
}

static utw_status check_options(const utw_draw_options *o, utw_error *err)
{
    if (o->version != 1)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "drawing options: version %d is not known; start from "
                        "UTW_DRAW_OPTIONS_INIT",
                        o->version);
    if (!(o->width >= UTW_WIDTH_MIN && o->width <= UTW_WIDTH_MAX))
        return utw_fail(err, UTW_E_ARGUMENT,
                        "drawing options: a width of %g mm is outside %g .. %g mm", o->width,
                        UTW_WIDTH_MIN, UTW_WIDTH_MAX);
    if (!(o->dpi >= 20 && o->dpi <= 2400))
        return utw_fail(err, UTW_E_ARGUMENT,
                        "drawing options: %g dots per inch is outside 20 .. 2400", o->dpi);
    if (utw_stress_component_key(o->component) == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "drawing options: component %d is outside 0 .. %d",
                        (int)o->component, UTW_STRESS_COMPONENT_COUNT - 1);
    return UTW_OK;
}

utw_status utw_picture_draw(const utw_solution *solution, utw_picture what,
                            const utw_draw_options *options, utw_canvas *canvas, utw_error *err)
{
    const utw_draw_options defaults = UTW_DRAW_OPTIONS_INIT;
    const utw_sitting sitting = {solution, options == NULL ? &defaults : options, canvas};
    if (solution == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "a picture: the solution must not be NULL");
    if (utw_picture_key(what) == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "a picture: kind %d is outside 0 .. %d", (int)what,
                        UTW_PICTURE_COUNT - 1);
    const utw_status st = check_options(sitting.options, err);
    return st == UTW_OK ? kinds[what].draw(&sitting, err) : st;
}

utw_status utw_draw_bytes(const utw_solution *solution, utw_picture what,
                          const utw_draw_options *options, utw_picture_format format,
                          unsigned char **bytes, size_t *n, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_draw_options defaults = UTW_DRAW_OPTIONS_INIT;
    utw_canvas *canvas = NULL;
    if (bytes == NULL || n == NULL || (int)format < 0 || format > UTW_PNG)
        return utw_fail(err, UTW_E_ARGUMENT, "utw_draw_bytes: bytes, n or the format is not valid");
    UTW_TRY(utw_canvas_create(&canvas, err));
    UTW_TRY(utw_picture_draw(solution, what, options, canvas, err));
    UTW_TRY(utw_canvas_bytes(canvas, format, utw_outline_name(solution->outline),
                             options == NULL ? defaults.dpi : options->dpi, bytes, n, err));
    st = UTW_OK;
done:
    utw_canvas_free(canvas);
    return st;
}

void utw_draw_free(unsigned char *bytes)
{
    utw_free(bytes);
}

utw_status utw_draw(const utw_solution *solution, utw_picture what, const utw_draw_options *options,
                    const char *path, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_picture_format format;
    unsigned char *bytes = NULL;
    size_t n = 0;
    if (path == NULL) return utw_fail(err, UTW_E_ARGUMENT, "utw_draw: the path must not be NULL");
    UTW_TRY(utw_format_of(path, &format, err));
    UTW_TRY(utw_draw_bytes(solution, what, options, format, &bytes, &n, err));
    UTW_TRY(utw_bytes_save(bytes, n, path, err));
    st = UTW_OK;
done:
    utw_free(bytes);
    return st;
}
