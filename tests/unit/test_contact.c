/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/contact.h"

#include "support/midlines.h"
#include "outline/graph.h"

static utw_status check(const utw_midline *m, utw_error *fault)
{
    utw_error err;
    utw_path paths[32];
    double origin[2], size;
    assert_true(m->n_walls <= 32);
    assert_ok(utw_graph_paths(m, paths, origin, &size, &err));
    return utw_contact_check(m, paths, origin, size, fault);
}

static void samples_are_let_pass(void **state)
{
    (void)state;
    const char *name;
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        utw_error err;
        assert_ok(check(utw_midline_sample(i, &name), &err));
    }
}

/* Walls that meet at a node at a small angle, a slit along a shared place, arcs back to back, a
 * wall that ends a thickness short of another. */
static void what_may_be_drawn(void **state)
{
    (void)state;
    double sharp[][2] = {{0, 0}, {10, 0.01}, {10, -0.01}};
    utw_wall blade[] = {WALL(0, 1, 0.3), WALL(0, 2, 0.3), WALL(1, 2, 0.3)};
    const utw_midline a = MIDLINE(sharp, blade);
    utw_error err;
    assert_ok(check(&a, &err));

    double lens[][2] = {{0, 0}, {10, 0}};
    utw_wall arcs[] = {ARC(0, 1, 0.1, 0.1, 5, 0.5), ARC(1, 0, 0.1, 0.1, 5, -0.5), WALL(0, 1, 0.1)};
    const utw_midline b = MIDLINE(lens, arcs);
    assert_ok(check(&b, &err));

    double slit[][2] = {{0, 0}, {4, 0}, {4, 3}, {0, 3}, {0, 0}};
    utw_wall box[] = {WALL(0, 1, 0.1), WALL(1, 2, 0.1), WALL(2, 3, 0.1), WALL(3, 4, 0.1)};
    const utw_midline c = MIDLINE(slit, box);
    assert_ok(check(&c, &err));

    double gap[][2] = {{0, 0}, {10, 0}, {5, 0.2}, {5, 4}, {10, 4}};
    utw_wall stem[] = {WALL(0, 1, 0.2), WALL(2, 3, 0.2), WALL(3, 4, 0.2), WALL(4, 1, 0.2)};
    const utw_midline d = MIDLINE(gap, stem);
    assert_ok(check(&d, &err));
}

static void refuse(const utw_midline *m, int place, const char *start)
{
    utw_error err;
    assert_int_equal(check(m, &err), UTW_E_OUTLINE);
    assert_int_equal(err.vertex, place);
    if (strncmp(err.text, start, strlen(start)) != 0) fail_msg("got: %s", err.text);
}

static void what_may_not_be_drawn(void **state)
{
    (void)state;
    /* a web that ends on the flange, and one that reaches beyond it */
    double n[][2] = {{0, 0}, {10, 0}, {10, 6}, {0, 6}, {4, 0}, {4, 6}};
    utw_wall w[] = {WALL(0, 1, 0.2), WALL(1, 2, 0.2), WALL(2, 5, 0.2),
                    WALL(5, 3, 0.2), WALL(3, 0, 0.2), WALL(5, 4, 0.2)};
    const utw_midline web = MIDLINE(n, w);
    refuse(&web, 4, "node 4 (4, 0) lies on wall 1 (node 0 to node 1)");
    n[4][1] = -0.1;
    refuse(&web, 5, "walls 1 and 6 cross at (4, 0)");
    n[4][1] = 0.001;
    refuse(&web, 4, "node 4 (4, 0.001) lies on wall 1");

    double x[][2] = {{0, 0}, {4, 4}, {4, 0}, {0, 4}};
    utw_wall cross[] = {WALL(0, 1, 0.1), WALL(1, 2, 0.1), WALL(2, 3, 0.1)};
    const utw_midline bow = MIDLINE(x, cross);
    refuse(&bow, 2, "walls 1 and 3 cross at (2, 2)");

    /* line and arc, arc and arc, the same arc twice, a wall on part of another */
    utw_wall bulge[] = {ARC(0, 1, 0.1, 0.1, 2.3, 1.5), WALL(1, 2, 0.1), WALL(2, 3, 0.1)};
    const utw_midline line_arc = MIDLINE(x, bulge);
    refuse(&line_arc, 2, "walls 1 and 3 cross at (2");
    utw_wall arcs[] = {ARC(0, 1, 0.1, 0.1, 2.3, 1.5), WALL(1, 2, 0.1), ARC(2, 3, 0.1, 0.1, 3, 3)};
    const utw_midline arc_arc = MIDLINE(x, arcs);
    refuse(&arc_arc, 2, "walls 1 and 3 cross at (");
    utw_wall twice[] = {ARC(0, 1, 0.1, 0.1, 2.3, 1.5), WALL(1, 2, 0.1), WALL(2, 3, 0.2),
                        ARC(1, 0, 0.1, 0.1, 2.3, 1.5)};
    const utw_midline same = MIDLINE(x, twice);
    double l[][2] = {{0, 0}, {4, 0}, {2, 0}, {2, 3}};
    utw_wall part[] = {WALL(0, 1, 0.1), WALL(0, 2, 0.1), WALL(2, 3, 0.1)};
    const utw_midline on = MIDLINE(l, part);
    refuse(&on, 2, "node 2 (2, 0) lies on wall 1");
    twice[2] = (utw_wall)WALL(1, 3, 0.2);
    refuse(&same, 3, "walls 1 and 4 lie on one another");
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(samples_are_let_pass),
        balanced_test(what_may_be_drawn),
        balanced_test(what_may_not_be_drawn),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
