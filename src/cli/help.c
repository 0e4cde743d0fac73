/* SPDX-License-Identifier: GPL-3.0-or-later
 * untwist help: help, written from the tables of commands and options. */
#include "cli/help.h"

#include <stdio.h>
#include <string.h>
#include <unistd.h>

#include "base/memory.h"
#include "base/nearest.h"
#include "base/text.h"
#include "cli/commands.h"
#include "cli/message.h"

enum { WIDTH = 80, LIST = 2, WORDS = 20 /* where the lists and their explanations begin */ };

/* A line of a list: what is typed, and what it means. */
static void write_entry(utw_text *text, const char *typed, const char *value, const char *meaning)
{
    utw_text_repeat(text, ' ', LIST);
    utw_text_add(text, value == NULL ? "%s" : "%s %s", typed, value);
    if (utw_text_column(text) >= WORDS) utw_text_add(text, "\n");
    utw_text_pad(text, WORDS);
    utw_text_wrap(text, WORDS, WIDTH, meaning);
}

static void write_option(utw_text *text, const cli_option *o)
{
    char typed[64];
    snprintf(typed, sizeof typed, "%s--%s", strcmp(o->name, "output") == 0 ? "-o, " : "", o->name);
    write_entry(text, typed, o->value, o->meaning);
}

/* Exit statuses, as every help shows them. */
static void write_statuses(utw_text *text)
{
    static const struct {
        int status;
        const char *meaning;
    } list[] = {
        {CLI_DONE, "done"},
        {CLI_SAYS_NO, "done, and a check you asked for says no"},
        {CLI_USAGE, "wrong use of the command"},
        {CLI_INPUT, "the input is wrong, or a file cannot be read or written"},
        {CLI_NO_RESULT, "no result could be computed"},
        {CLI_NOT_REACHED, "done, the tolerance was not reached; the printed bounds hold"},
    };
    utw_text_add(text, "\nExit status:\n");
    for (size_t i = 0; i < sizeof list / sizeof list[0]; i++)
        utw_text_add(text, "  %d  %s\n", list[i].status, list[i].meaning);
}

static void write_program(utw_text *text)
{
    utw_text_add(text,
                 "untwist %s: constants of a bar's cross-section, of any shape, with bounds\n\n"
                 "Usage: untwist COMMAND [OPTION]... [OPERAND]...\n\nCommands:\n",
                 utw_version());
    for (int i = 0; i < CLI_N_COMMAND; i++) {
        const cli_command *c = cli_command_list[i];
        write_entry(text, c->name, c->operands, c->summary);
    }
    utw_text_add(text, "\nOptions:\n");
    write_entry(text, "--help", NULL, "This text; after a command, how to use it.");
    write_entry(text, "--version", NULL, "Versions of untwist and of the libraries it stands on.");
    write_statuses(text);
    utw_text_add(text, "\nFirst try: untwist solve FILE, where FILE is a section file such as\n"
                       "those in examples/; docs/section-file.md says what one may hold.\n");
}

/* How the command is typed; an option and its value stay on one line. */
static void write_usage(utw_text *text, const cli_command *c)
{
    static const char begin[] = "Usage: untwist ";
    utw_text_add(text, "%s%s %s", begin, c->name, c->operands);
    for (int i = 0; i < c->n_option; i++) {
        const cli_option *o = &c->option[i];
        char word[96];
        snprintf(word, sizeof word, "[--%s%s%s]%s", o->name, o->value != NULL ? " " : "",
                 o->value != NULL ? o->value : "", o->repeats ? "..." : "");
        if (utw_text_column(text) + 1 + (int)strlen(word) > WIDTH) {
            utw_text_add(text, "\n");
            utw_text_pad(text, (int)sizeof begin - 2);
        }
        utw_text_add(text, " %s", word);
    }
    utw_text_add(text, "\n");
}

static void write_command(utw_text *text, const cli_command *c)
{
    write_usage(text, c);
    utw_text_add(text, "\n");
    utw_text_wrap(text, 0, WIDTH, c->details);
    if (c->n_option > 0) utw_text_add(text, "\nOptions:\n");
    for (int i = 0; i < c->n_option; i++) write_option(text, &c->option[i]);
}

int cli_print_help(const cli_command *command)
{
    utw_text text = {.text = NULL};
    utw_error err;
    char *content = NULL;
    if (command == NULL)
        write_program(&text);
    else
        write_command(&text, command);
    if (utw_text_take(&text, &content, &err) != UTW_OK) return cli_fail(&err);
    const int status = cli_print(content);
    utw_free(content);
    return status;
}

int cli_unknown_command(const char *name)
{
    const char *known[CLI_N_COMMAND];
    for (int i = 0; i < CLI_N_COMMAND; i++) known[i] = cli_command_list[i]->name;
    const int nearest = utw_nearest_word(name, known, CLI_N_COMMAND);
    if (name[0] == '-')
        cli_message("unknown option '%s'; options follow the command, and 'untwist --help' lists "
                    "the commands",
                    name);
    else if (nearest >= 0)
        cli_message("unknown command '%s'; did you mean '%s'?", name, known[nearest]);
    else if (access(name, R_OK) == 0)
        cli_message("'%s' is a file, not a command; did you mean 'untwist solve %s'?", name, name);
    else
        cli_message("unknown command '%s'; 'untwist --help' lists the commands", name);
    return CLI_USAGE;
}

static int run(const cli_call *call)
{
    if (call->n_operand == 0) return cli_print_help(NULL);
    const cli_command *command = cli_find_command(call->operand[0]);
    return command == NULL ? cli_unknown_command(call->operand[0]) : cli_print_help(command);
}

const cli_command cli_help = {
    "help",
    "[COMMAND]",
    "how to use a command, or what commands there are",
    "Tells how to use a command; without one, lists them all.",
    0,
    1,
    0,
    NULL,
    run,
};
