/* SPDX-License-Identifier: GPL-3.0-or-later
 * Solving pairs of problems on a mesh with given orders, and what the solutions measure. */
#ifndef UTW_FIELD_FIELD_H
#define UTW_FIELD_FIELD_H

#include "field/element.h"
#include "field/lift.h"
#include "mesh/rim.h"

/** The pairs with what does not change from one set of orders to the next on the same mesh. All
 * borrowed. */
typedef struct utw_setting {
    const utw_mesh *mesh;
    const utw_rim *rim;
    const utw_lift *lift;
    utw_basis_store *store;
    const double *conductivity; /* [n_part] k of pair.h, > 0; NULL: 1 */
    const double *axial;        /* [n_part] e of pair.h, > 0; NULL: k */
    int n_pair;
    const utw_pair *pair; /* [n_pair] */
} utw_setting;

/** Seconds of the stages of one solution, for benchmarks. */
typedef struct utw_field_times {
    double elements, analyse, factorise, solve, recover;
} utw_field_times;

/** Solutions: coefficients of the element's functions in the element's own order, signs applied, so
 * that they belong to the functions as utw_basis() gives them. Those of element t stand at coef +
 * first[t]: [2 n_pair][n_t], the potentials of all pairs, then chi of all pairs (boundary data
 * included as far as the element's order reaches). */
typedef struct utw_field {
    utw_setting setting;
    unsigned char *order;      /* [n_tri], owned */
    unsigned char *side_order; /* [n_edge]: the smaller of the two elements', but 3 at least where
                                  boundary data need it; owned */
    size_t *first;             /* [n_tri + 1], owned */
    double *coef;              /* owned */
    int n_free, n_skeleton_free,
        n_skeleton_clamped; /* unknowns of the potential, and after condensation */
    utw_field_times times;
} utw_field;

/** Solve with the orders order[n_tri] (1 .. UTW_ORDER_MAX). Elements on the boundary use order 3
 * there at least when a pair is balanced. [out] *field, returned owned: utw_field_free().
 * UTW_E_NOMEM, UTW_E_SINGULAR. */
utw_status utw_field_solve(const utw_setting *setting, const unsigned char *order,
                           utw_field **field, utw_error *err);
void utw_field_free(utw_field *field);

/** Element t of a field with its orders. */
void utw_field_element(const utw_field *field, int t, utw_element *element);

/** What one or several fields integrate to, over all elements. pi_i is k P of pair i when it is not
 * balanced, else 0. */
typedef struct utw_measures {
    double area;                               /* int dA by the mesh, as a check */
    double energy[UTW_PAIR_MAX][UTW_PAIR_MAX]; /* int k grad u_i . grad u_j */
    double stress[UTW_PAIR_MAX]
                 [UTW_PAIR_MAX];            /* int (k grad u_i - pi_i) . (k grad u_j - pi_j) / k */
    double gap[UTW_PAIR_MAX][UTW_PAIR_MAX]; /* int (k grad u_i - q_i) . (k grad u_j - q_j) / k */
    double mean[UTW_PAIR_MAX];              /* int e u_i dA */
    double product[UTW_PAIR_MAX];           /* int e u_i u_0 dA */
} utw_measures;

/** Integrate. share[n_tri][n_pair] (may be NULL) receives each element's part of gap[i][i];
 * peak[n_tri] (may be NULL) the greatest |stress| of pair 0 at the element's quadrature points,
 * where the stress is the mean of the two sides, (k grad u + q)/2 - pi. UTW_E_NOMEM. */
utw_status utw_field_measure(const utw_field *field, utw_measures *measures, double *share,
                             double *peak, utw_error *err);

/** Values at a point (r, s) of element t: for every pair the potential u[n_pair], the gradient form
 * k grad u: p[n_pair][2], and the flux q[n_pair][2] (any of them NULL when not wanted); xy[2]
 * receives the place. */
void utw_field_at(const utw_field *field, int t, double r, double s, double xy[2], double *u,
                  double (*p)[2], double (*q)[2]);

#endif
