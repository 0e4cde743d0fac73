/* SPDX-License-Identifier: GPL-3.0-or-later
 * The comparison of both theories as its files see it; the public functions are in untwist.h. */
#ifndef UTW_THINWALL_COMPARE_H
#define UTW_THINWALL_COMPARE_H

#include "base/text.h"
#include "thinwall/idealise.h"

enum { UTW_COMPARED = 15, UTW_MOST_REASONS = 8 };

struct utw_comparison {
    const utw_solution *solution;         /* borrowed */
    const utw_idealisation *idealisation; /* borrowed */
    double limit;
    utw_compared row[UTW_COMPARED];
    char absent[UTW_COMPARED][sizeof(((utw_error *)0)->text)];
    char *verdict; /* owned */
    int n_reason;
    char *reason[UTW_MOST_REASONS]; /* [n_reason], owned */
};

/** Row of a constant in a comparison, -1 when it is not compared; and the constant of a row. */
int utw_compared_index(utw_constant which);
utw_constant utw_compared_constant(int row);

/** Write the verdict from the rows. */
void utw_verdict_write(const utw_comparison *comparison, utw_text *text);

/** Write the reasons, [out] text[UTW_MOST_REASONS], all zero before; what stays empty is none. */
void utw_reasons_write(const utw_comparison *comparison, utw_text *text);

#endif
