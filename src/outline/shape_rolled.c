/* SPDX-License-Identifier: GPL-3.0-or-later
 * Rolled and extruded shapes of straight legs: angle, zed, cruciform, flat with bulb. */
#include "base/status.h"
#include "base/vec2.h"
#include "outline/shape.h"

/* ---- angle ---- */

enum { ANGLE_H, ANGLE_B, ANGLE_T, ANGLE_TB, ANGLE_R, ANGLE_R2 };

static const utw_shape_dimension angle_dimensions[] = {
    UTW_SHAPE_SIZE("h", "length of the upright leg, outside"),
    UTW_SHAPE_SIZE_OR("b", "length of the level leg, outside", "h"),
    UTW_SHAPE_SIZE("t", "thickness of the legs"),
    UTW_SHAPE_SIZE_OR("tb", "thickness of the level leg", "t"),
    UTW_SHAPE_RADIUS("r", "root radius"),
    UTW_SHAPE_RADIUS("r2", "toe radius, at the inner edge of each leg's end"),
};

static utw_status build_angle(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, h = v[ANGLE_H], t = v[ANGLE_T];
    const double b = utw_shape_default(given, ANGLE_B, h),
                 tb = utw_shape_default(given, ANGLE_TB, t);
    UTW_TRY(utw_shape_need_less(given, ANGLE_T, b, UTW_DIM(ANGLE_B), err));
    UTW_TRY(utw_shape_need_less(given, ANGLE_TB, h, UTW_DIM(ANGLE_H), err));
    utw_draft_begin(draft);
    utw_draft_point(draft, 0, 0);
    utw_draft_point(draft, b, 0);
    utw_draft_round(draft, b, tb, given, ANGLE_R2, 0);
    utw_draft_round(draft, t, tb, given, ANGLE_R, 0);
    utw_draft_round(draft, t, h, given, ANGLE_R2, 0);
    utw_draft_point(draft, 0, h);
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_angle = {
    "angle",
    "angle with equal or unequal legs",
    "heel (the outer corner)",
    "      |<->| t\n"
    "  -   .---. r2\n"
    "  |   |   |\n"
    "  |   |   |\n"
    "  h   |   |\n"
    "  |   |   |\n"
    "  |   |   'r\n"
    "  |   |     '--------. r2 -\n"
    "  |   |              |    tb\n"
    "  -   +--------------'    -\n"
    "      |<----- b ---->|\n",
    UTW_SHAPE_ROWS(angle_dimensions),
    build_angle,
};

/* ---- zed ---- */

enum { ZED_H, ZED_B, ZED_TF, ZED_TW, ZED_R, ZED_R2, ZED_BB, ZED_TFB };

static const utw_shape_dimension zed_dimensions[] = {
    UTW_SHAPE_SIZE("h", "height, outside"),
    UTW_SHAPE_SIZE("b", "width of the flanges (of the top one), web included"),
    UTW_SHAPE_SIZE("tf", "flange thickness (top)"),
    UTW_SHAPE_SIZE("tw", "web thickness"),
    UTW_SHAPE_RADIUS("r", "root radius, between web and flange"),
    UTW_SHAPE_RADIUS("r2", "toe radius, at the inner edge of the flange's tip"),
    UTW_SHAPE_SIZE_OR("b_bottom", "width of the bottom flange, web included", "b"),
    UTW_SHAPE_SIZE_OR("tf_bottom", "thickness of the bottom flange", "tf"),
};

static utw_status build_zed(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, h = v[ZED_H], tf = v[ZED_TF], w = v[ZED_TW] / 2;
    const double bb = utw_shape_default(given, ZED_BB, v[ZED_B]);
    const double tfb = utw_shape_default(given, ZED_TFB, tf), x = bb - w, xt = v[ZED_B] - w;
    UTW_TRY(utw_shape_need_less(given, ZED_TW, v[ZED_B], UTW_DIM(ZED_B), err));
    UTW_TRY(utw_shape_need_less(given, ZED_TW, bb, UTW_DIM(ZED_BB), err));
    UTW_TRY(utw_shape_need_less(given, ZED_TF, h, UTW_DIM(ZED_H), err));
    UTW_TRY(utw_shape_need_less(given, ZED_TFB, h, UTW_DIM(ZED_H), err));
    utw_draft_begin(draft);
    utw_draft_point(draft, -w, 0);
    utw_draft_point(draft, x, 0);
    utw_draft_round(draft, x, tfb, given, ZED_R2, 0);
    utw_draft_round(draft, w, tfb, given, ZED_R, 0);
    utw_draft_point(draft, w, h);
    utw_draft_point(draft, -xt, h);
    utw_draft_round(draft, -xt, h - tf, given, ZED_R2, 0);
    utw_draft_round(draft, -w, h - tf, given, ZED_R, 0);
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_zed = {
    "zed",
    "zed with root and toe radii",
    "middle of the web's lower end; the top flange goes left, the bottom one right",
    "      |<------ b ----->|\n"
    "      .----------------.   -\n"
    "   tf |                |   |\n"
    "      '----------.     |   |\n"
    "     r2         r \\    |   |\n"
    "                   |   |   |\n"
    "                   |<->| tw h\n"
    "                   |   |   |\n"
    "                   |    \\ r\n"
    "                   |     '----------. r2\n"
    "                   |                | tf_bottom\n"
    "                   '-+--------------'  -\n"
    "                   |<-- b_bottom -->|\n",
    UTW_SHAPE_ROWS(zed_dimensions),
    build_zed,
};

/* ---- cruciform ---- */

enum { CROSS_H, CROSS_B, CROSS_T, CROSS_TB, CROSS_R, CROSS_R2 };

static const utw_shape_dimension cruciform_dimensions[] = {
    UTW_SHAPE_SIZE("h", "height, outside"),
    UTW_SHAPE_SIZE_OR("b", "width, outside", "h"),
    UTW_SHAPE_SIZE("t", "thickness of the arms"),
    UTW_SHAPE_SIZE_OR("tb", "thickness of the level arms", "t"),
    UTW_SHAPE_RADIUS("r", "root radius"),
    UTW_SHAPE_RADIUS("r2", "toe radius, at both edges of each arm's end"),
};

static utw_status build_cruciform(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value;
    const double b = utw_shape_default(given, CROSS_B, v[CROSS_H]);
    const double tb = utw_shape_default(given, CROSS_TB, v[CROSS_T]);
    const double x = b / 2, y = v[CROSS_H] / 2, p = v[CROSS_T] / 2, q = tb / 2;
    UTW_TRY(utw_shape_need_less(given, CROSS_T, b, UTW_DIM(CROSS_B), err));
    UTW_TRY(utw_shape_need_less(given, CROSS_TB, 2 * y, UTW_DIM(CROSS_H), err));
    utw_draft_begin(draft);
    /* one arm after another, each by its toe, toe, root: bottom, right, top, left */
    const double corner[12][2] = {{-p, -y}, {p, -y}, {p, -q}, {x, -q}, {x, q},   {p, q},
                                  {p, y},   {-p, y}, {-p, q}, {-x, q}, {-x, -q}, {-p, -q}};
    for (int i = 0; i < 12; i++)
        utw_draft_round(draft, corner[i][0], corner[i][1], given, i % 3 == 2 ? CROSS_R : CROSS_R2,
                        0);
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_cruciform = {
    "cruciform",
    "cruciform",
    "centre",
    "             |<->| t\n"
    "  -          .---. r2\n"
    "  |          |   |\n"
    "  |          |   |\n"
    "  |   .------'   '------.   -\n"
    "  h   |        +  r     |   tb\n"
    "  |   '------.   .------'   -\n"
    "  |          |   |\n"
    "  |          |   |\n"
    "  -          '---'\n"
    "      |<------ b ------>|\n",
    UTW_SHAPE_ROWS(cruciform_dimensions),
    build_cruciform,
};

/* ---- flat with bulb ---- */

enum { BULB_B, BULB_T, BULB_C, BULB_R, BULB_ANGLE };

static const utw_shape_dimension bulb_dimensions[] = {
    UTW_SHAPE_SIZE("b", "width of the flat, bulb included"),
    UTW_SHAPE_SIZE("t", "thickness of the flat"),
    UTW_SHAPE_SIZE("c", "how far the bulb stands out from the flat"),
    {"r", "radius of the bulb's nose and of its root", UTW_SHAPE_IN_LENGTH, 1, (double)NAN, "", 0,
     1e9, 0},
    {"angle", "slope of the bulb's shoulder from the normal to the flat", UTW_SHAPE_IN_DEGREES, 0,
     30.0, "", 5, 75, 0},
};

/* The nose is one arc tangent to the end of the flat and to the shoulder, with its centre at (t + c
 * - r, b - r): end and shoulder meet in a corner of angle a, r / tan(a/2) beyond the centre, of
 * which the nose is the fillet (common practice; so in EN 10067, from memory). The root's fillet
 * meets the nose when c = 2 r (1 - sin a). */
static utw_status build_bulb(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, b = v[BULB_B], t = v[BULB_T], c = v[BULB_C], r = v[BULB_R];
    const double a = v[BULB_ANGLE] * (UTW_PI / 180);
    const double x = c - r + r / tan(a / 2);         /* the corner, from the face of the flat */
    const double root = r * tan(UTW_PI / 4 - a / 2); /* tangent length of the root's fillet */
    UTW_TRY(utw_shape_need_at_most(given, BULB_R, c / (2 * (1 - sin(a))),
                                   UTW_DIM(BULB_C) | UTW_DIM(BULB_ANGLE), err));
    UTW_TRY(utw_shape_need_at_most(given, BULB_R, t + c, UTW_DIM(BULB_T) | UTW_DIM(BULB_C), err));
    UTW_TRY(utw_shape_need_more(given, BULB_B, x * tan(a) + root, utw_shape_others(given, BULB_B),
                                err));
    utw_draft_begin(draft);
    utw_draft_point(draft, 0, 0);
    utw_draft_point(draft, t, 0);
    utw_draft_round(draft, t, b - x * tan(a), given, BULB_R, 0);
    utw_draft_round(draft, t + x, b, given, BULB_R, 0);
    utw_draft_point(draft, 0, b);
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_bulb = {
    "bulb",
    "flat with a bulb on one side",
    "lower corner of the flat's back; the bulb is at the top right",
    "         |<-- c -->|\n"
    "      |<>| t\n"
    "  -   .----------.\n"
    "  |   |           '. r (nose)\n"
    "  |   |            |\n"
    "  |   |          .'\n"
    "  |   |      .-'     angle: 0 is level\n"
    "  |   |   .-'\n"
    "  b   |  | r (root)\n"
    "  |   |  |\n"
    "  |   |  |\n"
    "  |   |  |\n"
    "  -   +--'\n",
    UTW_SHAPE_ROWS(bulb_dimensions),
    build_bulb,
};
