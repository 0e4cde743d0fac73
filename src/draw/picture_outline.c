/* SPDX-License-Identifier: GPL-3.0-or-later
 * The section with its extent, its points and its principal axes. */
#include <math.h>
#include <stdio.h>

#include "base/status.h"
#include "base/vec2.h"
#include "draw/picture.h"

/* Principal second moments closer than this are the same: every axis is one. */
#define SAME_MOMENTS 1e-9

/* A coordinate as text; less than 1e-5 of the section's size is what symmetry leaves of a zero. */
static void coordinate(const utw_sitting *p, utw_constant which, char *text, size_t n)
{
    const double *box = p->solution->outline->box, x = utw_sitting_value(p, which);
    const double size = hypot(box[2] - box[0], box[3] - box[1]);
    utw_sitting_length(p, fabs(x) < 1e-5 * size ? 0 : x, text, n);
}

static void note_point(const utw_sitting *p, utw_notes *notes, int sign, const char *what,
                       utw_constant x, utw_constant y)
{
    char xt[40], yt[40];
    coordinate(p, x, xt, sizeof xt);
    coordinate(p, y, yt, sizeof yt);
    utw_notes_add(notes, sign, "%s (%s, %s) %s", what, xt, yt, p->solution->outline->length_unit);
}

static int has_axes(const utw_sitting *p)
{
    const double I1 = utw_sitting_value(p, UTW_I1), I2 = utw_sitting_value(p, UTW_I2);
    return I1 - I2 > SAME_MOMENTS * I1;
}

static void write_notes(const utw_sitting *p, utw_notes *notes)
{
    char number[40], nu[40];
    note_point(p, notes, UTW_SIGN_CENTROID, "C  centroid", UTW_XC, UTW_YC);
    note_point(p, notes, UTW_SIGN_SHEAR_CENTRE, "S  shear centre", UTW_XS, UTW_YS);
    if (!isnan(p->solution->nu)) {
        char what[80];
        utw_number_text(p->solution->nu, 3, nu, sizeof nu);
        snprintf(what, sizeof what, "F  centre of flexure, \xCE\xBD = %s", nu);
        note_point(p, notes, UTW_SIGN_FLEXURE, what, UTW_XF, UTW_YF);
    }
    if (has_axes(p)) {
        utw_number_text(utw_sitting_value(p, UTW_ANGLE) * (180 / UTW_PI), 4, number, sizeof number);
        utw_notes_add(notes, UTW_SIGN_AXIS, "1, 2  principal axes, 1 at %s\xC2\xB0 from x", number);
    } else {
        utw_notes_add(notes, UTW_SIGN_NONE, "every axis through C is a principal axis");
    }
}

/* How far the section reaches from C along a unit vector: the ends of an axis that is drawn a
 * little longer. */
static void reach(const double box[4], const double C[2], const double d[2], double end[2])
{
    double t = UTW_INFINITY;
    for (int k = 0; k < 2; k++) {
        if (d[k] > 1e-9) t = fmin(t, (box[k + 2] - C[k]) / d[k]);
        if (d[k] < -1e-9) t = fmin(t, (box[k] - C[k]) / d[k]);
    }
    end[0] = C[0] + t * d[0];
    end[1] = C[1] + t * d[1];
}

/* An axis through C from end to end of the box and 1.2 font sizes past it. */
static void draw_axis(const utw_page *page, const double box[4], const double C[2],
                      const double d[2], double ends[2][2])
{
    const double f = page->font;
    const utw_pen pen = {.width = 1.2 * utw_hairline(page),
                         .colour = utw_ink(),
                         .dash = {1.6 * f, 0.35 * f, 0.12 * f, 0.35 * f}};
    for (int side = 0; side < 2; side++) {
        const double sign = side == 0 ? 1 : -1, u[2] = {sign * d[0], sign * d[1]};
        double end[2];
        reach(box, C, u, end);
        utw_page_point(page, end, ends[side]);
        ends[side][0] += 1.2 * f * u[0];
        ends[side][1] -= 1.2 * f * u[1];
    }
    utw_canvas_move(page->canvas, ends[0][0], ends[0][1]);
    utw_canvas_line(page->canvas, ends[1][0], ends[1][1]);
    utw_canvas_stroke(page->canvas, &pen);
    utw_labels_take_line(page->labels, ends[0], ends[1]);
}

static void name_axis(const utw_page *page, const char *name, double ends[2][2])
{
    const double f = page->font;
    utw_type type = utw_type_plain(f);
    const utw_text_size size = utw_canvas_measure(page->canvas, name, &type);
    for (int side = 0; side < 2; side++) {
        utw_box box;
        if (!utw_labels_find(page->labels, ends[side][0], ends[side][1], size.width,
                             size.above + size.below, 0.3 * f, 2 * f, 0.1 * f, &box))
            continue;
        utw_canvas_text(page->canvas, box.x0, box.y0 + size.above, 0, 0, name, &type);
        utw_labels_take_box(page->labels, box);
        return;
    }
}

static void draw_axes(const utw_sitting *p, const utw_page *page)
{
    const double a = utw_sitting_value(p, UTW_ANGLE), one[2] = {cos(a), sin(a)},
                 two[2] = {-one[1], one[0]};
    const double C[2] = {utw_sitting_value(p, UTW_XC), utw_sitting_value(p, UTW_YC)};
    double ends[2][2][2];
    draw_axis(page, p->solution->outline->box, C, one, ends[0]);
    draw_axis(page, p->solution->outline->box, C, two, ends[1]);
    name_axis(page, "1", ends[0]);
    name_axis(page, "2", ends[1]);
}

static void draw_origin(const utw_page *page, const double box[4])
{
    const double origin[2] = {0, 0};
    double xy[2];
    if (!(box[0] <= 0 && box[1] <= 0 && box[2] >= 0 && box[3] >= 0)) return;
    utw_page_point(page, origin, xy);
    utw_mark_sign(page->canvas, UTW_SIGN_ORIGIN, xy[0], xy[1], page->font);
    const double r = 0.7 * page->font;
    utw_labels_take_box(page->labels, (utw_box){xy[0] - r, xy[1] - r, xy[0] + r, xy[1] + r});
}

utw_status utw_picture_outline(const utw_sitting *p, utw_error *err)
{
    utw_status st = UTW_OK;
    const utw_outline *o = p->solution->outline;
    utw_notes notes = {0};
    utw_page page;
    utw_point_mark point[4];
    utw_points points;
    double box[4];
    write_notes(p, &notes);
    utw_request q = utw_sitting_request(p, "Outline and extent", &notes);
    utw_sitting_box(p, 1, 2.5, box);
    for (int d = 0; d < 4; d++) q.box[d] = box[d];
    q.left = 4.2;
    q.bottom = 4;
    q.top = q.right = 2.5;
    UTW_TRY(utw_layout(p->canvas, &q, &page, err));
    utw_mark_outline_path(&page, o);
    utw_canvas_fill(p->canvas, utw_metal(), 1);
    utw_mark_outline(&page, o);
    draw_origin(&page, box);
    utw_mark_extent(&page, o->box, o->length_unit);
    if (has_axes(p)) draw_axes(p, &page);
    utw_points_place(&page, utw_sitting_points(p, 1, box, point), point, &points);
    utw_points_draw(&page, &points);
    st = UTW_OK;
done:
    utw_page_clear(&page);
    return st;
}
