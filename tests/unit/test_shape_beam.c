/* SPDX-License-Identifier: GPL-3.0-or-later
 * Areas and moments are elementary: polygons of flange and web, spandrels of root and toe. */
#include "base/vec2.h"
#include "support/figure.h"
#include "support/shapes.h"

static void compare(const char *text, figure expected)
{
    utw_outline *o = shape_of(text);
    assert_figure(figure_of_outline(o), expected, 1e-12);
    utw_outline_free(o);
}

/* A flange on one side of a web: level face at y (material toward side), tip at x1, face of the web
 * at x0; thickness t1 at the tip, t0 at the web; root and toe radii. */
static void flange(figure *f, double x0, double x1, double y, double side, double t0, double t1,
                   double root, double toe)
{
    const double out = x1 > x0 ? 1 : -1, length = fabs(x1 - x0), fall = hypot(length, t0 - t1);
    const double v[4][2] = {{x0, y}, {x1, y}, {x1, y + side * t1}, {x0, y + side * t0}};
    figure_polygon(f, out * side, 4, v);
    /* along the underside, from the root to the tip */
    const double along[2] = {out * length / fall, side * (t1 - t0) / fall},
                 back[2] = {-along[0], -along[1]};
    const double up[2] = {0, side}, down[2] = {0, -side};
    if (root > 0) figure_spandrel(f, 1, v[3], along, up, root);
    if (toe > 0) figure_spandrel(f, -1, v[2], back, down, toe);
}

static figure channel(double h, double b, double tf, double tw, double r, double r2, double s,
                      double u)
{
    figure f = {0};
    figure_rectangle(&f, 1, 0, 0, tw, h);
    for (int i = 0; i < 2; i++)
        flange(&f, tw, b, i * h, i == 0 ? 1 : -1, tf + s * (b - u - tw), tf - s * u, r, r2);
    return f;
}

static void channels(void **state)
{
    (void)state;
    compare("channel h=100 b=50 tf=8.5 tw=6", channel(100, 50, 8.5, 6, 0, 0, 0, 25));
    compare("channel h=100 b=50 tf=8.5 tw=6 r=9", channel(100, 50, 8.5, 6, 9, 0, 0, 25));
    compare("channel h=100 b=50 tf=8.5 tw=6 r=9 r2=4.5", channel(100, 50, 8.5, 6, 9, 4.5, 0, 25));
    compare("channel h=100 b=50 tf=8.5 tw=6 r=8.5 r2=4.5 slope=8",
            channel(100, 50, 8.5, 6, 8.5, 4.5, 0.08, 25));
    compare("channel h=100 b=50 tf=8.5 tw=6 r=8.5 r2=4.5 slope=8 u=12",
            channel(100, 50, 8.5, 6, 8.5, 4.5, 0.08, 12));
    compare("channel h=100 b=50 tf=8.5 tw=6 r=8.5 slope_deg=7.5",
            channel(100, 50, 8.5, 6, 8.5, 0, tan(7.5 * UTW_PI / 180), 25));
    utw_outline *o = shape_of("channel h=100 b=50 tf=8.5 tw=6 r=8.5 r2=4.5 slope=8");
    shape_symmetric(o, 0, 50);
    utw_outline_free(o);
}

static void channels_at_their_limits(void **state)
{
    (void)state;
    compare("channel h=100 b=50 tf=8.5 tw=6 r=41.5",
            channel(100, 50, 8.5, 6, 41.5, 0, 0, 25)); /* the web's inner face */
    compare("channel h=100 b=20 tf=8.5 tw=6 r=14",
            channel(100, 20, 8.5, 6, 14, 0, 0, 10)); /* the flange's underside */
    compare("channel h=100 b=50 tf=8.5 tw=6 r=35.5 r2=8.5",
            channel(100, 50, 8.5, 6, 35.5, 8.5, 0, 25)); /* and the tip */
    compare("channel h=100 b=50 tf=8.5 tw=6 slope=0 u=0", channel(100, 50, 8.5, 6, 0, 0, 0, 0));
    compare("channel h=100 b=50 tf=8.5 tw=6 slope=20 u=0", channel(100, 50, 8.5, 6, 0, 0, 0.2, 0));
    compare("channel h=100 b=50 tf=8.5 tw=6 slope=16 u=50",
            channel(100, 50, 8.5, 6, 0, 0, 0.16, 50));
    shape_refused(
        "channel h=100 b=50 tf=8.5 tw=6 r=42", UTW_E_OUTLINE,
        "channel: r = 42 does not fit: at most 41.5 with h = 100, b = 50, tf = 8.5, tw = 6");
    shape_refused("channel h=100 b=50 tf=8.5 tw=6 r=36 r2=8.5", UTW_E_OUTLINE,
                  "channel: r = 36 does not fit: at most 35.5 with h = 100, b = 50, tf = 8.5, tw = "
                  "6, r2 = 8.5");
    shape_refused(
        "channel h=100 b=50 tf=8.5 tw=6 r2=9", UTW_E_OUTLINE,
        "channel: r2 = 9 does not fit: at most 8.5 with h = 100, b = 50, tf = 8.5, tw = 6");
    shape_refused("channel h=100 b=50 tf=8.5 tw=50", UTW_E_OUTLINE,
                  "channel: tw = 50 does not fit: less than 50 with b = 50");
    shape_refused("channel h=100 b=50 tf=50 tw=6", UTW_E_OUTLINE,
                  "channel: tf = 50 does not fit: less than 50 with h = 100");
    shape_refused("channel h=100 b=50 tf=8.5 tw=6 u=51", UTW_E_OUTLINE,
                  "channel: u = 51 does not fit: at most 50 with b = 50");
    /* the tip vanishes at slope tf/u = 8.5/25 */
    shape_refused("channel h=100 b=50 tf=8.5 tw=6 slope=34", UTW_E_OUTLINE,
                  "channel: slope = 34 does not fit: less than 34 with tf = 8.5, u = 25");
    shape_refused("channel h=100 b=50 tf=8.5 tw=6 slope_deg=19", UTW_E_OUTLINE,
                  "channel: slope_deg = 19 does not fit: less than 18.777 with tf = 8.5, u = 25");
    shape_refused("channel h=100 b=50 tf=8.5 tw=6 slope=8 slope_deg=4", UTW_E_SYNTAX,
                  "channel: slope and slope_deg are both given: give one of them");
    /* the flanges meet at the web: 2 (tf + 0.3 (50 - 10 - 6)) < 40 */
    shape_refused("channel h=40 b=50 tf=10 tw=6 slope=30 u=10", UTW_E_OUTLINE,
                  "channel: tf = 10 does not fit: less than 9.8 with h = 40, b = 50, tw = 6, slope "
                  "= 30, u = 10");
}

typedef struct i_beam {
    double h, b, tf, bb, tfb, tw, r, r2, s, u, ub;
} i_beam;

static figure i_figure(i_beam d)
{
    figure f = {0};
    figure_rectangle(&f, 1, -d.tw / 2, 0, d.tw / 2, d.h);
    for (int side = -1; side <= 1; side += 2) {
        flange(&f, side * d.tw / 2, side * d.b / 2, d.h, -1, d.tf + d.s * ((d.b - d.tw) / 2 - d.u),
               d.tf - d.s * d.u, d.r, d.r2);
        flange(&f, side * d.tw / 2, side * d.bb / 2, 0, 1, d.tfb + d.s * ((d.bb - d.tw) / 2 - d.ub),
               d.tfb - d.s * d.ub, d.r, d.r2);
    }
    return f;
}

static void i_beams(void **state)
{
    (void)state;
    compare("I h=200 b=100 tf=8.5 tw=5.6 r=12",
            i_figure((i_beam){200, 100, 8.5, 100, 8.5, 5.6, 12, 0, 0, 0, 0}));
    compare("I h=200 b=100 tf=8.5 tw=5.6",
            i_figure((i_beam){200, 100, 8.5, 100, 8.5, 5.6, 0, 0, 0, 0, 0}));
    compare("I h=200 b=90 tf=11.3 tw=7.5 r=7.5 r2=4.5 slope=14",
            i_figure((i_beam){200, 90, 11.3, 90, 11.3, 7.5, 7.5, 4.5, 0.14, 22.5, 22.5}));
    compare("I h=200 b=90 tf=11.3 tw=7.5 r=7.5 r2=4.5 slope=14 u=20 b_bottom=130 tf_bottom=15",
            i_figure((i_beam){200, 90, 11.3, 130, 15, 7.5, 7.5, 4.5, 0.14, 20, 20}));
    compare("I h=200 b=90 tf=11.3 tw=7.5 slope=14 b_bottom=130",
            i_figure((i_beam){200, 90, 11.3, 130, 11.3, 7.5, 0, 0, 0.14, 22.5, 32.5}));
    compare("I h=200 b=100 tf=8.5 tw=10 r=45",
            i_figure((i_beam){200, 100, 8.5, 100, 8.5, 10, 45, 0, 0, 0, 0}));
    compare("I h=100 b=200 tf=8.5 tw=10 r=41.5",
            i_figure((i_beam){100, 200, 8.5, 200, 8.5, 10, 41.5, 0, 0, 0, 0}));
    utw_outline *o = shape_of("I h=200 b=90 tf=11.3 tw=7.5 r=7.5 r2=4.5 slope=14");
    shape_symmetric(o, 1, 0);
    shape_symmetric(o, 0, 100);
    utw_outline_free(o);
    o = shape_of("I h=200 b=90 tf=11.3 tw=7.5 r=7.5 slope=14 b_bottom=130");
    shape_symmetric(o, 1, 0);
    utw_outline_free(o);
    shape_refused("I h=200 b=100 tf=8.5 tw=10 r=45.1", UTW_E_OUTLINE,
                  "I: r = 45.1 does not fit: at most 45 with h = 200, b = 100, tf = 8.5, tw = 10");
    shape_refused("I h=200 b=100 tf=8.5 tw=10 b_bottom=10", UTW_E_OUTLINE,
                  "I: tw = 10 does not fit: less than 10 with b_bottom = 10");
    shape_refused("I h=200 b=100 tf=8.5 tw=100", UTW_E_OUTLINE,
                  "I: tw = 100 does not fit: less than 100 with b = 100");
    shape_refused("I h=200 b=100 tf=100 tw=10", UTW_E_OUTLINE,
                  "I: tf = 100 does not fit: less than 100 with h = 200, tf_bottom = 100");
    shape_refused("I h=200 b=100 tf=8.5 tw=10 slope=14 u=51", UTW_E_OUTLINE,
                  "I: u = 51 does not fit: at most 50 with b = 100");
    shape_refused("I h=200 b=100 tf=3 tw=10 slope=14", UTW_E_OUTLINE,
                  "I: slope = 14 does not fit: less than 12 with b = 100, tf = 3");
}

/* Flange on top, stem faces at half-width tw/2 + sw (y - h/2). */
static figure tee(double h, double b, double tf, double tw, double r, double r2, double r3,
                  double s, double u, double sw)
{
    figure f = {0};
    /* where flange and stem meet, by the intersection of two lines */
    const double p[2] = {b / 2, h - (tf - s * u)}, dp[2] = {-1, -s}; /* underside, inward */
    const double q[2] = {tw / 2 - sw * h / 2, 0}, dq[2] = {sw, 1};   /* stem's face, upward */
    const double pq[2] = {q[0] - p[0], q[1] - p[1]}, k = utw_cross(pq, dq) / utw_cross(dp, dq);
    const double root[2] = {p[0] + k * dp[0], p[1] + k * dp[1]};
    for (int side = -1; side <= 1; side += 2) {
        const double v[6][2] = {{0, 0},
                                {side * q[0], 0},
                                {side * root[0], root[1]},
                                {side * p[0], p[1]},
                                {side * b / 2, h},
                                {0, h}};
        figure_polygon(&f, side, 6, v);
        const double np = hypot(1, s), nq = hypot(1, sw);
        const double out[2] = {side / np, s / np}, in[2] = {-side / np, -s / np};
        const double up[2] = {side * sw / nq, 1 / nq}, down[2] = {-side * sw / nq, -1 / nq};
        const double top[2] = {0, 1}, level[2] = {-side, 0};
        if (r > 0) figure_spandrel(&f, 1, v[2], out, down, r);
        if (r2 > 0) figure_spandrel(&f, -1, v[3], in, top, r2);
        if (r3 > 0) figure_spandrel(&f, -1, v[1], up, level, r3);
    }
    return f;
}

static void tees(void **state)
{
    (void)state;
    compare("tee h=60 b=70 tf=8.5 tw=6", tee(60, 70, 8.5, 6, 0, 0, 0, 0, 0, 0));
    compare("tee h=60 b=70 tf=8.5 tw=6 r=7 r2=3 r3=1.5", tee(60, 70, 8.5, 6, 7, 3, 1.5, 0, 0, 0));
    compare("tee h=60 b=70 tf=8.5 tw=6 r=7 r2=3 r3=1.5 slope=2 slope_web=2",
            tee(60, 70, 8.5, 6, 7, 3, 1.5, 0.02, 17.5, 0.02));
    compare("tee h=60 b=70 tf=8.5 tw=9 slope=9 u=10 slope_web=6",
            tee(60, 70, 8.5, 9, 0, 0, 0, 0.09, 10, 0.06));
    compare("tee h=60 b=70 tf=8.5 tw=6 r=32 r3=3",
            tee(60, 70, 8.5, 6, 32, 0, 3, 0, 0, 0)); /* both at their limits */
    utw_outline *o = shape_of("tee h=60 b=70 tf=8.5 tw=6 r=7 r2=3 r3=1.5 slope=2 slope_web=2");
    shape_symmetric(o, 1, 0);
    utw_outline_free(o);
    shape_refused("tee h=60 b=70 tf=8.5 tw=6 r3=3.1", UTW_E_OUTLINE,
                  "tee: r3 = 3.1 does not fit: at most 3 with h = 60, b = 70, tf = 8.5, tw = 6");
    shape_refused("tee h=60 b=70 tf=60 tw=6", UTW_E_OUTLINE,
                  "tee: tf = 60 does not fit: less than 60 with h = 60");
    shape_refused("tee h=60 b=70 tf=8.5 tw=70", UTW_E_OUTLINE,
                  "tee: tw = 70 does not fit: less than 70 with b = 70");
    shape_refused("tee h=60 b=70 tf=8.5 tw=6 slope_web=10", UTW_E_OUTLINE,
                  "tee: slope_web = 10 does not fit: less than 10 with h = 60, tw = 6");
    /* the stem at the flange is tw + 2 sw (51.5 - 30) wide */
    shape_refused(
        "tee h=60 b=24 tf=8.5 tw=20 slope_web=10", UTW_E_OUTLINE,
        "tee: tw = 20 does not fit: less than 19.7 with h = 60, b = 24, tf = 8.5, slope_web = 10");
    /* the underside reaches the foot: at the stem it is 59 - 0.5 (35 - 3) below ... */
    shape_refused("tee h=20 b=70 tf=10 tw=6 slope=50 u=0", UTW_E_OUTLINE,
                  "tee: tf = 10 does not fit: less than 4 with h = 20, b = 70, tw = 6, slope = 50");
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(channels),
        balanced_test(channels_at_their_limits),
        balanced_test(i_beams),
        balanced_test(tees),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
