/* SPDX-License-Identifier: GPL-3.0-or-later
 * What the kinds of pictures have in common, and the functions that draw them. */
#ifndef UTW_DRAW_PICTURE_H
#define UTW_DRAW_PICTURE_H

#include "draw/layout.h"
#include "draw/marks.h"
#include "draw/ticks.h"
#include "section/solution.h"

/** What a picture is drawn from and on. All borrowed. */
typedef struct utw_sitting {
    const utw_solution *solution;
    const utw_draw_options *options;
    utw_canvas *canvas;
} utw_sitting;

/** A constant's value; NAN when the section does not have it. */
double utw_sitting_value(const utw_sitting *sitting, utw_constant which);

/** A length or coordinate [L] as text, 0 when it is rounding of the section's size. */
void utw_sitting_length(const utw_sitting *sitting, double length, char *text, size_t n);

/** Name of the section, or "Section" when it has none. */
const char *utw_sitting_title(const utw_sitting *sitting);

/** The box of the outline, grown to hold centroid and shear centre (and the centre of flexure when
 * `flexure`) unless that makes it more than `most` times as large: box[4] [L]. */
void utw_sitting_box(const utw_sitting *sitting, int flexure, double most, double box[4]);

/** Centroid, shear centre (and centre of flexure) as points for utw_points_place(). Returns how
 * many; those outside `box` are left out. point[4]. */
int utw_sitting_points(const utw_sitting *sitting, int flexure, const double box[4],
                       utw_point_mark *point);

/** A request with title, width and unit filled in. */
utw_request utw_sitting_request(const utw_sitting *sitting, const char *subject,
                                const utw_notes *notes);

/** The frame of the solved net on a page. */
utw_frame utw_sitting_frame(const utw_sitting *sitting, const utw_page *page);

/** How fine a sampling of the net must be for a page of this sitting on which the section's box is
 * shown. */
utw_fineness utw_sitting_fineness(const utw_sitting *sitting);

/** Draw the pictures. UTW_E_NOMEM and what is said beside each. */
utw_status utw_picture_outline(const utw_sitting *sitting, utw_error *err);
utw_status utw_picture_mesh(const utw_sitting *sitting, utw_error *err);
utw_status utw_picture_warping(const utw_sitting *sitting, utw_error *err);
utw_status utw_picture_warped(const utw_sitting *sitting, utw_error *err);
/** Also UTW_E_LOAD: no load case, or none of that name; UTW_E_MATERIAL. */
utw_status utw_picture_stress(const utw_sitting *sitting, utw_error *err);

/** Draw any of them. UTW_E_ARGUMENT: unknown, or options out of range. */
utw_status utw_picture_draw(const utw_solution *solution, utw_picture what,
                            const utw_draw_options *options, utw_canvas *canvas, utw_error *err);

#endif
