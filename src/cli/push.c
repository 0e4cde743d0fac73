/* SPDX-License-Identifier: GPL-3.0-or-later
 * untwist push: a bar under a transverse load, and where the load may act. */
#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "base/vec2.h"
#include "cli/commands.h"
#include "cli/message.h"
#include "cli/output.h"
#include "cli/point.h"
#include "cli/section.h"
#include "report/push_words.h"

static int read_support(const cli_call *call, utw_push_load *load)
{
    const char *word = cli_text(call, "support");
    if (word == NULL) return CLI_DONE;
    for (int i = 0; i < UTW_SUPPORT_COUNT; i++)
        if (strcmp(word, utw_support_word((utw_support)i)) == 0) {
            load->support = (utw_support)i;
            return CLI_DONE;
        }
    cli_message("push: --support is fixed-free, fixed-fixed, forked or fixed-forked, not '%s'",
                word);
    return CLI_USAGE;
}

static int read_warping(const cli_call *call, utw_push_load *load)
{
    const char *word = cli_text(call, "warping");
    if (word == NULL) return CLI_DONE;
    for (int i = UTW_WARPING_FREE; i <= UTW_WARPING_HELD; i++)
        if (strcmp(word, utw_hold_warping_word((utw_hold_warping)i)) == 0) {
            load->warping = (utw_hold_warping)i;
            return CLI_DONE;
        }
    cli_message("push: --warping is free or held, not '%s'", word);
    return CLI_USAGE;
}

static int read_where(const cli_call *call, utw_push_load *load)
{
    static const struct {
        const char *word;
        utw_along_bar where;
    } list[] = {{"tip", UTW_AT_TIP}, {"mid", UTW_AT_MID}, {"uniform", UTW_UNIFORM}};
    const char *word = cli_text(call, "where");
    if (word == NULL) return CLI_DONE;
    for (size_t i = 0; i < sizeof list / sizeof *list; i++)
        if (strcmp(word, list[i].word) == 0) {
            load->where = list[i].where;
            return CLI_DONE;
        }
    if (strncmp(word, "z=", 2) == 0 && cli_read_decimal(word + 2, &load->z)) {
        load->where = UTW_AT_Z;
        return CLI_DONE;
    }
    cli_message("push: --where is tip, mid, uniform or z=Z, not '%s'", word);
    return CLI_USAGE;
}

static int read_load(const cli_call *call, utw_push_load *load)
{
    const char *at = cli_text(call, "at"), *force = cli_text(call, "force");
    int status = CLI_DONE;
    *load = (utw_push_load)UTW_PUSH_INIT;
    if (cli_option_given(call, "length", 0) == NULL) {
        cli_message("push: --length is missing; 'untwist help push' tells how to use it");
        return CLI_USAGE;
    }
    load->length = cli_number(call, "length", 0);
    load->twist_limit = cli_number(call, "twist-limit", 0) * (UTW_PI / 180);
    load->stress_limit = cli_number(call, "stress-limit", 0);
    load->has_at = at != NULL;
    if (at != NULL) status = cli_read_point(call, "at", at, load->at);
    if (status == CLI_DONE && force != NULL)
        status = cli_read_point(call, "force", force, load->force);
    if (status == CLI_DONE) status = read_support(call, load);
    if (status == CLI_DONE) status = read_warping(call, load);
    if (status == CLI_DONE) status = read_where(call, load);
    return status;
}

/* The limits that were asked for, against what the load does where it acts. */
static int check_limits(const cli_call *call, const utw_outline *outline, const utw_push *push)
{
    const utw_push_result *r = utw_push_get(push);
    int status = CLI_DONE;
    if (cli_option_given(call, "twist-limit", 0) != NULL && !r->twist_window.holds) {
        cli_message("the load twists the bar by %.4g deg, more than %g deg",
                    fabs(r->twist.value) * 180 / UTW_PI, r->twist_window.limit * 180 / UTW_PI);
        status = CLI_SAYS_NO;
    }
    if (cli_option_given(call, "stress-limit", 0) != NULL && !r->stress_window.holds) {
        cli_message("the greatest stress is %.6g, more than %g (%s)", r->von_mises.value,
                    r->stress_window.limit, utw_outline_units(outline));
        status = CLI_SAYS_NO;
    }
    return status;
}

static int write_reports(const cli_call *call, const utw_report *report)
{
    const char *json = cli_text(call, "json");
    int status = CLI_DONE;
    if (json != NULL) status = cli_write_report(utw_report_json, report, json);
    if (status == CLI_DONE && !cli_flag(call, "quiet") && !cli_to_output(call, "json"))
        status = cli_write_report(utw_report_push, report, "-");
    return status;
}

static int run(const cli_call *call)
{
    cli_section section = {NULL, NULL};
    utw_push_load load;
    utw_stress *stress = NULL;
    utw_push *push = NULL;
    utw_error err;
    int status = read_load(call, &load);
    if (status == CLI_DONE) status = cli_check_overwrite(call, "json");
    if (status == CLI_DONE) status = cli_solve_section(call, &section);
    if (status == CLI_DONE && utw_stress_create(section.solution, &stress, &err) != UTW_OK)
        status = cli_fail(&err);
    if (status == CLI_DONE &&
        utw_push_create(section.solution, stress, &load, &push, &err) != UTW_OK)
        status = cli_fail(&err);
    if (status == CLI_DONE) {
        utw_report report = UTW_REPORT_INIT;
        report.solution = section.solution;
        report.push = push;
        status = write_reports(call, &report);
    }
    if (status == CLI_DONE) status = check_limits(call, section.outline, push);
    if (status == CLI_DONE) status = cli_check_reached(section.solution);
    utw_push_free(push);
    utw_stress_free(stress);
    cli_clear_section(&section);
    return status;
}

static const cli_option options[] = {
    {"length", "L", "Length of the bar. Required.", CLI_NUMBER, 0, 1e100, 0},
    {"force", "FX,FY", "The force. Without it: 0,-1.", CLI_TEXT, 0, 0, 0},
    {"at", "X,Y",
     "Where in the section it acts; a place beside the section will do. Without it: at the shear "
     "centre.",
     CLI_TEXT, 0, 0, 0},
    {"where", "PLACE",
     "Where along the bar: tip, mid, z=Z, or uniform: spread evenly. Without it: at the tip of a "
     "cantilever, else in the middle.",
     CLI_TEXT, 0, 0, 0},
    {"support", "KIND",
     "fixed-free, fixed-fixed, forked or fixed-forked, from z = 0 to z = L. Without it: "
     "fixed-free.",
     CLI_TEXT, 0, 0, 0},
    {"warping", "HOLD",
     "Whether the supports hold the warping: free or held. Without it: fixed ends hold it, unless "
     "that fades within a fifth of the section's size.",
     CLI_TEXT, 0, 0, 0},
    {"twist-limit", "DEG", "Greatest twist allowed, in degrees.", CLI_NUMBER, 1e-12, 1e6, 0},
    {"stress-limit", "S", "Greatest von Mises stress allowed. Without it: the yield stress.",
     CLI_NUMBER, 1e-100, 1e100, 0},
    CLI_SOLVING_OPTIONS,
    {"json", "FILE",
     "Write all results as JSON to FILE; '-' is standard output, without the table.", CLI_TEXT, 0,
     0, 0},
    {"quiet", NULL, "Print no table.", CLI_FLAG, 0, 0, 0},
};

const cli_command cli_push = {
    "push",
    "FILE",
    "a transverse load on a bar: deflection, twist, load window",
    "Solves the section of FILE ('-' is standard input) and loads a bar of it with a transverse "
    "force at a stated place. Prints deflection, twist, the forces and moments at the ends, the "
    "greatest stress, and between which places the load may act for the twist and the stress to "
    "stay within their limits. The status is 1 when the load stands outside the window of a limit "
    "that was given.",
    1,
    1,
    sizeof options / sizeof options[0],
    options,
    run,
};
