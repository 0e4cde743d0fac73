/* SPDX-License-Identifier: GPL-3.0-or-later
 * Finding the element, and the place in it, of a point of the plane. */
#ifndef UTW_MESH_LOCATE_H
#define UTW_MESH_LOCATE_H

#include "mesh/mesh.h"

/** A place in the mesh: (r, s) of the reference triangle of element tri (mesh/blend.h). */
typedef struct utw_place {
    int tri;
    double r, s;
    double xy[2]; /* [L] */
} utw_place;

/** A grid of the elements' boxes. */
typedef struct utw_locator utw_locator;

/** [in] mesh, borrowed for the life of the locator. Returned owned: utw_locator_free().
 * UTW_E_NOMEM.
 */
utw_status utw_locator_create(const utw_mesh *mesh, utw_locator **locator, utw_error *err);
void utw_locator_free(utw_locator *locator);

/** The element that holds xy, by Newton's method on the blended maps of those whose box does. 1
 * when found; 0, with *place untouched, when xy lies in none. On a side of two elements either is
 * given.
 */
int utw_locate(const utw_locator *locator, const double xy[2], utw_place *place);

/** The point of the section's boundary nearest to xy. Returns its distance [L]. */
double utw_locate_boundary(const utw_locator *locator, const double xy[2], utw_place *place);

/** The place u in [0, 1] along side k of an element. */
void utw_place_on_side(const utw_mesh *mesh, int tri, int k, double u, utw_place *place);

#endif
