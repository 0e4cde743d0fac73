/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/aerofoil.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "outline/check.h"
#include "outline/intersect.h"
#include "support/figure.h"
#include "support/support.h"

/* NACA 2412, chord 300, skin 2, no spars: what the tests below change. */
static utw_aerofoil plain(void)
{
    utw_error err;
    utw_aerofoil f = {.chord = 300, .n_skin = 1, .skin = {{0, 2}}};
    assert_ok(utw_aerofoil_naca("2412", 0, &f.xy, &f.n, &err));
    return f;
}

static void check(utw_part *part)
{
    utw_error err;
    utw_outline o = {.n_part = 1, .part = part};
    utw_outline_orient(&o);
    assert_ok(utw_outline_check(&o, &err));
}

static utw_part built(const utw_aerofoil *f, int n_loop)
{
    utw_error err;
    utw_part part = {.n_loop = 0};
    assert_ok(utw_aerofoil_part(f, &part, &err));
    assert_int_equal(part.n_loop, n_loop);
    for (int i = 0; i < n_loop; i++) assert_true((utw_loop_area(&part.loop[i]) > 0) == (i == 0));
    check(&part);
    return part;
}

static double from_outline(const utw_part *part, const double p[2])
{
    double least = HUGE_VAL;
    for (int k = 0; k < part->loop[0].n; k++)
        least = fmin(least, utw_curve_nearest(&part->loop[0].curve[k], p, 400, NULL));
    return least;
}

/* A hole's curves are faces square to the chord or keep the skin's thickness from the outline. */
static void the_skin_is_as_thick_as_stated(void **state)
{
    (void)state;
    static const double skin[] = {2, 4.5, 8, 14};
    for (int i = 0; i < 4; i++) {
        utw_aerofoil f = plain();
        f.skin[0][1] = skin[i];
        f.n_spar = i < 2 ? 2 : 0;
        f.spar[0] = (utw_aerofoil_spar){.at = 0.25, .t = 4};
        f.spar[1] = (utw_aerofoil_spar){.at = 0.6, .t = 3};
        utw_part part = built(&f, i < 2 ? 4 : 2);
        double worst = 0;
        for (int l = 1; l < part.n_loop; l++)
            for (int k = 0; k < part.loop[l].n; k++) {
                const utw_curve *c = &part.loop[l].curve[k];
                for (double t = 0.1; t < 1 && c->kind == UTW_CUBIC; t += 0.2) {
                    double p[2];
                    utw_curve_point(c, t, p);
                    worst = fmax(worst, fabs(from_outline(&part, p) - skin[i]));
                }
                if (c->kind == UTW_LINE) assert_true(c->from[0] == c->to[0]);
            }
        /* the cubics' 2e-7 of the chord on either side */
        assert_true(worst < 4e-7 * 300);
        utw_part_clear(&part);
        utw_free(f.xy);
    }
}

static double box_area(const utw_part *part, double x0, double x1)
{
    double sum = 0;
    for (int l = 1; l < part->n_loop; l++) {
        double box[4], low = HUGE_VAL, high = -HUGE_VAL;
        for (int k = 0; k < part->loop[l].n; k++) {
            utw_curve_box(&part->loop[l].curve[k], box);
            low = fmin(low, box[0]);
            high = fmax(high, box[2]);
        }
        if (low > x0 && high < x1) sum -= utw_loop_area(&part->loop[l]);
    }
    return sum;
}

static void spars_take_their_web_out_of_the_cavity(void **state)
{
    (void)state;
    utw_aerofoil f = plain();
    utw_part whole = built(&f, 2);
    const double cavity = box_area(&whole, 0, 300);
    f.n_spar = 1;
    f.spar[0] = (utw_aerofoil_spar){.at = 0.3, .t = 4};
    utw_part two = built(&f, 3);
    /* a web 4 thick and about as high as the section less its skins: 36.0 - 4.0 at 30 % (NACA 2412
     * has its greatest thickness there) */
    assert_close(cavity - box_area(&two, 0, 300), 4 * (36.0 - 4.0), 0.01);
    /* caps add 1.5 to each skin over 20 - 4 of the chord */
    f.spar[0].cap_width = 20;
    f.spar[0].cap_t = 1.5;
    utw_part caps = built(&f, 3);
    assert_close(box_area(&two, 0, 300) - box_area(&caps, 0, 300), 2 * 16 * 1.5, 0.01);
    /* solid ends */
    f.nose = UTW_AEROFOIL_SOLID;
    utw_part nose = built(&f, 2);
    assert_close(box_area(&nose, 0, 300), box_area(&caps, 85, 300), 1e-12);
    f.tail = UTW_AEROFOIL_FACE;
    f.tail_at = 0.7;
    utw_part tail = built(&f, 2);
    assert_true(box_area(&tail, 85, 210.001) > 0);
    f.nose = UTW_AEROFOIL_FACE;
    f.nose_at = 0.05;
    f.tail = UTW_AEROFOIL_SOLID;
    utw_part front = built(&f, 2);
    assert_true(box_area(&front, 14.999, 88.001) > 0);
    utw_part *all[] = {&whole, &two, &caps, &nose, &tail, &front};
    for (int i = 0; i < 6; i++) utw_part_clear(all[i]);
    utw_free(f.xy);
}

static void the_skin_may_change_along_the_chord(void **state)
{
    (void)state;
    utw_aerofoil f = plain();
    const double table[4][2] = {{0.05, 1.5}, {0.3, 4}, {0.7, 4}, {0.9, 1}};
    memcpy(f.skin, table, sizeof table);
    f.n_skin = 4;
    utw_part part = built(&f, 2);
    for (int k = 0; k < part.loop[1].n; k++) {
        double p[2];
        utw_curve_point(&part.loop[1].curve[k], 0.5, p);
        const double off = from_outline(&part, p), s = p[0] / 300;
        /* thickness at the outline's point, which lies ahead or behind by the skin's thickness
         * times its slope at most */
        const double expected = s < 0.05  ? 1.5
                                : s < 0.3 ? 1.5 + 10 * (s - 0.05)
                                : s < 0.7 ? 4
                                : s < 0.9 ? 4 - 15 * (s - 0.7)
                                          : 1;
        assert_true(fabs(off - expected) < 0.12);
        if (s > 0.35 && s < 0.65) assert_true(fabs(off - 4) < 1.2e-4);
    }
    assert_true(part.loop[1].n < 60);
    utw_part_clear(&part);
    utw_free(f.xy);
}

static void refused(const utw_aerofoil *f, const char *message)
{
    utw_error err;
    utw_part part = {.n_loop = 0};
    const utw_status st = utw_aerofoil_part(f, &part, &err);
    if (st == UTW_OK) utw_part_clear(&part);
    assert_string_equal(st == UTW_OK ? "built" : err.text, message);
    assert_int_equal(st, UTW_E_OUTLINE);
    assert_null(part.loop);
}

static void what_does_not_fit_is_told(void **state)
{
    (void)state;
    utw_aerofoil f = plain();
    f.skin[0][1] = 18.5;
    refused(&f, "aerofoil: the skin fills the section, which is 36.02 thick at most, at 0.3 of the "
                "chord; make it thinner, or "
                "\"solid\"");
    f.skin[0][1] = 500;
    refused(&f, "aerofoil: the skin fills the section, which is 36.02 thick at most, at 0.3 of the "
                "chord; make it thinner, or "
                "\"solid\"");
    f.n_skin = 0;
    utw_part solid = built(&f, 1);
    utw_part_clear(&solid);
    f.tail = UTW_AEROFOIL_SOLID;
    refused(&f,
            "aerofoil: a solid section has no spars, nose, tail or r; leave them out, or give the "
            "skin a thickness");
    f.tail = UTW_AEROFOIL_HOLLOW;
    f.n_skin = 1;
    f.skin[0][1] = 0;
    refused(&f,
            "aerofoil: skin = 0 is too thin: more than 0.003, a hundred-thousandth of the chord");
    f.n_skin = 3;
    memcpy(f.skin, (double[3][2]){{0.3, 2}, {0.5, 20}, {0.7, 2}}, sizeof(double[3][2]));
    refused(&f, "aerofoil: the skin fills the section near 0.508 of the chord, between two "
                "cavities; make it thinner there");
    f.skin[2][0] = 0.5;
    refused(
        &f,
        "aerofoil: the stations of the skin must go up along the chord: 0.5 does not follow 0.5");
    f.n_skin = 1;
    f.skin[0][1] = 2;
    f.chord = 0;
    refused(&f, "aerofoil: chord = 0 must be more than 0");
    f.chord = 300;
    f.nose = UTW_AEROFOIL_SOLID;
    refused(&f, "aerofoil: a solid nose or tail ends at a spar, and there is none; give a spar, or "
                "the part of the chord "
                "where it ends");
    f.nose = UTW_AEROFOIL_FACE;
    f.nose_at = 0.99;
    refused(&f,
            "aerofoil: nose: 0.99 must lie in the cavity, from 0.006589 to 0.9601 of the chord");
    f.nose = UTW_AEROFOIL_HOLLOW;
    f.tail = UTW_AEROFOIL_FACE;
    refused(&f, "aerofoil: tail: 0 must lie in the cavity, from 0.006589 to 0.9601 of the chord");
    f.tail = UTW_AEROFOIL_HOLLOW;
    f.n_spar = 2;
    f.spar[0] = (utw_aerofoil_spar){.at = 0.2, .t = 3};
    f.spar[1] = (utw_aerofoil_spar){.at = 0.205, .t = 2};
    refused(&f, "aerofoil: spars 1 and 2, at 0.2 and 0.205, overlap: their webs or caps need 2.5, "
                "0.008333 of the chord");
    f.spar[1].at = 0.97;
    refused(&f, "aerofoil: spar 2 at 0.97 reaches from 0.9667 to 0.9733 of the chord; the cavity, "
                "from 0.006589 to 0.9601");
    f.n_spar = 1;
    f.spar[0].t = 0;
    refused(&f, "aerofoil: spar 1: t = 0 must be more than 0.003");
    f.spar[0] = (utw_aerofoil_spar){.at = 0.2, .t = 3, .cap_width = 2, .cap_t = 1};
    refused(&f, "aerofoil: spar 1: caps of width 2 and thickness 1; they must be wider than the "
                "web, 3, and have a thickness");
    f.spar[0] = (utw_aerofoil_spar){.at = 0.2, .t = 3, .cap_width = 20, .cap_t = 16};
    refused(&f, "aerofoil: at 0.195 of the chord there is no room inside the skin and the caps");
    f.spar[0].cap_t = 2;
    f.tail = UTW_AEROFOIL_FACE;
    f.tail_at = 0.22;
    refused(&f, "aerofoil: between 0.205 and 0.22 of the chord there is no room for a bay: nose, "
                "tail, spars and caps overlap");
    utw_free(f.xy);
}

/* Just inside what the messages above say, every option is drawn. */
static void options_reach_the_edges_of_their_ranges(void **state)
{
    (void)state;
    utw_aerofoil f = plain();
    f.skin[0][1] = 17.99; /* the last bit of a cavity */
    utw_part bit = built(&f, 2);
    assert_true(-utw_loop_area(&bit.loop[1]) < 5);
    utw_part_clear(&bit);
    utw_free(f.xy); /* as thin as may be; behind a blunt edge the skins would not meet */
    utw_error err;
    assert_ok(utw_aerofoil_naca("2412", 1, &f.xy, &f.n, &err));
    f.skin[0][1] = 300 * 1.01e-5;
    utw_part foil = built(&f, 2);
    utw_part_clear(&foil);
    utw_free(f.xy);
    f.xy = plain().xy;
    f.skin[0][1] = 2;
    f.n_spar = UTW_AEROFOIL_SPARS; /* as many spars as may be, webs side by side */
    for (int k = 0; k < f.n_spar; k++)
        f.spar[k] = (utw_aerofoil_spar){.at = 0.1 + 0.02 * k, .t = 300 * (0.02 - 2e-5)};
    utw_part many = built(&f, UTW_AEROFOIL_SPARS + 2);
    utw_part_clear(&many);
    f.n_spar = 1; /* a spar as near to the nose or the tail as the cavity reaches */
    for (int i = 0; i < 2; i++) {
        f.spar[0] = (utw_aerofoil_spar){.at = i == 0 ? 0.0067 + 0.005 : 0.9598 - 0.005, .t = 3};
        utw_part part = built(&f, 3);
        utw_part_clear(&part);
    }
    /* caps that nearly meet, and hardly any; as wide as the bays */
    f.spar[0] = (utw_aerofoil_spar){.at = 0.3, .t = 3, .cap_width = 20, .cap_t = 15.5};
    utw_part thick = built(&f, 3);
    utw_part_clear(&thick);
    f.spar[0] = (utw_aerofoil_spar){.at = 0.3, .t = 3, .cap_width = 3.01, .cap_t = 0.0031};
    utw_part thin = built(&f, 3);
    utw_part_clear(&thin);
    f.n_spar = 2;
    f.spar[0] = (utw_aerofoil_spar){.at = 0.3, .t = 3, .cap_width = 29.99, .cap_t = 1};
    f.spar[1] = (utw_aerofoil_spar){.at = 0.4, .t = 3, .cap_width = 29.99, .cap_t = 1};
    utw_part wide = built(&f, 4);
    utw_part_clear(&wide);
    f.n_spar = 0; /* faces at the ends of the cavity, and next to each other */
    f.nose = f.tail = UTW_AEROFOIL_FACE;
    const double face[2][2] = {{0.00662, 0.96}, {0.4, 0.40002}};
    for (int i = 0; i < 2; i++) {
        f.nose_at = face[i][0];
        f.tail_at = face[i][1];
        utw_part part = built(&f, 2);
        utw_part_clear(&part);
    }
    f.nose = f.tail = UTW_AEROFOIL_HOLLOW;
    f.n_skin = UTW_AEROFOIL_STATIONS; /* as many stations as may be */
    for (int k = 0; k < f.n_skin; k++) {
        f.skin[k][0] = (double)k / (f.n_skin - 1);
        f.skin[k][1] = 2 + 0.5 * (k % 2);
    }
    utw_part stations = built(&f, 2);
    utw_part_clear(&stations);
    utw_free(f.xy);
}

/* What rounding takes from a bay: r^2 (cot a/2 - (pi - a)/2) of each corner, a its angle: exact
 * between straight sides, and they are nearly straight. Counts the corners. */
static double spandrels(const utw_loop *hole, double r, int *n)
{
    double sum = 0;
    *n = 0;
    for (int k = 0; k < hole->n; k++) {
        double d[2], e[2];
        utw_curve_d1(&hole->curve[k], 1, d);
        utw_curve_d1(&hole->curve[(k + 1) % hole->n], 0, e);
        const double turn = fabs(atan2(utw_cross(d, e), utw_dot(d, e)));
        if (turn < 0.1) continue;
        sum += r * r * (tan(turn / 2) - turn / 2);
        ++*n;
    }
    return sum;
}

static void inner_corners_are_rounded(void **state)
{
    (void)state;
    utw_aerofoil f = plain();
    f.n_spar = 2;
    f.spar[0] = (utw_aerofoil_spar){.at = 0.3, .t = 4};
    f.spar[1] = (utw_aerofoil_spar){.at = 0.5, .t = 3};
    utw_part sharp = built(&f, 4);
    f.r = 1.5;
    utw_part round = built(&f, 4);
    for (int k = 1; k < 4; k++) {
        int n;
        const double lost = spandrels(&sharp.loop[k], f.r, &n);
        assert_close(utw_loop_area(&round.loop[k]) - utw_loop_area(&sharp.loop[k]), lost, 0.05);
        assert_int_equal(n, k == 1 ? 2 : k == 2 ? 4 : 3); /* the tail's, too */
        (void)spandrels(&round.loop[k], f.r, &n);
        assert_int_equal(n, 0);
    }
    utw_part_clear(&sharp);
    utw_part_clear(&round);
    f.r = -1;
    refused(&f, "aerofoil: r = -1 must be 0 or more");
    f.r = 20;
    refused(&f,
            "aerofoil: r = 20 does not fit in the corner at (88, -10.43), before the section is "
            "placed; the greatest that fits in this bay is 15.73");
    f.n_spar = 1;
    f.r = 15.73;
    utw_part greatest = built(&f, 3);
    utw_part_clear(&greatest);
    utw_free(f.xy);
}

/* A section like a flat box with a round nose and a square tail. */
static void a_thick_trailing_edge_needs_a_tail(void **state)
{
    (void)state;
    static double xy[][2] = {{1, 0.1},      {0.8, 0.1},    {0.5, 0.1},  {0.2, 0.09},
                             {0.08, 0.07},  {0.02, 0.035}, {0, 0},      {0.02, -0.035},
                             {0.08, -0.07}, {0.2, -0.09},  {0.5, -0.1}, {0.8, -0.1},
                             {1, -0.1}};
    utw_aerofoil f = {.n = 13, .xy = xy, .chord = 100, .n_skin = 1, .skin = {{0, 2}}};
    refused(&f, "aerofoil: the trailing edge is so thick that the skins do not meet; close the "
                "cavity with \"tail\"");
    f.tail = UTW_AEROFOIL_FACE;
    f.tail_at = 0.97;
    utw_part part = built(&f, 2);
    double box[4];
    utw_curve_box(&part.loop[1].curve[0], box);
    assert_close(-utw_loop_area(&part.loop[1]), 93 * 16, 0.1);
    utw_part_clear(&part);
}

/* ---- area: the thickened formula, integrated ---- */

enum { FINE = 40000 };

/* Half thickness (report 460) of NACA 0012 with a blunt or a sharp edge, and its slope. */
static double half(double last, double x, double *slope)
{
    *slope = 0.6 * (0.2969 / (2 * sqrt(x)) - 0.1260 - 2 * 0.3516 * x + 3 * 0.2843 * x * x +
                    4 * last * x * x * x);
    return 0.6 *
           (0.2969 * sqrt(x) - 0.1260 * x - 0.3516 * x * x + 0.2843 * pow(x, 3) + last * pow(x, 4));
}

/* Area of NACA 0012 of chord 1 and of its cavity between x0 and x1, where the cavity exists: by the
 * trapezium rule over points of the formula, each moved square to it by h (elementary). The half
 * above the chord, doubled. */
static void integrate(double last, double h, double x0, double x1, double *whole, double *cavity)
{
    double before[2] = {0, 0}, inside[2] = {0, 0};
    *whole = *cavity = 0;
    for (int i = 1; i <= FINE; i++) {
        const double s = (double)i / FINE, x = s * s;
        double slope;
        const double y = half(last, x, &slope), c = 1 / hypot(1, slope);
        double p[2] = {x + h * slope * c, y - h * c};
        *whole += (y + before[1]) * (x - before[0]);
        before[0] = x;
        before[1] = y;
        /* the part of this strip that is above the chord and between x0 and x1 */
        double a[2] = {inside[0], inside[1]}, b[2] = {p[0], p[1]};
        memcpy(inside, p, sizeof p);
        if (i == 1 || b[0] <= a[0] || b[0] < x0 || a[0] > x1) continue;
        const double rise = (b[1] - a[1]) / (b[0] - a[0]);
        if (a[0] < x0) a[1] += rise * (x0 - a[0]), a[0] = x0;
        if (b[0] > x1) b[1] += rise * (x1 - b[0]), b[0] = x1;
        if (a[1] < 0 && b[1] < 0) continue;
        if (a[1] < 0) a[0] -= a[1] / rise, a[1] = 0;
        if (b[1] < 0) b[0] -= b[1] / rise, b[1] = 0;
        *cavity += (a[1] + b[1]) * (b[0] - a[0]);
    }
}

static void areas_are_those_of_the_thickened_formula(void **state)
{
    (void)state;
    for (int sharp = 0; sharp < 2; sharp++)
        for (int i = 0; i < 3; i++) {
            utw_error err;
            const double skin = (double[]){0.0021, 0.0085, 0.0312}[i], c = 238.5;
            utw_aerofoil f = {.chord = c, .n_skin = 1, .skin = {{0.5, skin * c}}};
            assert_ok(utw_aerofoil_naca("0012", sharp, &f.xy, &f.n, &err));
            f.n_spar = 2;
            f.spar[0] = (utw_aerofoil_spar){.at = 0.25, .t = 0.01 * c};
            f.spar[1] = (utw_aerofoil_spar){.at = 0.6, .t = 0.006 * c};
            utw_part part = built(&f, 4);
            const double end[4] = {-1, 0.25, 0.6, 2}, web[4] = {0, 0.005, 0.003, 0};
            for (int k = 0; k < 4; k++) {
                double whole, cavity;
                integrate(sharp ? -0.1036 : -0.1015, skin, k ? end[k - 1] + web[k - 1] : 0,
                          k ? end[k] - web[k] : 0, &whole, &cavity);
                const double A = utw_loop_area(&part.loop[k]) / c / c;
                /* the cubics may be off by 2e-7 of the chord, here and there */
                assert_true(fabs((k ? -A : A) - (k ? cavity : whole)) < 4e-8);
            }
            utw_part_clear(&part);
            utw_free(f.xy);
        }
}

static void a_refused_allocation_leaves_nothing_behind(void **state)
{
    (void)state;
    utw_aerofoil f = plain();
    f.n_spar = 1;
    f.spar[0] = (utw_aerofoil_spar){.at = 0.25, .t = 4};
    utw_error err;
    utw_part part = {.n_loop = 0};
    utw_status st = UTW_E_NOMEM;
    long n = 0;
    while (st == UTW_E_NOMEM) {
        utw_memory_fail_at(++n);
        st = utw_aerofoil_part(&f, &part, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_null(part.loop);
    }
    assert_int_equal(st, UTW_OK);
    assert_true(n > 10);
    utw_part_clear(&part);
    utw_free(f.xy);
}

/* The same numbers on every machine (Knuth, The Art of Computer Programming 2, 3.3.4). */
static double uniform(unsigned long long *s, double low, double high)
{
    *s = *s * 6364136223846793005ULL + 1442695040888963407ULL;
    return low + (high - low) * (double)(*s >> 11) / 9007199254740992.0;
}

static void random_boxes_are_built_or_refused(void **state)
{
    (void)state;
    unsigned long long s = 5;
    int made = 0;
    for (int i = 0; i < 1000; i++) {
        char designation[40];
        utw_error err;
        utw_aerofoil f = {.chord = pow(10, uniform(&s, -1, 4)),
                          .n_skin = 1 + (int)uniform(&s, 0, 4)};
        snprintf(designation, sizeof designation, "%d%d%02d", (int)uniform(&s, 0, 10),
                 1 + (int)uniform(&s, 0, 9), 1 + (int)uniform(&s, 0, 40));
        assert_ok(utw_aerofoil_naca(designation, i & 1, &f.xy, &f.n, &err));
        for (int k = 0; k < f.n_skin; k++) {
            f.skin[k][0] = (k + uniform(&s, 0, 1)) / f.n_skin;
            f.skin[k][1] = f.chord * pow(10, uniform(&s, -3.5, -1.2));
        }
        f.n_spar = (int)uniform(&s, 0, 4);
        for (int k = 0; k < f.n_spar; k++) {
            f.spar[k].at = 0.1 + 0.7 * (k + uniform(&s, 0, 1)) / f.n_spar;
            f.spar[k].t = f.chord * pow(10, uniform(&s, -3, -1.5));
            if (uniform(&s, 0, 1) < 0.5) continue;
            f.spar[k].cap_width = f.spar[k].t * uniform(&s, 0.9, 8);
            f.spar[k].cap_t = f.spar[k].t * uniform(&s, 0.1, 2);
        }
        f.r = uniform(&s, 0, 1) < 0.5 ? 0 : f.chord * pow(10, uniform(&s, -4, -2));
        f.nose = (utw_aerofoil_end)(int)uniform(&s, 0, 3);
        f.tail = (utw_aerofoil_end)(int)uniform(&s, 0, 3);
        f.nose_at = uniform(&s, 0, 0.3);
        f.tail_at = uniform(&s, 0.6, 1);
        utw_part part = {.n_loop = 0};
        const utw_status st = utw_aerofoil_part(&f, &part, &err);
        if (st == UTW_OK) {
            utw_outline o = {.n_part = 1, .part = &part};
            utw_outline_orient(&o);
            const utw_status sound = utw_outline_check(&o, &err);
            if (sound != UTW_OK) print_message("%d, NACA %s: %s\n", i, designation, err.text);
            assert_int_equal(sound, UTW_OK);
            made++;
            utw_part_clear(&part);
        } else {
            assert_int_equal(st, UTW_E_OUTLINE);
            assert_true(strlen(err.text) > 20);
        }
        utw_free(f.xy);
    }
    print_message("%d of 1000 random boxes were built\n", made);
    assert_true(made > 200);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(the_skin_is_as_thick_as_stated),
        balanced_test(spars_take_their_web_out_of_the_cavity),
        balanced_test(the_skin_may_change_along_the_chord),
        balanced_test(what_does_not_fit_is_told),
        balanced_test(a_thick_trailing_edge_needs_a_tail),
        balanced_test(options_reach_the_edges_of_their_ranges),
        balanced_test(inner_corners_are_rounded),
        balanced_test(areas_are_those_of_the_thickened_formula),
        balanced_test(a_refused_allocation_leaves_nothing_behind),
        balanced_test(random_boxes_are_built_or_refused),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
