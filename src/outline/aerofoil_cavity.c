/* SPDX-License-Identifier: GPL-3.0-or-later
 * Finding the cavity: both inner sides are sampled from the trailing edge forward and their
 * crossings narrowed. */
#include "outline/aerofoil_cavity.h"

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"

typedef struct sample {
    double u, p[2];
} sample;

/* One inner side from the trailing edge forward, as long as x decreases and the offset does not
 * turn back. Twice as many samples as points of the contour. */
static int sample_side(const utw_aerofoil_offset *offset, int side, sample *s)
{
    const utw_aerofoil_skin *skin = offset->skin;
    const double nose = skin->round_nose ? skin->inner_nose : skin->nose;
    const double start = side == 0 ? 0 : skin->n, step = side == 0 ? 0.5 : -0.5;
    int n = 0;
    for (int i = 0;; i++) {
        double u = start + i * step, d1[2], d2[2];
        const int last = (u - nose) * step >= 0;
        if (last) u = nose;
        s[n].u = u;
        utw_aerofoil_inner(offset, u, s[n].p, d1, d2);
        if (!last && !(utw_aerofoil_stretch(offset, u) > 0)) break;
        if (n > 0 && !(s[n].p[0] < s[n - 1].p[0])) break;
        n++;
        if (last) break;
    }
    return n;
}

/* Height of the cavity at upper sample p by linear interpolation of the lower side; *j is where to
 * look from. NAN where there is no lower side. *u: the lower side's parameter. */
static double height(const double p[2], const sample *lower, int n, int *j, double *u)
{
    while (*j + 1 < n && lower[*j + 1].p[0] > p[0]) ++*j;
    if (*j + 1 >= n || lower[*j].p[0] < p[0]) return (double)NAN;
    const sample *a = &lower[*j], *b = a + 1;
    const double t = (a->p[0] - p[0]) / (a->p[0] - b->p[0]);
    *u = a->u + t * (b->u - a->u);
    return p[1] - (a->p[1] + t * (b->p[1] - a->p[1]));
}

/* The crossing near c->u, by Newton's iteration. Returns 0 when there is none on the two branches.
 */
static int narrow(const utw_aerofoil_offset *offset, utw_aerofoil_crossing *c)
{
    const utw_aerofoil_skin *skin = offset->skin;
    double last = HUGE_VAL;
    for (int i = 0; i < 60; i++) {
        double q[2], da[2], db[2], d2[2];
        utw_aerofoil_inner(offset, c->u[0], c->p, da, d2);
        utw_aerofoil_inner(offset, c->u[1], q, db, d2);
        const double r[2] = {q[0] - c->p[0], q[1] - c->p[1]}, det = utw_cross(da, db);
        if (!(fabs(det) > 1e-12 * utw_norm(da) * utw_norm(db))) return 0;
        double step[2] = {utw_cross(r, db) / det, utw_cross(r, da) / det};
        const double most = fmax(fabs(step[0]), fabs(step[1]));
        for (int k = 0; k < 2; k++)
            c->u[k] += most > 2 ? step[k] * 2 / most : step[k]; /* no leap */
        if (!(c->u[0] >= 0 && c->u[0] < skin->nose && c->u[1] > skin->nose && c->u[1] <= skin->n))
            return 0;
        if (most < 1e-13 * skin->n || (most < 1e-9 && most >= 0.5 * last)) {
            utw_aerofoil_inner(offset, c->u[0], c->p, da, d2);
            return utw_aerofoil_stretch(offset, c->u[0]) > 0 &&
                   utw_aerofoil_stretch(offset, c->u[1]) > 0;
        }
        last = most;
    }
    return 0;
}

/* The section's greatest height and where it is, for the message. */
static utw_status no_cavity(const utw_aerofoil_skin *skin, utw_error *err)
{
    double most = 0, at = 0;
    for (int i = 1; i < 50; i++) {
        double p[2], q[2], d1[2], d2[2];
        const double x = skin->foil->chord * i / 50;
        utw_aerofoil_outer(skin, utw_aerofoil_outer_at(skin, x, 0), p, d1, d2);
        utw_aerofoil_outer(skin, utw_aerofoil_outer_at(skin, x, 1), q, d1, d2);
        if (!(p[1] - q[1] > most)) continue;
        most = p[1] - q[1];
        at = i / 50.0;
    }
    return utw_fail(err, UTW_E_OUTLINE,
                    "aerofoil: the skin fills the section, which is %.4g thick at most, at %.2g of "
                    "the chord; make it thinner, "
                    "or \"solid\"",
                    most, at);
}

/* Samples first..last of the upper side are over the cavity. */
static utw_status find_run(const utw_aerofoil_skin *skin, const sample *upper, int n_upper,
                           const sample *lower, int n_lower, double *lower_u, int *first, int *last,
                           utw_error *err)
{
    *first = *last = -1;
    for (int i = 0, j = 0; i < n_upper; i++) {
        if (!(height(upper[i].p, lower, n_lower, &j, &lower_u[i]) > 0)) continue;
        if (*first < 0) *first = i;
        if (*last >= 0 && *last < i - 1)
            return utw_fail(err, UTW_E_OUTLINE,
                            "aerofoil: the skin fills the section near %.3g of the chord, between "
                            "two cavities; make it thinner there",
                            0.5 * (upper[*last].p[0] + upper[i].p[0]) / skin->foil->chord);
        *last = i;
    }
    return *first < 0 ? no_cavity(skin, err) : UTW_OK;
}

utw_status utw_aerofoil_find_cavity(const utw_aerofoil_skin *skin, utw_aerofoil_cavity *cavity,
                                    utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_aerofoil_offset offset = {skin, 0, UTW_AEROFOIL_ANY};
    const size_t most = 2 * (size_t)skin->n + 3;
    sample *upper = NULL, *lower = NULL;
    double *lower_u = NULL;
    int first, last;
    UTW_TRY_ALLOC(upper = utw_alloc(most, sizeof *upper));
    UTW_TRY_ALLOC(lower = utw_alloc(most, sizeof *lower));
    UTW_TRY_ALLOC(lower_u = utw_alloc(most, sizeof *lower_u));
    const int n_upper = sample_side(&offset, 0, upper), n_lower = sample_side(&offset, 1, lower);
    UTW_TRY(find_run(skin, upper, n_upper, lower, n_lower, lower_u, &first, &last, err));
    utw_aerofoil_cavity c = {.round_nose = skin->round_nose};
    c.tail.u[0] = upper[first].u;
    c.tail.u[1] = lower_u[first];
    c.open_tail = !narrow(&offset, &c.tail) || c.tail.p[0] < upper[last].p[0];
    c.x1 = c.open_tail ? fmin(upper[0].p[0], lower[0].p[0]) : c.tail.p[0];
    if (c.round_nose) {
        double d1[2], d2[2];
        c.front.u[0] = c.front.u[1] = skin->inner_nose;
        utw_aerofoil_inner(&offset, skin->inner_nose, c.front.p, d1, d2);
    } else {
        c.front.u[0] = upper[last].u;
        c.front.u[1] = lower_u[last];
        if (!narrow(&offset, &c.front) ||
            c.front.p[0] > upper[last].p[0] + 1e-9 * skin->foil->chord) {
            st = no_cavity(skin, err);
            goto done;
        }
    }
    c.x0 = c.front.p[0];
    if (!(c.x0 < c.x1)) {
        st = no_cavity(skin, err);
        goto done;
    }
    *cavity = c;
    st = UTW_OK;
done:
    utw_free(upper);
    utw_free(lower);
    utw_free(lower_u);
    return st;
}
