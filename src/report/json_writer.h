/* SPDX-License-Identifier: GPL-3.0-or-later
 * Building a JSON document: what cannot be added for want of memory is noted and looked at once, at
 * the end. */
#ifndef UTW_REPORT_JSON_WRITER_H
#define UTW_REPORT_JSON_WRITER_H

#include <cjson/cJSON.h>

#include "report/report.h"

typedef struct utw_json_writer {
    const utw_report *report; /* borrowed */
    int failed;
} utw_json_writer;

/** The item as it is; its absence is noted. */
cJSON *utw_json_kept(utw_json_writer *writer, cJSON *item);

/** Add a new empty object or array under a key. Returned borrowed from `to`, NULL when memory is
 * out: the functions here accept that. */
cJSON *utw_json_add_object(utw_json_writer *writer, cJSON *to, const char *key);
cJSON *utw_json_add_array(utw_json_writer *writer, cJSON *to, const char *key);

/** Add a new empty object to an array. */
cJSON *utw_json_append_object(utw_json_writer *writer, cJSON *array);

/** Add a number, a truth value to an array. */
void utw_json_append_number(utw_json_writer *writer, cJSON *array, double x);
void utw_json_append_flag(utw_json_writer *writer, cJSON *array, int value);

/** Add an item, which is taken. */
void utw_json_add_item(utw_json_writer *writer, cJSON *to, const char *key, cJSON *item);

void utw_json_add_text(utw_json_writer *writer, cJSON *to, const char *key, const char *value);
void utw_json_add_flag(utw_json_writer *writer, cJSON *to, const char *key, int value);

/** A number that reads back as the very same double; null when it is not finite. */
void utw_json_add_number(utw_json_writer *writer, cJSON *to, const char *key, double x);

/** A point as [x, y]; added to an array when key is NULL. */
void utw_json_add_point(utw_json_writer *writer, cJSON *to, const char *key, const double xy[2]);

/** Members of the document, one function a kind of result; [in,out] root. */
void utw_json_add_cases(utw_json_writer *writer, cJSON *root);
void utw_json_add_comparison(utw_json_writer *writer, cJSON *root);
void utw_json_add_push(utw_json_writer *writer, cJSON *root);

#endif
