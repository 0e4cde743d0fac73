/* SPDX-License-Identifier: GPL-3.0-or-later
 * Cutting a branch into walls. */
#ifndef UTW_THINWALL_SEGMENT_H
#define UTW_THINWALL_SEGMENT_H

#include "thinwall/regress.h"

/** A wall found between two stations of a branch. */
typedef struct utw_piece {
    utw_path path;
    int first, last; /* stations */
} utw_piece;

/** The walls of a branch, in order, with gaps where corners, fillets and lumps are. A wall follows
 * its stations to 5 % of its thickness and their thickness to 2 % (or, where nothing else can be
 * had, to 10 and 6, 20 and 18 %), its thickness changes by at most 0.45 of its length, and it is at
 * least 0.9 times as long as thick, more when it tapers; 0.3 times will do when its faces are
 * parallel. The fewest such walls are taken; they change where the curves of the border do. In a
 * branch where there is none of them, walls that follow to 35 %, then a short one with parallel
 * faces will do. [in] station[n] of one branch, borrowed. [out] *piece [*n_piece], returned owned:
 * utw_free(). UTW_E_NOMEM. */
utw_status utw_segment(const utw_station *station, int n, utw_piece **piece, int *n_piece,
                       utw_error *err);

/** Where to begin the row of a ring: after a station that is not good, else after a corner, else
 * where the curves of the border change. */
int utw_ring_start(const utw_station *station, int n);

#endif
