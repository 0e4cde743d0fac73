/* SPDX-License-Identifier: GPL-3.0-or-later
 * A collection of general sections for tests of what holds for every section. */
#ifndef UTW_TESTS_SAMPLES_H
#define UTW_TESTS_SAMPLES_H

#include "support/section.h"

/** Section number i from 0: first those of examples/, in the order of their names, then sections of
 * no symmetry with lines, arcs, splines and several holes. *name is static text or belongs to the
 * caller of the next call. NULL beyond the last. Owned: utw_outline_free(). */
utw_outline *sample_outline(int i, const char **name);

#endif
