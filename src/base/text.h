/* SPDX-License-Identifier: GPL-3.0-or-later
 * Text that grows: written piece by piece, checked once at the end. */
#ifndef UTW_BASE_TEXT_H
#define UTW_BASE_TEXT_H

#include "base/status.h"

/** A growing text. Start from all zero: `utw_text t = {0}`. Once memory is out every further piece
 * is dropped and utw_text_take() says so, so that pieces need no check of their own. */
typedef struct utw_text {
    char *text; /* [n], ends with '\0' once something was added; owned: utw_text_clear() */
    size_t n, capacity;
    int out_of_memory; /* something could not be added; what follows is not added either */
} utw_text;

/** Add printf-style text. */
void utw_text_add(utw_text *text, const char *format, ...) __attribute__((format(printf, 2, 3)));

/** Add a number in the fewest digits (15 to 17) that read back to it exactly; -0 is 0. */
void utw_text_add_number(utw_text *text, double value);

/** Add `count` times the character `c`; nothing when count <= 0. */
void utw_text_repeat(utw_text *text, char c, int count);

/** Characters (UTF-8) since the last line break. */
int utw_text_column(const utw_text *text);

/** Add spaces up to `column` of the current line; nothing when it is that long already. */
void utw_text_pad(utw_text *text, int column);

/** Add `words` broken at spaces so that no line is longer than `width` characters (a longer word
 * stands alone); lines after the first begin with `indent` spaces. Ends with a line break. Line
 * breaks in `words` are kept; a per cent sign stays with its number. */
void utw_text_wrap(utw_text *text, int indent, int width, const char *words);

/** Hand over what was written. [out] *content, returned owned: utw_free(); never NULL on success.
 * The text is empty afterwards. UTW_E_NOMEM when memory ran out since the text was started. */
utw_status utw_text_take(utw_text *text, char **content, utw_error *err);

/** Free what was written and start again. */
void utw_text_clear(utw_text *text);

#endif
