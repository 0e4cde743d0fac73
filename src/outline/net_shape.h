/* SPDX-License-Identifier: GPL-3.0-or-later
 * Moving a net, and its sharp corners. */
#ifndef UTW_OUTLINE_NET_SHAPE_H
#define UTW_OUTLINE_NET_SHAPE_H

#include "outline/net.h"

/** Put the origin at origin[2] and measure in `unit` lengths: every point p becomes (p - origin) /
 * unit. */
void utw_net_move(utw_net *net, const double origin[2], double unit);

/** Nodes on the boundary of the section where its interior angle, all parts together, lies between
 * least and most [rad]. [out] *node [*n], returned owned: utw_free(). UTW_E_NOMEM. */
utw_status utw_net_corners(const utw_net *net, double least, double most, int **node, int *n,
                           utw_error *err);

/** Those where it exceeds least_angle: the sharp re-entrant ones. */
utw_status utw_net_sharp_corners(const utw_net *net, double least_angle, int **node, int *n,
                                 utw_error *err);

#endif
