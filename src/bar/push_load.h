/* SPDX-License-Identifier: GPL-3.0-or-later
 * What may be asked of a push. */
#ifndef UTW_BAR_PUSH_LOAD_H
#define UTW_BAR_PUSH_LOAD_H

#include "base/status.h"

/** Where along the bar the force acts; NAN when it is spread [L]. */
double utw_push_load_z(const utw_push_load *load);

/** UTW_E_ARGUMENT: a version or a choice that does not exist. UTW_E_LOAD: numbers that are not
 * finite or out of range, no force, a force on a support. UTW_E_MATERIAL: the parts have not one E
 * and nu. The messages name the number. */
utw_status utw_push_load_check(const utw_solution *solution, const utw_push_load *load,
                               utw_error *err);

#endif
