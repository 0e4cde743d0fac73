/* SPDX-License-Identifier: GPL-3.0-or-later
 * What must hold of every picture of every example, narrow and wide. */
#include <dirent.h>

#include "support/picture.h"
#include "support/section.h"

static const double widths[] = {60, 160, 420};

static void check_one(const utw_solution *s, const char *name, utw_picture kind,
                      utw_stress_component component, double width)
{
    utw_draw_options options = UTW_DRAW_OPTIONS_INIT;
    char what[200];
    options.width = width;
    options.component = component;
    snprintf(what, sizeof what, "%s, %s, %s, %g mm wide", name, utw_picture_key(kind),
             utw_stress_component_key(component), width);
    utw_canvas *canvas = picture_canvas(s, kind, &options);
    picture_check_texts(canvas, what);
    utw_canvas_free(canvas);
}

/* Every kind; stresses when there are load cases. */
static void check_all(const utw_outline *outline, const char *name, size_t n_width)
{
    utw_solution *s = section_solve(outline, 1e-4, 0);
    const int loads = utw_outline_load_count(outline);
    for (size_t w = 0; w < n_width; w++)
        for (int k = 0; k < UTW_PICTURE_COUNT; k++)
            if (k != UTW_PICTURE_STRESS || loads > 0)
                check_one(s, name, (utw_picture)k, UTW_SHOW_VON_MISES, widths[w]);
    for (int c = 1; c < UTW_STRESS_COMPONENT_COUNT && loads > 0; c++)
        check_one(s, name, UTW_PICTURE_STRESS, (utw_stress_component)c, widths[0]);
    utw_solution_free(s);
}

static void texts_of_examples_are_clear(void **state)
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
        check_all(outline, entry->d_name, sizeof widths / sizeof *widths);
        utw_outline_free(outline);
        n++;
    }
    closedir(folder);
    assert_true(n >= 8);
}

/* Strips, a dot of a section far from the origin, a circle that does not warp, shear centres
 * outside, sharp corners. */
static void texts_of_hard_sections_are_clear(void **state)
{
    (void)state;
    static const char *const part[] = {
        "\"outline\": [[0,0],[300,0],[300,2],[0,2]]",
        "\"outline\": [[0,0],[2.5,0],[2.5,410],[0,410]]",
        "\"outline\": {\"circle\": [12.385, -7.1, 4.2]}",
        "\"outline\": [[90000,70000],[90003,70000],[90003,70002.5],[90000,70002.5]]",
        "\"outline\": [[0,0],[60,0],[60,3],[3,3],[3,97],[60,97],[60,100],[0,100]]",
        "\"outline\": [[0,0],[1e-4,0],[1e-4,2.385e-4],[0,2e-4]]",
        "\"outline\": [[0,0],[100,0],[100,20],[20,20],[20,100],[0,100]]",
        "\"outline\": {\"circle\": [0,0,50]}, \"holes\": [{\"circle\": [0,0,49]}]",
    };
    for (size_t i = 0; i < sizeof part / sizeof *part; i++) {
        utw_outline *outline = section_outline(i % 2 == 0 ? 0.3 : (double)NAN, "%s", part[i]);
        check_all(outline, part[i], 1);
        utw_outline_free(outline);
    }
}

int main(void)
{
    const struct CMUnitTest tests[] = {balanced_test(texts_of_examples_are_clear),
                                       balanced_test(texts_of_hard_sections_are_clear)};
    return cmocka_run_group_tests(tests, NULL, NULL);
}
