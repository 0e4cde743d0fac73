/* SPDX-License-Identifier: GPL-3.0-or-later
 * The same answers by another road: the displacement method. Its unknowns are the axial
 * displacements of the nodes, not flows of cells; a wall is a spring of stiffness 1 / int ds/t;
 * integrals along walls by brute force. torsion  per G theta': q int ds/t = u_to - u_from + int r_n
 * ds, sum of q at a node 0; J = sum q int r_n ds. flexure  per G: q = q0 - int t sigma' ds, int q/t
 * ds = u_to - u_from. */
#include "support/midlines.h"

enum { STEPS = 4000, MOST = 32 };

typedef struct wall_sums {
    double f, sector, gain[2],
        gain_f[2]; /* gain of the flow along the wall for unit Vx, Vy; int of it /t ds */
} wall_sums;

/* d sigma/dz = b x + a y for a unit force along x (k = 0) or y (k = 1). */
static void rates(const utw_thin_constants *c, int k, double *b, double *a)
{
    const double d = c->Ixx * c->Iyy - c->Ixy * c->Ixy;
    *b = (k == 0 ? c->Ixx : -c->Ixy) / d;
    *a = (k == 0 ? -c->Ixy : c->Iyy) / d;
}

/* Point of a wall at fraction u, straight from the drawing: on the circle through the three points.
 */
static void wall_point(const utw_midline *m, int w, double u, double p[2])
{
    const utw_wall *g = &m->walls[w];
    const double *a = m->nodes[g->from], *b = m->nodes[g->to], *c = g->mid;
    for (int k = 0; k < 2; k++) p[k] = a[k] + u * (b[k] - a[k]);
    if (!g->arc) return;
    double o[2] = {(a[0] + c[0]) / 2, (a[1] + c[1]) / 2};
    double angle = 2 * acos(-1.0);
    if (hypot(b[0] - a[0], b[1] - a[1]) > 0) {
        const double ax = c[0] - a[0], ay = c[1] - a[1], bx = b[0] - a[0], by = b[1] - a[1];
        const double d = 2 * (ax * by - ay * bx), aa = ax * ax + ay * ay, bb = bx * bx + by * by;
        o[0] = a[0] + (by * aa - ay * bb) / d;
        o[1] = a[1] + (ax * bb - bx * aa) / d;
        angle = atan2(b[1] - o[1], b[0] - o[0]) - atan2(a[1] - o[1], a[0] - o[0]);
        if (d > 0 && angle < 0) angle += 2 * acos(-1.0);
        if (d < 0 && angle > 0) angle -= 2 * acos(-1.0);
    }
    const double s = sin(u * angle), t = cos(u * angle), x = a[0] - o[0], y = a[1] - o[1];
    p[0] = o[0] + t * x - s * y;
    p[1] = o[1] + s * x + t * y;
}

/* Trapezoids refined by Richardson's extrapolation from STEPS and STEPS/2: error of order STEPS^-4.
 */
static wall_sums sum_wall(const utw_midline *m, const utw_thin_constants *c, int w, int steps)
{
    const utw_wall *g = &m->walls[w];
    const double length = utw_wall_length(m, w), ds = length / steps;
    wall_sums r = {.f = 0};
    double before[2];
    wall_point(m, w, 0, before);
    for (int i = 0; i < steps; i++) {
        double p[2], mid[2];
        wall_point(m, w, (i + 0.5) / steps, mid);
        wall_point(m, w, (i + 1.0) / steps, p);
        const double t = g->t0 + (g->t1 - g->t0) * (i + 0.5) / steps;
        r.f += ds / t;
        r.sector += (before[0] - c->xc) * (p[1] - c->yc) - (before[1] - c->yc) * (p[0] - c->xc);
        for (int k = 0; k < 2; k++) {
            double b, a;
            rates(c, k, &b, &a);
            const double step = -(b * (mid[0] - c->xc) + a * (mid[1] - c->yc)) * t * ds;
            r.gain_f[k] += (r.gain[k] + step / 2) * ds / t;
            r.gain[k] += step;
        }
        before[0] = p[0];
        before[1] = p[1];
    }
    return r;
}

static wall_sums refined(const utw_midline *m, const utw_thin_constants *c, int w)
{
    const wall_sums coarse = sum_wall(m, c, w, STEPS / 2), fine = sum_wall(m, c, w, STEPS);
    wall_sums r;
    const double *from = &coarse.f, *to = &fine.f;
    double *out = &r.f;
    for (size_t i = 0; i < sizeof r / sizeof(double); i++) out[i] = to[i] + (to[i] - from[i]) / 3;
    return r;
}

/* Gauss elimination with row exchange. */
static void solve(int n, double a[MOST][MOST + 1], double x[MOST])
{
    for (int k = 0; k < n; k++) {
        int best = k;
        for (int i = k + 1; i < n; i++)
            if (fabs(a[i][k]) > fabs(a[best][k])) best = i;
        for (int j = 0; j <= n; j++) {
            const double keep = a[k][j];
            a[k][j] = a[best][j];
            a[best][j] = keep;
        }
        assert_true(fabs(a[k][k]) > 0);
        for (int i = k + 1; i < n; i++) {
            const double f = a[i][k] / a[k][k];
            for (int j = k; j <= n; j++) a[i][j] -= f * a[k][j];
        }
    }
    for (int k = n - 1; k >= 0; k--) {
        x[k] = a[k][n];
        for (int j = k + 1; j < n; j++) x[k] -= a[k][j] * x[j];
        x[k] /= a[k][k];
    }
}

/* Start flows q0 = (u_to - u_from + drive)/f, where the flow at the end is q0 + gain. */
static void node_method(const utw_midline *m, const wall_sums *sums, const double *drive,
                        const double *gain, double *q0)
{
    static double a[MOST][MOST + 1];
    double u[MOST];
    assert_true(m->n_nodes <= MOST);
    memset(a, 0, sizeof a);
    const int n = m->n_nodes;
    for (int w = 0; w < m->n_walls; w++) {
        const int i = m->walls[w].from, j = m->walls[w].to;
        const double k = 1 / sums[w].f;
        /* leaving i: q0; leaving j: -(q0 + gain) */
        a[i][j] += k;
        a[i][i] -= k;
        a[i][n] -= k * drive[w];
        a[j][j] -= k;
        a[j][i] += k;
        a[j][n] += k * drive[w] + gain[w];
    }
    for (int j = 0; j <= n; j++) a[0][j] = j == 0; /* u of node 0 is 0 in place of its balance */
    solve(n, a, u);
    for (int w = 0; w < m->n_walls; w++)
        q0[w] = (u[m->walls[w].to] - u[m->walls[w].from] + drive[w]) / sums[w].f;
}

static void displacement_method_agrees(void **state)
{
    (void)state;
    const char *name;
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        const utw_midline *m = utw_midline_sample(i, &name);
        utw_thin *thin = utw_thin_of(m);
        const utw_thin_constants *k = utw_thin_get(thin);
        wall_sums sums[MOST];
        double drive[MOST], gain[MOST] = {0}, q[MOST], j = 0, greatest = 0;
        utw_thin_station at;
        utw_error err;
        for (int w = 0; w < m->n_walls; w++) {
            sums[w] = refined(m, k, w);
            drive[w] = sums[w].sector;
        }
        node_method(m, sums, drive, gain, q);
        for (int w = 0; w < m->n_walls; w++) {
            j += q[w] * sums[w].sector;
            greatest = fmax(greatest, fabs(q[w]));
        }
        assert_close_scaled(k->J_bredt, j, 1e-9, 1e-3 * k->J);
        const utw_thin_load twist = {.T = k->J};
        for (int w = 0; w < m->n_walls; w++) {
            assert_ok(utw_thin_at(thin, w, 0.4, &twist, &at, &err));
            assert_close_scaled(at.q, q[w], 1e-9, fmax(greatest, 1e-3 * at.t * at.t));
        }
        for (int axis = 0; axis < 2; axis++) {
            const utw_thin_load load = {.Vx = axis == 0, .Vy = axis == 1};
            for (int w = 0; w < m->n_walls; w++) {
                drive[w] = -sums[w].gain_f[axis];
                gain[w] = sums[w].gain[axis];
            }
            node_method(m, sums, drive, gain, q);
            for (int w = 0; w < m->n_walls; w++) {
                assert_ok(utw_thin_at(thin, w, 0, &load, &at, &err));
                assert_close_scaled(at.q, q[w], 1e-8, 1 / k->length);
            }
        }
        utw_thin_free(thin);
    }
}

typedef struct energies {
    double xx, yy, xy;
    const utw_thin *thin;
    int wall;
} energies;

/* int q^2/t ds by Simpson's rule over many steps, q from the public stations. */
static void shear_areas_by_brute_force(void **state)
{
    (void)state;
    const char *name;
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        const utw_midline *m = utw_midline_sample(i, &name);
        utw_thin *thin = utw_thin_of(m);
        const utw_thin_constants *k = utw_thin_get(thin);
        const utw_thin_load x = {.Vx = 1}, y = {.Vy = 1};
        double sum[3] = {0};
        for (int w = 0; w < m->n_walls; w++) {
            enum { N = 2000 };
            for (int s = 0; s <= N; s++) {
                utw_thin_station a, b;
                utw_error err;
                assert_ok(utw_thin_at(thin, w, (double)s / N, &x, &a, &err));
                assert_ok(utw_thin_at(thin, w, (double)s / N, &y, &b, &err));
                const double weight = (s == 0 || s == N ? 1 : s % 2 ? 4 : 2) / 3.0 / N;
                const double ds = weight * utw_wall_length(m, w) / a.t;
                sum[0] += a.q * a.q * ds;
                sum[1] += b.q * b.q * ds;
                sum[2] += a.q * b.q * ds;
            }
        }
        assert_close(k->Asx, 1 / sum[0], 1e-9);
        assert_close(k->Asy, 1 / sum[1], 1e-9);
        assert_close_scaled(k->shear_xy, sum[2], 1e-9, sum[0]);
        utw_thin_free(thin);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(displacement_method_agrees),
        balanced_test(shear_areas_by_brute_force),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
