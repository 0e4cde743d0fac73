/* SPDX-License-Identifier: GPL-3.0-or-later
 * The greatest torsional shear stress of a section. */
#ifndef UTW_SECTION_PEAK_H
#define UTW_SECTION_PEAK_H

#include "section/adapt.h"

/** A peak with its place in the net's coordinates; error: half the distance between the two
 * solutions there. */
typedef struct utw_peak {
    double value, error, at[2];
} utw_peak;

/** Greatest |stress| for theta' = 1, G = 1 [L of the net]. It lies on the boundary (|grad phi| is
 * subharmonic: Timoshenko and Goodier, Theory of Elasticity, ch. 10), so the boundary sides of the
 * elements that come near the peak are searched, on the polynomials themselves. */
utw_peak utw_torsion_peak(const utw_solved *solved);

#endif
