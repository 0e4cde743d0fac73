/* SPDX-License-Identifier: GPL-3.0-or-later
 * What the program says and how it ends. */
#include "cli/message.h"

#include <errno.h>
#include <stdarg.h>
#include <stdio.h>
#include <string.h>

void cli_message(const char *format, ...)
{
    va_list arguments;
    fputs("untwist: ", stderr);
    va_start(arguments, format);
    vfprintf(stderr, format, arguments);
    va_end(arguments);
    fputc('\n', stderr);
}

int cli_exit_status(utw_status status)
{
    switch (status) {
    case UTW_OK:
        return CLI_DONE;
    case UTW_E_ARGUMENT:
        return CLI_USAGE;
    case UTW_E_FILE:
    case UTW_E_SYNTAX:
    case UTW_E_OUTLINE:
    case UTW_E_MATERIAL:
    case UTW_E_LOAD:
        return CLI_INPUT;
    case UTW_E_NOMEM:
    case UTW_E_MESH:
    case UTW_E_SINGULAR:
    case UTW_E_NO_THIN_WALL:
    case UTW_E_UNBOUNDED:
    case UTW_E_INTERNAL:
        return CLI_NO_RESULT;
    }
    return CLI_NO_RESULT;
}

int cli_fail(const utw_error *err)
{
    cli_message("%s", err->text);
    return cli_exit_status(err->status);
}

static int cannot_write(const char *name, int reason)
{
    cli_message("%s cannot be written: %s", name,
                reason != 0 ? strerror(reason) : "unknown reason");
    return CLI_INPUT;
}

int cli_print(const char *text)
{
    errno = 0;
    const int failed = fputs(text, stdout) == EOF || fflush(stdout) != 0;
    return failed ? cannot_write("standard output", errno) : CLI_DONE;
}

int cli_write(const char *path, const char *text)
{
    if (strcmp(path, "-") == 0) return cli_print(text);
    errno = 0;
    FILE *file = fopen(path, "w");
    if (file == NULL) return cannot_write(path, errno);
    const size_t n = strlen(text);
    int reason = 0;
    errno = 0;
    if (fwrite(text, 1, n, file) != n || fflush(file) != 0) reason = errno != 0 ? errno : EIO;
    errno = 0;
    if (fclose(file) != 0 && reason == 0) reason = errno != 0 ? errno : EIO;
    return reason != 0 ? cannot_write(path, reason) : CLI_DONE;
}
