/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "field/element.h"

#include "base/vec2.h"
#include "support/meshing.h"
#include "support/section.h"

typedef struct fixture {
    utw_net *net;
    utw_mesh *mesh;
    utw_basis_store *store;
    utw_map map;
    double work[UTW_ELEMENT_WORK], K[UTW_FUNCTIONS_MAX * UTW_FUNCTIONS_MAX],
        F[2 * UTW_FUNCTIONS_MAX];
} fixture;

static fixture x;

static int set_up(void **state)
{
    (void)state;
    utw_error err;
    x.mesh = mesh_two_triangles(&x.net);
    assert_ok(utw_basis_store_create(&x.store, &err));
    return 0;
}

static int tear_down(void **state)
{
    (void)state;
    utw_basis_store_free(x.store);
    utw_mesh_free(x.mesh);
    utw_net_free(x.net);
    return 0;
}

static void functions_are_listed(void **state)
{
    (void)state;
    utw_element e;
    utw_element_of(x.mesh, 0, 5, (int[]){2, 4, 5}, &e);
    /* three vertices, 1 + 3 + 4 functions of the sides, 4 * 3 / 2 inside */
    assert_int_equal(e.n_skeleton, 3 + 1 + 3 + 4);
    assert_int_equal(e.n_interior, 6);
    assert_int_equal(e.n, e.n_skeleton + e.n_interior);
    assert_int_equal(e.top, 5);
    int index[UTW_FUNCTIONS_MAX];
    utw_element_index(&e, 7, index);
    for (int i = 0; i < 3; i++) assert_int_equal(index[i], i);
    assert_int_equal(index[3], utw_edge_function(7, 0, 2));
    assert_int_equal(index[4], utw_edge_function(7, 1, 2));
    assert_int_equal(index[10], utw_edge_function(7, 2, 5));
    assert_int_equal(index[11], 3 * 7); /* the first interior one */
    /* an odd function runs from the lower to the higher node: side 2 of (0, 1, 2) is run from 2 to
     * 0 */
    for (int i = 0; i < e.n; i++) {
        const int side2_odd = e.kind[i] >= 8 + 128 && e.kind[i] < 1024 && e.kind[i] % 2 == 1;
        assert_true(e.sign[i] == (side2_odd ? -1 : 1));
    }
}

/* Gradients of the three linear functions of a triangle of area A: a side's inward normal over 2 A
 * (elementary). The two triangles are half a rectangle 3 x 2, 3 large. */
static void gradients(int tri, double g[3][2])
{
    const int *node = x.mesh->tri[tri].node;
    for (int i = 0; i < 3; i++) {
        const double *p = x.mesh->xy[node[(i + 1) % 3]], *q = x.mesh->xy[node[(i + 2) % 3]];
        g[i][0] = (p[1] - q[1]) / 6;
        g[i][1] = (q[0] - p[0]) / 6;
    }
}

static void stiffness_and_loads_of_a_linear_triangle(void **state)
{
    (void)state;
    utw_error err;
    utw_element e;
    utw_element_of(x.mesh, 0, 1, (int[]){1, 1, 1}, &e);
    assert_int_equal(e.n, 3);
    assert_ok(utw_element_map(&e, x.store, &x.map, &err));
    double area = 0;
    for (int q = 0; q < x.map.table->n_point; q++) area += x.map.table->w[q] * x.map.det[q];
    assert_close(area, 3, 1e-14);
    assert_ok(utw_element_stiffness(&e, x.store, &x.map, x.K, x.work, &err));
    double g[3][2], centroid[2] = {0, 0};
    gradients(0, g);
    for (int i = 0; i < 3; i++)
        for (int k = 0; k < 2; k++) centroid[k] += x.mesh->xy[x.mesh->tri[0].node[i]][k] / 3;
    for (int i = 0; i < 3; i++)
        for (int j = 0; j < 3; j++)
            assert_close_scaled(x.K[3 * i + j], 3 * (g[i][0] * g[j][0] + g[i][1] * g[j][1]), 1e-14,
                                1);
    /* g = (2 + x, 0) and (0, y): linear, so their value at the centroid times A; s = 5: A/3 of it
     * to each */
    const utw_poly load[2][2] = {{{2, 1}, {0}}, {{0}, {0, 0, 1}}}, s[1] = {{5}};
    assert_ok(utw_element_loads(&e, x.store, &x.map, 2, load, 1, s, x.F, x.work, &err));
    for (int i = 0; i < 3; i++) {
        assert_close_scaled(x.F[i], 3 * (2 + centroid[0]) * g[i][0] + 5, 1e-14, 1);
        assert_close_scaled(x.F[3 + i], 3 * centroid[1] * g[i][1], 1e-14, 1);
    }
}

/* Vertex functions belong to every order: their energies do not change with it; constants have
 * none. */
static void higher_orders_hold_the_lower_ones(void **state)
{
    (void)state;
    utw_error err;
    for (int p = 2; p <= UTW_ORDER_MAX; p += 5) {
        utw_element e;
        utw_element_of(x.mesh, 1, p, (int[]){p, p, p}, &e);
        assert_int_equal(e.n, utw_n_functions(p));
        assert_ok(utw_element_map(&e, x.store, &x.map, &err));
        assert_ok(utw_element_stiffness(&e, x.store, &x.map, x.K, x.work, &err));
        double g[3][2];
        gradients(1, g);
        for (int i = 0; i < 3; i++)
            for (int j = 0; j < 3; j++)
                assert_close_scaled(x.K[e.n * i + j], 3 * utw_dot(g[i], g[j]), 1e-12, 1);
        for (int i = 0; i < e.n; i++) {
            assert_close_scaled(x.K[e.n * i] + x.K[e.n * i + 1] + x.K[e.n * i + 2], 0, 1e-12, 1);
            for (int j = 0; j < i; j++) assert_true(x.K[e.n * i + j] == x.K[e.n * j + i]);
            assert_true(x.K[e.n * i + i] > 0);
        }
    }
}

/* Elements on an arc: areas add up to the disc's, and int |grad x|^2 is its area. */
static void curved_elements_follow_the_arc(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = section_outline(UTW_NAN, "\"outline\":{\"circle\":[0.3,-0.2,1.5]}");
    utw_net *net = net_of(o);
    utw_outline_free(o);
    utw_mesh *mesh = mesh_of(net, 1e-3);
    double area = 0, energy = 0;
    int curved = 0;
    for (int t = 0; t < mesh->n_tri; t++) {
        utw_element e;
        utw_element_of(mesh, t, 8, (int[]){8, 8, 8}, &e);
        curved += e.blend.any;
        assert_ok(utw_element_map(&e, x.store, &x.map, &err));
        for (int q = 0; q < x.map.table->n_point; q++) {
            assert_true(x.map.det[q] > 0);
            area += x.map.table->w[q] * x.map.det[q];
        }
        /* the load of grad x is the first moment of the gradients: sum over a unit function is 0 */
        const utw_poly load[1][2] = {{{1}, {0}}};
        assert_ok(utw_element_loads(&e, x.store, &x.map, 1, load, 0, NULL, x.F, x.work, &err));
        assert_close_scaled(x.F[0] + x.F[1] + x.F[2], 0, 1e-13, 1);
        for (int i = 0; i < 3; i++) energy += x.F[i] * mesh->xy[mesh->tri[t].node[i]][0];
        if (!e.blend.any) continue;
        assert_true(utw_element_points(&e) > 9);
    }
    assert_true(curved > 3);
    assert_close(area, UTW_PI * 1.5 * 1.5, 1e-10);
    /* the chords' part of it: less than the disc, more than an inscribed square */
    assert_true(energy < area && energy > 2 * 1.5 * 1.5);
    utw_mesh_free(mesh);
    utw_net_free(net);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(functions_are_listed),
        cmocka_unit_test(stiffness_and_loads_of_a_linear_triangle),
        cmocka_unit_test(higher_orders_hold_the_lower_ones),
        cmocka_unit_test(curved_elements_follow_the_arc),
    };
    return cmocka_run_group_tests(tests, set_up, tear_down);
}
