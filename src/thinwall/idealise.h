/* SPDX-License-Identifier: GPL-3.0-or-later
 * The thin-walled idealisation of a section as the stages above see it; the public functions are in
 * untwist.h. */
#ifndef UTW_THINWALL_IDEALISE_H
#define UTW_THINWALL_IDEALISE_H

#include "untwist.h"

struct utw_idealisation {
    utw_midline midline; /* owned */
    utw_wall_info *wall; /* [n_walls], owned */
    double *faced;       /* [n_walls], owned: length along which a wall has two faces [L] */
    utw_thin *thin;      /* owned */
    utw_idealisation_info info;
    char doubt[320]; /* utw_idealisation_doubt() */
};

/** Least slenderness of a wall worth the name. */
#define UTW_SLENDER 3.0

/** utw_idealise() with the border sampled `density` times as densely (1: as usual). */
utw_status utw_idealise_with(const utw_outline *outline, double density,
                             utw_idealisation **idealisation, utw_error *err);

/** utw_idealise_as() of a midline known to be sound, without asking whether the section makes sense
 * as a thin-walled one. */
utw_status utw_idealise_given(const utw_outline *outline, const utw_midline *midline,
                              utw_idealisation **idealisation, utw_error *err);

#endif
