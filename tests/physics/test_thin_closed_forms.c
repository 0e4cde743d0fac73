/* SPDX-License-Identifier: GPL-3.0-or-later
 * Thin-walled theory against closed formulas: first fixed sections to all printed digits, then the
 * formulas at other dimensions.
 *
 * Sources of the formulas. [V] Vlasov, Thin-Walled Elastic Beams, 1961. [TG] Timoshenko and Gere,
 * Theory of Elastic Stability, 2nd ed. 1961, appendix. [Mu] Murray, Introduction to the Theory of
 * Thin-Walled Structures, 1984. [B] Bredt, Zeitschrift VDI 40 (1896). [KB] Kollbrunner and Basler,
 * Torsion in Structures, 1969. The formulas are written from memory; the digits were evaluated
 * independently of this program. Shear factors: V^2 / (A int q^2/t ds) with the shear flows of the
 * same texts. */
#include "support/midlines.h"

static const double pi = 3.14159265358979323846;

#define CHECK(quantity, value)      assert_close(k->quantity, value, 1e-12)
#define CHECK_ZERO(quantity, scale) assert_close_scaled(k->quantity, 0.0, 1e-13, scale)

static void channel(void **state) /* [V][TG]: web on x = 0, flanges to x = 4 */
{
    (void)state;
    double nodes[][2] = {{4, -5}, {0, -5}, {0, 5}, {4, 5}};
    utw_wall walls[] = {WALL(0, 1, 0.5), WALL(1, 2, 0.3), WALL(2, 3, 0.5)};
    const utw_midline m = MIDLINE(nodes, walls);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_constants *k = utw_thin_get(thin);
    CHECK(A, 7.0);
    CHECK(xc, 1.142857142857143);
    CHECK(Ixx, 125.0);
    CHECK(Iyy, 12.19047619047619);
    CHECK_ZERO(Ixy, 125.0);
    CHECK(J, 0.4233333333333333);
    CHECK(J_open, 0.4233333333333333);
    assert_true(k->J_bredt == 0);
    CHECK(xs, -1.6); /* behind the web, outside the section */
    CHECK_ZERO(ys, 5.0);
    CHECK(Iw, 213.3333333333333);
    CHECK(Asx, 7.0 * 0.28251393257187);
    CHECK(Asy, 7.0 * 0.3859613009468917);
    CHECK(Wt, 0.4233333333333333 / 0.5);
    CHECK(I1, 125.0);
    CHECK(I2, 12.19047619047619);
    assert_true(k->angle == 0 && k->n_cells == 0 && k->n_ends == 2 && k->n_junctions == 0 &&
                !k->straight);
    utw_thin_free(thin);
}

static void lipped_channel(void **state) /* [V][TG][Mu] */
{
    (void)state;
    double nodes[][2] = {{5, -3}, {5, -5}, {0, -5}, {0, 5}, {5, 5}, {5, 3}};
    utw_wall walls[] = {WALL(0, 1, 0.2), WALL(1, 2, 0.2), WALL(2, 3, 0.2), WALL(3, 4, 0.2),
                        WALL(4, 5, 0.2)};
    const utw_midline m = MIDLINE(nodes, walls);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_constants *k = utw_thin_get(thin);
    CHECK(A, 4.8);
    CHECK(xc, 1.875);
    CHECK(Ixx, 79.73333333333333);
    CHECK(Iyy, 19.79166666666667);
    CHECK(J, 0.064);
    CHECK(xs, -2.755016722408027);
    CHECK(Iw, 538.1479933110368);
    utw_thin_free(thin);
}

static void zed(void **state) /* [V][TG]: top flange to +x */
{
    (void)state;
    double nodes[][2] = {{-4, -5}, {0, -5}, {0, 5}, {4, 5}};
    utw_wall walls[] = {WALL(0, 1, 0.5), WALL(1, 2, 0.3), WALL(2, 3, 0.5)};
    const utw_midline m = MIDLINE(nodes, walls);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_constants *k = utw_thin_get(thin);
    CHECK(A, 7.0);
    CHECK(Ixx, 125.0);
    CHECK(Iyy, 21.33333333333333);
    CHECK(Ixy, 40.0);
    CHECK(J, 0.4233333333333333);
    CHECK_ZERO(xs, 5.0);
    CHECK_ZERO(ys, 5.0);
    CHECK(Iw, 304.7619047619048);
    /* Mohr's circle */
    CHECK(I1, 73.16666666666667 + hypot(51.83333333333333, 40.0));
    CHECK(angle, atan2(-40.0, 51.83333333333333) / 2);
    utw_thin_free(thin);
}

static void unequal_i(void **state) /* [V][TG] */
{
    (void)state;
    double nodes[][2] = {{-4, 0}, {0, 0}, {4, 0}, {-6, 20}, {0, 20}, {6, 20}};
    utw_wall walls[] = {WALL(0, 1, 1), WALL(1, 2, 1), WALL(3, 4, 2), WALL(4, 5, 2),
                        WALL(1, 4, 0.5)};
    const utw_midline m = MIDLINE(nodes, walls);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_constants *k = utw_thin_get(thin);
    CHECK(A, 42.0);
    CHECK(yc, 13.80952380952381);
    CHECK(Ixx, 2923.809523809524);
    CHECK(Iyy, 330.6666666666667);
    CHECK(J, 35.5);
    CHECK(ys, 17.41935483870968);
    CHECK(Iw, 14864.51612903226);
    assert_int_equal(k->n_junctions, 2);
    utw_thin_free(thin);
}

static void tee_and_angle(void **state) /* [V][TG]: Iw = 0 about the point where the walls meet */
{
    (void)state;
    double tee[][2] = {{-5, 12}, {0, 12}, {5, 12}, {0, 0}};
    utw_wall tee_walls[] = {WALL(0, 1, 0.8), WALL(1, 2, 0.8), WALL(1, 3, 0.5)};
    const utw_midline m = MIDLINE(tee, tee_walls);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_constants *k = utw_thin_get(thin);
    CHECK(A, 14.0);
    CHECK(yc, 9.428571428571429);
    CHECK(Ixx, 195.4285714285714);
    CHECK(Iyy, 66.66666666666667);
    CHECK(J, 2.206666666666667);
    CHECK(ys, 12.0);
    assert_true(k->Iw == 0);
    CHECK(Iw_secondary, 9.555555555555555);
    utw_thin_free(thin);

    double angle[][2] = {{10, 0}, {0, 0}, {0, 6}};
    utw_wall angle_walls[] = {WALL(0, 1, 0.8), WALL(1, 2, 0.8)};
    const utw_midline n = MIDLINE(angle, angle_walls);
    thin = utw_thin_of(&n);
    k = utw_thin_get(thin);
    CHECK(A, 12.8);
    CHECK(xc, 3.125);
    CHECK(yc, 1.125);
    CHECK(Ixx, 41.4);
    CHECK(Iyy, 141.6666666666667);
    CHECK(Ixy, -45.0);
    CHECK(J, 2.730666666666667);
    CHECK_ZERO(xs, 10.0);
    CHECK_ZERO(ys, 10.0);
    assert_true(k->Iw == 0);
    CHECK(Iw_secondary, 17.29422222222222);
    utw_thin_free(thin);
}

static void
arcs(void **state) /* [V][TG]: radius 3, thickness 0.1, symmetric about +x, centre at the origin */
{
    (void)state;
    double slit[][2] = {{-3, 0}, {-3, 0}}; /* a slit at -x */
    utw_wall round[] = {ARC(0, 1, 0.1, 0.1, 3, 0)};
    const utw_midline tube = MIDLINE(slit, round);
    utw_thin *thin = utw_thin_of(&tube);
    const utw_thin_constants *k = utw_thin_get(thin);
    CHECK(A, 1.884955592153876);
    CHECK(Ixx, 8.482300164692441);
    CHECK(Iyy, 8.482300164692441);
    CHECK(J, 0.006283185307179586);
    CHECK(xs, 6.0);
    CHECK(Iw, 196.9388762919292);
    utw_thin_free(thin);

    double ends120[][2] = {{1.5, -1.5 * sqrt(3)}, {1.5, 1.5 * sqrt(3)}};
    const utw_midline arc120 = MIDLINE(ends120, round);
    thin = utw_thin_of(&arc120);
    k = utw_thin_get(thin);
    CHECK(A, 0.6283185307179586);
    CHECK(xc, 2.480980029398064);
    CHECK(Ixx, 1.658299093121822);
    CHECK(Iyy, 0.1291025662067494);
    CHECK(J, 0.002094395102393195);
    CHECK(xs, 3.345181457087095);
    CHECK(Iw, 0.04700285443755283);
    utw_thin_free(thin);

    double ends180[][2] = {{0, -3}, {0, 3}};
    const utw_midline arc180 = MIDLINE(ends180, round);
    thin = utw_thin_of(&arc180);
    k = utw_thin_get(thin);
    CHECK(A, 0.942477796076938);
    CHECK(xc, 1.909859317102744);
    CHECK(Ixx, 4.241150082346221);
    CHECK(Iyy, 0.8034033115612816);
    CHECK(J, 0.003141592653589793);
    CHECK(xs, 3.819718634205488);
    CHECK(Iw, 0.9082684034782293);
    utw_thin_free(thin);
}

static void boxes(void **state) /* [B][KB] */
{
    (void)state;
    double nodes[][2] = {{0, 0}, {10, 0}, {10, 6}, {0, 6}};
    utw_wall twofold[] = {WALL(0, 1, 0.4), WALL(1, 2, 0.2), WALL(2, 3, 0.4), WALL(3, 0, 0.2)};
    const utw_midline box = MIDLINE(nodes, twofold);
    utw_thin *thin = utw_thin_of(&box);
    const utw_thin_constants *k = utw_thin_get(thin);
    CHECK(A, 10.4);
    CHECK(Ixx, 79.2);
    CHECK(Iyy, 126.6666666666667);
    CHECK(J_bredt, 130.9090909090909);
    CHECK(J_open, 0.4586666666666667);
    CHECK(J, 130.9090909090909 + 0.4586666666666667);
    CHECK(Iw, 6.446280991735537);
    const utw_thin_load none = {.N = 0};
    utw_thin_station corner;
    utw_error err;
    assert_ok(utw_thin_at(thin, 0, 0, &none, &corner, &err));
    assert_close(fabs(corner.omega), 1.363636363636364, 1e-12);
    utw_thin_free(thin);

    utw_wall fourfold[] = {WALL(0, 1, 0.4), WALL(1, 2, 0.2), WALL(2, 3, 0.3), WALL(3, 0, 0.5)};
    const utw_midline box4 = MIDLINE(nodes, fourfold);
    thin = utw_thin_of(&box4);
    k = utw_thin_get(thin);
    CHECK(A, 11.2);
    CHECK(xc, 4.196428571428571);
    CHECK(yc, 2.732142857142857);
    CHECK(Ixx, 74.79642857142856);
    CHECK(Iyy, 156.1011904761905);
    CHECK(J_bredt, 143.5215946843854);
    CHECK(J_open, 0.5693333333333332);
    CHECK(xs, 3.146345941975762);
    CHECK(ys, 2.528653417485844);
    CHECK(Iw, 21.88871633523853);
    CHECK(Asx, 11.2 * 0.5568224384079408);
    CHECK(Asy, 11.2 * 0.2527505308263349);
    utw_thin_free(thin);
}

static void two_cells(void **state) /* [B][KB] */
{
    (void)state;
    double nodes[][2] = {{0, 0}, {2, 0}, {5, 0}, {0, 3}, {2, 3}, {5, 3}};
    utw_wall walls[] = {WALL(0, 1, 0.1), WALL(3, 4, 0.15), WALL(1, 2, 0.2), WALL(4, 5, 0.1),
                        WALL(0, 3, 0.1), WALL(1, 4, 0.3),  WALL(2, 5, 0.2)};
    const utw_midline m = MIDLINE(nodes, walls);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_constants *k = utw_thin_get(thin);
    CHECK(A, 3.2);
    CHECK(xc, 2.640625);
    CHECK(yc, 1.40625);
    CHECK(Ixx, 4.471875);
    CHECK(Iyy, 8.653385416666667);
    CHECK(J_bredt, 7.581456953642384);
    CHECK(J_open, 0.04791666666666667);
    CHECK(xs, 2.663142950269155);
    CHECK(ys, 1.110846477406283);
    CHECK(Iw, 1.963876005399063);
    CHECK(Asx, 3.2 * 0.379212059415912);
    CHECK(Asy, 3.2 * 0.4729939535820733);
    assert_int_equal(k->n_cells, 2);
    utw_thin_free(thin);
}

static void box_with_fins(void **state) /* [B][KB] */
{
    (void)state;
    double nodes[][2] = {{-2, 0}, {2, 0}, {-3, 2}, {-2, 2}, {2, 2}, {3, 2}};
    utw_wall walls[] = {WALL(0, 1, 0.02), WALL(2, 3, 0.03), WALL(3, 4, 0.03),
                        WALL(4, 5, 0.03), WALL(0, 3, 0.02), WALL(1, 4, 0.02)};
    const utw_midline m = MIDLINE(nodes, walls);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_constants *k = utw_thin_get(thin);
    CHECK(A, 0.34);
    CHECK(yc, 1.294117647058824);
    CHECK(Ixx, 0.2572549019607843);
    CHECK(Iyy, 0.9666666666666667);
    CHECK(J_bredt, 0.48);
    CHECK(J_open, 7.533333333333333e-05);
    CHECK(ys, 1.220689655172414);
    CHECK(Iw, 0.02625287356321839);
    CHECK(Asx, 0.34 * 0.6380914010924185);
    CHECK(Asy, 0.34 * 0.1770062928843418);
    assert_int_equal(k->n_ends, 2);
    assert_int_equal(k->n_junctions, 2);
    utw_thin_free(thin);
}

/* [V][TG]: channel e = 3 b^2 tf/(6 b tf + h tw), Iw = tf b^3 h^2/12 (3 b tf + 2 h tw)/(6 b tf + h
 * tw); zed Iw = tf b^3 h^2/12 (b tf + 2 h tw)/(2 b tf + h tw); two flanges of moments I1, I2 at
 * distance h: the shear centre divides h as I2 : I1 and Iw = h^2 I1 I2/(I1 + I2). */
static void open_sections_at_other_dimensions(void **state)
{
    (void)state;
    for (int i = 0; i < 40; i++) {
        const double h = 7.31 + 11.3 * i, b = 2.385 + 1.7 * i, tf = 0.31 + 0.07 * (i % 7);
        const double tw = 0.23 + 0.11 * (i % 5), bottom = 1.9 + 0.8 * i;
        double c[][2] = {{b, -h / 2}, {0, -h / 2}, {0, h / 2}, {b, h / 2}};
        utw_wall walls[] = {WALL(0, 1, tf), WALL(1, 2, tw), WALL(2, 3, tf)};
        utw_midline m = MIDLINE(c, walls);
        utw_thin *thin = utw_thin_of(&m);
        const utw_thin_constants *k = utw_thin_get(thin);
        CHECK(xs, -3 * b * b * tf / (6 * b * tf + h * tw));
        CHECK(Iw, tf * b * b * b * h * h / 12 * (3 * b * tf + 2 * h * tw) / (6 * b * tf + h * tw));
        utw_thin_free(thin);

        c[0][0] = -b;
        thin = utw_thin_of(&m);
        k = utw_thin_get(thin);
        CHECK(Iw, tf * b * b * b * h * h / 12 * (b * tf + 2 * h * tw) / (2 * b * tf + h * tw));
        utw_thin_free(thin);

        double n[][2] = {{-b, h}, {0, h}, {b, h}, {-bottom, 0}, {0, 0}, {bottom, 0}};
        utw_wall w[] = {WALL(1, 0, tf), WALL(1, 2, tf), WALL(3, 4, tw), WALL(5, 4, tw),
                        WALL(4, 1, 0.2)};
        const utw_midline two = MIDLINE(n, w);
        thin = utw_thin_of(&two);
        k = utw_thin_get(thin);
        const double top = 2 * tf * b * b * b / 3, low = 2 * tw * bottom * bottom * bottom / 3;
        CHECK(ys, h * top / (top + low));
        CHECK(Iw, h * h * top * low / (top + low));
        utw_thin_free(thin);
    }
}

/* [V][TG]: arc of radius R over 2 a: e = 2 R (sin a - a cos a)/(a - sin a cos a) from the centre,
 * Iw = 2 t R^5/3 (a^3 - 6 (sin a - a cos a)^2/(a - sin a cos a)). From 20 to 360 degrees. */
static void arcs_at_other_openings(void **state)
{
    (void)state;
    for (int i = 1; i <= 18; i++) {
        const double r = 4.37, t = 0.085, a = pi * i / 18, f = sin(a) - a * cos(a),
                     g = a - sin(a) * cos(a);
        double ends[][2] = {{r * cos(a), -r * sin(a)}, {r * cos(a), r * sin(a)}};
        utw_wall walls[] = {ARC(0, 1, t, t, r, 0)};
        const utw_midline m = MIDLINE(ends, walls);
        utw_thin *thin = utw_thin_of(&m);
        const utw_thin_constants *k = utw_thin_get(thin);
        assert_close(k->A, 2 * a * r * t, 1e-12);
        assert_close(k->xs, 2 * r * f / g,
                     1e-9); /* the formula cancels at small openings, not we */
        assert_close_scaled(k->Iw, 2 * t * pow(r, 5) / 3 * (a * a * a - 6 * f * f / g), 1e-12,
                            t * pow(r, 5) * a * a * a);
        utw_thin_free(thin);
    }
}

/* [B] J = 4 A^2/int ds/t; [KB] the box's omega at the corner b h/4 (b tw - h tf)/(b tw + h tf), Iw
 * = omega^2 A/3; and the tube: J = 2 pi R^3 t, shear area A/2. */
static void closed_sections_at_other_dimensions(void **state)
{
    (void)state;
    for (int i = 0; i < 30; i++) {
        const double b = 3.7 + 1.9 * i, h = 2.9 + 0.83 * i, tf = 0.11 + 0.03 * (i % 4),
                     tw = 0.05 + 0.04 * (i % 9);
        double n[][2] = {{0, 0}, {b, 0}, {b, h}, {0, h}};
        utw_wall w[] = {WALL(0, 1, tf), WALL(1, 2, tw), WALL(2, 3, tf), WALL(3, 0, tw)};
        const utw_midline m = MIDLINE(n, w);
        utw_thin *thin = utw_thin_of(&m);
        const utw_thin_constants *k = utw_thin_get(thin);
        const double corner = b * h / 4 * (b * tw - h * tf) / (b * tw + h * tf);
        const double q = 2 * b * h / (2 * b / tf + 2 * h / tw); /* flow per G theta' */
        CHECK(J_bredt, 2 * b * h * q);
        CHECK(J_open, 2.0 / 3 * (b * tf * tf * tf + h * tw * tw * tw));
        CHECK(Wt, k->J / fmax(q / tf + tf, q / tw + tw));
        assert_close_scaled(k->Iw, corner * corner * k->A / 3, 1e-12, 1e-4 * b * b * h * h * k->A);
        utw_thin_free(thin);

        double at[][2] = {{b, h}};
        utw_wall ring[] = {ARC(0, 0, tf, tf, b, h + 2 * tw)};
        const utw_midline tube = MIDLINE(at, ring);
        thin = utw_thin_of(&tube);
        k = utw_thin_get(thin);
        CHECK(J_bredt, 2 * pi * tw * tw * tw * tf);
        CHECK(Asx, pi * tw * tf);
        CHECK(Asy, pi * tw * tf);
        CHECK(xs, b);
        CHECK(ys, h + tw);
        assert_true(k->Iw == 0); /* a circular tube does not warp */
        utw_thin_free(thin);
    }
}

/* Bredt and Batho by hand: three equal rectangular cells in a row, b by h, all walls t. The flows
 * obey q1 (2b + 2h) - q2 h = 2 b h t, -2 q1 h + q2 (2b + 2h) = 2 b h t (by symmetry q3 = q1). */
static void three_cells_by_hand(void **state)
{
    (void)state;
    const double b = 2.3, h = 3.1, t = 0.17;
    double n[8][2];
    utw_wall w[10];
    for (int i = 0; i < 4; i++) {
        n[i][0] = n[4 + i][0] = b * i;
        n[i][1] = 0;
        n[4 + i][1] = h;
        w[i] = (utw_wall)WALL(i, 4 + i, t);
    }
    for (int i = 0; i < 3; i++) {
        w[4 + i] = (utw_wall)WALL(i, i + 1, t);
        w[7 + i] = (utw_wall)WALL(5 + i, 4 + i, t);
    }
    const utw_midline m = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_constants *k = utw_thin_get(thin);
    const double p = 2 * (b + h), r = 2 * b * h * t, det = p * p - 2 * h * h;
    const double q1 = r * (p + h) / det, q2 = r * (p + 2 * h) / det;
    CHECK(J_bredt, 2 * b * h * (2 * q1 + q2));
    CHECK(xs, 1.5 * b);
    CHECK(ys, h / 2);
    assert_int_equal(k->n_cells, 3);
    utw_thin_free(thin);
}

/* A flat plate: shear area 5/6 A along it (a rectangle's by Timoshenko 1921), none across; a
 * wedge's shear centre by Duncan's rule int t^3 x / int t^3, with t = c (1 + x/L): (1^3..2^3):
 * 49/75 L. */
static void walls_on_one_line(void **state)
{
    (void)state;
    double n[][2] = {{-1.7, 2.2}, {0.6, 2.2}, {5.1, 2.2}};
    utw_wall w[] = {WALL(0, 1, 0.37), WALL(1, 2, 0.37)};
    const utw_midline m = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&m);
    const utw_thin_constants *k = utw_thin_get(thin);
    assert_true(k->straight && k->Ixx == 0 && k->Asy == 0 && k->Iw == 0);
    CHECK(Asx, 5.0 / 6 * k->A);
    CHECK(xs, 1.7);
    CHECK(ys, 2.2);
    CHECK(Iw_secondary, pow(0.37 * 6.8, 3) / 144);
    utw_thin_free(thin);

    double v[][2] = {{0, 0}, {0, 6.2}};
    utw_wall wedge[] = {TAPER(0, 1, 0.2, 0.4)};
    const utw_midline up = MIDLINE(v, wedge);
    thin = utw_thin_of(&up);
    k = utw_thin_get(thin);
    CHECK(ys, 6.2 * 49 / 75);
    CHECK(yc, 6.2 * 5 / 9);
    assert_true(k->straight && k->Asx == 0 && k->Asy > 0);
    utw_thin_free(thin);

    v[1][0] = 3.3;
    thin = utw_thin_of(&up);
    k = utw_thin_get(thin);
    assert_true(k->straight && k->Asx == 0 && k->Asy == 0);
    assert_close(k->ys, 6.2 * 49 / 75, 1e-12);
    assert_close(k->xs, 3.3 * 49 / 75, 1e-12);
    utw_thin_free(thin);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(channel),
        balanced_test(lipped_channel),
        balanced_test(zed),
        balanced_test(unequal_i),
        balanced_test(tee_and_angle),
        balanced_test(arcs),
        balanced_test(boxes),
        balanced_test(two_cells),
        balanced_test(box_with_fins),
        balanced_test(open_sections_at_other_dimensions),
        balanced_test(arcs_at_other_openings),
        balanced_test(closed_sections_at_other_dimensions),
        balanced_test(three_cells_by_hand),
        balanced_test(walls_on_one_line),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
