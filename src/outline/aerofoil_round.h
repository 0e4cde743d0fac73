/* SPDX-License-Identifier: GPL-3.0-or-later
 * Fillets in the inner corners of an aerofoil box. */
#ifndef UTW_OUTLINE_AEROFOIL_ROUND_H
#define UTW_OUTLINE_AEROFOIL_ROUND_H

#include "outline/fit.h"

/** Rounds the corners of a bay where the material's angle is greater than 185 degrees: at the feet
 * of webs, faces and caps, and where the two sides of the skin meet. Corners of caps that stick out
 * into the bay stay sharp; so do kinks of less than 5 degrees, which a skin of changing thickness
 * has. [in, out] bay: a closed chain of curves counter-clockwise about the bay; its curves are
 * replaced. r > 0: radius [L]. UTW_E_OUTLINE names a corner where the radius does not fit and the
 * greatest that fits in the bay; UTW_E_NOMEM. */
utw_status utw_aerofoil_round(utw_fit *bay, double r, utw_error *err);

#endif
