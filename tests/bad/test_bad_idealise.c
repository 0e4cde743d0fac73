/* SPDX-License-Identifier: GPL-3.0-or-later
 * The worst outlines: an answer or a plain sentence, soon, and no memory lost. */
#include "support/drawing.h"
#include "support/shapes.h"

#include "base/clock.h"
#include "base/memory.h"
#include "base/vec2.h"
#include "thinwall/idealise.h"

#define SOON 2.0 /* seconds, on a machine that does other work too */

/* Idealise within the time allowed; the outline is cleared. Returns NULL with the sentence in *err.
 */
static utw_idealisation *try_soon(drawing *d, utw_error *err)
{
    utw_idealisation *ideal = NULL;
    const double start = utw_seconds();
    const utw_status st = utw_idealise(drawing_done(d), &ideal, err);
    assert_true(utw_seconds() - start < SOON);
    drawing_clear(d);
    if (st == UTW_OK) return ideal;
    if (st != UTW_E_NO_THIN_WALL) print_error("%s\n", err->text);
    assert_int_equal(st, UTW_E_NO_THIN_WALL);
    assert_null(ideal);
    return NULL;
}

static void refused(drawing *d, const char *sentence)
{
    utw_error err;
    assert_null(try_soon(d, &err));
    assert_string_equal(err.text, sentence);
}

static void start(drawing *d)
{
    drawing_init(d);
    drawing_part(d, 0);
}

/* Closed polygon by radius and angle. */
static void polar(drawing *d, int n, double (*radius)(int, int), double turns)
{
    for (int i = 0; i < n; i++) {
        const double a = 2 * UTW_PI * turns * i / n, r = radius(i, n);
        if (i == 0)
            drawing_move(d, r * cos(a), r * sin(a));
        else
            drawing_line(d, r * cos(a), r * sin(a));
    }
    drawing_close(d);
}

static double five_points(int i, int n)
{
    (void)n;
    return i % 2 ? 26 : 10;
}

static double sharp_points(int i, int n)
{
    (void)n;
    return i % 2 ? 26 : 3;
}

static double teeth(int i, int n)
{
    (void)n;
    return i % 4 < 2 ? 20 : 24;
}

#define LUMP                                                                                       \
    "the section has no thin-walled idealisation: no part of it is clearly longer than thick "

static void lumps(void **state)
{
    (void)state;
    drawing d;
    start(&d);
    drawing_circle(&d, 3, 4, 10);
    refused(&d, LUMP "(width 20, height 20, area 314.2)");
    start(&d);
    drawing_rectangle(&d, -10, -10, 10, 10);
    refused(&d, LUMP "(width 20, height 20, area 400)");
    start(&d);
    drawing_rectangle(&d, -20, -10, 20, 10);
    refused(&d, "the section has no thin-walled idealisation: its most slender wall is 2 times as "
                "long as thick (at least 3 times is needed), and all walls together are 2 times as "
                "long as thick on average");
    start(&d);
    drawing_ellipse(&d, 0, 0, 20, 10, 0.3);
    utw_error err;
    assert_null(try_soon(&d, &err));
    start(&d);
    polar(&d, 10, five_points, 1);
    assert_null(try_soon(&d, &err));
    start(&d);
    polar(&d, 96, teeth, 1);
    refused(&d, LUMP "(width 47.9, height 47.9, area 1519)");
}

/* Spikes of 10 degrees are walls. */
static void star(void **state)
{
    (void)state;
    drawing d;
    utw_error err;
    start(&d);
    polar(&d, 14, sharp_points, 1);
    utw_idealisation *ideal = try_soon(&d, &err);
    assert_non_null(ideal);
    assert_int_equal(utw_idealisation_get(ideal)->walls, 7);
    utw_idealisation_free(ideal);
}

static void comb(void **state)
{
    (void)state;
    const double tooth[] = {1, 0.5}, gap[] = {2, 0.5}, spine[] = {2, 3};
    const int n[] = {20, 60};
    for (int k = 0; k < 2; k++) {
        drawing d;
        utw_error err;
        start(&d);
        drawing_move(&d, 0, 0);
        drawing_line(&d, n[k] * tooth[k] + (n[k] - 1) * gap[k], 0);
        for (int i = n[k] - 1; i >= 0; i--) {
            const double x = i * (tooth[k] + gap[k]);
            drawing_line(&d, x + tooth[k], spine[k] + 30);
            drawing_line(&d, x, spine[k] + 30);
            if (i == 0) break;
            drawing_line(&d, x, spine[k]);
            drawing_line(&d, x - gap[k], spine[k]);
        }
        drawing_close(&d);
        utw_idealisation *ideal = try_soon(&d, &err);
        assert_non_null(ideal);
        assert_int_equal(utw_idealisation_get(ideal)->junctions, n[k] - 2);
        utw_idealisation_free(ideal);
    }
}

/* A strip wound up, drawn with straight pieces. */
static void spiral(void **state)
{
    (void)state;
    enum { N = 300 };
    drawing d;
    utw_error err;
    start(&d);
    for (int k = 0; k <= 2 * N + 1; k++) {
        const int i = k <= N ? k : 2 * N + 1 - k;
        const double a = 8 * UTW_PI * i / N, r = 10 + 20.0 * i / N + (k <= N ? 0.5 : -0.5);
        if (k == 0)
            drawing_move(&d, r * cos(a), r * sin(a));
        else
            drawing_line(&d, r * cos(a), r * sin(a));
    }
    drawing_close(&d);
    utw_idealisation *ideal = try_soon(&d, &err);
    assert_non_null(ideal);
    assert_true(utw_idealisation_get(ideal)->slenderness > 400);
    assert_int_equal(utw_idealisation_get(ideal)->cells, 0);
    utw_idealisation_free(ideal);
}

/* Two discs joined by a hair. */
static void hair(void **state)
{
    (void)state;
    const double half[] = {2, 5e-3, 5e-5};
    for (int k = 0; k < 3; k++) {
        drawing d;
        utw_error err;
        const double h = half[k], x = sqrt(100 - h * h);
        start(&d);
        drawing_move(&d, -20 + x, -h);
        drawing_line(&d, 20 - x, -h);
        drawing_arc(&d, 30, 0, 20 - x, h);
        drawing_line(&d, -20 + x, h);
        drawing_arc(&d, -30, 0, -20 + x, -h);
        drawing_close(&d);
        assert_null(try_soon(&d, &err));
        assert_non_null(strstr(err.text, "of its area lies between the two faces of a wall"));
    }
}

/* A hole that nearly touches the outside: a cell whatever the ligament. */
static void hole_near_the_edge(void **state)
{
    (void)state;
    const double left[] = {1, 1e-2, 1e-4};
    for (int k = 0; k < 3; k++) {
        drawing d;
        utw_error err;
        start(&d);
        drawing_rectangle(&d, -20, -20, 20, 20);
        drawing_circle(&d, 0, 10 - left[k], 10);
        drawing_reverse(&d);
        utw_idealisation *ideal = try_soon(&d, &err);
        if (ideal != NULL) assert_int_equal(utw_idealisation_get(ideal)->cells, 1);
        utw_idealisation_free(ideal);
    }
}

/* A plate with holes and a plate with a slit: as many cells as holes. */
static void plates(void **state)
{
    (void)state;
    drawing d;
    utw_error err;
    start(&d);
    drawing_rectangle(&d, -60, -5, 60, 5);
    for (int i = -2; i <= 2; i++) {
        drawing_circle(&d, 20 * i, 0, 3);
        drawing_reverse(&d);
    }
    utw_idealisation *ideal = try_soon(&d, &err);
    assert_non_null(ideal);
    assert_int_equal(utw_idealisation_get(ideal)->cells, 5);
    utw_idealisation_free(ideal);
    start(&d);
    drawing_rectangle(&d, -60, -5, 60, 5);
    drawing_rectangle(&d, -30, -0.01, 30, 0.01);
    drawing_reverse(&d);
    ideal = try_soon(&d, &err);
    assert_non_null(ideal);
    assert_int_equal(utw_idealisation_get(ideal)->cells, 1);
    utw_idealisation_free(ideal);
}

static void arguments(void **state)
{
    (void)state;
    utw_error err;
    utw_idealisation *ideal = NULL;
    assert_int_equal(utw_idealise(NULL, &ideal, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text, "utw_idealise: outline and idealisation must not be NULL");
    utw_idealisation_free(NULL);
}

static void memory_runs_out(void **state)
{
    (void)state;
    utw_outline *outline = shape_of("formed-channel h=150 b=60 c=18 t=2 ri=3");
    utw_status st = UTW_E_NOMEM;
    long n = 1;
    for (; st == UTW_E_NOMEM && n < 5000; n += n < 60 ? 1 : 7) {
        utw_error err;
        utw_idealisation *ideal = NULL;
        const long live = utw_memory_live();
        utw_memory_fail_at(n);
        st = utw_idealise(outline, &ideal, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_null(ideal);
        utw_idealisation_free(ideal);
        assert_int_equal(utw_memory_live(), live);
    }
    assert_int_equal(st, UTW_OK);
    assert_true(n > 50);
    utw_outline_free(outline);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(lumps),  balanced_test(star),      balanced_test(comb),
        balanced_test(spiral), balanced_test(hair),      balanced_test(hole_near_the_edge),
        balanced_test(plates), balanced_test(arguments), balanced_test(memory_runs_out),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
