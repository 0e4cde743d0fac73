/* SPDX-License-Identifier: GPL-3.0-or-later
 * The program: finds the command, reads its arguments, runs it. */
#include "cli/program.h"

#include <stdio.h>
#include <string.h>

#include "cli/arguments.h"
#include "cli/commands.h"
#include "cli/help.h"
#include "cli/message.h"
#include "untwist.h"

static int print_version(void)
{
    char text[256], solver[64], mesher[64];
    utw_solver_version(solver, sizeof solver);
    utw_mesher_version(mesher, sizeof mesher);
    snprintf(text, sizeof text, "untwist %s\n%s\n%s\n", utw_version(), solver, mesher);
    return cli_print(text);
}

static int run_command(const cli_command *command, int n, char **argument)
{
    cli_call call;
    int help = 0;
    int status = cli_read_arguments(command, n, argument, &call, &help);
    if (status == CLI_DONE) status = help ? cli_print_help(command) : command->run(&call);
    cli_clear_call(&call);
    return status;
}

int cli_program(int argc, char **argv)
{
    if (argc < 2) {
        cli_message("no command is given; 'untwist --help' lists them");
        return CLI_USAGE;
    }
    if (strcmp(argv[1], "--help") == 0 || strcmp(argv[1], "-h") == 0) return cli_print_help(NULL);
    if (strcmp(argv[1], "--version") == 0) return print_version();
    const cli_command *command = cli_find_command(argv[1]);
    if (command == NULL) return cli_unknown_command(argv[1]);
    return run_command(command, argc - 2, argv + 2);
}
