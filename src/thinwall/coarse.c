/* SPDX-License-Identifier: GPL-3.0-or-later
 * Straight walls along the middles of chords. */
#include "thinwall/coarse.h"

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

#define CLOSE 0.35 /* of the mean width: how near the middles must be */

int utw_chord_after(const utw_branch *branch, int chord)
{
    const int last = branch->first + branch->n - 1;
    if (branch->closed && chord + 1 >= last) return branch->first;
    return chord + 1;
}

double utw_coarse_length(const utw_build *b, const utw_branch *branch, int from, int to)
{
    double length = 0, p[2], q[2];
    utw_chord_middle(b->border, &b->chordal->chord[from], p);
    for (int c = from; c != to;) {
        c = utw_chord_after(branch, c);
        utw_chord_middle(b->border, &b->chordal->chord[c], q);
        length += utw_distance(p, q);
        p[0] = q[0];
        p[1] = q[1];
    }
    return length;
}

typedef struct line {
    utw_build *build;
    const utw_branch *branch;
    double (*p)[2];      /* [n] middles */
    utw_station *middle; /* [n] the same, to fit lines to */
    int *chord;          /* [n] */
    double close;
} line;

static double off_segment(const double p[2], const double q[2], const double x[2])
{
    const double d[2] = {q[0] - p[0], q[1] - p[1]}, e[2] = {x[0] - p[0], x[1] - p[1]};
    const double dd = utw_dot(d, d), u = dd > 0 ? fmax(0, fmin(1, utw_dot(d, e) / dd)) : 0;
    const double foot[2] = {p[0] + u * d[0], p[1] + u * d[1]};
    return utw_distance(foot, x);
}

static utw_status add_leg(const line *l, int i, int j)
{
    utw_build *b = l->build;
    const double length = utw_distance(l->p[i], l->p[j]);
    if (!(length > 1e-9 * b->border->size)) return UTW_OK;
    utw_build_wall w = {.branch = (int)(l->branch - b->chordal->branch),
                        .path = utw_path_line(l->p[i], l->p[j], 1, 1),
                        .node = {-1, -1},
                        .chord = {l->chord[i], l->chord[j]}};
    /* chords at the ends lie askew: the line of least squares through all middles is better */
    utw_wall_fit fit;
    if (j - i >= 3 && utw_regress_line(l->middle + i, j - i + 1, &fit) &&
        fit.path.length > 0.5 * length)
        w.path = fit.path;
    w.path.t0 = w.path.t1 =
        utw_chordal_area(b->chordal, l->branch, l->chord[i], l->chord[j]) / w.path.length;
    return utw_build_add_wall(b, &w);
}

static utw_status simplify(const line *l, int i, int j, int least)
{
    int furthest = (i + j) / 2;
    double most = 0;
    for (int k = i + 1; k < j; k++) {
        const double off = off_segment(l->p[i], l->p[j], l->p[k]);
        if (off > most) {
            most = off;
            furthest = k;
        }
    }
    if (j - i < 2 || (least <= 1 && most <= l->close)) return add_leg(l, i, j);
    const utw_status st = simplify(l, i, furthest, least / 2);
    return st != UTW_OK ? st : simplify(l, furthest, j, least - least / 2);
}

utw_status utw_coarse_walls(utw_build *b, const utw_branch *branch, int from, int to, int least)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = b->err;
    line l = {.build = b, .branch = branch};
    int n = 1;
    for (int c = from; n <= branch->n && (c != to || (from == to && n == 1)); n++)
        c = utw_chord_after(branch, c);
    UTW_TRY_ALLOC(l.p = utw_alloc((size_t)n, sizeof *l.p));
    UTW_TRY_ALLOC(l.middle = utw_alloc((size_t)n, sizeof *l.middle));
    UTW_TRY_ALLOC(l.chord = utw_alloc((size_t)n, sizeof *l.chord));
    double length = 0;
    for (int i = 0, c = from; i < n; i++, c = utw_chord_after(branch, c)) {
        l.chord[i] = c;
        utw_chord_middle(b->border, &b->chordal->chord[c], l.p[i]);
        l.middle[i] = (utw_station){.x = {l.p[i][0], l.p[i][1]}, .t = 1};
        if (i > 0) length += utw_distance(l.p[i - 1], l.p[i]);
    }
    if (!(length > 0)) {
        st = UTW_OK;
        goto done;
    }
    /* in two parts: the whole of a ring begins and ends with the same chord */
    l.close = CLOSE / length *
              (utw_chordal_area(b->chordal, branch, from, l.chord[n / 2]) +
               utw_chordal_area(b->chordal, branch, l.chord[n / 2], to));
    UTW_TRY(simplify(&l, 0, n - 1, least));
    st = UTW_OK;
done:
    utw_free(l.p);
    utw_free(l.middle);
    utw_free(l.chord);
    return st;
}
