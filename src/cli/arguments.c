/* SPDX-License-Identifier: GPL-3.0-or-later
 * From what was typed to a call of a command. */
#include "cli/arguments.h"

#include <assert.h>
#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/nearest.h"
#include "cli/message.h"

enum { MOST_OPTIONS = 32 /* of a command */ };

/* ---- what the commands ask ------------------------------------------------------------------ */

const cli_given *cli_option_given(const cli_call *call, const char *name, int n)
{
    for (int i = 0; i < call->n_given; i++)
        if (strcmp(call->given[i].option->name, name) == 0 && n-- == 0) return &call->given[i];
    return NULL;
}

const char *cli_text(const cli_call *call, const char *name)
{
    const cli_given *given = cli_option_given(call, name, 0);
    return given == NULL ? NULL : given->text;
}

double cli_number(const cli_call *call, const char *name, double otherwise)
{
    const cli_given *given = cli_option_given(call, name, 0);
    return given == NULL ? otherwise : given->number;
}

int cli_flag(const cli_call *call, const char *name)
{
    return cli_option_given(call, name, 0) != NULL;
}

/* ---- reading -------------------------------------------------------------------------------- */

/* Where the reading stands. */
typedef struct reading {
    const cli_command *command;
    int n, next;
    char **argument;
    cli_call *call;
} reading;

static int refuse(const reading *r, const char *what, const char *argument)
{
    cli_message("%s: %s '%s'; 'untwist help %s' lists what it takes", r->command->name, what,
                argument, r->command->name);
    return CLI_USAGE;
}

static int unknown_option(const reading *r, const char *name, size_t length)
{
    const char *known[MOST_OPTIONS + 1];
    char typed[64];
    int n = 0;
    for (; n < r->command->n_option && n < MOST_OPTIONS; n++) known[n] = r->command->option[n].name;
    known[n++] = "help";
    length = length < sizeof typed - 1 ? length : sizeof typed - 1;
    memcpy(typed, name, length);
    typed[length] = '\0';
    const int nearest = utw_nearest_word(typed, known, n);
    if (nearest < 0) return refuse(r, "unknown option", r->argument[r->next]);
    cli_message("%s: unknown option '%s'; did you mean '--%s'?", r->command->name,
                r->argument[r->next], known[nearest]);
    return CLI_USAGE;
}

/* The whole text as a finite number in the option's range. */
static int read_number(const reading *r, const cli_option *option, const char *text, double *number)
{
    char *end = NULL;
    const int decimal = text[strspn(text, "+-.0123456789eE")] == '\0'; /* no hexadecimal, no inf */
    *number = strtod(text, &end);
    const int whole = option->kind == CLI_INTEGER;
    if (!decimal || end == text || *end != '\0' || !isfinite(*number) ||
        (whole && *number != floor(*number))) {
        cli_message("%s: --%s must be %s, not '%s'", r->command->name, option->name,
                    whole ? "a whole number" : "a number", text);
        return CLI_USAGE;
    }
    if (*number >= option->least && *number <= option->most) return CLI_DONE;
    cli_message("%s: --%s must lie in %g .. %g, not %s", r->command->name, option->name,
                option->least, option->most, text);
    return CLI_USAGE;
}

/* The option that is written --name or --name=VALUE, or -o for --output. */
static const cli_option *find_option(const cli_command *command, const char *argument)
{
    const int is_short = argument[1] != '-';
    const char *name = argument + (is_short ? 1 : 2);
    const size_t length = is_short ? strlen(name) : strcspn(name, "=");
    for (int i = 0; i < command->n_option; i++) {
        const cli_option *o = &command->option[i];
        if (is_short ? strcmp(name, "o") == 0 && strcmp(o->name, "output") == 0
                     : strlen(o->name) == length && strncmp(o->name, name, length) == 0)
            return o;
    }
    return NULL;
}

/* --name, --name VALUE, --name=VALUE or -o VALUE at r->next. */
static int read_option(reading *r)
{
    const char *name = r->argument[r->next] + 2;
    const int is_short = r->argument[r->next][1] != '-';
    const cli_command *command = r->command;
    const cli_option *option = find_option(command, r->argument[r->next]);
    if (option == NULL && is_short) return refuse(r, "unknown option", r->argument[r->next]);
    const size_t length = is_short ? 0 : strcspn(name, "=");
    if (option == NULL) return unknown_option(r, name, length);
    if (!option->repeats && cli_option_given(r->call, option->name, 0) != NULL) {
        cli_message("%s: --%s is given twice", command->name, option->name);
        return CLI_USAGE;
    }
    cli_given given = {option, NULL, 0};
    if (option->kind == CLI_FLAG) {
        if (!is_short && name[length] == '=') {
            cli_message("%s: --%s takes no value", command->name, option->name);
            return CLI_USAGE;
        }
    } else if (!is_short && name[length] == '=') {
        given.text = name + length + 1;
    } else if (r->next + 1 < r->n && strncmp(r->argument[r->next + 1], "--", 2) != 0) {
        given.text = r->argument[++r->next];
    }
    if (option->kind != CLI_FLAG && (given.text == NULL || given.text[0] == '\0')) {
        cli_message("%s: --%s needs a value: --%s %s", command->name, option->name, option->name,
                    option->value);
        return CLI_USAGE;
    }
    int status = CLI_DONE;
    if (option->kind == CLI_NUMBER || option->kind == CLI_INTEGER)
        status = read_number(r, option, given.text, &given.number);
    if (status == CLI_DONE) r->call->given[r->call->n_given++] = given;
    return status;
}

static int read_operand(reading *r)
{
    if (r->call->n_operand >= r->command->most)
        return refuse(r, r->command->most == 0 ? "takes no operand, not" : "one operand too many:",
                      r->argument[r->next]);
    r->call->operand[r->call->n_operand++] = r->argument[r->next];
    return CLI_DONE;
}

static int asks_for_help(int n, char **argument)
{
    for (int i = 0; i < n && strcmp(argument[i], "--") != 0; i++)
        if (strcmp(argument[i], "--help") == 0 || strcmp(argument[i], "-h") == 0) return 1;
    return 0;
}

int cli_read_arguments(const cli_command *command, int n, char **argument, cli_call *call,
                       int *help)
{
    reading r = {command, n, 0, argument, call};
    int status = CLI_DONE, options = 1;
    *call = (cli_call){.command = command};
    *help = asks_for_help(n, argument);
    if (*help) return CLI_DONE;
    call->operand = utw_alloc((size_t)n, sizeof *call->operand);
    call->given = utw_alloc((size_t)n, sizeof *call->given);
    if (call->operand == NULL || call->given == NULL) {
        cli_message("out of memory");
        return CLI_NO_RESULT;
    }
    for (; r.next < n && status == CLI_DONE; r.next++) {
        const char *a = argument[r.next];
        if (options && strcmp(a, "--") == 0)
            options = 0;
        else if (options && a[0] == '-' && a[1] != '\0')
            status = read_option(&r);
        else
            status = read_operand(&r);
    }
    if (status == CLI_DONE && call->n_operand < command->least) {
        cli_message("%s: %s is missing; 'untwist help %s' tells how to use it", command->name,
                    command->operands, command->name);
        status = CLI_USAGE;
    }
    return status;
}

void cli_clear_call(cli_call *call)
{
    utw_free(call->operand);
    utw_free(call->given);
    *call = (cli_call){0};
}
