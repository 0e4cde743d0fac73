/* SPDX-License-Identifier: GPL-3.0-or-later
 * Circular functions of angles in degrees. */
#include "base/degrees.h"

#include "base/vec2.h"

static const double DEGREE = UTW_PI / 180;

/* Sine of `degrees` plus a whole number of quarter turns. */
static double sine(double degrees, int quarters)
{
    int q;
    const double rest = remquo(degrees, 90, &q) * DEGREE;
    switch ((unsigned)(q + quarters) & 3u) { /* remquo gives at least the last three bits of q */
    case 0:
        return sin(rest);
    case 1:
        return cos(rest);
    case 2:
        return -sin(rest);
    default:
        return -cos(rest);
    }
}

double utw_sin_degrees(double degrees)
{
    return sine(degrees, 0);
}

double utw_cos_degrees(double degrees)
{
    return sine(degrees, 1);
}

double utw_tan_degrees(double degrees)
{
    return sine(degrees, 0) / sine(degrees, 1);
}

double utw_asin_degrees(double x)
{
    return asin(x) / DEGREE;
}

double utw_acos_degrees(double x)
{
    return acos(x) / DEGREE;
}

double utw_atan_degrees(double x)
{
    return atan(x) / DEGREE;
}

double utw_atan2_degrees(double y, double x)
{
    return atan2(y, x) / DEGREE;
}
