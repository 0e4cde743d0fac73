/* SPDX-License-Identifier: GPL-3.0-or-later
 * Hierarchic shape functions on the reference triangle and their tables at quadrature points.
 *
 * Reference triangle: r, s >= 0, r + s <= 1, with l0 = 1-r-s, l1 = r, l2 = s. Vertex i has l_i = 1;
 * edge e joins vertex e to vertex (e+1)%3. Functions of order p, in this order (Szabo and Babuska,
 * Finite Element Analysis, 1991, ch. 6; the interior family after Karniadakis and Sherwin,
 * Spectral/hp Element Methods, 1999, ch. 3): 3           vertex functions l_i 3 (p-1)     edge
 * functions, edge by edge, k = 2..p:  c_k la lb P_{k-2}^{(1,1)}(lb - la), on the edge minus the
 *               integrated Legendre polynomial of degree k, so that their derivatives are
 * orthogonal there (p-1)(p-2)/2  interior functions l0 l1 l2 P_i^{(2,2)} P_j^{(2i+5,2)}, by total
 * degree i+j ascending An edge function with k odd changes sign when its edge is run the other way.
 */
#ifndef UTW_FIELD_BASIS_H
#define UTW_FIELD_BASIS_H

#include "untwist.h"

#define UTW_ORDER_MAX     12 /* greatest order of an element */
#define UTW_SERIES_MAX    17 /* greatest degree of an edge function used for boundary data */
#define UTW_FUNCTIONS_MAX ((UTW_ORDER_MAX + 1) * (UTW_ORDER_MAX + 2) / 2)
#define UTW_POINTS_MAX    (UTW_ORDER_MAX + 2) /* quadrature points a direction */

/** Functions of order p: (p+1)(p+2)/2. */
static inline int utw_n_functions(int p)
{
    return (p + 1) * (p + 2) / 2;
}

/** Interior functions of order p. */
static inline int utw_n_interior(int p)
{
    return p < 3 ? 0 : (p - 1) * (p - 2) / 2;
}

/** Position of edge function k (2..p) of edge e in the list of order p. */
static inline int utw_edge_function(int p, int e, int k)
{
    return 3 + e * (p - 1) + k - 2;
}

/** All functions of order p and their derivatives at (r, s): N, Nr, Ns [utw_n_functions(p)]. */
void utw_basis(int p, double r, double s, double *N, double *Nr, double *Ns);

/** phi[j] = c la lb factor: the edge kernels c_k P_{k-2}^{(1,1)}(x), k = 2..n, and their
 * derivatives by x: phi[n-1], dphi[n-1]. The edge function is la lb phi[k-2](lb - la). */
void utw_edge_kernels(int n, double x, double *phi, double *dphi);

#define UTW_SERIES_TERMS (UTW_SERIES_MAX - 1) /* edge functions of degree 2 .. UTW_SERIES_MAX */

/** Tables at the collapsed Gauss-Legendre points of q x q points: exact for polynomials of degree
 * 2q-2 on the triangle (Duffy 1982; Stroud 1971). All weights are positive, all points inside.
 * Functions are those of order q-1. */
typedef struct utw_table {
    int q, n_point, n_function, order;
    double *r, *s, *w;   /* [n_point]; weights sum to 1/2 */
    double *N, *Nr, *Ns; /* [n_point][n_function] */
    double *phi, *dphi;  /* [n_point][3][UTW_SERIES_TERMS]: utw_edge_kernels() of every side */
} utw_table;

/** Reference matrices of order p and moments of quadratic loads. */
typedef struct utw_reference {
    int p, n;
    double *R11, *R12, *R22; /* [n][n]: int Nr Nr, int (Nr Ns + Ns Nr), int Ns Ns; symmetric */
    double *Mr, *Ms, *M0;    /* [6][n]: int Nr L_j, int Ns L_j, int N L_j with the six quadratic
                                Lagrange functions    (vertices 0 1 2, mid-edges 01 12 20) */
} utw_reference;

/** Tables and matrices, made when first asked for. */
typedef struct utw_basis_store utw_basis_store;

/** UTW_E_NOMEM. Returned owned: utw_basis_store_free(). */
utw_status utw_basis_store_create(utw_basis_store **store, utw_error *err);
void utw_basis_store_free(utw_basis_store *store);

/** Table with q points a direction (1 .. UTW_POINTS_MAX); returned borrowed, NULL when memory is
 * out. */
const utw_table *utw_basis_table(utw_basis_store *store, int q);

/** Reference matrices of order p (1 .. UTW_ORDER_MAX); returned borrowed, NULL when memory is out.
 */
const utw_reference *utw_basis_reference(utw_basis_store *store, int p);

#endif
