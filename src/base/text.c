/* SPDX-License-Identifier: GPL-3.0-or-later
 * Text that grows: written piece by piece, checked once at the end. */
#include "base/text.h"

#include <stdarg.h>
#include <stdio.h>
#include <string.h>

#include "base/decimal.h"
#include "base/memory.h"

/* Make room for `more` characters and the end mark. Returns 0 when there is none. */
static int reserve(utw_text *text, size_t more)
{
    if (text->out_of_memory) return 0;
    void *block = text->text;
    if (utw_grow(&block, &text->capacity, text->n + more + 1, 1) != 0) text->out_of_memory = 1;
    text->text = block;
    return !text->out_of_memory;
}

void utw_text_add(utw_text *text, const char *format, ...)
{
    va_list arguments;
    va_start(arguments, format);
    const int length = vsnprintf(NULL, 0, format, arguments);
    va_end(arguments);
    if (length < 0) text->out_of_memory = 1;
    if (length < 0 || !reserve(text, (size_t)length)) return;
    va_start(arguments, format);
    vsnprintf(text->text + text->n, (size_t)length + 1, format, arguments);
    va_end(arguments);
    text->n += (size_t)length;
}

void utw_text_add_number(utw_text *text, double value)
{
    char digits[UTW_DECIMAL_LENGTH];
    utw_decimal_exact(value == 0 ? 0 : value, digits);
    utw_text_add(text, "%s", digits);
}

void utw_text_repeat(utw_text *text, char c, int count)
{
    if (count <= 0 || !reserve(text, (size_t)count)) return;
    memset(text->text + text->n, c, (size_t)count);
    text->n += (size_t)count;
    text->text[text->n] = '\0';
}

/* Characters of s[n]: bytes that do not continue a UTF-8 sequence. */
static int characters(const char *s, size_t n)
{
    int count = 0;
    for (size_t i = 0; i < n; i++) count += ((unsigned char)s[i] & 0xC0) != 0x80;
    return count;
}

int utw_text_column(const utw_text *text)
{
    size_t start = text->n;
    while (start > 0 && text->text[start - 1] != '\n') start--;
    return start == text->n ? 0 : characters(text->text + start, text->n - start);
}

void utw_text_pad(utw_text *text, int column)
{
    utw_text_repeat(text, ' ', column - utw_text_column(text));
}

void utw_text_wrap(utw_text *text, int indent, int width, const char *words)
{
    int fresh = 1; /* nothing on this line yet but its indent */
    for (;;) {
        const size_t blanks = strspn(words, " ");
        words += blanks;
        size_t n = strcspn(words, " \n");
        while (words[n] == ' ' && words[n + 1] == '%') n += 1 + strcspn(words + n + 1, " \n");
        const int column = utw_text_column(text);
        if (n > 0 && !fresh && column + 1 + characters(words, n) > width) {
            utw_text_add(text, "\n");
            utw_text_repeat(text, ' ', indent);
            fresh = 1;
        }
        if (n > 0) utw_text_add(text, "%s%.*s", fresh ? "" : " ", (int)n, words);
        if (n > 0) fresh = 0;
        words += n;
        if (*words == '\0') break;
        if (*words == '\n') {
            utw_text_add(text, "\n");
            utw_text_repeat(text, ' ', indent);
            fresh = 1;
            words++;
        }
    }
    utw_text_add(text, "\n");
}

utw_status utw_text_take(utw_text *text, char **content, utw_error *err)
{
    if (!reserve(text, 0)) {
        utw_text_clear(text);
        return utw_fail(err, UTW_E_NOMEM, "out of memory (text)");
    }
    text->text[text->n] = '\0';
    *content = text->text;
    *text = (utw_text){0};
    return UTW_OK;
}

void utw_text_clear(utw_text *text)
{
    utw_free(text->text);
    *text = (utw_text){0};
}
