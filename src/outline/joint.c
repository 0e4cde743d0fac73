/* SPDX-License-Identifier: GPL-3.0-or-later
 * Mitres, steps, end faces. */
#include "outline/joint.h"

#include <string.h>

#include "base/vec2.h"

static const double STRAIGHT_ON =
    45 * (UTW_PI / 180); /* walls within this angle of straight go on */
static const double LONGEST_MITRE =
    4; /* times half the thickness; reached where walls fold back to 29 degrees */

static void end_point(const utw_arm *a, double p[2])
{
    double d1[2], d2[2];
    utw_side_point(&a->side, a->station, p, d1, d2);
}

static double half_thickness(const utw_arm *a)
{
    utw_path_point at;
    utw_path_at(a->side.path, a->station, &at);
    return at.t / 2;
}

static void one_point(utw_joint *j, const double p[2], double s_in, double s_out)
{
    j->n = 1;
    memcpy(j->p[0], p, sizeof j->p[0]);
    j->s_in = s_in;
    j->s_out = s_out;
}

static void two_points(utw_joint *j, const double p[2], const double q[2], double s_in,
                       double s_out)
{
    one_point(j, p, s_in, s_out);
    memcpy(j->p[1], q, sizeof j->p[1]);
    j->n = 2;
}

/* Walls that go on: where their sides meet near the node, else the thicker one's end face. */
static utw_joint_fit go_on(const utw_arm *in, const utw_arm *out, const double node[2],
                           double touch, double detail, utw_joint *j)
{
    const double ta = half_thickness(in), tb = half_thickness(out), reach = fmax(ta, tb);
    double s[2] = {in->station, out->station}, e[2][2], p[2];
    end_point(in, e[0]);
    end_point(out, e[1]);
    if (utw_distance(e[0], e[1]) <= touch) {
        one_point(j, e[0], s[0], s[1]);
        return UTW_JOINT_MADE;
    }
    if (utw_side_cross(&in->side, &out->side, reach / 2, s, p)) {
        one_point(j, p, s[0], s[1]);
        return UTW_JOINT_MADE;
    }
    const int thick = ta >= tb ? 0 : 1;
    const utw_arm *thin = thick == 0 ? out : in;
    double v[2] = {e[thick][0] - node[0], e[thick][1] - node[1]}, at = thin->station;
    const double length = utw_norm(v);
    for (int k = 0; k < 2; k++) v[k] /= length;
    if (!utw_side_cross_line(&thin->side, node, v, reach, &at, p)) return UTW_JOINT_TOO_SHARP;
    if (utw_distance(p, e[thick]) < detail) return UTW_JOINT_TINY_STEP;
    if (thick == 0)
        two_points(j, e[0], p, in->station, at);
    else
        two_points(j, p, e[1], at, out->station);
    return UTW_JOINT_MADE;
}

utw_joint_fit utw_joint_make(const utw_arm *in, const utw_arm *out, int dead_end,
                             const double node[2], double touch, double detail, utw_joint *j)
{
    double s[2] = {in->station, out->station}, e[2][2], p[2];
    const double bend = j->wedge - UTW_PI, reach = fmax(half_thickness(in), half_thickness(out));
    end_point(in, e[0]);
    end_point(out, e[1]);
    if (dead_end) {
        two_points(j, e[0], e[1], s[0], s[1]);
        return UTW_JOINT_MADE;
    }
    if (fabs(bend) < STRAIGHT_ON) return go_on(in, out, node, touch, detail, j);
    if (bend > 0) {
        if (utw_side_cross(&in->side, &out->side, 2 * LONGEST_MITRE * reach, s, p) &&
            utw_distance(p, node) <= LONGEST_MITRE * reach)
            one_point(j, p, s[0], s[1]);
        else
            two_points(j, e[0], e[1], in->station, out->station);
        return UTW_JOINT_MADE;
    }
    const double far = fmax(in->side.path->length, out->side.path->length);
    if (!utw_side_cross(&in->side, &out->side, far, s, p)) return UTW_JOINT_TOO_SHARP;
    if ((s[0] - in->station) * in->ahead < -reach || (s[1] - out->station) * out->ahead < -reach)
        return UTW_JOINT_TOO_SHARP;
    one_point(j, p, s[0], s[1]);
    return UTW_JOINT_MADE;
}
