/* SPDX-License-Identifier: GPL-3.0-or-later
 * What may be asked of a push. */
#include "bar/push_load.h"

#include <math.h>

#include "base/vec2.h"
#include "section/solution.h"

/* Squares and products of a few numbers of at most this size, or at least its inverse, are doubles.
 */
#define GREATEST 1e60

double utw_push_load_z(const utw_push_load *load)
{
    switch (load->where) {
    case UTW_AT_TIP:
        return load->length;
    case UTW_AT_MID:
        return load->length / 2;
    case UTW_AT_Z:
        return load->z;
    case UTW_UNIFORM:
        return UTW_NAN;
    case UTW_WHERE_USUAL:
        break;
    }
    return load->support == UTW_FIXED_FREE ? load->length : load->length / 2;
}

static utw_status check_material(const utw_solution *solution, utw_error *err)
{
    const utw_outline *o = solution->outline;
    const int none = o->part[0].material < 0;
    int same = 1;
    for (int i = 1; i < o->n_part && !none; i++)
        same &= o->part[i].material >= 0 &&
                o->material[o->part[i].material].E == o->material[o->part[0].material].E;
    if (none || isnan(solution->nu) || !same)
        return utw_fail(err, UTW_E_MATERIAL,
                        "a push needs the stiffness of the bar: give %s material with \"E\" and "
                        "\"nu\"",
                        none ? "the section a" : "every part the same");
    return UTW_OK;
}

static utw_status check_choices(const utw_push_load *l, utw_error *err)
{
    if (l->version != 1)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "push: version %d is not known; start from UTW_PUSH_INIT", l->version);
    if ((int)l->support < 0 || l->support >= UTW_SUPPORT_COUNT || (int)l->warping < 0 ||
        l->warping > UTW_WARPING_HELD || (int)l->where < 0 || l->where > UTW_UNIFORM)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "push: no such support, hold of warping or place along the bar");
    return UTW_OK;
}

static utw_status check_place(const utw_push_load *l, utw_error *err)
{
    const double z = utw_push_load_z(l);
    if (isnan(z)) return UTW_OK;
    if (z < 0 || z > l->length)
        return utw_fail(err, UTW_E_LOAD, "the force acts at z = %g, off the bar (0 to %g)", z,
                        l->length);
    if (z == 0 || (z == l->length && l->support != UTW_FIXED_FREE))
        return utw_fail(err, UTW_E_LOAD,
                        "the force acts at z = %g, on a support: it would neither bend nor twist "
                        "the bar",
                        z);
    return UTW_OK;
}

utw_status utw_push_load_check(const utw_solution *solution, const utw_push_load *l, utw_error *err)
{
    const struct {
        const char *name;
        double value;
    } list[] = {{"length", l->length},
                {"Fx", l->force[0]},
                {"Fy", l->force[1]},
                {"place x", l->has_at ? l->at[0] : 0},
                {"place y", l->has_at ? l->at[1] : 0},
                {"z", l->where == UTW_AT_Z ? l->z : 0},
                {"twist limit", l->twist_limit},
                {"stress limit", l->stress_limit}};
    utw_status st = check_choices(l, err);
    if (st != UTW_OK) return st;
    for (size_t i = 0; i < sizeof list / sizeof *list; i++)
        if (!isfinite(list[i].value))
            return utw_fail(err, UTW_E_LOAD, "push: %s is not a finite number", list[i].name);
    for (size_t i = 0; i < sizeof list / sizeof *list; i++)
        if (list[i].value != 0 &&
            (fabs(list[i].value) > GREATEST || fabs(list[i].value) < 1 / GREATEST))
            return utw_fail(err, UTW_E_LOAD, "push: %s is %g: no such number can be reckoned with",
                            list[i].name, list[i].value);
    if (!(l->length > 0))
        return utw_fail(err, UTW_E_LOAD, "push: the length of the bar is %g; it must be positive",
                        l->length);
    if (!(utw_norm(l->force) > 0))
        return utw_fail(err, UTW_E_LOAD, "push: the force is zero: nothing pushes");
    if (l->twist_limit < 0 || l->stress_limit < 0)
        return utw_fail(err, UTW_E_LOAD, "push: the %s limit is %g; it must be positive",
                        l->twist_limit < 0 ? "twist" : "stress",
                        l->twist_limit < 0 ? l->twist_limit : l->stress_limit);
    st = check_place(l, err);
    return st == UTW_OK ? check_material(solution, err) : st;
}
