/* SPDX-License-Identifier: GPL-3.0-or-later
 * The unit stresses at points spread over the whole section, made once, from which the peaks of any
 * number of load cases are found. */
#ifndef UTW_SECTION_SAMPLES_H
#define UTW_SECTION_SAMPLES_H

#include "mesh/locate.h"
#include "section/keep_out.h"
#include "section/unit_stress.h"

/** Samples of a side are three for each order, and one. */
#define UTW_SAMPLES_PER_ORDER 3
#define UTW_SAMPLES_MAX       (UTW_SAMPLES_PER_ORDER * UTW_ORDER_MAX + 1)

/** What a region is: a side on the boundary of the section, the inside of an element, or a part of
 * the circle around a sharp corner. */
typedef enum utw_region_kind { UTW_ALONG_SIDE, UTW_INSIDE, UTW_ON_CIRCLE } utw_region_kind;

typedef struct utw_region {
    utw_region_kind kind;
    int tri;      /* SIDE, INSIDE: the element */
    int which;    /* SIDE: 0..2; CIRCLE: index of the corner */
    int kept_out; /* 1: its points lie inside a circle around a sharp corner */
    int first, n; /* its samples */
    int whole;    /* SIDE: 1 when it holds all samples of the side, at Chebyshev-Lobatto points */
    /* the box of x, y, omega over the samples, and the greatest |tau| of each unit field */
    double low[3], high[3], most[UTW_N_UNIT];
} utw_region;

/** Samples of a region follow each other. Net coordinates. tau is the mean of both solutions. */
typedef struct utw_samples {
    int n, n_region;
    utw_region *region;          /* [n_region], owned */
    double *x, *y, *omega;       /* [n], owned */
    double *tau[UTW_N_UNIT][2];  /* [n] each, owned */
    int *tri;                    /* [n], owned */
    double (*at)[2];             /* [n] (r, s) of the element; owned */
    double (*apart)[UTW_N_UNIT]; /* [n_tri] root mean square distance of both solutions over the
                                    samples inside each element; owned */
    double *along;               /* [n] SIDE: u in [0, 1]; CIRCLE: angle [rad]; owned */
    size_t capacity, region_capacity;
} utw_samples;

/** Spacing of the samples, for a search around one of them: of r and s inside element tri, of the
 * angle on a circle. */
double utw_samples_spacing(const utw_region *region, const utw_field *field, int tri);

/** Sample sides at Chebyshev-Lobatto points, which keep the maximum of a polynomial of degree d
 * between m + 1 of them below its greatest sample over cos(pi d/(2 m)) (Ehlich and Zeller,
 * Mathematische Zeitschrift 86 (1964) 41-44), elements at a lattice, circles at equal angles. All
 * borrowed. Free with utw_samples_clear(). UTW_E_NOMEM. */
utw_status utw_samples_init(utw_samples *samples, const utw_unit_stress *unit,
                            const utw_locator *locator, const utw_keep_out *keep_out,
                            utw_error *err);
void utw_samples_clear(utw_samples *samples);

#endif
