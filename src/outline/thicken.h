/* SPDX-License-Identifier: GPL-3.0-or-later
 * A midline with its thicknesses, made into the part it stands for. */
#ifndef UTW_OUTLINE_THICKEN_H
#define UTW_OUTLINE_THICKEN_H

#include "outline/outline.h"

/** The part (material -1) that the walls of a midline cover: corners mitred, free ends square,
 * walls that meet at a node joined, every cell a hole. [in] midline, borrowed. [out] *part, owned
 * by the caller: utw_part_clear(); vertex numbers of its curves are those of their walls.
 *
 *  Each side of a wall runs half a thickness off its midline, measured square to it: a straight
 * line (also when the thickness changes along it), an arc about the same centre, or, beside an arc
 * whose thickness changes, cubics that follow it to 1e-9 of the section's size. Two sides that meet
 * at a node run to the point where they cross. Where walls go on within 45 degrees of straight with
 * thicknesses too different for that, the thicker one ends square at the node. Where they fold back
 * to less than about 29 degrees, the mitre, longer than twice the thickness, is cut off from one
 * wall's end to the other's.
 *
 *  UTW_E_ARGUMENT, UTW_E_NOMEM; UTW_E_OUTLINE: what utw_graph_paths(), utw_graph_init() and
 * utw_contact_check() refuse; two nodes in one place; a wall too short for the corners at its ends
 * or too thick for its arc; walls that meet at too sharp an angle or run into one another when
 * thickened. Messages count walls from 1 and give nodes by index; err->vertex is the index of the
 * wall or node. */
utw_status utw_thicken(const utw_midline *midline, utw_part *part, utw_error *err);

#endif
