/* SPDX-License-Identifier: GPL-3.0-or-later
 * A stress of a load case as filled contours, with arrows for shear. */
#include <math.h>
#include <stdio.h>
#include <string.h>

#include "base/memory.h"
#include "base/status.h"
#include "base/vec2.h"
#include "draw/arrows.h"
#include "draw/bands.h"
#include "draw/picture.h"
#include "draw/values.h"
#include "section/stress.h"
#include "section/stress_case.h"

static const struct {
    const char *key, *name, *meaning;
    int is_signed;
} components[UTW_STRESS_COMPONENT_COUNT] = {
    [UTW_SHOW_VON_MISES] = {"von_mises", "von Mises", "von Mises stress", 0},
    [UTW_SHOW_SIGMA_Z] = {"sigma_z", "\xCF\x83_{z}", "Normal stress \xCF\x83_{z}, tension positive",
                          1},
    [UTW_SHOW_TAU] = {"tau", "\xCF\x84", "Shear stress \xCF\x84 on the section", 0},
    [UTW_SHOW_TAU_XZ] = {"tau_xz", "\xCF\x84_{xz}", "Shear stress \xCF\x84_{xz}, positive along x",
                         1},
    [UTW_SHOW_TAU_YZ] = {"tau_yz", "\xCF\x84_{yz}", "Shear stress \xCF\x84_{yz}, positive along y",
                         1},
};

const char *utw_stress_component_key(utw_stress_component which)
{
    return (int)which >= 0 && which < UTW_STRESS_COMPONENT_COUNT ? components[which].key : NULL;
}

/* What the picture shows. */
typedef struct show {
    const utw_sitting *p;
    utw_stress_component which;
    const char *name; /* of the load case */
    utw_forces forces;
    utw_stress_peaks peaks;
    utw_stress *stress; /* owned */
    utw_cases *cases;   /* owned */
    utw_sampling s;     /* owned */
    double *value;      /* [n_vertex], owned */
    double (*tau)[2];   /* [n_vertex], owned */
    utw_colour *colour; /* [n_vertex] of arrows, owned */
    double low, high;
} show;

static void clear(show *w)
{
    utw_sampling_clear(&w->s);
    utw_free(w->value);
    utw_free(w->tau);
    utw_free(w->colour);
    utw_cases_free(w->cases);
    utw_stress_free(w->stress);
}

static utw_status find_case(show *w, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const char *name = w->p->options->load_case;
    if (name == NULL) name = utw_outline_load(w->p->solution->outline, 0, NULL);
    if (name == NULL)
        return utw_fail(err, UTW_E_LOAD,
                        "the section has no load cases (\"loads\"): there is no stress to draw");
    UTW_TRY(utw_stress_create(w->p->solution, &w->stress, err));
    UTW_TRY(utw_cases_create(w->stress, 1, &name, 0, NULL, &w->cases, err));
    UTW_TRY(utw_cases_get(w->cases, 0, &w->name, &w->forces, &w->peaks, err));
    st = UTW_OK;
done:
    return st;
}

static double component_of(utw_stress_component which, double sigma, const double tau[2])
{
    const double shear = utw_norm(tau);
    switch (which) {
    case UTW_SHOW_SIGMA_Z:
        return sigma;
    case UTW_SHOW_TAU:
        return shear;
    case UTW_SHOW_TAU_XZ:
        return tau[0];
    case UTW_SHOW_TAU_YZ:
        return tau[1];
    default:
        return sqrt(sigma * sigma + 3 * shear * shear);
    }
}

/* The stresses at the vertices of the sampling, and the range of those that are told. */
static utw_status sample(show *w, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_fineness fineness = utw_sitting_fineness(w->p);
    utw_values v = {0};
    utw_stress_case c;
    UTW_TRY(utw_sampling_init(&w->s, w->p->solution->solved.mesh, &fineness, err));
    UTW_TRY(utw_values_init(&v, &w->s, &w->stress->unit, 1, err));
    UTW_TRY(utw_stress_case_of(&w->stress->unit, &w->forces, &c, err));
    UTW_TRY_ALLOC(w->value = utw_alloc((size_t)v.n, sizeof *w->value));
    UTW_TRY_ALLOC(w->tau = utw_alloc((size_t)v.n, sizeof *w->tau));
    UTW_TRY_ALLOC(w->colour = utw_alloc((size_t)v.n, sizeof *w->colour));
    w->low = w->high = 0;
    for (int i = 0; i < v.n; i++) {
        const double *xy = w->s.xy[i];
        const double sigma = c.one + c.x * xy[0] + c.y * xy[1] + c.omega * v.omega[i];
        for (int d = 0; d < 2; d++) {
            w->tau[i][d] = 0;
            for (int k = 0; k < UTW_N_UNIT; k++) w->tau[i][d] += c.t[k] * v.tau[i][k][d];
        }
        w->value[i] = component_of(w->which, sigma, w->tau[i]);
        if (w->peaks.unbounded && utw_keep_out_holds(&w->stress->keep_out, xy)) continue;
        w->low = fmin(w->low, w->value[i]);
        w->high = fmax(w->high, w->value[i]);
    }
    st = UTW_OK;
done:
    utw_values_clear(&v);
    return st;
}

/* ---- notes ----------------------------------------------------------------------------------- */

static void add_force(char *text, size_t n, const char *name, double value, const char *unit)
{
    char number[40];
    const size_t used = strlen(text);
    if (value == 0) return;
    utw_number_text(value, 5, number, sizeof number);
    snprintf(text + used, n - used, "%s%s = %s %s", used > 0 ? ", " : "", name, number, unit);
}

/* Where the shear force acts. */
static void note_place(const utw_sitting *p, utw_notes *notes, const double at[2])
{
    char x[40], y[40];
    utw_sitting_length(p, at[0], x, sizeof x);
    utw_sitting_length(p, at[1], y, sizeof y);
    utw_notes_add(notes, UTW_SIGN_LOAD, "V acts at (%s, %s) %s", x, y,
                  p->solution->outline->length_unit);
}

/* The forces of the case, each with its unit. */
static void note_forces(const show *w, utw_notes *notes)
{
    const utw_outline *o = w->p->solution->outline;
    const utw_forces *f = &w->forces;
    char text[240] = "", moment[40], bimoment[40];
    snprintf(moment, sizeof moment, "%s %s", o->force_unit, o->length_unit);
    snprintf(bimoment, sizeof bimoment, "%s %s\xC2\xB2", o->force_unit, o->length_unit);
    add_force(text, sizeof text, "N", f->N, o->force_unit);
    add_force(text, sizeof text, "V_{x}", f->Vx, o->force_unit);
    add_force(text, sizeof text, "V_{y}", f->Vy, o->force_unit);
    add_force(text, sizeof text, "M_{x}", f->Mx, moment);
    add_force(text, sizeof text, "M_{y}", f->My, moment);
    add_force(text, sizeof text, "T", f->T, moment);
    add_force(text, sizeof text, "B", f->B, bimoment);
    utw_notes_add(notes, 0, "%s", text[0] == '\0' ? "no load" : text);
    if (f->Vx == 0 && f->Vy == 0) return;
    if (f->has_at)
        note_place(w->p, notes, f->at);
    else
        utw_notes_add(notes, 0, "V acts at the shear centre S");
}

/* A greatest stress, to the digits that its estimated error leaves. */
static void note_peak(const show *w, utw_notes *notes, int sign, const char *what,
                      utw_stress_kind kind, utw_point_mark *mark, int *n)
{
    const utw_stress_peak *peak = &w->peaks.peak[kind];
    const double sure = fabs(peak->value) / fmax(peak->error, 1e-30);
    char number[40];
    utw_number_text(peak->value, sure > 1e4 ? 4 : sure > 1e3 ? 3 : 2, number, sizeof number);
    utw_notes_add(notes, sign, "%s %s %s/%s\xC2\xB2", what, number,
                  w->p->solution->outline->force_unit, w->p->solution->outline->length_unit);
    mark[(*n)++] = (utw_point_mark){sign, "", {peak->at[0], peak->at[1]}};
}

static int inside(const double box[4], const double at[2])
{
    return at[0] >= box[0] && at[0] <= box[2] && at[1] >= box[1] && at[1] <= box[3];
}

/* Notes, and the points that are marked. Returns their number. */
static int annotate(const show *w, const double box[4], utw_notes *notes, utw_point_mark *mark)
{
    int n = utw_sitting_points(w->p, 0, box, mark);
    if (w->forces.has_at && (w->forces.Vx != 0 || w->forces.Vy != 0) && inside(box, w->forces.at))
        mark[n++] = (utw_point_mark){UTW_SIGN_LOAD, "V", {w->forces.at[0], w->forces.at[1]}};
    note_forces(w, notes);
    if (!(w->high > w->low)) return n;
    if (w->which == UTW_SHOW_VON_MISES)
        note_peak(w, notes, UTW_SIGN_GREATEST, "greatest", UTW_VON_MISES, mark, &n);
    if (w->which == UTW_SHOW_TAU)
        note_peak(w, notes, UTW_SIGN_GREATEST, "greatest", UTW_TAU_MAX, mark, &n);
    if (w->which == UTW_SHOW_SIGMA_Z) {
        note_peak(w, notes, UTW_SIGN_GREATEST, "greatest", UTW_SIGMA_MAX, mark, &n);
        note_peak(w, notes, UTW_SIGN_LEAST, "least", UTW_SIGMA_MIN, mark, &n);
    }
    if (w->peaks.unbounded && w->which != UTW_SHOW_SIGMA_Z)
        utw_notes_add(notes, UTW_SIGN_CORNER,
                      "sharp corner: no bound inside the circle, left out of the range");
    return n;
}

/* ---- drawing --------------------------------------------------------------------------------- */

/* The circles around sharp corners, as large as they are, but to be seen. */
static void draw_corners(const show *w, const utw_page *page)
{
    const utw_pen pen = {.width = 1.6 * utw_hairline(page), .colour = utw_accent()};
    for (int k = 0; k < w->stress->keep_out.n && w->which != UTW_SHOW_SIGMA_Z; k++) {
        utw_error err;
        double at[2], xy[2], radius;
        if (!w->peaks.unbounded || utw_stress_corner(w->stress, k, at, &radius, &err) != UTW_OK)
            continue;
        utw_page_point(page, at, xy);
        utw_canvas_circle(page->canvas, xy[0], xy[1],
                          fmax(radius * page->frame.scale, 0.3 * page->font));
        utw_canvas_stroke(page->canvas, &pen);
    }
}

/* Arrows over the colours, clear of the letters and signs of the points. */
static utw_status draw_arrows(show *w, const utw_page *page, const utw_bands *bands, int n_mark,
                              const utw_point_mark *mark, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    utw_points points;
    utw_box box[2 * UTW_POINTS_MAX];
    int n = 0;
    double most;
    utw_points_place(page, n_mark, mark, &points);
    for (int i = 0; i < points.n_label; i++) box[n++] = points.label[i].box;
    for (int i = 0; i < points.n; i++) {
        const double *xy = points.point[i].xy, r = 0.6 * page->font;
        box[n++] = (utw_box){xy[0] - r, xy[1] - r, xy[0] + r, xy[1] + r};
    }
    for (int i = 0; i < w->s.n_vertex; i++)
        w->colour[i] =
            utw_colour_on(utw_band_colour(bands, (long)floor(w->value[i] / bands->ticks.step)));
    UTW_TRY(
        utw_arrows_draw(page, &w->s, (const double(*)[2])w->tau, w->colour, n, box, &most, err));
    utw_points_draw(page, &points);
    st = UTW_OK;
done:
    return st;
}

static void title_of(const show *w, char *text, size_t n)
{
    snprintf(text, n, "%s: %s", utw_sitting_title(w->p), w->name);
}

static utw_status draw(show *w, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    const utw_outline *o = w->p->solution->outline;
    const int shear = w->which == UTW_SHOW_TAU, nothing = !(w->high > w->low);
    utw_notes notes = {0};
    utw_page page = {0};
    utw_point_mark mark[UTW_POINTS_MAX];
    char unit[40], title[600];
    double box[4];
    snprintf(unit, sizeof unit, "%s/%s\xC2\xB2", o->force_unit, o->length_unit);
    const utw_bands bands = utw_bands_of(w->low, w->high, components[w->which].is_signed, 13, unit);
    utw_sitting_box(w->p, 0, 1.6, box);
    const int n = annotate(w, box, &notes, mark);
    title_of(w, title, sizeof title);
    utw_request q = utw_sitting_request(w->p,
                                        shear ? "Shear stress on the section; arrows: size and "
                                                "direction of (\xCF\x84_{xz}, \xCF\x84_{yz})"
                                              : components[w->which].meaning,
                                        &notes);
    q.title = title;
    memcpy(q.box, box, sizeof q.box);
    q.left = q.right = q.top = q.bottom = shear ? 1.6 : 2.6;
    utw_key_request(w->p->canvas, &bands, components[w->which].name, &q);
    UTW_TRY(utw_layout(w->p->canvas, &q, &page, err));
    const utw_frame frame = utw_sitting_frame(w->p, &page);
    utw_sampling_map(&w->s, &frame);
    utw_key_draw(&page, &bands, components[w->which].name);
    UTW_TRY(utw_bands_draw(&page, &bands, &w->s, w->value, o, shear ? 0 : n, mark,
                           !shear && !nothing, err));
    if (shear) UTW_TRY(draw_arrows(w, &page, &bands, n, mark, err));
    draw_corners(w, &page);
    UTW_TRY(utw_canvas_status(w->p->canvas, err));
    st = UTW_OK;
done:
    utw_page_clear(&page);
    return st;
}

utw_status utw_picture_stress(const utw_sitting *p, utw_error *err)
{
    utw_status st = UTW_E_INTERNAL;
    show w;
    memset(&w, 0, sizeof w);
    w.p = p;
    w.which = p->options->component;
    UTW_TRY(find_case(&w, err));
    UTW_TRY(sample(&w, err));
    UTW_TRY(draw(&w, err));
    st = UTW_OK;
done:
    clear(&w);
    return st;
}
