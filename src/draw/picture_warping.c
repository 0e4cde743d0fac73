/* SPDX-License-Identifier: GPL-3.0-or-later
 * The warping function as filled contours. */
#include <math.h>
#include <stdio.h>

#include "base/memory.h"
#include "base/status.h"
#include "draw/bands.h"
#include "draw/crest.h"
#include "draw/picture.h"
#include "draw/values.h"

static void note_constant(const utw_sitting *p, utw_notes *notes, const char *name,
                          utw_constant which)
{
    char number[40], unit[40];
    utw_number_text(utw_sitting_value(p, which), 5, number, sizeof number);
    utw_unit_text(p->solution->outline->length_unit, utw_constant_power(which), unit, sizeof unit);
    utw_notes_add(notes, 0, "%s = %s %s", name, number, unit);
}

/* An extreme: noted, and marked where it is. */
static void note_extreme(const utw_sitting *p, utw_notes *notes, int sign, const char *what,
                         const utw_crest *crest, utw_point_mark *mark)
{
    const utw_solution *s = p->solution;
    char number[40], unit[40];
    utw_number_text(crest->value * s->unit * s->unit, 4, number, sizeof number);
    utw_unit_text(s->outline->length_unit, 2, unit, sizeof unit);
    utw_notes_add(notes, sign, "%s %s %s", what, number, unit);
    *mark = (utw_point_mark){
        sign, "", {s->origin[0] + s->unit * crest->xy[0], s->origin[1] + s->unit * crest->xy[1]}};
}

/* omega of a section that does not warp is rounding: less than this part of its area. */
#define NO_WARPING 1e-9

static utw_status draw(const utw_sitting *p, utw_sampling *s, const double *omega,
                       const utw_crest crest[2], utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_solution *sol = p->solution;
    utw_notes notes = {0};
    utw_page page = {0};
    utw_point_mark mark[UTW_POINTS_MAX];
    char unit[40];
    int n = 0;
    double box[4];
    const double unit2 = sol->unit * sol->unit, low = crest[0].value * unit2,
                 high = crest[1].value * unit2;
    const int flat = high - low < NO_WARPING * sol->area.A;
    utw_unit_text(sol->outline->length_unit, 2, unit, sizeof unit);
    const utw_bands bands = utw_bands_of(flat ? 0 : low, flat ? 0 : high, 1, 13, unit);
    utw_sitting_box(p, 0, 1.6, box);
    n = utw_sitting_points(p, 0, box, mark);
    if (flat) {
        utw_notes_add(&notes, 0, "this section does not warp");
    } else {
        note_extreme(p, &notes, UTW_SIGN_GREATEST, "greatest", &crest[1], &mark[n++]);
        note_extreme(p, &notes, UTW_SIGN_LEAST, "least", &crest[0], &mark[n++]);
    }
    note_constant(p, &notes, "warping constant I_{w}", UTW_IW);
    note_constant(p, &notes, "torsion constant J", UTW_J);
    utw_request q = utw_sitting_request(p,
                                        "Warping function \xCF\x89 about the shear centre S, mean "
                                        "zero: u_{z} = \xCF\x89 d\xCE\xB8/dz",
                                        &notes);
    for (int d = 0; d < 4; d++) q.box[d] = box[d];
    q.left = q.right = q.top = q.bottom = 2.6;
    utw_key_request(p->canvas, &bands, "\xCF\x89", &q);
    UTW_TRY(utw_layout(p->canvas, &q, &page, err));
    const utw_frame frame = utw_sitting_frame(p, &page);
    utw_sampling_map(s, &frame);
    utw_key_draw(&page, &bands, "\xCF\x89");
    UTW_TRY(utw_bands_draw(&page, &bands, s, omega, sol->outline, n, mark, !flat, err));
    UTW_TRY(utw_canvas_status(p->canvas, err));
    st = UTW_OK;
done:
    utw_page_clear(&page);
    return st;
}

utw_status utw_picture_warping(const utw_sitting *p, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_solution *s = p->solution;
    const utw_fineness fineness = utw_sitting_fineness(p);
    utw_sampling sampling = {0};
    utw_values values = {0};
    utw_unit_stress unit;
    utw_crest crest[2];
    utw_unit_stress_of(s, &unit);
    UTW_TRY(utw_sampling_init(&sampling, s->solved.mesh, &fineness, err));
    UTW_TRY(utw_values_init(&values, &sampling, &unit, 0, err));
    UTW_TRY(utw_crest_of(&sampling, &values, &unit, -1, &crest[0], err));
    UTW_TRY(utw_crest_of(&sampling, &values, &unit, 1, &crest[1], err));
    for (int i = 0; i < values.n; i++) values.omega[i] *= s->unit * s->unit;
    UTW_TRY(draw(p, &sampling, values.omega, crest, err));
    st = UTW_OK;
done:
    utw_sampling_clear(&sampling);
    utw_values_clear(&values);
    return st;
}
