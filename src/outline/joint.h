/* SPDX-License-Identifier: GPL-3.0-or-later
 * How the sides of two walls with thickness are joined at the node where they meet. */
#ifndef UTW_OUTLINE_JOINT_H
#define UTW_OUTLINE_JOINT_H

#include "outline/side.h"

/** A side of a wall as it comes to a node. */
typedef struct utw_arm {
    utw_side side;
    double station; /* of the node: 0 or the wall's length */
    double ahead;   /* +1 when stations grow away from the node, else -1 */
} utw_arm;

/** The boundary at a node, from the side of one wall to the side of the next one counter-clockwise.
 */
typedef struct utw_joint {
    double wedge;   /* angle between the two walls on this side of them, 0 .. 2 pi [rad] */
    int n;          /* 1: the sides meet in p[0]; 2: a straight line from p[0] to p[1] joins them */
    double p[2][2]; /* [L] */
    double s_in,
        s_out; /* stations where the side of the first wall ends and that of the second starts */
} utw_joint;

typedef enum utw_joint_fit {
    UTW_JOINT_MADE,
    UTW_JOINT_TOO_SHARP, /* the sides do not meet */
    UTW_JOINT_TINY_STEP /* two walls that go on differ in thickness by less than an edge may be long
                         */
} utw_joint_fit;

/** Join the side `in`, which comes to `node`, to the side `out`, which leaves it; joint->wedge is
 * known. `dead_end`: both are sides of one wall whose end is free. Points nearer than `touch` are
 * one, and a step is at least `detail` long [L]. The rules are those of utw_thicken(). *joint is as
 * it was unless UTW_JOINT_MADE is returned. */
utw_joint_fit utw_joint_make(const utw_arm *in, const utw_arm *out, int dead_end,
                             const double node[2], double touch, double detail, utw_joint *joint);

#endif
