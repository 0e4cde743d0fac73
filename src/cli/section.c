/* SPDX-License-Identifier: GPL-3.0-or-later
 * What commands that solve a section have in common: its file, the options of the solution. */
#include "cli/section.h"

#include "base/memory.h"
#include "base/status.h"
#include "cli/message.h"
#include "cli/progress.h"

/* The outline of the first operand, with the dimensions that were set. */
static utw_status read_outline(const cli_call *call, utw_outline **outline, utw_error *err)
{
    int n = 0;
    const char **set = utw_alloc((size_t)call->n_given, sizeof *set);
    if (set == NULL) return utw_fail(err, UTW_E_NOMEM, "out of memory (%s)", __func__);
    for (const cli_given *g; (g = cli_option_given(call, "set", n)) != NULL; n++) set[n] = g->text;
    const utw_status st = utw_outline_read_with(call->operand[0], n, set, outline, err);
    utw_free(set);
    return st;
}

int cli_read_section(const cli_call *call, cli_section *section)
{
    utw_error err;
    *section = (cli_section){NULL, NULL};
    return read_outline(call, &section->outline, &err) == UTW_OK ? CLI_DONE : cli_fail(&err);
}

void cli_solving_options(const cli_call *call, utw_options *options)
{
    options->tolerance = cli_number(call, "tol", options->tolerance);
    options->fixed_order = (int)cli_number(call, "order", options->fixed_order);
}

int cli_solve_read_section(const cli_call *call, cli_section *section)
{
    utw_error err;
    utw_options options = UTW_OPTIONS_INIT;
    cli_progress progress;
    cli_solving_options(call, &options);
    cli_progress_begin(&progress, &options);
    const utw_status st = utw_solve(section->outline, &options, &section->solution, &err);
    cli_progress_end(&progress);
    return st == UTW_OK ? CLI_DONE : cli_fail(&err);
}

int cli_solve_section(const cli_call *call, cli_section *section)
{
    const int status = cli_read_section(call, section);
    return status == CLI_DONE ? cli_solve_read_section(call, section) : status;
}

void cli_clear_section(cli_section *section)
{
    utw_solution_free(section->solution);
    utw_outline_free(section->outline);
    *section = (cli_section){NULL, NULL};
}

int cli_check_reached(const utw_solution *solution)
{
    utw_solution_info info;
    utw_solution_get_info(solution, &info);
    if (info.reached) return CLI_DONE;
    cli_message("the tolerance %g is not reached: (high - low)/value of J is %.2g; the bounds hold "
                "all the same",
                info.tolerance, info.gap);
    return CLI_NOT_REACHED;
}
