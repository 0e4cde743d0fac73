/* SPDX-License-Identifier: GPL-3.0-or-later
 * Every sample midline: flows balance at every node, have the right resultants and twist no cell;
 * stresses have the right resultants; omega is orthogonal to 1, x and y. All integrals are taken
 * here, over the public stations only. */
#include "support/midlines.h"

typedef struct resultants {
    double n, mx, my, b;     /* of sigma, about the centroid */
    double vx, vy, t, twist; /* of q, t about the shear centre; int q/t ds along the wall */
    double s_omega, sx_omega, sy_omega, iw;
    double xc, yc, xs, ys;
} resultants;

static void add(const utw_thin_station *at, double ds, void *data)
{
    resultants *r = data;
    const double da = at->t * ds, x = at->x - r->xc, y = at->y - r->yc;
    const double lever = (at->x - r->xs) * at->tangent[1] - (at->y - r->ys) * at->tangent[0];
    r->n += at->sigma * da;
    r->mx += at->sigma * y * da;
    r->my -= at->sigma * x * da;
    r->b += at->sigma * at->omega * da;
    r->vx += at->q * at->tangent[0] * ds;
    r->vy += at->q * at->tangent[1] * ds;
    r->t += at->q * lever * ds;
    r->twist += at->q / at->t * ds;
    r->s_omega += at->omega * da;
    r->sx_omega += at->omega * x * da;
    r->sy_omega += at->omega * y * da;
    r->iw += at->omega * at->omega * da;
}

/* All walls together; twist[n_walls] wall by wall when it is not NULL. */
static resultants integrate(const utw_midline *m, const utw_thin *thin, const utw_thin_load *load,
                            double *twist)
{
    const utw_thin_constants *k = utw_thin_get(thin);
    resultants r = {.xc = k->xc, .yc = k->yc, .xs = k->xs, .ys = k->ys};
    for (int w = 0; w < m->n_walls; w++) {
        const double before = r.twist;
        utw_along_wall(thin, w, utw_wall_length(m, w), 12, load, add, &r);
        if (twist != NULL) twist[w] = r.twist - before;
    }
    return r;
}

static void check_nodes(const utw_midline *m, const utw_thin *thin, const utw_thin_load *load,
                        double scale)
{
    utw_error err;
    for (int node = 0; node < m->n_nodes; node++) {
        double leaving = 0;
        for (int w = 0; w < m->n_walls; w++) {
            utw_thin_station start, end;
            assert_ok(utw_thin_at(thin, w, 0, load, &start, &err));
            assert_ok(utw_thin_at(thin, w, 1, load, &end, &err));
            if (m->walls[w].from == node) leaving += start.q;
            if (m->walls[w].to == node) leaving -= end.q;
        }
        assert_close_scaled(leaving, 0.0, 1e-11, scale);
    }
}

/* When the circulation of q/t is that of a potential at the nodes, it vanishes around every cell.
 * The potential follows walls outward from node 0 until nothing changes; then every wall must agree
 * with it. */
static void check_cells(const utw_midline *m, const double *gap, double scale)
{
    double u[64] = {0};
    int known[64] = {1};
    assert_true(m->n_nodes <= 64);
    for (int sweep = 0; sweep < m->n_nodes; sweep++) {
        for (int w = 0; w < m->n_walls; w++) {
            const int a = m->walls[w].from, b = m->walls[w].to;
            if (known[a] && !known[b]) u[b] = u[a] + gap[w];
            if (known[b] && !known[a]) u[a] = u[b] - gap[w];
            known[a] = known[b] = known[a] || known[b];
        }
    }
    for (int w = 0; w < m->n_walls; w++)
        assert_close_scaled(u[m->walls[w].to] - u[m->walls[w].from] - gap[w], 0.0, 1e-11, scale);
}

static void flexural_flows(void **state)
{
    (void)state;
    const char *name;
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        const utw_midline *m = utw_midline_sample(i, &name);
        utw_thin *thin = utw_thin_of(m);
        const double size =
            sqrt((utw_thin_get(thin)->Ixx + utw_thin_get(thin)->Iyy) / utw_thin_get(thin)->A);
        const utw_thin_load loads[] = {{.Vx = 2.385}, {.Vy = -1.7}, {.Vx = 0.8, .Vy = 1.9}};
        for (int j = 0; j < 3; j++) {
            double gap[64];
            const resultants r = integrate(m, thin, &loads[j], gap);
            assert_close_scaled(r.vx, loads[j].Vx, 1e-11, 1);
            assert_close_scaled(r.vy, loads[j].Vy, 1e-11, 1);
            assert_close_scaled(r.t, 0.0, 1e-11, size); /* about the shear centre */
            check_nodes(m, thin, &loads[j], 1 / size);
            double all = 0;
            for (int w = 0; w < m->n_walls; w++) all = fmax(all, fabs(gap[w]));
            check_cells(m, gap, all);
        }
        utw_thin_free(thin);
    }
}

/* The midline flows carry J_bredt/J of a torque, the faces' stresses +- T t/J the rest; J_open and
 * the torsion modulus are found again from the drawing and from the greatest stress met along the
 * walls. */
static void torsional_flows(void **state)
{
    (void)state;
    const char *name;
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        const utw_midline *m = utw_midline_sample(i, &name);
        utw_thin *thin = utw_thin_of(m);
        const utw_thin_constants *k = utw_thin_get(thin);
        const utw_thin_load load = {.T = 3.1};
        const resultants r = integrate(m, thin, &load, NULL);
        const double size = sqrt((k->Ixx + k->Iyy) / k->A);
        assert_close_scaled(r.t, load.T * k->J_bredt / k->J, 1e-11, load.T);
        assert_close_scaled(r.vx, 0.0, 1e-11, load.T / size);
        assert_close_scaled(r.vy, 0.0, 1e-11, load.T / size);
        assert_close_scaled(r.n, 0.0, 1e-11, 1);
        check_nodes(m, thin, &load, load.T / k->J);
        double greatest = 0, open = 0;
        utw_error err;
        for (int w = 0; w < m->n_walls; w++) {
            const double length = utw_wall_length(m, w);
            utw_thin_station at;
            for (int j = 0; j <= 20; j++) {
                assert_ok(utw_thin_at(thin, w, j / 20.0, &load, &at, &err));
                assert_close(at.tau_right - at.tau_left, 2 * load.T * at.t / k->J, 1e-12);
                assert_close_scaled((at.tau_right + at.tau_left) / 2, at.tau, 1e-12,
                                    fabs(at.tau_left));
                greatest = fmax(greatest, fmax(fabs(at.tau_left), fabs(at.tau_right)));
            }
            /* Simpson's rule is exact for t^3 */
            const double t0 = m->walls[w].t0, t1 = m->walls[w].t1, tm = (t0 + t1) / 2;
            open += length / 18 * (t0 * t0 * t0 + 4 * tm * tm * tm + t1 * t1 * t1);
        }
        assert_close(k->J_open, open, 1e-12);
        assert_close(greatest, load.T / k->Wt, 1e-12);
        utw_thin_free(thin);
    }
}

static void sectorial_coordinate(void **state)
{
    (void)state;
    const char *name;
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        const utw_midline *m = utw_midline_sample(i, &name);
        utw_thin *thin = utw_thin_of(m);
        const utw_thin_constants *k = utw_thin_get(thin);
        const utw_thin_load load = {.Tw = -2.2};
        double gap[64];
        const resultants r = integrate(m, thin, &load, gap);
        const double size = sqrt((k->Ixx + k->Iyy) / k->A), omega = sqrt(k->Iw / k->A);
        assert_close(r.iw, k->Iw, 1e-11);
        assert_close_scaled(r.s_omega, 0.0, 1e-11, omega * k->A);
        assert_close_scaled(r.sx_omega, 0.0, 1e-11, omega * k->A * size);
        assert_close_scaled(r.sy_omega, 0.0, 1e-11, omega * k->A * size);
        /* the flows of the warping torque: no force, no twist of a cell, the moment Tw */
        assert_close(r.t, load.Tw, 1e-10);
        assert_close_scaled(r.vx, 0.0, 1e-10, 1 / size);
        assert_close_scaled(r.vy, 0.0, 1e-10, 1 / size);
        check_nodes(m, thin, &load, omega * k->A / k->Iw);
        double all = 0;
        for (int w = 0; w < m->n_walls; w++) all = fmax(all, fabs(gap[w]));
        check_cells(m, gap, all);
        utw_thin_free(thin);
    }
}

static void normal_stresses(void **state)
{
    (void)state;
    const char *name;
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        const utw_midline *m = utw_midline_sample(i, &name);
        utw_thin *thin = utw_thin_of(m);
        const utw_thin_constants *k = utw_thin_get(thin);
        const utw_thin_load load = {.N = 2.1, .Mx = -3.4, .My = 1.9, .B = 4.3};
        const resultants r = integrate(m, thin, &load, NULL);
        const double size = sqrt((k->Ixx + k->Iyy) / k->A);
        assert_close_scaled(r.n, load.N, 1e-10, 5 / size);
        assert_close_scaled(r.mx, load.Mx, 1e-10, 5 * size);
        assert_close_scaled(r.my, load.My, 1e-10, 5 * size);
        assert_close_scaled(r.b, load.B, 1e-10, 5 * size);
        utw_thin_free(thin);
    }
}

/* Sign of the torsion of a box: T > 0 turns x toward y, so the flow runs counter-clockwise; and of
 * the open strip: the face on the left of a wall along +x is its top, where T > 0 makes tau_xz
 * negative. Bending: Mx > 0 stretches the top, My > 0 compresses the right. A force Vy > 0 makes
 * the web's flow run up. */
static void signs(void **state)
{
    (void)state;
    double n[][2] = {{0, 0}, {4, 0}, {4, 3}, {0, 3}};
    utw_wall w[] = {WALL(0, 1, 0.1), WALL(1, 2, 0.1), WALL(2, 3, 0.1), WALL(3, 0, 0.1)};
    const utw_midline m = MIDLINE(n, w);
    utw_thin *thin = utw_thin_of(&m);
    utw_thin_station at;
    utw_error err;
    const utw_thin_load twist = {.T = 1}, bend = {.Mx = 1}, side = {.My = 1}, up = {.Vy = 1};
    for (int i = 0; i < 4; i++) {
        assert_ok(utw_thin_at(thin, i, 0.3, &twist, &at, &err));
        assert_true(at.q > 0 && at.tau_left < at.tau_right);
        assert_close(at.q, 1 / (2 * 12.0) * utw_thin_get(thin)->J_bredt / utw_thin_get(thin)->J,
                     1e-12);
    }
    assert_ok(utw_thin_at(thin, 2, 0.5, &bend, &at, &err));
    assert_true(at.sigma > 0);
    assert_ok(utw_thin_at(thin, 1, 0.5, &side, &at, &err));
    assert_true(at.sigma < 0);
    assert_ok(utw_thin_at(thin, 1, 0.5, &up, &at, &err));
    assert_true(at.q > 0);
    utw_thin_free(thin);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(flexural_flows),
        balanced_test(torsional_flows),
        balanced_test(sectorial_coordinate),
        balanced_test(normal_stresses),
        balanced_test(signs),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
