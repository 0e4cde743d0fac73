/* SPDX-License-Identifier: GPL-3.0-or-later
 * Moduli of the parts against a reference, and the constants that follow. */
#include "section/composite.h"

#include <math.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"

static const utw_material *material_of(const utw_outline *o, int part)
{
    const int m = o->part[part].material;
    return m < 0 ? NULL : &o->material[m];
}

static double shear_modulus(const utw_material *m)
{
    return m->E / (2 * (1 + m->nu));
}

int utw_is_composite(const utw_outline *o)
{
    const utw_material *first = material_of(o, 0);
    for (int i = 1; i < o->n_part; i++) {
        const utw_material *m = material_of(o, i);
        if ((m == NULL) != (first == NULL)) return 1;
        if (m != NULL && (m->E != first->E || m->nu != first->nu)) return 1;
    }
    return 0;
}

utw_status utw_composite_of(const utw_outline *o, utw_composite *c, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    memset(c, 0, sizeof *c);
    if (!utw_is_composite(o)) return UTW_OK;
    for (int i = 0; i < o->n_part; i++)
        if (material_of(o, i) == NULL) {
            st = utw_fail(err, UTW_E_MATERIAL,
                          "part %d has no material and another part has: give every part one, or "
                          "none",
                          i + 1);
            utw_error_place(err, i, -1, -1);
            goto done;
        }
    c->reference = material_of(o, 0);
    UTW_TRY_ALLOC(c->by_material = utw_alloc((size_t)o->n_material, sizeof(double)));
    UTW_TRY_ALLOC(c->by_part.shear = utw_alloc((size_t)o->n_part, sizeof(double)));
    UTW_TRY_ALLOC(c->by_part.axial = utw_alloc((size_t)o->n_part, sizeof(double)));
    for (int m = 0; m < o->n_material; m++) c->by_material[m] = o->material[m].E / c->reference->E;
    for (int i = 0; i < o->n_part; i++) {
        c->by_part.shear[i] = shear_modulus(material_of(o, i)) / shear_modulus(c->reference);
        c->by_part.axial[i] = material_of(o, i)->E / c->reference->E;
    }
    st = UTW_OK;
done:
    if (st != UTW_OK) utw_composite_clear(c);
    return st;
}

void utw_composite_clear(utw_composite *c)
{
    utw_free(c->by_material);
    utw_free(c->by_part.shear);
    utw_free(c->by_part.axial);
    memset(c, 0, sizeof *c);
}

/* ---- constants ------------------------------------------------------------------------------- */

/* Shear centre and warping constant of one round, about the centroid, in units of the net. */
typedef struct torsion_values {
    double xs, ys, Iw;
} torsion_values;

/* With e = E/E_ref: xs = (Ixy int e omega x - Iyy int e omega y)/D, ys likewise, Iw = int e
 * (omega - mean - ys x + xs y)^2: flexure and torsion do no work on each other (Trefftz 1935),
 * whatever the moduli. int e omega x = int k grad omega . grad z_x for -div k grad z_x = e x. */
static torsion_values values_of(const utw_area *a, double scale, const utw_measures *m)
{
    const double s2 = scale * scale, s4 = s2 * s2, A = a->A / s2;
    const double Ixx = a->Ixx / s4, Iyy = a->Iyy / s4, Ixy = a->Ixy / s4;
    const double D = Ixx * Iyy - Ixy * Ixy;
    const double x = m->energy[UTW_TORSION][UTW_SHEAR_X], y = m->energy[UTW_TORSION][UTW_SHEAR_Y];
    const double mean = m->mean[UTW_TORSION];
    torsion_values v = {(Ixy * x - Iyy * y) / D, (Ixx * x - Ixy * y) / D, 0};
    v.Iw = fmax(m->product[UTW_TORSION] - mean * mean / A - v.ys * x + v.xs * y, 0);
    return v;
}

/* The error after one order more is a fraction of the change; the whole change is stated. */
static utw_interval by_change(double now, double before, double rounding)
{
    return utw_about(now, fabs(now - before) + rounding);
}

void utw_constants_of_composite(const utw_area *area, double scale, const utw_solved *solved,
                                utw_constant_value *value)
{
    static const utw_constant absent[] = {
        UTW_WX_TOP, UTW_WX_BOTTOM, UTW_WY_LEFT, UTW_WY_RIGHT, UTW_ZX,  UTW_ZY, UTW_XP, UTW_YP,
        UTW_WT,     UTW_XF,        UTW_YF,      UTW_ASX,      UTW_ASY, UTW_KX, UTW_KY};
    for (size_t i = 0; i < sizeof absent / sizeof *absent; i++)
        value[absent[i]].absent = UTW_E_MATERIAL;
    const utw_measures *m = &solved->now;
    const double s2 = scale * scale, size = sqrt(area->A) / scale;
    const double gap = m->gap[UTW_TORSION][UTW_TORSION], high = m->stress[UTW_TORSION][UTW_TORSION];
    const utw_interval J = utw_about(high - 0.5 * gap, 0.5 * gap + 2e-14 * high);
    const torsion_values now = values_of(area, scale, m),
                         before = values_of(area, scale, &solved->before);
    const utw_interval s[2] = {by_change(now.xs, before.xs, 1e-12 * size),
                               by_change(now.ys, before.ys, 1e-12 * size)};
    const double squares = m->product[UTW_TORSION];
    utw_interval Iw = by_change(now.Iw, before.Iw, 1e-12 * squares);
    Iw.low = fmax(Iw.low, 0);
    utw_constant_put(value, UTW_J, UTW_BRACKET, J, s2 * s2, 0);
    utw_constant_put(value, UTW_XS, UTW_ESTIMATE, s[0], scale, area->xc);
    utw_constant_put(value, UTW_YS, UTW_ESTIMATE, s[1], scale, area->yc);
    utw_constant_put(value, UTW_IW, UTW_ESTIMATE, Iw, s2 * s2 * s2, 0);
    const double D = area->Ixx * area->Iyy - area->Ixy * area->Ixy;
    const double xr = area->Ixxx + area->Ixyy, yr = area->Ixxy + area->Iyyy;
    utw_constant_put(value, UTW_BETAX, UTW_ESTIMATE, utw_times(-2, s[1]), scale,
                     (area->Iyy * yr - area->Ixy * xr) / D);
    utw_constant_put(value, UTW_BETAY, UTW_ESTIMATE, utw_times(-2, s[0]), scale,
                     (area->Ixx * xr - area->Ixy * yr) / D);
    const utw_interval r2 = utw_plus(utw_exactly((area->Ixx + area->Iyy) / area->A / s2),
                                     utw_plus(utw_square(s[0]), utw_square(s[1])));
    utw_constant_put(value, UTW_R0, UTW_ESTIMATE, utw_root(r2), scale, 0);
}
