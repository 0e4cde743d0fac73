/* SPDX-License-Identifier: GPL-3.0-or-later
 * A bar under a transverse force: bending and torsion side by side. */
#ifndef UTW_BAR_PUSH_H
#define UTW_BAR_PUSH_H

#include "bar/along.h"
#include "bar/bending.h"
#include "bar/torsion.h"

/** Bending by the force at the shear centre, and torsion by the torque it brings for each unit of
 * offset. Everything at an offset is bending + offset times torsion. */
typedef struct utw_pushed {
    utw_bending_solution bending;
    utw_torsion_solution torsion; /* of a torque [F L] for an offset of 1 [L] */
} utw_pushed;

struct utw_push {
    const utw_solution *solution; /* borrowed */
    const utw_stress *stress;     /* borrowed, may be NULL */
    utw_push_load load;
    utw_pushed bar;
    utw_stations stations;
    utw_push_result result;
};

/** The bar at z when the load acts at an offset from the shear centre. */
void utw_pushed_at(const utw_pushed *bar, double z, double offset, utw_push_state *state);

/** Offset of a place from the shear centre along `across`. */
double utw_push_offset(const utw_push *push, const double at[2]);

#endif
