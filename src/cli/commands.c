/* SPDX-License-Identifier: GPL-3.0-or-later
 * The table of commands. */
#include "cli/commands.h"

#include <stddef.h>
#include <string.h>

const cli_command *const cli_command_list[CLI_N_COMMAND] = {
    &cli_solve,
    &cli_compare,
    &cli_push,
    &cli_draw,
    &cli_shape,
    &cli_help,
};

const cli_command *cli_find_command(const char *name)
{
    for (int i = 0; i < CLI_N_COMMAND; i++)
        if (strcmp(cli_command_list[i]->name, name) == 0) return cli_command_list[i];
    return NULL;
}
