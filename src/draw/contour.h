/* SPDX-License-Identifier: GPL-3.0-or-later
 * Lines of equal value on a sampling, and the regions where the value is at least a level. */
#ifndef UTW_DRAW_CONTOUR_H
#define UTW_DRAW_CONTOUR_H

#include "draw/sampling.h"

/** Chains of points. Start from {0}; free with utw_paths_clear(). */
typedef struct utw_paths {
    int n_path, n_point;
    int *first;            /* [n_path] first point of each; owned */
    unsigned char *closed; /* [n_path] 1: the last point joins the first; owned */
    double (*xy)[2];       /* [n_point], owned */
    size_t path_capacity, closed_capacity, point_capacity;
} utw_paths;

void utw_paths_clear(utw_paths *paths);

/** Points of path k: from first[k] to before the result. */
int utw_paths_end(const utw_paths *paths, int k);

/** Values change linearly over each triangle of the sampling; value[n_vertex]. `region` gets the
 * closed boundaries, to be filled by the non-zero rule, of where the value is at least `level`;
 * `line` the line between. Either may be NULL. Points nearer than `tolerance` to what is left
 * without them are dropped (Douglas and Peucker, Cartographica 10 (1973) 112-122); 0 keeps all.
 * UTW_E_NOMEM. */
utw_status utw_contour(const utw_sampling *sampling, const double *value, double level,
                       double tolerance, utw_paths *region, utw_paths *line, utw_error *err);

#endif
