/* SPDX-License-Identifier: GPL-3.0-or-later
 * What the walls of a midline are, and how slender. */
#ifndef UTW_THINWALL_RATE_H
#define UTW_THINWALL_RATE_H

#include "thinwall/idealise.h"

/** Fill the wall list and the counts of an idealisation with its midline set. Arcs that round a
 * corner between two walls become bends: they touch both, and their mean radius is at most 5.5
 * thicknesses, which is an inner radius of 5, the limit up to which EN 1993-1-3, 5.1, lets corners
 * be taken as sharp (from memory). [in] kind[n_walls], borrowed; NULL: all plates. UTW_E_NOMEM. */
utw_status utw_rate_walls(utw_idealisation *idealisation, const utw_wall_kind *kind,
                          utw_error *err);

#endif
