/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where text may stand, and lines that leave room for it. */
#include "draw/labels.h"

#include "base/vec2.h"
#include "draw/canvas_list.h"
#include "draw/gaps.h"
#include "support/support.h"

static utw_labels *page(void)
{
    utw_error err;
    utw_labels *l = NULL;
    assert_ok(utw_labels_create(100, 60, &l, &err));
    return l;
}

static void what_is_taken_is_not_free(void **state)
{
    (void)state;
    utw_labels *l = page();
    const utw_box box = {20, 20, 30, 25};
    assert_int_equal(utw_labels_free_for(l, box, 0, 0), 1);
    utw_labels_take_line(l, (const double[]){10, 22}, (const double[]){90, 23});
    assert_int_equal(utw_labels_free_for(l, box, 0, 0), 0);
    assert_int_equal(utw_labels_free_for(l, (utw_box){20, 24, 30, 30}, 0, 0), 1);
    assert_int_equal(utw_labels_free_for(l, (utw_box){20, 24, 30, 30}, 2, 0), 0);
    utw_labels_take_box(l, (utw_box){60, 40, 70, 50});
    assert_int_equal(utw_labels_free_for(l, (utw_box){62, 42, 63, 43}, 0, 0), 0);
    assert_int_equal(utw_labels_free_for(l, (utw_box){71, 40, 75, 50}, 0, 0), 1);
    utw_labels_free(l);
}

/* A line drawn as finely as it may be crosses no box unseen, at any angle. */
static void no_line_slips_through(void **state)
{
    (void)state;
    for (int i = 0; i < 90; i++) {
        utw_labels *l = page();
        const double a = UTW_PI * i / 90, c = cos(a), s = sin(a);
        utw_labels_take_line(l, (const double[]){50 - 28 * c, 30 - 28 * s},
                             (const double[]){50 + 28 * c, 30 + 28 * s});
        for (double t = -25; t < 25; t += 1.7)
            assert_int_equal(utw_labels_free_for(l,
                                                 (utw_box){50 + t * c - 0.2, 30 + t * s - 0.2,
                                                           50 + t * c + 0.2, 30 + t * s + 0.2},
                                                 0, 0),
                             0);
        utw_labels_free(l);
    }
}

static void nothing_is_free_off_the_page(void **state)
{
    (void)state;
    utw_labels *l = page();
    assert_int_equal(utw_labels_free_for(l, (utw_box){-1, 5, 3, 8}, 0, 0), 0);
    assert_int_equal(utw_labels_free_for(l, (utw_box){1, 5, 3, 8}, 2, 0), 0);
    assert_int_equal(utw_labels_free_for(l, (utw_box){97, 5, 101, 8}, 0, 0), 0);
    assert_int_equal(utw_labels_free_for(l, (utw_box){97, 57, 99, 61}, 0, 0), 0);
    /* what lies off the page is ignored */
    utw_labels_take_box(l, (utw_box){-50, -50, -10, -10});
    utw_labels_take_line(l, (const double[]){-10, -10}, (const double[]){200, -10});
    assert_int_equal(utw_labels_free_for(l, (utw_box){0.5, 0.5, 99, 59}, 0, 0), 1);
    utw_labels_free(l);
}

static utw_paths two_points(double (*xy)[2], int *first, unsigned char *closed)
{
    *first = 0;
    *closed = 0;
    return (utw_paths){.n_path = 1, .n_point = 2, .first = first, .closed = closed, .xy = xy};
}

static void contours_give_way_to_their_own_labels(void **state)
{
    (void)state;
    utw_labels *l = page();
    double a[2][2] = {{10, 20}, {90, 20}}, b[2][2] = {{50, 10}, {50, 50}};
    int first[2];
    unsigned char closed[2];
    const utw_paths one = two_points(a, &first[0], &closed[0]),
                    two = two_points(b, &first[1], &closed[1]);
    utw_labels_take_contour(l, &one, 1);
    utw_labels_take_contour(l, &two, 2);
    const utw_box on_one = {20, 19, 26, 21}, on_both = {48, 19, 52, 21};
    assert_int_equal(utw_labels_free_for(l, on_one, 0, 1), 1);
    assert_int_equal(utw_labels_free_for(l, on_one, 0, 2), 0);
    assert_int_equal(utw_labels_free_for(l, on_one, 0, 0), 0);
    assert_int_equal(utw_labels_free_for(l, on_both, 0, 1), 0);
    assert_int_equal(utw_labels_free_for(l, on_both, 0, 2), 0);
    utw_labels_free(l);
}

static void a_place_is_found_near_the_point(void **state)
{
    (void)state;
    utw_labels *l = page();
    utw_box box;
    assert_int_equal(utw_labels_find(l, 50, 30, 8, 3, 1, 6, 0.2, &box), 1);
    utw_labels_take_box(l, box);
    utw_box other;
    assert_int_equal(utw_labels_find(l, 50, 30, 8, 3, 1, 6, 0.2, &other), 1);
    assert_true(other.x0 >= box.x1 || other.x1 <= box.x0 || other.y0 >= box.y1 ||
                other.y1 <= box.y0);
    /* the nearest point of the box is between `near` and `far` off */
    const double dx = fmax(fmax(other.x0 - 50, 50 - other.x1), 0),
                 dy = fmax(fmax(other.y0 - 30, 30 - other.y1), 0);
    assert_true(hypot(dx, dy) > 0.9 && hypot(dx, dy) < 6.1);
    utw_labels_take_box(l, (utw_box){30, 10, 70, 50});
    assert_int_equal(utw_labels_find(l, 50, 30, 8, 3, 1, 6, 0.2, &other), 0);
    utw_labels_free(l);
}

/* Length of what is laid of the line a b with boxes cut out, and that none of it lies in a box. */
static double laid(const utw_box *box, int n, const double a[2], const double b[2])
{
    utw_error err;
    utw_canvas *c = NULL;
    double xy[2][2] = {{a[0], a[1]}, {b[0], b[1]}}, length = 0, pen[2] = {0, 0};
    int first;
    unsigned char closed;
    const utw_paths line = two_points(xy, &first, &closed);
    assert_ok(utw_canvas_create(&c, &err));
    utw_lay_with_gaps(c, &line, n, box);
    for (size_t i = 0; i < c->n_segment; i++) {
        const double *v = c->segment[i].v;
        if (c->segment[i].verb == UTW_LINE_TO) {
            length += utw_distance(pen, v);
            const double middle[2] = {0.5 * (pen[0] + v[0]), 0.5 * (pen[1] + v[1])};
            for (int k = 0; k < n; k++)
                assert_false(middle[0] > box[k].x0 && middle[0] < box[k].x1 &&
                             middle[1] > box[k].y0 && middle[1] < box[k].y1);
        }
        pen[0] = v[0];
        pen[1] = v[1];
    }
    utw_canvas_free(c);
    return length;
}

static void lines_are_cut_at_boxes(void **state)
{
    (void)state;
    const utw_box box[3] = {{20, 10, 30, 30}, {50, 0, 55, 100}, {28, 15, 35, 25}};
    const double a[2] = {0, 20}, b[2] = {100, 20};
    assert_close(laid(box, 0, a, b), 100, 1e-12);
    assert_close(laid(box, 1, a, b), 90, 1e-12);
    assert_close(laid(box, 2, a, b), 85, 1e-12);
    assert_close(laid(box, 3, a, b), 80, 1e-12); /* the third overlaps the first */
    assert_close(laid(box, 3, b, a), 80, 1e-12);
    const double inside[2] = {25, 20}, above[2] = {25, 90};
    assert_close(laid(box, 2, inside, above), 60, 1e-12);
    assert_close(laid(box, 2, above, inside), 60, 1e-12);
    assert_close_scaled(laid(box, 1, inside, inside), 0, 1e-12, 1);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(what_is_taken_is_not_free),
        balanced_test(no_line_slips_through),
        balanced_test(nothing_is_free_off_the_page),
        balanced_test(contours_give_way_to_their_own_labels),
        balanced_test(a_place_is_found_near_the_point),
        balanced_test(lines_are_cut_at_boxes),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
