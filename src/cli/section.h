/* SPDX-License-Identifier: GPL-3.0-or-later
 * What commands that solve a section have in common: its file, the options of the solution. */
#ifndef UTW_CLI_SECTION_H
#define UTW_CLI_SECTION_H

#include "cli/command.h"
#include "untwist.h"

/* clang-format off */
/** Rows for the option table of such a command. */
#define CLI_SOLVING_OPTIONS                                                                        \
    {"set", "NAME=VALUE", "Give a named dimension of the file another value. May be repeated.",    \
     CLI_TEXT, 0, 0, 1},                                                                           \
    {"tol", "T", "Refine until (high - low)/value of J is at most T, 1e-12 to 0.5. Without "       \
     "it: 1e-6.", CLI_NUMBER, 1e-12, 0.5, 0},                                                      \
    {"order", "P", "Solve once with polynomials of order P, 1 to 12, in every element. Without "   \
     "it the orders are raised element by element until the tolerance is reached.",                \
     CLI_INTEGER, 1, 12, 0}
/* clang-format on */

/** A section that was read and solved. */
typedef struct cli_section {
    utw_outline *outline;   /* owned */
    utw_solution *solution; /* owned */
} cli_section;

/** Read the section of the first operand and solve it with the options of the call. [out] *section,
 * to be cleared whatever is returned. Returns CLI_DONE, or the exit status after a message. */
int cli_solve_section(const cli_call *call, cli_section *section);

/** The same in two steps: read it, and solve what was read. */
int cli_read_section(const cli_call *call, cli_section *section);
int cli_solve_read_section(const cli_call *call, cli_section *section);

/** Set the options of a solution that were given. */
void cli_solving_options(const cli_call *call, utw_options *options);

void cli_clear_section(cli_section *section);

/** CLI_DONE when the tolerance of the solution was reached, else CLI_NOT_REACHED after a message.
 */
int cli_check_reached(const utw_solution *solution);

#endif
