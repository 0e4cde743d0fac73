/* SPDX-License-Identifier: GPL-3.0-or-later
 * Element sizes inside a section from those on its boundary. */
#ifndef UTW_MESH_SIZES_H
#define UTW_MESH_SIZES_H

#include "untwist.h"

/** Points of the boundary with the size wanted there, in a tree of boxes. */
typedef struct utw_sizes utw_sizes;

/** The size grows by this much per length of distance from a boundary point. With 1 the interior of
 * a small feature's surroundings was found too coarse (a fillet of a thousandth of the wall took 40
 * times as many unknowns for 1e-6), with less elements are only added. */
#define UTW_SIZE_GROWTH 0.7

/** Copy n >= 1 points. [in] xy[n][2], size[n] [L], > 0. Returned owned: utw_sizes_free().
 * UTW_E_NOMEM. */
utw_status utw_sizes_create(int n, const double (*xy)[2], const double *size, utw_sizes **sizes,
                            utw_error *err);
void utw_sizes_free(utw_sizes *sizes);

/** Least of size + growth * distance over the points [L]. */
double utw_sizes_at(const utw_sizes *sizes, const double xy[2]);

#endif
