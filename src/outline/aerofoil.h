/* SPDX-License-Identifier: GPL-3.0-or-later
 * Aerofoil boxes: a skin, spars with or without caps, perhaps a solid nose and tail. */
#ifndef UTW_OUTLINE_AEROFOIL_H
#define UTW_OUTLINE_AEROFOIL_H

#include "outline/outline.h"

enum { UTW_AEROFOIL_SPARS = 32, UTW_AEROFOIL_STATIONS = 64, UTW_AEROFOIL_POINTS = 10000 };

/** A spar: a web square to the chord, and caps inside both skins. */
typedef struct utw_aerofoil_spar {
    double at; /* middle of the web, as a part of the chord from the leading edge */
    double t;  /* thickness of the web [L] */
    double cap_width,
        cap_t; /* width along the chord, thickness added to the skin [L]; 0: no caps */
} utw_aerofoil_spar;

/** How the cavity ends at the nose or at the tail. */
typedef enum utw_aerofoil_end {
    UTW_AEROFOIL_HOLLOW, /* it follows the skin */
    UTW_AEROFOIL_SOLID,  /* solid up to the first (from the last) spar */
    UTW_AEROFOIL_FACE /* solid up to (from) a stated part of the chord, with a face square to it */
} utw_aerofoil_end;

/** What an aerofoil box is made from. The chord runs along x from the leading edge at the origin.
 */
typedef struct utw_aerofoil {
    int n;           /* points of the contour */
    double (*xy)[2]; /* [n] from the trailing edge over the upper side to the leading edge and back
                        below, in chords, 0 <= x <= 1; borrowed */
    double chord;    /* [L] */
    int n_skin;      /* 0: the section is solid */
    double skin[UTW_AEROFOIL_STATIONS][2]; /* part of the chord, ascending; thickness of the skin
                                              there [L], linear between and constant beyond */
    int n_spar;
    utw_aerofoil_spar spar[UTW_AEROFOIL_SPARS]; /* by ascending `at` */
    utw_aerofoil_end nose, tail;
    double nose_at, tail_at; /* for UTW_AEROFOIL_FACE */
    double r;                /* radius of the inner corners; 0: sharp [L] */
} utw_aerofoil;

/** Points of a NACA four-digit aerofoil: `designation` such as "2412". Thickness is laid off square
 * to the mean line; sharp = 0: the trailing edge is 2.1 % of the greatest thickness, as the
 * formula gives it; 1: it is closed by the last coefficient (-0.1036 for -0.1015, common
 * practice). [out] *xy [*n][2] as utw_aerofoil.xy, returned owned: utw_free(). Source: Jacobs, Ward
 * and Pinkerton, NACA Report 460 (1933), eqs. for y_t and y_c on pp. 4-5. UTW_E_SYNTAX when it is
 * no such designation, UTW_E_NOMEM. */
utw_status utw_aerofoil_naca(const char *designation, int sharp, double (**xy)[2], int *n,
                             utw_error *err);

/** Points from the text of a list: two numbers a line, one closed run from trailing edge to
 * trailing edge in either direction, or two runs from leading to trailing edge; blank lines, lines
 * starting with #, and one line of something else at the top (a name; then perhaps two counts) are
 * passed over. They are scaled to a chord of 1 with the leading edge (the least x) at x = 0; y = 0
 * stays where it is. [out] as above. UTW_E_SYNTAX (with the line in err->line): a line that is not
 * two numbers, too few or too many points, points that do not run from edge to edge; UTW_E_NOMEM.
 */
utw_status utw_aerofoil_points(const char *text, size_t n_text, double (**xy)[2], int *n,
                               utw_error *err);

/** The part (material -1): the contour as cubics through the points, smooth but for the trailing
 * edge, and a hole for every bay between spars. [in] foil, borrowed. [out] *part, owned by the
 * caller: utw_part_clear(). The contour is the natural cubic spline through the points and the
 * inner side of the skin its true offset, square to it by the skin's thickness there; both are
 * followed by fitted cubics to 2e-7 of the chord. Where the two inner sides meet, toward the
 * trailing edge or in a nose whose radius is less than the skin's thickness, the cavity ends in
 * their crossing. Points that are symmetric about y = 0 give a drawing that is. With r > 0 the
 * inner corners are rounded (aerofoil_round.h). UTW_E_OUTLINE, UTW_E_NOMEM. */
utw_status utw_aerofoil_part(const utw_aerofoil *foil, utw_part *part, utw_error *err);

#endif
