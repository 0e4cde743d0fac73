/* SPDX-License-Identifier: GPL-3.0-or-later
 * The program as a function: main() calls it, and so do tests. */
#ifndef UTW_CLI_PROGRAM_H
#define UTW_CLI_PROGRAM_H

/** Find the command, read its arguments, run it. [in] argv[argc], argv[0] the program's name,
 * borrowed. Writes to standard output and standard error. Returns the exit status (message.h). */
int cli_program(int argc, char **argv);

#endif
