/* SPDX-License-Identifier: GPL-3.0-or-later
 * Midlines that cannot be: status, place and exact message. */
#include "support/midlines.h"

static void refuse(const utw_midline *m, utw_status status, int place, const char *text)
{
    utw_thin *thin = NULL;
    utw_error err;
    assert_int_equal(utw_thin_solve(m, &thin, &err), status);
    assert_string_equal(err.text, text);
    assert_int_equal(err.status, status);
    assert_int_equal(err.vertex, place);
    assert_null(thin);
    assert_int_equal(utw_thin_solve(m, &thin, NULL), status); /* without an error to fill */
}

/* A box to be spoilt. */
typedef struct drawing {
    double nodes[5][2];
    utw_wall walls[5];
    utw_midline midline;
} drawing;

static drawing box(void)
{
    drawing d = {.nodes = {{0, 0}, {4, 0}, {4, 3}, {0, 3}, {6, 5}},
                 .walls = {WALL(0, 1, 0.1), WALL(1, 2, 0.1), WALL(2, 3, 0.1), WALL(3, 0, 0.1),
                           WALL(2, 4, 0.1)}};
    return d;
}

static const utw_midline *drawn(drawing *d, int nodes, int walls)
{
    d->midline = (utw_midline){nodes, walls, d->nodes, d->walls};
    return &d->midline;
}

static void counts(void **state)
{
    (void)state;
    drawing d = box();
    utw_midline m = {5, 5, NULL, d.walls};
    utw_error err;
    refuse(NULL, UTW_E_ARGUMENT, -1, "midline: no nodes or no walls given (NULL)");
    refuse(&m, UTW_E_ARGUMENT, -1, "midline: no nodes or no walls given (NULL)");
    refuse(drawn(&d, 5, 0), UTW_E_ARGUMENT, -1,
           "midline: 5 nodes and 0 walls; at least one wall is needed");
    refuse(drawn(&d, -1, 5), UTW_E_ARGUMENT, -1,
           "midline: -1 nodes and 5 walls; at least one wall is needed");
    refuse(drawn(&d, 5, 5000), UTW_E_ARGUMENT, -1,
           "midline: 5 nodes and 5000 walls; at most 4096 of each are taken");
    assert_int_equal(utw_thin_solve(drawn(&d, 5, 5), NULL, &err), UTW_E_ARGUMENT);
}

static void numbers(void **state)
{
    (void)state;
    drawing d = box();
    d.nodes[3][1] = NAN;
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 3,
           "node 3: coordinates (0, nan) are not finite numbers");
    for (double scale = 1e-70; scale < 1e90; scale *= 1e140) {
        d = box();
        for (int i = 0; i < 5; i++) {
            for (int j = 0; j < 2; j++) d.nodes[i][j] *= scale;
            d.walls[i].t0 *= scale;
            d.walls[i].t1 *= scale;
        }
        refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, -1,
               "midline: its dimensions are too large or too small to compute with; use another "
               "unit of length");
    }
    d = box();
    d.nodes[1][0] = 1.7e308;
    d.nodes[2][0] = -1.7e308;
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, -1, "midline: its extent is too large to compute with");
    d = box();
    d.walls[2].to = 5;
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 2,
           "wall 3: node 5 does not exist; there are nodes 0 to 4");
    d.walls[2].to = -1;
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 2,
           "wall 3: node -1 does not exist; there are nodes 0 to 4");
    d = box();
    d.walls[4].t1 = 0;
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 4,
           "wall 5: thickness 0.1 at node 2, 0 at node 4; it must be positive");
    d.walls[4].t1 = -0.2;
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 4,
           "wall 5: thickness 0.1 at node 2, -0.2 at node 4; it must be positive");
    d.walls[4].t1 = NAN;
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 4,
           "wall 5: thickness 0.1 at node 2, nan at node 4; it must be positive");
    d.walls[4].t1 = 1e6;
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 4,
           "wall 5: thickness goes from 0.1 to 1e+06; a factor of 1e6 is the most that is taken");
    d = box();
    d.walls[1] = (utw_wall)ARC(1, 2, 0.1, 0.1, HUGE_VAL, 0);
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 1, "wall 2: arc point (inf, 0) is not finite");
}

static void lengths(void **state)
{
    (void)state;
    drawing d = box();
    d.walls[4].to = 2;
    refuse(drawn(&d, 4, 5), UTW_E_OUTLINE, 4,
           "wall 5: it has no length: nodes 2 and 2 both lie at (4, 3)");
    d = box();
    d.nodes[4][0] = 4;
    d.nodes[4][1] = 3;
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 4,
           "wall 5: it has no length: nodes 2 and 4 both lie at (4, 3)");
    d = box();
    d.walls[1] = (utw_wall)ARC(1, 2, 0.1, 0.1, 4, 0);
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 1, "wall 2: its arc point (4, 0) coincides with an end");
    d.walls[1] = (utw_wall)ARC(1, 2, 0.1, 0.1, 4, 7);
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 1,
           "wall 2: its arc point (4, 7) lies in line with its ends, but not between them");
}

static void pieces(void **state)
{
    (void)state;
    drawing d = box();
    refuse(drawn(&d, 5, 4), UTW_E_OUTLINE, 4,
           "node 4: no wall ends at it (6, 5); remove it or join it");
    d.walls[2] = (utw_wall)WALL(0, 3, 0.1); /* 0-1-2-4 joined by 3-0: break it at 1-2 */
    d.walls[3] = (utw_wall)WALL(4, 2, 0.1);
    d.walls[1] = (utw_wall)WALL(1, 3, 0.1);
    refuse(drawn(&d, 5, 4), UTW_E_OUTLINE, 2,
           "node 2: no walls lead from it (4, 3) to node 0 (0, 0); the walls must form one "
           "connected piece");
}

static void contacts(void **state)
{
    (void)state;
    drawing d = box();
    d.walls[4] = (utw_wall)WALL(1, 0, 0.2);
    refuse(drawn(&d, 4, 5), UTW_E_OUTLINE, 4,
           "walls 1 and 5 lie on one another; draw one wall with the thickness of both");
    d = box();
    d.nodes[4][0] = -1;
    d.nodes[4][1] = 1;
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 4,
           "walls 4 and 5 cross at (0, 1.4), where no node joins them; put a node there");
    d.nodes[4][0] = 0;
    refuse(drawn(&d, 5, 5), UTW_E_OUTLINE, 4,
           "node 4 (0, 1) lies on wall 4 (node 3 to node 0) without being joined to it; split the "
           "wall there (for a "
           "slit, into walls that end at a node of their own)");
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(counts), balanced_test(numbers),  balanced_test(lengths),
        balanced_test(pieces), balanced_test(contacts),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
