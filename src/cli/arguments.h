/* SPDX-License-Identifier: GPL-3.0-or-later
 * From what was typed to a call of a command. */
#ifndef UTW_CLI_ARGUMENTS_H
#define UTW_CLI_ARGUMENTS_H

#include "cli/command.h"

/** Read the arguments after the command's name. Options and operands may come in any order; "--"
 * ends the options; "-" is an operand. [in] argument[n], borrowed while the call is used. [out]
 * *call, to be cleared whatever is returned; *help = 1 when --help was among them (then nothing
 * else is checked). Returns CLI_DONE, or the exit status after a message. */
int cli_read_arguments(const cli_command *command, int n, char **argument, cli_call *call,
                       int *help);

void cli_clear_call(cli_call *call);

#endif
