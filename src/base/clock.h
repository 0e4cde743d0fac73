/* SPDX-License-Identifier: GPL-3.0-or-later
 * Wall clock. */
#ifndef UTW_BASE_CLOCK_H
#define UTW_BASE_CLOCK_H

#include <time.h>

/** Seconds of a monotonic clock. */
static inline double utw_seconds(void)
{
    struct timespec t;
    clock_gettime(CLOCK_MONOTONIC, &t);
    return (double)t.tv_sec + 1e-9 * (double)t.tv_nsec;
}

#endif
