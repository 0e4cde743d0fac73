/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "thinwall/border.h"

#include "base/vec2.h"
#include "support/drawing.h"
#include "support/shapes.h"

static utw_border *border_of(const utw_outline *outline, double density)
{
    utw_error err;
    utw_border *border = NULL;
    assert_ok(utw_border_create(outline, density, &border, &err));
    return border;
}

/* Points lie on their curves, loops close, neighbours are at most 3/8 of the wall apart and differ
 * in spacing by 2.5 at most. */
static void points(void **state)
{
    (void)state;
    utw_outline *outline = shape_of("box h=100 b=60 t=6 ro=9 ri=6");
    utw_border *b = border_of(outline, 1), *dense = border_of(outline, 2);
    double area = 0;
    assert_int_equal(b->n_loop, 2);
    assert_int_equal(b->loop[2], b->n_point);
    for (int i = 0; i < b->n_point; i++) {
        const int next = b->after[i], beyond = b->after[next];
        const double step = b->unit * utw_distance(b->xy[i], b->xy[next]),
                     step2 = b->unit * utw_distance(b->xy[next], b->xy[beyond]);
        double p[2];
        utw_curve_point(&b->curve[b->on[i]].curve, b->t[i], p);
        assert_true(utw_distance(p, b->xy[i]) < 1e-14);
        assert_true(step <= 0.375 * 6 * 1.05);
        assert_true(step <= 2.51 * step2 && step2 <= 2.51 * step);
        area += 0.5 * utw_cross(b->xy[i], b->xy[next]) * b->unit * b->unit;
    }
    /* chords of arcs leave out or add a little */
    assert_close(area, 6000 - 88 * 48 - (4 - UTW_PI) * (81 - 36), 0.01);
    assert_true(dense->n_point > 1.6 * b->n_point && dense->n_point < 2.4 * b->n_point);
    utw_border_free(b);
    utw_border_free(dense);
    utw_border_free(NULL);
    utw_outline_free(outline);
}

/* An angle in its own coordinates, and what one who slides along it finds. */
static void sliding(void **state)
{
    (void)state;
    drawing d;
    const double xy[][2] = {{0, 0}, {60, 0}, {60, 8}, {8, 8}, {8, 90}, {0, 90}};
    drawing_init(&d);
    drawing_part(&d, 0);
    drawing_polygon(&d, 6, xy);
    utw_border *b = border_of(drawing_done(&d), 1);
    int re_entrant = -1;
    assert_int_equal(b->n_curve, 6);
    for (int i = 0; i < 6; i++) {
        if (b->curve[i].turn > 0) continue;
        assert_close(b->curve[i].turn, -0.5 * UTW_PI, 1e-12);
        assert_int_equal(re_entrant, -1);
        re_entrant = i; /* the face from (8, 8) up */
    }
    const double p[2] = {(20 - b->origin[0]) / b->unit, (5 - b->origin[1]) / b->unit};
    int curve = re_entrant;
    double t = 0.5, q[2], e[2];
    utw_border_tangent(b, re_entrant, 0.3, e);
    assert_close(e[1], 1, 1e-14);
    /* from the upright face around the re-entrant corner to the level one above (20, 5) */
    assert_close(b->unit * utw_border_slide(b, p, &curve, &t, q), 3, 1e-12);
    assert_int_equal(curve, b->curve[re_entrant].before);
    assert_close(b->origin[0] + b->unit * q[0], 20, 1e-12);
    assert_close(b->origin[1] + b->unit * q[1], 8, 1e-12);
    utw_border_free(b);
    drawing_clear(&d);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(points), balanced_test(sliding)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
