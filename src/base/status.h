/* SPDX-License-Identifier: GPL-3.0-or-later
 * How every function of the library reports that it could not do its work. */
#ifndef UTW_BASE_STATUS_H
#define UTW_BASE_STATUS_H

#include "untwist.h"

/** Fill `err` (may be NULL) with `status` and a printf-style message and return `status`. The places
 *  (part, loop, vertex, line, column) are cleared to -1: set them afterwards with utw_error_place().
 *  A message says which object, what is wrong with it with its numbers, and what to do. */
utw_status utw_fail(utw_error *err, utw_status status, const char *format, ...)
    __attribute__((format(printf, 3, 4)));

/** Clear `err` (may be NULL): UTW_OK, no text, all places -1. */
void utw_error_clear(utw_error *err);

/** Note in `err` (may be NULL) where the fault lies; 0-based, -1 when it does not apply. */
void utw_error_place(utw_error *err, int part, int loop, int vertex);

/** Put a printf-style prefix before the message in `err` (may be NULL); status and places stay. */
void utw_error_prefix(utw_error *err, const char *format, ...)
    __attribute__((format(printf, 2, 3)));

/** Inside a function with a variable `st` and a label `done`: leave on the first failure. */
#define UTW_TRY(call)                                                                              \
    do {                                                                                           \
        st = (call);                                                                               \
        if (st != UTW_OK) goto done;                                                               \
    } while (0)

/** The same for an allocation: `pointer = utw_alloc(...)`. */
#define UTW_TRY_ALLOC(assignment)                                                                  \
    do {                                                                                           \
        if ((assignment) == NULL) {                                                                \
            st = utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);                       \
            goto done;                                                                             \
        }                                                                                          \
    } while (0)

#endif
