/* SPDX-License-Identifier: GPL-3.0-or-later
 * The report for programs: JSON. */
#include "base/text.h"
#include "report/json_writer.h"
#include "section/solution.h"

static void add_constants(utw_json_writer *w, cJSON *root)
{
    cJSON *all = utw_json_add_object(w, root, "constants");
    for (int k = 0; k < UTW_CONSTANT_COUNT; k++) {
        utw_quantity q;
        utw_error why;
        cJSON *one = utw_json_add_object(w, all, utw_constant_key((utw_constant)k));
        if (utw_report_constant(w->report->solution, (utw_constant)k, &q, &why) != UTW_OK) {
            utw_json_kept(w, cJSON_AddNullToObject(one, "value"));
            utw_json_add_text(w, one, "reason", why.text);
            continue;
        }
        utw_json_add_number(w, one, "value", q.value);
        utw_json_add_number(w, one, "low", q.low);
        utw_json_add_number(w, one, "high", q.high);
        utw_json_add_text(w, one, "trust", utw_report_trust(q.trust));
    }
}

/* Only for parts of different materials. */
static void add_stiffness(utw_json_writer *w, cJSON *root)
{
    const utw_solution *s = w->report->solution;
    if (!utw_solution_composite(s)) return;
    utw_json_add_text(w, root, "reference_material", s->composite.reference->name);
    cJSON *all = utw_json_add_object(w, root, "stiffness");
    for (int k = 0; k < UTW_STIFFNESS_COUNT; k++) {
        utw_quantity q;
        utw_error why;
        if (utw_solution_stiffness(s, (utw_stiffness)k, &q, &why) != UTW_OK) continue;
        cJSON *one = utw_json_add_object(w, all, utw_stiffness_key((utw_stiffness)k));
        utw_json_add_number(w, one, "value", q.value);
        utw_json_add_number(w, one, "low", q.low);
        utw_json_add_number(w, one, "high", q.high);
        utw_json_add_text(w, one, "trust", utw_report_trust(q.trust));
    }
}

static void add_solution(utw_json_writer *w, cJSON *root)
{
    utw_solution_info info;
    utw_solution_get_info(w->report->solution, &info);
    cJSON *solution = utw_json_add_object(w, root, "solution");
    const int orders[2] = {info.least_order, info.greatest_order};
    utw_json_add_item(w, solution, "order", cJSON_CreateIntArray(orders, 2));
    utw_json_add_number(w, solution, "triangles", info.triangles);
    utw_json_add_number(w, solution, "unknowns", info.unknowns);
    utw_json_add_number(w, solution, "gap", info.gap);
    utw_json_add_number(w, solution, "tolerance", info.tolerance);
    utw_json_add_flag(w, solution, "reached", info.reached);
    cJSON *seconds = utw_json_add_object(w, solution, "seconds");
    utw_json_add_number(w, seconds, "read", info.seconds_read);
    utw_json_add_number(w, seconds, "mesh", info.seconds_mesh);
    utw_json_add_number(w, seconds, "solve", info.seconds_solve);
    utw_json_add_number(w, seconds, "total", info.seconds_total);
}

static void add_heading(utw_json_writer *w, cJSON *root)
{
    const utw_outline *outline = w->report->solution->outline;
    utw_json_add_text(w, root, "untwist", utw_version());
    utw_json_add_text(w, root, "name", utw_outline_name(outline));
    utw_json_add_text(w, root, "units", utw_outline_units(outline));
    utw_json_add_text(w, root, "caution", utw_report_caution(w->report->solution));
}

/* The named dimensions the section was drawn with; only when it has any. */
static void add_dimensions(utw_json_writer *w, cJSON *root)
{
    const utw_outline *outline = w->report->solution->outline;
    const int n = utw_outline_dimension_count(outline);
    if (n == 0) return;
    cJSON *all = utw_json_add_object(w, root, "dimensions");
    for (int k = 0; k < n; k++) {
        double value = 0;
        const char *name = utw_outline_dimension(outline, k, &value, NULL);
        utw_json_add_number(w, all, name, value);
    }
}

/* The members of the document, in its order. A further kind of result is one more line. */
static void (*const members[])(utw_json_writer *, cJSON *) = {
    add_heading,  add_dimensions,     add_constants,           add_stiffness,
    add_solution, utw_json_add_cases, utw_json_add_comparison, utw_json_add_push};

utw_status utw_report_json(const utw_report *report, char **text, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_json_writer w = {report, 0};
    cJSON *root = NULL;
    char *printed = NULL;
    utw_text copy = {.text = NULL};
    UTW_TRY(utw_report_check(report, text, __func__, err));
    root = utw_json_kept(&w, cJSON_CreateObject());
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
