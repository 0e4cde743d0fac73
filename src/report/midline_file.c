/* SPDX-License-Identifier: GPL-3.0-or-later
 * Writes a midline as a section file. */
#include <stdio.h>

#include "base/status.h"
#include "base/text.h"
#include "untwist.h"

static void write_point(utw_text *out, const double p[2])
{
    utw_text_add(out, "[");
    utw_text_add_number(out, p[0]);
    utw_text_add(out, ", ");
    utw_text_add_number(out, p[1]);
    utw_text_add(out, "]");
}

static void write_wall(utw_text *out, const utw_wall *w)
{
    utw_text_add(out, "{\"from\": %d, \"to\": %d, \"t\": ", w->from, w->to);
    if (w->t0 == w->t1)
        utw_text_add_number(out, w->t0);
    else
        write_point(out, (const double[2]){w->t0, w->t1});
    if (w->arc) {
        utw_text_add(out, ", \"arc\": ");
        write_point(out, w->mid);
    }
    utw_text_add(out, "}");
}

/* Text in quotes. */
static void write_string(utw_text *out, const char *s)
{
    utw_text_add(out, "\"");
    for (; *s != '\0'; s++) {
        if (*s == '"' || *s == '\\')
            utw_text_add(out, "\\%c", *s);
        else if ((unsigned char)*s < 0x20)
            utw_text_add(out, "\\u%04x", (unsigned)*s);
        else
            utw_text_add(out, "%c", *s);
    }
    utw_text_add(out, "\"");
}

utw_status utw_midline_file(const utw_midline *midline, const char *name, const char *units,
                            char **text, utw_error *err)
{
    utw_text out = {.text = NULL};
    if (midline == NULL || name == NULL || units == NULL || text == NULL)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "utw_midline_file: midline, name, units and text must not be NULL");
    utw_text_add(&out, "{\n  \"name\": ");
    write_string(&out, name);
    utw_text_add(&out, ",\n  \"units\": ");
    write_string(&out, units);
    utw_text_add(&out, ",\n  \"midline\": {\n    \"nodes\": [");
    for (int i = 0; i < midline->n_nodes; i++) {
        utw_text_add(&out, "%s", i == 0 ? "\n      " : ",\n      ");
        write_point(&out, midline->nodes[i]);
    }
    utw_text_add(&out, "\n    ],\n    \"walls\": [");
    for (int i = 0; i < midline->n_walls; i++) {
        utw_text_add(&out, "%s", i == 0 ? "\n      " : ",\n      ");
        write_wall(&out, &midline->walls[i]);
    }
    utw_text_add(&out, "\n    ]\n  }\n}\n");
    const utw_status st = utw_text_take(&out, text, err);
    utw_text_clear(&out);
    return st;
}
