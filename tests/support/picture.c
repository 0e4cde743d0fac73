/* SPDX-License-Identifier: GPL-3.0-or-later
 * Checks of pictures. */
#include "support/picture.h"

#include "base/memory.h"
#include "draw/canvas_list.h"

utw_canvas *picture_canvas(const utw_solution *solution, utw_picture what,
                           const utw_draw_options *options)
{
    utw_error err;
    utw_canvas *canvas = NULL;
    assert_ok(utw_canvas_create(&canvas, &err));
    assert_ok(utw_picture_draw(solution, what, options, canvas, &err));
    return canvas;
}

/* Texts may touch lines only by rounding. */
#define SHRINK 0.02

static int boxes_meet(utw_box a, utw_box b)
{
    return a.x0 < b.x1 - SHRINK && b.x0 < a.x1 - SHRINK && a.y0 < b.y1 - SHRINK &&
           b.y0 < a.y1 - SHRINK;
}

/* A text's box, and the circle that lines are cut off at (radius 0: none). */
typedef struct target {
    utw_box box;
    double clip[3];
} target;

/* 1 when the segment enters the box, by sampling it finely. */
static int segment_enters(const double a[2], const double b[2], const target *g)
{
    const utw_box box = g->box;
    if (fmax(a[0], b[0]) < box.x0 || fmin(a[0], b[0]) > box.x1 || fmax(a[1], b[1]) < box.y0 ||
        fmin(a[1], b[1]) > box.y1)
        return 0;
    const int n = 2 + (int)(hypot(b[0] - a[0], b[1] - a[1]) / 0.05);
    for (int i = 0; i <= n; i++) {
        const double x = a[0] + (b[0] - a[0]) * i / n, y = a[1] + (b[1] - a[1]) * i / n;
        if (g->clip[2] > 0 && hypot(x - g->clip[0], y - g->clip[1]) > g->clip[2]) continue;
        if (x > box.x0 + SHRINK && x < box.x1 - SHRINK && y > box.y0 + SHRINK &&
            y < box.y1 - SHRINK)
            return 1;
    }
    return 0;
}

/* Cubics and circles as chords. */
static int path_enters(const utw_canvas *c, const utw_step *step, const target *g)
{
    double pen[2] = {0, 0}, start[2] = {0, 0};
    for (size_t i = step->first; i < step->first + step->n; i++) {
        const double *v = c->segment[i].v;
        double to[2] = {v[0], v[1]};
        switch (c->segment[i].verb) {
        case UTW_MOVE:
            memcpy(start, to, sizeof start);
            break;
        case UTW_LINE_TO:
            if (segment_enters(pen, to, g)) return 1;
            break;
        case UTW_CUBIC_TO: {
            double last[2] = {pen[0], pen[1]};
            memcpy(to, v + 4, sizeof to);
            if (fmax(fmax(pen[0], v[0]), fmax(v[2], v[4])) < g->box.x0 ||
                fmin(fmin(pen[0], v[0]), fmin(v[2], v[4])) > g->box.x1 ||
                fmax(fmax(pen[1], v[1]), fmax(v[3], v[5])) < g->box.y0 ||
                fmin(fmin(pen[1], v[1]), fmin(v[3], v[5])) > g->box.y1)
                break;
            for (int k = 1; k <= 20; k++) {
                const double t = k / 20.0, s = 1 - t;
                for (int d = 0; d < 2; d++)
                    to[d] = s * s * s * pen[d] + 3 * s * s * t * v[d] + 3 * s * t * t * v[d + 2] +
                            t * t * t * v[d + 4];
                if (segment_enters(last, to, g)) return 1;
                memcpy(last, to, sizeof last);
            }
            break;
        }
        case UTW_CLOSE:
            memcpy(to, start, sizeof to);
            if (segment_enters(pen, to, g)) return 1;
            break;
        case UTW_CIRCLE:
            for (int k = 0; k < 40; k++) {
                const double a0 = 0.15708 * k, a1 = 0.15708 * (k + 1);
                const double p[2] = {v[0] + v[2] * cos(a0), v[1] + v[2] * sin(a0)},
                             q[2] = {v[0] + v[2] * cos(a1), v[1] + v[2] * sin(a1)};
                if (segment_enters(p, q, g)) return 1;
            }
            break;
        }
        memcpy(pen, to, sizeof pen);
    }
    return 0;
}

static void check_lines(const utw_canvas *c, const utw_placed_text *text, const char *name)
{
    target g = {text->box, {0, 0, 0}};
    for (size_t i = 0; i < c->n_step; i++) {
        const utw_step *step = &c->step[i];
        if (step->act == UTW_CLIP) {
            /* pictures clip to single circles only */
            assert_int_equal(step->n, 1);
            assert_int_equal(c->segment[step->first].verb, UTW_CIRCLE);
            memcpy(g.clip, c->segment[step->first].v, sizeof g.clip);
        } else if (step->act == UTW_UNCLIP) {
            g.clip[2] = 0;
        }
        if (step->act != UTW_STROKE || !path_enters(c, step, &g)) continue;
        print_error("%s: a line runs through '%s'\n", name, text->text);
        fail();
    }
}

void picture_check_texts(const utw_canvas *c, const char *name)
{
    int n;
    const utw_placed_text *t = utw_canvas_placed(c, &n);
    assert_true(n > 0);
    for (int i = 0; i < n; i++) {
        const utw_box b = t[i].box;
        if (!(b.x0 >= 0 && b.y0 >= 0 && b.x1 <= c->width && b.y1 <= c->height)) {
            print_error("%s: '%s' leaves the page\n", name, t[i].text);
            fail();
        }
        for (int j = 0; j < i; j++)
            if (boxes_meet(b, t[j].box)) {
                print_error("%s: '%s' meets '%s'\n", name, t[i].text, t[j].text);
                fail();
            }
        check_lines(c, &t[i], name);
    }
}

pixels picture_pixels(const utw_canvas *canvas, double dpi)
{
    utw_error err;
    pixels p = {0, 0, NULL};
    assert_ok(utw_canvas_pixels(canvas, dpi, 0, &p.rgb, &p.nx, &p.ny, &err));
    return p;
}

double picture_lightness(const pixels *p, int x, int y)
{
    double lab[3];
    if (x < 0 || y < 0 || x >= p->nx || y >= p->ny) return 100;
    const unsigned v = p->rgb[y * p->nx + x];
    utw_colour_to_lab((utw_colour){(v >> 16) / 255.0, (v >> 8 & 255) / 255.0, (v & 255) / 255.0},
                      lab);
    return lab[0];
}

void picture_box_of(const pixels *p, utw_colour colour, int box[4])
{
    int b[4] = {p->nx, -1, p->ny, -1};
    for (int y = 0; y < p->ny; y++)
        for (int x = 0; x < p->nx; x++) {
            const unsigned v = p->rgb[y * p->nx + x];
            if (fabs((v >> 16) - 255 * colour.r) > 1.01 ||
                fabs((v >> 8 & 255) - 255 * colour.g) > 1.01 ||
                fabs((v & 255) - 255 * colour.b) > 1.01)
                continue;
            b[0] = x < b[0] ? x : b[0];
            b[1] = x > b[1] ? x : b[1];
            b[2] = y < b[2] ? y : b[2];
            b[3] = y > b[3] ? y : b[3];
        }
    assert_true(b[1] >= b[0]);
    memcpy(box, b, sizeof b);
}
