/* SPDX-License-Identifier: GPL-3.0-or-later
 * Thin-walled midlines for tests. */
#ifndef UTW_TESTS_MIDLINES_H
#define UTW_TESTS_MIDLINES_H

#include "support/support.h"

/* Walls: constant, tapering, arc through a point. */
#define WALL(from, to, t)                                                                          \
    {                                                                                              \
        from, to, t, t, 0,                                                                         \
        {                                                                                          \
            0, 0                                                                                   \
        }                                                                                          \
    }
#define TAPER(from, to, t0, t1)                                                                    \
    {                                                                                              \
        from, to, t0, t1, 0,                                                                       \
        {                                                                                          \
            0, 0                                                                                   \
        }                                                                                          \
    }
#define ARC(from, to, t0, t1, x, y)                                                                \
    {                                                                                              \
        from, to, t0, t1, 1,                                                                       \
        {                                                                                          \
            x, y                                                                                   \
        }                                                                                          \
    }

/* A midline from two arrays in scope. */
#define MIDLINE(nodes, walls)                                                                      \
    ((utw_midline){(int)(sizeof(nodes) / sizeof((nodes)[0])),                                      \
                   (int)(sizeof(walls) / sizeof((walls)[0])), nodes, walls})

/** Analyse it; the test fails with the message when it is refused. Owned by the caller. */
utw_thin *utw_thin_of(const utw_midline *midline);

/** A collection of general midlines without symmetry: open and closed, straight and curved,
 * tapering, with fins, slits and several cells. Number `i` from 0; NULL beyond the last. *name is
 * static text. */
const utw_midline *utw_midline_sample(int i, const char **name);

/** int f du-wise over a wall: calls utw_thin_at() at Gauss points of `parts` equal parts and hands
 * each station with its weight ds [L] to `add`. */
void utw_along_wall(const utw_thin *thin, int wall, double length, int parts,
                    const utw_thin_load *load,
                    void (*add)(const utw_thin_station *, double ds, void *data), void *data);

/** Length of a wall [L] from its drawing: the chord, or the arc through its point. */
double utw_wall_length(const utw_midline *midline, int wall);

#endif
