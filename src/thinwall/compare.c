/* SPDX-License-Identifier: GPL-3.0-or-later
 * Solid and thin-walled values side by side. */
#include "thinwall/compare.h"

#include <math.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "section/solution.h"

#define LEAST_LIMIT 1e-6
#define NOTHING     1e-9 /* of A r^4 (Iw), of the size (points): less is none in both */

static const utw_constant compared[UTW_COMPARED] = {UTW_A,   UTW_XC, UTW_YC, UTW_IXX, UTW_IYY,
                                                    UTW_IXY, UTW_I1, UTW_I2, UTW_J,   UTW_WT,
                                                    UTW_XS,  UTW_YS, UTW_IW, UTW_ASX, UTW_ASY};

int utw_compared_index(utw_constant which)
{
    for (int k = 0; k < UTW_COMPARED; k++)
        if (compared[k] == which) return k;
    return -1;
}

utw_constant utw_compared_constant(int row)
{
    return compared[row];
}

void utw_comparison_free(utw_comparison *c)
{
    if (c == NULL) return;
    utw_free(c->verdict);
    for (int k = 0; k < c->n_reason; k++) utw_free(c->reason[k]);
    utw_free(c);
}

int utw_comparison_count(const utw_comparison *c)
{
    (void)c;
    return UTW_COMPARED;
}

const utw_compared *utw_comparison_get(const utw_comparison *c, int k)
{
    return k >= 0 && k < UTW_COMPARED ? &c->row[k] : NULL;
}

double utw_comparison_limit(const utw_comparison *c)
{
    return c->limit;
}

const char *utw_comparison_verdict(const utw_comparison *c)
{
    return c->verdict;
}

int utw_comparison_reason_count(const utw_comparison *c)
{
    return c->n_reason;
}

const char *utw_comparison_reason(const utw_comparison *c, int k)
{
    return k >= 0 && k < c->n_reason ? c->reason[k] : NULL;
}

const utw_idealisation *utw_comparison_idealisation(const utw_comparison *c)
{
    return c->idealisation;
}

/* The thin-walled value of a constant; NULL in *why, or why there is none. */
static double thin_value(const utw_thin_constants *t, utw_constant which, const char **why)
{
    *why = NULL;
    switch (which) {
    case UTW_A:
        return t->A;
    case UTW_XC:
        return t->xc;
    case UTW_YC:
        return t->yc;
    case UTW_IXX:
        return t->Ixx;
    case UTW_IYY:
        return t->Iyy;
    case UTW_IXY:
        return t->Ixy;
    case UTW_I1:
        return t->I1;
    case UTW_I2:
        return t->I2;
    case UTW_J:
        return t->J;
    case UTW_WT:
        return t->Wt;
    case UTW_XS:
        return t->xs;
    case UTW_YS:
        return t->ys;
    case UTW_IW:
        return t->Iw > 0 ? t->Iw : t->Iw_secondary;
    case UTW_ASX:
    case UTW_ASY: {
        const double value = which == UTW_ASX ? t->Asx : t->Asy;
        if (!(value > 0))
            *why = "thin-walled theory knows no shear across walls that lie on one line";
        return value;
    }
    default:
        *why = "it is not compared";
        return 0;
    }
}

/* What the difference is divided by. */
static double base_of(const utw_solution *s, utw_compared *row)
{
    const double *box = s->outline->box;
    row->base = UTW_OF_SOLID;
    switch (row->which) {
    case UTW_XC:
    case UTW_XS:
        row->base = UTW_OF_WIDTH;
        return box[2] - box[0];
    case UTW_YC:
    case UTW_YS:
        row->base = UTW_OF_DEPTH;
        return box[3] - box[1];
    case UTW_IXY:
        row->base = UTW_OF_MEAN;
        return sqrt(s->area.Ixx * s->area.Iyy);
    default:
        return fabs(row->solid.value);
    }
}

/* A section that does not warp in either theory: both values are rounding. */
static int is_nothing(const utw_solution *s, const utw_compared *row)
{
    const double r2 = (s->area.Ixx + s->area.Iyy) / s->area.A;
    return row->which == UTW_IW &&
           fmax(fabs(row->solid.value), fabs(row->thin)) <= NOTHING * s->area.A * r2 * r2;
}

static void fill(utw_comparison *c, int k)
{
    utw_compared *row = &c->row[k];
    utw_error err;
    const char *why;
    row->which = compared[k];
    utw_error_clear(&err);
    utw_status st = utw_solution_constant(c->solution, row->which, &row->solid, &err);
    if (st == UTW_OK && !isfinite(row->solid.value))
        st =
            utw_fail(&err, UTW_E_UNBOUNDED, "%s has no finite value", utw_constant_key(row->which));
    row->thin = thin_value(utw_thin_get(c->idealisation->thin), row->which, &why);
    if (st != UTW_OK || why != NULL) {
        const char *text = st != UTW_OK ? err.text : why;
        memcpy(c->absent[k], text, strlen(text) + 1);
        row->absent = c->absent[k];
        return;
    }
    if (is_nothing(c->solution, row)) {
        row->base = UTW_OF_SOLID;
        row->within = 1;
        return;
    }
    const double base = base_of(c->solution, row);
    row->difference = (row->thin - row->solid.value) / base;
    /* at the bound further from the thin-walled value; a missing bound cannot be within */
    const double worst = fmax(fabs(row->thin - row->solid.low), fabs(row->thin - row->solid.high));
    row->within = isfinite(row->solid.low) && isfinite(row->solid.high) && worst <= c->limit * base;
}

static utw_status write_words(utw_comparison *c, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_text verdict = {.text = NULL}, reason[UTW_MOST_REASONS];
    memset(reason, 0, sizeof reason);
    utw_verdict_write(c, &verdict);
    UTW_TRY(utw_text_take(&verdict, &c->verdict, err));
    utw_reasons_write(c, reason);
    for (int k = 0; k < UTW_MOST_REASONS; k++) {
        if (reason[k].n == 0 && !reason[k].out_of_memory) continue;
        UTW_TRY(utw_text_take(&reason[k], &c->reason[c->n_reason], err));
        c->n_reason++;
    }
    st = UTW_OK;
done:
    utw_text_clear(&verdict);
    for (int k = 0; k < UTW_MOST_REASONS; k++) utw_text_clear(&reason[k]);
    return st;
}

utw_status utw_compare(const utw_solution *solution, const utw_idealisation *idealisation,
                       double limit, utw_comparison **comparison, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_comparison *c = NULL;
    if (solution == NULL || idealisation == NULL || comparison == NULL)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "utw_compare: solution, idealisation and comparison must not be NULL");
    if (!(limit >= LEAST_LIMIT && limit <= 1))
        return utw_fail(err, UTW_E_ARGUMENT, "utw_compare: the limit %g is not between %g and 1",
                        limit, LEAST_LIMIT);
    if (utw_solution_composite(solution))
        return utw_fail(err, UTW_E_MATERIAL,
                        "the parts are of different materials; the thin-walled theory is compared "
                        "for sections of one material");
    UTW_TRY_ALLOC(c = utw_alloc(1, sizeof *c));
    c->solution = solution;
    c->idealisation = idealisation;
    c->limit = limit;
    for (int k = 0; k < UTW_COMPARED; k++) fill(c, k);
    UTW_TRY(write_words(c, err));
    *comparison = c;
    c = NULL;
    st = UTW_OK;
done:
    utw_comparison_free(c);
    return st;
}
