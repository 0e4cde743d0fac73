/* SPDX-License-Identifier: GPL-3.0-or-later
 * Writes the draft of a trade shape as a section file. */
#include "report/shape_file.h"

#include "base/memory.h"
#include "base/status.h"
#include "base/text.h"
#include "base/vec2.h"
#include "outline/shape.h"

static void write_numbers(utw_text *out, const double *x, int n)
{
    for (int i = 0; i < n; i++) {
        utw_text_add(out, "%s", i == 0 ? "[" : ", ");
        utw_text_add_number(out, x[i]);
    }
    utw_text_add(out, "]");
}

static void write_vertex(utw_text *out, const utw_draft_vertex *v)
{
    if (v->is_arc || v->round > 0) utw_text_add(out, "{\"at\": ");
    write_numbers(out, v->at, 2);
    if (v->is_arc) {
        double cs[2];
        utw_draft_cos_sin(0.5 * (v->a0 + v->a1), cs);
        const double mid[2] = {v->centre[0] + v->r * cs[0], v->centre[1] + v->r * cs[1]};
        utw_text_add(out, ", \"arc\": ");
        write_numbers(out, mid, 2);
    } else if (v->round > 0) {
        utw_text_add(out, ", \"round\": ");
        utw_text_add_number(out, v->round);
    }
    if (v->is_arc || v->round > 0) utw_text_add(out, "}");
}

static void write_loop(utw_text *out, const utw_draft_loop *loop, const char *indent)
{
    const double closed[5] = {loop->centre[0], loop->centre[1], loop->a, loop->b,
                              loop->turn * (180 / UTW_PI)};
    if (loop->kind != UTW_DRAFT_VERTICES) {
        utw_text_add(out, "{\"%s\": ", loop->kind == UTW_DRAFT_CIRCLE ? "circle" : "ellipse");
        write_numbers(out, closed, loop->kind == UTW_DRAFT_CIRCLE ? 3 : 5);
        utw_text_add(out, "}");
        return;
    }
    for (int i = 0; i < loop->n; i++) {
        utw_text_add(out, "%s%s", i == 0 ? "[\n" : ",\n", indent);
        write_vertex(out, &loop->vertex[i]);
    }
    utw_text_add(out, "]");
}

static void write_file(utw_text *out, const utw_outline *outline, const utw_draft *draft)
{
    utw_text_add(
        out,
        "{\n  \"name\": \"%s\",\n  \"units\": \"%s\",\n  \"parts\": [\n    {\n      \"outline\": ",
        utw_outline_name(outline), utw_outline_units(outline));
    write_loop(out, &draft->loop[0], "        ");
    for (int i = 1; i < draft->n_loop; i++) {
        utw_text_add(out, "%s", i == 1 ? ",\n      \"holes\": [\n        " : ",\n        ");
        write_loop(out, &draft->loop[i], "          ");
    }
    utw_text_add(out, "%s\n    }\n  ]\n}\n", draft->n_loop > 1 ? "\n      ]" : "");
}

utw_status utw_shape_file_text(const char *name, int n, const char *const *keys,
                               const double *values, const char *units,
                               const utw_placement *placement, char **text, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_outline *outline = NULL; /* checked as a section file will be */
    utw_draft draft;
    utw_text out = {.text = NULL};
    utw_draft_init(&draft);
    UTW_TRY(utw_outline_from_shape(name, n, keys, values, units, placement, &outline, err));
    UTW_TRY(utw_shape_draft(name, n, keys, values, placement, &draft, NULL, err));
    write_file(&out, outline, &draft);
    if (out.out_of_memory) {
        st = utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
        goto done;
    }
    *text = out.text;
    out.text = NULL;
    st = UTW_OK;
done:
    utw_text_clear(&out);
    utw_draft_clear(&draft);
    utw_outline_free(outline);
    return st;
}
