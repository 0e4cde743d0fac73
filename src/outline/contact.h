/* SPDX-License-Identifier: GPL-3.0-or-later
 * Whether walls meet where no node joins them: a drawing mistake that would open a cell or hide a
 * junction. */
#ifndef UTW_OUTLINE_CONTACT_H
#define UTW_OUTLINE_CONTACT_H

#include "outline/wall.h"

/** Refuse two walls that lie on one another, a node that lies on a wall it is not joined to, and
 * two walls that cross away from their nodes. A node "lies on" a wall when it is within a hundredth
 * of the wall's thickness of its midline and further than a thickness from the wall's ends; nodes
 * at the same place are two sides of a slit and are left alone. Call after utw_graph_paths();
 * `size` is the one it returned. O(n^2) with a quick test by circles. [in] paths[midline->n_walls],
 * borrowed. UTW_E_OUTLINE; err->vertex is the index of the wall or node spoken of. */
utw_status utw_contact_check(const utw_midline *midline, const utw_path *paths,
                             const double origin[2], double size, utw_error *err);

#endif
