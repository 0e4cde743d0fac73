/* SPDX-License-Identifier: GPL-3.0-or-later
 * Layers at corners (mesh/layers.c), and cutting where a finer mesh is asked for (refine.c). */
#include "mesh/layers.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "mesh/divide.h"
#include "mesh/refine.h"
#include "mesh/triangulate.h"
#include "support/meshing.h"
#include "support/section.h"

static const char *const part[] = {
    "\"outline\":[[0,0],[40,0],[40,8],[8,8],[8,40],[0,40]]", /* one re-entrant corner */
    "\"outline\":[[0,0],[40,0],[40,8],{\"at\":[8,8],\"round\":2},[8,40],[0,40]],"
    "\"holes\":[{\"circle\":[4,4,2]}]",
    "\"outline\":{\"circle\":[0,0,5]},\"holes\":[[[-1,-1],[2,-1],[0,2]]]",
};

/* Coarse triangles without any layers. */
static utw_mesh *coarse(const char *text, utw_net **net)
{
    utw_error err;
    utw_division *division = NULL;
    utw_mesh *mesh = NULL;
    utw_outline *o = section_outline(UTW_NAN, "%s", text);
    *net = net_of(o);
    utw_outline_free(o);
    assert_ok(utw_division_create(*net, 1, NULL, &division, &err));
    assert_ok(utw_mesh_triangulate(*net, division, 0.7, &mesh, &err));
    utw_division_free(division);
    mesh_check(mesh);
    return mesh;
}

/* Shortest element side that ends at a node. */
static double shortest_at(const utw_mesh *mesh, const double xy[2])
{
    double least = UTW_INFINITY;
    for (int e = 0; e < mesh->n_edge; e++) {
        const double *a = mesh->xy[mesh->edge[e].node[0]], *b = mesh->xy[mesh->edge[e].node[1]];
        if (utw_distance(a, xy) < 1e-9 || utw_distance(b, xy) < 1e-9)
            least = fmin(least, utw_distance(a, b));
    }
    return least;
}

static void layers_shrink_toward_a_sharp_corner(void **state)
{
    (void)state;
    utw_error err;
    static const double corner[2] = {8, 8}, convex[2] = {40, 0};
    double last = UTW_INFINITY, beside = 0;
    for (double target = 1e-2; target > 1e-9; target *= 1e-3) {
        utw_net *net;
        utw_mesh *mesh = coarse(part[0], &net);
        const double before = shortest_at(mesh, corner), at_convex = shortest_at(mesh, convex);
        const double area = mesh_area(mesh);
        assert_ok(utw_mesh_add_layers(mesh, target, &err));
        mesh_check(mesh);
        assert_close(mesh_area(mesh), area, 1e-12);
        assert_close(area, 40 * 8 + 32 * 8, 1e-12);
        /* from layer to layer by the ratio */
        const double n = log(shortest_at(mesh, corner) / before) / log(UTW_LAYER_RATIO);
        assert_true(n > 0.9 && shortest_at(mesh, corner) < last);
        last = shortest_at(mesh, corner);
        beside = shortest_at(mesh, convex) / at_convex;
        assert_true(beside > 0.9 * UTW_LAYER_RATIO * 0.5); /* one layer there at most */
        utw_mesh_free(mesh);
        utw_net_free(net);
    }
    assert_true(last < 1e-3);
}

static void asked_layers_are_cut(void **state)
{
    (void)state;
    utw_error err;
    for (size_t i = 0; i < sizeof part / sizeof *part; i++) {
        utw_net *net;
        utw_mesh *mesh = coarse(part[i], &net);
        const double area = mesh_area(mesh), before = shortest_at(mesh, net->node[0]);
        const int n = mesh->n_tri;
        int *layers = utw_alloc((size_t)net->n_node, sizeof *layers);
        assert_non_null(layers);
        layers[0] = 3;
        assert_ok(utw_mesh_cut_layers(mesh, layers, &err));
        mesh_check(mesh);
        assert_close(mesh_area(mesh), area, 1e-10);
        assert_true(mesh->n_tri > n);
        for (int t = 0; t < mesh->n_tri; t++) assert_in_range(mesh->tri[t].from, 0, n - 1);
        assert_true(shortest_at(mesh, net->node[0]) < 0.1 * before);
        utw_free(layers);
        utw_mesh_free(mesh);
        utw_net_free(net);
    }
}

/* Whatever triangles are asked for, the finer mesh is sound, has the same figure, and each of its
 * triangles knows its parent. */
static void refining_conforms(void **state)
{
    (void)state;
    utw_error err;
    unsigned seed = 3;
    for (size_t i = 0; i < sizeof part / sizeof *part; i++)
        for (int every = 1; every <= 4; every++) {
            utw_outline *o = section_outline(UTW_NAN, "%s", part[i]);
            utw_net *net = net_of(o);
            utw_outline_free(o);
            utw_mesh *mesh = mesh_of(net, 1e-3), *finer = NULL;
            int *parent = NULL;
            unsigned char *wanted = utw_alloc((size_t)mesh->n_tri, 1);
            assert_non_null(wanted);
            for (int t = 0; t < mesh->n_tri; t++) {
                seed = seed * 1664525u + 1013904223u;
                wanted[t] = (seed >> 16) % (unsigned)every == 0;
            }
            assert_ok(utw_mesh_refine(mesh, wanted, &finer, &parent, &err));
            if (finer != NULL) {
                mesh_check(finer);
                assert_close(mesh_area(finer), mesh_area(mesh), 1e-9);
                assert_true(finer->n_tri > mesh->n_tri);
                assert_true(utw_mesh_quality(finer) > 0);
                int *children = utw_alloc((size_t)mesh->n_tri, sizeof *children);
                assert_non_null(children);
                for (int t = 0; t < finer->n_tri; t++) {
                    assert_in_range(parent[t], 0, mesh->n_tri - 1);
                    assert_int_equal(finer->tri[t].part, mesh->tri[parent[t]].part);
                    children[parent[t]]++;
                }
                for (int t = 0; t < mesh->n_tri; t++)
                    assert_true(children[t] >= (wanted[t] ? 2 : 1));
                utw_free(children);
            }
            if (every == 4) assert_true(finer != NULL);
            utw_free(wanted);
            utw_free(parent);
            utw_mesh_free(finer);
            utw_mesh_free(mesh);
            utw_net_free(net);
        }
    /* nothing asked for, nothing made */
    utw_net *net;
    utw_mesh *mesh = coarse(part[0], &net), *finer = NULL;
    int *parent = NULL;
    unsigned char *wanted = utw_alloc((size_t)mesh->n_tri, 1);
    assert_non_null(wanted);
    assert_ok(utw_mesh_refine(mesh, wanted, &finer, &parent, &err));
    assert_null(finer);
    utw_free(parent);
    utw_free(wanted);
    utw_mesh_free(mesh);
    utw_net_free(net);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(layers_shrink_toward_a_sharp_corner),
        balanced_test(asked_layers_are_cut),
        balanced_test(refining_conforms),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
