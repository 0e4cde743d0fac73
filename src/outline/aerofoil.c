/* SPDX-License-Identifier: GPL-3.0-or-later
 * Aerofoil boxes: the contour, and one hole for every bay between spars. */
#include "outline/aerofoil.h"

#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "outline/aerofoil_cavity.h"
#include "outline/aerofoil_round.h"
#include "outline/check_curve.h"
#include "outline/fit.h"

static const double FOLLOW = 2e-7; /* of the chord: how near cubics follow contour and inner side */
static const double LEAST = 1e-5;  /* of the chord: shortest face, narrowest bay */

/* A bay from front to tail: where it ends, and the caps it has there. A bay without a face ends as
 * the cavity does. */
typedef struct bay {
    int front_face, tail_face;
    double x0, x1;         /* [L] */
    double cap0, cap1;     /* thickness of the caps at either end; 0: none */
    double cap_x0, cap_x1; /* where they end: x0 <= cap_x0 <= cap_x1 <= x1 [L] */
} bay;

typedef struct builder {
    const utw_aerofoil *foil;
    utw_aerofoil_skin skin;
    utw_aerofoil_cavity cavity;
    utw_fit fit; /* the loop being made */
    utw_error *err;
} builder;

/* ---- what does not fit ---- */

#define FAIL(b, ...) utw_fail((b)->err, UTW_E_OUTLINE, "aerofoil: " __VA_ARGS__)

static utw_status check_skin(const builder *b)
{
    const utw_aerofoil *f = b->foil;
    if (f->n_skin == 0 && (f->n_spar > 0 || f->nose != UTW_AEROFOIL_HOLLOW ||
                           f->tail != UTW_AEROFOIL_HOLLOW || f->r > 0))
        return FAIL(b, "a solid section has no spars, nose, tail or r; leave them out, or give the "
                       "skin a thickness");
    if (!(f->r >= 0 && isfinite(f->r))) return FAIL(b, "r = %g must be 0 or more", f->r);
    for (int i = 0; i < f->n_skin; i++) {
        if (!(f->skin[i][1] > LEAST * f->chord))
            return FAIL(b,
                        "skin = %g is too thin: more than %.3g, a hundred-thousandth of the chord",
                        f->skin[i][1], LEAST * f->chord);
        if (i > 0 && !(f->skin[i][0] > f->skin[i - 1][0] + 1e-6))
            return FAIL(
                b, "the stations of the skin must go up along the chord: %g does not follow %g",
                f->skin[i][0], f->skin[i - 1][0]);
    }
    return UTW_OK;
}

static utw_status check_spar(const builder *b, int k)
{
    const utw_aerofoil_spar *s = &b->foil->spar[k];
    const double chord = b->foil->chord, x = s->at * chord;
    if (!(s->t > LEAST * chord))
        return FAIL(b, "spar %d: t = %g must be more than %.3g", k + 1, s->t, LEAST * chord);
    if (s->cap_t != 0 && !(s->cap_t > LEAST * chord && s->cap_width > s->t + 2 * LEAST * chord))
        return FAIL(b,
                    "spar %d: caps of width %g and thickness %g; they must be wider than the web, "
                    "%g, and have a thickness",
                    k + 1, s->cap_width, s->cap_t, s->t);
    const double half = fmax(s->t, s->cap_width) / 2;
    if (!(x - half > b->cavity.x0 && x + half < b->cavity.x1))
        return FAIL(
            b,
            "spar %d at %g reaches from %.4g to %.4g of the chord; the cavity, from %.4g to %.4g",
            k + 1, s->at, s->at - half / chord, s->at + half / chord, b->cavity.x0 / chord,
            b->cavity.x1 / chord);
    if (k == 0) return UTW_OK;
    const utw_aerofoil_spar *before = &b->foil->spar[k - 1];
    const double reach = fmax(before->t, before->cap_width) / 2 + half;
    if (!(x - before->at * chord > reach + LEAST * chord))
        return FAIL(b,
                    "spars %d and %d, at %g and %g, overlap: their webs or caps need %.4g, %.4g of "
                    "the chord",
                    k, k + 1, before->at, s->at, reach, reach / chord);
    return UTW_OK;
}

static utw_status check_ends(const builder *b)
{
    const utw_aerofoil *f = b->foil;
    const double x0 = b->cavity.x0 / f->chord, x1 = b->cavity.x1 / f->chord;
    if ((f->nose == UTW_AEROFOIL_SOLID || f->tail == UTW_AEROFOIL_SOLID) && f->n_spar == 0)
        return FAIL(b, "a solid nose or tail ends at a spar, and there is none; give a spar, or "
                       "the part of the chord where it ends");
    if (f->nose == UTW_AEROFOIL_FACE && !(f->nose_at > x0 + LEAST && f->nose_at < x1 - LEAST))
        return FAIL(b, "nose: %g must lie in the cavity, from %.4g to %.4g of the chord",
                    f->nose_at, x0, x1);
    if (f->tail == UTW_AEROFOIL_FACE && !(f->tail_at > x0 + LEAST && f->tail_at < x1 - LEAST))
        return FAIL(b, "tail: %g must lie in the cavity, from %.4g to %.4g of the chord",
                    f->tail_at, x0, x1);
    if (f->tail == UTW_AEROFOIL_HOLLOW && b->cavity.open_tail)
        return FAIL(b, "the trailing edge is so thick that the skins do not meet; close the cavity "
                       "with \"tail\"");
    return UTW_OK;
}

/* ---- bays ---- */

/* Bay k, ahead of spar k, from the faces of the spars or the ends of the cavity. Returns 0 for what
 * is solid. */
static int make_bay(const builder *b, int k, bay *y)
{
    const utw_aerofoil *f = b->foil;
    *y = (bay){.x0 = b->cavity.x0, .x1 = b->cavity.x1};
    if (k == 0) {
        if (f->nose == UTW_AEROFOIL_SOLID) return 0;
        if (f->nose == UTW_AEROFOIL_FACE) y->front_face = 1, y->x0 = f->nose_at * f->chord;
    } else {
        const utw_aerofoil_spar *s = &f->spar[k - 1];
        y->front_face = 1;
        y->x0 = s->at * f->chord + s->t / 2;
        y->cap0 = s->cap_t;
    }
    y->cap_x0 = y->cap0 > 0 ? f->spar[k - 1].at * f->chord + f->spar[k - 1].cap_width / 2 : y->x0;
    if (k == f->n_spar) {
        if (f->tail == UTW_AEROFOIL_SOLID) return 0;
        if (f->tail == UTW_AEROFOIL_FACE) y->tail_face = 1, y->x1 = f->tail_at * f->chord;
    } else {
        const utw_aerofoil_spar *s = &f->spar[k];
        y->tail_face = 1;
        y->x1 = s->at * f->chord - s->t / 2;
        y->cap1 = s->cap_t;
    }
    y->cap_x1 = y->cap1 > 0 ? f->spar[k].at * f->chord - f->spar[k].cap_width / 2 : y->x1;
    return 1;
}

static utw_status check_bay(const builder *b, const bay *y)
{
    if (y->cap_x1 - y->cap_x0 > LEAST * b->foil->chord && y->x1 - y->x0 > LEAST * b->foil->chord)
        return UTW_OK;
    return FAIL(b,
                "between %.4g and %.4g of the chord there is no room for a bay: nose, tail, spars "
                "and caps overlap",
                y->x0 / b->foil->chord, y->x1 / b->foil->chord);
}

/* ---- loops ---- */

/* Where between u0 < u1 the skin's thickness has its kinks, in order. Returns their number. Kinks
 * so near an end that no piece would be left are left out. */
static int find_kinks(const builder *b, double u0, double u1,
                      double kink[2 * UTW_AEROFOIL_STATIONS])
{
    int n = 0;
    for (int i = 0; b->foil->n_skin > 1 && i < b->foil->n_skin; i++)
        for (int side = 0; side < 2; side++) {
            const double u =
                utw_aerofoil_outer_at(&b->skin, b->foil->skin[i][0] * b->foil->chord, side);
            if (!(u - u0 > 1e-6 && u1 - u > 1e-6)) continue;
            int k = n++;
            for (; k > 0 && kink[k - 1] > u; k--) kink[k] = kink[k - 1];
            kink[k] = u;
        }
    return n;
}

/* Append the mirror image in y = 0 of the first n curves, run backward. */
static utw_status mirror(builder *b, size_t n)
{
    for (size_t i = n; i-- > 0;) {
        utw_curve c = utw_curve_reversed(&b->fit.curve[i]); /* lines and cubics only */
        c.from[1] = -c.from[1];
        c.to[1] = -c.to[1];
        c.c1[1] = -c.c1[1];
        c.c2[1] = -c.c2[1];
        const utw_status st = utw_fit_append(&b->fit, c, b->err);
        if (st != UTW_OK) return st;
    }
    return UTW_OK;
}

/* The inner side does not turn back on itself between u0 < u1, as it would where the contour has a
 * lesser radius than the skin's thickness; seen at every eighth of a piece of the contour. */
static utw_status check_fold(const builder *b, double extra, double u0, double u1)
{
    const utw_aerofoil_offset offset = {&b->skin, extra, UTW_AEROFOIL_ANY};
    for (double u = u0 + 0.0625; u < u1; u += 0.125) {
        double p[2], d1[2], d2[2];
        if (utw_aerofoil_stretch(&offset, u) > 0) continue;
        utw_aerofoil_outer(&b->skin, u, p, d1, d2);
        return FAIL(b,
                    "near (%.4g, %.4g) of the chord the contour bends more sharply than the skin%s "
                    "there can follow; make it thinner, or smooth the points",
                    p[0] / b->foil->chord, p[1] / b->foil->chord,
                    extra > 0 ? " with the caps" : "");
    }
    return UTW_OK;
}

/* Append the inner side between u0 < u1. */
static utw_status follow(builder *b, double extra, double u0, double u1, const double from[2],
                         const double to[2])
{
    utw_status st = UTW_E_INTERNAL;
    double kink[2 * UTW_AEROFOIL_STATIONS], p[2], q[2], d1[2], d2[2], start = u0;
    const int n = find_kinks(b, u0, u1, kink);
    UTW_TRY(check_fold(b, extra, u0, u1));
    memcpy(p, from, sizeof p);
    for (int k = 0; k <= n; k++) {
        const double end = k < n ? kink[k] : u1;
        const utw_aerofoil_offset offset = {&b->skin, extra,
                                            utw_aerofoil_segment(&b->skin, 0.5 * (start + end))};
        memcpy(q, to, sizeof q);
        if (k < n) utw_aerofoil_inner(&offset, end, q, d1, d2);
        UTW_TRY(utw_fit_cubics(utw_aerofoil_inner, &offset, start, end, p, q,
                               FOLLOW * b->foil->chord, &b->fit, b->err));
        memcpy(p, q, sizeof p);
        start = end;
    }
    st = UTW_OK;
done:
    return st;
}

/* u and point of an inner side at x; the message names the spar or the face when it is not there.
 */
static utw_status inner_at(const builder *b, double extra, double x, int side, double *u,
                           double p[2])
{
    const utw_aerofoil_offset offset = {&b->skin, extra, UTW_AEROFOIL_ANY};
    double d1[2], d2[2];
    *u = utw_aerofoil_inner_at(&offset, x, side);
    if (isnan(*u))
        return FAIL(b, "at %.4g of the chord there is no room inside the skin%s",
                    x / b->foil->chord, extra > 0 ? " and the caps" : "");
    utw_aerofoil_inner(&offset, *u, p, d1, d2);
    p[0] = x;
    return UTW_OK;
}

/* A stretch of a bay with one thickness of skin and cap. */
typedef struct zone {
    double x[2];    /* its ends: toward the tail, toward the nose [L] */
    int natural[2]; /* 1: the cavity itself ends there */
    double extra;   /* [L] */
} zone;

/* From tail to nose. Returns their number. */
static int make_zones(const bay *y, zone z[3])
{
    int n = 0;
    if (y->cap1 > 0) z[n++] = (zone){{y->x1, y->cap_x1}, {0, 0}, y->cap1};
    z[n++] = (zone){{y->cap_x1, y->cap_x0}, {!y->tail_face, !y->front_face}, 0};
    if (y->cap0 > 0) z[n++] = (zone){{y->cap_x0, y->x0}, {0, 0}, y->cap0};
    return n;
}

/* u and point of one end (0: toward the tail) of a zone on one side. */
static utw_status zone_end(const builder *b, const zone *z, int end, int side, double *u,
                           double p[2])
{
    const utw_aerofoil_crossing *c = end == 0 ? &b->cavity.tail : &b->cavity.front;
    if (!z->natural[end]) return inner_at(b, z->extra, z->x[end], side, u, p);
    *u = c->u[side];
    memcpy(p, c->p, sizeof c->p);
    if (b->skin.symmetric) p[1] = 0;
    return UTW_OK;
}

static utw_status check_height(const builder *b, const zone *z, double x)
{
    utw_status st = UTW_E_INTERNAL;
    double u, top[2], bottom[2];
    UTW_TRY(inner_at(b, z->extra, x, 0, &u, top));
    UTW_TRY(inner_at(b, z->extra, x, 1, &u, bottom));
    if (top[1] - bottom[1] > LEAST * b->foil->chord) return UTW_OK;
    st = FAIL(b, "at %.4g of the chord there is no room inside the skin%s", x / b->foil->chord,
              z->extra > 0 ? " and the caps" : "");
done:
    return st;
}

/* The upper side stays above the lower one: at the faces, where the skin's thickness has its kinks,
 * and between. */
static utw_status check_zone(const builder *b, const zone *z)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_aerofoil *f = b->foil;
    for (int end = 0; end < 2; end++)
        if (!z->natural[end]) UTW_TRY(check_height(b, z, z->x[end]));
    for (int k = 1; k < 4; k++) UTW_TRY(check_height(b, z, z->x[1] + k * (z->x[0] - z->x[1]) / 4));
    for (int k = 0; k < f->n_skin; k++) {
        const double x = f->skin[k][0] * f->chord, margin = 2 * LEAST * f->chord;
        if (x > z->x[1] + margin && x < z->x[0] - margin) UTW_TRY(check_height(b, z, x));
    }
    st = UTW_OK;
done:
    return st;
}

/* A straight face from where the loop stands to p. */
static utw_status face_to(builder *b, const double p[2])
{
    if (b->fit.n == 0) return UTW_OK;
    const double *here = b->fit.curve[b->fit.n - 1].to;
    if (here[0] == p[0] && here[1] == p[1]) return UTW_OK;
    return utw_fit_append(&b->fit, utw_curve_line(here, p), b->err);
}

/* The loop that has been fitted becomes loop[n_loop] of the part. */
static utw_status take_loop(builder *b, utw_part *part, int clockwise)
{
    utw_error *err = b->err;
    utw_status st = UTW_E_INTERNAL;
    utw_loop *loop = &part->loop[part->n_loop];
    UTW_TRY_ALLOC(loop->vertex = utw_alloc(b->fit.n, sizeof *loop->vertex));
    part->n_loop++;
    loop->curve = b->fit.curve;
    loop->n = (int)b->fit.n;
    for (int k = 0; k < loop->n; k++) loop->vertex[k] = k;
    b->fit = (utw_fit){.n = 0};
    if ((utw_loop_area(loop) < 0) != clockwise) utw_loop_reverse(loop);
    st = UTW_OK;
done:
    return st;
}

/* One side of a zone, joined by a face to what is there: above from tail to nose, below back. */
static utw_status make_side(builder *b, const zone *z, int side)
{
    utw_status st = UTW_E_INTERNAL;
    double u[2], p[2][2];
    for (int i = 0; i < 2; i++) UTW_TRY(zone_end(b, z, side == 0 ? i : 1 - i, side, &u[i], p[i]));
    UTW_TRY(face_to(b, p[0]));
    UTW_TRY(follow(b, z->extra, u[0], u[1], p[0], p[1]));
    st = UTW_OK;
done:
    return st;
}

/* Upper side from tail to nose, front face, lower side from nose to tail, rear face. */
static utw_status make_hole(builder *b, const bay *y, utw_part *part)
{
    utw_status st = UTW_E_INTERNAL;
    zone z[3];
    const int n = make_zones(y, z);
    for (int k = 0; k < n; k++) UTW_TRY(check_zone(b, &z[k]));
    for (int k = 0; k < n; k++) UTW_TRY(make_side(b, &z[k], 0));
    if (b->skin.symmetric) {
        const double *last = b->fit.curve[b->fit.n - 1].to;
        const size_t upper = b->fit.n;
        UTW_TRY(face_to(b, (double[2]){last[0], -last[1]}));
        UTW_TRY(mirror(b, upper));
    } else {
        for (int k = n - 1; k >= 0; k--) UTW_TRY(make_side(b, &z[k], 1));
    }
    UTW_TRY(face_to(b, b->fit.curve[0].from));
    if (b->foil->r > 0) UTW_TRY(utw_aerofoil_round(&b->fit, b->foil->r, b->err));
    UTW_TRY(take_loop(b, part, 1));
    st = UTW_OK;
done:
    return st;
}

static utw_status make_outline(builder *b, utw_part *part)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_aerofoil_skin *skin = &b->skin;
    const double *from = skin->piece[0].from, *to = skin->piece[skin->n - 1].to;
    utw_error *err = b->err;
    const double tolerance = FOLLOW * b->foil->chord;
    double nose[2], d1[2], d2[2];
    utw_aerofoil_outer(skin, skin->nose, nose, d1, d2);
    if (skin->symmetric) nose[1] = 0;
    UTW_TRY(utw_fit_cubics(utw_aerofoil_outer, skin, 0, skin->nose, from, nose, tolerance, &b->fit,
                           err));
    if (skin->symmetric)
        UTW_TRY(mirror(b, b->fit.n));
    else
        UTW_TRY(utw_fit_cubics(utw_aerofoil_outer, skin, skin->nose, skin->n, nose, to, tolerance,
                               &b->fit, err));
    if (b->fit.n > (size_t)skin->n) { /* a rough list of points: its own spline is shorter */
        b->fit.n = 0;
        for (int k = 0; k < skin->n; k++) UTW_TRY(utw_fit_append(&b->fit, skin->piece[k], err));
    }
    /* a trailing edge thinner than an edge may be is closed */
    utw_curve *last = &b->fit.curve[b->fit.n - 1];
    if (utw_distance(from, last->to) <= 4 * UTW_DETAIL * b->foil->chord)
        memcpy(last->to, from, sizeof last->to);
    else
        UTW_TRY(face_to(b, from));
    UTW_TRY(take_loop(b, part, 0));
    st = UTW_OK;
done:
    return st;
}

static utw_status make_part(builder *b, utw_part *part)
{
    utw_status st = UTW_E_INTERNAL;
    utw_error *err = b->err;
    const int solid = b->foil->n_skin == 0;
    UTW_TRY(check_skin(b));
    UTW_TRY(utw_aerofoil_skin_init(&b->skin, b->foil, err));
    if (!solid) UTW_TRY(utw_aerofoil_find_cavity(&b->skin, &b->cavity, err));
    if (!solid) UTW_TRY(check_ends(b));
    for (int k = 0; k < b->foil->n_spar; k++) UTW_TRY(check_spar(b, k));
    UTW_TRY_ALLOC(part->loop = utw_alloc((size_t)b->foil->n_spar + 2, sizeof *part->loop));
    UTW_TRY(make_outline(b, part));
    for (int k = 0; !solid && k <= b->foil->n_spar; k++) {
        bay y;
        if (!make_bay(b, k, &y)) continue;
        UTW_TRY(check_bay(b, &y));
        UTW_TRY(make_hole(b, &y, part));
    }
    st = UTW_OK;
done:
    return st;
}

utw_status utw_aerofoil_part(const utw_aerofoil *foil, utw_part *part, utw_error *err)
{
    builder b = {.foil = foil, .err = err};
    utw_part made = {.material = -1};
    if (!(foil->n >= 7 && foil->chord > 0 && isfinite(foil->chord)))
        return utw_fail(err, UTW_E_OUTLINE, "aerofoil: chord = %g must be more than 0",
                        foil->chord);
    const utw_status st = make_part(&b, &made);
    utw_aerofoil_skin_clear(&b.skin);
    utw_free(b.fit.curve);
    if (st == UTW_OK)
        *part = made;
    else
        utw_part_clear(&made);
    return st;
}
