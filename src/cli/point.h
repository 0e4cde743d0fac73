/* SPDX-License-Identifier: GPL-3.0-or-later
 * Pairs of numbers as options take them: X,Y. */
#ifndef UTW_CLI_POINT_H
#define UTW_CLI_POINT_H

#include "cli/command.h"

/** 1 when the text is a finite decimal number, nothing else. [out] *value. */
int cli_read_decimal(const char *text, double *value);

/** Read text of the form X,Y, two finite decimal numbers. Returns CLI_DONE, or CLI_USAGE after a
 * message that names the command and the option. */
int cli_read_point(const cli_call *call, const char *option, const char *text, double xy[2]);

#endif
