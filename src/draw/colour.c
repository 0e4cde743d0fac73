/* SPDX-License-Identifier: GPL-3.0-or-later
 * Colour maps in CIE L*a*b*. */
#include "draw/colour.h"

#include <math.h>

#include "base/vec2.h"

/* White point D65 of sRGB: X, Z over Y (IEC 61966-2-1). */
static const double white[3] = {0.95047, 1.0, 1.08883};

/* XYZ from linear sRGB (IEC 61966-2-1). */
static const double to_xyz[3][3] = {{0.4124564, 0.3575761, 0.1804375},
                                    {0.2126729, 0.7151522, 0.0721750},
                                    {0.0193339, 0.1191920, 0.9503041}};
static const double from_xyz[3][3] = {{3.2404542, -1.5371385, -0.4985314},
                                      {-0.9692660, 1.8760108, 0.0415560},
                                      {0.0556434, -0.2040259, 1.0572252}};

static double encode(double linear)
{
    return linear <= 0.0031308 ? 12.92 * linear : 1.055 * pow(linear, 1 / 2.4) - 0.055;
}

static double decode(double value)
{
    return value <= 0.04045 ? value / 12.92 : pow((value + 0.055) / 1.055, 2.4);
}

/* The cube root of L*a*b*, with its straight piece near black. */
static double lab_f(double t)
{
    const double d = 6.0 / 29;
    return t > d * d * d ? cbrt(t) : t / (3 * d * d) + 4.0 / 29;
}

static double lab_inverse(double f)
{
    const double d = 6.0 / 29;
    return f > d ? f * f * f : 3 * d * d * (f - 4.0 / 29);
}

/* Linear sRGB; components outside 0 .. 1 do not exist on a screen. */
static void linear_of_lab(double L, double a, double b, double rgb[3])
{
    const double fy = (L + 16) / 116;
    const double xyz[3] = {white[0] * lab_inverse(fy + a / 500), white[1] * lab_inverse(fy),
                           white[2] * lab_inverse(fy - b / 200)};
    for (int i = 0; i < 3; i++)
        rgb[i] = from_xyz[i][0] * xyz[0] + from_xyz[i][1] * xyz[1] + from_xyz[i][2] * xyz[2];
}

static int exists(const double rgb[3])
{
    const double slack = 1e-6;
    for (int i = 0; i < 3; i++)
        if (!(rgb[i] >= -slack && rgb[i] <= 1 + slack)) return 0;
    return 1;
}

utw_colour utw_colour_lab(double L, double a, double b)
{
    double rgb[3], keep = 1, least = 0;
    L = fmin(fmax(L, 0), 100);
    linear_of_lab(L, a, b, rgb);
    if (!exists(rgb)) {
        for (int step = 0; step < 30; step++) { /* halve towards the greatest chroma that exists */
            const double middle = 0.5 * (least + keep);
            linear_of_lab(L, middle * a, middle * b, rgb);
            if (exists(rgb))
                least = middle;
            else
                keep = middle;
        }
        linear_of_lab(L, least * a, least * b, rgb);
    }
    for (int i = 0; i < 3; i++) rgb[i] = encode(fmin(fmax(rgb[i], 0), 1));
    return (utw_colour){rgb[0], rgb[1], rgb[2]};
}

void utw_colour_to_lab(utw_colour colour, double lab[3])
{
    const double rgb[3] = {decode(colour.r), decode(colour.g), decode(colour.b)};
    double f[3];
    for (int i = 0; i < 3; i++)
        f[i] = lab_f((to_xyz[i][0] * rgb[0] + to_xyz[i][1] * rgb[1] + to_xyz[i][2] * rgb[2]) /
                     white[i]);
    lab[0] = 116 * f[1] - 16;
    lab[1] = 500 * (f[0] - f[1]);
    lab[2] = 200 * (f[1] - f[2]);
}

static utw_colour of_hue(double L, double chroma, double degrees)
{
    const double h = degrees * (UTW_PI / 180);
    return utw_colour_lab(L, chroma * cos(h), chroma * sin(h));
}

utw_colour utw_colour_signed(double value)
{
    const double v = fmin(fmax(value, -1), 1), size = fabs(v), rest = 1 - size;
    const double chroma = 1 - rest * rest; /* rises at once, so that signs differ close to 0 */
    if (v < 0) return of_hue(64 - 40 * size, 50 * chroma, 258 + 24 * size);
    return of_hue(64 + 30 * size, 70 * chroma, 66 + 34 * size);
}

utw_colour utw_colour_magnitude(double value)
{
    const double v = fmin(fmax(value, 0), 1);
    const double lightness = 96 - 75 * v, hue = 92 - 92 * v;
    return of_hue(lightness, 6 + 4 * 44 * v * (1 - v) + 20 * v, hue);
}

utw_colour utw_colour_on(utw_colour ground)
{
    double lab[3];
    utw_colour_to_lab(ground, lab);
    return lab[0] < 52 ? utw_white() : utw_ink();
}

utw_colour utw_ink(void)
{
    return utw_colour_lab(12, 0, -4);
}

utw_colour utw_pale(void)
{
    return utw_colour_lab(42, -1, -5);
}

utw_colour utw_metal(void)
{
    return utw_colour_lab(88, -1, -3);
}

utw_colour utw_accent(void)
{
    return utw_colour_lab(48, 52, 46);
}

utw_colour utw_second(void)
{
    return utw_colour_lab(42, -18, -30);
}

utw_colour utw_white(void)
{
    return (utw_colour){1, 1, 1};
}
