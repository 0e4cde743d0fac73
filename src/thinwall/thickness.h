/* SPDX-License-Identifier: GPL-3.0-or-later
 * The thickness study as its files see it; the public functions are in untwist.h. */
#ifndef UTW_THINWALL_THICKNESS_H
#define UTW_THINWALL_THICKNESS_H

#include "thinwall/compare.h"

enum { UTW_MOST_STEPS = 500 };

typedef struct utw_step {
    utw_study_step open;
    double difference[UTW_COMPARED]; /* NAN where there is none */
    char why[sizeof(((utw_error *)0)->text)];
} utw_step;

struct utw_study {
    int n;
    double limit;
    utw_step *step;                /* [n], owned */
    char *statement[UTW_COMPARED]; /* owned; NULL: nothing to say */
};

/** Where row k of the comparisons crosses the limit, in a sentence; nothing when it was never
 * compared. Between steps the size of the difference is taken as linear in the thickness. */
void utw_statement_write(const utw_study *study, int k, const char *unit, utw_text *text);

#endif
