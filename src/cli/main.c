/* SPDX-License-Identifier: GPL-3.0-or-later
 * The program: finds the command and runs it. */
#include <stdio.h>
#include <string.h>

#include "cli/shape.h"
#include "untwist.h"

int main(int argc, char **argv)
{
    if (argc == 2 && strcmp(argv[1], "--version") == 0) {
        printf("untwist %s\n", utw_version());
        return 0;
    }
    if (argc >= 2 && strcmp(argv[1], "shape") == 0) return utw_cli_shape(argc - 1, argv + 1);
    fprintf(stderr, "untwist: no command given; try 'untwist --help'\n");
    return 2;
}
