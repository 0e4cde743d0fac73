/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "thinwall/medial.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/drawing.h"
#include "support/support.h"

typedef struct row {
    drawing d;
    utw_border *border;
    utw_chordal *chordal;
    utw_station *station;
    int n;
} row;

static void begin(row *r)
{
    memset(r, 0, sizeof *r);
    drawing_init(&r->d);
    drawing_part(&r->d, 0);
}

static void find(row *r)
{
    utw_error err;
    assert_ok(utw_border_create(drawing_done(&r->d), 1, &r->border, &err));
    assert_ok(utw_chordal_create(r->border, &r->chordal, &err));
    assert_int_equal(r->chordal->n_branch, 1);
    assert_ok(utw_medial_stations(r->border, r->chordal, &r->chordal->branch[0], &r->station, &r->n,
                                  &err));
    assert_true(r->n > 10);
}

static void clear(row *r)
{
    utw_free(r->station);
    utw_chordal_free(r->chordal);
    utw_border_free(r->border);
    drawing_clear(&r->d);
}

/* A strip 100 long that tapers from 12 to 4: centres on y = 0, thickness as drawn. */
static void tapering_strip(void **state)
{
    (void)state;
    row r;
    int good = 0;
    const double xy[][2] = {{0, -6}, {100, -2}, {100, 2}, {0, 6}};
    begin(&r);
    drawing_polygon(&r.d, 4, xy);
    find(&r);
    for (int i = 0; i < r.n; i++) {
        const utw_station *s = &r.station[i];
        if (!s->good) continue;
        const double x = r.border->origin[0] + r.border->unit * s->x[0],
                     y = r.border->origin[1] + r.border->unit * s->x[1], t = r.border->unit * s->t;
        assert_close_scaled(y, 0, 1e-11, 100);
        assert_close(t, 12 - 0.08 * x, 1e-9);
        assert_close_scaled(fabs(s->e[0]), 1, 1e-12, 1);
        if (good++ > 0) /* in the order of the branch */
            assert_true((s->x[0] - r.station[i - 1].x[0]) * s->e[0] > -1e-9);
    }
    assert_true(good > 30);
    clear(&r);
}

/* A ring of radii 20 and 25 whose centres lie 1 apart: the midline is where circles touch both, an
 * ellipse with the centres as foci; |p - c1| + |p - c2| = 45. */
static void eccentric_ring(void **state)
{
    (void)state;
    row r;
    begin(&r);
    drawing_circle(&r.d, 0, 0, 25);
    drawing_circle(&r.d, 1, 0, 20);
    drawing_reverse(&r.d);
    find(&r);
    for (int i = 0; i < r.n; i++) {
        const double p[2] = {r.border->origin[0] + r.border->unit * r.station[i].x[0],
                             r.border->origin[1] + r.border->unit * r.station[i].x[1]};
        assert_int_equal(r.station[i].good, 1);
        assert_close(hypot(p[0], p[1]) + hypot(p[0] - 1, p[1]), 45, 1e-10);
    }
    clear(&r);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(tapering_strip),
                                       balanced_test(eccentric_ring)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
