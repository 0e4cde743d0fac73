/* SPDX-License-Identifier: GPL-3.0-or-later
 * Signs of a drawing: points of the section, axes, dimension lines, scale bar, the outline. */
#ifndef UTW_DRAW_MARKS_H
#define UTW_DRAW_MARKS_H

#include "draw/layout.h"
#include "outline/outline.h"

/** Signs of points; they differ in shape, not only in colour. */
enum {
    UTW_SIGN_NONE,
    UTW_SIGN_CENTROID,     /* a circle with two of its quarters filled */
    UTW_SIGN_SHEAR_CENTRE, /* a diamond */
    UTW_SIGN_FLEXURE,      /* a triangle */
    UTW_SIGN_ORIGIN,       /* a small open circle on a cross */
    UTW_SIGN_AXIS,         /* a piece of a dash-dot line */
    UTW_SIGN_LOAD,         /* a full circle with a ring */
    UTW_SIGN_CORNER,       /* a small open circle */
    UTW_SIGN_LEAST,        /* a triangle pointing down */
    UTW_SIGN_GREATEST      /* a triangle pointing up */
};

/** Draw a sign centred at (x, y), for a font of this size [mm]. */
void utw_mark_sign(utw_canvas *canvas, int sign, double x, double y, double size);

/** The path of all loops of an outline, exact curves, left for fill or stroke. */
void utw_mark_outline_path(const utw_page *page, const utw_outline *outline);

/** Note the outline's line where labels must not stand. */
void utw_take_outline(const utw_page *page, const utw_outline *outline);

/** Stroke the outline, and note its line where labels must not stand. */
void utw_mark_outline(const utw_page *page, const utw_outline *outline);

/** Axes of the drawing and a scale bar of round length, in a strip. */
void utw_mark_axes_and_scale(const utw_page *page, utw_box strip, const char *unit);

/** Dimension lines of the extent of an outline: its width below, its height on the left. */
void utw_mark_extent(const utw_page *page, const double box[4], const char *unit);

/** A line from a to b [mm] with an arrow head at b. */
void utw_mark_arrow(utw_canvas *canvas, const double a[2], const double b[2], double head,
                    const utw_pen *pen);

/** A point of the section with its letter, at a place in the drawing's units [L]. */
typedef struct utw_point_mark {
    int sign;
    const char *letter; /* "": none */
    double at[2];
} utw_point_mark;

enum { UTW_POINTS_MAX = 8 };

/** Points with the places of their letters. Letters of points that fall together on the page stand
 * in one label. */
typedef struct utw_points {
    int n, n_label;
    struct {
        int sign;
        double xy[2]; /* [mm] */
    } point[UTW_POINTS_MAX];
    struct {
        char text[64];
        utw_box box;
    } label[UTW_POINTS_MAX];
} utw_points;

/** Choose places for the letters and take the room of signs and letters; call it before what may
 * give way to them is drawn. [in] mark[n], borrowed; those beyond UTW_POINTS_MAX are left out. */
void utw_points_place(const utw_page *page, int n, const utw_point_mark *mark, utw_points *points);

/** Draw them; letters stand on a pale plate. */
void utw_points_draw(const utw_page *page, const utw_points *points);

#endif
