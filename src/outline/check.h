/* SPDX-License-Identifier: GPL-3.0-or-later
 * Whether an outline can be a cross-section at all: called once when it is read, before anything is
 * computed. */
#ifndef UTW_OUTLINE_CHECK_H
#define UTW_OUTLINE_CHECK_H

#include "outline/outline.h"

/** Check every loop (finite numbers, scale, zero-length curves, crossing itself or touching itself,
 *  turning back on itself), every part (loops crossing or touching one another, holes outside their
 *  outline or inside another hole) and whether the parts fit together (as utw_net_create() says).
 *  The true curves are looked at, not chords. The limits are in outline/check_curve.h.
 *  Outlines must run counter-clockwise, holes clockwise already: UTW_E_INTERNAL when they do not.
 *  UTW_E_OUTLINE with part, loop, vertex (of the file), what is wrong and what to do; UTW_E_NOMEM. */
utw_status utw_outline_check(const utw_outline *outline, utw_error *err);

#endif
