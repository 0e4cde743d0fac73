/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where commands that solve a section write their reports. */
#ifndef UTW_CLI_OUTPUT_H
#define UTW_CLI_OUTPUT_H

#include "cli/command.h"
#include "untwist.h"

/** One of utw_report_text, utw_report_json, utw_report_csv. */
typedef utw_status (*cli_report_writer)(const utw_report *, char **, utw_error *);

/** CLI_DONE unless the file of an option is the section file of the first operand, which writing
 * would destroy: then CLI_USAGE after a message. */
int cli_check_overwrite(const cli_call *call, const char *option);

/** 1 when the option was given with "-": its report goes to standard output. */
int cli_to_output(const cli_call *call, const char *option);

/** Write one kind of report to a file, "-" for standard output. Returns CLI_DONE, or the exit
 * status after a message. */
int cli_write_report(cli_report_writer writer, const utw_report *report, const char *path);

#endif
