/* SPDX-License-Identifier: GPL-3.0-or-later
 * Pairs of numbers as options take them. */
#include "cli/point.h"

#include <math.h>
#include <stdlib.h>
#include <string.h>

#include "cli/message.h"

/* A finite decimal number that is all of the text up to `end`. */
static int number(const char *text, const char *end, double *value)
{
    char *stop;
    const size_t length = (size_t)(end - text);
    if (strspn(text, "+-.0123456789eE") < length) return 0; /* no hexadecimal, no inf */
    *value = strtod(text, &stop);
    return length > 0 && stop == end && isfinite(*value);
}

int cli_read_decimal(const char *text, double *value)
{
    return number(text, text + strlen(text), value);
}

int cli_read_point(const cli_call *call, const char *option, const char *text, double xy[2])
{
    const char *comma = strchr(text, ',');
    if (comma != NULL && number(text, comma, &xy[0]) &&
        number(comma + 1, text + strlen(text), &xy[1]))
        return CLI_DONE;
    cli_message("%s: --%s takes X,Y, not '%s'", call->command->name, option, text);
    return CLI_USAGE;
}
