/* SPDX-License-Identifier: GPL-3.0-or-later
 * The contour of an aerofoil as one smooth curve, and the inner side of its skin. */
#ifndef UTW_OUTLINE_AEROFOIL_SKIN_H
#define UTW_OUTLINE_AEROFOIL_SKIN_H

#include "outline/aerofoil.h"
#include "outline/fit.h"

/** The contour runs by u from the trailing edge (0) over the upper side, the nose and the lower
 * side to the trailing edge (n): the interior is to its left. Its inner side is its offset to the
 * left by the skin's thickness at the contour's point, plus `extra` where caps are. */
typedef struct utw_aerofoil_skin {
    const utw_aerofoil *foil; /* borrowed */
    utw_curve *piece;         /* [n], owned: the natural cubic spline */
    int n;
    int symmetric;     /* 1: the lower side mirrors the upper one in y = 0, to the last bit of the
                        * points
                        */
    double nose;       /* u of the least x of the contour */
    double inner_nose; /* u of the least x of the inner side (extra = 0), when it is round there */
    int round_nose;    /* 1: the inner side follows the nose; 0: its two halves cross */
} utw_aerofoil_skin;

enum { UTW_AEROFOIL_ANY = -1 };

/** The inner side with an extra thickness: context of utw_aerofoil_inner(). The skin's thickness is
 * linear from station to station; `segment` k is the one that ends at station k (0: before the
 * first, n_skin: behind the last), which then goes on beyond it, so that both sides of a kink can
 * be followed up to it. UTW_AEROFOIL_ANY: whichever holds. */
typedef struct utw_aerofoil_offset {
    const utw_aerofoil_skin *skin;
    double extra; /* [L] */
    int segment;
} utw_aerofoil_offset;

/** The segment that holds at u. */
int utw_aerofoil_segment(const utw_aerofoil_skin *skin, double u);

/** Build the contour, at the size of the chord. Free with utw_aerofoil_skin_clear(). UTW_E_NOMEM.
 */
utw_status utw_aerofoil_skin_init(utw_aerofoil_skin *skin, const utw_aerofoil *foil,
                                  utw_error *err);
void utw_aerofoil_skin_clear(utw_aerofoil_skin *skin);

/** Point and derivatives by u of the contour and of the inner side (utw_fit_curve; contexts:
 * utw_aerofoil_skin, utw_aerofoil_offset). */
void utw_aerofoil_outer(const void *skin, double u, double p[2], double d1[2], double d2[2]);
void utw_aerofoil_inner(const void *offset, double u, double p[2], double d1[2], double d2[2]);

/** 1 - curvature * thickness of the inner side: where it is not positive the offset turns back on
 * itself. */
double utw_aerofoil_stretch(const utw_aerofoil_offset *offset, double u);

/** u where x of the contour is `x` [L], on the upper (side = 0) or lower (1) branch. */
double utw_aerofoil_outer_at(const utw_aerofoil_skin *skin, double x, int side);

/** u where the inner side has this x, on the upper (0) or lower (1) branch, counted from the
 * trailing edge: NAN when it never comes there or has turned back before. */
double utw_aerofoil_inner_at(const utw_aerofoil_offset *offset, double x, int side);

#endif
