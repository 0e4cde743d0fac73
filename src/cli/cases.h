/* SPDX-License-Identifier: GPL-3.0-or-later
 * Load cases and probes of a solved section, as commands ask for them. */
#ifndef UTW_CLI_CASES_H
#define UTW_CLI_CASES_H

#include "cli/section.h"

/* clang-format off */
/** Rows for the option table of such a command. */
#define CLI_CASE_OPTIONS                                                                           \
    {"case", "NAME", "Only this load case of the file. May be repeated.", CLI_TEXT, 0, 0, 1},      \
    {"probe", "X,Y", "Stresses at this point of the section too, for every load case. May be "     \
     "repeated.", CLI_TEXT, 0, 0, 1},                                                              \
    {"csv", "FILE", "Write the stresses of the load cases as comma-separated values to FILE; "     \
     "'-' is standard output.", CLI_TEXT, 0, 0, 0}
/* clang-format on */

/** The stresses of a section and its load cases. */
typedef struct cli_cases {
    utw_stress *stress; /* owned; NULL when there are no load cases */
    utw_cases *cases;   /* owned; NULL when there are no load cases */
} cli_cases;

/** Compute the load cases of a solved section that the call asks for: all of the file without
 * --case. A case that cannot be computed is an error only when it was asked for by its name. [out]
 * *cases, to be cleared whatever is returned. Returns CLI_DONE, or the exit status after a message.
 */
int cli_compute_cases(const cli_call *call, const cli_section *section, cli_cases *cases);

void cli_clear_cases(cli_cases *cases);

#endif
