/* SPDX-License-Identifier: GPL-3.0-or-later
 * Cold-formed shapes: one strip of constant thickness with bends of one inside radius. Hat, channel
 * and zed with or without lips. Every bend has the inside radius ri and the outside radius ri + t
 * (common practice). */
#include "base/status.h"
#include "base/vec2.h"
#include "outline/shape.h"

/* ---- hat ---- */

enum { HAT_H, HAT_B, HAT_C, HAT_T, HAT_RI, HAT_ANGLE };

static const utw_shape_dimension hat_dimensions[] = {
    UTW_SHAPE_SIZE("h", "height, outside"),
    UTW_SHAPE_SIZE("b", "width of the top, outside"),
    UTW_SHAPE_SIZE("c", "width of each brim, from the inner face of the web"),
    UTW_SHAPE_SIZE("t", "thickness"),
    UTW_SHAPE_RADIUS("ri", "inside radius of the bends"),
    {"angle", "angle of the webs from upright, spreading downward", UTW_SHAPE_IN_DEGREES, 0, 0.0,
     "", 0, 75, 0},
};

static utw_status build_hat(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, h = v[HAT_H], t = v[HAT_T], x = v[HAT_B] / 2;
    const double a = v[HAT_ANGLE] * (UTW_PI / 180), lean = tan(a), across = t / cos(a);
    const double foot = x + h * lean - across;   /* the web's inner face at y = 0 */
    const double knee = x + (h - t) * lean;      /* its outer face at the top of the brim */
    const double inside = x + t * lean - across; /* its inner face at the underside of the top */
    const double tip = foot + v[HAT_C];
    UTW_TRY(utw_shape_need_less(given, HAT_T, h, UTW_DIM(HAT_H), err));
    UTW_TRY(utw_shape_need_more(given, HAT_B, 2 * (across - t * lean),
                                UTW_DIM(HAT_T) | UTW_DIM(HAT_ANGLE), err));
    UTW_TRY(utw_shape_need_more(given, HAT_C, across - t * lean,
                                UTW_DIM(HAT_T) | UTW_DIM(HAT_ANGLE), err));
    utw_draft_begin(draft);
    utw_draft_point(draft, -tip, 0);
    utw_draft_round(draft, -foot, 0, given, HAT_RI, t);
    utw_draft_round(draft, -inside, h - t, given, HAT_RI, 0);
    utw_draft_round(draft, inside, h - t, given, HAT_RI, 0);
    utw_draft_round(draft, foot, 0, given, HAT_RI, t);
    utw_draft_point(draft, tip, 0);
    utw_draft_point(draft, tip, t);
    utw_draft_round(draft, knee, t, given, HAT_RI, 0);
    utw_draft_round(draft, x, h, given, HAT_RI, t);
    utw_draft_round(draft, -x, h, given, HAT_RI, t);
    utw_draft_round(draft, -knee, t, given, HAT_RI, 0);
    utw_draft_point(draft, -tip, t);
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_hat = {
    "hat",
    "cold-formed hat",
    "middle of the lower edge",
    "             |<---- b ---->|\n"
    "  -          .-------------.\n"
    "  |         / .-----------. \\\n"
    "  |        / /           ri\\ \\\n"
    "  h       / /               \\ \\ t\n"
    "  |      / /                 \\ \\\n"
    "  |  .--' /                   \\ '--.  angle: 0 is upright\n"
    "  -  '---'          +          '---'\n"
    "                               |<c>|\n",
    UTW_SHAPE_ROWS(hat_dimensions),
    build_hat,
};

/* ---- channel and zed ---- */

enum { FORMED_H, FORMED_B, FORMED_C, FORMED_T, FORMED_RI };

#define LIP_ROW                                                                                    \
    {                                                                                              \
        "c", "depth of the lips, outside, 0 for none", UTW_SHAPE_IN_LENGTH, 0, 0.0, "", 0, 1e9, 0  \
    }

static const utw_shape_dimension formed_channel_dimensions[] = {
    UTW_SHAPE_SIZE("h", "height, outside"),
    UTW_SHAPE_SIZE("b", "width of the flanges, outside"),
    LIP_ROW,
    UTW_SHAPE_SIZE("t", "thickness"),
    UTW_SHAPE_RADIUS("ri", "inside radius of the bends"),
};

static utw_status formed_check(const utw_shape_case *given, double walls_b, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value;
    UTW_TRY(utw_shape_need_less(given, FORMED_T, v[FORMED_B] / walls_b,
                                UTW_DIM(FORMED_B) | (v[FORMED_C] > 0 ? UTW_DIM(FORMED_C) : 0),
                                err));
    if (v[FORMED_C] > 0)
        UTW_TRY(utw_shape_need_more(given, FORMED_C, v[FORMED_T], UTW_DIM(FORMED_T), err));
    st = UTW_OK;
done:
    return st;
}

/* The end of the flange that runs to the right along y = 0 to x, seen from the web's outer face:
 * outer face, lip, inner face. side = -1 turns it by half a turn about (0, h/2). */
static void formed_flange(utw_draft *draft, const utw_shape_case *given, double x, double side,
                          double h)
{
    const double *v = given->value, t = v[FORMED_T], c = v[FORMED_C], y0 = side > 0 ? 0 : h;
    if (c > 0) {
        utw_draft_round(draft, side * x, y0, given, FORMED_RI, t);
        utw_draft_point(draft, side * x, y0 + side * c);
        utw_draft_point(draft, side * (x - t), y0 + side * c);
        utw_draft_round(draft, side * (x - t), y0 + side * t, given, FORMED_RI, 0);
    } else {
        utw_draft_point(draft, side * x, y0);
        utw_draft_point(draft, side * x, y0 + side * t);
    }
}

static utw_status build_formed_channel(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, h = v[FORMED_H], b = v[FORMED_B], t = v[FORMED_T],
                 c = v[FORMED_C];
    UTW_TRY(utw_shape_need_less(given, FORMED_T, h / 2, UTW_DIM(FORMED_H), err));
    UTW_TRY(formed_check(given, c > 0 ? 2 : 1, err));
    UTW_TRY(utw_shape_need_less(given, FORMED_C, h / 2, UTW_DIM(FORMED_H), err));
    utw_draft_begin(draft);
    utw_draft_round(draft, 0, 0, given, FORMED_RI, t);
    formed_flange(draft, given, b, 1, h);
    utw_draft_round(draft, t, t, given, FORMED_RI, 0);
    utw_draft_round(draft, t, h - t, given, FORMED_RI, 0);
    if (c > 0) {
        utw_draft_round(draft, b - t, h - t, given, FORMED_RI, 0);
        utw_draft_point(draft, b - t, h - c);
        utw_draft_point(draft, b, h - c);
        utw_draft_round(draft, b, h, given, FORMED_RI, t);
    } else {
        utw_draft_point(draft, b, h - t);
        utw_draft_point(draft, b, h);
    }
    utw_draft_round(draft, 0, h, given, FORMED_RI, t);
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_formed_channel = {
    "formed-channel",
    "cold-formed channel with or without lips",
    "lower corner of the web's back (of its sharp corners); opens to the right",
    "      |<------ b ------>|\n"
    "  -    .---------------.    -\n"
    "  |   / .-------------. \\   |\n"
    "  |   | | ri          | |   c\n"
    "  |   | |             '-'   -\n"
    "  |   | |\n"
    "  h   |-| t\n"
    "  |   | |\n"
    "  |   | |             .-.\n"
    "  |   | |             | |\n"
    "  |   \\ '-------------' /\n"
    "  -    '---------------'\n",
    UTW_SHAPE_ROWS(formed_channel_dimensions),
    build_formed_channel,
};

static const utw_shape_dimension formed_zed_dimensions[] = {
    UTW_SHAPE_SIZE("h", "height, outside"),
    UTW_SHAPE_SIZE("b", "width of the flanges, outside, web included"),
    LIP_ROW,
    UTW_SHAPE_SIZE("t", "thickness"),
    UTW_SHAPE_RADIUS("ri", "inside radius of the bends"),
};

static utw_status build_formed_zed(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, h = v[FORMED_H], t = v[FORMED_T], x = v[FORMED_B] - t / 2;
    UTW_TRY(utw_shape_need_less(given, FORMED_T, h, UTW_DIM(FORMED_H), err));
    UTW_TRY(formed_check(given, v[FORMED_C] > 0 ? 2 : 1, err));
    utw_draft_begin(draft);
    for (int side = 1; side >= -1; side -= 2) {
        const double y0 = side > 0 ? 0 : h;
        utw_draft_round(draft, -side * t / 2, y0, given, FORMED_RI, t);
        formed_flange(draft, given, x, side, h);
        utw_draft_round(draft, side * t / 2, y0 + side * t, given, FORMED_RI, 0);
    }
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_formed_zed = {
    "formed-zed",
    "cold-formed zed with or without lips",
    "middle of the web's lower end; the top flange goes left, the bottom one right",
    "      |<----- b ----->|\n"
    "  -    .-------------.        -\n"
    "  |   / .----------.  \\       |\n"
    "  c   | |        ri \\  |      |\n"
    "  -   '-'            | |      |\n"
    "                     |-| t    h\n"
    "                     | |\n"
    "                     | |            .-.\n"
    "                     | \\ ri         | |\n"
    "                      \\ '-----------' /\n"
    "                       '+-----------'\n",
    UTW_SHAPE_ROWS(formed_zed_dimensions),
    build_formed_zed,
};
