/* SPDX-License-Identifier: GPL-3.0-or-later
 * Contours of functions that are known everywhere, on samplings of sections with holes and arcs. */
#include "draw/contour.h"

#include "base/memory.h"
#include "section/solution.h"
#include "support/section.h"

/* A disc of radius 50 with an eccentric hole of radius 12. */
static const char disc[] = "\"outline\": {\"circle\": [0,0,50]}, "
                           "\"holes\": [{\"circle\": [14,5,12]}]";

typedef struct ground {
    utw_outline *outline;
    utw_solution *solution;
    utw_sampling s;
    double *value, unit;
} ground;

static ground ground_of(const char *part, double spacing)
{
    ground g;
    utw_error err;
    memset(&g, 0, sizeof g);
    g.outline = section_outline((double)NAN, "%s", part);
    g.solution = section_solve(g.outline, 1e-2, 0);
    g.unit = g.solution->unit;
    const utw_fineness fineness = {spacing / g.unit, 0.001 / g.unit};
    assert_ok(utw_sampling_init(&g.s, g.solution->solved.mesh, &fineness, &err));
    g.value = calloc((size_t)g.s.n_vertex, sizeof *g.value);
    return g;
}

static void ground_clear(ground *g)
{
    free(g->value);
    utw_sampling_clear(&g->s);
    utw_solution_free(g->solution);
    utw_outline_free(g->outline);
}

/* Vertices in the drawing's units and axes. */
static void vertex(const ground *g, int i, double xy[2])
{
    for (int d = 0; d < 2; d++) xy[d] = g->solution->origin[d] + g->unit * g->s.xy[i][d];
}

/* Area inside closed paths, in the drawing's units: positive counter-clockwise. */
static double area_of(const ground *g, const utw_paths *p)
{
    double sum = 0;
    for (int k = 0; k < p->n_path; k++) {
        const int first = p->first[k], end = utw_paths_end(p, k);
        assert_int_equal(p->closed[k], 1);
        for (int i = first; i < end; i++) {
            const double *a = p->xy[i], *b = p->xy[i + 1 < end ? i + 1 : first];
            sum += 0.5 * (a[0] * b[1] - a[1] * b[0]);
        }
    }
    return sum * g->unit * g->unit;
}

/* Where x >= c: a segment of the circle less the hole's (plane geometry). */
static double segment(double r, double d)
{
    if (d >= r) return 0;
    if (d <= -r) return 3.14159265358979 * r * r;
    return r * r * acos(d / r) - d * sqrt(r * r - d * d);
}

static void regions_of_a_plane_are_circle_segments(void **state)
{
    (void)state;
    static const double levels[] = {-60, -49, -20, 0, 2.385, 13.9, 26.5, 44, 60};
    ground g = ground_of(disc, 0.8);
    for (int i = 0; i < g.s.n_vertex; i++) {
        double xy[2];
        vertex(&g, i, xy);
        g.value[i] = xy[0];
    }
    for (size_t k = 0; k < sizeof levels / sizeof *levels; k++) {
        utw_error err;
        utw_paths region = {0}, line = {0};
        assert_ok(utw_contour(&g.s, g.value, levels[k], 0, &region, &line, &err));
        const double area = segment(50, levels[k]) - segment(12, levels[k] - 14);
        assert_close_scaled(area_of(&g, &region), area, 3e-4, 1000);
        /* the line of a plane is straight: two pieces beside the hole, one elsewhere, none outside
         */
        const int pieces = fabs(levels[k]) > 50 ? 0 : fabs(levels[k] - 14) < 12 ? 2 : 1;
        assert_int_equal(line.n_path, pieces);
        for (int i = 0; i < line.n_point; i++)
            assert_close_scaled(g.solution->origin[0] + g.unit * line.xy[i][0], levels[k], 1e-9,
                                100);
        utw_paths_clear(&region);
        utw_paths_clear(&line);
    }
    ground_clear(&g);
}

/* Rings around a point: closed lines, and a region with a hole of its own. */
static void rings_close(void **state)
{
    (void)state;
    utw_error err;
    utw_paths region = {0}, line = {0};
    ground g = ground_of("\"outline\": [[0,0],[80,0],[80,60],[0,60]]", 0.8);
    for (int i = 0; i < g.s.n_vertex; i++) {
        double xy[2];
        vertex(&g, i, xy);
        g.value[i] = hypot(xy[0] - 31, xy[1] - 27);
    }
    assert_ok(utw_contour(&g.s, g.value, 20, 0, &region, &line, &err));
    assert_int_equal(line.n_path, 1);
    assert_int_equal(line.closed[0], 1);
    assert_int_equal(region.n_path, 2);
    assert_close(area_of(&g, &region), 80 * 60 - 3.14159265358979 * 400, 5e-4);
    for (int i = 0; i < line.n_point; i++) {
        const double x = g.solution->origin[0] + g.unit * line.xy[i][0],
                     y = g.solution->origin[1] + g.unit * line.xy[i][1];
        assert_close(hypot(x - 31, y - 27), 20, 2e-3);
    }
    utw_paths_clear(&region);
    utw_paths_clear(&line);
    ground_clear(&g);
}

/* Regions of neighbouring levels differ by the band between them, whatever the function. */
static void bands_fill_the_section(void **state)
{
    (void)state;
    ground g = ground_of(disc, 1.1);
    double last = 3.14159265358979 * (2500 - 144);
    for (int i = 0; i < g.s.n_vertex; i++) {
        double xy[2];
        vertex(&g, i, xy);
        g.value[i] = sin(0.13 * xy[0]) * cos(0.11 * xy[1]) + 0.01 * xy[0];
    }
    for (double level = -2; level <= 2; level += 0.1) {
        utw_error err;
        utw_paths region = {0};
        assert_ok(utw_contour(&g.s, g.value, level, 0.002 / g.unit, &region, NULL, &err));
        const double area = area_of(&g, &region);
        assert_true(area <= last * (1 + 1e-4) + 1e-9);
        last = area;
        utw_paths_clear(&region);
    }
    assert_close_scaled(last, 0, 1e-9, 1);
    ground_clear(&g);
}

static void no_memory_is_told(void **state)
{
    (void)state;
    utw_error err;
    ground g = ground_of(disc, 3);
    for (int i = 0; i < g.s.n_vertex; i++) g.value[i] = g.s.xy[i][0];
    utw_status st = UTW_E_NOMEM;
    for (long n = 1; st == UTW_E_NOMEM; n++) {
        utw_paths region = {0}, line = {0};
        utw_memory_fail_at(n);
        st = utw_contour(&g.s, g.value, 0, 0, &region, &line, &err);
        utw_memory_fail_at(0);
        utw_paths_clear(&region);
        utw_paths_clear(&line);
        assert_true(n < 100);
    }
    assert_int_equal(st, UTW_OK);
    ground_clear(&g);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(regions_of_a_plane_are_circle_segments),
        balanced_test(rings_close),
        balanced_test(bands_fill_the_section),
        balanced_test(no_memory_is_told),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
