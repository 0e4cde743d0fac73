/* SPDX-License-Identifier: GPL-3.0-or-later
 * Strict check of JSON text, with line and column of the first fault. */
#ifndef UTW_OUTLINE_JSON_SCAN_H
#define UTW_OUTLINE_JSON_SCAN_H

#include "untwist.h"

#define UTW_JSON_DEEPEST 32 /* a section file needs 8 */

/** Check that text[n] is one JSON value by the grammar of RFC 8259, in UTF-8, with no more than
 *  UTW_JSON_DEEPEST brackets inside one another, numbers of at most 60 characters and no NUL in
 * strings. UTW_E_SYNTAX; the message starts with line and column (in characters, from 1), and err
 * carries both. */
utw_status utw_json_scan(const char *text, size_t n, utw_error *err);

#endif
