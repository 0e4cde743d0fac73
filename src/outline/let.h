/* SPDX-License-Identifier: GPL-3.0-or-later
 * Named dimensions and expressions in them: the only door to muparser. */
#ifndef UTW_OUTLINE_LET_H
#define UTW_OUTLINE_LET_H

#include "untwist.h"

#define UTW_LONGEST_DIMENSION  60  /* bytes of a name */
#define UTW_LONGEST_EXPRESSION 400 /* bytes */

/** Names with their values. An expression may hold numbers, names, + - * / ^, comparisons, ?:,
 * brackets, pi and the functions sqrt abs min max floor ceil hypot, sin cos tan (of degrees), asin
 * acos atan atan2 (in degrees). */
typedef struct utw_let utw_let;

/** Room for `capacity` names. [out] *let, returned owned: utw_let_free(). UTW_E_NOMEM. */
utw_status utw_let_create(int capacity, utw_let **let, utw_error *err);

/** NULL is allowed. */
void utw_let_free(utw_let *let);

/** Define a name by an expression (copied), or by a number when the expression is NULL. No more
 * than `capacity` times. UTW_E_SYNTAX when the name is none, is taken, or the expression too long;
 * UTW_E_NOMEM. */
utw_status utw_let_define(utw_let *let, const char *name, const char *expression, double number,
                          utw_error *err);

/** Give a name another expression, from outside: "t=5". UTW_E_ARGUMENT when it is not
 * NAME=EXPRESSION, or the name is not defined or has been set before; UTW_E_NOMEM. */
utw_status utw_let_set(utw_let *let, const char *assignment, utw_error *err);

/** Find the value of every name, in whatever order they depend on one another. UTW_E_SYNTAX: an
 * expression that is none, an unknown name, a circle, a division by zero, a value that is not
 * finite; the message names the dimension and its expression. */
utw_status utw_let_resolve(utw_let *let, utw_error *err);

/** The value of an expression, after utw_let_resolve(). UTW_E_SYNTAX as there; the message starts
 * with the expression. */
utw_status utw_let_evaluate(utw_let *let, const char *expression, double *value, utw_error *err);

/** Number of names; the k-th one, its value, and whether it was set from outside. Returned
 * borrowed. */
int utw_let_count(const utw_let *let);
const char *utw_let_name(const utw_let *let, int k);
double utw_let_value(const utw_let *let, int k);
int utw_let_is_set(const utw_let *let, int k);

#endif
