/* SPDX-License-Identifier: GPL-3.0-or-later
 * The known word a mistyped one was probably meant to be. */
#ifndef UTW_BASE_NEAREST_H
#define UTW_BASE_NEAREST_H

/** Edits (insert, remove, change a character, swap two neighbours) that turn `a` into `b`, letters compared without
 * case. Words of more than 63 bytes count as farther than any other: the result is then 1000.
 *  Method: dynamic programming over prefixes (Wagner and Fischer, J. ACM 21 (1974)
 *  168-173; swaps after Damerau, Comm. ACM 7 (1964) 171-176). */
int utw_word_distance(const char *a, const char *b);

/** Index of the candidate nearest to `word`, or -1 when none is near: at most one edit for every
 * three characters (at least one, at most three edits). [in] candidate[n], borrowed. */
int utw_nearest_word(const char *word, const char *const *candidate, int n);

#endif
