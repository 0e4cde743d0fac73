/* SPDX-License-Identifier: GPL-3.0-or-later
 * untwist shape: lists the trade shapes, shows one, writes one as a section file. */
#include "cli/shape.h"

#include <math.h>
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "base/memory.h"
#include "base/vec2.h"
#include "outline/shape.h"
#include "report/shape_file.h"

enum { DONE = 0, WRONG_USE = 2, WRONG_INPUT = 3, NO_RESULT = 4 };

static const char usage[] =
    "usage: untwist shape                              list the shapes\n"
    "       untwist shape NAME                         show its drawing and dimensions\n"
    "       untwist shape NAME key=value ... > FILE    write it as a section file\n"
    "options: --units \"mm N\"  length and force unit of the file\n"
    "         --at X,Y        where the shape's origin goes\n"
    "         --turn DEGREES  counter-clockwise, after mirroring\n"
    "         --mirror        left and right exchanged\n";

static int list_shapes(void)
{
    for (int i = 0; i < utw_shape_count(); i++) {
        const utw_shape *shape = utw_shape_at(i);
        printf("%-16s%s\n%16s", shape->name, shape->meaning, "");
        for (int k = 0; k < shape->n_dimension; k++) {
            const utw_shape_dimension *d = &shape->dimension[k];
            printf(d->required ? "%s%s" : "%s[%s]", k > 0 ? " " : "", d->key);
        }
        printf("\n");
    }
    printf("\n'untwist shape NAME' shows what the letters mean; those in [] may be left out.\n");
    return DONE;
}

static void show_dimension(const utw_shape_dimension *d)
{
    static const char *const unit[] = {"", " [degrees]", " [per cent]", " [a whole number]"};
    printf("  %-10s%s%s", d->key, d->meaning, unit[d->unit]);
    if (!d->required && d->otherwise[0] != '\0') printf("; %s when not given", d->otherwise);
    if (!d->required && d->otherwise[0] == '\0') printf("; %.10g when not given", d->fallback);
    printf("\n");
}

static int show_shape(const utw_shape *shape)
{
    printf("%s: %s\n\n%s\n", shape->name, shape->meaning, shape->drawing);
    for (int k = 0; k < shape->n_dimension; k++) show_dimension(&shape->dimension[k]);
    printf("\nOrigin: %s.\n", shape->origin);
    return DONE;
}

static int wrong_use(const char *what, const char *argument)
{
    fprintf(stderr, "untwist shape: %s%s\n%s", what, argument, usage);
    return WRONG_USE;
}

/* A finite number that is all of the text up to `end` (NULL: up to its end). */
static int number(const char *text, const char *end, double *value)
{
    char *stop;
    *value = strtod(text, &stop);
    return stop != text && (end != NULL ? stop == end : *stop == '\0') && isfinite(*value);
}

/* What the command line asks for. */
typedef struct request {
    const char *name, *units;
    utw_placement placement;
    int n;
    const char **keys; /* [n]; point into copies that the arguments' '=' ends */
    double *values;    /* [n] */
} request;

/* An option; moves *i past its value. */
static int read_option(int argc, char **argv, int *i, request *q)
{
    const char *option = argv[*i], *value = *i + 1 < argc ? argv[*i + 1] : NULL;
    if (strcmp(option, "--mirror") == 0) {
        q->placement.mirror = 1;
        return DONE;
    }
    const int units = strcmp(option, "--units") == 0, turn = strcmp(option, "--turn") == 0;
    if (!units && !turn && strcmp(option, "--at") != 0) return wrong_use("unknown option ", option);
    if (value == NULL) return wrong_use("a value is missing after ", option);
    ++*i;
    if (units) {
        q->units = value;
    } else if (turn) {
        if (!number(value, NULL, &q->placement.turn))
            return wrong_use("--turn takes degrees, not ", value);
        q->placement.turn = fmod(q->placement.turn, 360) * (UTW_PI / 180);
    } else {
        const char *comma = strchr(value, ',');
        if (comma == NULL || !number(value, comma, &q->placement.at[0]) ||
            !number(comma + 1, NULL, &q->placement.at[1]))
            return wrong_use("--at takes X,Y, not ", value);
    }
    return DONE;
}

static int read_dimension(char *argument, request *q)
{
    char *equals = strchr(argument, '=');
    if (equals == NULL || equals == argument)
        return wrong_use("a dimension is given as key=value, not ", argument);
    if (!number(equals + 1, NULL, &q->values[q->n])) return wrong_use("not a number: ", argument);
    *equals = '\0';
    q->keys[q->n++] = argument;
    return DONE;
}

static int write_shape(const request *q)
{
    char *text = NULL;
    utw_error err;
    const utw_status st = utw_shape_file_text(q->name, q->n, q->keys, q->values, q->units,
                                              &q->placement, &text, &err);
    if (st != UTW_OK) {
        fprintf(stderr, "untwist shape: %s\n", err.text);
        return st == UTW_E_SYNTAX ? WRONG_USE : st == UTW_E_OUTLINE ? WRONG_INPUT : NO_RESULT;
    }
    const int written = fputs(text, stdout) >= 0 && fflush(stdout) == 0;
    utw_free(text);
    if (written) return DONE;
    fprintf(stderr, "untwist shape: standard output cannot be written\n");
    return NO_RESULT;
}

int utw_cli_shape(int argc, char **argv)
{
    request q = {.units = "mm N"};
    int result = NO_RESULT;
    if (argc == 1) return list_shapes();
    q.keys = utw_alloc((size_t)argc, sizeof *q.keys);
    q.values = utw_alloc((size_t)argc, sizeof *q.values);
    if (q.keys == NULL || q.values == NULL) {
        fprintf(stderr, "untwist shape: out of memory\n");
        goto done;
    }
    result = DONE;
    for (int i = 1; i < argc && result == DONE; i++) {
        if (strcmp(argv[i], "--help") == 0) {
            fputs(usage, stdout);
            goto done;
        }
        if (argv[i][0] == '-')
            result = read_option(argc, argv, &i, &q);
        else if (q.name == NULL)
            q.name = argv[i];
        else
            result = read_dimension(argv[i], &q);
    }
    if (result != DONE) goto done;
    if (q.name == NULL) {
        result = wrong_use("name a shape", "");
        goto done;
    }
    const utw_shape *shape = utw_shape_find(q.name);
    result = shape != NULL && q.n == 0 ? show_shape(shape) : write_shape(&q);
done:
    utw_free(q.keys);
    utw_free(q.values);
    return result;
}
