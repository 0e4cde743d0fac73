/* SPDX-License-Identifier: GPL-3.0-or-later
 * untwist shape: lists the trade shapes, shows one, writes one as a section file. */
#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/text.h"
#include "base/vec2.h"
#include "cli/commands.h"
#include "cli/message.h"
#include "cli/point.h"
#include "outline/shape.h"
#include "report/shape_file.h"

/* Print what was written and clear it. */
static int print(utw_text *text)
{
    utw_error err;
    char *content = NULL;
    if (utw_text_take(text, &content, &err) != UTW_OK) return cli_fail(&err);
    const int status = cli_print(content);
    utw_free(content);
    return status;
}

static int list_shapes(void)
{
    utw_text text = {.text = NULL};
    for (int i = 0; i < utw_shape_count(); i++) {
        const utw_shape *shape = utw_shape_at(i);
        utw_text_add(&text, "%-16s%s\n%16s", shape->name, shape->meaning, "");
        for (int k = 0; k < shape->n_dimension; k++) {
            const utw_shape_dimension *d = &shape->dimension[k];
            utw_text_add(&text, d->required ? "%s%s" : "%s[%s]", k > 0 ? " " : "", d->key);
        }
        utw_text_add(&text, "\n");
    }
    utw_text_add(&text,
                 "\n'untwist shape NAME' shows what the letters mean; those in [] may be left "
                 "out.\nAerofoil boxes are drawn in section files: docs/shapes.md.\n");
    return print(&text);
}

static int show_shape(const utw_shape *shape)
{
    static const char *const unit[] = {"", " [degrees]", " [per cent]", " [a whole number]"};
    utw_text text = {.text = NULL};
    utw_text_add(&text, "%s: %s\n\n%s\n", shape->name, shape->meaning, shape->drawing);
    for (int k = 0; k < shape->n_dimension; k++) {
        const utw_shape_dimension *d = &shape->dimension[k];
        utw_text_add(&text, "  %-10s%s%s", d->key, d->meaning, unit[d->unit]);
        if (!d->required && d->otherwise[0] != '\0')
            utw_text_add(&text, "; %s when not given", d->otherwise);
        if (!d->required && d->otherwise[0] == '\0')
            utw_text_add(&text, "; %.10g when not given", d->fallback);
        utw_text_add(&text, "\n");
    }
    utw_text_add(&text, "\nOrigin: %s.\n", shape->origin);
    return print(&text);
}

/* A finite number that is all of the text. */
static int number(const char *text, double *value)
{
    char *stop;
    *value = strtod(text, &stop);
    return stop != text && *stop == '\0' && isfinite(*value);
}

/* What the command line asks for. */
typedef struct request {
    const char *units;
    utw_placement placement;
    int n;
    char **keys;    /* [n], owned */
    double *values; /* [n], owned */
} request;

static int read_placement(const cli_call *call, utw_placement *placement)
{
    const char *at = cli_text(call, "at");
    placement->mirror = cli_flag(call, "mirror");
    placement->turn = fmod(cli_number(call, "turn", 0), 360) * (UTW_PI / 180);
    return at == NULL ? CLI_DONE : cli_read_point(call, "at", at, placement->at);
}

/* An operand KEY=VALUE. */
static int read_dimension(const char *operand, request *q)
{
    const char *equals = strchr(operand, '=');
    if (equals == NULL || equals == operand) {
        cli_message("shape: a dimension is given as KEY=VALUE, not '%s'", operand);
        return CLI_USAGE;
    }
    if (!number(equals + 1, &q->values[q->n])) {
        cli_message("shape: not a number: '%s'", operand);
        return CLI_USAGE;
    }
    char *key = utw_copy_string(operand);
    if (key == NULL) {
        cli_message("out of memory");
        return CLI_NO_RESULT;
    }
    key[equals - operand] = '\0';
    q->keys[q->n++] = key;
    return CLI_DONE;
}

static int write_shape(const char *name, const request *q)
{
    char *text = NULL;
    utw_error err;
    const utw_status st = utw_shape_file_text(name, q->n, (const char *const *)q->keys, q->values,
                                              q->units, &q->placement, &text, &err);
    if (st != UTW_OK) {
        utw_error_prefix(&err, "shape: ");
        cli_fail(&err);
        /* what the library calls bad syntax of a file was typed here */
        return st == UTW_E_SYNTAX ? CLI_USAGE : cli_exit_status(st);
    }
    const int status = cli_print(text);
    utw_free(text);
    return status;
}

static int run(const cli_call *call)
{
    if (call->n_operand == 0 && call->n_given == 0) return list_shapes();
    if (call->n_operand == 0) {
        cli_message("shape: name a shape; 'untwist shape' lists them");
        return CLI_USAGE;
    }
    const char *name = call->operand[0], *units = cli_text(call, "units");
    const utw_shape *shape = utw_shape_find(name);
    if (shape != NULL && call->n_operand == 1 && call->n_given == 0) return show_shape(shape);
    request q = {.units = units == NULL ? "mm N" : units};
    const size_t n = (size_t)call->n_operand;
    int status = read_placement(call, &q.placement);
    q.keys = utw_alloc(n, sizeof *q.keys);
    q.values = utw_alloc(n, sizeof *q.values);
    if (q.keys == NULL || q.values == NULL) {
        cli_message("out of memory");
        status = CLI_NO_RESULT;
    }
    for (int i = 1; i < call->n_operand && status == CLI_DONE; i++)
        status = read_dimension(call->operand[i], &q);
    if (status == CLI_DONE) status = write_shape(name, &q);
    for (int i = 0; i < q.n; i++) utw_free(q.keys[i]);
    utw_free(q.keys);
    utw_free(q.values);
    return status;
}

static const cli_option options[] = {
    {"units", "UNITS", "Length and force unit of the file. Without it: \"mm N\".", CLI_TEXT, 0, 0,
     0},
    {"at", "X,Y", "Where the origin of the shape goes.", CLI_TEXT, 0, 0, 0},
    {"turn", "DEGREES", "Turn it counter-clockwise, after mirroring.", CLI_NUMBER, -1e6, 1e6, 0},
    {"mirror", NULL, "Exchange left and right.", CLI_FLAG, 0, 0, 0},
};

const cli_command cli_shape = {
    "shape",
    "[NAME [KEY=VALUE]...]",
    "trade shapes: list, dimensions, section files",
    "Without NAME lists the trade shapes; with NAME alone shows its drawing and its dimensions; "
    "with dimensions writes it as a section file to standard output, such as\n"
    "untwist shape channel h=100 b=50 tf=8.5 tw=6 r=8.5 > channel.json",
    0,
    1000,
    sizeof options / sizeof options[0],
    options,
    run,
};
