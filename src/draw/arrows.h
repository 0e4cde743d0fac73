/* SPDX-License-Identifier: GPL-3.0-or-later
 * A field of vectors as arrows, evenly spread over a section. */
#ifndef UTW_DRAW_ARROWS_H
#define UTW_DRAW_ARROWS_H

#include "draw/layout.h"
#include "draw/sampling.h"

/** Arrows centred at their places, their lengths in proportion to the vectors. In thick regions
 * they stand on a hexagonal lattice, in thin walls in the middle of the wall; those that would meet
 * one of box[n_box] are left out, and those too short to be read. [in] sampling, mapped onto the
 * page; vector[n_vertex][2] with y upward; colour[n_vertex]: of each place's arrow. [out] *most:
 * the length of the longest vector that was drawn. UTW_E_NOMEM. */
utw_status utw_arrows_draw(const utw_page *page, const utw_sampling *sampling,
                           const double (*vector)[2], const utw_colour *colour, int n_box,
                           const utw_box *box, double *most, utw_error *err);

#endif
