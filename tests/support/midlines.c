/* SPDX-License-Identifier: GPL-3.0-or-later
 * The collection of midlines and integrals along their walls. */
#include "support/midlines.h"

#include "base/gauss.h"

#define SAMPLE(id, ...)                                                                            \
    static utw_wall id##_walls[] = {__VA_ARGS__};                                                  \
    static const utw_midline id = {(int)(sizeof id##_nodes / sizeof id##_nodes[0]),                \
                                   (int)(sizeof id##_walls / sizeof id##_walls[0]), id##_nodes,    \
                                   id##_walls}

static double channel_nodes[][2] = {{43.7, -48.1}, {0.3, -52.2}, {-1.1, 49.6}, {38.2, 55.5}};
SAMPLE(channel, WALL(0, 1, 5.3), WALL(2, 1, 3.7), TAPER(2, 3, 6.1, 4.4));

/* a fin on each side of a curved web */
static double open_nodes[][2] = {{0, 0}, {2.385, 6.1}, {7.9, 8.3}, {9.2, 3.3}, {-3.1, 7.7}};
SAMPLE(open, ARC(0, 1, 0.31, 0.22, 0.4, 3.6), WALL(1, 2, 0.17), ARC(2, 3, 0.2, 0.4, 9.6, 6.0),
       TAPER(4, 1, 0.08, 0.35));

/* a tube sawn through: two nodes at the same place */
static double slit_nodes[][2] = {{-3.1, 0.4}, {-3.1, 0.4}, {1.4, 1.3}};
SAMPLE(slit, ARC(0, 1, 0.11, 0.19, 2.8, -0.3), TAPER(2, 0, 0.2, 0.07));

static double fins_nodes[][2] = {{-2.2, 0.1}, {2.3, -0.4}, {-3.4, 2.1},
                                 {-2.1, 1.9}, {2.2, 2.4},  {3.6, 2.6}};
SAMPLE(fins, WALL(0, 1, 0.021), TAPER(2, 3, 0.01, 0.034), WALL(4, 3, 0.03), TAPER(4, 5, 0.04, 0.02),
       WALL(0, 3, 0.023), TAPER(1, 4, 0.019, 0.031));

/* a wing section: a round nose, two webs, a tapering tail with a thin trailing edge */
static double wing_nodes[][2] = {{180, -62}, {185, 71}, {560, -55}, {548, 66}, {1040, 4.2}};
SAMPLE(wing, ARC(1, 0, 1.2, 1.2, 21, 7), TAPER(0, 2, 1.6, 1.1), TAPER(1, 3, 2.1, 1.3),
       WALL(1, 0, 2.4), WALL(3, 2, 1.8), ARC(3, 4, 0.9, 0.6, 801, 41),
       ARC(2, 4, 0.9, 0.6, 790, -33));

/* a closed tube of one wall, a spoke to its middle, a fin outside */
static double tube_nodes[][2] = {{5.2, 0}, {1.1, 0.7}, {8.4, 1.9}};
SAMPLE(tube, ARC(0, 0, 0.3, 0.45, -4.6, 1.2), TAPER(1, 0, 0.2, 0.6), WALL(0, 2, 0.33));

/* a grid of six cells with one wall missing, a strong taper and a bulging side */
static double grid_nodes[][2] = {{0, 0},     {3.1, 0.2}, {5.9, -0.3}, {9.2, 0.1},
                                 {0.2, 2.4}, {2.8, 2.6}, {6.3, 2.2},  {9.0, 2.7},
                                 {-0.3, 5},  {3.2, 5.4}, {6.1, 4.9},  {9.4, 5.2}};
SAMPLE(grid, WALL(0, 1, 0.1), WALL(1, 2, 0.12), TAPER(2, 3, 0.1, 0.2), WALL(4, 5, 0.05),
       WALL(6, 5, 0.07), WALL(6, 7, 0.2), WALL(8, 9, 0.13), TAPER(9, 10, 0.4, 0.02),
       WALL(10, 11, 0.11), WALL(0, 4, 0.1), WALL(4, 8, 0.09), WALL(5, 1, 0.08), WALL(2, 6, 0.06),
       TAPER(6, 10, 0.03, 0.3), WALL(3, 7, 0.14), ARC(7, 11, 0.15, 0.1, 10.4, 4.1));

/* two closed tubes joined by a plate: cells that share no wall */
static double pair_nodes[][2] = {{0, 0}, {4, 0.5}, {12, 1}, {15, -2}, {15.5, 3}};
SAMPLE(pair, ARC(0, 1, 0.2, 0.2, 1.9, 2.4), ARC(1, 0, 0.25, 0.15, 2.4, -1.7), WALL(1, 2, 0.3),
       WALL(2, 3, 0.2), TAPER(3, 4, 0.2, 0.4), WALL(4, 2, 0.15));

const utw_midline *utw_midline_sample(int i, const char **name)
{
    static const struct {
        const char *name;
        const utw_midline *midline;
    } all[] = {{"channel", &channel}, {"open", &open}, {"slit", &slit}, {"fins", &fins},
               {"wing", &wing},       {"tube", &tube}, {"grid", &grid}, {"pair", &pair}};
    if (i < 0 || i >= (int)(sizeof all / sizeof all[0])) return NULL;
    *name = all[i].name;
    return all[i].midline;
}

utw_thin *utw_thin_of(const utw_midline *midline)
{
    utw_error err;
    utw_thin *thin = NULL;
    assert_ok(utw_thin_solve(midline, &thin, &err));
    assert_non_null(thin);
    return thin;
}

void utw_along_wall(const utw_thin *thin, int wall, double length, int parts,
                    const utw_thin_load *load,
                    void (*add)(const utw_thin_station *, double ds, void *data), void *data)
{
    double x[24], w[24];
    utw_error err;
    utw_gauss(24, x, w);
    for (int i = 0; i < parts; i++) {
        for (int g = 0; g < 24; g++) {
            utw_thin_station at;
            assert_ok(utw_thin_at(thin, wall, (i + x[g]) / parts, load, &at, &err));
            add(&at, length / parts * w[g], data);
        }
    }
}

double utw_wall_length(const utw_midline *midline, int wall)
{
    const utw_wall *w = &midline->walls[wall];
    const double *a = midline->nodes[w->from], *b = midline->nodes[w->to];
    const double chord = hypot(b[0] - a[0], b[1] - a[1]);
    if (!w->arc) return chord;
    const double am = hypot(w->mid[0] - a[0], w->mid[1] - a[1]);
    const double mb = hypot(b[0] - w->mid[0], b[1] - w->mid[1]);
    if (chord == 0) return acos(-1.0) * am;
    /* circumradius by Heron's formula; the angle at mid by the law of cosines */
    const double p = (am + mb + chord) / 2;
    const double area = sqrt(p * (p - am) * (p - mb) * (p - chord));
    const double radius = am * mb * chord / (4 * area);
    const double at_mid = acos((am * am + mb * mb - chord * chord) / (2 * am * mb));
    return radius * 2 * (acos(-1.0) - at_mid);
}
