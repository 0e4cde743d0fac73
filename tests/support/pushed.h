/* SPDX-License-Identifier: GPL-3.0-or-later
 * A solved section with a push on a bar of it, for tests. */
#ifndef UTW_TESTS_PUSHED_H
#define UTW_TESTS_PUSHED_H

#include "support/stressed.h"

/** A plain channel with rounded roots, open to the right, h = 100, b = 50, tf = 8.5, tw = 6, r =
 * 8.5; E = 70000, nu = 0.27, yield 250. Its shear centre lies left of its web. */
extern const char *const pushed_channel;

/** A section like an aerofoil with its leading edge at (0, 0), its trailing edge at (120, 0). */
extern const char *const pushed_blade;

/** The push of a load on a bar of s, with stresses; the test fails with the message when it is
 * refused. Free with utw_push_free(). */
utw_push *pushed_by(const stressed *s, const utw_push_load *load);

/** A load: UTW_PUSH_INIT with these. */
utw_push_load pushed_load(double length, double fx, double fy, double x, double y);

#endif
