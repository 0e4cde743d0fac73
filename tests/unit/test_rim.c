/* SPDX-License-Identifier: GPL-3.0-or-later
 * Loops and cuts of a mesh (mesh/rim.c), on whole meshes (create.c, triangulate.c). */
#include "mesh/rim.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/meshing.h"
#include "support/section.h"

static const struct {
    const char *part;
    double area;
    int loops;
} list[] = {
    {"\"outline\":[[0,0],[30,0],[30,2],[0,2]]", 60, 1},
    {"\"outline\":{\"circle\":[0,0,5]},\"holes\":[{\"circle\":[1,0,3]}]", 16 * UTW_PI, 2},
    {"\"outline\":[[0,0],[60,0],[60,20],[0,20]],\"holes\":[[[2,2],[20,2],[20,18],[2,18]],"
     "[[22,2],[40,2],[40,18],[22,18]],{\"circle\":[50,10,6]}]",
     1200 - 2 * 18 * 16 - 36 * UTW_PI, 4},
};

static void meshes_are_sound(void **state)
{
    (void)state;
    utw_error err;
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        utw_outline *o = section_outline(UTW_NAN, "%s", list[i].part);
        utw_net *net = net_of(o);
        utw_outline_free(o);
        int coarsest = 0;
        for (int finer = 0; finer < 3; finer++) {
            const utw_mesh_options options = {finer == 0 ? 2 : finer == 1 ? 1 : 0.4, 1e-4};
            utw_mesh *mesh = NULL;
            assert_ok(utw_mesh_create(net, &options, &mesh, &err));
            mesh_check(mesh);
            assert_close(mesh_area(mesh), list[i].area, 1e-9);
            assert_true(utw_mesh_quality(mesh) >= UTW_LEAST_QUALITY);
            /* Euler: n - e + t = 1 - holes */
            assert_int_equal(mesh->n_node - mesh->n_edge + mesh->n_tri, 2 - list[i].loops);
            if (finer == 0) coarsest = mesh->n_tri;
            if (finer == 2) assert_true(mesh->n_tri > coarsest);
            utw_mesh_free(mesh);
        }
        utw_net_free(net);
    }
}

/* Twice the area enclosed by a loop, over its corners. */
static double around(const utw_mesh *mesh, const utw_rim *rim, int loop, int *length)
{
    double sum = 0;
    int node = rim->start[loop];
    *length = 0;
    do {
        const int side = rim->leave[node] % 3;
        const utw_triangle *t = &mesh->tri[rim->leave[node] / 3];
        assert_int_equal(t->node[side], node);
        assert_int_equal(rim->loop[node], loop);
        assert_true(mesh->edge[t->side[side]].tri[1] < 0);
        const int next = t->node[(side + 1) % 3];
        sum += utw_cross(mesh->xy[node], mesh->xy[next]);
        node = next;
        ++*length;
    } while (node != rim->start[loop]);
    return sum;
}

/* The function of the cut of a hole jumps by one when one walks once around the hole, and not
 * around the others: seen from the sides along each loop. */
static double jump(const utw_mesh *mesh, const utw_rim *rim, const double *f, int loop)
{
    double sum = 0;
    int node = rim->start[loop];
    do {
        const int t = rim->leave[node] / 3, k = rim->leave[node] % 3;
        sum += f[3 * t + (k + 1) % 3] - f[3 * t + k];
        node = mesh->tri[t].node[(k + 1) % 3];
    } while (node != rim->start[loop]);
    return sum;
}

static void loops_and_cuts(void **state)
{
    (void)state;
    utw_error err;
    for (size_t i = 0; i < sizeof list / sizeof *list; i++) {
        utw_outline *o = section_outline(UTW_NAN, "%s", list[i].part);
        utw_net *net = net_of(o);
        utw_outline_free(o);
        utw_mesh *mesh = mesh_of(net, 1e-3);
        utw_rim *rim = NULL;
        assert_ok(utw_rim_create(mesh, &rim, &err));
        assert_int_equal(rim->n_loop, list[i].loops);
        int on_loops = 0;
        for (int l = 0; l < rim->n_loop; l++) {
            int length;
            assert_true((around(mesh, rim, l, &length) > 0) == (l == 0)); /* material left */
            on_loops += length;
            /* a tree with the outer loop as its root */
            int up = l, steps = 0;
            while (up != 0 && steps++ < rim->n_loop) up = rim->parent[up];
            assert_int_equal(up, 0);
            assert_true((rim->parent[l] == -1) == (l == 0));
        }
        for (int n = 0; n < mesh->n_node; n++) on_loops -= rim->loop[n] >= 0;
        assert_int_equal(on_loops, 0);
        double *f = utw_alloc(3 * (size_t)mesh->n_tri, sizeof *f);
        assert_non_null(f);
        for (int hole = 1; hole < rim->n_loop; hole++) {
            memset(f, 0, 3 * (size_t)mesh->n_tri * sizeof *f);
            for (int c = 0; c < rim->n_cut; c++)
                if (rim->cut[c].hole == hole) f[3 * rim->cut[c].tri + rim->cut[c].corner] = 1;
            for (int l = 0; l < rim->n_loop; l++) {
                const double j = jump(mesh, rim, f, l);
                const int ends = l == hole || l == rim->parent[hole];
                assert_true(fabs(j) == (ends ? 1 : 0));
            }
        }
        utw_free(f);
        utw_rim_free(rim);
        utw_mesh_free(mesh);
        utw_net_free(net);
    }
}

static void a_refused_allocation_leaves_nothing_behind(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = section_outline(UTW_NAN, "%s", list[2].part);
    utw_net *net = net_of(o);
    utw_outline_free(o);
    const utw_mesh_options options = {1, 1e-3};
    for (int which = 0; which < 2; which++) {
        utw_mesh *whole = mesh_of(net, 1e-3), *mesh = NULL;
        utw_rim *rim = NULL;
        utw_status st = UTW_E_NOMEM;
        for (long n = 1; st == UTW_E_NOMEM; n += 1 + n / 50) {
            utw_memory_fail_at(n);
            st = which == 0 ? utw_rim_create(whole, &rim, &err)
                            : utw_mesh_create(net, &options, &mesh, &err);
            utw_memory_fail_at(0);
            if (st != UTW_OK) assert_true(rim == NULL && mesh == NULL);
        }
        assert_ok(st);
        utw_rim_free(rim);
        utw_mesh_free(mesh);
        utw_mesh_free(whole);
    }
    utw_net_free(net);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(meshes_are_sound),
        balanced_test(loops_and_cuts),
        balanced_test(a_refused_allocation_leaves_nothing_behind),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
