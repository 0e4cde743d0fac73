/* SPDX-License-Identifier: GPL-3.0-or-later
 * Outlines moved, turned, scaled, mirrored; and how their constants go with them. */
#ifndef UTW_TESTS_MAPPING_H
#define UTW_TESTS_MAPPING_H

#include "outline/outline.h"

/** p -> m p + shift (m row-major). */
typedef struct mapping {
    double m[4], shift[2];
} mapping;

/** Turn by degrees, then scale; mirror: first x -> -x. Right angles are exact. */
mapping mapping_of(double degrees, double scale, int mirror, double x, double y);

/** Map every point of all curves of an outline, turn loops round when m mirrors, and set the box.
 */
void mapping_apply(const mapping *map, utw_outline *outline);

/** The box of all curves, which the reader sets. */
void mapping_set_box(utw_outline *outline);

#endif
