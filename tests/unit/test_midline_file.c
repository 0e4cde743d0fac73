/* SPDX-License-Identifier: GPL-3.0-or-later
 * Midlines written as section files read back as they were. */
#include "base/memory.h"
#include "support/drawings.h"
#include "support/midlines.h"

static void read_back(void **state)
{
    (void)state;
    utw_wall wall[32];
    utw_midline m;
    const char *name;
    for (int i = 0; utw_drawing_sample(i, 0.0437, wall, &m, &name) != NULL; i++) {
        utw_error err;
        char *text = NULL;
        utw_outline *outline = NULL;
        m.walls[0].t1 *= 1.01; /* a taper, whose numbers are no round ones */
        assert_ok(utw_midline_file(&m, "with \"quotes\" and \\", "in lbf", &text, &err));
        assert_ok(utw_outline_parse(text, strlen(text), "text", &outline, &err));
        const utw_midline *back = utw_outline_midline(outline);
        assert_string_equal(utw_outline_name(outline), "with \"quotes\" and \\");
        assert_string_equal(utw_outline_units(outline), "in lbf");
        assert_int_equal(back->n_nodes, m.n_nodes);
        assert_int_equal(back->n_walls, m.n_walls);
        assert_memory_equal(back->nodes, m.nodes, (size_t)m.n_nodes * sizeof *m.nodes);
        for (int k = 0; k < m.n_walls; k++) {
            const utw_wall *a = &m.walls[k], *b = &back->walls[k];
            assert_true(a->from == b->from && a->to == b->to && a->t0 == b->t0 && a->t1 == b->t1 &&
                        a->arc == b->arc);
            if (a->arc) assert_memory_equal(a->mid, b->mid, sizeof a->mid);
        }
        utw_outline_free(outline);
        utw_report_free(text);
    }
}

static void refusals(void **state)
{
    (void)state;
    utw_error err;
    utw_wall wall[32];
    utw_midline m;
    const char *name;
    char *text = NULL;
    utw_drawing_sample(0, 0.05, wall, &m, &name);
    assert_int_equal(utw_midline_file(NULL, "", "mm N", &text, &err), UTW_E_ARGUMENT);
    assert_string_equal(err.text,
                        "utw_midline_file: midline, name, units and text must not be NULL");
    for (long n = 1; n < 20; n++) {
        utw_memory_fail_at(n);
        const utw_status st = utw_midline_file(&m, "", "mm N", &text, &err);
        utw_memory_fail_at(0);
        if (st == UTW_OK) break;
        assert_int_equal(st, UTW_E_NOMEM);
        assert_null(text);
    }
    assert_non_null(text);
    utw_report_free(text);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(read_back), balanced_test(refusals)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
