/* SPDX-License-Identifier: GPL-3.0-or-later
 * What a load case makes of the samples: the regions that may hold its greatest stresses. */
#ifndef UTW_SECTION_SCAN_H
#define UTW_SECTION_SCAN_H

#include "section/stress.h"
#include "section/stress_case.h"

/** The kinds of utw_stress_kind, and the von Mises stress over the yield stress of its part. */
enum { UTW_UTILISATION = UTW_STRESS_KIND_COUNT, UTW_N_KIND };

/** What is made greatest for a kind: the squares of the von Mises stress, of the shear stress and
 * of the utilisation; of the others the stress itself, turned round (-) where the least is wanted.
 */
double utw_merit(int kind, double sigma, double tau2);

/** The greatest merit of every kind over the samples of a region. */
typedef double utw_merits[UTW_N_KIND];

typedef struct utw_scan {
    utw_merits *best;    /* [n_region]; -infinity where a region cannot come near; owned */
    utw_merits greatest; /* of all samples */
    utw_merits near; /* what a merit may lack to the greatest sample and its region still be worth a
                        search */
} utw_scan;

/** Scan. Regions whose bounds (samples.h) lie too low are passed over. When the case is sheared,
 * what is not sigma_z counts outside the circles around sharp corners only. Free with
 * utw_scan_clear(). UTW_E_NOMEM. */
utw_status utw_scan_init(utw_scan *scan, const utw_stress *stress,
                         const utw_stress_case *stress_case, utw_error *err);
void utw_scan_clear(utw_scan *scan);

/** sigma_z and the shear stress of a case at the n samples from `first`: sigma, tx, ty [n]. */
void utw_scan_stresses(const utw_samples *samples, const utw_stress_case *stress_case, int first,
                       int n, double *sigma, double *tx, double *ty);

/** The least yield stress of the parts a region touches; stress->yield must not be NULL. */
double utw_region_yield(const utw_stress *stress, const utw_region *region);

#endif
