/* SPDX-License-Identifier: GPL-3.0-or-later
 * untwist draw, run as a user runs it. */
#include <unistd.h>

#include "cli/run.h"

static char folder[64];

static int make_folder(void **state)
{
    (void)state;
    snprintf(folder, sizeof folder, "/tmp/untwist-test-XXXXXX");
    return mkdtemp(folder) == NULL ? -1 : 0;
}

static int remove_folder(void **state)
{
    (void)state;
    char command[100], *output = NULL;
    snprintf(command, sizeof command, "rm -r %s", folder);
    const int status = utw_run(command, &output);
    free(output);
    return status;
}

/* Draw, silently, then a check of the file in a shell, $f being its path. */
static void draw_and_check(const char *options, const char *file, const char *check)
{
    char arguments[400], path[200], command[500], *output = NULL;
    snprintf(path, sizeof path, "%s/%s", folder, file);
    snprintf(arguments, sizeof arguments, "draw corner-bracket.json %s -o %s", options, path);
    expect_run(arguments, 0, "");
    snprintf(command, sizeof command, "f=%s; %s", path, check);
    const int status = utw_run(command, &output);
    if (status != 0) print_error("%s\n%s\n", command, output);
    free(output);
    assert_int_equal(status, 0);
}

static void kinds_and_formats(void **state)
{
    (void)state;
    draw_and_check("", "a.svg", "xmllint --noout $f && grep -q 'width=\"160mm\"' $f");
    draw_and_check("--show warping --width 6.3in", "b.pdf",
                   "pdfinfo $f | grep -q 'Page size: *453.6'");
    draw_and_check("--show mesh --width=16cm --dpi 100", "c.png",
                   "head -c 24 $f | tail -c 8 | od -An -tu1 | grep -q '^ *0 *0 *2 *118 '");
    draw_and_check("--show stress --component tau --case 'side gust' --width 60", "d.svg",
                   "xmllint --noout $f && grep -q 'width=\"60mm\"' $f");
}

static void what_is_wrong_is_told(void **state)
{
    (void)state;
    expect_run("draw corner-bracket.json", 2,
               "untwist: draw: name the picture's file with -o FILE; its ending, .svg, .pdf or "
               ".png, says what is written\n");
    expect_run("draw corner-bracket.json -o a.gif", 2,
               "untwist: draw: a.gif: the ending says what to write; it must be .svg, .pdf or "
               ".png\n");
    expect_run("draw corner-bracket.json --show warpnig -o a.svg", 2,
               "untwist: draw: --show warpnig: there is no such picture; did you mean "
               "'warping'?\n");
    expect_run("draw corner-bracket.json --show elephants -o a.svg", 2,
               "untwist: draw: --show elephants: there is no such picture; see 'untwist help "
               "draw'\n");
    expect_run("draw corner-bracket.json --width 5mm -o a.svg", 2,
               "untwist: draw: --width 5mm is outside 40 mm to 1200 mm\n");
    expect_run("draw corner-bracket.json --width 16furlong -o a.svg", 2,
               "untwist: draw: --width 16furlong is not a length; give it as 160mm, 16cm or "
               "6.3in\n");
    expect_run("draw corner-bracket.json --case gust -o a.svg", 2,
               "untwist: draw: --case and --component are for --show stress\n");
    expect_run("draw corner-bracket.json --show stress --component sigma -o a.svg", 2,
               "untwist: draw: --component sigma: it must be von_mises, sigma_z, tau, tau_xz or "
               "tau_yz\n");
    expect_run("draw corner-bracket.json --show stress --case 'side gusts' -o a.svg", 3,
               "untwist: there is no load case \"side gusts\"; did you mean \"side gust\"?\n");
    expect_run("draw corner-bracket.json -x a.svg", 2, "untwist: draw: unknown option '-x'");
    expect_run("draw corner-bracket.json -o", 2, "untwist: draw: --output needs a value");
    expect_run("draw corner-bracket.json -o /no/such/a.svg", 3,
               "untwist: /no/such/a.svg: cannot be written: No such file or directory\n");
    expect_run("draw nothing.json -o a.svg", 3, "untwist: nothing.json: ");
}

static void the_section_file_is_not_overwritten(void **state)
{
    (void)state;
    char arguments[300], *output = NULL;
    snprintf(arguments, sizeof arguments, "shape channel h=100 b=50 tf=8 tw=6 > %s/file.svg",
             folder);
    assert_int_equal(run_untwist(arguments, &output), 0);
    free(output);
    snprintf(arguments, sizeof arguments, "draw %s/file.svg -o %s/file.svg", folder, folder);
    expect_run(arguments, 2, "untwist: draw: --output ");
}

static void help_lists_the_kinds(void **state)
{
    (void)state;
    for (int k = 0; k < UTW_PICTURE_COUNT; k++) {
        char line[100];
        snprintf(line, sizeof line, "\n%s: ", utw_picture_key((utw_picture)k));
        assert_int_equal(output_holds("help draw", line), 1);
    }
    assert_int_equal(output_holds("draw --help", "-o, --output FILE"), 1);
}

int main(void)
{
    const struct CMUnitTest tests[] = {
        cmocka_unit_test(kinds_and_formats),
        cmocka_unit_test(what_is_wrong_is_told),
        cmocka_unit_test(the_section_file_is_not_overwritten),
        cmocka_unit_test(help_lists_the_kinds),
    };
    return cmocka_run_group_tests(tests, make_folder, remove_folder);
}
