/* SPDX-License-Identifier: GPL-3.0-or-later
 * The curves that join a vertex of a drawing to the one before. */
#ifndef UTW_OUTLINE_JOIN_H
#define UTW_OUTLINE_JOIN_H

#include "outline/chain.h"

/** Number of curves utw_join_curves() makes. */
int utw_join_count(const utw_vertex *vertex);

/** The curves from `from`, the place of vertex number `before` (0-based, for messages), to a
 * vertex. Points no farther apart than `same` [L] are one point. [out] curve[utw_join_count()].
 *  UTW_E_OUTLINE when there is no such curve (no place in err), UTW_E_NOMEM. */
utw_status utw_join_curves(const utw_vertex *vertex, const double from[2], int before, double same,
                           utw_curve *curve, utw_error *err);

#endif
