/* SPDX-License-Identifier: GPL-3.0-or-later
 * Shafts: with keyways, with straight-sided splines; solid or bored. */
#include "base/status.h"
#include "base/vec2.h"
#include "outline/shape.h"

/* A place on the shaft: drawn at the top, then turned to where it belongs. */
typedef struct turned {
    utw_draft *draft;
    double angle, cs[2];
} turned;

static turned turned_to(utw_draft *draft, int k, int n)
{
    turned at = {.draft = draft, .angle = 2 * UTW_PI * k / n};
    utw_draft_cos_sin(at.angle, at.cs);
    return at;
}

static void turn(const turned *at, double x, double y, double xy[2])
{
    xy[0] = at->cs[0] * x - at->cs[1] * y;
    xy[1] = at->cs[1] * x + at->cs[0] * y;
}

static void point(const turned *at, double x, double y)
{
    double p[2];
    turn(at, x, y, p);
    utw_draft_point(at->draft, p[0], p[1]);
}

static void fillet(const turned *at, double x, double y, const utw_shape_case *given, int dimension)
{
    double p[2];
    turn(at, x, y, p);
    utw_draft_round(at->draft, p[0], p[1], given, dimension, 0);
}

static void arc(const turned *at, double xc, double yc, double r, double a0, double a1, double x,
                double y)
{
    double p[2], c[2];
    turn(at, x, y, p);
    turn(at, xc, yc, c);
    utw_draft_arc(at->draft, c[0], c[1], r, a0 + at->angle, a1 + at->angle, p[0], p[1]);
}

/* ---- keyed shaft ---- */

enum { KEYED_D, KEYED_B, KEYED_T, KEYED_R, KEYED_N, KEYED_BORE };

static const utw_shape_dimension keyed_dimensions[] = {
    UTW_SHAPE_SIZE("d", "diameter of the shaft"),
    UTW_SHAPE_SIZE("b", "width of the keyway"),
    UTW_SHAPE_SIZE("t", "depth of the keyway, from the shaft's circumference at its middle"),
    UTW_SHAPE_RADIUS("r", "radius at the bottom of the keyway"),
    {"n", "number of keyways, evenly spaced", UTW_SHAPE_IN_COUNT, 0, 1.0, "", 1, 12, 0},
    UTW_SHAPE_RADIUS("bore", "diameter of the bore, 0 for none"),
};

static utw_status keyed_check(const utw_shape_case *given, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, d = v[KEYED_D], b = v[KEYED_B], t = v[KEYED_T];
    const unsigned d_b = UTW_DIM(KEYED_D) | UTW_DIM(KEYED_B);
    UTW_TRY(utw_shape_need_less(given, KEYED_B, d, UTW_DIM(KEYED_D), err));
    UTW_TRY(utw_shape_need_less(given, KEYED_BORE, d, UTW_DIM(KEYED_D), err));
    /* the bottom lies below the edges of the slot and outside the bore */
    UTW_TRY(utw_shape_need_more(given, KEYED_T, d / 2 - sqrt((d - b) * (d + b)) / 2, d_b, err));
    UTW_TRY(utw_shape_need_less(given, KEYED_T, (d - v[KEYED_BORE]) / 2,
                                UTW_DIM(KEYED_D) | UTW_DIM(KEYED_BORE), err));
    if (v[KEYED_N] > 2) /* neighbours' bottom corners, and so the edges, stay apart */
        UTW_TRY(utw_shape_need_less(given, KEYED_B, (d - 2 * t) * tan(UTW_PI / v[KEYED_N]),
                                    UTW_DIM(KEYED_D) | UTW_DIM(KEYED_T) | UTW_DIM(KEYED_N), err));
    st = UTW_OK;
done:
    return st;
}

static utw_status build_keyed(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    const double *v = given->value, r = v[KEYED_D] / 2, x = v[KEYED_B] / 2;
    const int n = (int)v[KEYED_N];
    const utw_status st = keyed_check(given, err);
    if (st != UTW_OK) return st;
    const double edge = sqrt((r - x) * (r + x)), bottom = r - v[KEYED_T], half = asin(x / r);
    utw_draft_begin(draft);
    utw_draft_point(draft, x, edge);
    for (int k = 0; k < n; k++) {
        const turned at = turned_to(draft, k, n), next = turned_to(draft, (k + 1) % n, n);
        fillet(&at, x, bottom, given, KEYED_R);
        fillet(&at, -x, bottom, given, KEYED_R);
        point(&at, -x, edge);
        double p[2];
        turn(&next, x, edge, p);
        utw_draft_arc(draft, 0, 0, r, at.angle + UTW_PI / 2 + half,
                      at.angle + 2 * UTW_PI / n + UTW_PI / 2 - half, p[0], p[1]);
    }
    if (v[KEYED_BORE] > 0) utw_draft_circle(draft, 0, 0, v[KEYED_BORE] / 2);
    return UTW_OK;
}

const utw_shape utw_shape_keyed_shaft = {
    "keyed-shaft",
    "round shaft with rectangular keyways",
    "centre; the first keyway is at the top",
    "               |<- b ->|\n"
    "          _.-''|       |''-._     - (top of the circle)\n"
    "        .'     |       |     '.   t\n"
    "       /      r'-------'       \\  -\n"
    "      |                         |\n"
    "      |           .-.           |    n keyways\n"
    "      |          ( + ) bore     |\n"
    "      |           '-'           |\n"
    "       \\                       /\n"
    "        '.                   .'\n"
    "          '-._           _.-'\n"
    "              ''-------''\n"
    "      |<---------- d ---------->|\n",
    UTW_SHAPE_ROWS(keyed_dimensions),
    build_keyed,
};

/* ---- splined shaft ---- */

enum { SPLINED_N, SPLINED_D, SPLINED_DO, SPLINED_B, SPLINED_R, SPLINED_BORE };

static const utw_shape_dimension splined_dimensions[] = {
    {"n", "number of splines", UTW_SHAPE_IN_COUNT, 1, (double)NAN, "", 2, 100, 0},
    UTW_SHAPE_SIZE("d", "inner diameter, at the bottom of the spaces"),
    UTW_SHAPE_SIZE("D", "outer diameter, at the top of the splines"),
    UTW_SHAPE_SIZE("b", "width of a spline, its sides parallel"),
    UTW_SHAPE_RADIUS("r", "radius at the foot of the splines"),
    UTW_SHAPE_RADIUS("bore", "diameter of the bore, 0 for none"),
};

/* The fillet at the foot touches the side x = b/2 and the circle of radius ri from outside: its
 * centre is at x = b/2 + r, ri + r from the shaft's centre. It must end below the spline's edge,
 * which gives r <= (ro^2 - ri^2)/(2 ri - b), and leave its neighbour room on the circle: b/2 + r <=
 * (ri + r) sin(pi/n). */
static utw_status splined_check(const utw_shape_case *given, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const double *v = given->value, ri = v[SPLINED_D] / 2, ro = v[SPLINED_DO] / 2, b = v[SPLINED_B];
    const double s = v[SPLINED_N] == 2 ? 1 : sin(UTW_PI / v[SPLINED_N]);
    const unsigned n_d = UTW_DIM(SPLINED_N) | UTW_DIM(SPLINED_D);
    UTW_TRY(utw_shape_need_more(given, SPLINED_DO, 2 * ri, UTW_DIM(SPLINED_D), err));
    UTW_TRY(utw_shape_need_less(given, SPLINED_BORE, 2 * ri, UTW_DIM(SPLINED_D), err));
    UTW_TRY(utw_shape_need_less(given, SPLINED_B, 2 * ri * s, n_d, err));
    UTW_TRY(utw_shape_need_at_most(given, SPLINED_R, (ro - ri) * (ro + ri) / (2 * ri - b),
                                   UTW_DIM(SPLINED_D) | UTW_DIM(SPLINED_DO) | UTW_DIM(SPLINED_B),
                                   err));
    if (s < 1)
        UTW_TRY(utw_shape_need_at_most(given, SPLINED_R, (ri * s - b / 2) / (1 - s),
                                       n_d | UTW_DIM(SPLINED_B), err));
    st = UTW_OK;
done:
    return st;
}

static utw_status build_splined(utw_shape_case *given, utw_draft *draft, utw_error *err)
{
    const double *v = given->value, ri = v[SPLINED_D] / 2, ro = v[SPLINED_DO] / 2;
    const double x = v[SPLINED_B] / 2, r = v[SPLINED_R];
    const int n = (int)v[SPLINED_N];
    const utw_status st = splined_check(given, err);
    if (st != UTW_OK) return st;
    const double xc = x + r, foot = sqrt((ri - x) * (ri + x + 2 * r)); /* (ri + r)^2 - (x + r)^2 */
    const double top = sqrt((ro - x) * (ro + x)), half = asin(x / ro);
    const double lean = asin(xc / (ri + r)),
                 in = ri / (ri + r); /* of the line to the fillet's centre */
    const double right = UTW_PI / 2;
    utw_draft_begin(draft);
    utw_draft_point(draft, in * xc, in * foot);
    for (int k = 0; k < n; k++) {
        const turned at = turned_to(draft, k, n), next = turned_to(draft, (k + 1) % n, n);
        if (r > 0) arc(&at, xc, foot, r, 3 * right - lean, UTW_PI, x, foot);
        point(&at, x, fmax(top, foot));
        arc(&at, 0, 0, ro, right - half, right + half, -x, fmax(top, foot));
        point(&at, -x, foot);
        if (r > 0) arc(&at, -xc, foot, r, 0, lean - right, -in * xc, in * foot);
        double p[2];
        turn(&next, in * xc, in * foot, p);
        utw_draft_arc(draft, 0, 0, ri, at.angle + right + lean,
                      at.angle + 2 * UTW_PI / n + right - lean, p[0], p[1]);
    }
    if (v[SPLINED_BORE] > 0) utw_draft_circle(draft, 0, 0, v[SPLINED_BORE] / 2);
    return UTW_OK;
}

const utw_shape utw_shape_splined_shaft = {
    "splined-shaft",
    "shaft with straight-sided splines",
    "centre; the first spline points up",
    "                |< b >|\n"
    "                .-----.\n"
    "           __   |     |   __\n"
    "         .'  '-.'     '.-'  '.\n"
    "         '.   r         r   .'\n"
    "           \\       .-.     /\n"
    "            |     ( + )   |      n splines\n"
    "           /       '-'     \\     bore: diameter of the hole\n"
    "         .'                 '.\n"
    "         '.__.-.       .-.__.'\n"
    "                |     |\n"
    "                '-----'\n"
    "            |<---- d ---->|         (at the bottom of the spaces)\n"
    "         |<------- D ------->|      (at the top of the splines)\n",
    UTW_SHAPE_ROWS(splined_dimensions),
    build_splined,
};
