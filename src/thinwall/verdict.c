/* SPDX-License-Identifier: GPL-3.0-or-later
 * The judgement of a comparison in words. */
#include <math.h>

#include "base/decimal.h"
#include "section/solution.h"
#include "thinwall/compare.h"

#define MENTIONED 0.1  /* share of the area in corners from which it is a reason */
#define FILLETS   0.01 /* area error from which it is one */
enum { LISTED = 5 };   /* walls named one by one */

static const char *shown(double x, int digits, char text[UTW_DECIMAL_LENGTH])
{
    utw_decimal_short(x, digits, text);
    return text;
}

/* "5.3 %": two digits, of large ones no fraction. */
static void add_per_cent(utw_text *text, double x)
{
    char number[UTW_DECIMAL_LENGTH];
    const double percent = 100 * fabs(x);
    if (percent >= 1e5)
        utw_text_add(text, "more than 100000 %%");
    else if (percent >= 100)
        utw_text_add(text, "%.0f %%", percent);
    else
        utw_text_add(text, "%s %%", shown(percent, 2, number));
}

/* How the thin-walled value is wrong. */
static void add_fault(utw_text *text, const utw_compared *row)
{
    const int more = row->difference > 0;
    switch (row->base) {
    case UTW_OF_SOLID:
        utw_text_add(text, ", which it %sestimates by ", more ? "over" : "under");
        add_per_cent(text, row->difference);
        break;
    case UTW_OF_WIDTH:
    case UTW_OF_DEPTH:
        utw_text_add(text, ", which it puts ");
        add_per_cent(text, row->difference);
        if (row->base == UTW_OF_WIDTH)
            utw_text_add(text, " of the width too far %s", more ? "right" : "left");
        else
            utw_text_add(text, " of the depth too far %s", more ? "up" : "down");
        break;
    case UTW_OF_MEAN:
        utw_text_add(text, ", which it misses by ");
        add_per_cent(text, row->difference);
        utw_text_add(text, " of sqrt(Ixx Iyy)");
        break;
    }
}

static int count_within(const utw_comparison *c, int within)
{
    int n = 0;
    for (int k = 0; k < UTW_COMPARED; k++)
        n += c->row[k].absent == NULL && c->row[k].within == within;
    return n;
}

/* "A, Ixx and J" */
static void add_names(const utw_comparison *c, utw_text *text)
{
    const int n = count_within(c, 1);
    for (int k = 0, i = 0; k < UTW_COMPARED; k++) {
        if (c->row[k].absent != NULL || !c->row[k].within) continue;
        utw_text_add(text, "%s%s",
                     i == 0       ? ""
                     : i + 1 == n ? " and "
                                  : ", ",
                     utw_constant_key(c->row[k].which));
        i++;
    }
}

void utw_verdict_write(const utw_comparison *c, utw_text *text)
{
    char percent[UTW_DECIMAL_LENGTH];
    const char *doubt = utw_idealisation_doubt(c->idealisation);
    const int good = count_within(c, 1), bad = count_within(c, 0);
    (void)shown(100 * c->limit, 4, percent);
    if (doubt[0] != '\0') utw_text_add(text, "%s ", doubt);
    if (bad == 0) {
        utw_text_add(text,
                     "The thin-walled idealisation may be used here for all that is compared: ");
        add_names(c, text);
        utw_text_add(text, " %s within %s %%.", good == 1 ? "is" : "are", percent);
        return;
    }
    if (good == 0) {
        utw_text_add(text,
                     "The thin-walled idealisation may not be used here: nothing is within %s %%.",
                     percent);
        return;
    }
    utw_text_add(text, "The thin-walled idealisation may be used here for ");
    add_names(c, text);
    utw_text_add(text, " (within %s %%); not for ", percent);
    for (int k = 0, i = 0; k < UTW_COMPARED; k++) {
        if (c->row[k].absent != NULL || c->row[k].within) continue;
        if (i++ > 0) utw_text_add(text, ", nor for ");
        utw_text_add(text, "%s", utw_constant_key(c->row[k].which));
        add_fault(text, &c->row[k]);
    }
    utw_text_add(text, ".");
}

/* ---- reasons ---- */

static const char *length_unit(const utw_comparison *c)
{
    return c->solution->outline->length_unit;
}

/* Walls that are not slender; how slender the others are. */
static void add_slenderness(const utw_comparison *c, utw_text *text)
{
    const utw_idealisation *ideal = c->idealisation;
    char number[UTW_DECIMAL_LENGTH];
    int n = 0, stubby = 0, listed = 0;
    double least = HUGE_VAL;
    for (int i = 0; i < ideal->midline.n_walls; i++) {
        const utw_wall_info *w = &ideal->wall[i];
        if (w->kind != UTW_WALL_PLATE) continue;
        n++;
        stubby += !w->slender;
        least = fmin(least, w->slenderness);
    }
    if (n == 0) return;
    if (stubby == 0) {
        utw_text_add(text, "Walls are slender: at least %s times as long as thick.",
                     shown(least, 3, number));
        return;
    }
    utw_text_add(text, "%d of %d walls %s less than %g times as long as thick: ", stubby, n,
                 stubby == 1 ? "is" : "are", UTW_SLENDER);
    for (int i = 0; i < ideal->midline.n_walls && listed < LISTED; i++) {
        const utw_wall_info *w = &ideal->wall[i];
        if (w->kind != UTW_WALL_PLATE || w->slender) continue;
        utw_text_add(text, "%swall %d (%s times)", listed == 0 ? "" : ", ", i + 1,
                     shown(w->slenderness, 2, number));
        listed++;
    }
    utw_text_add(text, stubby > LISTED ? ", and more." : ".");
}

static void add_lumps(const utw_comparison *c, utw_text *text)
{
    const utw_idealisation *ideal = c->idealisation;
    int n = 0;
    for (int i = 0; i < ideal->midline.n_walls; i++) {
        const utw_wall_info *w = &ideal->wall[i];
        char length[UTW_DECIMAL_LENGTH], thick[UTW_DECIMAL_LENGTH];
        if (w->kind != UTW_WALL_LUMP || n++ >= LISTED) continue;
        utw_text_add(
            text,
            "%sWall %d is a thick part, %s %s long and %s %s thick on average: it is taken "
            "as a wall of its own width.",
            n == 1 ? "" : " ", i + 1, shown(w->length, 3, length), length_unit(c),
            shown(w->thickness, 3, thick), length_unit(c));
    }
    if (n > LISTED) utw_text_add(text, " So are %d more.", n - LISTED);
}

static void add_share(const utw_comparison *c, utw_text *text)
{
    const double share = c->idealisation->info.area_share;
    if (share < MENTIONED) return;
    add_per_cent(text, share);
    utw_text_add(
        text, " of the area lies in corners, junctions, fillets and thick parts, not between two "
              "faces of a wall.");
}

static void add_area(const utw_comparison *c, utw_text *text)
{
    const double error = c->idealisation->info.area_error;
    if (fabs(error) < FILLETS) return;
    utw_text_add(text, "The midline has ");
    add_per_cent(text, error);
    utw_text_add(
        text,
        error < 0
            ? " less area than the section: fillets and what lies in corners are no part of it."
            : " more area than the section: walls overlap where they meet.");
}

static void add_links(const utw_comparison *c, utw_text *text)
{
    const int n = c->idealisation->info.links;
    if (n == 0) return;
    utw_text_add(text, "%d %s between midlines that do not meet %s put in.", n,
                 n == 1 ? "link" : "links", n == 1 ? "is" : "are");
}

static void add_warping(const utw_comparison *c, utw_text *text)
{
    const utw_thin_constants *t = utw_thin_get(c->idealisation->thin);
    if (t->Iw > 0 || !(t->Iw_secondary > 0)) return;
    utw_text_add(text,
                 "The midline does not warp: the thin-walled Iw is that of warping across the "
                 "walls alone.");
}

void utw_reasons_write(const utw_comparison *c, utw_text *text)
{
    static void (*const writers[])(const utw_comparison *, utw_text *) = {
        add_slenderness, add_share, add_lumps, add_area, add_links, add_warping};
    for (size_t k = 0; k < sizeof writers / sizeof writers[0]; k++) writers[k](c, &text[k]);
}
