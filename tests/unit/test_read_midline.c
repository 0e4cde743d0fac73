/* SPDX-License-Identifier: GPL-3.0-or-later */
#include "outline/outline.h"

#include "base/memory.h"
#include "support/figure.h"
#include "support/support.h"

static const char text[] =
    "{\"units\": \"mm N\", \"let\": {\"b\": 50, \"t\": 3}, \"materials\": {\"steel\": {\"E\": "
    "210000, \"nu\": 0.3}},"
    " \"midline\": {\"nodes\": [[0, 0], [\"b\", 0], [\"b\", 80], [0, 80]], \"material\": \"steel\","
    " \"walls\": [{\"from\": 0, \"to\": 1, \"t\": \"t\"}, {\"from\": 1, \"to\": 2, \"t\": [\"t\", "
    "\"2*t\"]},"
    "             {\"from\": 2, \"to\": 3, \"t\": 6}, {\"from\": 3, \"to\": 0, \"t\": 3, \"arc\": "
    "[-20, 40]}]}}";

static void a_midline_is_kept_and_thickened(void **state)
{
    (void)state;
    utw_outline *o = utw_outline_of(text);
    const utw_midline *m = utw_outline_midline(o);
    assert_non_null(m);
    assert_int_equal(m->n_nodes, 4);
    assert_int_equal(m->n_walls, 4);
    assert_true(m->nodes[2][0] == 50 && m->nodes[2][1] == 80);
    assert_true(m->walls[1].t0 == 3 && m->walls[1].t1 == 6 && !m->walls[1].arc);
    assert_true(m->walls[3].from == 3 && m->walls[3].to == 0 && m->walls[3].arc &&
                m->walls[3].mid[0] == -20);
    assert_int_equal(o->n_part, 1);
    assert_int_equal(o->part[0].material, 0);
    assert_int_equal(o->part[0].n_loop, 2);
    utw_thin *thin = NULL;
    utw_error err;
    assert_ok(utw_thin_solve(m, &thin, &err));
    assert_close(figure_of_outline(o).A, utw_thin_get(thin)->A, 0.02);
    utw_thin_free(thin);
    utw_outline_free(o);
    o = utw_outline_of("{\"units\": \"mm N\", \"shape\": {\"round\": {\"d\": 3}}}");
    assert_null(utw_outline_midline(o));
    utw_outline_free(o);
}

static void a_refused_allocation_leaves_nothing_behind(void **state)
{
    (void)state;
    utw_error err;
    utw_outline *o = NULL;
    utw_status st = UTW_E_NOMEM;
    for (long n = 1; st == UTW_E_NOMEM; n++) {
        utw_memory_fail_at(n);
        st = utw_outline_parse(text, strlen(text), "test", &o, &err);
        utw_memory_fail_at(0);
        if (st != UTW_OK) assert_null(o);
    }
    assert_int_equal(st, UTW_OK);
    utw_outline_free(o);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        balanced_test(a_midline_is_kept_and_thickened),
        balanced_test(a_refused_allocation_leaves_nothing_behind),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
