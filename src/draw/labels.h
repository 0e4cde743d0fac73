/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where text may stand: a page raster of what is taken by lines and by other text. */
#ifndef UTW_DRAW_LABELS_H
#define UTW_DRAW_LABELS_H

#include "draw/canvas.h"
#include "draw/contour.h"

typedef struct utw_labels utw_labels;

/** A free page of width x height [mm]. Returned owned: utw_labels_free(). UTW_E_NOMEM. */
utw_status utw_labels_create(double width, double height, utw_labels **labels, utw_error *err);
void utw_labels_free(utw_labels *labels);

/** Lines and text take the cells they touch. A contour (id 1 .. 4000) gives way to its own labels
 * only. */
void utw_labels_take_line(utw_labels *labels, const double a[2], const double b[2]);
void utw_labels_take_box(utw_labels *labels, utw_box box);
void utw_labels_take_contour(utw_labels *labels, const utw_paths *paths, int id);

/** 1 when the box, widened by `gap` on all sides, lies on the page and is free of all but contour
 * `id` (0: of all). */
int utw_labels_free_for(const utw_labels *labels, utw_box box, double gap, int id);

/** 1 when the line from a to b is free but for its first `skip` mm. */
int utw_labels_free_line(const utw_labels *labels, const double a[2], const double b[2],
                         double skip);

/** A free box of the given size near (x, y): the first free one of the places around it, on the
 * right and the left first, from `near` to `far` [mm] off. Returns 1 and *box when found. */
int utw_labels_find(const utw_labels *labels, double x, double y, double width, double height,
                    double near, double far, double gap, utw_box *box);

/** The side of a raster cell [mm]. */
#define UTW_LABEL_CELL 0.2

#endif
