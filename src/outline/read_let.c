/* SPDX-License-Identifier: GPL-3.0-or-later
 * "let": named dimensions, and those set from outside. */
#include <stdio.h>

#include "base/memory.h"
#include "outline/read.h"

/* Keep names and values for reports. */
static utw_status keep(utw_reader *r, utw_outline *outline)
{
    const int n = utw_let_count(r->let);
    outline->dimension = utw_alloc((size_t)n, sizeof *outline->dimension);
    if (outline->dimension == NULL)
        return utw_fail(r->err, UTW_E_NOMEM, "out of memory (%d dimensions)", n);
    for (int k = 0; k < n; k++) {
        utw_dimension *d = &outline->dimension[k];
        d->name = utw_copy_string(utw_let_name(r->let, k));
        if (d->name == NULL) return utw_fail(r->err, UTW_E_NOMEM, "out of memory (dimension)");
        d->value = utw_let_value(r->let, k);
        d->is_set = utw_let_is_set(r->let, k);
        outline->n_dimension++;
    }
    return UTW_OK;
}

utw_status utw_read_let(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_status st = UTW_OK;
    if (utw_json_kind_of(value) != UTW_JSON_OBJECT)
        return utw_fail(r->err, UTW_E_SYNTAX, "%s must be an object {\"name\": value, ...}, not %s",
                        what, utw_json_kind_text(value));
    const int n = utw_json_count(value);
    if (n > UTW_MOST_DIMENSIONS)
        return utw_fail(r->err, UTW_E_SYNTAX, "%s has %d members; at most %d are read", what, n,
                        UTW_MOST_DIMENSIONS);
    utw_let_free(r->let);
    r->let = NULL;
    st = utw_let_create(n, &r->let, r->err);
    for (const utw_json *m = utw_json_first(value); m != NULL && st == UTW_OK;
         m = utw_json_next(m)) {
        const int is_expression = utw_json_kind_of(m) == UTW_JSON_STRING;
        double number = 0;
        char name[80];
        snprintf(name, sizeof name, "dimension \"%.60s\"", utw_json_key(m));
        if (!is_expression) st = utw_read_number(r, m, name, &number);
        if (st == UTW_OK)
            st = utw_let_define(r->let, utw_json_key(m), is_expression ? utw_json_string(m) : NULL,
                                number, r->err);
    }
    for (int i = 0; i < r->n_set && st == UTW_OK; i++) st = utw_let_set(r->let, r->set[i], r->err);
    if (st == UTW_OK) st = utw_let_resolve(r->let, r->err);
    return st == UTW_OK ? keep(r, target) : st;
}
