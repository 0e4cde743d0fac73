/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where the cavity inside an aerofoil's skin begins and ends. */
#ifndef UTW_OUTLINE_AEROFOIL_CAVITY_H
#define UTW_OUTLINE_AEROFOIL_CAVITY_H

#include "outline/aerofoil_skin.h"

/** A place where the upper and the lower inner side cross. */
typedef struct utw_aerofoil_crossing {
    double u[2]; /* on the upper and on the lower branch */
    double p[2]; /* [L] */
} utw_aerofoil_crossing;

/** The cavity that the skin leaves, spars and caps left aside. */
typedef struct utw_aerofoil_cavity {
    int round_nose; /* 1: the inner side runs around the nose; else `front` is where it crosses
                       itself */
    utw_aerofoil_crossing front;
    int open_tail; /* 1: the sides do not meet before the (thick) trailing edge; else `tail` is
                      where they do */
    utw_aerofoil_crossing tail;
    double x0, x1; /* it reaches from x0 to x1 [L] */
} utw_aerofoil_cavity;

/** Find the cavity. UTW_E_OUTLINE when the skin fills the section, all of it or somewhere in the
 * middle; UTW_E_NOMEM. */
utw_status utw_aerofoil_find_cavity(const utw_aerofoil_skin *skin, utw_aerofoil_cavity *cavity,
                                    utw_error *err);

#endif
