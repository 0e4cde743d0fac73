/* SPDX-License-Identifier: GPL-3.0-or-later
 * The greatest value of something along a bar. */
#ifndef UTW_BAR_ALONG_H
#define UTW_BAR_ALONG_H

#include "base/status.h"

/** Most stations of a bar. */
#define UTW_STATIONS 96

/** Stations of a bar from 0 to length in which nothing jumps between neighbours but at breaks:
 * those are two stations, the second just right of the first. */
typedef struct utw_stations {
    int n;
    double z[UTW_STATIONS];
    int begins[UTW_STATIONS]; /* 1: a piece begins here */
} utw_stations;

/** Spread them: close to the ends of every piece, and within `fade` of them, where what held
 * warping does falls off as exp(-z/fade). [in] length > 0; at: where a force acts, 0 < at < length,
 * else there is one piece; fade: any number. */
void utw_stations_spread(utw_stations *stations, double length, double at, double fade);

/** Some function of the station. [out] *value. */
typedef utw_status (*utw_along_function)(const void *context, double z, double *value,
                                         utw_error *err);

/** Its greatest value: the best station, then golden sections between its neighbours (Brent,
 * Algorithms for Minimization without Derivatives, 1973, ch. 5) to `precision` of their distance,
 * for a function with one peak between neighbours. [out] *z, *value. What the function fails with.
 */
utw_status utw_along_greatest(const utw_stations *stations, utw_along_function function,
                              const void *context, double precision, double *z, double *value,
                              utw_error *err);

#endif
