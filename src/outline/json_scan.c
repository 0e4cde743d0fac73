/* SPDX-License-Identifier: GPL-3.0-or-later
 * One pass over JSON text: the grammar of RFC 8259, and nothing beside it. */
#include "outline/json_scan.h"

#include <string.h>

#include "base/status.h"

enum { LONGEST_NUMBER = 60 }; /* cJSON reads no more than 63 characters of one */

/* What may come next. */
typedef enum expectation {
    A_VALUE,
    VALUE_OR_END, /* after [ */
    KEY_OR_END,   /* after { */
    A_KEY,        /* after a comma in an object */
    A_COLON,
    COMMA_OR_END,
    NOTHING
} expectation;

typedef struct scan {
    const char *text;
    size_t n, i;
    int depth;
    char open[UTW_JSON_DEEPEST]; /* the closing bracket each open one asks for */
    utw_error *err;
} scan;

/* Note position `at` in the message just written. */
static utw_status placed(scan *s, size_t at, utw_status st)
{
    int line = 1, column = 1;
    for (size_t i = 0; i < at && i < s->n; i++) {
        const unsigned char c = (unsigned char)s->text[i];
        if (c == '\n') {
            line++;
            column = 1;
        } else if ((c & 0xC0) != 0x80) { /* not inside a character */
            column++;
        }
    }
    utw_error_prefix(s->err, "line %d, column %d: ", line, column);
    if (s->err != NULL) {
        s->err->line = line;
        s->err->column = column;
    }
    return st;
}

#define FAIL(s, at, ...) placed(s, at, utw_fail((s)->err, UTW_E_SYNTAX, __VA_ARGS__))

static int is_digit(const scan *s, size_t i)
{
    return i < s->n && s->text[i] >= '0' && s->text[i] <= '9';
}

static int is_letter(const scan *s, size_t i)
{
    return i < s->n &&
           ((s->text[i] >= 'a' && s->text[i] <= 'z') || (s->text[i] >= 'A' && s->text[i] <= 'Z'));
}

/* Bytes of the UTF-8 character at i, 0 when it is none (Unicode 15, table 3-7). */
static size_t utf8_length(const scan *s, size_t i)
{
    const unsigned char *c = (const unsigned char *)s->text + i;
    const size_t left = s->n - i;
    if (c[0] < 0x80) return 1;
    const size_t want = c[0] >= 0xC2 && c[0] <= 0xDF   ? 2
                        : c[0] >= 0xE0 && c[0] <= 0xEF ? 3
                        : c[0] >= 0xF0 && c[0] <= 0xF4 ? 4
                                                       : 0;
    if (want == 0 || left < want) return 0;
    for (size_t k = 1; k < want; k++)
        if ((c[k] & 0xC0) != 0x80) return 0;
    if ((c[0] == 0xE0 && c[1] < 0xA0) || (c[0] == 0xED && c[1] > 0x9F) ||
        (c[0] == 0xF0 && c[1] < 0x90) || (c[0] == 0xF4 && c[1] > 0x8F))
        return 0;
    return want;
}

/* The four hexadecimal digits at i, or -1. */
static long hex4(const scan *s, size_t i)
{
    long value = 0;
    if (s->n - i < 4) return -1;
    for (size_t k = i; k < i + 4; k++) {
        const char c = s->text[k];
        const int digit = c >= '0' && c <= '9'   ? c - '0'
                          : c >= 'a' && c <= 'f' ? c - 'a' + 10
                          : c >= 'A' && c <= 'F' ? c - 'A' + 10
                                                 : -1;
        if (digit < 0) return -1;
        value = 16 * value + digit;
    }
    return value;
}

/* A backslash and what follows it. */
static utw_status scan_escape(scan *s)
{
    const size_t at = s->i;
    const char c = at + 1 < s->n ? s->text[at + 1] : '\0';
    if (c != '\0' && strchr("\"\\/bfnrt", c) != NULL) {
        s->i += 2;
        return UTW_OK;
    }
    if (c != 'u')
        return FAIL(s, at, "a backslash in a string must be followed by one of \"\\/bfnrtu");
    const long code = hex4(s, at + 2);
    if (code < 0) return FAIL(s, at, "\\u must be followed by four hexadecimal digits");
    if (code == 0) return FAIL(s, at, "a string may not hold the character NUL");
    s->i += 6;
    if (code < 0xD800 || code > 0xDFFF) return UTW_OK;
    const int pair =
        code < 0xDC00 && s->i + 2 < s->n && s->text[s->i] == '\\' && s->text[s->i + 1] == 'u';
    const long low = pair ? hex4(s, s->i + 2) : -1;
    if (low < 0xDC00 || low > 0xDFFF)
        return FAIL(s, at, "\\u%04lX is half of a surrogate pair", code);
    s->i += 6;
    return UTW_OK;
}

static utw_status scan_string(scan *s)
{
    const size_t start = s->i++;
    while (s->i < s->n && s->text[s->i] != '"') {
        const unsigned char c = (unsigned char)s->text[s->i];
        if (c == '\\') {
            const utw_status st = scan_escape(s);
            if (st != UTW_OK) return st;
            continue;
        }
        if (c == '\n' || c == '\r') return FAIL(s, start, "a string is not closed on its line");
        if (c < 0x20) return FAIL(s, s->i, "a string may not hold control characters");
        const size_t length = utf8_length(s, s->i);
        if (length == 0) return FAIL(s, s->i, "this is not UTF-8 text; save the file as UTF-8");
        s->i += length;
    }
    if (s->i >= s->n) return FAIL(s, start, "a string is not closed");
    s->i++;
    return UTW_OK;
}

/* true, false, null; other words get the remedy that fits. */
static utw_status scan_word(scan *s)
{
    const size_t start = s->i;
    while (is_letter(s, s->i)) s->i++;
    const size_t length = s->i - start;
    const char *word = s->text + start;
    if ((length == 4 && (memcmp(word, "true", 4) == 0 || memcmp(word, "null", 4) == 0)) ||
        (length == 5 && memcmp(word, "false", 5) == 0))
        return UTW_OK;
    const int shown = length < 20 ? (int)length : 20;
    const char c = word[0];
    if (c == 'N' || c == 'n' || c == 'I' || c == 'i')
        return FAIL(s, start, "%.*s is not a number; every number must be finite and written out",
                    shown, word);
    return FAIL(s, start, "%.*s must stand in double quotes", shown, word);
}

static utw_status scan_number(scan *s)
{
    const size_t start = s->i;
    size_t i = start + (s->text[start] == '-');
    if (is_letter(s, i)) {
        s->i = i;
        return scan_word(s) == UTW_OK ? FAIL(s, start, "a minus sign must be followed by a digit")
                                      : UTW_E_SYNTAX;
    }
    if (!is_digit(s, i)) return FAIL(s, start, "a minus sign must be followed by a digit");
    if (s->text[i] == '0' && is_digit(s, i + 1))
        return FAIL(s, start, "a number may not start with 0; write 5, not 05");
    while (is_digit(s, i)) i++;
    if (i < s->n && s->text[i] == '.') {
        if (!is_digit(s, ++i)) return FAIL(s, start, "a decimal point must be followed by a digit");
        while (is_digit(s, i)) i++;
    }
    if (i < s->n && (s->text[i] == 'e' || s->text[i] == 'E')) {
        i++;
        if (i < s->n && (s->text[i] == '+' || s->text[i] == '-')) i++;
        if (!is_digit(s, i)) return FAIL(s, start, "an exponent must have a digit");
        while (is_digit(s, i)) i++;
    }
    if (i - start > LONGEST_NUMBER)
        return FAIL(s, start, "a number of %zu characters is too long; at most %d are read",
                    i - start, LONGEST_NUMBER);
    s->i = i;
    return UTW_OK;
}

static utw_status unexpected(scan *s, const char *wanted)
{
    const unsigned char c = (unsigned char)s->text[s->i];
    const char after_comma = c == ']' || c == '}';
    if (c == '\0') return FAIL(s, s->i, "the text holds a NUL byte; this is not a section file");
    if (c == '/' || c == '#') return FAIL(s, s->i, "comments are not allowed");
    if (c == '\'') return FAIL(s, s->i, "strings stand in double quotes, not in '");
    if (c < 0x20 || c > 0x7E) return FAIL(s, s->i, "expected %s, not the byte 0x%02X", wanted, c);
    size_t k = s->i;
    while (k > 0 && strchr(" \t\r\n", s->text[k - 1]) != NULL) k--;
    if (after_comma && k > 0 && s->text[k - 1] == ',')
        return FAIL(s, k - 1, "a comma stands before the closing %c; remove it", c);
    return FAIL(s, s->i, "expected %s, not %c", wanted, c);
}

/* [ or {. */
static utw_status scan_open(scan *s, expectation *next)
{
    const char c = s->text[s->i];
    if (s->depth == UTW_JSON_DEEPEST)
        return FAIL(s, s->i, "brackets stand more than %d deep inside one another",
                    UTW_JSON_DEEPEST);
    s->open[s->depth++] = c == '[' ? ']' : '}';
    *next = c == '[' ? VALUE_OR_END : KEY_OR_END;
    s->i++;
    return UTW_OK;
}

static utw_status scan_close(scan *s, expectation *next)
{
    const char want = s->open[s->depth - 1];
    if (s->text[s->i] != want) return FAIL(s, s->i, "expected %c, not %c", want, s->text[s->i]);
    s->depth--;
    s->i++;
    *next = s->depth == 0 ? NOTHING : COMMA_OR_END;
    return UTW_OK;
}

static utw_status scan_value(scan *s, expectation *next)
{
    const char c = s->text[s->i];
    if (c == '[' || c == '{') return scan_open(s, next);
    *next = s->depth == 0 ? NOTHING : COMMA_OR_END;
    if (c == '"') return scan_string(s);
    if (c == '-' || is_digit(s, s->i)) return scan_number(s);
    if (is_letter(s, s->i)) return scan_word(s);
    if (c == '+') return FAIL(s, s->i, "a number may not start with +");
    if (c == '.') return FAIL(s, s->i, "a number may not start with a point; write 0.5, not .5");
    return unexpected(s, "a value");
}

/* One token. */
static utw_status scan_token(scan *s, expectation *next)
{
    const char c = s->text[s->i];
    const int closing = c == ']' || c == '}';
    switch (*next) {
    case VALUE_OR_END:
        if (closing) return scan_close(s, next);
        return scan_value(s, next);
    case A_VALUE:
        return scan_value(s, next);
    case KEY_OR_END:
        if (closing) return scan_close(s, next);
        /* fall through */
    case A_KEY:
        if (is_letter(s, s->i))
            return scan_word(s) == UTW_OK ? FAIL(s, s->i, "a key must stand in double quotes")
                                          : UTW_E_SYNTAX;
        if (c != '"') return unexpected(s, "a key in double quotes");
        *next = A_COLON;
        return scan_string(s);
    case A_COLON:
        if (c != ':') return unexpected(s, "a colon after the key");
        *next = A_VALUE;
        s->i++;
        return UTW_OK;
    case COMMA_OR_END:
        if (closing) return scan_close(s, next);
        if (c != ',')
            return unexpected(s, s->open[s->depth - 1] == ']' ? "a comma or ]" : "a comma or }");
        *next = s->open[s->depth - 1] == ']' ? A_VALUE : A_KEY;
        s->i++;
        return UTW_OK;
    case NOTHING:
        break;
    }
    return FAIL(s, s->i, "text follows the end of the section; remove it");
}

static void skip_space(scan *s)
{
    while (s->i < s->n && (s->text[s->i] == ' ' || s->text[s->i] == '\t' || s->text[s->i] == '\n' ||
                           s->text[s->i] == '\r'))
        s->i++;
}

utw_status utw_json_scan(const char *text, size_t n, utw_error *err)
{
    scan s = {.text = text, .n = n, .err = err};
    expectation next = A_VALUE;
    for (skip_space(&s); s.i < s.n; skip_space(&s)) {
        const utw_status st = scan_token(&s, &next);
        if (st != UTW_OK) return st;
    }
    if (next == NOTHING) return UTW_OK;
    if (s.depth == 0)
        return utw_fail(err, UTW_E_SYNTAX, "the file is empty; a section file starts with {");
    return FAIL(&s, n, "the text ends before its brackets are closed; %c is missing",
                s.open[s.depth - 1]);
}
