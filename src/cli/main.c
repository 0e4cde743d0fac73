/* SPDX-License-Identifier: GPL-3.0-or-later
 * Where the program starts. */
#include <signal.h>

#include "cli/program.h"

int main(int argc, char **argv)
{
    /* a reader that closes the pipe is a write error like any other: told, with its exit status */
    signal(SIGPIPE, SIG_IGN);
    return cli_program(argc, argv);
}
