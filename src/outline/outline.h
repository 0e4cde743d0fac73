/* SPDX-License-Identifier: GPL-3.0-or-later
 * What the section is: parts with loops of curves, materials, loads. Filled by the reader, never changed after. */
#ifndef UTW_OUTLINE_OUTLINE_H
#define UTW_OUTLINE_OUTLINE_H

#include "outline/curve.h"
#include "untwist.h"

/** A closed chain of curves: curve[k] ends where curve[k+1] starts, the last where the first starts, bit by bit.
 *  After reading, outlines run counter-clockwise and holes clockwise (material on the left). */
typedef struct utw_loop {
    int n;
    utw_curve *curve; /* [n], owned */
    int *vertex;      /* [n], owned: the vertex of the file (0-based) this curve leads to as drawn (an outline that
                   * is turned round keeps the numbers), or the one it rounds or cuts; for messages */
} utw_loop;

/** One region of one material. loop[0] is the outline, the others are its holes. */
typedef struct utw_part {
    int material; /* index, or -1 for none */
    int n_loop;
    utw_loop *loop; /* [n_loop], owned */
} utw_part;

/** NAN stands for what the file does not give. */
typedef struct utw_material {
    char *name;     /* owned */
    double E;       /* [F/L^2] */
    double nu;      /* [1], -1 < nu <= 1/2 */
    double density; /* mass per L^3, as the user means it */
    double yield;   /* [F/L^2] */
} utw_material;

/** A load case: forces and moments of design.md's signs; B is the bimoment [F L^2]. */
typedef struct utw_load {
    char *name; /* owned */
    double N, Vx, Vy, T, Mx, My, B;
    int has_at;   /* 0: Vx, Vy act at the shear centre */
    double at[2]; /* where Vx, Vy act [L] */
} utw_load;

/** A named dimension of the file ("let"), with the value it had when the file was read. */
typedef struct utw_dimension {
    char *name; /* owned */
    double value;
    int is_set; /* 1: set by the caller, not by the file */
} utw_dimension;

struct utw_outline {
    char *name, *units; /* owned */
    char length_unit[8], force_unit[8];
    int n_part, n_material, n_load;
    utw_part *part;
    utw_material *material;
    utw_load *load;
    int n_dimension;
    utw_dimension *dimension; /* [n_dimension], owned */
    utw_midline *midline; /* what the part was thickened from, owned; NULL when it was not */
    double box[4]; /* xmin, ymin, xmax, ymax of all parts [L] */
    double seconds; /* wall clock of reading and checking */
};

/** Free what a loop, a part owns (not the struct itself). */
void utw_loop_clear(utw_loop *loop);
void utw_part_clear(utw_part *part);

/** Mirror, turn and shift a part; quarter turns are exact. Loops keep their direction. */
void utw_part_place(utw_part *part, const utw_placement *placement);

/** Signed area of a loop, positive counter-clockwise [L^2]; exact. */
double utw_loop_area(const utw_loop *loop);

/** Turn a loop round. Vertex numbers follow their curves. */
void utw_loop_reverse(utw_loop *loop);

/** Turn loops so that outlines run counter-clockwise and holes clockwise, and set the box. */
void utw_outline_orient(utw_outline *outline);

/** Make part 0 of an outline without parts by thickening a midline, and keep it. midline->nodes and walls are taken (and
 *  set to NULL) on success. UTW_E_NOMEM and what utw_thicken() gives. */
utw_status utw_outline_take_midline(utw_outline *outline, utw_midline *midline, utw_error *err);

/** Set units, length_unit and force_unit from text such as "mm N", called `what` in messages. UTW_E_SYNTAX (the outline
 *  is unchanged), UTW_E_NOMEM. */
utw_status utw_outline_set_units(utw_outline *outline, const char *text, const char *what, utw_error *err);

#endif
