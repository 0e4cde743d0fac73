/* SPDX-License-Identifier: GPL-3.0-or-later
 * Moving, turning, mirroring, scaling, renumbering and reversing a midline changes its constants as
 * it must. */
#include "support/midlines.h"

#include "base/memory.h"

/* p -> scale R(angle) p + shift, y mirrored first when mirror is -1. */
typedef struct motion {
    double scale, angle, shift[2], mirror;
    int renumber; /* reverse the order of nodes and walls and every other wall */
} motion;

static void move_point(const motion *to, const double p[2], double out[2])
{
    const double c = cos(to->angle), s = sin(to->angle), y = to->mirror * p[1];
    out[0] = to->shift[0] + to->scale * (c * p[0] - s * y);
    out[1] = to->shift[1] + to->scale * (s * p[0] + c * y);
}

static utw_midline moved(const utw_midline *m, const motion *to)
{
    utw_midline out = {m->n_nodes, m->n_walls, NULL, NULL};
    out.nodes = utw_alloc((size_t)m->n_nodes, sizeof *out.nodes);
    out.walls = utw_alloc((size_t)m->n_walls, sizeof *out.walls);
    assert_true(out.nodes != NULL && out.walls != NULL);
    for (int i = 0; i < m->n_nodes; i++)
        move_point(to, m->nodes[i], out.nodes[to->renumber ? m->n_nodes - 1 - i : i]);
    for (int i = 0; i < m->n_walls; i++) {
        utw_wall w = m->walls[i];
        w.t0 *= to->scale;
        w.t1 *= to->scale;
        if (w.arc) move_point(to, m->walls[i].mid, w.mid);
        if (to->renumber) {
            w.from = m->n_nodes - 1 - w.from;
            w.to = m->n_nodes - 1 - w.to;
        }
        /* a full circle runs counter-clockwise always: its mirror image goes from its end to its
         * start */
        const double *a = m->nodes[m->walls[i].from], *b = m->nodes[m->walls[i].to];
        const int circle = a[0] == b[0] && a[1] == b[1];
        if (circle ? to->mirror < 0 : to->renumber && i % 2) {
            const utw_wall keep = w;
            w.from = keep.to;
            w.to = keep.from;
            w.t0 = keep.t1;
            w.t1 = keep.t0;
        }
        out.walls[to->renumber ? m->n_walls - 1 - i : i] = w;
    }
    return out;
}

/* xx, yy, xy of a symmetric tensor v v^T turned with the section. */
static void turned(const motion *to, double xx, double yy, double xy, double out[3])
{
    const double c = cos(to->angle), s = sin(to->angle), m = to->mirror * xy;
    out[0] = c * c * xx - 2 * c * s * m + s * s * yy;
    out[1] = s * s * xx + 2 * c * s * m + c * c * yy;
    out[2] = c * s * (xx - yy) + (c * c - s * s) * m;
}

static void compare(const utw_thin_constants *a, const utw_thin_constants *b, const motion *to,
                    double rtol)
{
    const double l = to->scale, l2 = l * l, l4 = l2 * l2;
    double p[2], s[3];
    assert_close(b->A, l2 * a->A, rtol);
    assert_close(b->length, l * a->length, rtol);
    const double size = l * sqrt((a->Ixx + a->Iyy) / a->A), inertia = l4 * (a->Ixx + a->Iyy);
    move_point(to, (const double[2]){a->xc, a->yc}, p);
    assert_close_scaled(b->xc, p[0], rtol, size);
    assert_close_scaled(b->yc, p[1], rtol, size);
    move_point(to, (const double[2]){a->xs, a->ys}, p);
    assert_close_scaled(b->xs, p[0], rtol, size);
    assert_close_scaled(b->ys, p[1], rtol, size);
    turned(to, a->Iyy, a->Ixx, a->Ixy, s); /* int x x, int y y, int x y */
    assert_close_scaled(b->Iyy, l4 * s[0], rtol, inertia);
    assert_close_scaled(b->Ixx, l4 * s[1], rtol, inertia);
    assert_close_scaled(b->Ixy, l4 * s[2], rtol, inertia);
    assert_close(b->I1, l4 * a->I1, rtol);
    assert_close(b->I2, l4 * a->I2, rtol);
    assert_close(b->J, l4 * a->J, rtol);
    assert_close_scaled(b->J_bredt, l4 * a->J_bredt, rtol, l4 * a->J);
    assert_close(b->J_open, l4 * a->J_open, rtol);
    assert_close(b->Wt, l2 * l * a->Wt, rtol);
    assert_close(b->Iw, l4 * l2 * a->Iw, rtol);
    assert_close(b->Iw_secondary, l4 * l2 * a->Iw_secondary, rtol);
    turned(to, 1 / a->Asx, 1 / a->Asy, a->shear_xy, s);
    assert_close(1 / b->Asx, s[0] / l2, rtol);
    assert_close(1 / b->Asy, s[1] / l2, rtol);
    assert_close_scaled(b->shear_xy, s[2] / l2, rtol, (s[0] + s[1]) / l2);
    assert_true(a->n_cells == b->n_cells && a->n_ends == b->n_ends &&
                a->n_junctions == b->n_junctions);
    /* the axis of I1 turns with the section, by half turns at most */
    const double half_turns = (b->angle - to->mirror * a->angle - to->angle) / acos(-1.0);
    assert_close_scaled(half_turns, round(half_turns), 1e-11, 1);
    assert_true(b->angle > -acos(-1.0) / 2 - 1e-15 && b->angle <= acos(-1.0) / 2 + 1e-15);
}

static void check(const motion *to, double rtol)
{
    const char *name;
    for (int i = 0; utw_midline_sample(i, &name) != NULL; i++) {
        const utw_midline *m = utw_midline_sample(i, &name);
        utw_midline other = moved(m, to);
        utw_thin *a = utw_thin_of(m), *b = utw_thin_of(&other);
        compare(utw_thin_get(a), utw_thin_get(b), to, rtol);
        utw_thin_free(a);
        utw_thin_free(b);
        utw_free(other.nodes);
        utw_free(other.walls);
    }
}

static void moving(void **state)
{
    (void)state;
    check(&(motion){1, 0, {-731.2, 388.9}, 1, 0}, 1e-10);
}

static void turning(void **state)
{
    (void)state;
    for (int i = 1; i < 12; i++) check(&(motion){1, 0.53 * i, {0, 0}, 1, 0}, 1e-11);
}

static void mirroring(void **state)
{
    (void)state;
    check(&(motion){1, 0, {0, 0}, -1, 0}, 1e-11);
    check(&(motion){1, 1.3, {3, -2}, -1, 1}, 1e-11);
}

static void scaling(void **state)
{
    (void)state;
    check(&(motion){25.4, 0, {0, 0}, 1, 0}, 1e-11);
    check(&(motion){1e-3, 0, {0, 0}, 1, 0}, 1e-11);
    check(&(motion){1e9, 0, {0, 0}, 1, 0}, 1e-11);
    check(&(motion){1e-9, 0, {0, 0}, 1, 0}, 1e-11);
}

static void renumbering(void **state)
{
    (void)state;
    check(&(motion){1, 0, {0, 0}, 1, 1}, 1e-11);
}

/* Cutting a wall in two at any station changes nothing. */
static void cutting(void **state)
{
    (void)state;
    double whole[][2] = {{43, -50}, {0, -50}, {0, 50}, {31, 62}};
    utw_wall three[] = {WALL(0, 1, 5), TAPER(1, 2, 4, 3), ARC(2, 3, 3, 5, 18, 66)};
    const utw_midline a = MIDLINE(whole, three);
    double cut[][2] = {{43, -50}, {0, -50}, {0, 50}, {31, 62}, {0, -20}, {18, 66}};
    const utw_thin_load none = {.N = 0};
    utw_thin *one = utw_thin_of(&a);
    /* the arc's thickness is linear along it: find t at the cut by bisection of the station */
    double low = 0, high = 1;
    utw_thin_station at;
    utw_error err;
    for (int i = 0; i < 60; i++) {
        assert_ok(utw_thin_at(one, 2, (low + high) / 2, &none, &at, &err));
        if (at.x < 18)
            low = (low + high) / 2;
        else
            high = (low + high) / 2;
    }
    double before[2], after[2];
    utw_thin_station p;
    assert_ok(utw_thin_at(one, 2, low / 2, &none, &p, &err));
    before[0] = p.x;
    before[1] = p.y;
    assert_ok(utw_thin_at(one, 2, (1 + low) / 2, &none, &p, &err));
    after[0] = p.x;
    after[1] = p.y;
    utw_wall five[] = {WALL(0, 1, 5), TAPER(1, 4, 4, 3.7), TAPER(4, 2, 3.7, 3),
                       ARC(2, 5, 3, at.t, before[0], before[1]),
                       ARC(5, 3, at.t, 5, after[0], after[1])};
    const utw_midline b = MIDLINE(cut, five);
    utw_thin *two = utw_thin_of(&b);
    compare(utw_thin_get(one), utw_thin_get(two), &(motion){1, 0, {0, 0}, 1, 0}, 1e-11);
    utw_thin_free(one);
    utw_thin_free(two);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(moving),  balanced_test(turning),     balanced_test(mirroring),
        balanced_test(scaling), balanced_test(renumbering), balanced_test(cutting),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
