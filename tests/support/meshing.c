/* SPDX-License-Identifier: GPL-3.0-or-later
 * Making and checking meshes. */
#include "support/meshing.h"

#include "base/gauss.h"
#include "base/memory.h"
#include "base/vec2.h"

utw_net *net_of(const utw_outline *outline)
{
    utw_error err;
    utw_net *net = NULL;
    assert_ok(utw_net_create(outline, &net, &err));
    return net;
}

utw_mesh *mesh_of(const utw_net *net, double target)
{
    utw_error err;
    utw_mesh *mesh = NULL;
    const utw_mesh_options options = {1, target};
    assert_ok(utw_mesh_create(net, &options, &mesh, &err));
    return mesh;
}

utw_mesh *mesh_two_triangles(utw_net **net)
{
    utw_error err;
    utw_outline *o = section_rectangle(UTW_NAN, 0, 0, 3, 2);
    *net = net_of(o);
    utw_outline_free(o);
    assert_int_equal((*net)->n_node, 4);
    utw_mesh *mesh = utw_alloc(1, sizeof *mesh);
    assert_non_null(mesh);
    mesh->net = *net;
    mesh->n_node = 4;
    mesh->n_tri = 2;
    mesh->xy = utw_alloc(4, sizeof *mesh->xy);
    mesh->tri = utw_alloc(2, sizeof *mesh->tri);
    assert_true(mesh->xy != NULL && mesh->tri != NULL);
    for (int i = 0; i < 4; i++)
        for (int k = 0; k < 2; k++) mesh->xy[i][k] = (*net)->node[i][k];
    /* the net's nodes and edges run round from the first vertex */
    for (int t = 0; t < 2; t++) {
        utw_triangle *tri = &mesh->tri[t];
        *tri = (utw_triangle){.node = {0, t + 1, t + 2}, .curve = {-1, -1, -1}};
        for (int k = 0; k < 3; k++)
            for (int e = 0; e < 4; e++)
                if ((*net)->edge[e].from == tri->node[k] &&
                    (*net)->edge[e].to == tri->node[(k + 1) % 3]) {
                    tri->curve[k] = e;
                    tri->t[k][1] = 1;
                }
    }
    assert_ok(utw_mesh_connect(mesh, &err));
    return mesh;
}

/* The collapsed rule of field/basis.h written again: sixteen points a direction. */
double mesh_area(const utw_mesh *mesh)
{
    enum { N = 16 };
    double x[N], w[N], area = 0;
    utw_gauss(N, x, w);
    for (int t = 0; t < mesh->n_tri; t++) {
        utw_blend b;
        utw_blend_of(mesh, &mesh->tri[t], &b);
        for (int i = 0; i < N; i++)
            for (int j = 0; j < N; j++) {
                double xy[2], J[4];
                utw_blend_at(&b, x[i] * (1 - x[j]), x[j], xy, J);
                area += w[i] * w[j] * (1 - x[j]) * (J[0] * J[3] - J[1] * J[2]);
            }
    }
    return area;
}

/* ---- checks ---------------------------------------------------------------------------- */

static void check_side(const utw_mesh *mesh, int t, int k)
{
    const utw_triangle *tri = &mesh->tri[t];
    const int a = tri->node[k], b = tri->node[(k + 1) % 3];
    assert_in_range(a, 0, mesh->n_node - 1);
    assert_in_range(tri->side[k], 0, mesh->n_edge - 1);
    const utw_mesh_edge *e = &mesh->edge[tri->side[k]];
    assert_true(e->node[0] < e->node[1]);
    assert_true((e->node[0] == a && e->node[1] == b) || (e->node[0] == b && e->node[1] == a));
    assert_true((e->tri[0] == t && e->slot[0] == k) || (e->tri[1] == t && e->slot[1] == k));
    if (tri->curve[k] < 0) {
        assert_true(e->tri[1] >= 0); /* what has no curve lies inside */
        return;
    }
    assert_in_range(tri->curve[k], 0, mesh->net->n_edge - 1);
    const utw_net_edge *on = &mesh->net->edge[tri->curve[k]];
    const double *ends[2] = {mesh->xy[a], mesh->xy[b]}, chord = utw_distance(ends[0], ends[1]);
    for (int i = 0; i < 2; i++) {
        double p[2];
        assert_true(tri->t[k][i] >= 0 && tri->t[k][i] <= 1);
        utw_curve_point(&on->curve, tri->t[k][i], p);
        assert_true(utw_distance(p, ends[i]) <= 1e-11 * chord + 1e-15 * (fabs(p[0]) + fabs(p[1])));
    }
    /* the part lies on the left of the curve when run forward */
    const int forward = tri->t[k][1] > tri->t[k][0];
    assert_int_equal(forward ? on->left : on->right, tri->part);
    assert_int_equal(e->tri[1] < 0, on->left < 0 || on->right < 0);
}

/* Every net edge is covered by its sides exactly, from each side that has a part. */
static void check_cover(const utw_mesh *mesh)
{
    double *cover = utw_alloc(2 * (size_t)mesh->net->n_edge, sizeof *cover);
    assert_non_null(cover);
    for (int t = 0; t < mesh->n_tri; t++)
        for (int k = 0; k < 3; k++) {
            const utw_triangle *tri = &mesh->tri[t];
            if (tri->curve[k] < 0) continue;
            const double part = tri->t[k][1] - tri->t[k][0];
            cover[2 * tri->curve[k] + (part < 0)] += fabs(part);
        }
    for (int e = 0; e < mesh->net->n_edge; e++) {
        const utw_net_edge *on = &mesh->net->edge[e];
        assert_close_scaled(cover[2 * e], on->left >= 0 ? 1 : 0, 1e-12, 1);
        assert_close_scaled(cover[2 * e + 1], on->right >= 0 ? 1 : 0, 1e-12, 1);
    }
    utw_free(cover);
}

void mesh_check(const utw_mesh *mesh)
{
    unsigned char *used = utw_alloc((size_t)mesh->n_node, 1);
    assert_non_null(used);
    assert_true(mesh->n_tri > 0);
    int sides = 0;
    for (int t = 0; t < mesh->n_tri; t++) {
        const utw_triangle *tri = &mesh->tri[t];
        assert_true(
            utw_turn(mesh->xy[tri->node[0]], mesh->xy[tri->node[1]], mesh->xy[tri->node[2]]) > 0);
        for (int k = 0; k < 3; k++) {
            check_side(mesh, t, k);
            used[tri->node[k]] = 1;
        }
    }
    for (int i = 0; i < mesh->n_node; i++) assert_true(used[i]);
    for (int e = 0; e < mesh->n_edge; e++) sides += mesh->edge[e].tri[1] >= 0 ? 2 : 1;
    assert_int_equal(sides, 3 * mesh->n_tri);
    for (int i = 0; i < mesh->net->n_node; i++)
        assert_true(mesh->xy[i][0] == mesh->net->node[i][0] &&
                    mesh->xy[i][1] == mesh->net->node[i][1]);
    check_cover(mesh);
    utw_free(used);
}
