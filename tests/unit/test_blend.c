/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "mesh/blend.h"

#include "base/vec2.h"
#include "support/meshing.h"
#include "support/section.h"

static void a_straight_triangle_is_mapped_linearly(void **state)
{
    (void)state;
    utw_net *net;
    utw_mesh *mesh = mesh_two_triangles(&net);
    utw_blend b;
    utw_blend_of(mesh, &mesh->tri[0], &b);
    assert_int_equal(b.any, 0);
    assert_close(utw_blend_quality(&b), 1, 0);
    for (double r = 0; r <= 1; r += 0.25)
        for (double s = 0; r + s <= 1; s += 0.25) {
            double xy[2], J[4];
            utw_blend_at(&b, r, s, xy, J);
            for (int k = 0; k < 2; k++)
                assert_close_scaled(xy[k], (1 - r - s) * b.x[0][k] + r * b.x[1][k] + s * b.x[2][k],
                                    1e-15, 1);
            assert_close(J[0] * J[3] - J[1] * J[2], 6, 1e-14); /* twice the area */
        }
    utw_mesh_free(mesh);
    utw_net_free(net);
}

/* A disc: points of a curved side lie on the circle, corners and straight sides stay, and the
 * derivatives are those of the map. */
static void a_curved_side_follows_its_curve(void **state)
{
    (void)state;
    utw_outline *o = section_outline(UTW_NAN, "\"outline\":{\"circle\":[0.2,0.1,1.5]}");
    utw_net *net = net_of(o);
    utw_outline_free(o);
    utw_mesh *mesh = mesh_of(net, 1e-3);
    static const double corner[3][2] = {{0, 0}, {1, 0}, {0, 1}};
    const double centre[2] = {0.2, 0.1};
    int curved = 0;
    for (int t = 0; t < mesh->n_tri; t++) {
        utw_blend b;
        utw_blend_of(mesh, &mesh->tri[t], &b);
        for (int k = 0; k < 3; k++)
            for (int i = 0; i <= 8; i++) {
                const double *a = corner[k], *c = corner[(k + 1) % 3], u = i / 8.0;
                double xy[2], J[4];
                utw_blend_at(&b, a[0] + u * (c[0] - a[0]), a[1] + u * (c[1] - a[1]), xy, J);
                assert_true(J[0] * J[3] - J[1] * J[2] > 0);
                if (b.curved[k]) {
                    assert_close(utw_distance(xy, centre), 1.5, 1e-14);
                } else {
                    const double *p = b.x[k], *q = b.x[(k + 1) % 3];
                    for (int m = 0; m < 2; m++)
                        assert_close_scaled(xy[m], p[m] + u * (q[m] - p[m]), 1e-14, 1);
                }
            }
        curved += b.any;
        assert_true(b.any == (b.turning > 0));
        assert_true(utw_blend_quality(&b) > 0 && utw_blend_quality(&b) <= 1);
        const double r = 0.23, s = 0.41, h = 1e-6;
        double xy[2], J[4], p[2], q[2], unused[4];
        utw_blend_at(&b, r, s, xy, J);
        for (int along = 0; along < 2; along++) {
            utw_blend_at(&b, r + (along ? 0 : h), s + (along ? h : 0), q, unused);
            utw_blend_at(&b, r - (along ? 0 : h), s - (along ? h : 0), p, unused);
            for (int m = 0; m < 2; m++)
                assert_close_scaled(J[2 * m + along], (q[m] - p[m]) / (2 * h), 1e-8, 1);
        }
    }
    assert_true(curved >= 4);
    utw_mesh_free(mesh);
    utw_net_free(net);
}

/* A triangle whose curved side bulges in past its opposite corner folds. */
static void folding_is_seen(void **state)
{
    (void)state;
    const double a[2] = {0, 0}, c1[2] = {0.3, 2.5}, c2[2] = {0.7, 2.5}, b[2] = {1, 0};
    const utw_curve curve = utw_curve_cubic(a, c1, c2, b);
    utw_blend x = {.x = {{0, 0}, {1, 0}, {0.5, 0.6}}, .curved = {1, 0, 0}, .any = 1};
    x.curve[0] = &curve;
    x.t1[0] = 1;
    assert_true(utw_blend_quality(&x) <= 0);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(a_straight_triangle_is_mapped_linearly),
        balanced_test(a_curved_side_follows_its_curve),
        balanced_test(folding_is_seen),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
