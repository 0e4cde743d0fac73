/* SPDX-License-Identifier: GPL-3.0-or-later
 * A field as filled contours: bands of colour between round levels, their lines with labels, and
 * the key. */
#ifndef UTW_DRAW_BANDS_H
#define UTW_DRAW_BANDS_H

#include "draw/contour.h"
#include "draw/layout.h"
#include "draw/marks.h"
#include "draw/ticks.h"
#include "outline/outline.h"

/** How values become colours. */
typedef struct utw_bands {
    utw_ticks ticks; /* the levels */
    int is_signed;   /* 1: zero in the middle of the signed map; 0: magnitudes from 0 */
    double most;     /* the value at the end of the map */
    int open_above;  /* 1: values beyond the last level exist and are not told (no bound) */
    char unit[64];   /* what the numbers of the key are in */
} utw_bands;

/** Bands for values from low to high, at most `most` levels. Magnitudes begin at 0. A field without
 * any variation gets two bands about 0. */
utw_bands utw_bands_of(double low, double high, int is_signed, int most, const char *unit);

/** Colour of the band above level k. */
utw_colour utw_band_colour(const utw_bands *bands, long k);

/** Room that the key needs, put into a request (layout.h). `name` stands over it, may be "". */
void utw_key_request(utw_canvas *canvas, const utw_bands *bands, const char *name,
                     utw_request *request);

/** Draw the key where the layout has put it. */
void utw_key_draw(const utw_page *page, const utw_bands *bands, const char *name);

/** Fill the section and draw the lines with their labels; the outline and then the points on top.
 * [in] sampling, mapped onto the page; value[n_vertex]; outline; mark[n_mark]. With lines = 0 there
 * are only fills. UTW_E_NOMEM. */
utw_status utw_bands_draw(const utw_page *page, const utw_bands *bands,
                          const utw_sampling *sampling, const double *value,
                          const utw_outline *outline, int n_mark, const utw_point_mark *mark,
                          int lines, utw_error *err);

#endif
