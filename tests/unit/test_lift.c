/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "field/lift.h"

#include "base/vec2.h"
#include "support/meshing.h"
#include "support/section.h"

enum { X = 1, Y = 2, XX = 3 };

static int node_at(const utw_mesh *mesh, double px, double py)
{
    for (int i = 0; i < mesh->n_node; i++)
        if (mesh->xy[i][0] == px && mesh->xy[i][1] == py) return i;
    fail();
    return -1;
}

/* P = (y, -x) on the rectangle 3 x 2: chi grows by P_y x' - P_x y' along the boundary, so from
 * (0, 0) it is -x^2/2 below, -9/2 - y^2/2 on the right, and runs back to 0 (elementary). */
static void a_rectangle_by_hand(void **state)
{
    (void)state;
    utw_error err;
    utw_net *net;
    utw_mesh *mesh = mesh_two_triangles(&net);
    utw_rim *rim = NULL;
    utw_lift *lift = NULL;
    assert_ok(utw_rim_create(mesh, &rim, &err));
    const utw_pair pair[2] = {{.balanced = 0}, {.P = {{[Y] = 1}, {[X] = -1}}, .balanced = 1}};
    assert_ok(utw_lift_create(mesh, rim, 2, pair, &lift, &err));
    assert_int_equal(lift->n_column, 1);
    assert_true(lift->column[0] == -1 && lift->column[1] == 0);
    double chi[4];
    for (int t = 0; t < 2; t++)
        for (int k = 0; k < 3; k++) chi[mesh->tri[t].node[k]] = lift->corner[3 * t + k];
    const double start = chi[node_at(mesh, 0, 0)];
    assert_close(chi[node_at(mesh, 3, 0)] - start, -4.5, 1e-14);
    assert_close(chi[node_at(mesh, 3, 2)] - start, -6.5, 1e-14);
    assert_close(chi[node_at(mesh, 0, 2)] - start, -2, 1e-14);
    for (int e = 0; e < mesh->n_edge; e++) {
        const int row = lift->series_of[e], inside = mesh->edge[e].tri[1] >= 0;
        assert_true((row < 0) == inside);
        if (row >= 0) assert_int_equal(lift->degree[row], 3);
    }
    utw_lift_free(lift);
    utw_rim_free(rim);
    utw_mesh_free(mesh);
    utw_net_free(net);
}

/* On a disc P = (y, 0) flows out as much as in: chi = -y^2/2 on the rim. P = (x, y) flows out
 * everywhere, and cannot be led away. */
static void what_flows_in_must_flow_out(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = section_outline(UTW_NAN, "\"outline\":{\"circle\":[0,0,1.5]}");
    utw_net *net = net_of(o);
    utw_outline_free(o);
    utw_mesh *mesh = mesh_of(net, 1e-3);
    utw_rim *rim = NULL;
    utw_lift *lift = NULL;
    assert_ok(utw_rim_create(mesh, &rim, &err));
    const utw_pair in_and_out = {.P = {{[Y] = 1}, {0}}, .balanced = 1},
                   out = {.P = {{[X] = 1}, {[Y] = 1}}, .balanced = 1};
    assert_ok(utw_lift_create(mesh, rim, 1, &in_and_out, &lift, &err));
    double reference = UTW_INFINITY;
    for (int t = 0; t < mesh->n_tri; t++)
        for (int k = 0; k < 3; k++) {
            const int node = mesh->tri[t].node[k];
            if (rim->loop[node] < 0) continue;
            const double rest = lift->corner[3 * t + k] + pow(mesh->xy[node][1], 2) / 2;
            if (reference == UTW_INFINITY) reference = rest;
            assert_close_scaled(rest, reference, 1e-13, 1);
        }
    utw_lift_free(lift);
    lift = NULL;
    assert_int_equal(utw_lift_create(mesh, rim, 1, &out, &lift, &err), UTW_E_INTERNAL);
    assert_null(lift);
    utw_rim_free(rim);
    utw_mesh_free(mesh);
    utw_net_free(net);
}

/* P = (x^2, 0) on a ring: what flows out of one loop flows out of the other with the other sign
 * (int 2x dA = 0), so the pair is fit for a balance although each side has its own data. */
static void a_hole_is_joined_by_its_cut(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = section_outline(UTW_NAN, "\"outline\":{\"circle\":[0,0,1.5]},"
                                              "\"holes\":[{\"circle\":[0,0,0.7]}]");
    utw_net *net = net_of(o);
    utw_outline_free(o);
    utw_mesh *mesh = mesh_of(net, 1e-3);
    utw_rim *rim = NULL;
    utw_lift *lift = NULL;
    assert_ok(utw_rim_create(mesh, &rim, &err));
    assert_int_equal(rim->n_loop, 2);
    const utw_pair pair = {.P = {{[XX] = 1}, {0}}, .balanced = 1};
    assert_ok(utw_lift_create(mesh, rim, 1, &pair, &lift, &err));
    /* along a loop chi = -int x^2 dy: on the rim -r^3 (sin a - sin^3 a / 3), whatever its start */
    for (int l = 0; l < 2; l++) {
        const double r = l == 0 ? 1.5 : 0.7;
        double reference = UTW_INFINITY;
        for (int t = 0; t < mesh->n_tri; t++)
            for (int k = 0; k < 3; k++) {
                const int node = mesh->tri[t].node[k];
                if (rim->loop[node] != l) continue;
                const double s = mesh->xy[node][1] / r,
                             rest = lift->corner[3 * t + k] + r * r * r * (s - s * s * s / 3);
                if (reference == UTW_INFINITY) reference = rest;
                assert_close_scaled(rest, reference, 1e-12, 1);
            }
    }
    utw_lift_free(lift);
    utw_rim_free(rim);
    utw_mesh_free(mesh);
    utw_net_free(net);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(a_rectangle_by_hand),
        balanced_test(what_flows_in_must_flow_out),
        balanced_test(a_hole_is_joined_by_its_cut),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
