/* SPDX-License-Identifier: GPL-3.0-or-later
 * Sections whose parts differ in stiffness, bonded where they touch. */
#ifndef UTW_SECTION_COMPOSITE_H
#define UTW_SECTION_COMPOSITE_H

#include "section/adapt.h"
#include "section/area.h"
#include "section/constants.h"

/** Moduli against those of the first part's material, to which all constants are referred. */
typedef struct utw_composite {
    const utw_material *reference; /* borrowed */
    double *by_material;           /* [n_material] E/E_ref; owned */
    utw_moduli by_part;            /* G/G_ref and E/E_ref of each part; owned */
} utw_composite;

/** 1 when two parts differ in E or nu. */
int utw_is_composite(const utw_outline *outline);

/** Fill *composite; all zero when the section is not one. UTW_E_MATERIAL when only some parts have
 * a material; UTW_E_NOMEM. Owned: utw_composite_clear(). */
utw_status utw_composite_of(const utw_outline *outline, utw_composite *composite, utw_error *err);
void utw_composite_clear(utw_composite *composite);

/** The constants of a composite: J bracketed (int G |.|^2 of both solutions, the stress function's
 * problem with 1/G); shear centre, Iw, betax, betay, r0 with E-weighted integrals, estimated from
 * the last change. What has no meaning without more assumptions is absent: W, Z, plastic axes, Wt,
 * centre of flexure, shear areas. [in] area: E-weighted, referred to the reference. Sources:
 * docs/theory.md, "Several materials"; Muskhelishvili, Some Basic Problems of the Mathematical
 * Theory of Elasticity (1953), part VII (torsion of compound bars). */
void utw_constants_of_composite(const utw_area *area, double scale, const utw_solved *solved,
                                utw_constant_value *value);

#endif
