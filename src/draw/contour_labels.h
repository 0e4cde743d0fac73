/* SPDX-License-Identifier: GPL-3.0-or-later
 * Numbers at contour lines: on the line where there is room, else outside the section at the line's
 * end. */
#ifndef UTW_DRAW_CONTOUR_LABELS_H
#define UTW_DRAW_CONTOUR_LABELS_H

#include "draw/bands.h"

typedef struct utw_contour_label {
    long level;
    utw_box box;
    int outside; /* 1: beside the end `at` of the line */
    double at[2];
} utw_contour_label;

/** Start from {0}; free with utw_contour_labels_clear(). */
typedef struct utw_contour_labels {
    int n;
    utw_contour_label *label; /* [n], owned */
    size_t capacity;
} utw_contour_labels;

/** Choose places. [in] line[last - first + 1]: the lines of level first + k. What is set so far and
 * all lines are kept clear. UTW_E_NOMEM. */
utw_status utw_contour_labels_place(const utw_page *page, const utw_bands *bands,
                                    const utw_paths *line, utw_contour_labels *labels,
                                    utw_error *err);

/** Set the numbers. */
void utw_contour_labels_set(const utw_page *page, const utw_bands *bands,
                            const utw_contour_labels *labels);

void utw_contour_labels_clear(utw_contour_labels *labels);

#endif
