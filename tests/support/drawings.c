/* SPDX-License-Identifier: GPL-3.0-or-later
 * Midlines of our own: open, closed, tapering, curved, with fins. */
#include "support/drawings.h"

#include "base/memory.h"
#include "outline/outline.h"

#define DRAWING(id, width, ...)                                                                    \
    static utw_wall id##_walls[] = {__VA_ARGS__};                                                  \
    static const drawing_sample id = {#id,                                                         \
                                      width,                                                       \
                                      {(int)(sizeof id##_nodes / sizeof id##_nodes[0]),            \
                                       (int)(sizeof id##_walls / sizeof id##_walls[0]),            \
                                       id##_nodes, id##_walls}}

typedef struct drawing_sample {
    const char *name;
    double width;
    utw_midline midline;
} drawing_sample;

static double channel_nodes[][2] = {{50, 0}, {0, 0}, {0, 100}, {60, 100}};
DRAWING(channel, 100, WALL(0, 1, 1), WALL(1, 2, 1), WALL(2, 3, 1));

static double zed_nodes[][2] = {{-40, 0}, {0, 0}, {0, 80}, {45, 80}};
DRAWING(zed, 80, WALL(0, 1, 1), WALL(1, 2, 1), WALL(2, 3, 1));

static double lipped_nodes[][2] = {{50, 30}, {50, 0}, {0, 0}, {0, 100}, {50, 100}, {50, 70}};
DRAWING(lipped, 100, WALL(0, 1, 1), WALL(1, 2, 1), WALL(2, 3, 1), WALL(3, 4, 1), WALL(4, 5, 1));

static double tee_nodes[][2] = {{-50, 0}, {0, 0}, {50, 0}, {0, -90}};
DRAWING(tee, 100, WALL(0, 1, 1.2), WALL(1, 2, 1.2), WALL(1, 3, 0.8));

static double unequal_nodes[][2] = {{-50, 0}, {0, 0}, {50, 0}, {0, -110}, {-30, -110}, {30, -110}};
DRAWING(unequal, 100, WALL(0, 1, 1.2), WALL(1, 2, 1.2), WALL(1, 3, 0.8), WALL(3, 4, 1),
        WALL(3, 5, 1));

static double box_nodes[][2] = {{0, 0}, {100, 0}, {100, 60}, {0, 60}};
DRAWING(box, 80, WALL(0, 1, 1), WALL(1, 2, 0.7), WALL(2, 3, 1.3), WALL(3, 0, 1));

static double two_cells_nodes[][2] = {{0, 0}, {70, 0}, {150, 10}, {150, 70}, {70, 70}, {0, 60}};
DRAWING(two_cells, 80, WALL(0, 1, 1), WALL(1, 2, 0.8), WALL(2, 3, 1), WALL(3, 4, 0.9),
        WALL(4, 5, 1), WALL(5, 0, 1.1), WALL(1, 4, 0.7));

static double fins_nodes[][2] = {{0, 0}, {100, 0}, {100, 60}, {0, 60}, {-50, 60}, {160, 0}};
DRAWING(fins, 80, WALL(0, 1, 1), WALL(1, 2, 1), WALL(2, 3, 1), WALL(3, 0, 1), WALL(3, 4, 1),
        WALL(1, 5, 0.8));

static double tapers_nodes[][2] = {{90, 0}, {0, 0}, {0, 120}, {80, 130}};
DRAWING(tapers, 100, TAPER(0, 1, 0.6, 1.2), WALL(1, 2, 0.8), TAPER(2, 3, 1.1, 0.5));

static double bend_nodes[][2] = {{100, 0}, {0, 0}, {0, 100}, {100, 100}};
DRAWING(bend, 100, WALL(0, 1, 1), ARC(1, 2, 1, 1, -50, 50), WALL(2, 3, 1));

static double slit_nodes[][2] = {{98.0066578, -19.8669331}, {98.0066578, 19.8669331}};
DRAWING(slit, 100, ARC(0, 1, 1, 1, -100, 0));

static double nose_nodes[][2] = {{0, 0},     {60, -20}, {120, 0}, {140, 60},
                                 {120, 120}, {60, 140}, {60, 60}};
DRAWING(nose, 70, WALL(0, 1, 1), WALL(1, 2, 1), WALL(2, 3, 1.2), WALL(3, 4, 1), WALL(4, 5, 1),
        ARC(5, 0, 1, 0.8, -40, 60), WALL(6, 1, 0.8), WALL(6, 4, 0.9));

const utw_midline *utw_drawing_sample(int i, double t_over_b, utw_wall wall[32],
                                      utw_midline *midline, const char **name)
{
    static const drawing_sample *const all[] = {&channel,   &zed,  &lipped, &tee,  &unequal, &box,
                                                &two_cells, &fins, &tapers, &bend, &slit,    &nose};
    if (i < 0 || i >= (int)(sizeof all / sizeof all[0])) return NULL;
    *midline = all[i]->midline;
    *name = all[i]->name;
    for (int w = 0; w < midline->n_walls; w++) {
        wall[w] = midline->walls[w];
        wall[w].t0 *= t_over_b * all[i]->width;
        wall[w].t1 *= t_over_b * all[i]->width;
    }
    midline->walls = wall;
    return midline;
}

utw_outline *utw_outline_of_midline(const utw_midline *midline)
{
    utw_error err;
    utw_outline *outline = NULL;
    assert_ok(utw_outline_from_midline(midline, "mm N", &outline, &err));
    utw_free(outline->midline->nodes);
    utw_free(outline->midline->walls);
    utw_free(outline->midline);
    outline->midline = NULL;
    return outline;
}
