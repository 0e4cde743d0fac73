/* SPDX-License-Identifier: GPL-3.0-or-later
 * The command "shape". */
#ifndef UTW_CLI_SHAPE_H
#define UTW_CLI_SHAPE_H

/** untwist shape: the list; untwist shape NAME: its drawing and dimensions; untwist shape NAME
 * key=value ...: a section file on standard output. argv[0] is "shape". Returns the exit status: 0,
 * 2 (wrong use), 3 (dimensions that make no section), 4. */
int utw_cli_shape(int argc, char **argv);

#endif
