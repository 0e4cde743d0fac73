/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "mesh/mesh.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/meshing.h"
#include "support/section.h"

static void edges_are_found(void **state)
{
    (void)state;
    utw_error err;
    utw_net *net;
    utw_mesh *mesh = mesh_two_triangles(&net);
    assert_int_equal(mesh->n_edge, 5);
    mesh_check(mesh);
    int inside = 0;
    for (int e = 0; e < mesh->n_edge; e++) inside += mesh->edge[e].tri[1] >= 0;
    assert_int_equal(inside, 1);
    assert_close(mesh_area(mesh), 6, 1e-14);
    assert_close(utw_mesh_quality(mesh), 1, 0);
    /* three triangles at one edge */
    utw_triangle *more = utw_realloc(mesh->tri, 3, sizeof *more);
    assert_non_null(more);
    mesh->tri = more;
    mesh->tri[2] = mesh->tri[0];
    mesh->n_tri = 3;
    assert_int_equal(utw_mesh_connect(mesh, &err), UTW_E_MESH);
    utw_mesh_free(mesh);
    utw_net_free(net);
}

/* Angles of the triangle with legs 3 and 2: 90 degrees, atan 2/3 and the rest. */
static void angles_and_directions(void **state)
{
    (void)state;
    utw_net *net;
    utw_mesh *mesh = mesh_two_triangles(&net);
    for (int t = 0; t < 2; t++) {
        const utw_triangle *tri = &mesh->tri[t];
        double sum = 0;
        for (int k = 0; k < 3; k++) {
            const double *a = mesh->xy[tri->node[k]], *b = mesh->xy[tri->node[(k + 1) % 3]],
                         *c = mesh->xy[tri->node[(k + 2) % 3]];
            const double u[2] = {b[0] - a[0], b[1] - a[1]}, v[2] = {c[0] - a[0], c[1] - a[1]};
            assert_close(utw_mesh_corner_angle(mesh, tri, k), atan2(utw_cross(u, v), utw_dot(u, v)),
                         1e-14);
            sum += utw_mesh_corner_angle(mesh, tri, k);
            double d[2];
            utw_mesh_leave(mesh, tri, k, 0, d);
            assert_true(utw_dot(d, u) > 0 && fabs(utw_cross(d, u)) < 1e-14);
            utw_mesh_leave(mesh, tri, k, 1, d); /* from the other end: back */
            assert_true(utw_dot(d, u) < 0 && fabs(utw_cross(d, u)) < 1e-14);
            assert_int_equal(utw_mesh_is_curved(mesh, tri, k), 0);
        }
        assert_close(sum, UTW_PI, 1e-14);
    }
    utw_mesh_free(mesh);
    utw_net_free(net);
}

/* Any of the 32 choices of edges to halve leaves a sound mesh of the same figure. */
static void halving_conforms(void **state)
{
    (void)state;
    utw_error err;
    for (int choice = 0; choice < 32; choice++) {
        utw_net *net;
        utw_mesh *mesh = mesh_two_triangles(&net), *before = NULL;
        unsigned char marked[5];
        int halves = 0;
        for (int e = 0; e < 5; e++) halves += marked[e] = (unsigned char)(choice >> e & 1);
        assert_ok(utw_mesh_copy(mesh, &before, &err));
        assert_ok(utw_mesh_halve(mesh, marked, &err));
        mesh_check(mesh);
        assert_close(mesh_area(mesh), 6, 1e-14);
        /* a new node an edge, and by Euler's formula for a disc n - e + t = 1 */
        assert_int_equal(mesh->n_node, 4 + halves);
        assert_int_equal(mesh->n_node - mesh->n_edge + mesh->n_tri, 1);
        for (int t = 0; t < mesh->n_tri; t++) { /* each lies in the one it was cut from */
            assert_in_range(mesh->tri[t].from, 0, 1);
            const utw_triangle *old = &before->tri[mesh->tri[t].from];
            double c[2] = {0, 0};
            for (int k = 0; k < 3; k++)
                for (int i = 0; i < 2; i++) c[i] += mesh->xy[mesh->tri[t].node[k]][i] / 3;
            for (int k = 0; k < 3; k++)
                assert_true(
                    utw_turn(before->xy[old->node[k]], before->xy[old->node[(k + 1) % 3]], c) > 0);
        }
        utw_mesh_free(before);
        utw_mesh_free(mesh);
        utw_net_free(net);
    }
}

/* New nodes on a curve lie on it. */
static void curves_are_followed(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = section_outline(UTW_NAN, "\"outline\":{\"circle\":[0.2,0.1,1.5]}");
    utw_net *net = net_of(o);
    utw_outline_free(o);
    utw_mesh *mesh = mesh_of(net, 1e-3);
    for (int round = 0; round < 2; round++) {
        mesh_check(mesh);
        assert_close(mesh_area(mesh), UTW_PI * 2.25, 1e-9);
        assert_true(utw_mesh_quality(mesh) >= UTW_LEAST_QUALITY);
        const int n = mesh->n_tri;
        unsigned char *marked = utw_alloc((size_t)mesh->n_edge, 1);
        assert_non_null(marked);
        memset(marked, 1, (size_t)mesh->n_edge);
        assert_ok(utw_mesh_halve(mesh, marked, &err));
        assert_int_equal(mesh->n_tri, 4 * n);
        utw_free(marked);
    }
    utw_mesh_free(mesh);
    utw_net_free(net);
}

static void a_refused_allocation_leaves_nothing_behind(void **state)
{
    (void)state;
    utw_error err;
    utw_net *net;
    utw_mesh *mesh = mesh_two_triangles(&net), *copy = NULL;
    utw_status st = UTW_E_NOMEM;
    long n = 0;
    while (st == UTW_E_NOMEM) {
        utw_memory_fail_at(++n);
        st = utw_mesh_copy(mesh, &copy, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_null(copy);
    }
    assert_ok(st);
    assert_true(n > 3);
    utw_mesh_free(copy);
    utw_mesh_free(mesh);
    utw_net_free(net);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(edges_are_found),
        balanced_test(angles_and_directions),
        balanced_test(halving_conforms),
        balanced_test(curves_are_followed),
        balanced_test(a_refused_allocation_leaves_nothing_behind),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
