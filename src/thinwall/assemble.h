/* SPDX-License-Identifier: GPL-3.0-or-later
 * From the branches of the chordal axis to a graph of walls. */
#ifndef UTW_THINWALL_ASSEMBLE_H
#define UTW_THINWALL_ASSEMBLE_H

#include "thinwall/build.h"

/** Find the walls of every branch and join them. [in, out] build: border, chordal and err set, the
 * rest zero; on success it holds nodes and walls, none when the section is a lump. Clear it with
 * utw_build_clear() whatever is returned. UTW_E_NOMEM. */
utw_status utw_assemble(utw_build *build);

#endif
