/* SPDX-License-Identifier: GPL-3.0-or-later
 * Element sizes inside a section from those on its boundary. */
#ifndef UTW_MESH_SIZES_H
#define UTW_MESH_SIZES_H

#include "untwist.h"

/** Points of the boundary with the size wanted there, in a tree of boxes. */
typedef struct utw_sizes utw_sizes;

/** Copy n >= 1 points. [in] xy[n][2], size[n] [L], > 0. Returned owned: utw_sizes_free().
 * UTW_E_NOMEM. */
utw_status utw_sizes_create(int n, const double (*xy)[2], const double *size, double growth,
                            utw_sizes **sizes, utw_error *err);
void utw_sizes_free(utw_sizes *sizes);

/** Least of size + growth * distance over the points [L]. */
double utw_sizes_at(const utw_sizes *sizes, const double xy[2]);

#endif
