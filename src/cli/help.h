/* SPDX-License-Identifier: GPL-3.0-or-later
 * Help, written from the tables of commands and options. */
#ifndef UTW_CLI_HELP_H
#define UTW_CLI_HELP_H

#include "cli/command.h"

/** Print the help of a command, or of the program when it is NULL. Returns the exit status. */
int cli_print_help(const cli_command *command);

/** Tell that there is no such command, and which was probably meant. Returns CLI_USAGE. */
int cli_unknown_command(const char *name);

#endif
