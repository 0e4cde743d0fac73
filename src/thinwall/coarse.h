/* SPDX-License-Identifier: GPL-3.0-or-later
 * Walls where no smooth one could be followed: fluted, notched or very short ones. */
#ifndef UTW_THINWALL_COARSE_H
#define UTW_THINWALL_COARSE_H

#include "thinwall/build.h"

/** The chord after one in a branch; in a ring the last chord is the first. */
int utw_chord_after(const utw_branch *branch, int chord);

/** Length of the line through the middles of the chords from `from` on to `to` [units]. */
double utw_coarse_length(const utw_build *build, const utw_branch *branch, int from, int to);

/** Straight walls between the middles of chords, as few as stay within 0.35 of the mean width of
 * all of them, each with the area of its part; at least `least`. Appended to the build without
 * nodes. Method: the furthest point divides (Douglas and Peucker, Cartographica 10 (1973) 112-122).
 * UTW_E_NOMEM. */
utw_status utw_coarse_walls(utw_build *build, const utw_branch *branch, int from, int to,
                            int least);

#endif
