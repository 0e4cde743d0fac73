/* SPDX-License-Identifier: GPL-3.0-or-later
 * Text that grows as it is written. */
#ifndef UTW_BASE_TEXT_H
#define UTW_BASE_TEXT_H

#include <stddef.h>

/** Text being written. Start from {0}. */
typedef struct utw_text {
    char *text; /* NUL-terminated once something was added; owned: utw_text_clear() */
    size_t n;   /* bytes without the NUL */
    size_t capacity;
    int out_of_memory; /* something could not be added; what follows is not added either */
} utw_text;

/** Add printf-style text. */
void utw_text_add(utw_text *text, const char *format, ...) __attribute__((format(printf, 2, 3)));

/** Add a number in the fewest digits (15 to 17) that read back to it exactly; -0 is 0. */
void utw_text_add_number(utw_text *text, double value);

/** Free it and start afresh. */
void utw_text_clear(utw_text *text);

#endif
