/* SPDX-License-Identifier: GPL-3.0-or-later
 * A trade shape written out as a section file, vertex by vertex. */
#ifndef UTW_REPORT_SHAPE_FILE_H
#define UTW_REPORT_SHAPE_FILE_H

#include "untwist.h"

/** The section file of a shape: vertices with "round" and "arc" that read back to the curves
 *  utw_outline_from_shape() makes. Inputs and statuses as there. [out] *text, returned owned:
 * utw_free(). */
utw_status utw_shape_file_text(const char *name, int n, const char *const *keys,
                               const double *values, const char *units,
                               const utw_placement *placement, char **text, utw_error *err);

#endif
