/* SPDX-License-Identifier: GPL-3.0-or-later
 * untwist solve: the constants of a section. */
#include <string.h>
#include <sys/stat.h>

#include "cli/commands.h"
#include "cli/message.h"
#include "cli/section.h"

/* 1 when both paths are the same file, so that writing one would destroy the other. */
static int same_file(const char *a, const char *b)
{
    struct stat sa, sb;
    if (stat(a, &sa) != 0 || stat(b, &sb) != 0) return 0;
    return sa.st_dev == sb.st_dev && sa.st_ino == sb.st_ino;
}

typedef utw_status (*report_writer)(const utw_report *, char **, utw_error *);

/* Write one report to a file, "-" for standard output. */
static int write_report(report_writer writer, const utw_solution *solution, const char *path)
{
    utw_error err;
    utw_report report = UTW_REPORT_INIT;
    char *text = NULL;
    report.solution = solution;
    if (writer(&report, &text, &err) != UTW_OK) return cli_fail(&err);
    const int status = cli_write(path, text);
    utw_report_free(text);
    return status;
}

static int run(const cli_call *call)
{
    const char *json = cli_text(call, "json"), *file = call->operand[0];
    const int to_output = json != NULL && strcmp(json, "-") == 0;
    cli_section section;
    if (json != NULL && !to_output && same_file(json, file)) {
        cli_message("solve: --json %s would overwrite the section file", json);
        return CLI_USAGE;
    }
    int status = cli_solve_section(call, &section);
    if (status == CLI_DONE && json != NULL)
        status = write_report(utw_report_json, section.solution, json);
    if (status == CLI_DONE && !to_output && !cli_flag(call, "quiet"))
        status = write_report(utw_report_text, section.solution, "-");
    if (status == CLI_DONE) status = cli_check_reached(section.solution);
    cli_clear_section(&section);
    return status;
}

static const cli_option options[] = {
    CLI_SOLVING_OPTIONS,
    {"json", "FILE",
     "Write all results as JSON to FILE; '-' is standard output, without the table.", CLI_TEXT, 0,
     0, 0},
    {"quiet", NULL, "Print no table.", CLI_FLAG, 0, 0, 0},
};

const cli_command cli_solve = {
    "solve",
    "FILE",
    "constants of a section, each with its bounds",
    "Reads a section file ('-' is standard input), solves torsion and flexure of the drawn "
    "section, and "
    "prints area, second moments, moduli, torsion constant, shear centre, warping constant and "
    "shear "
    "areas. Every number says how far it can be trusted: exact, between two bounds, or estimated.",
    1,
    1,
    sizeof options / sizeof options[0],
    options,
    run,
};
