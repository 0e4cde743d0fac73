/* SPDX-License-Identifier: GPL-3.0-or-later
 * Reading a section file: its top level, and what is checked when all of it is known. */
#include "outline/read.h"

#include <stdio.h>
#include <string.h>

#include "base/clock.h"
#include "base/memory.h"
#include "outline/check.h"

/* In the order they are read: expressions name dimensions, parts name materials. What stands in
 * place of "parts" is one more line here, with its bit in SECTION. */
static const utw_key section_key[] = {
    {"let", utw_read_let, 0},         {"name", utw_read_text, offsetof(utw_outline, name)},
    {"units", utw_read_units, 0},     {"materials", utw_read_materials, 0},
    {"parts", utw_read_parts, 0},     {"shape", utw_read_shape, 0},
    {"midline", utw_read_midline, 0}, {"loads", utw_read_loads, 0},
};
enum {
    N_KEY = sizeof section_key / sizeof section_key[0],
    LET = 1 << 0,
    UNITS = 1 << 2,
    SECTION = 7 << 4
};

/* Either every part has a material or none. */
static utw_status check_materials(utw_reader *r)
{
    const utw_outline *o = r->outline;
    int with = -1, without = -1;
    for (int i = o->n_part - 1; i >= 0; i--) *(o->part[i].material < 0 ? &without : &with) = i;
    if (with >= 0 && without >= 0) {
        r->part = without;
        return utw_fail(
            r->err, UTW_E_MATERIAL,
            "\"material\" is missing, while part %d has one; give every part its material",
            with + 1);
    }
    if (with < 0 && o->n_material > 0)
        return utw_fail(r->err, UTW_E_MATERIAL,
                        "the material \"%.60s\" is defined and no part uses it; add \"material\": "
                        "\"%.60s\" to the part, or remove it",
                        o->material[0].name, o->material[0].name);
    return UTW_OK;
}

static utw_status read_section(utw_reader *r, const utw_json *json)
{
    unsigned given = 0;
    const utw_status st =
        utw_read_object(r, json, "the section", section_key, N_KEY, r->outline, &given);
    if (st != UTW_OK) return st;
    if (r->n_set > 0 && !(given & LET))
        return utw_fail(r->err, UTW_E_ARGUMENT,
                        "\"%.100s\" cannot be set; the section has no named dimensions (\"let\")",
                        r->set[0]);
    if (!(given & UNITS))
        return utw_fail(r->err, UTW_E_SYNTAX,
                        "\"units\" is missing; add, for example, \"units\": \"mm N\"");
    if (!(given & SECTION))
        return utw_fail(r->err, UTW_E_OUTLINE, "\"parts\" is missing; the section has no outline");
    return check_materials(r);
}

/* Put the place of a failed reading before its message. */
static void name_place(const utw_reader *r)
{
    if (r->part < 0) {
        if (r->subject[0] != '\0') utw_error_prefix(r->err, "%s: ", r->subject);
        return;
    }
    char text[96];
    int n = snprintf(text, sizeof text, "part %d", r->part + 1);
    if (r->loop == 0) n += snprintf(text + n, sizeof text - (size_t)n, ", outline");
    if (r->loop > 0) n += snprintf(text + n, sizeof text - (size_t)n, ", hole %d", r->loop);
    if (r->vertex >= 0) snprintf(text + n, sizeof text - (size_t)n, ", vertex %d", r->vertex + 1);
    utw_error_prefix(r->err, "%s: ", text);
    utw_error_place(r->err, r->part, r->loop, r->vertex);
}

static utw_status parse(const char *text, size_t n, const char *name, int n_set,
                        const char *const *set, utw_outline **outline, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_json *json = NULL;
    utw_reader r = {.err = err,
                    .path = name,
                    .n_set = n_set,
                    .set = set,
                    .part = -1,
                    .loop = -1,
                    .vertex = -1};
    const double start = utw_seconds();
    UTW_TRY(utw_json_parse(text, n, &json, err));
    UTW_TRY(utw_let_create(0, &r.let, err));
    UTW_TRY_ALLOC(r.outline = utw_alloc(1, sizeof *r.outline));
    st = read_section(&r, json);
    if (st != UTW_OK) {
        name_place(&r);
        goto done;
    }
    utw_outline_orient(r.outline);
    UTW_TRY(utw_outline_check(r.outline, err));
    r.outline->seconds = utw_seconds() - start;
    *outline = r.outline;
    r.outline = NULL;
    st = UTW_OK;
done:
    utw_outline_free(r.outline);
    utw_let_free(r.let);
    utw_json_free(json);
    return st;
}

utw_status utw_outline_parse_with(const char *text, size_t n, const char *name, int n_set,
                                  const char *const *set, utw_outline **outline, utw_error *err)
{
    utw_error local;
    int wrong =
        text == NULL || name == NULL || outline == NULL || n_set < 0 || (n_set > 0 && set == NULL);
    for (int i = 0; !wrong && i < n_set; i++) wrong = set[i] == NULL;
    if (wrong)
        return utw_fail(
            err, UTW_E_ARGUMENT,
            "reading a section: text, name, outline and each of set[n_set] must be given");
    utw_error_clear(&local);
    const utw_status st = parse(text, n, name, n_set, set, outline, &local);
    if (st == UTW_OK) return UTW_OK;
    utw_error_prefix(&local, "%.200s: ", name);
    if (err != NULL) *err = local;
    return st;
}

utw_status utw_outline_parse(const char *text, size_t n, const char *name, utw_outline **outline,
                             utw_error *err)
{
    return utw_outline_parse_with(text, n, name, 0, NULL, outline, err);
}

utw_status utw_outline_read_with(const char *path, int n_set, const char *const *set,
                                 utw_outline **outline, utw_error *err)
{
    char *text = NULL;
    size_t n = 0;
    if (path == NULL || outline == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "reading a section: path and outline must be given");
    const char *name = strcmp(path, "-") == 0 ? "standard input" : path;
    utw_status st = utw_read_file(path, &text, &n, err);
    if (st != UTW_OK) utw_error_prefix(err, "%.200s: ", name);
    if (st == UTW_OK) st = utw_outline_parse_with(text, n, name, n_set, set, outline, err);
    utw_free(text);
    return st;
}

utw_status utw_outline_read(const char *path, utw_outline **outline, utw_error *err)
{
    return utw_outline_read_with(path, 0, NULL, outline, err);
}
