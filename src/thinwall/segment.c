/* SPDX-License-Identifier: GPL-3.0-or-later
 * The fewest lines and arcs through the stations of a branch. */
#include "thinwall/segment.h"

#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

#define SHORTEST 0.9  /* length of a wall over its mean thickness, at least */
#define SHORT    0.3  /* the same when its faces are parallel */
#define EVEN     1e-3 /* slope and errors of the thickness of parallel faces, at most */
#define TAPERED                                                                                    \
    8.0 /* and longer by so many times the slope of its thickness: fillets are short and steep */
#define LOOSELY  3.0  /* least length over thickness of a wall that is followed more loosely */
#define STEEPEST 0.45 /* change of thickness over length, at most: more is a fillet or a bulb */
#define GAP      0.75 /* of the thickness: stations further apart belong to different stretches */
#define CORNER   (25 * UTW_PI / 180)
#define COVERED  0.7  /* of a stretch: what walls must cover of it at least */
#define MORE     0.1  /* of a stretch: how much more of it is clearly more */
#define MOST     0.8  /* of a wall that begins within a fillet is its plate, at least ... */
#define EXACT    1e-6 /* errors over the thickness that are rounding */
#define BETTER   0.25 /* ... which fits with this much of the errors, at most */
#define REFIT                                                                                      \
    3.0 /* of the thickness: what is left over and longer is tried again, more loosely             \
         */
#define SHARE                                                                                      \
    0.3 /* of the greatest thickness of the branch: thinner walls are fitted as if so              \
           thick */

#define WAIST                                                                                      \
    1.5 /* times the least thickness of a stretch: where it ends when followed most loosely */
#define STUBBY 0.5 /* length over thickness when followed most loosely, at least */
#define ONLY                                                                                       \
    0.2 /* length over thickness of the only wall of a branch, its faces nearly parallel           \
         */
#define PARALLEL 0.1 /* slope of its thickness, at most */

static const double FOLLOWS[] = {0.05, 0.1, 0.2, 0.35}, ROUGH[] = {0.02, 0.06, 0.18, 1.0};
enum { MOST_RUNS = 4 /* taken off an end of a wall */ };
enum { LEVELS = 3, LAST = 3 }; /* the last one is for branches in which nothing else was found */

typedef struct cutter {
    const utw_station *station;
    double thickest;
    utw_piece *piece;
    size_t n, capacity;
    utw_error *err;
} cutter;

static int fits(const cutter *c, int first, int last, int level, utw_wall_fit *best)
{
    const utw_station *s = c->station + first;
    const int n = last - first + 1;
    utw_wall_fit arc;
    if (n < 2 || !utw_regress_line(s, n, best)) return 0;
    const double t = fmax(best->mean, SHARE * c->thickest), off = FOLLOWS[level] * t,
                 rough = ROUGH[level] * t;
    if (best->off <= off && best->rough <= rough) return 1;
    if (!utw_regress_arc(s, n, &arc) || arc.off > off || arc.rough > rough) return 0;
    *best = arc;
    return 1;
}

static int is_wall(const utw_wall_fit *fit, int level)
{
    const double length = fit->path.length, slope = fabs(fit->path.t1 - fit->path.t0) / length;
    if (level == 0 && slope <= EVEN && fit->rough <= EVEN * fit->mean &&
        length >= SHORT * fit->mean)
        return 1;
    const double least = level == LAST ? STUBBY : SHORTEST;
    return slope <= STEEPEST && length >= least * (1 + TAPERED * slope) * fit->mean &&
           (level == 0 || level == LAST || length >= LOOSELY * fit->mean);
}

/* 1 when the next station belongs to the same stretch of wall: it lies between the same faces, or
 * near by and not around a corner. */
static int goes_on(const utw_station *a, const utw_station *b)
{
    if (!b->good) return 0;
    return (a->left == b->left && a->right == b->right) ||
           (utw_distance(a->x, b->x) < GAP * fmax(a->t, b->t) && utw_dot(a->e, b->e) > cos(CORNER));
}

/* Last station of the run of stations from `from` on toward `to` that touch the same two curves. */
static int run_end(const cutter *c, int from, int to)
{
    const utw_station *s = c->station;
    const int way = to < from ? -1 : 1;
    int i = from;
    while (i != to && s[i + way].left == s[from].left && s[i + way].right == s[from].right)
        i += way;
    return i;
}

static int fits_between(const cutter *c, int i, int k, int level, utw_wall_fit *best)
{
    return i < k ? fits(c, i, k, level, best) : fits(c, k, i, level, best);
}

/* The furthest station toward `to` that a wall from `from` on can reach, in whole runs; within the
 * first run when that is too long. Runs are tried in steps that double, then between the last two.
 * Counted from `from`, in either direction. */
static int reach(const cutter *c, int from, int to, int level, utw_wall_fit *fit)
{
    utw_wall_fit trial;
    const int way = to < from ? -1 : 1, all = abs(to - from);
    int good = abs(run_end(c, from, to) - from), bad = all + 1;
    /* a station alone is the joint of two curves and belongs to either */
    if (good == 0 && all > 0) good = abs(run_end(c, from + way, to) - from);
    if (!fits_between(c, from, from + way * good, level, fit)) {
        bad = good;
        good = 0;
        while (bad - good > 1) {
            const int middle = (good + bad) / 2;
            if (fits_between(c, from, from + way * middle, level, &trial)) {
                good = middle;
                *fit = trial;
            } else {
                bad = middle;
            }
        }
        return from + way * good;
    }
    for (int step = 1; good < all;) {
        int next = good;
        for (int k = 0; k < step && next < all; k++) {
            const int end = abs(run_end(c, from + way * (next + 1), to) - from);
            if (end >= bad) break;
            next = end;
        }
        if (next == good) break;
        if (fits_between(c, from, from + way * next, level, &trial)) {
            good = next;
            *fit = trial;
            step *= 2;
        } else {
            bad = next;
            step = 1;
        }
    }
    return from + way * good;
}

static utw_status keep(cutter *c, const utw_wall_fit *fit, int first, int last)
{
    void *array = c->piece;
    if (utw_grow(&array, &c->capacity, c->n + 1, sizeof *c->piece) != 0)
        return utw_fail(c->err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    c->piece = array;
    c->piece[c->n++] =
        first < last ? (utw_piece){fit->path, first, last} : (utw_piece){fit->path, last, first};
    return UTW_OK;
}

static double stretch(const cutter *c, int first, int last, double *mean)
{
    double length = 0;
    *mean = c->station[first].t / (last - first + 1);
    for (int i = first + 1; i <= last; i++) {
        length += utw_distance(c->station[i - 1].x, c->station[i].x);
        *mean += c->station[i].t / (last - first + 1);
    }
    return length;
}

static utw_status cut(cutter *c, int first, int last, int level);

/* What no wall was found for, once more with a wider tolerance. */
static utw_status again(cutter *c, int first, int last, int level)
{
    double mean;
    if (last <= first || level + 1 >= LEVELS || stretch(c, first, last, &mean) < REFIT * mean)
        return UTW_OK;
    return cut(c, first, last, level + 1);
}

/* What a way of cutting a stretch is worth. */
typedef struct merit {
    size_t pieces;
    double covered, error; /* length of its walls; sum of length and greatest error of each */
} merit;

/* A wall that begins within a fillet, before its plate, begins at the plate when it fits much
 * better there. */
static int plate_start(const cutter *c, int from, int end, int level, int follows,
                       utw_wall_fit *fit)
{
    const int way = end < from ? -1 : 1;
    if (fit->off + fit->rough <= EXACT * fit->mean) return from;
    for (int runs = 0, next = from; runs < MOST_RUNS; runs++) {
        utw_wall_fit trial;
        next = run_end(c, next, end) + way;
        if (follows && next != from + way) break;
        if ((end - next) * way < 1 || !fits_between(c, next, end, level, &trial)) break;
        if (!is_wall(&trial, level) || trial.path.length < MOST * fit->path.length) break;
        if (trial.off + trial.rough > BETTER * (fit->off + fit->rough)) continue;
        *fit = trial;
        return next;
    }
    return from;
}

/* Walls from one station to the next, from `from` toward `to`, as far as they reach. */
static utw_status cut_greedily(cutter *c, int from, int to, int level, merit *m)
{
    const int way = to < from ? -1 : 1;
    *m = (merit){0, 0, 0};
    for (int i = from, last = from; i != to;) {
        utw_wall_fit fit;
        int end = reach(c, i, to, level, &fit);
        if (end != i && is_wall(&fit, level)) {
            const int begin = plate_start(c, i, end, level, m->pieces > 0 && i == last, &fit);
            end = plate_start(c, end, begin, level, 0, &fit);
            const utw_status st = keep(c, &fit, begin, end);
            if (st != UTW_OK) return st;
            last = end;
            m->pieces++;
            m->covered += fit.path.length;
            m->error += fit.path.length * (fit.off + fit.rough);
        }
        i = end != i ? end : i + way;
    }
    return UTW_OK;
}

static int compare(const void *a, const void *b)
{
    return ((const utw_piece *)a)->first - ((const utw_piece *)b)->first;
}

/* 1 when the second way is better: it covers clearly more, else it has fewer walls, else they fit
 * better. */
static int is_better(const merit *a, const merit *b, double length)
{
    if (fabs(a->covered - b->covered) > MORE * length) return b->covered > a->covered;
    if (a->pieces != b->pieces) return b->pieces < a->pieces;
    return b->error < a->error;
}

/* The better of both directions: a wall found from a plate on ends where its fillet begins, one
 * found from a fillet on reaches into it. So the mirrored section is cut at the same places. */
static utw_status cut_both_ways(cutter *c, int first, int last, int level, double length,
                                double *covered)
{
    merit m[2];
    const size_t start = c->n;
    utw_status st = cut_greedily(c, first, last, level, &m[0]);
    if (st != UTW_OK) return st;
    const size_t middle = c->n;
    st = cut_greedily(c, last, first, level, &m[1]);
    if (st != UTW_OK) return st;
    const int better = is_better(&m[0], &m[1], length);
    if (better) memmove(c->piece + start, c->piece + middle, (c->n - middle) * sizeof *c->piece);
    c->n = better ? start + c->n - middle : middle;
    if (c->n > start + 1) qsort(c->piece + start, c->n - start, sizeof *c->piece, compare);
    *covered = m[better].covered;
    return UTW_OK;
}

/* Cut a stretch into walls; when they leave much of it open, a wider tolerance for all of it serves
 * better than many small walls. */
static utw_status cut(cutter *c, int first, int last, int level)
{
    const size_t start = c->n;
    double mean, covered;
    const double length = stretch(c, first, last, &mean);
    utw_status st = cut_both_ways(c, first, last, level, length, &covered);
    if (st != UTW_OK) return st;
    if (covered < COVERED * length && level + 1 < LEVELS && length >= REFIT * mean) {
        c->n = start;
        return cut(c, first, last, level + 1);
    }
    const size_t end = c->n;
    int open = first;
    for (size_t k = start; k <= end && st == UTW_OK; k++) {
        st = again(c, open, k < end ? c->piece[k].first : last, level);
        if (k < end) open = c->piece[k].last;
    }
    return st;
}

int utw_ring_start(const utw_station *s, int n)
{
    int start = 0, found = 0;
    for (int i = 0; i < n && found < 3; i++) {
        const utw_station *before = &s[(i + n - 1) % n];
        const int change = before->left != s[i].left || before->right != s[i].right;
        const int rank = !s[i].good ? 0 : !before->good ? 3 : !goes_on(before, &s[i]) ? 2 : change;
        if (rank <= found) continue;
        found = rank;
        start = i;
    }
    return start;
}

/* Leave off the ends of a stretch that are much thicker than its thinnest place: the sides of a
 * hole in a thick part. */
static void trim(const cutter *c, int *first, int *last)
{
    double least = UTW_INFINITY;
    for (int i = *first; i <= *last; i++) least = fmin(least, c->station[i].t);
    while (*first < *last && c->station[*first].t > WAIST * least) ++*first;
    while (*last > *first && c->station[*last].t > WAIST * least) --*last;
}

/* The stretches of good stations, each cut into walls. */
static utw_status cut_all(cutter *c, int n, int level)
{
    const utw_station *s = c->station;
    for (int i = 0, last; i < n; i = last + 1) {
        last = i;
        if (!s[i].good) continue;
        while (last + 1 < n && goes_on(&s[last], &s[last + 1])) last++;
        int from = i, to = last;
        if (level == LAST) trim(c, &from, &to);
        const utw_status st = cut(c, from, to, level);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}

/* The longest run with nearly parallel faces. */
static utw_status take_shortest(cutter *c, int n)
{
    utw_wall_fit best = {.mean = 0}, fit;
    int first = -1, last = -1;
    for (int i = 0, end; i < n; i = end + 1) {
        end = run_end(c, i, n - 1);
        if (!c->station[i].good || !c->station[end].good || !fits(c, i, end, 0, &fit)) continue;
        const double length = fit.path.length;
        if (length < ONLY * fit.mean || length <= best.path.length ||
            fabs(fit.path.t1 - fit.path.t0) > PARALLEL * length)
            continue;
        best = fit;
        first = i;
        last = end;
    }
    return first < 0 ? UTW_OK : keep(c, &best, first, last);
}

utw_status utw_segment(const utw_station *station, int n, utw_piece **piece, int *n_piece,
                       utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    cutter c = {.station = station, .err = err};
    for (int i = 0; i < n; i++)
        if (station[i].good) c.thickest = fmax(c.thickest, station[i].t);
    UTW_TRY(cut_all(&c, n, 0));
    if (c.n == 0) UTW_TRY(cut_all(&c, n, LAST));
    if (c.n == 0) UTW_TRY(take_shortest(&c, n));
    if (c.n > 1) qsort(c.piece, c.n, sizeof *c.piece, compare);
    *piece = c.piece;
    *n_piece = (int)c.n;
    c.piece = NULL;
    st = UTW_OK;
done:
    utw_free(c.piece);
    return st;
}
