/* SPDX-License-Identifier: GPL-3.0-or-later
 * What the kinds of pictures have in common. */
#include "draw/picture.h"

#include <math.h>
#include <string.h>

double utw_sitting_value(const utw_sitting *p, utw_constant which)
{
    const utw_constant_value *v = &p->solution->value[which];
    return v->absent == UTW_OK ? v->quantity.value : (double)NAN;
}

static double size_of(const double box[4])
{
    return fmax(box[2] - box[0], box[3] - box[1]);
}

void utw_sitting_length(const utw_sitting *p, double length, char *text, size_t n)
{
    const double noise = 1e-9 * size_of(p->solution->outline->box);
    utw_number_text(fabs(length) < noise ? 0 : length, 5, text, n);
}

const char *utw_sitting_title(const utw_sitting *p)
{
    const char *name = p->solution->outline->name;
    return name == NULL || name[0] == '\0' ? "Section" : name;
}

static void grow(double box[4], const double at[2], const double most[2])
{
    double b[4];
    for (int d = 0; d < 2; d++) {
        b[d] = fmin(box[d], at[d]);
        b[d + 2] = fmax(box[d + 2], at[d]);
    }
    if (b[2] - b[0] <= most[0] && b[3] - b[1] <= most[1]) memcpy(box, b, sizeof b);
}

void utw_sitting_box(const utw_sitting *p, int flexure, double most, double box[4])
{
    memcpy(box, p->solution->outline->box, 4 * sizeof *box);
    const double size = size_of(box), limit[2] = {box[2] - box[0] + (most - 1) * size,
                                                  box[3] - box[1] + (most - 1) * size};
    const double at[3][2] = {
        {utw_sitting_value(p, UTW_XC), utw_sitting_value(p, UTW_YC)},
        {utw_sitting_value(p, UTW_XS), utw_sitting_value(p, UTW_YS)},
        {utw_sitting_value(p, UTW_XF), utw_sitting_value(p, UTW_YF)},
    };
    for (int i = 0; i < (flexure && !isnan(at[2][0]) ? 3 : 2); i++) grow(box, at[i], limit);
}

static int add_point(const utw_sitting *p, int sign, const char *letter, utw_constant x,
                     utw_constant y, const double box[4], utw_point_mark *point)
{
    const double at[2] = {utw_sitting_value(p, x), utw_sitting_value(p, y)};
    const double slack = 1e-6 * size_of(box);
    if (!(at[0] >= box[0] - slack && at[0] <= box[2] + slack && at[1] >= box[1] - slack &&
          at[1] <= box[3] + slack))
        return 0;
    *point = (utw_point_mark){sign, letter, {at[0], at[1]}};
    return 1;
}

int utw_sitting_points(const utw_sitting *p, int flexure, const double box[4],
                       utw_point_mark *point)
{
    int n = add_point(p, UTW_SIGN_CENTROID, "C", UTW_XC, UTW_YC, box, point);
    n += add_point(p, UTW_SIGN_SHEAR_CENTRE, "S", UTW_XS, UTW_YS, box, point + n);
    if (flexure) n += add_point(p, UTW_SIGN_FLEXURE, "F", UTW_XF, UTW_YF, box, point + n);
    return n;
}

utw_request utw_sitting_request(const utw_sitting *p, const char *subject, const utw_notes *notes)
{
    utw_request q;
    memset(&q, 0, sizeof q);
    q.width = p->options->width;
    q.title = utw_sitting_title(p);
    q.subject = subject;
    q.notes = notes;
    q.length_unit = p->solution->outline->length_unit;
    q.wall = 2 * p->solution->area.A / p->solution->area.perimeter;
    q.left = q.right = q.top = q.bottom = 1;
    return q;
}

utw_frame utw_sitting_frame(const utw_sitting *p, const utw_page *page)
{
    const utw_frame *f = &page->frame;
    const utw_solution *s = p->solution;
    return (utw_frame){f->scale * s->unit, f->x0 + f->scale * s->origin[0],
                       f->y0 - f->scale * s->origin[1]};
}

/* The section will fill the page's width or its square; chords of two thirds of a font are hardly
 * seen in a smooth line, and more than about 50000 triangles gain nothing. */
utw_fineness utw_sitting_fineness(const utw_sitting *p)
{
    const double *box = p->solution->outline->box, f = utw_font_size(p->options->width);
    const double scale = 0.85 * p->options->width * p->solution->unit / size_of(box);
    const double unit2 = p->solution->unit * p->solution->unit;
    const double area = p->solution->area.A / unit2, most = 50000;
    const double least = sqrt(area / (0.433 * most));
    return (utw_fineness){fmax(0.3 * f / scale, least), 0.003 * f / scale};
}
