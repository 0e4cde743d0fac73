/* SPDX-License-Identifier: GPL-3.0-or-later
 * Outlines drawn in C, for tests of what works on outlines: no file and no reader is involved. */
#ifndef UTW_TESTS_DRAWING_H
#define UTW_TESTS_DRAWING_H

#include "outline/outline.h"

/** An outline under construction. Every call below works on the last part and the last loop. The
 * memory is utw_alloc's; a test that makes an allocation fail must draw first. */
typedef struct drawing {
    utw_outline outline;
    double start[2], pen[2];
    int open; /* the last loop is still being drawn */
} drawing;

void drawing_init(drawing *d);
void drawing_clear(drawing *d);

/** Begin a part of material index `material`; its first loop is the outline, the next ones its
 * holes. */
void drawing_part(drawing *d, int material);

/** Begin a loop at (x, y). */
void drawing_move(drawing *d, double x, double y);
void drawing_line(drawing *d, double x, double y);
/** Circle arc through (xm, ym) to (x, y). */
void drawing_arc(drawing *d, double xm, double ym, double x, double y);
void drawing_cubic(drawing *d, double x1, double y1, double x2, double y2, double x, double y);
/** Close the loop with a straight line, or with none when the pen is at its start already. */
void drawing_close(drawing *d);

/** Loops of one closed curve, counter-clockwise. */
void drawing_circle(drawing *d, double x, double y, double r);
void drawing_ellipse(drawing *d, double x, double y, double a, double b, double radians);

/** Closed loops of straight lines. */
void drawing_polygon(drawing *d, int n, const double (*xy)[2]);
void drawing_rectangle(drawing *d, double x0, double y0, double x1, double y1);

/** A whole section: every kind of curve, an elliptic hole, no symmetry, about 10 long. */
void drawing_mixed(drawing *d);

/** Turn the last loop round: holes run clockwise. */
void drawing_reverse(drawing *d);

/** Map every point of all curves: p -> m p + shift (m row-major), and turn loops round when m
 * mirrors. */
void drawing_map(drawing *d, const double m[4], const double shift[2]);

/** The box of all curves, which the reader would have set, and the outline. Returned borrowed. */
const utw_outline *drawing_done(drawing *d);

#endif
