/* SPDX-License-Identifier: GPL-3.0-or-later
 * Twelve midlines to be thickened and found again. */
#ifndef UTW_TESTS_DRAWINGS_H
#define UTW_TESTS_DRAWINGS_H

#include "support/midlines.h"

/** Midline `i`, its thicknesses (about 1) multiplied by t_over_b times its width; NULL beyond the
 * last. *name is static text; wall[32] holds the walls of the result. [out] *midline. */
const utw_midline *utw_drawing_sample(int i, double t_over_b, utw_wall wall[32],
                                      utw_midline *midline, const char **name);

/** Thicken it and forget the midline, so that it has to be found. Owned: utw_outline_free(). */
utw_outline *utw_outline_of_midline(const utw_midline *midline);

#endif
