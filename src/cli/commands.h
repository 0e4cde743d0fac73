/* SPDX-License-Identifier: GPL-3.0-or-later
 * The commands. One is a file that defines its cli_command, a line here, and a line in commands.c.
 */
#ifndef UTW_CLI_COMMANDS_H
#define UTW_CLI_COMMANDS_H

#include "cli/command.h"

extern const cli_command cli_compare; /* compare.c */
extern const cli_command cli_draw;    /* draw.c */
extern const cli_command cli_help;    /* help.c */
extern const cli_command cli_push;    /* push.c */
extern const cli_command cli_shape;   /* shape.c */
extern const cli_command cli_solve;   /* solve.c */

/** All of them, in the order help lists them. */
enum { CLI_N_COMMAND = 6 };
extern const cli_command *const cli_command_list[CLI_N_COMMAND];

/** The command of that name, or NULL. Returned borrowed. */
const cli_command *cli_find_command(const char *name);

#endif
