/* SPDX-License-Identifier: GPL-3.0-or-later
 * A sparse symmetric positive definite system whose unknowns come in blocks (a vertex, the
 * functions of an edge). The only file of the library that knows CHOLMOD. */
#ifndef UTW_FIELD_SYSTEM_H
#define UTW_FIELD_SYSTEM_H

#include "untwist.h"

typedef struct utw_system utw_system;

/** Order the blocks by approximate minimum degree on the graph of blocks (Amestoy, Davis and Duff,
 * SIAM J. Matrix Anal. Appl. 17 (1996) 886-905) and lay out the matrix. Block b has size[b] >= 0
 * unknowns; element i joins the blocks item[first[i]] .. item[first[i+1]-1], each at most once.
 * Returned owned: utw_system_free(). UTW_E_NOMEM. */
utw_status utw_system_create(int n_block, const int *size, int n_element, const int *first,
                             const int *item, utw_system **system, utw_error *err);
void utw_system_free(utw_system *system);

/** Unknowns in all, and the first unknown of a block. */
int utw_system_size(const utw_system *system);
int utw_system_offset(const utw_system *system, int block);

/** Add an element matrix S (row-major, leading dimension ld, symmetric): its rows i come in n_group
 * runs; run g holds the unknowns of block[g] (-1: known, dropped), of which the first is row
 * start[g]. A block may stand twice (two nodes with one common unknown). */
void utw_system_add(utw_system *system, int n_group, const int *block, const int *start,
                    const double *S, int ld);

/** Factorise. UTW_E_SINGULAR when the matrix is not positive definite, UTW_E_NOMEM. */
utw_status utw_system_factorise(utw_system *system, utw_error *err);

/** Solve for n_rhs right-hand sides in place: b[n_rhs][size]. UTW_E_NOMEM, UTW_E_SINGULAR. */
utw_status utw_system_solve(const utw_system *system, int n_rhs, double *b, utw_error *err);

/** Give back the matrix and its factor; size and offsets stay. Nothing can be added, factorised or
 * solved afterwards. */
void utw_system_release(utw_system *system);

/** Seconds spent on ordering and analysis, factorising, solving (wall clock), for benchmarks. */
void utw_system_seconds(const utw_system *system, double *analyse, double *factorise,
                        double *solve);

#endif
