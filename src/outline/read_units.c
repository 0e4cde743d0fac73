/* SPDX-License-Identifier: GPL-3.0-or-later
 * "units": a length and a force. Nothing is converted; the names go with every number of a report.
 */
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "base/nearest.h"
#include "outline/read.h"

static const char *const length_unit[] = {"mm", "cm", "m", "in", "ft"};
static const char *const force_unit[] = {"N", "kN", "MN", "lbf", "kip"};
enum { N_UNIT = 5 };

static int find(const char *const *unit, const char *word)
{
    for (int i = 0; i < N_UNIT; i++)
        if (strcmp(unit[i], word) == 0) return i;
    return -1;
}

utw_status utw_outline_set_units(utw_outline *outline, const char *text, const char *what,
                                 utw_error *err)
{
    char length[9] = "", force[9] = "", rest, units[sizeof length + sizeof force];
    const int words = sscanf(text, " %8s %8s %c", length, force, &rest);
    const int l = find(length_unit, length), f = find(force_unit, force);
    if (words == 2 && l >= 0 && f >= 0) {
        /* one blank between the two, whatever was given */
        snprintf(units, sizeof units, "%s %s", length_unit[l], force_unit[f]);
        char *copy = utw_copy_string(units);
        if (copy == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", what);
        utw_free(outline->units);
        outline->units = copy;
        snprintf(outline->length_unit, sizeof outline->length_unit, "%s", length_unit[l]);
        snprintf(outline->force_unit, sizeof outline->force_unit, "%s", force_unit[f]);
        return UTW_OK;
    }
    if (words == 2 && find(length_unit, force) >= 0 && find(force_unit, length) >= 0)
        return utw_fail(err, UTW_E_SYNTAX, "%s is \"%.40s\"; the length comes first: \"%s %s\"",
                        what, text, force, length);
    return utw_fail(err, UTW_E_SYNTAX,
                    "%s is \"%.40s\"; it must be a length (mm, cm, m, in, ft), a blank and a force "
                    "(N, kN, MN, lbf, kip), such as \"mm N\"",
                    what, text);
}

utw_status utw_read_units(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    char *text = NULL;
    utw_status st = utw_read_text(r, value, what, &text);
    if (st == UTW_OK) st = utw_outline_set_units(target, text, what, r->err);
    utw_free(text);
    return st;
}
