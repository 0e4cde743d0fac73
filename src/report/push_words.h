/* SPDX-License-Identifier: GPL-3.0-or-later
 * The names of the choices of a push, as they are typed and printed. */
#ifndef UTW_REPORT_PUSH_WORDS_H
#define UTW_REPORT_PUSH_WORDS_H

#include "untwist.h"

/** "fixed-free", "free" ...; NULL when out of range. Returned borrowed. */
const char *utw_support_word(utw_support support);
const char *utw_hold_warping_word(utw_hold_warping warping);

#endif
