/* SPDX-License-Identifier: GPL-3.0-or-later
 * Closed solution of unsymmetric bending with shear.
 *
 * With M = (int sigma x dA, int sigma y dA), C = (E I)^-1, I = [[Iyy, Ixy], [Ixy, Ixx]], a the
 * shear flexibility and Rn the n-fold integral of the load (R0 = force applied up to z): V = V0 -
 * R0,  M = M0 + V0 z - R1,  psi = psi0 - C (M0 z + V0 z^2/2 - R2), u = u0 + psi0 z - C (M0 z^2/2 +
 * V0 z^3/6 - R3) + a (V0 z - R1). The eight constants follow from two conditions an end in each
 * plane. Below, R1, R2, R3 at z = L are written R1, R2, R3. */
#include "bar/bending.h"

#include <math.h>

/* Integrals of the load up to z: r[n][axis]. */
static void load_integrals(const utw_bending_bar *bar, double z, int past_force, double r[4][2])
{
    const double t = fmax(z - bar->at, 0);
    const double point[4] = {past_force ? 1 : 0, t, t * t / 2, t * t * t / 6};
    const double uniform[4] = {z, z * z / 2, z * z * z / 6, z * z * z * z / 24};
    for (int n = 0; n < 4; n++)
        for (int k = 0; k < 2; k++)
            r[n][k] = bar->force[k] * point[n] + bar->per_length[k] * uniform[n];
}

/* out = C v */
static void curve(const utw_bending_bar *bar, const double v[2], double out[2])
{
    const double d = bar->E * (bar->Ixx * bar->Iyy - bar->Ixy * bar->Ixy);
    out[0] = (bar->Ixx * v[0] - bar->Ixy * v[1]) / d;
    out[1] = (bar->Iyy * v[1] - bar->Ixy * v[0]) / d;
}

/* out = a v */
static void distort(const utw_bending_bar *bar, const double v[2], double out[2])
{
    out[0] = bar->shear[0] * v[0] + bar->shear[2] * v[1];
    out[1] = bar->shear[2] * v[0] + bar->shear[1] * v[1];
}

static utw_status check_ends(const utw_bending_bar *bar, utw_error *err)
{
    const utw_bending_end *s = &bar->start, *e = &bar->end;
    if (!s->deflection && !e->deflection)
        return utw_fail(err, UTW_E_LOAD, "bending: neither end holds the bar against deflection");
    if (!(s->deflection && e->deflection) && !s->rotation && !e->rotation)
        return utw_fail(err, UTW_E_LOAD,
                        "bending: one end holds the deflection and none the rotation; the bar "
                        "would turn about it");
    return UTW_OK;
}

static utw_status check_bar(const utw_bending_bar *b, utw_error *err)
{
    const double all[] = {b->length,       b->E,        b->Ixx,      b->Iyy,
                          b->Ixy,          b->shear[0], b->shear[1], b->shear[2],
                          b->force[0],     b->force[1], b->at,       b->per_length[0],
                          b->per_length[1]};
    for (size_t i = 0; i < sizeof all / sizeof all[0]; i++)
        if (!isfinite(all[i]))
            return utw_fail(err, UTW_E_ARGUMENT, "bending: a number of the bar is not finite");
    if (!(b->length > 0 && b->E > 0))
        return utw_fail(err, UTW_E_ARGUMENT, "bending: length %g and E = %g; both must be positive",
                        b->length, b->E);
    if (!(b->Ixx > 0 && b->Iyy > 0 && b->Ixy * b->Ixy < b->Ixx * b->Iyy))
        return utw_fail(err, UTW_E_ARGUMENT,
                        "bending: Ixx = %g, Iyy = %g, Ixy = %g are no second moments of a section",
                        b->Ixx, b->Iyy, b->Ixy);
    if (b->shear[0] < 0 || b->shear[1] < 0 || b->shear[2] * b->shear[2] > b->shear[0] * b->shear[1])
        return utw_fail(err, UTW_E_ARGUMENT,
                        "bending: %g, %g, %g are no shear flexibilities of a section", b->shear[0],
                        b->shear[1], b->shear[2]);
    if (b->at < 0 || b->at > b->length)
        return utw_fail(err, UTW_E_ARGUMENT,
                        "bending: the force acts at z = %g, off the bar (0 to %g)", b->at,
                        b->length);
    return check_ends(b, err);
}

/* V0 of a bar whose both ends hold the deflection and at least one the rotation:
 * (C c L^3 + a L) V0 = C load + a R1, the matrix a sum of two positive ones. */
static void redundant_shear(const utw_bending_bar *bar, double c, const double load[2],
                            const double r1[2], double v0[2])
{
    const double length = bar->length, x[2] = {1, 0}, y[2] = {0, 1};
    double cx[2], cy[2], ax[2], ay[2], right[2], extra[2];
    curve(bar, x, cx);
    curve(bar, y, cy);
    distort(bar, x, ax);
    distort(bar, y, ay);
    const double l3 = c * length * length * length;
    const double m00 = l3 * cx[0] + length * ax[0], m01 = l3 * cy[0] + length * ay[0];
    const double m11 = l3 * cy[1] + length * ay[1], d = m00 * m11 - m01 * m01;
    curve(bar, load, right);
    distort(bar, r1, extra);
    for (int k = 0; k < 2; k++) right[k] += extra[k];
    v0[0] = (m11 * right[0] - m01 * right[1]) / d;
    v0[1] = (m00 * right[1] - m01 * right[0]) / d;
}

/* Shear force at the start. */
static void start_shear(const utw_bending_bar *bar, double r[4][2], double v0[2])
{
    const double length = bar->length;
    const int rot0 = bar->start.rotation, rot1 = bar->end.rotation;
    double load[2] = {0, 0};
    for (int k = 0; k < 2; k++) {
        if (!bar->end.deflection) {
            v0[k] = r[0][k]; /* the free end carries nothing */
        } else if (!bar->start.deflection) {
            v0[k] = 0;
        } else if (!rot0 && !rot1) {
            v0[k] = r[1][k] / length; /* moments about the far end */
        } else if (rot0 && rot1) {
            load[k] = r[2][k] * length / 2 - r[3][k];
        } else if (rot0) {
            load[k] = r[1][k] * length * length / 2 - r[3][k];
        } else {
            load[k] = r[2][k] * length - r[3][k];
        }
    }
    if (bar->start.deflection && bar->end.deflection && (rot0 || rot1))
        redundant_shear(bar, rot0 && rot1 ? 1.0 / 12 : 1.0 / 3, load, r[1], v0);
}

/* Moment, rotation and deflection at the start, from V0. */
static void start_state(utw_bending_solution *s, double r[4][2])
{
    const utw_bending_bar *bar = &s->bar;
    const double length = bar->length, l2 = length * length;
    const int rot0 = bar->start.rotation, rot1 = bar->end.rotation;
    double bend[2], turn[2], sag[2], move[2], strain[2], shear[2];
    for (int k = 0; k < 2; k++) {
        const double at_end = s->shear[k] * length - r[1][k]; /* M(L) - M0 */
        s->moment[k] = !rot0 ? 0 : !rot1 ? -at_end : -(s->shear[k] * length / 2 - r[2][k] / length);
        bend[k] = s->moment[k] * length + s->shear[k] * l2 / 2 - r[2][k];
        sag[k] = s->moment[k] * l2 / 2 + s->shear[k] * l2 * length / 6 - r[3][k];
        strain[k] = at_end;
    }
    curve(bar, bend, turn);
    curve(bar, sag, move);
    distort(bar, strain, shear);
    for (int k = 0; k < 2; k++) {
        if (rot0)
            s->rotation[k] = 0;
        else if (rot1)
            s->rotation[k] = turn[k]; /* so that psi(L) = 0 */
        else
            s->rotation[k] = (move[k] - shear[k]) / length; /* so that u(L) = 0 */
        s->u[k] = bar->start.deflection ? 0 : move[k] - shear[k] - s->rotation[k] * length;
    }
}

utw_status utw_bending_solve(const utw_bending_bar *bar, utw_bending_solution *solution,
                             utw_error *err)
{
    if (bar == NULL || solution == NULL)
        return utw_fail(err, UTW_E_ARGUMENT, "bending: an argument is NULL");
    const utw_status st = check_bar(bar, err);
    if (st != UTW_OK) return st;
    utw_bending_solution s = {.bar = *bar};
    double r[4][2];
    load_integrals(bar, bar->length, 1, r);
    start_shear(bar, r, s.shear);
    start_state(&s, r);
    *solution = s;
    return UTW_OK;
}

void utw_bending_at(const utw_bending_solution *s, double z, utw_bending_state *state)
{
    const utw_bending_bar *bar = &s->bar;
    const double at = fmin(fmax(z, 0), bar->length);
    double r[4][2], v[2], m[2], bend[2], sag[2], strain[2], turn[2], move[2], distance[2], gamma[2];
    load_integrals(bar, at, at > bar->at || bar->at == 0, r);
    for (int k = 0; k < 2; k++) {
        v[k] = s->shear[k] - r[0][k];
        m[k] = s->moment[k] + s->shear[k] * at - r[1][k];
        bend[k] = s->moment[k] * at + s->shear[k] * at * at / 2 - r[2][k];
        sag[k] = s->moment[k] * at * at / 2 + s->shear[k] * at * at * at / 6 - r[3][k];
        strain[k] = s->shear[k] * at - r[1][k];
    }
    curve(bar, bend, turn);
    curve(bar, sag, move);
    distort(bar, strain, distance);
    distort(bar, v, gamma);
    utw_bending_state out = {.Mx = m[1], .My = -m[0], .Vx = v[0], .Vy = v[1]};
    for (int k = 0; k < 2; k++) {
        out.rotation[k] = s->rotation[k] - turn[k];
        out.slope[k] = out.rotation[k] + gamma[k];
        out.u[k] = s->u[k] + s->rotation[k] * at - move[k] + distance[k];
    }
    if (isnan(z)) out = (utw_bending_state){{NAN, NAN}, {NAN, NAN}, {NAN, NAN}, NAN, NAN, NAN, NAN};
    *state = out;
}
