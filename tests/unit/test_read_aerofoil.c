/* SPDX-License-Identifier: GPL-3.0-or-later */
#include <unistd.h>

#include "outline/outline.h"

#include "base/memory.h"
#include "base/vec2.h"
#include "support/figure.h"
#include "support/support.h"

static const char box[] = "{\"units\": \"mm N\", \"let\": {\"c\": 300, \"web\": 3}, \"materials\": "
                          "{\"2024\": {\"E\": 72000, \"nu\": 0.33}},"
                          " \"shape\": {\"material\": \"2024\", \"aerofoil\": {\"naca\": \"2412\", "
                          "\"chord\": \"c\", \"skin\": [[0, 2], [0.5, \"c/200\"]],"
                          " \"spars\": [{\"at\": 0.25, \"t\": \"web\", \"cap\": [20, 1]}, {\"at\": "
                          "0.6, \"t\": \"web\"}], \"tail\": 0.9, \"edge\": \"sharp\"}";

static void an_aerofoil_box_is_read(void **state)
{
    (void)state;
    char text[1200];
    snprintf(text, sizeof text, "%s}}", box);
    utw_outline *o = utw_outline_of(text);
    assert_int_equal(o->part[0].n_loop, 4);
    assert_int_equal(o->part[0].material, 0);
    assert_true(o->box[2] == 300);
    const figure f = figure_of_outline(o);
    /* turned by a quarter and mirrored: x' = y, y' = x (elementary: mirror x to -x, then turn by
     * -90 degrees) */
    snprintf(text, sizeof text, "%s, \"mirror\": true, \"turn\": -90, \"at\": [7, -3]}}", box);
    utw_outline *p = utw_outline_of(text);
    const figure g = figure_of_outline(p);
    assert_close(g.A, f.A, 1e-12);
    assert_close(g.x / g.A, f.y / f.A + 7, 1e-12);
    assert_close(g.y / g.A, f.x / f.A - 3, 1e-12);
    for (int i = 0; i < 4; i++) assert_true((utw_loop_area(&p->part[0].loop[i]) > 0) == (i == 0));
    utw_outline_free(o);
    utw_outline_free(p);
}

static void points_lie_beside_the_section_file(void **state)
{
    (void)state;
    char folder[] = "/tmp/untwist-aerofoil-XXXXXX", section[80], list[80];
    assert_non_null(mkdtemp(folder));
    snprintf(section, sizeof section, "%s/wing.json", folder);
    snprintf(list, sizeof list, "%s/wing.dat", folder);
    FILE *file = fopen(section, "w");
    assert_non_null(file);
    fputs("{\"units\": \"mm N\", \"shape\": {\"aerofoil\": {\"points\": \"wing.dat\", \"chord\": "
          "200, \"skin\": 1.5}}}",
          file);
    fclose(file);
    utw_error err;
    utw_outline *o = NULL;
    assert_int_equal(utw_outline_read(section, &o, &err), UTW_E_FILE);
    assert_non_null(strstr(err.text, "wing.json: wing.dat: cannot be opened"));
    file = fopen(list, "w");
    assert_non_null(file);
    fputs("wing\n", file);
    for (int i = -30; i <= 30;
         i++) { /* an ellipse cut short by a wedge: any smooth section with an edge */
        const double s = i / 30.0, x = s * s;
        fprintf(file, "%.5f %.5f\n", x, (s < 0 ? 1 : -1) * 0.12 * sqrt(x) * (1 - x));
    }
    fclose(file);
    assert_ok(utw_outline_read(section, &o, &err));
    assert_int_equal(o->part[0].n_loop, 2);
    /* int 2 0.12 sqrt x (1 - x) dx = 0.064; the skin is cut out of it by its inner side */
    assert_close(utw_loop_area(&o->part[0].loop[0]), 0.064 * 200 * 200, 1e-4);
    utw_outline_free(o);
    o = NULL;
    file = fopen(list, "w");
    assert_non_null(file);
    fputs("wing\n1 0\nx\n", file);
    fclose(file);
    assert_int_equal(utw_outline_read(section, &o, &err), UTW_E_SYNTAX);
    assert_non_null(strstr(err.text, "wing.json: wing.dat: line 3 is not two numbers: \"x\""));
    assert_int_equal(err.line, 3);
    remove(list);
    remove(section);
    rmdir(folder);
}

static void a_refused_allocation_leaves_nothing_behind(void **state)
{
    (void)state;
    char text[1200];
    snprintf(text, sizeof text, "%s}}", box);
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
        balanced_test(an_aerofoil_box_is_read),
        balanced_test(points_lie_beside_the_section_file),
        balanced_test(a_refused_allocation_leaves_nothing_behind),
    };
    return cmocka_run_group_tests(tests, NULL, NULL);
}
