/* SPDX-License-Identifier: GPL-3.0-or-later
 * Circular functions of angles in degrees: multiples of 90 are exact. */
#ifndef UTW_BASE_DEGREES_H
#define UTW_BASE_DEGREES_H

/** The angle is reduced to a rest of at most 45 degrees and a number of quarter turns before pi
 * comes in. */
double utw_sin_degrees(double degrees);
double utw_cos_degrees(double degrees);
double utw_tan_degrees(double degrees);

/** Angles in degrees; ranges are those of the C functions: [-90, 90], [0, 180], (-90, 90), (-180,
 * 180]. */
double utw_asin_degrees(double sine);
double utw_acos_degrees(double cosine);
double utw_atan_degrees(double tangent);
double utw_atan2_degrees(double y, double x);

#endif
