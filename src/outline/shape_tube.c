/* SPDX-License-Identifier: GPL-3.0-or-later
 * Tubes: round, rectangular, slit; and the strip bent to an arc. */
#include "base/status.h"
#include "base/vec2.h"
#include "outline/shape.h"

/* ---- round tube ---- */

static const utw_shape_dimension tube_dimensions[] = {
    UTW_SHAPE_SIZE("d", "outer diameter"),
    UTW_SHAPE_SIZE("t", "wall thickness"),
};

static utw_status build_tube(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    const double d = given->value[0], t = given->value[1];
    const utw_status st = utw_shape_need_less(given, 1, d / 2, UTW_DIM(0), err);
    if (st != UTW_OK) return st;
    utw_draft_circle(draft, 0, 0, d / 2);
    utw_draft_circle(draft, 0, 0, d / 2 - t);
    return UTW_OK;
}

const utw_shape utw_shape_tube = {
    "tube",
    "round tube",
    "centre",
    "         .-'''''-.\n"
    "       .'  .---.  '.\n"
    "      /  .'     '.  \\\n"
    "      |  |   +   |<>| t\n"
    "      \\  '.     .'  /\n"
    "       '.  '---'  .'\n"
    "         '-.....-'\n"
    "      |<---- d ---->|\n",
    UTW_SHAPE_ROWS(tube_dimensions),
    build_tube,
};

/* ---- rectangular tube ---- */

enum { BOX_H, BOX_B, BOX_T, BOX_TF, BOX_RO, BOX_RI };

static const utw_shape_dimension box_dimensions[] = {
    UTW_SHAPE_SIZE("h", "height, outside"),
    UTW_SHAPE_SIZE("b", "width, outside"),
    UTW_SHAPE_SIZE("t", "thickness of the walls"),
    UTW_SHAPE_SIZE_OR("tf", "thickness of the top and bottom walls", "t"),
    UTW_SHAPE_RADIUS("ro", "outer corner radius"),
    {"ri", "inner corner radius", UTW_SHAPE_IN_LENGTH, 0, (double)NAN, "ro - t, at least 0", 0, 1e9,
     0},
};

/* The corner of the cavity must stay inside the outer arc. With the outer arc's centre as origin
 * the inner arc's lies at (a - ri, c - ri), a = ro - t, c = ro - tf, so its farthest point is
 * hypot(a - ri, c - ri) + ri away. That is less than ro for ri above the lesser root of (ro - ri)^2
 * = (a - ri)^2 + (c - ri)^2. */
static utw_status box_corner(const utw_shape_case *given, utw_error *err)
{
    const double *v = given->value, ro = v[BOX_RO], a = ro - v[BOX_T], c = ro - v[BOX_TF];
    if (!(a > v[BOX_RI]) || !(c > v[BOX_RI]))
        return UTW_OK; /* farthest where the wall is straight */
    const double q = a + c - ro, least = q - sqrt(fmax(0, q * q + ro * ro - a * a - c * c));
    if (least < 0) return UTW_OK;
    return utw_shape_need_more(given, BOX_RI, least,
                               UTW_DIM(BOX_RO) | UTW_DIM(BOX_T) | UTW_DIM(BOX_TF), err);
}

static void box_loop(utw_draft *draft, double x, double y, const utw_shape_case *given, int radius)
{
    utw_draft_begin(draft);
    utw_draft_round(draft, -x, -y, given, radius, 0);
    utw_draft_round(draft, x, -y, given, radius, 0);
    utw_draft_round(draft, x, y, given, radius, 0);
    utw_draft_round(draft, -x, y, given, radius, 0);
}

static utw_status build_box(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value;
    const double tf = utw_shape_default(given, BOX_TF, v[BOX_T]);
    utw_shape_default(given, BOX_RI, fmax(0, v[BOX_RO] - v[BOX_T]));
    UTW_TRY(utw_shape_need_less(given, BOX_T, v[BOX_B] / 2, UTW_DIM(BOX_B), err));
    UTW_TRY(utw_shape_need_less(given, BOX_TF, v[BOX_H] / 2, UTW_DIM(BOX_H), err));
    UTW_TRY(box_corner(given, err));
    box_loop(draft, v[BOX_B] / 2, v[BOX_H] / 2, given, BOX_RO);
    box_loop(draft, v[BOX_B] / 2 - v[BOX_T], v[BOX_H] / 2 - tf, given, BOX_RI);
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_box = {
    "box",
    "rectangular tube",
    "centre",
    "      |<------- b ------->|\n"
    "  -   .-------------------.  -\n"
    "  |  /ro .-------------.   \\ tf\n"
    "  |  |  /ri             \\  | -\n"
    "  |  |  |               |  |\n"
    "  h  |  |       +       |<>| t\n"
    "  |  |  |               |  |\n"
    "  |  |  \\               /  |\n"
    "  |  \\   '-------------'   /\n"
    "  -   '-------------------'\n",
    UTW_SHAPE_ROWS(box_dimensions),
    build_box,
};

/* ---- slit tube ---- */

enum { SLIT_D, SLIT_T, SLIT_GAP };

static const utw_shape_dimension slit_dimensions[] = {
    UTW_SHAPE_SIZE("d", "outer diameter"),
    UTW_SHAPE_SIZE("t", "wall thickness"),
    UTW_SHAPE_SIZE("gap", "width of the slit, its faces parallel"),
};

static utw_status build_slit_tube(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, r = v[SLIT_D] / 2, ri = r - v[SLIT_T], g = v[SLIT_GAP] / 2;
    UTW_TRY(utw_shape_need_less(given, SLIT_T, r, UTW_DIM(SLIT_D), err));
    UTW_TRY(utw_shape_need_less(given, SLIT_GAP, 2 * ri, UTW_DIM(SLIT_D) | UTW_DIM(SLIT_T), err));
    const double a = asin(g / r), ai = asin(g / ri);
    const double x = sqrt((r - g) * (r + g)), xi = sqrt((ri - g) * (ri + g));
    utw_draft_begin(draft);
    utw_draft_point(draft, x, g);
    utw_draft_arc(draft, 0, 0, r, a, 2 * UTW_PI - a, x, -g);
    utw_draft_point(draft, xi, -g);
    utw_draft_arc(draft, 0, 0, ri, 2 * UTW_PI - ai, ai, xi, g);
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_slit_tube = {
    "slit-tube",
    "round tube slit along its length",
    "centre; the slit points to the right",
    "         .-'''''-.\n"
    "       .'  .---.  '.\n"
    "      /  .'     '.__\\  -\n"
    "      |  |   +          gap\n"
    "      \\  '.     .'--/  -\n"
    "       '.  '---'  .'\n"
    "         '-.....-'  |<>| t (wall)\n"
    "      |<---- d ---->|\n",
    UTW_SHAPE_ROWS(slit_dimensions),
    build_slit_tube,
};

/* ---- arc strip ---- */

enum { STRIP_R, STRIP_T, STRIP_ANGLE };

static const utw_shape_dimension strip_dimensions[] = {
    UTW_SHAPE_SIZE("r", "radius of the middle of the strip"),
    UTW_SHAPE_SIZE("t", "thickness"),
    {"angle", "angle of the arc", UTW_SHAPE_IN_DEGREES, 1, (double)NAN, "", 0, 359.9, 1},
};

static utw_status build_arc_strip(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, t = v[STRIP_T], half = v[STRIP_ANGLE] * (UTW_PI / 360);
    UTW_TRY(utw_shape_need_less(given, STRIP_T, 2 * v[STRIP_R], UTW_DIM(STRIP_R), err));
    const double ro = v[STRIP_R] + t / 2, ri = v[STRIP_R] - t / 2;
    const double c = v[STRIP_ANGLE] == 180 ? 0 : -cos(half), s = sin(half);
    const double a0 = UTW_PI - half, a1 = UTW_PI + half;
    utw_draft_begin(draft);
    utw_draft_point(draft, ro * c, ro * s);
    utw_draft_arc(draft, 0, 0, ro, a0, a1, ro * c, -ro * s);
    utw_draft_point(draft, ri * c, -ri * s);
    utw_draft_arc(draft, 0, 0, ri, a1, a0, ri * c, ri * s);
    st = UTW_OK;
done:
    return st;
}

const utw_shape utw_shape_arc_strip = {
    "arc-strip",
    "strip bent to an arc of a circle",
    "centre of the circle; the strip lies to its left and opens to the right",
    "           .-'''/\n"
    "        .-'   .'\n"
    "      .'    -'\\\n"
    "     /    .'   \\\n"
    "    |    /      \\          t: from inner to outer face\n"
    "    |   |<- r -->+ angle   r: to the middle of the strip\n"
    "    |    \\      /\n"
    "     \\    '.   /\n"
    "      '.    -./\n"
    "        '-.   '.\n"
    "           '-...\\\n",
    UTW_SHAPE_ROWS(strip_dimensions),
    build_arc_strip,
};
