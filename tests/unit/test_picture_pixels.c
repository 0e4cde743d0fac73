/* SPDX-License-Identifier: GPL-3.0-or-later
 * Pictures as pixels: outlines lie where they should, symmetric sections give symmetric pictures,
 * signs are as the axes say. */
#include "base/memory.h"
#include "base/vec2.h"
#include "outline/outline.h"
#include "support/picture.h"
#include "support/section.h"

#define DPI 300

/* Where the drawing lies on the pixels, from the pixels themselves: the box of what is dark or
 * coloured inside the largest figure is not known to the code under test. */
typedef struct lens {
    double scale, x0, y0;
} lens;

/* [in] box: of the metal, which begins half an outline's width inside; the outline's left side is
 * upright at half its height. */
static lens lens_of(const pixels *p, const int box[4], const double extent[4])
{
    lens l;
    int line = 0;
    while (picture_lightness(p, box[0] - 1 - line, (box[2] + box[3]) / 2) < 70) line++;
    assert_in_range(line, 2, 8);
    l.scale = (box[1] + 1 - box[0] + line) / (extent[2] - extent[0]);
    l.x0 = box[0] - 0.5 * line - l.scale * extent[0];
    l.y0 = box[3] + 1 + 0.5 * line + l.scale * extent[1];
    return l;
}

static double seen_at(const pixels *p, const lens *l, double x, double y)
{
    return picture_lightness(p, (int)floor(l->x0 + l->scale * x), (int)floor(l->y0 - l->scale * y));
}

static void the_outline_lies_where_it_should(void **state)
{
    (void)state;
    utw_outline *o = section_outline(
        0.3, "%s",
        "\"outline\": [[0,0],[70,0],{\"at\":[70,31],\"bulge\":0.3},[22,31],"
        "{\"at\":[0,44],\"bezier\":[[15,35],[9,44]]}], \"holes\": [{\"circle\": [14.5,15,8.25]}]");
    utw_solution *s = section_solve(o, 1e-3, 0);
    utw_draw_options options = UTW_DRAW_OPTIONS_INIT;
    utw_canvas *canvas = picture_canvas(s, UTW_PICTURE_OUTLINE, &options);
    pixels p = picture_pixels(canvas, DPI);
    int box[4];
    picture_box_of(&p, utw_metal(), box);
    lens l = lens_of(&p, box, o->box);
    /* same scale both ways */
    assert_true(fabs(l.y0 - l.scale * o->box[3] - box[2]) < 5);
    int all = 0, on = 0, off = 0;
    for (int k = 0; k < o->part[0].n_loop; k++)
        for (int i = 0; i < o->part[0].loop[k].n; i++)
            for (double t = 0.07; t < 1; t += 0.09) {
                const utw_curve *c = &o->part[0].loop[k].curve[i];
                double q[2], d[2];
                utw_curve_point(c, t, q);
                utw_curve_d1(c, t, d);
                const double n = utw_norm(d), step = 0.9; /* [L]: the material is on the left */
                all++;
                on += seen_at(&p, &l, q[0], q[1]) < 60;
                off += seen_at(&p, &l, q[0] - step * d[1] / n, q[1] + step * d[0] / n) > 70 &&
                       seen_at(&p, &l, q[0] + step * d[1] / n, q[1] - step * d[0] / n) > 95;
            }
    assert_in_range(all, 60, 100);
    assert_int_equal(on, all);
    assert_true(off >= all - 4); /* axes and marks cross some */
    utw_free(p.rgb);
    utw_canvas_free(canvas);
    utw_solution_free(s);
    utw_outline_free(o);
}

/* The part of the pixels of a picture's drawing that its image under (x, y) -> (sx x, sy y) about
 * the middle of the drawing repeats. */
static double repeats(const pixels *p, const int box[4], int sx, int sy)
{
    long same = 0, all = 0;
    for (int y = box[2]; y <= box[3]; y++)
        for (int x = box[0]; x <= box[1]; x++) {
            const int mx = sx > 0 ? x : box[0] + box[1] - x, my = sy > 0 ? y : box[2] + box[3] - y;
            const double a = picture_lightness(p, x, y), b = picture_lightness(p, mx, my);
            if (a > 99 && b > 99) continue;
            all++;
            same += fabs(a - b) < 4;
        }
    assert_true(all > 10000);
    return (double)same / (double)all;
}

/* From (x, y) in steps of (dx, dy): how many steps the picture goes on, white lines of a pixel or
 * two apart. */
static int reach(const pixels *p, int x, int y, int dx, int dy)
{
    int last = 0;
    for (int k = 1; k - last < 8; k++)
        if (picture_lightness(p, x + k * dx, y + k * dy) < 99) last = k;
    return last;
}

/* The box of the drawing, from a point inside. */
static void drawing_box(const pixels *p, const double at[2], int box[4])
{
    const int x = (int)at[0], y = (int)at[1];
    box[0] = x - reach(p, x, y, -1, 0);
    box[1] = x + reach(p, x, y, 1, 0);
    box[2] = y - reach(p, x, y, 0, -1);
    box[3] = y + reach(p, x, y, 0, 1);
}

/* A rectangle: omega is odd in x and in y, so the picture repeats itself when turned by half a turn
 * and nowhere near when mirrored. */
static void symmetric_sections_give_symmetric_pictures(void **state)
{
    (void)state;
    utw_outline *o = section_rectangle(0.3, 10, 20, 70, 50);
    utw_solution *s = section_solve(o, 1e-6, 0);
    utw_canvas *canvas = picture_canvas(s, UTW_PICTURE_WARPING, NULL);
    pixels p = picture_pixels(canvas, 150);
    const double middle[2] = {0.5 * p.nx - 40, 0.42 * p.ny};
    int box[4];
    drawing_box(&p, middle, box);
    assert_true(abs((box[1] - box[0]) - 2 * (box[3] - box[2])) < 12);
    assert_true(repeats(&p, box, -1, -1) > 0.96);
    assert_true(repeats(&p, box, -1, 1) < 0.3);
    assert_true(repeats(&p, box, 1, -1) < 0.3);
    utw_free(p.rgb);
    utw_canvas_free(canvas);
    utw_solution_free(s);
    utw_outline_free(o);
}

/* omega = -(a^2 - b^2)/(a^2 + b^2) x y of an ellipse longer in x (Saint-Venant 1855): negative, and
 * so darker, where x y > 0. */
static void signs_are_those_of_the_axes(void **state)
{
    (void)state;
    utw_outline *o = section_outline(0.3, "%s", "\"outline\": {\"ellipse\": [5, 3, 60, 30, 0]}");
    utw_solution *s = section_solve(o, 1e-6, 0);
    utw_canvas *canvas = picture_canvas(s, UTW_PICTURE_WARPING, NULL);
    pixels p = picture_pixels(canvas, 150);
    const double start[2] = {0.4 * p.nx, 0.42 * p.ny};
    int box[4];
    drawing_box(&p, start, box);
    const int x = (box[0] + box[1]) / 2, y = (box[2] + box[3]) / 2;
    const int dx = (box[1] - box[0]) / 3, dy = (box[3] - box[2]) / 4;
    assert_true(picture_lightness(&p, x + dx, y - dy) < 50); /* up is y > 0 */
    assert_true(picture_lightness(&p, x - dx, y + dy) < 50);
    assert_true(picture_lightness(&p, x + dx, y + dy) > 75);
    assert_true(picture_lightness(&p, x - dx, y - dy) > 75);
    utw_free(p.rgb);
    utw_canvas_free(canvas);
    utw_solution_free(s);
    utw_outline_free(o);
}

/* sigma_z = Mx y / Ixx: with Mx > 0 tension, which is light, at the top; My > 0 compression, which
 * is dark, at the right (src/untwist.h). */
static void stresses_have_the_signs_of_the_axes(void **state)
{
    (void)state;
    static const char *const load[] = {"Mx", "My"};
    for (int k = 0; k < 2; k++) {
        char text[400];
        snprintf(text, sizeof text,
                 "{\"units\":\"mm N\",\"materials\":{\"m\":{\"E\":1000,\"nu\":0.3}},\"parts\":[{"
                 "\"material\":\"m\",\"outline\":[[3,7],[63,7],[63,47],[3,47]]}],"
                 "\"loads\":[{\"name\":\"a\",\"%s\":2385}]}",
                 load[k]);
        utw_outline *o = utw_outline_of(text);
        utw_solution *s = section_solve(o, 1e-4, 0);
        utw_draw_options options = UTW_DRAW_OPTIONS_INIT;
        options.component = UTW_SHOW_SIGMA_Z;
        utw_canvas *canvas = picture_canvas(s, UTW_PICTURE_STRESS, &options);
        pixels p = picture_pixels(canvas, 150);
        const double start[2] = {0.4 * p.nx, 0.4 * p.ny};
        int box[4];
        drawing_box(&p, start, box);
        const int x = (box[0] + box[1]) / 2, y = (box[2] + box[3]) / 2;
        const int dx = k == 0 ? 0 : (box[1] - box[0]) * 2 / 5,
                  dy = k == 0 ? (box[3] - box[2]) * 2 / 5 : 0;
        /* up is y > 0: tension at the top, or at the left */
        assert_true(picture_lightness(&p, x + 7 - dx, y - dy + 7) > 75);
        assert_true(picture_lightness(&p, x + 7 + dx, y + dy + 7) < 45);
        utw_free(p.rgb);
        utw_canvas_free(canvas);
        utw_solution_free(s);
        utw_outline_free(o);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(the_outline_lies_where_it_should),
        balanced_test(symmetric_sections_give_symmetric_pictures),
        balanced_test(signs_are_those_of_the_axes),
        balanced_test(stresses_have_the_signs_of_the_axes),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
