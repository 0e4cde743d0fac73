/* SPDX-License-Identifier: GPL-3.0-or-later
 * Aerofoil boxes with thin skins against hand calculation: Bredt's flows in several cells
 * (Megson, Aircraft Structures for Engineering Students, ch. "Bending, shear and torsion of
 * thin-walled beams"), and the thin-walled shear centre of the same midline. */
#include "base/vec2.h"
#include "support/midlines.h"
#include "support/section.h"

enum { HALF = 160, MOST_SPARS = 3, NODES = 2 * (HALF + MOST_SPARS) + 2 };

typedef struct box {
    const char *naca;
    double chord, skin;
    int n_spar;
    double at[MOST_SPARS], t[MOST_SPARS];
    double J_tolerance, shear_centre; /* relative; part of the chord */
} box;

static const box boxes[] = {
    /* the solid tip behind the tail is what a thin-walled drawing leaves out: half the skin, half
       the difference */
    {"0012", 300, 1.5, 0, {0}, {0}, 0.0155, 0.0115},
    {"0012", 300, 0.75, 0, {0}, {0}, 0.0078, 0.0058},
    {"2412", 300, 2, 2, {0.25, 0.6}, {4, 3}, 0.014, 0.004},
    {"4415", 1000, 4, 3, {0.2, 0.4, 0.65}, {6, 4, 4}, 0.008, 0.002},
    {"0018", 160, 1, 1, {0.35}, {1.6}, 0.013, 0.006},
};

/* Middle of the skin at parameter s (x = s^2) of the mean line: the report's formulas (NACA Report
 * 460), sharp edge, moved inward by half the skin. side 1: upper, -1: lower. */
static void middle(const box *b, double s, double side, double p[2])
{
    double q[3][2];
    for (int k = 0; k < 3; k++) { /* the normal from differences */
        const double m = (b->naca[0] - '0') / 100.0, c = (b->naca[1] - '0') / 10.0,
                     t = atof(b->naca + 2) / 100,
                     z = s + (k == 2   ? 0
                              : k == 1 ? 1e-5
                                       : -1e-5),
                     x = z * z;
        const double y =
            5 * t *
            (0.2969 * z - 0.1260 * x - 0.3516 * x * x + 0.2843 * pow(x, 3) - 0.1036 * pow(x, 4));
        const double w = m == 0 ? 1 : x < c ? c * c : (1 - c) * (1 - c);
        const double slope = 2 * m / w * (c - x),
                     line = m / w * ((x < c ? 0 : 1 - 2 * c) + 2 * c * x - x * x);
        q[k][0] = b->chord * (x - side * y * sin(atan(slope)));
        q[k][1] = b->chord * (line + side * y * cos(atan(slope)));
    }
    const double d[2] = {q[1][0] - q[0][0], q[1][1] - q[0][1]}, v = utw_norm(d);
    p[0] = q[2][0] + side * d[1] / v * b->skin / 2;
    p[1] = q[2][1] - side * d[0] / v * b->skin / 2;
}

/* The parameter where the middle has this x. */
static double parameter(const box *b, double x, double side)
{
    double low = 1e-4, high = 1, p[2];
    for (int i = 0; i < 60; i++) {
        const double s = (low + high) / 2;
        middle(b, s, side, p);
        *(p[0] < x ? &low : &high) = s;
    }
    return low;
}

/* Where the two middles cross: they do so at the x where both are at one height. */
static double tail(const box *b)
{
    double low = 0.5, high = 0.9999;
    for (int i = 0; i < 60; i++) {
        const double x = (low + high) / 2 * b->chord;
        double p[2], q[2];
        middle(b, parameter(b, x, 1), 1, p);
        middle(b, parameter(b, x, -1), -1, q);
        *(p[1] > q[1] ? &low : &high) = x / b->chord;
    }
    return low * b->chord;
}

/* The thin-walled drawing: rows[side][k] are the nodes from nose (0) to tail, web[i] the row of
 * spar i. */
typedef struct drawing {
    double node[NODES][2];
    utw_wall wall[NODES + MOST_SPARS];
    int n_node, n_wall, n_row, row[2][HALF + MOST_SPARS + 1], web[MOST_SPARS + 1];
} drawing;

static void draw(const box *b, drawing *d)
{
    const double end = tail(b), nose = b->skin / 2;
    *d = (drawing){.n_node = 0};
    for (int i = 0; i <= HALF; i++) {
        const double s = (double)i / HALF;
        double x = nose + (end - nose) * s * s;
        for (int k = 0; k < b->n_spar; k++) /* the nearest station goes to the spar */
            if (fabs(x - b->at[k] * b->chord) <= s / HALF * end) {
                x = b->at[k] * b->chord;
                d->web[k] = i;
            }
        for (int side = 0; side < 2; side++) {
            double *p = d->node[d->n_node];
            if ((i == 0 || i == HALF) && side == 1) {
                d->row[1][i] = d->row[0][i]; /* nose and tail are common */
                continue;
            }
            middle(b, i == 0 ? 1e-4 : parameter(b, x, side ? -1 : 1), side ? -1 : 1, p);
            if (i == 0) { /* the nose's radius is greater than the skin: straight on from it */
                p[0] = nose;
                p[1] = 0;
            }
            d->row[side][i] = d->n_node++;
        }
    }
    d->n_row = HALF + 1;
    for (int side = 0; side < 2; side++)
        for (int i = 0; i < HALF; i++)
            d->wall[d->n_wall++] = (utw_wall)WALL(d->row[side][i], d->row[side][i + 1], b->skin);
    for (int k = 0; k < b->n_spar; k++)
        d->wall[d->n_wall++] = (utw_wall)WALL(d->row[0][d->web[k]], d->row[1][d->web[k]], b->t[k]);
}

/* sum over cells: q from [delta] q = 2 A, delta = int ds/t around a cell, less that of the web
 * between two; J = 2 sum q A; and t^3/3 of every wall. */
static double bredt(const box *b, const drawing *d)
{
    const int n = b->n_spar + 1;
    double a[MOST_SPARS + 1][MOST_SPARS + 1] = {{0}}, A[MOST_SPARS + 1], q[MOST_SPARS + 1], J = 0;
    for (int c = 0; c < n; c++) {
        const int from = c == 0 ? 0 : d->web[c - 1], to = c == n - 1 ? d->n_row - 1 : d->web[c];
        A[c] = 0;
        for (int side = 0; side < 2; side++)
            for (int i = from; i < to; i++) {
                const double *p = d->node[d->row[side][i]], *r = d->node[d->row[side][i + 1]];
                A[c] += (side ? 1 : -1) * 0.5 * utw_cross(p, r);
                a[c][c] += utw_distance(p, r) / b->skin;
                J += utw_distance(p, r) * pow(b->skin, 3) / 3;
            }
        for (int k = c - 1; k <= c; k++) { /* webs in front and behind */
            if (k < 0 || k >= b->n_spar) continue;
            const double *p = d->node[d->row[0][d->web[k]]], *r = d->node[d->row[1][d->web[k]]],
                         flexibility = utw_distance(p, r) / b->t[k];
            A[c] += (k == c ? 1 : -1) * 0.5 * utw_cross(r, p);
            a[c][c] += flexibility;
            if (k == c) {
                a[c][c + 1] -= flexibility;
                a[c + 1][c] -= flexibility;
                J += utw_distance(p, r) * pow(b->t[k], 3) / 3;
            }
        }
        q[c] = 2 * A[c];
    }
    for (int i = 0; i < n; i++)
        for (int k = i + 1; k < n; k++) {
            const double f = a[k][i] / a[i][i];
            for (int j = i; j < n; j++) a[k][j] -= f * a[i][j];
            q[k] -= f * q[i];
        }
    for (int i = n - 1; i >= 0; i--) {
        for (int j = i + 1; j < n; j++) q[i] -= a[i][j] * q[j];
        q[i] /= a[i][i];
        J += 2 * q[i] * A[i];
    }
    return J;
}

static utw_outline *outline(const box *b)
{
    char spars[300] = "";
    for (int k = 0; k < b->n_spar; k++)
        snprintf(spars + strlen(spars), sizeof spars - strlen(spars), "%s{\"at\":%g,\"t\":%g}",
                 k ? "," : "", b->at[k], b->t[k]);
    return section_outline(0.33,
                           "\"shape\":{\"aerofoil\":{\"naca\":\"%s\",\"chord\":%g,\"skin\":%g,"
                           "\"edge\":\"sharp\",\"spars\":[%s]}}",
                           b->naca, b->chord, b->skin, spars);
}

static void thin_boxes_follow_bredt(void **state)
{
    (void)state;
    for (size_t i = 0; i < sizeof boxes / sizeof *boxes; i++) {
        const box *b = &boxes[i];
        static drawing d;
        draw(b, &d);
        const utw_midline m = {d.n_node, d.n_wall, d.node, d.wall};
        utw_thin *thin = utw_thin_of(&m);
        const utw_thin_constants *c = utw_thin_get(thin);
        const double J = bredt(b, &d);
        assert_close(c->J, J, 1e-9); /* the library's own thin-walled theory is the same sum */
        utw_outline *o = outline(b);
        double found[2][2];
        for (int k = 0; k < 2; k++) {
            utw_solution *s = section_solve(o, k == 0 ? 1e-3 : 1e-6, 0);
            const utw_quantity j = section_constant(s, UTW_J), x = section_constant(s, UTW_XS),
                               y = section_constant(s, UTW_YS);
            assert_close(j.value, J, b->J_tolerance);
            assert_true(fabs(x.value - c->xs) < b->shear_centre * b->chord);
            assert_true(fabs(y.value - c->ys) < b->shear_centre * b->chord);
            assert_true(j.low > J); /* the tip is material too */
            if (b->naca[0] == '0') assert_true(y.low <= 0 && 0 <= y.high);
            /* ahead of the middle of the chord, between the skins */
            assert_true(x.value > 0.15 * b->chord && x.value < 0.5 * b->chord);
            found[k][0] = j.low;
            found[k][1] = j.high;
            utw_solution_free(s);
        }
        assert_true(found[1][0] <= found[0][1] && found[0][0] <= found[1][1]); /* they overlap */
        utw_outline_free(o);
        utw_thin_free(thin);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(thin_boxes_follow_bredt)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
