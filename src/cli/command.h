/* SPDX-License-Identifier: GPL-3.0-or-later
 * What a command of the program is: one table drives its parsing and its help. */
#ifndef UTW_CLI_COMMAND_H
#define UTW_CLI_COMMAND_H

/** What an option takes. */
typedef enum cli_kind { CLI_FLAG, CLI_TEXT, CLI_NUMBER, CLI_INTEGER } cli_kind;

/** An option of a command, given as --name, --name VALUE or --name=VALUE; "output" also as -o. */
typedef struct cli_option {
    const char *name, *value; /* without the dashes; placeholder of the value, NULL for a flag */
    const char *meaning;
    cli_kind kind;
    double least, most; /* of a number */
    int repeats;        /* 1: may be given several times */
} cli_option;

/** An option as it was given. */
typedef struct cli_given {
    const cli_option *option;
    const char *text; /* its value; NULL for a flag; borrowed */
    double number;    /* of CLI_NUMBER and CLI_INTEGER */
} cli_given;

struct cli_command;

/** A command as it was typed. */
typedef struct cli_call {
    const struct cli_command *command;
    int n_operand, n_given;
    const char **operand; /* [n_operand], in order; owned, the texts are borrowed */
    cli_given *given;     /* [n_given], in order; owned */
} cli_call;

/** A command. */
typedef struct cli_command {
    const char *name, *operands; /* operands as help shows them, such as "FILE" */
    const char *summary;         /* a line */
    const char *details;         /* what help says below it; may hold line breaks */
    int least, most;             /* number of operands */
    int n_option;
    const cli_option *option;         /* [n_option] */
    int (*run)(const cli_call *call); /* returns the exit status */
} cli_command;

/** The n-th (from 0) giving of an option of the call's command, or NULL. Returned borrowed. */
const cli_given *cli_option_given(const cli_call *call, const char *name, int n);

/** The value of an option that takes text, NULL when it was not given. */
const char *cli_text(const cli_call *call, const char *name);

/** The value of an option that takes a number, `otherwise` when it was not given. */
double cli_number(const cli_call *call, const char *name, double otherwise);

/** 1 when the flag was given. */
int cli_flag(const cli_call *call, const char *name);

#endif
