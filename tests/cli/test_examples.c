/* SPDX-License-Identifier: GPL-3.0-or-later
 * Every example is solved to the usual tolerance, and what must hold of any section holds of it. */
#include <dirent.h>

#include "cli/run.h"
#include "outline/outline.h"

static double value(const utw_solution *s, utw_constant which)
{
    utw_quantity q;
    utw_error err;
    assert_ok(utw_solution_constant(s, which, &q, &err));
    assert_true(q.low <= q.value && q.value <= q.high);
    return q.value;
}

static void check(const char *path, const utw_outline *outline)
{
    utw_error err;
    utw_solution *s = NULL;
    utw_solution_info info;
    assert_ok(utw_solve(outline, NULL, &s, &err));
    utw_solution_get_info(s, &info);
    if (!info.reached) print_error("%s: gap %g\n", path, info.gap);
    assert_true(info.reached);
    for (int k = 0; k < UTW_CONSTANT_COUNT; k++) value(s, (utw_constant)k);
    const double A = value(s, UTW_A), Ixx = value(s, UTW_IXX), Iyy = value(s, UTW_IYY),
                 J = value(s, UTW_J);
    /* Saint-Venant's inequality: no section of this area is stiffer than the circle */
    if (outline->part[0].n_loop == 1) assert_true(J <= A * A / 6.283185307179586);
    /* the warping function can only lower the energy of the rigid rotation */
    assert_true(J < Ixx + Iyy);
    assert_true(value(s, UTW_KX) < 1 && value(s, UTW_KY) < 1);
    assert_true(value(s, UTW_ZX) > fmin(value(s, UTW_WX_TOP), value(s, UTW_WX_BOTTOM)));
    assert_true(value(s, UTW_ZY) > fmin(value(s, UTW_WY_LEFT), value(s, UTW_WY_RIGHT)));
    utw_solution_free(s);
}

static void every_example_is_solved(void **state)
{
    (void)state;
    DIR *folder = opendir(UTW_SOURCE_DIR "/examples");
    assert_non_null(folder);
    int n = 0;
    for (const struct dirent *entry; (entry = readdir(folder)) != NULL;) {
        const size_t length = strlen(entry->d_name);
        if (length < 5 || strcmp(entry->d_name + length - 5, ".json") != 0) continue;
        char path[600];
        utw_error err;
        utw_outline *outline = NULL;
        snprintf(path, sizeof path, UTW_SOURCE_DIR "/examples/%s", entry->d_name);
        assert_ok(utw_outline_read(path, &outline, &err));
        assert_true(outline->n_load > 0 && outline->n_material == 1 && outline->name[0] != '\0');
        check(path, outline);
        utw_outline_free(outline);
        n++;
    }
    closedir(folder);
    assert_true(n >= 8);
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(every_example_is_solved)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
