/* SPDX-License-Identifier: GPL-3.0-or-later
 * Faults of single curves and corners. */
#include "outline/check_curve.h"

#include <stdio.h>

#include "base/status.h"
#include "base/vec2.h"
#include "outline/intersect.h"

void utw_loop_text(char *text, size_t size, int part, int loop)
{
    if (loop == 0)
        snprintf(text, size, "part %d, outline: ", part + 1);
    else
        snprintf(text, size, "part %d, hole %d: ", part + 1, loop);
}

static int vertex_of(const utw_loop *loop, int k)
{
    return loop->vertex != NULL ? loop->vertex[k] : k;
}

void utw_edge_text(char *text, size_t size, const utw_loop *loop, int k)
{
    if (loop->n == 1)
        snprintf(text, size, "the closed curve");
    else
        snprintf(text, size, "the edge to vertex %d", vertex_of(loop, k) + 1);
}

/* Put the place before the message and into the error. */
static utw_status at_curve(utw_status st, const utw_loop *loop, int part, int index, int k,
                           utw_error *err)
{
    if (st == UTW_OK) return st;
    char text[64];
    utw_loop_text(text, sizeof text, part, index);
    utw_error_prefix(err, "%s", text);
    utw_error_place(err, part, index, k >= 0 && k < loop->n ? vertex_of(loop, k) : -1);
    return st;
}

/* ---- scale ------------------------------------------------------------------------------- */

static int all_finite(const utw_curve *c)
{
    double sum = c->from[0] + c->from[1] + c->to[0] + c->to[1];
    if (c->kind == UTW_ARC)
        sum += c->centre[0] + c->centre[1] + c->u[0] + c->u[1] + c->v[0] + c->v[1] + c->a0 + c->a1;
    if (c->kind == UTW_CUBIC) sum += c->c1[0] + c->c1[1] + c->c2[0] + c->c2[1];
    return isfinite(sum); /* a sum of finite terms that overflows is out of scale as well */
}

static utw_status check_chain(const utw_loop *loop, int part, int index, utw_error *err)
{
    utw_status st = UTW_OK;
    int k = -1;
    if (loop->n < 1) {
        st = utw_fail(err, UTW_E_OUTLINE, "the loop has no edge; give it at least three vertices");
        goto done;
    }
    for (k = 0; k < loop->n; k++) {
        const utw_curve *c = &loop->curve[k], *next = &loop->curve[(k + 1) % loop->n];
        if (!all_finite(c)) {
            st = utw_fail(err, UTW_E_OUTLINE,
                          "vertex %d has a coordinate that is not a finite number; correct it",
                          vertex_of(loop, k) + 1);
            goto done;
        }
        if (c->to[0] != next->from[0] || c->to[1] != next->from[1]) {
            st = utw_fail(err, UTW_E_OUTLINE, "the loop is open after vertex %d: close it",
                          vertex_of(loop, k) + 1);
            goto done;
        }
    }
done:
    return at_curve(st, loop, part, index, k, err);
}

static utw_status check_extent(const double box[4], double size, utw_error *err)
{
    const double away = fmax(fmax(fabs(box[0]), fabs(box[2])), fmax(fabs(box[1]), fabs(box[3])));
    if (!(size <= UTW_LARGEST))
        return utw_fail(
            err, UTW_E_OUTLINE,
            "the section is %.6g long, more than %g in the units of the file: check the units",
            size, UTW_LARGEST);
    if (!(size >= UTW_SMALLEST))
        return utw_fail(
            err, UTW_E_OUTLINE,
            "the section is %.6g long, less than %g in the units of the file: check the units",
            size, UTW_SMALLEST);
    if (away > UTW_OFFSET * size)
        return utw_fail(
            err, UTW_E_OUTLINE,
            "the section is %.6g long but lies %.6g away from the origin, so that its coordinates "
            "have too few digits left: move it toward the origin",
            size, away);
    return UTW_OK;
}

utw_status utw_check_scale(const utw_outline *outline, double *size, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    double all[4] = {HUGE_VAL, HUGE_VAL, -HUGE_VAL, -HUGE_VAL};
    if (outline->n_part < 1) {
        st = utw_fail(err, UTW_E_OUTLINE, "the section has no part; give it one");
        goto done;
    }
    for (int p = 0; p < outline->n_part; p++) {
        const utw_part *part = &outline->part[p];
        if (part->n_loop < 1) {
            st = utw_fail(err, UTW_E_OUTLINE, "part %d has no outline; give it one", p + 1);
            utw_error_place(err, p, -1, -1);
            goto done;
        }
        for (int l = 0; l < part->n_loop; l++) {
            UTW_TRY(check_chain(&part->loop[l], p, l, err));
            for (int k = 0; k < part->loop[l].n; k++) {
                double box[4];
                utw_curve_box(&part->loop[l].curve[k], box);
                for (int q = 0; q < 4; q++)
                    all[q] = q < 2 ? fmin(all[q], box[q]) : fmax(all[q], box[q]);
            }
        }
    }
    *size = hypot(all[2] - all[0], all[3] - all[1]);
    st = check_extent(all, *size, err);
done:
    return st;
}

/* ---- one curve --------------------------------------------------------------------------- */

static utw_status check_arc(const utw_curve *c, double size, const char *edge, utw_error *err)
{
    /* semi-axes: singular values of the matrix [u v] */
    const double uu = utw_dot(c->u, c->u), vv = utw_dot(c->v, c->v), uv = utw_dot(c->u, c->v);
    const double big = sqrt(0.5 * (uu + vv + hypot(uu - vv, 2 * uv)));
    const double small = big > 0 ? fabs(utw_cross(c->u, c->v)) / big : 0;
    if (small < UTW_DETAIL * size)
        return utw_fail(
            err, UTW_E_OUTLINE,
            "%s has the radius %.6g, less than %g of the section's size %.6g; make it larger or "
            "leave it out",
            edge, small, UTW_DETAIL, size);
    if (big > UTW_FLAT * size)
        return utw_fail(
            err, UTW_E_OUTLINE,
            "%s has the radius %.6g, more than %g times the section's size %.6g; draw it as a "
            "straight line",
            edge, big, UTW_FLAT, size);
    if (fabs(c->a1 - c->a0) > 2 * UTW_PI * (1 + 1e-12))
        return utw_fail(err, UTW_E_OUTLINE, "%s turns through more than a full circle; shorten it",
                        edge);
    for (int end = 0; end < 2; end++) {
        const double a = end ? c->a1 : c->a0, *p = end ? c->to : c->from;
        const double off[2] = {c->centre[0] + c->u[0] * cos(a) + c->v[0] * sin(a) - p[0],
                               c->centre[1] + c->u[1] * cos(a) + c->v[1] * sin(a) - p[1]};
        if (utw_norm(off) > 0.1 * UTW_DETAIL * size)
            return utw_fail(err, UTW_E_OUTLINE,
                            "%s: its end (%.9g, %.9g) is not on the arc but %.3g off; correct it",
                            edge, p[0], p[1], utw_norm(off));
    }
    return UTW_OK;
}

static utw_status check_cubic(const utw_curve *c, const char *edge, utw_error *err)
{
    double s = 0, t = 0, at[2];
    const utw_self what = utw_curve_meets_itself(c, &s, &t);
    utw_curve_point(c, s, at);
    switch (what) {
    case UTW_SELF_NONE:
        return UTW_OK;
    case UTW_SELF_CROSSES:
        return utw_fail(err, UTW_E_OUTLINE,
                        "%s crosses itself near (%.6g, %.6g); move its control points", edge, at[0],
                        at[1]);
    case UTW_SELF_CUSP:
        return utw_fail(err, UTW_E_OUTLINE,
                        "%s turns back on itself near (%.6g, %.6g); move its control points", edge,
                        at[0], at[1]);
    case UTW_SELF_NO_START:
        return utw_fail(
            err, UTW_E_OUTLINE,
            "%s has a control point on its end (%.6g, %.6g), so that its direction there is not "
            "given; put the control point on the tangent, a third of the way along",
            edge, at[0], at[1]);
    }
    return utw_fail(err, UTW_E_INTERNAL, "%s: unknown fault", edge);
}

static utw_status check_curve(const utw_loop *loop, int k, double size, utw_error *err)
{
    const utw_curve *c = &loop->curve[k];
    char edge[64];
    utw_edge_text(edge, sizeof edge, loop, k);
    utw_status st = UTW_E_INTERNAL;
    double box[4];
    utw_curve_box(c, box);
    const double length = hypot(box[2] - box[0], box[3] - box[1]);
    if (length <= UTW_TOUCH * size) {
        st = utw_fail(
            err, UTW_E_OUTLINE,
            "%s has no length: vertex %d repeats the one before it at (%.9g, %.9g); remove one",
            edge, vertex_of(loop, k) + 1, c->to[0], c->to[1]);
        goto done;
    }
    if (length < UTW_DETAIL * size) {
        st = utw_fail(
            err, UTW_E_OUTLINE,
            "%s is %.6g long, less than %g of the section's size %.6g; lengthen or remove it", edge,
            length, UTW_DETAIL, size);
        goto done;
    }
    if (c->kind == UTW_LINE && loop->n == 1) {
        st = utw_fail(err, UTW_E_OUTLINE,
                      "one straight edge does not enclose an area; add vertices");
        goto done;
    }
    if (c->kind == UTW_ARC) UTW_TRY(check_arc(c, size, edge, err));
    if (c->kind == UTW_CUBIC) UTW_TRY(check_cubic(c, edge, err));
    st = UTW_OK;
done:
    return st;
}

/* The corner between curve k and the next: neither may run back along the other. */
static utw_status check_corner(const utw_loop *loop, int k, utw_error *err)
{
    const utw_curve *in = &loop->curve[k], *out = &loop->curve[(k + 1) % loop->n];
    double d[2], e[2];
    utw_curve_d1(in, 1, d);
    utw_curve_d1(out, 0, e);
    const double angle = UTW_PI - fabs(atan2(utw_cross(d, e), utw_dot(d, e)));
    if (angle >= UTW_CUSP) return UTW_OK;
    return utw_fail(
        err, UTW_E_OUTLINE,
        "the edges before and after the corner at (%.6g, %.6g), vertex %d, run back along one "
        "another (the angle between them is %.3g degrees, least is %.3g); open the corner",
        in->to[0], in->to[1], vertex_of(loop, k) + 1, angle * 180 / UTW_PI,
        UTW_CUSP * 180 / UTW_PI);
}

utw_status utw_check_curves(const utw_loop *loop, int part, int index, double size, utw_error *err)
{
    utw_status st = UTW_OK;
    int k = 0;
    for (k = 0; k < loop->n; k++) UTW_TRY(check_curve(loop, k, size, err));
    for (k = 0; k < loop->n; k++) UTW_TRY(check_corner(loop, k, err));
done:
    return at_curve(st, loop, part, index, k, err);
}
