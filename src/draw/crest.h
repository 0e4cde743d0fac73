/* SPDX-License-Identifier: GPL-3.0-or-later
 * The least and the greatest value of omega, from the elements' polynomials. */
#ifndef UTW_DRAW_CREST_H
#define UTW_DRAW_CREST_H

#include "draw/values.h"

/** In units of the net. */
typedef struct utw_crest {
    double value, xy[2];
} utw_crest;

/** The greatest omega (sign 1) or the least (sign -1). omega is harmonic but for a linear term, so
 * both lie on the boundary: the pieces of boundary at the extreme vertex of the sampling are
 * searched by golden section (Kiefer, Proceedings of the American Mathematical Society 4 (1953)
 * 502-506). [in] sampling, in any coordinates; values of it; unit, borrowed. UTW_E_NOMEM. */
utw_status utw_crest_of(const utw_sampling *sampling, const utw_values *values,
                        const utw_unit_stress *unit, int sign, utw_crest *crest, utw_error *err);

#endif
