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

utw_status utw_read_units(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_outline *outline = target;
    utw_status st = utw_read_text(r, value, what, &outline->units);
    if (st != UTW_OK) return st;
    char length[9] = "", force[9] = "", rest;
    const int words = sscanf(outline->units, " %8s %8s %c", length, force, &rest);
    const int l = find(length_unit, length), f = find(force_unit, force);
    if (words == 2 && l >= 0 && f >= 0) {
        /* one blank between the two, whatever the file has */
        snprintf(outline->length_unit, sizeof outline->length_unit, "%s", length_unit[l]);
        snprintf(outline->force_unit, sizeof outline->force_unit, "%s", force_unit[f]);
        snprintf(outline->units, strlen(outline->units) + 1, "%s %s", length_unit[l],
                 force_unit[f]);
        return UTW_OK;
    }
    if (words == 2 && find(length_unit, force) >= 0 && find(force_unit, length) >= 0)
        return utw_fail(r->err, UTW_E_SYNTAX, "%s is \"%s\"; the length comes first: \"%s %s\"",
                        what, outline->units, force, length);
    return utw_fail(r->err, UTW_E_SYNTAX,
                    "%s is \"%.40s\"; it must be a length (mm, cm, m, in, ft), a blank and a force "
                    "(N, kN, MN, lbf, kip), such as \"mm N\"",
                    what, outline->units);
}
