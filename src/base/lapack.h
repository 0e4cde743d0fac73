/* SPDX-License-Identifier: GPL-3.0-or-later
 * The LAPACK routines the library calls, declared once: Fortran linkage, column-major matrices, and
 * the hidden lengths of character arguments at the end, as gfortran passes them. Source: Anderson
 * et al., LAPACK Users' Guide, 3rd ed. 1999. */
#ifndef UTW_BASE_LAPACK_H
#define UTW_BASE_LAPACK_H

#include <stddef.h>

/** Cholesky factor of a symmetric positive definite matrix a[n][n], in place, in the triangle
 * `uplo` names. *info > 0: the leading minor of that order is not positive. */
void dpotrf_(const char *uplo, const int *n, double *a, const int *lda, int *info,
             size_t uplo_length);

/** Solve with that factor, in place, for the right-hand sides b[nrhs][n]. */
void dpotrs_(const char *uplo, const int *n, const int *nrhs, const double *a, const int *lda,
             double *b, const int *ldb, int *info, size_t uplo_length);

#endif
