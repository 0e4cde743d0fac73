/* SPDX-License-Identifier: GPL-3.0-or-later
 * Solid shapes with straight or plain edges: rectangle, round, ellipse, regular polygon, trapezium.
 */
#include "base/status.h"
#include "base/vec2.h"
#include "outline/shape.h"

/* ---- rectangle ---- */

enum { RECTANGLE_B, RECTANGLE_H, RECTANGLE_R };

static const utw_shape_dimension rectangle_dimensions[] = {
    UTW_SHAPE_SIZE("b", "width"),
    UTW_SHAPE_SIZE("h", "height"),
    UTW_SHAPE_RADIUS("r", "corner radius"),
};

static utw_status build_rectangle(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    (void)err;
    const double x = given->value[RECTANGLE_B] / 2, y = given->value[RECTANGLE_H] / 2;
    utw_draft_begin(draft);
    utw_draft_round(draft, -x, -y, given, RECTANGLE_R, 0);
    utw_draft_round(draft, x, -y, given, RECTANGLE_R, 0);
    utw_draft_round(draft, x, y, given, RECTANGLE_R, 0);
    utw_draft_round(draft, -x, y, given, RECTANGLE_R, 0);
    return UTW_OK;
}

const utw_shape utw_shape_rectangle = {
    "rectangle",
    "flat or square bar",
    "centre",
    "      |<------ b ------>|\n"
    "  -    .---------------.\n"
    "  |   /r                \\\n"
    "  |   |                 |\n"
    "  h   |        +        |\n"
    "  |   |                 |\n"
    "  |   \\                 /\n"
    "  -    '---------------'\n",
    UTW_SHAPE_ROWS(rectangle_dimensions),
    build_rectangle,
};

/* ---- round and ellipse ---- */

static const utw_shape_dimension round_dimensions[] = {UTW_SHAPE_SIZE("d", "diameter")};

static utw_status build_round(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    (void)err;
    utw_draft_circle(draft, 0, 0, given->value[0] / 2);
    return UTW_OK;
}

const utw_shape utw_shape_round = {
    "round",
    "round bar",
    "centre",
    "        .-'''''-.\n"
    "      .'         '.\n"
    "     /             \\\n"
    "     |<---- d ---->|\n"
    "     \\             /\n"
    "      '.         .'\n"
    "        '-.....-'\n",
    UTW_SHAPE_ROWS(round_dimensions),
    build_round,
};

static const utw_shape_dimension ellipse_dimensions[] = {
    UTW_SHAPE_SIZE("b", "width (the whole axis along x)"),
    UTW_SHAPE_SIZE("h", "height (the whole axis along y)"),
};

static utw_status build_ellipse(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    (void)err;
    utw_draft_ellipse(draft, 0, 0, given->value[0] / 2, given->value[1] / 2);
    return UTW_OK;
}

const utw_shape utw_shape_ellipse = {
    "ellipse",
    "elliptical bar",
    "centre",
    "  -       .-'''''''-.\n"
    "  |    .-'           '-.\n"
    "  h   (        +        )\n"
    "  |    '-.           .-'\n"
    "  -       '-.......-'\n"
    "      |<------ b ------>|\n",
    UTW_SHAPE_ROWS(ellipse_dimensions),
    build_ellipse,
};

/* ---- regular polygon ---- */

enum { POLYGON_N, POLYGON_S, POLYGON_D, POLYGON_R };

static const utw_shape_dimension polygon_dimensions[] = {
    {"n", "number of sides", UTW_SHAPE_IN_COUNT, 1, (double)NAN, "", 3, 360, 0},
    UTW_SHAPE_SIZE_OR("s", "diameter of the inscribed circle: width across flats when n is even",
                      "from d"),
    UTW_SHAPE_SIZE_OR("d", "diameter of the circle through the corners", "from s"),
    UTW_SHAPE_RADIUS("r", "corner radius"),
};

static utw_status build_polygon(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    const int n = (int)given->value[POLYGON_N];
    if (given->given[POLYGON_S] == given->given[POLYGON_D])
        return utw_fail(err, UTW_E_SYNTAX, "polygon: %s: give one of them",
                        given->given[POLYGON_S] ? "s and d are both given" : "s or d is missing");
    const double flat = cos(UTW_PI / n);
    const double radius =
        given->given[POLYGON_D] ? given->value[POLYGON_D] / 2 : given->value[POLYGON_S] / 2 / flat;
    utw_draft_begin(draft);
    for (int i = 0; i < n;
         i++) { /* the side at the bottom is level; right half mirrors left half */
        const int mirrored = 2 * i >= n;
        const double a = UTW_PI * (2 * (mirrored ? n - 1 - i : i) + 1) / n;
        const double x = 2 * (mirrored ? n - 1 - i : i) + 1 == n ? 0 : radius * sin(a);
        utw_draft_round(draft, mirrored ? -x : x, -radius * cos(a), given, POLYGON_R, 0);
    }
    return UTW_OK;
}

const utw_shape utw_shape_polygon = {
    "polygon",
    "regular polygon, such as hexagon bar",
    "centre; the lowest side is level",
    "  -       .---------.\n"
    "  |      /           \\ r\n"
    "  |     /             \\\n"
    "  s    <------ d ------>     (n = 6)\n"
    "  |     \\             /\n"
    "  |      \\           /\n"
    "  -       '---------'\n",
    UTW_SHAPE_ROWS(polygon_dimensions),
    build_polygon,
};

/* ---- trapezium ---- */

enum { TRAPEZIUM_B, TRAPEZIUM_H, TRAPEZIUM_A, TRAPEZIUM_SHIFT, TRAPEZIUM_R };

static const utw_shape_dimension trapezium_dimensions[] = {
    UTW_SHAPE_SIZE("b", "width at the bottom"),
    UTW_SHAPE_SIZE("h", "height"),
    {"a", "width at the top; 0 makes a triangle", UTW_SHAPE_IN_LENGTH, 1, (double)NAN, "", 0, 1e9,
     0},
    {"shift", "how far right of the bottom's middle the top's middle lies", UTW_SHAPE_IN_LENGTH, 0,
     0.0, "", -1e9, 1e9, 0},
    UTW_SHAPE_RADIUS("r", "corner radius"),
};

static utw_status build_trapezium(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    (void)err;
    const double *v = given->value, x = v[TRAPEZIUM_B] / 2, a = v[TRAPEZIUM_A] / 2;
    utw_draft_begin(draft);
    utw_draft_round(draft, -x, 0, given, TRAPEZIUM_R, 0);
    utw_draft_round(draft, x, 0, given, TRAPEZIUM_R, 0);
    utw_draft_round(draft, v[TRAPEZIUM_SHIFT] + a, v[TRAPEZIUM_H], given, TRAPEZIUM_R, 0);
    utw_draft_round(draft, v[TRAPEZIUM_SHIFT] - a, v[TRAPEZIUM_H], given, TRAPEZIUM_R, 0);
    return UTW_OK;
}

const utw_shape utw_shape_trapezium = {
    "trapezium",
    "trapezium or triangle",
    "middle of the bottom",
    "             |<->| shift\n"
    "          |<-----a----->|\n"
    "  -       .-------------.\n"
    "  |      /   :   :       \\\n"
    "  h     /    :   :         \\\n"
    "  |    /r    :               \\\n"
    "  -   '------+-----------------'\n"
    "      |<--------- b ---------->|\n",
    UTW_SHAPE_ROWS(trapezium_dimensions),
    build_trapezium,
};
