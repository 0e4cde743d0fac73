/* SPDX-License-Identifier: GPL-3.0-or-later
 * Unsymmetric bending: end conditions, equilibrium and compatibility for every pair of ends;
 * turning the axes; bad bars. Formulas of the literature are in tests/physics/test_bar_tables.c. */
#include "bar/bending.h"

#include "base/gauss.h"
#include "support/support.h"

static utw_bending_bar sample(utw_bending_end start, utw_bending_end end, double at)
{
    return (utw_bending_bar){.length = 3.7,
                             .E = 2.1,
                             .Ixx = 1.3,
                             .Iyy = 0.8,
                             .Ixy = -0.55,
                             .shear = {0.9, 1.4, 0.3},
                             .start = start,
                             .end = end,
                             .force = {1.2, -0.7},
                             .at = at * 3.7,
                             .per_length = {-0.4, 0.9}};
}

static int stands(utw_bending_end a, utw_bending_end b)
{
    return (a.deflection && b.deflection) ||
           ((a.deflection || b.deflection) && (a.rotation || b.rotation));
}

static void close_to(double a, double b, double scale)
{
    assert_close_scaled(a, b, 1e-12, scale);
}

static void check(const utw_bending_bar *bar)
{
    utw_bending_solution s;
    utw_bending_state first, at;
    utw_error err;
    const double length = bar->length;
    assert_ok(utw_bending_solve(bar, &s, &err));
    /* V and M from the loads on the part to the left; rotation and slope from their laws */
    double x[8], w[8], psi[2], u[2];
    utw_gauss(8, x, w);
    utw_bending_at(&s, 0, &first);
    for (int k = 0; k < 2; k++) {
        psi[k] = first.rotation[k];
        u[k] = first.u[k];
    }
    const double stops[3] = {0, bar->at, length};
    for (int part = 0; part < 2; part++) {
        const double h = stops[part + 1] - stops[part];
        if (h == 0) continue;
        for (int g = 0; g < 8; g++) {
            const double z = stops[part] + h * x[g], past = part == 1;
            utw_bending_at(&s, z, &at);
            const double mx = at.Mx, my = -at.My,
                         d = bar->E * (bar->Ixx * bar->Iyy - bar->Ixy * bar->Ixy);
            psi[0] -= (bar->Ixx * my - bar->Ixy * mx) / d * h * w[g];
            psi[1] -= (bar->Iyy * mx - bar->Ixy * my) / d * h * w[g];
            u[0] += at.slope[0] * h * w[g];
            u[1] += at.slope[1] * h * w[g];
            close_to(at.slope[0], at.rotation[0] + bar->shear[0] * at.Vx + bar->shear[2] * at.Vy,
                     10);
            close_to(at.slope[1], at.rotation[1] + bar->shear[2] * at.Vx + bar->shear[1] * at.Vy,
                     10);
            const double held = bar->at == 0 ? 0 : past; /* the state at 0 includes a force there */
            close_to(first.Vx - at.Vx, bar->force[0] * held + bar->per_length[0] * z, 5);
            close_to(first.Vy - at.Vy, bar->force[1] * held + bar->per_length[1] * z, 5);
            close_to(at.Mx - first.Mx,
                     first.Vy * z - bar->force[1] * held * (z - bar->at) -
                         bar->per_length[1] * z * z / 2,
                     10);
            close_to(first.My - at.My,
                     first.Vx * z - bar->force[0] * held * (z - bar->at) -
                         bar->per_length[0] * z * z / 2,
                     10);
        }
    }
    utw_bending_at(&s, length, &at);
    for (int k = 0; k < 2; k++) {
        close_to(at.rotation[k], psi[k], 20);
        close_to(at.u[k], u[k], 50);
    }
    const utw_bending_end ends[2] = {bar->start, bar->end};
    for (int i = 0; i < 2; i++) {
        const utw_bending_state *e = i ? &at : &first;
        const double own = bar->at == i * length ? (i ? 1 : -1) : 0; /* a force at the end itself */
        for (int k = 0; k < 2; k++) {
            if (ends[i].deflection) close_to(e->u[k], 0, 50);
            if (ends[i].rotation) close_to(e->rotation[k], 0, 20);
            if (!ends[i].deflection) close_to(k ? e->Vy : e->Vx, own * bar->force[k], 5);
            if (!ends[i].rotation) close_to(k ? e->Mx : -e->My, 0, 10);
        }
    }
}

static void every_pair_of_ends(void **state)
{
    (void)state;
    int bars = 0;
    for (int bits = 0; bits < 16; bits++) {
        const utw_bending_end start = {bits & 1, (bits >> 1) & 1},
                              end = {(bits >> 2) & 1, (bits >> 3) & 1};
        if (!stands(start, end)) continue;
        for (double at = 0; at <= 1; at += 0.125) {
            utw_bending_bar bar = sample(start, end, at);
            check(&bar);
            bar.shear[0] = bar.shear[1] = bar.shear[2] = 0;
            check(&bar);
            bars++;
        }
    }
    assert_int_equal(bars, 9 * 10);
}

/* The same bar in axes turned by an angle: tensors and vectors turn, and so do the deflections. */
static void turned_axes(void **state)
{
    (void)state;
    const double a = 0.83, c = cos(a), s = sin(a);
    const utw_bending_bar bar = sample(UTW_BENDING_FIXED, UTW_BENDING_FORK, 0.4);
    utw_bending_bar t = bar;
    t.Iyy = c * c * bar.Iyy - 2 * c * s * bar.Ixy + s * s * bar.Ixx;
    t.Ixx = s * s * bar.Iyy + 2 * c * s * bar.Ixy + c * c * bar.Ixx;
    t.Ixy = c * s * (bar.Iyy - bar.Ixx) + (c * c - s * s) * bar.Ixy;
    t.shear[0] = c * c * bar.shear[0] - 2 * c * s * bar.shear[2] + s * s * bar.shear[1];
    t.shear[1] = s * s * bar.shear[0] + 2 * c * s * bar.shear[2] + c * c * bar.shear[1];
    t.shear[2] = c * s * (bar.shear[0] - bar.shear[1]) + (c * c - s * s) * bar.shear[2];
    t.force[0] = c * bar.force[0] - s * bar.force[1];
    t.force[1] = s * bar.force[0] + c * bar.force[1];
    t.per_length[0] = c * bar.per_length[0] - s * bar.per_length[1];
    t.per_length[1] = s * bar.per_length[0] + c * bar.per_length[1];
    utw_bending_solution p, q;
    utw_error err;
    assert_ok(utw_bending_solve(&bar, &p, &err));
    assert_ok(utw_bending_solve(&t, &q, &err));
    for (int i = 0; i <= 10; i++) {
        utw_bending_state x, y;
        utw_bending_at(&p, 0.37 * i, &x);
        utw_bending_at(&q, 0.37 * i, &y);
        close_to(y.u[0], c * x.u[0] - s * x.u[1], 10);
        close_to(y.u[1], s * x.u[0] + c * x.u[1], 10);
        close_to(y.Mx, c * x.Mx - s * x.My, 10);
        close_to(y.My, s * x.Mx + c * x.My, 10);
        close_to(y.Vx, c * x.Vx - s * x.Vy, 10);
    }
}

static void refuse(utw_bending_bar bar, utw_status status, const char *text)
{
    utw_bending_solution s = {.u = {77, 0}};
    utw_error err;
    assert_int_equal(utw_bending_solve(&bar, &s, &err), status);
    assert_string_equal(err.text, text);
    assert_true(s.u[0] == 77);
}

static void bars_that_cannot_be(void **state)
{
    (void)state;
    const utw_bending_bar good = sample(UTW_BENDING_FIXED, UTW_BENDING_FREE, 0.4);
    utw_bending_bar b = good;
    b.E = 0;
    refuse(b, UTW_E_ARGUMENT, "bending: length 3.7 and E = 0; both must be positive");
    b = good;
    b.Ixy = 1.1;
    refuse(b, UTW_E_ARGUMENT,
           "bending: Ixx = 1.3, Iyy = 0.8, Ixy = 1.1 are no second moments of a section");
    b = good;
    b.shear[1] = -1;
    refuse(b, UTW_E_ARGUMENT, "bending: 0.9, -1, 0.3 are no shear flexibilities of a section");
    b = good;
    b.per_length[1] = HUGE_VAL;
    refuse(b, UTW_E_ARGUMENT, "bending: a number of the bar is not finite");
    b = good;
    b.at = -0.1;
    refuse(b, UTW_E_ARGUMENT, "bending: the force acts at z = -0.1, off the bar (0 to 3.7)");
    b = good;
    b.start = UTW_BENDING_FREE;
    refuse(b, UTW_E_LOAD, "bending: neither end holds the bar against deflection");
    b.start = UTW_BENDING_FORK;
    refuse(
        b, UTW_E_LOAD,
        "bending: one end holds the deflection and none the rotation; the bar would turn about it");
    utw_bending_solution s;
    utw_bending_state at;
    utw_error err;
    assert_int_equal(utw_bending_solve(NULL, &s, &err), UTW_E_ARGUMENT);
    assert_int_equal(utw_bending_solve(&good, NULL, NULL), UTW_E_ARGUMENT);
    assert_ok(utw_bending_solve(&good, &s, &err));
    utw_bending_at(&s, NAN, &at);
    assert_true(isnan(at.u[0]) && isnan(at.Mx) && isnan(at.Vy));
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(every_pair_of_ends),
        cmocka_unit_test(turned_axes),
        cmocka_unit_test(bars_that_cannot_be),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
