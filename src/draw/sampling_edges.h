/* SPDX-License-Identifier: GPL-3.0-or-later
 * The edges of a sampling's triangles and the loops of its boundary. */
#ifndef UTW_DRAW_SAMPLING_EDGES_H
#define UTW_DRAW_SAMPLING_EDGES_H

#include "draw/sampling.h"

/** Fill edge, side and rim of a sampling whose triangles are there. UTW_E_NOMEM. */
utw_status utw_sampling_edges(utw_sampling *sampling, utw_error *err);

#endif
