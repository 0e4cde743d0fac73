/* SPDX-License-Identifier: GPL-3.0-or-later
 * A part as a section file states it: loops of vertices with fillets and arcs, before they become
 * curves. */
#ifndef UTW_OUTLINE_DRAFT_H
#define UTW_OUTLINE_DRAFT_H

#include "outline/outline.h"

struct utw_shape_case;

/** A vertex, and the curve that leads to it from the vertex before. */
typedef struct utw_draft_vertex {
    double at[2];
    double round;  /* radius of the fillet here; 0 for none. Both curves at it are then lines */
    int dimension; /* which dimension of the shape states the radius ... */
    double extra;  /* ... to which this is added */
    int is_arc;    /* the curve to here is an arc of a circle: */
    double centre[2], r, a0, a1;
} utw_draft_vertex;

typedef enum utw_draft_kind {
    UTW_DRAFT_VERTICES,
    UTW_DRAFT_CIRCLE,
    UTW_DRAFT_ELLIPSE
} utw_draft_kind;

/** The first loop of a draft is the outline; the others are holes. Each may run in either
 * direction. */
typedef struct utw_draft_loop {
    utw_draft_kind kind;
    double centre[2], a, b,
        turn; /* circle (a = b = r), ellipse: semi-axes, a turned by `turn` [rad] from x */
    int n;
    size_t capacity;
    utw_draft_vertex *vertex; /* [n], owned */
} utw_draft_loop;

typedef struct utw_draft {
    int n_loop;
    size_t capacity;
    utw_draft_loop *loop; /* [n_loop], owned */
    int out_of_memory;    /* drawing went on without effect; utw_draft_part() reports it */
} utw_draft;

/** Start with nothing drawn; free what is drawn. */
void utw_draft_init(utw_draft *draft);
void utw_draft_clear(utw_draft *draft);

/** Begin a loop of vertices; the functions below add to it. It closes by itself. */
void utw_draft_begin(utw_draft *draft);

/** A sharp vertex, reached by a line. */
void utw_draft_point(utw_draft *draft, double x, double y);

/** A vertex, reached by a line, with a fillet of radius value + extra of dimension `dimension`; a
 * radius of 0 or less leaves it sharp. */
void utw_draft_round(utw_draft *draft, double x, double y, const struct utw_shape_case *given,
                     int dimension, double extra);

/** An arc from the vertex before about (xc, yc) from angle a0 to a1 [rad]; it ends at the vertex
 * (x, y). Arcs of more than half a turn are cut in two, so that they read back well from three
 * points. */
void utw_draft_arc(utw_draft *draft, double xc, double yc, double r, double a0, double a1, double x,
                   double y);

/** A loop that is a circle or an ellipse (semi-axes a along x, b along y). */
void utw_draft_circle(utw_draft *draft, double xc, double yc, double r);
void utw_draft_ellipse(utw_draft *draft, double xc, double yc, double a, double b);

/** Drop what rounding left: lines shorter than 1e-12 of their loop, a last vertex where the first
 * lies. */
void utw_draft_tidy(utw_draft *draft);

/** Mirror (x to -x), then turn, then shift. Mirroring turns loops round. Quarter turns are exact.
 */
void utw_draft_place(utw_draft *draft, const utw_placement *placement);

/** Cosine and sine of a turn [rad], exact at quarter turns. */
void utw_draft_cos_sin(double turn, double cs[2]);

/** Make curves of it: fillets are tangent arcs in closed form, an edge that fillets use up to 1e-12
 * of the loop's size leaves no curve. [out] *part, owned by the caller: utw_part_clear().
 *  UTW_E_OUTLINE names a fillet that does not fit with its greatest radius (`given` says what the
 * dimensions are called); UTW_E_NOMEM. */
utw_status utw_draft_part(const utw_draft *draft, const struct utw_shape_case *given,
                          utw_part *part, utw_error *err);

#endif
