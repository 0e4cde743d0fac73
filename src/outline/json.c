/* SPDX-License-Identifier: GPL-3.0-or-later
 * cJSON behind a strict check; no other file of this folder names it. */
#include "outline/json.h"

#include <cjson/cJSON.h>
#include <errno.h>
#include <string.h>

#include "base/status.h"
#include "outline/json_scan.h"

utw_status utw_json_parse(const char *text, size_t n, utw_json **json, utw_error *err)
{
    if (n >= 3 && memcmp(text, "\xEF\xBB\xBF", 3) == 0) {
        text += 3;
        n -= 3;
    }
    const utw_status st = utw_json_scan(text, n, err);
    if (st != UTW_OK) return st;
    /* The text is sound, so cJSON fails only when memory runs out. Its end pointer guards against
     * the two parsers ever disagreeing; its error pointer is global and never used. */
    const char *end = NULL;
    errno = 0;
    cJSON *tree = cJSON_ParseWithLengthOpts(text, n, &end, 0);
    if (tree == NULL && errno == ENOMEM)
        return utw_fail(err, UTW_E_NOMEM, "out of memory (JSON tree)");
    while (tree != NULL && end < text + n && strchr(" \t\r\n", *end) != NULL) end++;
    if (tree == NULL || end != text + n) {
        cJSON_Delete(tree);
        return utw_fail(err, UTW_E_SYNTAX, "the JSON text could not be read beyond byte %ld",
                        end == NULL ? 0L : (long)(end - text));
    }
    *json = tree;
    return UTW_OK;
}

void utw_json_free(utw_json *json)
{
    cJSON_Delete(json);
}

utw_json_kind utw_json_kind_of(const utw_json *json)
{
    if (cJSON_IsNumber(json)) return UTW_JSON_NUMBER;
    if (cJSON_IsString(json)) return UTW_JSON_STRING;
    if (cJSON_IsArray(json)) return UTW_JSON_ARRAY;
    if (cJSON_IsObject(json)) return UTW_JSON_OBJECT;
    if (cJSON_IsBool(json)) return UTW_JSON_BOOL;
    return UTW_JSON_NULL;
}

const char *utw_json_kind_text(const utw_json *json)
{
    switch (utw_json_kind_of(json)) {
    case UTW_JSON_NUMBER:
        return "a number";
    case UTW_JSON_STRING:
        return "a string";
    case UTW_JSON_ARRAY:
        return "an array";
    case UTW_JSON_OBJECT:
        return "an object";
    case UTW_JSON_BOOL:
        return "true or false";
    case UTW_JSON_NULL:
        break;
    }
    return "null";
}

const utw_json *utw_json_first(const utw_json *json)
{
    return json->child;
}

const utw_json *utw_json_next(const utw_json *json)
{
    return json->next;
}

int utw_json_count(const utw_json *json)
{
    return cJSON_GetArraySize(json);
}

const char *utw_json_key(const utw_json *json)
{
    return json->string == NULL ? "" : json->string;
}

int utw_json_bool(const utw_json *json)
{
    return cJSON_IsTrue(json) != 0;
}

double utw_json_number(const utw_json *json)
{
    return json->valuedouble;
}

const char *utw_json_string(const utw_json *json)
{
    return json->valuestring == NULL ? "" : json->valuestring;
}
