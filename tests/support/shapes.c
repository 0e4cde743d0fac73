/* SPDX-License-Identifier: GPL-3.0-or-later
 * Trade shapes in tests. */
#include "support/shapes.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "outline/outline.h"
#include "report/shape_file.h"

enum { MOST = 20 };

typedef struct line {
    char copy[400];
    const char *name, *keys[MOST];
    double values[MOST];
    int n;
} line;

static void split(const char *text, line *l)
{
    char *save = NULL;
    l->n = 0;
    snprintf(l->copy, sizeof l->copy, "%s", text);
    l->name = strtok_r(l->copy, " ", &save);
    for (char *word; (word = strtok_r(NULL, " ", &save)) != NULL; l->n++) {
        char *equals = strchr(word, '=');
        assert_non_null(equals);
        assert_true(l->n < MOST);
        *equals = '\0';
        l->keys[l->n] = word;
        l->values[l->n] = strtod(equals + 1, NULL);
    }
}

utw_status shape_try(const char *text, const utw_placement *placement, utw_outline **outline,
                     utw_error *err)
{
    line l;
    split(text, &l);
    return utw_outline_from_shape(l.name, l.n, l.keys, l.values, "mm N", placement, outline, err);
}

static void same_curve(const utw_curve *a, const utw_curve *b, double size)
{
    assert_int_equal(a->kind, b->kind);
    for (double t = 0; t <= 1; t += 0.125) {
        double p[2], q[2];
        utw_curve_point(a, t, p);
        utw_curve_point(b, t, q);
        if (utw_distance(p, q) > 1e-12 * size)
            print_error("(%g, %g) and (%g, %g)\n", p[0], p[1], q[0], q[1]);
        assert_true(utw_distance(p, q) <= 1e-12 * size);
    }
}

/* The section file of the shape reads back to the same curves. */
static void reads_back(const line *l, const utw_outline *o, double size)
{
    utw_error err;
    char *text = NULL;
    utw_outline *read = NULL;
    assert_ok(utw_shape_file_text(l->name, l->n, l->keys, l->values, "mm N", NULL, &text, &err));
    assert_ok(utw_outline_parse(text, strlen(text), "written", &read, &err));
    assert_int_equal(read->part[0].n_loop, o->part[0].n_loop);
    for (int i = 0; i < o->part[0].n_loop; i++) {
        const utw_loop *a = &o->part[0].loop[i], *b = &read->part[0].loop[i];
        assert_int_equal(a->n, b->n);
        int first = 0; /* either may start with the fillet of its first vertex */
        while (first < b->n && utw_distance(a->curve[0].from, b->curve[first].from) > 1e-12 * size)
            first++;
        assert_true(first < b->n);
        for (int k = 0; k < a->n; k++)
            same_curve(&a->curve[k], &b->curve[(first + k) % b->n], size);
    }
    utw_outline_free(read);
    utw_free(text);
}

utw_outline *shape_of(const char *text)
{
    utw_error err;
    utw_outline *o = NULL;
    line l;
    const utw_status st = shape_try(text, NULL, &o, &err);
    if (st != UTW_OK) print_error("%s: %s\n", text, err.text);
    assert_int_equal(st, UTW_OK);
    assert_int_equal(o->n_part, 1);
    assert_string_equal(utw_outline_name(o), text);
    const double size = hypot(o->box[2] - o->box[0], o->box[3] - o->box[1]);
    for (int i = 0; i < o->part[0].n_loop; i++) {
        const utw_loop *loop = &o->part[0].loop[i];
        assert_true((utw_loop_area(loop) > 0) == (i == 0));
        for (int k = 0; k < loop->n; k++)
            assert_true(utw_curve_length(&loop->curve[k]) > 1e-6 * size);
    }
    split(text, &l);
    reads_back(&l, o, size);
    return o;
}

void shape_refused(const char *text, utw_status status, const char *message)
{
    utw_error err;
    utw_outline *o = NULL;
    const utw_status st = shape_try(text, NULL, &o, &err);
    if (st == UTW_OK) print_error("%s was not refused\n", text);
    assert_int_equal(st, status);
    assert_null(o);
    assert_string_equal(err.text, message);
}

void shape_symmetric(const utw_outline *o, int mirror_x, double middle)
{
    const double size = hypot(o->box[2] - o->box[0], o->box[3] - o->box[1]);
    for (int i = 0; i < o->part[0].n_loop; i++) {
        const utw_loop *loop = &o->part[0].loop[i];
        for (int k = 0; k < loop->n; k++) {
            const double *p = loop->curve[k].from;
            const double m[2] = {mirror_x ? -p[0] : p[0], mirror_x ? p[1] : 2 * middle - p[1]};
            double nearest = HUGE_VAL;
            for (int j = 0; j < loop->n; j++)
                nearest = fmin(nearest, utw_distance(m, loop->curve[j].from));
            if (loop->n > 1) assert_true(nearest <= 1e-14 * size);
        }
    }
}
