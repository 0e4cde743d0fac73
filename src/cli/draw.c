/* SPDX-License-Identifier: GPL-3.0-or-later
 * untwist draw: pictures of a section. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/nearest.h"
#include "cli/commands.h"
#include "cli/message.h"
#include "cli/output.h"
#include "cli/section.h"
#include "draw/canvas.h"

/* The kind that --show names. Returns CLI_DONE, or CLI_USAGE after a message. */
static int read_kind(const char *name, utw_picture *kind)
{
    const char *keys[UTW_PICTURE_COUNT];
    for (int k = 0; k < UTW_PICTURE_COUNT; k++) {
        keys[k] = utw_picture_key((utw_picture)k);
        if (strcmp(keys[k], name) != 0) continue;
        *kind = (utw_picture)k;
        return CLI_DONE;
    }
    const int near = utw_nearest_word(name, keys, UTW_PICTURE_COUNT);
    if (near >= 0)
        cli_message("draw: --show %s: there is no such picture; did you mean '%s'?", name,
                    keys[near]);
    else
        cli_message("draw: --show %s: there is no such picture; see 'untwist help draw'", name);
    return CLI_USAGE;
}

/* The stress that --component names. Returns CLI_DONE, or CLI_USAGE after a message. */
static int read_component(const char *name, utw_stress_component *component)
{
    for (int k = 0; k < UTW_STRESS_COMPONENT_COUNT; k++) {
        if (strcmp(utw_stress_component_key((utw_stress_component)k), name) != 0) continue;
        *component = (utw_stress_component)k;
        return CLI_DONE;
    }
    cli_message("draw: --component %s: it must be von_mises, sigma_z, tau, tau_xz or tau_yz", name);
    return CLI_USAGE;
}

/* "160mm", "16cm", "6.3in" or "160" (mm). */
static int read_width(const char *text, double *width)
{
    static const struct {
        const char *unit;
        double mm;
    } units[] = {{"", 1}, {"mm", 1}, {"cm", 10}, {"in", 25.4}};
    char *end;
    const double number = strtod(text, &end);
    for (size_t i = 0; end != text && i < sizeof units / sizeof *units; i++)
        if (strcmp(end, units[i].unit) == 0) {
            *width = number * units[i].mm;
            if (*width >= 40 && *width <= 1200) return CLI_DONE;
            cli_message("draw: --width %s is outside 40 mm to 1200 mm", text);
            return CLI_USAGE;
        }
    cli_message("draw: --width %s is not a length; give it as 160mm, 16cm or 6.3in", text);
    return CLI_USAGE;
}

/* Where the picture goes, known to be possible before anything is solved. */
static int check_output(const cli_call *call)
{
    const char *output = cli_text(call, "output");
    utw_picture_format format;
    utw_error err;
    if (output == NULL) {
        cli_message("draw: name the picture's file with -o FILE; its ending, .svg, .pdf or .png, "
                    "says what is written");
        return CLI_USAGE;
    }
    if (utw_format_of(output, &format, &err) != UTW_OK) {
        cli_message("draw: %s", err.text);
        return CLI_USAGE;
    }
    return cli_check_overwrite(call, "output");
}

static int run(const cli_call *call)
{
    const char *output = cli_text(call, "output"), *width = cli_text(call, "width"),
               *show = cli_text(call, "show"), *component = cli_text(call, "component");
    utw_draw_options options = UTW_DRAW_OPTIONS_INIT;
    utw_picture kind = UTW_PICTURE_OUTLINE;
    utw_error err;
    cli_section section;
    if (show != NULL && read_kind(show, &kind) != CLI_DONE) return CLI_USAGE;
    if (width != NULL && read_width(width, &options.width) != CLI_DONE) return CLI_USAGE;
    if (component != NULL && read_component(component, &options.component) != CLI_DONE)
        return CLI_USAGE;
    if (kind != UTW_PICTURE_STRESS && (component != NULL || cli_text(call, "case") != NULL)) {
        cli_message("draw: --case and --component are for --show stress");
        return CLI_USAGE;
    }
    if (check_output(call) != CLI_DONE) return CLI_USAGE;
    options.load_case = cli_text(call, "case");
    options.dpi = cli_number(call, "dpi", options.dpi);
    int status = cli_solve_section(call, &section);
    if (status == CLI_DONE) {
        const utw_status st = utw_draw(section.solution, kind, &options, output, &err);
        if (st != UTW_OK) status = cli_fail(&err);
    }
    if (status == CLI_DONE) status = cli_check_reached(section.solution);
    cli_clear_section(&section);
    return status;
}

static const cli_option options[] = {
    {"output", "FILE",
     "The picture. Its ending says what is written: .svg, .pdf or .png. An existing file is "
     "replaced.",
     CLI_TEXT, 0, 0, 0},
    {"show", "KIND", "What to draw; outline when it is not given. The kinds are listed above.",
     CLI_TEXT, 0, 0, 0},
    {"case", "NAME", "The load case of a stress picture. Without it: the first of the file.",
     CLI_TEXT, 0, 0, 0},
    {"component", "STRESS",
     "Stress to draw: von_mises, sigma_z, tau, tau_xz or tau_yz. Without it: von_mises.", CLI_TEXT,
     0, 0, 0},
    {"width", "LENGTH",
     "Width of the page, 40 mm to 1200 mm, given as 160mm, 16cm or 6.3in; its height follows. "
     "Without it: 160mm.",
     CLI_TEXT, 0, 0, 0},
    {"dpi", "N", "Dots per inch of a PNG, 20 to 2400. Without it: 150.", CLI_NUMBER, 20, 2400, 0},
    CLI_SOLVING_OPTIONS,
};

const cli_command cli_draw = {
    "draw",
    "FILE",
    "pictures of a section: outline, mesh, warping, stresses",
    "Reads and solves a section file ('-' is standard input) and draws one picture of it. Kinds:\n"
    "outline: extent, centroid, shear centre, centre of flexure, principal axes\n"
    "mesh: elements, their orders, the layers in the corners\n"
    "warping: warping function about the shear centre, as contours\n"
    "warped: tilted view of the warped end of the bar\n"
    "stress: a stress of a load case, as contours; tau with arrows",
    1,
    1,
    sizeof options / sizeof options[0],
    options,
    run,
};
