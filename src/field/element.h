/* SPDX-License-Identifier: GPL-3.0-or-later
 * One element of given orders: its functions, stiffness and load vectors. */
#ifndef UTW_FIELD_ELEMENT_H
#define UTW_FIELD_ELEMENT_H

#include "field/basis.h"
#include "field/pair.h"
#include "mesh/blend.h"

/** The functions of an element in its own order: three vertices, the functions of side 0, 1, 2 up
 * to their orders, the interior ones. A sign makes odd functions of a side run from its lower to
 * its higher node number. */
typedef struct utw_element {
    int tri, order, side_order[3];
    int top;                       /* greatest of them */
    int n_skeleton, n_interior, n; /* n = n_skeleton + n_interior */
    int kind[UTW_FUNCTIONS_MAX]; /* vertex i: i; side e, degree k: 8 + 64 e + k; interior j: 1024 +
                                    j */
    double sign[UTW_FUNCTIONS_MAX];
    utw_blend blend;
} utw_element;

/** Set up element `tri` with interior order `order` and side orders; sides lie in the mesh's
 * numbering. */
void utw_element_of(const utw_mesh *mesh, int tri, int order, const int side_order[3],
                    utw_element *element);

/** Where the element's functions stand in the list of order p >= top: index[element->n]. */
void utw_element_index(const utw_element *element, int p, int *index);

/** Points a direction that integrate the stiffness, squares of gradients of quadratic fluxes and
 * squares of values. */
int utw_element_points(const utw_element *element);

/** The map of an element at the points of its table: place, derivatives {x_r, x_s, y_r, y_s} and
 * their determinant. */
typedef struct utw_map {
    const utw_table *table;
    double xy[UTW_POINTS_MAX * UTW_POINTS_MAX][2], J[UTW_POINTS_MAX * UTW_POINTS_MAX][4];
    double det[UTW_POINTS_MAX * UTW_POINTS_MAX];
} utw_map;

/** Fill the map. UTW_E_NOMEM when the table cannot be made. */
utw_status utw_element_map(const utw_element *element, utw_basis_store *store, utw_map *map,
                           utw_error *err);

/** Doubles of scratch that the functions below need. */
#define UTW_ELEMENT_WORK (2 * UTW_POINTS_MAX * UTW_POINTS_MAX * UTW_FUNCTIONS_MAX)

/** Stiffness int grad Ni . grad Nj, K[n][n], signs applied. work[UTW_ELEMENT_WORK]. UTW_E_NOMEM. */
utw_status utw_element_stiffness(const utw_element *element, utw_basis_store *store,
                                 const utw_map *map, double *K, double *work, utw_error *err);

/** Load vectors int (g . grad Ni + s Ni): F[n_load][n], signs applied. g[n_load][2] polynomials;
 * s[n_source] for the first n_source <= n_load loads, the others have none. work[UTW_ELEMENT_WORK].
 * UTW_E_NOMEM. */
utw_status utw_element_loads(const utw_element *element, utw_basis_store *store, const utw_map *map,
                             int n_load, const utw_poly (*g)[2], int n_source, const utw_poly *s,
                             double *F, double *work, utw_error *err);

#endif
