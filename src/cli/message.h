/* SPDX-License-Identifier: GPL-3.0-or-later
 * What the program says and how it ends. */
#ifndef UTW_CLI_MESSAGE_H
#define UTW_CLI_MESSAGE_H

#include "untwist.h"

/** Exit statuses. docs/untwist.1 lists them for users. */
enum {
    CLI_DONE = 0,
    CLI_SAYS_NO = 1,     /* done, and a check that was asked for says no */
    CLI_USAGE = 2,       /* wrong use of the command */
    CLI_INPUT = 3,       /* the input is wrong, or a file cannot be read or written */
    CLI_NO_RESULT = 4,   /* no result could be computed */
    CLI_NOT_REACHED = 5, /* done, and the tolerance was not reached; the bounds hold */
};

/** A printf-style line on standard error, with "untwist: " before and a line break after it. */
void cli_message(const char *format, ...) __attribute__((format(printf, 1, 2)));

/** The exit status for what became of a call of the library. */
int cli_exit_status(utw_status status);

/** Tell the error and return its exit status. */
int cli_fail(const utw_error *err);

/** Write text to standard output. Returns CLI_DONE, or CLI_INPUT after a message when not all of it
 * could be written. */
int cli_print(const char *text);

/** Write text as the file `path`, or to standard output when it is "-". Returns as cli_print(). */
int cli_write(const char *path, const char *text);

#endif
