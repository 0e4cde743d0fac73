/* SPDX-License-Identifier: GPL-3.0-or-later
 * The local wall thickness (mesh/walls.c), and what the boundary is divided into by it (divide.c).
 */
#include "mesh/walls.h"

#include "base/vec2.h"
#include "mesh/divide.h"
#include "support/meshing.h"
#include "support/section.h"

static utw_net *drawn(const char *part)
{
    utw_outline *o = section_outline(UTW_NAN, "%s", part);
    utw_net *net = net_of(o);
    utw_outline_free(o);
    return net;
}

static utw_walls *walls_of(const utw_net *net)
{
    utw_error err;
    utw_walls *walls = NULL;
    assert_ok(utw_walls_create(net, &walls, &err));
    return walls;
}

static void a_rectangle_is_seen_across(void **state)
{
    (void)state;
    utw_net *net = drawn("\"outline\":[[0,0],[30,0],[30,2],[0,2]]");
    utw_walls *walls = walls_of(net);
    for (int e = 0; e < net->n_edge; e++) {
        const utw_net_edge *on = &net->edge[e];
        const int level = net->node[on->from][1] == net->node[on->to][1];
        for (double t = 0.15; t < 1; t += 0.2)
            assert_close(utw_walls_thickness(walls, e, t, 0), level ? 2 : 30, 1e-12);
    }
    utw_walls_free(walls);
    utw_net_free(net);
}

/* A ring 0.3 thick: from outside and from inside; and one whose hole lies off the middle. */
static void curved_walls_are_seen_too(void **state)
{
    (void)state;
    utw_net *net = drawn("\"outline\":{\"circle\":[0,0,5]},\"holes\":[{\"circle\":[0,0,4.7]}]");
    utw_walls *walls = walls_of(net);
    for (int e = 0; e < net->n_edge; e++)
        for (double t = 0; t <= 1; t += 0.125)
            assert_close(utw_walls_thickness(walls, e, t, 0), 0.3, 1e-3);
    utw_walls_free(walls);
    utw_net_free(net);
    net = drawn("\"outline\":{\"circle\":[0,0,5]},\"holes\":[{\"circle\":[1,0,3]}]");
    walls = walls_of(net);
    double least = 9, most = 0;
    for (int e = 0; e < net->n_edge; e++)
        for (double t = 0; t <= 1; t += 0.125) {
            const double h = utw_walls_thickness(walls, e, t, 0);
            least = fmin(least, h);
            most = fmax(most, h);
        }
    assert_close(least, 1, 1e-3); /* 5 - 3 - 1 */
    assert_true(most >= 3);
    utw_walls_free(walls);
    utw_net_free(net);
}

/* A wedge closes in on its tip: seen across it is as thin as one likes, with `wedge` it is not. */
static void a_tip_is_not_a_thin_wall(void **state)
{
    (void)state;
    utw_net *net = drawn("\"outline\":[[0,0],[40,0],[40,8]]");
    utw_walls *walls = walls_of(net);
    for (int e = 0; e < net->n_edge; e++) {
        const double *a = net->node[net->edge[e].from], *b = net->node[net->edge[e].to];
        if (a[1] != 0 || b[1] != 0) continue;
        for (double t = 0.05; t < 1; t += 0.1) {
            const double from_tip = a[0] + t * (b[0] - a[0]);
            assert_close(utw_walls_thickness(walls, e, t, 0), from_tip / 5, 1e-12);
            assert_close(utw_walls_thickness(walls, e, t, 0.5), from_tip / 2, 1e-12);
        }
    }
    utw_walls_free(walls);
    utw_net_free(net);
}

/* Breakpoints run from 0 to 1; no side is much longer than its wall is thick, or turns by more than
 * a right angle; a finer scale gives more of them. */
static void sides_follow_the_walls(void **state)
{
    (void)state;
    static const char *const part[] = {
        "\"outline\":[[0,0],[60,0],[60,3],[3,3],[3,40],[0,40]]",
        "\"outline\":{\"circle\":[0,0,5]},\"holes\":[{\"circle\":[1,0,3]}]",
        "\"outline\":[[0,0],[60,0],{\"at\":[60,9],\"round\":4},{\"at\":[9,9],\"round\":0.4},[9,50],"
        "[0,50]]"};
    for (size_t i = 0; i < sizeof part / sizeof *part; i++) {
        utw_error err;
        utw_net *net = drawn(part[i]);
        utw_walls *walls = walls_of(net);
        int n[2];
        for (int fine = 0; fine < 2; fine++) {
            utw_division *d = NULL;
            assert_ok(utw_division_create(net, fine ? 0.5 : 1, NULL, &d, &err));
            assert_int_equal(d->n_edge, net->n_edge);
            n[fine] = d->first[d->n_edge];
            for (int e = 0; e < net->n_edge; e++) {
                const int first = d->first[e], last = d->first[e + 1] - 1;
                assert_true(last > first && d->t[first] == 0 && d->t[last] == 1);
                for (int k = first; k < last; k++) {
                    assert_true(d->t[k] < d->t[k + 1]);
                    const utw_curve piece =
                        utw_curve_piece(&net->edge[e].curve, d->t[k], d->t[k + 1]);
                    const double middle = 0.5 * (d->t[k] + d->t[k + 1]);
                    assert_true(utw_curve_turning(&piece) <= UTW_PI / 2 * (1 + 1e-9));
                    /* at most about 1.5 scale walls, and graded: twice that is never right */
                    assert_true(utw_curve_length(&piece) <=
                                3 * utw_walls_thickness(walls, e, middle, 0.5));
                }
            }
            utw_division_free(d);
        }
        assert_true(n[1] > n[0]);
        utw_walls_free(walls);
        utw_net_free(net);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(a_rectangle_is_seen_across),
        balanced_test(curved_walls_are_seen_too),
        balanced_test(a_tip_is_not_a_thin_wall),
        balanced_test(sides_follow_the_walls),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
