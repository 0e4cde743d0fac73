/* SPDX-License-Identifier: GPL-3.0-or-later
 * The greatest stress of a pushed bar, and the places of the load for which it stays within a
 * limit. */
#ifndef UTW_BAR_PUSH_STRESS_H
#define UTW_BAR_PUSH_STRESS_H

#include "bar/push.h"

/** The greatest von Mises stress anywhere in the bar. */
typedef struct utw_worst {
    utw_stress_peak peak;
    double z;
    int unbounded;
} utw_worst;

/** Search it for a load at an offset: the peaks of sections (section/extremes.h) at the stations of
 * the bar, then between them. push->stress must not be NULL. UTW_E_NOMEM and what
 * utw_stress_peaks_of() gives. */
utw_status utw_push_worst(const utw_push *push, double offset, utw_worst *worst, utw_error *err);

/** The offsets for which the greatest von Mises stress is at most `limit` > 0. At one point of the
 * bar the stresses are linear in the offset, so that the square of the von Mises stress is a convex
 * parabola of it; the greatest over all points is convex, and the window is one interval, which may
 * be empty and need not hold the shear centre. It is found from outside: the parabola of the worst
 * point at a trial offset lies nowhere above the square of the greatest stress, so that its own
 * interval holds the window; trials go to the ends that are left (Kelley 1960, the cutting-plane
 * method, with parabolas for planes; near an end it is Newton's). [out] *window: all but `holds`,
 * at_from, at_to. Statuses as of utw_push_worst(). */
utw_status utw_push_stress_window(const utw_push *push, double limit, utw_load_window *window,
                                  utw_error *err);

#endif
