/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "base/memory.h"
#include "outline/boxtree.h"
#include "support/support.h"

enum { N = 137 };

typedef struct seen {
    int pairs, stop_after, query[N], n_query;
    unsigned char pair[N][N];
} seen;

static int see_pair(void *context, int i, int j)
{
    seen *s = context;
    assert_true(i < j);
    assert_false(s->pair[i][j]);
    s->pair[i][j] = 1;
    return ++s->pairs == s->stop_after ? 42 : 0;
}

static int see_box(void *context, int i)
{
    seen *s = context;
    s->query[s->n_query++] = i;
    return 0;
}

static void boxes(double box[N][4])
{
    for (int i = 0; i < N; i++) {
        box[i][0] = sin(i * 1.7) * 10;
        box[i][1] = cos(i * 2.9) * 10;
        box[i][2] = box[i][0] + 1 + (i % 5);
        box[i][3] = box[i][1] + 0.5 * (i % 7);
    }
}

static int apart(const double a[4], const double b[4], double margin)
{
    return a[0] > b[2] + margin || b[0] > a[2] + margin || a[1] > b[3] + margin ||
           b[1] > a[3] + margin;
}

static void pairs_are_those_of_all_against_all(void **state)
{
    (void)state;
    double box[N][4];
    boxes(box);
    for (int n = 1; n <= N; n += 17)
        for (double margin = 0; margin < 1; margin += 0.3) {
            utw_boxtree tree;
            utw_error err;
            seen *s = calloc(1, sizeof *s);
            assert_non_null(s);
            assert_ok(utw_boxtree_init(&tree, (const double(*)[4])box, n, &err));
            assert_int_equal(utw_boxtree_pairs(&tree, margin, see_pair, s), 0);
            for (int i = 0; i < n; i++)
                for (int j = i + 1; j < n; j++)
                    assert_int_equal(s->pair[i][j], !apart(box[i], box[j], margin));
            utw_boxtree_clear(&tree);
            free(s);
        }
}

static void queries_find_what_they_overlap(void **state)
{
    (void)state;
    double box[N][4];
    boxes(box);
    utw_boxtree tree;
    utw_error err;
    assert_ok(utw_boxtree_init(&tree, (const double(*)[4])box, N, &err));
    for (int q = 0; q < N; q++) {
        seen *s = calloc(1, sizeof *s);
        assert_non_null(s);
        utw_boxtree_query(&tree, box[q], see_box, s);
        int k = 0;
        for (int i = 0; i < N; i++)
            if (!apart(box[i], box[q], 0)) assert_int_equal(s->query[k++], i);
        assert_int_equal(k, s->n_query);
        free(s);
    }
    utw_boxtree_clear(&tree);
}

static void a_visit_can_stop_the_walk(void **state)
{
    (void)state;
    double box[N][4];
    boxes(box);
    utw_boxtree tree;
    utw_error err;
    seen *s = calloc(1, sizeof *s);
    assert_non_null(s);
    s->stop_after = 3;
    assert_ok(utw_boxtree_init(&tree, (const double(*)[4])box, N, &err));
    assert_int_equal(utw_boxtree_pairs(&tree, 0, see_pair, s), 42);
    assert_int_equal(s->pairs, 3);
    utw_boxtree_clear(&tree);
    utw_memory_fail_at(1);
    const utw_status st = utw_boxtree_init(&tree, (const double(*)[4])box, N, &err);
    utw_memory_fail_at(0);
    assert_int_equal(st, UTW_E_NOMEM);
    free(s);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(pairs_are_those_of_all_against_all),
        balanced_test(queries_find_what_they_overlap),
        balanced_test(a_visit_can_stop_the_walk),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
