/* SPDX-License-Identifier: GPL-3.0-or-later
 * untwist solve: the constants of a section and the stresses of its load cases. */
#include "cli/cases.h"
#include "cli/commands.h"
#include "cli/message.h"
#include "cli/output.h"
#include "cli/section.h"

static int check_files(const cli_call *call)
{
    int status = cli_check_overwrite(call, "json");
    if (status == CLI_DONE) status = cli_check_overwrite(call, "csv");
    if (status == CLI_DONE) status = cli_check_overwrite(call, "vtu");
    if (status == CLI_DONE && cli_to_output(call, "vtu")) {
        cli_message("solve: --vtu needs a file; it is not text for standard output");
        return CLI_USAGE;
    }
    if (status != CLI_DONE || !cli_to_output(call, "json") || !cli_to_output(call, "csv"))
        return status;
    cli_message("solve: --json and --csv cannot both go to standard output");
    return CLI_USAGE;
}

static int write_reports(const cli_call *call, const utw_report *report)
{
    const char *json = cli_text(call, "json"), *csv = cli_text(call, "csv");
    const int table =
        !cli_flag(call, "quiet") && !cli_to_output(call, "json") && !cli_to_output(call, "csv");
    int status = CLI_DONE;
    if (json != NULL) status = cli_write_report(utw_report_json, report, json);
    if (status == CLI_DONE && csv != NULL) status = cli_write_report(utw_report_csv, report, csv);
    if (status == CLI_DONE && cli_text(call, "vtu") != NULL) {
        utw_error err;
        if (utw_report_vtu(report, cli_text(call, "vtu"), &err) != UTW_OK) status = cli_fail(&err);
    }
    if (status == CLI_DONE && table) status = cli_write_report(utw_report_text, report, "-");
    return status;
}

static int run(const cli_call *call)
{
    cli_section section = {NULL, NULL};
    cli_cases cases = {NULL, NULL};
    int status = check_files(call);
    if (status == CLI_DONE) status = cli_solve_section(call, &section);
    if (status == CLI_DONE) status = cli_compute_cases(call, &section, &cases);
    if (status == CLI_DONE) {
        utw_report report = UTW_REPORT_INIT;
        report.solution = section.solution;
        report.cases = cases.cases;
        status = write_reports(call, &report);
    }
    if (status == CLI_DONE) status = cli_check_reached(section.solution);
    cli_clear_cases(&cases);
    cli_clear_section(&section);
    return status;
}

static const cli_option options[] = {
    CLI_SOLVING_OPTIONS,
    CLI_CASE_OPTIONS,
    {"json", "FILE",
     "Write all results as JSON to FILE; '-' is standard output, without the table.", CLI_TEXT, 0,
     0, 0},
    {"vtu", "FILE",
     "Write the fields of the section for general-purpose viewers: a VTK XML unstructured grid.",
     CLI_TEXT, 0, 0, 0},
    {"quiet", NULL, "Print no table.", CLI_FLAG, 0, 0, 0},
};

const cli_command cli_solve = {
    "solve",
    "FILE",
    "constants of a section, each with its bounds, and stresses",
    "Reads a section file ('-' is standard input), solves torsion and flexure of the drawn "
    "section, and "
    "prints area, second moments, moduli, torsion constant, shear centre, warping constant and "
    "shear "
    "areas. Every number says how far it can be trusted: exact, between two bounds, or estimated. "
    "Then the greatest stresses of the load cases of the file, wherever in the section they are.",
    1,
    1,
    sizeof options / sizeof options[0],
    options,
    run,
};
