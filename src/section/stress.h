/* SPDX-License-Identifier: GPL-3.0-or-later
 * Everything that the stresses of a solved section stand on, made once. */
#ifndef UTW_SECTION_STRESS_H
#define UTW_SECTION_STRESS_H

#include "section/samples.h"

struct utw_stress {
    utw_unit_stress unit;
    utw_locator *locator;
    utw_keep_out keep_out;
    utw_samples samples;
    double *yield; /* [n_part] yield stress of each part, NULL when a part has none; owned */
};

#endif
