/* SPDX-License-Identifier: GPL-3.0-or-later
 * The report for programs: JSON. */
#include <cjson/cJSON.h>
#include <math.h>

#include "base/decimal.h"
#include "base/text.h"
#include "report/report.h"
#include "section/solution.h"

/* What cannot be added for want of memory is noted here and looked at once, at the end. */
typedef struct writer {
    const utw_report *report;
    int failed;
} writer;

static cJSON *kept(writer *w, cJSON *item)
{
    if (item == NULL) w->failed = 1;
    return item;
}

static cJSON *add_object(writer *w, cJSON *to, const char *key)
{
    return kept(w, cJSON_AddObjectToObject(to, key));
}

static void add_text(writer *w, cJSON *to, const char *key, const char *value)
{
    kept(w, cJSON_AddStringToObject(to, key, value));
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

static void add_item(writer *w, cJSON *to, const char *key, cJSON *item)
{
    if (kept(w, item) == NULL) return;
    if (cJSON_AddItemToObject(to, key, item)) return;
    w->failed = 1;
    cJSON_Delete(item);
}

static void add_number(writer *w, cJSON *to, const char *key, double x)
{
    add_item(w, to, key, number(x));
}

static void add_constants(writer *w, cJSON *root)
{
    cJSON *all = add_object(w, root, "constants");
    for (int k = 0; k < UTW_CONSTANT_COUNT; k++) {
        utw_quantity q;
        utw_error why;
        cJSON *one = add_object(w, all, utw_constant_key((utw_constant)k));
        if (utw_report_constant(w->report->solution, (utw_constant)k, &q, &why) != UTW_OK) {
            kept(w, cJSON_AddNullToObject(one, "value"));
            add_text(w, one, "reason", why.text);
            continue;
        }
        add_number(w, one, "value", q.value);
        add_number(w, one, "low", q.low);
        add_number(w, one, "high", q.high);
        add_text(w, one, "trust", utw_report_trust(q.trust));
    }
}

static void add_solution(writer *w, cJSON *root)
{
    utw_solution_info info;
    utw_solution_get_info(w->report->solution, &info);
    cJSON *solution = add_object(w, root, "solution");
    const int orders[2] = {info.least_order, info.greatest_order};
    add_item(w, solution, "order", cJSON_CreateIntArray(orders, 2));
    add_number(w, solution, "triangles", info.triangles);
    add_number(w, solution, "unknowns", info.unknowns);
    add_number(w, solution, "gap", info.gap);
    add_number(w, solution, "tolerance", info.tolerance);
    kept(w, cJSON_AddBoolToObject(solution, "reached", info.reached));
    cJSON *seconds = add_object(w, solution, "seconds");
    add_number(w, seconds, "read", info.seconds_read);
    add_number(w, seconds, "mesh", info.seconds_mesh);
    add_number(w, seconds, "solve", info.seconds_solve);
    add_number(w, seconds, "total", info.seconds_total);
}

static void add_heading(writer *w, cJSON *root)
{
    const utw_outline *outline = w->report->solution->outline;
    add_text(w, root, "untwist", utw_version());
    add_text(w, root, "name", utw_outline_name(outline));
    add_text(w, root, "units", utw_outline_units(outline));
    add_text(w, root, "caution", utw_report_caution(w->report->solution));
}

/* The named dimensions the section was drawn with; only when it has any. */
static void add_dimensions(writer *w, cJSON *root)
{
    const utw_outline *outline = w->report->solution->outline;
    const int n = utw_outline_dimension_count(outline);
    if (n == 0) return;
    cJSON *all = add_object(w, root, "dimensions");
    for (int k = 0; k < n; k++) {
        double value = 0;
        const char *name = utw_outline_dimension(outline, k, &value, NULL);
        add_number(w, all, name, value);
    }
}

/* The members of the document, in its order. A further kind of result is one more line. */
static void (*const members[])(writer *, cJSON *) = {add_heading, add_dimensions, add_constants,
                                                     add_solution};

utw_status utw_report_json(const utw_report *report, char **text, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    writer w = {report, 0};
    cJSON *root = NULL;
    char *printed = NULL;
    utw_text copy = {.text = NULL};
    UTW_TRY(utw_report_check(report, text, __func__, err));
    root = kept(&w, cJSON_CreateObject());
    for (size_t i = 0; i < sizeof members / sizeof members[0]; i++) members[i](&w, root);
    if (!w.failed) printed = cJSON_Print(root);
    if (printed == NULL) w.failed = 1;
    if (w.failed) {
        st = utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
        goto done;
    }
    utw_text_add(&copy, "%s\n", printed);
    UTW_TRY(utw_text_take(&copy, text, err));
    st = UTW_OK;
done:
    cJSON_free(printed);
    cJSON_Delete(root);
    utw_text_clear(&copy);
    return st;
}
