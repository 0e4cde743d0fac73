/* SPDX-License-Identifier: GPL-3.0-or-later
 * Colours, and the maps from values to colours.
 *
 * Both maps are built in CIE L*a*b* (CIE 015:2018; ISO/CIE 11664-4:2019) for the D65 white of sRGB
 * (IEC 61966-2-1:1999), whose lightness L* and distances come from measurements of what people see.
 * Lightness runs evenly one way (from end to zero and from zero to end), so that a grey print keeps
 * the order of the values, sign included; the signs are blue and yellow, which those who confuse
 * red and green tell apart (Vienot, Brettel and Mollon, Color Research and Application 24 (1999)
 * 243-252). */
#ifndef UTW_DRAW_COLOUR_H
#define UTW_DRAW_COLOUR_H

/** Red, green, blue of sRGB, 0 .. 1. */
typedef struct utw_colour {
    double r, g, b;
} utw_colour;

/** The colour of L* (0 .. 100), a*, b*. Colours that sRGB does not have lose chroma until it has.
 */
utw_colour utw_colour_lab(double L, double a, double b);

/** L*, a*, b* of a colour. */
void utw_colour_to_lab(utw_colour colour, double lab[3]);

/** Signed values, -1 .. 1 (beyond: the ends): deep blue, neutral grey at 0, amber. */
utw_colour utw_colour_signed(double value);

/** Magnitudes, 0 .. 1 (beyond: the ends): from near white by ochre and brick to dark plum. */
utw_colour utw_colour_magnitude(double value);

/** Black or white, whichever reads better on a colour. */
utw_colour utw_colour_on(utw_colour ground);

/** Colours of the look that all pictures share. */
utw_colour utw_ink(void);    /* outlines, text */
utw_colour utw_pale(void);   /* text of second rank, dimension lines */
utw_colour utw_metal(void);  /* the section where it shows no value */
utw_colour utw_accent(void); /* what the eye should find: shear centre, load */
utw_colour utw_second(void); /* the second accent: centre of flexure */
utw_colour utw_white(void);

#endif
