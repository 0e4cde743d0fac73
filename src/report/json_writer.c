/* SPDX-License-Identifier: GPL-3.0-or-later
 * Adding to a JSON document. */
#include "report/json_writer.h"

#include <math.h>

#include "base/decimal.h"

cJSON *utw_json_kept(utw_json_writer *w, cJSON *item)
{
    if (item == NULL) w->failed = 1;
    return item;
}

cJSON *utw_json_add_object(utw_json_writer *w, cJSON *to, const char *key)
{
    return utw_json_kept(w, cJSON_AddObjectToObject(to, key));
}

cJSON *utw_json_add_array(utw_json_writer *w, cJSON *to, const char *key)
{
    return utw_json_kept(w, cJSON_AddArrayToObject(to, key));
}

static void append(utw_json_writer *w, cJSON *array, cJSON *item)
{
    if (utw_json_kept(w, item) == NULL) return;
    if (cJSON_AddItemToArray(array, item)) return;
    w->failed = 1;
    cJSON_Delete(item);
}

cJSON *utw_json_append_object(utw_json_writer *w, cJSON *array)
{
    cJSON *item = cJSON_CreateObject();
    const int failed = w->failed;
    w->failed = 0;
    append(w, array, item);
    if (w->failed) return NULL;
    w->failed = failed;
    return item;
}

void utw_json_add_item(utw_json_writer *w, cJSON *to, const char *key, cJSON *item)
{
    if (utw_json_kept(w, item) == NULL) return;
    if (cJSON_AddItemToObject(to, key, item)) return;
    w->failed = 1;
    cJSON_Delete(item);
}

void utw_json_add_text(utw_json_writer *w, cJSON *to, const char *key, const char *value)
{
    utw_json_kept(w, cJSON_AddStringToObject(to, key, value));
}

void utw_json_add_flag(utw_json_writer *w, cJSON *to, const char *key, int value)
{
    utw_json_kept(w, cJSON_AddBoolToObject(to, key, value));
}

/* cJSON's own numbers may lose the last digits; and NaN or infinity must not come out as numbers.
 */
static cJSON *number(double x)
{
    char text[UTW_DECIMAL_LENGTH];
    if (!isfinite(x)) return cJSON_CreateNull();
    utw_decimal_exact(x, text);
    return cJSON_CreateRaw(text);
}

void utw_json_add_number(utw_json_writer *w, cJSON *to, const char *key, double x)
{
    utw_json_add_item(w, to, key, number(x));
}

void utw_json_append_number(utw_json_writer *w, cJSON *array, double x)
{
    append(w, array, number(x));
}

void utw_json_append_flag(utw_json_writer *w, cJSON *array, int value)
{
    append(w, array, cJSON_CreateBool(value));
}

void utw_json_add_point(utw_json_writer *w, cJSON *to, const char *key, const double xy[2])
{
    cJSON *point = utw_json_kept(w, cJSON_CreateArray());
    if (point == NULL) return;
    append(w, point, number(xy[0]));
    append(w, point, number(xy[1]));
    if (key != NULL)
        utw_json_add_item(w, to, key, point);
    else
        append(w, to, point);
}
