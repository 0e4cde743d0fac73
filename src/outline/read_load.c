/* SPDX-License-Identifier: GPL-3.0-or-later
 * "loads": the load cases. */
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "outline/read.h"

static const utw_key load_key[] = {
    {"name", utw_read_text, offsetof(utw_load, name)},
    {"N", utw_read_number, offsetof(utw_load, N)},
    {"Vx", utw_read_number, offsetof(utw_load, Vx)},
    {"Vy", utw_read_number, offsetof(utw_load, Vy)},
    {"T", utw_read_number, offsetof(utw_load, T)},
    {"Mx", utw_read_number, offsetof(utw_load, Mx)},
    {"My", utw_read_number, offsetof(utw_load, My)},
    {"B", utw_read_number, offsetof(utw_load, B)},
    {"at", utw_read_point, offsetof(utw_load, at)},
};
enum { N_KEY = sizeof load_key / sizeof load_key[0] };
enum { NAME = 1u << 0, VX = 1u << 2, VY = 1u << 3, AT = 1u << 8 };

static utw_status read_load(utw_reader *r, const utw_json *value, utw_outline *outline)
{
    utw_load *load = &outline->load[outline->n_load];
    const int number = ++outline->n_load; /* owned by the outline from now on */
    unsigned given = 0;
    snprintf(r->subject, sizeof r->subject, "load %d", number);
    utw_status st = utw_read_object(r, value, "the load", load_key, N_KEY, load, &given);
    if (st != UTW_OK) return st;
    if (!(given & NAME) || load->name[0] == '\0')
        return utw_fail(r->err, UTW_E_LOAD, "\"name\" is missing; results are reported by it");
    snprintf(r->subject, sizeof r->subject, "load %d (\"%.60s\")", number, load->name);
    for (int i = 0; i < number - 1; i++)
        if (strcmp(outline->load[i].name, load->name) == 0)
            return utw_fail(r->err, UTW_E_LOAD, "load %d has the same name; rename one", i + 1);
    if (!(given & ~(unsigned)(NAME | AT)))
        return utw_fail(
            r->err, UTW_E_LOAD,
            "no force or moment is given; give at least one of N, Vx, Vy, T, Mx, My, B");
    if ((given & AT) && !(given & (VX | VY)))
        return utw_fail(
            r->err, UTW_E_LOAD,
            "\"at\" is the point where Vx and Vy act, and neither is given; remove \"at\"");
    load->has_at = (given & AT) != 0;
    r->subject[0] = '\0';
    return UTW_OK;
}

utw_status utw_read_loads(utw_reader *r, const utw_json *value, const char *what, void *target)
{
    utw_outline *outline = target;
    int n;
    const utw_status counted = utw_read_array(r, value, what, UTW_MOST_LOADS, &n);
    if (counted != UTW_OK) return counted;
    outline->load = utw_alloc((size_t)n, sizeof *outline->load);
    if (outline->load == NULL) return utw_fail(r->err, UTW_E_NOMEM, "out of memory (%d loads)", n);
    for (const utw_json *m = utw_json_first(value); m != NULL; m = utw_json_next(m)) {
        const utw_status st = read_load(r, m, outline);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}
