/* SPDX-License-Identifier: GPL-3.0-or-later
 * Rolled and extruded beams with parallel or tapered flanges: channel, I, tee.
 * A tapered flange's thickness is measured at distance u from its tip, the underside slopes by a
 * stated slope, and its tip has its sharp-cornered thickness tf - slope u (common practice; so in
 * DIN 1025-1 and DIN 1026-1, from memory). */
#include "base/status.h"
#include "base/vec2.h"
#include "outline/shape.h"

#define SLOPE_ROWS                                                                                 \
    {"slope", "slope of the flange's underside", UTW_SHAPE_IN_PER_CENT, 0, 0.0, "", 0, 100, 0},    \
    {                                                                                              \
        "slope_deg", "the same as an angle", UTW_SHAPE_IN_DEGREES, 0, 0.0, "", 0, 45, 0            \
    }

/* A flange that thins toward its tip. */
typedef struct flange {
    int t, u,
        which;    /* dimensions: thickness, where it is measured, the one that states the slope */
    double width; /* from the tip to the face of the web */
    double slope; /* rise over run */
    double tip, root; /* thickness at the tip, at the face of the web; sharp corners */
} flange;

/* Thicknesses at the ends of a flange. [in] f->t, u, which, width, slope. `at` is the distance u.
 */
static utw_status taper(const utw_shape_case *given, flange *f, double at, utw_error *err)
{
    const double t = given->value[f->t];
    f->tip = t - f->slope * at;
    f->root = t + f->slope * (f->width - at);
    if (f->slope == 0 || at == 0) return UTW_OK;
    const double most = t / at;
    const int degrees = given->shape->dimension[f->which].unit == UTW_SHAPE_IN_DEGREES;
    return utw_shape_need_less(given, f->which, degrees ? atan(most) * (180 / UTW_PI) : 100 * most,
                               UTW_DIM(f->t) | UTW_DIM(f->u), err);
}

/* ---- channel ---- */

enum {
    CHANNEL_H,
    CHANNEL_B,
    CHANNEL_TF,
    CHANNEL_TW,
    CHANNEL_R,
    CHANNEL_R2,
    CHANNEL_SLOPE,
    CHANNEL_SLOPE_DEG,
    CHANNEL_U
};

static const utw_shape_dimension channel_dimensions[] = {
    UTW_SHAPE_SIZE("h", "height, outside"),
    UTW_SHAPE_SIZE("b", "width of the flanges, from the back of the web"),
    UTW_SHAPE_SIZE("tf", "flange thickness; of a tapered flange at u from its tip"),
    UTW_SHAPE_SIZE("tw", "web thickness"),
    UTW_SHAPE_RADIUS("r", "root radius, between web and flange"),
    UTW_SHAPE_RADIUS("r2", "toe radius, at the inner edge of the flange's tip"),
    SLOPE_ROWS,
    {"u", "distance from the flange's tip at which tf is measured", UTW_SHAPE_IN_LENGTH, 0,
     (double)NAN, "b/2", 0, 1e9, 0},
};

static utw_status build_channel(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, h = v[CHANNEL_H], b = v[CHANNEL_B], tw = v[CHANNEL_TW];
    flange f = {.t = CHANNEL_TF, .u = CHANNEL_U, .width = b - tw};
    utw_shape_default(given, CHANNEL_U, b / 2);
    UTW_TRY(utw_shape_slope(given, CHANNEL_SLOPE, CHANNEL_SLOPE_DEG, &f.slope, &f.which, err));
    UTW_TRY(utw_shape_need_less(given, CHANNEL_TW, b, UTW_DIM(CHANNEL_B), err));
    UTW_TRY(utw_shape_need_at_most(given, CHANNEL_U, b, UTW_DIM(CHANNEL_B), err));
    UTW_TRY(taper(given, &f, v[CHANNEL_U], err));
    UTW_TRY(utw_shape_need_less(
        given, CHANNEL_TF, h / 2 - (f.root - v[CHANNEL_TF]),
        UTW_DIM(CHANNEL_H) | (f.slope > 0 ? utw_shape_others(given, CHANNEL_TF) : 0), err));
    utw_draft_begin(draft);
    utw_draft_point(draft, 0, 0);
    utw_draft_point(draft, b, 0);
    utw_draft_round(draft, b, f.tip, given, CHANNEL_R2, 0);
    utw_draft_round(draft, tw, f.root, given, CHANNEL_R, 0);
    utw_draft_round(draft, tw, h - f.root, given, CHANNEL_R, 0);
    utw_draft_round(draft, b, h - f.tip, given, CHANNEL_R2, 0);
    utw_draft_point(draft, b, h);
    utw_draft_point(draft, 0, h);
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_channel = {
    "channel",
    "channel with parallel or tapered flanges",
    "lower corner of the web's back; opens to the right",
    "      |<------ b ------>|\n"
    "  -   .-----------------.\n"
    "  |   |          :      |   -\n"
    "  |   |       .--:------'   tf (at u from the tip)\n"
    "  |   |    .-' slope  r2    -\n"
    "  |   |   / r    |<-u-->|\n"
    "  h   |   |\n"
    "  |   |<->| tw\n"
    "  |   |   \\\n"
    "  |   |    '-.\n"
    "  |   |       '---------.\n"
    "  |   |                 |\n"
    "  -   +-----------------'\n",
    UTW_SHAPE_ROWS(channel_dimensions),
    build_channel,
};

/* ---- I ---- */

enum { I_H, I_B, I_TF, I_TW, I_R, I_R2, I_SLOPE, I_SLOPE_DEG, I_U, I_BB, I_TFB };

static const utw_shape_dimension i_dimensions[] = {
    UTW_SHAPE_SIZE("h", "height, outside"),
    UTW_SHAPE_SIZE("b", "width of the flanges (of the top one)"),
    UTW_SHAPE_SIZE("tf", "flange thickness (top); of a tapered flange at u from its tip"),
    UTW_SHAPE_SIZE("tw", "web thickness"),
    UTW_SHAPE_RADIUS("r", "root radius, between web and flange"),
    UTW_SHAPE_RADIUS("r2", "toe radius, at the inner edge of the flange's tip"),
    SLOPE_ROWS,
    {"u", "distance from the flange's tip at which tf is measured", UTW_SHAPE_IN_LENGTH, 0,
     (double)NAN, "a quarter of the flange's width", 0, 1e9, 0},
    UTW_SHAPE_SIZE_OR("b_bottom", "width of the bottom flange", "b"),
    UTW_SHAPE_SIZE_OR("tf_bottom", "thickness of the bottom flange", "tf"),
};

/* Checks one flange of an I and finds its thicknesses. [in] f->t, which, slope. */
static utw_status i_flange(const utw_shape_case *given, int width, flange *f, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, b = v[width];
    const double at = isnan(v[I_U]) ? b / 4 : v[I_U];
    f->u = given->given[I_U] ? I_U : width;
    f->width = (b - v[I_TW]) / 2;
    UTW_TRY(utw_shape_need_less(given, I_TW, b, UTW_DIM(width), err));
    if (given->given[I_U]) UTW_TRY(utw_shape_need_at_most(given, I_U, b / 2, UTW_DIM(width), err));
    UTW_TRY(taper(given, f, at, err));
    st = UTW_OK;
done:
    return st;
}

static utw_status build_i(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, h = v[I_H], w = v[I_TW] / 2;
    const double x = v[I_B] / 2, xb = utw_shape_default(given, I_BB, v[I_B]) / 2;
    utw_shape_default(given, I_TFB, v[I_TF]);
    flange top = {.t = I_TF}, bottom = {.t = I_TFB};
    UTW_TRY(utw_shape_slope(given, I_SLOPE, I_SLOPE_DEG, &top.slope, &top.which, err));
    bottom.slope = top.slope;
    bottom.which = top.which;
    UTW_TRY(i_flange(given, I_B, &top, err));
    UTW_TRY(i_flange(given, I_BB, &bottom, err));
    UTW_TRY(utw_shape_need_less(
        given, I_TF, h - bottom.root - (top.root - v[I_TF]),
        UTW_DIM(I_H) | UTW_DIM(I_TFB) | (top.slope > 0 ? utw_shape_others(given, I_TF) : 0), err));
    utw_draft_begin(draft);
    for (int side = 1; side >= -1; side -= 2) { /* right side upward, left side downward */
        const flange *f = side > 0 ? &bottom : &top, *g = side > 0 ? &top : &bottom;
        const double y0 = side > 0 ? 0 : h, xf = side > 0 ? xb : x, xg = side > 0 ? x : xb;
        const double y1 = h - y0;
        utw_draft_point(draft, side * xf, y0);
        utw_draft_round(draft, side * xf, y0 + side * f->tip, given, I_R2, 0);
        utw_draft_round(draft, side * w, y0 + side * f->root, given, I_R, 0);
        utw_draft_round(draft, side * w, y1 - side * g->root, given, I_R, 0);
        utw_draft_round(draft, side * xg, y1 - side * g->tip, given, I_R2, 0);
        utw_draft_point(draft, side * xg, y1);
    }
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_i = {
    "I",
    "I or H with parallel, tapered or unequal flanges",
    "middle of the bottom",
    "      |<--------- b --------->|\n"
    "  -   .-----------------------.\n"
    "  |   |                :      |   -\n"
    "  |   '-------.     .--:------'   tf (at u from the tip)\n"
    "  |            \\   / slope  r2    -\n"
    "  |           r |  |   |<-u-->|\n"
    "  h             |  |\n"
    "  |             |<>| tw\n"
    "  |            /   \\\n"
    "  |   .-------'     '---------.\n"
    "  |   |                       |   tf_bottom\n"
    "  -   '------------+----------'\n"
    "      |<------ b_bottom ----->|\n",
    UTW_SHAPE_ROWS(i_dimensions),
    build_i,
};

/* ---- tee ---- */

enum {
    TEE_H,
    TEE_B,
    TEE_TF,
    TEE_TW,
    TEE_R,
    TEE_R2,
    TEE_R3,
    TEE_SLOPE,
    TEE_SLOPE_DEG,
    TEE_U,
    TEE_SLOPE_W
};

static const utw_shape_dimension tee_dimensions[] = {
    UTW_SHAPE_SIZE("h", "height, outside"),
    UTW_SHAPE_SIZE("b", "width of the flange"),
    UTW_SHAPE_SIZE("tf", "flange thickness; of a tapered flange at u from its tip"),
    UTW_SHAPE_SIZE("tw", "stem thickness; of a tapered stem at h/2"),
    UTW_SHAPE_RADIUS("r", "root radius, between stem and flange"),
    UTW_SHAPE_RADIUS("r2", "toe radius, at the inner edge of the flange's tip"),
    UTW_SHAPE_RADIUS("r3", "toe radius at both edges of the stem's end"),
    SLOPE_ROWS,
    {"u", "distance from the flange's tip at which tf is measured", UTW_SHAPE_IN_LENGTH, 0,
     (double)NAN, "b/4", 0, 1e9, 0},
    {"slope_web", "slope of each face of the stem", UTW_SHAPE_IN_PER_CENT, 0, 0.0, "", 0, 50, 0},
};

/* The underside y = p - ... of the flange and the face of the stem meet at (*x, *y):
 *   x = tw/2 + sw (y - h/2),  y = h - tf - s (b/2 - u - x). */
static void tee_root(const utw_shape_case *given, double s, double sw, double *x, double *y)
{
    const double *v = given->value, h = v[TEE_H];
    const double y0 = h - v[TEE_TF] - s * (v[TEE_B] / 2 - v[TEE_U]); /* the underside at x = 0 */
    *x = (v[TEE_TW] / 2 + sw * (y0 - h / 2)) / (1 - sw * s);
    *y = y0 + s * *x;
}

static utw_status build_tee(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, h = v[TEE_H], b = v[TEE_B], sw = v[TEE_SLOPE_W] / 100;
    flange f = {.t = TEE_TF, .u = TEE_U};
    double x, y;
    utw_shape_default(given, TEE_U, b / 4);
    UTW_TRY(utw_shape_slope(given, TEE_SLOPE, TEE_SLOPE_DEG, &f.slope, &f.which, err));
    UTW_TRY(utw_shape_need_at_most(given, TEE_U, b / 2, UTW_DIM(TEE_B), err));
    UTW_TRY(utw_shape_need_less(given, TEE_TF, h, UTW_DIM(TEE_H), err));
    UTW_TRY(utw_shape_need_less(given, TEE_TW, b, UTW_DIM(TEE_B), err));
    UTW_TRY(taper(given, &f, v[TEE_U], err));
    UTW_TRY(utw_shape_need_less(given, TEE_SLOPE_W, 100 * v[TEE_TW] / h,
                                UTW_DIM(TEE_TW) | UTW_DIM(TEE_H), err));
    tee_root(given, f.slope, sw, &x, &y);
    if (!(x < b / 2)) /* thicker by what the stem gains above h/2 */
        UTW_TRY(utw_shape_need_less(given, TEE_TW, b - 2 * x + v[TEE_TW],
                                    utw_shape_others(given, TEE_TW), err));
    if (!(y > 0))
        UTW_TRY(utw_shape_need_less(given, TEE_TF, y + v[TEE_TF], utw_shape_others(given, TEE_TF),
                                    err));
    const double foot = v[TEE_TW] / 2 - sw * h / 2;
    utw_draft_begin(draft);
    utw_draft_round(draft, -foot, 0, given, TEE_R3, 0);
    utw_draft_round(draft, foot, 0, given, TEE_R3, 0);
    utw_draft_round(draft, x, y, given, TEE_R, 0);
    utw_draft_round(draft, b / 2, h - f.tip, given, TEE_R2, 0);
    utw_draft_point(draft, b / 2, h);
    utw_draft_point(draft, -b / 2, h);
    utw_draft_round(draft, -b / 2, h - f.tip, given, TEE_R2, 0);
    utw_draft_round(draft, -x, y, given, TEE_R, 0);
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_tee = {
    "tee",
    "tee with parallel or tapered flange and stem",
    "middle of the stem's end; the flange is at the top",
    "      |<--------- b --------->|\n"
    "  -   .-----------------------.\n"
    "  |   |                :      |   -\n"
    "  |   '-------.     .--:------'   tf (at u from the tip)\n"
    "  |            \\   / slope  r2    -\n"
    "  |           r |  |   |<-u-->|\n"
    "  |             |  |\n"
    "  h             |<>| tw (at h/2)\n"
    "  |             |  |\n"
    "  |             |  | slope_web\n"
    "  -             '+-' r3\n",
    UTW_SHAPE_ROWS(tee_dimensions),
    build_tee,
};
