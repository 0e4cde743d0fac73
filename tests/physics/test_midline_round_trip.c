/* SPDX-License-Identifier: GPL-3.0-or-later
 * Midlines that are thickened, sampled and found again; trade shapes whose walls are known. */
#include "support/drawings.h"
#include "support/shapes.h"

#include "base/memory.h"
#include "thinwall/idealise.h"
#include "thinwall/rate.h"

static utw_idealisation *found_in(const utw_outline *outline)
{
    utw_error err;
    utw_idealisation *ideal = NULL;
    assert_ok(utw_idealise(outline, &ideal, &err));
    return ideal;
}

static double distance_to_nodes(const utw_midline *m, const double p[2])
{
    double best = HUGE_VAL;
    for (int i = 0; i < m->n_nodes; i++)
        best = fmin(best, hypot(m->nodes[i][0] - p[0], m->nodes[i][1] - p[1]));
    return best;
}

/* The thickness of the found wall that lies on the middle of a given one. */
static double thickness_at(const utw_idealisation *found, const double p[2])
{
    const utw_midline *m = utw_idealisation_midline(found);
    double best = HUGE_VAL, t = 0;
    for (int w = 0; w < m->n_walls; w++)
        for (int k = 0; k <= 200; k++) {
            utw_error err;
            utw_thin_station at;
            const utw_thin_load none = {0};
            assert_ok(utw_thin_at(utw_idealisation_thin(found), w, k / 200.0, &none, &at, &err));
            const double d = hypot(at.x - p[0], at.y - p[1]);
            if (d < best) {
                best = d;
                t = at.t;
            }
        }
    return t;
}

static void same_thickness(const utw_midline *given, const utw_idealisation *found)
{
    utw_thin *thin = utw_thin_of(given);
    for (int w = 0; w < given->n_walls; w++) {
        utw_error err;
        utw_thin_station at;
        const utw_thin_load none = {0};
        assert_ok(utw_thin_at(thin, w, 0.5, &none, &at, &err));
        const double p[2] = {at.x, at.y};
        assert_close(thickness_at(found, p), at.t, 0.02);
    }
    utw_thin_free(thin);
}

static void same_constants(const utw_midline *given, const utw_idealisation *found)
{
    utw_thin *thin = utw_thin_of(given);
    const utw_thin_constants *a = utw_thin_get(thin),
                             *b = utw_thin_get(utw_idealisation_thin(found));
    const double r2 = (a->Ixx + a->Iyy) / a->A, size = sqrt(r2);
    assert_close(b->A, a->A, 0.01);
    assert_close(b->J, a->J, 0.01);
    assert_close_scaled(b->xs, a->xs, 0.01, size);
    assert_close_scaled(b->ys, a->ys, 0.01, size);
    /* a tee's Iw is 0, and is found as 0 */
    assert_close_scaled(b->Iw, a->Iw, 0.01, 1e-9 * a->A * r2 * r2);
    utw_thin_free(thin);
}

static void twelve_drawings(void **state)
{
    (void)state;
    static const double t_over_b[] = {0.02, 0.05, 0.1, 0.2};
    utw_wall wall[32];
    utw_midline given;
    const char *name;
    int n = 0;
    for (; utw_drawing_sample(n, 1, wall, &given, &name) != NULL; n++)
        for (int k = 0; k < 4; k++) {
            utw_error err;
            utw_drawing_sample(n, t_over_b[k], wall, &given, &name);
            utw_outline *outline = utw_outline_of_midline(&given);
            utw_idealisation *found = found_in(outline), rated = {.midline = given};
            const utw_idealisation_info *info = utw_idealisation_get(found);
            assert_ok(utw_rate_walls(&rated, NULL, &err));
            if (info->walls != rated.info.walls) print_error("%s at %g\n", name, t_over_b[k]);
            assert_int_equal(info->walls, rated.info.walls);
            assert_int_equal(info->bends, rated.info.bends);
            assert_int_equal(info->junctions, rated.info.junctions);
            assert_int_equal(info->cells, rated.info.cells);
            assert_int_equal(info->cells, info->holes);
            assert_int_equal(info->lumps, 0);
            assert_int_equal(info->links, 0);
            assert_int_equal(info->given, 0);
            for (int i = 0; i < given.n_nodes; i++) {
                double t = 0;
                for (int w = 0; w < given.n_walls; w++) {
                    if (wall[w].from == i) t = fmax(t, wall[w].t0);
                    if (wall[w].to == i) t = fmax(t, wall[w].t1);
                }
                assert_true(distance_to_nodes(&found->midline, given.nodes[i]) <= 0.25 * t);
            }
            same_thickness(&given, found);
            if (t_over_b[k] < 0.15) same_constants(&given, found);
            utw_free(rated.wall);
            utw_idealisation_free(found);
            utw_outline_free(outline);
        }
    assert_int_equal(n, 12);
}

/* The midline a section was drawn by takes the place of one that would be found. */
static void a_given_midline_is_taken(void **state)
{
    (void)state;
    utw_error err;
    utw_wall wall[32];
    utw_midline given;
    const char *name;
    utw_drawing_sample(6, 0.05, wall, &given, &name);
    utw_outline *outline = NULL;
    assert_ok(utw_outline_from_midline(&given, "mm N", &outline, &err));
    utw_idealisation *ideal = found_in(outline);
    const utw_midline *m = utw_idealisation_midline(ideal);
    assert_int_equal(utw_idealisation_get(ideal)->given, 1);
    assert_int_equal(m->n_walls, given.n_walls);
    assert_memory_equal(m->nodes, given.nodes, (size_t)given.n_nodes * sizeof *given.nodes);
    assert_int_equal(utw_idealisation_get(ideal)->holes, 2);
    utw_idealisation_free(ideal);
    utw_outline_free(outline);
}

typedef struct counts {
    const char *shape;
    int walls, bends, junctions, cells;
} counts;

static void trade_shapes(void **state)
{
    (void)state;
    static const counts list[] = {
        {"rectangle b=100 h=8", 1, 0, 0, 0},
        {"angle h=100 b=65 t=10 r=10 r2=5", 2, 0, 0, 0},
        {"box h=100 b=60 t=6 ro=9 ri=6", 4, 4, 0, 1},
        {"box h=100 b=60 t=5 ro=10 ri=5", 4, 4, 0, 1},
        {"box h=100 b=60 t=5", 4, 0, 0, 1},
        {"box h=50 b=50 t=10", 4, 0, 0, 1},
        {"channel h=100 b=50 tf=8.5 tw=6 r=8.5", 3, 0, 0, 0},
        {"channel h=100 b=50 tf=8.5 tw=6 r=8.5 r2=4.5 slope=8", 3, 0, 0, 0},
        {"tee h=100 b=100 tf=11 tw=11 r=11", 3, 0, 1, 0},
        {"I h=200 b=100 tf=8.5 tw=5.6 r=12", 5, 0, 2, 0},
        {"I h=80 b=42 tf=5.9 tw=3.9 r=3.9 r2=2.3 slope=14", 5, 0, 2, 0},
        {"I h=120 b=106 tf=20 tw=12 r=12", 5, 0, 2, 0},
        {"cruciform h=100 t=10 r=5", 4, 0, 1, 0},
        {"slit-tube d=100 t=5 gap=2", 1, 0, 0, 0},
        {"zed h=100 b=50 tf=8 tw=6 r=5", 3, 0, 0, 0},
        {"formed-channel h=150 b=60 c=18 t=2 ri=3", 5, 4, 0, 0},
        {"formed-zed h=200 b=70 c=20 t=2 ri=4", 5, 4, 0, 0},
        {"hat h=60 b=60 c=30 t=3 ri=4", 5, 4, 0, 0},
        {"arc-strip r=50 t=4 angle=120", 1, 0, 0, 0},
        {"tube d=60.3 t=4", 1, 0, 0, 1},
    };
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        utw_outline *outline = shape_of(list[i].shape);
        utw_idealisation *ideal = found_in(outline);
        const utw_idealisation_info *info = utw_idealisation_get(ideal);
        if (info->walls != list[i].walls) print_error("%s\n", list[i].shape);
        assert_int_equal(info->walls, list[i].walls);
        assert_int_equal(info->bends, list[i].bends);
        assert_int_equal(info->junctions, list[i].junctions);
        assert_int_equal(info->cells, list[i].cells);
        assert_int_equal(info->links, 0);
        assert_int_equal(info->lumps, 0);
        utw_idealisation_free(ideal);
        utw_outline_free(outline);
    }
}

/* What lies in fillets is not in the midline: A of a rolled channel is 1 to 3 % low, and that of a
 * tube with concentric corners is exact. */
static void areas(void **state)
{
    (void)state;
    utw_outline *tube = shape_of("box h=100 b=60 t=5 ro=10 ri=5");
    utw_idealisation *ideal = found_in(tube);
    /* 2 (80 + 40) 5 + 2 pi 7.5 5 */
    assert_close(utw_thin_get(utw_idealisation_thin(ideal))->A, 1200 + 75 * acos(-1.0), 1e-9);
    utw_idealisation_free(ideal);
    utw_outline_free(tube);
    utw_outline *channel = shape_of("channel h=100 b=50 tf=8.5 tw=6 r=8.5");
    ideal = found_in(channel);
    /* mitred: (50 - 3) 8.5 twice and (100 - 8.5) 6 */
    assert_close(utw_thin_get(utw_idealisation_thin(ideal))->A, 2 * 47 * 8.5 + 91.5 * 6, 1e-9);
    utw_idealisation_free(ideal);
    utw_outline_free(channel);
}

/* A bulb is one thick part at the end of its plate, which reaches to where the fillet begins
 * however densely the boundary is sampled. */
static void thick_end(void **state)
{
    (void)state;
    double length[2], area[2];
    utw_outline *bulb = shape_of("bulb b=200 t=10 c=28 r=8");
    for (int k = 0; k < 2; k++) {
        utw_error err;
        utw_idealisation *ideal = NULL;
        assert_ok(utw_idealise_with(bulb, 1 + k, &ideal, &err));
        const utw_idealisation_info *info = utw_idealisation_get(ideal);
        assert_int_equal(info->walls, 2);
        assert_int_equal(info->lumps, 1);
        assert_close_scaled(info->area_error, 0, 1e-3, 1);
        length[k] = area[k] = 0;
        for (int i = 0; i < 2; i++) {
            const utw_wall_info *w = utw_idealisation_wall(ideal, i);
            if (w->kind == UTW_WALL_LUMP)
                area[k] = w->length * w->thickness;
            else
                length[k] = w->length;
        }
        utw_idealisation_free(ideal);
    }
    assert_close(length[0], length[1], 1e-9);
    assert_close(area[0], area[1], 2e-3);
    utw_outline_free(bulb);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(twelve_drawings), balanced_test(a_given_midline_is_taken),
        balanced_test(trade_shapes),    balanced_test(areas),
        balanced_test(thick_end),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
