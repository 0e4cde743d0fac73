/* SPDX-License-Identifier: GPL-3.0-or-later
 * Solving again with higher orders where the error is, until the bracket is as narrow as asked. */
#ifndef UTW_SECTION_ADAPT_H
#define UTW_SECTION_ADAPT_H

#include "field/field.h"
#include "section/problems.h"

/** Moduli of the parts against a reference, each [n_part]; both NULL for one material. */
typedef struct utw_moduli {
    double *shear, *axial; /* G/G_ref, E/E_ref */
} utw_moduli;

/** The mesh and everything on it. */
typedef struct utw_solved {
    utw_net *net; /* centroidal, scaled; owned */
    utw_mesh *mesh;
    utw_rim *rim;
    utw_lift *lift;
    utw_basis_store *store;
    const utw_moduli *moduli; /* borrowed; NULL for one material */
    utw_pair pair[UTW_N_PAIR];
    utw_field *field;
    utw_measures now, before; /* of the last round and the one before it */
    double
        *peak; /* [n_tri] greatest torsional stress seen in each element of the last round; owned */
    int rounds, reached;
    double gap; /* relative gap of J of the last round */
    double seconds_mesh, seconds_solve;
} utw_solved;

/** Solve on a net about its centroid. With options->fixed_order this order everywhere, once. Orders
 * start at 3 and rise element by element by the predicted decay of its share of the gap (a
 * factor of about 0.15 an order was measured); elements whose order is used up are cut in four.
 * [in] moduli, borrowed, or NULL: with several only the pair of torsion is bounded and refined, and
 * two rounds are made at least, for estimates from their difference. [in] net is taken:
 * utw_solved_clear() frees it, also after a failure. [in] poisson: 1 when Poisson's ratio matters
 * (the anticlastic pairs are then refined too). UTW_E_MESH, UTW_E_SINGULAR, UTW_E_NOMEM. */
utw_status utw_adapt(utw_net *net, const utw_moduli *moduli, const utw_options *options,
                     int poisson, utw_solved *solved, utw_error *err);

void utw_solved_clear(utw_solved *solved);

#endif
