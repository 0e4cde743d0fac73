/* SPDX-License-Identifier: GPL-3.0-or-later
 * A line on the terminal that tells how far a long solution is. */
#ifndef UTW_CLI_PROGRESS_H
#define UTW_CLI_PROGRESS_H

#include "untwist.h"

/** The line: whether it may be shown, and since when the work goes on. */
typedef struct cli_progress {
    int terminal, shown;
    double start;
} cli_progress;

/** Begin: options->progress is set so that rounds are told on standard error when that is a
 * terminal and the work takes longer than half a second. [in] progress must live while options are
 * used. */
void cli_progress_begin(cli_progress *progress, utw_options *options);

/** Wipe the line. */
void cli_progress_end(cli_progress *progress);

#endif
