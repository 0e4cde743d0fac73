/* SPDX-License-Identifier: GPL-3.0-or-later
 * JSON text as a tree: the only door to cJSON for reading. Strict where cJSON is lenient. */
#ifndef UTW_OUTLINE_JSON_H
#define UTW_OUTLINE_JSON_H

#include "untwist.h"

/** A node of the tree; returned borrowed everywhere but by utw_json_parse(). */
typedef struct cJSON utw_json;

typedef enum utw_json_kind {
    UTW_JSON_NULL,
    UTW_JSON_BOOL,
    UTW_JSON_NUMBER,
    UTW_JSON_STRING,
    UTW_JSON_ARRAY,
    UTW_JSON_OBJECT
} utw_json_kind;

/** Parse text[n] (UTF-8, a byte order mark is skipped). [out] *json, returned owned:
 * utw_json_free(). UTW_E_SYNTAX with line and column, UTW_E_NOMEM. */
utw_status utw_json_parse(const char *text, size_t n, utw_json **json, utw_error *err);

/** Free a tree; NULL is allowed. */
void utw_json_free(utw_json *json);

utw_json_kind utw_json_kind_of(const utw_json *json);

/** What a node is, for messages: "a number", "an array" ... */
const char *utw_json_kind_text(const utw_json *json);

/** First member of an array or object, and the next one; NULL at the end. */
const utw_json *utw_json_first(const utw_json *json);
const utw_json *utw_json_next(const utw_json *json);

/** Members of an array or object; counts them each time. */
int utw_json_count(const utw_json *json);

/** Key of a member of an object. */
const char *utw_json_key(const utw_json *json);

/** Value of true (1) or false (0). */
int utw_json_bool(const utw_json *json);

/** Value of a number (infinite when it is beyond what a double holds) and of a string. */
double utw_json_number(const utw_json *json);
const char *utw_json_string(const utw_json *json);

#endif
