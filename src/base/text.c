/* SPDX-License-Identifier: GPL-3.0-or-later
 * Growing text. */
#include "base/text.h"

#include <stdarg.h>
#include <stdio.h>
#include <stdlib.h>

#include "base/memory.h"

void utw_text_add(utw_text *text, const char *format, ...)
{
    va_list list;
    va_start(list, format);
    const int n = vsnprintf(NULL, 0, format, list);
    va_end(list);
    void *block = text->text;
    if (text->out_of_memory || n < 0 ||
        utw_grow(&block, &text->capacity, text->n + (size_t)n + 1, 1) != 0) {
        text->out_of_memory = 1;
        return;
    }
    text->text = block;
    va_start(list, format);
    vsnprintf(text->text + text->n, (size_t)n + 1, format, list);
    va_end(list);
    text->n += (size_t)n;
}

void utw_text_add_number(utw_text *text, double value)
{
    char digits[40] = "0";
    for (int n = 15; n <= 17 && value != 0; n++) {
        snprintf(digits, sizeof digits, "%.*g", n, value);
        if (strtod(digits, NULL) == value) break;
    }
    utw_text_add(text, "%s", digits);
}

void utw_text_clear(utw_text *text)
{
    utw_free(text->text);
    *text = (utw_text){.text = NULL};
}
