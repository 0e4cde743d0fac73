/* SPDX-License-Identifier: GPL-3.0-or-later
 * Areas of thickened midlines by hand (elementary). */
#include "outline/thicken.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/figure.h"
#include "support/midlines.h"
#include "support/support.h"

/* Thickened and checked as a section file would be. */
static utw_outline *outline_of(const utw_midline *m)
{
    utw_error err;
    utw_outline *o = NULL;
    assert_ok(utw_outline_from_midline(m, "mm N", &o, &err));
    const utw_part *part = &o->part[0];
    assert_int_equal(o->n_part, 1);
    assert_int_equal(part->n_loop, m->n_walls - m->n_nodes + 2);
    for (int i = 0; i < part->n_loop; i++)
        for (int k = 0; k < part->loop[i].n; k++)
            assert_true(part->loop[i].vertex[k] >= 0 && part->loop[i].vertex[k] < m->n_walls);
    assert_int_equal(utw_outline_midline(o)->n_walls, m->n_walls);
    return o;
}

static double area_of(const utw_midline *m)
{
    utw_outline *o = outline_of(m);
    const double A = figure_of_outline(o).A;
    utw_outline_free(o);
    return A;
}

static void refused(const utw_midline *m, int place, const char *message)
{
    utw_error err;
    utw_outline *o = NULL;
    const utw_status st = utw_outline_from_midline(m, "mm N", &o, &err);
    assert_null(o);
    assert_string_equal(err.text, message);
    assert_int_equal(st, UTW_E_OUTLINE);
    assert_int_equal(err.vertex, place);
}

static void a_strip(void **state)
{
    (void)state;
    double nodes[][2] = {{-3, 7}, {20, 7}};
    utw_wall walls[] = {WALL(0, 1, 2.385)};
    utw_outline *o = outline_of(&MIDLINE(nodes, walls));
    assert_int_equal(o->part[0].loop[0].n, 4);
    assert_true(o->box[0] == -3 && o->box[2] == 20 && o->box[1] == 7 - 2.385 / 2);
    figure f = {0};
    figure_rectangle(&f, 1, -3, 7 - 2.385 / 2, 20, 7 + 2.385 / 2);
    assert_figure(figure_of_outline(o), f, 1e-12);
    utw_outline_free(o);
    utw_wall taper[] = {TAPER(1, 0, 2, 5)};
    assert_close(area_of(&MIDLINE(nodes, taper)), 23 * 3.5, 1e-14);
}

static void an_ell_is_mitred(void **state)
{
    (void)state;
    double nodes[][2] = {{0, 60}, {0, 0}, {40, 0}};
    utw_wall walls[] = {WALL(0, 1, 5), WALL(1, 2, 8)};
    utw_outline *o = outline_of(&MIDLINE(nodes, walls));
    /* legs 5 and 8 thick with their outer corner at (-2.5, -4) */
    figure f = {0};
    figure_rectangle(&f, 1, -2.5, -4, 2.5, 60);
    figure_rectangle(&f, 1, 2.5, -4, 40, 4);
    assert_figure(figure_of_outline(o), f, 1e-12);
    assert_int_equal(o->part[0].loop[0].n, 6);
    utw_outline_free(o);
}

static void tee_and_cross_join_cleanly(void **state)
{
    (void)state;
    double nodes[][2] = {{-30, 0}, {0, 0}, {30, 0}, {0, -50}, {0, 45}};
    utw_wall walls[] = {WALL(0, 1, 6), WALL(1, 2, 6), WALL(3, 1, 4), WALL(1, 4, 4)};
    utw_midline m = MIDLINE(nodes, walls);
    figure f = {0};
    figure_rectangle(&f, 1, -30, -3, 30, 3);
    figure_rectangle(&f, 1, -2, -50, 2, -3);
    figure_rectangle(&f, 1, -2, 3, 2, 45);
    utw_outline *o = outline_of(&m);
    assert_figure(figure_of_outline(o), f, 1e-12);
    assert_int_equal(o->part[0].loop[0].n, 12);
    utw_outline_free(o);
    m.n_walls = 3;
    m.n_nodes = 4;
    assert_close(area_of(&m), 60 * 6 + 47 * 4, 1e-13);
}

static void boxes_have_their_cells_as_holes(void **state)
{
    (void)state;
    double nodes[][2] = {{0, 0}, {60, 0}, {60, 40}, {0, 40}, {25, 0}, {25, 40}};
    utw_wall one[] = {WALL(0, 1, 3), WALL(1, 2, 4), WALL(2, 3, 5), WALL(3, 0, 6)};
    utw_midline m = MIDLINE(nodes, one);
    m.n_nodes = 4;
    const double inside = (60 - 2 - 3) * (40 - 1.5 - 2.5),
                 outside = (60 + 2 + 3) * (40 + 1.5 + 2.5);
    assert_close(area_of(&m), outside - inside, 1e-13);
    utw_wall two[] = {WALL(0, 4, 3), WALL(4, 1, 3), WALL(1, 2, 4), WALL(2, 5, 5),
                      WALL(5, 3, 5), WALL(3, 0, 6), WALL(5, 4, 2)};
    assert_close(area_of(&MIDLINE(nodes, two)), outside - inside + 2 * (40 - 1.5 - 2.5), 1e-13);
    /* the two bottom walls of different thickness: the thicker one ends square at the node */
    two[0].t0 = two[0].t1 = 7;
    utw_outline *o = outline_of(&MIDLINE(nodes, two));
    figure f = {0};
    figure_rectangle(&f, 1, -3, -1.5, 62, 42.5);
    figure_rectangle(&f, 1, -3, -3.5, 25, -1.5);
    figure_rectangle(&f, -1, 3, 3.5, 24, 37.5);
    figure_rectangle(&f, -1, 26, 1.5, 58, 37.5);
    assert_figure(figure_of_outline(o), f, 1e-12);
    utw_outline_free(o);
}

static void a_zed_and_a_slanted_ell(void **state)
{
    (void)state;
    double nodes[][2] = {{-30, 80}, {0, 80}, {0, 0}, {30, 0}};
    utw_wall walls[] = {WALL(0, 1, 5), WALL(1, 2, 5), WALL(2, 3, 5)};
    assert_close(area_of(&MIDLINE(nodes, walls)), 5 * (80 - 5) + 2 * 5 * 32.5, 1e-14);
    /* equal walls at any angle: the mitre adds what the inside loses */
    for (int i = 1; i < 16; i++) {
        const double a = UTW_PI * i / 16;
        double v[][2] = {{50, 0}, {0, 0}, {60 * cos(a), 60 * sin(a)}};
        utw_wall w[] = {WALL(0, 1, 4), WALL(1, 2, 4)};
        /* below 29 degrees the mitre is cut: the kite at the node, t/2 by t/2 cot(a/2), becomes a
         * triangle */
        double expected = 110 * 4;
        if (a < 2 * asin(0.25)) expected -= 4 / tan(a / 2) - 2 * sin(a);
        assert_close(area_of(&MIDLINE(v, w)), expected, 1e-13);
    }
}

static void arcs_have_concentric_sides(void **state)
{
    (void)state;
    const double R = 23.85, h = sqrt(0.5);
    double nodes[][2] = {{R, 0}, {0, R}};
    utw_wall walls[] = {ARC(0, 1, 4, 4, R * h, R * h)};
    utw_outline *o = outline_of(&MIDLINE(nodes, walls));
    figure f = {0};
    figure_sector(&f, 1, 0, 0, R + 2, 0, UTW_PI / 2);
    figure_sector(&f, -1, 0, 0, R - 2, 0, UTW_PI / 2);
    assert_figure(figure_of_outline(o), f, 1e-13);
    assert_int_equal(o->part[0].loop[0].n, 4);
    utw_outline_free(o);
    /* a tapering arc: int t ds whatever the taper, within the tolerance of the cubics */
    utw_wall taper[] = {ARC(0, 1, 2, 9, R * h, R * h)};
    o = outline_of(&MIDLINE(nodes, taper));
    assert_close(figure_of_outline(o).A, R * UTW_PI / 2 * 5.5, 1e-9);
    for (int k = 0; k < o->part[0].loop[0].n; k++) { /* every point half a thickness off */
        const utw_curve *c = &o->part[0].loop[0].curve[k];
        for (double t = 0.05; t < 1 && c->kind == UTW_CUBIC; t += 0.05) {
            double p[2];
            utw_curve_point(c, t, p);
            const double at = 2 + 7 * atan2(p[1], p[0]) / (UTW_PI / 2), r = utw_norm(p);
            assert_true(fabs(fabs(r - R) - at / 2) < 3e-8);
        }
    }
    utw_outline_free(o);
}

static void rings_and_bends_run_smoothly(void **state)
{
    (void)state;
    const double R = 23.85, a = 8 * sqrt(0.5);
    double one[][2] = {{R, 0}}, opposite[2] = {-R, 0};
    utw_wall ring[] = {ARC(0, 0, 3, 3, opposite[0], opposite[1])};
    utw_outline *o = outline_of(&MIDLINE(one, ring));
    assert_close(figure_of_outline(o).A, 2 * UTW_PI * R * 3, 1e-13);
    assert_int_equal(o->part[0].loop[0].n, 1);
    assert_int_equal(o->part[0].loop[1].n, 1);
    utw_outline_free(o);
    /* two halves, and a fin outside */
    double two[][2] = {{R, 0}, {-R, 0}, {R + 20, 0}};
    utw_wall halves[] = {ARC(0, 1, 3, 3, 0, R), ARC(1, 0, 3, 3, 0, -R), WALL(0, 2, 2)};
    const double g =
        asin(1 / (R + 1.5)); /* where the fin meets the circle; its foot is cut along it */
    const double foot =
        (R + 20 - (R + 1.5) * cos(g)) * 2 - (R + 1.5) * (R + 1.5) * (g - sin(g) * cos(g));
    assert_close(area_of(&MIDLINE(two, halves)), 2 * UTW_PI * R * 3 + foot, 1e-13);
    /* cold-formed: straight, bend of radius 8, straight */
    double bend[][2] = {{0, 40}, {0, 8}, {8, 0}, {50, 0}};
    utw_wall walls[] = {WALL(0, 1, 3), ARC(1, 2, 3, 3, 8 - a, 8 - a), WALL(2, 3, 3)};
    o = outline_of(&MIDLINE(bend, walls));
    assert_close(figure_of_outline(o).A, 3 * (32 + 8 * UTW_PI / 2 + 42), 1e-13);
    assert_int_equal(o->part[0].loop[0].n, 8);
    utw_outline_free(o);
}

/* As the walls get thin the area tends to the sum of length times thickness; what corners add is of
 * second order. */
static void thin_walls_have_the_area_of_their_midline(void **state)
{
    (void)state;
    int samples = 0;
    const char *name;
    const utw_midline *sample;
    for (int i = 0; (sample = utw_midline_sample(i, &name)) != NULL; i++) {
        double error[2];
        int done = 0;
        for (int halved = 0; halved < 2; halved++) {
            utw_wall walls[64];
            assert_true(sample->n_walls <= 64);
            double sum = 0;
            const double scale = halved ? 0.02 : 0.04;
            for (int k = 0; k < sample->n_walls; k++) {
                walls[k] = sample->walls[k];
                walls[k].t0 *= scale;
                walls[k].t1 *= scale;
                sum += utw_wall_length(sample, k) * (walls[k].t0 + walls[k].t1) / 2;
            }
            const utw_midline m = {sample->n_nodes, sample->n_walls, sample->nodes, walls};
            utw_error err;
            utw_outline *o = NULL;
            const utw_status st = utw_outline_from_midline(&m, "mm N", &o, &err);
            if (st != UTW_OK) { /* slits of no width cannot be thickened */
                if (strstr(err.text, "a slit of no width") == NULL)
                    print_error("%s: %s\n", name, err.text);
                assert_non_null(strstr(err.text, "a slit of no width"));
                break;
            }
            error[halved] = (figure_of_outline(o).A - sum) / sum;
            utw_outline_free(o);
            done++;
        }
        if (done < 2) continue;
        samples++;
        assert_true(fabs(error[0]) < 0.02);
        assert_true(fabs(error[1]) < 0.51 * fabs(error[0]) + 1e-8);
    }
    assert_true(samples >= 5);
}

static void what_cannot_be_thickened_is_named(void **state)
{
    (void)state;
    double nodes[][2] = {{0, 0}, {60, 0}, {60, 6}, {0, 40}, {60, 6}, {30, -5}, {30, 5}, {30, 0.8}};
    utw_wall shorty[] = {WALL(0, 1, 4), WALL(1, 2, 3), WALL(2, 3, 14)};
    utw_midline m = MIDLINE(nodes, shorty);
    m.n_nodes = 4;
    refused(&m, 1,
            "wall 2 (node 1 to node 2) is too short for the thicknesses at its ends: of its length "
            "6 the corners take "
            "2 at node 1 and 7.19577 at node 2; lengthen it or make the walls thinner");
    utw_wall slit[] = {WALL(0, 1, 1), WALL(1, 2, 1), WALL(4, 3, 1)};
    m = MIDLINE(nodes, slit);
    m.n_nodes = 5;
    refused(&m, 4,
            "nodes 2 and 4 both lie at (60, 6): a slit of no width cannot be thickened; move them "
            "apart by its width, "
            "or make them one node");
    utw_wall crossing[] = {WALL(0, 1, 1), WALL(1, 2, 1), WALL(2, 3, 1), WALL(3, 4, 1),
                           WALL(4, 5, 1)};
    double cross[][2] = {{0, 0}, {60, 0}, {60, 30}, {20, 30}, {20, 10}, {20, -10}};
    m = MIDLINE(cross, crossing);
    refused(&m, 4, "walls 1 and 5 cross at (20, 0), where no node joins them; put a node there");
    utw_wall apart[] = {WALL(0, 1, 1), WALL(2, 3, 1)};
    m = MIDLINE(cross, apart);
    m.n_nodes = 4;
    refused(&m, 2,
            "node 2: no walls lead from it (60, 30) to node 0 (0, 0); the walls must form one "
            "connected piece");
    /* a fin that ends inside the wall opposite */
    double u[][2] = {{0, 40}, {0, 0}, {30, 0}, {30, 40}, {30, 20}, {1.4, 20}};
    utw_wall fin[] = {WALL(0, 1, 3), WALL(1, 2, 3), WALL(2, 4, 3), WALL(4, 3, 3), WALL(4, 5, 2)};
    m = MIDLINE(u, fin);
    refused(&m, 4,
            "walls 1 and 5, thickened, run into one another near (1.5, 21); make them thinner or "
            "move them apart");
    double straight[][2] = {{0, 0}, {60, 0}, {100, 0}};
    utw_wall step[] = {WALL(0, 1, 3), WALL(1, 2, 3.00001)};
    refused(&MIDLINE(straight, step), 1,
            "walls 1 and 2 differ in thickness at node 1 by too little to be drawn; give them the "
            "same thickness there");
    utw_wall foil[] = {WALL(0, 1, 3), WALL(1, 2, 1e-5)};
    refused(
        &MIDLINE(straight, foil), 1,
        "wall 2 (node 1 to node 2) is only 1e-05 thick, less than 2e-7 of the section's size 100");
    double arc[][2] = {{5, 0}, {-5, 0}};
    utw_wall thick[] = {ARC(0, 1, 10, 10, 0, 5)};
    refused(&MIDLINE(arc, thick), 0,
            "wall 1 (node 0 to node 1) is 10 thick, too much for its arc of radius 5: it must be "
            "less than twice the "
            "radius");
    utw_wall gap[] = {ARC(0, 1, 2, 2, 0, 5)};
    double nearly[][2] = {{5, -0.3}, {5, 0.3}};
    gap[0].mid[0] = -5;
    gap[0].mid[1] = 0;
    assert_close(area_of(&MIDLINE(nearly, gap)), 2 * utw_wall_length(&MIDLINE(nearly, gap), 0),
                 1e-12);
    double sharp[][2] = {{0, 0}, {100, 0}, {100, 1}};
    utw_wall wedge[] = {WALL(0, 1, 4), WALL(0, 2, 4)};
    refused(&MIDLINE(sharp, wedge), 1,
            "walls 1 and 2 meet at node 0 at too sharp an angle for their thickness and length: "
            "0.573 degrees");
    /* line and arc leave in one direction */
    double tangent[][2] = {{0, 0}, {50, 0}, {20, 20}};
    utw_wall cusp[] = {WALL(0, 1, 2),
                       ARC(0, 2, 2, 2, 20 * sin(UTW_PI / 4), 20 - 20 * cos(UTW_PI / 4))};
    refused(&MIDLINE(tangent, cusp), 1,
            "walls 1 and 2 meet at node 0 at too sharp an angle for their thickness and length: 0 "
            "degrees");
}

static void arguments_are_checked(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = NULL;
    double nodes[][2] = {{0, 0}, {60, 0}};
    utw_wall walls[] = {WALL(0, 1, 4)};
    utw_midline m = MIDLINE(nodes, walls);
    assert_int_equal(utw_outline_from_midline(NULL, "mm N", &o, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_from_midline(&m, NULL, &o, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_from_midline(&m, "mm N", NULL, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_outline_from_midline(&m, "mm", &o, &err), UTW_E_SYNTAX);
    m.n_walls = 0;
    assert_int_equal(utw_outline_from_midline(&m, "mm N", &o, &err), UTW_E_ARGUMENT);
    utw_part part;
    assert_int_equal(utw_thicken(NULL, &part, &err), UTW_E_ARGUMENT);
    m.n_walls = 1;
    walls[0].to = 7;
    refused(&m, 0, "wall 1: node 7 does not exist; there are nodes 0 to 1");
}

static void a_refused_allocation_leaves_nothing_behind(void **state)
{
    (void)state;
    double nodes[][2] = {{0, 0}, {60, 0}, {60, 40}, {0, 40}};
    utw_wall walls[] = {WALL(0, 1, 4), WALL(1, 2, 3), WALL(2, 3, 5), ARC(3, 0, 2, 3, -10, 20)};
    utw_midline m = MIDLINE(nodes, walls);
    utw_error err;
    utw_outline *o = NULL;
    utw_status st = UTW_E_NOMEM;
    long n = 0;
    while (st == UTW_E_NOMEM) {
        utw_memory_fail_at(++n);
        st = utw_outline_from_midline(&m, "mm N", &o, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_null(o);
    }
    assert_int_equal(st, UTW_OK);
    assert_true(n > 20);
    utw_outline_free(o);
}

/* The same numbers on every machine (Knuth, The Art of Computer Programming 2, 3.3.4). */
static double uniform(unsigned long long *s, double low, double high)
{
    *s = *s * 6364136223846793005ULL + 1442695040888963407ULL;
    return low + (high - low) * (double)(*s >> 11) / 9007199254740992.0;
}

static void random_graphs_are_thickened_or_refused(void **state)
{
    (void)state;
    unsigned long long s = 11;
    int made = 0;
    for (int i = 0; i < 6000; i++) {
        double nodes[9][2];
        utw_wall walls[12];
        const int grid = uniform(&s, 0, 1) < 0.5;
        utw_midline m = {2 + (int)uniform(&s, 0, 8), 1, nodes, walls};
        m.n_walls = m.n_nodes - 1 + (int)uniform(&s, 0, 4);
        for (int k = 0; k < m.n_nodes; k++)
            for (int j = 0; j < 2; j++)
                nodes[k][j] = grid ? 40 * floor(uniform(&s, 0, 4)) : uniform(&s, 0, 100);
        for (int k = 0; k < m.n_walls; k++) {
            const double t = pow(10, uniform(&s, -1, 1));
            walls[k] = (utw_wall)WALL((int)uniform(&s, 0, m.n_nodes), k + 1, t);
            if (k + 1 < m.n_nodes) walls[k].from = (int)uniform(&s, 0, k + 1); /* a tree first */
            if (k + 1 >= m.n_nodes) walls[k].to = (int)uniform(&s, 0, m.n_nodes);
            if (uniform(&s, 0, 1) < 0.3) walls[k].t1 = t * uniform(&s, 0.5, 2);
            if (uniform(&s, 0, 1) < 0.2) {
                walls[k].arc = 1;
                for (int j = 0; j < 2; j++) walls[k].mid[j] = uniform(&s, 0, 100);
            }
        }
        utw_error err;
        utw_outline *o = NULL;
        const utw_status st = utw_outline_from_midline(&m, "mm N", &o, &err);
        if (st == UTW_OK) {
            made++;
            assert_true(figure_of_outline(o).A > 0);
            utw_outline_free(o);
            continue;
        }
        assert_int_equal(st, UTW_E_OUTLINE);
        /* walls and nodes are named, not edges of the outline made of them */
        if (strncmp(err.text, "part", 4) == 0) print_error("graph %d: %s\n", i, err.text);
        assert_true(strncmp(err.text, "part", 4) != 0);
    }
    print_message("%d of 6000 random graphs were thickened\n", made);
    assert_true(made > 500);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(a_strip),
        balanced_test(an_ell_is_mitred),
        balanced_test(tee_and_cross_join_cleanly),
        balanced_test(boxes_have_their_cells_as_holes),
        balanced_test(a_zed_and_a_slanted_ell),
        balanced_test(arcs_have_concentric_sides),
        balanced_test(rings_and_bends_run_smoothly),
        balanced_test(thin_walls_have_the_area_of_their_midline),
        balanced_test(what_cannot_be_thickened_is_named),
        balanced_test(arguments_are_checked),
        balanced_test(a_refused_allocation_leaves_nothing_behind),
        balanced_test(random_graphs_are_thickened_or_refused),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
