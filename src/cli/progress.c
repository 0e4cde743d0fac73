/* SPDX-License-Identifier: GPL-3.0-or-later
 * A line on the terminal that tells how far a long solution is. */
#include "cli/progress.h"

#include <stdio.h>
#include <unistd.h>

#include "base/clock.h"

static const double PATIENCE = 0.5; /* seconds in silence */

static void tell(void *user, int round, int unknowns, double gap)
{
    cli_progress *p = user;
    if (!p->terminal || utw_seconds() - p->start < PATIENCE) return;
    fprintf(stderr, "\r\033[Kround %d: %d unknowns, gap %.1e", round, unknowns, gap);
    fflush(stderr);
    p->shown = 1;
}

void cli_progress_begin(cli_progress *p, utw_options *options)
{
    *p = (cli_progress){isatty(STDERR_FILENO), 0, utw_seconds()};
    options->progress = tell;
    options->user = p;
}

void cli_progress_end(cli_progress *p)
{
    if (p->shown) fputs("\r\033[K", stderr);
    p->shown = 0;
}
