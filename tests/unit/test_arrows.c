/* SPDX-License-Identifier: GPL-3.0-or-later
 * Arrows: where they stand, where they point, how long they are. */
#include "draw/arrows.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "draw/canvas_list.h"
#include "draw/picture.h"
#include "support/section.h"

/* A section on a page of its own with its sampling. */
typedef struct scene {
    utw_outline *outline;
    utw_solution *solution;
    utw_canvas *canvas;
    utw_page page;
    utw_sampling s;
    double (*v)[2];
    utw_colour *colour;
} scene;

static scene scene_of(const char *part)
{
    scene c;
    utw_error err;
    const utw_draw_options options = UTW_DRAW_OPTIONS_INIT;
    const utw_notes notes = {0};
    memset(&c, 0, sizeof c);
    c.outline = section_outline(0.3, "%s", part);
    c.solution = section_solve(c.outline, 1e-2, 0);
    assert_ok(utw_canvas_create(&c.canvas, &err));
    const utw_sitting sitting = {c.solution, &options, c.canvas};
    utw_request q = utw_sitting_request(&sitting, "", &notes);
    memcpy(q.box, c.outline->box, sizeof q.box);
    q.no_scale = 1; /* no other arrows */
    assert_ok(utw_layout(c.canvas, &q, &c.page, &err));
    const utw_fineness fineness = utw_sitting_fineness(&sitting);
    assert_ok(utw_sampling_init(&c.s, c.solution->solved.mesh, &fineness, &err));
    const utw_frame frame = utw_sitting_frame(&sitting, &c.page);
    utw_sampling_map(&c.s, &frame);
    c.v = calloc((size_t)c.s.n_vertex, sizeof *c.v);
    c.colour = calloc((size_t)c.s.n_vertex, sizeof *c.colour);
    return c;
}

static void scene_clear(scene *c)
{
    free(c->v);
    free(c->colour);
    utw_sampling_clear(&c->s);
    utw_page_clear(&c->page);
    utw_canvas_free(c->canvas);
    utw_solution_free(c->solution);
    utw_outline_free(c->outline);
}

/* The arrows as drawn: tail and the point of the head, which is a triangle filled after its line.
 */
static int arrows_on(const utw_canvas *c, double (*tail)[2], double (*head)[2], int most)
{
    int n = 0;
    for (size_t i = 0; i + 1 < c->n_step && n < most; i++) {
        if (c->step[i].act != UTW_STROKE || c->step[i].n != 2 || c->step[i + 1].act != UTW_FILL)
            continue;
        memcpy(tail[n], c->segment[c->step[i].first].v, sizeof tail[n]);
        memcpy(head[n++], c->segment[c->step[i + 1].first].v, sizeof head[n]);
    }
    return n;
}

enum { MOST = 2000 };

static void a_plate_is_covered_evenly(void **state)
{
    (void)state;
    static double tail[MOST][2], head[MOST][2];
    utw_error err;
    double longest;
    scene c = scene_of("\"outline\": [[0,0],[80,0],[80,55],[0,55]]");
    for (int i = 0; i < c.s.n_vertex; i++) {
        c.v[i][0] = 2;
        c.v[i][1] = 1;
    }
    const utw_box d = c.page.drawing, hole = {d.x0, d.y0, 0.5 * (d.x0 + d.x1), 0.5 * (d.y0 + d.y1)};
    assert_ok(utw_arrows_draw(&c.page, &c.s, (const double(*)[2])c.v, c.colour, 1, &hole, &longest,
                              &err));
    assert_close(longest, sqrt(5), 1e-9);
    const int n = arrows_on(c.canvas, tail, head, MOST);
    const double f = c.page.font, area = 0.75 * (d.x1 - d.x0) * (d.y1 - d.y0);
    assert_true(n > 0.6 * area / (0.866 * 4 * f * f) && n < 1.1 * area / (0.866 * 4 * f * f));
    for (int i = 0; i < n; i++) {
        const double u[2] = {head[i][0] - tail[i][0], head[i][1] - tail[i][1]};
        assert_close(utw_norm(u), 1.7 * f, 1e-9);
        assert_close(u[0] / utw_norm(u), 2 / sqrt(5), 1e-9);
        assert_close(u[1] / utw_norm(u), -1 / sqrt(5), 1e-9); /* y is upward, the page's downward */
        assert_true(tail[i][0] > hole.x1 || head[i][1] > hole.y1);
        const double x = 0.5 * (tail[i][0] + head[i][0]), y = 0.5 * (tail[i][1] + head[i][1]);
        assert_true(x > d.x0 + 0.3 * f && x < d.x1 - 0.3 * f && y > d.y0 + 0.3 * f &&
                    y < d.y1 - 0.3 * f);
        for (int j = 0; j < i; j++) assert_true(utw_distance(tail[i], tail[j]) > 1.4 * f);
    }
    scene_clear(&c);
}

/* A wall thinner than the distance of arrows has them in a row in its middle. */
static void thin_walls_have_one_row(void **state)
{
    (void)state;
    static double tail[MOST][2], head[MOST][2];
    utw_error err;
    double longest;
    scene c = scene_of("\"outline\": [[0,0],[120,0],[120,2],[0,2]]");
    for (int i = 0; i < c.s.n_vertex; i++) c.v[i][0] = 1 + c.s.xy[i][0] / c.page.width;
    assert_ok(
        utw_arrows_draw(&c.page, &c.s, (const double(*)[2])c.v, c.colour, 0, NULL, &longest, &err));
    const int n = arrows_on(c.canvas, tail, head, MOST);
    const utw_box d = c.page.drawing;
    assert_true(n > 0.8 * (d.x1 - d.x0) / (2 * c.page.font));
    for (int i = 0; i < n; i++) {
        assert_true(fabs(tail[i][1] - 0.5 * (d.y0 + d.y1)) < 0.25 * c.page.font);
        for (int j = 0; j < n; j++) /* longer to the right */
            if (tail[j][0] > tail[i][0] + 1)
                assert_true(head[j][0] - tail[j][0] > head[i][0] - tail[i][0]);
    }
    scene_clear(&c);
}

static void nothing_is_drawn_of_nothing(void **state)
{
    (void)state;
    static double tail[MOST][2], head[MOST][2];
    utw_error err;
    double longest = -1;
    scene c = scene_of("\"outline\": {\"circle\": [2,3,20]}");
    assert_ok(
        utw_arrows_draw(&c.page, &c.s, (const double(*)[2])c.v, c.colour, 0, NULL, &longest, &err));
    assert_true(longest >= 0 && longest <= 0);
    assert_int_equal(arrows_on(c.canvas, tail, head, MOST), 0);
    scene_clear(&c);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(a_plate_is_covered_evenly),
        balanced_test(thin_walls_have_one_row),
        balanced_test(nothing_is_drawn_of_nothing),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
