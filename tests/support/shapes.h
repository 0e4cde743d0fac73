/* SPDX-License-Identifier: GPL-3.0-or-later
 * Trade shapes from one line of text, and what every one of them must satisfy. */
#ifndef UTW_TESTS_SHAPES_H
#define UTW_TESTS_SHAPES_H

#include "support/support.h"

/** "channel h=100 b=50 ...": the outline, or the status and message of the refusal. Owned:
 * utw_outline_free(). */
utw_status shape_try(const char *text, const utw_placement *placement, utw_outline **outline,
                     utw_error *err);

/** The outline; the test fails with the message when it is refused. Checked on the way: one part,
 * outline counter-clockwise and holes clockwise, no curve shorter than 1e-6 of the box, and the
 * written section file reads back to the same curves. */
utw_outline *shape_of(const char *text);

/** The shape is refused with this status and exactly this message. */
void shape_refused(const char *text, utw_status status, const char *message);

/** For every end of a curve there is one mirrored in x = 0 (mirror_x) or y = middle, to 1e-14 of
 * the box. */
void shape_symmetric(const utw_outline *outline, int mirror_x, double middle);

#endif
